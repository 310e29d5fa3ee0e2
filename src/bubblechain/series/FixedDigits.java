package bubblechain.series;

import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.List;

/**
 * Fixed-point numbers as arrays of signed digits in radix 2^56: d[0] + d[1] 2^-56 + ... + d[limbs] 2^(-56 limbs). Digits
 * are balanced, |d| &lt;= 2^55, so that no operation has to look at a sign and a small number begins with zero digits.
 *
 * <p>The unit in the last place, 2^(-56 limbs), is the unit of every error in this package.
 */
final class FixedDigits {
    /** Bits of a digit. */
    static final int BITS = 56;

    static final long MASK = (1L << BITS) - 1;

    private static final long HALF = 1L << (BITS - 1);
    private static final int WORD = 28;
    private static final long WORD_MASK = (1L << WORD) - 1;
    /**
     * The integer digit must stay within this; beyond it the computation is given up. 64 times as much, which
     * {@link #combination} can make of it, still fits a long.
     */
    static final long LARGEST = 1L << 56;

    private static final int SMALL_BITS = 25;
    private static final double LARGEST_RATIO = 64;

    private FixedDigits() {}

    /** The digits of value 2^(-56 limbs). */
    static long[] of(BigInteger value, int limbs) {
        long[] digits = new long[limbs + 1];
        byte[] bytes = value.toByteArray();
        int perDigit = BITS / Byte.SIZE;
        byte fill = (byte) (value.signum() < 0 ? -1 : 0);
        if (bytes.length > (limbs + 1) * perDigit) {
            throw new ArithmeticException("a fixed-point number is out of range");
        }
        for (int k = 0; k <= limbs; k++) {
            long digit = 0;
            for (int b = perDigit - 1; b >= 0; b--) {
                int index = bytes.length - 1 - ((limbs - k) * perDigit + b);
                digit = digit << Byte.SIZE | (index < 0 ? fill : bytes[index]) & 0xff;
            }
            digits[k] = digit;
        }
        // two's complement: the top digit carries the sign
        digits[0] = digits[0] << (Long.SIZE - BITS) >> (Long.SIZE - BITS);
        normalise(digits);
        return digits;
    }

    /** The integer whose digits these are, the number times 2^(56 limbs). */
    static BigInteger toInteger(long[] digits) {
        int perDigit = BITS / Byte.SIZE;
        byte[] bytes = new byte[digits.length * perDigit + Byte.SIZE];
        long carry = 0;
        int index = bytes.length;
        for (int k = digits.length - 1; k >= 0; k--) {
            long digit = digits[k] + carry;
            carry = digit >> BITS;
            for (int b = 0; b < perDigit; b++) {
                bytes[--index] = (byte) digit;
                digit >>= Byte.SIZE;
            }
        }
        while (index > 0) {
            bytes[--index] = (byte) carry;
            carry >>= Byte.SIZE;
        }
        return new BigInteger(bytes);
    }

    /** Balances the digits. @throws ArithmeticException if the number is out of range */
    static void normalise(long[] digits) {
        long carry = 0;
        for (int k = digits.length - 1; k > 0; k--) {
            long d = digits[k] + carry;
            carry = d + HALF >> BITS;
            digits[k] = d - (carry << BITS);
        }
        digits[0] += carry;
        if (digits[0] > LARGEST || digits[0] < -LARGEST) {
            throw new ArithmeticException("a fixed-point number is out of range");
        }
    }

    /** Adds another number of as many digits. */
    static void add(long[] target, long[] more) {
        for (int k = 0; k < target.length; k++) {
            target[k] += more[k];
        }
        normalise(target);
    }

    /** Adds a small multiple of another number from a digit on, without carries. */
    static void addMultiple(long[] target, long[] more, int weight, int from) {
        for (int k = from; k < target.length; k++) {
            target[k] += weight * more[k];
        }
    }

    /** Number of zero digits at the start; the length if all are zero. */
    static int leadingZeros(long[] digits) {
        int k = 0;
        while (k < digits.length && digits[k] == 0) {
            k++;
        }
        return k;
    }

    static int[] leadingZeros(long[][] numbers) {
        int[] zeros = new int[numbers.length];
        for (int k = 0; k < zeros.length; k++) {
            zeros[k] = leadingZeros(numbers[k]);
        }
        return zeros;
    }

    static double[] upperBounds(long[][] numbers) {
        double[] bounds = new double[numbers.length];
        for (int k = 0; k < bounds.length; k++) {
            bounds[k] = upperBound(numbers[k]);
        }
        return bounds;
    }

    /** Not below the bit lengths of the integers behind some numbers. */
    static int largestBits(List<long[]> numbers) {
        int largest = 0;
        for (long[] digits : numbers) {
            int zeros = leadingZeros(digits);
            if (zeros < digits.length) {
                int first = Long.SIZE - Long.numberOfLeadingZeros(Math.abs(digits[zeros]));
                largest = Math.max(largest, first + 1 + BITS * (digits.length - 1 - zeros));
            }
        }
        return largest;
    }

    /** The number to four units in the last place of a double. */
    static double toDouble(long[] digits) {
        int zeros = leadingZeros(digits);
        double value = 0;
        for (int k = Math.min(digits.length, zeros + 3) - 1; k >= zeros; k--) {
            value = value * 0x1p-56 + digits[k];
        }
        return Math.scalb(value, -BITS * zeros);
    }

    /** Not below |number|. */
    static double upperBound(long[] digits) {
        return upperBound(digits, 0);
    }

    /** Not below |number| 2^shift. */
    static double upperBound(long[] digits, int shift) {
        int zeros = leadingZeros(digits);
        if (zeros == digits.length) {
            return 0;
        }
        double first = Math.abs((double) digits[zeros]);
        double second = zeros + 1 < digits.length ? Math.abs((double) digits[zeros + 1]) : 0;
        // the digits that are left out add less than one unit of the second
        double mantissa = (first + (second + 1) * 0x1p-56) * (1 + 0x1p-50);
        return Math.max(Math.scalb(mantissa, shift - BITS * zeros), Double.MIN_VALUE);
    }

    /**
     * Adds the product of two numbers to column sums, columns 0 .. last; column c of the sums stands at index c + 2.
     *
     * @param zerosA leading zero digits of a
     * @param zerosB leading zero digits of b
     */
    static void accumulateProduct(long[] a, int zerosA, long[] b, int zerosB, int last, long[] sums) {
        int largest = a.length - 1;
        for (int c = zerosA + zerosB; c <= last; c++) {
            int to = Math.min(largest, c - zerosB);
            for (int from = Math.max(zerosA, c - (b.length - 1)); from <= to; from += 64) {
                accumulateColumn(a, b, c, from, Math.min(to, from + 63), sums);
            }
        }
    }

    /** At most 64 products, so that neither half of their sum overflows. */
    private static void accumulateColumn(long[] a, long[] b, int c, int from, int to, long[] sums) {
        long low = 0;
        long high = 0;
        for (int i = from; i <= to; i++) {
            long x = a[i];
            long y = b[c - i];
            long product = x * y;
            low += product & MASK;
            high += (Math.multiplyHigh(x, y) << (Long.SIZE - BITS)) | (product >>> BITS);
        }
        long t = high + (low >>> BITS);
        sums[c + 2] += low & MASK;
        sums[c + 1] += t & MASK;
        sums[c] += t >> BITS;
    }

    /** Carries in the column sums, so that 48 more products can be added. */
    static void carry(long[] sums) {
        long carry = 0;
        for (int k = sums.length - 1; k > 0; k--) {
            long d = sums[k] + carry;
            carry = d >> BITS;
            sums[k] = d & MASK;
        }
        sums[0] += carry;
    }

    /** The product of two numbers, off by less than two units in the last place. */
    static long[] product(long[] a, long[] b, int limbs) {
        int last = limbs + FixedSeries.GUARD_COLUMNS;
        long[] sums = new long[last + 3];
        accumulateProduct(a, leadingZeros(a), b, leadingZeros(b), last, sums);
        return fromSums(sums, limbs);
    }

    /** The column sums as a number of so many limbs, columns beyond the last digit dropped. */
    static long[] fromSums(long[] sums, int limbs) {
        carry(sums);
        long[] digits = new long[limbs + 1];
        System.arraycopy(sums, 2, digits, 0, limbs + 1);
        // sums[0] and sums[1] stand above the integer digit: a sign extension unless the number is out of range
        long above = (sums[0] << BITS) + sums[1];
        if (sums[0] > 0 || sums[0] < -1 || above > 7 || above < -8) {
            throw new ArithmeticException("a fixed-point number is out of range");
        }
        digits[0] += above << BITS;
        normalise(digits);
        return digits;
    }

    /**
     * number/divisor for 0 &lt; divisor &lt; 2^26, cut off: the error is below 1 + 2^-20 units in the last place, the excess
     * because a quotient of doubles can fall just below an integer.
     */
    static void divideSmall(long[] digits, int divisor) {
        double inverse = 1.0 / divisor;
        long remainder = 0;
        for (int k = 0; k < digits.length; k++) {
            long x = (remainder << WORD) + (digits[k] >> WORD);
            long upper = (long) (x * inverse);
            remainder = x - upper * divisor;
            x = (remainder << WORD) + (digits[k] & WORD_MASK);
            long lower = (long) (x * inverse);
            remainder = x - lower * divisor;
            digits[k] = (upper << WORD) + lower;
        }
        normalise(digits);
    }

    /** True if {@link #scale} takes this factor. */
    static boolean scales(Rational factor) {
        return factor.numerator().bitLength() < SMALL_BITS
                && factor.denominator().bitLength() < SMALL_BITS
                && Math.abs(factor.toDouble()) <= LARGEST_RATIO;
    }

    /** number p/q in place, digits from {@code from} on (those before are zero); error below two units in the last place. */
    static void scale(long[] digits, int p, int q, int from) {
        double inverse = 1.0 / q;
        long remainder = 0;
        for (int k = from; k < digits.length; k++) {
            long x = (remainder << WORD) + p * (digits[k] >> WORD);
            long upper = (long) (x * inverse);
            remainder = x - upper * q;
            x = (remainder << WORD) + p * (digits[k] & WORD_MASK);
            long lower = (long) (x * inverse);
            remainder = x - lower * q;
            digits[k] = (upper << WORD) + lower;
        }
        normalise(digits);
    }

    /** Up to this many terms in a {@link #combination}. */
    static final int TERMS = 5;

    /**
     * sum_i weights[i] terms[i] / divisor into target, for up to {@link #TERMS} terms, |weights| &lt; 2^26 and
     * 0 &lt; divisor &lt; 2^26, sum |weights| at most 64 divisor: one pass, the error of the division below two units in the
     * last place.
     */
    static void combination(long[] target, long[][] terms, int[] weights, int count, int divisor) {
        double inverse = 1.0 / divisor;
        long remainder = 0;
        long w0 = weights[0];
        long[] t0 = terms[0];
        long w1 = count > 1 ? weights[1] : 0;
        long[] t1 = count > 1 ? terms[1] : t0;
        long w2 = count > 2 ? weights[2] : 0;
        long[] t2 = count > 2 ? terms[2] : t0;
        long w3 = count > 3 ? weights[3] : 0;
        long[] t3 = count > 3 ? terms[3] : t0;
        long w4 = count > 4 ? weights[4] : 0;
        long[] t4 = count > 4 ? terms[4] : t0;
        for (int k = 0; k < target.length; k++) {
            long a = t0[k];
            long b = t1[k];
            long c = t2[k];
            long d = t3[k];
            long e = t4[k];
            long x = (remainder << WORD)
                    + w0 * (a >> WORD) + w1 * (b >> WORD) + w2 * (c >> WORD) + w3 * (d >> WORD) + w4 * (e >> WORD);
            long upper = (long) (x * inverse);
            remainder = x - upper * divisor;
            x = (remainder << WORD)
                    + w0 * (a & WORD_MASK) + w1 * (b & WORD_MASK) + w2 * (c & WORD_MASK) + w3 * (d & WORD_MASK)
                    + w4 * (e & WORD_MASK);
            long lower = (long) (x * inverse);
            remainder = x - lower * divisor;
            target[k] = (upper << WORD) + lower;
        }
        normalise(target);
    }
}
