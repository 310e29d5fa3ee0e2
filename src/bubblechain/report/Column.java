package bubblechain.report;

import java.util.List;

/**
 * Heading of a column of a {@link Table}.
 *
 * @param key     name in JSON objects and in the header row of CSV
 * @param heading what a reader sees above the column
 * @param unit    unit of every number in the column ("GeV"), or empty for a pure number; in JSON the entry
 *                {@link #unitKey} of each row
 * @param place   where the column is shown
 */
public record Column(String key, String heading, String unit, Place place) {
    public Column {
        Keys.check(key);
    }

    /** Name of the unit in JSON. */
    public String unitKey() {
        return Keys.unitKey(key);
    }

    List<String> keys() {
        return Keys.taken(key, unit);
    }

    /** A column of pure numbers or texts, shown everywhere. */
    public static Column of(String key, String heading) {
        return new Column(key, heading, "", Place.EVERYWHERE);
    }

    /** A column of numbers with a unit, shown everywhere. */
    public static Column of(String key, String heading, String unit) {
        return new Column(key, heading, unit, Place.EVERYWHERE);
    }

    /** The same column left out of JSON and CSV. */
    public Column textOnly() {
        return new Column(key, heading, unit, Place.TEXT_ONLY);
    }

    /** The same column left out of text and LaTeX. */
    public Column dataOnly() {
        return new Column(key, heading, unit, Place.DATA_ONLY);
    }
}
