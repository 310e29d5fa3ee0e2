package bubblechain.formula;

import bubblechain.exact.Rational;

/**
 * Zeros, ones and double signs taken out of a tree that came from a substitution. A product with zero goes only if the other
 * factor is a polynomial: 0*gamma(0) must stay what it is, an error.
 */
final class Simplification {
    private Simplification() {}

    static Formula of(Formula formula) {
        if (formula instanceof Formula.Negation n) {
            return negated(of(n.operand()), n);
        }
        if (formula instanceof Formula.Binary b) {
            return binary(b.operator(), of(b.left()), of(b.right()), b);
        }
        if (formula instanceof Formula.Call c) {
            Formula.Call simple = new Formula.Call(
                    c.function(), c.arguments().stream().map(Simplification::of).toList(), c.span());
            boolean one = c.function() == Function.GAMMA && isNumber(simple.arguments().get(0), Rational.ONE);
            return one ? simple.arguments().get(0) : simple;
        }
        if (formula instanceof Formula.FiniteSum s) {
            return new Formula.FiniteSum(s.index(), s.from(), s.to(), of(s.body()), s.span());
        }
        return formula;
    }

    private static Formula negated(Formula operand, Formula place) {
        if (operand instanceof Formula.Negation n) {
            return n.operand();
        }
        return isNumber(operand, Rational.ZERO) ? operand : new Formula.Negation(operand, place.span());
    }

    private static Formula binary(Formula.Operator operator, Formula left, Formula right, Formula place) {
        return switch (operator) {
            case ADD -> sum(left, right, place);
            case SUBTRACT -> sum(left, negated(right, place), place);
            case MULTIPLY, DIVIDE -> signed(operator, left, right, place);
            case POWER -> power(left, right, place);
        };
    }

    private static Formula sum(Formula left, Formula right, Formula place) {
        if (isNumber(left, Rational.ZERO)) {
            return right;
        }
        if (isNumber(right, Rational.ZERO)) {
            return left;
        }
        return right instanceof Formula.Negation n
                ? new Formula.Binary(Formula.Operator.SUBTRACT, left, n.operand(), place.span())
                : new Formula.Binary(Formula.Operator.ADD, left, right, place.span());
    }

    /** A product or quotient, its sign in front of it. */
    private static Formula signed(Formula.Operator operator, Formula left, Formula right, Formula place) {
        if (left instanceof Formula.Negation n) {
            return negated(signed(operator, n.operand(), right, place), place);
        }
        if (right instanceof Formula.Negation n) {
            return negated(signed(operator, left, n.operand(), place), place);
        }
        if (isNumber(right, Rational.ONE)) {
            return left;
        }
        if (operator == Formula.Operator.MULTIPLY) {
            if (isNumber(left, Rational.ONE) || isNumber(right, Rational.ZERO) && isPolynomial(left)) {
                return right;
            }
            if (isNumber(left, Rational.ZERO) && isPolynomial(right)) {
                return left;
            }
        }
        return new Formula.Binary(operator, left, right, place.span());
    }

    private static Formula power(Formula base, Formula exponent, Formula place) {
        boolean positive = exponent instanceof Formula.Literal n && n.value().isInteger() && n.value().signum() > 0;
        if (positive && (isNumber(base, Rational.ZERO) || isNumber(exponent, Rational.ONE))) {
            return base;
        }
        if (positive && base instanceof Formula.Negation n) {
            Formula size = new Formula.Binary(Formula.Operator.POWER, n.operand(), exponent, place.span());
            boolean even = !((Formula.Literal) exponent).value().numerator().testBit(0);
            return even ? size : new Formula.Negation(size, place.span());
        }
        return new Formula.Binary(Formula.Operator.POWER, base, exponent, place.span());
    }

    private static boolean isPolynomial(Formula formula) {
        if (formula instanceof Formula.Negation n) {
            return isPolynomial(n.operand());
        }
        if (formula instanceof Formula.Binary b) {
            return switch (b.operator()) {
                case ADD, SUBTRACT, MULTIPLY -> isPolynomial(b.left()) && isPolynomial(b.right());
                case POWER -> isPolynomial(b.left())
                        && b.right() instanceof Formula.Literal n && n.value().isInteger() && n.value().signum() > 0;
                case DIVIDE -> false;
            };
        }
        return formula instanceof Formula.Literal || formula instanceof Formula.Name;
    }

    private static boolean isNumber(Formula formula, Rational value) {
        return formula instanceof Formula.Literal l && l.value().equals(value);
    }
}
