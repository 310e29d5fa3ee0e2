package bubblechain.analytic;

import bubblechain.exact.Ball;
import bubblechain.exact.BallFunctions;
import bubblechain.exact.BoundSamples;
import bubblechain.exact.Rational;
import java.math.BigDecimal;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Radii of gamma functions and polygammas over the complex plane against closed forms on two vertical lines, in balls
 * of more than three times the 53 bits of the discs: |Gamma(1/2 + iy)|^2 = pi/cosh(pi y), |Gamma(1 + iy)|^2 = pi
 * y/sinh(pi y), Im psi(1/2 + iy) = (pi/2) tanh(pi y), Im psi(1 + iy) = -1/(2y) + (pi/2) coth(pi y) (DLMF 5.4.4, 5.4.3,
 * 5.4.17, 5.4.18, numbers from memory), and 2 Re psi'(1/2 + iy) = pi^2/cosh^2(pi y) from the reflection formula DLMF
 * 5.15.6; moved to the right by recurrence.
 */
class StirlingBoundsTest {
    private static final int BITS = 220;
    private static final Ball PI = BallFunctions.pi(BITS);

    private static Rational exact(double x) {
        return Rational.parse(new BigDecimal(x).toPlainString());
    }

    private static Ball ball(double x) {
        return Ball.of(exact(x), BITS);
    }

    /** e^(pi y) and e^(-pi y), added or subtracted, over two. */
    private static Ball hyperbolic(double y, boolean sine) {
        Ball up = BallFunctions.exp(PI.multiply(exact(y), BITS), BITS);
        Ball down = BallFunctions.exp(PI.multiply(exact(-y), BITS), BITS);
        return (sine ? up.subtract(down, BITS) : up.add(down, BITS)).shift(-1);
    }

    /** ln |Gamma(x + iy)| for x = 1/2 + steps or 1 + steps. */
    private static Ball lnModulus(double start, int steps, double y) {
        Ball square = start == 0.5
                ? PI.divide(hyperbolic(y, false), BITS)
                : PI.multiply(exact(y), BITS).divide(hyperbolic(y, true), BITS);
        for (int k = 0; k < steps; k++) {
            Rational x = exact(start + k);
            square = square.multiply(x.multiply(x).add(exact(y).multiply(exact(y))), BITS);
        }
        return BallFunctions.ln(square, BITS).shift(-1);
    }

    /** Im psi at the same points: psi(z + 1) = psi(z) + 1/z, Im 1/z = -y/|z|^2. */
    private static Ball imaginaryDigamma(double start, int steps, double y) {
        Ball ratio = hyperbolic(y, true).divide(hyperbolic(y, false), BITS);
        Ball value = start == 0.5
                ? ratio.multiply(PI, BITS).shift(-1)
                : PI.divide(ratio, BITS).shift(-1).subtract(ball(2 * y).inverse(BITS), BITS);
        for (int k = 0; k < steps; k++) {
            Rational x = exact(start + k);
            value = value.add(exact(y).divide(x.multiply(x).add(exact(y).multiply(exact(y)))).negate(), BITS);
        }
        return value;
    }

    private static void add(BoundSamples samples, double value, double radius, Ball expected, String what, Object... at) {
        Rational error = exact(value).subtract(expected.midpoint()).abs();
        samples.add(exact(radius).add(expected.radius().toRational()), error, what, at);
    }

    @ParameterizedTest
    @ValueSource(ints = {2, 5, 9, StirlingSeries.TERMS})
    void seriesInTheRightHalfPlaneAreWithinTheirRadiiSeed22(int terms) {
        Random random = new Random(22);
        BoundSamples gammas = new BoundSamples();
        BoundSamples digammas = new BoundSamples();
        for (int i = 0; i < 100; i++) {
            double start = i % 2 == 0 ? 0.5 : 1;
            int steps = 3 + random.nextInt(12);
            double y = 0.1 + 12 * random.nextDouble();
            ComplexDisc z = ComplexDisc.of(start + steps, y);
            ComplexDisc gamma = StirlingSeries.lnGamma(z, terms);
            add(gammas, gamma.re(), gamma.radius(), lnModulus(start, steps, y), "ln |Gamma(%s)|", z);
            ComplexDisc digamma = StirlingSeries.digamma(z, terms);
            add(digammas, digamma.im(), digamma.radius(), imaginaryDigamma(start, steps, y), "Im psi(%s)", z);
        }
        gammas.assertNotWasteful(90, "ln Gamma, %d terms", terms);
        digammas.assertNotWasteful(90, "psi, %d terms", terms);
    }

    @Test
    void evaluatedFormsAreWithinTheirRadiiSeed23() {
        Random random = new Random(23);
        FormEvaluation gamma = FormEvaluation.of(ArcValues.form("gamma(u)"));
        FormEvaluation digamma = FormEvaluation.of(ArcValues.form("digamma(u)"));
        FormEvaluation trigamma = FormEvaluation.of(ArcValues.form("polygamma(1,u)"));
        BoundSamples gammas = new BoundSamples();
        BoundSamples digammas = new BoundSamples();
        BoundSamples trigammas = new BoundSamples();
        for (int i = 0; i < 150; i++) {
            double start = i % 2 == 0 ? 0.5 : 1;
            int steps = random.nextInt(4);
            double y = 0.1 + 5 * random.nextDouble();
            Ball modulus = BallFunctions.exp(lnModulus(start, steps, y), BITS);
            ComplexValue value = gamma.at(start + steps, y);
            Ball square = ball(value.re()).multiply(ball(value.re()), BITS)
                    .add(ball(value.im()).multiply(ball(value.im()), BITS), BITS);
            Ball distance = BallFunctions.sqrt(square, BITS).shift((int) value.exponent()).subtract(modulus, BITS).abs();
            Rational bound = exact(value.error()).multiply(Rational.TWO.power((int) value.exponent()));
            gammas.add(bound, distance.midpoint(), "|Gamma(%s + %s i)|", start + steps, y);
            ComplexValue psi = digamma.at(start + steps, y);
            add(digammas, psi.imaginaryPart(), psi.absoluteError(), imaginaryDigamma(start, steps, y), "Im psi, y = %s", y);
            Ball cosine = hyperbolic(y, false);
            Ball expected = PI.multiply(PI, BITS).divide(cosine.multiply(cosine, BITS), BITS).shift(-1);
            ComplexValue one = trigamma.at(0.5, y);
            add(trigammas, one.realPart(), one.absoluteError(), expected, "Re psi'(1/2 + %s i)", y);
        }
        gammas.assertNotWasteful(140, "Gamma");
        digammas.assertNotWasteful(140, "psi");
        trigammas.assertNotWasteful(140, "psi'");
    }
}
