package bubblechain.formula;

import bubblechain.exact.Rational;
import java.math.BigDecimal;
import java.math.BigInteger;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/** Prints a tree as text that parses back to the same tree. */
final class FormulaPrinter {
    private static final int NEGATION_STRENGTH = 3;
    private static final int ATOM_STRENGTH = 5;
    private static final int LONGEST_PLAIN = 60;
    private static final BigInteger FIVE = BigInteger.valueOf(5);

    private FormulaPrinter() {}

    static String print(Formula formula) {
        if (formula instanceof Formula.Literal l) {
            return literal(l.value());
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
        if (formula instanceof Formula.Literal l) {
            boolean fraction = literal(l.value()).indexOf('/') >= 0;
            return fraction
                    ? Formula.Operator.DIVIDE.strength()
                    : l.value().signum() < 0 ? NEGATION_STRENGTH : ATOM_STRENGTH;
        }
        return ATOM_STRENGTH;
    }

    /** A decimal where the number is one, so that it reads back as one number; else a fraction. */
    private static String literal(Rational value) {
        if (!isDecimal(value.denominator())) {
            return value.toString();
        }
        BigDecimal decimal = new BigDecimal(value.numerator()).divide(new BigDecimal(value.denominator()));
        String plain = decimal.stripTrailingZeros().toPlainString();
        return plain.length() <= LONGEST_PLAIN ? plain : decimal.stripTrailingZeros().toString();
    }

    /** True for 2^i 5^j. */
    private static boolean isDecimal(BigInteger denominator) {
        BigInteger odd = denominator.shiftRight(denominator.getLowestSetBit());
        int power = (int) Math.round((odd.bitLength() - 0.5) / (Math.log(5) / Math.log(2)));
        return IntStream.rangeClosed(Math.max(0, power - 1), power + 1)
                .anyMatch(k -> FIVE.pow(k).equals(odd));
    }
}
