package bubblechain.exact;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.math.BigInteger;
import java.util.List;
import java.util.function.BiFunction;
import org.junit.jupiter.api.Test;

class BallFunctionsTest {
    private static final int BITS = 120;

    private record Named(String name, BiFunction<Ball, Integer, Ball> function) {}

    private static final List<Named> OF_POSITIVE = List.of(
            new Named("ln", BallFunctions::ln),
            new Named("sqrt", BallFunctions::sqrt),
            new Named("exp", BallFunctions::exp),
            new Named("sin", BallFunctions::sin),
            new Named("cos", BallFunctions::cos),
            new Named("power 2/3", (x, bits) -> BallFunctions.power(x, Rational.of(2, 3), bits)),
            new Named("power -5/2", (x, bits) -> BallFunctions.power(x, Rational.of(-5, 2), bits)),
            new Named("gamma", BallFunctions::gamma),
            new Named("lnGamma", BallFunctions::lnGamma),
            new Named("digamma", BallFunctions::digamma),
            new Named("polygamma 1", (x, bits) -> BallFunctions.polygamma(1, x, bits)),
            new Named("polygamma 4", (x, bits) -> BallFunctions.polygamma(4, x, bits)),
            new Named("hurwitz 3", (x, bits) -> BallFunctions.hurwitzZeta(3, x, bits)));

    private static final List<Named> OF_NEGATIVE = List.of(
            new Named("exp", BallFunctions::exp),
            new Named("sin", BallFunctions::sin),
            new Named("cos", BallFunctions::cos),
            new Named("gamma", BallFunctions::gamma),
            new Named("digamma", BallFunctions::digamma),
            new Named("polygamma 2", (x, bits) -> BallFunctions.polygamma(2, x, bits)));

    /** A ball between about 2^-5 and 2^7, of a radius up to a tenth of it. */
    private static Ball positive(RandomBalls source) {
        Rational middle = Rational.of(1 + source.random().nextInt(10_000), 100 + source.random().nextInt(200));
        Rational radius = middle.divide(10L << source.random().nextInt(60));
        return Ball.of(middle, radius, BITS);
    }

    private static void assertInclusion(Named named, Ball wide, Rational point) {
        Ball whole = named.function.apply(wide, BITS);
        Ball exact = named.function.apply(Ball.of(point, 3 * BITS), 3 * BITS);
        assertThat(whole.contains(exact)).as("%s of %s at %s", named.name, wide, point).isTrue();
    }

    @Test
    void imagesOfPointsLieInTheImageOfTheBallSeed41() {
        RandomBalls source = new RandomBalls(41);
        for (Named named : OF_POSITIVE) {
            for (int i = 0; i < 25; i++) {
                Ball wide = positive(source);
                assertInclusion(named, wide, wide.lower().add(Rational.TWO.power(-200)));
                assertInclusion(named, wide, wide.upper().subtract(Rational.TWO.power(-200)));
                assertInclusion(named, wide, source.pointOf(wide.shift(-1).add(wide.center().shift(-1), BITS * 4)));
            }
        }
    }

    @Test
    void imagesOfNegativePointsLieInTheImageOfTheBallSeed42() {
        RandomBalls source = new RandomBalls(42);
        for (Named named : OF_NEGATIVE) {
            for (int i = 0; i < 25; i++) {
                Rational middle = Rational.of(-1 - source.random().nextInt(100)).add(Rational.of(
                        1 + source.random().nextInt(8), 10));
                Ball wide = Ball.of(middle, Rational.of(1, 11L << source.random().nextInt(50)), BITS);
                assertInclusion(named, wide, wide.lower().add(Rational.TWO.power(-200)));
                assertInclusion(named, wide, wide.upper().subtract(Rational.TWO.power(-200)));
            }
        }
    }

    @Test
    void gammaSatisfiesRecurrenceAndReflectionSeed43() {
        RandomBalls source = new RandomBalls(43);
        for (int i = 0; i < 60; i++) {
            Rational q = Rational.of(source.random().nextInt(20_000) * 7L + 1, 700).subtract(100);
            Ball x = Ball.of(q, 2 * BITS);
            Ball gamma = BallFunctions.gamma(x, BITS);
            Ball next = BallFunctions.gamma(x.add(Rational.ONE, 2 * BITS), BITS);
            assertThat(next.overlaps(x.multiply(gamma, BITS))).as("Gamma(x+1) = x Gamma(x) at %s", q).isTrue();
            Ball mirror = BallFunctions.gamma(Ball.of(Rational.ONE.subtract(q), 2 * BITS), BITS);
            Ball left = gamma.multiply(mirror, BITS).multiply(BallFunctions.sinPi(q, BITS), BITS);
            assertThat(left.overlaps(BallFunctions.pi(BITS))).as("reflection at %s", q).isTrue();
            assertThat(left.accuracyBits()).isGreaterThan(BITS - 20);
        }
    }

    @Test
    void digammaAndPolygammaSatisfyTheirRecurrencesSeed44() {
        RandomBalls source = new RandomBalls(44);
        for (int i = 0; i < 40; i++) {
            Rational q = Rational.of(source.random().nextInt(2000) * 7L + 1, 70).subtract(100);
            Ball x = Ball.of(q, 2 * BITS);
            Ball next = Ball.of(q.add(1), 2 * BITS);
            Ball step = BallFunctions.digamma(next, BITS).subtract(BallFunctions.digamma(x, BITS), BITS);
            assertThat(step.contains(q.inverse())).as("psi at %s", q).isTrue();
            Ball second = BallFunctions.polygamma(2, next, BITS).subtract(BallFunctions.polygamma(2, x, BITS), BITS);
            assertThat(second.contains(q.power(-3).multiply(2))).as("psi'' at %s", q).isTrue();
        }
    }

    @Test
    void exponentialAndLogarithmAreInverseSeed45() {
        RandomBalls source = new RandomBalls(45);
        for (int i = 0; i < 100; i++) {
            Rational q = source.rational(1000).abs().add(Rational.of(1, 1000));
            Ball x = Ball.of(q, 2 * BITS);
            assertThat(BallFunctions.exp(BallFunctions.ln(x, BITS), BITS).contains(q)).isTrue();
            assertThat(BallFunctions.ln(BallFunctions.exp(x, BITS), BITS).contains(q)).isTrue();
            Ball root = BallFunctions.sqrt(x, BITS);
            assertThat(root.multiply(root, BITS).contains(q)).isTrue();
            Ball cube = BallFunctions.power(x, Rational.of(1, 3), BITS).power(3, BITS);
            assertThat(cube.contains(q)).isTrue();
        }
    }

    @Test
    void sineAndCosineAreOnTheUnitCircleAndAgreeWithMultiplesOfPiSeed46() {
        RandomBalls source = new RandomBalls(46);
        for (int i = 0; i < 100; i++) {
            Rational q = source.rational(5000);
            Ball x = BallFunctions.pi(2 * BITS).multiply(q, 2 * BITS);
            Ball sine = BallFunctions.sin(x, BITS);
            Ball cosine = BallFunctions.cos(x, BITS);
            assertThat(sine.overlaps(BallFunctions.sinPi(q, BITS))).as("sin(pi %s)", q).isTrue();
            assertThat(cosine.overlaps(BallFunctions.cosPi(q, BITS))).as("cos(pi %s)", q).isTrue();
            Ball one = sine.multiply(sine, BITS).add(cosine.multiply(cosine, BITS), BITS);
            assertThat(one.contains(Rational.ONE)).isTrue();
        }
        assertThat(BallFunctions.sinPi(Rational.of(-19, 6), 50)).isEqualTo(Ball.ONE.shift(-1));
        assertThat(BallFunctions.cosPi(Rational.of(7, 2), 50).isZero()).isTrue();
    }

    @Test
    void sineNearAMultipleOfPiKeepsRelativePrecision() {
        Rational nearPi = BallFunctions.pi(500).midpoint();
        Ball sine = BallFunctions.sin(Ball.ofDyadic(nearPi.numerator(), -nearPi.denominator().bitLength() + 1), 100);
        assertThat(sine.accuracyBits()).isGreaterThan(90);
        assertThat(sine.overlaps(BallFunctions.pi(700).add(nearPi.negate(), 150))).isTrue();
    }

    @Test
    void logarithmNearOneKeepsRelativePrecision() {
        for (int k : new int[] {10, 40, 100, 1000}) {
            Ball x = Ball.ofDyadic(BigInteger.ONE.shiftLeft(k).add(BigInteger.ONE), -k);
            Ball logarithm = BallFunctions.ln(x, 200);
            assertThat(logarithm.accuracyBits()).isGreaterThan(190);
            assertThat(BallFunctions.exp(logarithm, 200 + k).contains(x.midpoint())).isTrue();
        }
    }

    @Test
    void zetaTableAgreesWithHurwitzZetaAtOneAndSingleValues() {
        Ball[] table = BallFunctions.zetaTable(130, 200);
        Ball[] hurwitz = BallFunctions.hurwitzZetaTable(Ball.ONE, 130, 200);
        assertThat(table).hasSize(131);
        assertThat(table[0]).isEqualTo(Ball.ofDyadic(BigInteger.ONE.negate(), -1));
        for (int k = 2; k <= 130; k++) {
            assertThat(table[k].overlaps(hurwitz[k])).as("zeta(%s)", k).isTrue();
            assertThat(table[k].overlaps(BallFunctions.zeta(k, 333))).as("zeta(%s) at 333 bits", k).isTrue();
            assertThat(table[k].accuracyBits()).isGreaterThan(195);
            assertThat(hurwitz[k].accuracyBits()).isGreaterThan(195);
        }
    }

    @Test
    void evenZetaValuesBeyondTheBernoulliRangeComeFromTheAlternatingSum() {
        Ball[] table = BallFunctions.zetaTable(1010, 1100);
        for (int k : new int[] {999, 1000, 1001, 1002, 1010}) {
            // zeta(k) - 1 - 2^-k lies between 3^-k and 3^-k + 4^-k + ... < 2 3^-k
            Ball rest = table[k].add(Rational.ONE.add(Rational.TWO.power(-k)).negate(), 1100);
            assertThat(table[k].accuracyBits()).isGreaterThan(1090);
            assertThat(rest.upper()).isGreaterThan(Rational.of(3).power(-k));
            assertThat(rest.lower()).isLessThan(Rational.of(3).power(-k).multiply(2));
        }
        assertThat(BallFunctions.zeta(100_000, 64).contains(Rational.ONE)).isTrue();
    }

    @Test
    void hurwitzZetaSatisfiesTheMultiplicationTheoremSeed47() {
        RandomBalls source = new RandomBalls(47);
        for (int i = 0; i < 20; i++) {
            int s = 2 + source.random().nextInt(20);
            Rational q = source.rational(100).abs().add(Rational.of(1, 50));
            Ball sum = Ball.ZERO;
            for (int j = 0; j < 3; j++) { // sum_{j<3} zeta(s, (q+j)/3) = 3^s zeta(s, q)
                sum = sum.add(BallFunctions.hurwitzZeta(s, Ball.of(q.add(j).divide(3), 2 * BITS), BITS), BITS);
            }
            Ball direct = BallFunctions.hurwitzZeta(s, Ball.of(q, 2 * BITS), BITS);
            assertThat(sum.overlaps(direct.multiply(Rational.of(3).power(s), BITS))).as("s=%s q=%s", s, q).isTrue();
        }
    }

    @Test
    void polylogarithmsSatisfyKnownIdentities() {
        Ball half = BallFunctions.dilog(Rational.HALF, BITS); // Li_2(1/2) = pi^2/12 - ln(2)^2/2
        Ball ln2 = BallFunctions.lnOf(BigInteger.TWO, BITS);
        Ball closed = BallFunctions.pi(BITS).power(2, BITS).divide(Rational.of(12), BITS)
                .subtract(ln2.power(2, BITS).shift(-1), BITS);
        assertThat(half.overlaps(closed)).isTrue();
        Ball first = BallFunctions.polylog(1, Rational.of(-1, 3), BITS); // Li_1(x) = -ln(1 - x)
        assertThat(first.overlaps(BallFunctions.ln(Ball.of(Rational.of(4, 3), BITS), BITS).negate())).isTrue();
        assertThat(BallFunctions.polylog(3, Rational.ZERO, BITS).isZero()).isTrue();
    }

    @Test
    void exactValuesAreExact() {
        assertThat(BallFunctions.gamma(Ball.of(6), 60)).isEqualTo(Ball.of(120));
        assertThat(BallFunctions.lnGamma(Ball.of(2), 60).isZero()).isTrue();
        assertThat(BallFunctions.sqrt(Ball.of(Rational.of(9, 16), 60), 60)).isEqualTo(Ball.of(Rational.of(3, 4), 60));
        assertThat(BallFunctions.exp(Ball.ZERO, 60)).isEqualTo(Ball.ONE);
        assertThat(BallFunctions.ln(Ball.ONE, 60).isZero()).isTrue();
        assertThat(BallFunctions.cos(Ball.ZERO, 60)).isEqualTo(Ball.ONE);
        assertThat(BallFunctions.power(Ball.of(4), Rational.of(-3, 2), 60)).isEqualTo(Ball.ONE.shift(-3));
    }

    @Test
    void polesAreRefused() {
        assertThatThrownBy(() -> BallFunctions.gamma(Ball.of(-3), 60))
                .isInstanceOf(DomainException.class)
                .hasMessage("gamma has a pole at -3; the argument must not be an integer <= 0");
        assertThatThrownBy(() -> BallFunctions.gamma(Ball.parse("-2.9+-0.2", 60), 60))
                .isInstanceOf(PrecisionException.class)
                .hasMessageContaining("gamma has a pole at -3");
        assertThatThrownBy(() -> BallFunctions.digamma(Ball.ZERO, 60)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> BallFunctions.polygamma(1, Ball.parse("0.1+-0.2", 60), 60))
                .isInstanceOf(PrecisionException.class);
    }

    @Test
    void argumentsOutsideTheRangeAreRefused() {
        assertThatThrownBy(() -> BallFunctions.ln(Ball.of(-1), 60)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> BallFunctions.ln(Ball.ZERO, 60)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> BallFunctions.ln(Ball.parse("1+-2", 60), 60)).isInstanceOf(PrecisionException.class);
        assertThatThrownBy(() -> BallFunctions.lnOf(BigInteger.ZERO, 60)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> BallFunctions.sqrt(Ball.of(-1), 60)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> BallFunctions.sqrt(Ball.parse("1+-2", 60), 60)).isInstanceOf(PrecisionException.class);
        assertThatThrownBy(() -> BallFunctions.exp(Ball.of(1L << 40), 60)).isInstanceOf(PrecisionException.class);
        assertThatThrownBy(() -> BallFunctions.zeta(1, 60)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> BallFunctions.hurwitzZeta(1, Ball.ONE, 60)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> BallFunctions.hurwitzZeta(2, Ball.ZERO, 60)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> BallFunctions.lnGamma(Ball.of(-1), 60)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> BallFunctions.polygamma(0, Ball.ONE, 60)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> BallFunctions.polylog(2, Rational.of(51, 100), 60))
                .isInstanceOf(DomainException.class)
                .hasMessageContaining("|x| must not exceed 1/2");
        assertThatThrownBy(() -> BallFunctions.polylog(0, Rational.HALF, 60)).isInstanceOf(DomainException.class);
    }
}
