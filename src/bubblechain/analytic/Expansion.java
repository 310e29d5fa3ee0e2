package bubblechain.analytic;

import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.GradedSum;
import bubblechain.exact.Rational;
import bubblechain.series.BallRing;
import bubblechain.series.CoefficientRing;
import bubblechain.series.CoefficientwiseAlgebra;
import bubblechain.series.ExactRing;
import bubblechain.series.LaurentSeries;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.IntFunction;

/**
 * The Laurent expansion of a normal form about a rational point u0, in powers of u - u0.
 *
 * <p>The lowest power of every term is known exactly beforehand, so the expansion always reaches the absolute order
 * asked for, however much cancels between terms.
 */
public final class Expansion {
    /** Shorter expansions start sooner through series. */
    private static final int ENUMERATED_LENGTH = 7;

    private final List<LocalTerm> terms = new ArrayList<>();

    private Expansion(NormalForm form, Rational point) {
        for (Map.Entry<TermKey, RationalFunction> term : form.terms().entrySet()) {
            terms.add(new LocalTerm(term.getKey(), term.getValue(), point));
        }
    }

    public static Expansion about(Rational point, NormalForm form) {
        return new Expansion(form, point);
    }

    /** The lowest power any single term has; the sum may start later. Zero for the zero form. */
    public int lowestPower() {
        int lowest = terms.isEmpty() ? 0 : Integer.MAX_VALUE;
        for (LocalTerm term : terms) {
            lowest = Math.min(lowest, term.valuation());
        }
        return lowest;
    }

    /**
     * Exact coefficients of all powers below {@code end}; a formal zero is dropped at the start.
     *
     * @throws bubblechain.exact.DomainException if a coefficient has more than {@link bubblechain.exact.GradedSeries#LARGEST_SIZE} terms
     */
    public LaurentSeries<ExactConstant> exact(int end) {
        return end - lowestPower() < ENUMERATED_LENGTH
                ? exactBySeries(end)
                : exactByMonomials(end).orElseGet(() -> exactBySeries(end));
    }

    /** The same through series whose coefficients are exact constants. */
    LaurentSeries<ExactConstant> exactBySeries(int end) {
        return sum(end, length -> ExactRing.INSTANCE);
    }

    /** The same monomial by monomial; empty if that does not apply to a term. */
    Optional<LaurentSeries<ExactConstant>> exactByMonomials(int end) {
        return graded(end).map(graded -> {
            GradedSum sum = GradedSum.of(graded.stream().map(GradedTerm::summand).toList());
            List<ExactConstant> coefficients = new ArrayList<>();
            int lowest = lowestPower();
            for (int n = lowest; n < end; n++) {
                int power = n;
                ExactConstant coefficient = sum.combine((h, weight) -> graded.get(h).factor(power - weight));
                if (coefficients.isEmpty() && coefficient.isZero()) {
                    lowest++;
                } else {
                    coefficients.add(coefficient);
                }
            }
            return new LaurentSeries<>(coefficients.isEmpty() ? end : lowest, coefficients);
        });
    }

    /** This as graded terms that hold all powers below {@code end}; empty if a term has none. */
    public Optional<List<GradedTerm>> graded(int end) {
        List<GradedTerm> result = new ArrayList<>();
        for (LocalTerm term : terms) {
            if (term.valuation() < end) {
                Optional<List<GradedTerm>> parts = GradedTerm.of(term, end);
                if (parts.isEmpty()) {
                    return Optional.empty();
                }
                result.addAll(parts.get());
            }
        }
        return Optional.of(result);
    }

    /** Balls that enclose the coefficients of all powers below {@code end}. */
    public LaurentSeries<Ball> balls(int end, int bits) {
        return sum(end, length -> BallRing.of(bits, length + 1));
    }

    private <C> LaurentSeries<C> sum(int end, IntFunction<CoefficientRing<C>> rings) {
        int length = Math.max(1, end - lowestPower());
        CoefficientwiseAlgebra<C> algebra = CoefficientwiseAlgebra.of(rings.apply(length), length);
        LaurentSeries<C> total = new LaurentSeries<>(end, List.of());
        for (LocalTerm term : terms) {
            if (term.valuation() < end) {
                total = algebra.add(total, term.expand(algebra));
            }
        }
        return total;
    }
}
