package bubblechain.chain;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.analytic.ArcBound;
import bubblechain.analytic.FixedExpansion;
import bubblechain.analytic.NormalForm;
import bubblechain.exact.Ball;
import bubblechain.exact.BoundSamples;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Magnitude;
import bubblechain.exact.Rational;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import bubblechain.kernel.KernelText;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Coefficients on the fixed-point route against three times the precision on the route of balls, long lists against
 * three times the precision on the same route: within the bounds, and the bounds not wasteful.
 */
class FixedCoefficientsTest {
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

    private static BoundSamples compare(BoundSamples samples, String what, List<Ball> low, List<Ball> high) {
        assertThat(low).hasSameSizeAs(high);
        for (int n = 0; n < low.size(); n++) {
            samples.add(low.get(n), high.get(n), "%s, c_%d", what, n);
        }
        return samples;
    }

    static List<String> library() {
        return KernelLibrary.names();
    }

    @ParameterizedTest
    @ValueSource(strings = {"pole-mass", "pole-mass-diagram", "adler", "bjorken-gls", "static-potential-r", "lepton-g2"})
    void coefficientsAreWithinTheirBoundsAtEveryScale(String name) {
        Kernel kernel = KernelLibrary.load(name);
        BoundSamples samples = new BoundSamples();
        for (String mu : new String[] {"1", "3/2", "1/100", "exp(-euler_gamma)"}) {
            for (String operatorMu : new String[] {"1", "3/2", "100"}) {
                Scales scales = scales(mu, operatorMu);
                List<Ball> low = fixed(kernel, 26, 150, scales);
                List<Ball> high = new BallCoefficients(450).coefficients(kernel, 26, scales);
                compare(samples, name + " at " + mu + ", " + operatorMu, low, high);
            }
        }
        samples.assertNotWasteful(250, "%s", name);
    }

    /** Either route; some kernels only the route of balls can take, and short lists go that way too. */
    @ParameterizedTest
    @MethodSource("library")
    void everyKernelIsWithinItsBoundsOnEitherRoute(String name) {
        Kernel kernel = KernelLibrary.load(name);
        int orders = 30;
        List<Ball> high = new BallCoefficients(600).coefficients(kernel, orders, Scales.NATURAL);
        List<Ball> balls = new BallCoefficients(200).coefficients(kernel, orders, Scales.NATURAL);
        compare(new BoundSamples(), name, balls, high).assertNotWasteful(orders - 3, "%s, balls", name);
        List<Ball> few = new BallCoefficients(150).coefficients(kernel, 20, Scales.NATURAL);
        compare(new BoundSamples(), name, few, high.subList(0, 20)).assertNotWasteful(17, "%s, few balls", name);
        Optional<List<Ball>> fixed = new FixedCoefficients(200).coefficients(kernel, orders, Scales.NATURAL);
        if (fixed.isPresent()) {
            compare(new BoundSamples(), name, fixed.get(), high).assertNotWasteful(orders - 3, "%s, fixed point", name);
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"cusp", "gamma-m"})
    void anomalousDimensionsAreWithinTheirBounds(String name) {
        Kernel kernel = KernelLibrary.load(name);
        List<Ball> low = fixed(kernel, 60, 200, Scales.NATURAL);
        List<Ball> high = new BallCoefficients(600).coefficients(kernel, 60, Scales.NATURAL);
        compare(new BoundSamples(), name, low, high).assertNotWasteful(55, "%s", name);
        Kernel alone = KernelLibrary.load("pole-mass").anomalousDimensionAsKernel();
        low = fixed(alone, 60, 200, Scales.NATURAL);
        high = new BallCoefficients(600).coefficients(alone, 60, Scales.NATURAL);
        compare(new BoundSamples(), "of the pole mass", low, high).assertNotWasteful(55, "of the pole mass");
    }

    /** Long lists: the anomalous part computed in stages and cut off. */
    @ParameterizedTest
    @CsvSource({
        "400, 1300, 1, 1", "300, 900, 3/2, 1", "270, 600, 1, 100", "270, 600, 100, 1", "260, 500, 1/100, 1/100",
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
        List<Ball> high = fixed(kernel, loops, 3 * bits, scales);
        compare(new BoundSamples(), "pole-mass", low, high)
                .assertNotWasteful(loops - 5, "%d loops, %d bits, %s, %s", loops, bits, mu, operatorMu);
        for (int n = 0; n < loops; n++) {
            assertThat(low.get(n).accuracyBits()).as("bits of c_%d", n).isGreaterThan(bits - 80);
        }
    }

    /**
     * The y_k left out, in units of 2^(-bits), and e^(l v): what each coefficient loses, exactly up to the rounding of
     * doubles.
     */
    private static double largestLoss(FixedExpansion series, int from, int count, double l, int bits) {
        double ratio = 0.5 / series.radius().toDouble();
        double weight = Math.log(0.5) + bits * LN2;
        double[] y = new double[count];
        for (int k = 1; k < count; k++) {
            weight += Math.log(ratio) - Math.log(k);
            if (k >= from) {
                y[k] = series.scaled(k).toDouble() * Math.exp(weight);
            }
        }
        double largest = 0;
        for (int n = from; n < count; n++) {
            double loss = 0;
            double power = 1;
            for (int k = n; k >= from; k--) {
                loss += y[k] * power;
                power *= l / (n - k + 1);
            }
            largest = Math.max(largest, Math.abs(loss));
        }
        return largest;
    }

    /**
     * What the cut leaves out, from the coefficients themselves, and the bound it rests on. Cauchy's bound takes the
     * largest value on the circle through the nearest pole, 2^10 on the far side, for coefficients that the small
     * residue of that pole makes, 2^-8: no bound from that circle alone could be closer than 2^18.
     */
    @ParameterizedTest
    @CsvSource({"400, 1300, 1", "300, 500, 1", "300, 500, 3/2", "300, 500, 100", "400, 500, 10^12", "500, 300, 10^(-40)"})
    void whatTheCutLeavesOutIsBelowItsBound(int count, int bits, String ratio) {
        NormalForm gamma = KernelLibrary.load("pole-mass").anomalousDimension().orElseThrow().normalForm().orElseThrow();
        ExactConstant log = constant("2*ln(" + ratio + ")");
        FixedCoefficients.Tail tail =
                new FixedCoefficients(bits).tail(gamma, count, Rational.HALF, log).orElseThrow();
        assertThat(tail.last()).isLessThan(count);
        FixedExpansion series = FixedExpansion.of(gamma, count, 3 * bits).orElseThrow();
        double l = log.toBall(64).toDouble() / 2;
        double allowed = tail.size().scale(bits).toDouble();
        double lost = largestLoss(series, tail.last(), count, l, bits);
        assertThat(lost).as("the part left out, in units").isPositive().isLessThan(allowed);
        assertThat(Math.log(allowed / lost) / LN2).as("log2 of bound over loss").isLessThan(BoundSamples.LARGEST_MEDIAN);
        double radius = series.radius().toDouble() * 511 / 512;
        double bound = ArcBound.remainder(gamma, radius).logarithm();
        for (int k = 1; k <= tail.last(); k++) {
            bound += Math.log(0.5 / radius / k);
        }
        double largest = 0;
        for (int j = 1; j <= Math.abs(l); j++) {
            largest += Math.log(Math.abs(l) / j);
        }
        assertThat(Math.exp(bound + largest + bits * LN2) / 2)
                .as("Cauchy's bound of it, in units")
                .isBetween(allowed * 0.98, allowed);
        assertThat(allowed).isLessThan(0x1p-8);
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
            compare(new BoundSamples(), transform, low, high).assertNotWasteful(235, "%s", transform);
            for (int n = 0; n < 240; n++) {
                assertThat(low.get(n).accuracyBits()).as("%s, c_%d", transform, n).isGreaterThan(270);
            }
        }
    }
}
