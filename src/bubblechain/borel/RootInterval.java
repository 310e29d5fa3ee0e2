package bubblechain.borel;

import bubblechain.analytic.AlgebraicPole;
import bubblechain.analytic.Polynomial;
import bubblechain.exact.Ball;
import bubblechain.exact.Rational;
import bubblechain.report.CertainDigits;
import bubblechain.report.Value;

/**
 * The place of an irrational pole, narrowed from its isolating interval.
 *
 * @param lower below the root
 * @param upper above the root
 */
record RootInterval(Rational lower, Rational upper) {
    private static final double BITS_PER_DIGIT = 3.33;
    private static final int GUARD_BITS = 64;

    /** An interval that gives the root to this many digits. */
    static RootInterval of(AlgebraicPole pole, int digits) {
        Polynomial polynomial = pole.polynomial();
        Rational lower = pole.lower();
        Rational upper = pole.upper();
        int sign = polynomial.valueAt(lower).signum();
        int steps = (int) (digits * BITS_PER_DIGIT) + GUARD_BITS;
        for (int k = 0; k < steps; k++) {
            Rational middle = lower.add(upper).divide(2);
            if (polynomial.valueAt(middle).signum() == sign) {
                lower = middle;
            } else {
                upper = middle;
            }
        }
        return new RootInterval(lower, upper);
    }

    /** The root with at most this many digits, all certain. */
    Value decimal(int digits) {
        Rational half = upper.subtract(lower).divide(2);
        int bits = (int) (digits * BITS_PER_DIGIT) + GUARD_BITS;
        return CertainDigits.of(Ball.of(lower.add(half), half, bits), digits);
    }

    /** The distance from the origin. */
    double distance() {
        return Math.abs(lower.add(upper).divide(2).toDouble());
    }
}
