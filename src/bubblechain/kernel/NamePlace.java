package bubblechain.kernel;

import bubblechain.formula.Formula;
import bubblechain.formula.Span;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/** Where a name stands in a formula, to underline it. */
final class NamePlace {
    private NamePlace() {}

    /** The first free occurrence of a name. */
    static Optional<Span> of(String name, Formula formula) {
        if (formula instanceof Formula.Name n && n.name().equals(name)) {
            return Optional.of(n.span());
        }
        return parts(name, formula).map(part -> of(name, part)).flatMap(Optional::stream).findFirst();
    }

    private static Stream<Formula> parts(String name, Formula formula) {
        if (formula instanceof Formula.Negation n) {
            return Stream.of(n.operand());
        }
        if (formula instanceof Formula.Binary b) {
            return Stream.of(b.left(), b.right());
        }
        if (formula instanceof Formula.Call c) {
            return c.arguments().stream();
        }
        if (formula instanceof Formula.FiniteSum s) {
            List<Formula> bounds = List.of(s.from(), s.to());
            return s.index().equals(name) ? bounds.stream() : Stream.concat(bounds.stream(), Stream.of(s.body()));
        }
        return Stream.empty();
    }
}
