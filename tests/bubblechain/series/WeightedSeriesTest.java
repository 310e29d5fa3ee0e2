package bubblechain.series;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.Ball;
import bubblechain.exact.Rational;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Decimals straight from fixed point against those of the same numbers as balls. */
class WeightedSeriesTest {
    /** Numbers of all sizes with small and large errors. */
    private static FixedSeries random(RandomDigits random, int length, int limbs) {
        long[][] digits = new long[length][];
        double[] errors = new double[length];
        for (int k = 0; k < length; k++) {
            digits[k] = random.any(limbs, random.random().nextBoolean() ? 5 : 1L << 40);
            int zeros = random.random().nextInt(4) == 0 ? random.random().nextInt(limbs + 1) : 0;
            System.arraycopy(new long[zeros], 0, digits[k], 0, zeros);
            errors[k] = Math.scalb(random.random().nextDouble(), random.random().nextInt(50 * limbs));
        }
        return FixedSeries.of(digits, errors, limbs);
    }

    @ParameterizedTest
    @CsvSource({"1/2, true", "1, true", "5/2, false", "1/1000, false", "3/7, true", "400, true", "1/20000, true", "3000000001/7, true"})
    void certainDigitsAreThoseOfTheBallsWithSeed53(String radius, boolean factorials) {
        RandomDigits random = new RandomDigits(53);
        int decided = 0;
        int undecided = 0;
        for (int limbs : new int[] {1, 2, 4, 12}) {
            FixedSeries series = random(random, 300, limbs);
            WeightedSeries weighted = new WeightedSeries(series, Rational.parse(radius), factorials);
            List<Ball> balls = weighted.balls(FixedSeries.bits(limbs) + 200);
            for (int digits : new int[] {1, 2, 5, 16, 17, 33, 150}) {
                List<Optional<String>> decimals = weighted.decimals(digits, FixedSeries.bits(limbs) + 200);
                for (int n = 0; n < balls.size(); n++) {
                    Optional<String> expected = balls.get(n).toDecimal(digits);
                    if (decimals.get(n).isPresent()) {
                        decided++;
                        // the weight has errors of its own, so that the ball may be a little narrower, never another number
                        assertThat(expected).as("c_%d to %d digits", n, digits).isEqualTo(decimals.get(n));
                    } else if (expected.isPresent()) {
                        undecided++;
                    }
                }
            }
        }
        assertThat(decided).isGreaterThan(500);
        assertThat(undecided).isLessThan(decided / 10);
    }

    @Test
    void roundingUpCarriesThroughNines() {
        // 10 - 2^-56, 1 - 2^-56, 0.0625 and 9.5: the last two are ties at one digit
        long[][] digits = {{10, -1, 0, 0}, {1, -1, 0, 0}, {0, 1L << 52, 0, 0}, {9, 1L << 55, 0, 0}};
        FixedSeries series = FixedSeries.of(digits, new double[4], 3);
        WeightedSeries weighted = new WeightedSeries(series, Rational.ONE, false);
        assertThat(weighted.decimals(3, 200).get(0)).contains("10.0");
        assertThat(weighted.decimals(1, 200).get(0)).contains("1e+1");
        assertThat(weighted.decimals(16, 200).get(1)).contains("1.000000000000000");
        assertThat(weighted.decimals(17, 200).get(1)).contains("0.99999999999999999");
        assertThat(weighted.decimals(2, 200).get(2)).isEmpty();
        assertThat(weighted.decimals(2, 200).get(3)).contains("9.5");
        assertThat(weighted.decimals(1, 200).get(3)).isEmpty();
    }

    @Test
    void nothingIsDecidedAboutANumberThatMayBeZero() {
        long[][] digits = {{0, 0, 0}, {0, 0, 0}, {0, 0, 5}, {0, 0, -5}};
        FixedSeries series = FixedSeries.of(digits, new double[] {0, 1, 6, 6}, 2);
        List<Optional<String>> decimals = new ArrayList<>(new WeightedSeries(series, Rational.ONE, true).decimals(1, 100));
        assertThat(decimals.get(0)).contains("0");
        assertThat(decimals.subList(1, 4)).allMatch(Optional::isEmpty);
    }
}
