package bubblechain.analytic;

import bubblechain.exact.Bernoulli;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.Arrays;

/**
 * The polygamma function psi^(n) over discs: reflection into the right half plane, recurrence away from the origin,
 * there the asymptotic series.
 *
 * <p>Reflection, DLMF 5.15.6: psi^(n)(z) = (-1)^n psi^(n)(1-z) - pi d^n cot(pi z)/dz^n. With q = e^(2 pi i s z), s the
 * sign of Im z, pi cot(pi z) = -i pi s (1+q)/(1-q) = -i pi s - 2 i pi s sum_{k>=1} q^k, so that its n-th derivative is
 * -(2 pi i s)^(n+1) q A_n(q)/(1-q)^(n+1), A_n the Eulerian polynomial, DLMF 26.14.
 */
final class PolygammaDisc {
    /** Above this order the recurrence takes the place of the reflection. */
    private static final int LARGEST_ORDER_REFLECTED = 100;

    private static final ComplexDisc TWO_PI_I =
            ComplexDisc.of(Math.PI, 0).widened(Math.ulp(Math.PI)).multiply(2).timesI();

    private final int n;
    /** (-1)^(n+1) n!. */
    private final ScaledDisc factor;
    /** 1/n for n >= 1. */
    private final ComplexDisc inverseOrder;
    /** B_2k (2k+n-1)!/((2k)! n!) at index k. */
    private final ComplexDisc[] coefficients = new ComplexDisc[StirlingSeries.TERMS + 1];
    /** Coefficients of A_n for n >= 1. */
    private final ComplexDisc[] eulerian;

    private PolygammaDisc(int n) {
        this.n = n;
        Rational factorial = Rational.of(ExactFunctions.factorial(n));
        this.factor = ScaledDisc.of(n % 2 == 0 ? factorial.negate() : factorial);
        this.inverseOrder = n == 0 ? ComplexDisc.ZERO : ComplexDisc.of(Rational.of(1, n));
        for (int k = 1; k <= StirlingSeries.TERMS; k++) {
            Rational quotient = Rational.of(1, 2L * k); // binomial(2k+n-1, n)/(2k)
            for (int j = 1; j <= n; j++) {
                quotient = quotient.multiply(2L * k - 1 + j).divide(j);
            }
            coefficients[k] = ComplexDisc.of(Bernoulli.number(2 * k).multiply(quotient));
        }
        this.eulerian = n <= LARGEST_ORDER_REFLECTED ? eulerian(n) : new ComplexDisc[0];
    }

    /** DLMF 26.14: A(n, k) = (k+1) A(n-1, k) + (n-k) A(n-1, k-1). */
    private static ComplexDisc[] eulerian(int n) {
        BigInteger[] row = {BigInteger.ONE};
        for (int m = 2; m <= n; m++) {
            BigInteger[] next = new BigInteger[m];
            for (int k = 0; k < m; k++) {
                BigInteger stay = k < m - 1 ? row[k].multiply(BigInteger.valueOf(k + 1L)) : BigInteger.ZERO;
                BigInteger step = k > 0 ? row[k - 1].multiply(BigInteger.valueOf(m - k)) : BigInteger.ZERO;
                next[k] = stay.add(step);
            }
            row = next;
        }
        return Arrays.stream(row).map(a -> ComplexDisc.of(Rational.of(a))).toArray(ComplexDisc[]::new);
    }

    static PolygammaDisc of(int n) {
        return new PolygammaDisc(n);
    }

    /** psi^(n) over the disc; the whole plane if the disc touches a pole or is too large. */
    ScaledDisc over(ComplexDisc z) {
        if (z.re() >= 0.5 || n > LARGEST_ORDER_REFLECTED) {
            return byRecurrence(z);
        }
        ScaledDisc mirrored = byRecurrence(ComplexDisc.ONE.subtract(z));
        return (n % 2 == 0 ? mirrored : mirrored.negate()).add(cotangent(z).negate());
    }

    /** pi d^n cot(pi z)/dz^n. */
    private ScaledDisc cotangent(ComplexDisc z) {
        ComplexDisc factor = z.im() < 0 ? TWO_PI_I.negate() : TWO_PI_I;
        ComplexDisc q = ScaledDisc.exp(z.add(-Math.rint(z.re())).multiply(factor)).unscaled();
        ScaledDisc inverse = ScaledDisc.of(ComplexDisc.ONE.subtract(q).inverse());
        if (n == 0) {
            return inverse.multiply(q.add(1)).multiply(factor.multiply(-0.5));
        }
        ComplexDisc sum = ComplexDisc.ZERO;
        for (int k = eulerian.length - 1; k >= 0; k--) {
            sum = sum.multiply(q).add(eulerian[k]);
        }
        return inverse.multiply(factor).power(n + 1).multiply(sum.multiply(q)).negate();
    }

    private ScaledDisc byRecurrence(ComplexDisc z) {
        int steps = StirlingSeries.shift(n, z);
        if (steps < 0) {
            return ScaledDisc.WHOLE;
        }
        if (n == 0) {
            ComplexDisc sum = StirlingSeries.digamma(z.add(steps), StirlingSeries.TERMS);
            for (int k = 0; k < steps; k++) {
                sum = sum.subtract(z.add(k).inverse());
            }
            return ScaledDisc.of(sum);
        }
        ScaledDisc sum = hurwitz(z.add(steps), StirlingSeries.TERMS);
        for (int k = 0; k < steps; k++) {
            sum = sum.add(ScaledDisc.of(z.add(k).inverse()).power(n + 1));
        }
        return sum.multiply(factor);
    }

    /**
     * sum_{k>=0} (z+k)^(-n-1) for n >= 1 and a disc in the right half plane: (-1)^(n+1) psi^(n)(z)/n!, which is
     * z^(-n-1) (z/n + 1/2 + sum_{0&lt;k&lt;K} B_2k (2k+n-1)!/((2k)! n!) z^(1-2k)) and a remainder, DLMF 5.15.8 and
     * {@link StirlingSeries}.
     */
    ScaledDisc hurwitz(ComplexDisc z, int terms) {
        if (!(z.re() - z.radius() > 0)) {
            return ScaledDisc.WHOLE;
        }
        ComplexDisc w = z.inverse();
        ComplexDisc square = w.multiply(w);
        ComplexDisc sum = ComplexDisc.ZERO;
        for (int k = terms - 1; k >= 1; k--) {
            sum = sum.multiply(square).add(coefficients[k]);
        }
        double neglected =
                StirlingSeries.remainder(z, w, coefficients[terms].largest(), 2 * terms - 1, 2 * terms + n + 1);
        ComplexDisc bracket =
                z.multiply(inverseOrder).add(0.5).add(sum.multiply(w)).widened(neglected);
        return ScaledDisc.of(w).power(n + 1).multiply(bracket);
    }
}
