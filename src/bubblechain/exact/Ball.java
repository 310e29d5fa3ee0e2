package bubblechain.exact;

import java.math.BigInteger;
import java.util.Optional;

/**
 * A midpoint and a radius: the set of real numbers x with |x - midpoint| <= radius.
 *
 * <p>Inclusion: an operation on balls returns a ball that holds the result for every choice of points in its
 * arguments. The midpoint is {@code mantissa * 2^exponent}, exact; {@code bits} is the length to which it is rounded,
 * and what rounding cuts off is added to the radius. A midpoint keeps about {@value #SPARE_BITS} bits below the radius.
 * A ball of radius zero is an exact number. {@code equals} is equality of midpoint and radius, not of the numbers meant.
 *
 * <p>Radii bound rounding and truncation only, whatever the formula evaluated leaves out.
 */
public final class Ball {
    public static final Ball ZERO = new Ball(BigInteger.ZERO, 0, Magnitude.ZERO);
    public static final Ball ONE = of(1);

    private static final int SPARE_BITS = 30;
    private static final long LARGEST_EXPONENT = 1L << 30;

    private final BigInteger mantissa;
    private final int exponent;
    private final Magnitude radius;

    private Ball(BigInteger mantissa, long exponent, Magnitude radius) {
        if (Math.abs(exponent) > LARGEST_EXPONENT) {
            throw new PrecisionException("a number near 2^" + exponent + " is outside the range of balls, 2^(+-2^30)");
        }
        this.mantissa = mantissa;
        this.exponent = mantissa.signum() == 0 ? 0 : (int) exponent;
        this.radius = radius;
    }

    public static Ball of(long value) {
        return of(BigInteger.valueOf(value));
    }

    /** The exact integer, however long. */
    public static Ball of(BigInteger value) {
        return new Ball(value, 0, Magnitude.ZERO);
    }

    /** The rational, rounded to {@code bits} significant bits; exact if it is a short enough dyadic number. */
    public static Ball of(Rational value, int bits) {
        return of(value.numerator()).divide(of(value.denominator()), bits);
    }

    /** Exactly mantissa * 2^exponent. */
    public static Ball ofDyadic(BigInteger mantissa, int exponent) {
        return new Ball(mantissa, exponent, Magnitude.ZERO);
    }

    static Ball ofDyadic(Dyadic value) {
        return new Ball(value.mantissa(), value.exponent(), Magnitude.ZERO);
    }

    /** Fixed-point result of an algorithm: value * 2^-scale with an error of at most {@code units} of 2^-scale. */
    static Ball ofFixed(BigInteger value, int scale, long units) {
        return new Ball(value, -(long) scale, Magnitude.of(units).scale(-(long) scale));
    }

    /**
     * The ball around a midpoint with the absolute value of {@code radius}, the midpoint rounded to {@code bits}.
     */
    public static Ball of(Rational midpoint, Rational radius, int bits) {
        return of(midpoint, bits).addError(Magnitude.ofRational(radius)).round(bits);
    }

    /**
     * Reads "1.23" or "-3/4" (exact up to rounding at {@code bits}), "1.23+-0.05" (also "1.23 +/- 0.05"), or
     * "3567.60(164)": an uncertainty in units of the last digit printed, here 1.64; "1.23(5)e-4" is allowed.
     *
     * @throws DomainException if the text is none of these
     */
    public static Ball parse(String text, int bits) {
        return BallText.parse(text, bits);
    }

    /** Rounds the midpoint to {@code bits} significant bits, fewer where the radius makes them meaningless. */
    public Ball round(int bits) {
        return rounded(mantissa, exponent, radius, bits);
    }

    private static Ball rounded(BigInteger mantissa, long exponent, Magnitude radius, int bits) {
        if (bits < 2) {
            throw new DomainException("a working precision of " + bits + " bits is too small; use at least 2");
        }
        int length = mantissa.abs().bitLength();
        long drop = Math.max(0, length - bits);
        if (!radius.isZero()) {
            drop = Math.max(drop, radius.exponent() - SPARE_BITS - exponent);
        }
        if (drop == 0 || mantissa.signum() == 0) {
            return new Ball(mantissa, exponent, radius);
        }
        if (drop > length) { // less than half a unit of the dropped size: the midpoint becomes zero
            return new Ball(BigInteger.ZERO, 0, radius.add(Magnitude.of(mantissa).scale(exponent)));
        }
        int places = (int) drop;
        if (mantissa.getLowestSetBit() >= places) {
            return new Ball(mantissa.shiftRight(places), exponent + places, radius);
        }
        // round to nearest: off by at most half a unit
        BigInteger nearest = mantissa.shiftRight(places - 1).add(BigInteger.ONE).shiftRight(1);
        return new Ball(nearest, exponent + places, radius.add(Magnitude.powerOfTwo(exponent + places - 1)));
    }

    public Ball add(Ball other, int bits) {
        Magnitude error = radius.add(other.radius);
        Dyadic a = mid();
        Dyadic b = other.mid();
        long gap = a.top() - b.top();
        if (a.signum() != 0 && b.signum() != 0 && Math.abs(gap) > 64L + bits) {
            // the smaller midpoint is far below the rounding of the larger one: keep it as an error
            Dyadic large = gap > 0 ? a : b;
            Dyadic small = gap > 0 ? b : a;
            return rounded(large.mantissa(), large.exponent(), error.add(small.upperBound()), bits);
        }
        Dyadic sum = a.add(b);
        return rounded(sum.mantissa(), sum.exponent(), error, bits);
    }

    public Ball add(Rational other, int bits) {
        // (m q + p)/q, the numerator exact: cancellation costs nothing
        Dyadic numerator = mid().multiply(other.denominator()).add(new Dyadic(other.numerator(), 0));
        return ofDyadic(numerator).divide(of(other.denominator()), bits).addError(radius).round(bits);
    }

    public Ball subtract(Ball other, int bits) {
        return add(other.negate(), bits);
    }

    public Ball multiply(Ball other, int bits) {
        // (a + x)(b + y) - ab = a y + b x + x y with |x| <= r, |y| <= s: at most |a| s + (|b| + s) r
        Magnitude error = mid().upperBound().multiply(other.radius).add(other.upperBound().multiply(radius));
        return rounded(mantissa.multiply(other.mantissa), (long) exponent + other.exponent, error, bits);
    }

    public Ball multiply(Rational other, int bits) {
        BigInteger numerator = other.numerator();
        Ball scaled = new Ball(mantissa.multiply(numerator), exponent, radius.multiply(Magnitude.of(numerator)));
        return other.isInteger() ? scaled.round(bits) : scaled.divide(of(other.denominator()), bits);
    }

    /** @throws PrecisionException if the divisor contains zero */
    public Ball divide(Ball other, int bits) {
        if (other.containsZero()) {
            throw new PrecisionException("division by a ball that contains zero, " + other
                    + "; raise the precision, or treat the zero exactly");
        }
        // x/y - a/b = ((x - a) b - a (y - b)) / (y b), at most r/|y| + |a| s/(|b| |y|), |y| >= |b| - s
        Magnitude inverse = other.inverseUpperBound();
        Magnitude error = radius.multiply(inverse);
        if (!other.isExact()) {
            Magnitude ratio = mid().upperBound().multiply(Magnitude.ofInverse(other.mantissa, other.exponent));
            error = error.add(ratio.multiply(other.radius).multiply(inverse));
        }
        // digits far below the radius of the quotient are not worth computing
        long known = Math.min(accuracyBits(), other.accuracyBits());
        int length = (int) Math.min(bits, Math.max(0, known) + SPARE_BITS + 2);
        return quotient(other, error, length).round(bits);
    }

    /** The quotient of the midpoints to {@code length} bits, with its truncation error added to {@code error}. */
    private Ball quotient(Ball other, Magnitude error, int length) {
        int shift = Math.max(0, length + 2 + other.mantissa.bitLength() - mantissa.bitLength());
        BigInteger[] parts = mantissa.shiftLeft(shift).divideAndRemainder(other.mantissa);
        long scale = (long) exponent - other.exponent - shift;
        // division cuts towards zero: off by less than one unit
        Magnitude total = parts[1].signum() == 0 ? error : error.add(Magnitude.powerOfTwo(scale));
        int zeros = Math.max(0, parts[0].getLowestSetBit()); // an exact quotient is kept short
        return new Ball(parts[0].shiftRight(zeros), scale + zeros, total);
    }

    /** @throws ArithmeticException if the divisor is zero */
    public Ball divide(Rational other, int bits) {
        return multiply(other.inverse(), bits);
    }

    /** @throws PrecisionException if this contains zero */
    public Ball inverse(int bits) {
        return ONE.divide(this, bits);
    }

    /** @throws PrecisionException if the exponent is negative and this contains zero */
    public Ball power(int n, int bits) {
        int working = bits + 2 * (32 - Integer.numberOfLeadingZeros(Math.abs(n))) + 4;
        Ball base = n < 0 ? inverse(working) : this; // inverted first: a power of a wide ball may reach zero
        Ball result = ONE;
        for (int bit = 31 - Integer.numberOfLeadingZeros(Math.abs(n)); bit >= 0; bit--) {
            result = result.multiply(result, working);
            if ((Math.abs(n) >> bit & 1) == 1) {
                result = result.multiply(base, working);
            }
        }
        return result.round(bits);
    }

    public Ball negate() {
        return new Ball(mantissa.negate(), exponent, radius);
    }

    /** Encloses |x|: | |x| - |m| | <= |x - m|. */
    public Ball abs() {
        return mantissa.signum() < 0 ? negate() : this;
    }

    /** This times 2^k, exactly. */
    public Ball shift(int k) {
        return new Ball(mantissa, (long) exponent + k, radius.scale(k));
    }

    /** The same midpoint, the radius larger by {@code error}. */
    public Ball addError(Magnitude error) {
        return new Ball(mantissa, exponent, radius.add(error));
    }

    /** The midpoint alone, as an exact ball. */
    public Ball center() {
        return new Ball(mantissa, exponent, Magnitude.ZERO);
    }

    /** The smallest interval that holds both, as a ball. */
    public Ball union(Ball other) {
        Dyadic low = low().compareTo(other.low()) <= 0 ? low() : other.low();
        Dyadic high = high().compareTo(other.high()) >= 0 ? high() : other.high();
        Dyadic middle = low.add(high).shift(-1);
        Magnitude half = high.subtract(low).shift(-1).upperBound();
        return rounded(middle.mantissa(), middle.exponent(), half, Integer.MAX_VALUE);
    }

    public boolean isExact() {
        return radius.isZero();
    }

    /** Whether this is the number zero, exactly. */
    public boolean isZero() {
        return mantissa.signum() == 0 && radius.isZero();
    }

    public boolean containsZero() {
        return mid().abs().compareTo(radius.toDyadic()) <= 0;
    }

    /** Whether every point is above zero. */
    public boolean isPositive() {
        return mantissa.signum() > 0 && !containsZero();
    }

    /** Whether every point is below zero. */
    public boolean isNegative() {
        return mantissa.signum() < 0 && !containsZero();
    }

    public boolean contains(Rational x) {
        // |m - p/q| <= r  <=>  |m q - p| <= r q
        Dyadic distance = mid().multiply(x.denominator()).subtract(new Dyadic(x.numerator(), 0)).abs();
        return distance.compareTo(radius.toDyadic().multiply(x.denominator())) <= 0;
    }

    public boolean contains(Ball other) {
        return low().compareTo(other.low()) <= 0 && high().compareTo(other.high()) >= 0;
    }

    public boolean overlaps(Ball other) {
        return low().compareTo(other.high()) <= 0 && high().compareTo(other.low()) >= 0;
    }

    Dyadic mid() {
        return new Dyadic(mantissa, exponent);
    }

    Dyadic low() {
        return mid().subtract(radius.toDyadic());
    }

    Dyadic high() {
        return mid().add(radius.toDyadic());
    }

    /** Exact. */
    public Rational midpoint() {
        return mid().toRational();
    }

    /** The largest integer not above midpoint 2^bits; the radius is not part of it. */
    public BigInteger scaledMidpoint(int bits) {
        return mantissa.shiftLeft(exponent + bits);
    }

    /** The lower end, exact. */
    public Rational lower() {
        return low().toRational();
    }

    /** The upper end, exact. */
    public Rational upper() {
        return high().toRational();
    }

    public Magnitude radius() {
        return radius;
    }

    /** A bound of |x| for every point x. */
    public Magnitude upperBound() {
        return mid().upperBound().add(radius);
    }

    /** A bound of 1/|x| for every point x of a ball without zero. */
    Magnitude inverseUpperBound() {
        Dyadic least = mid().abs().subtract(radius.toDyadic());
        return Magnitude.ofInverse(least.mantissa(), least.exponent());
    }

    /** The integer below midpoint * 2^scale, less than one away from it. */
    BigInteger fixed(int scale) {
        return mid().shift(scale).floor();
    }

    /** A double near the midpoint (a few units in the last place); not certified. */
    public double toDouble() {
        int excess = mantissa.bitLength() - 62;
        double top = (excess > 0 ? mantissa.shiftRight(excess) : mantissa).doubleValue();
        return Math.scalb(top, (int) Math.max(-5000, Math.min(5000, (long) exponent + Math.max(0, excess))));
    }

    /** A double not below the radius. */
    public double radiusAsDouble() {
        return radius.toDouble();
    }

    /**
     * floor(log2(|midpoint|/radius)): {@link Integer#MAX_VALUE} if exact, at most 0 if zero is contained, -1 if the
     * midpoint is zero and the radius is not.
     */
    public int accuracyBits() {
        if (radius.isZero() || mantissa.signum() == 0) {
            return radius.isZero() ? Integer.MAX_VALUE : -1;
        }
        Dyadic bound = radius.toDyadic();
        long difference = mid().top() - bound.top();
        boolean above = mid().abs().shift(-difference).compareTo(bound) >= 0;
        return (int) Math.max(-Integer.MAX_VALUE, Math.min(Integer.MAX_VALUE - 1, above ? difference : difference - 1));
    }

    /**
     * The value with {@code digits} significant decimal digits, if both ends of the ball round to the same decimal
     * (ties to even; an exact ball always does).
     *
     * <p>With e the decimal exponent: plain notation "123.4500", "0.00012" if -6 <= e < digits, otherwise
     * "1.2345e+27", so that no zero is printed that is not a digit of the value. Exact zero is "0".
     */
    public Optional<String> toDecimal(int digits) {
        return BallText.toDecimal(this, digits);
    }

    /** The largest d up to {@code max} for which {@link #toDecimal} has a result; 0 if there is none. */
    public int certainDigits(int max) {
        return BallText.certainDigits(this, max);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Ball b && mid().compareTo(b.mid()) == 0 && radius.equals(b.radius);
    }

    @Override
    public int hashCode() {
        return Long.hashCode(mid().top()) * 31 + radius.hashCode();
    }

    /** The certain digits, at most 20; the form "1.23+-0.05", which encloses the ball, if fewer than four are certain. */
    @Override
    public String toString() {
        return BallText.toString(this);
    }
}
