package bubblechain.analytic;

import bubblechain.analytic.TermKey.UnitFactor;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.exact.UnitHypergeometric;
import bubblechain.exact.UnitRecurrence;
import bubblechain.series.SeriesAlgebra;
import java.util.ArrayList;
import java.util.List;

/**
 * {@link UnitHypergeometric} and its derivatives about a point: their Taylor series where the argument lies in [1, 2),
 * carried to other places by the recurrence, whose poles are exact. Of the numbers in the Taylor series a pole part
 * involves those only that it really contains.
 */
final class UnitFunctions {
    private static final int LARGEST_DISTANCE = 200;

    private UnitFunctions() {}

    /** The order of the pole of W^(n)(shift + slope u) at a point, 0 if there is none. */
    static int poleOrder(UnitFactor factor, Rational point) {
        return UnitHypergeometric.isPole(argument(factor, point)) ? factor.n() + 1 : 0;
    }

    static boolean poleAtZero(TermKey key) {
        return key.units().keySet().stream().anyMatch(w -> poleOrder(w, Rational.ZERO) > 0);
    }

    private static Rational argument(UnitFactor factor, Rational point) {
        return factor.shift().add(factor.slope().multiply(point));
    }

    /** The distance from u = 0 to the nearest other pole, at arguments 1/2 - j and -j. */
    static Rational distance(UnitFactor factor) {
        Rational nearest = factor.shift();
        Rational toHalf = factor.shift().subtract(Rational.HALF).abs();
        if (!toHalf.isZero() && toHalf.compareTo(nearest) < 0) {
            nearest = toHalf;
        }
        return nearest.divide(factor.slope()).abs();
    }

    /** The expansion of a factor in x = u - point. */
    static <S> S about(Rational point, UnitFactor factor, SeriesAlgebra<S> algebra) {
        return at(factor.n(), argument(factor, point), factor.slope(), algebra);
    }

    /** W^(n)(z + slope x). */
    static <S> S at(int n, Rational z, Rational slope, SeriesAlgebra<S> algebra) {
        Rational anchor = UnitHypergeometric.anchor(z);
        List<S> values = new ArrayList<>();
        for (int k = 0; k <= n; k++) {
            values.add(algebra.unit3f2Tail(k, anchor, slope));
        }
        Rational distance = z.subtract(anchor);
        if (distance.abs().compareTo(Rational.of(LARGEST_DISTANCE)) > 0) {
            throw new DomainException("an argument of " + z + " of unit_3f2 is further than "
                    + LARGEST_DISTANCE + " from 1");
        }
        return new UnitRecurrence<S>(
                        algebra::add, algebra::multiply, q -> algebra.constant(ExactConstant.of(q)),
                        (c, power) -> algebra.power(
                                algebra.linear(ExactConstant.of(c), ExactConstant.of(slope)), -power))
                .from(values, anchor, distance.intValueExact())
                .get(n);
    }
}
