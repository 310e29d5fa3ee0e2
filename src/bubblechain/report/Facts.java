package bubblechain.report;

import java.util.ArrayList;
import java.util.List;

/**
 * A list of named values.
 *
 * @param key   name of the object in JSON ({@code result.key}); empty to put the entries directly into {@code result}
 * @param title heading for a reader; may be empty
 * @param facts the values, keys unique
 */
public record Facts(String key, String title, List<Fact> facts) implements Block {
    public Facts {
        Keys.checkOrEmpty(key);
        facts = List.copyOf(facts);
        Keys.checkUnique(facts.stream().flatMap(fact -> fact.keys().stream()).toList(), "the facts '" + title + "'");
    }

    /** An empty list to be filled by {@link #with}. */
    public static Facts titled(String key, String title) {
        return new Facts(key, title, List.of());
    }

    /** This list and one more pure number or text. */
    public Facts with(String factKey, String label, Value value) {
        return with(factKey, label, value, "");
    }

    /** This list and one more value with a unit. */
    public Facts with(String factKey, String label, Value value, String unit) {
        List<Fact> more = new ArrayList<>(facts);
        more.add(new Fact(factKey, label, value, unit));
        return new Facts(key, title, more);
    }
}
