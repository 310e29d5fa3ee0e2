package bubblechain.series;

import java.util.Arrays;
import java.util.List;

/**
 * The work state of n h_n = sum_{k=1}^{n} s_k h_{n-k}, h_0 given. Each block of new coefficients is added to the sums
 * of the next one as a whole, by columns or by a transform, whichever is cheaper; single blocks are done term by term.
 */
final class ExponentialRecurrence {
    /** Blocks below this size are not divided. */
    private static final int SMALLEST_BLOCK = 32;
    private static final int SAMPLES = 12;
    /** Bounds in units of the last place beyond which a better one is worth its time. */
    private static final double LARGE_BOUND = 0x1p12;

    private final long[][] slopes;
    private final double[] slopeErrors;
    private final double[] slopeSizes;
    private final int[] slopeZeros;
    private final int limbs;
    private final int last;
    private final int between;
    private final long[][] h;
    private final double[] bounds;
    private final double[] sizes;
    private final int[] zeros;
    /** Column sums of the contributions to each n, and how many products or transforms went into them. */
    private final long[][] sums;
    private final int[] products;
    private final int[] transforms;
    private double[] factor = {};

    ExponentialRecurrence(long[][] slopes, double[] slopeErrors, int limbs) {
        this.slopes = slopes;
        this.slopeErrors = slopeErrors;
        this.limbs = limbs;
        this.last = limbs + FixedSeries.GUARD_COLUMNS;
        this.between = FixedSeries.productsBetweenCarries(limbs);
        int length = slopes.length;
        this.slopeSizes = FixedDigits.upperBounds(slopes);
        this.slopeZeros = FixedDigits.leadingZeros(slopes);
        this.h = new long[length][];
        this.bounds = new double[length];
        this.sizes = new double[length];
        this.zeros = new int[length];
        this.sums = new long[length][];
        this.products = new int[length];
        this.transforms = new int[length];
    }

    long[][] digits() {
        return h;
    }

    double[] bounds() {
        return bounds;
    }

    /** The errors as a factor, see {@link ExponentialBounds}; empty where they are small or not known in this form. */
    double[] factor() {
        return factor;
    }

    void run(long[][] known, double[] knownBounds) {
        for (int k = 0; k < known.length; k++) {
            h[k] = known[k];
            bounds[k] = knownBounds[k];
            measure(k);
        }
        int length = h.length;
        if (known.length < length) {
            for (int n = known.length; n < length; n++) {
                sums[n] = new long[last + 3];
            }
            contribute(0, known.length, length);
            block(known.length, length);
        }
        if (known.length == 1 && knownBounds[0] == 0 && largestBound() > LARGE_BOUND) {
            improveBounds();
        }
    }

    private double largestBound() {
        double largest = 0;
        for (double bound : bounds) {
            largest = Math.max(largest, bound);
        }
        return largest;
    }

    private void improveBounds() {
        double unit = Math.scalb(1.0, -FixedSeries.bits(limbs));
        double[] lost = new double[h.length];
        double[] upper = new double[h.length];
        for (int n = 0; n < h.length; n++) {
            lost[n] = lost(n);
            upper[n] = (sizes[n] + bounds[n] * unit) * FixedSeries.UP;
        }
        factor = ExponentialBounds.factor(slopes, slopeErrors, lost, unit);
        double[] others = ExponentialBounds.errors(upper, factor);
        for (int n = 0; n < bounds.length; n++) {
            bounds[n] = others[n] < bounds[n] ? others[n] : bounds[n];
        }
    }

    /** One unit for the digits dropped from the sum, one for the division, one for all dropped columns; times n. */
    private double lost(int n) {
        return transforms[n] + 3.0 * n;
    }

    private void measure(int n) {
        sizes[n] = FixedDigits.upperBound(h[n]);
        zeros[n] = FixedDigits.leadingZeros(h[n]);
    }

    /** All coefficients from .. to-1, what those before {@code from} contribute being in the sums. */
    private void block(int from, int to) {
        if (to - from <= SMALLEST_BLOCK) {
            for (int n = from; n < to; n++) {
                addColumns(from, n, n);
                finish(n);
            }
            return;
        }
        int middle = (from + to) >>> 1;
        block(from, middle);
        contribute(from, middle, to);
        block(middle, to);
    }

    /** Adds what h_from .. h_(middle-1) contribute to the sums of middle .. to-1. */
    private void contribute(int from, int middle, int to) {
        double work = columnWork(from, middle, to);
        List<long[]> left = Arrays.asList(h).subList(from, middle);
        List<long[]> right = Arrays.asList(slopes).subList(0, to - from);
        TransformProduct.Shape shape = TransformProduct.Shape.of(
                middle - from, to - from, FixedDigits.largestBits(left), FixedDigits.largestBits(right));
        if (shape.isPossible() && shape.cost() < work * FixedSeries.COLUMN_COST) {
            // the convolution wraps around onto entries below middle - from, which are not wanted
            long[][] product = TransformProduct.multiply(left, right, middle - from, to - from, limbs, shape);
            for (int n = middle; n < to; n++) {
                addDigits(product[n - middle], n);
            }
        } else {
            for (int n = middle; n < to; n++) {
                addColumns(from, middle, n);
            }
        }
    }

    /** Products of digits that columns would take, from a sample of the pairs. */
    private double columnWork(int from, int middle, int to) {
        int stepN = Math.max(1, (to - middle) / SAMPLES);
        int stepI = Math.max(1, (middle - from) / SAMPLES);
        double work = 0;
        for (int n = middle; n < to; n += stepN) {
            for (int i = from; i < middle; i += stepI) {
                double columns = Math.max(0, last + 1 - slopeZeros[n - i] - zeros[i]);
                work += columns * columns / 2;
            }
        }
        return work * stepN * stepI;
    }

    private void addDigits(long[] digits, int n) {
        for (int i = 0; i <= limbs; i++) {
            sums[n][i + 2] += digits[i];
        }
        FixedDigits.carry(sums[n]);
        products[n] = 0;
        transforms[n]++;
    }

    private void addColumns(int from, int to, int n) {
        for (int i = from; i < to; i++) {
            int k = n - i;
            if (slopeZeros[k] + zeros[i] <= last) {
                FixedDigits.accumulateProduct(slopes[k], slopeZeros[k], h[i], zeros[i], last, sums[n]);
                if (++products[n] % between == 0) {
                    FixedDigits.carry(sums[n]);
                }
            }
        }
    }

    /** sum_k (|s_k| e_(n-k) + d_k (|h_(n-k)| + e_(n-k))), in a method of its own because it is compiled often. */
    private double errorSum(int n, double unit) {
        double bound = 0;
        for (int k = 1; k <= n; k++) {
            bound += slopeSizes[k] * bounds[n - k] + slopeErrors[k] * (sizes[n - k] + bounds[n - k] * unit);
        }
        return bound;
    }

    private void finish(int n) {
        double unit = Math.scalb(1.0, -FixedSeries.bits(limbs));
        double bound = lost(n) + errorSum(n, unit);
        h[n] = FixedDigits.fromSums(sums[n], limbs);
        sums[n] = new long[0];
        FixedDigits.divideSmall(h[n], n);
        bounds[n] = bound / n * FixedSeries.UP;
        measure(n);
    }
}
