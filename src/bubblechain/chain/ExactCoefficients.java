package bubblechain.chain;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import bubblechain.series.ExactRing;
import java.util.List;

/**
 * Coefficients as exact constants: monomial by monomial where the kernel allows it, else through exact series arithmetic,
 * which gives the same constants and is slow beyond about 20 loops.
 */
final class ExactCoefficients {
    private final int largestSeriesLoops;

    /** @param largestSeriesLoops coefficients a kernel may have that needs series of constants */
    ExactCoefficients(int largestSeriesLoops) {
        this.largestSeriesLoops = largestSeriesLoops;
    }

    /** c_0 .. c_(loops-1) of f = prefactor x sum c_n a^(n+1). */
    List<ExactConstant> coefficients(Kernel kernel, int loops, Scales scales) {
        return EnumeratedCoefficients.of(kernel, loops, scales, Chain.LARGEST_EXACT_TERMS).orElseGet(() -> {
            Chain.requireRange("the number of loops in exact form of this kernel", loops, largestSeriesLoops);
            return new RingCoefficients<>(ExactRing.INSTANCE, (function, end) -> function.exact(Rational.ZERO, end))
                    .coefficients(kernel, loops, scales);
        });
    }
}
