package bubblechain.series;

import bubblechain.exact.Rational;
import java.util.List;

/**
 * What groups of linear factors, applied one after the other, make of the errors of a series.
 *
 * <p>A step leaves an error of at most two units in every coefficient: a product g = p f + d, a quotient p g = f + d.
 * What follows multiplies d by the power series of all later groups, in a quotient by that of its own one too. With F
 * the product of all groups and S the sum of the sizes of those partial ones, the errors are at most |F| e + 2 S/(1 -
 * v), coefficient by coefficient. Bounding each step alone would take prod (1 + |slope|) for |F|, where neighbouring
 * factors above and below nearly cancel.
 */
final class LinearBounds {
    /** Bound of the relative rounding of a slope, a product and a sum of doubles. */
    private static final double ROUNDING = 0x1p-50;

    private final double[] values;
    private final double[] errors;
    private final double[] partial;

    private LinearBounds(int length) {
        this.values = new double[length];
        this.errors = new double[length];
        this.partial = new double[length];
    }

    static LinearBounds of(List<LinearGroup> groups, int length) {
        LinearBounds bounds = new LinearBounds(length);
        bounds.values[0] = 1;
        for (int j = groups.size() - 1; j >= 0; j--) {
            LinearGroup group = groups.get(j);
            if (!group.divides()) {
                bounds.collect();
            }
            for (Rational slope : group.slopes()) {
                if (group.divides()) {
                    bounds.divide(slope.toDouble());
                } else {
                    bounds.multiply(slope.toDouble());
                }
            }
            if (group.divides()) {
                bounds.collect();
            }
        }
        return bounds;
    }

    private void collect() {
        for (int n = 0; n < partial.length; n++) {
            partial[n] += Math.abs(values[n]) + errors[n];
        }
    }

    private void multiply(double slope) {
        double size = Math.abs(slope) * FixedSeries.UP;
        for (int n = values.length - 1; n > 0; n--) {
            double rounding = rounding(values[n], slope * values[n - 1]);
            values[n] += slope * values[n - 1];
            errors[n] += size * errors[n - 1] + rounding;
        }
    }

    private void divide(double slope) {
        double size = Math.abs(slope) * FixedSeries.UP;
        for (int n = 1; n < values.length; n++) {
            double rounding = rounding(values[n], slope * values[n - 1]);
            values[n] -= slope * values[n - 1];
            errors[n] += size * errors[n - 1] + rounding;
        }
    }

    private static double rounding(double first, double second) {
        return (Math.abs(first) + Math.abs(second)) * ROUNDING + 4 * Double.MIN_VALUE;
    }

    /** The bounds after all steps, from those before. */
    double[] after(double[] before) {
        int length = values.length;
        double[] sizes = new double[length];
        double[] result = new double[length];
        double steps = 0;
        for (int n = 0; n < length; n++) {
            sizes[n] = Math.abs(values[n]) + errors[n];
            steps += 2 * partial[n];
            double bound = steps;
            for (int k = 0; k <= n; k++) {
                bound += sizes[k] * before[n - k];
            }
            result[n] = bound * FixedSeries.UP;
        }
        return result;
    }

    /**
     * The bounds after all steps for a series that is off by a factor: the same factor multiplies the result.
     *
     * @param sizes bounds of the sizes of the coefficients of the result
     * @param other bounds already known
     */
    double[] after(double[] factor, double[] sizes, double[] other) {
        double[] result = ExponentialBounds.errors(sizes, factor);
        double steps = 0;
        for (int n = 0; n < result.length; n++) {
            steps += 2 * partial[n];
            double bound = (result[n] + steps) * FixedSeries.UP;
            result[n] = bound < other[n] ? bound : other[n];
        }
        return result;
    }
}
