package bubblechain.exact;

import java.math.BigInteger;
import java.util.ArrayList;
import java.util.List;

/** Bernoulli numbers B_0 = 1, B_1 = -1/2, B_2 = 1/6, ... as exact rationals. */
public final class Bernoulli {
    /** Even-index numbers B_0, B_2, B_4, ... found so far. */
    private static final List<Rational> EVEN = new ArrayList<>(List.of(Rational.ONE));

    private Bernoulli() {}

    /**
     * B_n.
     *
     * @param n at least 0
     * @implNote from the tangent numbers, O(n^2) operations on integers for all numbers up to n; kept
     */
    public static synchronized Rational number(int n) {
        if (n < 0) {
            throw new DomainException("Bernoulli numbers B_n begin at n = 0, got n = " + n);
        }
        if (n == 1) {
            return Rational.of(-1, 2);
        }
        if (n % 2 == 1) {
            return Rational.ZERO;
        }
        if (n / 2 >= EVEN.size()) {
            extend(Math.max(n / 2, 2 * EVEN.size()));
        }
        return EVEN.get(n / 2);
    }

    /** Brent and Harvey, arXiv:1108.0286, algorithm for tangent numbers T_k; B_2k = (-1)^(k-1) 2k T_k/(4^k (4^k - 1)). */
    private static void extend(int count) {
        BigInteger[] tangent = new BigInteger[count + 1];
        tangent[1] = BigInteger.ONE;
        for (int k = 2; k <= count; k++) {
            tangent[k] = tangent[k - 1].multiply(BigInteger.valueOf(k - 1));
        }
        for (int k = 2; k <= count; k++) {
            for (int j = k; j <= count; j++) {
                tangent[j] = tangent[j - 1]
                        .multiply(BigInteger.valueOf(j - k))
                        .add(tangent[j].multiply(BigInteger.valueOf(j - k + 2)));
            }
        }
        for (int k = EVEN.size(); k <= count; k++) {
            BigInteger four = BigInteger.ONE.shiftLeft(2 * k);
            Rational magnitude = Rational.of(
                    tangent[k].multiply(BigInteger.valueOf(2L * k)), four.multiply(four.subtract(BigInteger.ONE)));
            EVEN.add(k % 2 == 1 ? magnitude : magnitude.negate());
        }
    }
}
