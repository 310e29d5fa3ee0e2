package bubblechain.fixedorder;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.qcd.Coupling;
import bubblechain.toml.TomlException;
import bubblechain.toml.TomlFile;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class SeriesFileTest {
    private static final String GOOD = """
            name = "mine"
            title = "My series"
            quantity = "f"
            scale = "Q"
            coupling = "alpha/4pi"
            coupling_flavours = "nf"
            flavours = "massless flavours"
            flavours_from = "3"
            flavours_to = "5"
            prefactor = "4/3"
            power = "4"
            sources = ["Beneke:1998ui"]

            [definitions]
            half = "nf/2"

            [[coefficient]]
            loops = "1"
            value = "half + zeta(3)"
            errors = ["0.5", "0.1*nf"]
            status = "from memory"
            sources = ["Pineda:2001zq"]

            [[singularity]]
            u = "-1"
            kind = "UV"
            operator = "dimension six"
            exponent_shift = "2/(11 - 2*nf/3)"
            corrections = ["-11/18*4"]
            """;

    private static PerturbativeSeries parse(String text) {
        return SeriesFile.parse(text, "mine.toml");
    }

    @Test
    void everyEntryIsRead() {
        PerturbativeSeries series = parse(GOOD);
        assertThat(series.coupling()).isEqualTo(Coupling.ALPHA_OVER_4PI);
        assertThat(series.power()).isEqualTo(Rational.of(4));
        assertThat(series.prefactor(3)).isEqualTo(ExactConstant.of(Rational.of(4, 3)));
        assertThat(series.value(1, 4).toString()).isEqualTo("zeta(3)+2");
        assertThat(series.errors(1, 5)).containsExactly(ExactConstant.of(Rational.HALF), ExactConstant.of(Rational.HALF));
        assertThat(series.coefficient(1).status()).isEqualTo(SourceStatus.FROM_MEMORY);
        assertThat(series.coefficient(1).isExact()).isFalse();
        assertThat(series.sources(1)).containsExactly("Beneke:1998ui", "Pineda:2001zq");
        Singularity singularity = series.singularity(Rational.of(-2)).orElseThrow();
        assertThat(singularity.kind()).isEqualTo(Singularity.Kind.UV);
        assertThat(singularity.exponentShift(3)).contains(Rational.of(2, 9));
        assertThat(singularity.corrections(3)).containsExactly(ExactConstant.of(Rational.of(-22, 9)));
        assertThat(series.singularity(Rational.of(4))).isEmpty();
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '`', value = {
        "power = \"4\" | power = 4 | mine.toml, line 11, column 1: numbers are written as strings so that they stay exact: power = \"4\"",
        "power = \"4\" | power = 4.5 | numbers are written as strings so that they stay exact: power = \"4.5\"",
        "power = \"4\" | powr = \"4\" | mine.toml, line 11, column 1: unknown key 'powr' at the top of the file; did you mean power?",
        "power = \"4\" | power = \"four\" | mine.toml, line 11, column 1: 'four' is not a rational number such as 3, -3/4 or 1.25",
        "power = \"4\" | power = \"0\" | line 11, column 1: series 'mine' has power 0; give p = 2 u0 of its leading singularity",
        "errors = [\"0.5\", \"0.1*nf\"] | errors = [0.5] | line 20, column 1: numbers are written as strings",
        "errors = [\"0.5\", \"0.1*nf\"] | errors = \"0.5\" | line 20, column 1: 'errors' must be a list of strings",
        "status = \"from memory\" | status = \"rumour\" | line 21, column 1: 'status' must be \"seen in the paper\"",
        "status = \"from memory\" | stauts = \"from memory\" | unknown key 'stauts' in [[coefficient]]; did you mean status?",
        "loops = \"1\" | loops = \"2\" | line 18, column 1: coefficients come in order 1, 2, 3, ...; expected loops = \"1\", got \"2\"",
        "kind = \"UV\" | kind = \"uv\" | line 26, column 1: 'kind' must be \"IR\" or \"UV\"",
        "u = \"-1\" | u = \"0\" | line 25, column 1: a singularity needs u different from 0",
        "coupling = \"alpha/4pi\" | coupling = \"alphas\" | line 5, column 1: coupling 'alphas' is not one of",
        "coupling_flavours = \"nf\" | coupling_flavours = \"nl\" | line 6, column 1: 'coupling_flavours' must be \"nf\" or \"nf+1\"",
        "flavours_to = \"5\" | flavours_to = \"17\" | line 9, column 1: a range of flavour numbers must lie between 0 and 16",
        "scale = \"Q\" | scale = 1979-05-27 | line 4, column 1: 'scale' must be a string",
        "half = \"nf/2\" | pi = \"nf/2\" | line 15, column 1: 'pi' cannot be the name of a definition",
        "half = \"nf/2\" | half = \"nl/2\" | mine.toml, line 15, column 1, in 'half': line 1, column 1: the name 'nl' has no value here",
        "half + zeta(3) | 2nf | mine.toml, line 19, column 1, in 'value': line 1, column 1: two factors without an operator",
        "half + zeta(3) | whole | the name 'whole' has no value here",
        "title = \"My series\" | # | the key 'title' is missing at the top of the file",
        "title = \"My series\" | title = | mine.toml, line 2, column 8",
    })
    void mistakesAreNamedWithTheirPlace(String good, String bad, String message) {
        assertThat(GOOD).contains(good);
        assertThatThrownBy(() -> parse(GOOD.replace(good, bad)))
                .isInstanceOf(TomlException.class)
                .hasMessageContaining(message);
    }

    @Test
    void aSeriesNeedsACoefficient() {
        String none = GOOD.substring(0, GOOD.indexOf("[[coefficient]]"));
        assertThatThrownBy(() -> parse(none))
                .isInstanceOf(TomlException.class)
                .hasMessageContaining("there is no [[coefficient]]; give at least one");
    }

    @Test
    void aListOfTablesIsNotReplacedByOneTable() {
        assertThatThrownBy(() -> parse(GOOD.replace("[[coefficient]]", "[coefficient]")))
                .isInstanceOf(TomlException.class)
                .hasMessageContaining("'coefficient' must be a list of tables: [[coefficient]]");
        assertThatThrownBy(() -> parse("definitions = \"x\"\n" + GOOD.replace("[definitions]\nhalf = \"nf/2\"", "")))
                .isInstanceOf(TomlException.class)
                .hasMessageContaining("'definitions' must be a table: [definitions]");
    }

    @Test
    void flavourNumbersOutsideTheDeclaredRangeAreRefused() {
        assertThatThrownBy(() -> parse(GOOD).value(1, 6))
                .isInstanceOf(DomainException.class)
                .hasMessage("series 'mine' holds for 3 to 5 flavours (massless flavours); got 6");
    }

    @Test
    void aCoefficientThatIsNoPolynomialHasNoFlavourCoefficients() {
        PerturbativeSeries series = parse(GOOD.replace("half + zeta(3)", "1/(nf+1)"));
        assertThatThrownBy(() -> series.flavourCoefficients(1))
                .isInstanceOf(DomainException.class)
                .hasMessageContaining("is not a polynomial in nf of degree 1 or less");
    }

    @Test
    void hugeAndMissingAndBinaryFilesAreRefused(@TempDir Path folder) throws IOException {
        Path huge = folder.resolve("huge.toml");
        Files.write(huge, ("#" + " ".repeat(TomlFile.LARGEST_SIZE)).getBytes(StandardCharsets.UTF_8));
        assertThatThrownBy(() -> SeriesFile.read(huge))
                .isInstanceOf(TomlException.class)
                .hasMessageContaining("larger than the limit of 1000000 bytes");
        assertThatThrownBy(() -> SeriesFile.read(folder.resolve("none.toml")))
                .isInstanceOf(TomlException.class)
                .hasMessageContaining("check that it exists and is readable");
        Path binary = folder.resolve("binary.toml");
        Files.write(binary, new byte[] {(byte) 0xff, (byte) 0xfe});
        assertThatThrownBy(() -> SeriesFile.read(binary))
                .isInstanceOf(TomlException.class)
                .hasMessageContaining("not a text in UTF-8");
    }

    @Test
    void aPathWorksWhereverANameDoes(@TempDir Path folder) throws IOException {
        Path file = folder.resolve("mine.toml");
        Files.writeString(file, GOOD);
        assertThat(SeriesLibrary.find(file.toString()).name()).isEqualTo("mine");
    }

    @Test
    void anUnknownNameIsAnsweredWithTheNearest() {
        assertThatThrownBy(() -> SeriesLibrary.find("pole-mas"))
                .isInstanceOf(DomainException.class)
                .hasMessage("there is no series 'pole-mas'; did you mean pole-mass or pole-mass-heavy-coupling? A path to a series file works too.");
        assertThatThrownBy(() -> SeriesLibrary.find("zzzzzz"))
                .isInstanceOf(DomainException.class)
                .hasMessageContaining("known are adler, bjorken-gls, chromomag,");
        assertThatThrownBy(() -> SeriesLibrary.find("nul\0byte"))
                .isInstanceOf(DomainException.class)
                .hasMessage("'nul?byte' is neither a series nor a path");
    }

    @Test
    void theIndexListsEveryFileOfTheFolder() throws IOException {
        try (Stream<Path> files = Files.list(Path.of("reference-values", "series"))) {
            Set<String> names = files.map(f -> f.getFileName().toString())
                    .filter(f -> f.endsWith(".toml"))
                    .map(f -> f.substring(0, f.length() - ".toml".length()))
                    .collect(Collectors.toSet());
            assertThat(SeriesLibrary.names()).containsExactlyInAnyOrderElementsOf(names);
        }
    }

    @Test
    void everyBuiltInSeriesIsNamedLikeItsFileAndCitesKnownWorks() {
        List<String> keys =
                ReferenceTable.read("/reference-values/bibliography.csv").stream().map(r -> r.get("key")).toList();
        for (String name : SeriesLibrary.names()) {
            PerturbativeSeries series = SeriesLibrary.find(name);
            assertThat(series.name()).isEqualTo(name);
            assertThat(keys).containsAll(series.sources(series.loops()));
            assertThat(series.sources(series.loops())).isNotEmpty();
        }
    }
}
