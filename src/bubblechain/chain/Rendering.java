package bubblechain.chain;

import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.kernel.Kernel;
import bubblechain.qcd.Coupling;
import bubblechain.qcd.Normalisation;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;

/**
 * How coefficients are shown: c_n turned into factor x ratio^(n+1) x c_n, or divided by c_0.
 *
 * @param factor     what multiplies every coefficient
 * @param ratio      what multiplies once per power of the coupling
 * @param byFirst    divide by the first coefficient afterwards
 */
public record Rendering(ExactConstant factor, ExactConstant ratio, boolean byFirst) {
    /** c_n as they are. */
    public static final Rendering PLAIN = new Rendering(ExactConstant.ONE, ExactConstant.ONE, false);

    /**
     * The rendering for a coupling and a normalisation.
     *
     * @param nf massless flavours in the bubbles; needed unless the coupling is a and the prefactor is taken out
     * @throws DomainException if nf is needed and absent, or beta0 is zero
     */
    public static Rendering of(Kernel kernel, Coupling coupling, Normalisation normalisation, OptionalInt nf) {
        if (normalisation == Normalisation.FIRST && coupling == Coupling.A) {
            return new Rendering(ExactConstant.ONE, ExactConstant.ONE, true);
        }
        if (coupling == Coupling.A && normalisation == Normalisation.PREFACTOR) {
            return PLAIN;
        }
        if (nf.isEmpty()) {
            throw new DomainException("coefficients in " + coupling.text() + " normalised to "
                    + normalisation.text() + " depend on the number of flavours; give --nf");
        }
        var beta0 = kernel.theory().beta0(nf.getAsInt());
        if (beta0.isZero()) {
            throw new DomainException("beta0 is zero for nf = " + nf.getAsInt() + ": there is no chain to expand in");
        }
        ExactConstant ratio = Coupling.A.inUnitsOf(coupling, beta0);
        ExactConstant factor = normalisation == Normalisation.FULL
                ? kernel.prefactor().value(kernel.theory(), nf.getAsInt())
                : ExactConstant.ONE;
        return new Rendering(factor, ratio, normalisation == Normalisation.FIRST);
    }

    boolean isPlain() {
        return factor.equals(ExactConstant.ONE) && ratio.equals(ExactConstant.ONE) && !byFirst;
    }

    /** Applies this to exact coefficients c_0, c_1, ... */
    public List<ExactConstant> applyToExact(List<ExactConstant> coefficients) {
        if (coefficients.isEmpty() || isPlain()) {
            return coefficients;
        }
        List<ExactConstant> result = new ArrayList<>();
        ExactConstant weight = factor.multiply(ratio);
        for (ExactConstant c : coefficients) {
            result.add(c.multiply(weight));
            weight = weight.multiply(ratio);
        }
        if (byFirst) {
            ExactConstant first = firstOf(result, result.get(0).isZero()).inverse();
            result.replaceAll(c -> c.multiply(first));
        }
        return result;
    }

    /** Applies this to balls. */
    public List<Ball> applyToBalls(List<Ball> coefficients, int bits) {
        if (isPlain()) {
            return coefficients;
        }
        List<Ball> result = new ArrayList<>();
        Ball step = ratio.toBall(bits);
        Ball weight = factor.multiply(ratio).toBall(bits);
        for (Ball c : coefficients) {
            result.add(c.multiply(weight, bits));
            weight = weight.multiply(step, bits);
        }
        if (byFirst) {
            Ball first = firstOf(result, result.get(0).isZero());
            result.replaceAll(c -> c.divide(first, bits));
        }
        return result;
    }

    private static <C> C firstOf(List<C> values, boolean zero) {
        if (zero) {
            throw new DomainException("the first coefficient is zero; choose another normalisation");
        }
        return values.get(0);
    }
}
