package bubblechain.series;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import java.util.Optional;

/**
 * The numbers a {@link CoefficientwiseAlgebra} computes with.
 *
 * @param <C> an immutable number
 */
public interface CoefficientRing<C> {
    C constant(ExactConstant value);

    C constant(Rational value);

    C add(C left, C right);

    C negate(C value);

    C multiply(C left, C right);

    C multiply(C value, Rational factor);

    /** 1/value. @throws ArithmeticException if value is, or cannot be told from, zero */
    C inverse(C value);

    /** True only if the value is known to be zero. */
    boolean isZero(C value);

    /** The value if it is known to be an integer. */
    Optional<Integer> asInteger(C value);

    C exp(C value);

    C ln(C value);

    C sin(C value);

    C cos(C value);

    C gamma(C value);

    /** The n-th derivative of psi, n of at least 0. */
    C polygamma(int n, C value);

    /** Hurwitz zeta(k, s) for k of at least 2 and s in (0,1]. */
    C hurwitz(int k, Rational s);

    /** W^(k)(s)/k! of {@link bubblechain.exact.UnitHypergeometric}, for s in [1,2). */
    C unit3f2(int k, Rational s);
}
