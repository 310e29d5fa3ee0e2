package bubblechain.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/** What the commands show, read as text and as JSON. */
class ShownAnswersTest {
    private static String text(String command) {
        Console console = Console.runProgram(command.split(" "));
        assertThat(console.err()).isEmpty();
        assertThat(console.status()).isZero();
        return console.out();
    }

    private static String json(String command) {
        return text(command + " --format json").replaceAll("\\s*\\n\\s*", " ");
    }

    static Stream<String> examples() {
        return Subcommands.all().stream().flatMap(c -> c.examples().stream()).map(Example::arguments);
    }

    @ParameterizedTest
    @MethodSource("examples")
    void everyExampleOfTheHelpRuns(String command) {
        assertThat(text(command)).startsWith("bubblechain " + command.split(" ")[0] + "\n");
    }

    @Test
    void poleMassThroughFourLoopsIsShownExactly() {
        assertThat(text("coefficients pole-mass --exact --loops 4")).contains("""
                Coefficients
                n  loops  c_n                      exact
                -  -----  -----------------------  ---------------------------------------------
                0      1    4.0000000000000000000  4
                1      2   18.744604401089358619   pi^2+71/8
                2      3   70.490600900806725862   14*zeta(3)+13*pi^2/3+2353/216
                3      4  439.43538459172580754    71*pi^4/40+317*zeta(3)/4+89*pi^2/6+42979/1728
                """);
    }

    @Test
    void polesOfThePoleMassAreShownExactly() {
        List<String> points = List.of("-4", "-3", "-2", "-1", "1/2", "3/2", "2", "5/2", "7/2", "9/2", "11/2");
        String json = json("poles pole-mass --from -4 --to 6");
        String poles = json.substring(json.indexOf("\"poles\": ["), json.indexOf("\"regular\""));
        assertThat(poles.split("\"u\": ", -1)).hasSize(points.size() + 1);
        points.forEach(u -> assertThat(poles).contains("\"u\": \"" + u + "\", \"order\": 1, \"status\": \"exact\""));
        assertThat(poles).contains("\"exact\": \"-2*exp(5/6)\"", "\"exact\": \"3*exp(5/2)/4\"");
        assertThat(json).contains("\"regular\": [ { \"u\": \"0\" }, { \"u\": \"1\" }, { \"u\": \"3\" }, { \"u\": \"4\" },"
                + " { \"u\": \"5\" }, { \"u\": \"6\" } ]");
    }

    @ParameterizedTest
    @CsvSource({
        // own evaluation of the sum rule on the published terms, lambda = 1, 1/2, 2 at three and four loops
        "0, 0.42441318, 0.57440396, 0.60909469, 0.59824, 0.58329, 0.56745",
        "3, 0.42441318, 0.54292126, 0.56900615, 0.53737, 0.50495, 0.52279"
    })
    void theResidueOfThePoleMassIsThatOfTheSumRule(
            int nl, String one, String two, String three, String four, String half, String twice) {
        String json = json("residue pole-mass --nf " + nl);
        int loops = 0;
        for (String normalisation : List.of(one, two, three, four)) {
            loops++;
            assertThat(json).containsPattern("\"loops\": " + loops + ", \"K\": \"[0-9.]+\", \"N\": \"" + normalisation + "\"");
        }
        assertThat(json).containsPattern("\"lambda\": \"1/2\", \"K\": \"[0-9.]+\", \"N\": \"" + half + "\"");
        assertThat(json).containsPattern("\"lambda\": \"2\", \"K\": \"[0-9.]+\", \"N\": \"" + twice + "\"");
        assertThat(json).contains("\"verdict\": \"present\"", "\"blocked_by\": []");
    }

    @Test
    void aNearerSingularityIsNamed() {
        String json = json("residue pole-mass --power 3");
        assertThat(json).contains("\"verdict\": \"cannot tell\"", "\"blocked_by\": [ { \"u\": \"1/2\", \"kind\": \"IR\"",
                "remove it first");
        assertThat(text("residue pole-mass --power 3")).contains("In the way: u = 1/2");
    }

    @Test
    void aChainSaysWhatWasTakenOutOfIt() {
        String shown = text("residue pole-mass --chain --power 3 --remove-nearer --loops 7").replaceAll("\\s+", " ");
        assertThat(shown).contains("the parts of the nearer poles at u = -1, 1/2 are taken out of c_n exactly",
                "chain = yes, remove_nearer = yes", "alpha_s^(3)(m)", "Large beta0 is a model", "- Beneke:1994sw (");
        assertThat(text("residue pole-mass --chain --power 1 --remove-nearer --loops 3").replaceAll("\\s+", " "))
                .contains("; no pole is nearer than u = 1/2");
        // K_k = c_k/((2/p)^k k!) of the bare chain: 4, 9.3723022, 8.8113251, ... own evaluation
        assertThat(json("residue pole-mass --chain --loops 3"))
                .contains("\"K_bare\": \"4.0000000\"", "\"K_bare\": \"9.3723022\"", "\"K_bare\": \"8.8113251\"");
    }

    @ParameterizedTest
    @CsvSource({"0, 0.86", "3, 0.98", "4, 1.08", "5, 1.23"})
    void theCrossCheckShowsTheFlavourTermsAndTheRatios(int nl, String ratio) {
        // chain over published at four loops, from Marquard:2016dcn; own evaluation 0.855, 0.982, 1.075, 1.232
        String json = json("crosscheck pole-mass --nf " + nl);
        assertThat(json.split("\"nf_term_agrees\": true", -1)).hasSize(5);
        String last = json.replaceAll(".*\"chain_over_published\": \"([0-9.]+)\".*", "$1");
        assertThat(Double.parseDouble(last)).isEqualTo(Double.parseDouble(ratio), org.assertj.core.data.Offset.offset(0.006));
    }

    @Test
    void theCrossCheckDoesNotPromiseALimitItDoesNotHave() {
        assertThat(text("crosscheck pole-mass")).contains("(tends to the exact N)");
        assertThat(text("crosscheck pole-mass --power 3")).contains("(another pole is as near or nearer: it has no limit)");
    }

    @Test
    void flavourTermsFollowTheScale() {
        String natural = text("coefficients pole-mass --loops 2 --nf-terms");
        assertThat(natural).contains("The nf^n terms of the full series at mu = m, prefactor included", "-pi^2/18-71/144");
        // at mu = 2 m: CF c_1 (-2/3)/16 with c_1 = pi^2 + 71/8 + 8 ln 2
        String twice = text("coefficients pole-mass --loops 2 --nf-terms --mu-over-scale 2");
        assertThat(twice).contains("at mu = 2 m", "-pi^2/18-4*ln(2)/9-71/144");
        assertThat(text("coefficients pole-mass --loops 2 --nf-terms --mu-over-scale 2 --nf 3 --coupling-nf 4"))
                .contains("-pi^2/18-4*ln(2)/9-71/144");
        assertThat(text("coefficients lepton-g2 --loops 2 --nf-terms")).contains("nf^n term in (alpha/pi)^(n+1)", "-25/36");
    }

    @Test
    void kernelsAreListedDescribedAndSearchedFor() {
        assertThat(text("kernels")).containsPattern("\\ntau +massless +3 double +-1 +exact ");
        assertThat(text("kernels tau")).contains("IR     3      2  exact\n", "UV    -1      1  exact\n");
        assertThat(text("kernels --search tau")).contains("request    search = tau").containsPattern("\\ntau +massless ");
        assertThat(text("kernels decay tau")).containsPattern("\\ntau +massless ").doesNotContain("adler");
        assertThat(text("kernels decay --search tau")).isEqualTo(text("kernels decay tau"));
        assertThat(text("kernels pol-mas")).contains("near in name: pole-mass").contains("(none)");
        assertThat(json("kernels tau decay")).contains("\"ir\": \"3\", \"ir_order\": 2, \"uv\": \"-1\", \"uv_order\": 1,"
                + " \"pole_status\": \"exact\"");
    }

    @Test
    void thePapersAreGivenAsBibtex() {
        assertThat(text("kernels dis-f2 --bibtex")).startsWith("@article{").contains("\n@article{Mankiewicz:1997gz,\n");
        assertThat(text("kernels dis-f2 --parameter moment=4 --bibtex")).isEqualTo(text("kernels dis-f2 --bibtex"));
        assertThat(text("kernels --bibtex")).contains(text("kernels pole-mass --bibtex").lines().limit(5).toList().get(1));
    }

    @Test
    void sourcesAreShownWithTheirAuthorsAsTextAndAsKeysInJson() {
        assertThat(text("coefficients pole-mass --loops 1"))
                .contains("  - Beneke:1994sw (M. Beneke and V.M. Braun, hep-ph/9402364)\n");
        assertThat(json("coefficients pole-mass --loops 1"))
                .contains("\"sources\": [ \"Beneke:1994sw\", \"Ball:1995ni\", \"Neubert:1994vb\" ]");
    }

    @Test
    void ratiosToTheFirstCoefficientHaveTheirOwnName() {
        String shown = text("coefficients pole-mass --normalise first --loops 2");
        assertThat(shown).contains("(first coefficient) sum_{n>=0} d_n a^(n+1)", "n  loops  d_n\n", "4.6861511002723396547");
    }

    @Test
    void anAnomalousDimensionIsNamed() {
        assertThat(text("coefficients pole-mass --anomalous-dimension --loops 2")).contains("d ln(M/mbar(mu))/d ln mu = CF/beta0");
        assertThat(text("kernels pole-mass")).contains("defined by");
        assertThat(text("kernels cusp")).contains("gamma(a) =").doesNotContain("B(u)");
    }

    @Test
    void powerCorrectionsAreRelativeToTheQuantity() {
        String potential = text("poles static-potential-r --from 0 --to 5/2").replaceAll("\\s+", " ");
        assertThat(potential).contains("relative power", "correction operator", "Lambda*r", "(Lambda*r)^3", "(Lambda*r)^5");
    }

    @Test
    void assessmentsSayWhereTheyLooked() {
        assertThat(text("assess static-potential-r --loops 3 --range 1")).contains("ultraviolet  none with |u| up to 12");
        assertThat(text("assess cusp --loops 3")).contains("infrared     none\n");
        assertThat(text("assess pole-mass --loops 3 --nf 4 --range 1")).contains("alpha_s^(4)(m)");
    }

    @Test
    void cautionsAboutSumsOverPolesStandWhereSumsAre() {
        assertThat(text("coefficients pole-mass --loops 2")).doesNotContain("sum over all poles");
        assertThat(text("poles pole-mass")).contains("A sum over all poles need not converge to c_n");
    }
}
