package bubblechain.fixedorder;

import static bubblechain.fixedorder.ReferenceTable.assertPrinted;
import static bubblechain.fixedorder.ReferenceTable.numbers;
import static bubblechain.fixedorder.ReferenceTable.value;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatCode;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.qcd.BetaFunction;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The built-in series against the decimals of fixed-order.csv, and against each other. */
class PublishedSeriesTest {
    private static PerturbativeSeries series(String name) {
        return SeriesLibrary.find(name);
    }

    /** "c0 + c1*nf - c2*nf^2" to c0, c1, -c2; powers and flavour symbols taken out. */
    private static List<String> polynomial(String text) {
        return numbers(text.replaceAll("\\*?\\s*n[fl]\\^\\d+", "").replaceAll("\\(\\d+\\)", ""));
    }

    @ParameterizedTest
    @CsvSource({
        "adler, 1, Adler function non-singlet d1, a^1", "adler, 2, Adler function non-singlet d2, a^2",
        "adler, 3, Adler function non-singlet d3, a^3", "adler, 4, Adler function non-singlet d4, a^4",
        "bjorken-gls, 4, Bjorken polarised sum rule non-singlet c4, a^4",
        "cusp, 1, light-like cusp A1, 1-loop", "cusp, 2, light-like cusp A2, 2-loop",
        "cusp, 3, light-like cusp A3, 3-loop", "cusp, 4, 'light-like cusp A4', 4-loop",
        "gamma-m, 2, gamma_m1 (alpha_s, 2-loop", "gamma-m, 3, gamma_m2 (alpha_s, 3-loop",
        "gamma-m, 4, gamma_m3 (alpha_s, 4-loop", "gamma-m, 5, gamma_m4 (alpha_s, 5-loop",
        "static-potential-q, 2, static potential a1, 1-loop", "static-potential-q, 3, static potential a2, 2-loop",
        "pole-mass-heavy-coupling, 3, M/mbar(mbar) c3 in alpha_s^(nl+1), 3-loop",
        "pole-mass-heavy-coupling, 4, M/mbar(mbar) c4 in alpha_s^(nl+1), 4-loop",
    })
    void polynomialsInFlavoursMatchTheReferenceTable(String name, int loops, String quantity, String order) {
        List<String> printed = polynomial(first(quantity, order));
        List<ExactConstant> found = series(name).flavourCoefficients(loops);
        assertThat(found).hasSameSizeAs(printed);
        for (int k = 0; k < printed.size(); k++) {
            assertPrinted(found.get(k), printed.get(k), name + ", loops " + loops + ", nf^" + k);
        }
    }

    /** The row of the exact form; an earlier numerical one follows it in the table. */
    private static String first(String quantity, String order) {
        return quantity.equals("light-like cusp A4")
                ? ReferenceTable.read("/reference-values/fixed-order.csv").stream()
                        .filter(r -> r.get("quantity").equals(quantity))
                        .findFirst()
                        .orElseThrow()
                        .get("value")
                : value(quantity, order);
    }

    @Test
    void lowerOrdersOfTheBjorkenSumRuleMatchTheReferenceTable() {
        String[] rows = value("Bjorken polarised sum rule non-singlet c1", "a^1").split(";");
        for (int loops = 1; loops <= 3; loops++) {
            List<String> printed = polynomial(rows[loops - 1]);
            for (int k = 0; k < printed.size(); k++) {
                assertPrinted(
                        series("bjorken-gls").flavourCoefficients(loops).get(k), printed.get(k), loops + " loops, nf^" + k);
            }
        }
    }

    @Test
    void timeLikeCoefficientsMatchTheReferenceTable() {
        String[] rows = value("R ratio non-singlet r3, r4", "a^3").split(";");
        for (int loops = 3; loops <= 4; loops++) {
            List<String> printed = polynomial(rows[loops - 3]);
            for (int k = 0; k < printed.size(); k++) {
                assertPrinted(series("ree").flavourCoefficients(loops).get(k), printed.get(k), "r" + loops + ", nf^" + k);
            }
        }
        assertThat(series("ree").coefficient(1).value()).isEqualTo(series("adler").coefficient(1).value());
        assertThat(series("ree").flavourCoefficients(2)).isEqualTo(series("adler").flavourCoefficients(2));
    }

    @Test
    void singletPartOfTheGrossLlewellynSmithSumRuleMatchesTheReferenceTable() {
        ExactConstant third = series("gls").value(3, 1).subtract(series("bjorken-gls").value(3, 1));
        // fixed-order.csv, singlet part a^3: 0.413179761*nf
        assertPrinted(third, polynomial(value("Gross-Llewellyn Smith sum rule singlet", "a^3").replace("*nf", "")).get(0), "a^3");
        List<String> printed = numbers(value("Gross-Llewellyn Smith sum rule singlet part", "a^4").replace("nf^2", ""));
        for (int k = 1; k <= 2; k++) {
            ExactConstant fourth = series("gls").flavourCoefficients(4).get(k)
                    .subtract(series("bjorken-gls").flavourCoefficients(4).get(k));
            assertPrinted(fourth, printed.get(k - 1), "a^4, nf^" + k);
        }
    }

    @Test
    void threeLoopPotentialMatchesTheReferenceTableAndItsErrorCoversTheOneQuoted() {
        // fixed-order.csv: 13432.6(1) - 3289.91*nl + 185.990*nl^2 - 1.371742*nl^3
        List<String> printed = polynomial(value("static potential a3", "3-loop"));
        List<ExactConstant> found = series("static-potential-q").flavourCoefficients(4);
        for (int k = 0; k <= 3; k++) {
            assertPrinted(found.get(k), printed.get(k), "a3, nl^" + k);
        }
        // 0.01 CA^3 and 0.12 dF.dA/NA are larger than the (1) of the sum
        assertThat(series("static-potential-q").errors(4, 0)).containsExactly(
                ExactConstant.of(Rational.parse("0.27")), ExactConstant.of(Rational.parse("0.1125")));
    }

    @Test
    void theSumRuleOfCrewtherHoldsExactlyForEveryFlavourNumber() {
        // (1 + sum d) (1 + sum c) = 1 + (beta(a)/a) (K1 a + K2 a^2 + K3 a^3), fixed-order.md section 6: the coefficient of a
        // vanishes, that of a^2 is -B0 K1, of a^3 -B0 K2 - B1 K1
        String k1 = "4/3*(3*zeta(3) - 21/8)";
        String k2 = "16/9*(397/96 + 17/2*zeta(3) - 15*zeta(5)) + 4*(-629/32 + 221/12*zeta(3)) + 2/3*nf*(163/24 - 19/3*zeta(3))";
        for (int nf = 0; nf <= 6; nf++) {
            List<ExactConstant> d = series("adler").at(nf).values();
            List<ExactConstant> c = series("bjorken-gls").at(nf).values();
            List<ExactConstant> product = product(d, c);
            ExactConstant b0 = ExactConstant.of(BetaFunction.of(nf).beta0().divide(4));
            ExactConstant b1 = ExactConstant.of(Rational.of(306 - 38L * nf, 48));
            ExactConstant one = constant(k1, nf);
            assertThat(product.get(0).isZero()).isTrue();
            assertThat(product.get(1)).isEqualTo(b0.multiply(one).multiply(Rational.of(-1)));
            assertThat(product.get(2))
                    .isEqualTo(b0.multiply(constant(k2, nf)).add(b1.multiply(one)).multiply(Rational.of(-1)));
        }
    }

    @Test
    void theFourLoopCrewtherRemainderVanishesWhereBetaZeroDoes() {
        // at beta0 = 0, nf = 33/2, the coefficient of a^4 is -B1 K2 - B2 K1 (K3 is multiplied by B0)
        Rational nf = Rational.of(33, 2);
        List<ExactConstant> d = at("adler", nf);
        List<ExactConstant> c = at("bjorken-gls", nf);
        ExactConstant k1 = constant("4/3*(3*zeta(3) - 21/8)", 0);
        ExactConstant k2 = constant("16/9*(397/96 + 17/2*zeta(3) - 15*zeta(5)) + 4*(-629/32 + 221/12*zeta(3))"
                + " + 11*(163/24 - 19/3*zeta(3))", 0);
        Rational b1 = Rational.of(102 - 209).divide(16); // 102 - 38/3 * 33/2
        Rational b2 = Rational.parse("2857/2").subtract(Rational.of(5033, 18).multiply(nf))
                .add(Rational.of(325, 54).multiply(nf).multiply(nf)).divide(64);
        ExactConstant expected = k2.multiply(b1).add(k1.multiply(b2)).multiply(Rational.of(-1));
        assertThat(product(d, c).get(3)).isEqualTo(expected);
    }

    private static List<ExactConstant> at(String name, Rational nf) {
        List<ExactConstant> values = new ArrayList<>();
        for (int n = 1; n <= 4; n++) {
            values.add(ConstantValue.of(series(name).coefficient(n).value(), Map.of("nf", ExactConstant.of(nf))));
        }
        return values;
    }

    private static List<ExactConstant> product(List<ExactConstant> d, List<ExactConstant> c) {
        List<ExactConstant> result = new ArrayList<>();
        for (int n = 0; n < d.size(); n++) {
            ExactConstant sum = d.get(n).add(c.get(n));
            for (int k = 0; k < n; k++) {
                sum = sum.add(d.get(k).multiply(c.get(n - 1 - k)));
            }
            result.add(sum);
        }
        return result;
    }

    private static ExactConstant constant(String formula, int nf) {
        return ConstantValue.of(Formula.parse(formula), Map.of("nf", ExactConstant.of(nf)));
    }

    @Test
    void piSquaredTermsOfTheHiggsWidthAreThoseOfTheContinuation() {
        // d F/d ln Q^2 = m^2 (-2 gamma_m G - beta G') twice, times -pi^2/6; G = 1 + 17/3 a
        for (int nf = 0; nf <= 6; nf++) {
            Rational b0 = Rational.of(33 - 2L * nf, 12);
            Rational b1 = Rational.of(306 - 38L * nf, 48);
            Rational g1 = Rational.of(606 - 20L * nf, 144); // gamma_m1, fixed-order.csv
            Rational d1 = Rational.of(17, 3);
            Rational x = g1.multiply(-2).subtract(d1.multiply(2)).subtract(b0.multiply(d1));
            Rational second = g1.multiply(4).subtract(x.multiply(2)).add(b1.multiply(2)).subtract(x.multiply(b0).multiply(2));
            Rational two = Rational.of(4).add(b0.multiply(2));
            assertThat(constant("-19/12 + nf/18", nf)).isEqualTo(ExactConstant.of(two.divide(-6)));
            assertThat(constant("-3535/72 + 277/72*nf - 11/162*nf^2", nf)).isEqualTo(ExactConstant.of(second.divide(-6)));
            // without these pi^2 terms no pi^2 is left in the file: only rational numbers and zeta values
            ExactConstant rest = series("scalar-im-hbb").value(2, nf).subtract(
                    ExactConstant.PI.power(2).multiply(constant("-19/12 + nf/18", nf)));
            assertThat(rest).isEqualTo(constant("10801/144 - 39/2*zeta(3) + nf*(-65/24 + 2/3*zeta(3))", nf));
            ExactConstant third = series("scalar-im-hbb").value(3, nf).subtract(
                    ExactConstant.PI.power(2).multiply(ExactConstant.of(second.divide(-6))));
            assertThat(third).isEqualTo(constant("6163613/5184 - 109735/216*zeta(3) + 815/12*zeta(5)"
                    + " + nf*(-46147/486 + 262/9*zeta(3) - 5/6*zeta(4) - 25/9*zeta(5)) + nf^2*(15511/11664 - zeta(3)/3)", nf));
        }
    }

    @Test
    void fourLoopHiggsWidthHasThePublishedDecimalWhereTheChainFormIsWritten() {
        // hep-ph/0511063 (from memory): -0.0205 nf^3
        assertPrinted(series("scalar-im-hbb").flavourCoefficients(4).get(3), "-0.0205", "nf^3");
    }

    @Test
    void chromomagneticSeriesMatchesTheReferenceTableAndIsKnownAtOneFlavourNumberOnly() {
        List<String> printed = numbers(value("HQET chromomagnetic coefficient C_cm(m_b), nl=4", "1..3-loop"));
        for (int n = 1; n <= 3; n++) {
            assertPrinted(series("chromomag").value(n, 4), printed.get(n - 1), "alpha_s^" + n);
        }
        assertThat(series("chromomag").isForOneFlavourNumber()).isTrue();
        assertThat(series("pole-mass").isForOneFlavourNumber()).isFalse();
        assertThatThrownBy(() -> series("chromomag").value(1, 3))
                .hasMessageStartingWith("series 'chromomag' holds for 4 flavours (");
    }

    @Test
    void chromomagneticAnomalousDimensionMatchesTheReferenceTable() {
        // 1.5(alpha_s/pi)[1 + (2.833333333 - 0.3611111111 nf)(alpha_s/pi)], in size
        List<ExactConstant> found = series("gamma-chromomag").flavourCoefficients(2);
        assertPrinted(found.get(0), "2.833333333", "nf^0");
        assertPrinted(found.get(1), "-0.3611111111", "nf^1");
        assertThat(series("gamma-chromomag").prefactor(3)).isEqualTo(ExactConstant.of(Rational.parse("-1.5")));
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 3, 4, 5})
    void bothCouplingsOfThePoleMassAreTheSameSeries(int nl) {
        List<ExactConstant> light = series("pole-mass").inAlphaOverPi(nl, 0).values();
        List<ExactConstant> converted = series("pole-mass-heavy-coupling").inAlphaOverPi(nl, 0).values();
        for (int n = 0; n < 4; n++) {
            assertPrinted(converted.get(n).subtract(light.get(n)), "0.00000000", "c" + (n + 1));
        }
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 3, 5})
    void theForceIsTheDerivativeOfThePotential(int nl) {
        // fixed-order.csv, beta function rows
        List<ExactConstant> v = series("static-potential-r").at(nl).values();
        List<ExactConstant> f = series("static-force").at(nl).values();
        List<ExactConstant> beta = List.of(
                constant("11 - 2/3*nf", nl), constant("102 - 38/3*nf", nl), constant("2857/2 - 5033/18*nf + 325/54*nf^2", nl));
        for (int n = 1; n <= 4; n++) {
            ExactConstant expected = v.get(n - 1);
            for (int k = 0; k <= n - 2; k++) {
                int m = n - 1 - k;
                expected = expected.subtract(beta.get(k).multiply(v.get(m - 1)).multiply(Rational.of(2L * m)));
            }
            assertThat(f.get(n - 1)).as("f_%d", n).isEqualTo(expected);
        }
    }

    @Test
    void seriesWithDifferentPrescriptionsAreNotCompared() {
        PerturbativeSeries potential = series("static-potential-r");
        PerturbativeSeries other = withPrescription("mu_us = 1 GeV");
        assertThatThrownBy(() -> potential.requireSamePrescription(other))
                .isInstanceOf(DomainException.class)
                .hasMessage("the series 'static-potential-r' and 'mine' cannot be compared: the first has the prescription"
                        + " 'ultrasoft logarithm left out of a_3 in momentum space (mu_us = q)', the second"
                        + " 'mu_us = 1 GeV'; use series with the same one");
        assertThatCode(() -> potential.requireSamePrescription(series("static-force"))).doesNotThrowAnyException();
        assertThatCode(() -> potential.requireSamePrescription(series("pole-mass"))).doesNotThrowAnyException();
        assertThat(other.inWords(3)).isEqualTo("f in alpha_s^(3)(1/r)/pi; mu_us = 1 GeV");
    }

    private static PerturbativeSeries withPrescription(String words) {
        return SeriesFile.parse("""
                name = "mine"
                title = "Mine"
                quantity = "f"
                scale = "1/r"
                coupling = "alpha/pi"
                coupling_flavours = "nf"
                flavours = "massless"
                flavours_from = "0"
                flavours_to = "6"
                power = "1"
                prescription = "%s"
                [[coefficient]]
                loops = "1"
                value = "1"
                status = "derived here"
                """.formatted(words), "mine.toml");
    }
}
