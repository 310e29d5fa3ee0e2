package bubblechain.exact;

import java.math.BigInteger;
import java.util.Random;

/** Seeded random balls and points for the laws; corner cases (exact, tiny, wide, integers) are frequent. */
final class RandomBalls {
    private final Random random;

    RandomBalls(long seed) {
        random = new Random(seed);
    }

    Random random() {
        return random;
    }

    /** A ball around a dyadic number between about 2^-40 and 2^40, of either sign, wide, narrow or exact. */
    Ball any() {
        int length = 1 + random.nextInt(120);
        BigInteger mantissa = new BigInteger(length, random);
        if (random.nextBoolean()) {
            mantissa = mantissa.negate();
        }
        Ball center = Ball.ofDyadic(mantissa, random.nextInt(81) - 40 - length);
        switch (random.nextInt(5)) {
            case 0:
                return center;
            case 1:
                return Ball.of(random.nextInt(7) - 3);
            default:
                BigInteger width = BigInteger.valueOf(random.nextInt(1000));
                return center.addError(Magnitude.of(width).scale(random.nextInt(120) - 120));
        }
    }

    Ball withoutZero() {
        while (true) {
            Ball ball = any();
            if (!ball.containsZero()) {
                return ball;
            }
        }
    }

    /** An end, the midpoint or a random inner point, exact. */
    Rational pointOf(Ball ball) {
        switch (random.nextInt(4)) {
            case 0:
                return ball.lower();
            case 1:
                return ball.upper();
            case 2:
                return ball.midpoint();
            default:
                Rational part = Rational.of(random.nextInt(1001), 1000);
                return ball.lower().add(ball.upper().subtract(ball.lower()).multiply(part));
        }
    }

    /** A rational with numerator and denominator up to {@code size}. */
    Rational rational(int size) {
        return Rational.of(random.nextInt(2 * size + 1) - size, 1 + random.nextInt(size));
    }

    int bits() {
        return 2 + random.nextInt(random.nextBoolean() ? 20 : 200);
    }
}
