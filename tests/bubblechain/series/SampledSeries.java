package bubblechain.series;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;

/**
 * A fixed-point series and one sequence of real numbers within its error bounds, held to about three times its precision:
 * what an operation does to the numbers must stay within the bounds it gives.
 *
 * @param series the series under test
 * @param points integers, the sampled numbers times 2^scale
 * @param scale  bits after the point
 */
record SampledSeries(FixedSeries series, List<BigInteger> points, int scale) {
    private static final int STEP_BITS = 20;
    private static final int SHOWN_BITS = 60;

    /** Balanced random digits, the integer part below {@code largest}, errors zero or up to 2^errorBits units. */
    static SampledSeries random(RandomDigits random, int length, int limbs, long largest, int errorBits) {
        long[][] digits = new long[length][];
        double[] errors = new double[length];
        for (int k = 0; k < length; k++) {
            digits[k] = random.any(limbs, largest);
            errors[k] = random.random().nextInt(4) == 0 ? 0 : 1 + random.random().nextInt(1 << errorBits);
        }
        return of(FixedSeries.of(digits, errors, limbs), random.random());
    }

    /** Sampled numbers for a series, half of them at an end of the error interval. */
    static SampledSeries of(FixedSeries series, Random random) {
        int bits = FixedSeries.bits(series.limbs());
        int scale = 3 * bits + 200;
        List<BigInteger> points = new ArrayList<>();
        for (int k = 0; k < series.length(); k++) {
            long end = (long) Math.scalb(series.error(k), STEP_BITS);
            long step = random.nextBoolean() || end == 0
                    ? random.nextBoolean() ? end : -end
                    : (long) ((2 * random.nextDouble() - 1) * end);
            points.add(series.integer(k)
                    .shiftLeft(scale - bits)
                    .add(BigInteger.valueOf(step).shiftLeft(scale - bits - STEP_BITS)));
        }
        return new SampledSeries(series, points, scale);
    }

    BigInteger point(int k) {
        return points.get(k);
    }

    /** Points of the product. */
    List<BigInteger> times(SampledSeries other) {
        List<BigInteger> result = new ArrayList<>();
        for (int n = 0; n < points.size(); n++) {
            BigInteger sum = BigInteger.ZERO;
            for (int k = 0; k <= n; k++) {
                sum = sum.add(point(k).multiply(other.point(n - k)));
            }
            result.add(sum.shiftRight(scale));
        }
        return result;
    }

    /** Points of the exponential of the integral. */
    List<BigInteger> exponential() {
        List<BigInteger> result = new ArrayList<>(List.of(BigInteger.ONE.shiftLeft(scale)));
        for (int n = 1; n < points.size(); n++) {
            BigInteger sum = BigInteger.ZERO;
            for (int k = 1; k <= n; k++) {
                sum = sum.add(point(k).multiply(result.get(n - k)));
            }
            result.add(sum.shiftRight(scale).divide(BigInteger.valueOf(n)));
        }
        return result;
    }

    List<BigInteger> times(List<Rational> polynomial) {
        List<BigInteger> result = new ArrayList<>();
        for (int n = 0; n < points.size(); n++) {
            BigInteger sum = BigInteger.ZERO;
            for (int i = 0; i < polynomial.size() && i <= n; i++) {
                sum = sum.add(product(polynomial.get(i), point(n - i)));
            }
            result.add(sum);
        }
        return result;
    }

    List<BigInteger> over(List<Rational> polynomial) {
        List<BigInteger> result = new ArrayList<>();
        for (int n = 0; n < points.size(); n++) {
            BigInteger sum = point(n);
            for (int i = 1; i < polynomial.size() && i <= n; i++) {
                sum = sum.subtract(product(polynomial.get(i), result.get(n - i)));
            }
            result.add(product(polynomial.get(0).inverse(), sum));
        }
        return result;
    }

    private static BigInteger product(Rational factor, BigInteger number) {
        return factor.numerator().multiply(number).divide(factor.denominator());
    }

    /** Checks a result against its points; adds log2(bound/actual error) of every coefficient that has both to the list. */
    static void assertWithin(FixedSeries result, List<BigInteger> points, int scale, List<Double> slack) {
        int bits = FixedSeries.bits(result.limbs());
        for (int k = 0; k < result.length(); k++) {
            BigInteger difference = result.integer(k).shiftLeft(scale - bits).subtract(points.get(k)).abs();
            // to 2^-60 of a unit
            double units = Math.scalb(difference.shiftRight(scale - bits - SHOWN_BITS).doubleValue(), -SHOWN_BITS);
            // the points of the results are themselves rounded, far below the last place
            assertThat(units).as("coefficient %d of %d, %d limbs", k, result.length(), result.limbs())
                    .isLessThanOrEqualTo(result.error(k) * (1 + 0x1p-40) + 0x1p-40);
            if (units > 0x1p-30 && result.error(k) > 0) {
                slack.add(Math.log(result.error(k) / units) / Math.log(2));
            }
        }
    }
}
