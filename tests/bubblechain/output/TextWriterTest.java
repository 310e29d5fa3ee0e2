package bubblechain.output;

import static bubblechain.output.Samples.write;
import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.report.Column;
import bubblechain.report.Facts;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class TextWriterTest extends WriterContract {
    @Override
    ReportWriter writer() {
        return TextWriter.ofWidth(80);
    }

    @Override
    void checkWellFormed(String output) {
        for (String line : output.split("\n", -1)) {
            assertThat(line.codePointCount(0, line.length())).as(line).isLessThanOrEqualTo(80);
            assertThat(line).isEqualTo(line.stripTrailing());
        }
        assertThat(output).doesNotContain("\n\n\n");
    }

    @Override
    boolean shows(String output, String text) {
        String dense = PlainText.oneLine(text).replace(" ", "");
        return output.replaceAll("\\s", "").contains(dense);
    }

    @Override
    boolean isForReading() {
        return true;
    }

    @Test
    void theSampleLooksLikeThis() {
        assertThat(write(writer(), Samples.poles())).isEqualTo("""
                bubblechain poles
                  expansion  f = sum c_n a^(n+1), a = beta0 alpha_s/(4 pi)
                  request    kernel = example, to = 2

                Poles
                  u  order  kind      operator
                ---  -----  --------  ----------
                1/2      1  infrared  -
                    Laurent coefficients
                    power  exact        value
                       -1  -2*exp(5/6)   -4.6

                  2      2  infrared  condensate
                    Laurent coefficients
                    power  exact        value
                       -1  -            112.25

                Leading singularity
                  ambiguity  0.125 GeV
                  strength
                      K  9.2

                A remark for the reader.

                Cautions
                  - First caution

                Sources
                  - First source
                """);
    }

    @Test
    void numbersAreAlignedAtThePointAndBrokenBelowTheirDigits() {
        Table table = Table.builder("t", "Constants")
                .column("n", "n")
                .column("v", "value", "GeV")
                .row(Value.count(8), Value.numeral(Samples.LONG_NUMBER))
                .row(Value.count(9), Value.numeral("-12.5"))
                .row(Value.count(10), Value.numeral("0"))
                .row(Value.count(11), Value.text("0 within 10^-40 (not proved zero)"))
                .build();
        String output = write(TextWriter.ofWidth(60), Report.builder("test").add(table).build());
        assertThat(output).isEqualTo("""
                bubblechain test

                Constants
                 n  value [GeV]
                --  --------------------------------------------------------
                 8    3.1415926535897932384626433832795028841971693993751058
                        2097494459230781640628620899862803482534211706798214
                        8086513282306647
                 9  -12.5
                10    0
                11  0 within 10^-40 (not proved zero)
                """);
    }

    @Test
    void aWideTableOfWordsAndDigitsKeepsTheDigitsWhole() {
        Table table = Table.builder("t", "")
                .column("v", "value")
                .column("e", "exact")
                .row(
                        Value.numeral("1.234567890123456789012345678901"),
                        Value.exact("71/8+pi^2+2*pi^2*ln(2)/3-zeta(3)/6"))
                .row(Value.numeral("2.234567890123456789012345678901"), Value.exact("1/2"))
                .build();
        assertThat(write(TextWriter.ofWidth(54), Report.builder("test").add(table).build())).isEqualTo("""
                bubblechain test

                value                             exact
                --------------------------------  --------------------
                1.234567890123456789012345678901  71/8+pi^2+2*pi^2*
                                                  ln(2)/3-zeta(3)/6
                2.234567890123456789012345678901  1/2
                """);
    }

    @Test
    void aTableTooWideForAnyColumnsIsWrittenAsAList() {
        Table.Builder table = Table.builder("t", "Wide");
        for (int c = 0; c < 4; c++) {
            table.column("c" + c, "long heading " + c);
        }
        table.row(
                Value.text("first words of the cell"),
                Value.numeral("1.23456789012345678901234567890"),
                Value.text("third words of the cell"),
                Value.count(4));
        assertThat(write(TextWriter.ofWidth(40), Report.builder("test").add(table.build()).build())).isEqualTo("""
                bubblechain test

                Wide

                long heading 0  first words of the cell
                long heading 1  1.2345678901234567890123
                                4567890
                long heading 2  third words of the cell
                long heading 3  4
                """);
    }

    @Test
    void longHeadingsAreBrokenAndLowered() {
        Table table = Table.builder("t", "")
                .column("p", "power of Lambda over Q")
                .column("o", "operator")
                .row(Value.count(4), Value.text("the gluon condensate of dimension"))
                .build();
        assertThat(write(TextWriter.ofWidth(48), Report.builder("test").add(table).build())).isEqualTo("""
                bubblechain test

                     power of
                Lambda over Q  operator
                -------------  ---------------------------------
                            4  the gluon condensate of dimension
                """);
    }

    @Test
    void columnsWithoutAnyValueAreLeftOut() {
        Table table = Table.builder("t", "")
                .column("a", "seen")
                .column("b", "unseen")
                .row(Value.count(1), Value.absent())
                .build();
        assertThat(write(writer(), Report.builder("test").add(table).build())).contains("seen").doesNotContain("unseen");
    }

    @Test
    void longLabelsAndValuesOfFactsHang() {
        Facts facts = Facts.titled("f", "")
                .with("a", "short", Value.numeral("1.2345678901234567890123456789"), "GeV^2")
                .with("b", "a label that is much longer than half of the line", Value.flag(true));
        assertThat(write(TextWriter.ofWidth(40), Report.builder("test").add(facts).build())).isEqualTo("""
                bubblechain test

                short  1.2345678901234567890123456789
                       GeV^2
                a label that is much longer than half of
                the line
                       yes
                """);
    }

    @Test
    void listsInFactsAreJoinedAndListsOfTablesFollow() {
        Table inner = Table.builder("", "").column("x", "x").row(Value.count(7)).build();
        Facts facts = Facts.titled("f", "")
                .with("a", "values", Value.listing(Value.numeral("1.5"), Value.absent(), Value.exact("pi")))
                .with("b", "tables", Value.listing(Value.rows(inner), Value.text("end")));
        assertThat(write(writer(), Report.builder("test").add(facts).build())).isEqualTo("""
                bubblechain test

                values  1.5, -, pi
                tables
                    x
                    7
                    end
                """);
    }

    @ParameterizedTest
    @ValueSource(ints = {-1, 0, 1, 39, 40})
    void noWidthIsTooSmall(int width) {
        String output = write(TextWriter.ofWidth(width), Samples.poles());
        assertThat(output.lines().mapToInt(String::length)).allMatch(length -> length <= 40);
        assertThat(shows(output, "112.25")).isTrue();
    }

    @Test
    void aNestedColumnOfSomeRowsOnlyLeavesTheOthersAlone() {
        Table inner = Table.builder("", "").column("x", "x").row(Value.count(7)).build();
        Table table = Table.builder("t", "")
                .column("a", "a")
                .column(Column.of("b", "detail"))
                .row(Value.count(1), Value.absent())
                .row(Value.count(2), Value.rows(inner))
                .build();
        assertThat(write(writer(), Report.builder("test").add(table).build())).isEqualTo("""
                bubblechain test

                a
                -
                1
                2
                    detail
                    x
                    7
                """);
    }
}
