package bubblechain.chain;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.analytic.AnalyticFunction;
import bubblechain.analytic.SeriesInterpretation;
import bubblechain.exact.Ball;
import bubblechain.exact.BallFunctions;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import bubblechain.kernel.KernelText;
import bubblechain.series.CoefficientwiseAlgebra;
import bubblechain.series.ExactRing;
import bubblechain.series.LaurentSeries;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Exact coefficients monomial by monomial against series of exact constants, counts of their terms, and balls. */
class EnumeratedCoefficientsTest {
    private static final int LOOPS = 14;
    /** At other scales the series route has many more terms. */
    private static final int SCALED_LOOPS = 8;

    private static Scales scales(String mu, String operatorMu) {
        return Scales.of(ExactConstant.of(Rational.parse(mu)), ExactConstant.of(Rational.parse(operatorMu)));
    }

    /** The tree of the formula, evaluated with series of exact constants. */
    private static LaurentSeries<ExactConstant> tree(
            AnalyticFunction function, String variable, ExactConstant log, int end) {
        CoefficientwiseAlgebra<ExactConstant> algebra = CoefficientwiseAlgebra.of(ExactRing.INSTANCE, end + 3);
        LaurentSeries<ExactConstant> series =
                SeriesInterpretation.about(Rational.ZERO, function.formula(), algebra, variable);
        return log.isZero()
                ? series
                : algebra.multiply(series, algebra.exp(algebra.linear(ExactConstant.ZERO, log)));
    }

    private static List<ExactConstant> bySeries(Kernel kernel, int loops, Scales scales) {
        return new RingCoefficients<>(ExactRing.INSTANCE, (function, end) -> {
                    boolean anomalous = kernel.anomalousDimension().filter(function::equals).isPresent()
                            || kernel.sudakov().filter(s -> s.cusp() == function || s.slope() == function).isPresent();
                    return anomalous
                            ? tree(function, "a", ExactConstant.ZERO, end)
                            : tree(function, "u", scales.couplingLog(), end);
                })
                .coefficients(kernel, loops, scales);
    }

    private static List<ExactConstant> enumerated(Kernel kernel, int loops, Scales scales) {
        return EnumeratedCoefficients.of(kernel, loops, scales, Chain.LARGEST_EXACT_TERMS).orElseThrow();
    }

    static List<String> kernels() {
        // the widths hold numbers known by their balls only
        return KernelLibrary.names().stream().filter(name -> !name.contains("width")).toList();
    }

    @ParameterizedTest
    @MethodSource("kernels")
    void everyKernelHasTheCoefficientsOfItsTree(String name) {
        Kernel kernel = KernelLibrary.load(name);
        assertThat(enumerated(kernel, LOOPS, Scales.NATURAL)).isEqualTo(bySeries(kernel, LOOPS, Scales.NATURAL));
    }

    @ParameterizedTest
    @MethodSource("kernels")
    void everyKernelHasTheCoefficientsOfItsTreeAtOtherScales(String name) {
        Kernel kernel = KernelLibrary.load(name);
        List<Scales> others = List.of(
                scales("3/2", "3/2"),
                scales("3/2", "2"),
                scales("1", "2"),
                scales("2", "1"),
                scales("3/2", "1").withVCoupling(),
                new Scales(ExactConstant.PI.add(ExactConstant.EULER_GAMMA), ExactConstant.ONE));
        for (Scales scales : others) {
            assertThat(enumerated(kernel, SCALED_LOOPS, scales))
                    .as("%s at %s", name, scales)
                    .isEqualTo(bySeries(kernel, SCALED_LOOPS, scales));
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"pole-mass", "adler", "gamma-m"})
    void coefficientsAtTwoOtherScalesAgreeToFourteenLoops(String name) {
        Kernel kernel = KernelLibrary.load(name);
        assertThat(enumerated(kernel, LOOPS, scales("3/2", "2"))).isEqualTo(bySeries(kernel, LOOPS, scales("3/2", "2")));
    }

    /** The comparison has teeth: another operator scale changes every coefficient of the pole mass. */
    @Test
    void anotherOperatorScaleIsSeenAtOnce() {
        Kernel kernel = KernelLibrary.load("pole-mass");
        List<ExactConstant> other = bySeries(kernel, 6, scales("1", "3"));
        List<ExactConstant> coefficients = enumerated(kernel, 6, scales("1", "2"));
        for (int n = 0; n < 6; n++) {
            assertThat(coefficients.get(n)).isNotEqualTo(other.get(n));
        }
    }

    /** c_n of the pole mass has one term for each product of pi^2, zeta(3), zeta(5), ... of weight at most n + 1. */
    @ParameterizedTest
    @ValueSource(ints = {10, 20, 30, 40})
    void thePoleMassHasEveryProductOfZetaValuesThroughItsWeight(int loops) {
        long[] products = new long[loops + 1];
        products[0] = 1;
        for (int part = 2; part <= loops; part += part == 2 ? 1 : 2) {
            for (int w = part; w <= loops; w++) {
                products[w] += products[w - part];
            }
        }
        long expected = 0;
        long through = products[0];
        for (int n = 0; n < loops; n++) {
            through += products[n + 1];
            expected += through;
        }
        long terms = Chain.of(KernelLibrary.load("pole-mass")).exact(loops).stream()
                .mapToLong(ExactConstant::size)
                .sum();
        assertThat(terms).isEqualTo(expected);
        // counted in polynomials made by PARI/GP 2.15 and by sympy
        assertThat(terms).isEqualTo(List.of(92L, 1065L, 6950L, 33717L).get(loops / 10 - 1));
    }

    @Test
    void sixtyLoopsOverlapTheBallsOfTheFixedPointRoute() {
        int bits = 300;
        // balls of terms that cancel: 60! is 2^272
        int working = bits + 300;
        BallFunctions.zetaTable(64, working);
        Chain chain = Chain.of(KernelLibrary.load("pole-mass"));
        List<Ball> balls = chain.balls(60, bits);
        List<ExactConstant> exact = chain.exact(60);
        assertThat(exact.stream().mapToLong(ExactConstant::size).sum()).isEqualTo(474_556);
        for (int n : new int[] {0, 1, 20, 59}) {
            Ball value = exact.get(n).toBall(working);
            assertThat(value.overlaps(balls.get(n))).as("c_%d", n).isTrue();
            assertThat(value.accuracyBits()).isGreaterThan(bits);
            assertThat(value.multiply(Rational.of(3, 2), working).overlaps(balls.get(n))).isFalse();
        }
    }

    @Test
    void aPrintedCoefficientReadsBackAsTheSameConstant() {
        for (ExactConstant c : Chain.of(KernelLibrary.load("pole-mass"), scales("3/2", "2")).exact(10)) {
            assertThat(ConstantValue.of(Formula.parse(c.toString()))).isEqualTo(c);
        }
    }

    @Test
    void moreTermsThanAllowedAreRefusedWithTheLoopsThatFit() {
        Kernel kernel = KernelLibrary.load("pole-mass");
        assertThatThrownBy(() -> EnumeratedCoefficients.of(kernel, 30, Scales.NATURAL, 1_064))
                .isInstanceOf(DomainException.class)
                .hasMessage("the first 20 exact coefficients have more than 1064 terms together;"
                        + " ask for at most 19 loops, or for decimals");
        List<ExactConstant> fitting =
                EnumeratedCoefficients.of(kernel, 20, Scales.NATURAL, 1_065).orElseThrow();
        assertThat(fitting).hasSize(20);
        assertThatThrownBy(() -> Chain.of(kernel).exact(81))
                .isInstanceOf(DomainException.class)
                .hasMessage("the number of loops in exact form lies between 1 and 80, got 81");
    }

    @Test
    void eightyLoopsOfAShortKernelAreExact() {
        List<ExactConstant> exact = Chain.of(KernelLibrary.load("bjorken-gls")).exact(80);
        List<ExactConstant> short14 = new ArrayList<>(exact.subList(0, LOOPS));
        assertThat(short14).isEqualTo(Chain.of(KernelLibrary.load("bjorken-gls")).exact(LOOPS));
        assertThat(exact).allMatch(c -> c.asRational().isPresent());
    }

    @TempDir
    Path folder;

    /** A polygamma has one weight more than its order: the highest order of a short list needs it too. */
    @Test
    void anomalousDimensionsWithPolygammasAreExactToTheLastOrder() {
        Kernel kernel = KernelText.of("(digamma(1+u)+euler_gamma)/u+polygamma(1,1/2)/(2*u)")
                .and("anomalous_dimension = \"polygamma(1,1/2+a)+a*digamma(1+a)*gamma(1-a)\"\ndefining_equation = \"d f/d ln mu = gamma\"")
                .kernel(folder);
        List<ExactConstant> longer = bySeries(kernel, 9, scales("3/2", "2"));
        for (int loops = 1; loops <= 8; loops++) {
            assertThat(enumerated(kernel, loops, scales("3/2", "2"))).isEqualTo(longer.subList(0, loops));
            Kernel gamma = kernel.anomalousDimensionAsKernel();
            assertThat(enumerated(gamma, loops, Scales.NATURAL)).isEqualTo(bySeries(gamma, loops, Scales.NATURAL));
        }
    }
}
