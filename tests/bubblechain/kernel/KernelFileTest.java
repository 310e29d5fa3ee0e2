package bubblechain.kernel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.PrecisionException;
import bubblechain.exact.Rational;
import java.nio.file.Path;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What a kernel file may say and what is refused, with the place. */
class KernelFileTest {
    @TempDir
    private Path folder;

    private void assertRefused(KernelText text, String message) {
        String path = text.in(folder);
        assertThatThrownBy(() -> KernelLibrary.load(path))
                .isInstanceOf(DomainException.class)
                .hasMessage(message.replace("FILE", path));
    }

    @Test
    void aFileOfSevenLinesIsAKernel() {
        Kernel kernel = KernelText.of("exp(5*u/3)/(1-u)").kernel(folder);
        assertThat(kernel.name()).isEqualTo("mine");
        assertThat(kernel.prefactor().words()).isEqualTo("CF/beta0");
        assertThat(kernel.theory().name()).isEqualTo("QCD");
        assertThat(kernel.heavyQuark()).isFalse();
        assertThat(kernel.anomalousDimension()).isEmpty();
        assertThat(kernel.definingEquation()).isEmpty();
        assertThat(kernel.checks()).isEmpty();
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '`', value = {
        "2u              | two factors without an operator; write 2*u | 1 | 2u;^^",
        "1/(1-x)         | the name 'x' has no meaning; the variable is u, other names are set in [definitions] or"
                + " [parameters] | 6 | 1/(1-x);     ^",
        "gamma(1+u       | the formula ends where the parenthesis that closes column 1 was expected | 10 | gamma(1+u;         ^",
        "2\u2212u        | the character U+2212 (MINUS SIGN) has no meaning in a formula | 2 | 2\u2212u; ^",
        "u*\u0435xp(u)   | the character U+0435 (CYRILLIC SMALL LETTER IE) has no meaning in a formula | 3 |"
                + " u*\u0435xp(u);  ^",
        "\uff55          | the character U+FF55 (FULLWIDTH LATIN SMALL LETTER U) has no meaning in a formula | 1 |"
                + " \uff55;^",
        "1+beta(u)       | no function 'beta'; known are gamma, digamma, polygamma, zeta, polylog, unit_3f2, ln, sqrt, exp, sin,"
                + " cos, sum (for a product write beta*(...)) | 3 | 1+beta(u);  ^^^^",
        "sum(k,1,3,k*v)  | the name 'v' has no meaning; the variable is u, other names are set in [definitions] or"
                + " [parameters] | 13 | sum(k,1,3,k*v);            ^"
    })
    void aFormulaAtFaultIsUnderlined(String transform, String reason, int column, String picture) {
        String[] lines = picture.split(";");
        assertRefused(KernelText.of(transform), "FILE, line 7, column 1, in 'T': line 1, column " + column + ": " + reason
                + "\n  " + lines[0] + "\n  " + lines[1]);
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "gamma(u)      | the 1/u pole does not cancel: T(u) has residue 1 at u = 0, and no anomalous_dimension is given that"
                + " would subtract it",
        "exp(u)*pi/u   | the 1/u pole does not cancel: T(u) has residue pi = 3.14159265358979324 at u = 0, and no"
                + " anomalous_dimension is given that would subtract it",
        "1/u^2         | T(u) has a pole of order 2 at u = 0, leading coefficient 1; one subtraction takes away a simple"
                + " pole only",
        "1/(exp(u)-1)  | the 1/u pole does not cancel: T(u) has residue 1 at u = 0, and no anomalous_dimension is given"
                + " that would subtract it"
    })
    void aPoleAtZeroThatNothingTakesAwayIsRefused(String transform, String reason) {
        assertRefused(KernelText.of(transform), "FILE, line 7, column 1: " + reason);
    }

    @Test
    void aPoleAtZeroMustBeTheOneOfTheAnomalousDimension() {
        KernelText text = KernelText.of("3*gamma(u)").and("""
                anomalous_dimension = "5 + a"
                defining_equation = "d ln O/d ln mu = CF/beta0 * a * anomalous_dimension(a)"
                """);
        assertRefused(text, "FILE, line 7, column 1: the 1/u pole does not cancel: T(u) has residue 3 at u = 0, of which the"
                + " anomalous dimension takes away gamma(0)/2 = 5/2, leaving 1/2");
        assertThat(text.replacing("5 + a", "6 + a").kernel(folder).anomalousDimension()).isPresent();
    }

    @ParameterizedTest
    @CsvSource({"(1+u)/u - gamma(1+u)/u", "gamma(u) - 1/u", "(cos(pi*u)-1)/u^2", "gamma(1+u^2)", "u/(exp(u)-1)", "(exp(u)-1)/u"})
    void aPoleAtZeroThatCancelsBetweenTermsIsNone(String transform) {
        assertThat(KernelText.of(transform).kernel(folder).transform()).isPresent();
    }

    @Test
    void aFormulaThatDividesByAnIdenticalZeroIsRefused() {
        String path = KernelText.of("1/(exp(2*u^2)-exp(u^2)^2)").in(folder);
        assertThatThrownBy(() -> KernelLibrary.load(path))
                .isInstanceOf(PrecisionException.class)
                .hasMessageContaining("vanish");
    }

    @Test
    void keysAndFormsAreChecked() {
        KernelText good = KernelText.of("1+u");
        assertRefused(good.and("sourcess = [\"x\"]"), "FILE, line 8, column 1: unknown key 'sourcess' at the top of the file;"
                + " did you mean sources?");
        assertRefused(good.and("title = \"again\""),
                "FILE, line 8, column 1: not TOML: title previously defined at line 2, column 1");
        assertRefused(good.replacing("\"0\"", "0"), "FILE, line 5, column 1: numbers are written as strings so that they stay"
                + " exact: mass_dimension = \"0\"");
        assertRefused(good.replacing("borel", "borrel"),
                "FILE, line 6, column 1: form 'borrel' is not one of borel, d-dimensional, combination");
        assertRefused(good.replacing("borel", "d-dimensional"),
                "FILE, line 7, column 1: form \"d-dimensional\" takes G, not T");
        assertRefused(good.replacing("\"mine\"", "\"My Kernel\""),
                "FILE, line 1, column 1: a kernel name has lower-case letters, digits and hyphens, got 'My Kernel'");
        assertRefused(good.replacing("T = \"1+u\"", ""),
                "FILE, line 6, column 1: form \"borel\" needs T(u), an anomalous_dimension in a, or both");
        assertRefused(good.replacing("title = \"A kernel of one's own\"", ""),
                "FILE, line 1, column 1: the key 'title' is missing at the top of the file");
        assertRefused(good.and("theory = \"QFD\""), "FILE, line 8, column 1: theory 'QFD' is neither QCD nor QED");
        assertRefused(good.and("heavy_quark = \"maybe\""),
                "FILE, line 8, column 1: heavy_quark is \"yes\" or \"no\", got \"maybe\"");
        assertRefused(good.and("prefactor = \"CF*x\""),
                "FILE, line 8, column 1: a prefactor uses the names CF, CA, TF, nf, beta0 and pi only");
        assertRefused(good.and("anomalous_dimension = \"1+u\"\ndefining_equation = \"a = b\""),
                "FILE, line 8, column 1, in 'anomalous_dimension': line 1, column 3: the name 'u' has no meaning; the variable"
                        + " is a, other names are set in [definitions] or [parameters]\n  1+u\n    ^");
        assertRefused(good.and("anomalous_dimension = \"1+a\""),
                "FILE, line 1, column 1: the key 'defining_equation' is missing at the top of the file");
        assertRefused(good.and("anomalous_dimension = \"1+a\"\ndefining_equation = \"as usual\""),
                "FILE, line 9, column 1: the defining equation has the form \"d ln O/d ln mu = CF/beta0 * a *"
                        + " anomalous_dimension(a)\", got \"as usual\"");
    }

    @Test
    void singularitiesAndChecksAreChecked() {
        KernelText good = KernelText.of("1/(1-u)");
        assertRefused(good.and("[[singularity]]\nu = \"1\"\nkind = \"ir\""),
                "FILE, line 10, column 1: a singularity is \"IR\" or \"UV\", got \"ir\"");
        assertRefused(good.and("[[check]]\nkind = \"value\"\nsource = \"x\""),
                "FILE, line 9, column 1: a check is \"coefficient\", \"nf-term\", \"laurent\", \"absent\" or \"same-as\", got \"value\"");
        assertRefused(good.and("[[check]]\nkind = \"coefficient\"\nsource = \"x\"\nn = \"-1\"\nvalue = \"1\""),
                "FILE, line 11, column 1: a checked coefficient has n between 0 and 60, got -1");
        assertRefused(good.and("[[check]]\nkind = \"laurent\"\nsource = \"x\"\nu = \"1\"\npower = \"0\"\nvalue = \"1\""),
                "FILE, line 12, column 1: a checked Laurent coefficient belongs to a negative power, got 0");
        assertRefused(good.and("[[check]]\nkind = \"laurent\"\nsource = \"x\"\nu = \"1\"\npower = \"-1\"\nvalue = \"2pi\""),
                "FILE, line 13, column 1, in 'value': line 1, column 1: two factors without an operator; write 2*pi\n"
                        + "  2pi\n  ^^^");
    }

    @Test
    void definitionsMayUseEarlierOnes() {
        Kernel kernel = KernelText.of("front*b + b")
                .and("[definitions]\nfront = \"exp(5*u/3)\"\nb = \"front/(1-u)\"")
                .kernel(folder);
        Kernel written = KernelText.of("exp(5*u/3)*exp(5*u/3)/(1-u) + exp(5*u/3)/(1-u)").kernel(folder);
        assertThat(kernel.transform().orElseThrow().exact(Rational.ZERO, 6).coefficients())
                .isEqualTo(written.transform().orElseThrow().exact(Rational.ZERO, 6).coefficients());
        assertRefused(KernelText.of("b").and("[definitions]\nb = \"front\"\nfront = \"1\""),
                "FILE, line 7, column 1, in 'T': line 1, column 1: the name 'front' has no meaning; the variable is u, other"
                        + " names are set in [definitions] or [parameters]\n  front\n  ^^^^^");
        assertRefused(KernelText.of("b").and("[definitions]\npi = \"3\""),
                "FILE, line 9, column 1: 'pi' cannot be the name of a definition");
        assertRefused(KernelText.of("b").and("[definitions]\nu = \"3\""),
                "FILE, line 9, column 1: 'u' cannot be the name of a definition");
    }

    private static final String FAMILY = """
            [parameters.moment]
            from = "1"
            to = "50"
            default = "2"
            integer = "yes"
            meaning = "index of the moment"
            """;

    @Test
    void aFamilyTakesItsParameterWithinItsRange() {
        KernelText family = KernelText.of("gamma(moment+u)/(gamma(moment)*gamma(1+u)*(1-u))").and(FAMILY);
        String path = family.in(folder);
        assertThat(KernelLibrary.load(path).title()).isEqualTo("A kernel of one's own (moment = 2)");
        Kernel third = KernelLibrary.load(path, Map.of("moment", Rational.of(3)));
        assertThat(third.quantity()).isEqualTo("f (moment = 3)");
        // gamma(3+u)/(gamma(3) gamma(1+u)) = (1+u)(2+u)/2, so T(0) = 1 and T'(0) = 1 + 1 + 1/2
        assertThat(third.transform().orElseThrow().exact(Rational.ZERO, 2).coefficients())
                .containsExactly(ExactConstant.ONE, ExactConstant.of(Rational.of(5, 2)));
        assertThat(KernelLibrary.load(path, Map.of("moment", Rational.ONE)).title()).endsWith("(moment = 1)");
        assertThat(KernelLibrary.load(path, Map.of("moment", Rational.of(50))).title()).endsWith("(moment = 50)");
        assertThatThrownBy(() -> KernelLibrary.load(path, Map.of("moment", Rational.ZERO)))
                .hasMessage("the parameter moment is an integer between 1 and 50, got 0");
        assertThatThrownBy(() -> KernelLibrary.load(path, Map.of("moment", Rational.of(51))))
                .hasMessage("the parameter moment is an integer between 1 and 50, got 51");
        assertThatThrownBy(() -> KernelLibrary.load(path, Map.of("moment", Rational.of(5, 2))))
                .hasMessage("the parameter moment is an integer between 1 and 50, got 5/2");
        assertThatThrownBy(() -> KernelLibrary.load(path, Map.of("spin", Rational.ONE)))
                .hasMessage(path + ": the kernel has no parameter 'spin'; it has moment");
        assertThatThrownBy(() -> KernelLibrary.load("adler", Map.of("moment", Rational.ONE)))
                .hasMessageEndingWith("the kernel has no parameter 'moment'; it has none");
    }

    @Test
    void aDiagramInDDimensionsGivesTransformAndAnomalousDimension() {
        KernelText diagram = new KernelText(KernelText.of("").text().replace("T = \"\"\n", "").replace("borel", "d-dimensional"))
                .and("G = \"2*(3-2*eps)*(1-u)*gamma(1+u)*gamma(1-2*u)/gamma(3-u-eps)\"");
        Kernel kernel = diagram.kernel(folder);
        assertThat(kernel.anomalousDimension().orElseThrow().valueAt(Rational.ZERO)).isEqualTo(ExactConstant.of(6));
        assertRefused(diagram.replacing("eps", "epsilon"), "FILE, line 7, column 1, in 'G': line 1, column 8: the name 'epsilon'"
                + " has no meaning; the variables are eps and u, other names are set in [definitions] or [parameters]\n"
                + "  2*(3-2*epsilon)*(1-u)*gamma(1+u)*gamma(1-2*u)/gamma(3-u-epsilon)\n         ^^^^^^^");
    }

    @Test
    void aFileMayHoldAnAnomalousDimensionOnly() {
        Kernel kernel = new KernelText(KernelText.of("").text().replace("T = \"\"\n", ""))
                .and("anomalous_dimension = \"4*gamma(4+2*a)/(6*gamma(1+a)*gamma(2+a)^2*gamma(1-a))\"\n"
                        + "defining_equation = \"Gamma = CF/beta0 * a * anomalous_dimension(a)\"")
                .kernel(folder);
        assertThat(kernel.isAnomalousDimension()).isTrue();
        assertThat(kernel.anomalousDimensionAsKernel()).isEqualTo(kernel);
        assertThat(kernel.transform()).isEmpty();
    }

    @Test
    void unknownNamesAreAnsweredWithTheNearest() {
        assertThatThrownBy(() -> KernelLibrary.load("pole-mas"))
                .isInstanceOf(KernelException.class)
                .hasMessage("no kernel is named 'pole-mas'; did you mean pole-mass, pole-mass-diagram? (a file of your own is"
                        + " given by its path, ending in .toml)");
        assertThatThrownBy(() -> KernelLibrary.load("xyzzy"))
                .hasMessage("no kernel is named 'xyzzy'; 'bubblechain kernels' lists them (a file of your own is given by its"
                        + " path, ending in .toml)");
        assertThatThrownBy(() -> KernelLibrary.load("a\0b.toml")).hasMessage("'a\0b.toml' cannot be the name of a file");
    }

    @Test
    void theAnomalousDimensionOfAKernelIsNamedByItsDefiningEquation() {
        assertThat(KernelLibrary.load("pole-mass").anomalousDimensionAsKernel().quantity())
                .isEqualTo("d ln(M/mbar(mu))/d ln mu");
        assertThatThrownBy(() -> KernelLibrary.load("adler").anomalousDimensionAsKernel())
                .isInstanceOf(KernelException.class)
                .hasMessage("the kernel adler has no anomalous dimension");
    }
}
