package bubblechain.analytic;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.analytic.ArcBound.Bound;
import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Magnitude;
import bubblechain.exact.Rational;
import bubblechain.series.LaurentSeries;
import java.math.BigInteger;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.assertj.core.data.Offset;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Bounds on circles against reference-values/generated/arc-values.csv (mpmath) and against exact coefficients. */
class ArcBoundTest {
    private static final String POLE_MASS = "exp(5*u/3)*6*(1-u)*gamma(u)*gamma(1-2*u)/gamma(3-u)";
    private static final String POTENTIAL = "gamma(1/2-u)*exp(5*u/3)/(sqrt(pi)*4^u*gamma(1+u))";
    private static final String ADLER = "8*exp(5*u/3)*(polygamma(1,(1+u)/2)-polygamma(1,(2+u)/2)-polygamma(1,(3-u)/2)"
            + "+polygamma(1,(4-u)/2))/4/((1-u)*(2-u))";
    private static final String RATIONAL = "sin(1+3*u/2)*(1-2*u)/((9/4-u^2)*(3-u)^2)+cos(u/3)";
    private static final int BITS = 700;
    private static final int LAST = 60;

    @Test
    void boundsHoldAtEveryReferencePointOfTheirCircle() {
        Map<String, Bound> bounds = new HashMap<>();
        int compared = 0;
        for (ArcValues.Row row : ArcValues.rows()) {
            if (!row.radius().isEmpty()) {
                Bound bound = bounds.computeIfAbsent(
                        row.formula() + row.radius(), key -> ArcBound.remainder(row.form(), row.circle()));
                assertThat(row.lnModulus())
                        .as("%s at %s + %s i", row.formula(), row.re(), row.im())
                        .isLessThanOrEqualTo(bound.logarithm());
                compared++;
            }
        }
        assertThat(compared).isGreaterThan(600);
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 5, 17, 1000})
    void boundsExceedTheTrueMaximaByLittleWhateverTheFirstArcs(int arcs) {
        for (ArcValues.Row row : ArcValues.rows()) {
            if (row.kind().equals("maximum")) {
                Bound bound = ArcBound.maximum(row.form(), row.circle(), arcs);
                assertThat(bound.logarithm() - row.lnModulus())
                        .as("%s, radius %s", row.formula(), row.radius())
                        .isBetween(0.0, 0.06);
                assertThat(bound.attained()).isLessThanOrEqualTo(row.lnModulus() + 1e-9);
                assertThat(bound.arcs()).isBetween(arcs, ArcBound.ARC_LIMIT);
            }
        }
    }

    @ParameterizedTest
    @CsvSource({"0.75", "1.25", "3.25", "10.25"})
    void poleMassCoefficientsWithoutThePolesInsideStayWithinCauchysBound(double radius) {
        assertCauchy(POLE_MASS, radius);
    }

    @ParameterizedTest
    @CsvSource({"1", "3", "7"})
    void potentialCoefficientsWithoutThePolesInsideStayWithinCauchysBound(double radius) {
        assertCauchy(POTENTIAL, radius);
    }

    @ParameterizedTest
    @CsvSource({"0.5", "1.5", "2.5", "3.5", "10.5"})
    void adlerCoefficientsWithoutThePolesInsideStayWithinCauchysBound(double radius) {
        assertCauchy(ADLER, radius);
    }

    @ParameterizedTest
    @CsvSource({"1", "2.25", "5"})
    void sineAndRationalCoefficientsWithoutThePolesInsideStayWithinCauchysBound(double radius) {
        assertCauchy(RATIONAL, radius);
    }

    /** |c_n - sum over poles inside of [u^n] of their principal parts| <= M R^-n, and not far below for some n. */
    private static void assertCauchy(String formula, double radius) {
        NormalForm form = ArcValues.form(formula);
        Bound bound = ArcBound.remainder(form, radius);
        LaurentSeries<Ball> series = Expansion.about(Rational.ZERO, form).balls(LAST + 1, BITS);
        Rational end = Rational.parse(Double.toString(radius));
        List<Pole> poles = SingularityList.of(form).poles(end.negate(), end).stream()
                .filter(p -> !p.point().isZero())
                .toList();
        double closest = Double.NEGATIVE_INFINITY;
        for (int n = 0; n <= LAST; n++) {
            Ball rest = series.coefficients().get(n - series.lowest());
            for (Pole pole : poles) {
                rest = rest.subtract(share(pole, n), BITS);
            }
            Ball size = rest.abs();
            assertThat(size.upper())
                    .as("%s, radius %s, n = %s", formula, radius, n)
                    .isLessThanOrEqualTo(bound.coefficientBound(n).toRational());
            if (!size.containsZero()) {
                Rational scaled = size.lower().divide(bound.coefficientBound(n).toRational());
                closest = Math.max(closest, Math.log(scaled.toDouble()));
            }
        }
        assertThat(closest).as("closest approach of %s on %s, in ln", formula, radius).isGreaterThan(-8);
    }

    /** [u^n] of sum_j a_j (u - p)^-j: a_j (-p)^-j binomial(n+j-1, n) p^-n. */
    private static Ball share(Pole pole, int n) {
        List<Ball> laurent = pole.balls(BITS);
        Ball sum = Ball.ZERO;
        for (int j = 1; j <= pole.order(); j++) {
            BigInteger binomial = ExactFunctions.factorial(n + j - 1)
                    .divide(ExactFunctions.factorial(n).multiply(ExactFunctions.factorial(j - 1)));
            Rational factor =
                    pole.point().negate().power(-j).multiply(pole.point().power(-n)).multiply(Rational.of(binomial));
            sum = sum.add(laurent.get(pole.order() - j).multiply(factor, BITS), BITS);
        }
        return sum;
    }

    @Test
    void theBoundOfACoefficientIsMaximumTimesPowerOfTheRadius() {
        Bound bound = ArcBound.remainder(ArcValues.form("exp(u)"), 4);
        assertThat(bound.logarithm()).isBetween(4.0, 4.05);
        assertThat(bound.coefficientLogarithm(3))
                .isCloseTo(bound.logarithm() - 3 * Math.log(4), Offset.offset(1e-13))
                .isGreaterThanOrEqualTo(bound.logarithm() - 3 * Math.log(4));
        Magnitude magnitude = bound.coefficientBound(3);
        assertThat(magnitude.toDouble()).isCloseTo(Math.exp(bound.coefficientLogarithm(3)), Offset.offset(1e-12));
        // far outside the range of doubles: log2 of e^-3000 is -4328.08
        Bound tiny = ArcBound.remainder(ArcValues.form("exp(-3000)*u^4"), 1);
        assertThat(tiny.coefficientBound(0).exponent()).isEqualTo(-4328);
    }

    @Test
    void theZeroFormHasTheBoundZero() {
        Bound bound = ArcBound.remainder(NormalForm.ZERO, 2);
        assertThat(bound.logarithm()).isEqualTo(Double.NEGATIVE_INFINITY);
        assertThat(bound.coefficientBound(5)).isEqualTo(Magnitude.ZERO);
    }

    @Test
    void aCircleThroughAPoleIsRefused() {
        assertThatThrownBy(() -> ArcBound.remainder(ArcValues.form(POTENTIAL), 0.5))
                .isInstanceOf(DomainException.class)
                .hasMessage("the circle |u| = 0.5 passes through a singular point of a term, or very close to one,"
                        + " where the argument of u is about 0.000 pi; choose a radius between the circles of poles");
        assertThatThrownBy(() -> ArcBound.remainder(ArcValues.form("1/(u^2+1)"), 1))
                .isInstanceOf(DomainException.class)
                .hasMessageContaining("about 0.500 pi");
        assertThatThrownBy(() -> ArcBound.remainder(ArcValues.form("digamma(u)"), 3))
                .isInstanceOf(DomainException.class);
    }

    @Test
    void wrongRadiiAndNumbersOfArcsAreRefused() {
        for (double radius : new double[] {0, -1, Double.NaN, Double.POSITIVE_INFINITY}) {
            assertThatThrownBy(() -> ArcBound.remainder(NormalForm.ONE, radius))
                    .isInstanceOf(DomainException.class)
                    .hasMessage("the radius of a circle must be positive and finite, got " + radius);
        }
        for (int arcs : new int[] {0, 4097}) {
            assertThatThrownBy(() -> ArcBound.maximum(NormalForm.ONE, 1, arcs))
                    .isInstanceOf(DomainException.class)
                    .hasMessage("the number of arcs lies between 1 and 4096, got " + arcs);
        }
    }

    @Test
    void theRadiusLiesInTheWidestGapBetweenCirclesOfPoles() {
        NormalForm poleMass = ArcValues.form(POLE_MASS);
        assertThat(ArcBound.radiusBetween(poleMass, Rational.of(3), Rational.of(7, 2))).isEqualTo(3.25);
        assertThat(ArcBound.radiusBetween(poleMass, Rational.ZERO, Rational.HALF)).isEqualTo(0.25);
        NormalForm rational = ArcValues.form("1/((u-1)*(u^2-2)*(u^2+9))");
        assertThat(ArcBound.radiusBetween(rational, Rational.ZERO, Rational.of(20)))
                .isEqualTo(11.5, Offset.offset(1e-9));
        assertThat(ArcBound.radiusBetween(rational, Rational.ONE, Rational.of(3)))
                .isEqualTo((Math.sqrt(2) + 3) / 2, Offset.offset(1e-9));
        assertThatThrownBy(() -> ArcBound.radiusBetween(poleMass, Rational.ONE, Rational.ONE))
                .isInstanceOf(DomainException.class)
                .hasMessage("the radii must satisfy 0 <= inner < outer, got 1 and 1");
    }
}
