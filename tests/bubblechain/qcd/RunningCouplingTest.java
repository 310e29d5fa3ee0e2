package bubblechain.qcd;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import bubblechain.exact.DomainException;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class RunningCouplingTest {
    private static final double MZ = 91.188;

    private static RunningCoupling random(SplittableRandom random) {
        return RunningCoupling.of(random.nextInt(0, 7), random.nextInt(1, 6), 91, random.nextDouble(0.08, 0.15));
    }

    private static double logUniform(SplittableRandom random, double from, double to) {
        return from * Math.pow(to / from, random.nextDouble());
    }

    private static void equal(double value, double expected, double relative) {
        assertThat(value / expected - 1).isCloseTo(0, within(relative));
    }

    @Test
    void runningThereAndBackIsTheIdentityWithSeed51() {
        SplittableRandom random = new SplittableRandom(51);
        for (int i = 0; i < 200; i++) {
            RunningCoupling start = random(random);
            double mu = logUniform(random, 5, 1e15);
            equal(start.at(mu).alphaS(91), start.value(), 1e-12);
        }
    }

    @Test
    void runningInTwoStepsIsRunningInOneWithSeed52() {
        SplittableRandom random = new SplittableRandom(52);
        for (int i = 0; i < 200; i++) {
            RunningCoupling start = random(random);
            double end = logUniform(random, 5, 1e6);
            equal(start.at(logUniform(random, 5, 1e6)).alphaS(end), start.alphaS(end), 1e-12);
        }
    }

    @Test
    void oneLoopIsTheClosedForm() {
        for (int nf = 0; nf <= 16; nf++) {
            RunningCoupling oneLoop = RunningCoupling.of(nf, 1, MZ, 0.118);
            double beta0 = 11 - 2.0 * nf / 3;
            for (double mu : new double[] {3, 20, 1000, 1e16}) {
                equal(oneLoop.alphaS(mu), 0.118 / (1 + 0.118 * beta0 / (2 * Math.PI) * Math.log(mu / MZ)), 1e-13);
            }
            equal(oneLoop.landauPole().orElseThrow(), MZ * Math.exp(-2 * Math.PI / (beta0 * 0.118)), 1e-12);
            equal(LambdaParameter.of(oneLoop).lambdaMsbar(), oneLoop.landauPole().orElseThrow(), 1e-12);
        }
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 3, 5, 6})
    void twoLoopsAreTheLambertForm(int nf) {
        // with c = beta1/beta0: 1/(c y) = -1 - W, W the lower real branch of W e^W = -exp(ln of Lambda/mu), found by Newton
        double beta0 = 11 - 2.0 * nf / 3;
        double c = (102 - 38.0 * nf / 3) / beta0;
        RunningCoupling twoLoop = RunningCoupling.of(nf, 2, MZ, 0.118);
        double w0 = -1 - 4 * Math.PI / (c * 0.118);
        for (double mu : new double[] {4, 10, 500, 1e10}) {
            double logOfZ = w0 + Math.log(-w0) - 2 * beta0 / c * Math.log(mu / MZ); // ln(-z) = w + ln(-w)
            double w = w0;
            for (int i = 0; i < 100; i++) {
                w -= (w + Math.log(-w) - logOfZ) / (1 + 1 / w);
            }
            equal(twoLoop.alphaS(mu), -4 * Math.PI / (c * (1 + w)), 1e-12);
        }
    }

    @Test
    void strongCouplingsAgreeWithTheQuadratureOfTheBetaFunction() {
        for (int nf = 0; nf <= 6; nf++) {
            for (int loops = 1; loops <= 5; loops++) {
                RunningCoupling coupling = RunningCoupling.of(nf, loops, 2, 0.3);
                for (double alpha : new double[] {0.5, 1, 2, 3.14}) {
                    double mu = 2 * Math.exp(coupling.evolution().distance(4 * Math.PI / 0.3, 4 * Math.PI / alpha));
                    equal(coupling.alphaS(mu), alpha, RunningCoupling.RELATIVE_ACCURACY * (alpha > 1 ? 10 : 1));
                }
            }
        }
    }

    @Test
    void strongCouplingsHaveTheirIndependentValues() {
        // from alpha_s(2 GeV) = 0.3; quadrature and secant method with 30 digits in mpmath, derived here
        equal(RunningCoupling.of(3, 5, 2, 0.3).alphaS(0.66), 1.6304704407038892833, 1e-11);
        equal(RunningCoupling.of(3, 2, 2, 0.3).alphaS(0.54), 1.1026681173996122445, 1e-11);
        equal(RunningCoupling.of(0, 4, 2, 0.3).alphaS(1.16), 0.52390742963703965145, 1e-12);
    }

    @Test
    void couplingsHaveTheirUnits() {
        RunningCoupling coupling = RunningCoupling.of(3, 4, 2, 0.3);
        equal(coupling.value(Coupling.ALPHA_OVER_PI, 2), 0.3 / Math.PI, 1e-15);
        equal(coupling.value(Coupling.A, 2), 9 * 0.3 / (4 * Math.PI), 1e-15);
    }

    @Test
    void theCouplingReachesPiAtTheLowestScale() {
        for (int loops = 1; loops <= 5; loops++) {
            RunningCoupling coupling = RunningCoupling.of(3, loops, 2, 0.3);
            double lowest = coupling.lowestScale();
            assertThat(lowest).isGreaterThan(coupling.landauPole().orElseThrow());
            equal(coupling.alphaS(lowest * (1 + 1e-14)), Math.PI, 1e-10); // steep there
        }
    }

    @Test
    void nothingDivergesWhereTheBetaFunctionHasAZero() {
        RunningCoupling conformal = RunningCoupling.of(16, 2, 1, 0.03);
        double zero = 4 * Math.PI * (1.0 / 3) / (302.0 / 3); // beta0 = 1/3, beta1 = -302/3
        equal(conformal.fixedPoint().orElseThrow(), zero, 1e-12);
        assertThat(conformal.landauPole()).isEmpty();
        assertThat(conformal.lowestScale()).isZero();
        assertThat(conformal.alphaS(1e-300)).isBetween(0.03, zero);
        assertThatThrownBy(() -> RunningCoupling.of(16, 2, 1, 0.05))
                .isInstanceOf(DomainException.class)
                .hasMessage("alpha_s = 0.05000 lies beyond the zero of the 2-loop beta function with nf = 16 at 0.04161;"
                        + " give a smaller value");
    }

    @Test
    void scalesBelowTheLandauPoleAreRefusedInOneLine() {
        RunningCoupling coupling = RunningCoupling.of(5, 1, MZ, 0.118);
        assertThatThrownBy(() -> coupling.alphaS(0.08))
                .isInstanceOf(DomainException.class)
                .hasMessage("mu = 0.08000 GeV is below the Landau pole of the 1-loop coupling with nf = 5 at 0.08783 GeV;"
                        + " give a larger scale");
        assertThatThrownBy(() -> coupling.alphaS(0.09))
                .isInstanceOf(DomainException.class)
                .hasMessage("mu = 0.09000 GeV is so near to the Landau pole that alpha_s with nf = 5 exceeds pi;"
                        + " give at least 0.1140 GeV");
    }

    @Test
    void wrongNumbersAreRefused() {
        RunningCoupling coupling = RunningCoupling.of(5, 5, MZ, 0.118);
        for (double wrong : new double[] {0, -1, Double.NaN, Double.POSITIVE_INFINITY}) {
            assertThatThrownBy(() -> coupling.alphaS(wrong))
                    .isInstanceOf(DomainException.class)
                    .hasMessage("the scale mu in GeV must be a positive number, got " + wrong);
            assertThatThrownBy(() -> RunningCoupling.of(5, 5, wrong, 0.118)).isInstanceOf(DomainException.class);
            assertThatThrownBy(() -> RunningCoupling.of(5, 5, MZ, wrong)).isInstanceOf(DomainException.class);
            assertThatThrownBy(() -> RunningMass.of(coupling, MZ, wrong)).isInstanceOf(DomainException.class);
            assertThatThrownBy(() -> LambdaParameter.of(3, 5, wrong)).isInstanceOf(DomainException.class);
            assertThatThrownBy(() -> Threshold.msbar(3, wrong)).isInstanceOf(DomainException.class);
        }
        assertThatThrownBy(() -> RunningCoupling.of(17, 5, MZ, 0.118)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> RunningCoupling.of(-1, 5, MZ, 0.118)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> RunningCoupling.of(5, 6, MZ, 0.118)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> RunningCoupling.of(5, 5, MZ, 3.2))
                .isInstanceOf(DomainException.class)
                .hasMessage("alpha_s must not exceed pi, got 3.200");
    }

    @Test
    void hugeAndTinyScalesHaveAnAnswer() {
        RunningCoupling coupling = RunningCoupling.of(5, 5, 1e-200, 0.2);
        assertThat(coupling.alphaS(1e300)).isPositive().isLessThan(0.01);
    }
}
