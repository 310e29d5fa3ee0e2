package bubblechain.sumrule;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.Singularity;
import java.util.Optional;

/**
 * Another singularity of the same Borel transform, which may stand in the way of the one probed.
 *
 * @param position      u_j, not zero
 * @param kind          infrared or ultraviolet
 * @param operator      what it belongs to, in words
 * @param exponentShift delta_j: it goes like (1 - u/u_j)^(-1-b_j-delta_j); 0 if unknown, m - 1 for a pole of order m in
 *                      a bubble chain
 * @param strength      K_j in the normalisation of the coefficients given, empty if unknown
 * @param removed       true if its part has been taken out of the coefficients
 */
public record Obstacle(
        Rational position,
        Singularity.Kind kind,
        String operator,
        Rational exponentShift,
        Optional<ExactConstant> strength,
        boolean removed) {
    public Obstacle {
        if (position.isZero()) {
            throw new DomainException("a singularity at u = 0 is no renormalon; give u different from 0");
        }
    }

    /** A singularity of unknown strength. */
    public static Obstacle unknown(Rational position, Singularity.Kind kind, String operator) {
        return new Obstacle(position, kind, operator, Rational.ZERO, Optional.empty(), false);
    }

    /** A singularity declared with a series; its strength is unknown. */
    static Obstacle of(Singularity declared, int nf) {
        return new Obstacle(
                declared.position(),
                declared.kind(),
                declared.operator(),
                declared.exponentShift(nf).orElse(Rational.ZERO),
                Optional.empty(),
                false);
    }

    /** The same with a known strength. */
    public Obstacle withStrength(ExactConstant known) {
        return new Obstacle(position, kind, operator, exponentShift, Optional.of(known), removed);
    }

    /** The same, its part taken out of the coefficients. */
    public Obstacle asRemoved() {
        return new Obstacle(position, kind, operator, exponentShift, strength, true);
    }
}
