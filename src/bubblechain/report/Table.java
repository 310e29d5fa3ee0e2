package bubblechain.report;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;

/**
 * A table; in JSON an array of objects, one per row, without the absent cells.
 *
 * @param key     name of the array in JSON ({@code result.key}); may be empty only in a nested table
 * @param title   heading for a reader; may be empty
 * @param columns at least one, keys unique
 * @param rows    as many cells in each as there are columns
 */
public record Table(String key, String title, List<Column> columns, List<List<Value>> rows) implements Block {
    public Table {
        Keys.checkOrEmpty(key);
        columns = List.copyOf(columns);
        rows = copied(rows);
        if (columns.isEmpty()) {
            throw new IllegalArgumentException("table '" + title + "' has no columns");
        }
        List<String> keys = new ArrayList<>();
        for (Column column : columns) {
            keys.addAll(column.keys());
        }
        Keys.checkUnique(keys, "the columns of table '" + title + "'");
        for (List<Value> row : rows) {
            if (row.size() != columns.size()) {
                throw new IllegalArgumentException("a row of table '" + title + "' has " + row.size()
                        + " cells, there are " + columns.size() + " columns");
            }
        }
    }

    private static List<List<Value>> copied(List<List<Value>> rows) {
        List<List<Value>> copies = new ArrayList<>(rows.size());
        for (List<Value> row : rows) {
            copies.add(List.copyOf(row));
        }
        return Collections.unmodifiableList(copies);
    }

    /** True if no row has a value in that column. */
    public boolean isEmpty(int column) {
        for (List<Value> row : rows) {
            if (!(row.get(column) instanceof Value.Absent)) {
                return false;
            }
        }
        return true;
    }

    /** A table under construction. */
    public static Builder builder(String key, String title) {
        return new Builder(key, title);
    }

    /** Collects columns, then rows. */
    public static final class Builder {
        private final String key;
        private final String title;
        private final List<Column> columns = new ArrayList<>();
        private final List<List<Value>> rows = new ArrayList<>();

        private Builder(String key, String title) {
            this.key = key;
            this.title = title;
        }

        /** Adds a column of pure numbers or texts. */
        public Builder column(String columnKey, String heading) {
            return column(Column.of(columnKey, heading));
        }

        /** Adds a column of numbers with a unit. */
        public Builder column(String columnKey, String heading, String unit) {
            return column(Column.of(columnKey, heading, unit));
        }

        public Builder column(Column column) {
            columns.add(column);
            return this;
        }

        /** Adds a row; its length is checked by {@link #build}. */
        public Builder row(Value... cells) {
            rows.add(List.of(cells));
            return this;
        }

        public Builder row(List<Value> cells) {
            rows.add(cells);
            return this;
        }

        /** @throws IllegalArgumentException if a row does not fit the columns or a key appears twice */
        public Table build() {
            return new Table(key, title, columns, rows);
        }
    }
}
