package bubblechain.assessment;

import bubblechain.chain.CoefficientReport;
import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.report.Block;
import bubblechain.report.CertainDigits;
import bubblechain.report.Facts;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import bubblechain.sumrule.ResidueReport;
import bubblechain.sumrule.SumRuleResult;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Shows a cross-check. */
public final class CrossCheckReport {
    private static final int BITS = 256;
    private static final int DIGITS = 8;

    private CrossCheckReport() {}

    public static Report of(CrossCheck check) {
        Report.Builder report = Report.builder("crosscheck")
                .request("kernel", check.kernel().name())
                .request("series", check.series().name())
                .request("nf", Integer.toString(check.nf()))
                .request("power", check.power().toString())
                .normalisation(check.series().inWords(check.nf()) + "; K = strength of (1 - 2u/p)^(-1-b), prefactor"
                        + " included, N = beta0 K/(4 pi)");
        blocks(check).forEach(report::add);
        sourcesOf(check).forEach(report::source);
        cautionsOf(check).forEach(report::caution);
        return report.build();
    }

    /** The tables, for use inside another report. Keys: comparison, chain_orders, published_orders, coefficients. */
    static List<Block> blocks(CrossCheck check) {
        return List.of(comparison(check), chainOrders(check), publishedOrders(check), coefficients(check));
    }

    static List<String> sourcesOf(CrossCheck check) {
        List<String> sources = new ArrayList<>(check.kernel().sources());
        sources.addAll(ResidueReport.sources(check.measured()));
        return sources;
    }

    static List<String> cautionsOf(CrossCheck check) {
        List<String> cautions = new ArrayList<>(check.kernel().cautions());
        cautions.addAll(ResidueReport.cautions(check.measured()));
        cautions.add(CoefficientReport.MODEL_CAUTION);
        cautions.add("The chain has b = 0: its N may overshoot the measured one while its coefficients do not;"
                + " compare both columns.");
        return cautions;
    }

    /** The three determinations and the verdict. */
    static Facts comparison(CrossCheck check) {
        SumRuleResult measured = check.measured();
        double error = measured.normalisationErrors().combined();
        Facts facts = Facts.titled(
                        "comparison", "Residue at u = " + check.power().divide(2) + " (p = " + check.power() + ")")
                .with("verdict", "verdict", Value.text(check.verdict()));
        if (check.pole().isPresent()) {
            ExactConstant residue = check.pole().get().pole().residue();
            facts = facts.with("chain_R_u", "chain: Laurent residue R_u, no prefactor", exact(residue))
                    .with("chain_K_exact", "chain: K = -prefactor R_u/u0", exact(check.chainStrength()))
                    .with("chain_K", "chain: K", number(check.chainStrength()));
        }
        facts = facts.with("chain_N", "chain: N, exact", number(check.normalisation(check.chainStrength())))
                .with(
                        "published_N", "published series: N from " + measured.loops() + " loops",
                        CertainDigits.withError(measured.normalisation(measured.loops()), error))
                .with("published_N_error", "  +- (truncation, scale, input, beta)", CertainDigits.error(error))
                .with("null_test", "null test on the published series", Value.text(measured.verdict().text()));
        Optional<Value> ratio = ratio(check);
        return ratio.isPresent() ? facts.with("published_over_chain", "published N / chain N", ratio.get()) : facts;
    }

    /** Measured N over the N of the chain, to the place of the error; empty if the chain has no pole there. */
    static Optional<Value> ratio(CrossCheck check) {
        double error = check.measured().normalisationErrors().combined();
        Ball measured = check.measured().normalisation(check.measured().loops());
        return check.measuredOverChain()
                .map(r -> CertainDigits.withError(r, Math.abs(error * r.toDouble() / measured.toDouble())));
    }

    private static Value exact(ExactConstant value) {
        return value.isClosedForm() ? Value.exact(value.toString()) : Value.absent();
    }

    private static Value number(ExactConstant value) {
        return CertainDigits.of(value.toBall(BITS), DIGITS);
    }

    private static Table chainOrders(CrossCheck check) {
        String limit = check.isNearest() ? "tends to the exact N" : "another pole is as near or nearer: it has no limit";
        Table.Builder table = Table.builder("chain_orders", "Sum rule on the first terms of the chain (" + limit + ")")
                .column("loops", "loops")
                .column("K", "K")
                .column("N", "N")
                .column("N_over_exact", "N/exact");
        ExactConstant exact = check.normalisation(check.chainStrength());
        for (int k = 0; k < check.chainOrders().size(); k++) {
            ExactConstant strength = check.chainOrders().get(k);
            ExactConstant normalisation = check.normalisation(strength);
            table.row(
                    Value.count(k + 1L), number(strength), number(normalisation),
                    exact.isZero()
                            ? Value.absent()
                            : CertainDigits.of(
                                    normalisation.toBall(BITS).divide(exact.toBall(BITS), BITS), DIGITS));
        }
        return table.build();
    }

    private static Table publishedOrders(CrossCheck check) {
        SumRuleResult measured = check.measured();
        Table.Builder table = Table.builder("published_orders", "Sum rule on the published series, by order")
                .column("loops", "loops")
                .column("K", "K")
                .column("N", "N");
        for (int n = 1; n <= measured.loops(); n++) {
            double error = measured.inputErrors().get(n - 1);
            table.row(
                    Value.count(n), CertainDigits.withError(measured.strength(n), error),
                    CertainDigits.withError(measured.normalisation(n), error * measured.normalisationPerStrength()));
        }
        return table.build();
    }

    private static Table coefficients(CrossCheck check) {
        Table.Builder table = Table.builder(
                        "coefficients", "Coefficients of (alpha_s/pi)^loops: the chain beside the published series")
                .column("loops", "loops")
                .column("published", "published")
                .column("chain", "chain")
                .column("chain_over_published", "chain/published")
                .column("nf_term", "nf^n term")
                .column("nf_term_agrees", "agrees with published");
        for (CrossCheck.OrderComparison row : check.orders()) {
            Ball published = row.published().toBall(BITS);
            Ball chain = row.chain().toBall(BITS);
            double error = check.publishedError(row.loops());
            table.row(
                    Value.count(row.loops()), CertainDigits.withError(published, error), CertainDigits.of(chain, DIGITS),
                    published.containsZero()
                            ? Value.absent()
                            : CertainDigits.withError(
                                    chain.divide(published, BITS),
                                    Math.abs(error * chain.toDouble() / Math.pow(published.toDouble(), 2))),
                    number(row.flavourTerm()),
                    row.publishedFlavourTerm().isPresent() ? Value.flag(row.flavourTermsEqual()) : Value.absent());
        }
        return table.build();
    }
}
