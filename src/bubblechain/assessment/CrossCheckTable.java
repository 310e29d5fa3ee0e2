package bubblechain.assessment;

import bubblechain.chain.CoefficientReport;
import bubblechain.report.CertainDigits;
import bubblechain.report.Column;
import bubblechain.report.Note;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import bubblechain.sumrule.SumRuleResult;
import java.util.List;

/** Shows many cross-checks in one table, a row for each quantity. */
public final class CrossCheckTable {
    private static final int BITS = 256;
    private static final int DIGITS = 6;
    private static final List<Column> COLUMNS = List.of(
            Column.of("name", "name"), Column.of("nf", "nf"), Column.of("loops", "").dataOnly(), Column.of("u0", "u0"),
            Column.of("power", "p"), Column.of("chain_N", "chain N"), Column.of("published_N", "series N"),
            Column.of("published_N_error", "+-"), Column.of("published_over_chain", "ratio"),
            Column.of("null_test", "singularity"), Column.of("nf_terms", "nf^n agree").textOnly(),
            Column.of("nf_terms_agree", "").dataOnly(), Column.of("nf_terms_loops", "").dataOnly());

    private CrossCheckTable() {}

    /**
     * The table of the command {@code crosscheck --all}. Key: quantities.
     *
     * @param checks at least one
     * @param nf     massless flavours asked for; a check may have others if its series is not known there
     */
    public static Report report(List<CrossCheck> checks, int nf) {
        Report.Builder report = Report.builder("crosscheck")
                .request("all", "yes")
                .request("nf", Integer.toString(nf))
                .normalisation("K = strength of (1 - u/u0)^(-1-b), prefactor included, u0 = p/2, N = beta0 K/(4 pi)")
                .add(table(checks));
        report.add(new Note("chain N: exact; series N: truncated sum rule on all known terms, error from truncation, scale, input"
                + " and beta function; 'cannot tell': too few terms, or a singularity as near stands in the way."
                + " 'bubblechain crosscheck NAME' shows the rest."));
        for (CrossCheck check : checks) {
            CrossCheckReport.sourcesOf(check).forEach(report::source);
        }
        report.caution(CoefficientReport.MODEL_CAUTION);
        report.caution("Cautions of the single series are left out here; 'bubblechain crosscheck NAME' states them.");
        return report.build();
    }

    private static Table table(List<CrossCheck> checks) {
        return new Table(
                "quantities", "Bubble chain and published series at the leading singularity", COLUMNS,
                checks.stream().map(CrossCheckTable::row).toList());
    }

    private static List<Value> row(CrossCheck check) {
        SumRuleResult measured = check.measured();
        double error = measured.normalisationErrors().combined();
        return List.of(
                Value.text(check.series().name()),
                Value.count(check.nf()),
                Value.count(measured.loops()),
                Value.exact(check.power().divide(2).toString()),
                Value.exact(check.power().toString()),
                CertainDigits.of(check.normalisation(check.chainStrength()).toBall(BITS), DIGITS),
                CertainDigits.withError(measured.normalisation(measured.loops()), error),
                CertainDigits.error(error),
                Value.orAbsent(CrossCheckReport.ratio(check)),
                Value.text(measured.verdict().text()),
                Value.text(check.flavourTermsAgree() ? "to loop " + check.flavourLoops() : "NO"),
                Value.flag(check.flavourTermsAgree()),
                Value.count(check.flavourLoops()));
    }
}
