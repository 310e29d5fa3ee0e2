package bubblechain.cli;

import bubblechain.report.Report;
import java.util.List;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** {@code kernels [NAME]}. */
@Command(name = "kernels", description = "Lists the built-in kernels, or describes one: formulas, singularities, sources.")
final class KernelsCommand extends ReportCommand {
    @Parameters(
            index = "0",
            arity = "0..1",
            paramLabel = "NAME",
            description = "a built-in name, or path of a kernel file; without it all are listed")
    @Nullable String name;

    @Option(names = "--search", paramLabel = "WORD", defaultValue = "", description = "list only kernels with this word")
    String search = "";

    @Mixin
    FamilyOption family = new FamilyOption();

    @Override
    List<Example> examples() {
        return List.of(
                new Example("kernels", "the library"), new Example("kernels adler", "formula, poles and sources of one"));
    }

    @Override
    Report report() {
        return name == null ? Answers.kernels(search) : Answers.kernel(name, family);
    }
}
