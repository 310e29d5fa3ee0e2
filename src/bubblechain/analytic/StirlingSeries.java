package bubblechain.analytic;

import bubblechain.exact.Bernoulli;
import bubblechain.exact.DomainException;
import bubblechain.exact.Rational;

/**
 * ln Gamma and its derivatives over discs in the right half plane, from their asymptotic series with a proved
 * remainder.
 *
 * <p>ln Gamma(z) = (z - 1/2) ln z - z + ln(2 pi)/2 + sum_{k&lt;K} T_k(z) + R_K(z), T_k = B_2k/(2k (2k-1) z^(2k-1)),
 * with R_K(z) = int_0^infinity (B_2K - B_2K(x - [x]))/(2K (x+z)^2K) dx, DLMF 5.11.1 and the Euler-Maclaurin formula
 * DLMF 2.10.1. The numerator has one sign, and |x + z| >= (x + |z|) cos(arg(z)/2), so that the j-th derivative obeys
 * |R_K^(j)(z)| <= |R_K^(j)(|z|)| sec^(2K+j)(arg(z)/2). On the positive axis R_K^(j) and R_(K+1)^(j) have opposite
 * signs, hence |R_K^(j)(|z|)| <= |T_K^(j)(|z|)|: the first neglected term. For j = 0, 1 this is DLMF 5.11(ii); the
 * higher derivatives follow by the same argument. Here sec^2(arg(z)/2) = 2 |z|/(|z| + Re z), at most 2.
 */
final class StirlingSeries {
    /** The K that is used: the terms k &lt; K are summed. */
    static final int TERMS = 14;

    /** Gamma functions are shifted up to this modulus first, the n-th polygamma to n more. */
    private static final int SHIFTED_MODULUS = 12;
    /** Discs larger than this are not treated; the arc is divided instead. */
    private static final double LARGEST_RADIUS = 6;

    private static final int LARGEST_SHIFT = 20_000;
    private static final ComplexDisc HALF_LN_TWO_PI =
            ComplexDisc.of(Math.PI, 0).widened(Math.ulp(Math.PI)).multiply(2).ln().multiply(0.5);

    private StirlingSeries() {}

    /**
     * How often the argument of psi^(n) (n = 0 for ln Gamma too) goes up by one before the series serves, so that the
     * disc lies in the right half plane; -1 if the disc is too large.
     */
    static int shift(int n, ComplexDisc z) {
        if (!(z.radius() <= LARGEST_RADIUS)) {
            return -1;
        }
        int modulus = SHIFTED_MODULUS + n;
        double goal = Math.abs(z.im()) >= modulus ? 1 + z.radius() : modulus;
        double steps = Math.max(0, Math.ceil(goal - z.re()));
        if (steps > LARGEST_SHIFT) {
            throw new DomainException("a gamma function at the argument " + z.re() + " lies too far to the left (limit "
                    + -LARGEST_SHIFT + "); choose a smaller |u|");
        }
        return (int) steps;
    }

    /** ln Gamma(z). The disc must lie in the right half plane, else the whole plane comes back. */
    static ComplexDisc lnGamma(ComplexDisc z, int terms) {
        if (!(z.re() - z.radius() > 0)) {
            return ComplexDisc.WHOLE;
        }
        ComplexDisc w = z.inverse();
        ComplexDisc square = w.multiply(w);
        ComplexDisc sum = ComplexDisc.ZERO;
        for (int k = terms - 1; k >= 1; k--) {
            sum = sum.multiply(square).add(Coefficients.LN_GAMMA[k]);
        }
        double neglected = remainder(z, w, Coefficients.LN_GAMMA[terms].largest(), 2 * terms - 1, 2 * terms);
        ComplexDisc main = z.add(-0.5).multiply(z.ln()).subtract(z).add(HALF_LN_TWO_PI);
        return main.add(sum.multiply(w)).widened(neglected);
    }

    /** psi(z) under the same condition. */
    static ComplexDisc digamma(ComplexDisc z, int terms) {
        if (!(z.re() - z.radius() > 0)) {
            return ComplexDisc.WHOLE;
        }
        ComplexDisc w = z.inverse();
        ComplexDisc square = w.multiply(w);
        ComplexDisc sum = ComplexDisc.ZERO;
        for (int k = terms - 1; k >= 1; k--) {
            sum = sum.add(Coefficients.DIGAMMA[k]).multiply(square);
        }
        double neglected = remainder(z, w, Coefficients.DIGAMMA[terms].largest(), 2 * terms, 2 * terms + 1);
        return z.ln().subtract(w.multiply(0.5)).subtract(sum).widened(neglected);
    }

    /** A bound of coefficient |z|^-power sec^secants(arg(z)/2). */
    static double remainder(ComplexDisc z, ComplexDisc w, double coefficient, int power, int secants) {
        double modulus = z.largest();
        double lowest = Math.nextDown(z.re() - z.radius());
        double squaredSecant = Math.min(2, Upward.inflate(2 * modulus / (modulus + lowest)));
        double bound = coefficient;
        double inverse = w.largest();
        for (int k = 0; k < power; k++) {
            bound = Upward.inflate(bound * inverse);
        }
        for (int k = 0; 2 * k < secants; k++) {
            bound = Upward.inflate(bound * squaredSecant);
        }
        return bound;
    }

    /** Coefficients of the two most used series, index k from 1 to {@link #TERMS}. */
    private static final class Coefficients {
        static final ComplexDisc[] LN_GAMMA = new ComplexDisc[TERMS + 1];
        static final ComplexDisc[] DIGAMMA = new ComplexDisc[TERMS + 1];

        static {
            for (int k = 1; k <= TERMS; k++) {
                Rational bernoulli = Bernoulli.number(2 * k);
                LN_GAMMA[k] = ComplexDisc.of(bernoulli.divide(2L * k * (2L * k - 1)));
                DIGAMMA[k] = ComplexDisc.of(bernoulli.divide(2L * k));
            }
        }
    }
}
