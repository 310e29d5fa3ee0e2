package bubblechain.cli;

import bubblechain.assessment.Validation;
import bubblechain.assessment.ValidationReport;
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
    private @Nullable String path;

    private boolean failed;

    @Override
    List<Example> examples() {
        return List.of(new Example("validate pole-mass", "the built-in kernel and series of the pole mass"));
    }

    @Override
    Report report() {
        List<Validation.Finding> findings = path == null ? Validation.library() : Validation.of(path);
        failed = findings.stream().anyMatch(f -> !f.passed());
        return ValidationReport.of(path == null ? "library" : path, findings);
    }

    @Override
    int status(Report report) {
        return failed ? ExitStatus.NOT_COMPUTED : ExitStatus.DONE;
    }
}
