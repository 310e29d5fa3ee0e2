package bubblechain.borel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.chain.Chain;
import bubblechain.chain.Scales;
import bubblechain.exact.Ball;
import bubblechain.exact.BoundSamples;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import bubblechain.kernel.KernelText;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class PoleSharesTest {
    private static final int BITS = 512;

    @TempDir
    private static Path folder;

    private static PoleShares shares(Kernel kernel, Scales scales, String from, String to, int n) {
        Rational low = Rational.parse(from);
        Rational high = Rational.parse(to);
        List<BorelPole> poles = BorelPlane.of(kernel, scales).poles(low, high);
        return PoleShares.of(kernel, scales, poles, low, high, n);
    }

    @ParameterizedTest
    @CsvSource({
        "pole-mass, -4, 6", "pole-mass, -1, 1", "pole-mass, 1/2, 1/2", "pole-mass, 1, 2", "pole-mass, -12, 12",
        "adler, -3, 3", "adler, -1, 2", "adler, 2, 4", "bjorken-gls, -2, 2", "bjorken-gls, -1, 1", "lepton-g2, -2, 5/2",
        "static-potential-r, -1, 9/2", "static-potential-r, 1/2, 3/2"
    })
    void sharesAndRemainderMakeUpTheCoefficientWithinAProvedAndUsefulBound(String name, String from, String to) {
        Kernel kernel = KernelLibrary.load(name);
        BoundSamples samples = new BoundSamples();
        for (String mu : new String[] {"1", "2"}) {
            Scales scales = Scales.of(ExactConstant.of(Rational.parse(mu)), ExactConstant.ONE);
            for (int n : new int[] {0, 1, 5, 20, 41}) {
                PoleShares made = shares(kernel, scales, from, to, n);
                String what = "%s, %s to %s, mu = %s, n = %d".formatted(name, from, to, mu, n);
                Ball sum = made.remainder();
                for (Ball share : made.shares()) {
                    sum = sum.add(share, BITS);
                }
                Ball exact = Chain.of(kernel, scales).balls(n + 1, BITS).get(n);
                assertThat(sum.subtract(exact, BITS).containsZero()).as(what).isTrue();
                RemainderBound bound = made.bound().orElseThrow();
                // the remainder has some three hundred bits, the bound is a double
                assertThat(made.remainder().accuracyBits()).as(what).isGreaterThan(3 * 53);
                samples.add(bound.size().toRational(), made.remainder().abs().upperBound().toRational(), "%s", what);
                assertUseful(made, bound, what);
            }
        }
        samples.assertNotWasteful(10, "%s, %s to %s", name, from, to);
    }

    /** A bound is useful if it is not far above the larger of the remainder and the coefficient's smallest share. */
    private static void assertUseful(PoleShares made, RemainderBound bound, String what) {
        double remainder = made.remainder().abs().upperBound().toDouble();
        assertThat(bound.size().toDouble()).as(what + ", remainder " + remainder).isLessThan(1e8 * (1e-3 + remainder));
    }

    @Test
    void farOutThePolesAreAllOfTheCoefficient() {
        PoleShares made = shares(KernelLibrary.load("pole-mass"), Scales.NATURAL, "-2", "2", 120);
        double relative = made.bound().orElseThrow().size().toDouble() / made.total().toDouble();
        // the nearest pole left out is u = 5/2 against u = 1/2: (1/5)^120 times a moderate number
        assertThat(relative).isLessThan(1e-80);
    }

    @Test
    void aRationalTransformWithAllPolesListedLeavesNothing() {
        Kernel kernel = KernelText.of("1/((1-u)*(2+u)^2)").kernel(folder);
        for (int n = 0; n < 12; n++) {
            PoleShares made = shares(kernel, Scales.NATURAL, "-2", "1", n);
            assertThat(made.remainder().containsZero()).isTrue();
            assertThat(made.remainder().upperBound().toDouble()).isLessThan(1e-60);
        }
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {"1/(u^2-2) | 10", "1/(u^2+u+1) | 9", "gamma(1/4-u) | 12", "exp(u)/(u^3-2) | 8"})
    void polesThatAreNotListedKeepTheCircleInside(String transform, int n) {
        Kernel kernel = KernelText.of(transform).kernel(folder);
        PoleShares made = shares(kernel, Scales.NATURAL, "-3", "3", n);
        RemainderBound bound = made.bound().orElseThrow();
        assertThat(made.remainder().abs().upperBound().toRational()).isLessThanOrEqualTo(bound.size().toRational());
        assertUseful(made, bound, transform);
    }

    @Test
    void theShareOfAPoleIsItsPrincipalPartExpanded() {
        // -R n!/u0^(n+1) for a simple pole
        BorelPole pole = BorelPlane.of(KernelLibrary.load("pole-mass"), Scales.NATURAL).poleAt(Rational.HALF).orElseThrow();
        Ball share = pole.share(4, BITS);
        Ball expected = pole.pole().residue().negate().multiply(Rational.of(24 * 32)).toBall(BITS);
        assertThat(share.subtract(expected, BITS).containsZero()).isTrue();
    }

    @Test
    void theBoundIsRoundedUp() {
        PoleShares made = shares(KernelLibrary.load("adler"), Scales.NATURAL, "-1", "2", 6);
        RemainderBound bound = made.bound().orElseThrow();
        assertThat(Rational.parse(bound.decimal())).isGreaterThanOrEqualTo(bound.size().toRational());
        assertThat(Rational.parse(bound.decimal()).toDouble()).isLessThan(1.02 * bound.size().toDouble());
    }

    @Test
    void anIndexOutOfRangeIsRefused() {
        assertThatThrownBy(() -> shares(KernelLibrary.load("adler"), Scales.NATURAL, "-1", "2", 401))
                .isInstanceOf(DomainException.class)
                .hasMessage("the coefficient whose make-up is shown has n between 0 and 400, got 401");
    }
}
