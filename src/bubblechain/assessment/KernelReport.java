package bubblechain.assessment;

import bubblechain.analytic.AnalyticFunction;
import bubblechain.borel.NearestPoles;
import bubblechain.exact.DomainException;
import bubblechain.formula.FormulaException;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.SingularityNote;
import bubblechain.report.Column;
import bubblechain.report.Facts;
import bubblechain.report.Note;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Shows one kernel. */
public final class KernelReport {
    /** Status of poles that are there but outside the class of formulas in which they can be listed. */
    private static final String NOT_LISTED = "not-listed";

    private KernelReport() {}

    /**
     * Everything a kernel file says, and where its nearest poles are.
     *
     * @param field the part of the library it belongs to; empty for a file of the user's own
     */
    public static Report describe(Kernel kernel, Optional<String> field) {
        Facts facts = Facts.titled("kernel", kernel.title())
                .with("name", "name", Value.text(kernel.name()))
                .with("field", "field", Value.orAbsent(field.map(Value::text)))
                .with("title", "title", Value.text(kernel.title()))
                .with("quantity", "quantity", Value.text(kernel.quantity()))
                .with("scale", "scale", Value.text(kernel.scale()))
                .with("theory", "theory", Value.text(kernel.theory().name()))
                .with("prefactor", "prefactor", Value.text(kernel.prefactor().words()))
                .with("mass_dimension", "mass dimension", Value.exact(kernel.massDimension().toString()))
                .with("form", "form", Value.text(kernel.form().text()));
        if (kernel.origin().isPresent()) {
            facts = facts.with("origin", "made from", Value.text(kernel.origin().get()));
        }
        if (kernel.transform().isPresent()) {
            facts = facts.with("transform", "T(u)", formula(kernel.transform().get()));
        }
        if (kernel.anomalousDimension().isPresent()) {
            facts = facts.with("anomalous_dimension", "gamma(a)", formula(kernel.anomalousDimension().get()));
        }
        if (kernel.sudakov().isPresent()) {
            facts = facts.with("cusp", "cusp part g(a)", formula(kernel.sudakov().get().cusp()));
        }
        if (kernel.definingEquation().isPresent()) {
            facts = facts.with("defining_equation", "defined by", Value.text(kernel.definingEquation().get()));
        }
        if (kernel.series().isPresent()) {
            facts = facts.with("series", "mimics the series", Value.text(kernel.series().get()));
        }
        Report.Builder report = Report.builder("kernels")
                .request("kernel", kernel.name())
                .normalisation(kernel.quantity() + " = " + kernel.prefactor().words()
                        + " sum_{n>=0} c_n a^(n+1), a = beta0 " + kernel.theory().coupling() + "(" + kernel.scale()
                        + ")/(4 pi)" + transformInWords(kernel));
        addPoles(report, facts, kernel);
        report.add(singularities(kernel));
        kernel.sources().forEach(report::source);
        kernel.cautions().forEach(report::caution);
        return report.build();
    }

    private static void addPoles(Report.Builder report, Facts facts, Kernel kernel) {
        try {
            NearestPoles poles = NearestPoles.of(kernel);
            report.add(withStatus(facts, KernelList.status(poles))).add(nearest(kernel, poles));
        } catch (FormulaException e) {
            notListed(report, facts, e.reason());
        } catch (DomainException e) {
            notListed(report, facts, String.valueOf(e.getMessage()));
        }
    }

    private static void notListed(Report.Builder report, Facts facts, String reason) {
        report.add(withStatus(facts, NOT_LISTED)).add(new Note("The poles cannot be listed: " + reason + "."));
    }

    private static Facts withStatus(Facts facts, String status) {
        return facts.with("pole_status", "status of its poles", Value.text(status));
    }

    private static Table nearest(Kernel kernel, NearestPoles poles) {
        List<List<Value>> rows = new ArrayList<>();
        poles.infrared().ifPresent(pole -> rows.add(row("IR", pole)));
        poles.ultraviolet().ifPresent(pole -> rows.add(row("UV", pole)));
        return new Table(
                "nearest_poles",
                kernel.isAnomalousDimension()
                        ? "Nearest poles: the series of an anomalous dimension converges"
                        : "Nearest poles of B(u), looked for with |u| up to " + poles.searchedTo(),
                List.of(
                        Column.of("kind", "kind"), Column.of("u", "u0"), Column.of("order", "order"),
                        Column.of("status", "status")),
                rows);
    }

    private static List<Value> row(String kind, NearestPoles.Nearest pole) {
        return List.of(Value.text(kind), pole.u(), Value.count(pole.order()), Value.text(pole.status().text()));
    }

    private static String transformInWords(Kernel kernel) {
        if (kernel.isAnomalousDimension()) {
            return ", gamma(a) = sum_{n>=0} c_n a^n";
        }
        return "; B(u) = sum_{n>=0} c_n u^n/n! = T(u)"
                + (kernel.isRenormalised() ? " minus the subtraction that the anomalous dimension implies" : "");
    }

    private static Value formula(AnalyticFunction function) {
        return Value.exact(function.formula().print());
    }

    private static Table singularities(Kernel kernel) {
        List<List<Value>> rows = new ArrayList<>();
        for (SingularityNote note : kernel.singularities()) {
            rows.add(List.of(
                    Value.exact(note.u().toString()), Value.text(note.kind().name()),
                    note.operator().map(Value::text).orElse(Value.absent()),
                    note.power().map(Value::text).orElse(Value.absent()),
                    note.anomalousDimension().map(d -> Value.exact(d.toString())).orElse(Value.absent()),
                    note.source().map(Value::text).orElse(Value.absent())));
        }
        return new Table(
                "singularities", "Declared singularities",
                List.of(
                        Column.of("u", "u0"), Column.of("kind", "kind"), Column.of("operator", "operator"),
                        Column.of("power_correction", "power correction"), Column.of("delta", "delta"),
                        Column.of("source", "source")),
                rows);
    }
}
