package bubblechain.toml;

import bubblechain.exact.DomainException;
import bubblechain.exact.Rational;
import bubblechain.formula.Formula;
import bubblechain.formula.FormulaException;
import bubblechain.formula.FormulaLimits;
import bubblechain.report.NearestNames;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.Set;

/** A table of a file whose entries are texts; every complaint names file, line and column. */
public final class TomlSection {
    private final String file;
    private final String section;
    private final Node.Table table;

    TomlSection(String file, String section, Node.Table table) {
        this.file = file;
        this.section = section;
        this.table = table;
    }

    /** The name of the file, as messages show it. */
    public String file() {
        return file;
    }

    public Set<String> keys() {
        return Collections.unmodifiableSet(table.entries().keySet());
    }

    /** Refuses any key that is not one of {@code known}, naming the nearest of them. */
    public void requireKnown(List<String> known) {
        for (String key : table.entries().keySet()) {
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
        return at(nodeOf(key), reason);
    }

    private Node nodeOf(String key) {
        return table.entries().getOrDefault(key, table);
    }

    private TomlException at(Node node, String reason) {
        return new TomlException(place(node) + ": " + reason);
    }

    private String place(Node node) {
        return file + ", line " + node.line() + ", column " + node.column();
    }

    /** The text of a key. @throws TomlException if it is missing or not a string */
    public String text(String key) {
        Optional<String> text = optionalText(key);
        if (text.isEmpty()) {
            throw at(table, "the key '" + key + "' is missing " + section);
        }
        return text.get();
    }

    public Optional<String> optionalText(String key) {
        Optional<Node> value = value(key);
        return value.isPresent() ? Optional.of(asText(key, value.get())) : Optional.empty();
    }

    private Optional<Node> value(String key) {
        return Optional.ofNullable(table.entries().get(key));
    }

    private String asText(String key, Node value) {
        if (value instanceof Node.Text text) {
            refuseHidden(text);
            return text.text();
        }
        if (value instanceof Node.Other other && other.number()) {
            throw error(key, "numbers are written as strings so that they stay exact: " + key + " = \"" + other.text() + "\"");
        }
        throw error(key, "'" + key + "' must be a string");
    }

    /** Characters that do not show, or turn the text around them, would let a file say other things than it seems to. */
    private void refuseHidden(Node.Text node) {
        String text = node.text();
        for (int k = 0; k < text.length(); k++) {
            char c = text.charAt(k);
            boolean control = Character.getType(c) == Character.CONTROL && c != '\n' && c != '\t' && c != '\r';
            if (control || Character.getType(c) == Character.FORMAT || Character.isSurrogate(c) && !paired(text, k)) {
                throw at(node, String.format("the character U+%04X (%s) may not stand in a text", (int) c, Character.getName(c)));
            }
        }
    }

    private static boolean paired(String text, int k) {
        return Character.isHighSurrogate(text.charAt(k))
                ? k + 1 < text.length() && Character.isLowSurrogate(text.charAt(k + 1))
                : k > 0 && Character.isHighSurrogate(text.charAt(k - 1));
    }

    /** A list of strings, empty if the key is absent. */
    public List<String> texts(String key) {
        Optional<Node> value = value(key);
        if (value.isEmpty()) {
            return List.of();
        }
        if (!(value.get() instanceof Node.Listing list)) {
            throw error(key, "'" + key + "' must be a list of strings: " + key + " = [\"...\"]");
        }
        List<String> texts = new ArrayList<>();
        for (Node entry : list.entries()) {
            texts.add(asText(key, entry));
        }
        return texts;
    }

    /** The tables [[key]], empty if the key is absent. */
    public List<TomlSection> tables(String key) {
        Optional<Node> value = value(key);
        if (value.isEmpty()) {
            return List.of();
        }
        List<TomlSection> result = new ArrayList<>();
        if (value.get() instanceof Node.Listing list) {
            for (Node entry : list.entries()) {
                if (entry instanceof Node.Table inner) {
                    result.add(new TomlSection(file, "in [[" + key + "]]", inner));
                }
            }
            if (result.size() == list.entries().size()) {
                return result;
            }
        }
        throw error(key, "'" + key + "' must be a list of tables: [[" + key + "]]");
    }

    /** The table [key], if there is one. */
    public Optional<TomlSection> optionalTable(String key) {
        Optional<Node> value = value(key);
        if (value.isEmpty()) {
            return Optional.empty();
        }
        if (!(value.get() instanceof Node.Table inner)) {
            throw error(key, "'" + key + "' must be a table: [" + key + "]");
        }
        return Optional.of(new TomlSection(file, "in [" + key + "]", inner));
    }

    /** An exact rational number written as a string. */
    public Rational rational(String key) {
        String text = text(key);
        if (text.length() > FormulaLimits.DIGITS) {
            throw error(key, "a number of more than " + FormulaLimits.DIGITS + " characters");
        }
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
        return place(nodeOf(key));
    }
}
