package bubblechain.exact;

import java.math.BigInteger;

/**
 * The exact number {@code mantissa * 2^exponent}; the ends of a {@link Ball}. Components are not normalised: compare
 * values with {@link #compareTo}.
 */
record Dyadic(BigInteger mantissa, long exponent) implements Comparable<Dyadic> {
    static final Dyadic ZERO = new Dyadic(BigInteger.ZERO, 0);
    /** Largest distance of exponents that is aligned exactly; more would be a number of tens of megabytes. */
    private static final long LARGEST_SHIFT = 1L << 28;

    Dyadic add(Dyadic other) {
        if (signum() == 0 || other.signum() == 0) {
            return signum() == 0 ? other : this;
        }
        long lower = Math.min(exponent, other.exponent);
        return new Dyadic(aligned(lower).add(other.aligned(lower)), lower);
    }

    private BigInteger aligned(long lower) {
        if (exponent - lower > LARGEST_SHIFT) {
            throw new PrecisionException("numbers of sizes 2^" + exponent + " and 2^" + lower
                    + " are too far apart for an exact sum; use a smaller range");
        }
        return mantissa.shiftLeft((int) (exponent - lower));
    }

    Dyadic subtract(Dyadic other) {
        return add(other.negate());
    }

    Dyadic negate() {
        return new Dyadic(mantissa.negate(), exponent);
    }

    Dyadic abs() {
        return signum() < 0 ? negate() : this;
    }

    Dyadic multiply(BigInteger factor) {
        return new Dyadic(mantissa.multiply(factor), exponent);
    }

    Dyadic shift(long k) {
        return new Dyadic(mantissa, exponent + k);
    }

    int signum() {
        return mantissa.signum();
    }

    /** The k with 2^(k-1) <= |value| < 2^k. */
    long top() {
        return mantissa.abs().bitLength() + exponent;
    }

    /** The largest integer not above. */
    BigInteger floor() {
        return exponent >= 0 ? aligned(0) : mantissa.shiftRight((int) Math.min(-exponent, Integer.MAX_VALUE));
    }

    Magnitude upperBound() {
        return Magnitude.of(mantissa).scale(exponent);
    }

    Rational toRational() {
        if (signum() == 0) {
            return Rational.ZERO;
        }
        int zeros = mantissa.getLowestSetBit();
        BigInteger odd = mantissa.shiftRight(zeros);
        int power = Math.toIntExact(exponent + zeros);
        return power >= 0 ? Rational.of(odd.shiftLeft(power)) : Rational.of(odd, BigInteger.ONE.shiftLeft(-power));
    }

    @Override
    public int compareTo(Dyadic other) {
        if (signum() != other.signum() || signum() == 0) {
            return Integer.compare(signum(), other.signum());
        }
        if (top() != other.top()) {
            return top() > other.top() ? signum() : -signum();
        }
        return subtract(other).signum();
    }
}
