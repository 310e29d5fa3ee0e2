package bubblechain.cli;

import bubblechain.report.Report;
import java.util.List;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** {@code crosscheck NAME}. */
@Command(
        name = "crosscheck",
        description = "One residue three ways: exact from the chain, by the sum rule from the first terms of the chain, and"
                + " by the sum rule from the published series; the coefficients side by side.")
final class CrosscheckCommand extends ReportCommand {
    @Parameters(
            index = "0",
            arity = "0..1",
            paramLabel = "NAME",
            description = "a built-in quantity with both a kernel and a series")
    @Nullable String name;

    @Option(names = "--kernel", paramLabel = "FILE", description = "kernel: a built-in name or a file")
    @Nullable String kernel;

    @Option(names = "--series", paramLabel = "FILE", description = "published series: a built-in name or a file")
    @Nullable String series;

    @Option(
            names = "--nf",
            paramLabel = "N",
            defaultValue = "3",
            description = "massless flavours (nl for heavy quarks); default ${DEFAULT-VALUE}")
    int nf;

    @Option(names = "--power", paramLabel = "p", description = "p = 2 u0; default: the leading singularity of the series")
    @Nullable String power;

    @Option(
            names = "--all",
            description = "one table over every built-in quantity with both a kernel and a series, each at the leading"
                    + " singularity of its series")
    boolean all;

    @Mixin
    FamilyOption family = new FamilyOption();

    @Override
    List<Example> examples() {
        return List.of(
                new Example("crosscheck pole-mass --nf 4", "chain against four-loop QCD for four flavours"),
                new Example("crosscheck --all", "one line for every quantity"));
    }

    @Override
    Report report() {
        return Answers.crosscheck(this);
    }
}
