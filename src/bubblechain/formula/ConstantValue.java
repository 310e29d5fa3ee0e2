package bubblechain.formula;

import bubblechain.exact.ConstantFunctions;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.exact.UnitHypergeometric;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The value of a formula without free variables, as an {@link ExactConstant}: canonical where a canonical form is
 * known, opaque (known by its balls) otherwise.
 */
public final class ConstantValue {
    private static final Rational LARGEST_ARGUMENT = Rational.of(10_000);

    private static final int LARGEST_SUM = 5_000;

    private final Map<String, ExactConstant> values;
    private final EvaluationSteps steps;

    private ConstantValue(Map<String, ExactConstant> values, EvaluationSteps steps) {
        this.values = values;
        this.steps = steps;
    }

    /** The value of a constant. @throws FormulaException if a name has no value or a function is out of its range */
    public static ExactConstant of(Formula formula) {
        return of(formula, Map.of());
    }

    /** The value with given numbers for some names. */
    public static ExactConstant of(Formula formula, Map<String, ExactConstant> values) {
        return of(formula, values, new EvaluationSteps());
    }

    /** The value with given numbers for some names, counted with the other constants of a formula. */
    public static ExactConstant of(Formula formula, Map<String, ExactConstant> values, EvaluationSteps steps) {
        return new ConstantValue(values, steps).value(formula);
    }

    /** The integer a formula stands for, such as the order of a polygamma or the end of a sum. */
    public static int integer(Formula formula, Map<String, ExactConstant> values, String what) {
        Optional<Rational> value = of(formula, values).asRational();
        if (value.isEmpty() || !value.get().isInteger() || value.get().abs().compareTo(LARGEST_ARGUMENT) > 0) {
            throw FormulaException.at(formula.span(), what + " must be an integer of at most " + LARGEST_ARGUMENT);
        }
        return value.get().intValueExact();
    }

    /** The order of a polygamma, from 0 to 1000. */
    public static int polygammaOrder(Formula formula, Map<String, ExactConstant> values) {
        int n = integer(formula, values, "the order of a polygamma");
        if (n < 0 || n > ConstantFunctions.LARGEST_ORDER) {
            throw FormulaException.at(
                    formula.span(), "the order of a polygamma lies between 0 and " + ConstantFunctions.LARGEST_ORDER);
        }
        return n;
    }

    /** The order of a derivative of unit_3f2, from 0 to 100. */
    public static int unit3f2Order(Formula formula, Map<String, ExactConstant> values) {
        int n = integer(formula, values, "the order of a derivative of unit_3f2");
        if (n < 0 || n > UnitHypergeometric.LARGEST_ORDER) {
            throw FormulaException.at(formula.span(), "the order of a derivative of unit_3f2 lies between 0 and "
                    + UnitHypergeometric.LARGEST_ORDER);
        }
        return n;
    }

    private ExactConstant value(Formula formula) {
        steps.visit(formula);
        try {
            ExactConstant value = unchecked(formula);
            steps.value(value, formula);
            if (value.size() > LARGEST_SUM) {
                throw FormulaException.at(
                        formula.span(), "a constant of " + value.size() + " terms; the limit is " + LARGEST_SUM);
            }
            return value;
        } catch (FormulaException alreadyPlaced) {
            throw alreadyPlaced;
        } catch (ArithmeticException | DomainException e) {
            throw FormulaException.at(formula.span(), String.valueOf(e.getMessage()));
        }
    }

    private ExactConstant unchecked(Formula formula) {
        if (formula instanceof Formula.Literal l) {
            return ExactConstant.of(l.value());
        }
        if (formula instanceof Formula.Name n) {
            return named(n);
        }
        if (formula instanceof Formula.Negation n) {
            return value(n.operand()).negate();
        }
        if (formula instanceof Formula.Call c) {
            return call(c);
        }
        if (formula instanceof Formula.FiniteSum s) {
            return sum(s);
        }
        Formula.Binary b = (Formula.Binary) formula;
        return switch (b.operator()) {
            case ADD -> value(b.left()).add(value(b.right()));
            case SUBTRACT -> value(b.left()).subtract(value(b.right()));
            case MULTIPLY -> product(value(b.left()), value(b.right()), b);
            case DIVIDE -> value(b.left()).multiply(value(b.right()).inverse());
            case POWER -> ConstantFunctions.power(value(b.left()), value(b.right()));
        };
    }

    private static ExactConstant product(ExactConstant left, ExactConstant right, Formula place) {
        if ((long) left.size() * right.size() > (long) LARGEST_SUM * LARGEST_SUM / 10) {
            throw FormulaException.at(
                    place.span(), "a product of sums of " + left.size() + " and " + right.size() + " terms");
        }
        return left.multiply(right);
    }

    private ExactConstant named(Formula.Name n) {
        if (values.containsKey(n.name())) {
            return values.get(n.name());
        }
        return switch (n.name()) {
            case Constants.PI -> ExactConstant.PI;
            case Constants.EULER_GAMMA -> ExactConstant.EULER_GAMMA;
            default -> throw FormulaException.at(n.span(), "the name '" + n.name() + "' has no value here");
        };
    }

    private ExactConstant sum(Formula.FiniteSum s) {
        int from = integer(s.from(), values, "the start of a sum");
        int to = integer(s.to(), values, "the end of a sum");
        if (to - from >= FormulaLimits.SUM_TERMS) {
            throw FormulaException.at(s.span(), "a sum of more than " + FormulaLimits.SUM_TERMS + " terms");
        }
        ExactConstant total = ExactConstant.ZERO;
        Map<String, ExactConstant> inner = new HashMap<>(values);
        for (int k = from; k <= to; k++) {
            inner.put(s.index(), ExactConstant.of(k));
            total = total.add(new ConstantValue(inner, steps).value(s.body()));
        }
        return total;
    }

    private ExactConstant call(Formula.Call c) {
        List<Formula> arguments = c.arguments();
        ExactConstant last = value(arguments.get(arguments.size() - 1));
        return switch (c.function()) {
            case ZETA -> ConstantFunctions.zeta(integer(arguments.get(0), values, "the argument of zeta"));
            case POLYLOG -> ConstantFunctions.polylog(integer(arguments.get(0), values, "the order of a polylog"), last);
            case POLYGAMMA -> ConstantFunctions.polygamma(polygammaOrder(arguments.get(0), values), last);
            case UNIT_3F2 -> ConstantFunctions.unit3f2(unit3f2Order(arguments.get(0), values), last);
            case GAMMA -> ConstantFunctions.gamma(last);
            case DIGAMMA -> ConstantFunctions.polygamma(0, last);
            case LN -> last.ln();
            case SQRT -> ConstantFunctions.power(last, ExactConstant.of(Rational.HALF));
            case EXP -> last.exp();
            case SIN -> ConstantFunctions.sine(last, Rational.ZERO);
            case COS -> ConstantFunctions.sine(last, Rational.HALF);
        };
    }
}
