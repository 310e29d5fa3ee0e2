package bubblechain.cli;

import bubblechain.assessment.CrossCheck;
import bubblechain.assessment.CrossCheckReport;
import bubblechain.exact.DomainException;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.SeriesLibrary;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import bubblechain.report.Report;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
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
    private @Nullable String name;

    @Option(names = "--kernel", paramLabel = "FILE", description = "kernel: a built-in name or a file")
    private @Nullable String kernel;

    @Option(names = "--series", paramLabel = "FILE", description = "published series: a built-in name or a file")
    private @Nullable String series;

    @Option(
            names = "--nf",
            paramLabel = "N",
            defaultValue = "3",
            description = "massless flavours (nl for heavy quarks); default ${DEFAULT-VALUE}")
    private int nf;

    @Option(names = "--power", paramLabel = "p", description = "p = 2 u0; default: the leading singularity of the series")
    private @Nullable String power;

    @Override
    List<Example> examples() {
        return List.of(new Example("crosscheck pole-mass --nf 4", "chain against four-loop QCD for four flavours"));
    }

    @Override
    Report report() {
        Optional<Rational> p = Optional.ofNullable(power).map(text -> ScaleOptions.rational("--power", text));
        Kernel chosen = KernelLibrary.load(chosen("--kernel", kernel));
        String seriesName = series != null ? series : kernel != null && name == null
                ? chosen.series().orElseThrow(() -> new DomainException("give --series; the kernel names none"))
                : chosen("--series", null);
        return CrossCheckReport.of(CrossCheck.of(chosen, SeriesLibrary.find(seriesName), nf, p));
    }

    private String chosen(String option, @Nullable String given) {
        if (given != null) {
            return given;
        }
        if (name == null) {
            throw new DomainException("name a quantity, or give --kernel and --series; " + option + " is missing");
        }
        return name;
    }
}
