package bubblechain.exact;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.math.BigInteger;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Every canonical rule: the closed form as printed. Numbers are compared in the formula package's reference test. */
class ExactFunctionsTest {
    private static Rational rational(String text) {
        return Rational.parse(text);
    }

    /** DLMF 25.6.1-3. */
    @ParameterizedTest
    @CsvSource({
        "2, pi^2/6", "4, pi^4/90", "6, pi^6/945", "3, zeta(3)", "17, zeta(17)", "0, -1/2", "-1, -1/12", "-2, 0",
        "-3, 1/120", "-18, 0", "-11, 691/32760"
    })
    void zetaIsARationalTimesAPowerOfPiAtEvenArguments(int k, String text) {
        assertThat(ExactFunctions.zeta(k)).hasToString(text);
    }

    @ParameterizedTest
    @CsvSource({
        "1, 0", "6, ln(2)+ln(3)", "8, 3*ln(2)", "1/12, -2*ln(2)-ln(3)", "97/3, -ln(3)+ln(97)",
        // 100003^2: its prime lies above the trial divisors, so the square stands for itself
        "10000600009, ln(10000600009)"
    })
    void logarithmsSplitIntoPrimes(String x, String text) {
        assertThat(ExactFunctions.ln(rational(x))).hasToString(text);
    }

    @ParameterizedTest
    @CsvSource({
        "8, 1/2, 2*sqrt(2)", "12, -1/2, sqrt(3)/6", "1/2, 1/3, 2^(2/3)/2", "72, 2/3, 12*3^(1/3)", "-2, 3, -8",
        "-2, -2, 1/4", "0, 0, 1", "0, 1/2, 0", "1, 22/7, 1"
    })
    void rootsSplitIntoPrimesWithExponentsBetweenZeroAndOne(String x, String q, String text) {

        assertThat(ExactFunctions.power(rational(x), rational(q))).hasToString(text);
    }

    @Test
    void fractionalPowersOfAPrimeCarryIntoTheRational() {
        ExactConstant a = ExactFunctions.power(Rational.TWO, rational("2/3"));
        assertThat(a.multiply(a)).isEqualTo(ExactFunctions.power(Rational.TWO, rational("1/3")).multiply(Rational.TWO));
        assertThat(a.power(3)).isEqualTo(ExactConstant.of(4));
        assertThat(a.inverse()).hasToString("2^(1/3)/2");
    }

    @Test
    void fractionalPowersNeedAPositiveBase() {
        assertThatThrownBy(() -> ExactFunctions.power(Rational.of(-8), rational("1/3")))
                .isInstanceOf(DomainException.class)
                .hasMessage("a fractional power needs a positive base, got -8");
        assertThatThrownBy(() -> ExactFunctions.power(Rational.ZERO, rational("-1/3")))
                .isInstanceOf(DomainException.class)
                .hasMessage("a fractional power needs a positive base, got 0");
    }

    @Test
    void anEnormousPowerIsRefused() {
        assertThatThrownBy(() -> ExactFunctions.power(Rational.of(3), Rational.of(BigInteger.TEN.pow(9))))
                .isInstanceOf(DomainException.class)
                .hasMessage("the power 1000000000 of a number of 2 bits is too large; the limit is 2000000 bits");
        assertThatThrownBy(() -> ExactFunctions.ln(Rational.of(3)).multiply(Rational.of(1L << 40)).exp())
                .isInstanceOf(DomainException.class);
    }

    /** DLMF 5.4.1, 5.4.6, 5.5.1; elsewhere the argument is brought to (0,1]. */
    @ParameterizedTest
    @CsvSource({
        "1, 1", "5, 24", "1/2, sqrt(pi)", "5/2, 3*sqrt(pi)/4", "-1/2, -2*sqrt(pi)", "-5/2, -8*sqrt(pi)/15",
        "9/4, 5*gamma(1/4)/16", "-2/3, -3*gamma(1/3)/2", "-3/4, -4*gamma(1/4)/3"
    })
    void gammaIsClosedAtIntegersAndHalfIntegers(String z, String text) {
        assertThat(ExactFunctions.gamma(rational(z))).hasToString(text);
    }

    /** DLMF 5.4.12-15. */
    @ParameterizedTest
    @CsvSource({
        "1, -euler_gamma", "4, -euler_gamma+11/6", "1/2, -2*ln(2)-euler_gamma",
        "-3/2, -2*ln(2)-euler_gamma+8/3", "1/3, digamma(1/3)", "4/3, digamma(1/3)+3"
    })
    void digammaIsClosedAtIntegersAndHalfIntegers(String z, String text) {
        assertThat(ExactFunctions.digamma(rational(z))).hasToString(text);
    }

    /** DLMF 5.15.2-5. */
    @ParameterizedTest
    @CsvSource({
        "1, 1, pi^2/6", "2, 1, -2*zeta(3)", "3, 1, pi^4/15", "1, 1/2, pi^2/2", "2, 1/2, -14*zeta(3)",
        "1, -1/2, pi^2/2+4", "2, -1/2, -14*zeta(3)+16", "1, 3, pi^2/6-5/4", "2, 1/4, 'polygamma(2,1/4)'",
        "1, -3/4, 'polygamma(1,1/4)+16/9'"
    })
    void polygammaIsClosedAtIntegersAndHalfIntegers(int n, String z, String text) {
        assertThat(ExactFunctions.polygamma(n, rational(z))).hasToString(text);
    }

    @ParameterizedTest
    @CsvSource({"2, 1/2, pi^2/2", "3, 1/2, 7*zeta(3)", "4, 1, pi^4/90", "3, 1, zeta(3)", "3, 1/3, '-polygamma(2,1/3)/2'"})
    void hurwitzZetaIsClosedAtOneAndOneHalf(int k, String s, String text) {
        assertThat(ExactFunctions.hurwitz(k, rational(s))).hasToString(text);
    }

    @Test
    void hurwitzZetaNeedsAConvergentSeries() {
        assertThatThrownBy(() -> ExactFunctions.hurwitz(1, Rational.HALF))
                .isInstanceOf(DomainException.class)
                .hasMessage("the Hurwitz zeta function needs an integer k of at least 2, got 1");
    }

    /** DLMF Table 4.17.1. */
    @ParameterizedTest
    @CsvSource({
        "0, 0, 1", "1/6, 1/2, sqrt(3)/2", "1/4, sqrt(2)/2, sqrt(2)/2", "1/3, sqrt(3)/2, 1/2", "1/2, 1, 0",
        "2/3, sqrt(3)/2, -1/2", "3/4, sqrt(2)/2, -sqrt(2)/2", "5/6, 1/2, -sqrt(3)/2", "1, 0, -1", "7/6, -1/2, -sqrt(3)/2",
        "-1/4, -sqrt(2)/2, sqrt(2)/2", "3/2, -1, 0", "-17/3, sqrt(3)/2, 1/2", "1000001/2, 1, 0"
    })
    void sineAndCosineAreClosedAtMultiplesOfPiOverFourAndSix(String turns, String sine, String cosine) {
        assertThat(ExactFunctions.sinPi(rational(turns))).hasToString(sine);
        assertThat(ExactFunctions.cosPi(rational(turns))).hasToString(cosine);
    }

    @Test
    void otherSinesAreBroughtToTheFirstQuadrant() {
        assertThat(ExactFunctions.sinPi(rational("6/5"))).isEqualTo(ExactFunctions.sinPi(rational("1/5")).negate());
        assertThat(ExactFunctions.cosPi(rational("3/10"))).isEqualTo(ExactFunctions.sinPi(rational("1/5")));
        assertThat(ExactFunctions.sinPi(rational("-4/5"))).hasToString("-sin(1/5*pi)");
    }

    @Test
    void polylogarithmsOfOrderOneAndAtZeroAreClosed() {
        assertThat(ConstantFunctions.polylog(1, ExactConstant.of(rational("1/3")))).hasToString("-ln(2)+ln(3)");
        assertThat(ConstantFunctions.polylog(3, ExactConstant.ZERO).isZero()).isTrue();
        assertThat(ConstantFunctions.polylog(2, ExactConstant.of(rational("-1/3")))).hasToString("polylog(2,-1/3)");
    }

    @ParameterizedTest
    @CsvSource({"0, 1/3", "2, 2/3", "2, -1", "2000, 1/3"})
    void polylogarithmsOutsideTheirRangeAreRefused(int s, String x) {
        assertThatThrownBy(() -> ConstantFunctions.polylog(s, ExactConstant.of(rational(x))))
                .isInstanceOf(DomainException.class)
                .hasMessage("polylog(s, x) needs an integer s >= 1 and a rational x with |x| <= 1/2");
    }

    @Test
    void polesAreRefusedByName() {
        assertThatThrownBy(() -> ExactFunctions.gamma(Rational.of(-3)))
                .isInstanceOf(DomainException.class)
                .hasMessage("gamma(-3) is infinite");
        assertThatThrownBy(() -> ExactFunctions.polygamma(2, Rational.ZERO))
                .isInstanceOf(DomainException.class)
                .hasMessage("polygamma(0) is infinite");
        assertThatThrownBy(() -> ExactFunctions.zeta(1))
                .isInstanceOf(DomainException.class)
                .hasMessage("zeta(1) is infinite");
    }

    @Test
    void theRecurrencesHoldFarFromTheUnitInterval() {
        for (String text : new String[] {"7/2", "-9/2", "1/3", "-25/7", "40", "2001/2"}) {
            Rational z = rational(text);
            // DLMF 5.5.1 and 5.15.5
            assertThat(ExactFunctions.gamma(z.add(1))).isEqualTo(ExactFunctions.gamma(z).multiply(z));
            for (int n = 0; n < 4; n++) {
                Rational step = Rational.of(ExactFunctions.factorial(n)).multiply(n % 2 == 0 ? 1 : -1).multiply(z.power(-n - 1));
                assertThat(ExactFunctions.polygamma(n, z.add(1)))
                        .isEqualTo(ExactFunctions.polygamma(n, z).add(ExactConstant.of(step)));
            }
        }
    }
}
