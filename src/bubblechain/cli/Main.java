package bubblechain.cli;

import java.io.BufferedOutputStream;
import java.io.FileDescriptor;
import java.io.FileOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;

/** Entry point of the command line. */
public final class Main {
    private static final int BUFFER = 1 << 16;

    private Main() {}

    /** Runs the program on the process's streams and ends the process with its status. */
    public static void main(String[] arguments) {
        StandardOutput output = new StandardOutput(new FileOutputStream(FileDescriptor.out));
        PrintStream out = new PrintStream(new BufferedOutputStream(output, BUFFER), false, StandardCharsets.UTF_8);
        PrintStream err = new PrintStream(new FileOutputStream(FileDescriptor.err), true, StandardCharsets.UTF_8);
        CommandFrame frame = new CommandFrame(Subcommands.named(arguments), Terminal.of(System.getenv()));
        int status = frame.run(out, err, arguments);
        out.flush();
        System.exit(output.status(status, err));
    }

    /**
     * Runs the program without a terminal.
     *
     * @param out       receives the result, UTF-8
     * @param err       receives everything else, UTF-8
     * @param arguments command, options and parameters
     * @return          0 done, 1 the result could not be computed, 2 wrong usage
     */
    public static int run(PrintStream out, PrintStream err, String... arguments) {
        return new CommandFrame(Subcommands.named(arguments), Terminal.none()).run(out, err, arguments);
    }
}
