package bubblechain.series;

import bubblechain.exact.Rational;

/**
 * sum_j w_j r_j^k for k = 1, 2, ... at once, in fixed point: each power follows from the one before by small
 * multiplications and divisions, and gets shorter as it falls.
 */
public final class PowerSums {
    private static final int SMALL_BITS = 25;
    /** Weighted powers that fit into the digits of a sum before it must be carried. */
    private static final int WEIGHT_LIMIT = 60;

    private final int limbs;
    private final long[][] sums;
    private final double[] errors;
    private int pending;

    private PowerSums(int length, int limbs) {
        this.limbs = limbs;
        this.sums = new long[length][limbs + 1];
        this.errors = new double[length];
    }

    /** Sums for k = 0 .. length-1; those of k = 0 stay zero. */
    public static PowerSums of(int length, int limbs) {
        return new PowerSums(length, limbs);
    }

    /** True if {@link #add} can take this ratio: at most 1 in size, numerator and denominator small. */
    public static boolean fits(Rational ratio) {
        return ratio.abs().compareTo(Rational.ONE) <= 0 && ratio.denominator().bitLength() <= SMALL_BITS;
    }

    /** Adds weight ratio^k to the sum of every k from 1 to {@code largest}. */
    public void add(Rational ratio, int weight, int largest) {
        if (Math.abs((long) weight) > WEIGHT_LIMIT) {
            add(ratio, weight / 2, largest);
            add(ratio, weight - weight / 2, largest);
            return;
        }
        pending += Math.abs(weight);
        if (pending > WEIGHT_LIMIT) {
            settle();
            pending = Math.abs(weight);
        }
        int p = ratio.numerator().intValueExact();
        int q = ratio.denominator().intValueExact();
        long[] power = new long[limbs + 1];
        power[0] = 1;
        double error = 0;
        double size = Math.abs(ratio.toDouble()) * (1 + 0x1p-40);
        int from = 0;
        for (int k = 1; k <= largest; k++) {
            FixedDigits.scale(power, p, q, from);
            // without a division the step is exact
            error = (error * size + (q == 1 ? 0 : 2)) * (1 + 0x1p-30);
            while (from <= limbs && power[from] == 0) {
                from++;
            }
            FixedDigits.addMultiple(sums[k], power, weight, from);
            errors[k] += Math.abs((double) weight) * error;
        }
    }

    /** The sums as a series. */
    public FixedSeries series() {
        settle();
        return FixedSeries.of(sums, errors, limbs);
    }

    private void settle() {
        for (long[] sum : sums) {
            FixedDigits.normalise(sum);
        }
    }
}
