package bubblechain.toml;

import bubblechain.exact.DomainException;
import java.util.stream.Collectors;

/** A file that cannot be used; the message names file, line, column and reason. */
public final class TomlException extends DomainException {
    private static final long serialVersionUID = 1L;
    private static final int LONGEST = 600;
    private static final int ENDING = 200;

    public TomlException(String message) {
        super(shortened(message));
    }

    public TomlException(String message, Throwable cause) {
        super(shortened(message), cause);
    }

    /** Each line with its middle left out if it is long, because a message may repeat what a file says. */
    private static String shortened(String message) {
        return message.length() <= LONGEST ? message : message.lines().map(TomlException::shortLine).collect(Collectors.joining("\n"));
    }

    private static String shortLine(String line) {
        return line.length() <= LONGEST
                ? line
                : line.substring(0, LONGEST - ENDING) + " ... " + line.substring(line.length() - ENDING);
    }
}
