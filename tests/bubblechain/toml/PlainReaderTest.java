package bubblechain.toml;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The plain reader and the library read the same from every file the plain one takes. */
class PlainReaderTest {
    static List<Path> shippedFiles() throws IOException {
        try (Stream<Path> kernels = Files.walk(Path.of("kernels"));
                Stream<Path> series = Files.walk(Path.of("reference-values/series"))) {
            return Stream.concat(kernels, series)
                    .filter(p -> p.toString().endsWith(".toml"))
                    .toList();
        }
    }

    @ParameterizedTest
    @MethodSource("shippedFiles")
    void shippedFilesArePlainAndReadAlike(Path file) throws IOException {
        String text = Files.readString(file);
        assertThat(PlainReader.read(text)).as("read without the library").isPresent();
        assertThat(PlainReader.read(text).orElseThrow()).isEqualTo(GeneralReader.read(text, file.toString()));
    }

    @Test
    void thereAreShippedFiles() throws IOException {
        assertThat(shippedFiles()).hasSizeGreaterThan(8);
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "", "a = \"x\"", "a=\"\"", "# only a comment", "a = \"x\" # after\nb = [\"y\", # in\n \"z\",\n]\n",
                "[t]\nk = \"v\"\n[t.u]\nw = \"x\"\n", "[[c]]\nn = \"1\"\n[[c]]\nn = \"2\"\n[d]\n",
                "t = \"\"\"\nfirst\nsecond\"\"\"\nn = \"x\"\n", "t = \"\"\"one\"\"\"", "e = []", "a = \"\u00e9\"",
            })
    void plainTextsAreReadAlike(String text) {
        assertThat(PlainReader.read(text)).isPresent();
        assertThat(PlainReader.read(text).orElseThrow()).isEqualTo(GeneralReader.read(text, "text"));
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "a = 1", "a = true", "a = 'x'", "a = \"\\n\"", "a.b = \"x\"", "\"a\" = \"x\"", "a = {b = \"x\"}",
                "a = \"x\"\na = \"y\"", "[t]\n[t]", "[[t]]\n[t]", "a = \"x\"\n[a]", "a = \"x\" b = \"y\"", "a = \"x",
                "a = [\"x\" \"y\"]", "a = [1]", "a = \"\"\"x", "a = \"x\ny\"", "= \"x\"", "a \"x\"", "[t", "[a.b]\n[[a]]",
                "[a]\n[a.b]\n[a]", "a = \"x\"\r\n", "\u0410 = \"x\"", "a = \"\"\"x\"\"\"\"", "a = \"\u0001\"",
            })
    void everythingElseIsLeftToTheLibrary(String text) {
        assertThat(PlainReader.read(text)).isEmpty();
    }
}
