package bubblechain.exact;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigInteger;
import java.util.List;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestInfo;

/**
 * The bounds inside the algorithms, which the guard bits hide from outside: each series is run with so few terms or so
 * few bits that its own error dominates, and must still enclose the value found at high precision.
 */
class TruncationBoundTest {
    /** At least three times the precision of every coarse series. */
    private static final int FINE = 900;

    private final BoundSamples samples = new BoundSamples();

    private void assertEnclosesTightly(Ball coarse, Ball fine, int accuracy, String what) {
        assertThat(coarse.contains(fine)).as("%s = %s in %s", what, fine, coarse).isTrue();
        assertThat(coarse.accuracyBits()).as("accuracy of %s", what).isGreaterThanOrEqualTo(accuracy);
        samples.add(coarse, fine, "%s", what);
    }

    @AfterEach
    void boundsAreNotWasteful(TestInfo test) {
        if (samples.count() > 0) {
            samples.assertNotWasteful(6, "%s", test.getDisplayName());
        }
    }

    @Test
    void inverseTangentSeriesInFewBits() {
        for (int scale = 20; scale < 60; scale++) {
            for (int x : new int[] {2, 5, 26, 239}) {
                for (int sign : new int[] {-1, 1}) {
                    assertEnclosesTightly(Constants.inverseTangent(x, scale, sign),
                            Constants.inverseTangent(x, FINE, sign), scale - 15, "series at 1/" + x);
                }
            }
        }
    }

    @Test
    void eulerGammaFromFewBesselTerms() {
        Ball gamma = BallFunctions.eulerGamma(FINE);
        for (int n = 1; n < 30; n++) {
            assertEnclosesTightly(Constants.brentMcMillan(n, 300), gamma, 5 * n - 4, "Euler's constant, n = " + n);
        }
        for (int working = 30; working < 60; working++) {
            assertEnclosesTightly(Constants.brentMcMillan(20, working), gamma, working - 20, "Euler's constant");
        }
    }

    @Test
    void besselSumsInFewBits() {
        for (int n = 1; n < 20; n++) {
            Constants.BesselSums fine = Constants.BesselSums.of(n, FINE);
            for (int scale = 10; scale < 40; scale++) {
                Constants.BesselSums coarse = Constants.BesselSums.of(n, scale);
                assertEnclosesTightly(coarse.plain(), fine.plain(), scale - 10, "I_0(" + 2 * n + ")");
                assertEnclosesTightly(coarse.weighted(), fine.weighted(), scale - 12, "S, n = " + n);
            }
        }
    }

    @Test
    void exponentialSeriesOfAPointInFewBits() {
        for (int scale = 20; scale < 200; scale += 3) {
            for (int t : new int[] {1, 511, -512, 301, -77}) {
                Ball point = Ball.ofDyadic(BigInteger.valueOf(t), -10);
                assertEnclosesTightly(Elementary.expSeries(point, scale), Elementary.expSeries(point, FINE),
                        scale - 10, "exp of " + point);
            }
        }
    }

    @Test
    void logarithmByThreeTermsOfItsSeries() {
        for (int k = 2; k < 20; k++) {
            for (int sign : new int[] {-1, 1}) {
                Ball d = Ball.of(sign).shift(-k);
                Ball fine = BallFunctions.ln(Ball.ONE.add(d, FINE), FINE);
                assertEnclosesTightly(Elementary.lnOnePlus(d, 200), fine, 3 * k - 2, "ln(1 + " + d + ")");
            }
        }
    }

    @Test
    void exponentialSeriesOfABallInFewBitsSeed51() {
        RandomBalls source = new RandomBalls(51);
        for (int i = 0; i < 200; i++) {
            int scale = 20 + source.random().nextInt(30);
            Ball t = Ball.of(source.rational(500).divide(1001), Rational.of(1, 1L << (10 + i % 40)), 100);
            Ball series = Elementary.expSeries(t, scale);
            assertThat(series.contains(BallFunctions.exp(Ball.of(t.lower(), FINE), FINE))).isTrue();
            assertThat(series.contains(BallFunctions.exp(Ball.of(t.upper(), FINE), FINE))).isTrue();
            samples.add(series, BallFunctions.exp(Ball.of(t.upper(), FINE), FINE), "exp of %s", t);
        }
    }

    @Test
    void sineAndCosineSeriesOfAPointInFewBits() {
        for (int scale = 20; scale < 300; scale += 3) {
            for (int t : new int[] {1, 900, -900, 511, -77}) {
                BigInteger u = BigInteger.valueOf(t);
                Ball sine = Trigonometric.alternating(u.shiftLeft(scale - 10), u.shiftLeft(scale - 10), 1, scale);
                Ball cosine = Trigonometric.alternating(BigInteger.ONE.shiftLeft(scale), u.shiftLeft(scale - 10), 0, scale);
                Ball point = Ball.ofDyadic(u, -10);
                assertEnclosesTightly(sine, Trigonometric.sineOfSmall(point, FINE), scale - 18, "sin " + point);
                assertEnclosesTightly(cosine, Trigonometric.cosineOfSmall(point, FINE), scale - 12, "cos " + point);
            }
        }
    }

    @Test
    void sineAndCosineSeriesOfABallSeed52() {
        RandomBalls source = new RandomBalls(52);
        for (int i = 0; i < 200; i++) {
            Ball t = Ball.of(source.rational(500).divide(1001), Rational.of(1, 1L << (10 + i % 40)), 100);
            Rational x = i % 2 == 0 ? t.lower() : t.upper();
            Ball point = Ball.ofDyadic(x.numerator(), 1 - x.denominator().bitLength());
            Ball sine = Trigonometric.sineOfSmall(t, 40);
            Ball cosine = Trigonometric.cosineOfSmall(t, 40);
            assertThat(sine.contains(Trigonometric.sineOfSmall(point, FINE))).isTrue();
            assertThat(cosine.contains(Trigonometric.cosineOfSmall(point, FINE))).isTrue();
            samples.add(sine, Trigonometric.sineOfSmall(point, FINE), "sin of %s", t);
            samples.add(cosine, Trigonometric.cosineOfSmall(point, FINE), "cos of %s", t);
        }
    }

    @Test
    void zetaFromFewTermsOfTheAlternatingSum() {
        for (int n = 2; n < 40; n++) {
            Ball[] values = ZetaFunctions.alternatingSums(2, 20, n, FINE);
            for (int i = 0; i < values.length; i++) {
                int s = 2 + 2 * i;
                assertEnclosesTightly(values[i], BallFunctions.zeta(s, FINE + 100), 5 * n / 2 - 3, "zeta(" + s + ")");
            }
        }
    }

    @Test
    void hurwitzZetaFromFewBernoulliTerms() {
        for (int s = 2; s < 8; s++) {
            Ball z = Ball.of(5);
            List<Ball> coefficients = HurwitzZeta.coefficients(z, s, 60);
            Ball exact = BallFunctions.hurwitzZeta(s, z, FINE).multiply(z.power(s, FINE), FINE);
            for (int used = 1; used <= 6; used++) {
                Ball tail = HurwitzZeta.tail(z, s, coefficients.subList(0, used), FINE);
                assertEnclosesTightly(tail, exact, 2 + used, "5^s zeta(s, 5), s = " + s);
            }
        }
    }

    @Test
    void stirlingSeriesAtSmallArgumentsStopsAtItsLeastTerm() {
        for (int k = 2; k < 20; k++) {
            Ball z = Ball.of(k).shift(-1).add(Rational.of(1, 3), FINE);
            assertEnclosesTightly(
                    GammaFunctions.stirling(z, 200), BallFunctions.lnGamma(z, FINE), 3, "ln Gamma(" + z + ")");
        }
    }

    @Test
    void polylogarithmInFewBits() {
        for (int scale = 20; scale < 60; scale++) {
            for (Rational x : List.of(Rational.HALF, Rational.of(-1, 2), Rational.of(2, 5), Rational.of(-1, 3))) {
                assertEnclosesTightly(Polylogarithm.fixedPointSum(2, x, scale),
                        Polylogarithm.fixedPointSum(2, x, FINE), scale - 12, "Li_2(" + x + ")");
            }
        }
    }

    @Test
    void keptConstantsAnswerAnyOrderOfRequests() {
        Ball fine = BallFunctions.pi(900);
        for (int bits : new int[] {30, 900, 100, 1200, 64}) {
            Ball pi = BallFunctions.pi(bits);
            assertThat(pi.overlaps(fine)).isTrue();
            assertThat(pi.accuracyBits()).isGreaterThanOrEqualTo(bits - 2);
            assertThat(BallFunctions.lnOf(BigInteger.TEN, bits).accuracyBits()).isGreaterThanOrEqualTo(bits - 2);
            assertThat(BallFunctions.zetaTable(12, bits)[11].accuracyBits()).isGreaterThanOrEqualTo(bits - 2);
        }
    }
}
