package bubblechain.chain;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;

/**
 * The two renormalisation scales of a chain, as logarithms of squared ratios to the kernel's scale Q.
 *
 * <p>With B = T - Gtilde/u at both scales equal to Q,
 * B = e^(L_c u) T(u) - e^((L_c - L_o) u) Gtilde(u)/u: the coupling's scale alone multiplies all of B, coupling and
 * operator together (L_c = L_o) multiply T only.
 *
 * @param couplingLog L_c = ln(mu^2/Q^2) of the coupling, the shift of its scheme included
 * @param operatorLog L_o = ln(mu_O^2/Q^2) of the operator
 */
public record Scales(ExactConstant couplingLog, ExactConstant operatorLog) {
    /** Both scales at Q, MS-bar coupling. */
    public static final Scales NATURAL = new Scales(ExactConstant.ZERO, ExactConstant.ZERO);

    /** e^(5u/3) of the massless bubble is the whole difference between the MS-bar and the V coupling in a chain. */
    private static final Rational V_SHIFT = Rational.of(-5, 3);

    /**
     * From ratios of scales.
     *
     * @param muOverScale         scale of the coupling over Q
     * @param operatorMuOverScale scale of the operator over Q
     * @throws bubblechain.exact.DomainException if a ratio is not positive
     */
    public static Scales of(ExactConstant muOverScale, ExactConstant operatorMuOverScale) {
        return new Scales(
                muOverScale.ln().multiply(Rational.TWO), operatorMuOverScale.ln().multiply(Rational.TWO));
    }

    /** The same with the coupling in the V scheme, a_V(mu) = a(e^(-5/6) mu). */
    public Scales withVCoupling() {
        return new Scales(couplingLog.add(ExactConstant.of(V_SHIFT)), operatorLog);
    }

    /**
     * The same for a coupling that counts the heavy quark of mass Q besides the nf in the bubbles: decoupled at Q,
     * beta0 alpha^(nf) runs as 1/alpha^(nf)(mu) = 1/alpha^(nf+1)(mu) + (4 TF/3) ln(mu^2/Q^2)/(4 pi), so that
     * L_c is multiplied by beta0(nf+1)/beta0(nf).
     */
    public Scales withHeavyFlavour(Kernel kernel, int nf) {
        Rational ratio = kernel.theory().beta0(nf + 1).divide(kernel.theory().beta0(nf));
        return new Scales(couplingLog.multiply(ratio), operatorLog);
    }

    /** L_c - L_o, the logarithm that multiplies the subtraction. */
    ExactConstant subtractionLog() {
        return couplingLog.subtract(operatorLog);
    }
}
