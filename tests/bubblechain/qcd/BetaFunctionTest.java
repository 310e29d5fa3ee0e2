package bubblechain.qcd;

import static bubblechain.fixedorder.ReferenceTable.assertPrinted;
import static bubblechain.fixedorder.ReferenceTable.value;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class BetaFunctionTest {
    /** Colour forms of fixed-order.csv (van Ritbergen, Vermaseren, Larin, hep-ph/9701390), in the formula language. */
    private static final List<String> COLOUR_FORMS = List.of(
            "11/3*CA - 4/3*TF*nf",
            "34/3*CA^2 - 4*CF*TF*nf - 20/3*CA*TF*nf",
            "2857/54*CA^3 + 2*CF^2*TF*nf - 205/9*CF*CA*TF*nf - 1415/27*CA^2*TF*nf + 44/9*CF*TF^2*nf^2 + 158/27*CA*TF^2*nf^2",
            "CA^4*(150653/486-44/9*zeta(3)) + CA^3*TF*nf*(-39143/81+136/3*zeta(3))"
                    + " + CA^2*CF*TF*nf*(7073/243-656/9*zeta(3)) + CA*CF^2*TF*nf*(-4204/27+352/9*zeta(3)) + 46*CF^3*TF*nf"
                    + " + CA^2*TF^2*nf^2*(7930/81+224/9*zeta(3)) + CF^2*TF^2*nf^2*(1352/27-704/9*zeta(3))"
                    + " + CA*CF*TF^2*nf^2*(17152/243+448/9*zeta(3)) + 424/243*CA*TF^3*nf^3 + 1232/243*CF*TF^3*nf^3"
                    + " + DAA/NA*(-80/9+704/3*zeta(3)) + nf*DFA/NA*(512/9-1664/3*zeta(3))"
                    + " + nf^2*DFF/NA*(-704/9+512/3*zeta(3))");

    @ParameterizedTest
    @ValueSource(ints = {0, 1, 2, 3, 4})
    void numbersOfTheReferenceTable(int k) {
        String printed = value("beta" + k + " number", (k + 1) + "-loop"); // fixed-order.csv, evaluation of the exact form
        for (String entry : printed.split("; ")) {
            String[] parts = entry.substring(2).split(": ");
            ExactConstant beta = BetaFunction.of(Integer.parseInt(parts[0])).beta(k);
            assertPrinted(beta, parts[1], "beta" + k + " at nf = " + parts[0]);
        }
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 1, 2, 3})
    void colourFormsReduceExactlyForEveryFlavourNumber(int k) {
        Formula colour = Formula.parse(COLOUR_FORMS.get(k));
        for (int nf = 0; nf <= BetaFunction.LARGEST_NF; nf++) {
            assertThat(ConstantValue.of(colour, colours(nf))).isEqualTo(BetaFunction.of(nf).beta(k));
        }
    }

    private static Map<String, ExactConstant> colours(int nf) {
        Map<String, ExactConstant> names = new HashMap<>();
        Map.of("CF", Colour.CF, "CA", Colour.CA, "TF", Colour.TF, "NA", Colour.NA, "DFF", Colour.DFF, "DFA", Colour.DFA,
                        "DAA", Colour.DAA)
                .forEach((name, number) -> names.put(name, ExactConstant.of(number)));
        names.put("nf", ExactConstant.of(nf));
        return names;
    }

    @Test
    void fiveLoopCoefficientHasThePublishedDecimals() {
        // 537147.674 - 186161.950 nf + 17567.758 nf^2 - 231.2777 nf^3 - 1.842474 nf^4, Baikov et al, arXiv:1606.08659
        Formula decimals = Formula.parse("537147.674 - 186161.950*nf + 17567.758*nf^2 - 231.2777*nf^3 - 1.842474*nf^4");
        for (int nf = 0; nf <= 6; nf++) {
            double published = ConstantValue.of(decimals, Map.of("nf", ExactConstant.of(nf))).toBall(64).toDouble();
            assertThat(BetaFunction.of(nf).toBall(4, 64).toDouble()).isCloseTo(published, within(0.03));
        }
    }

    @Test
    void coefficientsBeyondTheLoopsKeptAreZero() {
        BetaFunction oneLoop = BetaFunction.of(4, 1);
        assertThat(oneLoop.beta(1)).isEqualTo(ExactConstant.ZERO);
        assertThat(oneLoop.b1hat()).isEqualTo(Rational.ZERO);
        assertThat(BetaFunction.of(4).beta(5)).isEqualTo(ExactConstant.ZERO);
        assertThat(BetaFunction.of(4).truncated(1)).isEqualTo(oneLoop);
    }

    @Test
    void exponentOfLambdaForThreeFlavours() {
        assertThat(BetaFunction.of(3).b1hat()).isEqualTo(Rational.of(32, 81)); // b = 0.39506173, fixed-order.csv, nl=3
    }

    @Test
    void leadingCoefficientIsPositiveInTheWholeRange() {
        for (int nf = 0; nf <= BetaFunction.LARGEST_NF; nf++) {
            assertThat(BetaFunction.of(nf).beta0().signum()).isPositive();
        }
    }

    @Test
    void flavourNumbersOutsideTheRangeAreRefused() {
        assertThatThrownBy(() -> BetaFunction.of(17))
                .isInstanceOf(DomainException.class)
                .hasMessage("the number of flavours must lie between 0 and 16, where beta0 is positive; got 17");
        assertThatThrownBy(() -> BetaFunction.of(-1)).isInstanceOf(DomainException.class);
    }

    @Test
    void unknownLoopsAreRefused() {
        assertThatThrownBy(() -> BetaFunction.of(3, 6))
                .isInstanceOf(DomainException.class)
                .hasMessage("the beta function is known to 5 loops; ask for 1 to 5, got 6");
        assertThatThrownBy(() -> BetaFunction.of(3, 0)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> BetaFunction.of(3, 2).truncated(3)).isInstanceOf(DomainException.class);
    }

    @Test
    void colourFactorsFollowFromThreeColours() {
        // general SU(N) forms of the quartic traces at N = 3
        assertThat(Colour.DFF).isEqualTo(Rational.of(8 * (81 - 54 + 18), 96 * 9));
        assertThat(Colour.DFA).isEqualTo(Rational.of(3 * 8 * 15, 48));
        assertThat(Colour.DAA).isEqualTo(Rational.of(9 * 8 * 45, 24));
        assertThat(Colour.CF).isEqualTo(Rational.of(8, 6));
    }
}
