package bubblechain.cli;

import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.List;

/** What one run of the program wrote and how it ended. */
record Console(int status, String out, String err) {
    /** Runs the frame with the sample command. */
    static Console run(String... arguments) {
        return run(Terminal.none(), arguments);
    }

    static Console run(Terminal terminal, String... arguments) {
        CommandFrame frame = new CommandFrame(List.of(new SampleCommand()), terminal);
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        ByteArrayOutputStream err = new ByteArrayOutputStream();
        int status = frame.run(stream(out), stream(err), arguments);
        return new Console(status, out.toString(StandardCharsets.UTF_8), err.toString(StandardCharsets.UTF_8));
    }

    /** Runs the program with its own commands. */
    static Console runProgram(String... arguments) {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        ByteArrayOutputStream err = new ByteArrayOutputStream();
        int status = Main.run(stream(out), stream(err), arguments);
        return new Console(status, out.toString(StandardCharsets.UTF_8), err.toString(StandardCharsets.UTF_8));
    }

    private static PrintStream stream(ByteArrayOutputStream bytes) {
        return new PrintStream(bytes, false, StandardCharsets.UTF_8);
    }
}
