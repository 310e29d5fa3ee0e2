package bubblechain.chain;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import bubblechain.qcd.Theory;

/**
 * The chain read backwards: the term with the highest power of nf in the exact coefficient of alpha^(n+1) is the chain's
 * own coefficient with beta0 replaced by its fermionic part -4 TF nf/3. This is where a chain can be checked against a
 * full calculation, order by order.
 */
public final class FlavourTerm {
    private FlavourTerm() {}

    /**
     * The coefficient of nf^n in the coefficient of (alpha/pi)^(n+1) of f.
     *
     * @param n           order, 0 for one loop
     * @param coefficient c_n
     * @return [prefactor x beta0] c_n (-4 TF/3)^n / 4^(n+1) in units of the kernel's scale
     */
    public static ExactConstant perAlphaOverPi(Kernel kernel, int n, ExactConstant coefficient) {
        Theory theory = kernel.theory();
        // prefactor x beta0 does not depend on nf, so it is taken where beta0 is certainly not zero
        int anyFlavours = 1;
        ExactConstant pure =
                kernel.prefactor().value(theory, anyFlavours).multiply(theory.beta0(anyFlavours));
        Rational perBubble = theory.beta0PerFlavour().negate().divide(4).power(n).divide(4);
        return pure.multiply(coefficient).multiply(perBubble);
    }
}
