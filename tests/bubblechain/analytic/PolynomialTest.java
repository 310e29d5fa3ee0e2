package bubblechain.analytic;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.Rational;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Assertions;
import org.junit.jupiter.api.Test;

class PolynomialTest {
    private static final Polynomial U = Polynomial.linear(Rational.ZERO, Rational.ONE);

    private static Polynomial random(Random random, int degree) {
        List<Rational> coefficients = new ArrayList<>();
        for (int k = 0; k <= degree; k++) {
            coefficients.add(Rational.of(random.nextInt(21) - 10, 1 + random.nextInt(6)));
        }
        return Polynomial.of(coefficients);
    }

    private static RationalFunction randomFunction(Random random) {
        Polynomial denominator = random(random, random.nextInt(4));
        return RationalFunction.of(
                random(random, random.nextInt(5) - 1), denominator.isZero() ? Polynomial.ONE : denominator);
    }

    @Test
    void polynomialsAreARingWithDivisionOnSeed51() {
        Random random = new Random(51);
        for (int k = 0; k < 200; k++) {
            Polynomial a = random(random, random.nextInt(6) - 1);
            Polynomial b = random(random, random.nextInt(6) - 1);
            Polynomial c = random(random, random.nextInt(4));
            assertThat(a.multiply(b)).isEqualTo(b.multiply(a));
            assertThat(a.multiply(b).multiply(c)).isEqualTo(a.multiply(b.multiply(c)));
            assertThat(a.multiply(b.add(c))).isEqualTo(a.multiply(b).add(a.multiply(c)));
            assertThat(a.subtract(a)).isEqualTo(Polynomial.ZERO);
            if (!b.isZero()) {
                Polynomial[] parts = a.divideAndRemainder(b);
                assertThat(parts[0].multiply(b).add(parts[1])).isEqualTo(a);
                assertThat(parts[1].degree()).isLessThan(b.degree());
                assertThat(a.multiply(b).divideExactly(b)).isEqualTo(a);
            }
            assertThat(a.multiply(b).derivative())
                    .isEqualTo(a.derivative().multiply(b).add(a.multiply(b.derivative())));
        }
    }

    @Test
    void shiftingAndEvaluatingAgreeOnSeed52() {
        Random random = new Random(52);
        for (int k = 0; k < 100; k++) {
            Polynomial p = random(random, random.nextInt(7));
            Rational u0 = Rational.of(random.nextInt(9) - 4, 1 + random.nextInt(3));
            Rational x = Rational.of(random.nextInt(9) - 4, 1 + random.nextInt(5));
            assertThat(p.shifted(u0).valueAt(x)).isEqualTo(p.valueAt(u0.add(x)));
            assertThat(p.shifted(u0).shifted(u0.negate())).isEqualTo(p);
            assertThat(p.valueAt(Ball.of(x, 100), 100).contains(p.valueAt(x))).isTrue();
        }
    }

    @Test
    void theGreatestCommonDivisorDividesBothAndHoldsThePlantedFactorOnSeed53() {
        Random random = new Random(53);
        for (int k = 0; k < 200; k++) {
            Polynomial common = random(random, random.nextInt(4));
            Polynomial a = random(random, random.nextInt(5)).multiply(common);
            Polynomial b = random(random, random.nextInt(5)).multiply(common);
            Polynomial gcd = a.gcd(b);
            if (a.isZero() || b.isZero()) {
                assertThat(gcd).isEqualTo(a.isZero() ? b.monic() : a.monic());
                continue;
            }
            assertThat(gcd.leading()).isEqualTo(Rational.ONE);
            assertThat(a.divideAndRemainder(gcd)[1]).isEqualTo(Polynomial.ZERO);
            assertThat(b.divideAndRemainder(gcd)[1]).isEqualTo(Polynomial.ZERO);
            assertThat(gcd.divideAndRemainder(common)[1]).isEqualTo(Polynomial.ZERO);
            assertThat(a.divideExactly(gcd).gcd(b.divideExactly(gcd))).isEqualTo(Polynomial.ONE);
        }
        assertThat(Polynomial.ZERO.gcd(Polynomial.ZERO)).isEqualTo(Polynomial.ZERO);
    }

    @Test
    void aCommonFactorThatIsCongruentToNothingElseModuloThePrimeIsFound() {
        // leading coefficients divisible by the prime 2^31 - 1 of the modular test
        Polynomial factor = Polynomial.linear(Rational.ONE, Rational.of(2147483647));
        Polynomial a = factor.multiply(Polynomial.linear(Rational.of(3), Rational.ONE));
        Polynomial b = factor.multiply(Polynomial.linear(Rational.of(5), Rational.ONE));
        assertThat(a.gcd(b)).isEqualTo(factor.monic());
        // equal modulo the prime, coprime over Q
        Polynomial c = Polynomial.linear(Rational.of(7), Rational.ONE);
        Polynomial d = Polynomial.linear(Rational.of(7L + 2147483647L), Rational.ONE);
        assertThat(c.gcd(d)).isEqualTo(Polynomial.ONE);
    }

    @Test
    void rationalFunctionsAreAFieldWithUniqueFormOnSeed54() {
        Random random = new Random(54);
        for (int k = 0; k < 150; k++) {
            RationalFunction a = randomFunction(random);
            RationalFunction b = randomFunction(random);
            RationalFunction c = randomFunction(random);
            assertThat(a.add(b)).isEqualTo(b.add(a)).hasSameHashCodeAs(b.add(a));
            assertThat(a.add(b).add(c)).isEqualTo(a.add(b.add(c)));
            assertThat(a.multiply(b).multiply(c)).isEqualTo(a.multiply(b.multiply(c)));
            assertThat(a.multiply(b.add(c))).isEqualTo(a.multiply(b).add(a.multiply(c)));
            assertThat(a.denominator().leading()).isEqualTo(Rational.ONE);
            assertThat(a.numerator().gcd(a.denominator()).degree()).isLessThanOrEqualTo(
                    a.isZero() ? a.denominator().degree() : 0);
            if (!b.isZero()) {
                assertThat(a.multiply(b).multiply(b.inverse())).isEqualTo(a);
                assertThat(b.power(-2)).isEqualTo(RationalFunction.ONE.multiply(b.inverse()).multiply(b.inverse()));
            }
            Rational u0 = Rational.of(2, 3);
            assertThat(a.multiply(b).shifted(u0)).isEqualTo(a.shifted(u0).multiply(b.shifted(u0)));
        }
        assertThatThrownBy(() -> RationalFunction.ZERO.inverse()).isInstanceOf(ArithmeticException.class);
        assertThatThrownBy(() -> RationalFunction.of(Polynomial.ONE, Polynomial.ZERO))
                .isInstanceOf(ArithmeticException.class);
    }

    @Test
    void coprimeDenominatorsOfHighDegreeAreAddedFast() {
        Assertions.assertTimeoutPreemptively(Duration.ofSeconds(5), () -> {
            RationalFunction sum = RationalFunction.ZERO;
            for (int k = 1; k <= 80; k++) {
                sum = sum.add(RationalFunction.of(Polynomial.ONE, Polynomial.linear(Rational.of(k), Rational.ONE)));
            }
            assertThat(sum.denominator().degree()).isEqualTo(80);
        });
    }

    @Test
    void theDegreeIsLimited() {
        assertThat(U.power(1_000).degree()).isEqualTo(1_000);
        assertThatThrownBy(() -> U.power(1_001))
                .isInstanceOf(DomainException.class)
                .hasMessage("a polynomial of degree 1001 in u; the limit is 1000");
        assertThatThrownBy(() -> U.power(600).multiply(U.power(600)))
                .isInstanceOf(DomainException.class)
                .hasMessage("a polynomial of degree 1200 in u; the limit is 1000");
    }

    @Test
    void polynomialsPrintInTheFormulaLanguage() {
        assertThat(Polynomial.of(List.of(Rational.of(-1, 2), Rational.ONE, Rational.ZERO, Rational.of(-3))))
                .hasToString("-3*u^3+u-1/2");
        assertThat(Polynomial.ZERO).hasToString("0");
        assertThat(RationalFunction.of(U, Polynomial.linear(Rational.ONE, Rational.TWO))).hasToString("(1/2*u)/(u+1/2)");
    }
}
