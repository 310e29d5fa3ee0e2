package bubblechain.series;

import bubblechain.exact.Magnitude;
import bubblechain.exact.Rational;
import java.util.List;

/**
 * {@link bubblechain.exact.UnitHypergeometric} in fixed point. Its series is nested, with z = s + r v,
 *
 * <p>W(z) = (3/4) Y_0/((z-1/2) z), Y_n = 1 + (z+n)^2/(4 (z+n+1/2) (z+n+1)) Y_(n+1),
 *
 * <p>and worked out from the inside: every step makes earlier errors four times smaller, so that the innermost ones need few
 * digits. |Y_N| = |z+N| |sum of the rest| is at most 4/3 where Re z + N is positive.
 */
public final class FixedUnit3f2 {
    private static final int GUARD_BITS = 40;
    private static final Rational LARGEST_RATIO = Rational.HALF;
    /** Not below the coefficients of Y_N in v for |r| &lt;= 1/2, s + N &gt;= 1, by Cauchy's estimate on |r v| = 1/2. */
    private static final Magnitude REST = Magnitude.of(2);

    private FixedUnit3f2() {}

    /** True for the arguments {@link #of} takes: s in (0, 1] but not the pole 1/2, |r| at most 1/2. */
    public static boolean fits(Rational s, Rational r) {
        return s.signum() > 0 && s.compareTo(Rational.ONE) <= 0 && !s.equals(Rational.HALF)
                && r.abs().compareTo(LARGEST_RATIO) <= 0;
    }

    /** W(s + r v). */
    public static FixedSeries of(Rational s, Rational r, int length, int limbs) {
        int bits = FixedSeries.bits(limbs);
        int steps = bits / 2 + GUARD_BITS;
        FixedSeries y = FixedSeries.zero(length, 1).withError(REST);
        FixedSeries one = FixedSeries.one(length, 1);
        for (int n = steps - 1; n >= 0; n--) {
            int needed = Math.min(limbs, FixedSeries.limbsFor(Math.max(1, bits - 2 * n + GUARD_BITS)));
            y = y.extended(needed);
            one = one.extended(needed);
            Rational c = s.add(n);
            Rational first = c.add(Rational.HALF);
            Rational second = c.add(1);
            Rational weight = first.multiply(second).multiply(4).inverse();
            FixedSeries above = RationalSteps.times(y, List.of(
                    c.power(2).multiply(weight), c.multiply(r).multiply(2).multiply(weight), r.power(2).multiply(weight)));
            y = RationalSteps.over(above, product(r, first, second)).add(one);
        }
        Rational half = s.subtract(Rational.HALF);
        FixedSeries scaled = y.times(List.of(Rational.of(3, 4).divide(half.multiply(s))));
        // one after the other: of a product with roots on the unit circle the recurrence would lose digits in its bound
        FixedSeries quotient = RationalSteps.over(scaled, List.of(Rational.ONE, r.divide(half)));
        return RationalSteps.over(quotient, List.of(Rational.ONE, r.divide(s)));
    }

    /** (1 + r v/first) (1 + r v/second). */
    private static List<Rational> product(Rational r, Rational first, Rational second) {
        return RationalSteps.product(List.of(r.divide(first), r.divide(second)));
    }
}
