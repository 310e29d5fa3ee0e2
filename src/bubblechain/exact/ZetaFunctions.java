package bubblechain.exact;

import java.math.BigInteger;
import java.util.Arrays;
import java.util.Iterator;
import java.util.Map;
import java.util.NavigableMap;
import java.util.TreeMap;

/** Riemann's zeta function at integers: Bernoulli numbers at small even arguments, otherwise Borwein's sum. */
final class ZetaFunctions {
    private static final int GUARD = 24;
    /** A new table has this part more bits than asked for. */
    private static final int ROOM = 8;
    /** Up to here the Bernoulli numbers are cheaper than the alternating sum. */
    private static final int LARGEST_BERNOULLI_INDEX = 1000;
    /** Tables by precision, from index 0; guarded by itself. */
    private static final NavigableMap<Integer, Ball[]> TABLES = new TreeMap<>();

    private ZetaFunctions() {}

    static Ball zeta(int k, int bits) {
        if (k < 2) {
            throw new DomainException("zeta(" + k + ") is not provided; the argument must be an integer from 2 on");
        }
        synchronized (TABLES) {
            for (Ball[] table : TABLES.tailMap(bits, true).values()) {
                if (table.length > k) {
                    return table[k].round(bits);
                }
            }
        }
        return k % 2 == 0 && k <= LARGEST_BERNOULLI_INDEX
                ? fromBernoulli(k, bits)
                : alternatingSums(k, k, terms(bits), bits + GUARD)[0].round(bits);
    }

    static Ball[] table(int max, int bits) {
        if (max < 0) {
            throw new DomainException("a zeta table up to " + max + " was asked for; the end must not be negative");
        }
        synchronized (TABLES) {
            for (Ball[] known : TABLES.tailMap(bits, true).values()) {
                if (known.length > max) {
                    return rounded(known, max, bits);
                }
            }
            // a little more than asked for: the next request is often for a few more bits
            int roomy = bits + bits / ROOM + GUARD;
            Ball[] fresh = freshTable(max, roomy);
            forgetSmaller(max, roomy);
            TABLES.put(roomy, fresh);
            return rounded(fresh, max, bits);
        }
    }

    private static Ball[] rounded(Ball[] table, int max, int bits) {
        Ball[] result = Arrays.copyOf(table, max + 1);
        Arrays.setAll(result, k -> result[k].round(bits));
        return result;
    }

    private static void forgetSmaller(int max, int bits) {
        Iterator<Map.Entry<Integer, Ball[]>> known = TABLES.headMap(bits, true).entrySet().iterator();
        while (known.hasNext()) {
            if (known.next().getValue().length <= max + 1) {
                known.remove();
            }
        }
    }

    /** A table that owes nothing to those kept; each value keeps a few bits beyond the ones asked for. */
    static Ball[] freshTable(int max, int bits) {
        Ball[] table = new Ball[max + 1];
        Arrays.fill(table, Ball.ZERO);
        table[0] = Ball.ofDyadic(BigInteger.ONE.negate(), -1);
        int working = bits + GUARD;
        int lastBernoulli = Math.min(max, LARGEST_BERNOULLI_INDEX);
        Ball square = Constants.pi(working).power(2, working).shift(2);
        Ball factor = Ball.ONE.shift(-1); // (2 pi)^k/(2 k!)
        for (int k = 2; k <= lastBernoulli; k += 2) {
            factor = factor.multiply(square, working).divide(Rational.of((long) k * (k - 1)), working);
            table[k] = factor.multiply(Bernoulli.number(k).abs(), bits + 4);
        }
        fill(table, alternatingSums(3, max, terms(bits), working), 3);
        int even = LARGEST_BERNOULLI_INDEX + 2;
        fill(table, alternatingSums(even, max, terms(bits), working), even);
        return table;
    }

    private static void fill(Ball[] table, Ball[] values, int first) {
        for (int i = 0; i < values.length; i++) {
            table[first + 2 * i] = values[i];
        }
    }

    /** zeta(k) = |B_k| (2 pi)^k/(2 k!) for even k (Euler). */
    private static Ball fromBernoulli(int k, int bits) {
        int working = bits + GUARD;
        BigInteger factorial = BigInteger.ONE;
        for (int i = 2; i <= k; i++) {
            factorial = factorial.multiply(BigInteger.valueOf(i));
        }
        Ball power = Constants.pi(working).shift(1).power(k, working);
        return power.multiply(Bernoulli.number(k).abs(), working)
                .divide(Ball.of(factorial.shiftLeft(1)), working)
                .round(bits);
    }

    /**
     * zeta(first), zeta(first + 2), ..., up to {@code last}, from n terms; empty if first > last.
     *
     * <p>P. Borwein, "An efficient algorithm for the Riemann zeta function" (2000), algorithm 2: with
     * d_k = sum_{i<=k} t_i, t_i = n (n+i-1)! 4^i/((n-i)! (2i)!), and eta(s) = (1 - 2^(1-s)) zeta(s),
     * eta(s) = (1/d_n) sum_{k<n} (-1)^k (d_n - d_k)/(k+1)^s + remainder.
     *
     * <p>Error. The remainder is int_0^1 T_n(1-2x) |ln x|^(s-1)/(1+x) dx/(d_n Gamma(s)), at most eta(s)/d_n < 1/d_n as
     * |T_n| <= 1; d_n = T_n(3) > (3 + sqrt 8)^n/2 > 2^(5n/2 - 1), from (3 + sqrt 8)^2 > 2^5. The integers
     * d_n - d_k are exact, times 2^spare; floor(floor(a/b)/c) = floor(a/(bc)), so each term is less than one unit low.
     * Sum of both: n + 2^spare units of 1/(d_n 2^spare).
     */
    static Ball[] alternatingSums(int first, int last, int n, int working) {
        if (first > last) {
            return new Ball[0];
        }
        int spare = 32 - Integer.numberOfLeadingZeros(n);
        BigInteger[] weights = suffixSums(n);
        BigInteger[] sums = powerSums(weights, spare, first, (last - first) / 2 + 1);
        Ball scale = Ball.of(weights[0].shiftLeft(spare));
        Magnitude error = Magnitude.of(n).add(Magnitude.powerOfTwo(spare));
        Ball[] result = new Ball[sums.length];
        for (int i = 0; i < sums.length; i++) {
            Ball eta = Ball.of(sums[i]).addError(error).divide(scale, working);
            result[i] = fromEta(eta, first + 2 * i, working);
        }
        return result;
    }

    /** sum_k (-1)^k floor(weights_(k+1) 2^spare/(k+1)^(first + 2i)) for i = 0 .. count-1. */
    private static BigInteger[] powerSums(BigInteger[] weights, int spare, int first, int count) {
        int n = weights.length - 1;
        DivisionSweep sweep = new DivisionSweep(count, weights[0].bitLength() + spare + 1);
        BigInteger[] sums = new BigInteger[count];
        Arrays.fill(sums, BigInteger.ZERO);
        for (int k = 0; k < n; k++) {
            BigInteger base = BigInteger.valueOf(k + 1L);
            BigInteger weight = weights[k + 1].shiftLeft(spare);
            // the first power may be far longer than the weight: then every term is below one unit
            BigInteger term = (double) first * (base.bitLength() - 1) > weight.bitLength()
                    ? BigInteger.ZERO
                    : weight.divide(base.pow(first));
            long divisor = (k + 1L) * (k + 1L);
            if (divisor < DivisionSweep.DIVISOR_LIMIT) {
                sweep.add(term, (int) divisor);
            } else {
                for (int i = 0; i < count && term.signum() > 0; i++) {
                    sums[i] = k % 2 == 0 ? sums[i].add(term) : sums[i].subtract(term);
                    term = term.divide(BigInteger.valueOf(divisor));
                }
            }
        }
        BigInteger[] swept = sweep.results();
        Arrays.setAll(sums, i -> sums[i].add(swept[i]));
        return sums;
    }

    /** So many that 1/d_n < 2^(1 - 5n/2) is below 2^-(bits + GUARD). */
    private static int terms(int bits) {
        return 2 * (bits + GUARD) / 5 + 2;
    }

    /** Entry i is t_i + ... + t_n, which is d_n - d_(i-1); from t_(i+1)/t_i = 4 (n+i)(n-i)/((2i+1)(2i+2)), t_0 = 1. */
    private static BigInteger[] suffixSums(int n) {
        BigInteger[] sums = new BigInteger[n + 1];
        BigInteger term = BigInteger.ONE;
        for (int i = 0; i <= n; i++) {
            sums[i] = term;
            term = term.multiply(BigInteger.valueOf(4L * (n + i) * (n - i)))
                    .divide(BigInteger.valueOf((2L * i + 1) * (2L * i + 2)));
        }
        for (int i = n - 1; i >= 0; i--) {
            sums[i] = sums[i].add(sums[i + 1]);
        }
        return sums;
    }

    /** zeta = eta/(1 - 2^(1-s)); for large s the factor is one up to 2^(2-s), as 1/(1-x) - 1 <= 2x for x <= 1/2. */
    private static Ball fromEta(Ball eta, int s, int bits) {
        if (s > bits + 4) {
            return eta.multiply(Ball.ONE.addError(Magnitude.powerOfTwo(2L - s)), bits);
        }
        BigInteger power = BigInteger.ONE.shiftLeft(s - 1);
        return eta.shift(s - 1).divide(Ball.of(power.subtract(BigInteger.ONE)), bits);
    }
}
