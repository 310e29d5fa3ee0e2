package bubblechain.cli;

import bubblechain.report.Report;
import java.util.List;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Parameters;

/** {@code validate [PATH]}. */
@Command(
        name = "validate",
        description = "Checks kernel and series files and recomputes the numbers they promise. Status 1 if a check fails.")
final class ValidateCommand extends ReportCommand {
    @Parameters(
            index = "0",
            arity = "0..1",
            paramLabel = "PATH",
            description = "a file, a folder, or a built-in name; without it the whole library")
    @Nullable String path;

    @Override
    List<Example> examples() {
        return List.of(new Example("validate pole-mass", "the built-in kernel and series of the pole mass"));
    }

    @Override
    Report report() {
        return Answers.validate(path);
    }

    @Override
    int status(Report report) {
        return Answers.allPassed(report) ? ExitStatus.DONE : ExitStatus.NOT_COMPUTED;
    }
}
