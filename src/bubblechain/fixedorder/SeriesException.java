package bubblechain.fixedorder;

import bubblechain.exact.DomainException;

/** A series file that cannot be read or used. The message names the file and, where there is one, line and column. */
public final class SeriesException extends DomainException {
    private static final long serialVersionUID = 1L;

    /** @param message the place, the reason, what to do */
    public SeriesException(String message) {
        super(message);
    }

    SeriesException(String message, Throwable cause) {
        super(message, cause);
    }
}
