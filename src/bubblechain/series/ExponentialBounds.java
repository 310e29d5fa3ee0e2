package bubblechain.series;

import java.util.Arrays;

/**
 * The errors of h = e^L, h_0 = 1, as a factor: better than the bounds of the recurrence where slopes are large and
 * cancel each other, and dearer.
 *
 * <p>With slopes k L_k that are off by d_k at most, and r_n lost in step n n times over, the numbers computed are h (1
 * + x)(1 + y), where 1 + x is the exponential of the series of the d_k/k, and y the integral of (r/v) e^(-L) over the
 * slopes taken: |y_n| &lt;= (1/n) sum_{i=1}^{n} |g_{n-i}| |r_i|, g = e^(-L). The products of errors are below the
 * square of the sum of all x and y: e^s - 1 - s &lt;= s^2 for s &lt;= 1.
 */
final class ExponentialBounds {
    private ExponentialBounds() {}

    /** Bounds of |g_n|: the recurrence in doubles, its rounding carried along. */
    private static double[] inverseSizes(double[] slopes) {
        int length = slopes.length;
        double[] g = new double[length];
        double[] radius = new double[length];
        double[] sizes = new double[length];
        g[0] = 1;
        sizes[0] = 1;
        for (int n = 1; n < length; n++) {
            double sum = 0;
            double terms = 0;
            double error = 0;
            for (int k = 1; k <= n; k++) {
                double size = Math.abs(slopes[k]) * FixedSeries.UP;
                sum += slopes[k] * g[n - k];
                terms += size * Math.abs(g[n - k]);
                error += size * radius[n - k];
            }
            g[n] = -sum / n;
            // each slope is off by four units of a double at most; then come a product, n sums and a quotient
            radius[n] = ((error + terms * (n + 8) * 0x1p-52) / n + (n + 1) * 4 * Double.MIN_VALUE) * FixedSeries.UP;
            sizes[n] = (Math.abs(g[n]) + radius[n]) * FixedSeries.UP;
        }
        return sizes;
    }

    /**
     * Bounds of the coefficients of the factor less one, in units of the last place.
     *
     * @param slopeErrors errors of the slopes in the same units
     * @param lost        units lost in step n, times n
     * @param unit        the last place
     */
    static double[] factor(long[][] slopes, double[] slopeErrors, double[] lost, double unit) {
        double[] inverse = inverseSizes(
                Arrays.stream(slopes).mapToDouble(FixedDigits::toDouble).toArray());
        double[] factor = new double[slopes.length];
        double total = 0;
        for (int n = 1; n < factor.length; n++) {
            double sum = slopeErrors[n];
            for (int i = 1; i <= n; i++) {
                sum += inverse[n - i] * lost[i];
            }
            factor[n] = sum / n * FixedSeries.UP;
            total += factor[n];
        }
        double products = total * unit < 0.5 ? total * total * unit * 2 : Double.POSITIVE_INFINITY;
        for (int n = 1; n < factor.length; n++) {
            factor[n] += products;
        }
        return factor;
    }

    /** Bounds of the errors of a series with coefficients of some sizes that is off by a factor. */
    static double[] errors(double[] sizes, double[] factor) {
        double[] errors = new double[sizes.length];
        for (int n = 0; n < errors.length; n++) {
            for (int k = 0; k < n; k++) {
                errors[n] += sizes[k] * factor[n - k];
            }
            errors[n] *= FixedSeries.UP;
        }
        return errors;
    }
}
