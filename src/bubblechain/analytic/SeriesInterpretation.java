package bubblechain.analytic;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.PrecisionException;
import bubblechain.exact.Rational;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.formula.FormulaException;
import bubblechain.formula.FormulaLimits;
import bubblechain.formula.Function;
import bubblechain.series.SeriesAlgebra;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;

/**
 * A formula evaluated node by node in a series algebra: the route for formulas outside the admissible class, and for two
 * variables with dual numbers.
 *
 * <p>Sub-expressions without variables are exact constants and linear ones are formed exactly, so that 1/3 + 1/3 - 2/3
 * is zero in every algebra.
 *
 * @param <S> the series
 */
public final class SeriesInterpretation<S> {
    private final SeriesAlgebra<S> algebra;
    private final Map<String, S> variables;
    private final Map<String, Rational> points;
    private final Map<String, ExactConstant> indices = new HashMap<>();
    private int steps;

    private SeriesInterpretation(SeriesAlgebra<S> algebra, Map<String, S> variables, Map<String, Rational> points) {
        this.algebra = algebra;
        this.variables = variables;
        this.points = points;
    }

    /**
     * The series of a formula.
     *
     * @param variables the series each variable stands for
     * @throws FormulaException if a sub-expression has no expansion here, with the place
     */
    public static <S> S of(Formula formula, SeriesAlgebra<S> algebra, Map<String, S> variables) {
        return new SeriesInterpretation<>(algebra, variables, Map.of()).value(formula);
    }

    /**
     * The series of a formula in powers of {@code variable - point}; arguments linear in the variable are exact, so that
     * gamma(u - 4/3) has its pole at u = 1/3 in every algebra.
     *
     * @throws FormulaException if a sub-expression has no expansion here, with the place
     */
    public static <S> S about(Rational point, Formula formula, SeriesAlgebra<S> algebra, String variable) {
        S series = algebra.linear(ExactConstant.of(point), ExactConstant.ONE);
        return new SeriesInterpretation<>(algebra, Map.of(variable, series), Map.of(variable, point)).value(formula);
    }

    private S value(Formula formula) {
        if (++steps > FormulaLimits.STEPS) {
            throw FormulaException.at(formula.span(), "the sums of this formula have too many terms in all");
        }
        try {
            return unchecked(formula);
        } catch (FormulaException | PrecisionException alreadyToldOrTooShort) {
            throw alreadyToldOrTooShort;
        } catch (ArithmeticException | DomainException e) {
            throw FormulaException.at(formula.span(), String.valueOf(e.getMessage()));
        }
    }

    private S unchecked(Formula formula) {
        if (formula.names().stream().noneMatch(this::isVariable)) {
            return algebra.constant(ConstantValue.of(formula, indices));
        }
        if (formula instanceof Formula.Name n) {
            return variables.get(n.name());
        }
        if (formula instanceof Formula.Negation n) {
            return algebra.negate(value(n.operand()));
        }
        if (formula instanceof Formula.Call c) {
            return call(c);
        }
        if (formula instanceof Formula.FiniteSum s) {
            return sum(s);
        }
        Formula.Binary b = (Formula.Binary) formula;
        return switch (b.operator()) {
            case ADD -> algebra.add(value(b.left()), value(b.right()));
            case SUBTRACT -> algebra.add(value(b.left()), algebra.negate(value(b.right())));
            case MULTIPLY -> algebra.multiply(value(b.left()), value(b.right()));
            case DIVIDE -> algebra.multiply(value(b.left()), algebra.inverse(exactIfLinear(b.right())));
            case POWER -> power(b);
        };
    }

    private boolean isVariable(String name) {
        return variables.containsKey(name) && !indices.containsKey(name);
    }

    private S power(Formula.Binary b) {
        boolean constantExponent = b.right().names().stream().noneMatch(this::isVariable);
        if (constantExponent) {
            ExactConstant exponent = ConstantValue.of(b.right(), indices);
            Optional<Rational> q = exponent.asRational();
            if (q.isPresent() && q.get().isInteger()) {
                if (q.get().abs().compareTo(Rational.of(FormulaLimits.EXPONENT)) > 0) {
                    throw FormulaException.at(
                            b.right().span(), "an exponent of more than " + FormulaLimits.EXPONENT + " in size");
                }
                return algebra.power(exactIfLinear(b.left()), q.get().intValueExact());
            }
        }
        return algebra.exp(algebra.multiply(value(b.right()), algebra.ln(exactIfLinear(b.left()))));
    }

    /** The value, formed exactly if the formula is linear in the variables. */
    private S exactIfLinear(Formula formula) {
        Optional<LinearForm> form = LinearForm.of(formula, variables.keySet(), indices);
        if (form.isEmpty()) {
            return value(formula);
        }
        ExactConstant constant = form.get().constant();
        Map<String, ExactConstant> slopes = form.get().slopes();
        if (slopes.size() == 1 && points.keySet().containsAll(slopes.keySet())) {
            String variable = slopes.keySet().iterator().next();
            ExactConstant slope = slopes.get(variable);
            return algebra.linear(constant.add(slope.multiply(points.get(variable))), slope);
        }
        S sum = algebra.constant(constant);
        for (Map.Entry<String, ExactConstant> term : slopes.entrySet()) {
            S slope = algebra.constant(term.getValue());
            sum = algebra.add(sum, algebra.multiply(slope, variables.get(term.getKey())));
        }
        return sum;
    }

    private S sum(Formula.FiniteSum s) {
        int from = ConstantValue.integer(s.from(), indices, "the start of a sum");
        int to = ConstantValue.integer(s.to(), indices, "the end of a sum");
        if (to - from >= FormulaLimits.SUM_TERMS) {
            throw FormulaException.at(s.span(), "a sum of more than " + FormulaLimits.SUM_TERMS + " terms");
        }
        ExactConstant hidden = indices.get(s.index());
        S total = algebra.constant(ExactConstant.ZERO);
        for (int k = from; k <= to; k++) {
            indices.put(s.index(), ExactConstant.of(k));
            total = algebra.add(total, value(s.body()));
        }
        if (hidden == null) {
            indices.remove(s.index());
        } else {
            indices.put(s.index(), hidden);
        }
        return total;
    }

    /** W^(n) has an expansion at arguments linear in one variable. */
    private S unit3f2(Formula.Call c) {
        Formula argument = c.arguments().get(1);
        Optional<LinearForm> form = LinearForm.of(argument, variables.keySet(), indices);
        Optional<Rational> constant = form.flatMap(f -> f.constant().asRational());
        if (constant.isEmpty() || form.get().slopes().size() != 1) {
            throw FormulaException.at(argument.span(), "unit_3f2 needs an argument s + b*u with rational s and b");
        }
        Map.Entry<String, ExactConstant> term = form.get().slopes().entrySet().iterator().next();
        Optional<Rational> slope = term.getValue().asRational();
        Rational point = points.get(term.getKey());
        if (slope.isEmpty() || point == null) {
            throw FormulaException.at(argument.span(), "unit_3f2 needs an argument s + b*u with rational s and b");
        }
        int n = ConstantValue.unit3f2Order(c.arguments().get(0), indices);
        return UnitFunctions.at(n, constant.get().add(slope.get().multiply(point)), slope.get(), algebra);
    }

    private S call(Formula.Call c) {
        if (c.function() == Function.UNIT_3F2) {
            return unit3f2(c);
        }
        S argument = exactIfLinear(c.arguments().get(c.arguments().size() - 1));
        return switch (c.function()) {
            case GAMMA -> algebra.gamma(argument);
            case DIGAMMA -> algebra.polygamma(0, argument);
            case POLYGAMMA -> algebra.polygamma(
                    ConstantValue.polygammaOrder(c.arguments().get(0), indices), argument);
            case LN -> algebra.ln(argument);
            case SQRT -> algebra.exp(algebra.multiply(algebra.ln(argument), Rational.HALF));
            case EXP -> algebra.exp(argument);
            case SIN -> algebra.sin(argument);
            case COS -> algebra.cos(argument);
            case ZETA, POLYLOG, UNIT_3F2 -> throw FormulaException.at(
                    c.span(), c.function().text() + " needs a constant argument");
        };
    }
}
