package bubblechain.series;

import java.math.BigInteger;
import java.util.Arrays;
import java.util.Random;

/** Seeded random fixed-point numbers; digits at the two ends of their range, zeros and long carries are frequent. */
final class RandomDigits {
    static final long EDGE = 1L << (FixedDigits.BITS - 1);

    private final Random random;

    RandomDigits(long seed) {
        random = new Random(seed);
    }

    Random random() {
        return random;
    }

    /** Balanced digits, the integer digit at most {@code largest} in size. */
    long[] any(int limbs, long largest) {
        long[] digits = new long[limbs + 1];
        int kind = random.nextInt(7);
        for (int k = 0; k <= limbs; k++) {
            digits[k] = digit(kind);
        }
        digits[0] = Math.max(-largest, Math.min(largest, digits[0]));
        if (random.nextInt(3) == 0) {
            Arrays.fill(digits, 0, random.nextInt(limbs + 1), 0);
        }
        return digits;
    }

    private long digit(int kind) {
        return switch (kind) {
            case 0 -> EDGE;
            case 1 -> -EDGE;
            case 2 -> -1;
            case 5 -> 1;
            case 3 -> random.nextBoolean() ? EDGE : -EDGE;
            case 4 -> random.nextInt(4) == 0 ? random.nextLong() >> (Long.SIZE - FixedDigits.BITS) : 0;
            default -> random.nextLong() >> (Long.SIZE - FixedDigits.BITS);
        };
    }

    /** sum d[k] 2^(56 (limbs - k)), straight from the definition. */
    static BigInteger value(long[] digits) {
        BigInteger sum = BigInteger.ZERO;
        for (long digit : digits) {
            sum = sum.shiftLeft(FixedDigits.BITS).add(BigInteger.valueOf(digit));
        }
        return sum;
    }
}
