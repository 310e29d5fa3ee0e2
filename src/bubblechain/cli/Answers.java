package bubblechain.cli;

import bubblechain.assessment.AssessmentReport;
import bubblechain.assessment.ChainSumRule;
import bubblechain.assessment.CrossCheck;
import bubblechain.assessment.CrossCheckReport;
import bubblechain.assessment.CrossCheckTable;
import bubblechain.assessment.KernelList;
import bubblechain.assessment.KernelReport;
import bubblechain.assessment.Validation;
import bubblechain.assessment.ValidationReport;
import bubblechain.borel.PolesReport;
import bubblechain.chain.ChainCost;
import bubblechain.chain.ChainOptions;
import bubblechain.chain.CoefficientReport;
import bubblechain.chain.Scheme;
import bubblechain.exact.DomainException;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.PerturbativeSeries;
import bubblechain.fixedorder.SeriesLibrary;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import bubblechain.qcd.Coupling;
import bubblechain.qcd.Normalisation;
import bubblechain.report.Report;
import bubblechain.sumrule.ResidueReport;
import bubblechain.sumrule.SumRule;
import bubblechain.sumrule.SumRuleRequest;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.TreeMap;
import org.jspecify.annotations.Nullable;

/**
 * What each command asks the library for. It stands apart from the command classes so that those, which are all made at
 * every start, pull in nothing that another command does not need.
 */
final class Answers {
    private static final int CHAIN_TERMS = 10;

    private Answers() {}

    static Report kernels(KernelsCommand c) {
        Optional<String> name = oneKernel(c);
        if (name.isEmpty()) {
            return KernelList.matching(words(c)).report();
        }
        Kernel kernel = KernelLibrary.load(name.get(), parameters(c.family));
        return asked(KernelReport.describe(kernel, KernelLibrary.field(name.get())), parameterEntries(c.family));
    }

    /** The papers behind the kernels asked for. */
    static String bibtex(KernelsCommand c, boolean formatGiven) {
        if (formatGiven) {
            throw new DomainException("--bibtex is a format of its own; leave out --format");
        }
        return oneKernel(c)
                .map(name -> KernelList.bibtex(KernelLibrary.load(name, parameters(c.family))))
                .orElseGet(() -> KernelList.matching(words(c)).bibtex());
    }

    /** The built-in name or the file, if one is given; everything else is searched for. */
    private static Optional<String> oneKernel(KernelsCommand c) {
        Optional<String> name = c.words.size() == 1 && c.search.isBlank()
                ? Optional.of(c.words.get(0)).filter(KernelLibrary::isNameOrFile)
                : Optional.empty();
        if (name.isEmpty() && !c.family.parameters.isEmpty()) {
            throw new DomainException("--parameter needs the name of one kernel or the path of a file");
        }
        return name;
    }

    private static List<String> words(KernelsCommand c) {
        String all = String.join(" ", c.words) + " " + c.search;
        return List.of(all.strip().split("\\s+"));
    }

    static Report coefficients(CoefficientsCommand c) {
        ChainOptions options = options(c.scales, Coupling.parse(c.coupling), Normalisation.parse(c.normalise));
        Kernel kernel = KernelLibrary.load(c.name, parameters(c.family));
        Report report = CoefficientReport.of(
                c.anomalousDimension ? kernel.anomalousDimensionAsKernel() : kernel, options, c.loops, c.digits, c.exact,
                c.flavourTerms);
        return asked(report, parameterEntries(c.family));
    }

    static Report poles(PolesCommand c) {
        ChainOptions options = options(c.scales, Coupling.A, Normalisation.PREFACTOR);
        Kernel kernel = KernelLibrary.load(c.name, parameters(c.family));
        Report report = PolesReport.of(
                kernel, options, rational("--from", c.from), rational("--to", c.to), c.digits, c.shareOf);
        return asked(report, parameterEntries(c.family));
    }

    static Report residue(ResidueCommand c) {
        Map<String, String> flags =
                Map.of("chain", c.chain ? "yes" : "no", "remove_nearer", c.removeNearer ? "yes" : "no");
        if (!c.chain) {
            return asked(ResidueReport.of(SumRule.evaluate(seriesRequest(c))), flags);
        }
        Kernel kernel = KernelLibrary.load(c.name, parameters(c.family));
        Map<String, String> entries = new TreeMap<>(flags);
        entries.putAll(parameterEntries(c.family));
        return asked(ChainSumRule.report(kernel, chainRequest(c, kernel)), entries);
    }

    /** A report with more entries in its request. */
    private static Report asked(Report report, Map<String, String> more) {
        Map<String, String> request = new LinkedHashMap<>(report.request());
        request.putAll(new TreeMap<>(more));
        return new Report(
                report.command(), request, report.normalisation(), report.blocks(), report.sources(), report.cautions());
    }

    private static Map<String, String> parameterEntries(FamilyOption family) {
        Map<String, String> entries = new LinkedHashMap<>();
        for (Map.Entry<String, String> parameter : family.parameters.entrySet()) {
            entries.put("parameter_" + parameter.getKey(), parameter.getValue());
        }
        return entries;
    }

    private static SumRuleRequest seriesRequest(ResidueCommand c) {
        if (!c.family.parameters.isEmpty()) {
            throw new DomainException("--parameter needs --chain: a published series has no parameters");
        }
        if (c.removeNearer) {
            throw new DomainException("--remove-nearer needs --chain: only there are the residues of nearer poles exact");
        }
        if (SeriesLibrary.builtIn(c.name).isEmpty() && KernelLibrary.contains(c.name)) {
            throw new DomainException("no published series of '" + c.name + "' is built in; give the path of a series file,"
                    + " or --chain to probe its bubble chain");
        }
        SumRuleRequest.Builder builder = SumRuleRequest.forSeries(SeriesLibrary.find(c.name), c.nf);
        optionalRational("--power", c.power).ifPresent(builder::power);
        optionalRational("--exponent-shift", c.exponentShift).ifPresent(builder::exponentShift);
        optional(c.loops).ifPresent(builder::loops);
        optional(c.betaLoops).ifPresent(builder::betaLoops);
        return builder.build();
    }

    private static SumRuleRequest chainRequest(ResidueCommand c, Kernel kernel) {
        if (c.exponentShift != null || c.betaLoops != null) {
            throw new DomainException("a chain runs at one loop and its exponents are exact; leave out --exponent-shift and"
                    + " --beta-loops");
        }
        return ChainSumRule.request(
                kernel, c.nf, optional(c.loops).orElse(CHAIN_TERMS), optionalRational("--power", c.power),
                c.removeNearer);
    }

    static Report crosscheck(CrosscheckCommand c) {
        if (c.all) {
            return crosscheckAll(c);
        }
        Kernel kernel = KernelLibrary.load(chosen(c.kernel, c.name, "--kernel"), parameters(c.family));
        String series = c.series != null
                ? c.series
                : kernel.series().orElseThrow(() -> new DomainException(
                        "the kernel " + kernel.name() + " names no series; give --series"));
        Report report = CrossCheckReport.of(
                CrossCheck.of(kernel, SeriesLibrary.find(series), c.nf, optionalRational("--power", c.power)));
        return asked(report, parameterEntries(c.family));
    }

    private static Report crosscheckAll(CrosscheckCommand c) {
        if (c.name != null || c.kernel != null || c.series != null || c.power != null || !c.family.parameters.isEmpty()) {
            throw new DomainException("--all takes every quantity at the leading singularity of its series; leave out NAME,"
                    + " --kernel, --series, --power and --parameter");
        }
        return CrossCheckTable.report(CrossCheck.all(c.nf), c.nf);
    }

    private static String chosen(@Nullable String given, @Nullable String name, String option) {
        if (given == null && name == null) {
            throw new DomainException("name a quantity, or give --kernel and --series; " + option + " is missing");
        }
        return given != null ? given : String.valueOf(name);
    }

    static Report assess(AssessCommand c) {
        Kernel kernel = KernelLibrary.load(c.name, parameters(c.family));
        Optional<PerturbativeSeries> published = c.series == null
                ? kernel.series().flatMap(SeriesLibrary::builtIn)
                : Optional.of(SeriesLibrary.find(c.series));
        Report report = AssessmentReport.of(kernel, published, c.nf, c.loops, rational("--range", c.range));
        return asked(report, parameterEntries(c.family));
    }

    static Report validate(@Nullable String path) {
        List<Validation.Finding> findings = path == null ? Validation.library() : Validation.of(path);
        return ValidationReport.of(path == null ? "library" : path, findings);
    }

    static double estimatedSeconds(int loops, int digits) {
        return ChainCost.of(Math.max(1, loops), Math.max(1, digits)).seconds();
    }

    /** True if a validation found no failure. */
    static boolean allPassed(Report report) {
        return ValidationReport.allPassed(report);
    }

    private static ChainOptions options(ScaleOptions s, Coupling coupling, Normalisation normalisation) {
        return new ChainOptions(
                s.mu, s.operatorMu, coupling, normalisation, Scheme.parse(s.scheme), optional(s.nf),
                optional(s.couplingNf));
    }

    private static Map<String, Rational> parameters(FamilyOption family) {
        Map<String, Rational> values = new LinkedHashMap<>();
        for (Map.Entry<String, String> parameter : family.parameters.entrySet()) {
            values.put(parameter.getKey(), rational("--parameter " + parameter.getKey(), parameter.getValue()));
        }
        return values;
    }

    private static OptionalInt optional(@Nullable Integer value) {
        return value == null ? OptionalInt.empty() : OptionalInt.of(value);
    }

    private static Optional<Rational> optionalRational(String option, @Nullable String text) {
        return text == null ? Optional.empty() : Optional.of(rational(option, text));
    }

    private static Rational rational(String option, String text) {
        try {
            return Rational.parse(text);
        } catch (DomainException e) {
            throw new DomainException(option + ": " + e.getMessage(), e);
        }
    }
}
