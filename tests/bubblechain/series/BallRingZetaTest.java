package bubblechain.series;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.Ball;
import bubblechain.exact.Rational;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The zeta values behind every product of gamma functions: right to a few units of their last place. */
class BallRingZetaTest {
    private static final int LARGEST_ORDER = 70;
    /** Bits that a ball may be wider than the working precision. */
    private static final int ALLOWANCE = 6;

    @ParameterizedTest
    @ValueSource(strings = {"1", "1/2", "1/4", "2/3", "1/1000003"})
    void everyHurwitzZetaIsWithinItsBallAtThreeTimesThePrecision(String shift) {
        Rational s = Rational.parse(shift);
        for (int bits : new int[] {64, 200, 500}) {
            BallRing low = BallRing.of(bits, LARGEST_ORDER);
            BallRing high = BallRing.of(3 * bits, LARGEST_ORDER);
            // beyond the largest order the values no longer come from a table
            for (int k = 2; k <= LARGEST_ORDER + 5; k++) {
                Ball ball = low.hurwitz(k, s);
                Ball finer = high.hurwitz(k, s);
                Rational difference = ball.midpoint().subtract(finer.midpoint()).abs();
                assertThat(difference)
                        .as("zeta(%d, %s), %d bits", k, s, bits)
                        .isLessThanOrEqualTo(ball.radius().add(finer.radius()).toRational());
                assertThat(ball.accuracyBits()).as("zeta(%d, %s), %d bits", k, s, bits).isGreaterThan(bits - ALLOWANCE);
            }
        }
    }
}
