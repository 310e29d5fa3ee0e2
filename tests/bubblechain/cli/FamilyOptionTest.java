package bubblechain.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The parameter of a family reaches every command that takes a kernel, and stands in its request and title. */
class FamilyOptionTest {
    private static String run(int status, String... words) {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        ByteArrayOutputStream err = new ByteArrayOutputStream();
        int found = Main.run(
                new PrintStream(out, true, StandardCharsets.UTF_8), new PrintStream(err, true, StandardCharsets.UTF_8), words);
        assertThat(found).as(err.toString(StandardCharsets.UTF_8)).isEqualTo(status);
        return (status == 0 ? out : err).toString(StandardCharsets.UTF_8);
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "kernels dis-f2", "coefficients dis-f2 --loops 2", "poles dis-f2 --from 1 --to 2",
                "residue dis-f2 --chain --power 2 --loops 4", "assess dis-f2 --loops 3 --range 1",
            })
    void everyCommandTakesTheMoment(String command) {
        String shown = run(0, (command + " --parameter moment=4").split(" "));
        assertThat(shown.replaceAll("\\s+", " ")).contains("parameter_moment = 4", "(moment = 4)");
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', textBlock = """
            coefficients dis-f2 --parameter moment=31 | bubblechain: the parameter moment is an integer between 1 and 30, got 31
            coefficients dis-f2 --parameter moment=x | bubblechain: --parameter moment: 'x' is not a rational number such as 3, -3/4 or 1.25
            residue pole-mass --parameter moment=3 | bubblechain: --parameter needs --chain: a published series has no parameters
            """)
    void valuesThatDoNotFitAreRefused(String command, String message) {
        assertThat(run(2, command.split(" "))).isEqualTo(message + "\n");
    }
}
