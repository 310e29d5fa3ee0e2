package bubblechain.exact;

import java.math.BigInteger;

/**
 * A non-negative upper bound {@code mantissa * 2^exponent}; every operation rounds up, so a bound stays a bound.
 *
 * <p>Zero, or a mantissa in [1/2, 1) with 53 bits. {@code equals} is equality of the bounds.
 *
 * @implNote a sum, product or quotient of doubles is rounded to nearest, so its next larger double is not below the
 *     exact result. Mantissas stay within 2^-62 .. 2^62 during an operation: no overflow, no underflow.
 */
public final class Magnitude implements Comparable<Magnitude> {
    public static final Magnitude ZERO = new Magnitude(0, 0);
    public static final Magnitude ONE = powerOfTwo(0);

    private static final int MANTISSA_BITS = 53;
    /** A summand smaller than 2^-60 of the other is below one unit in the last place of a mantissa in [1/2, 1). */
    private static final long NEGLIGIBLE = -60;

    private final double mantissa;
    private final long exponent;

    private Magnitude(double mantissa, long exponent) {
        this.mantissa = mantissa;
        this.exponent = exponent;
    }

    private static Magnitude normalised(double value, long exponent) {
        if (value == 0) {
            return ZERO;
        }
        int excess = Math.getExponent(value) + 1;
        return new Magnitude(Math.scalb(value, -excess), exponent + excess);
    }

    /** Exactly 2^k. */
    public static Magnitude powerOfTwo(long k) {
        return new Magnitude(0.5, k + 1);
    }

    /** A bound of |value|. */
    public static Magnitude of(long value) {
        return of(BigInteger.valueOf(value));
    }

    /** A bound of |value|; exact up to 53 bits. */
    public static Magnitude of(BigInteger value) {
        BigInteger size = value.abs();
        int excess = size.bitLength() - MANTISSA_BITS;
        if (excess <= 0) {
            return normalised(size.longValue(), 0);
        }
        long top = size.shiftRight(excess).longValue();
        // top + 1 <= 2^53 is still an exact double
        return normalised(size.getLowestSetBit() < excess ? top + 1 : top, excess);
    }

    /** A bound of |value|. */
    public static Magnitude ofRational(Rational value) {
        return of(value.numerator()).multiply(ofInverse(value.denominator(), 0));
    }

    /** A bound of 1/|mantissa 2^exponent|; the mantissa must not be zero. */
    static Magnitude ofInverse(BigInteger mantissa, long exponent) {
        BigInteger size = mantissa.abs();
        if (size.signum() == 0) {
            throw new PrecisionException("the inverse of zero has no bound");
        }
        int excess = Math.max(0, size.bitLength() - MANTISSA_BITS);
        double below = size.shiftRight(excess).longValue(); // cut down, hence its inverse is a bound
        return below == 1 && size.bitCount() == 1
                ? powerOfTwo(-exponent - excess)
                : normalised(Math.nextUp(1 / below), -exponent - excess);
    }

    public Magnitude add(Magnitude other) {
        if (isZero() || other.isZero()) {
            return isZero() ? other : this;
        }
        Magnitude large = exponent >= other.exponent ? this : other;
        Magnitude small = large == this ? other : this;
        long gap = small.exponent - large.exponent;
        double sum = gap < NEGLIGIBLE ? large.mantissa : large.mantissa + Math.scalb(small.mantissa, (int) gap);
        return normalised(Math.nextUp(sum), large.exponent);
    }

    public Magnitude multiply(Magnitude other) {
        if (isZero() || other.isZero()) {
            return ZERO;
        }
        if (mantissa == 0.5 || other.mantissa == 0.5) { // a power of two: exact
            return normalised(mantissa * other.mantissa, exponent + other.exponent);
        }
        return normalised(Math.nextUp(mantissa * other.mantissa), exponent + other.exponent);
    }

    /** This times 2^k, exactly. */
    public Magnitude scale(long k) {
        return isZero() ? this : new Magnitude(mantissa, exponent + k);
    }

    public Magnitude max(Magnitude other) {
        return compareTo(other) >= 0 ? this : other;
    }

    public Magnitude min(Magnitude other) {
        return compareTo(other) <= 0 ? this : other;
    }

    public boolean isZero() {
        return mantissa == 0;
    }

    /** The k with 2^(k-1) <= this < 2^k; zero for the zero bound. */
    public long exponent() {
        return exponent;
    }

    /** The mantissa in [1/2, 1), or zero. */
    double mantissa() {
        return mantissa;
    }

    /** The bound as an exact number. */
    Dyadic toDyadic() {
        return new Dyadic(BigInteger.valueOf((long) Math.scalb(mantissa, MANTISSA_BITS)), exponent - MANTISSA_BITS);
    }

    /** The bound as an exact rational. */
    public Rational toRational() {
        return toDyadic().toRational();
    }

    /** A double not below this bound; infinity if there is no finite one. */
    public double toDouble() {
        if (isZero()) {
            return 0;
        }
        if (exponent > Double.MAX_EXPONENT + 1) {
            return Double.POSITIVE_INFINITY;
        }
        if (exponent >= Double.MIN_EXPONENT + 1) {
            return Math.scalb(mantissa, (int) exponent); // normal: exact
        }
        return Math.nextUp(Math.scalb(mantissa, (int) Math.max(exponent, -2000)));
    }

    @Override
    public int compareTo(Magnitude other) {
        if (isZero() || other.isZero()) {
            return Double.compare(mantissa, other.mantissa);
        }
        int byExponent = Long.compare(exponent, other.exponent);
        return byExponent != 0 ? byExponent : Double.compare(mantissa, other.mantissa);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Magnitude m && compareTo(m) == 0;
    }

    @Override
    public int hashCode() {
        return Double.hashCode(mantissa) * 31 + Long.hashCode(exponent);
    }

    /** The mantissa and the exponent, as "0.75*2^-12". */
    @Override
    public String toString() {
        return isZero() ? "0" : mantissa + "*2^" + exponent;
    }
}
