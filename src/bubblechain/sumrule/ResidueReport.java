package bubblechain.sumrule;

import bubblechain.exact.Ball;
import bubblechain.exact.BallFunctions;
import bubblechain.exact.Rational;
import bubblechain.qcd.BetaFunction;
import bubblechain.report.Block;
import bubblechain.report.CertainDigits;
import bubblechain.report.Facts;
import bubblechain.report.Note;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.stream.Collectors;

/** The answer of the sum rule as a report: orders, value with error, error budget, scan, estimators, verdict. */
public final class ResidueReport {
    private static final int BITS = 256;

    private final SumRuleResult result;
    private final SumRuleRequest request;
    private final boolean prefixed;

    private ResidueReport(SumRuleResult result) {
        this.result = result;
        this.request = result.request();
        this.prefixed = request.prefactor().asRational().filter(Rational.ONE::equals).isEmpty();
    }

    /** The whole report of the command {@code residue}. */
    public static Report of(SumRuleResult result) {
        Report.Builder builder = Report.builder("residue")
                .request("series", result.request().name())
                .request("nf", String.valueOf(result.request().beta().nf()))
                .request("loops", String.valueOf(result.loops()))
                .request("power", result.request().power().toString())
                .request("exponent_shift", shift(result.request()))
                .request("beta_loops", String.valueOf(result.request().beta().loops()))
                .normalisation(result.request().inWords());
        blocks(result).forEach(builder::add);
        sources(result).forEach(builder::source);
        cautions(result).forEach(builder::caution);
        return builder.build();
    }

    private static String shift(SumRuleRequest request) {
        return request.exponentShift().map(Rational::toString).orElse("unknown, 0 used");
    }

    /**
     * The parts shown, for use inside another report. Keys: orders, value, errors, verdict, verdict_unblocked,
     * blocked_by, scan, estimators, formulas.
     */
    public static List<Block> blocks(SumRuleResult result) {
        ResidueReport report = new ResidueReport(result);
        List<Block> blocks = new ArrayList<>();
        blocks.add(report.orders());
        blocks.add(report.value());
        blocks.add(report.errors());
        blocks.add(report.verdict());
        if (!result.blockedBy().isEmpty()) {
            blocks.add(new Note("In the way: "
                    + result.blockedBy().stream()
                            .map(b -> "u = " + b.obstacle().position() + ", " + b.reason())
                            .collect(Collectors.joining("; "))
                    + "."));
        }
        blocks.add(report.blockedBy());
        blocks.add(report.scan());
        blocks.add(report.estimators());
        blocks.add(report.formulas());
        return blocks;
    }

    /** Bibliography keys: of the series, the beta coefficients used and the method. */
    public static List<String> sources(SumRuleResult result) {
        Set<String> keys = new LinkedHashSet<>(result.request().sources());
        int highest = Math.min(result.loops(), result.request().beta().loops() - 1);
        for (int k = 0; k <= highest; k++) {
            keys.addAll(BetaFunction.sources(k));
        }
        keys.addAll(SumRule.SOURCES);
        return List.copyOf(keys);
    }

    /** What the reader must know before quoting the value. */
    public static List<String> cautions(SumRuleResult result) {
        SumRuleRequest request = result.request();
        List<String> cautions = new ArrayList<>(request.cautions());
        cautions.add("A value from a few terms has a truncation error: see how it moved with the order and with lambda.");
        if (request.exponentShift().isEmpty()) {
            cautions.add("The exponent shift delta of this singularity is unknown and taken as 0; with a wrong exponent the"
                    + " full sum is 0 or infinite, so no value in MeV follows from K.");
        }
        int known = request.beta().loops();
        if (known > 1 && result.loops() > known - 1) {
            cautions.add("With " + result.loops() + " terms the sum rule uses beta_0 to beta_" + result.loops()
                    + "; those beyond beta_" + (known - 1) + " are set to zero.");
        }
        if (request.power().signum() < 0) {
            cautions.add("An ultraviolet singularity gives no ambiguity on the positive axis; P is not defined.");
        }
        return cautions;
    }

    private Table orders() {
        Table.Builder table = Table.builder("orders", "Sum rule by order")
                .column("loops", "loops")
                .column("K", "K");
        if (prefixed) {
            table.column("K_bare", "K without prefactor");
        }
        if (request.isSimplePole()) {
            table.column("R_u", "R_u without prefactor");
        }
        table.column("N", "N");
        if (!result.ambiguities().isEmpty()) {
            table.column("P", "P");
        }
        for (int n = 1; n <= result.loops(); n++) {
            table.row(orderRow(n));
        }
        return table.build();
    }

    private List<Value> orderRow(int n) {
        List<Value> row = new ArrayList<>();
        row.add(Value.count(n));
        row.add(order(result.strength(n), result.strength(n), n));
        if (prefixed) {
            row.add(order(result.bareStrength(n), result.strength(n), n));
        }
        result.laurentResidue(n).ifPresent(r -> row.add(order(r, result.strength(n), n)));
        row.add(order(result.normalisation(n), result.strength(n), n));
        result.ambiguity(n).ifPresent(p -> row.add(order(p, result.strength(n), n)));
        return row;
    }

    /** A multiple of K with the same relative input error. */
    private Value order(Ball value, Ball strength, int n) {
        double k = Math.abs(strength.toDouble());
        double error = result.inputErrors().get(n - 1);
        return CertainDigits.withError(value, k == 0 ? error : error / k * Math.abs(value.toDouble()));
    }

    private Facts value() {
        int last = result.loops();
        Facts facts = Facts.titled("value", "Value")
                .with("K", "K", withError(result.strength(last), result.errors()))
                .with("N", "N", withError(result.normalisation(last), result.normalisationErrors()));
        Optional<Ball> ambiguity = result.ambiguity(last);
        Optional<ErrorBudget> errors = result.ambiguityErrors();
        return ambiguity.isPresent() && errors.isPresent()
                ? facts.with("P", "P", withError(ambiguity.get(), errors.get()))
                : facts;
    }

    private static Value withError(Ball value, ErrorBudget budget) {
        double error = budget.combined();
        return Value.group(Facts.titled("", "")
                .with("value", "value", CertainDigits.withError(value, error))
                .with("error", "error", CertainDigits.error(error)));
    }

    private Facts errors() {
        ErrorBudget budget = result.errors();
        return Facts.titled("errors", "Error of K at the last order")
                .with("scale", "half the spread over lambda", CertainDigits.error(budget.scale()))
                .with("last_step", "last step", CertainDigits.error(budget.lastStep()))
                .with("input", "input errors", CertainDigits.error(budget.input()))
                .with("beta", "highest beta coefficient dropped", CertainDigits.error(budget.beta()))
                .with(
                        "combined",
                        "sqrt(max(scale, last step)^2 + input^2 + beta^2)",
                        CertainDigits.error(budget.combined()));
    }

    private Facts verdict() {
        Facts facts = Facts.titled("", "")
                .with("verdict", "Singularity at u = " + request.position(), Value.text(result.verdict().text()));
        return result.blockedBy().isEmpty()
                ? facts
                : facts.with(
                        "verdict_unblocked",
                        "Verdict if nothing stood in the way",
                        Value.text(result.unblockedVerdict().text()));
    }

    private Table blockedBy() {
        Table.Builder table = Table.builder("blocked_by", "Singularities in the way")
                .column("u", "u")
                .column("kind", "kind")
                .column("operator", "operator")
                .column("contamination", "relative part of the last order")
                .column("reason", "reason");
        for (BlockedBy blocked : result.blockedBy()) {
            table.row(
                    Value.exact(blocked.obstacle().position().toString()),
                    Value.text(blocked.obstacle().kind().name()),
                    Value.text(blocked.obstacle().operator()),
                    Value.orAbsent(blocked.contamination().map(CertainDigits::error)),
                    Value.text(blocked.reason()));
        }
        return table.build();
    }

    private Table scan() {
        Table.Builder table = Table.builder("scan", "Last order with f rewritten at lambda R")
                .column("lambda", "lambda")
                .column("K", "K")
                .column("N", "N");
        double error = result.inputErrors().get(result.loops() - 1);
        Ball prefactor = request.prefactor().toBall(BITS);
        for (ScanPoint point : result.scan()) {
            Ball k = point.strengths().get(result.loops() - 1).multiply(prefactor, BITS);
            table.row(
                    Value.exact(point.lambda().toString()),
                    CertainDigits.withError(k, error),
                    CertainDigits.withError(normalisation(k), error * result.normalisationPerStrength()));
        }
        return table.build();
    }

    private Ball normalisation(Ball strength) {
        return strength.multiply(request.beta().beta0(), BITS)
                .divide(BallFunctions.pi(BITS), BITS)
                .shift(-2);
    }

    private Table estimators() {
        Table.Builder table = Table.builder("estimators", "N from three estimators")
                .column("loops", "loops")
                .column("sum_rule", "sum rule")
                .column("ratio", "ratio to the large-order formula")
                .column("truncated_residue", "truncated residue");
        for (int n = 1; n <= result.loops(); n++) {
            table.row(estimatorRow(n));
        }
        return table.build();
    }

    private List<Value> estimatorRow(int n) {
        Ball k = result.strength(n);
        Optional<Value> ratio = result.ratios().get(n - 1).map(r -> order(normalisation(r), k, n));
        return List.of(
                Value.count(n),
                order(result.normalisation(n), k, n),
                Value.orAbsent(ratio),
                order(normalisation(result.truncatedResidues().get(n - 1)), k, n));
    }

    private Facts formulas() {
        Facts facts = Facts.titled("formulas", "Meaning")
                .with("K", "K", Value.text("strength of (1 - u/u0)^(-1-b-delta) in the Borel transform B(u),"
                        + " f = int_0^inf du e^(-u/a) B(u), a = beta0 alpha_s/(4 pi)"
                        + (prefixed ? ", prefactor " + request.prefactor() + " included" : "")));
        if (request.isSimplePole()) {
            facts = facts.with("R_u", "R_u", Value.text("Laurent residue in u - u0, prefactor not included; K = -R_u/u0"
                    + (prefixed ? " times the prefactor" : "")));
        }
        facts = facts.with("N", "N", Value.text("beta0 K/(4 pi)"));
        if (!result.ambiguities().isEmpty()) {
            String formula = request.power().equals(Rational.ONE) && request.shiftUsed().isZero()
                    ? "2 pi N/(beta0 Gamma(1+b)); |Im f|/pi = P Lambda_t/R"
                    : "(p/2) p^nu K/Gamma(1+nu), nu = b + delta;"
                            + " |Im f|/pi = P (Lambda_t/R)^p (2 beta0 alpha_s/(4 pi))^(-delta)";
            facts = facts.with("P", "P", Value.text(formula));
        }
        Rational b = request.power().multiply(request.beta().b1hat());
        return facts.with("b", "b = p beta1/(2 beta0^2)", Value.exact(b.toString()))
                .with("u0", "u0 = p/2", Value.exact(request.position().toString()));
    }
}
