package bubblechain.analytic;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.EvaluationSteps;
import bubblechain.formula.Formula;
import bubblechain.formula.FormulaException;
import bubblechain.formula.FormulaLimits;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;

/** Turns a formula tree into a {@link NormalForm}, or says which sub-expression is outside the class. */
final class NormalFormCompiler {
    /** Nodes visited while sums are written out. */
    private static final int STEP_LIMIT = 200_000;

    private final String variable;
    private final Map<String, ExactConstant> indices = new HashMap<>();
    private final EvaluationSteps constants = new EvaluationSteps();
    private final CompileWork work = new CompileWork();
    private int steps;

    NormalFormCompiler(String variable) {
        this.variable = variable;
    }

    NormalForm compile(Formula formula) {
        if (++steps > STEP_LIMIT) {
            throw FormulaException.at(formula.span(), "the sums of this formula have too many terms in all");
        }
        work.node(formula);
        try {
            return unchecked(formula);
        } catch (FormulaException placed) {
            throw placed;
        } catch (ArithmeticException | DomainException e) {
            throw FormulaException.at(formula.span(), String.valueOf(e.getMessage()));
        }
    }

    private NormalForm unchecked(Formula formula) {
        if (formula instanceof Formula.Literal l) {
            return NormalForm.constant(ExactConstant.of(l.value()));
        }
        if (formula instanceof Formula.Name n) {
            return n.name().equals(variable) && !indices.containsKey(variable)
                    ? NormalForm.VARIABLE
                    : NormalForm.constant(ConstantValue.of(n, indices, constants));
        }
        if (formula instanceof Formula.Negation n) {
            return compile(n.operand()).negate();
        }
        if (formula instanceof Formula.Call c) {
            return call(c);
        }
        if (formula instanceof Formula.FiniteSum s) {
            return sum(s);
        }
        Formula.Binary b = (Formula.Binary) formula;
        NormalForm left = compile(b.left());
        return switch (b.operator()) {
            case ADD -> sum(left, compile(b.right()), b);
            case SUBTRACT -> sum(left, compile(b.right()).negate(), b);
            case MULTIPLY -> product(left, compile(b.right()), b);
            case DIVIDE -> product(left, inverse(compile(b.right()), b.right()), b);
            case POWER -> power(left, b);
        };
    }

    private NormalForm sum(NormalForm left, NormalForm right, Formula place) {
        work.sum(left, right, place);
        return left.add(right);
    }

    private NormalForm product(NormalForm left, NormalForm right, Formula place) {
        work.product(left, right, place);
        return left.multiply(right);
    }

    private static NormalForm inverse(NormalForm form, Formula place) {
        Optional<NormalForm> inverse = form.inverse();
        if (inverse.isEmpty()) {
            throw new InadmissibleFormulaException(
                    place.span(),
                    "a denominator must be a product of rational functions, exponentials, gammas and"
                            + " sin(pi*...); the zeros of this one cannot be listed exactly");
        }
        return inverse.get();
    }

    private NormalForm power(NormalForm base, Formula.Binary b) {
        NormalForm exponent = compile(b.right());
        Optional<ExactConstant> value = exponent.asConstant();
        Optional<Rational> constant = value.isPresent() ? value.get().asRational() : Optional.empty();
        if (constant.isPresent() && constant.get().isInteger()) {
            if (constant.get().abs().compareTo(Rational.of(FormulaLimits.EXPONENT)) > 0) {
                throw FormulaException.at(
                        b.right().span(), "an exponent of more than " + FormulaLimits.EXPONENT + " in size");
            }
            int n = constant.get().intValueExact();
            return integerPower(n < 0 ? inverse(base, b.left()) : base, Math.abs(n), b);
        }
        Optional<ExactConstant> constantBase = base.asConstant();
        Optional<NormalForm.Linear> linear = exponent.asLinear();
        if (constantBase.isEmpty() || linear.isEmpty()) {
            throw new InadmissibleFormulaException(
                    b.span(), "a power needs an integer exponent, or a positive constant to a power linear in u");
        }
        ExactConstant log = constantBase.get().ln();
        return NormalForm.exponential(
                linear.get().constant().multiply(log), linear.get().slope().multiply(log));
    }

    private NormalForm integerPower(NormalForm base, int n, Formula place) {
        NormalForm result = NormalForm.ONE;
        NormalForm square = base;
        for (int e = n; e > 0; e >>= 1) {
            if ((e & 1) == 1) {
                result = product(result, square, place);
            }
            if (e > 1) {
                square = product(square, square, place);
            }
        }
        return result;
    }

    private NormalForm sum(Formula.FiniteSum s) {
        int from = ConstantValue.integer(s.from(), indices, "the start of a sum");
        int to = ConstantValue.integer(s.to(), indices, "the end of a sum");
        if (to - from >= FormulaLimits.SUM_TERMS) {
            throw FormulaException.at(s.span(), "a sum of more than " + FormulaLimits.SUM_TERMS + " terms");
        }
        ExactConstant hidden = indices.get(s.index());
        NormalForm total = NormalForm.ZERO;
        for (int k = from; k <= to; k++) {
            indices.put(s.index(), ExactConstant.of(k));
            total = sum(total, compile(s.body()), s);
        }
        if (hidden == null) {
            indices.remove(s.index());
        } else {
            indices.put(s.index(), hidden);
        }
        return total;
    }

    private NormalForm call(Formula.Call c) {
        Formula last = c.arguments().get(c.arguments().size() - 1);
        if (!dependsOnVariable(c)) {
            return NormalForm.constant(ConstantValue.of(c, indices, constants));
        }
        NormalForm argument = compile(last);
        Optional<NormalForm.Linear> form = argument.asLinear();
        if (form.isEmpty()) {
            throw new InadmissibleFormulaException(
                    last.span(), "the argument of " + c.function().text() + " must be linear in u");
        }
        NormalForm.Linear linear = form.get();
        return switch (c.function()) {
            case GAMMA -> gamma(linear, last);
            case DIGAMMA -> polygamma(0, linear, last);
            case POLYGAMMA -> polygamma(ConstantValue.polygammaOrder(c.arguments().get(0), indices), linear, last);
            case UNIT_3F2 -> NormalForm.unit3f2(
                    ConstantValue.unit3f2Order(c.arguments().get(0), indices), rational(linear.constant(), last), rational(linear.slope(), last));
            case EXP -> NormalForm.exponential(linear.constant(), linear.slope());
            case SIN -> sine(linear.constant(), linear.slope(), last);
            case COS -> sine(
                    linear.constant().add(ExactConstant.PI.multiply(Rational.HALF)), linear.slope(), last);
            case LN, SQRT, ZETA, POLYLOG -> throw new InadmissibleFormulaException(
                    c.span(), c.function().text() + " of an expression with u has no exact list of singularities");
        };
    }

    private NormalForm gamma(NormalForm.Linear argument, Formula place) {
        Rational constant = rational(argument.constant(), place);
        work.shiftOfGamma(constant, place);
        return NormalForm.gamma(constant, rational(argument.slope(), place));
    }

    private NormalForm polygamma(int order, NormalForm.Linear argument, Formula place) {
        Rational constant = rational(argument.constant(), place);
        work.shiftOfPolygamma(constant, order, place);
        return NormalForm.polygamma(order, constant, rational(argument.slope(), place));
    }

    private static NormalForm sine(ExactConstant constant, ExactConstant slope, Formula place) {
        Optional<NormalForm> sine = NormalForm.sine(constant, slope);
        if (sine.isEmpty()) {
            throw new InadmissibleFormulaException(
                    place.span(), "the slope of u in a sine or cosine must be rational or a multiple of pi");
        }
        return sine.get();
    }

    private static Rational rational(ExactConstant value, Formula place) {
        Optional<Rational> rational = value.asRational();
        if (rational.isEmpty()) {
            throw new InadmissibleFormulaException(
                    place.span(), "a gamma or hypergeometric function needs an argument s + b*u with rational s and b");
        }
        return rational.get();
    }

    private boolean dependsOnVariable(Formula formula) {
        return !indices.containsKey(variable) && formula.names().contains(variable);
    }
}
