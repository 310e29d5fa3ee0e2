package bubblechain.exact;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.math.BigInteger;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class RationalTest {
    /** Corner cases first, then seeded numbers of very different lengths. */
    private static List<Rational> samples(int seed, int count) {
        List<Rational> samples = new ArrayList<>(List.of(
                Rational.ZERO,
                Rational.ONE,
                Rational.of(-1),
                Rational.HALF,
                Rational.of(Long.MIN_VALUE),
                Rational.of(Long.MAX_VALUE, 2),
                Rational.of(BigInteger.TEN.pow(80), BigInteger.valueOf(-3))));
        Random random = new Random(seed);
        while (samples.size() < count) {
            BigInteger numerator = new BigInteger(1 + random.nextInt(120), random);
            BigInteger denominator = new BigInteger(1 + random.nextInt(90), random).add(BigInteger.ONE);
            samples.add(Rational.of(random.nextBoolean() ? numerator : numerator.negate(), denominator));
        }
        return samples;
    }

    @Test
    void rationalsAreAFieldOnSeed1() {
        Random pick = new Random(1);
        List<Rational> numbers = samples(1, 60);
        for (int k = 0; k < 2_000; k++) {
            Rational a = numbers.get(pick.nextInt(numbers.size()));
            Rational b = numbers.get(pick.nextInt(numbers.size()));
            Rational c = numbers.get(pick.nextInt(numbers.size()));
            assertThat(a.add(b)).isEqualTo(b.add(a)).hasSameHashCodeAs(b.add(a));
            assertThat(a.multiply(b)).isEqualTo(b.multiply(a));
            assertThat(a.add(b).add(c)).isEqualTo(a.add(b.add(c)));
            assertThat(a.multiply(b).multiply(c)).isEqualTo(a.multiply(b.multiply(c)));
            assertThat(a.multiply(b.add(c))).isEqualTo(a.multiply(b).add(a.multiply(c)));
            assertThat(a.subtract(b).add(b)).isEqualTo(a);
            assertThat(a.add(a.negate())).isEqualTo(Rational.ZERO);
            if (!b.isZero()) {
                assertThat(a.divide(b).multiply(b)).isEqualTo(a);
                assertThat(b.inverse().inverse()).isEqualTo(b);
                assertThat(b.power(-3)).isEqualTo(Rational.ONE.divide(b.multiply(b).multiply(b)));
            }
            assertThat(Integer.signum(a.compareTo(b))).isEqualTo(a.subtract(b).signum());
        }
    }

    @Test
    void numbersAreInLowestTermsWithAPositiveDenominatorOnSeed2() {
        for (Rational a : samples(2, 300)) {
            for (Rational r : List.of(a, a.add(Rational.of(5, 6)), a.multiply(Rational.of(-14, 15)), a.multiply(6))) {
                assertThat(r.denominator().signum()).isPositive();
                assertThat(r.numerator().gcd(r.denominator())).isEqualTo(BigInteger.ONE);
            }
        }
    }

    @Test
    void textReadsBackAsTheSameNumberOnSeed3() {
        for (Rational a : samples(3, 300)) {
            assertThat(Rational.parse(a.toString())).isEqualTo(a);
        }
    }

    @ParameterizedTest
    @CsvSource({
        "0.1, 1/10", "-1.250, -5/4", "2e3, 2000", "-3.5E-2, -7/200", "+6/4, 3/2", "7., 7", "' 12 ', 12", "-0, 0",
        "1e-3, 1/1000"
    })
    void decimalsAreExact(String text, String expected) {
        assertThat(Rational.parse(text)).hasToString(expected);
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "x", "1/-2", "1/2/3", ".5", "1e", "1e999999", "0x10", "NaN", "１", "1,5", "--1"})
    void otherTextIsRefusedWithAnExample(String text) {
        assertThatThrownBy(() -> Rational.parse(text))
                .isInstanceOf(DomainException.class)
                .hasMessage("'" + text + "' is not a rational number such as 3, -3/4 or 1.25");
    }

    @Test
    void aFractionOverZeroIsRefused() {
        assertThatThrownBy(() -> Rational.parse("3/0"))
                .isInstanceOf(DomainException.class)
                .hasMessage("'3/0' divides by zero");
        assertThatThrownBy(() -> Rational.ZERO.inverse())
                .isInstanceOf(ArithmeticException.class)
                .hasMessage("division by zero");
    }

    @Test
    void floorAndCeilingEncloseTheNumberOnSeed4() {
        for (Rational a : samples(4, 300)) {
            Rational floor = Rational.of(a.floor());
            assertThat(floor).isLessThanOrEqualTo(a);
            assertThat(a.subtract(floor)).isLessThan(Rational.ONE);
            assertThat(a.ceiling().subtract(a.floor())).isEqualTo(a.isInteger() ? BigInteger.ZERO : BigInteger.ONE);
        }
    }

    @Test
    void theNearestDoubleIsCloseToTheNumberOnSeed5() {
        for (Rational a : samples(5, 300)) {
            double expected = new java.math.BigDecimal(a.numerator())
                    .divide(new java.math.BigDecimal(a.denominator()), java.math.MathContext.DECIMAL64)
                    .doubleValue();
            assertThat(a.toDouble()).isCloseTo(expected, org.assertj.core.data.Percentage.withPercentage(1e-13));
        }
    }

    @Test
    void subtractingTheSmallestLongDoesNotOverflow() {
        assertThat(Rational.ZERO.subtract(Long.MIN_VALUE)).isEqualTo(Rational.of(BigInteger.ONE.shiftLeft(63)));
    }
}
