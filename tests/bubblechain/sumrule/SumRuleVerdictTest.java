package bubblechain.sumrule;

import static bubblechain.fixedorder.ReferenceTable.assertPrinted;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.SeriesLibrary;
import bubblechain.fixedorder.Singularity;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Calibration of the null test: sum-rule.md section 2.4. */
class SumRuleVerdictTest {
    private static final Obstacle MINUS_ONE =
            Obstacle.unknown(Rational.of(-1), Singularity.Kind.UV, "dimension-six operators");

    private static SumRuleResult evaluate(SumRuleRequest.Builder builder) {
        return SumRule.evaluate(builder.build());
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 3, 4})
    void constructedSingularityIsPresent(int p) {
        assertThat(evaluate(SampleSeries.constructed(p, 10)).verdict()).isEqualTo(Verdict.PRESENT);
    }

    @ParameterizedTest
    @CsvSource({"1", "2", "3", "4"})
    void constructedSingularityIsNeverCalledAbsentWithFewerTerms(int p) {
        for (int loops = 1; loops < 10; loops++) {
            assertThat(evaluate(SampleSeries.constructed(p, loops)).verdict()).as("%d loops", loops).isNotEqualTo(Verdict.ABSENT);
        }
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 4})
    void convergentSeriesHasNoSingularity(int p) {
        assertThat(evaluate(SampleSeries.convergent(p, 15)).verdict()).isEqualTo(Verdict.ABSENT);
        for (int loops = 1; loops < 15; loops++) {
            assertThat(evaluate(SampleSeries.convergent(p, loops)).verdict()).isNotEqualTo(Verdict.PRESENT);
        }
    }

    @ParameterizedTest
    @CsvSource({ // sum-rule.md section 2.4: K_k of the convergent series, k = 0, 1, 3, 5, 9, 14
        "1, 0.5, 0.1055, 1.065e-3, -6.849e-6, -3.603e-11, 2.148e-17",
        "2, 0.5, 0.1885, 8.178e-3, -3.003e-4, 2.568e-8, 5.103e-13",
        "4, 0.5, 0.3274, 6.573e-2, -7.999e-3, 2.795e-5, 5.067e-9",
    })
    void convergentSeriesFallsAsInTheSheet(int p, String k0, String k1, String k3, String k5, String k9, String k14) {
        List<Ball> values = evaluate(SampleSeries.convergent(p, 15)).bareStrengths();
        int[] orders = {0, 1, 3, 5, 9, 14};
        String[] printed = {k0, k1, k3, k5, k9, k14};
        for (int i = 0; i < orders.length; i++) {
            assertPrinted(values.get(orders[i]), printed[i], "K_" + orders[i]);
        }
    }

    @ParameterizedTest
    @ValueSource(ints = {3, 4, 5})
    void anomalousDimensionsHaveNoSingularity(int nf) {
        assertThat(evaluate(SampleSeries.cusp(nf)).verdict()).isEqualTo(Verdict.ABSENT);
        assertThat(evaluate(SampleSeries.gammaM(nf)).verdict()).isEqualTo(Verdict.ABSENT);
    }

    @ParameterizedTest
    @CsvSource({ // sum-rule.md section 2.4: |K|/E of the Bjorken sum rule
        "3, 2, 7.7", "5, 2, 1.9", "3, 1, 1.2",
    })
    void significanceOfTheBjorkenSumRuleMatchesTheSheet(int nf, int p, String printed) {
        SumRuleResult result = evaluate(SampleSeries.bjorken(nf, p));
        double ratio = Math.abs(result.strength(4).toDouble()) / result.errors().forNullTest();
        assertThat(ratio).isCloseTo(Double.parseDouble(printed), within(0.05));
    }

    @Test
    void bjorkenVerdictsFollowTheirSignificance() {
        assertThat(evaluate(SampleSeries.bjorken(3, 2)).verdict()).isEqualTo(Verdict.PRESENT);
        assertThat(evaluate(SampleSeries.bjorken(5, 2)).verdict()).isEqualTo(Verdict.CANNOT_TELL);
        assertThat(evaluate(SampleSeries.bjorken(3, 1)).verdict()).isEqualTo(Verdict.CANNOT_TELL);
    }

    @Test
    void adlerAtPowerTwoCannotBeToldWhileTheUltravioletPoleIsAsNear() {
        SumRuleResult result = evaluate(SampleSeries.adler(3, 2).obstacle(MINUS_ONE));
        assertThat(result.verdict()).isEqualTo(Verdict.CANNOT_TELL);
        assertThat(result.blockedBy()).extracting(b -> b.obstacle().position()).containsExactly(Rational.of(-1));
        // the scale band alone would say "present"; the last step does not
        assertThat(result.unblockedVerdict()).isEqualTo(Verdict.CANNOT_TELL);
        assertThat(result.blockedBy().get(0).reason())
                .isEqualTo("at equal or smaller |u| and its strength is unknown: the sum need not converge; remove it first");
        // sum-rule.md section 2.4: K_3/K_0 = 0.267, last step 0.124 in units of K_0
        double first = result.strength(1).toDouble();
        assertThat(result.strength(4).toDouble() / first).isCloseTo(0.267, within(5e-4));
        assertThat(result.errors().lastStep() / first).isCloseTo(0.124, within(5e-4));
        assertThat(result.errors().scale() / first).isCloseTo(0.061, within(5e-4));
    }

    @Test
    void adlerAtPowerFourCarriesNoInformation() {
        // sum-rule.md section 2.4: QCD 1.155 +- 1.76 in units of K_0
        SumRuleResult result = evaluate(SampleSeries.adler(3, 4).obstacle(MINUS_ONE));
        double first = result.strength(1).toDouble();
        assertThat(result.strength(4).toDouble() / first).isCloseTo(1.155, within(5e-4));
        assertThat(result.errors().forNullTest() / first).isCloseTo(1.76, within(5e-3));
        assertThat(result.verdict()).isEqualTo(Verdict.CANNOT_TELL);
    }

    @Test
    void removedOrFartherSingularitiesDoNotBlock() {
        assertThat(evaluate(SampleSeries.adler(3, 2).obstacle(MINUS_ONE.asRemoved())).blockedBy()).isEmpty();
        SumRuleResult poleMass = evaluate(SumRuleRequest.forSeries(SeriesLibrary.find("pole-mass"), 4));
        assertThat(poleMass.request().obstacles()).hasSize(2);
        assertThat(poleMass.blockedBy()).isEmpty();
    }

    @Test
    void nearerSingularitiesAreWeighedByStrength() {
        ExactConstant tiny = ExactConstant.of(Rational.of(1, 10_000));
        assertThat(evaluate(SampleSeries.bjorken(3, 2).obstacle(MINUS_ONE.withStrength(tiny))).verdict())
                .isEqualTo(Verdict.PRESENT);
        assertThat(evaluate(SampleSeries.bjorken(3, 2).obstacle(MINUS_ONE.withStrength(ExactConstant.of(100)))).verdict())
                .isEqualTo(Verdict.CANNOT_TELL);
    }

    @Test
    void strongSingularityFartherAwayBlocksToo() {
        Obstacle far = Obstacle.unknown(Rational.of(3), Singularity.Kind.IR, "far").withStrength(ExactConstant.of(10_000));
        SumRuleResult result = evaluate(SampleSeries.bjorken(3, 2).obstacle(far));
        assertThat(result.blockedBy()).hasSize(1);
        assertThat(result.blockedBy().get(0).reason()).startsWith("farther away and its part of the last order is ");
        assertThat(result.unblockedVerdict()).isEqualTo(Verdict.PRESENT);
    }

    @Test
    void probingTheNextPowerOfThePoleMassIsBlockedByTheLeadingOne() {
        SumRuleResult result =
                evaluate(SumRuleRequest.forSeries(SeriesLibrary.find("pole-mass"), 3).power(Rational.of(3)));
        assertThat(result.blockedBy())
                .extracting(b -> b.obstacle().position())
                .containsExactly(Rational.HALF, Rational.of(-1));
        assertThat(result.request().exponentShift()).isEmpty();
    }

    @ParameterizedTest
    @CsvSource({
        "1;1;1, 1;0.49;0.3, PRESENT", "1;1;1, 1;0.6;0.3, CANNOT_TELL", "1;1;1, 1;0.49;0.34, CANNOT_TELL",
        "1;0.5;0.2, 1;0.5;0.3, ABSENT", "1;0.5;0.26, 1;0.5;0.3, CANNOT_TELL", "1;0.1;0.2, 1;0.5;0.3, CANNOT_TELL",
        "1;1.1;0.2, 1;0.5;0.3, CANNOT_TELL", "1;0.5;0.2, 1;0.5;0.1, CANNOT_TELL", "1, 1, CANNOT_TELL",
    })
    void ruleOfTheVerdict(String strengths, String errors, Verdict verdict) {
        assertThat(NullTest.judge(doubles(strengths), doubles(errors))).isEqualTo(verdict);
    }

    private static List<Double> doubles(String text) {
        return Arrays.stream(text.split(";")).map(Double::valueOf).toList();
    }

    @Test
    void partsOfTheErrorAreCombinedAsStated() {
        ErrorBudget budget = new ErrorBudget(3, 2, 4, 12);
        assertThat(budget.combined()).isEqualTo(13); // sqrt(3^2 + 4^2 + 12^2)
        assertThat(new ErrorBudget(2, 3, 4, 12).combined()).isEqualTo(13);
        assertThat(budget.forNullTest()).isEqualTo(4);
        assertThat(new ErrorBudget(1, 7, 4, 12).forNullTest()).isEqualTo(7);
        assertThat(new ErrorBudget(9, 7, 4, 12).forNullTest()).isEqualTo(9);
        assertThat(budget.times(-2)).isEqualTo(new ErrorBudget(6, 4, 8, 24));
    }

    @Test
    void aVerdictNeedsValuesAndErrors() {
        assertThatThrownBy(() -> NullTest.judge(List.of(), List.of())).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> NullTest.judge(List.of(1.0), List.of()))
                .isInstanceOf(DomainException.class)
                .hasMessage("a verdict needs one error for each of at least one value, got 1 values and 0 errors");
    }
}
