package bubblechain.report;

/**
 * One named value.
 *
 * @param key   name in machine-readable output
 * @param label what a reader sees
 * @param value the value; an absent one is left out everywhere
 * @param unit  unit of the number ("MeV"), or empty for a pure number or a text
 */
public record Fact(String key, String label, Value value, String unit) {
    public Fact {
        Keys.check(key);
    }
}
