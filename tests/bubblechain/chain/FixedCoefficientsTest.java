package bubblechain.chain;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.analytic.ArcBound;
import bubblechain.analytic.FixedExpansion;
import bubblechain.analytic.NormalForm;
import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Magnitude;
import bubblechain.exact.Rational;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import bubblechain.kernel.KernelText;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Coefficients on the fixed-point route against three times the precision on the route of balls, long lists against twice
 * the precision on the same route: within the bounds, and the bounds not wasteful.
 */
class FixedCoefficientsTest {
    private static final double LARGEST_MEDIAN = 20;
    private static final double LN2 = Math.log(2);

    @TempDir
    private static Path folder;

    private static Scales scales(String mu, String operatorMu) {
        return Scales.of(constant(mu), constant(operatorMu));
    }

    private static ExactConstant constant(String text) {
        return ConstantValue.of(Formula.parse(text));
    }

    private static List<Ball> fixed(Kernel kernel, int loops, int bits, Scales scales) {
        return new FixedCoefficients(bits).coefficients(kernel, loops, scales).orElseThrow();
    }

    /** log2(bound/error) of the inexact coefficients. */
    private static List<Double> compare(String what, List<Ball> low, List<Ball> high) {
        assertThat(low).hasSameSizeAs(high);
        List<Double> slack = new ArrayList<>();
        for (int n = 0; n < low.size(); n++) {
            Rational difference = low.get(n).midpoint().subtract(high.get(n).midpoint()).abs();
            Magnitude allowed = low.get(n).radius().add(high.get(n).radius());
            assertThat(difference).as("%s, c_%d", what, n).isLessThanOrEqualTo(allowed.toRational());
            if (!difference.isZero()) {
                slack.add(Math.log(allowed.toRational().divide(difference).toDouble()) / LN2);
            }
        }
        return slack;
    }

    private static double median(List<Double> values) {
        Collections.sort(values);
        return values.get(values.size() / 2);
    }

    @ParameterizedTest
    @ValueSource(strings = {"pole-mass", "pole-mass-diagram", "adler", "bjorken-gls", "static-potential-r", "lepton-g2"})
    void coefficientsAreWithinTheirBoundsAtEveryScale(String name) {
        Kernel kernel = KernelLibrary.load(name);
        List<Double> slack = new ArrayList<>();
        for (String mu : new String[] {"1", "3/2", "1/100", "exp(-euler_gamma)"}) {
            for (String operatorMu : new String[] {"1", "3/2", "100"}) {
                Scales scales = scales(mu, operatorMu);
                List<Ball> low = fixed(kernel, 26, 150, scales);
                List<Ball> high = new BallCoefficients(450).coefficients(kernel, 26, scales);
                slack.addAll(compare(name + " at " + mu + ", " + operatorMu, low, high));
            }
        }
        assertThat(median(slack)).isLessThan(LARGEST_MEDIAN);
    }

    @ParameterizedTest
    @ValueSource(strings = {"cusp", "gamma-m"})
    void anomalousDimensionsAreWithinTheirBounds(String name) {
        Kernel kernel = KernelLibrary.load(name);
        List<Ball> low = fixed(kernel, 60, 200, Scales.NATURAL);
        compare(name, low, new BallCoefficients(600).coefficients(kernel, 60, Scales.NATURAL));
        Kernel alone = KernelLibrary.load("pole-mass").anomalousDimensionAsKernel();
        compare("of the pole mass", fixed(alone, 60, 200, Scales.NATURAL),
                new BallCoefficients(600).coefficients(alone, 60, Scales.NATURAL));
    }

    /** Long lists: the anomalous part computed in stages and cut off. */
    @ParameterizedTest
    @CsvSource({
        "400, 1300, 1, 1", "330, 1210, 3/2, 1", "270, 600, 1, 100", "270, 600, 100, 1", "260, 500, 1/100, 1/100",
        "260, 500, 1, 1/1000000000", "330, 200, 1000000, 1"
    })
    void longListsWithACutAnomalousPartAreWithinTheirBounds(int loops, int bits, String mu, String operatorMu) {
        Kernel kernel = KernelLibrary.load("pole-mass");
        Scales scales = scales(mu, operatorMu);
        FixedCoefficients route = new FixedCoefficients(bits);
        NormalForm gamma = kernel.anomalousDimension().orElseThrow().normalForm().orElseThrow();
        assertThat(route.tail(gamma, loops + 1, Rational.HALF, scales.subtractionLog()).orElseThrow().last())
                .isLessThan(loops);
        List<Ball> low = route.coefficients(kernel, loops, scales).orElseThrow();
        List<Ball> high = fixed(kernel, loops, 2 * bits, scales);
        assertThat(median(compare("pole-mass", low, high))).isLessThan(LARGEST_MEDIAN + 12);
        for (int n = 0; n < loops; n++) {
            assertThat(low.get(n).accuracyBits()).as("bits of c_%d", n).isGreaterThan(bits - 80);
        }
    }

    /** What the cut leaves out, from the coefficients themselves and from the bound it rests on. */
    @ParameterizedTest
    @CsvSource({"400, 1300, 1", "300, 500, 1", "300, 500, 3/2", "300, 500, 100", "400, 500, 10^12", "500, 300, 10^(-40)"})
    void whatTheCutLeavesOutIsBelowItsBound(int count, int bits, String ratio) {
        NormalForm gamma = KernelLibrary.load("pole-mass").anomalousDimension().orElseThrow().normalForm().orElseThrow();
        ExactConstant log = constant("2*ln(" + ratio + ")");
        FixedCoefficients.Tail tail =
                new FixedCoefficients(bits).tail(gamma, count, Rational.HALF, log).orElseThrow();
        assertThat(tail.last()).isLessThan(count);
        FixedExpansion series = FixedExpansion.of(gamma, count, 2 * bits).orElseThrow();
        double size = log.toBall(64).abs().toDouble() / 2;
        double sum = 0;
        double bound = ArcBound.remainder(gamma, series.radius().toDouble() * 15 / 16).logarithm() + size;
        double weight = 1;
        for (int k = 1; k < count; k++) {
            weight = Math.log(0.5 / series.radius().toDouble()) - Math.log(k) + (k == 1 ? 0 : weight);
            bound += k <= tail.last() ? Math.log(0.5 / (series.radius().toDouble() * 15 / 16) / k) : 0;
            if (k >= tail.last()) {
                Rational coefficient = series.scaled(k).upperBound().toRational();
                double worth = coefficient.isZero() ? 0 : Math.log(coefficient.toDouble()) + weight + size;
                sum += Math.exp(worth + bits * LN2) / 2;
            }
        }
        double allowed = Math.log(tail.size().scale(bits).toDouble()) / LN2;
        assertThat(Math.log(sum) / LN2).as("the part left out, bits above the last").isLessThan(allowed);
        assertThat(bound / LN2 + bits).as("Cauchy's bound of it, bits above the last").isBetween(allowed - 2.1, allowed);
        assertThat(allowed).isLessThan(-8);
    }

    @Test
    void shortOrCoarseListsAreNotCut() {
        NormalForm gamma = KernelLibrary.load("pole-mass").anomalousDimension().orElseThrow().normalForm().orElseThrow();
        for (int[] size : new int[][] {{20, 100}, {149, 50}, {200, 5_000}}) {
            FixedCoefficients.Tail tail = new FixedCoefficients(size[1])
                    .tail(gamma, size[0], Rational.HALF, ExactConstant.ZERO)
                    .orElseThrow();
            assertThat(tail).isEqualTo(new FixedCoefficients.Tail(size[0], Magnitude.ZERO));
        }
    }

    @Test
    void kernelsWithIrrationalAndComplexPolesKeepTheirBitsAtHighOrders() {
        for (String transform : new String[] {
            "exp(5*u/3)/(3-u^2)^2", "gamma(1-u)/(1+u+u^2)", "sin(1+u/2)/(1-2*u^2)", "polygamma(1,1-u/3)*gamma(1/2-u)"
        }) {
            Kernel kernel = KernelText.of(transform).kernel(folder);
            List<Ball> low = fixed(kernel, 240, 300, scales("3/2", "1"));
            List<Ball> high = fixed(kernel, 240, 900, scales("3/2", "1"));
            compare(transform, low, high);
            for (int n = 0; n < 240; n++) {
                assertThat(low.get(n).accuracyBits()).as("%s, c_%d", transform, n).isGreaterThan(100);
            }
        }
    }
}
