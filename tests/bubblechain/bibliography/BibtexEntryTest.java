package bubblechain.bibliography;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

class BibtexEntryTest {
    private static final Pattern FIELD = Pattern.compile("  ([A-Za-z]+) += \\{(.*)\\},?");

    private static String shipped(String key) {
        return BibtexEntry.of(Bibliography.shipped().find(key).orElseThrow());
    }

    private static Publication made(String authors, String title, String journal) {
        return new Publication("Key:2000ab", "", authors, title, "2000", journal, "", "seen: somewhere (all fields)");
    }

    @Test
    void aVerifiedArticleHasItsFieldsAndNoNote() {
        assertThat(shipped("vanRitbergen:1997va")).isEqualTo("""
                @article{vanRitbergen:1997va,
                  author        = {van Ritbergen, T. and Vermaseren, J. A. M. and Larin, S. A.},
                  title         = {{The four-loop beta function in quantum chromodynamics}},
                  year          = {1997},
                  journal       = {Phys. Lett. B},
                  volume        = {400},
                  pages         = {379--384},
                  doi           = {10.1016/S0370-2693(97)00370-5},
                  eprint        = {hep-ph/9701390},
                  archivePrefix = {arXiv}
                }""");
    }

    @Test
    void anEntryNotVerifiedSaysHowFarItWasChecked() {
        assertThat(shipped("Beneke:1994sw")).contains(
                "  note          = {entry not fully verified; seen: paper page (arxiv, authors, title); key, journal, doi from"
                        + " memory}\n}");
        assertThat(shipped("Gross:1973id")).contains("  note          = {entry not fully verified; from memory}\n}")
                .doesNotContain("eprint");
    }

    @Test
    void doubtfulFieldsAreLeftOut() {
        assertThat(shipped("Kinoshita:Muon1967")).startsWith("@article{").doesNotContain("title  ").contains("key is a project key");
        assertThat(shipped("Boito:HbbRational")).startsWith("@misc{").doesNotContain("JHEP").contains("{2110.09909}");
        assertThat(shipped("Larin:QEDbeta1N")).startsWith("@misc{").doesNotContain("howpublished");
    }

    @Test
    void aPreprintPrintedLaterIsTheArticle() {
        assertThat(shipped("Tarasov:1982plg"))
                .contains("{Phys. Part. Nucl. Lett.}", "volume        = {17}", "year          = {2020}", "pages         = {109--115}");
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "M. Beneke | Beneke, M.",
        "W.L. van Neerven and E.B. Zijlstra | van Neerven, W. L. and Zijlstra, E. B.",
        "J. Sanchez Guillen, X.-D. Ji and E. de Rafael | Sanchez Guillen, J. and Ji, X.-D. and de Rafael, E.",
        "D. d'Enterria et al. | d'Enterria, D. and others"
    })
    void namesOfTwoWordsAreNotCut(String authors, String written) {
        assertThat(BibtexEntry.of(made(authors, "T", "arXiv only"))).contains("  author        = {" + written + "},\n");
    }

    @Test
    void aCollaborationHasItsOwnField() {
        assertThat(shipped("ParticleDataGroup:2024cfk"))
                .contains("{Navas, S. and others}", "collaboration = {Particle Data Group}");
        assertThat(shipped("Brambilla:2017hcq")).contains("and Vairo, A.},", "collaboration = {TUMQCD}");
    }

    @Test
    void everyCharacterPrintsAsItself() {
        assertThat(BibtexEntry.of(made("A. B", "O(alpha_s^3) & 100% of #1 {x} ~ $y$ |V_cb| a -> b <c> \\d", "arXiv only")))
                .contains("{{O(alpha\\_s\\textasciicircum{}3) \\& 100\\% of \\#1 \\textbraceleft{}x\\textbraceright{}"
                        + " \\textasciitilde{} \\$y\\$ \\textbar{}V\\_cb\\textbar{} a -\\textgreater{} b"
                        + " \\textless{}c\\textgreater{} \\textbackslash{}d}}");
    }

    @Test
    void aSourceWithoutAnEntryIsALineThatBibtexPassesOver() {
        assertThat(BibtexEntry.unknown("Some:2020ab")).isEqualTo("% Some:2020ab: not in the bibliography of this program");
        assertThat(BibtexEntry.unknown("@book{x,\n}\u00e9")).isEqualTo("% ?book{x,?}?: not in the bibliography of this program");
    }

    static Set<String> keys() {
        return Bibliography.shipped().keys();
    }

    @ParameterizedTest
    @MethodSource("keys")
    void everyEntryIsWellFormed(String key) {
        String entry = shipped(key);
        assertThat(entry).matches("(?s)[ -~\\n]*");
        List<String> lines = entry.lines().toList();
        assertThat(lines.get(0)).matches("@(article|misc)\\{" + Pattern.quote(key) + ",");
        assertThat(lines.get(lines.size() - 1)).isEqualTo("}");
        Set<String> names = new HashSet<>();
        for (String line : lines.subList(1, lines.size() - 1)) {
            Matcher field = FIELD.matcher(line);
            assertThat(field.matches()).as(line).isTrue();
            assertThat(names.add(field.group(1))).as(line).isTrue();
            assertBalanced(field.group(2));
            assertThat(field.group(2).replaceAll("\\\\.", "")).as("bare special characters").doesNotContainPattern("[#$%&_^~<>|]");
        }
        assertThat(names).contains("author", "year");
        assertThat(lines.get(0).startsWith("@article")).isEqualTo(names.contains("journal"));
        assertThat(names.contains("note")).isEqualTo(!Bibliography.shipped().find(key).orElseThrow().isVerified());
    }

    private static void assertBalanced(String text) {
        int depth = 0;
        for (char c : text.toCharArray()) {
            depth += c == '{' ? 1 : c == '}' ? -1 : 0;
            assertThat(depth).as(text).isNotNegative();
        }
        assertThat(depth).as(text).isZero();
    }
}
