package bubblechain.cli;

import bubblechain.chain.ChainOptions;
import bubblechain.chain.Scheme;
import bubblechain.exact.DomainException;
import bubblechain.exact.Rational;
import bubblechain.qcd.Coupling;
import bubblechain.qcd.Normalisation;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.OptionalInt;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Option;

/** The options that say at which scales and with which flavours a chain is taken. */
final class ScaleOptions {
    @Option(
            names = "--nf",
            paramLabel = "N",
            description = "massless flavours in the bubbles (nl for heavy quarks)")
    private @Nullable Integer nf;

    @Option(
            names = "--coupling-nf",
            paramLabel = "M",
            description = "flavours of the coupling; default N, or N+1 to count the heavy quark")
    private @Nullable Integer couplingNf;

    @Option(
            names = "--mu-over-scale",
            paramLabel = "X",
            defaultValue = "1",
            description = "scale of the coupling alone, the quantity fixed: a constant such as 2, 'sqrt(8)',"
                    + " 'exp(-euler_gamma)'; default ${DEFAULT-VALUE}")
    private String mu = "1";

    @Option(
            names = "--operator-mu-over-scale",
            paramLabel = "Y",
            defaultValue = "1",
            description = "renormalisation scale of the operator or mass, with its anomalous dimension;"
                    + " default ${DEFAULT-VALUE}")
    private String operatorMu = "1";

    @Option(
            names = "--scheme",
            paramLabel = "S",
            defaultValue = "msbar",
            description = "scheme of the coupling: msbar or v; default ${DEFAULT-VALUE}")
    private String scheme = "msbar";

    @Option(
            names = "--parameter",
            paramLabel = "NAME=VALUE",
            description = "value of a parameter of a family, such as moment=4; may be repeated")
    private Map<String, String> parameters = new LinkedHashMap<>();

    /** With the natural coupling and the prefactor taken out. */
    ChainOptions options() {
        return options(Coupling.A, Normalisation.PREFACTOR);
    }

    ChainOptions options(Coupling coupling, Normalisation normalisation) {
        return new ChainOptions(
                mu, operatorMu, coupling, normalisation, Scheme.parse(scheme), optional(nf), optional(couplingNf));
    }

    Map<String, Rational> parameters() {
        Map<String, Rational> values = new LinkedHashMap<>();
        parameters.forEach((name, value) -> values.put(name, Rational.parse(value)));
        return values;
    }

    static OptionalInt optional(@Nullable Integer value) {
        return value == null ? OptionalInt.empty() : OptionalInt.of(value);
    }

    /** A rational given for an option. @throws DomainException naming the option */
    static Rational rational(String option, String text) {
        try {
            return Rational.parse(text);
        } catch (DomainException e) {
            throw new DomainException(option + ": " + e.getMessage(), e);
        }
    }
}
