package bubblechain.cli;

import bubblechain.output.OutputFormat;
import java.util.Iterator;
import java.util.Optional;
import picocli.CommandLine.ITypeConverter;
import picocli.CommandLine.Option;
import picocli.CommandLine.TypeConversionException;

/** The option {@code --format}. */
final class FormatOption {
    @Option(
            names = "--format",
            paramLabel = "FORMAT",
            order = ReportCommand.LAST - 1,
            defaultValue = "text",
            converter = Converter.class,
            completionCandidates = Names.class,
            description = "${COMPLETION-CANDIDATES}; default ${DEFAULT-VALUE}")
    private OutputFormat format = OutputFormat.TEXT;

    OutputFormat format() {
        return format;
    }

    /** Reads the name of a format. */
    static final class Converter implements ITypeConverter<OutputFormat> {
        @Override
        public OutputFormat convert(String name) {
            Optional<OutputFormat> format = OutputFormat.named(name);
            if (format.isEmpty()) {
                throw new TypeConversionException(
                        "'" + name + "' is not one of " + String.join(", ", OutputFormat.names()));
            }
            return format.get();
        }
    }

    /** The names for the help and for completion. */
    static final class Names implements Iterable<String> {
        @Override
        public Iterator<String> iterator() {
            return OutputFormat.names().iterator();
        }
    }
}
