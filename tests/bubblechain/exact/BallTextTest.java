package bubblechain.exact;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.math.BigDecimal;
import java.math.BigInteger;
import java.math.MathContext;
import java.math.RoundingMode;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class BallTextTest {
    @ParameterizedTest
    @CsvSource({
        "1.23+-0.05, 118/100, 128/100",
        "1.23 +/- 0.05, 118/100, 128/100",
        "1.23±0.05, 118/100, 128/100",
        "3567.60(164), 356596/100, 356924/100",
        "1.23(5)e-4, 118/1000000, 128/1000000",
        "-12(3), -15, -9",
        "-3/4, -3/4, -3/4",
        "2.5e3, 2500, 2500"
    })
    void uncertaintiesAreRead(String text, String lower, String upper) {
        Ball ball = Ball.parse(text, 100);
        Rational slack = Rational.TWO.power(-24); // the midpoint keeps 30 bits below the radius
        assertThat(ball.lower()).isBetween(Rational.parse(lower).subtract(slack), Rational.parse(lower));
        assertThat(ball.upper()).isBetween(Rational.parse(upper), Rational.parse(upper).add(slack));
    }

    @ParameterizedTest
    @CsvSource({"1.2.3", "+-1", "1+-2+-3", "1.5(0.2)", "abc", "1+--2"})
    void otherTextIsRefused(String text) {
        assertThatThrownBy(() -> Ball.parse(text, 100)).isInstanceOf(DomainException.class).hasMessageContaining("'");
    }

    @ParameterizedTest
    @CsvSource({
        "1/8, 2, 0.12", // ties to even
        "3/8, 2, 0.38",
        "5/2, 1, 2",
        "-7/2, 1, -4",
        "247/2, 7, 123.5000",
        "3/25000, 2, 0.00012",
        "1/1000000, 3, 0.00000100",
        "1/10000000, 3, 1.00e-7",
        "123456, 6, 123456",
        "123456, 5, 1.2346e+5",
        "999999, 3, 1.00e+6",
        "-12345678901234567890123456789, 5, -1.2346e+28",
        "0, 7, 0"
    })
    void decimalsHaveTheAnnouncedForm(String value, int digits, String expected) {
        assertThat(Ball.of(Rational.parse(value), 200).toDecimal(digits)).contains(expected);
    }

    @Test
    void printedDigitsAreThoseOfTheNumberSeed31() {
        RandomBalls source = new RandomBalls(31);
        int printed = 0;
        for (int i = 0; i < 3000; i++) {
            Rational q = source.rational(1_000_000).multiply(Rational.of(10).power(source.random().nextInt(40) - 20));
            int digits = 1 + source.random().nextInt(30);
            Ball ball = Ball.of(q, source.bits());
            MathContext context = new MathContext(digits, RoundingMode.HALF_EVEN);
            BigDecimal expected = new BigDecimal(q.numerator()).divide(new BigDecimal(q.denominator()), context);
            ball.toDecimal(digits).ifPresent(text -> assertThat(new BigDecimal(text)).isEqualByComparingTo(expected));
            printed += ball.toDecimal(digits).isPresent() ? 1 : 0;
            int certain = ball.certainDigits(40);
            assertThat(certain == 0 || ball.toDecimal(certain).isPresent()).isTrue();
        }
        assertThat(printed).isGreaterThan(1000);
    }

    @Test
    void everyPointOfABallRoundsToThePrintedDecimalSeed32() {
        RandomBalls source = new RandomBalls(32);
        for (int i = 0; i < 2000; i++) {
            Ball ball = source.any();
            int digits = 1 + source.random().nextInt(15);
            Rational x = source.pointOf(ball);
            ball.toDecimal(digits).ifPresent(text -> {
                BigDecimal direct = new BigDecimal(x.numerator())
                        .divide(new BigDecimal(x.denominator()), new MathContext(digits, RoundingMode.HALF_EVEN));
                assertThat(new BigDecimal(text)).isEqualByComparingTo(direct);
            });
        }
    }

    @Test
    void noDigitsWhereTheEndsDisagree() {
        assertThat(Ball.parse("1.23+-0.05", 60).toDecimal(3)).isEmpty();
        assertThat(Ball.parse("1.23+-0.05", 60).toDecimal(1)).contains("1");
        assertThat(Ball.parse("1.5+-1e-30", 200).toDecimal(1)).isEmpty();
        assertThat(Ball.parse("1.5+-1e-30", 200).toDecimal(2)).contains("1.5");
        assertThat(Ball.parse("0+-1e-30", 200).toDecimal(1)).isEmpty();
        assertThat(Ball.parse("0+-1e-30", 200).certainDigits(10)).isZero();
        assertThatThrownBy(() -> Ball.ONE.toDecimal(0)).isInstanceOf(DomainException.class);
    }

    @Test
    void textOfABallNeverClaimsMoreThanItHoldsSeed33() {
        RandomBalls source = new RandomBalls(33);
        for (int i = 0; i < 2000; i++) {
            Ball ball = source.any();
            String text = ball.toString();
            if (text.contains("+-")) {
                assertThat(Ball.parse(text, 300).contains(ball)).as("%s encloses its ball", text).isTrue();
                assertThat(ball.certainDigits(20)).isLessThan(4);
            } else if (!ball.isExact()) {
                BigDecimal printed = new BigDecimal(text);
                Rational half = Rational.of(10).power(-printed.scale()).multiply(Rational.HALF);
                Rational distance = source.pointOf(ball).subtract(Rational.parse(text)).abs();
                assertThat(distance).as(text).isLessThanOrEqualTo(half);
            }
        }
    }

    @ParameterizedTest
    @CsvSource({"3, 3", "-3/4, -0.75", "1/1024, 0.0009765625", "1e15, 1000000000000000", "0, 0"})
    void exactNumbersAreShownInFull(String value, String text) {
        assertThat(Ball.of(Rational.parse(value), 100)).hasToString(text);
    }

    @Test
    void doublesAreNearTheMidpoint() {
        assertThat(Ball.of(Rational.of(-1, 3), 300).toDouble()).isEqualTo(-1 / 3.0);
        assertThat(Ball.ofDyadic(BigInteger.ONE, -5000).toDouble()).isZero();
        assertThat(Ball.parse("2.0(1)", 100).radiusAsDouble()).isBetween(0.1, 0.1000001);
    }
}
