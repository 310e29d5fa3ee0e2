package bubblechain.output;

import bubblechain.bibliography.Bibliography;
import bubblechain.report.Block;
import bubblechain.report.Column;
import bubblechain.report.Fact;
import bubblechain.report.Facts;
import bubblechain.report.Note;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.io.IOException;
import java.io.Writer;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Writes a report for reading: what is expanded in what, the request, the blocks, cautions and sources.
 *
 * <p>Numbers are aligned at the decimal point and never shortened; long ones are continued on the next line below the
 * digits after the point. A table inside a cell is written indented below its row. A table that does not fit even with
 * broken cells is written as a list, row by row. Columns without any value are left out.
 */
public final class TextWriter implements ReportWriter {
    private static final int NARROWEST = 40;
    private static final int INDENT = 4;
    private static final int WIDEST_LABEL = 36;

    private final int width;

    private TextWriter(int width) {
        this.width = width;
    }

    /** @param width columns of the terminal; fewer than 40 count as 40 */
    public static TextWriter ofWidth(int width) {
        return new TextWriter(Math.max(width, NARROWEST));
    }

    @Override
    public void write(Report report, Writer out) throws IOException {
        TextPage page = new TextPage(width);
        header(page, report);
        for (Block block : report.blocks()) {
            page.gap();
            block(page, block);
        }
        remarks(page, "Cautions", report.cautions());
        remarks(page, "Sources", report.sources().stream().map(TextWriter::source).toList());
        page.writeTo(out);
    }

    /** A key of the bibliography with what it stands for; any other text as it is. */
    private static String source(String key) {
        return Bibliography.shipped().find(key).map(p -> key + " (" + p.inWords() + ")").orElse(key);
    }

    private static void header(TextPage page, Report report) {
        page.paragraph("", PlainText.oneLine("bubblechain " + report.command()));
        if (!report.normalisation().isBlank()) {
            page.paragraph("  expansion  ", PlainText.oneLine(report.normalisation()));
        }
        if (!report.request().isEmpty()) {
            List<String> settings = new ArrayList<>();
            for (Map.Entry<String, String> entry : report.request().entrySet()) {
                settings.add(PlainText.oneLine(entry.getKey() + " = " + entry.getValue()));
            }
            page.items("  request    ", settings);
        }
    }

    private static void block(TextPage page, Block block) {
        if (block instanceof Note note) {
            PlainText.clean(note.text()).lines().forEach(line -> page.paragraph("", line.strip()));
        } else if (block instanceof Facts facts) {
            title(page, facts.title());
            page.indented(facts.title().isBlank() ? 0 : 2, () -> facts(page, facts));
        } else if (block instanceof Table table) {
            title(page, table.title());
            table(page, table.columns(), List.of(table), true);
        }
    }

    private static void title(TextPage page, String title) {
        if (!title.isBlank()) {
            page.paragraph("", PlainText.oneLine(title));
        }
    }

    private static void remarks(TextPage page, String title, List<String> remarks) {
        if (!remarks.isEmpty()) {
            page.gap();
            page.line(title);
            for (String remark : remarks) {
                page.paragraph("  - ", PlainText.oneLine(remark));
            }
        }
    }

    private static void facts(TextPage page, Facts facts) {
        List<Fact> present =
                facts.facts().stream().filter(fact -> !(fact.value() instanceof Value.Absent)).toList();
        int limit = Math.min(WIDEST_LABEL, page.room() / 2);
        int labels = present.stream()
                .filter(fact -> !isNested(fact.value()))
                .mapToInt(fact -> Wrapping.width(PlainText.oneLine(fact.label())))
                .filter(length -> length <= limit)
                .max()
                .orElse(0);
        present.forEach(fact -> fact(page, fact, labels));
    }

    private static void fact(TextPage page, Fact fact, int labels) {
        String label = PlainText.oneLine(fact.label());
        if (isNested(fact.value())) {
            page.paragraph("", label + bracketed(fact.unit()));
            page.indented(INDENT, () -> nested(page, fact.value()));
            return;
        }
        if (Wrapping.width(label) > labels) {
            page.paragraph("", label);
            label = "";
        }
        String lead = label + " ".repeat(labels - Wrapping.width(label) + 2);
        Cell cell = Cell.of(fact.value());
        List<String> pieces = new ArrayList<>(cell.wrapped(page.room() - Wrapping.width(lead)));
        String unit = PlainText.oneLine(fact.unit());
        if (!unit.isEmpty()) {
            int last = pieces.size() - 1;
            pieces.addAll(Wrapping.words(pieces.remove(last) + " " + unit, page.room() - Wrapping.width(lead)));
        }
        page.hanging(lead, pieces);
    }

    private static boolean isNested(Value value) {
        return value instanceof Value.Rows
                || value instanceof Value.Group
                || value instanceof Value.Listing listing && listing.values().stream().anyMatch(TextWriter::isNested);
    }

    private static void nested(TextPage page, Value value) {
        if (value instanceof Value.Rows rows) {
            table(page, rows.table().columns(), List.of(rows.table()), false);
        } else if (value instanceof Value.Group group) {
            facts(page, group.facts());
        } else if (value instanceof Value.Listing listing) {
            listing.values().forEach(entry -> nested(page, entry));
        } else {
            page.hanging("", Cell.of(value).wrapped(page.room()));
        }
    }

    /** Writes the first table; the others, of the same columns, only take part in finding the widths. */
    private static void table(TextPage page, List<Column> columns, List<Table> alike, boolean ruled) {
        Table table = alike.get(0);
        if (table.rows().isEmpty()) {
            page.line("(none)");
            return;
        }
        List<Integer> inner = new ArrayList<>();
        List<Integer> flat = new ArrayList<>();
        for (int c = 0; c < columns.size(); c++) {
            boolean empty = true;
            for (Table one : alike) {
                empty &= one.isEmpty(c);
            }
            if (columns.get(c).place().inText() && !empty) {
                (hasNested(alike, c) ? inner : flat).add(c);
            }
        }
        List<String> headings = new ArrayList<>();
        for (int c : flat) {
            headings.add(heading(columns.get(c)));
        }
        List<List<Cell>> cells = cells(alike, flat);
        Optional<TextTable> fitted = TextTable.fitted(headings, cells, page.room());
        if (fitted.isPresent() && !flat.isEmpty()) {
            page.lines(fitted.get().heading());
            if (ruled) {
                page.line(fitted.get().rule());
            }
        }
        for (int r = 0; r < table.rows().size(); r++) {
            if (fitted.isPresent()) {
                page.lines(fitted.get().lines(cells.get(r)));
            } else {
                page.gap();
                list(page, headings, cells.get(r));
            }
            inner(page, table, r, inner);
        }
    }

    private static boolean hasNested(List<Table> alike, int column) {
        for (Table table : alike) {
            for (List<Value> row : table.rows()) {
                if (isNested(row.get(column))) {
                    return true;
                }
            }
        }
        return false;
    }

    private static List<List<Cell>> cells(List<Table> alike, List<Integer> columns) {
        List<List<Cell>> cells = new ArrayList<>();
        for (Table table : alike) {
            for (List<Value> row : table.rows()) {
                List<Cell> shown = new ArrayList<>();
                for (int c : columns) {
                    shown.add(Cell.of(row.get(c)));
                }
                cells.add(shown);
            }
        }
        return cells;
    }

    private static String heading(Column column) {
        return PlainText.oneLine(column.heading()) + bracketed(column.unit());
    }

    private static String bracketed(String unit) {
        return unit.isBlank() ? "" : " [" + PlainText.oneLine(unit) + "]";
    }

    /** One row below each other, for a table that is too wide. */
    private static void list(TextPage page, List<String> headings, List<Cell> row) {
        int labels = headings.stream().mapToInt(Wrapping::width).max().orElse(0);
        int lead = Math.min(labels, page.room() / 2);
        for (int c = 0; c < row.size(); c++) {
            List<String> label = Wrapping.words(headings.get(c), lead);
            page.lines(label.subList(0, label.size() - 1));
            String last = label.get(label.size() - 1);
            String padded = last + " ".repeat(lead - Wrapping.width(last) + 2);
            page.hanging(padded, row.get(c).wrapped(page.room() - lead - 2));
        }
    }

    /** The nested values of one row, below it. */
    private static void inner(TextPage page, Table table, int row, List<Integer> inner) {
        for (int c : inner) {
            Value value = table.rows().get(row).get(c);
            if (value instanceof Value.Absent) {
                continue;
            }
            page.indented(INDENT, () -> {
                page.paragraph("", heading(table.columns().get(c)));
                if (value instanceof Value.Rows rows) {
                    table(page, rows.table().columns(), alike(table, row, c, rows.table()), false);
                } else {
                    nested(page, value);
                }
            });
            page.gap();
        }
    }

    /** The table of this row, then the tables with the same columns in the other rows. */
    private static List<Table> alike(Table table, int row, int column, Table first) {
        List<Table> alike = new ArrayList<>(List.of(first));
        for (int r = 0; r < table.rows().size(); r++) {
            Value value = table.rows().get(r).get(column);
            if (r != row && value instanceof Value.Rows rows && rows.table().columns().equals(first.columns())) {
                alike.add(rows.table());
            }
        }
        return alike;
    }
}
