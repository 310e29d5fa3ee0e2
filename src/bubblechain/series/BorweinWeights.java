package bubblechain.series;

import java.math.BigInteger;

/**
 * w_k = (t_(k+1) + ... + t_n)/(t_0 + ... + t_n), k = 0 .. n-1, with t_i = n (n+i-1)! 4^i/((n-i)! (2i)!), in fixed point.
 *
 * <p>t_(i+1)/t_i = 2 (n+i)(n-i)/((2i+1)(i+1)) falls with i. The recurrence starts at the largest t, so that it nowhere
 * magnifies an error: t_i is off by at most four units for each step.
 */
final class BorweinWeights {
    private static final int LARGEST_FACTOR = 1 << 25;

    private final int n;
    private final int limbs;
    private final long[][] terms;
    private final double error;

    private BorweinWeights(int n, int limbs) {
        this.n = n;
        this.limbs = limbs;
        this.terms = new long[n + 1][];
        int largest = 0;
        while (2L * (n + largest) * (n - largest) >= (2L * largest + 1) * (largest + 1)) {
            largest++;
        }
        BigInteger one = BigInteger.ONE.shiftLeft(FixedSeries.bits(limbs));
        fill(largest, FixedDigits.of(one, limbs));
        BigInteger total = FixedDigits.toInteger(sum());
        // the sum of all t is at least the largest, 1, and off by at most 4 n (n+1)
        fill(largest, FixedDigits.of(one.shiftLeft(FixedSeries.bits(limbs)).divide(total), limbs));
        double off = 4.0 * n + (4.0 * n * (n + 1) + 2);
        for (int k = n - 1; k >= 0; k--) {
            FixedDigits.add(terms[k], terms[k + 1]);
        }
        this.error = (n + 1) * off * FixedSeries.UP;
    }

    static BorweinWeights of(int n, int limbs) {
        return new BorweinWeights(n, limbs);
    }

    private void fill(int largest, long[] value) {
        terms[largest] = value;
        for (int i = largest; i < n; i++) {
            terms[i + 1] = terms[i].clone();
            scale(terms[i + 1], 2 * (n + i), 2 * i + 1, n - i, i + 1);
        }
        for (int i = largest - 1; i >= 0; i--) {
            terms[i] = terms[i + 1].clone();
            scale(terms[i], 2 * i + 1, 2 * (n + i), i + 1, n - i);
        }
    }

    /** Times p/q and r/s, at once if they are small. */
    private static void scale(long[] digits, int p, int q, int r, int s) {
        int from = FixedDigits.leadingZeros(digits);
        if ((long) p * r < LARGEST_FACTOR && (long) q * s < LARGEST_FACTOR) {
            FixedDigits.scale(digits, p * r, q * s, from);
        } else {
            FixedDigits.scale(digits, r, s, from);
            // the first step may have carried into a digit before
            FixedDigits.scale(digits, p, q, FixedDigits.leadingZeros(digits));
        }
    }

    private long[] sum() {
        long[] sum = new long[limbs + 1];
        for (long[] term : terms) {
            FixedDigits.add(sum, term);
        }
        return sum;
    }

    /** The weight w_k, which the caller may change. */
    long[] take(int k) {
        return terms[k + 1];
    }

    /** A bound of the error of each weight in units of the last place. */
    double error() {
        return error;
    }
}
