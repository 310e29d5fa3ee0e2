package bubblechain.borel;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.analytic.NormalForm;
import bubblechain.analytic.Pole;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.kernel.KernelLibrary;
import org.junit.jupiter.api.Test;

/** 2M + V: the leading renormalons of twice the pole mass and of the static potential cancel, Beneke:1998rk, Hoang:1998nz. */
class StaticEnergyTest {
    private static NormalForm form(String kernel) {
        return KernelLibrary.load(kernel).transform().orElseThrow().requireNormalForm();
    }

    /** At mu = m = 1/r: 2 m (CF/beta0) T_M - (4 pi CF/(beta0 r)) T_V, divided by m CF/beta0. */
    private static final NormalForm ENERGY = form("pole-mass")
            .multiply(NormalForm.constant(ExactConstant.of(2)))
            .subtract(form("static-potential-r").multiply(NormalForm.constant(ExactConstant.PI.multiply(Rational.of(4)))));

    @Test
    void thePoleAtOneHalfCancelsIdentically() {
        assertThat(Pole.of(form("pole-mass"), Rational.HALF)).isPresent();
        assertThat(Pole.of(form("static-potential-r"), Rational.HALF)).isPresent();
        assertThat(Pole.of(ENERGY, Rational.HALF)).isEmpty();
    }

    @Test
    void thePoleAtThreeHalvesStays() {
        // 2 * 3/4 e^(5/2) - 4 pi/(6 pi) e^(5/2)
        assertThat(Pole.of(ENERGY, Rational.of(3, 2)).orElseThrow().residue())
                .isEqualTo(ExactConstant.of(Rational.of(5, 2)).exp().multiply(Rational.of(5, 6)));
    }

    @Test
    void aWrongWeightWouldLeaveAPole() {
        NormalForm wrong = form("pole-mass").subtract(
                form("static-potential-r").multiply(NormalForm.constant(ExactConstant.PI.multiply(Rational.of(4)))));
        assertThat(Pole.of(wrong, Rational.HALF)).isPresent();
    }
}
