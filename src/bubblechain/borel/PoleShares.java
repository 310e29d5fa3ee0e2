package bubblechain.borel;

import bubblechain.chain.Chain;
import bubblechain.chain.Scales;
import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import bubblechain.series.LaurentSeries;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * One coefficient c_n as the shares of listed poles plus an exact remainder.
 *
 * <p>With all poles inside |u| = R listed, Cauchy's theorem gives n! [u^n] T = sum of their shares + a contour term of
 * at most n! max_{|u|=R} |T| R^(-n). The remainder is the contour term, minus the listed poles outside the circle, plus
 * the part of the entire subtraction.
 *
 * @param n         index of the coefficient
 * @param total     c_n
 * @param poles     the listed poles
 * @param shares    their shares, in the same order
 * @param remainder c_n minus all shares
 * @param bound     a proved bound of its size, if one could be computed
 */
public record PoleShares(
        int n, Ball total, List<BorelPole> poles, List<Ball> shares, Ball remainder, Optional<RemainderBound> bound) {
    /** Largest n whose make-up is shown. */
    public static final int LARGEST_INDEX = 400;

    private static final int BITS = 320;
    private static final int BITS_PER_ORDER = 8;

    public PoleShares {
        poles = List.copyOf(poles);
        shares = List.copyOf(shares);
    }

    /**
     * The make-up of c_n.
     *
     * @param poles every pole with from &lt;= u &lt;= to
     */
    public static PoleShares of(Kernel kernel, Scales scales, List<BorelPole> poles, Rational from, Rational to, int n) {
        if (n < 0 || n > LARGEST_INDEX) {
            throw new DomainException("the coefficient whose make-up is shown has n between 0 and " + LARGEST_INDEX
                    + ", got " + n);
        }
        int bits = BITS + BITS_PER_ORDER * n;
        Ball total = Chain.of(kernel, scales).balls(n + 1, bits).get(n);
        List<Ball> shares = new ArrayList<>();
        Ball remainder = total;
        for (BorelPole pole : poles) {
            Ball share = pole.share(n, bits);
            shares.add(share);
            remainder = remainder.subtract(share, bits);
        }
        Ball entire = entirePart(kernel, scales, total, n, bits);
        Optional<RemainderBound> bound =
                RemainderBound.of(BorelPlane.of(kernel, scales), poles, shares, entire, from, to, n);
        return new PoleShares(n, total, poles, shares, remainder, bound);
    }

    /** c_n minus n! [u^n] e^(L u) T(u): what the entire subtraction contributes. */
    private static Ball entirePart(Kernel kernel, Scales scales, Ball total, int n, int bits) {
        if (!kernel.isRenormalised() || kernel.transform().isEmpty()) {
            return Ball.ZERO;
        }
        LaurentSeries<Ball> transform = kernel.transform().get()
                .timesExponential(scales.couplingLog())
                .balls(Rational.ZERO, n + 1, bits);
        int index = n - transform.lowest();
        Ball singular = index < 0 ? Ball.ZERO : transform.coefficients().get(index);
        return total.subtract(singular.multiply(Rational.of(ExactFunctions.factorial(n)), bits), bits);
    }
}
