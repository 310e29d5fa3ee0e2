package bubblechain.formula;

import java.util.stream.Collectors;

/** Prints a tree as text that parses back to the same tree. */
final class FormulaPrinter {
    private static final int NEGATION_STRENGTH = 3;
    private static final int ATOM_STRENGTH = 5;

    private FormulaPrinter() {}

    static String print(Formula formula) {
        if (formula instanceof Formula.Literal l) {
            return l.value().toString();
        }
        if (formula instanceof Formula.Name n) {
            return n.name();
        }
        if (formula instanceof Formula.Negation n) {
            return "-" + wrap(n.operand(), NEGATION_STRENGTH);
        }
        if (formula instanceof Formula.Call c) {
            return c.function().text()
                    + c.arguments().stream().map(FormulaPrinter::print).collect(Collectors.joining(", ", "(", ")"));
        }
        if (formula instanceof Formula.FiniteSum s) {
            return "sum(" + s.index() + ", " + print(s.from()) + ", " + print(s.to()) + ", " + print(s.body()) + ")";
        }
        return printBinary((Formula.Binary) formula);
    }

    private static String printBinary(Formula.Binary b) {
        int strength = b.operator().strength();
        return switch (b.operator()) {
            // a power groups to the right, and its exponent may carry a sign
            case POWER -> wrap(b.left(), ATOM_STRENGTH) + "^" + wrap(b.right(), NEGATION_STRENGTH);
            case ADD -> wrap(b.left(), strength) + " + " + wrap(b.right(), strength + 1);
            case SUBTRACT -> wrap(b.left(), strength) + " - " + wrap(b.right(), strength + 1);
            case MULTIPLY, DIVIDE -> wrap(b.left(), strength) + b.operator().text() + wrap(b.right(), strength + 1);
        };
    }

    private static String wrap(Formula formula, int needed) {
        String text = print(formula);
        return strength(formula) >= needed ? text : "(" + text + ")";
    }

    private static int strength(Formula formula) {
        if (formula instanceof Formula.Binary b) {
            return b.operator().strength();
        }
        if (formula instanceof Formula.Negation) {
            return NEGATION_STRENGTH;
        }
        if (formula instanceof Formula.Literal l && (!l.value().isInteger() || l.value().signum() < 0)) {
            return 0;
        }
        return ATOM_STRENGTH;
    }
}
