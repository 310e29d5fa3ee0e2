package bubblechain.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import org.junit.jupiter.api.Test;

class StandardOutputTest {
    private final ByteArrayOutputStream errors = new ByteArrayOutputStream();
    private final PrintStream err = new PrintStream(errors, true, StandardCharsets.UTF_8);

    private static StandardOutput failing(String reason) {
        StandardOutput output = new StandardOutput(new OutputStream() {
            @Override
            public void write(int value) throws IOException {
                throw new IOException(reason);
            }
        });
        PrintStream out = new PrintStream(output, false, StandardCharsets.UTF_8);
        out.print("result");
        out.flush();
        return output;
    }

    @Test
    void aReaderThatWentAwayIsNoError() {
        assertThat(failing("Broken pipe").status(0, err)).isZero();
        assertThat(errors.toString(StandardCharsets.UTF_8)).isEmpty();
    }

    @Test
    void aFullDiskIsAnError() {
        assertThat(failing("No space left on device").status(0, err)).isEqualTo(1);
        assertThat(errors.toString(StandardCharsets.UTF_8))
                .isEqualTo("bubblechain: cannot write the result: No space left on device\n");
    }

    @Test
    void withoutFailureEverythingArrivesAndTheStatusStays() throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        StandardOutput output = new StandardOutput(bytes);
        output.write("abc".getBytes(StandardCharsets.UTF_8), 0, 3);
        output.write('d');
        assertThat(bytes.toString(StandardCharsets.UTF_8)).isEqualTo("abcd");
        assertThat(output.status(2, err)).isEqualTo(2);
    }
}
