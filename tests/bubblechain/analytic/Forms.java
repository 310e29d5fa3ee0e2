package bubblechain.analytic;

import bubblechain.exact.ExactConstant;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;

/** Normal forms and constants from text, and a few kernels the tests share. */
final class Forms {
    /** Pole mass: Beneke, Braun hep-ph/9402364; Ball, Beneke, Braun hep-ph/9502300. */
    static final String POLE_MASS = "exp(5*u/3)*6*(1-u)*gamma(u)*gamma(1-2*u)/gamma(3-u)";
    /** Adler function: Beneke, Nucl. Phys. B405 (1993) 424; Broadhurst, Z. Phys. C58 (1993) 339, in trigammas. */
    static final String ADLER = "8*exp(5*u/3)/((1-u)*(2-u))*(polygamma(1,(1+u)/2)-polygamma(1,(2+u)/2)"
            + "-polygamma(1,(3-u)/2)+polygamma(1,(4-u)/2))/4";

    private Forms() {}

    static NormalForm form(String text) {
        return NormalForm.of(Formula.parse(text), "u");
    }

    static ExactConstant constant(String text) {
        return ConstantValue.of(Formula.parse(text));
    }
}
