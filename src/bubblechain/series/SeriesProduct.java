package bubblechain.series;

import java.util.Arrays;
import java.util.List;

/** Products of fixed-point series, with their bounds. */
final class SeriesProduct {
    private final FixedSeries left;
    private final FixedSeries right;
    private final int limbs;
    private final int[] leftZeros;
    private final int[] rightZeros;
    private final double[] bounds;
    /** Products of digits that columns would take. */
    private double work;

    private SeriesProduct(FixedSeries left, FixedSeries right) {
        this.left = left;
        this.right = right;
        this.limbs = left.limbs();
        this.leftZeros = FixedDigits.leadingZeros(left.digits());
        this.rightZeros = FixedDigits.leadingZeros(right.digits());
        this.bounds = new double[Math.min(left.length(), right.length())];
        bound();
    }

    /** The product, digit by digit or by one long convolution, whichever is cheaper. */
    static FixedSeries of(FixedSeries left, FixedSeries right) {
        SeriesProduct product = new SeriesProduct(left, right);
        return FixedSeries.of(product.digits(), product.bounds, product.limbs);
    }

    private long[][] digits() {
        int length = bounds.length;
        List<long[]> first = Arrays.asList(left.digits()).subList(0, length);
        List<long[]> second = Arrays.asList(right.digits()).subList(0, length);
        TransformProduct.Shape shape = TransformProduct.Shape.of(
                length, 2 * length, FixedDigits.largestBits(first), FixedDigits.largestBits(second));
        return shape.isPossible() && shape.cost() < work * FixedSeries.COLUMN_COST
                ? TransformProduct.multiply(first, second, 0, length, limbs, shape)
                : columns();
    }

    private void bound() {
        double[] leftSizes = FixedDigits.upperBounds(left.digits());
        double[] rightSizes = FixedDigits.upperBounds(right.digits());
        double unit = Math.scalb(1.0, -FixedSeries.bits(limbs));
        int last = limbs + FixedSeries.GUARD_COLUMNS;
        for (int n = 0; n < bounds.length; n++) {
            double bound = 0;
            for (int k = 0; k <= n; k++) {
                bound += leftSizes[k] * right.error(n - k)
                        + left.error(k) * (rightSizes[n - k] + right.error(n - k) * unit);
                double columns = Math.max(0, last + 1 - leftZeros[k] - rightZeros[n - k]);
                work += columns * columns / 2;
            }
            bounds[n] = (bound + 2) * FixedSeries.UP;
        }
    }

    private long[][] columns() {
        long[][] product = new long[bounds.length][];
        int last = limbs + FixedSeries.GUARD_COLUMNS;
        int between = FixedSeries.productsBetweenCarries(limbs);
        long[] sums = new long[last + 3];
        for (int n = 0; n < product.length; n++) {
            Arrays.fill(sums, 0);
            int products = 0;
            for (int k = 0; k <= n; k++) {
                if (leftZeros[k] + rightZeros[n - k] <= last) {
                    FixedDigits.accumulateProduct(
                            left.digits()[k], leftZeros[k], right.digits()[n - k], rightZeros[n - k], last, sums);
                    if (++products % between == 0) {
                        FixedDigits.carry(sums);
                    }
                }
            }
            product[n] = FixedDigits.fromSums(sums, limbs);
        }
        return product;
    }
}
