package bubblechain.output;

import bubblechain.report.Column;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;

/** A table without tables in its cells. */
record CsvTable(String title, List<String> header, List<List<String>> rows) {
    /** The table without the columns that only hold tables, then the tables of each column that holds some. */
    static List<CsvTable> of(Table table) {
        List<Integer> data = IntStream.range(0, table.columns().size())
                .filter(c -> table.columns().get(c).place().inData())
                .boxed()
                .toList();
        List<Integer> nesting = data.stream().filter(c -> holdsTables(table, c)).toList();
        List<Integer> flat = data.stream().filter(c -> !nesting.contains(c) || holdsMore(table, c)).toList();
        List<CsvTable> tables = new ArrayList<>();
        if (!flat.isEmpty()) {
            tables.add(flat(table, flat));
        }
        int owner = flat.stream().filter(c -> !nesting.contains(c)).findFirst().orElse(-1);
        nesting.forEach(c -> tables.addAll(nested(table, owner, c)));
        return tables;
    }

    private static boolean holdsTables(Table table, int column) {
        return table.rows().stream().anyMatch(row -> row.get(column) instanceof Value.Rows);
    }

    private static boolean holdsMore(Table table, int column) {
        return table.rows().stream()
                .map(row -> row.get(column))
                .anyMatch(value -> !(value instanceof Value.Rows || value instanceof Value.Absent));
    }

    private static CsvTable flat(Table table, List<Integer> columns) {
        List<String> header = columns.stream().map(c -> header(table.columns().get(c))).toList();
        List<List<String>> rows = table.rows().stream()
                .map(row -> columns.stream().map(c -> CsvWriter.cell(row.get(c))).toList())
                .toList();
        return new CsvTable(name(table), header, rows);
    }

    private static String name(Table table) {
        return table.title().isBlank() ? table.key() : table.title();
    }

    private static String header(Column column) {
        return column.unit().isEmpty() ? column.key() : column.key() + " [" + PlainText.oneLine(column.unit()) + "]";
    }

    /** The tables of one column, those with equal columns joined, each row behind the name of the row it belongs to. */
    private static List<CsvTable> nested(Table table, int owner, int column) {
        Map<List<Column>, List<List<Value>>> joined = new LinkedHashMap<>();
        for (int r = 0; r < table.rows().size(); r++) {
            List<Value> outer = table.rows().get(r);
            if (outer.get(column) instanceof Value.Rows inner) {
                Value name = owner < 0 ? Value.count(r + 1L) : outer.get(owner);
                List<List<Value>> rows = joined.computeIfAbsent(inner.table().columns(), key -> new ArrayList<>());
                for (List<Value> innerRow : inner.table().rows()) {
                    List<Value> row = new ArrayList<>(List.of(name));
                    row.addAll(innerRow);
                    rows.add(row);
                }
            }
        }
        Column outer = table.columns().get(column);
        String title = name(table) + ": " + outer.heading();
        List<CsvTable> tables = new ArrayList<>();
        joined.forEach((inner, rows) -> {
            List<Column> columns = new ArrayList<>(List.of(owner(table, owner, inner)));
            columns.addAll(inner);
            tables.addAll(of(new Table(outer.key(), title, columns, rows)));
        });
        return tables;
    }

    /** The column that says which row of the outer table a row belongs to. */
    private static Column owner(Table table, int owner, List<Column> inner) {
        String wanted = owner < 0 ? "row" : table.columns().get(owner).key();
        String unit = owner < 0 ? "" : table.columns().get(owner).unit();
        String key = wanted;
        while (isTaken(key, inner)) {
            key = "outer_" + key;
        }
        return Column.of(key, wanted, unit);
    }

    private static boolean isTaken(String key, List<Column> columns) {
        return columns.stream().anyMatch(column ->
                column.key().equals(key) || column.unitKey().equals(key) || column.key().equals(key + "_unit"));
    }
}
