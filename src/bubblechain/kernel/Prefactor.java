package bubblechain.kernel;

import bubblechain.exact.ExactConstant;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.qcd.Theory;

/**
 * The factor in front of the series, f = prefactor x sum c_n a^(n+1).
 *
 * @param formula its value in CF, CA, TF, nf, beta0 and pi, without the scale
 * @param words   the full factor in words where it carries a scale, such as "-(4 pi CF/(beta0 r))"
 */
public record Prefactor(Formula formula, String words) {
    /** Its value for nf massless flavours. @throws ArithmeticException if beta0 = 0 */
    public ExactConstant value(Theory theory, int nf) {
        return ConstantValue.of(formula, theory.names(nf));
    }
}
