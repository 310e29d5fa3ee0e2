package bubblechain.assessment;

import bubblechain.borel.BorelPlane;
import bubblechain.borel.BorelPole;
import bubblechain.chain.Chain;
import bubblechain.chain.FlavourTerm;
import bubblechain.chain.Rendering;
import bubblechain.chain.Scales;
import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.PerturbativeSeries;
import bubblechain.fixedorder.SeriesLibrary;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import bubblechain.qcd.Coupling;
import bubblechain.qcd.Normalisation;
import bubblechain.qcd.Theory;
import bubblechain.sumrule.SumRule;
import bubblechain.sumrule.SumRuleRequest;
import bubblechain.sumrule.SumRuleResult;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;

/**
 * One residue determined three ways, and the coefficients behind it compared.
 *
 * <p>Definitions: K is the strength of K (1 - 2u/p)^(-1-b) in the Borel transform of the full quantity, N = beta0 K/(4 pi).
 * In the chain b = 0 and K = -prefactor x R/u0 with the exact Laurent residue R.
 *
 * @param kernel        the chain
 * @param series        the published series
 * @param nf            massless flavours
 * @param power         p = 2 u0 of the singularity
 * @param pole          the pole of the chain there, if there is one
 * @param chainStrength exact K of the chain, prefactor included; zero if the chain has no pole there
 * @param chainOrders   K by the telescoped sum rule from c_0 .. c_k, k = 0, 1, ..., prefactor included
 * @param measured      the sum rule on the published series
 * @param orders        coefficients order by order
 */
public record CrossCheck(
        Kernel kernel,
        PerturbativeSeries series,
        int nf,
        Rational power,
        Optional<BorelPole> pole,
        ExactConstant chainStrength,
        List<ExactConstant> chainOrders,
        SumRuleResult measured,
        List<OrderComparison> orders) {
    /** Terms of the chain whose telescoped sum rule is shown. */
    public static final int CHAIN_TERMS = 12;

    private static final int BITS = 256;

    public CrossCheck {
        chainOrders = List.copyOf(chainOrders);
        orders = List.copyOf(orders);
    }

    /**
     * One order of the published series beside the chain, in alpha^n/pi^n of the full quantity.
     *
     * @param loops        n
     * @param published    the published coefficient at nf
     * @param chain        prefactor x c_(n-1) (beta0/4)^n: naive non-abelianization
     * @param flavourTerm  the chain's nf^(n-1) term
     * @param publishedFlavourTerm the published nf^(n-1) term; empty if the series is known at one nf only and n > 1
     */
    public record OrderComparison(
            int loops,
            ExactConstant published,
            ExactConstant chain,
            ExactConstant flavourTerm,
            Optional<ExactConstant> publishedFlavourTerm) {
        /** True if the two nf^(n-1) terms are the same closed form. */
        public boolean flavourTermsEqual() {
            return publishedFlavourTerm.filter(flavourTerm::equals).isPresent();
        }
    }

    /**
     * Compares a kernel with a series.
     *
     * @param power p = 2 u0 of the singularity to measure; the leading one declared by the series if absent
     * @throws DomainException if the chain has a multiple pole there, or nf is out of range
     */
    public static CrossCheck of(Kernel kernel, PerturbativeSeries series, int nf, Optional<Rational> power) {
        Rational p = power.orElse(series.power());
        if (kernel.theory() != Theory.QCD) {
            throw new DomainException("the kernel " + kernel.name() + " belongs to " + kernel.theory() + ", the series "
                    + series.name() + " to QCD; there is nothing to compare");
        }
        Rational u = p.divide(2);
        Optional<BorelPole> pole = BorelPlane.of(kernel, Scales.NATURAL).poleAt(u);
        if (pole.isPresent() && pole.get().pole().order() > 1) {
            throw new DomainException("the chain has a pole of order " + pole.get().pole().order() + " at u = " + u
                    + "; a residue is compared at simple poles only");
        }
        SumRuleResult measured =
                SumRule.evaluate(SumRuleRequest.forSeries(series, nf).power(p).build());
        ExactConstant prefactor = kernel.prefactor().value(kernel.theory(), nf);
        ExactConstant strength = pole.flatMap(BorelPole::strength).orElse(ExactConstant.ZERO).multiply(prefactor);
        List<ExactConstant> chain = Chain.of(kernel).exact(CHAIN_TERMS);
        return new CrossCheck(
                kernel, series, nf, p, pole, strength, telescoped(chain, nf, p, prefactor), measured,
                compare(kernel, series, nf, chain));
    }

    private static List<ExactConstant> telescoped(
            List<ExactConstant> chain, int nf, Rational power, ExactConstant prefactor) {
        List<ExactConstant> bare = SumRule.exactStrengths(
                SumRuleRequest.forChain("chain", chain, nf, power).build());
        return bare.stream().map(k -> k.multiply(prefactor)).toList();
    }

    private static List<OrderComparison> compare(
            Kernel kernel, PerturbativeSeries series, int nf, List<ExactConstant> chain) {
        Rendering full = Rendering.of(kernel, Coupling.ALPHA_OVER_PI, Normalisation.FULL, OptionalInt.of(nf));
        List<ExactConstant> naive = full.applyToExact(chain);
        List<ExactConstant> published = series.inAlphaOverPi(nf, 0).values();
        ExactConstant prefactor = series.prefactor(nf);
        ExactConstant unit = series.coupling().inUnitsOf(Coupling.ALPHA_OVER_PI, Rational.ONE);
        List<OrderComparison> rows = new ArrayList<>();
        for (int n = 1; n <= Math.min(series.loops(), chain.size()); n++) {
            int loops = n;
            rows.add(new OrderComparison(
                    n,
                    published.get(n - 1).multiply(prefactor),
                    naive.get(n - 1),
                    FlavourTerm.perAlphaOverPi(kernel, n - 1, chain.get(n - 1)),
                    publishedFlavourTerm(series, n).map(c -> c.multiply(prefactor).multiply(unit.power(loops)))));
        }
        return rows;
    }

    private static Optional<ExactConstant> publishedFlavourTerm(PerturbativeSeries series, int loops) {
        return series.isForOneFlavourNumber() && loops > 1
                ? Optional.empty()
                : Optional.of(series.leadingFlavourCoefficient(loops));
    }

    /** Names that stand for both a built-in kernel and the built-in series it mimics. */
    public static List<String> names() {
        return SeriesLibrary.names().stream()
                .filter(KernelLibrary::contains)
                .filter(name -> KernelLibrary.load(name).series().filter(name::equals).isPresent())
                .toList();
    }

    /**
     * Every built-in quantity with both a kernel and a series, each at the leading singularity of its series.
     *
     * @param nf massless flavours; a series known at other numbers only is taken at the nearest of them
     */
    public static List<CrossCheck> all(int nf) {
        return names().stream().map(name -> ofBuiltIn(name, nf)).toList();
    }

    private static CrossCheck ofBuiltIn(String name, int nf) {
        PerturbativeSeries series = SeriesLibrary.find(name);
        return of(KernelLibrary.load(name), series, series.flavours().nearest(nf), Optional.empty());
    }

    /** N = beta0 K/(4 pi) for a strength K with prefactor. */
    public ExactConstant normalisation(ExactConstant strength) {
        return strength.multiply(kernel.theory().beta0(nf).divide(4)).multiply(ExactConstant.PI.inverse());
    }

    /** The measured N over the exact N of the chain; empty if the chain has no pole there. */
    public Optional<Ball> measuredOverChain() {
        if (chainStrength.isZero()) {
            return Optional.empty();
        }
        Ball chain = normalisation(chainStrength).toBall(BITS);
        return Optional.of(measured.normalisation(measured.loops()).divide(chain, BITS));
    }

    /** The input error of a published coefficient of (alpha_s/pi)^loops, prefactor included. */
    double publishedError(int loops) {
        double variance = 0;
        for (List<ExactConstant> source : series.inAlphaOverPi(nf, 0).sources()) {
            variance += Math.pow(source.get(loops - 1).toBall(BITS).toDouble(), 2);
        }
        return Math.sqrt(variance) * Math.abs(series.prefactor(nf).toBall(BITS).toDouble());
    }

    /** True if every published nf^(n-1) term that is known is the chain's, in closed form. */
    public boolean flavourTermsAgree() {
        return orders.stream().limit(flavourLoops()).allMatch(OrderComparison::flavourTermsEqual);
    }

    /** Loops through which the published nf^(n-1) terms are known. */
    public int flavourLoops() {
        return (int) orders.stream().takeWhile(row -> row.publishedFlavourTerm().isPresent()).count();
    }

    /** True if no pole of the chain is as near to the origin: then the sum rule on its first terms has a limit. */
    public boolean isNearest() {
        Rational u = power.divide(2);
        return BorelPlane.of(kernel, Scales.NATURAL).poles(u.abs().negate(), u.abs()).stream()
                .allMatch(other -> other.u().equals(u));
    }

    /** The verdict in one sentence. */
    public String verdict() {
        String published = "sum rule on the published series: singularity at u = " + power.divide(2) + ": "
                + measured.verdict().text();
        String chain = pole.isPresent() ? "chain: simple pole there" : "chain: no pole there";
        return published + "; " + chain + "; " + flavoursInWords();
    }

    private String flavoursInWords() {
        if (!flavourTermsAgree()) {
            return "the nf^n terms DIFFER: the kernel does not describe this series";
        }
        int known = flavourLoops();
        String agreement = "the nf^n terms agree exactly through " + known + (known == 1 ? " loop" : " loops");
        return known == orders.size() ? agreement : agreement + ", beyond they are not known (series at one nf only)";
    }
}
