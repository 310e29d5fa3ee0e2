package bubblechain.fixedorder;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * What is known of one singularity of the Borel transform of a series. With p = 2 u0 the power correction is
 * (Lambda/R)^p y^(-delta) (1 + C_1 y + C_2 y^2 + ...), y = alpha_s(R)/(4 pi), and the transform goes like
 * (1 - u/u0)^(-1-b-delta), b = p beta1/(2 beta0^2).
 *
 * @param position      u0, not zero
 * @param kind          infrared or ultraviolet, as declared
 * @param operator      the operator behind the power correction, in words
 * @param exponentShift delta as a formula in {@code nf} with a rational value; empty if unknown
 * @param corrections   C_1, C_2, ... as formulas in {@code nf}; missing ones are unknown and taken as zero
 */
public record Singularity(
        Rational position, Kind kind, String operator, Optional<Formula> exponentShift, List<Formula> corrections) {
    /** The momenta from which a singularity comes. */
    public enum Kind {
        IR,
        UV
    }

    public Singularity {
        if (position.isZero()) {
            throw new DomainException("a singularity at u = 0 is no renormalon; give u different from 0");
        }
        corrections = List.copyOf(corrections);
    }

    /** p = 2 u0, the power of Lambda/R. */
    public Rational power() {
        return position.multiply(2);
    }

    /** True if delta is known. */
    public boolean isExponentKnown() {
        return exponentShift.isPresent();
    }

    /** delta at a flavour number. @throws DomainException if its formula is not rational there */
    public Optional<Rational> exponentShift(int nf) {
        return exponentShift.map(formula -> ConstantValue.of(formula, flavours(nf))
                .asRational()
                .orElseThrow(() -> new DomainException("the exponent shift '" + formula.print()
                        + "' of the singularity at u = " + position + " must be a rational number")));
    }

    /** C_1, C_2, ... at a flavour number. */
    public List<ExactConstant> corrections(int nf) {
        return corrections.stream().map(c -> ConstantValue.of(c, flavours(nf))).toList();
    }

    private static Map<String, ExactConstant> flavours(int nf) {
        return Map.of("nf", ExactConstant.of(nf));
    }
}
