package bubblechain.output;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Set;
import java.util.regex.Pattern;

/** Validates JSON against the keywords that the schema of the reports uses; an unknown keyword is an error. */
final class JsonSchema {
    private static final Set<String> ANNOTATIONS = Set.of("$schema", "$id", "title", "description", "$defs");

    private final Map<String, Object> root;
    private final List<String> complaints = new ArrayList<>();

    private JsonSchema(Map<String, Object> root) {
        this.root = root;
    }

    /** What is wrong with a report; empty if it is valid. */
    static List<String> complaints(String json) {
        try (InputStream stream = Objects.requireNonNull(
                OutputFormat.class.getResourceAsStream("schema/report.schema.json"), "schema")) {
            String schema = new String(stream.readAllBytes(), StandardCharsets.UTF_8);
            return complaints(JsonTree.object(schema), JsonTree.object(json));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    static List<String> complaints(Map<String, Object> schema, Object value) {
        JsonSchema validator = new JsonSchema(schema);
        validator.check(schema, value, "");
        return validator.complaints;
    }

    private boolean matches(Object schema, Object value) {
        JsonSchema trial = new JsonSchema(root);
        trial.check(JsonTree.object(schema), value, "");
        return trial.complaints.isEmpty();
    }

    private void require(boolean holds, String place, String what) {
        if (!holds) {
            complaints.add((place.isEmpty() ? "/" : place) + ": " + what);
        }
    }

    private void check(Map<String, Object> schema, Object value, String place) {
        schema.forEach((keyword, wanted) -> {
            switch (keyword) {
                case "$ref" -> check(definition(String.valueOf(wanted)), value, place);
                case "allOf" -> JsonTree.list(wanted).forEach(part -> check(JsonTree.object(part), value, place));
                case "anyOf" -> require(
                        JsonTree.list(wanted).stream().anyMatch(part -> matches(part, value)), place, "none of anyOf fits " + value);
                case "if" -> {
                    if (matches(wanted, value) && schema.containsKey("then")) {
                        check(JsonTree.object(schema.get("then")), value, place);
                    }
                }
                case "then" -> require(schema.containsKey("if"), place, "then without if");
                case "type" -> require(types(wanted).contains(type(value)), place, "is " + type(value) + ", not " + wanted);
                case "const" -> require(wanted.equals(value), place, value + " is not " + wanted);
                case "enum" -> require(JsonTree.list(wanted).contains(value), place, value + " is not in " + wanted);
                default -> checkByType(keyword, wanted, schema, value, place);
            }
        });
    }

    private void checkByType(String keyword, Object wanted, Map<String, Object> schema, Object value, String place) {
        if (ANNOTATIONS.contains(keyword)) {
            return;
        }
        switch (keyword) {
            case "properties", "required", "additionalProperties", "minProperties" -> {
                if (value instanceof Map) {
                    checkObject(keyword, wanted, schema, JsonTree.object(value), place);
                }
            }
            case "items", "uniqueItems" -> {
                if (value instanceof List) {
                    checkArray(keyword, wanted, JsonTree.list(value), place);
                }
            }
            case "minLength" -> require(!(value instanceof String s) || s.length() >= (Long) wanted, place, "too short");
            case "pattern" -> require(
                    !(value instanceof String s) || Pattern.compile(String.valueOf(wanted)).matcher(s).find(),
                    place, "'" + value + "' does not match " + wanted);
            case "minimum" -> require(!(value instanceof Long n) || n >= (Long) wanted, place, value + " is below " + wanted);
            case "maximum" -> require(!(value instanceof Long n) || n <= (Long) wanted, place, value + " is above " + wanted);
            default -> throw new IllegalArgumentException("the validator does not know the keyword " + keyword);
        }
    }

    private void checkObject(
            String keyword, Object wanted, Map<String, Object> schema, Map<String, Object> value, String place) {
        Map<String, Object> properties = JsonTree.object(schema.getOrDefault("properties", Map.of()));
        switch (keyword) {
            case "properties" -> properties.forEach((key, part) -> {
                if (value.containsKey(key)) {
                    check(JsonTree.object(part), value.get(key), place + "/" + key);
                }
            });
            case "required" -> JsonTree.list(wanted)
                    .forEach(key -> require(value.containsKey(String.valueOf(key)), place, "'" + key + "' is missing"));
            case "minProperties" -> require(value.size() >= (Long) wanted, place, "too few entries");
            default -> value.forEach((key, entry) -> {
                if (!properties.containsKey(key)) {
                    if (wanted.equals(false)) {
                        require(false, place, "'" + key + "' is not in the schema");
                    } else {
                        check(JsonTree.object(wanted), entry, place + "/" + key);
                    }
                }
            });
        }
    }

    private void checkArray(String keyword, Object wanted, List<Object> value, String place) {
        if (keyword.equals("items")) {
            for (int k = 0; k < value.size(); k++) {
                check(JsonTree.object(wanted), value.get(k), place + "/" + k);
            }
        } else {
            require(new HashSet<>(value).size() == value.size(), place, "repeats an entry");
        }
    }

    private Map<String, Object> definition(String reference) {
        Object found = JsonTree.object(root.get("$defs")).get(reference.replace("#/$defs/", ""));
        return JsonTree.object(Objects.requireNonNull(found, reference));
    }

    private static List<?> types(Object wanted) {
        return wanted instanceof List<?> list ? list : List.of(wanted);
    }

    private static String type(Object value) {
        return value instanceof String ? "string"
                : value instanceof Long ? "integer"
                : value instanceof Boolean ? "boolean"
                : value instanceof Map ? "object"
                : value instanceof List ? "array" : "null";
    }
}
