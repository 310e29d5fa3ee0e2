package bubblechain.qcd;

import static bubblechain.fixedorder.ReferenceTable.assertPrinted;
import static bubblechain.fixedorder.ReferenceTable.numbers;
import static bubblechain.fixedorder.ReferenceTable.value;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.bibliography.Bibliography;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class MassAnomalousDimensionTest {
    @ParameterizedTest
    @ValueSource(ints = {0, 1, 2, 3, 4})
    void numbersOfTheReferenceTable(int k) {
        String printed = value("gamma_m" + k + " number", (k + 1) + "-loop"); // fixed-order.csv, evaluation of the exact form
        for (String entry : printed.split("; ")) {
            String[] parts = entry.substring(2).split(": ");
            assertPrinted(perPi(Integer.parseInt(parts[0]), k), parts[1], "gamma_m" + k + " at nf = " + parts[0]);
        }
    }

    /** In the normalisation of the table, d ln m/d ln mu^2 = -sum gamma (alpha_s/pi)^(k+1). */
    private static ExactConstant perPi(int nf, int k) {
        return MassAnomalousDimension.of(nf).gamma(k).divide(Rational.of(4).power(k + 1));
    }

    @Test
    void fiveLoopCoefficientHasThePublishedDecimals() {
        // 559.7069 - 143.6865 nf + 7.48238 nf^2 + 0.108318 nf^3 - 0.0000853589 nf^4, Baikov et al, arXiv:1402.6611, from memory
        Formula decimals = Formula.parse("559.7069 - 143.6865*nf + 7.48238*nf^2 + 0.108318*nf^3 - 0.0000853589*nf^4");
        for (int nf = 0; nf <= 6; nf++) {
            double published = ConstantValue.of(decimals, Map.of("nf", ExactConstant.of(nf))).toBall(64).toDouble();
            assertThat(Math.abs(Numbers.of(perPi(nf, 4)) - published)).isLessThan(1e-3);
        }
    }

    @Test
    void leadingFlavourTermsAreThoseOfOneChain() {
        // (1 + 2b/3) Gamma(4+2b)/[Gamma(1-b) Gamma(2+b)^2 Gamma(3+b)]/3 in b = -nf a/6: 1, -5/6 b, ...; fixed-order.csv, section 2:
        // here the nf^k terms of gamma_m printed in the rows of the general forms
        List<String> two = numbers(value("gamma_m1 (", "2-loop")); // 4.208333333 - 0.1388888889*nf
        ExactConstant slope = perPi(1, 1).subtract(perPi(0, 1));
        assertPrinted(slope, two.get(1), "nf term of gamma_m1");
        assertThat(slope).isEqualTo(ExactConstant.of(Rational.of(-5, 36)));
    }

    @Test
    void coefficientsBeyondTheLoopsKeptAreZero() {
        MassAnomalousDimension two = MassAnomalousDimension.of(4, 2);
        assertThat(two.loops()).isEqualTo(2);
        assertThat(two.gamma(2)).isEqualTo(ExactConstant.ZERO);
        assertThat(two.gamma(1)).isEqualTo(MassAnomalousDimension.of(4).gamma(1));
    }

    @Test
    void sourcesAreInTheBibliography() {
        List<String> known = List.copyOf(Bibliography.shipped().keys());
        for (int k = 0; k < MassAnomalousDimension.LARGEST_LOOPS; k++) {
            assertThat(known).containsAll(MassAnomalousDimension.sources(k)).containsAll(BetaFunction.sources(k));
        }
        assertThat(known)
                .containsAll(Decoupling.SOURCES)
                .containsAll(DecouplingSeries.MASS_SOURCES)
                .containsAll(DecouplingSeries.POLE_MASS_SOURCES);
    }

    @Test
    void requestsOutsideTheRangeAreRefused() {
        assertThatThrownBy(() -> MassAnomalousDimension.of(17))
                .isInstanceOf(DomainException.class)
                .hasMessage("the number of flavours must lie between 0 and 16, where beta0 is positive; got 17");
        assertThatThrownBy(() -> MassAnomalousDimension.of(3, 6))
                .isInstanceOf(DomainException.class)
                .hasMessage("the mass anomalous dimension is known to 5 loops; ask for 1 to 5, got 6");
    }
}
