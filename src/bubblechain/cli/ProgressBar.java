package bubblechain.cli;

import java.io.PrintStream;
import java.util.function.LongConsumer;
import java.util.function.LongSupplier;

/**
 * A line on standard error that says how far a long computation is. It appears only on a terminal and only after two
 * seconds, changes at most ten times a second, and is wiped by {@link #close}.
 */
final class ProgressBar implements LongConsumer, AutoCloseable {
    private static final long SECOND = 1_000_000_000L;
    private static final long SILENT = 2 * SECOND;
    private static final long BETWEEN = SECOND / 10;
    private static final int CELLS = 30;

    private final PrintStream err;
    private final boolean wanted;
    private final String work;
    private final long total;
    private final LongSupplier clock;
    private final long start;
    private long shown;
    private int length;

    ProgressBar(PrintStream err, boolean wanted, String work, long total, LongSupplier clock) {
        this.err = err;
        this.wanted = wanted && total > 0;
        this.work = work;
        this.total = total;
        this.clock = clock;
        this.start = clock.getAsLong();
        this.shown = start;
    }

    /** A bar for so many steps of the work named, on the process's standard error if it is a terminal. */
    static ProgressBar of(Terminal terminal, String work, long total) {
        return new ProgressBar(System.err, terminal.errorIsTerminal(), work, total, System::nanoTime);
    }

    /** Says that so many steps are done. */
    @Override
    public void accept(long done) {
        long now = clock.getAsLong();
        if (!wanted || now - start < SILENT || length > 0 && now - shown < BETWEEN) {
            return;
        }
        shown = now;
        long part = Math.max(0, Math.min(done, total));
        int full = (int) (CELLS * part / total);
        String line = work + " [" + "#".repeat(full) + "-".repeat(CELLS - full) + "] " + 100 * part / total + "%";
        err.print("\r" + line + " ".repeat(Math.max(0, length - line.length())));
        err.flush();
        length = line.length();
    }

    /** Wipes the line. */
    @Override
    public void close() {
        if (length > 0) {
            err.print("\r" + " ".repeat(length) + "\r");
            err.flush();
            length = 0;
        }
    }
}
