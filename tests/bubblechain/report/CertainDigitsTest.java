package bubblechain.report;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.Ball;
import bubblechain.exact.Rational;
import java.math.BigDecimal;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Decimals of reports read again against the balls they were printed from. */
class CertainDigitsTest {
    private static Ball random(Random random) {
        Rational middle = Rational.of(random.nextInt(2_000_001) - 1_000_000, 1 + random.nextInt(1_000))
                .multiply(Rational.of(10).power(random.nextInt(30) - 15));
        Rational radius = middle.abs().multiply(Rational.of(1 + random.nextInt(9), 10)).multiply(
                Rational.of(10).power(-random.nextInt(25)));
        return Ball.of(middle, radius, 200);
    }

    private static String decimal(Value value) {
        assertThat(value).isInstanceOf(Value.Numeral.class);
        return ((Value.Numeral) value).decimal();
    }

    @Test
    void everyPointOfABallRoundsToItsDigitsSeed71() {
        Random random = new Random(71);
        int printed = 0;
        for (int i = 0; i < 500; i++) {
            Ball ball = random(random);
            int digits = 1 + random.nextInt(20);
            if (ball.certainDigits(digits) == 0) {
                continue;
            }
            String text = decimal(CertainDigits.of(ball, digits));
            BigDecimal decimal = new BigDecimal(text);
            Rational half = Rational.parse("5e" + (-decimal.scale() - 1));
            Rational value = Rational.parse(text);
            assertThat(ball.upper().subtract(value)).as("%s from %s", text, ball).isLessThanOrEqualTo(half);
            assertThat(value.subtract(ball.lower())).as("%s from %s", text, ball).isLessThanOrEqualTo(half);
            assertThat(decimal.precision()).isLessThanOrEqualTo(digits);
            printed++;
        }
        assertThat(printed).isGreaterThan(300);
    }

    @Test
    void aValueWithAnErrorIsPrintedToThePlaceOfTheErrorSeed72() {
        Random random = new Random(72);
        for (int i = 0; i < 500; i++) {
            Ball ball = Ball.of(random(random).midpoint(), 200);
            double error = Math.abs(ball.toDouble()) * Math.pow(10, -6 * random.nextDouble());
            if (error == 0) {
                continue;
            }
            BigDecimal value = new BigDecimal(decimal(CertainDigits.withError(ball, error)));
            BigDecimal printed = new BigDecimal(decimal(CertainDigits.error(error)));
            assertThat(value.scale()).as("%s +- %s", value, printed).isLessThanOrEqualTo(printed.scale());
            Rational distance = Rational.parse(value.toString()).subtract(ball.midpoint()).abs();
            assertThat(distance).isLessThanOrEqualTo(Rational.parse("5e" + (-value.scale() - 1)));
            assertThat(printed.precision()).isEqualTo(2);
        }
    }
}
