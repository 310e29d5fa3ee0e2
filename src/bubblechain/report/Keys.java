package bubblechain.report;

import java.util.Collection;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.regex.Pattern;

/** The rule for names in machine-readable output: a letter, then letters, digits and underscores, each used once. */
final class Keys {
    private static final Pattern KEY = Pattern.compile("[A-Za-z][A-Za-z0-9_]*");

    private Keys() {}

    static void check(String key) {
        if (!KEY.matcher(key).matches()) {
            throw new IllegalArgumentException(
                    "key '" + key + "' must be a letter followed by letters, digits and underscores");
        }
    }

    static void checkOrEmpty(String key) {
        if (!key.isEmpty()) {
            check(key);
        }
    }

    /** The names a value takes in a JSON object: its key and, if it has a unit, the key of the unit. */
    static List<String> taken(String key, String unit) {
        return unit.isEmpty() ? List.of(key) : List.of(key, unitKey(key));
    }

    static String unitKey(String key) {
        return key + "_unit";
    }

    static void checkUnique(Collection<String> keys, String place) {
        Set<String> seen = new HashSet<>();
        for (String key : keys) {
            if (!seen.add(key)) {
                throw new IllegalArgumentException("key '" + key + "' appears twice in " + place);
            }
        }
    }
}
