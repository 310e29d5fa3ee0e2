package bubblechain.exact;

import java.math.BigInteger;

/**
 * Alternating sums of repeated divisions, s_i = sum_k (-1)^k floor(t_k/d_k^i): all sums of one k at once, and four k side
 * by side, so that the divisions of one do not wait for those of another.
 *
 * <p>Numbers are words of 28 bits, the highest first. floor(floor(t/d)/d) = floor(t/d^2), so each sum is off by less than
 * one unit for each k from the sum of the exact quotients.
 */
public final class DivisionSweep {
    /** Divisors must stay below this. */
    public static final int DIVISOR_LIMIT = 1 << 27;

    /** Bits of a word. */
    public static final int BITS = 28;

    private static final int LANES = 4;
    private static final long MASK = (1L << BITS) - 1;

    private final int words;
    private final long[][] sums;
    private final long[][] terms = new long[LANES][];
    private final long[] divisors = new long[LANES];
    private int waiting;

    /**
     * @param count number of sums
     * @param bits  largest length of a term
     */
    DivisionSweep(int count, int bits) {
        this(new long[count][bits / BITS + 1]);
    }

    private DivisionSweep(long[][] sums) {
        this.words = sums[0].length;
        this.sums = sums;
    }

    /**
     * A sweep over terms that are given as words.
     *
     * @param count number of sums, at least 1
     * @param words words of a term
     */
    public static DivisionSweep ofWords(int count, int words) {
        return new DivisionSweep(new long[count][words]);
    }

    /** Adds the quotients of one more term; they alternate in sign from one call to the next, the first is positive. */
    void add(BigInteger term, int divisor) {
        add(wordsOf(term), divisor);
    }

    /** The same for a term in words, the highest first, which the caller gives away. */
    public void add(long[] term, int divisor) {
        terms[waiting] = term;
        divisors[waiting] = divisor;
        if (++waiting == LANES) {
            run();
        }
    }

    private void run() {
        for (; waiting < LANES; waiting++) {
            terms[waiting] = new long[words];
            divisors[waiting] = 1;
        }
        waiting = 0;
        int from = 0;
        for (long[] sum : sums) {
            while (from < words && (terms[0][from] | terms[1][from] | terms[2][from] | terms[3][from]) == 0) {
                from++;
            }
            if (from == words) {
                return;
            }
            step(sum, from);
        }
    }

    /** Adds the terms to a sum and divides them. */
    private void step(long[] sum, int from) {
        long[] a = terms[0];
        long[] b = terms[1];
        long[] c = terms[2];
        long[] d = terms[3];
        double inverseA = 1.0 / divisors[0];
        double inverseB = 1.0 / divisors[1];
        double inverseC = 1.0 / divisors[2];
        double inverseD = 1.0 / divisors[3];
        long restA = 0;
        long restB = 0;
        long restC = 0;
        long restD = 0;
        for (int w = from; w < words; w++) {
            sum[w] += a[w] - b[w] + c[w] - d[w];
            long x = (restA << BITS) + a[w];
            long q = (long) (x * inverseA);
            long r = x - q * divisors[0];
            long fix = (r >> 63) - ((divisors[0] - 1 - r) >> 63);
            a[w] = q + fix;
            restA = r - fix * divisors[0];
            x = (restB << BITS) + b[w];
            q = (long) (x * inverseB);
            r = x - q * divisors[1];
            fix = (r >> 63) - ((divisors[1] - 1 - r) >> 63);
            b[w] = q + fix;
            restB = r - fix * divisors[1];
            x = (restC << BITS) + c[w];
            q = (long) (x * inverseC);
            r = x - q * divisors[2];
            fix = (r >> 63) - ((divisors[2] - 1 - r) >> 63);
            c[w] = q + fix;
            restC = r - fix * divisors[2];
            x = (restD << BITS) + d[w];
            q = (long) (x * inverseD);
            r = x - q * divisors[3];
            fix = (r >> 63) - ((divisors[3] - 1 - r) >> 63);
            d[w] = q + fix;
            restD = r - fix * divisors[3];
        }
    }

    private long[] wordsOf(BigInteger term) {
        long[] result = new long[words];
        byte[] bytes = term.toByteArray();
        for (int k = 0; k < bytes.length; k++) {
            int bit = (bytes.length - 1 - k) * Byte.SIZE;
            long value = (bytes[k] & 0xffL) << (bit % BITS);
            int word = words - 1 - bit / BITS;
            if (value != 0) {
                result[word] |= value & MASK;
                if (value > MASK) {
                    result[word - 1] |= value >> BITS;
                }
            }
        }
        return result;
    }

    /** The sums in words, which are not normalised: they have a sign and may be longer than {@link #BITS}. */
    public long[][] sums() {
        if (waiting > 0) {
            run();
        }
        return sums;
    }

    /** The sums. */
    BigInteger[] results() {
        sums();
        BigInteger[] results = new BigInteger[sums.length];
        for (int i = 0; i < results.length; i++) {
            results[i] = integer(sums[i]);
        }
        return results;
    }

    private static BigInteger integer(long[] words) {
        byte[] bytes = new byte[words.length * BITS / Byte.SIZE + 2 * Long.BYTES];
        int index = bytes.length;
        long carry = 0;
        long window = 0;
        int held = 0;
        for (int w = words.length - 1; w >= 0; w--) {
            long t = words[w] + carry;
            carry = t >> BITS;
            window |= (t & MASK) << held;
            held += BITS;
            while (held >= Byte.SIZE) {
                bytes[--index] = (byte) window;
                window >>>= Byte.SIZE;
                held -= Byte.SIZE;
            }
        }
        // the carry goes on from the bits still held
        long top = (carry << held) | window;
        while (index > 0) {
            bytes[--index] = (byte) top;
            top >>= Byte.SIZE;
        }
        return new BigInteger(bytes);
    }
}
