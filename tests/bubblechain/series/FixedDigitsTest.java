package bubblechain.series;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.math.BigInteger;
import java.util.Arrays;
import org.junit.jupiter.api.Test;

/** Digits against big integers: values are exact, errors stay below the units that the comments promise. */
class FixedDigitsTest {
    private static final int[] SIZES = {0, 1, 2, 3, 5, 17, 61, 62, 63, 64, 65, 126, 127, 128, 129, 200, 540};
    private static final long SAFE = 1L << 40;

    private static void assertBalanced(long[] digits) {
        for (int k = 1; k < digits.length; k++) {
            assertThat(Math.abs(digits[k])).isLessThanOrEqualTo(RandomDigits.EDGE);
        }
    }

    @Test
    void integersGoThereAndBackWithSeed1() {
        RandomDigits random = new RandomDigits(1);
        for (int limbs : SIZES) {
            for (int i = 0; i < 60; i++) {
                long[] digits = random.any(limbs, SAFE);
                BigInteger value = RandomDigits.value(digits);
                assertThat(FixedDigits.toInteger(digits)).isEqualTo(value);
                long[] again = FixedDigits.of(value, limbs);
                assertThat(RandomDigits.value(again)).isEqualTo(value);
                assertBalanced(again);
            }
        }
    }

    @Test
    void integersOutOfRangeAreRefused() {
        for (int limbs : SIZES) {
            int bits = FixedDigits.BITS * (limbs + 1);
            BigInteger half = BigInteger.ONE.shiftLeft(bits - 1);
            for (BigInteger outside : new BigInteger[] {
                half, half.negate().subtract(BigInteger.ONE), half.shiftLeft(1), half.shiftLeft(7), half.shiftLeft(200).negate()
            }) {
                assertThatThrownBy(() -> FixedDigits.of(outside, limbs)).isInstanceOf(ArithmeticException.class);
            }
            for (BigInteger inside : new BigInteger[] {half.subtract(BigInteger.ONE), half.negate()}) {
                assertThat(FixedDigits.toInteger(FixedDigits.of(inside, limbs))).isEqualTo(inside);
            }
        }
    }

    @Test
    void normalisingKeepsTheValueAndBalancesTheDigitsWithSeed2() {
        RandomDigits random = new RandomDigits(2);
        for (int limbs : SIZES) {
            for (int i = 0; i < 60; i++) {
                long[] digits = random.any(limbs, SAFE);
                for (int k = 1; k <= limbs; k++) {
                    digits[k] = digits[k] * random.random().nextInt(120) + random.random().nextInt(3) - 1;
                }
                BigInteger value = RandomDigits.value(digits);
                FixedDigits.normalise(digits);
                assertThat(RandomDigits.value(digits)).isEqualTo(value);
                assertBalanced(digits);
            }
        }
    }

    @Test
    void theUpperBoundIsNotBelowTheNumberAndCloseWithSeed3() {
        RandomDigits random = new RandomDigits(3);
        for (int limbs : new int[] {0, 1, 2, 5, 17}) {
            BigInteger scale = BigInteger.ONE.shiftLeft(1_200);
            for (int i = 0; i < 200; i++) {
                long[] digits = random.any(limbs, SAFE);
                BigInteger size = RandomDigits.value(digits).abs().shiftLeft(1_200 - FixedDigits.BITS * limbs);
                double bound = FixedDigits.upperBound(digits);
                BigInteger exact = new java.math.BigDecimal(bound)
                        .multiply(new java.math.BigDecimal(scale))
                        .setScale(0, java.math.RoundingMode.CEILING)
                        .toBigInteger();
                assertThat(exact).isGreaterThanOrEqualTo(size);
                // digits 1, -2^55, ... stand for a half: no bound from two digits is closer than that
                assertThat(exact.shiftRight(2)).isLessThanOrEqualTo(size);
            }
        }
    }

    /** Products of full length, their columns longer than 64 terms from 64 limbs on. */
    @Test
    void sumsOfProductsAreExactUpToTheGuardColumnsWithSeed4() {
        RandomDigits random = new RandomDigits(4);
        for (int limbs : SIZES) {
            int last = limbs + 2;
            int between = Math.max(1, 40 / (1 + last / 64));
            long[] sums = new long[last + 3];
            BigInteger exact = BigInteger.ZERO;
            for (int i = 1; i <= 150; i++) {
                long[] a = random.any(limbs, 1 << 20);
                long[] b = random.any(limbs, 1 << 20);
                FixedDigits.accumulateProduct(
                        a, FixedDigits.leadingZeros(a), b, FixedDigits.leadingZeros(b), last, sums);
                if (i % between == 0) {
                    FixedDigits.carry(sums);
                }
                exact = exact.add(RandomDigits.value(a).multiply(RandomDigits.value(b)));
            }
            long[] result = FixedDigits.fromSums(sums, limbs);
            assertBalanced(result);
            assertError(RandomDigits.value(result), exact, BigInteger.ONE.shiftLeft(FixedDigits.BITS * limbs), 2);
        }
    }

    /** |value - numerator/denominator| < units. */
    private static void assertError(BigInteger value, BigInteger numerator, BigInteger denominator, int units) {
        BigInteger error = value.multiply(denominator).subtract(numerator).abs();
        assertThat(error).isLessThan(denominator.multiply(BigInteger.valueOf(units)));
    }

    @Test
    void divisionLosesHardlyMoreThanOneUnitWithSeed5() {
        RandomDigits random = new RandomDigits(5);
        for (int limbs : SIZES) {
            for (int divisor : new int[] {1, 2, 3, 7, 1_000, (1 << 25) - 39, (1 << 26) - 1}) {
                for (int i = 0; i < 20; i++) {
                    long[] digits = random.any(limbs, FixedDigits.LARGEST);
                    BigInteger before = RandomDigits.value(digits);
                    FixedDigits.divideSmall(digits, divisor);
                    assertBalanced(digits);
                    BigInteger twentyBits = before.shiftLeft(20);
                    BigInteger value = RandomDigits.value(digits).shiftLeft(20);
                    assertError(value, twentyBits, BigInteger.valueOf(divisor), (1 << 20) + 1);
                }
            }
        }
    }

    @Test
    void scalingLosesLessThanTwoUnitsWithSeed6() {
        RandomDigits random = new RandomDigits(6);
        for (int limbs : SIZES) {
            for (int i = 0; i < 100; i++) {
                int q = 1 + random.random().nextInt((1 << 25) - 1);
                int p = random.random().nextInt(2 * q + 1) - q;
                long[] digits = random.any(limbs, 3);
                int from = FixedDigits.leadingZeros(digits);
                BigInteger before = RandomDigits.value(digits);
                FixedDigits.scale(digits, p, q, from);
                assertBalanced(digits);
                BigInteger exact = before.multiply(BigInteger.valueOf(p));
                assertError(RandomDigits.value(digits), exact, BigInteger.valueOf(q), 2);
            }
        }
    }

    @Test
    void combinationsLoseLessThanTwoUnitsWithSeed7() {
        RandomDigits random = new RandomDigits(7);
        for (int limbs : SIZES) {
            for (int i = 0; i < 150; i++) {
                int divisor = 1 + random.random().nextInt(i % 2 == 0 ? 5 : (1 << 26) - 1);
                int count = 1 + random.random().nextInt(FixedDigits.TERMS);
                int[] weights = new int[FixedDigits.TERMS];
                long[][] terms = new long[FixedDigits.TERMS][];
                BigInteger exact = BigInteger.ZERO;
                // up to the largest weights that FixedSeries.fits lets through
                int largest = (int) Math.min((1 << 26) - 1, 64L * divisor / count);
                for (int t = 0; t < count; t++) {
                    int size = random.random().nextBoolean() ? largest : random.random().nextInt(largest + 1);
                    weights[t] = random.random().nextBoolean() ? size : -size;
                    terms[t] = random.any(limbs, SAFE);
                    exact = exact.add(RandomDigits.value(terms[t]).multiply(BigInteger.valueOf(weights[t])));
                }
                long[] target = new long[limbs + 1];
                FixedDigits.combination(target, terms, weights, count, divisor);
                assertBalanced(target);
                assertError(RandomDigits.value(target), exact, BigInteger.valueOf(divisor), 2);
            }
        }
    }

    /** Integer digits from 2^40 to the largest allowed: the result is right or refused. */
    @Test
    void productsThatLeaveTheRangeAreRefusedAndNeverWrapWithSeed8() {
        RandomDigits random = new RandomDigits(8);
        int refused = 0;
        int limbs = 2;
        for (int i = 0; i < 4_000; i++) {
            long[] sums = new long[limbs + 5];
            BigInteger exact = BigInteger.ZERO;
            int products = i % 2 == 0 ? 1 << random.random().nextInt(9) : 1 + random.random().nextInt(300);
            boolean same = random.random().nextBoolean();
            long[] a = large(random, limbs);
            long[] b = large(random, limbs);
            for (int k = 1; k <= products; k++) {
                FixedDigits.accumulateProduct(a, 0, b, 0, limbs + 2, sums);
                exact = exact.add(RandomDigits.value(a).multiply(RandomDigits.value(b)));
                if (k % 40 == 0) {
                    FixedDigits.carry(sums);
                }
                if (!same) {
                    a = large(random, limbs);
                }
            }
            try {
                BigInteger value = RandomDigits.value(FixedDigits.fromSums(sums, limbs));
                assertError(value, exact, BigInteger.ONE.shiftLeft(FixedDigits.BITS * limbs), 2);
            } catch (ArithmeticException outOfRange) {
                assertThat(outOfRange).hasMessageContaining("out of range");
                refused++;
            }
        }
        assertThat(refused).isBetween(2_000, 3_990);
    }

    /** A number whose integer digit is near a power of two up to the limit, so that sums of products come near 2^112 and 2^120. */
    private static long[] large(RandomDigits random, int limbs) {
        long[] digits = random.any(limbs, 0);
        int exponent = 63 - Long.numberOfLeadingZeros(FixedDigits.LARGEST) - random.random().nextInt(5);
        long power = 1L << (random.random().nextBoolean() ? exponent : random.random().nextInt(exponent));
        long near = Math.min(FixedDigits.LARGEST, power + random.random().nextInt(3) - 1);
        digits[0] = random.random().nextBoolean() ? near : -near;
        return digits;
    }

    @Test
    void combinationsThatLeaveTheRangeAreRefusedAndNeverWrapWithSeed9() {
        RandomDigits random = new RandomDigits(9);
        int refused = 0;
        for (int i = 0; i < 20_000; i++) {
            int limbs = 1 + random.random().nextInt(2);
            int divisor = 1 + random.random().nextInt(i % 2 == 0 ? 3 : 1 << 22);
            int count = 1 + random.random().nextInt(FixedDigits.TERMS);
            int[] weights = new int[FixedDigits.TERMS];
            long[][] terms = new long[FixedDigits.TERMS][];
            BigInteger exact = BigInteger.ZERO;
            for (int t = 0; t < count; t++) {
                weights[t] = (int) Math.min((1 << 26) - 1, 64L * divisor / count) >> random.random().nextInt(9);
                terms[t] = large(random, limbs);
                exact = exact.add(RandomDigits.value(terms[t]).multiply(BigInteger.valueOf(weights[t])));
            }
            long[] target = new long[limbs + 1];
            try {
                FixedDigits.combination(target, terms, weights, count, divisor);
                assertError(RandomDigits.value(target), exact, BigInteger.valueOf(divisor), 2);
            } catch (ArithmeticException outOfRange) {
                assertThat(outOfRange).hasMessageContaining("out of range");
                refused++;
            }
        }
        assertThat(refused).isBetween(500, 15_000);
    }

    @Test
    void theLargestIntegerDigitIsKeptAndTheNextRefused() {
        for (long sign : new long[] {1, -1}) {
            long[] largest = {sign * FixedDigits.LARGEST, 0};
            FixedDigits.normalise(largest);
            assertThat(largest[0]).isEqualTo(sign * FixedDigits.LARGEST);
            long[] beyond = {sign * FixedDigits.LARGEST, sign * RandomDigits.EDGE + sign};
            beyond[0] += sign;
            assertThatThrownBy(() -> FixedDigits.normalise(beyond)).isInstanceOf(ArithmeticException.class);
        }
    }

    @Test
    void leadingZerosCountZeroDigitsOnly() {
        assertThat(FixedDigits.leadingZeros(new long[] {0, 0, -1, 0})).isEqualTo(2);
        assertThat(FixedDigits.leadingZeros(new long[4])).isEqualTo(4);
        long[] none = new long[3];
        Arrays.fill(none, 1);
        assertThat(FixedDigits.leadingZeros(none)).isZero();
    }
}
