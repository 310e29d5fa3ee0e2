package bubblechain.series;

import bubblechain.exact.DecimalText;
import java.util.Optional;

/**
 * The decimal digits of a number between A and A + width. They are those of A, 16 at a time: times 10^16, cut off the
 * integer; digits of the fraction that the width makes meaningless are dropped on the way. The decimal is given if
 * A + width rounds to the same.
 */
final class DecimalDigits {
    /** 10^0 .. 10^17. */
    static final long[] POWERS_OF_TEN = powersOfTen();

    private static final int BITS = FixedDigits.BITS;
    private static final long MASK = FixedDigits.MASK;
    private static final int CHUNK = 16;
    /** Digits computed beyond those asked for, to decide on the rounding. */
    private static final int BEYOND = 12;

    private static final double DROP = 0x1p57;
    private static final double LARGEST_WIDTH = 1e17;
    private static final int TEN = 10;

    private final long[] fraction;
    /** In units of the last digit of the fraction. */
    private double width;
    private int last;
    private long integer;

    private DecimalDigits(long[] digits, double width) {
        this.fraction = digits;
        this.width = width;
        this.last = digits.length - 1;
        this.integer = digits[0];
    }

    private static long[] powersOfTen() {
        long[] powers = new long[18];
        powers[0] = 1;
        for (int k = 1; k < powers.length; k++) {
            powers[k] = TEN * powers[k - 1];
        }
        return powers;
    }

    /**
     * @param digits A in radix 2^56, the last digit of any size; taken over
     * @param width  in units of the last digit
     */
    static DecimalDigits of(long[] digits, double width) {
        for (int k = digits.length - 1; k > 0; k--) {
            digits[k - 1] += digits[k] >> BITS;
            digits[k] &= MASK;
        }
        return new DecimalDigits(digits, width);
    }

    /**
     * The number times 10^exponent, rounded; empty if the digits are not certain, or A is not positive.
     *
     * @param digits significant digits
     */
    Optional<String> text(boolean negative, long exponent, int digits) {
        long first = exponent;
        if (integer < 0) {
            return Optional.empty();
        }
        while (integer == 0) {
            if (last == 0) {
                return Optional.empty();
            }
            next(CHUNK);
            first -= CHUNK;
        }
        String leading = Long.toString(integer);
        first += leading.length() - 1;
        char[] text = new char[Math.max(leading.length(), digits + BEYOND)];
        leading.getChars(0, leading.length(), text, 0);
        for (int at = leading.length(); at < text.length; at += CHUNK) {
            int count = Math.min(CHUNK, text.length - at);
            next(count);
            write(text, at, count);
        }
        if (!round(text, digits)) {
            return Optional.empty();
        }
        if (text[0] > '9') {
            text[0] = '1';
            first++;
        }
        return Optional.of(DecimalText.of(negative, new String(text, 0, digits), first));
    }

    /** The fraction times 10^count: its integer, and what is left. */
    private void next(int count) {
        long factor = POWERS_OF_TEN[count];
        long carry = 0;
        for (int k = last; k > 0; k--) {
            long x = fraction[k];
            long low = x * factor;
            long t = (low & MASK) + carry;
            carry = (Math.multiplyHigh(x, factor) << (Long.SIZE - BITS)) + (low >>> BITS) + (t >>> BITS);
            fraction[k] = t & MASK;
        }
        integer = carry;
        width *= factor * FixedSeries.UP;
        while (width >= DROP && last > 0) {
            width = width * 0x1p-56 + 1;
            last--;
        }
    }

    private void write(char[] text, int at, int count) {
        long rest = integer;
        for (int k = at + count - 1; k >= at; k--) {
            long quotient = rest / TEN;
            text[k] = (char) ('0' + (rest - quotient * TEN));
            rest = quotient;
        }
    }

    /**
     * Rounds to so many digits; the digits behind them are X, and the number is between X and X + 1 + width of their last
     * places.
     *
     * @return false if the interval holds a point half-way between two decimals
     */
    private boolean round(char[] text, int digits) {
        int behind = text.length - digits;
        double spread = Math.ceil(Math.scalb(width, -BITS * last) * FixedSeries.UP);
        if (!(spread < LARGEST_WIDTH)) {
            return false;
        }
        long x = Long.parseLong(new String(text, digits, behind));
        long upper = x + 1 + (long) spread;
        long half = POWERS_OF_TEN[behind] / 2;
        if (upper <= half) {
            return true;
        }
        if (x <= half || upper > 3 * half) {
            return false;
        }
        int k = digits - 1;
        while (k > 0 && text[k] == '9') {
            text[k] = '0';
            k--;
        }
        // a first digit above nine stands for 10
        text[k]++;
        return true;
    }
}
