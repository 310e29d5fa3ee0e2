package bubblechain.analytic;

import bubblechain.exact.Ball;
import bubblechain.exact.Rational;

/** A disc times 2^exponent, so that products of many gamma functions neither overflow nor underflow. */
record ScaledDisc(ComplexDisc mantissa, long exponent) {
    static final ScaledDisc ZERO = new ScaledDisc(ComplexDisc.ZERO, 0);
    static final ScaledDisc ONE = new ScaledDisc(ComplexDisc.ONE, 0);
    static final ScaledDisc WHOLE = new ScaledDisc(ComplexDisc.WHOLE, 0);

    private static final double LN2 = StrictMath.log(2);
    /** Mantissas are kept between 2^-this and 2^this. */
    private static final int SPREAD = 100;
    /** Shifting by more than this turns every mantissa into zero. */
    private static final int LARGEST_SHIFT = 2_400;

    private static final double LARGEST_EXPONENT = 1e12;

    static ScaledDisc of(ComplexDisc value) {
        return normalised(value, 0);
    }

    static ScaledDisc of(Rational value) {
        int scale = value.numerator().bitLength() - value.denominator().bitLength();
        return new ScaledDisc(ComplexDisc.of(value.multiply(Rational.TWO.power(-scale))), scale);
    }

    static ScaledDisc of(Ball value) {
        Rational midpoint = value.midpoint();
        int scale = midpoint.numerator().bitLength() - midpoint.denominator().bitLength();
        ComplexDisc mantissa = ComplexDisc.of(midpoint.multiply(Rational.TWO.power(-scale)));
        return new ScaledDisc(mantissa.widened(value.radius().scale(-scale).toDouble()), scale);
    }

    /** e^w. */
    static ScaledDisc exp(ComplexDisc w) {
        if (w.isWhole() || Math.abs(w.re()) > LARGEST_EXPONENT) {
            return WHOLE;
        }
        double k = Math.rint(w.re() / LN2);
        double rest = w.re() - k * LN2;
        // k LN2 is off by |k| (2^-53 + |LN2 - ln 2|), the difference by 2^-53 of its size, below 1
        double radius = Upward.inflate(w.radius() + Upward.UNIT * (4 * Math.abs(k) + 1));
        double size = StrictMath.exp(rest);
        double bound = size * (1 + 16 * Upward.UNIT);
        // |e^w - e^c| <= |e^c| (e^|w - c| - 1); exp 2, sine and cosine 2, product 1 unit per component
        ComplexDisc mantissa = new ComplexDisc(
                size * StrictMath.cos(w.im()),
                size * StrictMath.sin(w.im()),
                Upward.inflate(bound * Upward.expm1(radius) + 16 * Upward.UNIT * size));
        return normalised(mantissa, (long) k);
    }

    private static ScaledDisc normalised(ComplexDisc disc, long exponent) {
        double size = Math.max(Math.max(Math.abs(disc.re()), Math.abs(disc.im())), disc.radius());
        int excess = Math.getExponent(size);
        if (Math.abs(excess) <= SPREAD || size == 0 || disc.isWhole()) {
            return new ScaledDisc(disc, exponent);
        }
        return new ScaledDisc(shifted(disc, -excess), exponent + excess);
    }

    /** The disc times 2^k; what underflows is below the number that widening always adds. */
    private static ComplexDisc shifted(ComplexDisc disc, long k) {
        int shift = (int) Math.max(-LARGEST_SHIFT, Math.min(LARGEST_SHIFT, k));
        double radius = Math.scalb(disc.radius(), shift);
        return new ComplexDisc(Math.scalb(disc.re(), shift), Math.scalb(disc.im(), shift), radius).widened(0);
    }

    private boolean isZero() {
        return mantissa.re() == 0 && mantissa.im() == 0 && mantissa.radius() == 0;
    }

    boolean isWhole() {
        return mantissa.isWhole();
    }

    ScaledDisc add(ScaledDisc other) {
        if (isZero() || other.isZero()) {
            return isZero() ? other : this;
        }
        if (exponent < other.exponent) {
            return other.add(this);
        }
        return normalised(mantissa.add(shifted(other.mantissa, other.exponent - exponent)), exponent);
    }

    ScaledDisc negate() {
        return new ScaledDisc(mantissa.negate(), exponent);
    }

    ScaledDisc multiply(ScaledDisc other) {
        return normalised(mantissa.multiply(other.mantissa), exponent + other.exponent);
    }

    ScaledDisc multiply(ComplexDisc other) {
        return multiply(of(other));
    }

    ScaledDisc inverse() {
        return normalised(mantissa.inverse(), -exponent);
    }

    /** Any integer power. */
    ScaledDisc power(int n) {
        ScaledDisc result = ONE;
        for (int bit = 31 - Integer.numberOfLeadingZeros(Math.abs(n)); bit >= 0; bit--) {
            result = result.multiply(result);
            if ((Math.abs(n) >> bit & 1) == 1) {
                result = result.multiply(this);
            }
        }
        return n < 0 ? result.inverse() : result;
    }

    /** The disc without its scale; small values may come out as a disc about zero. */
    ComplexDisc unscaled() {
        return exponent == 0 ? mantissa : shifted(mantissa, exponent);
    }

    /** An upper bound of ln |w|; infinite for the whole plane, minus infinity for exact zero. */
    double lnLargest() {
        if (isZero()) {
            return Double.NEGATIVE_INFINITY;
        }
        double first = Upward.ln(mantissa.largest());
        double second = exponent * LN2;
        return Math.nextUp(first + second + 8 * Upward.UNIT * (Math.abs(first) + Math.abs(second)));
    }

    /** ln |centre|, not a bound. */
    double lnCenter() {
        return Math.log(Upward.abs(mantissa.re(), mantissa.im())) + exponent * LN2;
    }
}
