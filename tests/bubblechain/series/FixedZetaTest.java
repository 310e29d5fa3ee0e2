package bubblechain.series;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.Ball;
import bubblechain.exact.BallFunctions;
import bubblechain.exact.Bernoulli;
import bubblechain.exact.Rational;
import java.math.BigInteger;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Zeta values in fixed point against those of balls, which come from Bernoulli numbers and exact integers. */
class FixedZetaTest {
    @ParameterizedTest
    @CsvSource({"1, 5, 2", "1, 60, 1", "1, 600, 20", "1, 2600, 3", "1, 260, 62", "1, 9, 300", "1/2, 5, 2", "1/2, 270, 20", "1/3, 30, 3", "3/4, 30, 5"})
    void valuesAreWithinTheirBoundsAndTheBoundsSmall(String shift, int max, int limbs) {
        Rational s = Rational.parse(shift);
        FixedSeries series = FixedZeta.normalised(s, max, limbs);
        int bits = FixedSeries.bits(limbs) + 100;
        Ball[] zeta = s.equals(Rational.ONE)
                ? BallFunctions.zetaTable(max, bits)
                : BallFunctions.hurwitzZetaTable(Ball.of(s, bits + 8), max, bits);
        for (int k = 2; k <= max; k++) {
            Ball expected = zeta[k].multiply(s.power(k), bits);
            Rational error = series.coefficient(k).midpoint().subtract(expected.midpoint()).abs();
            Rational allowed = series.coefficient(k).radius().add(expected.radius()).toRational();
            assertThat(error).as("zeta(%d, %s)", k, s).isLessThanOrEqualTo(allowed);
            assertThat(series.error(k)).isLessThan(3);
        }
        assertThat(series.coefficient(0).containsZero() && series.coefficient(1).containsZero()).isTrue();
    }

    /** B_2k = (-1)^(k-1) 2k T_k/(4^k (4^k - 1)), Brent and Harvey, arXiv:1108.0286. */
    @Test
    void tangentNumbersBelongToTheBernoulliNumbers() {
        int count = 300;
        int limbs = 120;
        TangentNumbers tangents = TangentNumbers.upTo(count);
        for (int k = 1; k <= count; k++) {
            BigInteger four = BigInteger.ONE.shiftLeft(2 * k);
            Rational tangent = Bernoulli.number(2 * k)
                    .abs()
                    .multiply(Rational.of(four.multiply(four.subtract(BigInteger.ONE))))
                    .divide(2L * k);
            assertThat(tangents.bitLength(k)).isEqualTo(tangent.numerator().bitLength());
            BigInteger mantissa = tangent.numerator()
                    .shiftLeft(FixedSeries.bits(limbs))
                    .shiftRight(tangents.bitLength(k) - 1);
            assertThat(FixedDigits.toInteger(tangents.mantissa(k, limbs))).as("T_%d", k).isEqualTo(mantissa);
        }
    }

    /** w_k with t_i = n (n+i-1)! 4^i/((n-i)! (2i)!) from exact integers. */
    @ParameterizedTest
    @CsvSource({"2, 1", "7, 2", "60, 4", "400, 20", "6000, 2"})
    void weightsAreWithinTheirBound(int n, int limbs) {
        BigInteger[] sums = new BigInteger[n + 1];
        BigInteger term = BigInteger.ONE;
        for (int i = 0; i <= n; i++) {
            sums[i] = term;
            term = term.multiply(BigInteger.valueOf(4L * (n + i) * (n - i)))
                    .divide(BigInteger.valueOf((2L * i + 1) * (2L * i + 2)));
        }
        for (int i = n - 1; i >= 0; i--) {
            sums[i] = sums[i].add(sums[i + 1]);
        }
        BorweinWeights weights = BorweinWeights.of(n, limbs);
        for (int k = 0; k < n; k++) {
            BigInteger exact = sums[k + 1].shiftLeft(FixedSeries.bits(limbs)).divide(sums[0]);
            BigInteger error = FixedDigits.toInteger(weights.take(k)).subtract(exact).abs();
            assertThat(error.doubleValue()).as("w_%d", k).isLessThanOrEqualTo(weights.error() + 1);
        }
    }

    @Test
    void shiftedNumbersAreAddedWithinOneUnitWithSeed51() {
        RandomDigits random = new RandomDigits(51);
        for (int limbs : new int[] {1, 2, 5, 40}) {
            for (int shift = 1; shift < FixedSeries.bits(limbs) + 60; shift += 1 + random.random().nextInt(20)) {
                for (int sign : new int[] {1, -1}) {
                    long[] digits = random.any(limbs, 3);
                    BigInteger before = RandomDigits.value(digits);
                    DigitWords.addShifted(digits, shift, sign);
                    BigInteger twice = before.shiftLeft(shift).add(before.multiply(BigInteger.valueOf(sign)));
                    BigInteger error = RandomDigits.value(digits).shiftLeft(shift).subtract(twice).abs();
                    assertThat(error).isLessThan(BigInteger.ONE.shiftLeft(shift));
                }
            }
        }
    }

    @Test
    void wordsGoThereAndBackWithSeed52() {
        RandomDigits random = new RandomDigits(52);
        for (int limbs : new int[] {1, 2, 5, 40}) {
            for (int i = 0; i < 100; i++) {
                long[] digits = random.any(limbs, 3);
                if (RandomDigits.value(digits).signum() >= 0) {
                    long[] words = DigitWords.toWords(digits);
                    assertThat(java.util.Arrays.stream(words)).allMatch(word -> word >= 0 && word < 1L << 28);
                    assertThat(RandomDigits.value(DigitWords.ofWords(words))).isEqualTo(RandomDigits.value(digits));
                }
            }
        }
    }
}
