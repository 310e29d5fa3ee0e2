package bubblechain.series;

import bubblechain.exact.Rational;
import java.util.Optional;

/**
 * Decimals of s_n w_n for fixed-point numbers s_n and weights w_n that follow from each other by small rational factors,
 * w_0 = 1. The weight is kept as m 10^E with m of order one, so that neither factorials nor powers leave the range.
 */
final class FixedDecimals {
    private static final int TEN = 10;
    private static final int LARGEST_FACTOR = 1 << 25;
    private static final int LARGEST_RATIO = 32;
    private static final double LARGEST_ERROR = 0x1p54;
    private final int limbs;
    private final long[] weight;
    private double weightError;
    private long exponent;

    FixedDecimals(int limbs) {
        this.limbs = limbs;
        this.weight = new long[limbs + 1];
        weight[0] = 1;
    }

    /** True if {@link #step} can take this factor. */
    static boolean fits(Rational factor) {
        return factor.signum() > 0
                && factor.numerator().bitLength() < 25
                && factor.denominator().bitLength() < 25
                && tens(factor.numerator().intValueExact(), factor.denominator().intValueExact()) >= 0;
    }

    /** The power of ten that brings p/q into range; negative if the denominator gets too large by it. */
    private static int tens(int p, int q) {
        long denominator = q;
        int power = 0;
        while (p > LARGEST_RATIO * denominator) {
            denominator *= TEN;
            power++;
        }
        return denominator < LARGEST_FACTOR ? power : -1;
    }

    /** The next weight is the last one times a factor. */
    void step(Rational factor) {
        int p = factor.numerator().intValueExact();
        int q = factor.denominator().intValueExact();
        int power = tens(p, q);
        scale(p, (int) (q * DecimalDigits.POWERS_OF_TEN[power]));
        exponent += power;
        while (weight[0] >= TEN) {
            scale(1, TEN);
            exponent++;
        }
        while (weight[0] == 0) {
            scale(TEN, 1);
            exponent--;
        }
    }

    private void scale(int p, int q) {
        FixedDigits.scale(weight, p, q, 0);
        weightError = (weightError * p / q + 2) * FixedSeries.UP;
    }

    /**
     * The decimal of number times weight; empty if the digits are not certain.
     *
     * @param error bound of the error of the number in units of its last place
     */
    Optional<String> decimal(long[] number, double error, int digits) {
        int zeros = FixedDigits.leadingZeros(number);
        if (zeros == number.length && error == 0) {
            return Optional.of("0");
        }
        int last = limbs + FixedSeries.GUARD_COLUMNS;
        long[] sums = new long[last + 3];
        FixedDigits.accumulateProduct(number, zeros, weight, 0, last, sums);
        long[] product = FixedDigits.fromSums(sums, limbs);
        double unit = Math.scalb(1.0, -FixedSeries.bits(limbs));
        double bound = FixedDigits.upperBound(number) * weightError
                + error * (FixedDigits.upperBound(weight) + weightError * unit)
                + 2;
        return text(product, bound * FixedSeries.UP, digits);
    }

    private Optional<String> text(long[] product, double error, int digits) {
        int zeros = FixedDigits.leadingZeros(product);
        if (zeros == product.length || !(error < Double.MAX_VALUE)) {
            return Optional.empty();
        }
        boolean negative = product[zeros] < 0;
        int end = limbs;
        double units = error;
        while (units > LARGEST_ERROR) {
            units = units * 0x1p-56 + 1;
            end--;
        }
        if (end < 1) {
            return Optional.empty();
        }
        long[] low = new long[end + 1];
        for (int k = 0; k <= end; k++) {
            low[k] = negative ? -product[k] : product[k];
        }
        // what was cut off is less than one unit of the last digit kept
        long margin = (long) Math.ceil(units) + 1;
        low[end] -= margin;
        return DecimalDigits.of(low, 2.0 * margin).text(negative, exponent, digits);
    }
}
