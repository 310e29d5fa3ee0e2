package bubblechain.series;

import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.List;

/**
 * Products and quotients of fixed-point series with polynomials over Q: in small integers where they fit, else in big
 * ones.
 */
final class RationalSteps {
    private RationalSteps() {}

    static FixedSeries times(FixedSeries series, List<Rational> polynomial) {
        Integers p = Integers.of(polynomial);
        if (p.isSmall() && SmallPolynomials.fits(p.small(), p.divisor.longValueExact())) {
            return SmallPolynomials.times(series, p.small(), p.divisor.intValueExact());
        }
        List<BigInteger> values = integers(series);
        List<BigInteger> result = new ArrayList<>();
        double[] errors = new double[series.length()];
        for (int n = 0; n < series.length(); n++) {
            BigInteger sum = BigInteger.ZERO;
            double bound = 0;
            for (int i = 0; i < p.numerators.size() && i <= n; i++) {
                sum = sum.add(p.numerators.get(i).multiply(values.get(n - i)));
                bound += upper(p.numerators.get(i), p.divisor) * series.error(n - i);
            }
            result.add(sum.divide(p.divisor));
            errors[n] = (bound + 1) * (1 + 0x1p-30);
        }
        return FixedSeries.of(result, errors, series.limbs());
    }

    static FixedSeries over(FixedSeries series, List<Rational> polynomial) {
        Rational leading = polynomial.get(0);
        List<Rational> monic = new ArrayList<>();
        for (Rational c : polynomial) {
            monic.add(c.divide(leading));
        }
        Integers p = Integers.of(monic);
        FixedSeries scaled = leading.equals(Rational.ONE) ? series : times(series, List.of(leading.inverse()));
        if (p.isSmall() && SmallPolynomials.fits(p.small(), p.small()[0])) {
            return SmallPolynomials.over(scaled, p.small());
        }
        List<BigInteger> values = integers(scaled);
        List<BigInteger> result = new ArrayList<>();
        double[] errors = new double[series.length()];
        BigInteger divisor = p.numerators.get(0);
        for (int n = 0; n < series.length(); n++) {
            BigInteger sum = values.get(n).multiply(divisor);
            double bound = scaled.error(n);
            for (int i = 1; i < p.numerators.size() && i <= n; i++) {
                sum = sum.subtract(p.numerators.get(i).multiply(result.get(n - i)));
                bound += upper(p.numerators.get(i), divisor) * errors[n - i];
            }
            result.add(sum.divide(divisor));
            errors[n] = (bound + 1) * (1 + 0x1p-30);
        }
        return FixedSeries.of(result, errors, series.limbs());
    }

    /**
     * Bounds of the sizes of the coefficients of p_0/p.
     *
     * <p>The recurrence in doubles gives some q with p q = p_0 (1 + h), h known to be small, so that the quotient is q
     * - h times the quotient, and |quotient_n| &lt;= |q_n| + sum_{k>=1} |h_k| |quotient_(n-k)|. Interval arithmetic
     * would grow like 1/(1 - sum |p_i| v^i) instead, exponentially faster.
     */
    static double[] quotientSizes(List<Rational> polynomial, int length) {
        int degree = polynomial.size() - 1;
        double[] p = polynomial.stream()
                .mapToDouble(c -> c.divide(polynomial.get(0)).toDouble())
                .toArray();
        double[] q = new double[length];
        double[] h = new double[length];
        double[] sizes = new double[length];
        for (int n = 0; n < length; n++) {
            double sum = 0;
            double terms = 0;
            for (int i = 1; i <= degree && i <= n; i++) {
                sum += p[i] * q[n - i];
                terms += Math.abs(p[i] * q[n - i]);
            }
            q[n] = n == 0 ? 1 : -sum;
            // each p_i is off by four units at most; then come a product and a sum
            h[n] = (degree + 6) * (0x1p-51 * terms + 4 * Double.MIN_VALUE);
            double bound = Math.abs(q[n]);
            for (int k = 1; k <= n; k++) {
                bound += h[k] * sizes[n - k];
            }
            sizes[n] = bound * FixedSeries.UP;
        }
        return sizes;
    }

    /** The coefficients of prod (1 + slope v). */
    static List<Rational> product(List<Rational> slopes) {
        List<Rational> product = new ArrayList<>(List.of(Rational.ONE));
        for (Rational slope : slopes) {
            product.add(Rational.ZERO);
            for (int k = product.size() - 1; k > 0; k--) {
                product.set(k, product.get(k).add(product.get(k - 1).multiply(slope)));
            }
        }
        return product;
    }

    private static List<BigInteger> integers(FixedSeries series) {
        List<BigInteger> values = new ArrayList<>();
        for (int k = 0; k < series.length(); k++) {
            values.add(series.integer(k));
        }
        return values;
    }

    /** Not below |numerator/divisor|. */
    private static double upper(BigInteger numerator, BigInteger divisor) {
        return Math.abs(Rational.of(numerator, divisor).toDouble()) * (1 + 0x1p-40) + Double.MIN_VALUE;
    }

    /** A polynomial over Q as integers over one positive divisor. */
    private record Integers(List<BigInteger> numerators, BigInteger divisor) {
        static Integers of(List<Rational> polynomial) {
            BigInteger common = BigInteger.ONE;
            for (Rational c : polynomial) {
                common = common.multiply(c.denominator()).divide(common.gcd(c.denominator()));
            }
            List<BigInteger> numerators = new ArrayList<>();
            for (Rational c : polynomial) {
                numerators.add(c.numerator().multiply(common.divide(c.denominator())));
            }
            return new Integers(numerators, common);
        }

        boolean isSmall() {
            boolean small = divisor.bitLength() < 30;
            for (BigInteger numerator : numerators) {
                small &= numerator.bitLength() < 30;
            }
            return small;
        }

        long[] small() {
            long[] result = new long[numerators.size()];
            for (int i = 0; i < result.length; i++) {
                result[i] = numerators.get(i).longValueExact();
            }
            return result;
        }
    }
}
