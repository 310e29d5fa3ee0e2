package bubblechain.chain;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import bubblechain.series.CoefficientRing;
import java.util.ArrayList;
import java.util.List;

/**
 * What a {@link bubblechain.kernel.SudakovSubtraction} comes to, order by order.
 *
 * @param <C> the numbers
 */
final class SudakovCoefficients<C> {
    private final CoefficientRing<C> ring;
    /** g_k. */
    private final List<C> cusp;
    /** h_k. */
    private final List<C> slope;

    private SudakovCoefficients(CoefficientRing<C> ring, List<C> cusp, List<C> slope) {
        this.ring = ring;
        this.cusp = cusp;
        this.slope = slope;
    }

    /**
     * From the coefficients of the two functions of a subtraction.
     *
     * @param cusp      of g(a)
     * @param slope     of h(a) - g(a) ln D(-a)/(-a)
     * @param logarithm of ln D(-a)/(-a)
     */
    static <C> SudakovCoefficients<C> of(CoefficientRing<C> ring, List<C> cusp, List<C> slope, List<C> logarithm) {
        List<C> h = new ArrayList<>();
        for (int k = 0; k < slope.size(); k++) {
            C sum = slope.get(k);
            for (int j = 0; j <= k; j++) {
                sum = ring.add(sum, ring.multiply(cusp.get(j), logarithm.get(k - j)));
            }
            h.add(sum);
        }
        return new SudakovCoefficients<>(ring, cusp, h);
    }

    /**
     * Coefficients of ln D(-a)/(-a) = sum_k d_(k+1) (-a)^k, ln D(eps) = sum d_k eps^k, with the massless bubble
     * D(eps) = 6 e^(gammaE eps) Gamma(1+eps) Gamma(2-eps)^2/Gamma(4-2eps):
     * k d_k = zeta(k) ((-1)^k + 2 - 2^k) + 2^k + (2/3)^k - 1 for k of at least 2, d_1 = 5/3 by DLMF 5.7.3.
     */
    static List<ExactConstant> bubbleLogarithm(int count) {
        List<ExactConstant> result = new ArrayList<>();
        for (int k = 1; k <= count; k++) {
            Rational power = Rational.TWO.power(k);
            Rational rational = power.add(Rational.of(2, 3).power(k)).subtract(1);
            ExactConstant value = ExactConstant.of(rational);
            if (k > 1) {
                Rational weight = Rational.of(k % 2 == 0 ? 3 : 1).subtract(power);
                value = value.add(ExactFunctions.hurwitz(k, Rational.ONE).multiply(weight));
            }
            result.add(value.multiply(Rational.of(k % 2 == 0 ? -1 : 1, k)));
        }
        return result;
    }

    /** g_0. */
    C cusp() {
        return cusp.get(0);
    }

    /** s_k = h_k + L g_k - H_k g_(k+1) for k below count. */
    List<C> subtraction(C operatorLog, int count) {
        List<C> result = new ArrayList<>();
        Rational harmonic = Rational.ZERO;
        for (int k = 0; k < count; k++) {
            if (k > 0) {
                harmonic = harmonic.add(Rational.of(1, k));
            }
            C value = ring.isZero(operatorLog)
                    ? slope.get(k)
                    : ring.add(slope.get(k), ring.multiply(operatorLog, cusp.get(k)));
            result.add(ring.add(value, ring.multiply(cusp.get(k + 1), harmonic.negate())));
        }
        return result;
    }

    /** gamma_k = 2 (h_k - H_(k+1) g_(k+1)) for k below count. */
    List<C> anomalousDimension(int count) {
        List<C> result = new ArrayList<>();
        Rational harmonic = Rational.ZERO;
        for (int k = 0; k < count; k++) {
            harmonic = harmonic.add(Rational.of(1, k + 1L));
            C value = ring.add(slope.get(k), ring.multiply(cusp.get(k + 1), harmonic.negate()));
            result.add(ring.multiply(value, Rational.TWO));
        }
        return result;
    }
}
