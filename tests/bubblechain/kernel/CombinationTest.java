package bubblechain.kernel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.analytic.Pole;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Random;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Sums of kernels: what cancels is gone, the rest adds exactly, and bad files are refused with their place. */
class CombinationTest {
    private static final String HEAD = """
            name = "mine"
            title = "A combination"
            quantity = "f"
            scale = "Q"
            mass_dimension = "0"
            form = "combination"
            """;

    @TempDir
    Path folder;

    private Path file;

    @BeforeEach
    void place() {
        file = folder.resolve("mine.toml");
    }

    private Kernel combination(String rest) throws IOException {
        Files.writeString(file, HEAD + rest);
        return KernelLibrary.load(file.toString());
    }

    private static String part(String kernel, String weight, String more) {
        return "[[part]]\nkernel = \"" + kernel + "\"\nweight = \"" + weight + "\"\n" + more + "\n";
    }

    private void assertRefused(String rest, String reason) throws IOException {
        Files.writeString(file, HEAD + rest);
        assertThatThrownBy(() -> KernelLibrary.load(file.toString()))
                .isInstanceOf(DomainException.class)
                .hasMessageStartingWith(file.toString())
                .hasMessageContaining(reason);
    }

    /** The leading pole of 2 M + V at every distance, of the short-distance masses at every cut-off. */
    @ParameterizedTest
    @CsvSource({
        "static-energy, mr, 1/7", "static-energy, mr, 1", "static-energy, mr, 355/113", "ps-mass-msbar, ratio, 2/9",
        "ps-mass-msbar, ratio, 1", "kinetic-mass-msbar, ratio, 1/10", "kinetic-mass-msbar, ratio, 3/4"
    })
    void theLeadingPoleCancelsIdentically(String name, String parameter, String value) {
        Kernel kernel = KernelLibrary.load(name, Map.of(parameter, Rational.parse(value)));
        var form = kernel.transform().orElseThrow().requireNormalForm();
        assertThat(Pole.of(form, Rational.HALF)).isEmpty();
        assertThat(Pole.of(form, Rational.of(3, 2))).isPresent();
    }

    @Test
    void randomSumsAddTermByTermWithSeed23() throws IOException {
        Random random = new Random(23);
        String[] names = {"adler", "bjorken-gls", "static-potential-r", "top-width-mw0-pole", "gradient-flow", "ree"};
        for (int i = 0; i < 12; i++) {
            StringBuilder text = new StringBuilder();
            ExactConstant[] expected = {ExactConstant.ZERO, ExactConstant.ZERO, ExactConstant.ZERO};
            for (int k = 0; k < 3; k++) {
                String name = names[random.nextInt(names.length)];
                Rational weight = Rational.of(random.nextInt(9) - 4, 1 + random.nextInt(3));
                Rational ratio = Rational.of(1 + random.nextInt(4), 1 + random.nextInt(3));
                text.append(part(name, "(" + weight + ")*pi", "scale_ratio = \"" + ratio + "\""));
                ExactConstant log = ExactConstant.of(ratio).ln().multiply(Rational.TWO);
                var own = KernelLibrary.load(name).transform().orElseThrow().timesExponential(log).exact(Rational.ZERO, 3);
                for (int n = own.lowest(); n < 3; n++) {
                    expected[n] = expected[n].add(own.coefficients().get(n - own.lowest())
                            .multiply(ExactConstant.PI.multiply(weight)));
                }
            }
            var sum = combination(text.toString()).transform().orElseThrow().exact(Rational.ZERO, 3);
            for (int n = 0; n < 3; n++) {
                int index = n - sum.lowest();
                ExactConstant found = index < 0 || index >= sum.length() ? ExactConstant.ZERO : sum.coefficients().get(index);
                assertThat(found).as("%s, [u^%d]", text, n).isEqualTo(expected[n]);
            }
        }
    }

    @Test
    void partsOfFamiliesTakeParametersOfTheFile() throws IOException {
        Kernel kernel = combination("""
                [parameters.moment]
                from = "1"
                to = "6"
                default = "3"
                integer = "yes"
                """ + part("dis-f2", "1", "[part.parameters]\nmoment = \"moment + 1\"")
                + part("dis-f2", "-1", "[part.parameters]\nmoment = \"4\""));
        assertThat(kernel.transform().orElseThrow().requireNormalForm().isZero()).isTrue();
        assertThat(kernel.anomalousDimension()).isEmpty();
    }

    /** A single logarithm has no cusp part: its gamma/2 stands where a double logarithm has its slope. */
    @Test
    void singleAndDoubleLogarithmsAddTogether() throws IOException {
        Kernel kernel = combination(part("hard-massless", "1", "") + part("pole-mass", "3", "") + part("hard-massless", "-1", ""));
        var sudakov = kernel.sudakov().orElseThrow();
        assertThat(sudakov.cusp().requireNormalForm().isZero()).isTrue();
        var gamma = KernelLibrary.load("pole-mass").anomalousDimension().orElseThrow().requireNormalForm();
        assertThat(sudakov.slope().requireNormalForm()).isEqualTo(gamma.multiply(Rational.of(3, 2)));
    }

    @Test
    void combinationsOfCombinationsAreReadFromTheFolderOfTheFile() throws IOException {
        Path below = Files.createDirectory(folder.resolve("below"));
        Files.writeString(below.resolve("inner.toml"), HEAD.replace("mine", "inner") + part("adler", "2", ""));
        Kernel kernel = combination(part("below/inner.toml", "1/2", "") + part("adler", "-1", ""));
        assertThat(kernel.transform().orElseThrow().requireNormalForm().isZero()).isTrue();
        assertThat(kernel.sources()).containsAll(KernelLibrary.load("adler").sources());
    }

    @Test
    void cautionsOfPartsAreKeptUnlessTheFileSaysThatTheyDoNotHold() throws IOException {
        List<String> cautions = KernelLibrary.load("soft-thrust").cautions();
        assertThat(cautions).isNotEmpty();
        assertThat(combination(part("soft-thrust", "1", "")).cautions()).isEqualTo(cautions);
        assertThat(combination(part("soft-thrust", "1", "cautions = \"no\"")).cautions()).isEmpty();
        assertRefused(part("adler", "1", "cautions = \"never\""), "cautions is \"yes\" or \"no\", got \"never\"");
    }

    @Test
    void aFileThatContainsItselfIsRefused() throws IOException {
        assertRefused(part("mine.toml", "1", ""), "contains itself");
        assertRefused(part("./mine.toml", "1", ""), "contains itself");
        Files.writeString(folder.resolve("other.toml"), HEAD.replace("mine", "other") + part("mine.toml", "1", ""));
        assertThatThrownBy(() -> combination(part("other.toml", "1", ""))).hasMessageContaining("contains itself");
    }

    /** Ten files of 32 parts each would be 32^10 kernels. */
    @Test
    void aTreeOfFilesWithTooManyPartsIsRefusedSoon() throws IOException {
        for (int level = 0; level < 10; level++) {
            String below = level == 0 ? "adler" : "level" + (level - 1) + ".toml";
            Files.writeString(folder.resolve("level" + level + ".toml"), HEAD + part(below, "1", "").repeat(32));
        }
        long start = System.nanoTime();
        assertThatThrownBy(() -> KernelLibrary.load(folder.resolve("level9.toml").toString()))
                .isInstanceOf(DomainException.class)
                .hasMessageContaining("more than 100 parts in all");
        assertThat(System.nanoTime() - start).isLessThan(5_000_000_000L);
    }

    @Test
    void badCombinationsAreRefusedWithTheirPlace() throws IOException {
        assertRefused("", "form \"combination\" needs entries [[part]] with kernel and weight");
        assertRefused(part("adlr", "1", ""), "line 8, column 1: no kernel is named 'adlr'; did you mean adler");
        assertRefused(part("cusp", "1", ""), "the kernel cusp is an anomalous dimension");
        assertRefused(part("lepton-g2", "1", ""), "the kernel lepton-g2 belongs to QED, this combination to QCD");
        assertRefused(part("adler", "x", ""), "the name 'x' has no value here");
        assertRefused(part("adler", "1", "scale_ratio = \"-2\""), "a ratio of scales must be positive");
        assertRefused(part("pole-mass", "1", "scale_ratio = \"2\""), "the kernel pole-mass is renormalised");
        assertRefused(part("adler", "1", "wieght = \"2\""), "unknown key 'wieght' in [[part]]; did you mean weight?");
        assertRefused(part("dis-f2", "1", "[part.parameters]\nmoment = \"99\""), "the parameter moment is an integer between 1 and 30");
        assertRefused(part("dis-f2", "1", "[part.parameters]\nmoment = \"pi\""), "a parameter of a part is a rational number");
        assertRefused(part("missing.toml", "1", ""), "missing.toml");
        assertRefused("T = \"1\"\n" + part("adler", "1", ""), "form \"combination\" takes [[part]], not T");
        assertRefused(part("adler", "1", "").repeat(33), "a combination has at most 32 parts, got 33");
    }
}
