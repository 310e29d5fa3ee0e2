package bubblechain.formula;

import bubblechain.exact.Rational;
import java.util.List;
import java.util.Random;

/** Seeded random trees with every kind of node. */
final class RandomFormulas {
    private static final Span NOWHERE = new Span("", 0, 0);
    private static final List<String> NAMES = List.of("u", "eps", "pi", "euler_gamma", "k", "N_c");

    private final Random random;

    RandomFormulas(int seed) {
        random = new Random(seed);
    }

    Formula next(int depth) {
        int kind = depth == 0 ? random.nextInt(2) : random.nextInt(9);
        return switch (kind) {
            case 0 -> literal();
            case 1 -> new Formula.Name(NAMES.get(random.nextInt(NAMES.size())), NOWHERE);
            case 2 -> new Formula.Negation(next(depth - 1), NOWHERE);
            case 3 -> call(depth);
            case 4 -> new Formula.FiniteSum("k", next(0), next(0), next(depth - 1), NOWHERE);
            default -> {
                Formula.Operator[] operators = Formula.Operator.values();
                yield new Formula.Binary(
                        operators[random.nextInt(operators.length)], next(depth - 1), next(depth - 1), NOWHERE);
            }
        };
    }

    private Formula literal() {
        // what can be written: integers and decimals, not negative
        long[] denominators = {1, 1, 1, 2, 10, 125, 1_000_000};
        return new Formula.Literal(
                Rational.of(random.nextInt(2_000), denominators[random.nextInt(denominators.length)]), NOWHERE);
    }

    private Formula call(int depth) {
        Function function = Function.values()[random.nextInt(Function.values().length)];
        Formula last = next(depth - 1);
        return new Formula.Call(function, function.arity() == 1 ? List.of(last) : List.of(next(0), last), NOWHERE);
    }
}
