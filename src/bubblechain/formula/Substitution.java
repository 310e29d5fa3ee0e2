package bubblechain.formula;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/** Replacing names in a tree, and counting how large the result would be before doing so. */
final class Substitution {
    private Substitution() {}

    static Formula apply(Formula formula, Map<String, Formula> values) {
        if (values.isEmpty()) {
            return formula;
        }
        if (formula instanceof Formula.Name n) {
            return values.getOrDefault(n.name(), n);
        }
        if (formula instanceof Formula.Negation n) {
            return new Formula.Negation(apply(n.operand(), values), n.span());
        }
        if (formula instanceof Formula.Binary b) {
            return new Formula.Binary(b.operator(), apply(b.left(), values), apply(b.right(), values), b.span());
        }
        if (formula instanceof Formula.Call c) {
            List<Formula> arguments = new ArrayList<>();
            for (Formula argument : c.arguments()) {
                arguments.add(apply(argument, values));
            }
            return new Formula.Call(c.function(), arguments, c.span());
        }
        if (formula instanceof Formula.FiniteSum s) {
            return applyToSum(s, values);
        }
        return formula;
    }

    /** The index hides an outer name, and is renamed if a formula that enters the body means another thing by it. */
    private static Formula applyToSum(Formula.FiniteSum s, Map<String, Formula> values) {
        Map<String, Formula> inner = new HashMap<>(values);
        inner.remove(s.index());
        Set<String> used = new HashSet<>();
        collectNames(s.body(), Set.of(), used);
        inner.keySet().retainAll(used);
        Set<String> entering = new HashSet<>();
        inner.values().forEach(value -> collectNames(value, Set.of(), entering));
        String index = s.index();
        if (entering.contains(index)) {
            while (entering.contains(index) || used.contains(index) || values.containsKey(index)) {
                index += "_";
            }
            inner.put(s.index(), new Formula.Name(index, s.span()));
        }
        return new Formula.FiniteSum(
                index, apply(s.from(), values), apply(s.to(), values), apply(s.body(), inner), s.span());
    }

    static void collectNames(Formula formula, Set<String> bound, Set<String> found) {
        if (formula instanceof Formula.Name n && !bound.contains(n.name())) {
            found.add(n.name());
        } else if (formula instanceof Formula.Negation n) {
            collectNames(n.operand(), bound, found);
        } else if (formula instanceof Formula.Binary b) {
            collectNames(b.left(), bound, found);
            collectNames(b.right(), bound, found);
        } else if (formula instanceof Formula.Call c) {
            for (Formula argument : c.arguments()) {
                collectNames(argument, bound, found);
            }
        } else if (formula instanceof Formula.FiniteSum s) {
            collectNames(s.from(), bound, found);
            collectNames(s.to(), bound, found);
            Set<String> inner = new HashSet<>(bound);
            inner.add(s.index());
            collectNames(s.body(), inner, found);
        }
    }

    private record Level(Formula formula, int depth) {}

    /**
     * Refuses a tree so deep that walking it would exhaust the stack; names count with the height given for them.
     *
     * @return the height of the tree
     */
    static int requireShallow(Formula formula, Map<String, Integer> heights) {
        int height = 0;
        Deque<Level> open = new ArrayDeque<>(List.of(new Level(formula, 1)));
        while (!open.isEmpty()) {
            Level level = open.pop();
            int below = level.formula() instanceof Formula.Name n ? heights.getOrDefault(n.name(), 1) - 1 : 0;
            height = Math.max(height, level.depth() + below);
            for (Formula child : children(level.formula())) {
                open.push(new Level(child, level.depth() + 1));
            }
        }
        if (height > FormulaLimits.HEIGHT) {
            throw FormulaException.at(
                    formula.span(),
                    "too long a chain of operations (" + height + " levels; the limit is " + FormulaLimits.HEIGHT
                            + "); group the terms with parentheses or use sum(k, 1, n, ...)");
        }
        return height;
    }

    private static List<Formula> children(Formula formula) {
        if (formula instanceof Formula.Negation n) {
            return List.of(n.operand());
        } else if (formula instanceof Formula.Binary b) {
            return List.of(b.left(), b.right());
        } else if (formula instanceof Formula.Call c) {
            return c.arguments();
        } else if (formula instanceof Formula.FiniteSum s) {
            return List.of(s.from(), s.to(), s.body());
        }
        return List.of();
    }

    /** Number of nodes after every name with a known size is written out; saturates. */
    static long size(Formula formula, Map<String, Long> sizes) {
        long children;
        if (formula instanceof Formula.Name n) {
            return sizes.getOrDefault(n.name(), 1L);
        } else if (formula instanceof Formula.Negation n) {
            children = size(n.operand(), sizes);
        } else if (formula instanceof Formula.Binary b) {
            children = size(b.left(), sizes) + size(b.right(), sizes);
        } else if (formula instanceof Formula.Call c) {
            children = 0;
            for (Formula argument : c.arguments()) {
                children += size(argument, sizes);
            }
        } else if (formula instanceof Formula.FiniteSum s) {
            children = size(s.from(), sizes) + size(s.to(), sizes) + size(s.body(), sizes);
        } else {
            children = 0;
        }
        return Math.min(1 + children, Integer.MAX_VALUE);
    }
}
