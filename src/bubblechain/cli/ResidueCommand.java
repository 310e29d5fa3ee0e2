package bubblechain.cli;

import bubblechain.report.Report;
import java.util.List;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** {@code residue SERIES}. */
@Command(
        name = "residue",
        description = "The residue at u = p/2 from the first terms of a series by the truncated sum rule: by order, with"
                + " its error budget, scale scan, other estimators and null-test verdict.")
final class ResidueCommand extends ReportCommand {
    @Parameters(
            index = "0",
            paramLabel = "SERIES",
            description = "built-in series, or path of a series file; with --chain a kernel")
    String name = "";

    @Option(
            names = "--nf",
            paramLabel = "N",
            defaultValue = "3",
            description = "massless flavours (nl for heavy quarks); default ${DEFAULT-VALUE}")
    int nf;

    @Option(names = "--loops", paramLabel = "L", description = "use the first L terms only; default: all that are known")
    @Nullable Integer loops;

    @Option(
            names = "--power",
            paramLabel = "p",
            description = "p = 2 u0, the power of Lambda/Q; negative for an ultraviolet singularity;"
                    + " default: the leading one")
    @Nullable String power;

    @Option(
            names = "--exponent-shift",
            paramLabel = "delta",
            description = "shift of the exponent, (Lambda/Q)^p alpha^(-delta); default: as the series declares")
    @Nullable String exponentShift;

    @Option(
            names = "--beta-loops",
            paramLabel = "B",
            description = "loops of the beta function, 1 to 5; default: 5, and 1 for a chain")
    @Nullable Integer betaLoops;

    @Option(names = "--chain", description = "probe the first terms of the bubble chain of a kernel instead")
    boolean chain;

    @Option(names = "--remove-nearer", description = "with --chain: take out all nearer poles exactly first")
    boolean removeNearer;

    @Mixin
    FamilyOption family = new FamilyOption();

    @Override
    List<Example> examples() {
        return List.of(
                new Example("residue pole-mass --nf 3", "the u = 1/2 residue of the pole mass from four loops"),
                new Example(
                        "residue pole-mass --chain --power 3 --remove-nearer --loops 8",
                        "the u = 3/2 pole of the chain after taking out the nearer ones"));
    }

    @Override
    Report report() {
        return Answers.residue(this);
    }
}
