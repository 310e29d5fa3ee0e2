package bubblechain.exact;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;

class ExactConstantTest {
    private static final int BITS = 128;

    @Test
    void constantsAreARingOnSeed11() {
        RandomConstants random = new RandomConstants(11);
        for (int k = 0; k < 300; k++) {
            ExactConstant a = random.any();
            ExactConstant b = random.any();
            ExactConstant c = random.any();
            assertThat(a.add(b)).isEqualTo(b.add(a)).hasSameHashCodeAs(b.add(a));
            assertThat(a.multiply(b)).isEqualTo(b.multiply(a));
            assertThat(a.add(b).add(c)).isEqualTo(a.add(b.add(c)));
            assertThat(a.multiply(b).multiply(c)).isEqualTo(a.multiply(b.multiply(c)));
            assertThat(a.multiply(b.add(c))).isEqualTo(a.multiply(b).add(a.multiply(c)));
            assertThat(a.subtract(a).isZero()).isTrue();
            assertThat(a.multiply(ExactConstant.ONE)).isEqualTo(a);
            assertThat(a.power(3)).isEqualTo(a.multiply(a).multiply(a));
            assertThat(a.multiply(Rational.of(-3, 7))).isEqualTo(a.multiply(ExactConstant.of(Rational.of(-3, 7))));
        }
    }

    @Test
    void ballsOfSumsAndProductsOverlapSumsAndProductsOfBallsOnSeed12() {
        RandomConstants random = new RandomConstants(12);
        for (int k = 0; k < 120; k++) {
            ExactConstant a = random.any();
            ExactConstant b = random.any();
            assertThat(a.add(b).toBall(BITS).overlaps(a.toBall(BITS).add(b.toBall(BITS), BITS)))
                    .as("(%s) + (%s)", a, b)
                    .isTrue();
            assertThat(a.multiply(b).toBall(BITS).overlaps(a.toBall(BITS).multiply(b.toBall(BITS), BITS)))
                    .as("(%s) * (%s)", a, b)
                    .isTrue();
            assertThat(a.toBall(BITS).overlaps(a.toBall(2 * BITS))).as("two precisions of %s", a).isTrue();
        }
    }

    @Test
    void theInverseOfASingleProductIsExactOnSeed13() {
        RandomConstants random = new RandomConstants(13);
        int exact = 0;
        for (int k = 0; k < 200; k++) {
            ExactConstant a = random.closedProduct();
            if (a.isZero()) {
                continue;
            }
            ExactConstant inverse = a.inverse();
            assertThat(inverse.toBall(BITS).multiply(a.toBall(BITS), BITS).contains(Rational.ONE)).as("%s", a).isTrue();
            if (inverse.isClosedForm()) {
                exact++;
                assertThat(inverse.multiply(a)).isEqualTo(ExactConstant.ONE);
            }
        }
        assertThat(exact).isGreaterThan(50);
    }

    @Test
    void zeroHasNoInverse() {
        assertThatThrownBy(() -> ExactConstant.PI.subtract(ExactConstant.PI).inverse())
                .isInstanceOf(ArithmeticException.class)
                .hasMessage("division by zero");
    }

    @Test
    void exponentialsOfRationalsAndEulersConstantMultiply() {
        ExactConstant a = ExactConstant.of(Rational.of(5, 3)).subtract(ExactConstant.EULER_GAMMA).exp();
        ExactConstant b = ExactConstant.of(Rational.of(-2, 3)).add(ExactConstant.EULER_GAMMA.multiply(Rational.TWO)).exp();
        assertThat(a.multiply(b)).isEqualTo(ExactConstant.ONE.add(ExactConstant.EULER_GAMMA).exp());
        assertThat(a.multiply(a.inverse())).isEqualTo(ExactConstant.ONE);
        assertThat(a).hasToString("exp(5/3-euler_gamma)");
        assertThat(ExactConstant.ZERO.exp()).isEqualTo(ExactConstant.ONE);
    }

    @Test
    void exponentialsOfLogarithmsArePowers() {
        ExactConstant halfLog = ExactFunctions.ln(Rational.of(12)).divide(Rational.TWO);
        assertThat(halfLog.exp()).hasToString("2*sqrt(3)");
        assertThat(ExactConstant.PI.ln().multiply(Rational.of(-3, 2)).exp())
                .isEqualTo(ExactConstant.SQRT_PI.power(-3));
        assertThat(ExactConstant.PI.ln().multiply(Rational.of(4, 3)).exp()).hasToString("exp(ln(pi)/3)*pi");
    }

    @Test
    void theLogarithmOfAProductSplitsIntoItsFactors() {
        ExactConstant product = ExactFunctions.power(Rational.of(8), Rational.of(1, 2))
                .multiply(ExactConstant.SQRT_PI)
                .multiply(ExactConstant.of(Rational.of(1, 3)).add(ExactConstant.EULER_GAMMA).exp())
                .multiply(Rational.of(5, 7));
        ExactConstant expected = ExactFunctions.ln(Rational.TWO)
                .multiply(Rational.of(3, 2))
                .add(ExactConstant.PI.ln().divide(Rational.TWO))
                .add(ExactConstant.of(Rational.of(1, 3)))
                .add(ExactConstant.EULER_GAMMA)
                .add(ExactFunctions.ln(Rational.of(5)))
                .subtract(ExactFunctions.ln(Rational.of(7)));
        assertThat(product.ln()).isEqualTo(expected);
        assertThat(product.ln().exp()).isEqualTo(product);
    }

    @Test
    void logarithmAndExponentialUndoEachOtherInBallsOnSeed14() {
        RandomConstants random = new RandomConstants(14);
        for (int k = 0; k < 40; k++) {
            ExactConstant a = random.any();
            ExactConstant square = a.multiply(a).add(ExactConstant.ONE);
            assertThat(square.ln().exp().toBall(BITS).overlaps(square.toBall(BITS))).as("%s", square).isTrue();
            assertThat(a.exp().ln().toBall(BITS).overlaps(a.toBall(BITS))).as("%s", a).isTrue();
        }
    }

    @Test
    void theLogarithmOfANegativeNumberIsRefused() {
        assertThatThrownBy(() -> ExactConstant.of(3).subtract(ExactConstant.PI).ln())
                .isInstanceOf(DomainException.class)
                .hasMessage("the logarithm needs a positive number, got -pi+3");
    }

    @Test
    void aNumericalZeroThatIsNotAFormalZeroStaysInTheConstant() {
        // gamma(1/4) gamma(3/4) = pi sqrt(2), DLMF 5.5.3
        ExactConstant difference = ExactFunctions.gamma(Rational.of(1, 4))
                .multiply(ExactFunctions.gamma(Rational.of(3, 4)))
                .subtract(ExactConstant.PI.multiply(ExactFunctions.power(Rational.TWO, Rational.HALF)));
        assertThat(difference.isZero()).isFalse();
        assertThat(difference.isClosedForm()).isFalse();
        assertThat(difference.toBall(500).containsZero()).isTrue();
    }

    @Test
    void termsArePrintedByWeight() {
        ExactConstant c2 = ExactFunctions.zeta(3)
                .multiply(Rational.of(14))
                .add(ExactConstant.PI.power(2).multiply(Rational.of(13, 3)))
                .add(ExactConstant.of(Rational.of(2353, 216)));
        assertThat(c2).hasToString("14*zeta(3)+13*pi^2/3+2353/216");
        assertThat(ExactConstant.SQRT_PI.inverse().divide(Rational.of(-2))).hasToString("-1/2/sqrt(pi)");
        assertThat(ExactConstant.ZERO).hasToString("0");
    }
}
