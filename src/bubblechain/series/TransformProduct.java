package bubblechain.series;

import java.math.BigInteger;

/**
 * Products of series with fixed-point coefficients by one integer convolution: every coefficient is cut into chunks of a
 * few bits, a coefficient of the product takes twice as many places, and the convolution of the chunks is exact.
 */
final class TransformProduct {
    /** A sum of products of chunks must stay below half the modulus, 2^59.7. */
    private static final int SUM_BITS = 59;

    private static final int LARGEST_LOG2_LENGTH = 26;

    private TransformProduct() {}

    /** How two series are cut up. */
    record Shape(int terms, int chunkBits, int chunks, int log2Length) {
        /** The shape for so many terms of so many limbs; a log2Length above the limit if it is too large. */
        static Shape of(int terms, int limbs) {
            int bits = (limbs + 1) * FixedDigits.BITS;
            int chunkBits = 4;
            for (int candidate = 5; candidate <= 26; candidate++) {
                long products = (long) terms * (bits / candidate + 2);
                if (2 * (candidate - 1) + (Long.SIZE - Long.numberOfLeadingZeros(products)) <= SUM_BITS) {
                    chunkBits = candidate;
                }
            }
            int chunks = bits / chunkBits + 2;
            long places = 2L * chunks * 2 * terms;
            return new Shape(terms, chunkBits, chunks, Long.SIZE - Long.numberOfLeadingZeros(places - 1));
        }

        boolean isPossible() {
            return log2Length <= LARGEST_LOG2_LENGTH;
        }

        /** Nanoseconds, roughly: three transforms, and packing. */
        double cost() {
            double length = Math.scalb(1.0, log2Length);
            return length * (log2Length * 7.0 + 20);
        }

        private int places() {
            return 2 * chunks;
        }
    }

    /**
     * The first coefficients of a product, digits below the last place dropped: entry n is floor(sum_k a_k b_(n-k)).
     */
    static long[][] multiply(long[][] left, long[][] right, int limbs, Shape shape) {
        NumberTheoreticTransform transform = new NumberTheoreticTransform(shape.log2Length());
        long[] a = pack(left, shape);
        transform.convolve(a, pack(right, shape));
        long[][] product = new long[shape.terms()][];
        for (int n = 0; n < product.length; n++) {
            product[n] = unpack(a, n * shape.places(), limbs, shape);
        }
        return product;
    }

    private static long[] pack(long[][] series, Shape shape) {
        long[] packed = new long[1 << shape.log2Length()];
        for (int k = 0; k < shape.terms(); k++) {
            BigInteger value = FixedDigits.toInteger(series[k]);
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
