package bubblechain.qcd;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import org.junit.jupiter.api.Test;

class CouplingTest {
    private static final Rational NINE = Rational.of(9);

    @Test
    void everyCouplingIsReadByItsName() {
        for (Coupling coupling : Coupling.values()) {
            assertThat(Coupling.parse(coupling.text())).isEqualTo(coupling);
        }
    }

    @Test
    void couplingsRelateToAlphaAsTheirNamesSay() {
        assertThat(Coupling.A.perAlpha(NINE)).isEqualTo(ExactConstant.PI.inverse().multiply(Rational.of(9, 4)));
        assertThat(Coupling.ALPHA_OVER_PI.inUnitsOf(Coupling.ALPHA_OVER_4PI, NINE)).isEqualTo(ExactConstant.of(4));
        assertThat(Coupling.A.inUnitsOf(Coupling.ALPHA_OVER_4PI, NINE)).isEqualTo(ExactConstant.of(9));
    }

    @Test
    void conversionThereAndBackIsOne() {
        for (Coupling from : Coupling.values()) {
            for (Coupling to : Coupling.values()) {
                ExactConstant round = from.inUnitsOf(to, NINE).multiply(to.inUnitsOf(from, NINE));
                assertThat(round).isEqualTo(ExactConstant.ONE);
            }
        }
    }

    @Test
    void wordsNameFlavoursAndScale() {
        assertThat(Coupling.ALPHA_OVER_PI.words(4, "2 mbar")).isEqualTo("alpha_s^(4)(2 mbar)/pi");
        assertThat(Coupling.A.words(3, "Q")).isEqualTo("a = beta0 alpha_s^(3)(Q)/(4 pi)");
    }

    @Test
    void wrongNamesAreRefused() {
        assertThatThrownBy(() -> Coupling.parse("alphas"))
                .isInstanceOf(DomainException.class)
                .hasMessage("coupling 'alphas' is not one of a, alpha, alpha/pi, alpha/4pi");
        assertThatThrownBy(() -> Normalisation.parse("none"))
                .isInstanceOf(DomainException.class)
                .hasMessage("normalisation 'none' is not one of prefactor, full, first");
        assertThatThrownBy(() -> Coupling.ALPHA.inUnitsOf(Coupling.A, Rational.ZERO)).isInstanceOf(DomainException.class);
    }

    @Test
    void everyNormalisationIsReadByItsName() {
        for (Normalisation normalisation : Normalisation.values()) {
            assertThat(Normalisation.parse(normalisation.text())).isEqualTo(normalisation);
        }
    }
}
