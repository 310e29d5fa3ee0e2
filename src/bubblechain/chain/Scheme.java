package bubblechain.chain;

import bubblechain.exact.DomainException;
import java.util.Locale;

/** The scheme of the coupling: MS-bar, or the V scheme of the static potential in momentum space. */
public enum Scheme {
    MSBAR,
    V;

    /** The word on the command line. */
    public String text() {
        return name().toLowerCase(Locale.ROOT);
    }

    /** @throws DomainException if the text is neither msbar nor v */
    public static Scheme parse(String text) {
        return switch (text.toLowerCase(Locale.ROOT)) {
            case "msbar" -> MSBAR;
            case "v" -> V;
            default -> throw new DomainException("scheme '" + text + "' is neither msbar nor v");
        };
    }
}
