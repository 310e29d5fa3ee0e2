package bubblechain.report;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class ReportTest {
    @Test
    void sourcesAndCautionsKeepTheirOrderAndAppearOnce() {
        Report report = Report.builder("poles")
                .source("second")
                .source("first")
                .source("second")
                .caution("c")
                .caution("c")
                .build();
        assertThat(report.sources()).containsExactly("second", "first");
        assertThat(report.cautions()).containsExactly("c");
    }

    @Test
    void aReportMadeWithoutTheBuilderDropsDuplicatesToo() {
        Report report = new Report("x", Map.of(), "", List.of(), List.of("s", "s"), List.of("c", "d", "c"));
        assertThat(report.sources()).containsExactly("s");
        assertThat(report.cautions()).containsExactly("c", "d");
    }

    @Test
    void requestKeepsItsOrderAndTheLastValueOfAKey() {
        Report report = Report.builder("poles").request("to", "2").request("from", "1").request("to", "3").build();
        assertThat(report.request().keySet()).containsExactly("to", "from");
        assertThat(report.request()).containsEntry("to", "3");
    }

    @Test
    void partsOfAReportCannotBeChanged() {
        Report report = Report.builder("poles").request("a", "b").add(new Note("x")).build();
        assertThat(report.request()).isUnmodifiable();
        assertThat(report.blocks()).isUnmodifiable();
    }

    @Test
    void twoBlocksCannotUseTheSameKey() {
        Table table = Table.builder("poles", "Poles").column("u", "u").build();
        Report.Builder twice = Report.builder("poles").add(table).add(Facts.titled("poles", ""));
        assertThatThrownBy(twice::build)
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessage("key 'poles' appears twice in the result of 'poles'");
    }

    @Test
    void entriesOfFactsWithoutAKeyShareTheNamesOfTheResult() {
        Facts loose = Facts.titled("", "").with("poles", "number", Value.count(3));
        Table table = Table.builder("poles", "Poles").column("u", "u").build();
        assertThatThrownBy(Report.builder("x").add(loose).add(table)::build)
                .hasMessageContaining("'poles' appears twice");
    }

    @Test
    void aTableOfAReportNeedsAKeyAndANestedOneDoesNot() {
        Table nameless = Table.builder("", "inner").column("u", "u").build();
        assertThatThrownBy(Report.builder("x").add(nameless)::build).hasMessageContaining("key ''");
        Table outer = Table.builder("t", "").column("c", "c").row(Value.rows(nameless)).build();
        assertThat(Report.builder("x").add(outer).build().blocks()).containsExactly(outer);
    }

    @Test
    void aRowMustFitTheColumns() {
        Table.Builder table = Table.builder("t", "Title").column("a", "a").column("b", "b").row(Value.count(1));
        assertThatThrownBy(table::build)
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessage("a row of table 'Title' has 1 cells, there are 2 columns");
    }

    @Test
    void aTableNeedsColumnsWithDifferentKeys() {
        assertThatThrownBy(() -> new Table("t", "Title", List.of(), List.of())).hasMessageContaining("no columns");
        assertThatThrownBy(Table.builder("t", "Title").column("a", "x").column("a", "y")::build)
                .hasMessageContaining("key 'a' appears twice");
    }

    @Test
    void theUnitOfAValueTakesAKeyToo() {
        assertThatThrownBy(() -> Facts.titled("f", "")
                        .with("mu", "scale", Value.numeral("2"), "GeV")
                        .with("mu_unit", "unit", Value.text("GeV")))
                .hasMessageContaining("key 'mu_unit' appears twice");
        assertThatThrownBy(Table.builder("t", "").column("mu", "mu", "GeV").column("mu_unit", "unit")::build)
                .hasMessageContaining("key 'mu_unit' appears twice");
    }

    @Test
    void keysAreLettersDigitsAndUnderscores() {
        for (String bad : List.of("", "1a", "a b", "a-b", "_a", "\u00e9")) {
            assertThatThrownBy(() -> Column.of(bad, "heading")).as(bad).isInstanceOf(IllegalArgumentException.class);
            assertThatThrownBy(() -> new Fact(bad, "label", Value.count(1), "")).as(bad)
                    .isInstanceOf(IllegalArgumentException.class);
        }
        assertThat(Column.of("R_u0", "heading").key()).isEqualTo("R_u0");
    }

    @Test
    void aNumeralIsADecimalNumber() {
        for (String good : List.of("0", "-1", "+2.50", "1e10", "-3.25E-7")) {
            assertThat(Value.numeral(good)).isEqualTo(new Value.Numeral(good));
        }
        for (String bad : List.of("", "NaN", "Infinity", "1.", ".5", "1,5", "1/2", "0x1", "1e", " 1", "1.2(3)")) {
            assertThatThrownBy(() -> Value.numeral(bad)).as(bad).isInstanceOf(IllegalArgumentException.class);
        }
    }

    @Test
    void emptyNotesFormulasAndCommandsAreRefused() {
        assertThatThrownBy(() -> new Note(" ")).isInstanceOf(IllegalArgumentException.class);
        assertThatThrownBy(() -> Value.exact("")).isInstanceOf(IllegalArgumentException.class);
        assertThatThrownBy(Report.builder("")::build).isInstanceOf(IllegalArgumentException.class);
    }

    @Test
    void placesDecideWhatIsShownWhere() {
        Column column = Column.of("a", "a", "GeV");
        assertThat(column.place().inText() && column.place().inData()).isTrue();
        assertThat(column.textOnly().place().inData()).isFalse();
        assertThat(column.textOnly().place().inText()).isTrue();
        assertThat(column.dataOnly().place().inText()).isFalse();
        assertThat(column.dataOnly().place().inData()).isTrue();
        assertThat(column.dataOnly().unit()).isEqualTo("GeV");
    }

    @Test
    void anEmptyColumnHasOnlyAbsentValues() {
        Table table = Table.builder("t", "")
                .column("a", "a")
                .column("b", "b")
                .row(Value.count(1), Value.absent())
                .row(Value.absent(), Value.orAbsent(Optional.empty()))
                .build();
        assertThat(table.isEmpty(0)).isFalse();
        assertThat(table.isEmpty(1)).isTrue();
    }
}
