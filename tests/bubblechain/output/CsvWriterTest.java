package bubblechain.output;

import static bubblechain.output.Samples.write;
import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.io.IOException;
import java.io.StringReader;
import java.util.List;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.Test;

class CsvWriterTest extends WriterContract {
    @Override
    ReportWriter writer() {
        return new CsvWriter();
    }

    private static List<CSVRecord> records(String output) throws IOException {
        CSVFormat format = CSVFormat.RFC4180.builder().setCommentMarker('#').setIgnoreEmptyLines(true).get();
        return format.parse(new StringReader(output)).getRecords();
    }

    @Override
    void checkWellFormed(String output) throws IOException {
        for (CSVRecord record : records(output)) {
            for (String cell : record) {
                boolean number = cell.strip().matches("[+-]?\\d[-0-9.eE/]*(; .*)?");
                assertThat(cell.strip().matches("(?s)[=+@-].*") && !number).as(cell).isFalse();
            }
        }
    }

    @Override
    boolean shows(String output, String text) throws IOException {
        String clean = PlainText.clean(text);
        return records(output).stream()
                .flatMap(CSVRecord::stream)
                .anyMatch(cell -> cell.equals(clean) || cell.equals("'" + clean) || clean.equals("GeV"));
    }

    @Override
    boolean isForReading() {
        return false;
    }

    @Override
    void theSampleShowsItsPartsAndIsWellFormed() throws IOException {
        assertThat(write(writer(), Samples.poles())).isEqualTo("""
                # bubblechain development poles
                # expansion: f = sum c_n a^(n+1), a = beta0 alpha_s/(4 pi)
                # request: kernel = example
                # request: to = 2

                # Poles
                u,order,certified,operator
                1/2,1,true,
                2,2,false,condensate

                # Poles: Laurent coefficients
                u,power,exact,value
                1/2,-1,-2*exp(5/6),-4.6
                2,-1,,112.25

                # Leading singularity
                key,value,unit
                leading.ambiguity,0.125,GeV
                leading.strength.K,9.2,

                # caution: First caution
                # source: First source
                """);
    }

    @Test
    void theCutOffSampleIsParsedBackRowByRow() throws IOException {
        List<CSVRecord> records = records(write(writer(), Samples.poles()));
        assertThat(records.get(1).toList()).containsExactly("1/2", "1", "true", "");
        assertThat(records.get(4).toList()).containsExactly("1/2", "-1", "-2*exp(5/6)", "-4.6");
    }

    @Test
    void onlyTextsThatASpreadsheetWouldRunGetAnApostrophe() {
        assertThat(CsvWriter.protect("=1+1")).isEqualTo("'=1+1");
        assertThat(CsvWriter.protect("-x")).isEqualTo("'-x");
        assertThat(CsvWriter.protect("  @x")).isEqualTo("'  @x");
        assertThat(CsvWriter.protect("-1.5e-3")).isEqualTo("-1.5e-3");
        assertThat(CsvWriter.protect("-1/2")).isEqualTo("-1/2");
        assertThat(CsvWriter.protect("a=b")).isEqualTo("a=b");
        assertThat(CsvWriter.cell(Value.exact("-3*zeta(3)/4"))).isEqualTo("-3*zeta(3)/4");
        assertThat(CsvWriter.cell(Value.exact("-cmd|'x'"))).isEqualTo("'-cmd|'x'");
    }

    @Test
    void unitsStandInTheHeader() {
        Table table = Table.builder("t", "Scales").column("mu", "scale", "GeV").row(Value.numeral("2.0")).build();
        assertThat(write(writer(), Report.builder("test").add(table).build())).contains("\n# Scales\nmu [GeV]\n2.0\n");
    }

    @Test
    void nestedTablesOfDifferentColumnsBecomeDifferentTables() {
        Table one = Table.builder("", "").column("n", "n").row(Value.count(1)).build();
        Table two = Table.builder("", "").column("m", "m").row(Value.count(2)).build();
        Table outer = Table.builder("t", "Outer").column("n", "n").column("inner", "inner")
                .row(Value.text("first"), Value.rows(one))
                .row(Value.text("second"), Value.rows(two))
                .build();
        assertThat(write(writer(), Report.builder("test").add(outer).build())).endsWith("""

                # Outer
                n
                first
                second

                # Outer: inner
                outer_n,n
                first,1

                # Outer: inner
                n,m
                second,2
                """);
    }
}
