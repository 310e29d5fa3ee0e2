package bubblechain.formula;

import bubblechain.exact.Rational;
import java.util.List;

/** Partial derivatives of a tree. Zeros are not written out, so that what does not depend on the variable costs nothing. */
final class Derivative {
    private final String variable;

    private Derivative(String variable) {
        this.variable = variable;
    }

    static Formula of(Formula formula, String variable) {
        return new Derivative(variable).derivative(formula);
    }

    private Formula derivative(Formula formula) {
        if (!formula.names().contains(variable)) {
            return number(Rational.ZERO, formula);
        }
        if (formula instanceof Formula.Negation n) {
            return new Formula.Negation(derivative(n.operand()), n.span());
        }
        if (formula instanceof Formula.Binary b) {
            return binary(b);
        }
        if (formula instanceof Formula.Call c) {
            return times(outer(c), derivative(last(c)));
        }
        if (formula instanceof Formula.FiniteSum s) {
            return new Formula.FiniteSum(s.index(), s.from(), s.to(), derivative(s.body()), s.span());
        }
        return number(Rational.ONE, formula);
    }

    private Formula binary(Formula.Binary b) {
        return switch (b.operator()) {
            case ADD, SUBTRACT -> sum(b.operator(), derivative(b.left()), derivative(b.right()), b);
            case MULTIPLY -> sum(
                    Formula.Operator.ADD, times(derivative(b.left()), b.right()), times(b.left(), derivative(b.right())), b);
            case DIVIDE -> over(
                    sum(Formula.Operator.SUBTRACT, derivative(b.left()), times(over(b.left(), b.right()), derivative(b.right())), b),
                    b.right());
            case POWER -> power(b);
        };
    }

    /** n f^(n-1) f' for an exponent without the variable, else f^g (g ln f)'. */
    private Formula power(Formula.Binary b) {
        if (!b.right().names().contains(variable)) {
            Formula less = join(Formula.Operator.SUBTRACT, b.right(), number(Rational.ONE, b));
            return times(times(b.right(), join(Formula.Operator.POWER, b.left(), less)), derivative(b.left()));
        }
        Formula logarithm = call(Function.LN, List.of(b.left()), b);
        return times(b, derivative(times(b.right(), logarithm)));
    }

    /** The derivative of a function at its argument. */
    private static Formula outer(Formula.Call c) {
        Formula x = last(c);
        return switch (c.function()) {
            case GAMMA -> times(c, call(Function.DIGAMMA, List.of(x), c));
            case DIGAMMA -> call(Function.POLYGAMMA, List.of(number(Rational.ONE, c), x), c);
            case POLYGAMMA, UNIT_3F2 -> call(c.function(), List.of(next(c), x), c);
            case LN -> over(number(Rational.ONE, c), x);
            case SQRT -> over(number(Rational.HALF, c), c);
            case EXP -> c;
            case SIN -> call(Function.COS, List.of(x), c);
            case COS -> new Formula.Negation(call(Function.SIN, List.of(x), c), c.span());
            case ZETA, POLYLOG -> throw FormulaException.at(
                    c.span(), c.function().text() + " needs a constant argument");
        };
    }

    private static Formula next(Formula.Call c) {
        return join(Formula.Operator.ADD, c.arguments().get(0), number(Rational.ONE, c));
    }

    private static Formula last(Formula.Call c) {
        return c.arguments().get(c.arguments().size() - 1);
    }

    private static Formula sum(Formula.Operator operator, Formula left, Formula right, Formula place) {
        if (isZero(right)) {
            return left;
        }
        if (isZero(left)) {
            return operator == Formula.Operator.ADD ? right : new Formula.Negation(right, place.span());
        }
        return new Formula.Binary(operator, left, right, place.span());
    }

    private static Formula times(Formula left, Formula right) {
        if (isZero(left) || isZero(right)) {
            return number(Rational.ZERO, left);
        }
        return isNumber(right, Rational.ONE) ? left : isNumber(left, Rational.ONE) ? right : join(Formula.Operator.MULTIPLY, left, right);
    }

    private static Formula over(Formula left, Formula right) {
        return isZero(left) ? left : join(Formula.Operator.DIVIDE, left, right);
    }

    private static Formula join(Formula.Operator operator, Formula left, Formula right) {
        return new Formula.Binary(operator, left, right, left.span());
    }

    private static Formula call(Function function, List<Formula> arguments, Formula place) {
        return new Formula.Call(function, arguments, place.span());
    }

    private static Formula number(Rational value, Formula place) {
        return new Formula.Literal(value, place.span());
    }

    private static boolean isZero(Formula formula) {
        return isNumber(formula, Rational.ZERO);
    }

    private static boolean isNumber(Formula formula, Rational value) {
        return formula instanceof Formula.Literal l && l.value().equals(value);
    }
}
