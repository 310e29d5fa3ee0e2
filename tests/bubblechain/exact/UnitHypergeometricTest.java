package bubblechain.exact;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** W(z) against its defining sum, its recurrence and its closed forms; bounds at three times the precision. */
class UnitHypergeometricTest {
    private static final double LARGEST_MEDIAN = 20;

    private static Ball value(Rational z, int bits) {
        return UnitHypergeometric.taylor(z, 1, bits)[0];
    }

    /** sum_k [k! Gamma(z)/Gamma(z+k+1)]^2 for large z, where it converges fast: the term ratio is ((k+1)/(z+k+1))^2. */
    @ParameterizedTest
    @ValueSource(ints = {40, 41, 65})
    void theDefiningSum(int z) {
        Rational term = Rational.of(1, z).power(2);
        Rational sum = Rational.ZERO;
        int k = 0;
        Rational tail = term;
        while (tail.compareTo(Rational.TWO.power(-140)) > 0) {
            sum = sum.add(term);
            term = term.multiply(Rational.of(k + 1, z + k + 1L).power(2));
            k++;
            // from here on terms fall like k^(-2z): the rest is below term (z+k)/(2z-1)
            tail = term.multiply(Rational.of(z + k, 2L * z - 1)).multiply(2);
        }
        Ball found = value(Rational.of(z), 120);
        assertThat(found.midpoint().subtract(sum).abs()).isLessThanOrEqualTo(found.radius().toRational().add(tail));
        assertThat(found.accuracyBits()).isGreaterThan(100);
    }

    @Test
    void closedFormsAreTheNumbers() {
        // W(1) = zeta(2), W'(1) = -4 zeta(3), W''(1)/2 = 41 zeta(4)/4, W'''(1)/6 = -19 zeta(5) - 2 zeta(2) zeta(3), W(3/2) = 4 pi - 12: derivation at UnitHypergeometric
        for (int k = 0; k <= 3; k++) {
            assertContains(UnitHypergeometric.coefficient(k, Rational.ONE), Rational.ONE, k);
        }
        assertContains(UnitHypergeometric.coefficient(0, Rational.of(3, 2)), Rational.of(3, 2), 0);
        assertThat(UnitHypergeometric.coefficient(2, Rational.ONE)).hasToString("41*pi^4/360");
        assertThat(UnitHypergeometric.coefficient(0, Rational.of(3, 2))).hasToString("4*pi-12");
    }

    private static void assertContains(ExactConstant exact, Rational z, int k) {
        assertThat(exact.isClosedForm()).isTrue();
        Ball numeric = UnitHypergeometric.taylor(z, k + 1, 700)[k];
        Ball closed = exact.toBall(800);
        assertThat(numeric.subtract(closed, 800).containsZero()).isTrue();
        assertThat(numeric.accuracyBits()).isGreaterThan(680);
    }

    /** The values by series at z itself and by recurrence from [1, 2), for W and its first derivatives. */
    @Test
    void exactValuesAreTheSeriesWithSeed41() {
        Random random = new Random(41);
        for (int i = 0; i < 40; i++) {
            Rational z = Rational.of(random.nextInt(80) - 40, 1 + random.nextInt(6));
            int n = random.nextInt(4);
            if (UnitHypergeometric.isPole(z)) {
                assertThatThrownBy(() -> ConstantFunctions.unit3f2(n, ExactConstant.of(z)))
                        .isInstanceOf(DomainException.class)
                        .hasMessage("unit_3f2 has a pole at " + z);
                continue;
            }
            Ball exact = ConstantFunctions.unit3f2(n, ExactConstant.of(z)).toBall(400);
            Ball series = UnitHypergeometric.taylor(z, n + 1, 400)[n]
                    .multiply(Rational.of(ExactFunctions.factorial(n)), 400);
            assertThat(exact.subtract(series, 400).containsZero()).as("W^(%d)(%s)", n, z).isTrue();
            assertThat(series.accuracyBits()).as("W^(%d)(%s)", n, z).isGreaterThan(300);
        }
    }

    @Test
    void polesAreWhereTheyAreSaidToBe() {
        for (int twice = -12; twice <= 12; twice++) {
            Rational z = Rational.of(twice, 2);
            // next to a simple pole the value grows like the inverse distance
            Ball near = value(z.add(Rational.TWO.power(-60)), 300);
            boolean large = near.abs().midpoint().compareTo(Rational.TWO.power(40)) > 0;
            assertThat(UnitHypergeometric.isPole(z)).as("z = %s", z).isEqualTo(large);
        }
    }

    /** Few bits, so that rounding and truncation dominate: the error stays below its bound, and not far below. */
    @ParameterizedTest
    @ValueSource(ints = {30, 90, 250})
    void taylorCoefficientsAreWithinTheirBounds(int bits) {
        List<Double> slack = new ArrayList<>();
        for (Rational z : List.of(
                Rational.ONE, Rational.of(3, 2), Rational.of(5, 4), Rational.of(1, 3), Rational.of(-7, 3), Rational.of(9, 2))) {
            int count = 12;
            Ball[] coarse = UnitHypergeometric.taylor(z, count, bits);
            Ball[] fine = UnitHypergeometric.taylor(z, count, 3 * bits + 60);
            for (int k = 0; k < count; k++) {
                Rational error = coarse[k].midpoint().subtract(fine[k].midpoint()).abs();
                Rational bound = coarse[k].radius().toRational();
                assertThat(error).as("W^(%d)(%s) in %d bits", k, z, bits)
                        .isLessThanOrEqualTo(bound.add(fine[k].radius().toRational()));
                if (!error.isZero()) {
                    slack.add(Math.log(bound.divide(error).toDouble()) / Math.log(2));
                }
            }
        }
        Collections.sort(slack);
        assertThat(slack).hasSizeGreaterThan(50);
        assertThat(slack.get(slack.size() / 2)).as("median of log2(bound/error)").isLessThan(LARGEST_MEDIAN);
    }

    @Test
    void argumentsOutOfRangeAreRefused() {
        assertThatThrownBy(() -> ConstantFunctions.unit3f2(0, ExactConstant.PI)).hasMessageContaining("needs a rational z");
        assertThatThrownBy(() -> ConstantFunctions.unit3f2(0, ExactConstant.of(500))).hasMessageContaining("between -200 and 200");
    }
}
