package bubblechain.chain;

import bubblechain.analytic.GradedTerm;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.GradedSeries;
import bubblechain.exact.GradedSum;
import bubblechain.exact.Rational;
import bubblechain.kernel.SudakovSubtraction;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The subtraction of double logarithms monomial by monomial. With ln D(-a)/(-a) = (Z(a) + R(a))/a, Z = sum of rational
 * multiples of zeta(k) a^k and R rational, every part of h_k, and of g_(k+1) times a harmonic number, has the factor of
 * {@link GradedCoefficients}.
 */
final class GradedSudakov {
    private final List<GradedTerm> cusp;
    private final List<GradedCoefficients> slope;

    private GradedSudakov(List<GradedTerm> cusp, List<GradedCoefficients> slope) {
        this.cusp = cusp;
        this.slope = slope;
    }

    /** Empty if a function is not a sum of graded terms. @param end orders of g that are wanted */
    static Optional<GradedSudakov> of(SudakovSubtraction subtraction, int end) {
        Optional<List<GradedTerm>> cusp = EnumeratedCoefficients.graded(subtraction.cusp(), end);
        Optional<List<GradedTerm>> slope = EnumeratedCoefficients.graded(subtraction.slope(), end);
        Optional<GradedSeries> zetas = GradedSeries.of(zetas(end + 1));
        if (cusp.isEmpty() || slope.isEmpty() || zetas.isEmpty()) {
            return Optional.empty();
        }
        List<GradedCoefficients> h = new ArrayList<>();
        slope.get().forEach(term -> h.add(GradedCoefficients.of(term)));
        List<Rational> rationals = rationals(end + 1);
        for (GradedTerm term : cusp.get()) {
            Optional<GradedSeries> product = term.summand().series().multiply(zetas.get());
            if (product.isEmpty()) {
                return Optional.empty();
            }
            h.add(new GradedCoefficients(
                    new GradedSum.Summand(term.summand().constant(), product.get()),
                    (k, weight) -> term.factor(k + 1 - weight)));
            h.add(new GradedCoefficients(term.summand(), (k, weight) -> convolution(rationals, term, k + 1 - weight)));
        }
        return Optional.of(new GradedSudakov(cusp.get(), h));
    }

    /** (-1)^(k-1) k d_k of {@link SudakovCoefficients#bubbleLogarithm} over k: the part with zeta(k). */
    private static List<ExactConstant> zetas(int count) {
        List<ExactConstant> result = new ArrayList<>();
        for (int k = 0; k < count; k++) {
            Rational weight = Rational.of(k % 2 == 0 ? 3 : 1).subtract(Rational.TWO.power(k));
            result.add(k < 2
                    ? ExactConstant.ZERO
                    : ExactFunctions.hurwitz(k, Rational.ONE).multiply(weight.multiply(Rational.of(k % 2 == 0 ? -1 : 1, k))));
        }
        return result;
    }

    /** The rest, rational. */
    private static List<Rational> rationals(int count) {
        List<Rational> result = new ArrayList<>();
        for (int k = 0; k < count; k++) {
            Rational value = Rational.TWO.power(k).add(Rational.of(2, 3).power(k)).subtract(1);
            result.add(k == 0 ? Rational.ZERO : value.multiply(Rational.of(k % 2 == 0 ? -1 : 1, k)));
        }
        return result;
    }

    /** sum_j left_j right_(power-j). */
    private static Rational convolution(List<Rational> left, GradedTerm right, int power) {
        Rational sum = Rational.ZERO;
        for (int j = 1; j < left.size() && j <= power; j++) {
            sum = sum.add(left.get(j).multiply(right.factor(power - j)));
        }
        return sum;
    }

    /** s_k = h_k + L g_k - H_k g_(k+1). */
    List<GradedCoefficients> subtraction(ExactConstant operatorLog) {
        List<GradedCoefficients> result = new ArrayList<>(withHarmonic(0));
        if (!operatorLog.isZero()) {
            for (GradedTerm term : cusp) {
                ExactConstant constant = term.summand().constant().multiply(operatorLog);
                result.add(new GradedCoefficients(
                        new GradedSum.Summand(constant, term.summand().series()),
                        (k, weight) -> term.factor(k - weight)));
            }
        }
        return result;
    }

    /** Half of the anomalous dimension, h_k - H_(k+1) g_(k+1). */
    List<GradedCoefficients> anomalousDimension() {
        return withHarmonic(1);
    }

    /** h_k - H_(k+offset) g_(k+1). */
    private List<GradedCoefficients> withHarmonic(int offset) {
        List<GradedCoefficients> result = new ArrayList<>(slope);
        for (GradedTerm term : cusp) {
            result.add(new GradedCoefficients(
                    term.summand(),
                    (k, weight) -> harmonic(k + offset).negate().multiply(term.factor(k + 1 - weight))));
        }
        return result;
    }

    private static Rational harmonic(int k) {
        Rational sum = Rational.ZERO;
        for (int j = 1; j <= k; j++) {
            sum = sum.add(Rational.of(1, j));
        }
        return sum;
    }

    /** g_0 as a function without higher orders. */
    List<GradedCoefficients> cuspAtZero() {
        return cusp.stream()
                .map(term -> new GradedCoefficients(
                        term.summand(), (k, weight) -> k == 0 ? term.factor(-weight) : Rational.ZERO))
                .toList();
    }
}
