package bubblechain.qcd;

import static bubblechain.fixedorder.ReferenceTable.assertPrinted;
import static bubblechain.fixedorder.ReferenceTable.numbers;
import static bubblechain.fixedorder.ReferenceTable.value;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.ReferenceTable;
import java.util.List;
import java.util.SplittableRandom;
import org.assertj.core.api.InstanceOfAssertFactories;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class FlavourThresholdsTest {
    private static final List<Threshold> THREE = StandardInputs.thresholds();

    private static void equal(double value, double expected, double relative) {
        assertThat(value / expected - 1).isCloseTo(0, within(relative));
    }

    private static FlavourThresholds scaled(int order, double factor) {
        return FlavourThresholds.of(order, THREE.stream().map(t -> t.atScale(factor * t.mass())).toList());
    }

    @Test
    void downAndUpIsTheIdentityWithSeed54() {
        SplittableRandom random = new SplittableRandom(54);
        for (int i = 0; i < 40; i++) {
            int loops = random.nextInt(1, 6);
            FlavourThresholds thresholds = scaled(loops - 1, random.nextDouble(0.7, 3));
            RunningCoupling start = RunningCoupling.of(5, loops, 91, random.nextDouble(0.11, 0.122));
            equal(thresholds.alphaS(thresholds.withFlavours(start, 3), 91, 5), start.value(), 1e-12);
            equal(thresholds.alphaS(thresholds.withFlavours(start, 6), 91, 5), start.value(), 1e-12);
            RunningMass mass = RunningMass.of(start, 91, 0.05);
            equal(thresholds.mass(thresholds.withFlavours(mass, 3), 91, 5), 0.05, 1e-12);
        }
    }

    @Test
    void theScaleOfAThresholdMattersLessAtEveryOrder() {
        double[] spread = new double[6];
        for (int loops = 1; loops <= 5; loops++) {
            RunningCoupling start = StandardInputs.coupling(loops);
            double low = scaled(loops - 1, 1).alphaS(start, 3, 3);
            spread[loops] = Math.abs(scaled(loops - 1, 2).alphaS(start, 3, 3) / low - 1);
        }
        assertThat(spread[2]).isLessThan(spread[1] / 2);
        assertThat(spread[3]).isLessThan(spread[2]);
        assertThat(spread[5]).isLessThan(spread[1] / 20);
    }

    @Test
    void poleMassAndMsbarMassAgreeUpToTheOrdersLeftOut() {
        for (int order = 2; order <= 4; order++) {
            double ratio = poleAgainstMsbar(order, 0.02) / poleAgainstMsbar(order, 0.01);
            assertThat(ratio).as("order %d", order).isBetween(0.9 * Math.pow(2, order + 1), 1.2 * Math.pow(2, order + 1));
        }
    }

    /** Relative difference of alpha^(5) from mbar(mbar) = 163 GeV and from its pole mass, at a value of alpha^(6)(163 GeV). */
    private static double poleAgainstMsbar(int order, double alpha) {
        double a = alpha / Math.PI;
        // coefficients at nl = 5 in alpha_s^(6)(mbar), fixed-order.csv
        double pole = 163 * (1 + 4.0 / 3 * a + (13.44339626 - 5 * 1.041366911) * a * a
                + (190.5949552 - 5 * 26.65513169 + 25 * 0.6526907491) * a * a * a
                + (3567.60 - 5 * 745.721 + 25 * 43.3963 - 125 * 0.678141) * a * a * a * a);
        RunningCoupling six = RunningCoupling.of(6, 5, 163, alpha);
        double fromMsbar = FlavourThresholds.of(order, List.of(Threshold.msbar(5, 163))).alphaS(six, 163, 5);
        double fromPole = FlavourThresholds.of(order, List.of(Threshold.pole(5, pole))).alphaS(six, 163, 5);
        return fromPole / fromMsbar - 1;
    }

    @Test
    void poleMassConstantsOfTheReferenceTable() {
        List<String> printed = numbers(value("alpha_s^(nl)/alpha_s^(nl+1) at mu=M", "2,3-loop"));
        DecouplingSeries zero = DecouplingSeries.of(0, HeavyMass.POLE, 4);
        assertPrinted(zero.coupling(2).get(0), printed.get(0), "a^2 at mu = M");
        assertPrinted(zero.coupling(3).get(0), printed.get(1), "a^3 at mu = M");
        assertThat(zero.coupling(2).get(0)).isEqualTo(ExactConstant.of(Rational.of(-7, 24)));
    }

    @Test
    void fourLoopPoleMassConstantHasThePublishedDecimals() {
        // -85.875 + 9.69229 nl - 0.239542 nl^2, Schroeder and Steinhauser, hep-ph/0512058, from memory
        for (int nl = 3; nl <= 5; nl++) {
            double found = Numbers.of(DecouplingSeries.of(nl, HeavyMass.POLE, 4).coupling(4).get(0));
            assertThat(found).isCloseTo(-85.875 + 9.69229 * nl - 0.239542 * nl * nl, within(1e-3));
        }
    }

    @Test
    void massConstantsHaveThePublishedDecimals() {
        // 0.2060; 1.848 + 0.02473 nl; 6.850 - 1.466 nl + 0.05616 nl^2, arXiv:1502.04719, from memory
        for (int nl = 0; nl <= 5; nl++) {
            List<ExactConstant> m = DecouplingSeries.massAtMass(nl, 4);
            assertThat(Numbers.of(m.get(1))).isCloseTo(0.2060, within(5e-5));
            assertThat(Numbers.of(m.get(2))).isCloseTo(1.848 + 0.02473 * nl, within(6e-4));
            assertThat(Numbers.of(m.get(3))).isCloseTo(6.850 - 1.466 * nl + 0.05616 * nl * nl, within(2e-4));
        }
    }

    @Test
    void logarithmsOfTheMassHaveThePublishedForm() {
        // 1 + a^2 (89/432 - 5/36 L + 1/12 L^2), Chetyrkin, Kniehl and Steinhauser, hep-ph/9708255, from memory
        assertThat(DecouplingSeries.of(4, HeavyMass.MSBAR, 2).mass(2))
                .containsExactly(
                        ExactConstant.of(Rational.of(89, 432)),
                        ExactConstant.of(Rational.of(-5, 36)),
                        ExactConstant.of(Rational.of(1, 12)));
    }

    @Test
    void flavoursFollowTheScales() {
        FlavourThresholds thresholds = FlavourThresholds.standard(5);
        assertThat(thresholds.flavoursAt(1)).isEqualTo(3);
        assertThat(thresholds.flavoursAt(4.183)).isEqualTo(5);
        assertThat(thresholds.flavoursAt(4.182)).isEqualTo(4);
        assertThat(thresholds.flavoursAt(1000)).isEqualTo(6);
        RunningCoupling start = StandardInputs.coupling(5);
        assertThat(thresholds.alphaS(start, 3)).isEqualTo(thresholds.alphaS(start, 3, 4));
    }

    @ParameterizedTest
    @CsvSource({
        "alpha_s(MZ),                        world average, 0.1180(9)",
        "M_Z,                                '',            91.1880(20)",
        "mbar_c(mbar_c),                     MS-bar,        1.2730(46)",
        "mbar_b(mbar_b),                     MS-bar,        4.183(7)",
        "top pole mass from cross sections,  pole,          172.4(7)",
    })
    void standardInputsAreThoseOfTheReferenceTable(String quantity, String form, String printed) {
        List<String> rows = ReferenceTable.read("/reference-values/fixed-order.csv").stream()
                .filter(r -> r.get("quantity").equals(quantity) && r.get("colour_or_nf_form").equals(form))
                .map(r -> r.get("value"))
                .toList();
        assertThat(rows).singleElement(InstanceOfAssertFactories.STRING).contains(printed);
        double value = Double.parseDouble(printed.substring(0, printed.indexOf('(')));
        assertThat(List.of(
                        StandardInputs.ALPHA_S_MZ,
                        StandardInputs.MZ,
                        StandardInputs.CHARM_MASS,
                        StandardInputs.BOTTOM_MASS,
                        StandardInputs.TOP_POLE_MASS))
                .contains(value);
    }

    @Test
    void aHeavyQuarkIsNotCarriedBelowItsOwnThreshold() {
        RunningMass bottom = RunningMass.ofOwnScale(StandardInputs.coupling(5).at(4.183), 4.183);
        FlavourThresholds thresholds = FlavourThresholds.standard(5);
        assertThatThrownBy(() -> thresholds.mass(bottom, 3, 4))
                .isInstanceOf(DomainException.class)
                .hasMessage("a quark of mass 4.183 GeV cannot be carried over the threshold of one of 4.183 GeV;"
                        + " its running mass exists only above its own threshold");
        assertThat(thresholds.mass(bottom, 500, 6)).isBetween(2.0, 3.0);
    }

    @Test
    void wrongListsAreRefused() {
        assertThatThrownBy(() -> FlavourThresholds.of(4, List.of())).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> FlavourThresholds.of(5, THREE)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> FlavourThresholds.of(4, List.of(THREE.get(0), THREE.get(2))))
                .isInstanceOf(DomainException.class)
                .hasMessageStartingWith("thresholds must follow each other with one more flavour and a larger scale");
        assertThatThrownBy(() -> FlavourThresholds.standard(5).withFlavours(StandardInputs.coupling(5), 2))
                .isInstanceOf(DomainException.class)
                .hasMessage("these thresholds lead from 3 to 6 flavours, not to or from 2");
        assertThatThrownBy(() -> Threshold.pole(16, 100)).isInstanceOf(DomainException.class);
    }
}
