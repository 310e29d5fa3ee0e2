package bubblechain.chain;

import bubblechain.analytic.AnalyticFunction;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.SudakovSubtraction;
import bubblechain.series.CoefficientRing;
import bubblechain.series.LaurentSeries;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.List;
import java.util.function.ObjIntConsumer;

/**
 * The coefficients over any ring:
 * c_n = n! [u^n] e^(L_c u) T(u) - 1/(n+1) sum_k C(n+1, k) s_k (L_c - L_o)^(n+1-k), with s_k = gamma_k/2, or for double
 * logarithms the s_k of {@link bubblechain.kernel.SudakovSubtraction} and one more term, g_0 (L_c - L_o)^(n+2)/((n+1)(n+2)),
 * to be taken away.
 *
 * @param <C> the numbers
 */
final class RingCoefficients<C> {
    /** Expansion about zero through a given number of powers. */
    interface Expander<C> {
        LaurentSeries<C> expand(AnalyticFunction function, int end);
    }

    private final CoefficientRing<C> ring;
    private final Expander<C> expander;

    RingCoefficients(CoefficientRing<C> ring, Expander<C> expander) {
        this.ring = ring;
        this.expander = expander;
    }

    List<C> coefficients(Kernel kernel, int loops, Scales scales) {
        if (kernel.transform().isEmpty()) {
            return rescaled(anomalousDimension(kernel, loops), scales.couplingLog(), loops);
        }
        AnalyticFunction transform = kernel.transform().get().timesExponential(scales.couplingLog());
        List<C> result = new ArrayList<>(taylor(transform, loops));
        for (int n = 0; n < loops; n++) {
            result.set(n, ring.multiply(result.get(n), Rational.of(ExactFunctions.factorial(n))));
        }
        if (kernel.isRenormalised()) {
            Subtraction<C> subtraction = subtraction(kernel, loops + 1, scales);
            List<C> shifted = rescaled(subtraction.values(), scales.subtractionLog(), loops + 1);
            List<C> logarithms = powers(scales.subtractionLog(), loops + 2);
            for (int n = 0; n < loops; n++) {
                // the k = 0 .. n+1 sum of the class comment is the rescaled coefficient n+1
                C part = ring.multiply(shifted.get(n + 1), Rational.of(-1, n + 1L));
                C twice = ring.multiply(
                        ring.multiply(subtraction.cusp(), logarithms.get(n + 2)), Rational.of(-1, (n + 1L) * (n + 2L)));
                result.set(n, sum(sum(result.get(n), part), twice));
            }
        }
        return result;
    }

    /**
     * The entire part of B(u), cusp/u^2 + (1/u) sum values_k u^k/k!.
     *
     * @param cusp   g_0, zero without double logarithms
     * @param values s_k
     */
    private record Subtraction<C>(C cusp, List<C> values) {}

    private Subtraction<C> subtraction(Kernel kernel, int count, Scales scales) {
        if (kernel.sudakov().isPresent()) {
            SudakovCoefficients<C> sudakov = sudakov(kernel.sudakov().get(), count + 1);
            return new Subtraction<>(sudakov.cusp(), sudakov.subtraction(ring.constant(scales.operatorLog()), count));
        }
        List<C> values = taylor(kernel.anomalousDimension().orElseThrow(), count);
        return new Subtraction<>(
                ring.constant(Rational.ZERO), values.stream().map(v -> ring.multiply(v, Rational.HALF)).toList());
    }

    private List<C> anomalousDimension(Kernel kernel, int count) {
        return kernel.sudakov().isPresent()
                ? sudakov(kernel.sudakov().get(), count + 1).anomalousDimension(count)
                : taylor(kernel.anomalousDimension().orElseThrow(), count);
    }

    private SudakovCoefficients<C> sudakov(SudakovSubtraction subtraction, int count) {
        return SudakovCoefficients.of(
                ring, taylor(subtraction.cusp(), count), taylor(subtraction.slope(), count),
                SudakovCoefficients.bubbleLogarithm(count).stream().map(ring::constant).toList());
    }

    private C sum(C left, C right) {
        return ring.isZero(left) ? right : ring.isZero(right) ? left : ring.add(left, right);
    }

    /** Coefficients of u^0 .. u^(count-1); a pole at zero has been checked to cancel and is left out. */
    private List<C> taylor(AnalyticFunction function, int count) {
        LaurentSeries<C> series = expander.expand(function, count);
        List<C> result = new ArrayList<>(count);
        C zero = ring.constant(Rational.ZERO);
        for (int k = 0; k < count; k++) {
            int index = k - series.lowest();
            result.add(index < 0 || index >= series.length() ? zero : series.coefficients().get(index));
        }
        return result;
    }

    /** sum_k C(n, k) L^(n-k) g_k: the coefficients of sum g_n u^n/n! times e^(L u). */
    private List<C> rescaled(List<C> values, ExactConstant log, int count) {
        if (log.isZero()) {
            return values;
        }
        List<C> powers = powers(log, count);
        List<C> result = new ArrayList<>(count);
        for (int n = 0; n < count; n++) {
            List<C> total = new ArrayList<>(List.of(ring.constant(Rational.ZERO)));
            int order = n;
            binomials(n, (binomial, k) -> {
                if (!ring.isZero(values.get(k))) {
                    C term = ring.multiply(ring.multiply(values.get(k), powers.get(order - k)), Rational.of(binomial));
                    total.set(0, sum(total.get(0), term));
                }
            });
            result.add(total.get(0));
        }
        return result;
    }

    private List<C> powers(ExactConstant log, int count) {
        List<C> powers = new ArrayList<>();
        C logarithm = ring.constant(log);
        powers.add(ring.constant(Rational.ONE));
        for (int k = 1; k < count; k++) {
            powers.add(ring.isZero(logarithm) ? ring.constant(Rational.ZERO) : ring.multiply(powers.get(k - 1), logarithm));
        }
        return powers;
    }

    private static void binomials(int n, ObjIntConsumer<BigInteger> use) {
        BigInteger binomial = BigInteger.ONE;
        for (int k = 0; k <= n; k++) {
            use.accept(binomial, k);
            binomial = binomial.multiply(BigInteger.valueOf(n - k)).divide(BigInteger.valueOf(k + 1));
        }
    }
}
