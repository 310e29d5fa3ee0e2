package bubblechain.series;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.PrecisionException;
import bubblechain.exact.Rational;
import java.util.List;
import org.junit.jupiter.api.Test;

/** The laws every algebra of series over a ring obeys, for each ring that has one. */
abstract class SeriesAlgebraLaws<C> {
    private static final int LENGTH = 7;

    abstract CoefficientRing<C> ring();

    /** Equal numbers as far as this ring can tell. */
    abstract boolean agree(C left, C right);

    final CoefficientwiseAlgebra<C> algebra = CoefficientwiseAlgebra.of(ring(), LENGTH);

    private void assertEqual(LaurentSeries<C> left, LaurentSeries<C> right, String law) {
        int end = Math.min(left.end(), right.end());
        assertThat(end).as("known terms: %s", law).isGreaterThan(Math.min(left.lowest(), right.lowest()) - 1);
        for (int k = Math.min(left.lowest(), right.lowest()); k < end; k++) {
            C a = algebra.coefficient(left, k);
            C b = algebra.coefficient(right, k);
            assertThat(agree(a, b)).as("%s, power %d: %s and %s", law, k, a, b).isTrue();
        }
    }

    private LaurentSeries<C> one() {
        return algebra.constant(ExactConstant.ONE);
    }

    private LaurentSeries<C> x() {
        return algebra.linear(ExactConstant.ZERO, ExactConstant.ONE);
    }

    private LaurentSeries<C> subtract(LaurentSeries<C> left, LaurentSeries<C> right) {
        return algebra.add(left, algebra.negate(right));
    }

    private LaurentSeries<C> constant(Rational value) {
        return algebra.constant(ExactConstant.of(value));
    }

    @Test
    void seriesAreARingOnSeed41() {
        RandomSeries<C> random = new RandomSeries<>(algebra, 41);
        for (int k = 0; k < 60; k++) {
            LaurentSeries<C> a = random.any();
            LaurentSeries<C> b = random.any();
            LaurentSeries<C> c = random.any();
            assertEqual(algebra.add(a, b), algebra.add(b, a), "a+b = b+a");
            assertEqual(algebra.add(algebra.add(a, b), c), algebra.add(a, algebra.add(b, c)), "(a+b)+c = a+(b+c)");
            assertEqual(algebra.multiply(a, b), algebra.multiply(b, a), "ab = ba");
            assertEqual(
                    algebra.multiply(algebra.multiply(a, b), c), algebra.multiply(a, algebra.multiply(b, c)), "(ab)c = a(bc)");
            assertEqual(
                    algebra.multiply(a, algebra.add(b, c)),
                    algebra.add(algebra.multiply(a, b), algebra.multiply(a, c)),
                    "a(b+c) = ab+ac");
            assertEqual(algebra.multiply(a, Rational.of(-3, 2)), algebra.multiply(a, constant(Rational.of(-3, 2))), "ra");
            assertEqual(algebra.shift(a, 3), algebra.multiply(a, algebra.power(x(), 3)), "x^3 a");
        }
    }

    @Test
    void productsAndQuotientsWithPolynomialsAgreeWithSeriesOnSeed42() {
        RandomSeries<C> random = new RandomSeries<>(algebra, 42);
        List<Rational> polynomial = List.of(Rational.of(2, 3), Rational.ZERO, Rational.of(-5), Rational.of(1, 7));
        LaurentSeries<C> series = algebra.series(0, polynomialTerms(polynomial));
        for (int k = 0; k < 30; k++) {
            LaurentSeries<C> a = random.any();
            assertEqual(algebra.multiply(a, polynomial), algebra.multiply(a, series), "a p");
            assertEqual(algebra.divide(a, polynomial), algebra.multiply(a, algebra.inverse(series)), "a/p");
            assertEqual(algebra.multiply(algebra.divide(a, polynomial), polynomial), a, "(a/p) p = a");
        }
    }

    private List<C> polynomialTerms(List<Rational> polynomial) {
        return java.util.stream.IntStream.range(0, LENGTH)
                .mapToObj(k -> algebra.ring().constant(k < polynomial.size() ? polynomial.get(k) : Rational.ZERO))
                .toList();
    }

    @Test
    void inverseAndPowersUndoEachOtherOnSeed43() {
        RandomSeries<C> random = new RandomSeries<>(algebra, 43);
        for (int k = 0; k < 40; k++) {
            LaurentSeries<C> a = algebra.shift(random.unit(), k % 5 - 2);
            assertEqual(algebra.multiply(a, algebra.inverse(a)), one(), "a/a = 1");
            assertEqual(algebra.power(a, -3), algebra.inverse(algebra.multiply(a, algebra.multiply(a, a))), "a^-3");
            assertEqual(algebra.power(a, 5), algebra.multiply(algebra.power(a, 2), algebra.power(a, 3)), "a^5 = a^2 a^3");
            assertEqual(algebra.power(a, 0), one(), "a^0 = 1");
        }
    }

    @Test
    void exponentialAndLogarithmObeyTheirLawsOnSeed44() {
        RandomSeries<C> random = new RandomSeries<>(algebra, 44);
        for (int k = 0; k < 30; k++) {
            LaurentSeries<C> a = random.small();
            LaurentSeries<C> b = random.small();
            LaurentSeries<C> unit = random.unit();
            assertEqual(
                    algebra.exp(algebra.add(a, b)), algebra.multiply(algebra.exp(a), algebra.exp(b)), "e^(a+b) = e^a e^b");
            assertEqual(algebra.ln(algebra.exp(a)), a, "ln e^a = a");
            assertEqual(algebra.exp(algebra.ln(unit)), unit, "e^(ln a) = a");
            assertEqual(
                    algebra.ln(algebra.multiply(unit, algebra.exp(a))), algebra.add(algebra.ln(unit), a), "ln(ab)");
        }
    }

    @Test
    void sineAndCosineObeyTheirLawsOnSeed45() {
        RandomSeries<C> random = new RandomSeries<>(algebra, 45);
        for (int k = 0; k < 25; k++) {
            LaurentSeries<C> a = random.small();
            LaurentSeries<C> b = random.small();
            LaurentSeries<C> sin = algebra.sin(a);
            LaurentSeries<C> cos = algebra.cos(a);
            assertEqual(algebra.add(algebra.multiply(sin, sin), algebra.multiply(cos, cos)), one(), "sin^2 + cos^2 = 1");
            assertEqual(
                    algebra.sin(algebra.add(a, b)),
                    algebra.add(algebra.multiply(sin, algebra.cos(b)), algebra.multiply(cos, algebra.sin(b))),
                    "sin(a+b)");
            // shifted by pi/6: sin(pi/6 + a) = cos(a)/2 + sin(a) sqrt(3)/2
            LaurentSeries<C> shifted = algebra.add(algebra.constant(ExactConstant.PI.divide(Rational.of(6))), a);
            LaurentSeries<C> half = algebra.multiply(algebra.constant(ExactConstant.of(3).ln().divide(Rational.TWO).exp()), sin);
            assertEqual(
                    algebra.sin(shifted), algebra.multiply(algebra.add(cos, half), Rational.HALF), "sin(pi/6 + a)");
        }
    }

    /** Constant terms at which gamma has a closed form, a pole or none. */
    private static final List<Rational> POINTS = List.of(
            Rational.ONE, Rational.of(3), Rational.HALF, Rational.of(-3, 2), Rational.ZERO, Rational.of(-1), Rational.of(-4));

    @Test
    void gammaObeysItsRecurrenceOnSeed46() {
        RandomSeries<C> random = new RandomSeries<>(algebra, 46);
        for (Rational point : POINTS) {
            for (int k = 0; k < 4; k++) {
                LaurentSeries<C> z = algebra.add(constant(point), algebra.multiply(x(), random.unit()));
                LaurentSeries<C> next = algebra.add(z, one());
                // DLMF 5.5.1
                assertEqual(algebra.gamma(next), algebra.multiply(z, algebra.gamma(z)), "gamma(z+1) = z gamma(z) at " + point);
            }
        }
    }

    @Test
    void gammaObeysItsReflectionFormulaOnSeed47() {
        RandomSeries<C> random = new RandomSeries<>(algebra, 47);
        for (Rational point : POINTS) {
            LaurentSeries<C> z = algebra.add(constant(point), algebra.multiply(x(), random.unit()));
            LaurentSeries<C> product = algebra.multiply(algebra.gamma(z), algebra.gamma(subtract(one(), z)));
            LaurentSeries<C> piZ = algebra.add(
                    algebra.constant(ExactConstant.PI.multiply(point)),
                    algebra.multiply(algebra.constant(ExactConstant.PI), subtract(z, constant(point))));
            // DLMF 5.5.3
            assertEqual(
                    algebra.multiply(product, algebra.sin(piZ)),
                    algebra.constant(ExactConstant.PI),
                    "gamma(z) gamma(1-z) sin(pi z) = pi at " + point);
        }
    }

    private LaurentSeries<C> derivative(LaurentSeries<C> f) {
        List<C> terms = new java.util.ArrayList<>();
        for (int k = f.lowest(); k < f.end(); k++) {
            terms.add(algebra.ring().multiply(algebra.coefficient(f, k), Rational.of(k)));
        }
        return algebra.series(f.lowest() - 1, terms);
    }

    @Test
    void polygammasAreDerivativesOfLogGamma() {
        for (Rational point : POINTS) {
            LaurentSeries<C> z = algebra.linear(ExactConstant.of(point), ExactConstant.ONE);
            LaurentSeries<C> gamma = algebra.gamma(z);
            LaurentSeries<C> logarithmic = algebra.multiply(derivative(gamma), algebra.inverse(gamma));
            assertEqual(algebra.polygamma(0, z), logarithmic, "psi = gamma'/gamma at " + point);
            for (int n = 0; n < 3; n++) {
                assertEqual(
                        derivative(algebra.polygamma(n, z)), algebra.polygamma(n + 1, z), "psi^(n)' at " + point + ", n = " + n);
            }
        }
    }

    @Test
    void tailsAgreeWithTheFunctionsThemselves() {
        for (Rational s : List.of(Rational.ONE, Rational.HALF)) {
            for (Rational slope : List.of(Rational.ONE, Rational.of(-2), Rational.of(3, 2))) {
                LaurentSeries<C> z = algebra.linear(ExactConstant.of(s), ExactConstant.of(slope));
                LaurentSeries<C> ratio = algebra.multiply(
                        algebra.gamma(z), algebra.inverse(algebra.gamma(constant(s))));
                assertEqual(algebra.exp(algebra.logGammaTail(s, slope)), ratio, "gamma(s + b x)/gamma(s)");
                for (int n = 0; n < 3; n++) {
                    assertEqual(algebra.polygammaTail(n, s, slope), algebra.polygamma(n, z), "psi^(n)(s + b x)");
                }
            }
        }
    }

    @Test
    void functionsOfASeriesOfOneTermDoNotInventMoreTerms() {
        LaurentSeries<C> two = new LaurentSeries<>(0, List.of(algebra.ring().constant(Rational.TWO)));
        for (LaurentSeries<C> value : List.of(
                algebra.gamma(two), algebra.polygamma(1, two), algebra.exp(two), algebra.ln(two), algebra.sin(two),
                algebra.cos(two), algebra.inverse(two), algebra.power(two, 3))) {
            assertThat(value.end()).isEqualTo(1);
        }
    }

    @Test
    void anUnknownRemainderStaysUnknown() {
        LaurentSeries<C> unknown = new LaurentSeries<>(2, List.of());
        assertThat(algebra.multiply(unknown, x()).end()).isEqualTo(3);
        assertThat(algebra.add(unknown, one()).end()).isEqualTo(2);
        assertThatThrownBy(() -> algebra.inverse(unknown))
                .isInstanceOf(PrecisionException.class)
                .hasMessage("division by a series that vanishes through all 7 terms computed");
        assertThatThrownBy(() -> algebra.coefficient(one(), LENGTH))
                .isInstanceOf(PrecisionException.class)
                .hasMessage("the series ends before x^7");
    }

    @Test
    void essentialSingularitiesAreRefused() {
        LaurentSeries<C> pole = algebra.inverse(x());
        assertThatThrownBy(() -> algebra.exp(pole))
                .isInstanceOf(DomainException.class)
                .hasMessage("exp of an argument that is infinite at this point");
        assertThatThrownBy(() -> algebra.gamma(pole))
                .isInstanceOf(DomainException.class)
                .hasMessage("gamma of an argument that is infinite at this point");
        assertThatThrownBy(() -> algebra.ln(x()))
                .isInstanceOf(DomainException.class)
                .hasMessage("the logarithm of a series needs a constant term that is not zero");
    }

    @Test
    void anAlgebraWithoutTermsIsRefused() {
        assertThatThrownBy(() -> CoefficientwiseAlgebra.of(ring(), 0))
                .isInstanceOf(DomainException.class)
                .hasMessage("a series needs at least one term, got 0");
    }
}
