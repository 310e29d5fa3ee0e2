package bubblechain.output;

import bubblechain.report.Fact;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.util.List;
import java.util.regex.Pattern;
import java.util.stream.Collectors;

/** A value as one line of text, and how it is aligned and broken. */
record Cell(String text, Kind kind) {
    private static final Pattern RATIONAL = Pattern.compile("[+-]?\\d+(?:/\\d+)?");

    enum Kind {
        /** Left, broken between words. */
        WORDS,
        /** Left, broken between terms. */
        FORMULA,
        /** Right: integers and fractions. */
        WHOLE,
        /** At the decimal point, broken between digits. */
        DECIMAL,
        /** An absent value. */
        NOTHING
    }

    static Cell of(Value value) {
        if (value instanceof Value.Numeral numeral) {
            return new Cell(numeral.decimal(), Kind.DECIMAL);
        }
        if (value instanceof Value.Exact exact) {
            String formula = PlainText.oneLine(exact.formula());
            return new Cell(formula, RATIONAL.matcher(formula).matches() ? Kind.WHOLE : Kind.FORMULA);
        }
        if (value instanceof Value.Count count) {
            return new Cell(Long.toString(count.count()), Kind.WHOLE);
        }
        if (value instanceof Value.Absent) {
            return new Cell("-", Kind.NOTHING);
        }
        return new Cell(words(value), Kind.WORDS);
    }

    private static String words(Value value) {
        if (value instanceof Value.Text text) {
            return PlainText.oneLine(text.text());
        }
        if (value instanceof Value.Flag flag) {
            return flag.set() ? "yes" : "no";
        }
        if (value instanceof Value.Listing listing) {
            return joined(listing.values(), ", ");
        }
        if (value instanceof Value.Group group) {
            return group.facts().facts().stream()
                    .filter(fact -> !(fact.value() instanceof Value.Absent))
                    .map(Cell::labelled)
                    .collect(Collectors.joining(", "));
        }
        if (value instanceof Value.Rows rows) {
            Table table = rows.table();
            return table.rows().stream().map(row -> "(" + joined(row, ", ") + ")").collect(Collectors.joining(" "));
        }
        return of(value).text();
    }

    private static String joined(List<Value> values, String separator) {
        return values.stream().map(value -> of(value).text()).collect(Collectors.joining(separator));
    }

    private static String labelled(Fact fact) {
        return PlainText.oneLine(fact.label() + " " + of(fact.value()).text() + " " + fact.unit());
    }

    /** Columns taken by an unbroken line. */
    int width() {
        return Wrapping.width(text);
    }

    /** Characters before the decimal point; all of them if there is none. */
    int beforePoint() {
        if (kind != Kind.DECIMAL) {
            return text.length();
        }
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            if (c == '.' || c == 'e' || c == 'E') {
                return i;
            }
        }
        return text.length();
    }

    /** The text in lines of at most that width. */
    List<String> wrapped(int width) {
        return switch (kind) {
            case WORDS, NOTHING -> Wrapping.words(text, width);
            case FORMULA -> Wrapping.formula(text, width);
            case WHOLE, DECIMAL -> Wrapping.digits(text, width, width);
        };
    }
}
