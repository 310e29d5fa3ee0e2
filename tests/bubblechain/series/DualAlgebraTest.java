package bubblechain.series;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;

/** Functions of x and t to first order in t, against derivatives taken by hand and by difference-free algebra. */
class DualAlgebraTest {
    private static final int LENGTH = 7;

    private final CoefficientwiseAlgebra<ExactConstant> base = CoefficientwiseAlgebra.of(ExactRing.INSTANCE, LENGTH);
    private final DualAlgebra<LaurentSeries<ExactConstant>> dual = DualAlgebra.over(base);
    private final Dual<LaurentSeries<ExactConstant>> t = dual.secondVariable();
    private final Dual<LaurentSeries<ExactConstant>> x = dual.linear(ExactConstant.ZERO, ExactConstant.ONE);
    private final Dual<LaurentSeries<ExactConstant>> one = dual.constant(ExactConstant.ONE);

    private Dual<LaurentSeries<ExactConstant>> subtract(
            Dual<LaurentSeries<ExactConstant>> left, Dual<LaurentSeries<ExactConstant>> right) {
        return dual.add(left, dual.negate(right));
    }

    private void assertEqual(LaurentSeries<ExactConstant> left, LaurentSeries<ExactConstant> right) {
        int end = Math.min(left.end(), right.end());
        assertThat(end).isGreaterThanOrEqualTo(LENGTH - 4);
        for (int k = Math.min(left.lowest(), right.lowest()); k < end; k++) {
            assertThat(base.coefficient(left, k)).as("power %d", k).isEqualTo(base.coefficient(right, k));
        }
    }

    @Test
    void theSquareOfTheSecondVariableVanishes() {
        Dual<LaurentSeries<ExactConstant>> square = dual.multiply(t, t);
        assertThat(square.value().length()).isZero();
        assertThat(square.derivative().length()).isZero();
        assertThat(dual.power(t, 2).derivative().length()).isZero();
    }

    @Test
    void gammaInTwoVariablesHasTheLeadingCoefficientsOfItsTaylorSeries() {
        // gamma(1+t-x) = 1 - gE (t-x) + (gE^2 + pi^2/6)(t-x)^2/2 + ...: d/dt = -gE - (gE^2 + pi^2/6) x + ...
        Dual<LaurentSeries<ExactConstant>> gamma = dual.gamma(dual.add(one, subtract(t, x)));
        ExactConstant euler = ExactConstant.EULER_GAMMA;
        ExactConstant second = euler.power(2).add(ExactFunctions.zeta(2));
        assertThat(base.coefficient(gamma.value(), 0)).isEqualTo(ExactConstant.ONE);
        assertThat(base.coefficient(gamma.value(), 1)).isEqualTo(euler);
        assertThat(base.coefficient(gamma.value(), 2)).isEqualTo(second.divide(Rational.TWO));
        assertThat(base.coefficient(gamma.derivative(), 0)).isEqualTo(euler.negate());
        assertThat(base.coefficient(gamma.derivative(), 1)).isEqualTo(second.negate());
    }

    @Test
    void theDerivativeOfAFunctionOfXPlusTIsItsDerivativeInX() {
        check(dual::exp, base::exp, Rational.ZERO);
        check(dual::sin, base::sin, Rational.ZERO);
        check(dual::cos, base::cos, Rational.ZERO);
        check(dual::ln, base::ln, Rational.ONE);
        check(dual::gamma, base::gamma, Rational.HALF);
        check(dual::gamma, base::gamma, Rational.ZERO);
        check(dual::gamma, base::gamma, Rational.of(-2));
        check(dual::inverse, base::inverse, Rational.of(3));
        check(dual::inverse, base::inverse, Rational.ZERO);
        check(z -> dual.polygamma(1, z), z -> base.polygamma(1, z), Rational.of(-1));
        check(z -> dual.power(z, 4), z -> base.power(z, 4), Rational.TWO);
        check(z -> dual.power(z, -2), z -> base.power(z, -2), Rational.ZERO);
        check(z -> dual.power(z, 1), z -> base.power(z, 1), Rational.TWO);
    }

    private void check(
            UnaryOperator<Dual<LaurentSeries<ExactConstant>>> inTwoVariables,
            UnaryOperator<LaurentSeries<ExactConstant>> inOne,
            Rational point) {
        Dual<LaurentSeries<ExactConstant>> z = dual.add(dual.linear(ExactConstant.of(point), ExactConstant.ONE), t);
        Dual<LaurentSeries<ExactConstant>> value = inTwoVariables.apply(z);
        LaurentSeries<ExactConstant> expected = inOne.apply(z.value());
        assertEqual(value.value(), expected);
        java.util.List<ExactConstant> terms = new java.util.ArrayList<>();
        for (int k = expected.lowest(); k < expected.end(); k++) {
            terms.add(base.coefficient(expected, k).multiply(Rational.of(k)));
        }
        assertEqual(value.derivative(), base.series(expected.lowest() - 1, terms));
    }

    @Test
    void aProductOfGammasObeysTheRecurrenceInBothVariables() {
        // gamma(2+t-x) = (1+t-x) gamma(1+t-x) and its t-derivative
        Dual<LaurentSeries<ExactConstant>> z = dual.add(one, subtract(t, x));
        Dual<LaurentSeries<ExactConstant>> left = dual.gamma(dual.add(one, z));
        Dual<LaurentSeries<ExactConstant>> right = dual.multiply(z, dual.gamma(z));
        assertEqual(left.value(), right.value());
        assertEqual(left.derivative(), right.derivative());
    }

    @Test
    void multiplicationIsAssociativeAndDistributive() {
        Dual<LaurentSeries<ExactConstant>> a = dual.add(dual.exp(x), t);
        Dual<LaurentSeries<ExactConstant>> b = dual.gamma(dual.add(one, dual.multiply(dual.add(x, t), Rational.of(-2))));
        Dual<LaurentSeries<ExactConstant>> c = dual.inverse(dual.add(dual.constant(ExactConstant.of(3)), dual.multiply(x, t)));
        Dual<LaurentSeries<ExactConstant>> left = dual.multiply(dual.multiply(a, b), c);
        Dual<LaurentSeries<ExactConstant>> right = dual.multiply(a, dual.multiply(b, c));
        assertEqual(left.value(), right.value());
        assertEqual(left.derivative(), right.derivative());
        Dual<LaurentSeries<ExactConstant>> sum = dual.multiply(a, dual.add(b, c));
        Dual<LaurentSeries<ExactConstant>> parts = dual.add(dual.multiply(a, b), dual.multiply(a, c));
        assertEqual(sum.value(), parts.value());
        assertEqual(sum.derivative(), parts.derivative());
    }

    @Test
    void tailsDoNotDependOnTheSecondVariable() {
        assertThat(dual.logGammaTail(Rational.ONE, Rational.TWO).derivative().length()).isZero();
        assertThat(dual.polygammaTail(1, Rational.ONE, Rational.TWO).derivative().length()).isZero();
        assertEqual(dual.polygammaTail(1, Rational.HALF, Rational.TWO).value(), base.polygammaTail(1, Rational.HALF, Rational.TWO));
    }
}
