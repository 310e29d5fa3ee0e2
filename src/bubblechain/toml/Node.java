package bubblechain.toml;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** An entry of a TOML file with the place where it begins; lines and columns from 1. */
sealed interface Node {
    int line();

    int column();

    /** A string. */
    record Text(String text, int line, int column) implements Node {}

    /** An array. */
    record Listing(List<Node> entries, int line, int column) implements Node {}

    /** A table; the map keeps the order of the file. */
    record Table(Map<String, Node> entries, int line, int column) implements Node {
        static Table empty(int line, int column) {
            return new Table(new LinkedHashMap<>(), line, column);
        }
    }

    /** Anything else: a number, a date, true or false, as it is shown to the user. */
    record Other(String text, boolean number, int line, int column) implements Node {}
}
