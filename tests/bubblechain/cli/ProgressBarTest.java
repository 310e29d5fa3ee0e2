package bubblechain.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.concurrent.atomic.AtomicLong;
import org.junit.jupiter.api.Test;

class ProgressBarTest {
    private static final long MILLISECOND = 1_000_000L;

    private final ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    private final PrintStream err = new PrintStream(bytes, false, StandardCharsets.UTF_8);
    private final AtomicLong clock = new AtomicLong();

    private ProgressBar bar(boolean wanted, long total) {
        return new ProgressBar(err, wanted, "coefficients", total, clock::get);
    }

    private String written() {
        return bytes.toString(StandardCharsets.UTF_8);
    }

    @Test
    void nothingIsShownInTheFirstTwoSeconds() {
        try (ProgressBar bar = bar(true, 10)) {
            clock.set(1999 * MILLISECOND);
            bar.accept(9);
        }
        assertThat(written()).isEmpty();
    }

    @Test
    void nothingIsShownWithoutATerminalOrWithoutWork() {
        try (ProgressBar noTerminal = bar(false, 10);
                ProgressBar noWork = bar(true, 0)) {
            clock.set(5000 * MILLISECOND);
            noTerminal.accept(5);
            noWork.accept(0);
        }
        assertThat(written()).isEmpty();
    }

    @Test
    void theBarIsDrawnAndWiped() {
        ProgressBar bar = bar(true, 10);
        clock.set(2000 * MILLISECOND);
        bar.accept(5);
        String line = "\rcoefficients [###############---------------] 50%";
        assertThat(written()).isEqualTo(line);
        bar.close();
        assertThat(written()).isEqualTo(line + "\r" + " ".repeat(line.length() - 1) + "\r");
        bar.close();
        assertThat(written()).endsWith(" \r").hasSize(3 * line.length() - 1 + 1 - line.length() + 1);
    }

    @Test
    void theBarIsNotRedrawnMoreThanTenTimesASecond() {
        ProgressBar bar = bar(true, 1000);
        clock.set(3000 * MILLISECOND);
        bar.accept(100);
        clock.set(3099 * MILLISECOND);
        bar.accept(200);
        assertThat(written()).contains("10%").doesNotContain("20%");
        clock.set(3100 * MILLISECOND);
        bar.accept(300);
        assertThat(written()).contains("30%");
    }

    @Test
    void stepsOutsideTheRangeAreShownAtItsEnds() {
        ProgressBar bar = bar(true, 10);
        clock.set(3000 * MILLISECOND);
        bar.accept(25);
        assertThat(written()).endsWith("] 100%");
    }
}
