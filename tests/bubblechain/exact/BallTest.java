package bubblechain.exact;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.math.BigInteger;
import org.junit.jupiter.api.Test;

class BallTest {
    private static final int CASES = 2000;

    @Test
    void sumHoldsTheSumOfPointsSeed21() {
        RandomBalls source = new RandomBalls(21);
        for (int i = 0; i < CASES; i++) {
            Ball a = source.any();
            Ball b = source.any();
            Rational x = source.pointOf(a);
            Rational y = source.pointOf(b);
            assertThat(a.add(b, source.bits()).contains(x.add(y))).as("%s + %s", a, b).isTrue();
            assertThat(a.subtract(b, source.bits()).contains(x.subtract(y))).as("%s - %s", a, b).isTrue();
        }
    }

    @Test
    void productHoldsTheProductOfPointsSeed22() {
        RandomBalls source = new RandomBalls(22);
        for (int i = 0; i < CASES; i++) {
            Ball a = source.any();
            Ball b = source.any();
            Rational exact = source.pointOf(a).multiply(source.pointOf(b));
            assertThat(a.multiply(b, source.bits()).contains(exact)).as("%s * %s", a, b).isTrue();
        }
    }

    @Test
    void quotientHoldsTheQuotientOfPointsSeed23() {
        RandomBalls source = new RandomBalls(23);
        for (int i = 0; i < CASES; i++) {
            Ball a = source.any();
            Ball b = source.withoutZero();
            Rational x = source.pointOf(a);
            Rational y = source.pointOf(b);
            assertThat(a.divide(b, source.bits()).contains(x.divide(y))).as("%s / %s", a, b).isTrue();
            assertThat(b.inverse(source.bits()).contains(y.inverse())).as("1 / %s", b).isTrue();
        }
    }

    @Test
    void powerHoldsThePowerOfPointsSeed24() {
        RandomBalls source = new RandomBalls(24);
        for (int i = 0; i < CASES; i++) {
            int n = source.random().nextInt(25) - 12;
            Ball a = n < 0 ? source.withoutZero() : source.any();
            Rational x = source.pointOf(a);
            assertThat(a.power(n, source.bits()).contains(x.power(n))).as("(%s)^%s", a, n).isTrue();
        }
    }

    @Test
    void rationalOperandsAreTakenExactlySeed25() {
        RandomBalls source = new RandomBalls(25);
        for (int i = 0; i < CASES; i++) {
            Ball a = source.any();
            Rational x = source.pointOf(a);
            Rational q = source.rational(1000);
            assertThat(a.add(q, source.bits()).contains(x.add(q))).isTrue();
            assertThat(a.multiply(q, source.bits()).contains(x.multiply(q))).isTrue();
            if (!q.isZero()) {
                assertThat(a.divide(q, source.bits()).contains(x.divide(q))).isTrue();
            }
            assertThat(Ball.of(q, source.bits()).contains(q)).isTrue();
            assertThat(Ball.of(x, q.abs(), source.bits()).contains(x.add(q))).isTrue();
        }
    }

    @Test
    void unaryOperationsAndRoundingHoldTheirPointsSeed26() {
        RandomBalls source = new RandomBalls(26);
        for (int i = 0; i < CASES; i++) {
            Ball a = source.any();
            Ball b = source.any();
            Rational x = source.pointOf(a);
            assertThat(a.negate().contains(x.negate())).isTrue();
            assertThat(a.abs().contains(x.abs())).isTrue();
            assertThat(a.round(source.bits()).contains(a)).isTrue();
            assertThat(a.shift(-7).contains(x.divide(128))).isTrue();
            assertThat(a.union(b).contains(a) && a.union(b).contains(b)).isTrue();
            assertThat(a.upperBound().toRational()).isGreaterThanOrEqualTo(x.abs());
            assertThat(a.contains(x)).isTrue();
        }
    }

    @Test
    void predicatesAgreeWithTheExactEndsSeed27() {
        RandomBalls source = new RandomBalls(27);
        for (int i = 0; i < CASES; i++) {
            Ball a = source.any();
            Ball b = source.random().nextBoolean() ? source.any() : a.shift(source.random().nextInt(2));
            assertThat(a.isPositive()).isEqualTo(a.lower().signum() > 0);
            assertThat(a.isNegative()).isEqualTo(a.upper().signum() < 0);
            assertThat(a.containsZero()).isEqualTo(a.lower().signum() <= 0 && a.upper().signum() >= 0);
            assertThat(a.overlaps(b))
                    .isEqualTo(a.lower().compareTo(b.upper()) <= 0 && b.lower().compareTo(a.upper()) <= 0);
            assertThat(a.contains(b))
                    .isEqualTo(a.lower().compareTo(b.lower()) <= 0 && a.upper().compareTo(b.upper()) >= 0);
            Rational outside = a.upper().add(Rational.of(1, 1L << 60));
            assertThat(a.contains(outside)).isFalse();
            assertThat(a.upper().subtract(a.lower())).isEqualTo(a.radius().toRational().multiply(2));
        }
    }

    @Test
    void accuracyBitsAreTheFloorOfTheLogarithmSeed28() {
        RandomBalls source = new RandomBalls(28);
        for (int i = 0; i < CASES; i++) {
            Ball a = source.any();
            if (a.isExact()) {
                assertThat(a.accuracyBits()).isEqualTo(Integer.MAX_VALUE);
            } else if (!a.midpoint().isZero()) {
                Rational ratio = a.midpoint().abs().divide(a.radius().toRational());
                Rational power = Rational.TWO.power(a.accuracyBits());
                assertThat(ratio).isBetween(power, power.multiply(2));
            }
        }
        assertThat(Ball.parse("0+-1", 50).accuracyBits()).isEqualTo(-1);
    }

    @Test
    void oneOperationCostsAtMostTwoBitsSeed29() {
        RandomBalls source = new RandomBalls(29);
        for (int i = 0; i < CASES; i++) {
            Ball a = Ball.of(source.rational(1000).add(2000), 300);
            Ball b = Ball.of(source.rational(1000).add(3000), 300);
            assertThat(a.add(b, 200).accuracyBits()).isGreaterThanOrEqualTo(198);
            assertThat(a.multiply(b, 200).accuracyBits()).isGreaterThanOrEqualTo(198);
            assertThat(a.divide(b, 200).accuracyBits()).isGreaterThanOrEqualTo(198);
            assertThat(a.power(100, 200).accuracyBits()).isGreaterThanOrEqualTo(198);
        }
    }

    @Test
    void exactArithmeticStaysExact() {
        Ball threeQuarters = Ball.ofDyadic(BigInteger.valueOf(3), -2);
        assertThat(threeQuarters.multiply(Ball.of(4), 10)).isEqualTo(Ball.of(3));
        assertThat(Ball.of(3).divide(Ball.of(4), 10)).isEqualTo(threeQuarters);
        assertThat(Ball.of(Rational.of(3, 4), 10).isExact()).isTrue();
        assertThat(Ball.of(10).power(5, 60)).isEqualTo(Ball.of(100_000));
        assertThat(Ball.of(7).subtract(Ball.of(7), 10).isZero()).isTrue();
        assertThat(Ball.parse("0+-1", 10).isZero()).isFalse();
        assertThat(Ball.of(Rational.of(1, 3), 10).isExact()).isFalse();
    }

    @Test
    void cancellationWithARationalKeepsRelativePrecision() {
        Ball third = Ball.ofDyadic(BigInteger.ONE.shiftLeft(400).divide(BigInteger.valueOf(3)), -400);
        Ball rest = third.add(Rational.of(-1, 3), 60);
        assertThat(rest.accuracyBits()).isGreaterThanOrEqualTo(58);
        assertThat(rest.contains(Rational.of(-1, 3).divide(Rational.TWO.power(400)))).isTrue();
    }

    @Test
    void midpointKeepsAboutThirtyBitsBelowTheRadius() {
        Ball ball = Ball.of(Rational.of(1, 3), 1000).addError(Magnitude.powerOfTwo(-100)).round(1000);
        assertThat(ball.midpoint().denominator().bitLength()).isBetween(120, 135);
        assertThat(ball.radius().toRational()).isLessThan(Rational.TWO.power(-100).multiply(Rational.of(1001, 1000)));
    }

    @Test
    void divisionByABallWithZeroIsRefused() {
        assertThatThrownBy(() -> Ball.ONE.divide(Ball.parse("0.1+-0.2", 50), 50))
                .isInstanceOf(PrecisionException.class)
                .hasMessageContaining("division by a ball that contains zero");
        assertThatThrownBy(() -> Ball.ZERO.inverse(50)).isInstanceOf(PrecisionException.class);
        assertThatThrownBy(() -> Ball.ZERO.power(-1, 50)).isInstanceOf(PrecisionException.class);
        assertThatThrownBy(() -> Ball.ONE.round(1))
                .isInstanceOf(DomainException.class)
                .hasMessageContaining("a working precision of 1 bits is too small");
    }
}
