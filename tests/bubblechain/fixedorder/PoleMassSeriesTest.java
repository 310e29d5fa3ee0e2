package bubblechain.fixedorder;

import static bubblechain.fixedorder.ReferenceTable.assertPrinted;
import static bubblechain.fixedorder.ReferenceTable.numbers;
import static bubblechain.fixedorder.ReferenceTable.value;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.qcd.Coupling;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class PoleMassSeriesTest {
    private static final PerturbativeSeries SERIES = SeriesLibrary.find("pole-mass");

    @ParameterizedTest
    @CsvSource({"0,0", "3,0", "5,0", "0,1", "3,1", "5,1"})
    void coefficientsOfAlphaMatchTheReferenceTable(int nl, int heavy) {
        String coupling = heavy == 0 ? "alpha_s^(nl)" : "alpha_s^(nl+1)";
        List<String> printed = numbers(value("M/mbar(mbar) coefficients of alpha_s^k, " + coupling + "(mbar), nl=" + nl, "1..4"));
        UncertainSeries series = SERIES.inAlphaOverPi(nl, heavy).inUnits(ExactConstant.PI.inverse());
        for (int n = 0; n < 4; n++) {
            assertPrinted(series.values().get(n), printed.get(n), "coefficient of alpha_s^" + (n + 1));
        }
    }

    @Test
    void fourLoopPolynomialHasThePublishedFormInTheLightCoupling() {
        // fixed-order.csv, c4 in alpha_s^(nl): 3562.20(164) - 745.290(40)*nl + 43.3963*nl^2 - 0.678141*nl^3
        List<ExactConstant> polynomial = SERIES.flavourCoefficients(4);
        List<String> printed = List.of("3562.20", "-745.290", "43.3963", "-0.678141");
        for (int k = 0; k < 4; k++) {
            assertPrinted(polynomial.get(k), printed.get(k), "nl^" + k + " of c4");
        }
        assertThat(SERIES.errors(4, 5)).containsExactly(
                ExactConstant.of(Rational.parse("1.64")), ExactConstant.of(Rational.parse("0.2")));
    }

    @Test
    void shiftFromTheHeavyCouplingIsApplied() {
        // fixed-order.md section 3: the shift is -5.403780 + 0.431064 nl
        ExactConstant published = ExactConstant.of(Rational.parse("3567.60"));
        assertPrinted(SERIES.value(4, 0).subtract(published), "-5.403780", "shift at nl = 0");
    }

    @Test
    void threeLoopConstantsOfTheTwoCouplingsDifferByElevenFiftyFourths() {
        ExactConstant difference = SERIES.inAlphaOverPi(4, 1).values().get(2).subtract(SERIES.value(3, 4));
        assertThat(difference).isEqualTo(ExactConstant.of(Rational.of(11, 54)));
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 3, 4})
    void leadingFlavourCoefficientsAreThoseOfTheBubbleChain(int loops) {
        List<String> printed = numbers(value("M/mbar(mbar) leading nl^n coefficient", "all"));
        assertPrinted(SERIES.leadingFlavourCoefficient(loops), printed.get(loops - 1), "leading coefficient");
    }

    @Test
    void errorsSurviveTheChangeOfUnits() {
        UncertainSeries inY = SERIES.at(3, Coupling.ALPHA_OVER_4PI);
        assertThat(inY.sources()).hasSize(2);
        assertThat(inY.sources().get(0).get(3)).isEqualTo(ExactConstant.of(Rational.parse("1.64").multiply(256)));
        assertThat(SERIES.at(3).first(3).sources()).isEmpty();
        assertThat(SERIES.at(0).sources()).hasSize(1);
    }

    @Test
    void wordsSayWhatIsExpandedInWhat() {
        assertThat(SERIES.inWords(3)).isEqualTo("M/mbar(mbar) - 1 in alpha_s^(3)(mbar)/pi");
    }

    @Test
    void ordersAndFlavoursOutsideTheRangeAreRefused() {
        assertThatThrownBy(() -> SERIES.coefficient(5))
                .isInstanceOf(DomainException.class)
                .hasMessage("series 'pole-mass' is known to 4 loops; ask for 1 to 4, got 5");
        assertThatThrownBy(() -> SERIES.coefficient(0)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> SERIES.value(1, 16))
                .isInstanceOf(DomainException.class)
                .hasMessageContaining("holds for 0 to 15 flavours");
        assertThatThrownBy(() -> SERIES.at(3).first(0)).isInstanceOf(DomainException.class);
    }
}
