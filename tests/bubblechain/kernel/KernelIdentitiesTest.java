package bubblechain.kernel;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.analytic.AnalyticFunction;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.series.LaurentSeries;
import java.util.Map;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;

/** Relations between built-in kernels that hold term by term, to all orders; here exactly up to u^8 and a^8. */
class KernelIdentitiesTest {
    private static final int HIGHEST_POWER = 8;

    private static Kernel kernel(String name) {
        return KernelLibrary.load(name);
    }

    private static Kernel moment(String name, int moment) {
        return KernelLibrary.load(name, Map.of("moment", Rational.of(moment)));
    }

    private static AnalyticFunction transform(Kernel kernel) {
        return kernel.transform().orElseThrow();
    }

    private static AnalyticFunction gamma(Kernel kernel) {
        return kernel.anomalousDimension().orElseThrow();
    }

    private static ExactConstant coefficient(AnalyticFunction function, int n) {
        LaurentSeries<ExactConstant> series = function.exact(Rational.ZERO, n + 1);
        int index = n - series.lowest();
        return index < 0 || index >= series.length() ? ExactConstant.ZERO : series.coefficients().get(index);
    }

    /** left = first + factor x second. */
    private static void assertSum(AnalyticFunction left, AnalyticFunction first, Rational factor, AnalyticFunction second) {
        assertThat(IntStream.rangeClosed(-1, HIGHEST_POWER)).allSatisfy(n -> assertThat(coefficient(left, n)
                        .subtract(coefficient(first, n))
                        .subtract(coefficient(second, n).multiply(factor))
                        .isZero())
                .as("power %d", n)
                .isTrue());
    }

    private static void assertMultiple(AnalyticFunction left, Rational factor, AnalyticFunction right) {
        assertThat(IntStream.rangeClosed(-1, HIGHEST_POWER)).allSatisfy(n -> assertThat(coefficient(left, n)
                        .subtract(coefficient(right, n).multiply(factor))
                        .isZero())
                .as("power %d", n)
                .isTrue());
    }

    @Test
    void scalarCurrentIsTheTimeComponentTimesThePoleMassOverTheRunningMass() {
        // equation of motion
        Kernel scalar = kernel("hl-current-scalar");
        Kernel time = kernel("hl-current-gamma0");
        Kernel mass = kernel("pole-mass");
        assertSum(transform(scalar), transform(time), Rational.ONE, transform(mass));
        assertSum(gamma(scalar), gamma(time), Rational.ONE, gamma(mass));
    }

    @Test
    void ratioOfDecayConstantsIsTheTransverseOverTheTimeComponent() {
        Kernel transverse = kernel("hl-current-gammaperp");
        Kernel time = kernel("hl-current-gamma0");
        assertSum(transform(transverse), transform(time), Rational.ONE, transform(kernel("fbstar-over-fb")));
        assertMultiple(gamma(transverse), Rational.ONE, gamma(time));
    }

    @Test
    void vectorCurrentIsConservedSoItsMatchingRunsWithTheHeavyLightAnomalousDimension() {
        // d ln C/d ln mu = d ln Z_J/d ln mu = -3 CF (a/beta0) gamma-hl-current
        assertMultiple(gamma(kernel("hl-current-gamma0")), Rational.of(-3), gamma(kernel("gamma-hl-current")));
    }

    @Test
    void heavyLightAnomalousDimensionIsHalfThatOfTheMass() {
        assertMultiple(gamma(kernel("gamma-m")), Rational.of(6), gamma(kernel("gamma-hl-current")));
    }

    @Test
    void chromomagneticAnomalousDimensionAgreesWithTheMatchingCoefficient() {
        assertMultiple(gamma(kernel("chromomag-ca")), Rational.TWO, gamma(kernel("gamma-chromomag")));
    }

    @Test
    void chromomagneticPartWithCFIsTwiceTheLeptonMoment() {
        assertMultiple(transform(kernel("chromomag-cf")), Rational.TWO, transform(kernel("lepton-g2")));
    }

    @Test
    void bjorkenSumRulesAreFirstMoments() {
        assertMultiple(transform(kernel("bjorken-gls")), Rational.ONE, transform(moment("dis-f3", 1)));
        assertMultiple(transform(kernel("bjorken-unpol")), Rational.of(-1), transform(moment("dis-fl", 1)));
    }

    @Test
    void adlerSumRuleHasNoCorrection() {
        Kernel first = moment("dis-f2", 1);
        assertThat(transform(first).exact(Rational.ZERO, HIGHEST_POWER).coefficients()).allMatch(ExactConstant::isZero);
        assertThat(gamma(first).exact(Rational.ZERO, HIGHEST_POWER).coefficients()).allMatch(ExactConstant::isZero);
    }

    @TestFactory
    Stream<DynamicTest> coefficientFunctionsOfEveryMomentRunWithTwiceTheOperatorAnomalousDimension() {
        return IntStream.rangeClosed(1, 12).mapToObj(n -> DynamicTest.dynamicTest("moment " + n, () -> {
            AnalyticFunction operator = gamma(moment("dis-gamma", n));
            assertMultiple(gamma(moment("dis-f2", n)), Rational.TWO, operator);
            assertMultiple(gamma(moment("dis-f3", n)), Rational.TWO, operator);
            // one loop: 4 S_1(N) - 3 - 2/(N(N+1))
            Rational harmonic = IntStream.rangeClosed(1, n).mapToObj(k -> Rational.of(1, k)).reduce(Rational.ZERO, Rational::add);
            Rational oneLoop = harmonic.multiply(Rational.of(4)).subtract(Rational.of(3)).subtract(Rational.of(2, (long) n * (n + 1)));
            assertThat(operator.valueAt(Rational.ZERO)).isEqualTo(ExactConstant.of(oneLoop));
        }));
    }

    @Test
    void scalarCorrelatorsRunWithTwiceTheMassAnomalousDimension() {
        assertMultiple(gamma(kernel("scalar-psi2")), Rational.TWO, gamma(kernel("gamma-m")));
        assertMultiple(gamma(kernel("scalar-im-hbb")), Rational.TWO, gamma(kernel("gamma-m")));
    }
}
