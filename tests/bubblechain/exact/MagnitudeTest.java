package bubblechain.exact;

import static org.assertj.core.api.Assertions.assertThat;

import java.math.BigInteger;
import java.util.Random;
import org.junit.jupiter.api.Test;

class MagnitudeTest {
    private static Magnitude random(Random random) {
        BigInteger size = new BigInteger(1 + random.nextInt(90), random);
        return Magnitude.of(size).scale(random.nextInt(300) - 150);
    }

    private static void assertTightBound(Magnitude bound, Rational exact) {
        Rational slack = exact.multiply(Rational.of(1, 1L << 50));
        assertThat(bound.toRational()).isBetween(exact, exact.add(slack));
    }

    @Test
    void sumsAndProductsAreTightUpperBoundsSeed11() {
        Random random = new Random(11);
        for (int i = 0; i < 2000; i++) {
            Magnitude a = random(random);
            Magnitude b = random(random);
            assertTightBound(a.add(b), a.toRational().add(b.toRational()));
            assertTightBound(a.multiply(b), a.toRational().multiply(b.toRational()));
            int k = random.nextInt(200) - 100;
            assertThat(a.scale(k).toRational()).isEqualTo(a.toRational().multiply(Rational.TWO.power(k)));
        }
    }

    @Test
    void integersAndRationalsAreBoundedFromAboveSeed12() {
        Random random = new Random(12);
        for (int i = 0; i < 2000; i++) {
            BigInteger n = new BigInteger(1 + random.nextInt(200), random);
            BigInteger d = new BigInteger(1 + random.nextInt(200), random).add(BigInteger.ONE);
            assertTightBound(Magnitude.of(n.negate()), Rational.of(n));
            assertTightBound(Magnitude.ofRational(Rational.of(n, d).negate()), Rational.of(n, d));
            assertTightBound(Magnitude.ofInverse(d, 7), Rational.of(d).inverse().multiply(Rational.of(1, 128)));
        }
    }

    @Test
    void anyPositiveSummandRaisesTheBound() {
        Magnitude sum = Magnitude.ONE.add(Magnitude.powerOfTwo(-100_000));
        assertThat(sum).isGreaterThan(Magnitude.ONE);
        assertThat(sum.toRational()).isLessThan(Rational.ONE.add(Rational.of(1, 1L << 51)));
    }

    @Test
    void orderAndExtremesFollowTheValuesSeed13() {
        Random random = new Random(13);
        for (int i = 0; i < 2000; i++) {
            Magnitude a = random(random);
            Magnitude b = random.nextInt(10) == 0 ? Magnitude.ZERO : random(random);
            int expected = a.toRational().compareTo(b.toRational());
            assertThat(Integer.signum(a.compareTo(b))).isEqualTo(Integer.signum(expected));
            assertThat(a.max(b)).isEqualTo(expected >= 0 ? a : b);
            assertThat(a.min(b)).isEqualTo(expected <= 0 ? a : b);
        }
    }

    @Test
    void doublesRoundUpEvenWhereTheyAreSubnormal() {
        Magnitude third = Magnitude.ofRational(Rational.of(1, 3));
        assertThat(third.toDouble()).isBetween(1 / 3.0, Math.nextUp(1 / 3.0) + 1e-16);
        assertThat(third.scale(-1070).toDouble()).isBetween(Math.scalb(1 / 3.0, -1070), Math.scalb(1.0, -1070));
        assertThat(third.scale(-100_000).toDouble()).isEqualTo(Double.MIN_VALUE);
        assertThat(third.scale(100_000).toDouble()).isEqualTo(Double.POSITIVE_INFINITY);
        assertThat(Magnitude.ZERO.toDouble()).isZero();
    }
}
