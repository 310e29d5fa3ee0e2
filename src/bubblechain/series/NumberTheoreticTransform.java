package bubblechain.series;

import java.math.BigInteger;

/**
 * The discrete Fourier transform over the integers modulo p = 27 2^56 + 1, for lengths that are powers of two: exact
 * convolutions of integer sequences whose results stay below p/2 in size.
 *
 * <p>Twiddle factors are multiplied with a precomputed quotient, w' = floor(w 2^63/p), so that a product costs two high
 * words and no division (V. Shoup's method).
 */
final class NumberTheoreticTransform {
    /** 27 2^56 + 1, a prime below 2^61. */
    static final long MODULUS = (27L << 56) + 1;

    /** A generator of the multiplicative group. */
    private static final BigInteger GENERATOR = BigInteger.valueOf(5);

    private static final BigInteger P = BigInteger.valueOf(MODULUS);

    private static final double INVERSE = 1.0 / MODULUS;

    /** -1/p modulo 2^64, for Montgomery's reduction. */
    private static final long NEGATIVE_INVERSE =
            P.negate().modInverse(BigInteger.ONE.shiftLeft(Long.SIZE)).longValue();

    private final int length;
    private final long[] roots;
    private final long[] quotients;

    /** @param log2Length between 1 and 30 */
    NumberTheoreticTransform(int log2Length) {
        this.length = 1 << log2Length;
        BigInteger root = GENERATOR.modPow(P.subtract(BigInteger.ONE).shiftRight(log2Length), P);
        this.roots = powers(root.longValueExact(), length / 2);
        this.quotients = new long[roots.length];
        for (int k = 0; k < roots.length; k++) {
            quotients[k] = quotient(roots[k]);
        }
    }

    private static long[] powers(long root, int count) {
        long[] powers = new long[Math.max(count, 1)];
        long quotient = quotient(root);
        powers[0] = 1;
        for (int k = 1; k < count; k++) {
            powers[k] = reduce(multiply(powers[k - 1], root, quotient));
        }
        return powers;
    }

    /** floor(w 2^63/p) for 0 &lt;= w &lt; p, in two steps of long division whose quotients a double finds to within one. */
    private static long quotient(long w) {
        long upper = (long) (w * 0x1p31 * INVERSE);
        long remainder = (w << 31) - upper * MODULUS;
        while (remainder < 0) {
            remainder += MODULUS;
            upper--;
        }
        while (remainder >= MODULUS) {
            remainder -= MODULUS;
            upper++;
        }
        long lower = (long) (remainder * 0x1p32 * INVERSE);
        remainder = (remainder << 32) - lower * MODULUS;
        while (remainder < 0) {
            remainder += MODULUS;
            lower--;
        }
        while (remainder >= MODULUS) {
            remainder -= MODULUS;
            lower++;
        }
        return (upper << 32) + lower;
    }

    /** x w modulo p in [0, 3p) for 0 &lt;= x &lt; 2^62. */
    private static long multiply(long x, long w, long quotient) {
        long q = Math.multiplyHigh(quotient, x << 1);
        return x * w - q * MODULUS;
    }

    private static long reduce(long x) {
        long y = x >= 2 * MODULUS ? x - 2 * MODULUS : x;
        return y >= MODULUS ? y - MODULUS : y;
    }

    /** In place, natural order in, bit-reversed order out; values in [0, p). */
    private void forward(long[] values) {
        for (int half = length / 2, step = 1; half >= 1; half /= 2, step *= 2) {
            for (int start = 0; start < length; start += 2 * half) {
                for (int k = 0, r = 0; k < half; k++, r += step) {
                    long a = values[start + k];
                    long b = values[start + k + half];
                    long sum = a + b;
                    values[start + k] = sum >= MODULUS ? sum - MODULUS : sum;
                    values[start + k + half] = reduce(multiply(a - b + MODULUS, roots[r], quotients[r]));
                }
            }
        }
    }

    /** In place, bit-reversed order in, natural order out, times factor/length; values in [0, p). */
    private void inverse(long[] values, BigInteger factor) {
        for (int half = 1, step = length / 2; half < length; half *= 2, step /= 2) {
            for (int start = 0; start < length; start += 2 * half) {
                butterfly(values, start, start + half, 1, 0);
                for (int k = 1; k < half; k++) {
                    // w^-k = -w^(length/2 - k), and the quotient of p - w is that of w from 2^63 - 1
                    int r = length / 2 - k * step;
                    butterfly(values, start + k, start + k + half, MODULUS - roots[r], Long.MAX_VALUE - quotients[r]);
                }
            }
        }
        long scale = factor.multiply(BigInteger.valueOf(length).modInverse(P)).mod(P).longValueExact();
        long quotient = quotient(scale);
        for (int k = 0; k < length; k++) {
            values[k] = reduce(multiply(values[k], scale, quotient));
        }
    }

    private static void butterfly(long[] values, int i, int j, long w, long quotient) {
        long a = values[i];
        long b = quotient == 0 ? values[j] : reduce(multiply(values[j], w, quotient));
        long sum = a + b;
        long difference = a - b;
        values[i] = sum >= MODULUS ? sum - MODULUS : sum;
        values[j] = difference < 0 ? difference + MODULUS : difference;
    }

    /** The cyclic convolution of two sequences of residues, into the first; the second is overwritten. */
    void convolve(long[] left, long[] right) {
        forward(left);
        forward(right);
        for (int k = 0; k < length; k++) {
            left[k] = montgomery(left[k], right[k]);
        }
        inverse(left, BigInteger.ONE.shiftLeft(Long.SIZE));
    }

    /** a b 2^-64 modulo p, in [0, p). */
    private static long montgomery(long a, long b) {
        long low = a * b;
        long m = low * NEGATIVE_INVERSE;
        long highOfM = Math.multiplyHigh(m, MODULUS) + ((m >> (Long.SIZE - 1)) & MODULUS);
        long sum = Math.multiplyHigh(a, b) + highOfM + (low == 0 ? 0 : 1);
        return sum >= MODULUS ? sum - MODULUS : sum;
    }
}
