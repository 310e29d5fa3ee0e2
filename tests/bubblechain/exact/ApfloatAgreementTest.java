package bubblechain.exact;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigDecimal;
import org.apfloat.Apfloat;
import org.apfloat.ApfloatMath;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Balls against an independent library, Apfloat, at 60 digits; its last digits are not trusted. */
class ApfloatAgreementTest {
    private static final int DIGITS = 60;
    private static final int TRUSTED = 55;
    private static final int BITS = 240;

    private static Apfloat apfloat(Rational q) {
        return new Apfloat(q.numerator(), DIGITS).divide(new Apfloat(q.denominator(), DIGITS));
    }

    private static void assertAgree(Ball ball, Apfloat expected) {
        BigDecimal value = new BigDecimal(expected.toString(true));
        Rational tolerance = Rational.parse(value.abs().scaleByPowerOfTen(-TRUSTED).toPlainString());
        Rational difference = Rational.parse(value.toPlainString()).subtract(ball.midpoint()).abs();
        assertThat(difference).isLessThanOrEqualTo(tolerance.add(ball.radius().toRational()));
        assertThat(ball.accuracyBits()).isGreaterThan(BITS - 20);
    }

    @ParameterizedTest
    @ValueSource(strings = {"1/3", "1/4", "5/2", "-7/3", "17/5", "40/3"})
    void gammaAgrees(String text) {
        Rational q = Rational.parse(text);
        assertAgree(BallFunctions.gamma(Ball.of(q, BITS + 30), BITS), ApfloatMath.gamma(apfloat(q)));
    }

    @ParameterizedTest
    @ValueSource(strings = {"1/3", "3/4", "5/2", "17/5"})
    void digammaAgrees(String text) {
        Rational q = Rational.parse(text);
        assertAgree(BallFunctions.digamma(Ball.of(q, BITS + 30), BITS), ApfloatMath.digamma(apfloat(q)));
    }

    @ParameterizedTest
    @ValueSource(strings = {"5/3", "-5/3", "1/7", "-20/3"})
    void exponentialsAgree(String text) {
        Rational q = Rational.parse(text);
        assertAgree(BallFunctions.exp(Ball.of(q, BITS + 30), BITS), ApfloatMath.exp(apfloat(q)));
    }

    @ParameterizedTest
    @ValueSource(ints = {2, 3, 5, 12})
    void zetaAgrees(int k) {
        assertAgree(BallFunctions.zeta(k, BITS), ApfloatMath.zeta(new Apfloat(k, DIGITS)));
    }
}
