package bubblechain.chain;

import bubblechain.exact.PrecisionException;
import bubblechain.series.FixedSeries;

/**
 * What a list of coefficients will cost, estimated before it is computed: good to a factor of two or so, the time on a
 * processor of 2025.
 *
 * @param bytes   memory, the decimals and their text included
 * @param seconds time
 */
public record ChainCost(long bytes, double seconds) {
    private static final double BITS_PER_DIGIT = 3.33;
    /** Series alive at once. */
    private static final long SERIES = 10;

    private static final long OBJECT = 64;
    /** Numbers, decimals and two copies of the text. */
    private static final long BYTES_PER_DIGIT = 5;

    private static final long BASE = 60_000_000;

    /** Measured at 1000 loops to 1000 digits in a new virtual machine, and how time grows with the digits. */
    private static final double SECONDS_AT_THOUSAND = 0.7;

    private static final double DIGITS_EXPONENT = 1.5;
    private static final double START = 0.3;

    /** The cost of so many loops to so many digits. */
    public static ChainCost of(int loops, int digits) {
        long limbs = FixedSeries.limbsFor((int) (digits * BITS_PER_DIGIT) + 100);
        long series = SERIES * loops * (limbs * Long.BYTES + OBJECT);
        // the numbers of a transform: four arrays of a power of two of places for twice as many bits, 20 bits in each
        double places = Math.min(2.0 * loops, 0.4 * digits + 200) * 2 * limbs * 56 / 20;
        long transform = 4L * Long.BYTES * Long.highestOneBit((long) places);
        long text = BYTES_PER_DIGIT * loops * (digits + OBJECT);
        double thousand = 1_000;
        double seconds = START
                + SECONDS_AT_THOUSAND * (loops / thousand) * Math.pow(Math.max(digits, 100) / thousand, DIGITS_EXPONENT);
        return new ChainCost(BASE + series + transform + text, seconds);
    }

    /**
     * Refuses what does not fit.
     *
     * @throws PrecisionException if more than {@code available} bytes are needed, with the heap that would do
     */
    public void requireMemory(long available) {
        if (bytes > available) {
            long megabytes = bytes / 1_000_000;
            throw new PrecisionException("this needs about " + megabytes + " MB of memory, java may take "
                    + available / 1_000_000 + " MB; ask for fewer loops or digits, or start with java -Xmx"
                    + (megabytes / 900 + 1) + "g -jar ...");
        }
    }
}
