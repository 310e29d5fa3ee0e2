package bubblechain.sumrule;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.data.Percentage.withPercentage;

import bubblechain.exact.Ball;
import bubblechain.exact.BallFunctions;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.PerturbativeSeries;
import bubblechain.fixedorder.SeriesLibrary;
import bubblechain.fixedorder.UncertainSeries;
import bubblechain.qcd.BetaFunction;
import bubblechain.qcd.Coupling;
import bubblechain.series.BallRing;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class SumRuleLawsTest {
    private static final PerturbativeSeries POLE_MASS = SeriesLibrary.find("pole-mass");

    @ParameterizedTest
    @ValueSource(ints = {1, 2})
    void strengthIsScaleInvariantWhenEnoughTermsAreKnown(int p) {
        SumRuleResult result = SumRule.evaluate(SampleSeries.constructed(p, 36).build());
        double strength = result.strength(36).toDouble();
        for (ScanPoint point : result.scan()) {
            assertThat(point.strengths().get(35).toDouble())
                    .as("lambda = %s", point.lambda())
                    .isCloseTo(strength, withPercentage(1e-4));
        }
    }

    @Test
    void shiftedStrengthIsScaleInvariantToo() {
        BetaFunction beta = BetaFunction.of(4, 3);
        Rational delta = Rational.of(2, 5);
        List<ExactConstant> corrections = List.of(ExactConstant.of(3));
        ScaleEvolution<Ball> evolution = ScaleEvolution.of(
                BallRing.of(400, 2), beta, Rational.ONE, delta, List.of(Ball.of(3)), 40);
        List<Ball> terms = SampleSeries.constructedTerms().stream().map(s -> s.toBall(400)).toList();
        List<ExactConstant> a = new ArrayList<>();
        for (Ball value : evolution.coefficients(terms, 40)) {
            a.add(ExactConstant.of(value.midpoint()));
        }
        SumRuleResult result = SumRule.evaluate(SampleSeries.inY("shifted", a, beta, 1)
                .exponentShift(delta)
                .corrections(corrections)
                .build());
        double strength = evolution.strengths(terms).get(2).toDouble();
        for (ScanPoint point : result.scan()) {
            assertThat(point.strengths().get(39).toDouble())
                    .as("lambda = %s", point.lambda())
                    .isCloseTo(strength, withPercentage(1e-3));
        }
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 3, -2})
    void exactAndBallValuesAgree(int p) {
        SumRuleRequest request = SumRuleRequest.forSeries(POLE_MASS, 3).power(Rational.of(p)).build();
        List<ExactConstant> exact = SumRule.exactStrengths(request);
        SumRuleResult result = SumRule.evaluate(request);
        for (int k = 0; k < 4; k++) {
            assertThat(result.bareStrengths().get(k).overlaps(exact.get(k).toBall(400))).isTrue();
            assertThat(result.bareStrengths().get(k).accuracyBits()).isGreaterThan(100);
        }
    }

    @Test
    void fewerLoopsReturnTheSameFirstOrders() {
        SumRuleResult four = SumRule.evaluate(SumRuleRequest.forSeries(POLE_MASS, 3).build());
        SumRuleResult two = SumRule.evaluate(SumRuleRequest.forSeries(POLE_MASS, 3).loops(2).build());
        assertThat(two.loops()).isEqualTo(2);
        for (int n = 1; n <= 2; n++) {
            assertThat(two.strength(n).overlaps(four.strength(n))).isTrue();
        }
    }

    @Test
    void prefactorScalesEveryFullValueAndNoBareOne() {
        ExactConstant factor = ExactConstant.PI.multiply(Rational.of(-2));
        SumRuleResult plain = SumRule.evaluate(SumRuleRequest.forSeries(POLE_MASS, 3).build());
        SumRuleResult scaled = SumRule.evaluate(SumRuleRequest.forSeries(POLE_MASS, 3).prefactor(factor).build());
        Ball times = factor.toBall(300);
        for (int n = 1; n <= 4; n++) {
            assertThat(scaled.bareStrength(n).overlaps(plain.bareStrength(n))).isTrue();
            assertThat(scaled.strength(n).overlaps(plain.strength(n).multiply(times, 300))).isTrue();
            assertThat(scaled.normalisation(n).overlaps(plain.normalisation(n).multiply(times, 300))).isTrue();
        }
        assertThat(scaled.errors().combined())
                .isCloseTo(2 * Math.PI * plain.errors().combined(), withPercentage(1e-9));
        assertThat(scaled.verdict()).isEqualTo(plain.verdict());
    }

    @ParameterizedTest
    @CsvSource({"1", "2", "4"})
    void ambiguityIsTheDirectSumOfTheTerms(int p) {
        // P = p^nu sum_k S_k p^k/Gamma(1+nu+k), sum-rule.md section 1
        SumRuleRequest request = SumRuleRequest.forSeries(POLE_MASS, 4).power(Rational.of(p)).build();
        int bits = 300;
        ScaleEvolution<Ball> evolution = ScaleEvolution.of(
                BallRing.of(bits, 2), request.beta(), request.power(), Rational.ZERO, List.of(), 4);
        List<Ball> terms = evolution.terms(request.coefficients().values().stream().map(c -> c.toBall(bits)).toList());
        Ball sum = Ball.ZERO;
        for (int k = 0; k < 4; k++) {
            Ball gamma = BallFunctions.gamma(Ball.of(evolution.nu().add(k + 1), bits), bits);
            sum = sum.add(terms.get(k).multiply(Rational.of(p).power(k), bits).divide(gamma, bits), bits);
        }
        Ball expected = sum.multiply(BallFunctions.power(Ball.of(p), evolution.nu(), bits), bits);
        assertThat(SumRule.evaluate(request).ambiguity(4).orElseThrow().overlaps(expected)).isTrue();
    }

    @Test
    void couplingOfTheInputDoesNotMatter() {
        SumRuleResult inPi = SumRule.evaluate(SumRuleRequest.forCoefficients(
                        "f", POLE_MASS.at(3), Coupling.ALPHA_OVER_PI, BetaFunction.of(3), Rational.ONE)
                .build());
        SumRuleResult inA = SumRule.evaluate(SumRuleRequest.forCoefficients(
                        "f", POLE_MASS.at(3, Coupling.A), Coupling.A, BetaFunction.of(3), Rational.ONE)
                .build());
        assertThat(inA.strength(4).overlaps(inPi.strength(4))).isTrue();
    }

    @Test
    void wrongRequestsAreRefusedInOneLine() {
        assertThatThrownBy(() -> SumRuleRequest.forSeries(POLE_MASS, 3).power(Rational.ZERO).build())
                .isInstanceOf(DomainException.class)
                .hasMessage("the power p = 2 u0 of a singularity cannot be 0; give p > 0 (infrared) or p < 0 (ultraviolet)");
        assertThatThrownBy(() -> SumRuleRequest.forSeries(POLE_MASS, 17))
                .isInstanceOf(DomainException.class)
                .hasMessageContaining("holds for 0 to 15 flavours");
        assertThatThrownBy(() -> SumRuleRequest.forSeries(POLE_MASS, 3).loops(5).build())
                .isInstanceOf(DomainException.class)
                .hasMessage("the series is known to 4 loops; ask for 1 to 4, got 5");
        assertThatThrownBy(() -> SumRuleRequest.forSeries(POLE_MASS, 3).loops(0).build()).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> SumRuleRequest.forSeries(POLE_MASS, 3).lambdas(List.of(ExactConstant.of(-1))).build())
                .isInstanceOf(DomainException.class)
                .hasMessage("a scale factor lambda must be positive, got -1");
        assertThatThrownBy(() -> SumRuleRequest.forSeries(POLE_MASS, 3).lambdas(List.of(ExactConstant.ZERO)).build())
                .isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> SumRuleRequest.forSeries(POLE_MASS, 3).lambdas(List.of()).build())
                .isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> UncertainSeries.exact(List.of()))
                .isInstanceOf(DomainException.class)
                .hasMessage("a series needs at least one coefficient, got none");
    }

    @Test
    void seriesThatVanishesHasNoStrengthAndNoVerdict() {
        SumRuleResult result = SumRule.evaluate(SampleSeries.inY(
                        "zero", List.of(ExactConstant.ZERO, ExactConstant.ZERO), BetaFunction.of(3), 1)
                .build());
        assertThat(result.strength(2).isZero()).isTrue();
        assertThat(result.verdict()).isEqualTo(Verdict.CANNOT_TELL);
    }
}
