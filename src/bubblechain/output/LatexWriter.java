package bubblechain.output;

import bubblechain.report.Block;
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

/**
 * Writes a report as LaTeX tables to be put into a paper, with the rules of the package booktabs; nothing else is
 * needed. Program, request, cautions and sources stand in comments; the expansion is part of every caption.
 *
 * <p>Numbers are aligned at the decimal point by two columns without space between; exact numbers are set as formulas.
 */
public final class LatexWriter implements ReportWriter {
    @Override
    public void write(Report report, Writer out) throws IOException {
        StringBuilder latex = new StringBuilder();
        comment(latex, "bubblechain " + ProgramVersion.text() + " " + report.command());
        report.request().forEach((key, value) -> comment(latex, "request: " + key + " = " + value));
        comment(latex, "needs \\usepackage{booktabs}");
        for (Block block : report.blocks()) {
            latex.append('\n');
            if (block instanceof Note note) {
                PlainText.clean(note.text()).lines().forEach(line -> line(latex, LatexText.escape(line)));
            } else if (block instanceof Facts facts) {
                floating(latex, caption(facts.title(), report), () -> facts(latex, facts));
            } else if (block instanceof Table table) {
                floating(latex, caption(table.title(), report), () -> new LatexTable(table).append(latex));
            }
        }
        if (!report.cautions().isEmpty() || !report.sources().isEmpty()) {
            latex.append('\n');
        }
        report.cautions().forEach(caution -> comment(latex, "caution: " + caution));
        report.sources().forEach(source -> comment(latex, "source: " + source));
        out.write(latex.toString());
    }

    private static void comment(StringBuilder latex, String text) {
        latex.append("% ").append(PlainText.oneLine(text)).append('\n');
    }

    private static void line(StringBuilder latex, String line) {
        latex.append(line).append('\n');
    }

    private static String caption(String title, Report report) {
        List<String> sentences = new ArrayList<>();
        for (String words : List.of(title, report.normalisation())) {
            if (!words.isBlank()) {
                sentences.add(LatexText.escape(words) + ".");
            }
        }
        return String.join(" ", sentences);
    }

    private static void floating(StringBuilder latex, String caption, Runnable body) {
        line(latex, "\\begin{table}");
        line(latex, "\\centering");
        if (!caption.isEmpty()) {
            line(latex, "\\caption{" + caption + "}");
        }
        body.run();
        line(latex, "\\end{table}");
    }

    private static void facts(StringBuilder latex, Facts facts) {
        line(latex, "\\begin{tabular}{ll}");
        line(latex, "\\toprule");
        for (Fact fact : facts.facts()) {
            if (!(fact.value() instanceof Value.Absent)) {
                String unit = fact.unit().isBlank() ? "" : "\\," + LatexText.escape(fact.unit());
                line(latex, LatexText.escape(fact.label()) + " & " + LatexTable.cell(fact.value()) + unit + " \\\\");
            }
        }
        line(latex, "\\bottomrule");
        line(latex, "\\end{tabular}");
    }
}
