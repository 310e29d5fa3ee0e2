package bubblechain.output;

import bubblechain.report.Column;
import bubblechain.report.Fact;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/** One table as a tabular environment. */
final class LatexTable {
    private final Table table;
    private final List<Integer> shown;

    LatexTable(Table table) {
        this.table = table;
        this.shown = IntStream.range(0, table.columns().size())
                .filter(c -> table.columns().get(c).place().inText() && !table.isEmpty(c))
                .boxed()
                .toList();
    }

    void append(StringBuilder latex) {
        if (shown.isEmpty()) {
            latex.append("(none)\n");
            return;
        }
        String columns = shown.stream().map(this::kind).collect(Collectors.joining());
        latex.append("\\begin{tabular}{").append(columns).append("}\n\\toprule\n");
        latex.append(headings()).append("\\midrule\n");
        table.rows().forEach(row -> latex.append(row(row)));
        latex.append("\\bottomrule\n\\end{tabular}\n");
    }

    private String kind(int column) {
        if (isDecimal(column)) {
            return "r@{}l";
        }
        boolean whole = table.rows().stream().allMatch(row -> {
            Cell.Kind kind = Cell.of(row.get(column)).kind();
            return kind == Cell.Kind.WHOLE || kind == Cell.Kind.NOTHING;
        });
        return whole ? "r" : "l";
    }

    private boolean isDecimal(int column) {
        return table.rows().stream().anyMatch(row -> row.get(column) instanceof Value.Numeral);
    }

    private String headings() {
        return line(shown.stream().map(c -> {
            Column column = table.columns().get(c);
            String unit = column.unit().isBlank() ? "" : " (" + LatexText.escape(column.unit()) + ")";
            String heading = LatexText.escape(column.heading()) + unit + innerHeadings(c);
            return isDecimal(c) ? "\\multicolumn{2}{l}{" + heading + "}" : heading;
        }).toList());
    }

    /** In brackets, the headings of the tables that a column holds. */
    private String innerHeadings(int column) {
        return table.rows().stream()
                .map(row -> row.get(column))
                .filter(Value.Rows.class::isInstance)
                .findFirst()
                .map(value -> new LatexTable(((Value.Rows) value).table()))
                .map(inner -> inner.shown.stream()
                        .map(c -> LatexText.escape(inner.table.columns().get(c).heading()))
                        .collect(Collectors.joining(", ", " (", ")")))
                .orElse("");
    }

    private String row(List<Value> row) {
        return line(shown.stream().map(c -> isDecimal(c) ? atPoint(row.get(c)) : cell(row.get(c))).toList());
    }

    /** Joins the cells; an empty group keeps a leading star from being taken for an argument of the line before. */
    private static String line(List<String> cells) {
        String line = String.join(" & ", cells);
        return (line.startsWith("*") ? "{}" : "") + line + " \\\\\n";
    }

    private static String atPoint(Value value) {
        if (value instanceof Value.Numeral numeral) {
            int point = Cell.of(value).beforePoint();
            String after = numeral.decimal().substring(point);
            String tail = after.isEmpty() ? "" : "$" + power(after) + "$";
            return "$" + numeral.decimal().substring(0, point) + "$ & " + tail;
        }
        if (value instanceof Value.Count) {
            return cell(value) + " & ";
        }
        return "\\multicolumn{2}{l}{" + cell(value) + "}";
    }

    /** Any value in one cell, text escaped and numbers in math mode. */
    static String cell(Value value) {
        if (value instanceof Value.Numeral numeral) {
            return "$" + power(numeral.decimal()) + "$";
        }
        if (value instanceof Value.Count count) {
            return "$" + count.count() + "$";
        }
        if (value instanceof Value.Exact exact) {
            return LatexFormula.of(exact.formula())
                    .map(formula -> "$" + formula + "$")
                    .orElseGet(() -> "\\texttt{" + LatexText.escape(exact.formula()) + "}");
        }
        if (value instanceof Value.Absent) {
            return "--";
        }
        if (value instanceof Value.Listing listing) {
            return listing.values().stream().map(LatexTable::cell).collect(Collectors.joining(", "));
        }
        if (value instanceof Value.Group group) {
            return group.facts().facts().stream()
                    .filter(fact -> !(fact.value() instanceof Value.Absent))
                    .map(LatexTable::labelled)
                    .collect(Collectors.joining(", "));
        }
        if (value instanceof Value.Rows rows) {
            return new LatexTable(rows.table()).inCell();
        }
        return LatexText.escape(Cell.of(value).text());
    }

    private static String labelled(Fact fact) {
        String unit = fact.unit().isBlank() ? "" : "\\," + LatexText.escape(fact.unit());
        return LatexText.escape(fact.label()) + " " + cell(fact.value()) + unit;
    }

    private static String power(String decimal) {
        return decimal.replaceFirst("[eE]\\+?(-?\\d+)", "\\\\times10^{$1}");
    }

    private String inCell() {
        if (shown.isEmpty()) {
            return "";
        }
        List<String> lines = new ArrayList<>();
        table.rows().forEach(row -> lines.add(row(row).strip()));
        String columns = shown.stream().map(this::kind).collect(Collectors.joining());
        return "\\begin{tabular}[t]{@{}" + columns + "@{}} " + String.join(" ", lines) + " \\end{tabular}";
    }
}
