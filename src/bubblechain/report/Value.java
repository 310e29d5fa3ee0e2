package bubblechain.report;

import java.util.List;
import java.util.Optional;

/** What stands in a cell or behind a label. Numbers are texts whose digits have been decided by their maker. */
public sealed interface Value {
    /** Words, a name, a formula with free symbols. JSON: a string. */
    record Text(String text) implements Value {}

    /**
     * A decimal number such as "-0.25", "1.5e-12"; every digit is meant. JSON: a string, so that no reader rounds it.
     *
     * @throws IllegalArgumentException if the text is not a decimal number
     */
    record Numeral(String decimal) implements Value {
        public Numeral {
            if (!isDecimal(decimal)) {
                throw new IllegalArgumentException("'" + decimal + "' is not a decimal number");
            }
        }

        /** Sign, digits, point and digits, e and signed digits; written out because lists may have millions of digits. */
        private static boolean isDecimal(String text) {
            int at = digits(text, sign(text, 0));
            if (at > 0 && at < text.length() && text.charAt(at) == '.') {
                at = digits(text, at + 1);
            }
            if (at > 0 && at < text.length() && (text.charAt(at) == 'e' || text.charAt(at) == 'E')) {
                at = digits(text, sign(text, at + 1));
            }
            return at == text.length() && at > 0;
        }

        private static int sign(String text, int at) {
            return at < text.length() && (text.charAt(at) == '+' || text.charAt(at) == '-') ? at + 1 : at;
        }

        /** The end of a run of digits; -1 if there is none. */
        private static int digits(String text, int from) {
            int at = from;
            while (at < text.length() && text.charAt(at) >= '0' && text.charAt(at) <= '9') {
                at++;
            }
            return at > from ? at : -1;
        }
    }

    /** An exact number in the formula language, such as "1/2" or "-3*zeta(3)/4 + pi^2". JSON: a string. */
    record Exact(String formula) implements Value {
        public Exact {
            if (formula.isBlank()) {
                throw new IllegalArgumentException("an exact number needs a formula");
            }
        }
    }

    /** A small integer: an order, a number of loops, a power. JSON: an integer. */
    record Count(long count) implements Value {}

    /** Yes or no. JSON: true or false. */
    record Flag(boolean set) implements Value {}

    /** A table inside a cell. JSON: an array of objects; the table's own key is not used. */
    record Rows(Table table) implements Value {}

    /** Several values in order. JSON: an array, in which an absent entry is null. */
    record Listing(List<Value> values) implements Value {
        public Listing {
            values = List.copyOf(values);
        }
    }

    /** Named values inside a cell. JSON: an object; the group's own key is not used. */
    record Group(Facts facts) implements Value {}

    /** Nothing: left out of JSON objects, an empty cell in CSV. */
    enum Absent implements Value {
        ABSENT
    }

    static Value text(String text) {
        return new Text(text);
    }

    static Value numeral(String decimal) {
        return new Numeral(decimal);
    }

    static Value exact(String formula) {
        return new Exact(formula);
    }

    static Value count(long count) {
        return new Count(count);
    }

    static Value flag(boolean set) {
        return new Flag(set);
    }

    static Value rows(Table table) {
        return new Rows(table);
    }

    static Value listing(List<? extends Value> values) {
        return new Listing(List.copyOf(values));
    }

    static Value listing(Value... values) {
        return new Listing(List.of(values));
    }

    static Value group(Facts facts) {
        return new Group(facts);
    }

    static Value absent() {
        return Absent.ABSENT;
    }

    /** The value, or absent. */
    static Value orAbsent(Optional<? extends Value> value) {
        return value.isPresent() ? value.get() : Absent.ABSENT;
    }
}
