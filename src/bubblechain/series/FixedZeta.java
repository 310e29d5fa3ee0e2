package bubblechain.series;

import bubblechain.exact.Ball;
import bubblechain.exact.BallFunctions;
import bubblechain.exact.DivisionSweep;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.Map;
import java.util.NavigableMap;
import java.util.TreeMap;

/**
 * s^k zeta(k, s) for k = 2, 3, ... in fixed point; between 1 and 2 for s up to 1. For s = 1 the even ones come from
 * tangent numbers, the odd ones from one sweep of P. Borwein's sum over all k; none of it needs a long division.
 */
public final class FixedZeta {
    /** Errors met on the way must not reach what is given out. */
    private static final int SPARE_LIMBS = 1;
    /** A new table has so many limbs more than asked for: the other part of a chain may want a few more bits. */
    private static final int ROOM = 2;
    /** Squares of more are too large for a sweep. */
    private static final int LARGEST_TERMS = 11_000;
    private static final int SMALL_SHIFT = 25;
    /** Tables of s = 1 by limbs; guarded by itself. */
    private static final NavigableMap<Integer, FixedSeries> TABLES = new TreeMap<>();

    private FixedZeta() {}

    /**
     * s^k zeta(k, s) at v^k for k = 2 .. max, and zero below.
     *
     * @param s between 0, excluded, and 1
     */
    public static FixedSeries normalised(Rational s, int max, int limbs) {
        if (s.equals(Rational.ONE)) {
            return zeta(max, limbs);
        }
        if (s.equals(Rational.HALF)) {
            // 2^-k zeta(k, 1/2) = (1 - 2^-k) zeta(k)
            return zeta(max, limbs).timesOneMinusPowersOfHalf();
        }
        int bits = FixedSeries.bits(limbs) + Long.SIZE;
        return fromBalls(BallFunctions.hurwitzZetaTable(Ball.of(s, bits + 8), max, bits), s, max, limbs);
    }

    private static FixedSeries fromBalls(Ball[] values, Rational s, int max, int limbs) {
        int bits = FixedSeries.bits(limbs);
        long[][] digits = new long[max + 1][limbs + 1];
        double[] errors = new double[max + 1];
        Ball power = Ball.of(s.power(1), bits + Long.SIZE);
        for (int k = 2; k <= max; k++) {
            power = power.multiply(s, bits + Long.SIZE);
            Ball value = values[k].multiply(power, bits + Long.SIZE);
            digits[k] = FixedDigits.of(value.scaledMidpoint(bits), limbs);
            errors[k] = value.radius().scale(bits).toDouble() + 1;
        }
        return FixedSeries.of(digits, errors, limbs);
    }

    private static FixedSeries zeta(int max, int limbs) {
        synchronized (TABLES) {
            for (FixedSeries known : TABLES.tailMap(limbs, true).values()) {
                if (known.length() > max) {
                    return known.truncated(max + 1, limbs);
                }
            }
            int roomy = limbs + ROOM;
            FixedSeries fresh = fresh(max, roomy);
            if (!TABLES.isEmpty() && TABLES.firstEntry().getValue().length() <= max + 1) {
                // the smallest table is of no more use
                TABLES.pollFirstEntry();
            }
            TABLES.put(roomy, fresh);
            return fresh.truncated(max + 1, limbs);
        }
    }

    private static FixedSeries fresh(int max, int limbs) {
        int working = limbs + SPARE_LIMBS;
        int terms = terms(working);
        if (terms > LARGEST_TERMS) {
            int bits = FixedSeries.bits(limbs) + Long.SIZE;
            return fromBalls(BallFunctions.zetaTable(max, bits), Rational.ONE, max, limbs);
        }
        long[][] digits = new long[max + 1][working + 1];
        double[] errors = new double[max + 1];
        even(max / 2, digits, errors, working);
        odd(max, terms, digits, errors, working);
        return FixedSeries.of(digits, errors, working).truncated(max + 1, limbs);
    }

    /** So many that Borwein's remainder, 1/d_n < 2^(1 - 5n/2), is below one unit in the last place. */
    private static int terms(int limbs) {
        return 2 * (FixedSeries.bits(limbs) + 1) / 5 + 2;
    }

    /**
     * zeta(2k) (1 - 4^-k) = T_k p_k/2 with p_k = (pi/2)^(2k)/(2k-1)!, both kept with a power of two apart.
     */
    private static void even(int count, long[][] digits, double[] errors, int limbs) {
        if (count < 1) {
            return;
        }
        TangentNumbers tangents = TangentNumbers.upTo(count);
        ScaledPowers powers = new ScaledPowers(limbs);
        for (int k = 1; k <= count; k++) {
            powers.next(k);
            long[] product = FixedDigits.product(tangents.mantissa(k, limbs), powers.digits(), limbs);
            // T_k is below 2 and at most one unit low
            double error = (2 * powers.error() + powers.bound() + 2) * FixedSeries.UP;
            int shift = tangents.bitLength(k) - 2 + powers.exponent();
            FixedDigits.scale(product, 1 << Math.max(0, shift), 1 << Math.max(0, -shift), 0);
            error = Math.scalb(error, shift) + 2;
            digits[2 * k] = product;
            errors[2 * k] = divide(product, 2 * k, error, limbs);
        }
    }

    /** number/(1 - 2^-m) in place; the new error. */
    private static double divide(long[] number, int m, double error, int limbs) {
        double bound = error;
        if (m < SMALL_SHIFT) {
            // 1/(1 - 2^-m) = 1 + 1/(2^m - 1)
            long[] part = number.clone();
            FixedDigits.divideSmall(part, (1 << m) - 1);
            for (int i = 0; i <= limbs; i++) {
                number[i] += part[i];
            }
            FixedDigits.normalise(number);
            return (2 * bound + 2) * FixedSeries.UP;
        }
        // 1/(1 - x) = (1 + x)(1 + x^2)(1 + x^4) ...; what is left out is below one unit
        for (long shift = m; shift <= FixedSeries.bits(limbs) + 2; shift *= 2) {
            DigitWords.addShifted(number, (int) shift, 1);
            bound = (bound * (1 + Math.scalb(1.0, -(int) Math.min(shift, 60))) + 1) * FixedSeries.UP;
        }
        return bound + 1;
    }

    /**
     * P. Borwein, "An efficient algorithm for the Riemann zeta function" (2000), algorithm 2: with
     * t_i = n (n+i-1)! 4^i/((n-i)! (2i)!) and w_k = (t_(k+1) + ... + t_n)/(t_0 + ... + t_n),
     * (1 - 2^(1-s)) zeta(s) = sum_(k&lt;n) (-1)^k w_k/(k+1)^s + remainder, the remainder as in {@link #terms}.
     */
    private static void odd(int max, int n, long[][] digits, double[] errors, int limbs) {
        if (max < 3) {
            return;
        }
        BorweinWeights weights = BorweinWeights.of(n, limbs);
        // the first sum is that of s = 1, which is not used
        DivisionSweep sweep = DivisionSweep.ofWords((max + 1) / 2, 2 * (limbs + 1));
        for (int k = 0; k < n; k++) {
            long[] term = weights.take(k);
            FixedDigits.scale(term, 1, k + 1, FixedDigits.leadingZeros(term));
            sweep.add(DigitWords.toWords(term), (k + 1) * (k + 1));
        }
        long[][] sums = sweep.sums();
        // of each term two units in the first division and two in all others; the weights go with 1/(k+1)^s
        double error = 2 * weights.error() + 4.0 * n + 1;
        for (int s = 3; s <= max; s += 2) {
            digits[s] = DigitWords.ofWords(sums[s / 2]);
            errors[s] = divide(digits[s], s - 1, error, limbs);
        }
    }
}
