package bubblechain.output;

import static bubblechain.output.Samples.write;
import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.report.Facts;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.util.ArrayDeque;
import java.util.Deque;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;

class LatexWriterTest extends WriterContract {
    private static final Pattern TOKEN = Pattern.compile("\\\\(begin|end)\\{(\\w+)\\}|\\\\(?:[A-Za-z]+|.)|[{}$#^_\"|<>%~]");

    @Override
    ReportWriter writer() {
        return new LatexWriter();
    }

    @Override
    void checkWellFormed(String output) {
        Deque<String> open = new ArrayDeque<>();
        boolean math = false;
        for (String line : output.split("\n")) {
            if (line.startsWith("%")) {
                continue;
            }
            Matcher tokens = TOKEN.matcher(line);
            while (tokens.find()) {
                String token = tokens.group();
                if ("begin".equals(tokens.group(1))) {
                    open.push(tokens.group(2));
                } else if ("end".equals(tokens.group(1))) {
                    assertThat(open.pop()).as(line).isEqualTo(tokens.group(2));
                } else if (token.equals("{")) {
                    open.push("{");
                } else if (token.equals("}")) {
                    assertThat(open.pop()).as(line).isEqualTo("{");
                } else if (token.equals("$")) {
                    math = !math;
                } else if (token.length() == 1) {
                    assertThat(math && "^_".contains(token)).as("special " + token + " in " + line).isTrue();
                }
            }
            assertThat(math).as(line).isFalse();
        }
        assertThat(open).isEmpty();
    }

    @Override
    boolean shows(String output, String text) {
        String plain = output.replaceAll("(?m)^%.*$", "")
                .replaceAll("\\{\\}|\\$ & \\$|(?<!\\\\)\\$", "")
                .replace("{[}", "[")
                .replace("{]}", "]")
                .replace("\\textasciicircum", "^")
                .replace("\\textasciitilde", "~")
                .replace("\\textless", "<")
                .replace("\\textgreater", ">")
                .replace("\\textbar", "|")
                .replace("\\char34", "\"")
                .replaceAll("\\\\([{}#$%&_])", "$1")
                .replace("\\textbackslash", "\\");
        return plain.contains(PlainText.oneLine(text));
    }

    @Override
    boolean isForReading() {
        return true;
    }

    @Test
    void theSampleLooksLikeThis() {
        assertThat(write(writer(), Samples.poles())).startsWith("""
                % bubblechain development poles
                % request: kernel = example
                % request: to = 2
                % needs \\usepackage{booktabs}

                \\begin{table}
                \\centering
                \\caption{Poles. f = sum c\\_n a\\textasciicircum{}(n+1), a = beta0 alpha\\_s/(4 pi).}
                \\begin{tabular}{rrlll}
                \\toprule
                u & order & kind & operator & Laurent coefficients (power, exact, value) \\\\
                \\midrule
                """);
    }

    @Test
    void numbersAreAlignedAtThePointInMathMode() {
        Table table = Table.builder("t", "Title")
                .column("n", "n")
                .column("v", "value", "GeV")
                .row(Value.count(-1), Value.numeral("-12.50"))
                .row(Value.count(2), Value.numeral("3.5e-12"))
                .row(Value.count(3), Value.numeral("4"))
                .row(Value.count(4), Value.absent())
                .build();
        assertThat(write(writer(), Report.builder("test").add(table).build())).contains("""
                \\begin{tabular}{rr@{}l}
                \\toprule
                n & \\multicolumn{2}{l}{value (GeV)} \\\\
                \\midrule
                $-1$ & $-12$ & $.50$ \\\\
                $2$ & $3$ & $.5\\times10^{-12}$ \\\\
                $3$ & $4$ &  \\\\
                $4$ & \\multicolumn{2}{l}{--} \\\\
                \\bottomrule
                """);
    }

    @Test
    void namedValuesBecomeATable() {
        Facts facts = Facts.titled("f", "Scale").with("mu", "mu_0", Value.numeral("2.5"), "GeV");
        assertThat(write(writer(), Report.builder("test").add(facts).build())).contains("mu\\_0 & $2.5$\\,GeV \\\\\n");
    }

    @Test
    void exactNumbersBecomeFormulas() {
        assertThat(LatexFormula.of("-3*zeta(3)/4+pi^2/6")).hasValue("-3\\,\\zeta (3)/4 + \\pi ^{2}/6");
        assertThat(LatexFormula.of("1/2")).hasValue("1/2");
        assertThat(LatexFormula.of("2*3*pi^(3/2)*sqrt(2)")).hasValue("2\\cdot 3\\,\\pi ^{3/2}\\,\\sqrt{2}");
        assertThat(LatexFormula.of("exp(-5/3)^2*exp(euler_gamma)"))
                .hasValue("(e^{-5/3})^{2}\\,e^{\\gamma_E }");
        assertThat(LatexFormula.of("2^3^4")).hasValue("2^{3^{4}}");
        assertThat(LatexFormula.of("2^(1+1)^-4")).hasValue("2^{(1 + 1)^{-4}}");
        assertThat(LatexFormula.of("polygamma(2, 1/4)")).hasValue("\\mathrm{polygamma}(2,1/4)");
    }

    @Test
    void whatIsNotAFormulaIsNotTurnedIntoOne() {
        for (String bad : new String[] {"2^", "(1", "1)", "1 $ 2", "\\input{x}", "2^*", "sqrt(2"}) {
            assertThat(LatexFormula.of(bad)).as(bad).isEmpty();
        }
    }
}
