package bubblechain.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Map;
import org.junit.jupiter.api.Test;

class TerminalTest {
    @Test
    void colourNeedsATerminalThatIsNotDumbAndNoWishAgainstIt() {
        assertThat(Terminal.of(Map.of("TERM", "xterm"), true, true).colour()).isTrue();
        assertThat(Terminal.of(Map.of("TERM", "xterm"), false, true).colour()).isFalse();
        assertThat(Terminal.of(Map.of("TERM", "dumb"), true, true).colour()).isFalse();
        assertThat(Terminal.of(Map.of(), true, true).colour()).isFalse();
        assertThat(Terminal.of(Map.of("TERM", "xterm", "NO_COLOR", "1"), true, true).colour()).isFalse();
        assertThat(Terminal.of(Map.of("TERM", "xterm", "NO_COLOR", ""), true, true).colour()).isTrue();
    }

    @Test
    void theWidthIsThatOfColumnsOrOneHundred() {
        assertThat(Terminal.of(Map.of("COLUMNS", "72"), false, false).width()).isEqualTo(72);
        assertThat(Terminal.of(Map.of("COLUMNS", "99999"), false, false).width()).isEqualTo(10_000);
        for (String nonsense : new String[] {"", "0", "-5", "wide", "1000000"}) {
            assertThat(Terminal.of(Map.of("COLUMNS", nonsense), false, false).width()).as(nonsense).isEqualTo(100);
        }
    }
}
