package bubblechain.analytic;

/**
 * Bounds in double precision: results that are not below (or, where named so, not above) the exact ones.
 *
 * <p>A sum, product, quotient or square root is the exact one rounded to nearest, off by at most a fraction 2^-53 or,
 * when it underflows, by 2^-1075. {@link StrictMath} promises log, exp, expm1, hypot, sin and cos within one unit in
 * the last place, at most a fraction 2^-52, and atan2 within two.
 */
final class Upward {
    /** Largest relative error of one rounding. */
    static final double UNIT = 0x1p-53;

    /** (1 + 2^-53)^16 is below this. */
    private static final double MANY_ROUNDINGS = 1 + 0x1p-48;
    /** More than two units in the last place, as a fraction. */
    private static final double ELEMENTARY = 0x1p-50;
    /** Squares of numbers between these neither overflow nor lose digits. */
    private static final double SMALLEST_SQUARED = 0x1p-460;

    private static final double LARGEST_SQUARED = 0x1p460;

    private Upward() {}

    /**
     * A bound of the exact value of an expression that came out as {@code value}: at most 16 roundings in sums,
     * products of two and quotients of non-negative numbers.
     */
    static double inflate(double value) {
        return value * MANY_ROUNDINGS + Double.MIN_NORMAL;
    }

    static double exp(double x) {
        return inflate(StrictMath.exp(x) * (1 + ELEMENTARY));
    }

    /** A bound of e^x - 1 for x >= 0. */
    static double expm1(double x) {
        return inflate(StrictMath.expm1(x) * (1 + ELEMENTARY));
    }

    /** A bound of ln x for x >= 0. */
    static double ln(double x) {
        double value = StrictMath.log(x);
        return Double.isInfinite(value) ? value : Math.nextUp(value + Math.abs(value) * ELEMENTARY);
    }

    /** A number not above ln x, x > 0. */
    static double lnBelow(double x) {
        double value = StrictMath.log(x);
        return Double.isInfinite(value) ? value : Math.nextDown(value - Math.abs(value) * ELEMENTARY);
    }

    /** |re + i im| to within a fraction 4 * 2^-53. */
    static double abs(double re, double im) {
        double largest = Math.max(Math.abs(re), Math.abs(im));
        return largest > SMALLEST_SQUARED && largest < LARGEST_SQUARED
                ? Math.sqrt(re * re + im * im)
                : StrictMath.hypot(re, im);
    }

    /** Whether the square of a modulus and its inverse stay far inside the range of doubles. */
    static boolean squaresSafely(double modulus) {
        return modulus > SMALLEST_SQUARED && modulus < LARGEST_SQUARED;
    }
}
