package bubblechain.sumrule;

import static bubblechain.fixedorder.ReferenceTable.assertPrinted;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.data.Percentage.withPercentage;

import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import bubblechain.qcd.BetaFunction;
import bubblechain.series.BallRing;
import bubblechain.series.ExactRing;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ScaleEvolutionTest {
    private static final int BITS = 300;
    private static final int FAR = 80;

    private static ScaleEvolution<Ball> balls(BetaFunction beta, Rational p, Rational delta, List<Ball> corrections) {
        return ScaleEvolution.of(BallRing.of(BITS, 2), beta, p, delta, corrections, FAR + 1);
    }

    private static List<Ball> constructedTerms() {
        return SampleSeries.constructedTerms().stream().map(s -> s.toBall(BITS)).toList();
    }

    @ParameterizedTest
    @CsvSource({ // sum-rule.md section 2.3, nf = 4, beta_0..beta_2
        "1, 2.8373194419", "2, 1.55307951233", "3, 1.05598687531", "4, 0.786486281026",
    })
    void constructedSeriesGrowsAsItsStrengthSays(int p, String printed) {
        ScaleEvolution<Ball> evolution = balls(BetaFunction.of(4, 3), Rational.of(p), Rational.ZERO, List.of());
        List<Ball> strengths = evolution.strengths(constructedTerms());
        assertPrinted(strengths.get(2), printed, "K from the terms");
        List<Ball> a = evolution.coefficients(constructedTerms(), FAR + 1);
        Ball fromGrowth = a.get(FAR).divide(evolution.asymptotic(FAR, 40), BITS);
        // the large-order formula to depth 40 leaves less than 1e-12 at n = 80
        assertPrinted(fromGrowth, printed, "K from the growth at n = 80");
    }

    @ParameterizedTest
    @CsvSource({"1,1/3,2,-1", "-2,1,0,0", "2,7/10,-3,1/2", "4,-1/4,1,5"})
    void shiftedExponentGrowsAsItsStrengthSays(String p, String delta, String c1, String c2) {
        List<Ball> corrections = List.of(Ball.of(Rational.parse(c1), BITS), Ball.of(Rational.parse(c2), BITS));
        ScaleEvolution<Ball> evolution =
                balls(BetaFunction.of(3, 3), Rational.parse(p), Rational.parse(delta), corrections);
        List<Ball> a = evolution.coefficients(constructedTerms(), FAR + 1);
        double strength = evolution.strengths(constructedTerms()).get(2).toDouble();
        double fromGrowth = a.get(FAR).divide(evolution.asymptotic(FAR, 30), BITS).toDouble();
        assertThat(fromGrowth).isCloseTo(strength, withPercentage(1e-7));
    }

    /**
     * Independent of the recursion: without it, only Gamma(n+1+nu) growth is put in, and the sum rule must return its
     * strength. The growth of y^(-delta) (Lambda/R)^p is exact for one term of the shape when beta is one-loop, so the
     * test uses B = (1 - 2u/p)^(-1-delta) with a fractional delta.
     */
    @ParameterizedTest
    @CsvSource({"1,1/2", "3,-1/3", "-2,7/4"})
    void fractionalPowerOfAChainIsFoundAtEveryOrder(String p, String delta) {
        BetaFunction beta = BetaFunction.of(3, 1);
        Rational power = Rational.parse(p);
        Rational shift = Rational.parse(delta);
        List<ExactConstant> a = new ArrayList<>();
        Rational binomial = Rational.ONE; // Gamma(n+1+delta)/Gamma(1+delta)
        for (int n = 0; n < 7; n++) {
            a.add(ExactConstant.of(beta.beta0().power(n + 1).multiply(Rational.TWO.divide(power).power(n)).multiply(binomial)));
            binomial = binomial.multiply(shift.add(n + 1));
        }
        ScaleEvolution<ExactConstant> evolution =
                ScaleEvolution.of(ExactRing.INSTANCE, beta, power, shift, List.of(), 7);
        assertThat(evolution.strengths(evolution.terms(a))).containsOnly(ExactConstant.ONE);
        assertThat(evolution.truncatedResidues(a)).containsOnly(ExactConstant.ONE);
    }

    @ParameterizedTest
    @CsvSource({"1,0", "-3,0", "2,1/2", "4,-3/4"})
    void termsAndCoefficientsAreInverseExactlySeed3(String p, String delta) {
        Random random = new Random(3);
        List<ExactConstant> a = new ArrayList<>();
        for (int n = 0; n < 6; n++) {
            a.add(ExactFunctions.zeta(3).multiply(Rational.of(random.nextInt(9) - 4)).add(ExactConstant.of(random.nextInt(99) - 50)));
        }
        List<ExactConstant> corrections = List.of(ExactConstant.PI, ExactConstant.of(Rational.of(-2, 3)));
        ScaleEvolution<ExactConstant> evolution = ScaleEvolution.of(
                ExactRing.INSTANCE, BetaFunction.of(4), Rational.parse(p), Rational.parse(delta), corrections, 6);
        assertThat(evolution.coefficients(evolution.terms(a), 6)).isEqualTo(a);
    }

    @Test
    void unitTermChangesOnlyItsOwnAndHigherCoefficients() {
        // forecast.md section 1: d a_{N+1}/d S_N = (2 beta0)^(N+1)/p
        BetaFunction beta = BetaFunction.of(5);
        ScaleEvolution<ExactConstant> evolution =
                ScaleEvolution.of(ExactRing.INSTANCE, beta, Rational.TWO, Rational.ZERO, List.of(), 5);
        List<ExactConstant> unit = List.of(ExactConstant.ZERO, ExactConstant.ZERO, ExactConstant.ONE);
        List<ExactConstant> a = evolution.coefficients(unit, 5);
        assertThat(a.subList(0, 2)).allMatch(ExactConstant::isZero);
        assertThat(a.get(2)).isEqualTo(ExactConstant.of(beta.beta0().multiply(2).power(3).divide(2)));
    }

    @Test
    void oneLoopRunningHasNoSubleadingShape() {
        ScaleEvolution<ExactConstant> evolution = ScaleEvolution.of(
                ExactRing.INSTANCE, BetaFunction.of(3, 1), Rational.ONE, Rational.ZERO, List.of(), 5);
        assertThat(evolution.shape(4).subList(1, 4)).allMatch(ExactConstant::isZero);
        assertThat(evolution.nu()).isEqualTo(Rational.ZERO);
    }

    @Test
    void powerZeroIsRefused() {
        assertThatThrownBy(() -> balls(BetaFunction.of(3), Rational.ZERO, Rational.ZERO, List.of()))
                .isInstanceOf(DomainException.class)
                .hasMessage("the power p = 2 u0 of a singularity cannot be 0; give p > 0 (infrared) or p < 0 (ultraviolet)");
    }

    @Test
    void exponentWithoutSingularityIsRefused() {
        assertThatThrownBy(() -> balls(BetaFunction.of(3, 1), Rational.ONE, Rational.of(-2), List.of()))
                .isInstanceOf(DomainException.class)
                .hasMessageContaining("is no singularity; change the exponent shift -2");
    }
}
