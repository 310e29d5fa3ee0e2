package bubblechain.output;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

class OutputFormatTest {
    @Test
    void formatsAreNamedInAnyCase() {
        assertThat(OutputFormat.named("JSON")).hasValue(OutputFormat.JSON);
        assertThat(OutputFormat.named("latex")).hasValue(OutputFormat.LATEX);
        assertThat(OutputFormat.named("xml")).isEmpty();
        assertThat(OutputFormat.names()).containsExactly("text", "json", "csv", "latex");
    }

    @Test
    void eachFormatHasItsWriter() {
        assertThat(OutputFormat.TEXT.writer(80)).isInstanceOf(TextWriter.class);
        assertThat(OutputFormat.JSON.writer(80)).isInstanceOf(JsonWriter.class);
        assertThat(OutputFormat.CSV.writer(80)).isInstanceOf(CsvWriter.class);
        assertThat(OutputFormat.LATEX.writer(80)).isInstanceOf(LatexWriter.class);
    }

    @Test
    void theTextWriterIsGivenTheWidth() {
        String narrow = Samples.write(OutputFormat.TEXT.writer(50), Samples.with("several words to be broken somewhere"));
        assertThat(narrow.lines().mapToInt(String::length)).allMatch(length -> length <= 50);
    }

    @Test
    void theVersionOfClassesOutsideTheJarIsDevelopment() {
        assertThat(ProgramVersion.text()).isEqualTo("development");
    }
}
