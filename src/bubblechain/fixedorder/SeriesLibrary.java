package bubblechain.fixedorder;

import bubblechain.exact.DomainException;
import bubblechain.report.NearestNames;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/** The built-in series, and the user's: a path to a series file works anywhere a name does. */
public final class SeriesLibrary {
    private static final String FOLDER = "/reference-values/series/";
    private static final String EXTENSION = ".toml";

    private SeriesLibrary() {}

    /** Names of the built-in series, in the order of the index. */
    public static List<String> names() {
        String index = new String(resource("index.txt"), StandardCharsets.UTF_8);
        return index.lines()
                .map(String::strip)
                .filter(line -> !line.isEmpty() && !line.startsWith("#"))
                .toList();
    }

    /** The built-in series of this name, if there is one. */
    public static Optional<PerturbativeSeries> builtIn(String name) {
        return names().contains(name) ? Optional.of(load(name)) : Optional.empty();
    }

    /**
     * The built-in series of this name, or the series in the file of this path.
     *
     * @throws DomainException if there is neither; the message names the nearest built-in ones
     * @throws bubblechain.toml.TomlException if the file is not a series
     */
    public static PerturbativeSeries find(String nameOrPath) {
        Optional<PerturbativeSeries> found = builtIn(nameOrPath);
        if (found.isPresent()) {
            return found.get();
        }
        if (looksLikePath(nameOrPath)) {
            return SeriesFile.read(path(nameOrPath));
        }
        List<String> nearest = NearestNames.of(nameOrPath, names());
        throw new DomainException("there is no series '" + nameOrPath + "'; "
                + (nearest.isEmpty()
                        ? "known are " + String.join(", ", names()) + "."
                        : "did you mean " + String.join(" or ", nearest) + "?")
                + " A path to a series file works too.");
    }

    private static boolean looksLikePath(String text) {
        return text.endsWith(EXTENSION) || text.contains("/") || Files.isRegularFile(path(text));
    }

    private static Path path(String text) {
        try {
            return Path.of(text);
        } catch (InvalidPathException e) {
            throw new DomainException("'" + text.replaceAll("\\p{Cntrl}", "?") + "' is neither a series nor a path", e);
        }
    }

    private static PerturbativeSeries load(String name) {
        return SeriesFile.parse(new String(resource(name + EXTENSION), StandardCharsets.UTF_8), name + EXTENSION);
    }

    private static byte[] resource(String file) {
        try (InputStream stream = SeriesLibrary.class.getResourceAsStream(FOLDER + file)) {
            if (stream == null) {
                throw new IllegalStateException("the built-in file " + FOLDER + file + " is missing from this build");
            }
            return stream.readAllBytes();
        } catch (IOException e) {
            throw new IllegalStateException("the built-in file " + FOLDER + file + " cannot be read", e);
        }
    }
}
