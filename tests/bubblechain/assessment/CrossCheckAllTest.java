package bubblechain.assessment;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import bubblechain.exact.DomainException;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.SeriesLibrary;
import bubblechain.kernel.KernelLibrary;
import bubblechain.sumrule.SumRule;
import bubblechain.sumrule.SumRuleRequest;
import bubblechain.sumrule.SumRuleResult;
import bubblechain.sumrule.Verdict;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Every published series beside its bubble chain, and the verdicts of sum-rule.md section 2.4 on the built-in files. */
class CrossCheckAllTest {
    static List<String> names() {
        return CrossCheck.names();
    }

    private static CrossCheck check(String name) {
        int nf = SeriesLibrary.find(name).flavours().nearest(3);
        return CrossCheck.of(KernelLibrary.load(name), SeriesLibrary.find(name), nf, Optional.empty());
    }

    @ParameterizedTest
    @MethodSource("names")
    void theHighestFlavourTermsOfThePublishedSeriesAreThoseOfTheChain(String name) {
        CrossCheck check = check(name);
        assertThat(check.flavourTermsAgree()).isTrue();
        int known = check.series().isForOneFlavourNumber() ? 1 : check.series().loops();
        assertThat(check.flavourLoops()).isEqualTo(known);
        assertThat(check.verdict()).contains("the nf^n terms agree exactly through " + known + (known == 1 ? " loop" : " loops"));
    }

    @ParameterizedTest
    @CsvSource({"bjorken-gls, gls", "pole-mass, pole-mass-heavy-coupling"})
    void otherFormsOfASeriesHaveTheFlavourTermsOfTheChainToo(String kernel, String series) {
        CrossCheck check = CrossCheck.of(KernelLibrary.load(kernel), SeriesLibrary.find(series), 3, Optional.empty());
        assertThat(check.orders()).hasSize(4).allMatch(CrossCheck.OrderComparison::flavourTermsEqual);
    }

    @Test
    void aSeriesGivenAtOneFlavourNumberSaysThatItsTermsAreNotKnown() {
        assertThat(check("chromomag").verdict())
                .endsWith("exactly through 1 loop, beyond they are not known (series at one nf only)");
    }

    @Test
    void everyQuantityWithKernelAndSeriesIsInTheTable() {
        assertThat(names()).contains("adler", "bjorken-gls", "cusp", "gamma-m", "pole-mass", "ree", "tau", "static-force");
        assertThat(names()).hasSize(13).doesNotContain("gls");
        assertThat(CrossCheck.all(3)).extracting(c -> c.series().name()).containsExactlyElementsOf(names());
        assertThat(CrossCheck.all(3)).filteredOn(c -> c.series().name().equals("chromomag"))
                .extracting(CrossCheck::nf).containsExactly(4);
    }

    private static SumRuleResult measured(String name, int nf, int p) {
        return SumRule.evaluate(
                SumRuleRequest.forSeries(SeriesLibrary.find(name), nf).power(Rational.of(p)).build());
    }

    @ParameterizedTest
    @ValueSource(ints = {3, 4, 5})
    void anomalousDimensionsHaveNoSingularity(int nf) {
        assertThat(measured("cusp", nf, 1).verdict()).isEqualTo(Verdict.ABSENT);
        assertThat(measured("gamma-m", nf, 1).verdict()).isEqualTo(Verdict.ABSENT);
    }

    @ParameterizedTest
    @ValueSource(ints = {2, 4})
    void theAdlerFunctionCannotBeToldWhileTheUltravioletSingularityIsInTheWay(int p) {
        SumRuleResult result = measured("adler", 3, p);
        assertThat(result.verdict()).isEqualTo(Verdict.CANNOT_TELL);
        assertThat(result.blockedBy()).extracting(b -> b.obstacle().position()).containsExactly(Rational.of(-1));
    }

    @ParameterizedTest
    @CsvSource({ // sum-rule.md section 2.4: |K|/E of minus the Bjorken sum rule
        "3, 2, 7.7", "5, 2, 1.9", "3, 1, 1.2",
    })
    void significanceOfTheBjorkenSumRuleMatchesTheSheet(int nf, int p, double printed) {
        SumRuleResult result = measured("bjorken-gls", nf, p);
        double ratio = Math.abs(result.strength(4).toDouble()) / result.errors().forNullTest();
        assertThat(ratio).isCloseTo(printed, within(0.05));
    }

    @Test
    void theBjorkenSingularityIsPresentUnlessTheUltravioletOneIsWeighed() {
        assertThat(measured("bjorken-gls", 3, 2).unblockedVerdict()).isEqualTo(Verdict.PRESENT);
        assertThat(measured("bjorken-gls", 3, 2).verdict()).isEqualTo(Verdict.CANNOT_TELL);
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 3, 4, 5})
    void thePotentialHasMinusTwiceTheNormalisationOfThePoleMass(int nl) {
        SeriesLibrary.find("static-potential-r").requireSamePrescription(SeriesLibrary.find("pole-mass"));
        SumRuleResult potential = measured("static-potential-r", nl, 1);
        SumRuleResult mass = measured("pole-mass", nl, 1);
        double sum = potential.normalisation(4).toDouble() + 2 * mass.normalisation(4).toDouble();
        double error = Math.hypot(potential.normalisationErrors().combined(), 2 * mass.normalisationErrors().combined());
        assertThat(Math.abs(sum)).isLessThan(error);
        assertThat(potential.verdict()).isEqualTo(Verdict.PRESENT);
    }

    @Test
    void thePotentialOfThreeFlavoursAgreesWithThePublishedNormalisation() {
        // fixed-order.csv, N_m, nf=3 from the potential: 0.563(26), arXiv:1407.2128
        assertThat(measured("static-potential-r", 3, 1).normalisation(4).toDouble() / -2).isCloseTo(0.563, within(0.026));
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 3, 4, 5})
    void theForceHasNoSingularityAtOneHalfThatTheSumRuleSees(int nl) {
        SumRuleResult force = measured("static-force", nl, 1);
        assertThat(force.verdict()).isNotEqualTo(Verdict.PRESENT);
        assertThat(Math.abs(force.normalisation(4).toDouble())).isLessThan(force.normalisationErrors().combined());
    }

    @Test
    void theMultiplePoleOfTheAdlerFunctionIsRefused() {
        assertThatThrownBy(() -> CrossCheck.of(
                        KernelLibrary.load("adler"), SeriesLibrary.find("adler"), 3, Optional.of(Rational.of(-2))))
                .isInstanceOf(DomainException.class)
                .hasMessage("the chain has a pole of order 2 at u = -1; a residue is compared at simple poles only");
    }
}
