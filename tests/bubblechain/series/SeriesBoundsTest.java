package bubblechain.series;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.BoundSamples;
import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Bounds that hold for an operation as a whole where those of its steps would be far larger: long quotients, linear
 * factors above and below that nearly cancel, exponentials of large slopes.
 */
class SeriesBoundsTest {
    private static final double UNIT_BITS = 20;

    private static void assertNotWasteful(List<Double> slack) {
        assertThat(slack).hasSizeGreaterThan(100);
        Collections.sort(slack);
        assertThat(slack.get(slack.size() / 2)).isLessThan(BoundSamples.LARGEST_MEDIAN);
    }

    /** 1 - 2 s v + r^2 v^2 with a pair of roots at a distance 1/r from the origin. */
    private static List<Rational> pair(RandomDigits random) {
        Rational r = Rational.of(900 + random.random().nextInt(100), 1_000);
        Rational s = r.multiply(Rational.of(random.random().nextInt(1_990) - 995, 1_000));
        return List.of(Rational.ONE, s.multiply(-2), r.multiply(r));
    }

    private static List<Rational> product(List<Rational> left, List<Rational> right) {
        List<Rational> product = new ArrayList<>(Collections.nCopies(left.size() + right.size() - 1, Rational.ZERO));
        for (int i = 0; i < left.size(); i++) {
            for (int k = 0; k < right.size(); k++) {
                product.set(i + k, product.get(i + k).add(left.get(i).multiply(right.get(k))));
            }
        }
        return product;
    }

    @Test
    void longQuotientsByComplexPairsKeepTheirBitsWithSeed34() {
        RandomDigits random = new RandomDigits(34);
        List<Double> slack = new ArrayList<>();
        for (int i = 0; i < 12; i++) {
            SampledSeries a = SampledSeries.random(random, 240, 1 + i % 3, 2, 4);
            List<Rational> p = i % 2 == 0 ? pair(random) : product(pair(random), pair(random));
            FixedSeries quotient = a.series().over(p);
            SampledSeries.assertWithin(quotient, a.over(p), a.scale(), slack);
            // interval arithmetic along the recurrence would lose more than a hundred bits
            assertThat(Math.log(quotient.error(239)) / Math.log(2)).as("bits lost by 1/%s", p).isLessThan(UNIT_BITS);
        }
        assertNotWasteful(slack);
    }

    @Test
    void sizesOfQuotientsAreBoundedFromAboveAndCloselyWithSeed37() {
        RandomDigits random = new RandomDigits(37);
        for (int i = 0; i < 20; i++) {
            List<Rational> p = product(pair(random), List.of(Rational.of(3), Rational.of(random.random().nextInt(7) - 3)));
            double[] sizes = RationalSteps.quotientSizes(p, 60);
            List<Rational> exact = new ArrayList<>();
            for (int n = 0; n < 60; n++) {
                Rational sum = n == 0 ? p.get(0) : Rational.ZERO;
                for (int k = 1; k < p.size() && k <= n; k++) {
                    sum = sum.subtract(p.get(k).multiply(exact.get(n - k)));
                }
                exact.add(sum.divide(p.get(0)));
                double size = exact.get(n).abs().toDouble();
                assertThat(sizes[n]).as("%s, %d", p, n).isGreaterThanOrEqualTo(size * (1 - 0x1p-50));
                assertThat(sizes[n]).as("%s, %d", p, n).isLessThanOrEqualTo(size + 1e-8);
            }
        }
    }

    /** Roots at distances k and k + 1/2 of both signs, those above and those below in turn. */
    private static List<LinearGroup> alternating(int power, int count) {
        List<LinearGroup> groups = new ArrayList<>();
        for (int k = 1; k <= count; k++) {
            Rational above = Rational.of(5, 2 * k);
            Rational below = Rational.of(5, 2 * k + 3);
            groups.add(new LinearGroup(Collections.nCopies(power, above), false));
            groups.add(new LinearGroup(Collections.nCopies(power, below), true));
            groups.add(new LinearGroup(List.of(above.negate()), false));
        }
        return groups;
    }

    private static SampledSeries through(List<LinearGroup> groups, SampledSeries a) {
        SampledSeries result = a;
        for (LinearGroup group : groups) {
            for (Rational slope : group.slopes()) {
                List<Rational> linear = List.of(Rational.ONE, slope);
                result = new SampledSeries(
                        a.series(), group.divides() ? result.over(linear) : result.times(linear), a.scale());
            }
        }
        return result;
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 4})
    void linearFactorsAboveAndBelowStayWithinTheirBoundsWithSeed35(int power) {
        RandomDigits random = new RandomDigits(35);
        List<Double> slack = new ArrayList<>();
        List<LinearGroup> groups = alternating(power, 8);
        for (int limbs : new int[] {1, 2, 3}) {
            for (int errorBits : new int[] {0, 8, 30}) {
                SampledSeries a = SampledSeries.random(random, 60, limbs, 1, errorBits);
                SampledSeries.assertWithin(
                        a.series().throughLinear(groups), through(groups, a).points(), a.scale(), slack);
            }
        }
        assertNotWasteful(slack);
    }

    /** Slopes of an exponential fall with the order. */
    private static void shorten(long[] digits, int k) {
        for (int i = 1; i < digits.length; i++) {
            digits[i] = i <= k / 20 ? 0 : digits[i] >> Math.min(40, k);
        }
    }

    /** e^L with L = -14 v + ..., then divided by (1 + v)^4 and more: the errors move together with the numbers. */
    @Test
    void exponentialsOfLargeSlopesStayWithinTheirBoundsWithSeed36() {
        RandomDigits random = new RandomDigits(36);
        List<Double> slack = new ArrayList<>();
        List<LinearGroup> groups = alternating(3, 6);
        for (int limbs : new int[] {1, 2, 4}) {
            for (int errorBits : new int[] {0, 6}) {
                long[][] digits = new long[60][];
                double[] errors = new double[60];
                for (int k = 0; k < 60; k++) {
                    digits[k] = random.any(limbs, 0);
                    digits[k][0] = k == 1 ? -14 : 0;
                    shorten(digits[k], k);
                    errors[k] = random.random().nextInt(1 << errorBits);
                }
                SampledSeries slopes = SampledSeries.of(FixedSeries.of(digits, errors, limbs), random.random());
                List<BigInteger> points = slopes.exponential();
                FixedSeries exponential = slopes.series().expOfIntegral();
                SampledSeries.assertWithin(exponential, points, slopes.scale(), slack);
                SampledSeries whole = through(groups, new SampledSeries(exponential, points, slopes.scale()));
                SampledSeries.assertWithin(exponential.throughLinear(groups), whole.points(), whole.scale(), slack);
            }
        }
        assertNotWasteful(slack);
    }
}
