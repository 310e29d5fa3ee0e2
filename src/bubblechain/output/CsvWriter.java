package bubblechain.output;

import bubblechain.report.Block;
import bubblechain.report.Fact;
import bubblechain.report.Facts;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.io.IOException;
import java.io.Writer;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVPrinter;

/**
 * Writes a report as comma-separated tables one after another, each with a comment line for its title and a header
 * row, separated by empty lines. Comment lines begin with {@code #}: program, command, normalisation and request at the
 * top, cautions and sources at the end.
 *
 * <p>Named values become a table of key, value and unit; the key of a value in a group is {@code group.key}. A table
 * inside a cell becomes a table of its own, whose first column repeats the first plain column of the row it belongs to.
 * The entries of a list are separated by "; " in one cell. A unit of a column stands in brackets behind its key.
 *
 * <p>A text that a spreadsheet would take for a formula (it begins with = + - @ and is not a number) gets a leading
 * apostrophe. Exact numbers in the characters of the formula language stay as they are.
 */
public final class CsvWriter implements ReportWriter {
    private static final CSVFormat FORMAT =
            CSVFormat.RFC4180.builder().setRecordSeparator("\n").get();

    @Override
    public void write(Report report, Writer out) throws IOException {
        comment(out, "bubblechain " + ProgramVersion.text() + " " + report.command());
        if (!report.normalisation().isBlank()) {
            comment(out, "expansion: " + report.normalisation());
        }
        for (Map.Entry<String, String> option : report.request().entrySet()) {
            comment(out, "request: " + option.getKey() + " = " + option.getValue());
        }
        for (Block block : report.blocks()) {
            if (block instanceof Table table) {
                write(out, CsvTable.of(table));
            } else if (block instanceof Facts facts) {
                facts(out, facts);
            }
        }
        if (!report.cautions().isEmpty() || !report.sources().isEmpty()) {
            out.write('\n');
        }
        for (String caution : report.cautions()) {
            comment(out, "caution: " + caution);
        }
        for (String source : report.sources()) {
            comment(out, "source: " + source);
        }
    }

    private static void comment(Writer out, String text) throws IOException {
        out.write("# " + PlainText.oneLine(text) + "\n");
    }

    private static void write(Writer out, List<CsvTable> tables) throws IOException {
        for (CsvTable table : tables) {
            out.write('\n');
            comment(out, table.title());
            CSVPrinter printer = new CSVPrinter(out, FORMAT);
            printer.printRecord(table.header());
            printer.printRecords(table.rows());
        }
    }

    private static void facts(Writer out, Facts facts) throws IOException {
        List<List<String>> rows = new ArrayList<>();
        List<CsvTable> tables = new ArrayList<>();
        collect(facts.key().isEmpty() ? "" : facts.key() + ".", facts, rows, tables);
        String title = facts.title().isBlank() ? "values" : facts.title();
        if (!rows.isEmpty()) {
            write(out, List.of(new CsvTable(title, List.of("key", "value", "unit"), rows)));
        }
        write(out, tables);
    }

    private static void collect(String prefix, Facts facts, List<List<String>> rows, List<CsvTable> tables) {
        for (Fact fact : facts.facts()) {
            if (fact.value() instanceof Value.Group group) {
                collect(prefix + fact.key() + ".", group.facts(), rows, tables);
            } else if (fact.value() instanceof Value.Rows nested) {
                Table table = nested.table();
                tables.addAll(CsvTable.of(new Table(table.key(), fact.label(), table.columns(), table.rows())));
            } else if (!(fact.value() instanceof Value.Absent)) {
                rows.add(List.of(prefix + fact.key(), cell(fact.value()), protect(fact.unit())));
            }
        }
    }

    /** A value in one cell; a table leaves it empty. */
    static String cell(Value value) {
        if (value instanceof Value.Text text) {
            return protect(text.text());
        }
        if (value instanceof Value.Exact exact) {
            boolean plain = exact.formula().matches("[-A-Za-z0-9_+*/^()., ]+");
            return plain ? exact.formula() : protect(exact.formula());
        }
        if (value instanceof Value.Flag flag) {
            return Boolean.toString(flag.set());
        }
        if (value instanceof Value.Absent || value instanceof Value.Rows) {
            return "";
        }
        if (value instanceof Value.Listing listing) {
            return protect(listing.values().stream().map(CsvWriter::cell).collect(Collectors.joining("; ")));
        }
        if (value instanceof Value.Group group) {
            return group.facts().facts().stream()
                    .filter(fact -> !(fact.value() instanceof Value.Absent))
                    .map(fact -> fact.key() + "=" + cell(fact.value()))
                    .collect(Collectors.joining("; "));
        }
        return Cell.of(value).text();
    }

    /** The text, behind an apostrophe if a spreadsheet would run it. */
    static String protect(String text) {
        String clean = PlainText.clean(text);
        String start = clean.stripLeading();
        boolean formula = !start.isEmpty() && "=+-@".indexOf(start.charAt(0)) >= 0;
        boolean number = start.matches("[+-]?\\d+(?:[./]\\d+)?(?:[eE][+-]?\\d+)?(?:; .*)?");
        return formula && !number ? "'" + clean : clean;
    }
}
