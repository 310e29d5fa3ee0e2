package bubblechain.cli;

import bubblechain.exact.DomainException;
import bubblechain.exact.PrecisionException;
import bubblechain.report.Facts;
import bubblechain.report.Report;
import bubblechain.report.Value;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.List;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** A command for the tests of the frame: it prints its options or fails as it is told. */
@Command(name = "sample", description = "prints its options")
final class SampleCommand extends ReportCommand {
    @Parameters(index = "0", paramLabel = "NAME", description = "a name, or a way to fail")
    private String name = "";

    @Option(names = "--loops", paramLabel = "L", defaultValue = "3", description = "number of terms; default ${DEFAULT-VALUE}")
    private int loops;

    @Option(names = "--from", paramLabel = "U", defaultValue = "0", description = "a rational")
    private String from = "";

    @Override
    List<Example> examples() {
        return List.of(new Example("sample any --loops 5", "the options, 100% of them"));
    }

    @Override
    Report report() {
        switch (name) {
            case "domain" -> throw new DomainException("loops 0 is below 1; ask for at least one");
            case "formula" -> throw new DomainException("line 1, column 2: expected an operator\n  2u\n   ^") {
                private static final long serialVersionUID = 1L;
            };
            case "escape" -> throw new DomainException("no kernel \u001b[31m");
            case "precision" -> throw new PrecisionException("40 digits were asked for, 12 could be reached");
            case "bug" -> throw new IllegalStateException("first line\n  second line");
            case "silent" -> throw new IllegalStateException();
            case "file" -> throw new UncheckedIOException(new IOException("disk on fire"));
            case "deep" -> throw new StackOverflowError();
            case "memory" -> throw new OutOfMemoryError();
            default -> {
                return shown();
            }
        }
    }

    private Report shown() {
        return Report.builder("sample")
                .normalisation("\u03b1 in words")
                .add(Facts.titled("", "")
                        .with("name", "name", Value.text(name))
                        .with("loops", "loops", Value.count(loops))
                        .with("from", "from", Value.exact(from))
                        .with("width", "width", Value.count(terminal().width())))
                .build();
    }

    @Override
    int status(Report report) {
        return name.equals("unhappy") ? ExitStatus.NOT_COMPUTED : super.status(report);
    }
}
