package bubblechain.toml;

import bubblechain.exact.DomainException;
import bubblechain.exact.Rational;
import bubblechain.formula.Formula;
import bubblechain.formula.FormulaException;
import bubblechain.report.NearestNames;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import org.jspecify.annotations.Nullable;
import org.tomlj.TomlArray;
import org.tomlj.TomlPosition;
import org.tomlj.TomlTable;

/** A table of a file whose entries are texts; every complaint names file, line and column. */
public final class TomlSection {
    private final String file;
    private final String section;
    private final TomlTable table;
    private final TomlPosition start;

    TomlSection(String file, String section, TomlTable table, TomlPosition start) {
        this.file = file;
        this.section = section;
        this.table = table;
        this.start = start;
    }

    /** The name of the file, as messages show it. */
    public String file() {
        return file;
    }

    public Set<String> keys() {
        return table.keySet();
    }

    /** Refuses any key that is not one of {@code known}, naming the nearest of them. */
    public void requireKnown(List<String> known) {
        for (String key : table.keySet()) {
            if (!known.contains(key)) {
                List<String> nearest = NearestNames.of(key, known);
                String hint = nearest.isEmpty()
                        ? "allowed are " + String.join(", ", known)
                        : "did you mean " + nearest.get(0) + "?";
                throw error(key, "unknown key '" + key + "' " + section + "; " + hint);
            }
        }
    }

    /** A complaint about a key of this table, with its place. */
    public TomlException error(String key, String reason) {
        @Nullable TomlPosition position = table.inputPositionOf(List.of(key));
        return at(position == null ? start : position, reason);
    }

    private TomlException at(TomlPosition position, String reason) {
        return new TomlException(place(position) + ": " + reason);
    }

    private String place(TomlPosition position) {
        return file + ", line " + position.line() + ", column " + position.column();
    }

    /** The text of a key. @throws TomlException if it is missing or not a string */
    public String text(String key) {
        return optionalText(key).orElseThrow(() -> at(start, "the key '" + key + "' is missing " + section));
    }

    public Optional<String> optionalText(String key) {
        @Nullable Object value = table.get(List.of(key));
        return value == null ? Optional.empty() : Optional.of(asText(key, value));
    }

    private String asText(String key, Object value) {
        if (value instanceof String text) {
            return text;
        }
        if (value instanceof Long || value instanceof Double) {
            throw error(key, "numbers are written as strings so that they stay exact: " + key + " = \"" + value + "\"");
        }
        throw error(key, "'" + key + "' must be a string");
    }

    /** A list of strings, empty if the key is absent. */
    public List<String> texts(String key) {
        @Nullable Object value = table.get(List.of(key));
        if (value == null) {
            return List.of();
        }
        if (!(value instanceof TomlArray array)) {
            throw error(key, "'" + key + "' must be a list of strings: " + key + " = [\"...\"]");
        }
        List<String> result = new ArrayList<>();
        for (Object entry : array.toList()) {
            result.add(asText(key, entry));
        }
        return result;
    }

    /** The tables [[key]], empty if the key is absent. */
    public List<TomlSection> tables(String key) {
        @Nullable Object value = table.get(List.of(key));
        if (value == null) {
            return List.of();
        }
        if (!(value instanceof TomlArray array)) {
            throw error(key, "'" + key + "' must be a list of tables: [[" + key + "]]");
        }
        List<TomlSection> result = new ArrayList<>();
        for (int k = 0; k < array.size(); k++) {
            if (!(array.get(k) instanceof TomlTable entry)) {
                throw error(key, "'" + key + "' must be a list of tables: [[" + key + "]]");
            }
            result.add(new TomlSection(file, "in [[" + key + "]]", entry, array.inputPositionOf(k)));
        }
        return result;
    }

    /** The table [key], if there is one. */
    public Optional<TomlSection> optionalTable(String key) {
        @Nullable Object value = table.get(List.of(key));
        if (value == null) {
            return Optional.empty();
        }
        if (!(value instanceof TomlTable inner)) {
            throw error(key, "'" + key + "' must be a table: [" + key + "]");
        }
        @Nullable TomlPosition position = table.inputPositionOf(List.of(key));
        return Optional.of(new TomlSection(file, "in [" + key + "]", inner, position == null ? start : position));
    }

    /** An exact rational number written as a string. */
    public Rational rational(String key) {
        String text = text(key);
        try {
            return Rational.parse(text);
        } catch (DomainException e) {
            throw rethrown(key, String.valueOf(e.getMessage()), e);
        }
    }

    public int integer(String key) {
        Rational value = rational(key);
        if (!value.isInteger() || value.numerator().bitLength() > 30) {
            throw error(key, "'" + key + "' must be a small integer, got " + value);
        }
        return value.intValueExact();
    }

    /** A formula read from an entry of this table; errors name the file and the key. */
    public Formula formula(String key, String text) {
        try {
            return Formula.parse(text);
        } catch (FormulaException e) {
            throw rethrown(key, e);
        }
    }

    /** A formula error placed at a key of this table. */
    public TomlException rethrown(String key, FormulaException e) {
        String where = position(key) + ", in '" + key + "': ";
        return new TomlException(String.valueOf(e.in(where).getMessage()), e);
    }

    /** Any error placed at a key of this table. */
    public TomlException rethrown(String key, String reason, Throwable cause) {
        return new TomlException(position(key) + ": " + reason, cause);
    }

    private String position(String key) {
        @Nullable TomlPosition position = table.inputPositionOf(List.of(key));
        return place(position == null ? start : position);
    }
}
