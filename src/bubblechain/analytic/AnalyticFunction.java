package bubblechain.analytic;

import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.PrecisionException;
import bubblechain.exact.Rational;
import bubblechain.formula.Formula;
import bubblechain.series.BallRing;
import bubblechain.series.CoefficientRing;
import bubblechain.series.CoefficientwiseAlgebra;
import bubblechain.series.ExactRing;
import bubblechain.series.LaurentSeries;
import java.util.Optional;
import java.util.function.IntFunction;
import org.jspecify.annotations.Nullable;

/**
 * A function of one variable given by a formula: by its normal form if it has one, by its tree otherwise.
 *
 * <p>Outside the admissible class only expansions are offered, about points where the tree has one; the list of
 * singularities is refused with the place that prevents it.
 */
public final class AnalyticFunction {
    /** Terms computed beyond those asked for before a function is said to vanish. */
    private static final int SURPLUS_LIMIT = 60;
    /** Characters of a formula that are repeated in a message. */
    private static final int LONGEST_SHOWN = 200;

    private final Formula formula;
    private final String variable;
    private final @Nullable NormalForm form;
    private final @Nullable InadmissibleFormulaException reason;
    /** The factor e^(slope u) that multiplies the formula; already part of the normal form. */
    private final ExactConstant slope;

    private AnalyticFunction(
            Formula formula,
            String variable,
            @Nullable NormalForm form,
            @Nullable InadmissibleFormulaException reason,
            ExactConstant slope) {
        this.formula = formula;
        this.variable = variable;
        this.form = form;
        this.reason = reason;
        this.slope = slope;
    }

    /** @throws bubblechain.formula.FormulaException if a name other than the variable has no meaning */
    public static AnalyticFunction of(Formula formula, String variable) {
        try {
            return new AnalyticFunction(formula, variable, NormalForm.of(formula, variable), null, ExactConstant.ZERO);
        } catch (InadmissibleFormulaException e) {
            return new AnalyticFunction(formula, variable, null, e, ExactConstant.ZERO);
        }
    }

    public Formula formula() {
        return formula;
    }

    public Optional<NormalForm> normalForm() {
        return Optional.ofNullable(form);
    }

    /** @throws InadmissibleFormulaException if the formula is outside the class, with the place */
    public NormalForm requireNormalForm() {
        if (form != null) {
            return form;
        }
        throw reason == null ? new IllegalStateException("neither a normal form nor a reason") : reason;
    }

    /** e^(slope u) times this function. */
    public AnalyticFunction timesExponential(ExactConstant factor) {
        if (factor.isZero()) {
            return this;
        }
        @Nullable NormalForm product =
                form == null ? null : form.multiply(NormalForm.exponential(ExactConstant.ZERO, factor));
        return new AnalyticFunction(formula, variable, product, reason, slope.add(factor));
    }

    /** Exact coefficients of all powers of u - point below {@code end}. */
    public LaurentSeries<ExactConstant> exact(Rational point, int end) {
        return form != null
                ? Expansion.about(point, form).exact(end)
                : tree(point, end, length -> ExactRing.INSTANCE);
    }

    /** Balls for the coefficients of all powers of u - point below {@code end}. */
    public LaurentSeries<Ball> balls(Rational point, int end, int bits) {
        return form != null
                ? Expansion.about(point, form).balls(end, bits)
                : tree(point, end, length -> BallRing.of(bits, length + 1));
    }

    /** Evaluates the tree with more and more terms until the order asked for is reached. */
    private <C> LaurentSeries<C> tree(Rational point, int end, IntFunction<CoefficientRing<C>> rings) {
        for (int surplus = 0; surplus <= SURPLUS_LIMIT; surplus = 2 * surplus + 2) {
            int length = Math.max(1, end) + surplus;
            CoefficientwiseAlgebra<C> algebra = CoefficientwiseAlgebra.of(rings.apply(length), length);
            Optional<LaurentSeries<C>> series = attempt(algebra, point);
            if (series.isPresent() && series.get().end() >= end) {
                return series.get();
            }
        }
        throw new PrecisionException("the expansion of " + shown() + " about " + variable + " = " + point
                + " does not reach order " + end + ": a part of it appears to vanish identically");
    }

    private String shown() {
        String text = formula.print();
        return text.length() <= LONGEST_SHOWN ? text : text.substring(0, LONGEST_SHOWN) + "...";
    }

    private <C> Optional<LaurentSeries<C>> attempt(CoefficientwiseAlgebra<C> algebra, Rational point) {
        try {
            LaurentSeries<C> series = SeriesInterpretation.about(point, formula, algebra, variable);
            return Optional.of(slope.isZero() ? series : algebra.multiply(series, exponential(algebra, point)));
        } catch (PrecisionException tooShort) {
            return Optional.empty();
        }
    }

    private <C> LaurentSeries<C> exponential(CoefficientwiseAlgebra<C> algebra, Rational point) {
        return algebra.exp(algebra.linear(slope.multiply(point), slope));
    }

    /** The value of a function that is regular at a rational point. @throws DomainException if it has a pole there */
    public ExactConstant valueAt(Rational point) {
        LaurentSeries<ExactConstant> series = exact(point, 1);
        if (series.lowest() < 0 && series.length() > 0) {
            throw new DomainException(shown() + " has a pole at " + variable + " = " + point);
        }
        return series.lowest() > 0 || series.length() == 0
                ? ExactConstant.ZERO
                : series.coefficients().get(0);
    }
}
