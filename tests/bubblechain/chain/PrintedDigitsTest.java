package bubblechain.chain;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.borel.BorelPlane;
import bubblechain.borel.BorelPole;
import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import bubblechain.qcd.Coupling;
import bubblechain.qcd.Normalisation;
import java.math.BigDecimal;
import java.util.List;
import java.util.OptionalInt;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Every printed decimal of every kernel is read again and lies within half a unit of its last digit of a ball at three
 * times the precision, found on another route: short lists, long lists, closed forms, other couplings, residues.
 */
class PrintedDigitsTest {
    private static final double BITS_PER_DIGIT = Math.log(10) / Math.log(2);

    static List<String> library() {
        return KernelLibrary.names();
    }

    private static int bits(int digits) {
        return (int) (3 * digits * BITS_PER_DIGIT);
    }

    /** The printed number is the ball rounded to so many digits, or is 0 and the ball may be. */
    static void assertReread(String what, String text, Ball ball, int digits) {
        if (text.equals("0")) {
            assertThat(ball.containsZero()).as("%s: printed 0", what).isTrue();
            return;
        }
        BigDecimal printed = new BigDecimal(text);
        assertThat(printed.precision()).as("%s: digits printed", what).isEqualTo(digits);
        Rational half = Rational.parse("5e" + (-printed.scale() - 1));
        Rational value = Rational.parse(text);
        assertThat(ball.upper().subtract(value)).as("%s = %s", what, text).isLessThanOrEqualTo(half);
        assertThat(value.subtract(ball.lower())).as("%s = %s", what, text).isLessThanOrEqualTo(half);
    }

    private static void assertReread(String what, List<CertifiedNumber> numbers, List<Ball> balls, int digits) {
        assertThat(numbers).hasSameSizeAs(balls);
        for (int n = 0; n < numbers.size(); n++) {
            assertThat(numbers.get(n).isDecimal()).as("%s, c_%d", what, n).isTrue();
            assertReread(what + ", c_" + n, numbers.get(n).text(), balls.get(n), digits);
        }
    }

    @ParameterizedTest
    @MethodSource("library")
    void shortAndLongListsAreReadAgain(String name) {
        Kernel kernel = KernelLibrary.load(name);
        Chain chain = Chain.of(kernel);
        List<Ball> balls = new BallCoefficients(bits(60)).coefficients(kernel, 23, Scales.NATURAL);
        assertReread(name, chain.certified(23, 60), balls, 60);
        assertReread(name, chain.certified(14, 35), balls.subList(0, 14), 35);
    }

    /** The guard bits cover what the bounds lose, and eight bits more: a second attempt would double the time. */
    @ParameterizedTest
    @ValueSource(strings = {
        "pole-mass", "adler", "tau", "bjorken-gls", "cusp", "gamma-m", "chromomag-ca", "static-potential-r", "lepton-g2"
    })
    void theFirstAttemptDecidesEveryDigit(String name) {
        Kernel kernel = KernelLibrary.load(name);
        for (int[] size : new int[][] {{14, 35}, {30, 60}, {110, 120}}) {
            List<Ball> balls = Chain.of(kernel).balls(size[0], Chain.firstBits(size[0], size[1]));
            for (int n = 0; n < size[0]; n++) {
                Ball ball = balls.get(n);
                assertThat(ball.isZero() || ball.accuracyBits() > size[1] * BITS_PER_DIGIT + 8)
                        .as("%s, c_%d to %d digits: %s", name, n, size[1], ball)
                        .isTrue();
            }
        }
    }

    @ParameterizedTest
    @MethodSource("library")
    void decimalsOfClosedFormsAreReadAgainAndAreThoseOfTheLists(String name) {
        Kernel kernel = KernelLibrary.load(name);
        List<ExactConstant> exact = Chain.of(kernel).exact(5);
        List<Ball> balls = new BallCoefficients(bits(40)).coefficients(kernel, 5, Scales.NATURAL);
        List<CertifiedNumber> numbers = exact.stream().map(c -> CertifiedNumber.of(c, 40)).toList();
        assertReread(name, numbers, balls, 40);
        assertThat(Chain.of(kernel).certified(5, 40)).isEqualTo(numbers);
    }

    @ParameterizedTest
    @ValueSource(strings = {"pole-mass", "adler", "static-potential-q"})
    void otherCouplingsAndNormalisationsAreReadAgain(String name) {
        Kernel kernel = KernelLibrary.load(name);
        for (Coupling coupling : Coupling.values()) {
            for (Normalisation normalisation : Normalisation.values()) {
                Rendering rendering = Rendering.of(kernel, coupling, normalisation, OptionalInt.of(4));
                List<Ball> balls = rendering.applyToBalls(
                        new BallCoefficients(bits(50)).coefficients(kernel, 25, Scales.NATURAL), bits(50));
                String what = name + " in " + coupling + ", " + normalisation;
                List<CertifiedNumber> numbers = Chain.of(kernel).certified(25, 50, rendering);
                for (int n = 0; n < 25; n++) {
                    if (!balls.get(n).isExact()) {
                        assertReread(what + ", " + n, numbers.get(n).text(), balls.get(n), 50);
                    }
                }
            }
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"pole-mass", "adler", "bjorken-gls", "lepton-g2", "static-potential-r"})
    void residuesAreReadAgain(String name) {
        for (BorelPole pole : BorelPlane.of(KernelLibrary.load(name), Scales.NATURAL).poles(Rational.of(-4), Rational.of(4))) {
            for (ExactConstant coefficient : pole.pole().laurent()) {
                String text = CertifiedNumber.of(coefficient, 30).text();
                assertReread(name + " at " + pole.u(), text, coefficient.toBall(bits(30)), 30);
            }
        }
    }
}
