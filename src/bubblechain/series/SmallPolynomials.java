package bubblechain.series;

/** Products and quotients of fixed-point series with short polynomials whose coefficients are small integers. */
final class SmallPolynomials {
    private static final int SMALL = 1 << 26;

    private SmallPolynomials() {}

    /** True if {@link #times} and {@link #over} can take these integers. */
    static boolean fits(long[] polynomial, long divisor) {
        if (polynomial.length > FixedDigits.TERMS || divisor <= 0 || divisor >= SMALL) {
            return false;
        }
        double sum = 0;
        for (long c : polynomial) {
            if (Math.abs(c) >= SMALL) {
                return false;
            }
            sum += Math.abs((double) c);
        }
        return sum / divisor <= 64;
    }

    /** A series times (p_0 + p_1 v + ... )/divisor. */
    static FixedSeries times(FixedSeries series, long[] polynomial, int divisor) {
        return combine(series, polynomial, divisor, series.digits(), series.errors());
    }

    /** A series over (p_0 + p_1 v + ...) with p_0 &gt; 0: p_0 g_n = f_n - sum_{i>=1} p_i g_{n-i}, with f = p_0 times it. */
    static FixedSeries over(FixedSeries series, long[] polynomial) {
        long[] recurrence = polynomial.clone();
        for (int i = 1; i < recurrence.length; i++) {
            recurrence[i] = -recurrence[i];
        }
        return combine(
                series, recurrence, (int) polynomial[0], new long[series.length()][], new double[series.length()]);
    }

    /**
     * g_n = (w_0 f_n + sum_{i>=1} w_i x_{n-i})/divisor with x either the input or the output itself.
     */
    private static FixedSeries combine(
            FixedSeries series, long[] weights, int divisor, long[][] shifted, double[] shiftedErrors) {
        boolean recurrence = shifted != series.digits();
        long[][] result = recurrence ? shifted : new long[series.length()][];
        double[] bounds = recurrence ? shiftedErrors : new double[series.length()];
        long[][] terms = new long[FixedDigits.TERMS][];
        int[] w = new int[FixedDigits.TERMS];
        for (int i = 0; i < weights.length; i++) {
            w[i] = (int) weights[i];
        }
        for (int n = 0; n < result.length; n++) {
            terms[0] = series.digits()[n];
            double bound = Math.abs((double) weights[0]) * series.error(n);
            int count = 1;
            for (int i = 1; i < weights.length && i <= n; i++) {
                terms[i] = shifted[n - i];
                bound += Math.abs((double) weights[i]) * shiftedErrors[n - i];
                count++;
            }
            result[n] = new long[series.limbs() + 1];
            FixedDigits.combination(result[n], terms, w, count, divisor);
            bounds[n] = (bound / divisor + 2) * FixedSeries.UP;
        }
        return FixedSeries.of(result, bounds, series.limbs());
    }
}
