package bubblechain.analytic;

import static bubblechain.analytic.Forms.constant;
import static bubblechain.analytic.Forms.form;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import bubblechain.formula.Formula;
import bubblechain.series.CoefficientwiseAlgebra;
import bubblechain.series.ExactRing;
import bubblechain.series.LaurentSeries;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class PoleListTest {
    private static List<Pole> poles(String text, int from, int to) {
        return SingularityList.of(form(text)).poles(Rational.of(from), Rational.of(to));
    }

    private static Pole pole(String text, String point) {
        return Pole.of(form(text), Rational.parse(point)).orElseThrow();
    }

    /** exp(5 u0/3) times a rational. */
    private static ExactConstant times(Rational factor, Rational u0) {
        return ExactConstant.of(Rational.of(5, 3).multiply(u0)).exp().multiply(factor);
    }

    @Test
    void poleMassPolesBetweenMinusFourAndSixAreThoseOfTheLiterature() {
        List<Pole> found = poles(Forms.POLE_MASS, -4, 6);
        assertThat(found).extracting(p -> p.point().toString()).containsExactly(
                "-4", "-3", "-2", "-1", "0", "1/2", "3/2", "2", "5/2", "7/2", "9/2", "11/2");
        assertThat(found).allMatch(p -> p.order() == 1 && p.status() == PoleStatus.EXACT);
    }

    @Test
    void poleMassResiduesAreExact() {
        // Beneke, Braun hep-ph/9402364 and Ball, Beneke, Braun hep-ph/9502300: R e^(-5 u0/3) at 1/2 .. 5/2, -1, -2
        Map<String, String> residues = new TreeMap<>(Map.of(
                "1/2", "-2", "3/2", "3/4", "2", "-1/2", "5/2", "9/64", "-1", "-4", "-2", "9", "0", "3"));
        residues.forEach((point, residue) -> {
            Pole pole = pole(Forms.POLE_MASS, point);
            assertThat(pole.residue()).as(point).isEqualTo(times(Rational.parse(residue), pole.point()));
            assertThat(pole.laurent()).hasSize(1);
        });
        assertThat(Pole.of(form(Forms.POLE_MASS), Rational.ONE)).isEmpty();
        assertThat(Pole.of(form(Forms.POLE_MASS), Rational.of(3))).isEmpty();
    }

    @Test
    void poleMassResiduesAtOddHalvesFollowFromThePolesOfGamma() {
        for (int k = 1; k <= 15; k += 2) {
            // gamma(1-2u) has the residue -(-1)^(k-1)/(2 (k-1)!) at u = k/2
            Rational u0 = Rational.of(k, 2);
            Rational gamma = Rational.of(minusOneToThe(k - 1)).divide(Rational.of(ExactFunctions.factorial(k - 1))).divide(-2);
            ExactConstant rest = ExactFunctions.gamma(u0)
                    .multiply(ExactFunctions.gamma(Rational.of(3).subtract(u0)).inverse())
                    .multiply(Rational.ONE.subtract(u0).multiply(6));
            ExactConstant expected = rest.multiply(times(gamma, u0));
            assertThat(pole(Forms.POLE_MASS, u0.toString()).residue()).as("u = %s", u0).isEqualTo(expected);
        }
    }

    private static long minusOneToThe(int n) {
        return n % 2 == 0 ? 1 : -1;
    }

    /** Heavy-light currents, Broadhurst, Grozin hep-ph/9410240 (residues derived from the kernel there); times e^(5 u0/3). */
    @ParameterizedTest
    @CsvSource({
        "3*(u^2+u-1), 1/2, 1/2", "3*(u^2+u-1), 1, 3/2", "3*(u^2+u-1), 3/2, -33/16", "3*(u^2+u-1), 2, 5/4",
        "3*(u^2+u-1), 5/2, -93/256", "3*(u^2+u-1), -1, 1", "3*(u^2+u-1), -2, 3/2",
        "3*u^2-u-3, 1/2, 11/6", "3*u^2-u-3, 1, -1/2", "3*u^2-u-3, 3/2, -9/16", "3*u^2-u-3, 2, 7/12",
        "3*u^2-u-3, 5/2, -53/256", "3*u^2-u-3, -1, -1/3", "3*u^2-u-3, -2, 11/2",
        "-4*u, 1/2, 4/3", "-4*u, 1, -2", "-4*u, 3/2, 3/2", "-4*u, 2, -2/3", "-4*u, 5/2, 5/32", "-4*u, -1, -4/3",
        "-4*u, -2, 4"
    })
    void currentKernelsHaveTheResiduesOfTheirTable(String numerator, String point, String residue) {
        String kernel = "exp(5*u/3)*(" + numerator + ")/u*gamma(1+u)*gamma(1-2*u)/gamma(3-u)";
        Pole pole = pole(kernel, point);
        assertThat(pole.order()).isEqualTo(1);
        assertThat(pole.residue()).isEqualTo(times(Rational.parse(residue), pole.point()));
    }

    @Test
    void adlerFunctionHasASimplePoleAtTwoAndDoublePolesFromThreeAndAtNegativeIntegers() {
        List<Pole> found = poles(Forms.ADLER, -8, 8);
        assertThat(found).extracting(p -> p.point().toString()).containsExactly(
                "-8", "-7", "-6", "-5", "-4", "-3", "-2", "-1", "2", "3", "4", "5", "6", "7", "8");
        for (Pole pole : found) {
            assertThat(pole.order()).isEqualTo(pole.point().equals(Rational.TWO) ? 1 : 2);
            assertThat(pole.status()).isEqualTo(PoleStatus.EXACT);
        }
        // Beneke, Nucl. Phys. B405 (1993) 424; Broadhurst, Z. Phys. C58 (1993) 339: 6 e^(10/3)/(2-u)
        assertThat(pole(Forms.ADLER, "2").residue()).isEqualTo(constant("-6*exp(10/3)"));
        assertThat(Pole.of(form(Forms.ADLER), Rational.ONE)).isEmpty();
    }

    @Test
    void adlerDoublePolesHaveTheClosedForms() {
        Rational fiveThirds = Rational.of(5, 3);
        for (int n = 3; n <= 8; n++) {
            // g_n (-1)^n {1/(n-u)^2 - [5/3 - 1/(n-1) - 1/(n-2)]/(n-u)}, g_n = 8 e^(5n/3)/((n-1)(n-2))
            ExactConstant g = times(Rational.of(8, (n - 1L) * (n - 2L)).multiply(minusOneToThe(n)), Rational.of(n));
            Rational bracket = fiveThirds.subtract(Rational.of(1, n - 1)).subtract(Rational.of(1, n - 2));
            Pole pole = pole(Forms.ADLER, "" + n);
            assertThat(pole.coefficient(-2)).isEqualTo(g);
            assertThat(pole.residue()).isEqualTo(g.multiply(bracket));
        }
        for (int n = 1; n <= 8; n++) {
            // h_n (-1)^(n-1) {1/(n+u)^2 + [5/3 + 1/(n+1) + 1/(n+2)]/(n+u)}, h_n = 8 e^(-5n/3)/((n+1)(n+2))
            ExactConstant h = times(Rational.of(8, (n + 1L) * (n + 2L)).multiply(minusOneToThe(n - 1)), Rational.of(-n));
            Rational bracket = fiveThirds.add(Rational.of(1, n + 1)).add(Rational.of(1, n + 2));
            Pole pole = pole(Forms.ADLER, "-" + n);
            assertThat(pole.coefficient(-2)).isEqualTo(h);
            assertThat(pole.residue()).isEqualTo(h.multiply(bracket));
        }
    }

    /** Every candidate of a single term that is not a pole of the sum. */
    @ParameterizedTest
    @ValueSource(strings = {
        "gamma(u) - 1/u", "exp(u)/u - cos(u)/u", "1/u^2 - (1-u)*gamma(1+u)*gamma(1-u)/u^2-1/u", "sin(pi*u)^2*gamma(-u)^2",
        "u^2*(u-1)^2*polygamma(1,u-1)", "sin(u)/u", "sin(u-1)/(u-1)", "(cos(u)-1)/u^2", "gamma(u)*u/gamma(1+u)",
        "digamma(u)+1/u+gamma(1+u)", "(u-1/3)*gamma(u-1/3)", "gamma(u)/gamma(2*u)", "gamma(3*u)/gamma(u)",
        "2^u/u - exp(u)/u - (ln(2)-1)*u/u"
    })
    void cancelledPolesAtTheOriginOrWhereTheFactorVanishesAreNotListed(String text) {
        SingularityList list = SingularityList.of(form(text));
        assertThat(list.poles(Rational.of(-1, 10), Rational.of(3, 2)))
                .as(text)
                .isEmpty();
    }

    @ParameterizedTest
    @CsvSource({
        "sin(pi*u)^2*gamma(-u)^3, 2, 1, exact", "sin(u)/u^2, 0, 1, exact", "gamma(u)^3, -1, 3, exact",
        "gamma(u-3/4)*gamma(u), 3/4, 1, certified", "polygamma(2;1-u)/(1-u), 1, 4, exact", "digamma(u)^2, 0, 2, exact",
        "1/(3*u-1)^3, 1/3, 3, exact", "gamma(u)*digamma(u), -2, 2, exact", "gamma(1/3-u)/(u-1/3), 1/3, 2, exact",
        "sin(1+u)/u, 0, 1, certified"
    })
    void ordersAndStatusFollowFromTheExactExpansion(String text, String point, int order, String status) {
        Pole pole = pole(text.replace(';', ','), point);
        assertThat(pole.order()).isEqualTo(order);
        assertThat(pole.status().text()).isEqualTo(status);
        assertThat(pole.laurent()).hasSize(order);
    }

    @Test
    void aCoefficientThatIsZeroWithoutProofKeepsItsPole() {
        // gamma(1/4) gamma(3/4) = pi sqrt(2), DLMF 5.5.3, but the two are formally independent
        Pole simple = pole("(gamma(1/4)*gamma(3/4)-pi*sqrt(2))/u", "0");
        assertThat(simple.order()).isEqualTo(1);
        assertThat(simple.status()).isEqualTo(PoleStatus.ORDER_NOT_PROVED);
        assertThat(simple.residue().isClosedForm()).isFalse();
        Ball ball = simple.balls(200).get(0);
        assertThat(ball.containsZero()).isTrue();
        Pole twofold = pole("(gamma(1/4)*gamma(3/4)-pi*sqrt(2))/u^2+1/u", "0");
        assertThat(twofold.order()).isEqualTo(2);
        assertThat(twofold.status()).isEqualTo(PoleStatus.ORDER_NOT_PROVED);
        assertThat(twofold.residue()).isEqualTo(ExactConstant.ONE);
    }

    @Test
    void aTinyResidueIsNotTakenForZero() {
        // exp(-300) + 10^-500: small, closed, and far from zero relative to its ball
        Pole pole = pole("(exp(-300)-2*exp(-300)+10^(-500))/u", "0");
        assertThat(pole.status()).isEqualTo(PoleStatus.EXACT);
        assertThat(pole.balls(100).get(0).isNegative()).isTrue();
        Pole cancelling = pole("(1-gamma(1/3)*gamma(2/3)*sqrt(3)/(2*pi)+10^(-200))/u", "0");
        assertThat(cancelling.status()).isEqualTo(PoleStatus.CERTIFIED);
    }

    @Test
    void endsOfTheRangeAreIncluded() {
        assertThat(poles("gamma(u)", -3, -1)).extracting(p -> p.point().intValueExact()).containsExactly(-3, -2, -1);
        assertThat(poles("gamma(u)", 1, 3)).isEmpty();
        assertThat(poles("gamma(u)", -1, -3)).isEmpty();
    }

    @Test
    void tooManyCandidatesAreRefused() {
        SingularityList list = SingularityList.of(form("gamma(1-2*u)"));
        assertThatThrownBy(() -> list.candidates(Rational.ZERO, Rational.of(3_000)))
                .isInstanceOf(DomainException.class)
                .hasMessage("the range from 0 to 3000 may hold more than 5000 poles; ask for a smaller one");
        assertThat(list.candidates(Rational.ZERO, Rational.of(2_000))).hasSize(4_000);
    }

    @Test
    void aPointTooFarOutIsRefused() {
        assertThatThrownBy(() -> Pole.of(form("gamma(1-u)"), Rational.of(100_000)))
                .isInstanceOf(DomainException.class)
                .hasMessage("the point u = 100000 is too far out: an argument of -99999 needs more than 10000 steps down to"
                        + " (0,1]");
    }

    @Test
    void aFactorOneOverUSquaredMinusTwoGivesPolesAtTheIrrationalRoots() {
        SingularityList list = SingularityList.of(form("exp(5*u/3)*gamma(1-u/3)*3/((u-1)*(u^2-2))"));
        assertThat(list.poles(Rational.of(-2), Rational.of(2))).extracting(p -> p.point().toString()).containsExactly("1");
        List<AlgebraicPole> found = list.algebraicPoles(Rational.of(-2), Rational.of(2));
        assertThat(found).hasSize(2);
        // mpmath 1.3.0: exp(5u/3) gamma(1-u/3) 3/((u-1) 2u) at u = -sqrt(2), sqrt(2)
        check(found.get(0), 1, "0.0368483331478140413579004510530179299956");
        check(found.get(1), 1, "45.39762323640821553178925341683069394292");
        assertThat(list.algebraicPoles(Rational.of(-1), Rational.of(1))).isEmpty();
    }

    @Test
    void multipleIrrationalRootsGiveTheirOrder() {
        SingularityList list = SingularityList.of(form("gamma(1+u)/(u^2-2)^2"));
        List<AlgebraicPole> found = list.algebraicPoles(Rational.ZERO, Rational.of(2));
        // mpmath 1.3.0: gamma(1+sqrt(2))/8
        check(found.get(0), 2, "0.15672693508036146083704636639298434998374");
        SingularityList cubic = SingularityList.of(form("polygamma(1,u/2+1/3)/(u^3-u-1)"));
        // mpmath 1.3.0: polygamma(1,r/2+1/3)/(3r^2-1), r^3 = r + 1
        check(cubic.algebraicPoles(Rational.ZERO, Rational.of(2)).get(0), 1, "0.38815786124729287005108741085105321424898");
    }

    private static void check(AlgebraicPole pole, int order, String leading) {
        assertThat(pole.order()).isEqualTo(order);
        assertThat(pole.status()).isEqualTo(PoleStatus.CERTIFIED);
        assertThat(pole.lower()).isLessThan(pole.upper());
        Rational value = Rational.parse(leading);
        Ball reference = Ball.of(value, value.abs().multiply(Rational.parse("1e-39")), 300);
        assertThat(pole.leading().overlaps(reference)).as("%s", pole.leading()).isTrue();
        assertThat(pole.leading().accuracyBits()).isGreaterThan(150);
    }

    @Test
    void aNumeratorThatVanishesAtAnIrrationalRootLeavesTheOrderUnproved() {
        // sin(sqrt(2)-u) vanishes at u = sqrt(2)
        SingularityList list = SingularityList.of(form("sin(sqrt(2)-u)/(u^2-2)"));
        List<AlgebraicPole> found = list.algebraicPoles(Rational.of(-2), Rational.of(2));
        assertThat(found).extracting(AlgebraicPole::status)
                .containsExactly(PoleStatus.CERTIFIED, PoleStatus.ORDER_NOT_PROVED);
    }

    @Test
    void complexRootsOfDenominatorsAreListed() {
        SingularityList list = SingularityList.of(form("gamma(1-u)/((u^2+1)*(u-5))+1/(u^2+1)^2"));
        assertThat(list.complexRoots()).hasSize(1);
        assertThat(list.complexRoots().get(0).im()).isCloseTo(1, org.assertj.core.data.Offset.offset(1e-9));
        assertThat(list.algebraicPoles(Rational.of(-9), Rational.of(9))).isEmpty();
    }

    @Test
    void expansionsReachTheOrderAskedForHoweverMuchCancels() {
        // u^6 times the first terms cancel: the sum begins at u^3
        NormalForm form = form("(sin(pi*u)/(pi*u) - 1 + pi^2*u^2/6)/u");
        LaurentSeries<ExactConstant> series = Expansion.about(Rational.ZERO, form).exact(6);
        assertThat(series.lowest()).isEqualTo(3);
        assertThat(series.end()).isEqualTo(6);
        assertThat(series.coefficients().get(0)).isEqualTo(constant("pi^4/120"));
        assertThat(Expansion.about(Rational.ZERO, form).exact(2).length()).isZero();
        assertThat(Expansion.about(Rational.ONE, NormalForm.ZERO).exact(4).length()).isZero();
    }

    @Test
    void theTreeRouteKeepsExactArgumentsOverEveryRing() {
        CoefficientwiseAlgebra<ExactConstant> exact = CoefficientwiseAlgebra.of(ExactRing.INSTANCE, 5);
        CoefficientwiseAlgebra<Ball> balls = CoefficientwiseAlgebra.of(bubblechain.series.BallRing.of(120, 8), 5);
        Formula formula = Formula.parse("gamma(1/3-u)*(u-1/3)^2/(3*u-1)");
        Rational third = Rational.of(1, 3);
        LaurentSeries<Ball> ball = SeriesInterpretation.about(third, formula, balls, "u");
        LaurentSeries<ExactConstant> series = SeriesInterpretation.about(third, formula, exact, "u");
        assertThat(ball.lowest()).isEqualTo(series.lowest()).isZero();
        assertThat(series.coefficients().get(0)).isEqualTo(ExactConstant.of(Rational.of(-1, 3)));
        assertThat(ball.coefficients().get(0).contains(Rational.of(-1, 3))).isTrue();
        // the same through a map of variables, where u stands for x + 0
        Formula shifted = Formula.parse("gamma(u/3+1/3-1/3)");
        LaurentSeries<Ball> atZero = SeriesInterpretation.of(
                shifted, balls, Map.of("u", balls.linear(ExactConstant.ZERO, ExactConstant.ONE)));
        assertThat(atZero.lowest()).isEqualTo(-1);
        assertThat(atZero.coefficients().get(0).contains(Rational.of(3))).isTrue();
    }
}
