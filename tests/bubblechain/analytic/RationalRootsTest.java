package bubblechain.analytic;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.Rational;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;

class RationalRootsTest {
    @Test
    void rootsThatWereMultipliedInComeBackWithTheirMultiplicitiesSeed31() {
        Random source = new Random(31);
        // u^3 - u + 2
        Polynomial rest = Polynomial.of(List.of(Rational.of(2), Rational.of(-1), Rational.ZERO, Rational.ONE));
        for (int trial = 0; trial < 60; trial++) {
            Map<Rational, Integer> expected = new TreeMap<>();
            Polynomial product = rest.multiply(Rational.of(-5, 7));
            for (int k = source.nextInt(12); k > 0; k--) {
                Rational root = Rational.of(source.nextInt(61) - 30, 1 + source.nextInt(12));
                expected.merge(root, 1, Integer::sum);
                product = product.multiply(Polynomial.linear(root.negate(), Rational.ONE));
            }
            RationalRoots.Split split = RationalRoots.of(product);
            assertThat(split.roots()).isEqualTo(expected);
            assertThat(split.rest()).isEqualTo(rest);
        }
    }

    @Test
    void aPochhammerProductOfSixtyFactorsSplitsAltogether() {
        Polynomial product = Polynomial.ONE;
        for (int k = 0; k < 60; k++) {
            product = product.multiply(Polynomial.linear(Rational.of(3 * k + 1, 3), Rational.of(-2)));
        }
        RationalRoots.Split split = RationalRoots.of(product);
        assertThat(split.roots()).hasSize(60).containsKey(Rational.of(1, 6));
        assertThat(split.rest()).isEqualTo(Polynomial.ONE);
    }

    @Test
    void constantsAndPolynomialsWithoutRationalRootsStayWhole() {
        assertThat(RationalRoots.of(Polynomial.constant(Rational.of(-3))).rest()).isEqualTo(Polynomial.ONE);
        Polynomial square = Polynomial.of(List.of(Rational.of(-2), Rational.ZERO, Rational.ONE));
        assertThat(RationalRoots.of(square).rest()).isEqualTo(square);
        assertThat(RationalRoots.of(square).roots()).isEmpty();
    }

    @Test
    void aDenominatorThatThePrimeDividesOnlyHidesTheRoots() {
        Rational prime = Rational.of(Integer.MAX_VALUE);
        Polynomial product = Polynomial.linear(Rational.ONE, Rational.ONE)
                .multiply(Polynomial.linear(prime.inverse(), Rational.ONE));
        RationalRoots.Split split = RationalRoots.of(product);
        assertThat(split.rest()).isEqualTo(product);
    }
}
