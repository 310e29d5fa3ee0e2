package bubblechain.analytic;

import bubblechain.exact.Ball;
import bubblechain.exact.Rational;

/**
 * The complex numbers w with |w - (re + i im)| <= radius, in double precision. An operation returns a disc that holds
 * the result for every choice of points; what rounding did to the centre is added to the radius.
 *
 * <p>An operation that is not defined for all points, or whose result is out of range, returns {@link #WHOLE}.
 */
record ComplexDisc(double re, double im, double radius) {
    static final ComplexDisc ZERO = new ComplexDisc(0, 0, 0);
    static final ComplexDisc ONE = new ComplexDisc(1, 0, 0);
    /** The whole plane: nothing is known. */
    static final ComplexDisc WHOLE = new ComplexDisc(0, 0, Double.POSITIVE_INFINITY);

    private static final int DOUBLE_BITS = 53;
    private static final int LARGEST_EXACT_EXPONENT = 900;

    ComplexDisc {
        if (!Double.isFinite(re) || !Double.isFinite(im) || !(radius < Double.POSITIVE_INFINITY)) {
            re = 0;
            im = 0;
            radius = Double.POSITIVE_INFINITY;
        }
    }

    static ComplexDisc of(double re, double im) {
        return new ComplexDisc(re, im, 0);
    }

    /** The rational; radius zero if it is a double. */
    static ComplexDisc of(Rational value) {
        double nearest = value.toDouble();
        boolean exact = value.numerator().bitLength() <= DOUBLE_BITS
                && value.denominator().bitCount() == 1
                && value.denominator().bitLength() < LARGEST_EXACT_EXPONENT;
        // toDouble keeps 62 bits before it rounds: off by less than a fraction 2^-52
        return new ComplexDisc(nearest, 0, exact ? 0 : Upward.inflate(Math.abs(nearest) * 2 * Upward.UNIT));
    }

    static ComplexDisc of(Ball value) {
        return of(value.midpoint()).widened(value.radiusAsDouble());
    }

    boolean isWhole() {
        return radius == Double.POSITIVE_INFINITY;
    }

    /** The centre as a point. */
    ComplexDisc center() {
        return isWhole() ? this : of(re, im);
    }

    /** The same centre, the radius larger by {@code error}. */
    ComplexDisc widened(double error) {
        return new ComplexDisc(re, im, Upward.inflate(radius + error));
    }

    /** An upper bound of |w|. */
    double largest() {
        return Upward.inflate(Upward.abs(re, im) + radius);
    }

    /** A lower bound of |w|, zero or more. */
    double smallest() {
        return Math.max(0, Math.nextDown(modulusBelow() - radius));
    }

    private double modulusBelow() {
        return Upward.abs(re, im) * (1 - 8 * Upward.UNIT);
    }

    ComplexDisc negate() {
        return new ComplexDisc(-re, -im, radius);
    }

    /** i times this. */
    ComplexDisc timesI() {
        return new ComplexDisc(-im, re, radius);
    }

    ComplexDisc add(ComplexDisc other) {
        double x = re + other.re;
        double y = im + other.im;
        return new ComplexDisc(
                x, y, Upward.inflate(radius + other.radius + (Math.abs(x) + Math.abs(y)) * Upward.UNIT));
    }

    ComplexDisc add(double real) {
        double x = re + real;
        return new ComplexDisc(x, im, Upward.inflate(radius + Math.abs(x) * Upward.UNIT));
    }

    ComplexDisc subtract(ComplexDisc other) {
        return add(other.negate());
    }

    ComplexDisc multiply(ComplexDisc other) {
        double x = re * other.re - im * other.im;
        double y = re * other.im + im * other.re;
        // each component: two products and a sum of them, at most 2 roundings on each product
        double size = (Math.abs(re) + Math.abs(im)) * (Math.abs(other.re) + Math.abs(other.im));
        double spread = Upward.inflate(Upward.abs(re, im)) * other.radius
                + Upward.inflate(Upward.abs(other.re, other.im)) * radius
                + radius * other.radius;
        return new ComplexDisc(x, y, Upward.inflate(spread + 4 * Upward.UNIT * size));
    }

    ComplexDisc multiply(double real) {
        double x = re * real;
        double y = im * real;
        double error = (Math.abs(x) + Math.abs(y)) * Upward.UNIT;
        return new ComplexDisc(x, y, Upward.inflate(radius * Math.abs(real) + error));
    }

    /** 1/w; the whole plane if zero is in the disc. */
    ComplexDisc inverse() {
        double modulus = modulusBelow();
        double gap = Math.nextDown(modulus - radius);
        if (!(gap > 0)) {
            return WHOLE;
        }
        if (!Upward.squaresSafely(modulus)) {
            return new ComplexDisc(0, 0, Upward.inflate(1 / gap));
        }
        double norm = re * re + im * im;
        // |1/w - 1/c| <= radius/(|c| |w|); components of 1/c have at most 4 roundings
        return new ComplexDisc(
                re / norm, -im / norm, Upward.inflate(radius / modulus / gap + 8 * Upward.UNIT / modulus));
    }

    /** The logarithm, on the branch that is principal at the centre; the whole plane if zero is in the disc. */
    ComplexDisc ln() {
        double gap = Math.nextDown(modulusBelow() - radius);
        if (!(gap > 0)) {
            return WHOLE;
        }
        double x = StrictMath.log(Upward.abs(re, im));
        double y = StrictMath.atan2(im, re);
        // |ln(w/c)| <= -ln(1 - radius/|c|) <= radius/(|c| - radius); modulus off by 4, log by 2, atan2 by 4 units
        return new ComplexDisc(
                x, y, Upward.inflate(radius / gap + 8 * Upward.UNIT * (1 + Math.abs(x) + Math.abs(y))));
    }
}
