package bubblechain.output;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonToken;
import com.fasterxml.jackson.core.StreamReadFeature;
import java.io.IOException;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/** JSON read into maps, lists, strings, longs and booleans, for comparison. */
final class JsonTree {
    private static final Object NULL = "(null)";

    private JsonTree() {}

    static Map<String, Object> object(String json) throws IOException {
        JsonFactory factory =
                JsonFactory.builder().enable(StreamReadFeature.STRICT_DUPLICATE_DETECTION).build();
        try (JsonParser parser = factory.createParser(json)) {
            parser.nextToken();
            Object tree = read(parser);
            if (parser.nextToken() != null) {
                throw new IOException("more than one JSON value");
            }
            return object(tree);
        }
    }

    @SuppressWarnings("unchecked")
    static Map<String, Object> object(Object tree) {
        return (Map<String, Object>) tree;
    }

    @SuppressWarnings("unchecked")
    static List<Object> list(Object tree) {
        return (List<Object>) tree;
    }

    static String typeOf(Object tree) {
        return tree instanceof Map ? "object" : tree instanceof List ? "array" : "string";
    }

    /** All strings in a tree. */
    static List<String> strings(Object tree) {
        List<String> strings = new ArrayList<>();
        if (tree instanceof Map) {
            object(tree).values().forEach(value -> strings.addAll(strings(value)));
        } else if (tree instanceof List) {
            list(tree).forEach(value -> strings.addAll(strings(value)));
        } else if (tree instanceof String text) {
            strings.add(text);
        }
        return strings;
    }

    private static Object read(JsonParser parser) throws IOException {
        return switch (parser.currentToken()) {
            case START_OBJECT -> {
                Map<String, Object> entries = new LinkedHashMap<>();
                while (parser.nextToken() != JsonToken.END_OBJECT) {
                    String name = parser.currentName();
                    parser.nextToken();
                    entries.put(name, read(parser));
                }
                yield entries;
            }
            case START_ARRAY -> {
                List<Object> entries = new ArrayList<>();
                while (parser.nextToken() != JsonToken.END_ARRAY) {
                    entries.add(read(parser));
                }
                yield entries;
            }
            case VALUE_NUMBER_INT -> parser.getLongValue();
            case VALUE_TRUE, VALUE_FALSE -> parser.getBooleanValue();
            case VALUE_NULL -> NULL;
            default -> parser.getText();
        };
    }
}
