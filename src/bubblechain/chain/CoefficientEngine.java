package bubblechain.chain;

import bubblechain.kernel.Kernel;
import java.util.List;

/**
 * A route from a kernel to its coefficients.
 *
 * @param <C> the numbers it gives
 */
interface CoefficientEngine<C> {
    /** c_0 .. c_(loops-1) of f = prefactor x sum c_n a^(n+1). */
    List<C> coefficients(Kernel kernel, int loops, Scales scales);
}
