package bubblechain.report;

import java.util.List;

/**
 * One named value.
 *
 * @param key   name in machine-readable output
 * @param label what a reader sees
 * @param value the value; an absent one is left out everywhere
 * @param unit  unit of the number ("MeV"), or empty for a pure number or a text; in JSON the entry {@link #unitKey}
 */
public record Fact(String key, String label, Value value, String unit) {
    public Fact {
        Keys.check(key);
    }

    /** Name of the unit in JSON. */
    public String unitKey() {
        return Keys.unitKey(key);
    }

    List<String> keys() {
        return Keys.taken(key, unit);
    }
}
