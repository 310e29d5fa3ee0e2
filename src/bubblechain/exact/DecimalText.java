package bubblechain.exact;

/** Decimal digits and an exponent as text, in the notation described at {@link Ball#toDecimal}. */
public final class DecimalText {
    private static final int SMALLEST_PLAIN_EXPONENT = -6;

    private DecimalText() {}

    /**
     * @param digits   significant digits, the first not zero
     * @param exponent decimal exponent of the first digit
     */
    public static String of(boolean negative, String digits, long exponent) {
        String sign = negative ? "-" : "";
        int length = digits.length();
        if (exponent < SMALLEST_PLAIN_EXPONENT || exponent >= length) {
            String fraction = length == 1 ? "" : "." + digits.substring(1);
            return sign + digits.charAt(0) + fraction + "e" + (exponent < 0 ? "" : "+") + exponent;
        }
        int whole = (int) exponent + 1;
        if (whole <= 0) {
            return sign + "0." + "0".repeat(-whole) + digits;
        }
        return whole == length ? sign + digits : sign + digits.substring(0, whole) + "." + digits.substring(whole);
    }
}
