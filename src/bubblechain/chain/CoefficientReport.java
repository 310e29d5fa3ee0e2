package bubblechain.chain;

import bubblechain.exact.ExactConstant;
import bubblechain.kernel.Kernel;
import bubblechain.report.Column;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.util.ArrayList;
import java.util.List;

/** Shows the coefficients of a chain. */
public final class CoefficientReport {
    /** The caution that goes with every number of a chain. */
    public static final String MODEL_CAUTION =
            "Large beta0 is a model of the series, not QCD: beyond the flavour terms the coefficients are estimates.";

    /** Most nf^n terms that are shown. */
    private static final int LARGEST_FLAVOUR_TERM = 20;

    private CoefficientReport() {}

    /**
     * The coefficients of a kernel, or of its anomalous dimension.
     *
     * @param exact       closed forms beside the decimals
     * @param flavourTerms the nf^n terms of the full series in (alpha/pi)^(n+1) as well
     */
    public static Report of(
            Kernel kernel,
            ChainOptions options,
            int loops,
            int digits,
            boolean exact,
            boolean flavourTerms) {
        Chain chain = Chain.of(kernel, options.scales(kernel));
        Rendering rendering = options.rendering(kernel);
        List<ExactConstant> closed = exact ? rendering.applyToExact(chain.exact(loops)) : List.of();
        List<CertifiedNumber> numbers = chain.certified(loops, digits, rendering);
        Report.Builder report = Report.builder("coefficients");
        requestEntries(report, kernel, options);
        report.request("loops", Integer.toString(loops)).request("digits", Integer.toString(digits));
        report.normalisation(options.words(kernel));
        report.add(table(numbers, closed, options.symbol()));
        if (flavourTerms) {
            report.add(flavourTable(kernel, options, Math.min(loops, LARGEST_FLAVOUR_TERM), digits));
        }
        for (String source : kernel.sources()) {
            report.source(source);
        }
        for (String caution : kernel.cautions()) {
            report.caution(caution);
        }
        report.caution(kernel.isAnomalousDimension()
                ? "The leading-nf part of an anomalous dimension converges; it says nothing about the other terms."
                : MODEL_CAUTION);
        return report.build();
    }

    /** The entries of the request that every chain command echoes. */
    public static void requestEntries(Report.Builder report, Kernel kernel, ChainOptions options) {
        report.request("kernel", kernel.name())
                .request("mu_over_scale", options.muOverScale())
                .request("operator_mu_over_scale", options.operatorMuOverScale())
                .request("coupling", options.coupling().text())
                .request("normalise", options.normalisation().text())
                .request("scheme", options.scheme().text());
        if (options.nf().isPresent()) {
            report.request("nf", Integer.toString(options.nf().getAsInt()));
        }
        if (options.couplingFlavours().isPresent()) {
            report.request("coupling_nf", Integer.toString(options.couplingFlavours().getAsInt()));
        }
    }

    private static Table table(List<CertifiedNumber> numbers, List<ExactConstant> closed, String symbol) {
        List<Column> columns = new ArrayList<>(
                List.of(Column.of("n", "n"), Column.of("loops", "loops"), Column.of("value", symbol)));
        if (!closed.isEmpty()) {
            columns.add(Column.of("exact", "exact"));
        }
        List<List<Value>> rows = new ArrayList<>();
        for (int n = 0; n < numbers.size(); n++) {
            List<Value> row = new ArrayList<>(List.of(Value.count(n), Value.count(n + 1L), value(numbers.get(n))));
            if (!closed.isEmpty()) {
                ExactConstant c = closed.get(n);
                row.add(c.isClosedForm() ? Value.exact(c.toString()) : Value.absent());
            }
            rows.add(row);
        }
        return new Table("coefficients", "Coefficients", columns, rows);
    }

    /** A certified number as a cell. */
    public static Value value(CertifiedNumber number) {
        return number.isDecimal() ? Value.numeral(number.text()) : Value.text(number.text());
    }

    /** The highest power of nf does not see the heavy quark in the running: a coupling of nf or nf + 1 flavours alike. */
    private static Table flavourTable(Kernel kernel, ChainOptions options, int loops, int digits) {
        String coupling = kernel.theory().coupling() + "/pi";
        List<Column> columns = List.of(
                Column.of("n", "n"), Column.of("value", "nf^n term in (" + coupling + ")^(n+1)"),
                Column.of("exact", "exact"));
        List<List<Value>> rows = new ArrayList<>();
        List<ExactConstant> coefficients = Chain.of(kernel, options.scalesWithoutHeavyQuark(kernel)).exact(loops);
        for (int n = 0; n < loops; n++) {
            ExactConstant term = FlavourTerm.perAlphaOverPi(kernel, n, coefficients.get(n));
            rows.add(List.of(
                    Value.count(n),
                    value(CertifiedNumber.of(term, digits)),
                    term.isClosedForm() ? Value.exact(term.toString()) : Value.absent()));
        }
        String title = "The nf^n terms of the full series at mu = " + options.scaleWords(kernel)
                + ", prefactor included (at most " + LARGEST_FLAVOUR_TERM + ")";
        return new Table("nf_terms", title, columns, rows);
    }
}
