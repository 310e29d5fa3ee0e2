package bubblechain.exact;

import java.math.BigInteger;
import java.util.ArrayList;
import java.util.List;
import java.util.function.BiFunction;
import java.util.function.BinaryOperator;
import java.util.function.Function;

/**
 * Steps by one of {@link UnitHypergeometric} and its derivatives, for any kind of value. With z = c + slope x,
 *
 * <p>W(z) = W(z+1) [1/4 + (1/8)/(z-1/2)] + (3/2) [1/(z-1/2) - 1/z], W(z) = W(z-1) [4 - 2/(z-1)] - 3/(z-1)^2,
 *
 * <p>and the derivatives in z by the rule of Leibniz.
 *
 * @param <S> numbers or functions of x
 */
public final class UnitRecurrence<S> {
    private final BinaryOperator<S> add;
    private final BinaryOperator<S> multiply;
    private final Function<Rational, S> constant;
    private final BiFunction<Rational, Integer, S> inversePower;

    /** @param inversePower (c, k) to (c + slope x)^(-k) */
    public UnitRecurrence(
            BinaryOperator<S> add,
            BinaryOperator<S> multiply,
            Function<Rational, S> constant,
            BiFunction<Rational, Integer, S> inversePower) {
        this.add = add;
        this.multiply = multiply;
        this.constant = constant;
        this.inversePower = inversePower;
    }

    /**
     * W, W', ..., W^(n) at c + steps.
     *
     * @param values the same at c
     * @param steps  any integer
     */
    public List<S> from(List<S> values, Rational c, int steps) {
        List<S> result = values;
        for (int j = 0; j < steps; j++) {
            result = up(result, c.add(j));
        }
        for (int j = 1; j <= -steps; j++) {
            result = down(result, c.subtract(j));
        }
        return result;
    }

    /** From z to z + 1. */
    private List<S> up(List<S> values, Rational z) {
        List<S> factors = new ArrayList<>();
        List<S> rest = new ArrayList<>();
        for (int i = 0; i < values.size(); i++) {
            Rational weight = signedFactorial(i);
            S factor = scaled(inversePower.apply(z, i + 1), weight.multiply(-2));
            factors.add(i == 0 ? add.apply(constant.apply(Rational.of(4)), factor) : factor);
            rest.add(scaled(inversePower.apply(z, i + 2), weight.multiply(-3L * (i + 1))));
        }
        return leibniz(factors, values, rest);
    }

    /** From z + 1 to z. */
    private List<S> down(List<S> values, Rational z) {
        List<S> factors = new ArrayList<>();
        List<S> rest = new ArrayList<>();
        Rational half = z.subtract(Rational.HALF);
        for (int i = 0; i < values.size(); i++) {
            Rational weight = signedFactorial(i);
            S pole = inversePower.apply(half, i + 1);
            S factor = scaled(pole, weight.divide(8));
            factors.add(i == 0 ? add.apply(constant.apply(Rational.of(1, 4)), factor) : factor);
            Rational large = weight.multiply(Rational.of(3, 2));
            rest.add(add.apply(scaled(pole, large), scaled(inversePower.apply(z, i + 1), large.negate())));
        }
        return leibniz(factors, values, rest);
    }

    private static Rational signedFactorial(int i) {
        BigInteger factorial = ExactFunctions.factorial(i);
        return Rational.of(i % 2 == 0 ? factorial : factorial.negate());
    }

    private S scaled(S value, Rational factor) {
        return multiply.apply(value, constant.apply(factor));
    }

    private List<S> leibniz(List<S> factors, List<S> values, List<S> rest) {
        List<S> result = new ArrayList<>();
        for (int i = 0; i < values.size(); i++) {
            S sum = rest.get(i);
            Rational binomial = Rational.ONE;
            for (int j = 0; j <= i; j++) {
                sum = add.apply(sum, scaled(multiply.apply(factors.get(i - j), values.get(j)), binomial));
                binomial = binomial.multiply(i - j).divide(j + 1);
            }
            result.add(sum);
        }
        return result;
    }
}
