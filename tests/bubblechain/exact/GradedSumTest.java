package bubblechain.exact;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Sums of homogeneous parts against the arithmetic of exact constants. */
class GradedSumTest {
    private static final int LENGTH = 9;
    private static final List<ExactConstant> FIRST =
            List.of(ExactConstant.PI, ExactConstant.EULER_GAMMA, ExactFunctions.ln(Rational.of(6)));

    /** Entry k is a multiple of zeta(k); entry 1 of a constant of weight one. */
    private static List<ExactConstant> exponent(Random random) {
        List<ExactConstant> exponent = new ArrayList<>();
        exponent.add(ExactConstant.ZERO);
        exponent.add(FIRST.get(random.nextInt(3)).multiply(rational(random)));
        for (int k = 2; k < LENGTH; k++) {
            exponent.add(ExactFunctions.zeta(k).multiply(rational(random)));
        }
        return exponent;
    }

    private static Rational rational(Random random) {
        return Rational.of(random.nextInt(9) - 4, 1 + random.nextInt(6));
    }

    /** w H_w = sum_k k f_k H_(w-k), with products of exact constants. */
    private static List<ExactConstant> exponential(List<ExactConstant> f) {
        List<ExactConstant> h = new ArrayList<>(List.of(ExactConstant.ONE));
        for (int w = 1; w < f.size(); w++) {
            ExactConstant sum = ExactConstant.ZERO;
            for (int k = 1; k <= w; k++) {
                sum = sum.add(f.get(k).multiply(Rational.of(k)).multiply(h.get(w - k)));
            }
            h.add(sum.divide(Rational.of(w)));
        }
        return h;
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 3, 4, 5, 6, 7, 8, 9, 10})
    void aSumOfRandomPartsIsTheSumOfTheirProducts(int seed) {
        Random random = new Random(seed);
        RandomConstants constants = new RandomConstants(seed);
        List<GradedSum.Summand> summands = new ArrayList<>();
        ExactConstant expected = ExactConstant.ZERO;
        Rational[][] factors = new Rational[3][LENGTH];
        for (int h = 0; h < factors.length; h++) {
            List<ExactConstant> exponent = exponent(random);
            // weights of the constant's own factors do not count; a sum has products that coincide
            ExactConstant constant = constants.any().add(ExactConstant.EULER_GAMMA).add(ExactConstant.PI);
            summands.add(new GradedSum.Summand(constant, GradedSeries.exp(exponent).orElseThrow()));
            List<ExactConstant> parts = exponential(exponent);
            for (int w = 0; w < LENGTH; w++) {
                factors[h][w] = rational(random);
                expected = expected.add(constant.multiply(parts.get(w)).multiply(factors[h][w]));
            }
        }
        assertThat(GradedSum.of(summands).combine((h, w) -> factors[h][w])).isEqualTo(expected);
    }

    @Test
    void partsOfOneWeightMultiplyToTheProductOfTheSeries() {
        Random random = new Random(20);
        List<ExactConstant> left = exponent(random);
        GradedSeries second = GradedSeries.exp(exponent(random)).orElseThrow();
        GradedSeries first = GradedSeries.exp(left).orElseThrow();
        List<GradedSum.Summand> split = new ArrayList<>();
        for (int m = 0; m < LENGTH; m++) {
            split.add(new GradedSum.Summand(ExactConstant.ONE, first.multiply(second.part(m)).orElseThrow()));
        }
        GradedSum whole = GradedSum.of(
                List.of(new GradedSum.Summand(ExactConstant.ONE, first.multiply(second).orElseThrow())));
        for (int weight = 0; weight < LENGTH; weight++) {
            int wanted = weight;
            GradedSum.Factors one = (h, w) -> w == wanted ? Rational.ONE : Rational.ZERO;
            assertThat(GradedSum.of(split).combine(one)).isEqualTo(whole.combine(one));
            assertThat(whole.combine(one).isZero()).isFalse();
        }
    }

    @Test
    void sizesCountTheMonomialsOfEachWeight() {
        // pi^2 and zeta(3): 1, -, pi^2, zeta(3), pi^4, pi^2 zeta(3), pi^6 and zeta(3)^2
        List<ExactConstant> exponent = new ArrayList<>(List.of(ExactConstant.ZERO, ExactConstant.ZERO));
        for (int k = 2; k < 7; k++) {
            exponent.add(k == 2 || k == 3 ? ExactFunctions.zeta(k) : ExactConstant.ZERO);
        }
        GradedSum sum = GradedSum.of(
                List.of(new GradedSum.Summand(ExactConstant.SQRT_PI, GradedSeries.exp(exponent).orElseThrow())));
        assertThat(sum.sizes()).containsExactly(1, 0, 1, 1, 1, 1, 2);
    }

    @Test
    void productsOfConstantsAndConstantsOfTwoWeightsAreNotGraded() {
        ExactConstant zeta = ExactFunctions.zeta(3);
        ExactConstant zero = ExactConstant.ZERO;
        assertThat(GradedSeries.of(List.of(zero, zeta.multiply(ExactConstant.PI)))).isEmpty();
        assertThat(GradedSeries.of(List.of(zero, zeta, zeta))).isEmpty();
        assertThat(GradedSeries.of(List.of(zero, ExactConstant.ONE))).isEmpty();
        assertThat(GradedSeries.exp(List.of(ExactConstant.ONE, zero))).isEmpty();
        GradedSeries third = GradedSeries.of(List.of(zero, zero, zero, zeta)).orElseThrow();
        GradedSeries both = GradedSeries.of(List.of(ExactConstant.ONE, zeta, zero, zero)).orElseThrow();
        assertThat(third.multiply(both)).isPresent();
        GradedSeries sum = GradedSeries.of(List.of(ExactConstant.ONE, zero, zero, zeta)).orElseThrow();
        assertThat(sum.multiply(both)).as("zeta(3) with x and with x^3").isEmpty();
    }
}
