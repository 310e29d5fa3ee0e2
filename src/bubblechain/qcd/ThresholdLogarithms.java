package bubblechain.qcd;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import java.util.ArrayList;
import java.util.List;

/**
 * The logarithms of a threshold from the renormalisation group. With l = ln mu^2, a = alpha^(nl+1)/pi,
 * da/dl = a B(a), d ln m/dl = G(a) and B', G' those of nl flavours, the ratios zeta(a, L) and zeta_m(a, L), dL/dl = 1, obey
 * <pre>
 *   d zeta/dL   = zeta [B'(a zeta) - B(a)]     - B(a) a d zeta/da
 *   d zeta_m/dL = zeta_m [G'(a zeta) - G(a)]   - B(a) a d zeta_m/da
 * </pre>
 * whose right sides at a^k contain lower orders only.
 */
final class ThresholdLogarithms {
    private final int order;
    /** -B: entry k belongs to a^k, entry 0 is zero; the same for the others. */
    private final List<ExactConstant> heavyBeta;
    private final List<ExactConstant> lightBeta;
    private final List<ExactConstant> heavyGamma;
    private final List<ExactConstant> lightGamma;

    ThresholdLogarithms(int nl, int order) {
        this.order = order;
        this.heavyBeta = perPi(BetaFunction.of(nl + 1).coefficients());
        this.lightBeta = perPi(BetaFunction.of(nl).coefficients());
        this.heavyGamma = perPi(MassAnomalousDimension.of(nl + 1).coefficients());
        this.lightGamma = perPi(MassAnomalousDimension.of(nl).coefficients());
    }

    /** From coefficients of (alpha_s/(4 pi))^(k+1) to those of (alpha_s/pi)^(k+1), with a zero in front. */
    private static List<ExactConstant> perPi(List<ExactConstant> coefficients) {
        List<ExactConstant> result = new ArrayList<>(List.of(ExactConstant.ZERO));
        for (int k = 0; k < coefficients.size(); k++) {
            result.add(coefficients.get(k).divide(Rational.of(4).power(k + 1)));
        }
        return result;
    }

    /** zeta(a, L) with the given values at L = 0. @param constants the coefficients of a, a^2, ... */
    LogarithmSeries coupling(List<ExactConstant> constants) {
        LogarithmSeries heavy = LogarithmSeries.constants(order, heavyBeta);
        LogarithmSeries zeta = LogarithmSeries.one(order);
        for (int k = 1; k <= order; k++) {
            LogarithmSeries light = LogarithmSeries.composed(lightBeta, zeta.shifted(1));
            LogarithmSeries slope = zeta.times(heavy.minus(light)).plus(zeta.counted().times(heavy));
            zeta = zeta.withIntegral(k, constants.get(k - 1), slope.row(k));
        }
        return zeta;
    }

    /** zeta_m(a, L) with the given values at L = 0. @param zeta {@link #coupling} */
    LogarithmSeries mass(List<ExactConstant> constants, LogarithmSeries zeta) {
        LogarithmSeries heavy = LogarithmSeries.constants(order, heavyBeta);
        LogarithmSeries difference = LogarithmSeries.constants(order, heavyGamma)
                .minus(LogarithmSeries.composed(lightGamma, zeta.shifted(1)));
        LogarithmSeries result = LogarithmSeries.one(order);
        for (int k = 1; k <= order; k++) {
            LogarithmSeries slope = result.times(difference).plus(result.counted().times(heavy));
            result = result.withIntegral(k, constants.get(k - 1), slope.row(k));
        }
        return result;
    }

    /**
     * ln(M^2/mbar^2) as a series in a(M), from M/mbar = 1 + sum c_k a(mbar)^k. The coupling at mbar is
     * a(M) sum r_k(t) a(M)^k, t = ln(mbar^2/M^2), d/dt being -sum_k b_k a^(k+2) d/da.
     *
     * @param relation c_1, c_2, c_3
     */
    LogarithmSeries poleMassLogarithm(List<ExactConstant> relation) {
        LogarithmSeries heavy = LogarithmSeries.constants(order, heavyBeta);
        LogarithmSeries running = LogarithmSeries.one(order);
        for (int k = 1; k <= order; k++) {
            LogarithmSeries slope = running.plus(running.counted()).times(heavy).times(ExactConstant.of(-1));
            running = running.withIntegral(k, ExactConstant.ZERO, slope.row(k));
        }
        List<ExactConstant> polynomial = new ArrayList<>(relation);
        polynomial.add(0, ExactConstant.ZERO);
        LogarithmSeries logarithm = LogarithmSeries.constants(order, List.of());
        for (int k = 0; k < relation.size(); k++) { // one more order right at every step
            LogarithmSeries atMass = running.at(logarithm.times(ExactConstant.of(-1))).shifted(1);
            logarithm = LogarithmSeries.composed(polynomial, atMass).lnOnePlus().times(ExactConstant.of(2));
        }
        return logarithm;
    }
}
