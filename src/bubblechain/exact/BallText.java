package bubblechain.exact;

import java.math.BigDecimal;
import java.math.BigInteger;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Balls from text and to text; the formats are described at {@link Ball#parse} and {@link Ball#toDecimal}. */
final class BallText {
    private static final Pattern LAST_DIGITS =
            Pattern.compile("([+-]?\\d+(?:\\.(\\d*))?)\\((\\d+)\\)(?:[eE]([+-]?\\d{1,5}))?");
    private static final Pattern PLUS_MINUS = Pattern.compile("\\s*(?:\\+-|\\+/-|\u00b1)\\s*");
    private static final int MOST_DIGITS = 20;
    private static final int FEW_DIGITS = 4;
    private static final double LOG10_OF_2 = Math.log10(2);

    private BallText() {}

    /** digits * 10^(exponent - number of digits + 1), digits positive and of the length asked for. */
    private record Decimal(BigInteger digits, long exponent) {}

    static Ball parse(String text, int bits) {
        Matcher m = LAST_DIGITS.matcher(text.strip());
        if (m.matches()) {
            int places = m.group(2) == null ? 0 : m.group(2).length();
            int power = m.group(4) == null ? 0 : Integer.parseInt(m.group(4));
            Rational scale = Rational.of(10).power(power);
            Rational unit = Rational.of(10).power(power - places);
            return Ball.of(Rational.parse(m.group(1)).multiply(scale), Rational.parse(m.group(3)).multiply(unit), bits);
        }
        String[] parts = PLUS_MINUS.split(text.strip(), -1);
        if (parts.length == 1) {
            return Ball.of(Rational.parse(text), bits);
        }
        if (parts.length > 2 || parts[0].isEmpty()) {
            throw new DomainException("'" + text + "' is not a number with an uncertainty such as 1.23+-0.05");
        }
        Rational radius = Rational.parse(parts[1]);
        if (radius.signum() < 0) {
            throw new DomainException("'" + text + "' has a negative uncertainty; give its size after +-");
        }
        return Ball.of(Rational.parse(parts[0]), radius, bits);
    }

    static Optional<String> toDecimal(Ball ball, int digits) {
        if (digits < 1) {
            throw new DomainException("asked for " + digits + " significant digits; ask for at least 1");
        }
        if (ball.isZero()) {
            return Optional.of("0");
        }
        if (ball.containsZero()) {
            return Optional.empty();
        }
        // the end nearer to zero is rounded; the other end must lie in the same rounding interval
        boolean negative = ball.isNegative();
        Dyadic near = (negative ? ball.high() : ball.low()).abs();
        Dyadic far = (negative ? ball.low() : ball.high()).abs();
        return nearest(near, far, digits)
                .map(d -> DecimalText.of(negative, d.digits.toString(), d.exponent));
    }

    /** The positive numbers between two ends rounded to significant digits, ties to even, if all round to the same. */
    private static Optional<Decimal> nearest(Dyadic near, Dyadic far, int digits) {
        BigInteger top = BigInteger.TEN.pow(digits);
        BigInteger bottom = BigInteger.TEN.pow(digits - 1);
        long exponent = (long) Math.floor((near.top() - 0.5) * LOG10_OF_2); // a guess, put right below
        while (true) {
            long place = exponent - digits + 1;
            Dyadic width = far.subtract(near);
            int common = Math.toIntExact(Math.min(0, Math.min(near.exponent(), width.exponent())));
            BigInteger divisor = (place > 0 ? BigInteger.TEN.pow(Math.toIntExact(place)) : BigInteger.ONE).shiftLeft(-common);
            BigInteger scale = place < 0 ? BigInteger.TEN.pow(Math.toIntExact(-place)) : BigInteger.ONE;
            BigInteger[] parts = integer(near, common).multiply(scale).divideAndRemainder(divisor);
            BigInteger whole = parts[0];
            if (whole.compareTo(top) >= 0) {
                exponent++;
            } else if (whole.compareTo(bottom) < 0) {
                exponent--;
            } else {
                BigInteger doubled = parts[1].shiftLeft(1);
                int half = doubled.compareTo(divisor);
                boolean up = half > 0 || half == 0 && whole.testBit(0);
                if (width.signum() != 0) {
                    BigInteger doubledFar = doubled.add(integer(width, common).multiply(scale).shiftLeft(1));
                    BigInteger limit = up ? divisor.multiply(BigInteger.valueOf(3)) : divisor;
                    boolean tie = half == 0;
                    if (tie || doubledFar.compareTo(limit) >= 0) {
                        return Optional.empty();
                    }
                }
                BigInteger rounded = up ? whole.add(BigInteger.ONE) : whole;
                boolean carry = rounded.equals(top);
                return Optional.of(new Decimal(carry ? bottom : rounded, carry ? exponent + 1 : exponent));
            }
        }
    }

    /** value 2^-lower for lower at most the exponent. */
    private static BigInteger integer(Dyadic value, int lower) {
        return value.mantissa().shiftLeft(Math.toIntExact(value.exponent() - lower));
    }

    static int certainDigits(Ball ball, int max) {
        if (ball.isExact()) {
            return max;
        }
        // two numbers closer than 10^-d relative can agree in at most d + 1 digits or so
        double guess = Math.max(0, ball.accuracyBits()) * LOG10_OF_2 + 2;
        for (int digits = (int) Math.min(max, guess); digits >= 1; digits--) {
            if (toDecimal(ball, digits).isPresent()) {
                return digits;
            }
        }
        return 0;
    }

    static String toString(Ball ball) {
        if (ball.isExact()) {
            return exactToString(ball);
        }
        int certain = certainDigits(ball, MOST_DIGITS);
        return certain >= FEW_DIGITS ? toDecimal(ball, certain).orElseThrow() : withRadius(ball);
    }

    private static String exactToString(Ball ball) {
        String text = toDecimal(ball, MOST_DIGITS).orElseThrow();
        if (!text.contains(".") || text.contains("e")) {
            return text;
        }
        BigDecimal stripped = new BigDecimal(text).stripTrailingZeros();
        return stripped.scale() < 0 ? stripped.setScale(0).toPlainString() : stripped.toPlainString();
    }

    /** Two digits of the radius, rounded up after adding what the midpoint lost in rounding: encloses the ball. */
    private static String withRadius(Ball ball) {
        Rational radius = ball.radius().toRational();
        Dyadic size = ball.radius().toDyadic();
        long place = nearest(size, size, 2).orElseThrow().exponent - 1;
        Rational unit = Rational.of(10).power(Math.toIntExact(place));
        BigInteger middle = ball.midpoint().divide(unit).add(Rational.HALF).floor();
        Rational lost = ball.midpoint().subtract(unit.multiply(Rational.of(middle))).abs();
        BigInteger error = radius.add(lost).divide(unit).ceiling();
        return decimal(middle, place) + "+-" + decimal(error, place);
    }

    private static String decimal(BigInteger units, long place) {
        BigDecimal value = new BigDecimal(units, Math.toIntExact(-place));
        return Math.abs(place) <= MOST_DIGITS ? value.toPlainString() : value.toString().replace('E', 'e');
    }
}
