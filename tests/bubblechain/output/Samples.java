package bubblechain.output;

import bubblechain.report.Column;
import bubblechain.report.Facts;
import bubblechain.report.Note;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.io.IOException;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import java.util.List;

/** Reports for the tests of the writers; the numbers in them mean nothing. */
final class Samples {
    /** The first 120 decimal places of pi are a number whose digits a reader can check. */
    static final String LONG_NUMBER = "3.14159265358979323846264338327950288419716939937510582097494459230781640628620"
            + "8998628034825342117067982148086513282306647";

    static final List<String> HOSTILE = List.of(
            "=cmd|'/C calc'!A0",
            "+1+cmd",
            "-SUM(A1)",
            "@import",
            "<script>alert('x')</script> & more",
            "\"double\" 'single' `back`",
            "50% of $x_1^2 # {brace} ~ tilde \\backslash",
            "\\end{tabular} \\input{secret} %",
            "line one\nline two\r\nline three\rfour",
            "tab\there",
            "bell\u0007 escape\u001b[31m nul\u0000 delete\u007f",
            "right-to-left\u202eoverride, byte order mark\ufeff",
            "\u00fc\u00df\u00e9 \u03b1\u03b2 \u2264 \ud835\udc65 (mathematical x)",
            "lone surrogate \ud835.",
            ",;:|\t\"\"",
            "# not a comment",
            "[optional] *star",
            "'apostrophe first",
            "-1.5",
            " ",
            "");

    private Samples() {}

    static Report poles() {
        return Report.builder("poles")
                .request("kernel", "example")
                .request("to", "2")
                .normalisation("f = sum c_n a^(n+1), a = beta0 alpha_s/(4 pi)")
                .add(Table.builder("poles", "Poles")
                        .column("u", "u")
                        .column("order", "order")
                        .column(Column.of("kind", "kind").textOnly())
                        .column(Column.of("certified", "certified").dataOnly())
                        .column("operator", "operator")
                        .column("laurent", "Laurent coefficients")
                        .row(
                                Value.exact("1/2"),
                                Value.count(1),
                                Value.text("infrared"),
                                Value.flag(true),
                                Value.absent(),
                                Value.rows(laurent(Value.exact("-2*exp(5/6)"), "-4.6")))
                        .row(
                                Value.exact("2"),
                                Value.count(2),
                                Value.text("infrared"),
                                Value.flag(false),
                                Value.text("condensate"),
                                Value.rows(laurent(Value.absent(), "112.25")))
                        .build())
                .add(Facts.titled("leading", "Leading singularity")
                        .with("ambiguity", "ambiguity", Value.numeral("0.125"), "GeV")
                        .with("missing", "missing", Value.absent())
                        .with("strength", "strength", Value.group(
                                Facts.titled("", "").with("K", "K", Value.numeral("9.2")))))
                .add(new Note("A remark for the reader."))
                .source("First source")
                .caution("First caution")
                .build();
    }

    private static Table laurent(Value exact, String value) {
        return Table.builder("", "")
                .column("power", "power")
                .column("exact", "exact")
                .column("value", "value")
                .row(Value.count(-1), exact, Value.numeral(value))
                .build();
    }

    /** A report with the text in every place that takes one. */
    static Report with(String text) {
        Facts group = Facts.titled("inner", text).with("k", text, Value.text(text), text);
        Table nested = Table.builder("", text).column("n", text, text).row(Value.text(text)).build();
        return Report.builder("test " + text)
                .request("request " + text, text)
                .normalisation(text)
                .add(Table.builder("table", text)
                        .column("plain", text)
                        .column("unit", text, text)
                        .column("exact", text)
                        .column("list", text)
                        .column("group", text)
                        .column("rows", text)
                        .row(
                                Value.text(text),
                                Value.text(text),
                                Value.exact("x" + text),
                                Value.listing(Value.text(text), Value.count(1)),
                                Value.group(group),
                                Value.rows(nested))
                        .build())
                .add(group)
                .add(Facts.titled("", text).with("loose", text, Value.listing(Value.text(text), Value.text(text))))
                .add(new Note("note " + text))
                .source(text)
                .caution(text)
                .build();
    }

    static String write(ReportWriter writer, Report report) {
        StringWriter out = new StringWriter();
        try {
            writer.write(report, out);
        } catch (IOException impossible) {
            throw new UncheckedIOException(impossible);
        }
        return out.toString();
    }
}
