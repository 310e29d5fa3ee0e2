package bubblechain.output;

import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** The formats a report can be written in. */
public enum OutputFormat {
    TEXT,
    JSON,
    CSV,
    LATEX;

    /** The format of that name in any case, or empty. */
    public static Optional<OutputFormat> named(String name) {
        for (OutputFormat format : values()) {
            if (format.toString().equals(name.toLowerCase(Locale.ROOT))) {
                return Optional.of(format);
            }
        }
        return Optional.empty();
    }

    /** The names, "text" first. */
    public static List<String> names() {
        return Arrays.stream(values()).map(OutputFormat::toString).toList();
    }

    /**
     * The writer of this format.
     *
     * @param width columns of the text output; the other formats do not use it
     * @implNote only the classes of the writer asked for are loaded
     */
    public ReportWriter writer(int width) {
        return switch (this) {
            case TEXT -> TextWriter.ofWidth(width);
            case JSON -> JsonWriter.pretty();
            case CSV -> new CsvWriter();
            case LATEX -> new LatexWriter();
        };
    }

    /** The name as typed after {@code --format}. */
    @Override
    public String toString() {
        return name().toLowerCase(Locale.ROOT);
    }
}
