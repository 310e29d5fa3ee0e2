package bubblechain.cli;

import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Option;

/** The options that say at which scales and with which flavours a chain is taken. */
final class ScaleOptions {
    @Option(
            names = "--nf",
            paramLabel = "N",
            description = "massless flavours in the bubbles (nl for heavy quarks)")
    @Nullable Integer nf;

    @Option(
            names = "--coupling-nf",
            paramLabel = "M",
            description = "flavours of the coupling; default N, or N+1 to count the heavy quark")
    @Nullable Integer couplingNf;

    @Option(
            names = "--mu-over-scale",
            paramLabel = "X",
            defaultValue = "1",
            description = "scale of the coupling alone, the quantity fixed: a constant such as 2, 'sqrt(8)',"
                    + " 'exp(-euler_gamma)'; default ${DEFAULT-VALUE}")
    String mu = "1";

    @Option(
            names = "--operator-mu-over-scale",
            paramLabel = "Y",
            defaultValue = "1",
            description = "renormalisation scale of the operator or mass, with its anomalous dimension;"
                    + " default ${DEFAULT-VALUE}")
    String operatorMu = "1";

    @Option(
            names = "--scheme",
            paramLabel = "S",
            defaultValue = "msbar",
            description = "scheme of the coupling: msbar or v; default ${DEFAULT-VALUE}")
    String scheme = "msbar";
}
