package bubblechain.formula;

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
            List<Formula> arguments =
                    c.arguments().stream().map(a -> apply(a, values)).toList();
            return new Formula.Call(c.function(), arguments, c.span());
        }
        if (formula instanceof Formula.FiniteSum s) {
            Map<String, Formula> inner = new HashMap<>(values);
            inner.remove(s.index());
            return new Formula.FiniteSum(
                    s.index(), apply(s.from(), values), apply(s.to(), values), apply(s.body(), inner), s.span());
        }
        return formula;
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
            c.arguments().forEach(a -> collectNames(a, bound, found));
        } else if (formula instanceof Formula.FiniteSum s) {
            collectNames(s.from(), bound, found);
            collectNames(s.to(), bound, found);
            Set<String> inner = new HashSet<>(bound);
            inner.add(s.index());
            collectNames(s.body(), inner, found);
        }
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
            children = c.arguments().stream().mapToLong(a -> size(a, sizes)).sum();
        } else if (formula instanceof Formula.FiniteSum s) {
            children = size(s.from(), sizes) + size(s.to(), sizes) + size(s.body(), sizes);
        } else {
            children = 0;
        }
        return Math.min(1 + children, Integer.MAX_VALUE);
    }
}
