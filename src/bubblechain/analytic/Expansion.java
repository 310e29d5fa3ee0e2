package bubblechain.analytic;

import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.series.BallRing;
import bubblechain.series.CoefficientRing;
import bubblechain.series.CoefficientwiseAlgebra;
import bubblechain.series.ExactRing;
import bubblechain.series.LaurentSeries;
import java.util.ArrayList;
import java.util.List;
import java.util.function.IntFunction;

/**
 * The Laurent expansion of a normal form about a rational point u0, in powers of u - u0.
 *
 * <p>The lowest power of every term is known exactly beforehand, so the expansion always reaches the absolute order
 * asked for, however much cancels between terms.
 */
public final class Expansion {
    private final List<LocalTerm> terms = new ArrayList<>();

    private Expansion(NormalForm form, Rational point) {
        form.terms().forEach((key, factor) -> terms.add(new LocalTerm(key, factor, point)));
    }

    public static Expansion about(Rational point, NormalForm form) {
        return new Expansion(form, point);
    }

    /** The lowest power any single term has; the sum may start later. Zero for the zero form. */
    public int lowestPower() {
        return terms.stream().mapToInt(LocalTerm::valuation).min().orElse(0);
    }

    /** Exact coefficients of all powers below {@code end}; a formal zero is dropped at the start. */
    public LaurentSeries<ExactConstant> exact(int end) {
        return sum(end, length -> ExactRing.INSTANCE);
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
