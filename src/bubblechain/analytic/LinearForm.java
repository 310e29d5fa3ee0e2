package bubblechain.analytic;

import bubblechain.exact.ExactConstant;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * A formula constant + sum slope_v v in the variables, with exact coefficients.
 *
 * @param constant the value where all variables are zero
 * @param slopes   the coefficients that are not zero, by variable
 */
record LinearForm(ExactConstant constant, Map<String, ExactConstant> slopes) {
    LinearForm {
        slopes = Map.copyOf(slopes);
    }

    /** The formula as a linear form, if it is plainly one: sums, and products and quotients with constants. */
    static Optional<LinearForm> of(Formula formula, Set<String> variables, Map<String, ExactConstant> indices) {
        if (formula.names().stream().noneMatch(name -> variables.contains(name) && !indices.containsKey(name))) {
            return Optional.of(new LinearForm(ConstantValue.of(formula, indices), Map.of()));
        }
        if (formula instanceof Formula.Name n) {
            return Optional.of(new LinearForm(ExactConstant.ZERO, Map.of(n.name(), ExactConstant.ONE)));
        }
        if (formula instanceof Formula.Negation n) {
            return of(n.operand(), variables, indices).map(form -> form.times(ExactConstant.of(-1)));
        }
        if (!(formula instanceof Formula.Binary b) || b.operator() == Formula.Operator.POWER) {
            return Optional.empty();
        }
        Optional<LinearForm> left = of(b.left(), variables, indices);
        Optional<LinearForm> right = left.isEmpty() ? left : of(b.right(), variables, indices);
        return right.isEmpty() ? right : left.get().combined(b.operator(), right.get());
    }

    private Optional<LinearForm> combined(Formula.Operator operator, LinearForm right) {
        return switch (operator) {
            case ADD -> Optional.of(plus(right));
            case SUBTRACT -> Optional.of(plus(right.times(ExactConstant.of(-1))));
            case MULTIPLY -> slopes.isEmpty()
                    ? Optional.of(right.times(constant))
                    : right.slopes.isEmpty() ? Optional.of(times(right.constant)) : Optional.empty();
            case DIVIDE -> right.slopes.isEmpty() ? Optional.of(times(right.constant.inverse())) : Optional.empty();
            case POWER -> Optional.empty();
        };
    }

    private LinearForm times(ExactConstant factor) {
        Map<String, ExactConstant> scaled = new HashMap<>();
        slopes.forEach((name, slope) -> scaled.put(name, slope.multiply(factor)));
        scaled.values().removeIf(ExactConstant::isZero);
        return new LinearForm(constant.multiply(factor), scaled);
    }

    private LinearForm plus(LinearForm other) {
        Map<String, ExactConstant> sum = new HashMap<>(slopes);
        other.slopes.forEach((name, slope) -> sum.merge(name, slope, ExactConstant::add));
        sum.values().removeIf(ExactConstant::isZero);
        return new LinearForm(constant.add(other.constant), sum);
    }
}
