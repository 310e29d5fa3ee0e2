package bubblechain.assessment;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.DomainException;
import bubblechain.kernel.KernelLibrary;
import bubblechain.kernel.KernelText;
import bubblechain.report.Note;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class KernelListTest {
    private static Table table(Report report) {
        return report.blocks().stream().filter(Table.class::isInstance).map(Table.class::cast).findFirst().orElseThrow();
    }

    private static List<String> column(Report report, String key) {
        Table table = table(report);
        int index = table.columns().stream().map(c -> c.key()).toList().indexOf(key);
        return table.rows().stream()
                .map(row -> row.get(index))
                .map(v -> v instanceof Value.Text t ? t.text() : v instanceof Value.Exact e ? e.formula() : "-")
                .toList();
    }

    private static List<String> names(String words) {
        return column(KernelList.matching(List.of(words.split(" "))).report(), "name");
    }

    @Test
    void withoutWordsTheWholeLibraryIsListed() {
        Report report = KernelList.matching(List.of()).report();
        assertThat(column(report, "name")).isEqualTo(KernelLibrary.names());
        assertThat(column(report, "field")).contains("heavy-quark", "massless", "potential", "anomalous-dimension", "qed")
                .doesNotContain("");
        assertThat(column(report, "pole_status")).isSubsetOf("exact", "none");
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        // poles of the closed forms, see the [[check]] entries of these files and their sources
        "pole-mass | 1/2 | -1 | exact",
        "adler | 2 | -1 double | exact",
        "tau | 3 double | -1 | exact",
        "ree | 3 | -1 | exact",
        "static-potential-r | 1/2 | - | exact",
        "static-potential-q | - | - | none",
        "cusp | - | - | none"
    })
    void theListHasTheFirstPolesAndTheirStatus(String name, String infrared, String ultraviolet, String status) {
        Report report = KernelList.matching(List.of()).report();
        int row = column(report, "name").indexOf(name);
        assertThat(column(report, "ir_pole").get(row)).isEqualTo(infrared);
        assertThat(column(report, "uv_pole").get(row)).isEqualTo(ultraviolet);
        assertThat(column(report, "pole_status").get(row)).isEqualTo(status);
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "adler | adler",                            // name, also in the title
        "LEPTON bubbles | lepton-g2",               // title, capitals do not matter
        "m_PS(mu_f) | ps-mass",                     // quantity
        "potential r-derivative | ",                // checks are not searched
        "gluon condensate scalar | scalar-psi2",    // operator
        "Luscher:2010iy | gradient-flow",           // source
        "harlander | gradient-flow",                // author
        "1606.03756 | gradient-flow",               // arXiv number
        "qed beta | qed-beta",                      // field
        "stein tau | "
    })
    void everyWordMustOccurSomewhere(String words, String name) {
        List<String> wanted = name == null ? List.of() : List.of(name);
        assertThat(names(words)).containsAll(wanted).hasSizeLessThanOrEqualTo(Math.max(wanted.size(), 4 * wanted.size()));
        assertThat(names(words).isEmpty()).isEqualTo(wanted.isEmpty());
    }

    @Test
    void theOrderOfTheWordsDoesNotMatterAndMoreWordsFindLess() {
        assertThat(names("current heavy-light")).isEqualTo(names("heavy-light current"));
        assertThat(names("heavy-light")).containsAll(names("heavy-light current"));
        assertThat(names("mass")).contains("pole-mass", "ps-mass", "gamma-m").doesNotContain("tau");
        assertThat(names("massless")).contains("tau", "adler");
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "pol-mas | No built-in kernel has the word 'pol-mas'; near in name: pole-mass. A file of your own is given by its path,"
                + " ending in .toml.",
        "pole mas zzzz | No built-in kernel has all of the words 'pole mas zzzz'; near in name: pole-mass, pole-mass-diagram. A file"
                + " of your own is given by its path, ending in .toml.",
        "zzzz | No built-in kernel has the word 'zzzz'; 'bubblechain kernels' lists them all. A file of your own is given by its"
                + " path, ending in .toml."
    })
    void nothingFoundIsANoteWithWhatMayHaveBeenMeant(String words, String note) {
        Report report = KernelList.matching(List.of(words.split(" "))).report();
        assertThat(report.blocks().get(0)).isEqualTo(new Note(note));
        assertThat(table(report).rows()).isEmpty();
    }

    @Test
    void theWholeLibraryIsListedInLessThanASecondOfOneThread() {
        long best = Long.MAX_VALUE;
        for (int attempt = 0; attempt < 3; attempt++) {
            long start = System.nanoTime();
            KernelList.matching(List.of()).report();
            best = Math.min(best, System.nanoTime() - start);
        }
        assertThat(best).isLessThan(1_000_000_000L);
    }

    @Test
    void thePapersOfAKernelAreThoseOfItsFileByKey() {
        String bibtex = KernelList.bibtex(KernelLibrary.load("pole-mass"));
        assertThat(entries(bibtex)).containsExactly("Ball:1995ni", "Beneke:1994sw", "Neubert:1994vb");
        assertThat(bibtex).endsWith("\n}\n").doesNotContain("\n\n\n");
    }

    @Test
    void thePapersOfDeclaredSingularitiesBelongToAKernel(@TempDir Path folder) {
        KernelText text = KernelText.of("1/(1-u)").and("""
                sources = ["Somebody:2030xy", "Grozin:2003gf"]
                [[singularity]]
                u = "1"
                kind = "IR"
                source = "as in Beneke:1998ui, not in Beneke:1998rk"
                """);
        String bibtex = KernelList.bibtex(text.kernel(folder));
        assertThat(entries(bibtex)).containsExactly("Beneke:1998rk", "Beneke:1998ui", "Grozin:2003gf");
        assertThat(bibtex).contains("\n% Somebody:2030xy: not in the bibliography of this program\n");
        assertThat(KernelList.bibtex(KernelText.of("1/(1-u)").kernel(folder))).isEqualTo("% no source is named\n");
    }

    private static List<String> entries(String bibtex) {
        List<String> keys = new ArrayList<>();
        bibtex.lines().filter(line -> line.startsWith("@")).forEach(line ->
                keys.add(line.substring(line.indexOf('{') + 1, line.length() - 1)));
        return keys;
    }

    @Test
    void thePapersOfTheLibraryAreEachThereOnceInOrder() {
        String bibtex = KernelList.matching(List.of()).bibtex();
        List<String> keys = entries(bibtex);
        assertThat(keys).doesNotHaveDuplicates().isSortedAccordingTo(Comparator.naturalOrder()).contains("Beneke:1994sw");
        KernelLibrary.names().forEach(name -> assertThat(keys).containsAll(KernelLibrary.load(name).sources()));
        assertThat(bibtex).doesNotContain("%").isEqualTo(KernelList.matching(List.of()).bibtex());
    }

    @ParameterizedTest
    @ValueSource(strings = {"zzzz", "adler zzzz"})
    void noPapersOfNothing(String words) {
        assertThatThrownBy(() -> KernelList.matching(List.of(words.split(" "))).bibtex())
                .isInstanceOf(DomainException.class)
                .hasMessageStartingWith("No built-in kernel has");
    }
}
