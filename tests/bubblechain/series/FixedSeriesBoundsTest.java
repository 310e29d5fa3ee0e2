package bubblechain.series;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import org.junit.jupiter.api.Test;

/**
 * Every operation on sampled numbers, taken at three times the precision, stays within the bounds it gives; the bounds
 * are not wasteful either: half of them exceed the error met by less than 2^20.
 */
class FixedSeriesBoundsTest {
    private static final double LARGEST_MEDIAN = 20;
    /** Lengths and limbs: products between carries, columns of more than 64 and 128 terms. */
    private static final int[][] SHAPES = {{1, 1}, {2, 1}, {12, 1}, {30, 3}, {170, 2}, {44, 63}, {42, 66}, {41, 131}};

    private static void assertNotWasteful(List<Double> slack) {
        assertThat(slack).hasSizeGreaterThan(50);
        Collections.sort(slack);
        assertThat(slack.get(slack.size() / 2)).isLessThan(LARGEST_MEDIAN);
    }

    @Test
    void productsStayWithinTheirBoundsWithSeed21() {
        RandomDigits random = new RandomDigits(21);
        List<Double> slack = new ArrayList<>();
        for (int[] shape : SHAPES) {
            for (int errorBits : new int[] {0, 8, 30}) {
                SampledSeries a = SampledSeries.random(random, shape[0], shape[1], 5, errorBits);
                SampledSeries b = SampledSeries.random(random, shape[0], shape[1], 5, errorBits);
                SampledSeries.assertWithin(a.series().multiply(b.series()), a.times(b), a.scale(), slack);
            }
        }
        assertNotWasteful(slack);
    }

    /** Slopes of an exponential that stays of order one: k L_k of order 2^-k, later ones short. */
    private static SampledSeries slopes(RandomDigits random, int length, int limbs, int errorBits) {
        long[][] digits = new long[length][];
        double[] errors = new double[length];
        for (int k = 0; k < length; k++) {
            digits[k] = random.any(limbs, 0);
            int zeros = Math.min(limbs, k * limbs / Math.max(40, length));
            System.arraycopy(new long[zeros + 1], 0, digits[k], 0, zeros);
            errors[k] = random.random().nextInt(4) == 0 ? 0 : 1 + random.random().nextInt(1 << errorBits);
        }
        return SampledSeries.of(FixedSeries.of(digits, errors, limbs), random.random());
    }

    @Test
    void exponentialsStayWithinTheirBoundsWithSeed22() {
        RandomDigits random = new RandomDigits(22);
        List<Double> slack = new ArrayList<>();
        for (int[] shape : SHAPES) {
            for (int errorBits : new int[] {0, 8, 30}) {
                SampledSeries slopes = slopes(random, shape[0], shape[1], errorBits);
                List<BigInteger> points = slopes.exponential();
                FixedSeries whole = slopes.series().expOfIntegral();
                SampledSeries.assertWithin(whole, points, slopes.scale(), slack);
                // in two stages, the second with fewer limbs
                int first = (shape[0] + 1) / 2;
                int fewer = Math.max(1, shape[1] / 2);
                FixedSeries known = slopes.series().first(first).expOfIntegral();
                FixedSeries both = slopes.series()
                        .truncated(shape[0], fewer)
                        .expOfIntegral(known.truncated(first, fewer));
                SampledSeries.assertWithin(both, points, slopes.scale(), slack);
            }
        }
        assertNotWasteful(slack);
    }

    /** Long enough for products and blocks of the exponential to go through a transform. */
    @Test
    void productsAndExponentialsByTransformStayWithinTheirBoundsWithSeed29() {
        RandomDigits random = new RandomDigits(29);
        int length = 270;
        int limbs = 42;
        List<Double> slack = new ArrayList<>();
        SampledSeries slopes = slopes(random, length, limbs, 0);
        SampledSeries.assertWithin(
                slopes.series().expOfIntegral(), slopes.exponential(), slopes.scale(), slack);
        SampledSeries a = SampledSeries.random(random, length, limbs, 1, 0);
        SampledSeries.assertWithin(a.series().multiply(slopes.series()), a.times(slopes), a.scale(), slack);
        assertNotWasteful(slack);
    }

    @Test
    void sumsDifferencesAndShortenedSeriesStayWithinTheirBoundsWithSeed23() {
        RandomDigits random = new RandomDigits(23);
        List<Double> slack = new ArrayList<>();
        for (int[] shape : SHAPES) {
            for (int errorBits : new int[] {0, 8, 30}) {
                SampledSeries a = SampledSeries.random(random, shape[0], shape[1], 1_000, errorBits);
                SampledSeries b = SampledSeries.random(random, shape[0], shape[1], 1_000, errorBits);
                List<BigInteger> sum = new ArrayList<>();
                List<BigInteger> difference = new ArrayList<>();
                for (int k = 0; k < shape[0]; k++) {
                    sum.add(a.point(k).add(b.point(k)));
                    difference.add(a.point(k).subtract(b.point(k)));
                }
                SampledSeries.assertWithin(a.series().add(b.series()), sum, a.scale(), slack);
                SampledSeries.assertWithin(a.series().subtract(b.series()), difference, a.scale(), slack);
                for (int fewer = 0; fewer <= shape[1]; fewer += 1 + shape[1] / 5) {
                    FixedSeries shorter = a.series().truncated(shape[0], fewer);
                    SampledSeries.assertWithin(shorter, a.points(), a.scale(), slack);
                }
            }
        }
        assertNotWasteful(slack);
    }

    /**
     * Polynomials of both kinds, small integers and large ones; quotients with roots of size above 1/2 stay bounded.
     */
    private static List<Rational> polynomial(RandomDigits random, boolean small) {
        int degree = random.random().nextInt(5);
        List<Rational> coefficients = new ArrayList<>();
        long divisor = small ? 1 + random.random().nextInt(1 << 20) : 1 + (random.random().nextLong() >>> 20);
        for (int i = 0; i <= degree; i++) {
            long numerator = (long) ((2 * random.random().nextDouble() - 1) * divisor / Math.pow(2, i));
            coefficients.add(Rational.of(i == 0 ? divisor : numerator, divisor));
        }
        if (!small) {
            coefficients.replaceAll(c -> c.multiply(Rational.of(divisor + 1, 3 + (divisor >> 2))));
        }
        return coefficients;
    }

    @Test
    void productsWithPolynomialsStayWithinTheirBoundsWithSeed24() {
        RandomDigits random = new RandomDigits(24);
        List<Double> slack = new ArrayList<>();
        for (int[] shape : SHAPES) {
            for (int i = 0; i < 6; i++) {
                SampledSeries a = SampledSeries.random(random, shape[0], shape[1], 5, 10 * (i % 3));
                List<Rational> p = polynomial(random, i % 2 == 0);
                SampledSeries.assertWithin(a.series().times(p), a.times(p), a.scale(), slack);
            }
        }
        assertNotWasteful(slack);
    }

    @Test
    void quotientsByPolynomialsStayWithinTheirBoundsWithSeed25() {
        RandomDigits random = new RandomDigits(25);
        List<Double> slack = new ArrayList<>();
        for (int[] shape : new int[][] {{1, 1}, {2, 1}, {12, 1}, {20, 3}, {24, 63}, {24, 66}, {24, 131}}) {
            for (int i = 0; i < 6; i++) {
                SampledSeries a = SampledSeries.random(random, shape[0], shape[1], 5, 10 * (i % 3));
                List<Rational> p = polynomial(random, i % 2 == 0);
                SampledSeries.assertWithin(a.series().over(p), a.over(p), a.scale(), slack);
            }
        }
        assertNotWasteful(slack);
    }

    /** Slopes up to one in size: the errors do not grow with the multiplied-out polynomial. */
    @Test
    void productsAndQuotientsByLinearFactorsStayWithinTheirBoundsWithSeed30() {
        RandomDigits random = new RandomDigits(30);
        List<Double> slack = new ArrayList<>();
        for (int i = 0; i < 40; i++) {
            int limbs = 1 + i % 3;
            SampledSeries a = SampledSeries.random(random, 60, limbs, 5, 8 * (i % 3));
            int largest = i % 4 == 0 ? 1 << 30 : 1 + random.random().nextInt(40);
            List<Rational> slopes = new ArrayList<>();
            List<BigInteger> product = a.points();
            List<BigInteger> quotient = a.points();
            for (int factors = 1 + random.random().nextInt(4); factors > 0; factors--) {
                int q = 1 + random.random().nextInt(largest);
                Rational slope = Rational.of(random.random().nextInt(3) == 0 ? q : random.random().nextInt(q), q);
                slopes.add(random.random().nextInt(4) == 0 ? slope.negate() : slope);
                List<Rational> linear = List.of(Rational.ONE, slopes.get(slopes.size() - 1));
                product = new SampledSeries(a.series(), product, a.scale()).times(linear);
                quotient = new SampledSeries(a.series(), quotient, a.scale()).over(linear);
            }
            FixedSeries above = a.series().throughLinear(List.of(new LinearGroup(slopes, false)));
            SampledSeries.assertWithin(above, product, a.scale(), slack);
            FixedSeries below = a.series().throughLinear(List.of(new LinearGroup(slopes, true)));
            SampledSeries.assertWithin(below, quotient, a.scale(), slack);
        }
        assertNotWasteful(slack);
    }

    @Test
    void smallAndLargeIntegersGiveOverlappingResultsWithSeed26() {
        RandomDigits random = new RandomDigits(26);
        for (int i = 0; i < 30; i++) {
            SampledSeries a = SampledSeries.random(random, 20, 2, 5, 4);
            // the same polynomial through a constant that only the route of large integers takes
            Rational large = Rational.of((1L << 40) + 15, 1L << 40);
            List<Rational> p = polynomial(random, true);
            List<Rational> q = p.stream().map(c -> c.multiply(large)).toList();
            FixedSeries product = a.series().times(p).times(List.of(large));
            FixedSeries quotient = a.series().over(q).times(List.of(large));
            for (int k = 0; k < 20; k++) {
                assertThat(product.coefficient(k).overlaps(a.series().times(q).coefficient(k))).isTrue();
                assertThat(quotient.coefficient(k).overlaps(a.series().over(p).coefficient(k))).isTrue();
            }
        }
    }

    /** Sums of columns that are -1 leave the largest possible digits behind before each carry. */
    @Test
    void longSeriesOfExtremeDigitsAreCarriedInTime() {
        for (int limbs : new int[] {1, 3, 63, 66, 127}) {
            // short enough at 66 limbs not to go through a transform
            int length = limbs > 66 ? 70 : limbs > 3 ? 44 : 150;
            long[][] ones = new long[length][limbs + 1];
            long[][] minus = new long[length][limbs + 1];
            for (int k = 0; k < length; k++) {
                ones[k][0] = 1;
                if (limbs > 64) {
                    // columns are summed 64 terms at a time: let every part of them be -1
                    ones[k][64] = 1;
                }
                Arrays.fill(minus[k], -1);
            }
            SampledSeries a = SampledSeries.of(FixedSeries.of(ones, new double[length], limbs), new java.util.Random(0));
            SampledSeries b = SampledSeries.of(FixedSeries.of(minus, new double[length], limbs), new java.util.Random(0));
            SampledSeries.assertWithin(a.series().multiply(b.series()), a.times(b), a.scale(), new ArrayList<>());
            SampledSeries.assertWithin(b.series().multiply(a.series()), b.times(a), a.scale(), new ArrayList<>());
            SampledSeries.assertWithin(a.series().expOfIntegral(), a.exponential(), a.scale(), new ArrayList<>());
        }
    }

    @Test
    void numbersThatLeaveTheRangeAreRefused() {
        List<BigInteger> large = Collections.nCopies(4, BigInteger.ONE.shiftLeft(56 + 50));
        FixedSeries series = FixedSeries.of(large, new double[4], 1);
        assertThatThrownBy(() -> series.multiply(series)).isInstanceOf(ArithmeticException.class);
        assertThatThrownBy(series::expOfIntegral).isInstanceOf(ArithmeticException.class);
        List<Rational> hundred = List.of(Rational.of(100));
        List<Rational> sixty = List.of(Rational.of(60));
        FixedSeries larger = series.times(sixty);
        assertThatThrownBy(() -> larger.times(sixty)).isInstanceOf(ArithmeticException.class);
        assertThatThrownBy(() -> larger.times(hundred)).isInstanceOf(ArithmeticException.class);
        assertThatThrownBy(() -> larger.add(larger)).isInstanceOf(ArithmeticException.class);
        // 1/(1-8v): the coefficients grow until they are refused
        FixedSeries long100 = FixedSeries.one(100, 1);
        assertThatThrownBy(() -> long100.over(List.of(Rational.ONE, Rational.of(-8)))).isInstanceOf(ArithmeticException.class);
        assertThatThrownBy(() -> long100.over(List.of(Rational.ONE, Rational.of(-800)))).isInstanceOf(ArithmeticException.class);
        assertThatThrownBy(() -> series.shifted(-1)).isInstanceOf(IllegalArgumentException.class);
    }

    @Test
    void powersOfTheVariableMoveNumbersAndBoundsWithSeed27() {
        RandomDigits random = new RandomDigits(27);
        SampledSeries a = SampledSeries.random(random, 9, 2, 5, 4);
        FixedSeries moved = a.series().shifted(3);
        for (int k = 0; k < 9; k++) {
            assertThat(moved.integer(k)).isEqualTo(k < 3 ? BigInteger.ZERO : a.series().integer(k - 3));
            assertThat(moved.error(k)).isEqualTo(k < 3 ? 0 : a.series().error(k - 3));
        }
        assertThat(a.series().first(4).length()).isEqualTo(4);
    }

    @Test
    void sumsOfPowersStayWithinTheirBoundsWithSeed28() {
        RandomDigits random = new RandomDigits(28);
        List<Double> slack = new ArrayList<>();
        for (int limbs : new int[] {1, 2, 20, 70}) {
            int length = 80;
            int scale = 3 * FixedSeries.bits(limbs) + 200;
            PowerSums powers = PowerSums.of(length, limbs);
            List<BigInteger> points = new ArrayList<>(Collections.nCopies(length, BigInteger.ZERO));
            for (int i = 0; i < 60; i++) {
                int q = 1 + random.random().nextInt(i % 3 == 0 ? 4 : (1 << 25) - 1);
                Rational ratio = Rational.of(random.random().nextInt(2 * q + 1) - q, q);
                int weight = i == 40 ? 5_000 : random.random().nextInt(59) - 29;
                int largest = random.random().nextInt(length);
                assertThat(PowerSums.fits(ratio)).isTrue();
                powers.add(ratio, weight, largest);
                BigInteger power = BigInteger.valueOf(weight).shiftLeft(scale);
                for (int k = 1; k <= largest; k++) {
                    power = power.multiply(ratio.numerator()).divide(ratio.denominator());
                    points.set(k, points.get(k).add(power));
                }
            }
            SampledSeries.assertWithin(powers.series(), points, scale, slack);
        }
        assertNotWasteful(slack);
        assertThat(PowerSums.fits(Rational.of(3, 2))).isFalse();
        assertThat(PowerSums.fits(Rational.of(1, 1L << 25))).isFalse();
        assertThat(PowerSums.fits(Rational.of(-1, 1))).isTrue();
    }
}
