package bubblechain.borel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.analytic.AlgebraicPole;
import bubblechain.analytic.PoleStatus;
import bubblechain.chain.Scales;
import bubblechain.exact.DomainException;
import bubblechain.exact.Rational;
import bubblechain.formula.FormulaException;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelText;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The Borel plane of formulas of one's own. */
class UserPolesTest {
    private static final Rational THREE = Rational.of(3);

    @TempDir
    private static Path folder;

    private static BorelPlane plane(String transform) {
        return BorelPlane.of(KernelText.of(transform).kernel(folder), Scales.NATURAL);
    }

    @Test
    void aRemovableFactorLeavesNoPole() {
        BorelPlane plane = plane("exp(5*u/3)*(u-1/3)/((u-1/3)*(1-u))");
        assertThat(plane.poles(THREE.negate(), THREE)).extracting(BorelPole::u).containsExactly(Rational.ONE);
        assertThat(plane.poleAt(Rational.of(1, 3))).isEmpty();
    }

    @Test
    void aPoleThatCancelsBetweenTermsIsNone() {
        BorelPlane plane = plane("gamma(1-u) - gamma(2-u)/(1-u) + 1/(2-u)");
        assertThat(plane.poles(THREE.negate(), THREE)).extracting(BorelPole::u).containsExactly(Rational.TWO);
        BorelPlane atZero = plane("(1+u)/u - gamma(1+u)/u");
        assertThat(atZero.poleAt(Rational.ZERO)).isEmpty();
        assertThat(atZero.regularCandidates(Rational.ZERO, Rational.ONE)).containsExactly(Rational.ZERO);
    }

    @Test
    void residuesOutsideTheKnownConstantsAreCertifiedWithoutClosedForm() {
        List<BorelPole> poles = plane("gamma(1/4-u)/gamma(1/4)").poles(Rational.ZERO, THREE);
        assertThat(poles).extracting(p -> p.u().toString()).containsExactly("1/4", "5/4", "9/4");
        assertThat(poles).allSatisfy(pole -> {
            assertThat(pole.pole().status()).isEqualTo(PoleStatus.CERTIFIED);
            assertThat(pole.pole().residue().isClosedForm()).isFalse();
        });
        // -1/Gamma(1/4), mpmath 30 digits
        assertThat(poles.get(0).pole().residue().toBall(200).toDecimal(20)).contains("-0.27581566283020931436");
        assertThat(poles.get(0).power("Q")).isEqualTo("(Lambda/Q)^(1/2)");
    }

    @Test
    void irrationalPolesAreIsolated() {
        List<AlgebraicPole> poles = plane("1/(u^2-2)").algebraicPoles(THREE.negate(), THREE);
        assertThat(poles).hasSize(2);
        for (AlgebraicPole pole : poles) {
            assertThat(pole.lower()).isLessThan(pole.upper());
            assertThat(pole.polynomial().valueAt(pole.lower()).signum() * pole.polynomial().valueAt(pole.upper()).signum())
                    .isEqualTo(-1);
            assertThat(pole.status()).isEqualTo(PoleStatus.CERTIFIED);
        }
        assertThat(RootInterval.of(poles.get(1), 12).decimal(12))
                .isEqualTo(bubblechain.report.Value.numeral("1.41421356237")); // sqrt(2)
        assertThat(RootInterval.of(poles.get(0), 12).distance()).isBetween(1.41421356237, 1.41421356238);
    }

    @Test
    void complexPolesAreListed() {
        assertThat(plane("1/(u^2+u+1)").complexPoles()).hasSize(1).allSatisfy(pair -> {
            assertThat(pair.re()).isEqualTo(-0.5, org.assertj.core.data.Offset.offset(1e-12));
            assertThat(Math.abs(pair.im())).isEqualTo(Math.sqrt(0.75), org.assertj.core.data.Offset.offset(1e-12));
        });
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "u/(exp(u)-1)      | line 1, column 4: a denominator must be a product of rational functions, exponentials, gammas and"
                + " sin(pi*...); the zeros of this one cannot be listed exactly | u/(exp(u)-1);   ^^^^^^^^",
        "gamma(1+u^2)      | line 1, column 7: the argument of gamma must be linear in u | gamma(1+u^2);      ^^^^^"
    })
    void outsideTheClassThePlaceIsShown(String transform, String reason, String picture) {
        Kernel kernel = KernelText.of(transform).kernel(folder);
        String[] lines = picture.split(";");
        assertThatThrownBy(() -> BorelPlane.of(kernel, Scales.NATURAL))
                .isInstanceOf(FormulaException.class)
                .hasMessage("the poles of the kernel mine cannot be listed, its coefficients can; T(u), " + reason + "\n  "
                        + lines[0] + "\n  " + lines[1]);
    }

    @Test
    void rangesAreChecked() {
        BorelPlane plane = plane("gamma(1-u)");
        assertThatThrownBy(() -> plane.poles(THREE, Rational.ONE))
                .isInstanceOf(DomainException.class)
                .hasMessage("the range from 3 to 1 is empty; --from must not exceed --to");
        Rational far = Rational.of(100_000);
        assertThatThrownBy(() -> plane.poles(far.negate(), far))
                .hasMessage("the range from -100000 to 100000 may hold more than 5000 poles; ask for a smaller one");
    }

    @Test
    void aDenseSequenceStillHasANearestPole() {
        assertThat(plane("gamma(1-1000*u)").leadingInfrared().orElseThrow().u()).isEqualTo(Rational.of(1, 1000));
        assertThat(plane("1/(11-u)").leadingInfrared().orElseThrow().u()).isEqualTo(Rational.of(11));
        assertThat(plane("1/(13-u)").leadingInfrared()).isEmpty();
    }

    @Test
    void listsThatWouldTakeMinutesAreRefused() {
        Kernel sequences = KernelText.of("sum(k,1,1000,gamma(1+k*u))").kernel(folder);
        assertThatThrownBy(() -> BorelPlane.of(sequences, Scales.NATURAL).poles(Rational.of(-3), Rational.of(3)))
                .isInstanceOf(DomainException.class)
                .hasMessage("the range from -3 to 3 may hold more than 5000 poles; ask for a smaller one");
        Kernel steep = KernelText.of("polygamma(200,1-u)").kernel(folder);
        assertThatThrownBy(() -> BorelPlane.of(steep, Scales.NATURAL).poles(Rational.ZERO, Rational.TWO))
                .isInstanceOf(DomainException.class)
                .hasMessage("the pole at u = 1 may be of order 201; principal parts are computed up to order 100");
    }
}
