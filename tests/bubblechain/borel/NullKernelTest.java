package bubblechain.borel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import bubblechain.analytic.Expansion;
import bubblechain.analytic.NormalForm;
import bubblechain.chain.Scales;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import java.util.List;
import java.util.Map;
import java.util.function.Predicate;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Singularities that must be absent, identically: null kernels of the published closed forms (no operator of that dimension, no
 * renormalon in a convergent series). Positions are searched from -8 to 12 in steps of the arguments of the functions.
 */
class NullKernelTest {
    private static final Rational FROM = Rational.of(-8);
    private static final Rational TO = Rational.of(12);

    private static List<Rational> poles(String name, Map<String, Rational> parameters) {
        BorelPlane plane = BorelPlane.of(KernelLibrary.load(name, parameters), Scales.NATURAL);
        assertThat(plane.algebraicPoles(FROM, TO)).isEmpty();
        assertThat(plane.complexPoles()).isEmpty();
        return plane.poles(FROM, TO).stream().map(BorelPole::u).toList();
    }

    private static List<Rational> poles(String name) {
        return poles(name, Map.of());
    }

    private static Predicate<Rational> isOneOf(String positions) {
        List<Rational> listed = List.of(positions.split(" ")).stream().map(Rational::parse).toList();
        return listed::contains;
    }

    @ParameterizedTest
    @ValueSource(strings = {
        "cusp", "gamma-m", "dis-gamma", "hard-gamma", "jet-gamma", "soft-dy-gamma", "qed-beta", "gamma-hl-current",
        "gamma-hqet-field-landau", "gamma-chromomag", "static-potential-q", "kin-mupi2", "jet-quark-delta"
    })
    void nothingAtAll(String name) {
        assertThat(poles(name)).isEmpty();
    }

    @ParameterizedTest
    @CsvSource({
        "adler, 1", "scalar-psi2, 1", "ree, 1 2", "scalar-im-hbb, 1 2", "tau, 1 2", "bjorken-unpol, -1", "gradient-flow, 1",
        "pole-mass, 1 3 4 5", "top-width-mw0-pole, 1 3", "b-to-u-width-pole, 1 -1/2 -3/2", "top-width-mw0-msbar, 1/2 1",
        "b-to-u-width-msbar, 1/2 1", "static-energy, 1/2 1", "ps-mass-msbar, 1/2", "kinetic-mass-msbar, 1/2", "static-force, 1/2",
        "soft-dy, 1/2"
    })
    void nothingAtThesePoints(String name, String positions) {
        assertThat(poles(name)).isNotEmpty().noneMatch(isOneOf(positions));
    }

    @ParameterizedTest
    @ValueSource(strings = {
        "adler", "ree", "tau", "scalar-psi2", "scalar-im-hbb", "bjorken-gls", "bjorken-unpol", "hard-massless",
        "hard-massless-timelike", "jet-quark", "soft-dy", "gradient-flow", "dis-f2", "dis-f3", "dis-fl"
    })
    void nothingAtHalfIntegers(String name) {
        assertThat(poles(name)).isNotEmpty().allMatch(Rational::isInteger);
    }

    @ParameterizedTest
    @ValueSource(strings = {"soft-dy", "jet-quark", "gradient-flow", "static-potential-r", "soft-thrust"})
    void nothingUltraviolet(String name) {
        assertThat(poles(name)).isNotEmpty().allMatch(u -> u.signum() > 0);
    }

    /** The four poles of the polarised sum rule, and half-integers only for the inclusive model of thrust. */
    @Test
    void onlyThese() {
        assertThat(poles("bjorken-gls")).containsExactly(
                Rational.of(-2), Rational.of(-1), Rational.ONE, Rational.TWO);
        assertThat(poles("bjorken-unpol")).containsExactly(Rational.of(-2), Rational.ONE, Rational.TWO);
        assertThat(poles("jet-quark")).containsExactly(Rational.ONE, Rational.TWO);
        assertThat(poles("soft-thrust")).allMatch(u -> u.add(Rational.HALF).isInteger());
        assertThat(poles("ps-mass")).containsExactly(Rational.HALF);
    }

    /** Double poles of the tau width at u = 3 and 4 only, of the form factor at 1 and 2, of b -> u at half-integers and 4. */
    @Test
    void theDoublePolesAreWhereTheyShouldBe() {
        assertThat(doublePoles("tau")).containsExactly(Rational.of(3), Rational.of(4));
        assertThat(doublePoles("ree")).isEmpty();
        assertThat(doublePoles("hard-massless")).containsExactly(Rational.ONE, Rational.TWO);
        assertThat(doublePoles("b-to-u-width-pole")).isEqualTo(doublePoles("b-to-u-width-msbar"))
                .contains(Rational.of(3, 2), Rational.of(5, 2), Rational.of(4), Rational.of(23, 2))
                .doesNotContain(Rational.HALF)
                .allMatch(u -> u.equals(Rational.of(4)) || !u.isInteger());
        assertThat(doublePoles("adler")).allMatch(Rational::isInteger).hasSize(8 + 10);
    }

    private static List<Rational> doublePoles(String name) {
        BorelPlane plane = BorelPlane.of(KernelLibrary.load(name), Scales.NATURAL);
        assertThat(plane.poles(FROM, TO)).allMatch(p -> p.pole().order() <= 2);
        return plane.poles(FROM, TO).stream().filter(p -> p.pole().order() == 2).map(BorelPole::u).toList();
    }

    /** Every moment: infrared poles at 1 and 2 only, ultraviolet ones down to -(N+1); F_L has one of these. */
    @Test
    void momentsHaveTheirFinitelyManyPoles() {
        for (int n = 1; n <= 12; n++) {
            int last = -n - 1;
            Map<String, Rational> moment = Map.of("moment", Rational.of(n));
            for (String name : List.of("dis-f2", "dis-f3", "dis-fl")) {
                assertThat(poles(name, moment)).as("%s, N = %d", name, n)
                        .allMatch(u -> u.signum() > 0 ? u.compareTo(Rational.TWO) <= 0 : u.compareTo(Rational.of(last)) >= 0);
            }
            if (n < 8) {
                assertThat(poles("dis-fl", moment)).contains(Rational.of(last)).filteredOn(u -> u.signum() < 0).hasSize(1);
            }
        }
        Kernel adlerSumRule = KernelLibrary.load("dis-f2", Map.of("moment", Rational.ONE));
        assertThat(adlerSumRule.transform().orElseThrow().requireNormalForm().isZero()).isTrue();
        assertThat(adlerSumRule.anomalousDimension().orElseThrow().requireNormalForm().isZero()).isTrue();
    }

    /**
     * The anomalous dimension of large moments is the cusp times ln N: N (gamma_(N+1) - gamma_N) goes to Gamma_cusp in units of
     * CF alpha_s/(4 pi), order by order, with corrections in powers of 1/N that three moments take away twice.
     */
    @Test
    void largeMomentsRunWithTheCusp() {
        NormalForm cusp = KernelLibrary.load("cusp").anomalousDimension().orElseThrow().requireNormalForm();
        List<ExactConstant> expected = Expansion.about(Rational.ZERO, cusp).exact(5).coefficients();
        List<double[]> steps = IntStream.of(7, 14, 28).mapToObj(n -> {
            double[] next = momentCoefficients(n + 1);
            double[] own = momentCoefficients(n);
            return IntStream.range(0, 5).mapToDouble(k -> n * (next[k] - own[k])).toArray();
        }).toList();
        for (int k = 0; k < 5; k++) {
            double first = 2 * steps.get(1)[k] - steps.get(0)[k];
            double second = 2 * steps.get(2)[k] - steps.get(1)[k];
            double limit = (4 * second - first) / 3;
            assertThat(limit).as("order %d", k)
                    .isCloseTo(expected.get(k).toBall(64).midpoint().toDouble(), within(0.05));
        }
    }

    private static double[] momentCoefficients(int n) {
        Kernel kernel = KernelLibrary.load("dis-gamma", Map.of("moment", Rational.of(n)));
        return kernel.anomalousDimension().orElseThrow().exact(Rational.ZERO, 5).coefficients().stream()
                .mapToDouble(c -> c.toBall(64).midpoint().toDouble())
                .toArray();
    }
}
