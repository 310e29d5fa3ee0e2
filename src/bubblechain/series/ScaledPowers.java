package bubblechain.series;

import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;

/** (pi/2)^(2k)/(2k-1)! for k = 1, 2, ... as digits, between 1/2 and 64, times a power of two. */
final class ScaledPowers {
    private static final int SPARE_BITS = 32;
    /** Not below pi^2/4 = 2.46740110027..., and not above by a part that 5000 steps would show. */
    private static final double PI_SQUARED_OVER_4 = 2.4674012;

    private static final int LARGE = 4;
    private static final int SMALL = 2;

    private final int limbs;
    private final long[] square;
    private long[] digits;
    private double error;
    private int exponent;

    ScaledPowers(int limbs) {
        this.limbs = limbs;
        int bits = FixedSeries.bits(limbs);
        Ball pi = ExactConstant.PI.toBall(bits + SPARE_BITS);
        Ball value = pi.multiply(pi, bits + SPARE_BITS).shift(-2);
        this.square = FixedDigits.of(value.scaledMidpoint(bits), limbs);
        this.digits = new long[limbs + 1];
        digits[0] = 1;
    }

    /** Goes on to k, one more than before. */
    void next(int k) {
        double size = bound();
        digits = FixedDigits.product(digits, square, limbs);
        // the square is off by at most two units
        error = (error * PI_SQUARED_OVER_4 + 2 * size + 2) * FixedSeries.UP;
        if (k > 1) {
            over(2 * k - 2);
            over(2 * k - 1);
        }
    }

    /** Over so much, and times the power of two that keeps the number of order one. */
    private void over(int divisor) {
        int power = Integer.SIZE - 1 - Integer.numberOfLeadingZeros(divisor);
        if (digits[0] > LARGE && power > 0) {
            power--;
        } else if (digits[0] < SMALL) {
            power++;
        }
        int factor = 1 << power;
        FixedDigits.scale(digits, factor, divisor, 0);
        error = (error * factor / divisor + 2) * FixedSeries.UP;
        exponent -= power;
    }

    long[] digits() {
        return digits;
    }

    double error() {
        return error;
    }

    /** Not below the digits, their error included. */
    double bound() {
        return FixedDigits.upperBound(digits) + error * Math.scalb(1.0, -FixedSeries.bits(limbs));
    }

    int exponent() {
        return exponent;
    }
}
