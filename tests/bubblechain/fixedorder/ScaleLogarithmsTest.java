package bubblechain.fixedorder;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import bubblechain.qcd.BetaFunction;
import bubblechain.qcd.Coupling;
import bubblechain.series.BallRing;
import bubblechain.series.ExactRing;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ScaleLogarithmsTest {
    private static final ExactConstant LN2 = ExactFunctions.ln(Rational.TWO);
    private static final ExactConstant LN3 = ExactFunctions.ln(Rational.of(3));

    private static ScaleLogarithms<ExactConstant> exact(List<ExactConstant> a, BetaFunction beta, Rational shift) {
        return ScaleLogarithms.of(ExactRing.INSTANCE, a, beta, shift);
    }

    private static List<ExactConstant> poleMass(int nl) {
        return SeriesLibrary.find("pole-mass").at(nl, Coupling.ALPHA_OVER_4PI).values();
    }

    private static List<ExactConstant> random(long seed, int count) {
        Random random = new Random(seed);
        List<ExactConstant> list = new ArrayList<>();
        for (int n = 0; n < count; n++) {
            ExactConstant zeta = ExactFunctions.zeta(3).multiply(Rational.of(random.nextInt(19) - 9, 7));
            list.add(ExactConstant.of(Rational.of(random.nextInt(199) - 99, 5)).add(zeta));
        }
        return list;
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 3, 5})
    void totalDerivativeOfThePoleMassCancelsFormallyThroughTheKnownOrder(int nl) {
        requireInvariant(poleMass(nl), BetaFunction.of(nl), Rational.ZERO);
    }

    @Test
    void totalDerivativeOfARandomSeriesWithAFractionalPowerCancelsFormallySeed11() {
        requireInvariant(random(11, 6), BetaFunction.of(4), Rational.of(-7, 5));
    }

    /** d/d ln mu of y^s sum a_n(L) y^n: the coefficient of y^(s+n) is a_n'(L) - 2 sum_j beta_j (n-1-j+s) a_{n-1-j}(L). */
    private static void requireInvariant(List<ExactConstant> a, BetaFunction beta, Rational shift) {
        ScaleLogarithms<ExactConstant> series = exact(a, beta, shift);
        for (int n = 1; n <= a.size(); n++) {
            for (int m = 0; m < n; m++) {
                ExactConstant total = power(series, n, m + 1).multiply(Rational.of(m + 1));
                for (int j = 0; n - 1 - j >= 1; j++) {
                    ExactConstant running = beta.beta(j).multiply(power(series, n - 1 - j, m));
                    total = total.subtract(running.multiply(shift.add(n - 1 - j).multiply(2)));
                }
                assertThat(total.isZero()).as("y^%d L^%d", n, m).isTrue();
            }
        }
    }

    private static ExactConstant power(ScaleLogarithms<ExactConstant> series, int n, int m) {
        List<ExactConstant> powers = series.powers(n);
        return m < powers.size() ? powers.get(m) : ExactConstant.ZERO;
    }

    @Test
    void firstLogarithmsAreTheTextbookOnes() {
        // y(R) = y(mu) [1 + 2 beta0 L y + (4 beta0^2 L^2 + 2 beta1 L) y^2], from dy/d ln mu = -2 beta0 y^2 - 2 beta1 y^3
        BetaFunction beta = BetaFunction.of(3);
        ScaleLogarithms<ExactConstant> series =
                exact(List.of(ExactConstant.ONE, ExactConstant.ZERO, ExactConstant.ZERO), beta, Rational.ZERO);
        assertThat(series.powers(2)).containsExactly(ExactConstant.ZERO, ExactConstant.of(18));
        assertThat(series.powers(3))
                .containsExactly(ExactConstant.ZERO, ExactConstant.of(128), ExactConstant.of(4 * 81));
    }

    @Test
    void twoChangesOfScaleMakeOneSeed5() {
        BetaFunction beta = BetaFunction.of(5);
        Rational shift = Rational.of(1, 3);
        List<ExactConstant> a = random(5, 5);
        List<ExactConstant> once = exact(a, beta, shift).at(LN2.add(LN3));
        List<ExactConstant> twice = exact(exact(a, beta, shift).at(LN2), beta, shift).at(LN3);
        assertThat(twice).isEqualTo(once);
    }

    @Test
    void thereAndBackReturnsTheSeries() {
        BetaFunction beta = BetaFunction.of(4);
        List<ExactConstant> a = poleMass(4);
        List<ExactConstant> there = exact(a, beta, Rational.ZERO).at(LN2);
        assertThat(exact(there, beta, Rational.ZERO).at(LN2.negate())).isEqualTo(a);
    }

    @Test
    void oneLoopRunningGivesTheGeometricSeries() {
        // y(R) = y(mu)/(1 - 2 beta0 L y(mu))
        BetaFunction beta = BetaFunction.of(3, 1);
        List<ExactConstant> a = new ArrayList<>(Collections.nCopies(8, ExactConstant.ZERO));
        a.set(0, ExactConstant.ONE);
        List<ExactConstant> moved = exact(a, beta, Rational.ZERO).at(LN2);
        for (int n = 0; n < 8; n++) {
            assertThat(moved.get(n)).isEqualTo(LN2.multiply(Rational.of(18)).power(n));
        }
    }

    @Test
    void ballsEncloseTheExactValuesAtTwoPrecisions() {
        BetaFunction beta = BetaFunction.of(3);
        List<ExactConstant> exact = exact(poleMass(3), beta, Rational.ZERO).at(LN2);
        for (int bits : new int[] {80, 200}) {
            BallRing ring = BallRing.of(bits, 2);
            List<Ball> a = poleMass(3).stream().map(ring::constant).toList();
            List<Ball> moved = ScaleLogarithms.of(ring, a, beta, Rational.ZERO).at(LN2.toBall(bits));
            for (int n = 0; n < 4; n++) {
                assertThat(moved.get(n).overlaps(exact.get(n).toBall(400))).isTrue();
                assertThat(moved.get(n).accuracyBits()).isGreaterThan(bits - 20);
            }
        }
    }

    @Test
    void ordersOutsideTheSeriesAreRefused() {
        ScaleLogarithms<ExactConstant> series = exact(poleMass(3), BetaFunction.of(3), Rational.ZERO);
        assertThat(series.loops()).isEqualTo(4);
        assertThatThrownBy(() -> series.powers(5)).isInstanceOf(DomainException.class).hasMessageContaining("orders 1 to 4");
        assertThatThrownBy(() -> series.powers(0)).isInstanceOf(DomainException.class);
    }
}
