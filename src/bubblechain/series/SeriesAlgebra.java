package bubblechain.series;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import java.util.List;

/**
 * Arithmetic and functions of truncated Laurent series in one variable x.
 *
 * <p>Leaves are made with {@link #length} known terms; products and quotients keep the shorter relative length, sums the
 * smaller absolute order. Implementations are free in how they hold a series.
 *
 * @param <S> an immutable series
 */
public interface SeriesAlgebra<S> {
    /** Number of terms of a freshly made series. */
    int length();

    S constant(ExactConstant value);

    /** constant + slope x. */
    S linear(ExactConstant constant, ExactConstant slope);

    S add(S left, S right);

    S negate(S value);

    S multiply(S left, S right);

    S multiply(S value, Rational factor);

    /**
     * 1/value.
     *
     * @throws bubblechain.exact.PrecisionException if the leading coefficient cannot be told from zero
     */
    S inverse(S value);

    /** The product with a polynomial in x, given by its coefficients from the constant term on. */
    S multiply(S value, List<Rational> polynomial);

    /** The quotient by a polynomial in x whose constant term is not zero. */
    S divide(S value, List<Rational> polynomial);

    /** value^exponent for any integer exponent. */
    S power(S value, int exponent);

    /** x^shift value. */
    S shift(S value, int shift);

    /** e^value. @throws bubblechain.exact.DomainException if value has a negative power */
    S exp(S value);

    S ln(S value);

    S sin(S value);

    S cos(S value);

    /** Gamma(value), also where the constant term is 0, -1, -2, ... exactly. */
    S gamma(S value);

    /** The n-th derivative of psi, n of at least 0. */
    S polygamma(int n, S value);

    /** ln Gamma(s + slope x) - ln Gamma(s) for s in (0,1]. */
    S logGammaTail(Rational s, Rational slope);

    /** psi^(n)(s + slope x) for s in (0,1]. */
    S polygammaTail(int n, Rational s, Rational slope);

    /** The n-th derivative of {@link bubblechain.exact.UnitHypergeometric} at s + slope x, for s in [1,2). */
    S unit3f2Tail(int n, Rational s, Rational slope);
}
