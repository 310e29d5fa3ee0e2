package bubblechain.borel;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import java.util.ArrayList;
import java.util.List;

/**
 * One Laurent term coefficient x (u - position)^(-order) of the Borel transform B(u) = sum_n c_n u^n/n! of a bubble chain.
 *
 * @param position    u_j, not zero
 * @param order       m, at least 1
 * @param coefficient L_m
 */
public record ChainPole(Rational position, int order, ExactConstant coefficient) {
    public ChainPole {
        if (position.isZero() || order < 1) {
            throw new DomainException("a pole needs a position different from 0 and an order of at least 1, got u = "
                    + position + ", order " + order);
        }
    }

    /** The part of c_n: L_m (-1)^m u_j^(-m-n) m (m+1) ... (m+n-1). */
    public ExactConstant part(int n) {
        Rational rising = Rational.of(ExactFunctions.factorial(order + n - 1), ExactFunctions.factorial(order - 1));
        Rational factor = position.power(-order - n).multiply(rising);
        return coefficient.multiply(order % 2 == 0 ? factor : factor.negate());
    }

    /** The strength K of (1 - u/u_j)^(-m), L_m (-u_j)^(-m); for a simple pole -R_u/u_j. */
    public ExactConstant strength() {
        return coefficient.multiply(position.negate().power(-order));
    }

    /**
     * The coefficients with the parts of some poles taken out, exactly; for probing the next singularity.
     *
     * @param c     c_0, c_1, ...
     * @param poles what to remove
     */
    public static List<ExactConstant> remove(List<ExactConstant> c, List<ChainPole> poles) {
        List<ExactConstant> rest = new ArrayList<>();
        for (int n = 0; n < c.size(); n++) {
            ExactConstant value = c.get(n);
            for (ChainPole pole : poles) {
                value = value.subtract(pole.part(n));
            }
            rest.add(value);
        }
        return rest;
    }
}
