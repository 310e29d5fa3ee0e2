package bubblechain.exact;

/** A request that has no answer: an argument outside its range, a malformed input, a quantity that does not exist. */
public class DomainException extends IllegalArgumentException {
    private static final long serialVersionUID = 1L;

    /** @param message one line: the value got, the range allowed, what to do */
    public DomainException(String message) {
        super(message);
    }

    /** @param message one line: the value got, the range allowed, what to do */
    public DomainException(String message, Throwable cause) {
        super(message, cause);
    }
}
