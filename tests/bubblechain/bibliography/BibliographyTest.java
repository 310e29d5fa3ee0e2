package bubblechain.bibliography;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.fixedorder.SeriesLibrary;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import bubblechain.sumrule.SumRule;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class BibliographyTest {
    private static final Path TABLE = Path.of("reference-values", "bibliography.csv");

    @Test
    void theTableIsReadAsByALibraryForSuchTables() throws IOException {
        CSVFormat format = CSVFormat.DEFAULT.builder().setCommentMarker('#').setIgnoreEmptyLines(true).get();
        List<List<String>> expected = new ArrayList<>();
        try (CSVParser parser = format.parse(Files.newBufferedReader(TABLE))) {
            parser.forEach(row -> expected.add(row.toList()));
        }
        List<List<String>> read = Files.readAllLines(TABLE).stream()
                .filter(line -> !line.isBlank() && !line.startsWith("#"))
                .map(CsvLine::fields)
                .toList();
        assertThat(read).isEqualTo(expected).hasSizeGreaterThan(100);
        assertThat(Bibliography.shipped().keys()).hasSize(read.size() - 1);
    }

    @Test
    void quotesInsideAFieldAreWrittenTwice() {
        assertThat(CsvLine.fields("a,\"b, \"\"c\"\"\",,d")).containsExactly("a", "b, \"c\"", "", "d");
    }

    @Test
    void everySourceOfTheLibraryIsKnown() {
        Bibliography shipped = Bibliography.shipped();
        for (String name : KernelLibrary.names()) {
            Kernel kernel = KernelLibrary.load(name);
            assertThat(kernel.sources()).as(name).isNotEmpty().allSatisfy(key -> assertThat(shipped.find(key)).as(key).isPresent());
            kernel.singularities().forEach(s -> assertThat(shipped.keys()).containsAll(Bibliography.keysIn(s.source().orElse(""))));
            kernel.checks().forEach(c -> assertThat(shipped.keys()).containsAll(Bibliography.keysIn(c.source())));
        }
        SeriesLibrary.names().forEach(name -> SeriesLibrary.find(name).sources()
                .forEach(key -> assertThat(shipped.find(key)).as(key).isPresent()));
        assertThat(shipped.keys()).containsAll(SumRule.SOURCES);
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "Beneke:1994sw | M. Beneke and V.M. Braun, hep-ph/9402364",
        "Ball:1995ni | P. Ball, M. Beneke and V.M. Braun, hep-ph/9502300",
        "Hoang:2017suc | A.H. Hoang et al., arXiv:1704.01580",
        "Baikov:2016tgj | P.A. Baikov, K.G. Chetyrkin and J.H. Kuehn, arXiv:1606.08659",
        "Beneke:1992ch | M. Beneke, Nucl. Phys. B 405 (1993) 424-450; from memory",
        "Lee:2013sx | R. Lee et al., arXiv:1301.6481; from memory",
        "Grozin:2003gf | A.G. Grozin, hep-ph/0311050; from memory",
        "Broadhurst:1994se | D.J. Broadhurst and A.G. Grozin, hep-ph/9410240; from memory",
        "vanNeerven:1991nn | W.L. van Neerven and E.B. Zijlstra, Phys. Lett. B 272 (1991) 127-133",
        "ParticleDataGroup:2024cfk | S. Navas et al. (Particle Data Group), Phys. Rev. D 110 (2024) 030001"
    })
    void aKeyIsShownWithAuthorsAndNumberAndWhetherTheseWereLookedUp(String key, String words) {
        assertThat(Bibliography.shipped().find(key).orElseThrow().inWords()).isEqualTo(words);
    }

    @Test
    void everyPublicationHasALineOfWords() {
        Bibliography shipped = Bibliography.shipped();
        shipped.keys().forEach(key -> assertThat(shipped.find(key).orElseThrow().inWords())
                .as(key).doesNotContain("not confirmed").matches("[ -~]{10,120}"));
    }

    @Test
    void keysAreFoundInAText() {
        assertThat(Bibliography.keysIn("Peter:1996ig, Schroder:1998vy, term 400/81 TF^2 nl^2 times 9/16 (from memory)"))
                .containsExactly("Peter:1996ig", "Schroder:1998vy");
        assertThat(Bibliography.keysIn("Palanques-Mestre:1983zy; Palanques-Mestre:1983zy")).containsExactly("Palanques-Mestre:1983zy");
        assertThat(Bibliography.keysIn("common practice, no source")).isEmpty();
        assertThat(Bibliography.keysIn("r-derivative of the static potential: 5/3 + 2 euler_gamma - 2")).isEmpty();
    }

    @Test
    void aTableThatIsNoneIsRefused() {
        String header = "key,arxiv,authors,title,year,journal,doi,source_status\n";
        assertThat(Bibliography.parse("# comment\n" + header + "A:1,,B. C,T,2000,J,,from memory\n").keys()).containsExactly("A:1");
        assertThatThrownBy(() -> Bibliography.parse("key,title\n")).hasMessageContaining("has the columns [key, title]");
        assertThatThrownBy(() -> Bibliography.parse(header + "A:1,B\n")).hasMessageContaining("has 2 fields");
        assertThatThrownBy(() -> Bibliography.parse(header + "A:1,,,,,,,\nA:1,,,,,,,\n")).hasMessageContaining("A:1 appears twice");
    }
}
