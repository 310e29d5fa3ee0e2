package bubblechain.toml;

import bubblechain.exact.DomainException;

/** A file that cannot be used; the message names file, line, column and reason. */
public final class TomlException extends DomainException {
    private static final long serialVersionUID = 1L;

    public TomlException(String message) {
        super(message);
    }

    public TomlException(String message, Throwable cause) {
        super(message, cause);
    }
}
