package bubblechain.exact;

import java.math.BigInteger;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * zeta(s, q) = sum_{k>=0} (q+k)^-s for integers s >= 2 and q > 0 by Euler's and Maclaurin's formula.
 *
 * <p>With z = q + N, T = zeta(s, z): z^s T = z/(s-1) + 1/2 + sum_{j=1..M} c_j (s)_(2j-1) + R,
 * c_j = B_2j z^(1-2j)/(2j)!, (s)_n = s (s+1) ... (s+n-1). All even derivatives of x^-s are positive and decreasing for
 * x > 0, hence R has the sign of the first omitted term and is not larger than it.
 */
final class HurwitzZeta {
    private static final int GUARD = 32;
    private static final double LOG2_STEP = 1 / Math.log(2);

    private HurwitzZeta() {}

    /** Entry i is zeta(first + i, q). */
    static Ball[] range(Ball q, int first, int last, int bits) {
        if (first < 2) {
            throw new DomainException("zeta(" + first + ", q) is not provided; the first argument must be from 2 on");
        }
        if (last < first) {
            return new Ball[0];
        }
        Elementary.requirePositive(q, "the Hurwitz zeta function");
        Ball[] values = centerRange(q.center(), first, last, bits);
        if (q.isExact()) {
            Arrays.setAll(values, i -> values[i].round(bits));
            return values;
        }
        // |d/dq zeta(s, q)| = s zeta(s+1, q) <= s (q^-(s+1) + q^-s/s), sum bounded by first term plus integral
        Magnitude inverse = q.inverseUpperBound();
        Magnitude power = power(inverse, first);
        for (int s = first; s <= last; s++) {
            Magnitude slope = power.multiply(inverse).multiply(Magnitude.of(s)).add(power);
            values[s - first] = values[s - first].addError(slope.multiply(q.radius())).round(bits);
            power = power.multiply(inverse);
        }
        return values;
    }

    private static Magnitude power(Magnitude base, int exponent) {
        Magnitude result = Magnitude.ONE;
        for (int i = 0; i < exponent; i++) {
            result = result.multiply(base);
        }
        return result;
    }

    private static Ball[] centerRange(Ball q, int first, int last, int bits) {
        int working = bits + GUARD;
        double start = q.toDouble();
        // any number of direct terms is correct; this one lets the Bernoulli terms fall fast enough
        int terms = (int) Math.max(0, Math.ceil(0.2 * working + 0.35 * last + 2 - start));
        Ball[] sums = new Ball[last - first + 1];
        Arrays.fill(sums, Ball.ZERO);
        for (int k = 0; k < terms; k++) {
            Ball base = q.add(Ball.of(k), working);
            double fall = q.mid().top() < -1000 ? 0 : Math.log((start + k) / start) * LOG2_STEP;
            addPowers(sums, base, first, fall, working);
        }
        Ball z = q.add(Ball.of(terms), working);
        List<Ball> coefficients = coefficients(z, last, working);
        Ball inverse = z.inverse(working);
        Ball power = inverse.power(first, working);
        for (int s = first; s <= last; s++) {
            sums[s - first] = sums[s - first].add(tail(z, s, coefficients, working).multiply(power, working), working);
            power = power.multiply(inverse, working);
        }
        return sums;
    }

    /** Adds base^-s to the sums; each power needs fewer bits than the first, larger by 2^(fall s), of its sum. */
    private static void addPowers(Ball[] sums, Ball base, int first, double fall, int working) {
        Ball inverse = base.inverse(working);
        Ball power = inverse.power(first, Math.max(GUARD, working - (int) (fall * first)));
        for (int i = 0; i < sums.length; i++) {
            sums[i] = sums[i].add(power, working);
            int needed = Math.max(GUARD, working - (int) Math.min(working, fall * (first + i + 1)));
            inverse = inverse.round(needed + 8);
            power = power.multiply(inverse, needed);
        }
    }

    /** c_1, ..., c_(M+1): up to the one whose term for s = last is small enough, or the least there is. */
    static List<Ball> coefficients(Ball z, int last, int working) {
        List<Ball> result = new ArrayList<>();
        Ball inverse = z.inverse(working);
        Ball square = inverse.multiply(inverse, working);
        Ball factor = inverse.shift(-1); // z^(1-2j)/(2j)!
        double rising = Math.log(last) * LOG2_STEP; // log2 of (s)_(2j-1), steers the length only
        double target = z.mid().top() - working - 1 - rising;
        double previous = Double.MAX_VALUE;
        for (int j = 1; ; j++) {
            Ball coefficient = factor.multiply(Bernoulli.number(2 * j), working);
            result.add(coefficient);
            double size = coefficient.upperBound().exponent() + rising;
            if (size < target || size > previous) {
                return result;
            }
            previous = size;
            factor = factor.multiply(square, working).divide(Rational.of((2L * j + 1) * (2L * j + 2)), working);
            rising += Math.log((last + 2.0 * j - 1) * (last + 2.0 * j)) * LOG2_STEP;
        }
    }

    /** z^s zeta(s, z), by Horner's rule; the last coefficient bounds the remainder. */
    static Ball tail(Ball z, int s, List<Ball> coefficients, int working) {
        int used = coefficients.size() - 1;
        Ball sum = Ball.ZERO;
        Magnitude rising = Magnitude.of(s);
        for (int j = used; j >= 1; j--) {
            Rational step = Rational.of(BigInteger.valueOf(s + 2L * j - 1).multiply(BigInteger.valueOf(s + 2L * j)));
            sum = sum.multiply(step, working).add(coefficients.get(j - 1), working);
            rising = rising.multiply(Magnitude.of(step.numerator())); // in the end (s)_(2 used + 1)
        }
        return sum.multiply(Rational.of(s), working)
                .addError(rising.multiply(coefficients.get(used).upperBound()))
                .add(Ball.ONE.shift(-1), working)
                .add(z.divide(Rational.of(s - 1L), working), working);
    }
}
