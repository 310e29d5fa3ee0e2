package bubblechain.toml;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.tomlj.Toml;
import org.tomlj.TomlArray;
import org.tomlj.TomlParseError;
import org.tomlj.TomlParseResult;
import org.tomlj.TomlPosition;
import org.tomlj.TomlTable;

/** Reads any TOML file with the library, and says what is wrong with one that is none. */
final class GeneralReader {
    private GeneralReader() {}

    static Node.Table read(String text, String file) {
        TomlParseResult result = Toml.parse(text);
        if (result.hasErrors()) {
            TomlParseError first = result.errors().get(0);
            TomlPosition position = first.position();
            String reason = String.valueOf(first.getMessage()).lines().findFirst().orElse("malformed");
            throw new TomlException(file + ", line " + position.line() + ", column " + position.column()
                    + ": not TOML: " + reason);
        }
        return table(result, TomlPosition.positionAt(1, 1));
    }

    private static Node.Table table(TomlTable table, TomlPosition start) {
        Map<String, Node> entries = new LinkedHashMap<>();
        for (String key : table.keySet()) {
            List<String> path = List.of(key);
            TomlPosition position = table.inputPositionOf(path);
            Object value = table.get(path);
            if (value != null) {
                entries.put(key, node(value, position == null ? start : position));
            }
        }
        return new Node.Table(entries, start.line(), start.column());
    }

    private static Node node(Object value, TomlPosition at) {
        if (value instanceof String text) {
            return new Node.Text(text, at.line(), at.column());
        }
        if (value instanceof TomlTable table) {
            return table(table, at);
        }
        if (value instanceof TomlArray array) {
            List<Node> entries = new ArrayList<>();
            for (int k = 0; k < array.size(); k++) {
                entries.add(node(array.get(k), array.inputPositionOf(k)));
            }
            return new Node.Listing(entries, at.line(), at.column());
        }
        boolean number = value instanceof Long || value instanceof Double;
        return new Node.Other(String.valueOf(value), number, at.line(), at.column());
    }
}
