package bubblechain.output;

import static bubblechain.output.Samples.write;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.report.Column;
import bubblechain.report.Facts;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.io.IOException;
import java.io.Writer;
import java.util.Random;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** What every writer must do, whatever its format. */
abstract class WriterContract {
    abstract ReportWriter writer();

    /** Fails if the output is not well formed in its format. */
    abstract void checkWellFormed(String output) throws IOException;

    /** True if the text can be read from the output as a reader of the format would read it. */
    abstract boolean shows(String output, String text) throws IOException;

    /** True for formats that people read, false for data. */
    abstract boolean isForReading();

    static Iterable<String> hostileTexts() {
        return Samples.HOSTILE;
    }

    @ParameterizedTest
    @MethodSource("hostileTexts")
    void hostileTextsStayWellFormed(String text) throws IOException {
        check(write(writer(), Samples.with(text)));
    }

    @ParameterizedTest
    @MethodSource("hostileTexts")
    void hostileTextsAreShownAsTheyAreButForControlCharacters(String text) throws IOException {
        Report report = Report.builder("test")
                .add(Table.builder("t", "Title").column("c", "c").row(Value.text(text)).build())
                .build();
        assertThat(shows(write(writer(), report), text)).as("text is shown").isTrue();
    }

    @Test
    void randomTextsOfSeed5StayWellFormed() throws IOException {
        Random random = new Random(5);
        String alphabet = "ab 1-+=@#$%&_{}[]()^~\\/\"'`<>|,;:.*\n\r\t\u001b\u202e\u00e9\u03b1";
        for (int trial = 0; trial < 60; trial++) {
            StringBuilder text = new StringBuilder();
            IntStream.range(0, random.nextInt(40))
                    .forEach(i -> text.append(alphabet.charAt(random.nextInt(alphabet.length()))));
            check(write(writer(), Samples.with(text.toString())));
        }
    }

    @Test
    void theSampleShowsItsPartsAndIsWellFormed() throws IOException {
        String output = write(writer(), Samples.poles());
        check(output);
        for (String part : new String[] {"-4.6", "112.25", "0.125", "GeV", "9.2", "condensate"}) {
            assertThat(shows(output, part)).as(part).isTrue();
        }
        assertThat(output).contains("First source", "First caution", "example").doesNotContain("missing", "Absent");
    }

    @Test
    void theNormalisationAndTheCommandAreStated() {
        Report report = Report.builder("poles")
                .normalisation("M over m in a")
                .add(Table.builder("t", "Title").column("c", "c").row(Value.count(1)).build())
                .build();
        assertThat(write(writer(), report)).contains("M over m in a", "poles", "bubblechain");
    }

    @Test
    void aLongNumberKeepsEveryDigit() throws IOException {
        Table table = Table.builder("t", "Title")
                .column("n", "n")
                .column("v", "value")
                .row(Value.count(0), Value.numeral(Samples.LONG_NUMBER))
                .row(Value.count(1), Value.numeral("-12345.5e-100"))
                .build();
        String output = write(writer(), Report.builder("test").add(table).build());
        assertThat(shows(output, Samples.LONG_NUMBER)).isTrue();
        check(output);
    }

    @Test
    void columnsAppearWhereTheyBelong() throws IOException {
        Table table = Table.builder("t", "Title")
                .column(Column.of("both", "both"))
                .column(Column.of("reading", "reading").textOnly())
                .column(Column.of("data", "data").dataOnly())
                .row(Value.text("everywhere"), Value.text("onlyread"), Value.text("onlydata"))
                .build();
        String output = write(writer(), Report.builder("test").add(table).build());
        assertThat(shows(output, "everywhere")).isTrue();
        assertThat(shows(output, "onlyread")).isEqualTo(isForReading());
        assertThat(shows(output, "onlydata")).isEqualTo(!isForReading());
    }

    @Test
    void emptyReportsTablesFactsAndListsAreWritten() throws IOException {
        check(write(writer(), Report.builder("test").build()));
        check(write(writer(), Report.builder("test")
                .add(Table.builder("t", "Title").column("c", "c").build())
                .add(Table.builder("s", "").column("c", "c").row(Value.absent()).build())
                .add(Facts.titled("f", ""))
                .add(Facts.titled("g", "").with("l", "list", Value.listing()).with("a", "absent", Value.absent()))
                .build()));
    }

    @Test
    void tablesInsideTablesInsideTablesAreWritten() throws IOException {
        Table innermost = Table.builder("", "").column("z", "z").row(Value.numeral("3.75")).build();
        Table middle = Table.builder("", "").column("y", "y").column("w", "w")
                .row(Value.text("middle"), Value.rows(innermost)).build();
        Table outer = Table.builder("t", "Title").column("x", "x")
                .row(Value.rows(middle)).row(Value.text("plain")).row(Value.absent()).build();
        String output = write(writer(), Report.builder("test").add(outer).build());
        check(output);
        assertThat(shows(output, "3.75")).isTrue();
        assertThat(shows(output, "plain")).isTrue();
        assertThat(shows(output, "middle")).isTrue();
    }

    @Test
    void equalReportsGiveEqualOutput() {
        assertThat(write(writer(), Samples.poles())).isEqualTo(write(writer(), Samples.poles()));
    }

    @Test
    void theTargetIsNotClosedAndItsFailureIsPassedOn() {
        Writer failing = new Writer() {
            @Override
            public void write(char[] characters, int from, int length) throws IOException {
                throw new IOException("disk full");
            }

            @Override
            public void flush() {
                throw new AssertionError("flushed");
            }

            @Override
            public void close() {
                throw new AssertionError("closed");
            }
        };
        assertThatThrownBy(() -> writer().write(Samples.poles(), failing))
                .isInstanceOf(IOException.class)
                .hasMessage("disk full");
    }

    private void check(String output) throws IOException {
        assertThat(output).endsWith("\n").doesNotEndWith("\n\n");
        assertThat(output.codePoints().filter(c -> c != '\n').map(Character::getType).toArray())
                .doesNotContain(Character.CONTROL, Character.FORMAT, Character.SURROGATE);
        checkWellFormed(output);
    }
}
