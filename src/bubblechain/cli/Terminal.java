package bubblechain.cli;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;

/**
 * What is known of the terminal behind the streams.
 *
 * @param outputIsTerminal true if a person reads standard output as it appears
 * @param errorIsTerminal  true if a person reads standard error as it appears
 * @param colour           true if coloured text is wanted on standard output
 * @param width            columns for text
 */
record Terminal(boolean outputIsTerminal, boolean errorIsTerminal, boolean colour, int width) {
    static final int DEFAULT_WIDTH = 100;
    private static final int WIDEST = 10_000;

    /** No terminal: a pipe or a file. */
    static Terminal none() {
        return new Terminal(false, false, false, DEFAULT_WIDTH);
    }

    /** The terminal of this process, with NO_COLOR, TERM and COLUMNS of the environment. */
    static Terminal of(Map<String, String> environment) {
        return of(environment, isTerminal(1), isTerminal(2));
    }

    static Terminal of(Map<String, String> environment, boolean outputIsTerminal, boolean errorIsTerminal) {
        boolean plain = !environment.getOrDefault("NO_COLOR", "").isEmpty()
                || environment.getOrDefault("TERM", "dumb").equals("dumb");
        return new Terminal(
                outputIsTerminal,
                errorIsTerminal,
                outputIsTerminal && !plain,
                width(environment.getOrDefault("COLUMNS", "")));
    }

    private static int width(String columns) {
        return columns.matches("[1-9]\\d{0,4}") ? Math.min(Integer.parseInt(columns), WIDEST) : DEFAULT_WIDTH;
    }

    /**
     * Linux names the terminal behind a stream, and a stream whose name cannot be read is none; elsewhere a console
     * exists if input and output are terminals.
     */
    private static boolean isTerminal(int descriptor) {
        Path link = Path.of("/proc/self/fd/" + descriptor);
        if (Files.isSymbolicLink(link)) {
            try {
                String target = Files.readSymbolicLink(link).toString();
                return target.startsWith("/dev/pts/") || target.startsWith("/dev/tty");
            } catch (IOException unreadable) {
                return false;
            }
        }
        return System.console() != null;
    }
}
