package bubblechain.kernel;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;

/**
 * The text of a kernel file for a test, changed line by line.
 *
 * @param text the TOML
 */
public record KernelText(String text) {
    /** A file of form borel with this T(u); T stands in line 7. */
    public static KernelText of(String transform) {
        return new KernelText("""
                name = "mine"
                title = "A kernel of one's own"
                quantity = "f"
                scale = "Q"
                mass_dimension = "0"
                form = "borel"
                T = "%s"
                """.formatted(transform));
    }

    /** The same and more lines. */
    public KernelText and(String lines) {
        return new KernelText(text + lines + "\n");
    }

    /** The same with one piece of text replaced. */
    public KernelText replacing(String old, String by) {
        if (!text.contains(old)) {
            throw new IllegalArgumentException("no '" + old + "' in the file");
        }
        return new KernelText(text.replace(old, by));
    }

    /** Writes the file and gives its path. */
    public String in(Path folder) {
        try {
            return Files.writeString(folder.resolve("mine.toml"), text).toString();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** The kernel of the file. */
    public Kernel kernel(Path folder) {
        return KernelLibrary.load(in(folder));
    }
}
