package bubblechain.exact;

/** A number that could not be computed to the digits asked for within the limits of the program. */
public class PrecisionException extends ArithmeticException {
    private static final long serialVersionUID = 1L;

    /** @param message one line: what was asked, how far the computation went */
    public PrecisionException(String message) {
        super(message);
    }
}
