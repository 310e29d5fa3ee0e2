package bubblechain.kernel;

import bubblechain.analytic.AnalyticFunction;
import bubblechain.report.Column;
import bubblechain.report.Facts;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** Shows the library, or one kernel of it. */
public final class KernelReport {
    private KernelReport() {}

    /** All kernels whose name, title or quantity contains a word; all of them for the empty word. */
    public static Report list(String word) {
        String wanted = word.toLowerCase(Locale.ROOT);
        List<List<Value>> rows = new ArrayList<>();
        for (String name : KernelLibrary.names()) {
            Kernel kernel = KernelLibrary.load(name);
            String text = (name + " " + kernel.title() + " " + kernel.quantity()).toLowerCase(Locale.ROOT);
            if (text.contains(wanted)) {
                rows.add(List.of(
                        Value.text(name), Value.text(kernel.quantity()), Value.text(kernel.scale()),
                        Value.text(kernel.form().text()), Value.text(kernel.title())));
            }
        }
        return Report.builder("kernels")
                .request("search", word)
                .normalisation("f = prefactor x sum_{n>=0} c_n a^(n+1), a = beta0 alpha/(4 pi)")
                .add(new Table(
                        "kernels", "Kernels",
                        List.of(
                                Column.of("name", "name"), Column.of("quantity", "quantity"),
                                Column.of("scale", "scale"), Column.of("form", "form"), Column.of("title", "title")),
                        rows))
                .build();
    }

    /** Everything a kernel file says. */
    public static Report describe(Kernel kernel) {
        Facts facts = Facts.titled("kernel", kernel.title())
                .with("name", "name", Value.text(kernel.name()))
                .with("title", "title", Value.text(kernel.title()))
                .with("quantity", "quantity", Value.text(kernel.quantity()))
                .with("scale", "scale", Value.text(kernel.scale()))
                .with("theory", "theory", Value.text(kernel.theory().name()))
                .with("prefactor", "prefactor", Value.text(kernel.prefactor().words()))
                .with("mass_dimension", "mass dimension", Value.exact(kernel.massDimension().toString()))
                .with("form", "form", Value.text(kernel.form().text()));
        if (kernel.transform().isPresent()) {
            facts = facts.with("transform", "T(u)", formula(kernel.transform().get()));
        }
        if (kernel.anomalousDimension().isPresent()) {
            facts = facts.with("anomalous_dimension", "gamma(a)", formula(kernel.anomalousDimension().get()));
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
                        + ")/(4 pi)" + transformInWords(kernel))
                .add(facts)
                .add(singularities(kernel));
        kernel.sources().forEach(report::source);
        kernel.cautions().forEach(report::caution);
        return report.build();
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
