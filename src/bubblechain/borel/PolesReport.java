package bubblechain.borel;

import bubblechain.analytic.AlgebraicPole;
import bubblechain.analytic.ComplexRoots;
import bubblechain.chain.CertifiedNumber;
import bubblechain.chain.Chain;
import bubblechain.chain.ChainOptions;
import bubblechain.chain.CoefficientReport;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.SingularityNote;
import bubblechain.report.CertainDigits;
import bubblechain.report.Column;
import bubblechain.report.Note;
import bubblechain.report.Report;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Shows the poles of a kernel in a range of u. */
public final class PolesReport {
    /** Largest number of digits of a Laurent coefficient. */
    public static final int LARGEST_DIGITS = Chain.LARGEST_DIGITS;

    /** Digits of the position of an irrational pole. */
    private static final int POSITION_DIGITS = 12;

    private PolesReport() {}

    /**
     * @param from   lower end of the range, inclusive
     * @param to     upper end, inclusive
     * @param digits significant digits of the values
     * @param shareOf n of the coefficient whose make-up is shown
     */
    public static Report of(Kernel kernel, ChainOptions options, Rational from, Rational to, int digits, int shareOf) {
        if (digits < 1 || digits > LARGEST_DIGITS) {
            throw new DomainException("the number of digits lies between 1 and " + LARGEST_DIGITS + ", got " + digits);
        }
        BorelPlane plane = BorelPlane.of(kernel, options.scales(kernel));
        List<BorelPole> poles = plane.poles(from, to);
        Report.Builder report = Report.builder("poles");
        CoefficientReport.requestEntries(report, kernel, options);
        report.request("from", from.toString())
                .request("to", to.toString())
                .request("digits", Integer.toString(digits))
                .request("share_of", Integer.toString(shareOf));
        report.normalisation("B(u) = sum_{n>=0} c_n u^n/n!, where " + options.words(kernel)
                + "; Laurent coefficients in powers of u - u0, prefactor taken out");
        report.add(table(poles, kernel, digits));
        if (kernel.isAnomalousDimension()) {
            report.add(new Note("The Borel transform of a convergent series is entire: no pole anywhere."));
        } else {
            report.add(regularTable(plane, from, to));
            addAlgebraic(report, plane, from, to, digits);
            report.add(ShareTables.of(PoleShares.of(kernel, options.scales(kernel), poles, from, to, shareOf)));
        }
        kernel.sources().forEach(report::source);
        kernel.cautions().forEach(report::caution);
        report.caution("A sum over all poles need not converge to c_n; the remainder shown is exact, not an estimate.");
        report.caution(CoefficientReport.MODEL_CAUTION);
        return report.build();
    }

    /** For a reader simple poles have their residue in the row; JSON and CSV have order and Laurent coefficients always. */
    private static Table table(List<BorelPole> poles, Kernel kernel, int digits) {
        boolean simple = !poles.isEmpty() && poles.stream().allMatch(p -> p.pole().order() == 1);
        Column order = Column.of("order", "order");
        List<Column> columns = new ArrayList<>(List.of(
                Column.of("u", "u0"), simple ? order.dataOnly() : order, Column.of("status", "status"),
                Column.of("kind", "kind"), Column.of("power", "p"),
                Column.of("power_correction", "relative power correction"), Column.of("operator", "operator")));
        Column coefficients = Column.of("laurent", "Laurent coefficients");
        columns.add(simple ? coefficients.dataOnly() : coefficients);
        if (simple) {
            columns.add(3, Column.of("residue_exact", "residue").textOnly());
            columns.add(4, Column.of("residue", "").textOnly());
        }
        List<List<Value>> rows = new ArrayList<>();
        for (BorelPole pole : poles) {
            Optional<String> operator = pole.note().flatMap(SingularityNote::operator);
            Table laurent = laurent(pole, digits);
            List<Value> row = new ArrayList<>(List.of(
                    Value.exact(pole.u().toString()),
                    Value.count(pole.pole().order()),
                    Value.text(pole.pole().status().text()),
                    Value.text(pole.kind().name()),
                    Value.exact(pole.u().multiply(2).toString()),
                    Value.text(pole.power(kernel.scale())),
                    operator.map(Value::text).orElse(Value.absent()),
                    Value.rows(laurent)));
            if (simple) {
                row.add(3, laurent.rows().get(0).get(1));
                row.add(4, laurent.rows().get(0).get(2));
            }
            rows.add(row);
        }
        return new Table("poles", simple ? "Poles of B(u), all simple; p = 2 u0" : "Poles of B(u); p = 2 u0", columns, rows);
    }

    private static Table laurent(BorelPole pole, int digits) {
        List<Column> columns =
                List.of(Column.of("power", "power"), Column.of("exact", "exact"), Column.of("value", "value"));
        List<List<Value>> rows = new ArrayList<>();
        for (int k = pole.pole().order(); k >= 1; k--) {
            ExactConstant exact = pole.pole().coefficient(-k);
            rows.add(List.of(
                    Value.count(-k),
                    exact.isClosedForm() ? Value.exact(exact.toString()) : Value.absent(),
                    CoefficientReport.value(CertifiedNumber.of(exact, digits))));
        }
        return new Table("laurent", "", columns, rows);
    }

    private static Table regularTable(BorelPlane plane, Rational from, Rational to) {
        List<List<Value>> rows = new ArrayList<>();
        for (Rational u : plane.regularCandidates(from, to)) {
            rows.add(List.of(Value.exact(u.toString())));
        }
        return new Table(
                "regular", "Points where single terms are singular but B(u) is not", List.of(Column.of("u", "u")), rows);
    }

    private static void addAlgebraic(
            Report.Builder report, BorelPlane plane, Rational from, Rational to, int digits) {
        List<AlgebraicPole> algebraic = plane.algebraicPoles(from, to);
        if (!algebraic.isEmpty()) {
            List<List<Value>> rows = new ArrayList<>();
            for (AlgebraicPole pole : algebraic) {
                rows.add(List.of(
                        RootInterval.of(pole, POSITION_DIGITS).decimal(POSITION_DIGITS),
                        Value.text(pole.polynomial() + " = 0"), Value.exact(pole.lower().toString()),
                        Value.exact(pole.upper().toString()), Value.count(pole.order()),
                        Value.text(pole.status().text()), CertainDigits.of(pole.leading(), digits)));
            }
            report.add(new Table(
                    "algebraic_poles", "Poles at irrational points, with isolating intervals",
                    List.of(
                            Column.of("u", "u0"), Column.of("equation", "root of"), Column.of("lower", "above"),
                            Column.of("upper", "below"),
                            Column.of("order", "order"), Column.of("status", "status"),
                            Column.of("leading", "leading coefficient")),
                    rows));
        }
        List<ComplexRoots.Pair> pairs = plane.complexPoles();
        if (!pairs.isEmpty()) {
            List<List<Value>> rows = new ArrayList<>();
            for (ComplexRoots.Pair pair : pairs) {
                rows.add(List.of(
                        Value.numeral(String.format(java.util.Locale.ROOT, "%.9f", pair.re() + 0.0)),
                        Value.numeral(String.format(java.util.Locale.ROOT, "%.9f", pair.im()))));
            }
            report.add(new Table(
                    "complex_poles", "Pairs of complex poles, approximately",
                    List.of(Column.of("re", "Re u"), Column.of("im", "+- Im u")), rows));
        }
    }
}
