package bubblechain.exact;

import java.math.BigInteger;
import java.util.Arrays;

/**
 * Constants and special functions over balls. Each result encloses the values of the function at all points of the
 * argument ball; for exact arguments its radius is normally far below 2^(10-bits) of its size.
 *
 * <p>{@code bits} is the length of the midpoint of the result. Near a zero of ln Gamma and digamma other than those
 * named exact the precision is absolute, not relative. A ball that reaches a point where the function is not defined is
 * refused with a {@link PrecisionException}, an argument that lies there altogether with a {@link DomainException}.
 *
 * @implNote O(bits^2) to O(bits^2 log bits) for the elementary functions, O(bits^3) with a small factor for gamma and
 *     Hurwitz zeta; sized for up to some 4000 bits. Constants, logarithms of small integers and zeta tables are kept.
 */
public final class BallFunctions {
    private static final int LARGEST_KEPT_LOGARITHM = 1000;

    private BallFunctions() {}

    public static Ball pi(int bits) {
        return Constants.pi(bits);
    }

    /** Euler's constant 0.5772... */
    public static Ball eulerGamma(int bits) {
        return Constants.eulerGamma(bits);
    }

    /** ln n for n >= 1; kept for n up to {@value #LARGEST_KEPT_LOGARITHM}. */
    public static Ball lnOf(BigInteger n, int bits) {
        if (n.signum() <= 0) {
            throw new DomainException("the logarithm of " + n + " is not real; the integer must be positive");
        }
        return n.bitLength() < 31 && n.intValueExact() <= LARGEST_KEPT_LOGARITHM
                ? Constants.kept("ln " + n, bits, working -> ln(Ball.of(n), working))
                : ln(Ball.of(n), bits);
    }

    /** @throws DomainException if no point is positive */
    public static Ball ln(Ball x, int bits) {
        return Elementary.ln(x, bits);
    }

    /** @throws PrecisionException if the ball reaches beyond +-2^28 */
    public static Ball exp(Ball x, int bits) {
        return Elementary.exp(x, bits);
    }

    /** Exact for a short square. */
    public static Ball sqrt(Ball x, int bits) {
        return Elementary.sqrt(x, bits);
    }

    /** The positive real power base^exponent; any base without zero if the exponent is an integer. */
    public static Ball power(Ball base, Rational exponent, int bits) {
        return Elementary.power(base, exponent, bits);
    }

    public static Ball sin(Ball x, int bits) {
        return Trigonometric.sin(x, bits);
    }

    public static Ball cos(Ball x, int bits) {
        return Trigonometric.cos(x, bits);
    }

    /** sin(pi q); exact where it is 0, +-1/2 or +-1. */
    public static Ball sinPi(Rational q, int bits) {
        return Trigonometric.sinPi(q, bits);
    }

    /** cos(pi q); exact where it is 0, +-1/2 or +-1. */
    public static Ball cosPi(Rational q, int bits) {
        return Trigonometric.cosPi(q, bits);
    }

    /** Riemann's zeta(k), k >= 2. */
    public static Ball zeta(int k, int bits) {
        return ZetaFunctions.zeta(k, bits);
    }

    /**
     * zeta(k) at index k, up to {@code max} inclusive. Index 0 holds zeta(0) = -1/2; index 1, the pole, holds zero.
     *
     * @implNote kept by precision; a request for more bits or a larger end computes afresh
     */
    public static Ball[] zetaTable(int max, int bits) {
        return ZetaFunctions.table(max, bits);
    }

    /** zeta(s, q) = sum_{k>=0} (q+k)^-s for s >= 2 and q > 0. */
    public static Ball hurwitzZeta(int s, Ball q, int bits) {
        return HurwitzZeta.range(q, s, s, bits)[0];
    }

    /** zeta(s, q) at index s, for s from 2 to {@code max} inclusive; indices 0 and 1 hold zero. */
    public static Ball[] hurwitzZetaTable(Ball q, int max, int bits) {
        if (max < 0) {
            throw new DomainException("a zeta table up to " + max + " was asked for; the end must not be negative");
        }
        Ball[] table = new Ball[max + 1];
        Arrays.fill(table, Ball.ZERO);
        Ball[] values = HurwitzZeta.range(q, 2, max, bits);
        System.arraycopy(values, 0, table, Math.min(2, max + 1), values.length);
        return table;
    }

    /** Gamma of a ball without an integer <= 0; exact for short factorials. */
    public static Ball gamma(Ball x, int bits) {
        return GammaFunctions.gamma(x, bits);
    }

    /** ln Gamma(x) for x > 0; exactly zero at 1 and 2. */
    public static Ball lnGamma(Ball x, int bits) {
        return GammaFunctions.lnGamma(x, bits);
    }

    /** psi(x) = d ln Gamma(x)/dx of a ball without an integer <= 0. */
    public static Ball digamma(Ball x, int bits) {
        return GammaFunctions.digamma(x, bits);
    }

    /** The n-th derivative of psi, n >= 1, of a ball without an integer <= 0, not below -100000. */
    public static Ball polygamma(int n, Ball x, int bits) {
        return GammaFunctions.polygamma(n, x, bits);
    }

    /** Li_s(x) = sum_{k>=1} x^k/k^s for s >= 1 and |x| <= 1/2. */
    public static Ball polylog(int s, Rational x, int bits) {
        return Polylogarithm.of(s, x, bits);
    }

    /** Li_2(x) for |x| <= 1/2. */
    public static Ball dilog(Rational x, int bits) {
        return Polylogarithm.of(2, x, bits);
    }
}
