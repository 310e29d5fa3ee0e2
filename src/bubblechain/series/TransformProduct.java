package bubblechain.series;

import java.util.List;

/**
 * Products of series with fixed-point coefficients by one integer convolution: every coefficient is cut into chunks of a
 * few bits, a coefficient of the product takes twice as many places, and the convolution of the chunks is exact.
 */
final class TransformProduct {
    /** A sum of products of chunks must stay below half the modulus, 2^59.7. */
    private static final int SUM_BITS = 59;

    private static final int LARGEST_LOG2_LENGTH = 26;
    private static final int SMALLEST_CHUNK = 4;
    private static final int LARGEST_CHUNK = 26;

    private static final int WORD = 28;
    private static final long WORD_MASK = (1L << WORD) - 1;

    private TransformProduct() {}

    /**
     * How two lists of numbers are cut up.
     *
     * @param period     the convolution is cyclic with this many coefficients
     * @param chunkBits  bits of a chunk
     * @param places     chunks of a coefficient of the product
     * @param log2Length length of the transform
     */
    record Shape(int period, int chunkBits, int places, int log2Length) {
        /**
         * @param terms     the smaller number of terms
         * @param leftBits  largest length of a left number, sign not counted
         * @param rightBits the same on the right
         */
        static Shape of(int terms, int period, int leftBits, int rightBits) {
            int chunkBits = SMALLEST_CHUNK;
            for (int candidate = SMALLEST_CHUNK + 1; candidate <= LARGEST_CHUNK; candidate++) {
                long products = (long) terms * chunks(Math.min(leftBits, rightBits), candidate);
                if (2 * (candidate - 1) + (Long.SIZE - Long.numberOfLeadingZeros(products)) <= SUM_BITS) {
                    chunkBits = candidate;
                }
            }
            int places = chunks(leftBits, chunkBits) + chunks(rightBits, chunkBits);
            long length = Math.max(2, (long) places * period);
            return new Shape(period, chunkBits, places, Long.SIZE - Long.numberOfLeadingZeros(length - 1));
        }

        private static int chunks(int bits, int chunkBits) {
            return bits / chunkBits + 2;
        }

        boolean isPossible() {
            return log2Length <= LARGEST_LOG2_LENGTH;
        }

        /** Nanoseconds, roughly: three transforms, and packing. */
        double cost() {
            return Math.scalb(1.0, log2Length) * (log2Length * 7.0 + 20);
        }
    }

    /**
     * Entries from .. to-1 of the cyclic convolution of two lists of fixed-point numbers, digits below the last place
     * dropped: floor(sum_k left_k right_(n-k)).
     */
    static long[][] multiply(
            List<long[]> left, List<long[]> right, int from, int to, int limbs, Shape shape) {
        NumberTheoreticTransform transform = new NumberTheoreticTransform(shape.log2Length());
        long[] a = pack(left, shape);
        transform.convolve(a, pack(right, shape));
        long[][] product = new long[to - from][];
        for (int n = from; n < to; n++) {
            product[n - from] = unpack(a, n * shape.places(), limbs, shape);
        }
        return product;
    }

    private static long[] pack(List<long[]> numbers, Shape shape) {
        long[] packed = new long[1 << shape.log2Length()];
        for (int k = 0; k < numbers.size(); k++) {
            cut(numbers.get(k), packed, k * shape.places(), shape.chunkBits());
        }
        return packed;
    }

    /** Balanced chunks from the lowest on, as residues. */
    private static void cut(long[] digits, long[] packed, int at, int chunkBits) {
        long half = 1L << (chunkBits - 1);
        long mask = (1L << chunkBits) - 1;
        int zeros = FixedDigits.leadingZeros(digits);
        int place = at;
        long carry = 0;
        long window = 0;
        int held = 0;
        for (int i = 2 * digits.length - 1; i >= 2 * zeros; i--) {
            // words of 28 bits that are not negative; the sign goes on into the next one
            long digit = digits[i / 2];
            long word = (i % 2 == 1 ? digit & WORD_MASK : digit >> WORD) + carry;
            carry = word >> WORD;
            window += (word & WORD_MASK) << held;
            for (held += WORD; held >= chunkBits; held -= chunkBits) {
                long chunk = ((window + half) & mask) - half;
                window = (window - chunk) >> chunkBits;
                packed[place++] = chunk < 0 ? chunk + NumberTheoreticTransform.MODULUS : chunk;
            }
        }
        for (window += carry << held; window != 0; place++) {
            long chunk = ((window + half) & mask) - half;
            window = (window - chunk) >> chunkBits;
            packed[place] = chunk < 0 ? chunk + NumberTheoreticTransform.MODULUS : chunk;
        }
    }

    /** sum_j c_j 2^(j chunkBits) 2^(-2 56 limbs), cut off to digits. */
    private static long[] unpack(long[] packed, int at, int limbs, Shape shape) {
        int chunkBits = shape.chunkBits();
        long mask = (1L << chunkBits) - 1;
        long[] digits = new long[limbs + 1];
        long carry = 0;
        long window = 0;
        int held = 0;
        // number of the next word of 28 bits from the last place of the result; those below it are dropped
        int next = -2 * limbs;
        long ones = WORD_MASK;
        long some = 0;
        for (int j = 0; j < shape.places(); j++) {
            long c = packed[at + j];
            long t = (c > NumberTheoreticTransform.MODULUS / 2 ? c - NumberTheoreticTransform.MODULUS : c) + carry;
            carry = t >> chunkBits;
            window += (t & mask) << held;
            held += chunkBits;
            if (held >= WORD) {
                long word = window & WORD_MASK;
                if (next >= 2 * digits.length) {
                    ones &= word;
                    some |= word;
                } else if (next >= 0) {
                    digits[limbs - next / 2] += word << WORD * (next & 1);
                }
                next++;
                window >>>= WORD;
                held -= WORD;
            }
        }
        // the sign is all that is left above
        for (window += carry << held; next < 2 * digits.length; window >>= WORD, next++) {
            digits[limbs - next / 2] += (window & WORD_MASK) << WORD * (next & 1);
        }
        digits[0] += window << FixedDigits.BITS;
        if (!(window == 0 && some == 0 || window == -1 && ones == WORD_MASK)) {
            throw new ArithmeticException("a fixed-point number is out of range");
        }
        FixedDigits.normalise(digits);
        return digits;
    }
}
