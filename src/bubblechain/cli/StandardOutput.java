package bubblechain.cli;

import java.io.FilterOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.io.PrintStream;
import java.util.Locale;

/**
 * Output that remembers its first failure, because {@link PrintStream} forgets the reason. A reader that went away
 * ({@code | head}) is no error; a full disk is one.
 */
final class StandardOutput extends FilterOutputStream {
    private String failure = "";

    StandardOutput(OutputStream target) {
        super(target);
    }

    @Override
    public void write(byte[] bytes, int from, int length) throws IOException {
        try {
            out.write(bytes, from, length);
        } catch (IOException reason) {
            remember(reason);
            throw reason;
        }
    }

    @Override
    public void write(int value) throws IOException {
        write(new byte[] {(byte) value}, 0, 1);
    }

    private void remember(IOException reason) {
        if (failure.isEmpty()) {
            failure = String.valueOf(reason.getMessage());
        }
    }

    /** The status of the program: the command's own, or 1 and a line on standard error if its result was not written. */
    int status(int commandStatus, PrintStream err) {
        if (failure.isEmpty() || failure.toLowerCase(Locale.ROOT).contains("pipe")) {
            return commandStatus;
        }
        err.println("bubblechain: cannot write the result: " + failure);
        return ExitStatus.NOT_COMPUTED;
    }
}
