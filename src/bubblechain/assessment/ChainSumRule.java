package bubblechain.assessment;

import bubblechain.borel.BorelPlane;
import bubblechain.borel.BorelPole;
import bubblechain.borel.ChainPole;
import bubblechain.chain.Chain;
import bubblechain.chain.ChainOptions;
import bubblechain.chain.CoefficientReport;
import bubblechain.chain.Scales;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.Singularity;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.SingularityNote;
import bubblechain.qcd.Theory;
import bubblechain.report.Report;
import bubblechain.sumrule.Obstacle;
import bubblechain.sumrule.ResidueReport;
import bubblechain.sumrule.SumRule;
import bubblechain.sumrule.SumRuleRequest;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * The sum rule on the first terms of a chain, with every other pole of the chain stated with its exact strength; nearer
 * ones may be taken out exactly.
 */
public final class ChainSumRule {
    /** Poles up to this multiple of the probed distance are stated. */
    private static final Rational HORIZON = Rational.of(3);

    private ChainSumRule() {}

    /**
     * The request for {@link bubblechain.sumrule.SumRule}.
     *
     * @param loops        terms of the chain
     * @param power        p = 2 u0 of the singularity to probe; the nearest pole if absent
     * @param removeNearer take out the parts of all poles at smaller |u|
     */
    public static SumRuleRequest request(
            Kernel kernel, int nf, int loops, Optional<Rational> power, boolean removeNearer) {
        if (kernel.theory() != Theory.QCD) {
            throw new DomainException("the sum rule runs with the beta function of QCD; the kernel " + kernel.name()
                    + " belongs to " + kernel.theory());
        }
        if (kernel.theory().beta0(nf).isZero()) {
            throw new DomainException("beta0 is zero for nf = " + nf);
        }
        BorelPlane plane = BorelPlane.of(kernel, Scales.NATURAL);
        Rational p = power.orElseGet(() -> nearest(plane).multiply(2));
        if (p.isZero()) {
            throw new DomainException("the power p = 2 u0 of a singularity cannot be 0");
        }
        Rational u = p.divide(2);
        Rational horizon = u.abs().multiply(HORIZON);
        List<BorelPole> poles = plane.poles(horizon.negate(), horizon);
        List<ExactConstant> coefficients = Chain.of(kernel).exact(loops);
        if (removeNearer) {
            coefficients = ChainPole.remove(coefficients, laurentTerms(poles, u));
        }
        ChainOptions options = ChainOptions.DEFAULT.withFlavours(nf);
        SumRuleRequest.Builder builder = SumRuleRequest.forChain(kernel.name(), coefficients, nf, p)
                .prefactor(kernel.prefactor().value(kernel.theory(), nf))
                .inWords("bubble chain: " + options.words(kernel) + (removeNearer ? removedInWords(poles, u) : ""));
        plane.poleAt(u).ifPresent(pole -> builder.exponentShift(Rational.of(pole.pole().order() - 1L)));
        for (BorelPole pole : poles) {
            if (!pole.u().equals(u)) {
                builder.obstacle(obstacle(pole, removeNearer && isNearer(pole, u)));
            }
        }
        return builder.build();
    }

    /** The answer to such a request, with the sources and cautions of the kernel. */
    public static Report report(Kernel kernel, SumRuleRequest request) {
        Report answer = ResidueReport.of(SumRule.evaluate(request));
        List<String> sources = new ArrayList<>(kernel.sources());
        sources.addAll(answer.sources());
        List<String> cautions = new ArrayList<>(kernel.cautions());
        cautions.addAll(answer.cautions());
        cautions.add(CoefficientReport.MODEL_CAUTION);
        return new Report(
                answer.command(), answer.request(), answer.normalisation(), answer.blocks(), sources, cautions);
    }

    private static String removedInWords(List<BorelPole> poles, Rational u) {
        String removed = poles.stream()
                .filter(pole -> isNearer(pole, u))
                .map(pole -> pole.u().toString())
                .collect(Collectors.joining(", "));
        return removed.isEmpty()
                ? "; no pole is nearer than u = " + u
                : "; the parts of the nearer poles at u = " + removed + " are taken out of c_n exactly";
    }

    private static Rational nearest(BorelPlane plane) {
        List<BorelPole> ends = new ArrayList<>();
        plane.leadingInfrared().ifPresent(ends::add);
        plane.leadingUltraviolet().ifPresent(ends::add);
        return ends.stream()
                .map(BorelPole::u)
                .min((a, b) -> a.abs().compareTo(b.abs()))
                .orElseThrow(() -> new DomainException("the kernel " + plane.kernel().name()
                        + " has no pole near the origin; give --power"));
    }

    private static boolean isNearer(BorelPole pole, Rational u) {
        return pole.u().abs().compareTo(u.abs()) < 0;
    }

    private static List<ChainPole> laurentTerms(List<BorelPole> poles, Rational u) {
        List<ChainPole> terms = new ArrayList<>();
        for (BorelPole pole : poles) {
            if (isNearer(pole, u)) {
                terms.addAll(pole.terms());
            }
        }
        return terms;
    }

    /** The strongest Laurent term of a pole stands for it. */
    private static Obstacle obstacle(BorelPole pole, boolean removed) {
        int order = pole.pole().order();
        ChainPole leading = pole.terms().get(order - 1);
        Singularity.Kind kind = pole.kind() == SingularityNote.Kind.IR ? Singularity.Kind.IR : Singularity.Kind.UV;
        String operator = pole.note().flatMap(SingularityNote::operator).orElse("");
        return new Obstacle(
                pole.u(), kind, operator, Rational.of(order - 1L), Optional.of(leading.strength()), removed);
    }
}
