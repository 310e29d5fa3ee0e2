package bubblechain.kernel;

import bubblechain.exact.DomainException;

/** A kernel that does not exist or contradicts itself. */
public final class KernelException extends DomainException {
    private static final long serialVersionUID = 1L;

    public KernelException(String message) {
        super(message);
    }
}
