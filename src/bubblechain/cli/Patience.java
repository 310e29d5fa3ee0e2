package bubblechain.cli;

import java.util.function.Supplier;

/** Shows on a terminal how much of the estimated time of a computation has passed; at most 99 %, for it is an estimate. */
final class Patience {
    private static final long TICK_MILLISECONDS = 250;
    private static final double MILLISECONDS = 1_000;
    private static final double LARGEST_PART = 0.99;

    private Patience() {}

    /** Does the work; on a terminal with a line of progress that is wiped at the end. */
    static <T> T during(Terminal terminal, String work, double estimatedSeconds, Supplier<T> task) {
        if (!terminal.errorIsTerminal()) {
            return task.get();
        }
        long total = Math.max(1, Math.round(estimatedSeconds * MILLISECONDS));
        String label = work + ", about " + Math.max(1, Math.round(estimatedSeconds)) + " s";
        try (ProgressBar bar = ProgressBar.of(terminal, label, total)) {
            Thread thread = new Thread(() -> watch(bar, total), "progress");
            thread.setDaemon(true);
            thread.start();
            try {
                return task.get();
            } finally {
                stop(thread);
            }
        }
    }

    private static void watch(ProgressBar bar, long total) {
        long start = System.currentTimeMillis();
        try {
            while (true) {
                Thread.sleep(TICK_MILLISECONDS);
                bar.accept(Math.min(System.currentTimeMillis() - start, (long) (LARGEST_PART * total)));
            }
        } catch (InterruptedException finished) {
            Thread.currentThread().interrupt();
        }
    }

    private static void stop(Thread thread) {
        thread.interrupt();
        try {
            thread.join(TICK_MILLISECONDS);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }
}
