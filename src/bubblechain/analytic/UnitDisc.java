package bubblechain.analytic;

import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;

/**
 * A derivative W^(n) of {@link bubblechain.exact.UnitHypergeometric} over discs: its series summed as polynomials of degree n in
 * y about every point z of the disc, and the tail bounded as there.
 */
final class UnitDisc {
    /** 4^(-n) is below the rounding of a double. */
    private static final int TERMS = 32;
    /** Steps to the right half plane taken at most. */
    private static final double LARGEST_STEPS = 10_000;

    private final int n;
    private final ScaledDisc factorial;

    private UnitDisc(int n) {
        this.n = n;
        this.factorial = ScaledDisc.of(Rational.of(ExactFunctions.factorial(n)));
    }

    static UnitDisc of(int n) {
        return new UnitDisc(n);
    }

    /** W^(n) over the disc; the whole plane if it touches a pole or is too far to the left. */
    ScaledDisc over(ComplexDisc z) {
        double steps = Math.max(1, Math.ceil(1 - z.re() + z.radius()));
        if (!(steps < LARGEST_STEPS)) {
            return ScaledDisc.WHOLE;
        }
        int last = (int) steps + TERMS;
        ComplexDisc[] factor = constant(0.75);
        overLinear(factor, z.add(-0.5));
        ComplexDisc[] sum = constant(0);
        for (int k = 0; k < last; k++) {
            ComplexDisc shifted = z.add(k);
            ComplexDisc[] term = factor.clone();
            overLinear(term, shifted);
            for (int j = 0; j <= n; j++) {
                sum[j] = sum[j].add(term[j]);
            }
            timesLinear(factor, shifted);
            overLinear(factor, shifted.add(0.5));
            for (int j = 0; j <= n; j++) {
                factor[j] = factor[j].multiply(0.25);
            }
        }
        // |R_j| <= 3 2^j where Re z + last >= 1
        double tail = 0;
        for (int j = 0; j <= n; j++) {
            tail = Upward.inflate(2 * tail + factor[j].largest());
        }
        return ScaledDisc.of(sum[n].widened(Upward.inflate(3 * tail))).multiply(factorial);
    }

    private ComplexDisc[] constant(double value) {
        ComplexDisc[] result = new ComplexDisc[n + 1];
        for (int j = 0; j <= n; j++) {
            result[j] = j == 0 ? ComplexDisc.of(value, 0) : ComplexDisc.ZERO;
        }
        return result;
    }

    private static void timesLinear(ComplexDisc[] series, ComplexDisc c) {
        for (int j = series.length - 1; j >= 0; j--) {
            ComplexDisc product = series[j].multiply(c);
            series[j] = j == 0 ? product : product.add(series[j - 1]);
        }
    }

    private static void overLinear(ComplexDisc[] series, ComplexDisc c) {
        ComplexDisc inverse = c.inverse();
        for (int j = 0; j < series.length; j++) {
            ComplexDisc value = j == 0 ? series[j] : series[j].subtract(series[j - 1]);
            series[j] = value.multiply(inverse);
        }
    }
}
