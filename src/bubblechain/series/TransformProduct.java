package bubblechain.series;

import java.math.BigInteger;
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
            BigInteger value = FixedDigits.toInteger(numbers.get(k));
            if (value.signum() != 0) {
                cut(value, packed, k * shape.places(), shape.chunkBits());
            }
        }
        return packed;
    }

    /** Balanced chunks from the lowest on, as residues. */
    private static void cut(BigInteger value, long[] packed, int at, int chunkBits) {
        byte[] bytes = value.toByteArray();
        long half = 1L << (chunkBits - 1);
        long mask = (1L << chunkBits) - 1;
        long window = 0;
        int held = 0;
        int next = bytes.length - 1;
        long sign = value.signum() < 0 ? 0xff : 0;
        long carry = 0;
        int total = value.bitLength() / chunkBits + 2;
        for (int j = 0; j < total; j++) {
            while (held < chunkBits) {
                window |= (next >= 0 ? bytes[next] & 0xffL : sign) << held;
                next--;
                held += Byte.SIZE;
            }
            long chunk = (window & mask) + carry;
            window >>>= chunkBits;
            held -= chunkBits;
            carry = chunk >= half ? 1 : 0;
            chunk -= carry << chunkBits;
            packed[at + j] = chunk < 0 ? chunk + NumberTheoreticTransform.MODULUS : chunk;
        }
    }

    /** sum_j c_j 2^(j chunkBits) 2^(-56 limbs), as digits. */
    private static long[] unpack(long[] packed, int at, int limbs, Shape shape) {
        int places = shape.places();
        int chunkBits = shape.chunkBits();
        byte[] bytes = new byte[(places * chunkBits + 2 * Long.SIZE) / Byte.SIZE];
        long mask = (1L << chunkBits) - 1;
        long carry = 0;
        long window = 0;
        int held = 0;
        int next = bytes.length - 1;
        for (int j = 0; j < places; j++) {
            long c = packed[at + j];
            long t = (c > NumberTheoreticTransform.MODULUS / 2 ? c - NumberTheoreticTransform.MODULUS : c) + carry;
            carry = t >> chunkBits;
            window |= (t & mask) << held;
            held += chunkBits;
            while (held >= Byte.SIZE) {
                bytes[next--] = (byte) window;
                window >>>= Byte.SIZE;
                held -= Byte.SIZE;
            }
        }
        // the rest of the last byte and the sign come from the carry
        window |= carry << held;
        long rest = carry >> (Long.SIZE - 1);
        bytes[next--] = (byte) window;
        long above = held == 0 ? carry >> Byte.SIZE : carry >> (Byte.SIZE - held);
        while (next >= 0) {
            bytes[next--] = (byte) above;
            above = above >> Byte.SIZE | rest << (Long.SIZE - Byte.SIZE);
        }
        return FixedDigits.of(new BigInteger(bytes).shiftRight(limbs * FixedDigits.BITS), limbs);
    }
}
