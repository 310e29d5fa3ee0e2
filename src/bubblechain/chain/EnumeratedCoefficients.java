package bubblechain.chain;

import bubblechain.analytic.AnalyticFunction;
import bubblechain.analytic.Expansion;
import bubblechain.analytic.GradedTerm;
import bubblechain.analytic.NormalForm;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.GradedSeries;
import bubblechain.exact.GradedSum;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;

/**
 * Exact coefficients monomial by monomial: every term of
 * c_n = n! [u^n] e^(L_c u) T(u) - (n!/2) [u^(n+1)] e^(L u) sum_k (gamma_k/k!) u^k, L = L_c - L_o,
 * is the product of a coefficient known for its monomial and a rational number that depends on n and the weight only.
 *
 * <p>With gamma(u) = R(u) sum_w H_w u^w and L = r + l, r rational, a monomial of H_w l^m/m! enters [u^q] of the second
 * part with V_w(q - m), V_w(q) = sum_k R_(k-w)/k! r^(q-k)/(q-k)!.
 *
 * @implNote the cost is that of one rational number for each term of the result; series are never multiplied
 */
final class EnumeratedCoefficients {
    private final int loops;
    private final int mostTerms;
    private final List<GradedSum.Summand> summands = new ArrayList<>();
    private final List<GradedCoefficients.Factor> factors = new ArrayList<>();
    private final List<BigInteger> factorials = new ArrayList<>();

    private EnumeratedCoefficients(int loops, int mostTerms) {
        this.loops = loops;
        this.mostTerms = mostTerms;
        factorials.add(BigInteger.ONE);
        for (int n = 1; n <= loops; n++) {
            factorials.add(factorials.get(n - 1).multiply(BigInteger.valueOf(n)));
        }
    }

    /**
     * c_0 .. c_(loops-1).
     *
     * @param mostTerms terms that all coefficients together may have
     * @return empty if a function of the kernel is not a sum of {@linkplain GradedTerm graded terms}
     * @throws DomainException if there are more terms
     */
    static Optional<List<ExactConstant>> of(Kernel kernel, int loops, Scales scales, int mostTerms) {
        EnumeratedCoefficients coefficients = new EnumeratedCoefficients(loops, mostTerms);
        boolean graded = kernel.transform().isPresent()
                ? coefficients.addTransform(kernel.transform().get().timesExponential(scales.couplingLog()))
                        && (!kernel.isRenormalised() || coefficients.addSubtraction(kernel, scales))
                : coefficients.addAnomalousDimension(kernel, scales.couplingLog());
        return graded ? Optional.of(coefficients.sums()) : Optional.empty();
    }

    static Optional<List<GradedTerm>> graded(AnalyticFunction function, int end) {
        Optional<NormalForm> form = function.normalForm();
        return form.flatMap(f -> Expansion.about(Rational.ZERO, f).graded(end));
    }

    /** n! [u^n] T; false if T is not graded. */
    private boolean addTransform(AnalyticFunction transform) {
        Optional<List<GradedTerm>> terms = graded(transform, loops);
        terms.ifPresent(list -> list.forEach(term -> {
            summands.add(term.summand());
            factors.add((n, weight) -> times(term.factor(n - weight), factorials.get(n)));
        }));
        return terms.isPresent();
    }

    private static Rational times(Rational value, BigInteger factorial) {
        return value.isZero() ? value : value.multiply(Rational.of(factorial));
    }

    private boolean addSubtraction(Kernel kernel, Scales scales) {
        ExactConstant log = scales.subtractionLog();
        if (kernel.anomalousDimension().isPresent()) {
            return addRescaled(coefficients(kernel.anomalousDimension().get(), loops + 1), log, 1, Rational.of(-1, 2));
        }
        Optional<GradedSudakov> sudakov = GradedSudakov.of(kernel.sudakov().orElseThrow(), loops + 2);
        return sudakov.isPresent()
                && addRescaled(Optional.of(sudakov.get().subtraction(scales.operatorLog())), log, 1, Rational.of(-1))
                && (log.isZero() || addRescaled(Optional.of(sudakov.get().cuspAtZero()), log, 2, Rational.of(-1)));
    }

    private boolean addAnomalousDimension(Kernel kernel, ExactConstant log) {
        if (kernel.anomalousDimension().isPresent()) {
            return addRescaled(coefficients(kernel.anomalousDimension().get(), loops), log, 0, Rational.ONE);
        }
        return addRescaled(
                GradedSudakov.of(kernel.sudakov().orElseThrow(), loops + 1).map(GradedSudakov::anomalousDimension),
                log, 0, Rational.TWO);
    }

    private static Optional<List<GradedCoefficients>> coefficients(AnalyticFunction function, int end) {
        return graded(function, end).map(list -> list.stream().map(GradedCoefficients::of).toList());
    }

    /** scale n! [u^(n+offset)] e^(log u) sum_k (gamma_k/k!) u^k. */
    private boolean addRescaled(
            Optional<List<GradedCoefficients>> terms, ExactConstant log, int offset, Rational scale) {
        if (terms.isEmpty()) {
            return false;
        }
        int end = loops + offset;
        Rational r = log.rationalPart();
        List<ExactConstant> exponent = new ArrayList<>();
        // a monomial may have a larger weight than its order: nothing of it is cut off by the product
        int longest = terms.get().stream().mapToInt(t -> t.summand().series().length()).max().orElse(0);
        for (int k = 0; k < Math.max(end, longest); k++) {
            exponent.add(k == 1 ? log.subtract(ExactConstant.of(r)) : ExactConstant.ZERO);
        }
        Optional<GradedSeries> powers = GradedSeries.exp(exponent);
        if (powers.isEmpty()) {
            return false;
        }
        for (GradedCoefficients term : terms.get()) {
            RescaledFactors rescaled = new RescaledFactors(term, r);
            int count = log.equals(ExactConstant.of(r)) ? 1 : end;
            for (int m = 0; m < count; m++) {
                Optional<GradedSeries> product = term.summand().series().multiply(powers.get().part(m));
                if (product.isEmpty()) {
                    return false;
                }
                int power = m;
                summands.add(new GradedSum.Summand(term.summand().constant(), product.get()));
                factors.add((n, weight) -> {
                    int q = n + offset - power;
                    return q < 0 || weight < power
                            ? Rational.ZERO
                            : times(rescaled.at(weight - power, q).multiply(scale), factorials.get(n));
                });
            }
        }
        return true;
    }

    /** V_w(q) of a term, kept once it is known. */
    private final class RescaledFactors {
        private final GradedCoefficients term;
        private final List<Rational> powers = new ArrayList<>(List.of(Rational.ONE));
        private final Rational r;
        private final Map<Integer, List<Rational>> known = new HashMap<>();

        RescaledFactors(GradedCoefficients term, Rational r) {
            this.term = term;
            this.r = r;
        }

        Rational at(int weight, int q) {
            List<Rational> values = known.computeIfAbsent(weight, w -> new ArrayList<>());
            while (values.size() <= q) {
                values.add(value(weight, values.size()));
            }
            return values.get(q);
        }

        private Rational value(int weight, int q) {
            while (powers.size() <= q) {
                powers.add(r.isZero() ? Rational.ZERO : powers.get(powers.size() - 1).multiply(r).divide(powers.size()));
            }
            Rational sum = Rational.ZERO;
            for (int k = r.isZero() ? q : 0; k <= q; k++) {
                Rational value = term.factors().at(k, weight);
                if (!value.isZero()) {
                    sum = sum.add(value.divide(Rational.of(factorials.get(k))).multiply(powers.get(q - k)));
                }
            }
            return sum;
        }
    }

    private List<ExactConstant> sums() {
        GradedSum sum = GradedSum.of(summands);
        requireSize(sum.sizes());
        return IntStream.range(0, loops)
                .mapToObj(n -> sum.combine((h, weight) -> factors.get(h).at(n, weight)))
                .toList();
    }

    /** c_n has at most the monomials through weight n + 1, n without an anomalous dimension, n + 2 with double logarithms. */
    private void requireSize(int[] sizes) {
        long total = 0;
        long one = sizes.length > 0 ? sizes[0] : 0;
        for (int n = 0; n < loops; n++) {
            one += n + 1 < sizes.length ? sizes[n + 1] : 0;
            total += one;
            if (total > mostTerms) {
                throw new DomainException("the first " + (n + 1) + " exact coefficients have more than " + mostTerms
                        + " terms together; ask for at most " + n + " loops, or for decimals");
            }
        }
    }
}
