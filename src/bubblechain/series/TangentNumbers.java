package bubblechain.series;

/**
 * The tangent numbers T_1 = 1, T_2 = 2, T_3 = 16, ... exactly, as words of 48 bits, the lowest first.
 *
 * <p>Brent and Harvey, arXiv:1108.0286, algorithm TangentNumbers: additions and products with small integers only.
 */
final class TangentNumbers {
    private static final int BITS = 48;
    private static final long MASK = (1L << BITS) - 1;
    /** A sum of two products with integers up to 2 count must fit a long. */
    static final int LARGEST_COUNT = 1 << 12;

    private final long[][] words;
    private final int[] lengths;

    private TangentNumbers(int count) {
        this.words = new long[count + 1][];
        this.lengths = new int[count + 1];
        double bits = 0;
        for (int k = 1; k <= count; k++) {
            // T_k < (2k)!
            bits += Math.log(2.0 * k * (2 * k - 1)) / Math.log(2);
            words[k] = new long[(int) (bits / BITS) + 3];
        }
    }

    /** T_1 .. T_count. */
    static TangentNumbers upTo(int count) {
        TangentNumbers numbers = new TangentNumbers(count);
        numbers.fill(count);
        return numbers;
    }

    private void fill(int count) {
        words[1][0] = 1;
        lengths[1] = 1;
        for (int k = 2; k <= count; k++) {
            lengths[k] = combine(words[k], words[k - 1], lengths[k - 1], k - 1, 0);
        }
        for (int k = 2; k <= count; k++) {
            lengths[k] = combine(words[k], words[k], lengths[k], 2, 0);
            for (int j = k + 1; j <= count; j++) {
                int length = Math.max(lengths[j - 1], lengths[j]);
                lengths[j] = combine(words[j], words[j - 1], length, j - k, j - k + 2);
            }
        }
    }

    /** target = a before + b target; the new length. */
    private static int combine(long[] target, long[] before, int length, long a, long b) {
        int common = Math.min(length, before.length);
        long carry = 0;
        for (int i = 0; i < common; i++) {
            long t = a * before[i] + b * target[i] + carry;
            target[i] = t & MASK;
            carry = t >>> BITS;
        }
        for (int i = common; i < length; i++) {
            long t = b * target[i] + carry;
            target[i] = t & MASK;
            carry = t >>> BITS;
        }
        if (carry == 0) {
            return length;
        }
        target[length] = carry;
        return length + 1;
    }

    /** The k with 2^(k-1) <= T_n < 2^k. */
    int bitLength(int n) {
        int top = lengths[n] - 1;
        return top * BITS + Long.SIZE - Long.numberOfLeadingZeros(words[n][top]);
    }

    /** T_n 2^(1 - bitLength), between 1 and 2, cut off: less than one unit low. */
    long[] mantissa(int n, int limbs) {
        long[] digits = new long[limbs + 1];
        digits[0] = 1;
        int at = bitLength(n) - 1;
        for (int k = 1; k <= limbs && at > 0; k++) {
            at -= FixedDigits.BITS;
            digits[k] = window(words[n], at);
        }
        FixedDigits.normalise(digits);
        return digits;
    }

    /** 56 bits from a position on, which may lie below the lowest bit. */
    private static long window(long[] words, int at) {
        int word = Math.floorDiv(at, BITS);
        int shift = at - word * BITS;
        long value = word(words, word) >>> shift;
        value |= word(words, word + 1) << (BITS - shift);
        if (shift > 2 * BITS - FixedDigits.BITS) {
            value |= word(words, word + 2) << (2 * BITS - shift);
        }
        return value & FixedDigits.MASK;
    }

    private static long word(long[] words, int index) {
        return index >= 0 && index < words.length ? words[index] : 0;
    }
}
