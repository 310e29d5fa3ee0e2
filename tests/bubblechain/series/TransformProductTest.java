package bubblechain.series;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.BoundSamples;
import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Convolutions by transform against schoolbook sums of big integers. */
class TransformProductTest {
    private static List<BigInteger> random(int terms, int bits, Random random) {
        List<BigInteger> values = new ArrayList<>();
        for (int k = 0; k < terms; k++) {
            BigInteger size = new BigInteger(random.nextInt(bits + 1), random);
            values.add(random.nextBoolean() ? size : size.negate());
        }
        return values;
    }

    private static List<BigInteger> same(int terms, BigInteger value) {
        return Collections.nCopies(terms, value);
    }

    private static void assertProduct(List<BigInteger> left, List<BigInteger> right, int limbs) {
        int terms = left.size();
        List<long[]> a = digits(left, limbs);
        List<long[]> b = digits(right, limbs);
        TransformProduct.Shape shape = TransformProduct.Shape.of(
                terms, 2 * terms, FixedDigits.largestBits(a), FixedDigits.largestBits(b));
        long[][] product = TransformProduct.multiply(a, b, 0, terms, limbs, shape);
        for (int n = 0; n < terms; n++) {
            BigInteger sum = BigInteger.ZERO;
            for (int k = 0; k <= n; k++) {
                sum = sum.add(left.get(k).multiply(right.get(n - k)));
            }
            assertThat(FixedDigits.toInteger(product[n]))
                    .as("coefficient %d of %d", n, terms)
                    .isEqualTo(sum.shiftRight(limbs * FixedDigits.BITS));
        }
    }

    private static List<long[]> digits(List<BigInteger> values, int limbs) {
        return values.stream().map(v -> FixedDigits.of(v, limbs)).toList();
    }

    @ParameterizedTest
    @CsvSource({"1,1", "2,1", "3,2", "17,5", "64,9", "150,20", "40,130"})
    void productsOfRandomSeriesAreExactSeed71(int terms, int limbs) {
        Random random = new Random(71);
        int bits = limbs * FixedDigits.BITS + 3;
        assertProduct(random(terms, bits, random), random(terms, bits, random), limbs);
    }

    @ParameterizedTest
    @CsvSource({"60,4", "200,12"})
    void productsOfTheLargestAndTheSmallestNumbersAreExact(int terms, int limbs) {
        BigInteger large = BigInteger.ONE.shiftLeft(limbs * FixedDigits.BITS + 20).subtract(BigInteger.ONE);
        assertProduct(same(terms, large), same(terms, large.negate()), limbs);
        assertProduct(same(terms, large), same(terms, BigInteger.valueOf(-1)), limbs);
        assertProduct(same(terms, BigInteger.ZERO), same(terms, large), limbs);
    }

    @Test
    void sumsOfChunksStayBelowHalfTheModulus() {
        for (int terms : new int[] {1, 10, 1_000, 10_000}) {
            for (int bits : new int[] {1, 56, 1_200, 34_000}) {
                TransformProduct.Shape shape = TransformProduct.Shape.of(terms, terms, bits, bits);
                double chunks = shape.places() / 2.0;
                double largest = Math.scalb(terms * chunks, 2 * (shape.chunkBits() - 1));
                assertThat(largest).isLessThan(NumberTheoreticTransform.MODULUS / 2.0);
                assertThat(chunks * shape.chunkBits()).isGreaterThan(bits);
            }
        }
    }

    @ParameterizedTest
    @CsvSource({"3,2", "40,3", "90,11"})
    void theUpperHalfOfACyclicConvolutionDoesNotSeeTheWrapSeed73(int terms, int limbs) {
        Random random = new Random(73);
        int bits = limbs * FixedDigits.BITS;
        List<BigInteger> left = random(terms, bits, random);
        List<BigInteger> right = random(2 * terms, bits, random);
        List<long[]> a = digits(left, limbs);
        List<long[]> b = digits(right, limbs);
        TransformProduct.Shape shape = TransformProduct.Shape.of(
                terms, 2 * terms, FixedDigits.largestBits(a), FixedDigits.largestBits(b));
        long[][] product = TransformProduct.multiply(a, b, terms, 2 * terms, limbs, shape);
        for (int n = terms; n < 2 * terms; n++) {
            BigInteger sum = BigInteger.ZERO;
            for (int k = 0; k < terms; k++) {
                sum = sum.add(left.get(k).multiply(right.get(n - k)));
            }
            assertThat(FixedDigits.toInteger(product[n - terms])).isEqualTo(sum.shiftRight(bits));
        }
    }

    @Test
    void theModulusIsPrime() {
        assertThat(BigInteger.valueOf(NumberTheoreticTransform.MODULUS).isProbablePrime(60)).isTrue();
    }

    @ParameterizedTest
    @CsvSource({"8,4", "300,18"})
    void productsStayWithinTheirBoundsOnEitherRouteSeed72(int terms, int limbs) {
        Random random = new Random(72);
        int bits = limbs * FixedDigits.BITS;
        FixedSeries left = FixedSeries.of(random(terms, bits, random), new double[terms], limbs);
        FixedSeries right = FixedSeries.of(random(terms, bits, random), new double[terms], limbs);
        FixedSeries product = left.multiply(right);
        BoundSamples samples = new BoundSamples();
        for (int n = 0; n < terms; n++) {
            BigInteger sum = BigInteger.ZERO;
            for (int k = 0; k <= n; k++) {
                sum = sum.add(left.integer(k).multiply(right.integer(n - k)));
            }
            BigInteger error = product.integer(n).shiftLeft(bits).subtract(sum).abs();
            BigInteger bound = BigInteger.valueOf((long) Math.floor(product.error(n))).shiftLeft(bits);
            samples.add(Rational.of(bound), Rational.of(error), "coefficient %d of %d", n, terms);
        }
        samples.assertNotWasteful(terms, "%d terms", terms);
    }
}
