package bubblechain.series;

/** Digits as words of 28 bits and back, and shifts by any number of bits. */
final class DigitWords {
    private static final int BITS = FixedDigits.BITS;
    private static final long MASK = FixedDigits.MASK;
    private static final int WORD = 28;
    private static final long WORD_MASK = (1L << WORD) - 1;

    private DigitWords() {}

    /** number times 1 + sign 2^-shift in place; off by less than one unit in the last place. */
    static void addShifted(long[] digits, int shift, int sign) {
        int whole = shift / BITS;
        int part = shift - whole * BITS;
        // from the lowest digit up: what is read has not been changed yet
        for (int k = digits.length - 1; k >= whole; k--) {
            long above = k > whole && part > 0 ? digits[k - whole - 1] << (BITS - part) & MASK : 0;
            digits[k] += sign * ((digits[k - whole] >> part) + above);
        }
        FixedDigits.normalise(digits);
    }

    /** A number that is not negative as twice as many words of 28 bits, none of them negative. */
    static long[] toWords(long[] digits) {
        long[] words = new long[2 * digits.length];
        long carry = 0;
        for (int k = digits.length - 1; k >= 0; k--) {
            long d = digits[k] + carry;
            carry = d >> BITS;
            words[2 * k + 1] = d & WORD_MASK;
            words[2 * k] = d >> WORD & WORD_MASK;
        }
        return words;
    }

    /** The number given by words of 28 bits that need not be normalised. */
    static long[] ofWords(long[] words) {
        long[] digits = new long[words.length / 2];
        long carry = 0;
        for (int k = digits.length - 1; k >= 0; k--) {
            long low = words[2 * k + 1] + carry;
            long high = words[2 * k] + (low >> WORD);
            digits[k] = ((high & WORD_MASK) << WORD) + (low & WORD_MASK);
            carry = high >> WORD;
        }
        digits[0] += carry << BITS;
        FixedDigits.normalise(digits);
        return digits;
    }
}
