package bubblechain.chain;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import bubblechain.kernel.KernelText;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Quantities with double logarithms: renormalisation-group identities, and the three routes against each other. */
class DoubleSubtractionTest {
    @TempDir
    static Path folder;

    private static Scales logs(Rational coupling, Rational operator) {
        return new Scales(ExactConstant.of(coupling), ExactConstant.of(operator));
    }

    private static List<ExactConstant> exact(Kernel kernel, int loops, Scales scales) {
        return Chain.of(kernel, scales).exact(loops);
    }

    /** The derivative at the first of equidistant points, by Newton's forward differences; exact for polynomials. */
    private static ExactConstant derivative(List<ExactConstant> values) {
        List<ExactConstant> row = values;
        ExactConstant sum = ExactConstant.ZERO;
        for (int k = 1; k < values.size(); k++) {
            List<ExactConstant> next = new ArrayList<>();
            for (int i = 1; i < row.size(); i++) {
                next.add(row.get(i).subtract(row.get(i - 1)));
            }
            row = next;
            sum = sum.add(row.get(0).multiply(Rational.of(k % 2 == 1 ? 1 : -1, k)));
        }
        return sum;
    }

    /**
     * f = sum c_n(L) a^(n+1), mu^2 da/dmu^2 = -a^2 and mu^2 df/dmu^2 = (1/2) sum [gamma_n + 2 L g_n] a^(n+1), where 2 g is minus
     * or plus the cusp series: the coefficients of e^(L u) at all scales of coupling and operator together.
     */
    @ParameterizedTest
    @ValueSource(strings = {
        "hard-massless", "jet-quark", "soft-dy", "soft-thrust", "hard-massless-timelike", "jet-quark-delta", "dis-threshold"
    })
    void theLogarithmsAreThoseOfTheRenormalisationGroup(String name) {
        Kernel kernel = KernelLibrary.load(name);
        List<ExactConstant> gamma = Chain.ofAnomalousDimension(kernel).exact(5);
        for (int start = -1; start <= 2; start += 3) {
            for (int n = 0; n < 5; n++) {
                List<ExactConstant> values = new ArrayList<>();
                for (int point = 0; point <= n + 3; point++) {
                    Rational log = Rational.of(start + point);
                    values.add(exact(kernel, n + 1, logs(log, log)).get(n));
                }
                ExactConstant running = n == 0
                        ? ExactConstant.ZERO
                        : exact(kernel, n, logs(Rational.of(start), Rational.of(start))).get(n - 1).multiply(Rational.of(n));
                ExactConstant cusp = cusp(kernel, n);
                ExactConstant expected = gamma.get(n).multiply(Rational.HALF).add(cusp.multiply(Rational.of(start)));
                assertThat(derivative(values).subtract(running)).as("%s, n = %d, L = %d", name, n, start).isEqualTo(expected);
            }
        }
    }

    /** g_n; of dis-threshold the cusp parts cancel. */
    private static ExactConstant cusp(Kernel kernel, int n) {
        var series = kernel.sudakov().orElseThrow().cusp().exact(Rational.ZERO, n + 1);
        return series.length() == 0 ? ExactConstant.ZERO : series.coefficients().get(n);
    }

    /** The coupling's scale alone multiplies B(u) by e^(L u). */
    @ParameterizedTest
    @ValueSource(strings = {"hard-massless", "jet-quark", "soft-dy", "dis-threshold"})
    void theCouplingsScaleMultipliesTheWholeBorelTransform(String name) {
        Kernel kernel = KernelLibrary.load(name);
        Rational operator = Rational.of(-2, 3);
        Rational log = Rational.of(5, 7);
        List<ExactConstant> before = exact(kernel, 6, logs(operator, operator));
        List<ExactConstant> after = exact(kernel, 6, logs(operator.add(log), operator));
        for (int n = 0; n < 6; n++) {
            ExactConstant sum = ExactConstant.ZERO;
            Rational binomial = Rational.ONE;
            for (int k = n; k >= 0; k--) {
                sum = sum.add(before.get(k).multiply(binomial.multiply(log.power(n - k))));
                binomial = binomial.multiply(k).divide(n - k + 1L);
            }
            assertThat(after.get(n)).as("%s, n = %d", name, n).isEqualTo(sum);
        }
    }

    @ParameterizedTest
    @CsvSource({
        "hard-massless, 40, 200, 0, 0", "hard-massless, 170, 900, 1, -1/3", "jet-quark, 160, 700, 1/2, 1/2",
        "soft-dy, 60, 400, -2, 3/7", "soft-thrust, 160, 700, 0, 1", "dis-threshold, 30, 500, 4/3, 1", "hard-gamma, 90, 500, 0, 0",
        "jet-gamma, 200, 300, 0, 0", "soft-dy-gamma, 60, 2000, 0, 0"
    })
    void fixedPointAndBallsAgree(String name, int loops, int bits, String coupling, String operator) {
        Kernel kernel = KernelLibrary.load(name);
        Scales scales = logs(Rational.parse(coupling), Rational.parse(operator));
        List<Ball> fixed = new FixedCoefficients(bits).coefficients(kernel, loops, scales).orElseThrow();
        List<Ball> reference = new BallCoefficients(3 * bits).coefficients(kernel, loops, scales);
        for (int n = 0; n < loops; n++) {
            Ball expected = reference.get(n);
            assertThat(fixed.get(n).midpoint().subtract(expected.midpoint()).abs())
                    .as("%s, n = %d", name, n)
                    .isLessThanOrEqualTo(fixed.get(n).radius().add(expected.radius()).toRational());
            if (!expected.containsZero()) {
                assertThat(fixed.get(n).accuracyBits()).as("accuracy of %s, n = %d", name, n).isGreaterThan(bits - 64);
            }
        }
    }

    @Test
    void randomDiagramsAreTheSameOnAllRoutesWithSeed17() {
        Random random = new Random(17);
        String[] factors = {
            "gamma(1-u)", "gamma(1+u-eps)", "1/gamma(2-u-eps)", "exp(u/3-euler_gamma*u)", "(1-u-eps)", "1/(2-u+eps)",
            "gamma(1-2*u)", "(3+eps*u-u^2)", "1/gamma(1+eps)", "cos(pi*u)", "2^u"
        };
        for (int i = 0; i < 25; i++) {
            StringBuilder diagram = new StringBuilder("(" + (1 + random.nextInt(5)) + "-" + random.nextInt(4) + "*u)");
            for (int k = 1 + random.nextInt(4); k > 0; k--) {
                diagram.append("*").append(factors[random.nextInt(factors.length)]);
            }
            Kernel kernel = KernelText.of("0").replacing("T = \"0\"", "G = \"" + diagram + "\"\nsubtraction = \"double\"")
                    .replacing("\"borel\"", "\"d-dimensional\"").kernel(folder);
            Scales scales = logs(Rational.of(random.nextInt(5) - 2, 3), Rational.of(random.nextInt(5) - 2, 2));
            List<ExactConstant> exact = Chain.of(kernel, scales).exact(7);
            List<Ball> balls = new BallCoefficients(300).coefficients(kernel, 7, scales);
            List<Ball> fixed = new FixedCoefficients(300).coefficients(kernel, 7, scales).orElse(balls);
            for (int n = 0; n < 7; n++) {
                Ball value = exact.get(n).toBall(400);
                assertThat(balls.get(n).contains(value)).as("balls, %s, n = %d", diagram, n).isTrue();
                assertThat(fixed.get(n).contains(value)).as("fixed point, %s, n = %d", diagram, n).isTrue();
            }
        }
    }

    private static void assertRefused(KernelText text, String reason) {
        assertThatThrownBy(() -> text.kernel(folder)).isInstanceOf(DomainException.class).hasMessageContaining(reason);
    }

    @Test
    void whatDoesNotCancelIsRefused() {
        KernelText good = KernelText.of("0").replacing("T = \"0\"", "G = \"gamma(1-u)\"\nsubtraction = \"double\"")
                .replacing("\"borel\"", "\"d-dimensional\"");
        assertThat(good.kernel(folder).sudakov()).isPresent();
        assertRefused(good.replacing("\"double\"", "\"twice\""), "subtraction is \"single\" or \"double\", got \"twice\"");
        assertRefused(good.and("result = \"gamma\""), "result is \"series\" or \"anomalous-dimension\", got \"gamma\"");
        assertRefused(good.replacing("gamma(1-u)\"", "gamma(u)\""), "line 7");
        assertRefused(good.replacing("gamma(1-u)\"", "1/(1+u/(eps+2)-1)\""), "division by zero");
        assertRefused(KernelText.of("1+u").and("subtraction = \"double\""), "subtraction belongs to form \"d-dimensional\"");
        assertRefused(KernelText.of("1+u").and("result = \"series\""), "result belongs to form \"d-dimensional\"");
        assertRefused(good.and("anomalous_dimension = \"1\""), "derives the anomalous dimension from G");
    }
}
