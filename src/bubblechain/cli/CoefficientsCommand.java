package bubblechain.cli;

import bubblechain.report.Report;
import java.util.List;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** {@code coefficients KERNEL}. */
@Command(
        name = "coefficients",
        description = "The coefficients c_0 .. c_(L-1) of a chain, f = prefactor x sum c_n a^(n+1), to certified digits"
                + " or in closed form.")
final class CoefficientsCommand extends ReportCommand {
    private static final long LARGE = 4_000_000;

    @Parameters(index = "0", paramLabel = "KERNEL", description = "built-in name, or path of a kernel file")
    String name = "";

    @Option(
            names = "--loops",
            paramLabel = "L",
            defaultValue = "10",
            description = "number of terms, 1 = one loop; default ${DEFAULT-VALUE}")
    int loops;

    @Option(
            names = "--digits",
            paramLabel = "P",
            defaultValue = "20",
            description = "significant digits, all of them correct; default ${DEFAULT-VALUE}")
    int digits;

    @Option(names = "--exact", description = "closed forms as well")
    boolean exact;

    @Option(names = "--nf-terms", description = "the nf^n terms of the full series in (alpha/pi)^(n+1) as well")
    boolean flavourTerms;

    @Option(
            names = "--anomalous-dimension",
            description = "the anomalous dimension of the kernel's operator instead, d ln O/d ln mu")
    boolean anomalousDimension;

    @Option(
            names = "--coupling",
            paramLabel = "C",
            defaultValue = "a",
            description = "expansion parameter: a (beta0 alpha/(4 pi)), alpha, alpha/pi, alpha/4pi;"
                    + " default ${DEFAULT-VALUE}")
    String coupling = "a";

    @Option(
            names = "--normalise",
            paramLabel = "HOW",
            defaultValue = "prefactor",
            description = "prefactor (c_n), full (coefficient in the quantity), first (c_n/c_0);"
                    + " default ${DEFAULT-VALUE}")
    String normalise = "prefactor";

    @Mixin
    ScaleOptions scales = new ScaleOptions();

    @Mixin
    FamilyOption family = new FamilyOption();

    @Override
    List<Example> examples() {
        return List.of(
                new Example("coefficients pole-mass --exact --loops 4", "closed forms through four loops"),
                new Example(
                        "coefficients pole-mass --nf 3 --coupling alpha/pi --normalise full --mu-over-scale 2 --loops 5",
                        "in alpha_s^(3)(2 m)/pi, prefactor included"));
    }

    @Override
    Report report() {
        return Answers.coefficients(this);
    }

    @Override
    double estimatedSeconds() {
        return Answers.estimatedSeconds(loops, digits);
    }

    @Override
    boolean isLarge() {
        return (long) loops * digits > LARGE;
    }
}
