package bubblechain.chain;

import bubblechain.exact.Ball;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import bubblechain.series.BallRing;
import java.util.List;

/** Coefficients as balls at one working precision. */
final class BallCoefficients {
    private final int bits;

    BallCoefficients(int bits) {
        this.bits = bits;
    }

    /** c_0 .. c_(loops-1) of f = prefactor x sum c_n a^(n+1). */
    List<Ball> coefficients(Kernel kernel, int loops, Scales scales) {
        return new RingCoefficients<>(
                        BallRing.of(bits, loops + 2), (function, end) -> function.balls(Rational.ZERO, end, bits))
                .coefficients(kernel, loops, scales);
    }
}
