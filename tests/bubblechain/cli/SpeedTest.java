package bubblechain.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** A small command answers while the user looks. */
class SpeedTest {
    private static final long SECOND = 1_000_000_000L;
    /** For machines that are slow or busy. */
    private static final int PATIENCE = 5;

    @Test
    void tenCoefficientsTakeLessThanASecondOfAWholeProcess(@TempDir Path folder) throws IOException, InterruptedException {
        String java = Path.of(System.getProperty("java.home"), "bin", "java").toString();
        List<String> command = List.of(
                java, "-cp", System.getProperty("java.class.path"), "bubblechain.cli.Main", "coefficients", "pole-mass",
                "--loops", "10");
        long best = Long.MAX_VALUE;
        for (int attempt = 0; attempt < 3; attempt++) {
            long start = System.nanoTime();
            Process process = new ProcessBuilder(command)
                    .redirectOutput(folder.resolve("out").toFile())
                    .redirectError(folder.resolve("err").toFile())
                    .start();
            assertThat(process.waitFor()).isZero();
            best = Math.min(best, System.nanoTime() - start);
        }
        assertThat(folder.resolve("out")).content().contains("1710256385.3020998658");
        assertThat(best).isLessThan(PATIENCE * SECOND);
    }
}
