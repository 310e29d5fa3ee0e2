package bubblechain.analytic;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.analytic.RealRoots.Interval;
import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.List;
import org.junit.jupiter.api.Test;

class RealRootsTest {
    private static Polynomial root(Rational r) {
        return Polynomial.linear(r.negate(), Rational.ONE);
    }

    private static Polynomial of(long... coefficients) {
        return Polynomial.of(java.util.Arrays.stream(coefficients).mapToObj(Rational::of).toList());
    }

    private static List<Rational> points(Polynomial p) {
        List<Interval> roots = RealRoots.of(p);
        assertThat(roots).allMatch(Interval::isPoint);
        return roots.stream().map(Interval::lower).toList();
    }

    @Test
    void theTwentyIntegerRootsOfWilkinsonsPolynomialAreExact() {
        Polynomial p = Polynomial.ONE;
        for (int k = 1; k <= 20; k++) {
            p = p.multiply(root(Rational.of(k)));
        }
        assertThat(points(p)).extracting(Rational::intValueExact).containsExactly(
                1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17, 18, 19, 20);
    }

    @Test
    void closeRationalRootsAreSeparated() {
        Rational tiny = Rational.of(BigInteger.ONE, BigInteger.TEN.pow(30));
        Rational third = Rational.of(1, 3);
        Polynomial p = root(third).multiply(root(third.add(tiny))).multiply(root(third.subtract(tiny)));
        assertThat(points(p)).containsExactly(third.subtract(tiny), third, third.add(tiny));
    }

    @Test
    void rationalRootsWithLongDenominatorsAreRecognised() {
        Rational a = Rational.of(new BigInteger("123456789012345678901234567"), new BigInteger("998877665544332211"));
        Rational b = Rational.of(-7, 1_000_003);
        assertThat(points(root(a).multiply(root(b)).multiply(of(3)))).containsExactly(b, a);
    }

    @Test
    void irrationalRootsLieInIsolatingIntervals() {
        // (u^2-2)(u^2-3)(2u-1): -sqrt3, -sqrt2, 1/2, sqrt2, sqrt3
        Polynomial p = of(-2, 0, 1).multiply(of(-3, 0, 1)).multiply(of(-1, 2));
        List<Interval> roots = RealRoots.of(p);
        assertThat(roots).hasSize(5);
        double[] expected = {-Math.sqrt(3), -Math.sqrt(2), 0.5, Math.sqrt(2), Math.sqrt(3)};
        for (int k = 0; k < 5; k++) {
            Interval narrow = RealRoots.refine(p, roots.get(k), Rational.of(1, 1L << 40));
            assertThat(narrow.lower().toDouble()).isLessThanOrEqualTo(expected[k] + 1e-15);
            assertThat(narrow.upper().toDouble()).isGreaterThanOrEqualTo(expected[k] - 1e-15);
            assertThat(narrow.width()).isLessThan(Rational.of(1, 1L << 40));
            assertThat(roots.get(k).isPoint()).isEqualTo(k == 2);
        }
        for (int k = 1; k < 5; k++) {
            assertThat(roots.get(k - 1).upper()).isLessThanOrEqualTo(roots.get(k).lower());
        }
    }

    @Test
    void closeIrrationalRootsAreSeparated() {
        // u^2 - 2 and (10^12 u)^2 - 2 10^24 - 1: roots 3.5e-25 apart
        Polynomial p = of(-2, 0, 1).multiply(Polynomial.of(List.of(
                Rational.of(BigInteger.TWO.multiply(BigInteger.TEN.pow(24)).add(BigInteger.ONE)).negate(),
                Rational.ZERO,
                Rational.of(BigInteger.TEN.pow(24)))));
        List<Interval> roots = RealRoots.of(p);
        assertThat(roots).hasSize(4).noneMatch(Interval::isPoint);
        assertThat(roots.get(2).upper()).isLessThanOrEqualTo(roots.get(3).lower());
    }

    @Test
    void complexRootsAreNotCounted() {
        assertThat(RealRoots.of(of(1, 0, 1))).isEmpty();
        assertThat(RealRoots.of(of(5))).isEmpty();
        assertThat(points(of(0, 1, 0, 1))).containsExactly(Rational.ZERO);
    }

    @Test
    void squarefreeFactorsCollectRootsByMultiplicity() {
        Polynomial p = root(Rational.ONE)
                .multiply(root(Rational.TWO).power(2))
                .multiply(of(-2, 0, 1).power(2))
                .multiply(root(Rational.of(-1, 3)).power(5))
                .multiply(Rational.of(7));
        List<Polynomial> factors = RealRoots.squarefreeFactors(p);
        assertThat(factors).hasSize(5);
        assertThat(factors.get(0)).isEqualTo(root(Rational.ONE));
        assertThat(factors.get(1)).isEqualTo(root(Rational.TWO).multiply(of(-2, 0, 1)));
        assertThat(factors.get(2)).isEqualTo(Polynomial.ONE);
        assertThat(factors.get(3)).isEqualTo(Polynomial.ONE);
        assertThat(factors.get(4)).isEqualTo(root(Rational.of(-1, 3)));
        Polynomial product = Polynomial.ONE;
        for (int k = 0; k < factors.size(); k++) {
            product = product.multiply(factors.get(k).power(k + 1));
        }
        assertThat(product.multiply(Rational.of(7))).isEqualTo(p);
    }

    @Test
    void complexPairsAreListedByDistance() {
        // (u^2+1)(u^2-2u+5)(u-3): +-i and 1 +- 2i
        List<ComplexRoots.Pair> pairs = ComplexRoots.of(of(1, 0, 1).multiply(of(5, -2, 1)).multiply(of(-3, 1)));
        assertThat(pairs).hasSize(2);
        assertThat(pairs.get(0).re()).isCloseTo(0, org.assertj.core.data.Offset.offset(1e-9));
        assertThat(pairs.get(0).im()).isCloseTo(1, org.assertj.core.data.Offset.offset(1e-9));
        assertThat(pairs.get(1).re()).isCloseTo(1, org.assertj.core.data.Offset.offset(1e-9));
        assertThat(pairs.get(1).im()).isCloseTo(2, org.assertj.core.data.Offset.offset(1e-9));
        assertThat(ComplexRoots.of(of(-2, 0, 1))).isEmpty();
    }
}
