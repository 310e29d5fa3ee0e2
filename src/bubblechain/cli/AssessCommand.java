package bubblechain.cli;

import bubblechain.report.Report;
import java.util.List;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** {@code assess NAME}. */
@Command(
        name = "assess",
        description = "The whole story of one quantity: growth of the chain, exact poles, the leading residue measured"
                + " from the published series beside its chain value.")
final class AssessCommand extends ReportCommand {
    @Parameters(index = "0", paramLabel = "NAME", description = "a built-in quantity, or path of a kernel file")
    String name = "";

    @Option(
            names = "--nf",
            paramLabel = "N",
            defaultValue = "3",
            description = "massless flavours (nl for heavy quarks); default ${DEFAULT-VALUE}")
    int nf;

    @Option(
            names = "--loops",
            paramLabel = "L",
            defaultValue = "10",
            description = "terms of the chain shown; default ${DEFAULT-VALUE}")
    int loops;

    @Option(
            names = "--range",
            paramLabel = "U",
            defaultValue = "3",
            description = "poles are shown for -U <= u <= U; default ${DEFAULT-VALUE}")
    String range = "3";

    @Option(names = "--series", paramLabel = "FILE", description = "published series; default: the one the kernel names")
    @Nullable String series;

    @Mixin
    FamilyOption family = new FamilyOption();

    @Override
    List<Example> examples() {
        return List.of(new Example("assess pole-mass", "the heavy-quark pole mass, three massless flavours"));
    }

    @Override
    Report report() {
        return Answers.assess(this);
    }
}
