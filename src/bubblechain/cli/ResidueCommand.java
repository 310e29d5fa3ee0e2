package bubblechain.cli;

import bubblechain.assessment.ChainSumRule;
import bubblechain.exact.DomainException;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.PerturbativeSeries;
import bubblechain.fixedorder.SeriesLibrary;
import bubblechain.kernel.KernelLibrary;
import bubblechain.report.Report;
import bubblechain.sumrule.ResidueReport;
import bubblechain.sumrule.SumRule;
import bubblechain.sumrule.SumRuleRequest;
import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;

/** {@code residue SERIES}. */
@Command(
        name = "residue",
        description = "The residue at u = p/2 from the first terms of a series by the truncated sum rule: by order, with"
                + " its error budget, scale scan, other estimators and null-test verdict.")
final class ResidueCommand extends ReportCommand {
    private static final int CHAIN_TERMS = 10;

    @Parameters(
            index = "0",
            paramLabel = "SERIES",
            description = "built-in series, or path of a series file; with --chain a kernel")
    private String name = "";

    @Option(
            names = "--nf",
            paramLabel = "N",
            defaultValue = "3",
            description = "massless flavours (nl for heavy quarks); default ${DEFAULT-VALUE}")
    private int nf;

    @Option(names = "--loops", paramLabel = "L", description = "use the first L terms only; default: all that are known")
    private @Nullable Integer loops;

    @Option(
            names = "--power",
            paramLabel = "p",
            description = "p = 2 u0, the power of Lambda/Q; negative for an ultraviolet singularity;"
                    + " default: the leading one")
    private @Nullable String power;

    @Option(
            names = "--exponent-shift",
            paramLabel = "delta",
            description = "shift of the exponent, (Lambda/Q)^p alpha^(-delta); default: as the series declares")
    private @Nullable String exponentShift;

    @Option(
            names = "--beta-loops",
            paramLabel = "B",
            description = "loops of the beta function, 1 to 5; default: 5, and 1 for a chain")
    private @Nullable Integer betaLoops;

    @Option(names = "--chain", description = "probe the first terms of the bubble chain of a kernel instead")
    private boolean chain;

    @Option(names = "--remove-nearer", description = "with --chain: take out all nearer poles exactly first")
    private boolean removeNearer;

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
        Optional<Rational> p = Optional.ofNullable(power).map(text -> ScaleOptions.rational("--power", text));
        return ResidueReport.of(SumRule.evaluate(chain ? chainRequest(p) : seriesRequest(p)));
    }

    private SumRuleRequest seriesRequest(Optional<Rational> p) {
        if (removeNearer) {
            throw new DomainException("--remove-nearer needs --chain: only there are the residues of nearer poles exact");
        }
        if (SeriesLibrary.builtIn(name).isEmpty() && KernelLibrary.contains(name)) {
            throw new DomainException("no published series of '" + name + "' is built in; give the path of a series file, or"
                    + " --chain to probe its bubble chain");
        }
        PerturbativeSeries series = SeriesLibrary.find(name);
        SumRuleRequest.Builder builder = SumRuleRequest.forSeries(series, nf);
        p.ifPresent(builder::power);
        if (loops != null) {
            builder.loops(loops);
        }
        if (exponentShift != null) {
            builder.exponentShift(ScaleOptions.rational("--exponent-shift", exponentShift));
        }
        if (betaLoops != null) {
            builder.betaLoops(betaLoops);
        }
        return builder.build();
    }

    private SumRuleRequest chainRequest(Optional<Rational> p) {
        if (exponentShift != null || betaLoops != null) {
            throw new DomainException("a chain runs at one loop and its exponents are exact; leave out --exponent-shift and"
                    + " --beta-loops");
        }
        return ChainSumRule.request(
                KernelLibrary.load(name), nf, loops == null ? CHAIN_TERMS : loops, p, removeNearer);
    }
}
