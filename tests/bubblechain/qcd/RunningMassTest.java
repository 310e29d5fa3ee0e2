package bubblechain.qcd;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import bubblechain.exact.DomainException;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class RunningMassTest {
    private static void equal(double value, double expected, double relative) {
        assertThat(value / expected - 1).isCloseTo(0, within(relative));
    }

    @Test
    void runningThereAndBackAndInTwoStepsWithSeed55() {
        SplittableRandom random = new SplittableRandom(55);
        for (int i = 0; i < 100; i++) {
            RunningCoupling coupling = RunningCoupling.of(random.nextInt(0, 7), random.nextInt(1, 6), 91, random.nextDouble(0.1, 0.13));
            RunningMass mass = RunningMass.of(coupling, random.nextInt(1, 6), random.nextDouble(5, 500), 2);
            double mu = 5 * Math.pow(10, 5 * random.nextDouble());
            equal(mass.at(mu).mass(mass.scale()), 2, 1e-12);
            equal(mass.at(mu).mass(60), mass.mass(60), 1e-12);
        }
    }

    @Test
    void oneLoopIsAPowerOfTheCoupling() {
        RunningCoupling coupling = RunningCoupling.of(5, 1, 91, 0.118);
        RunningMass mass = RunningMass.of(coupling, 91, 3);
        equal(mass.mass(5), 3 * Math.pow(coupling.alphaS(5) / 0.118, 12.0 / 23), 1e-13); // gamma0/beta0 = 4/(23/3)
    }

    @Test
    void theOwnScaleIsFoundFromAnyOther() {
        RunningCoupling coupling = StandardInputs.coupling(5);
        RunningMass bottom = RunningMass.ofOwnScale(coupling, 4.183);
        assertThat(bottom.mass(4.183)).isEqualTo(4.183);
        equal(bottom.at(91.188).ownScale(), 4.183, 1e-12);
        equal(bottom.at(3).ownScale(), 4.183, 1e-12);
    }

    @Test
    void bottomMassAtTheZ() {
        // about 2.8 to 2.9 GeV from mbar_b(mbar_b) near 4.18 GeV; general knowledge, from memory
        assertThat(RunningMass.ofOwnScale(StandardInputs.coupling(5), 4.183).mass(91.188)).isBetween(2.8, 2.9);
    }

    @Test
    void scalesBelowTheRangeAreRefused() {
        RunningMass mass = RunningMass.of(RunningCoupling.of(3, 1, 2, 0.3), 2, 0.09);
        assertThatThrownBy(() -> mass.mass(0.1))
                .isInstanceOf(DomainException.class)
                .hasMessageStartingWith("mu = 0.1000 GeV is below the Landau pole");
        assertThatThrownBy(() -> mass.mass(Double.NaN)).isInstanceOf(DomainException.class);
        assertThatThrownBy(mass::ownScale).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> RunningMass.of(mass.coupling(), 6, 2, 0.09))
                .isInstanceOf(DomainException.class)
                .hasMessage("the mass anomalous dimension is known to 5 loops; ask for 1 to 5, got 6");
    }
}
