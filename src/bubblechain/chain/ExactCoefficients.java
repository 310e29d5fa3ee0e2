package bubblechain.chain;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import bubblechain.series.ExactRing;
import java.util.List;

/** Coefficients as exact constants, through exact series arithmetic. */
final class ExactCoefficients implements CoefficientEngine<ExactConstant> {
    @Override
    public List<ExactConstant> coefficients(Kernel kernel, int loops, Scales scales) {
        return new RingCoefficients<>(ExactRing.INSTANCE, (function, end) -> function.exact(Rational.ZERO, end))
                .coefficients(kernel, loops, scales);
    }
}
