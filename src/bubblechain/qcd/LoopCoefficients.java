package bubblechain.qcd;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/**
 * The coefficients of a renormalisation-group function for one flavour number, the first loops of it.
 *
 * @param nf     flavours
 * @param values exact, one per loop
 */
record LoopCoefficients(int nf, List<ExactConstant> values) {
    LoopCoefficients {
        values = List.copyOf(values);
    }

    /**
     * The first coefficients from formulas in nf.
     *
     * @param what the function, as the refusal names it
     * @throws DomainException if nf is not between 0 and 16, or loops not between 1 and the number of formulas
     */
    static LoopCoefficients of(String what, List<Formula> formulas, int nf, int loops) {
        if (nf < 0 || nf > BetaFunction.LARGEST_NF) {
            throw new DomainException("the number of flavours must lie between 0 and " + BetaFunction.LARGEST_NF
                    + ", where beta0 is positive; got " + nf);
        }
        if (loops < 1 || loops > formulas.size()) {
            throw new DomainException("the " + what + " is known to " + formulas.size() + " loops; ask for 1 to "
                    + formulas.size() + ", got " + loops);
        }
        List<ExactConstant> values = new ArrayList<>();
        for (Formula formula : formulas.subList(0, loops)) {
            values.add(ConstantValue.of(formula, Map.of("nf", ExactConstant.of(nf))));
        }
        return new LoopCoefficients(nf, values);
    }

    int loops() {
        return values.size();
    }

    /** Zero beyond the loops kept. */
    ExactConstant get(int k) {
        return k < values.size() ? values.get(k) : ExactConstant.ZERO;
    }

    /** "5-loop running with 3 flavours". */
    String inWords(String what) {
        return loops() + "-loop " + what + " with " + nf + (nf == 1 ? " flavour" : " flavours");
    }
}
