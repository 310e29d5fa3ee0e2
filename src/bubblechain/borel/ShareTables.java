package bubblechain.borel;

import bubblechain.exact.Ball;
import bubblechain.report.CertainDigits;
import bubblechain.report.Column;
import bubblechain.report.Facts;
import bubblechain.report.Table;
import bubblechain.report.Value;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;

/** Shows how one coefficient is made up of the shares of the listed poles and the remainder. */
final class ShareTables {
    private static final int DIGITS = 12;
    private static final int FRACTION_DIGITS = 6;
    private static final int BITS = 256;

    private ShareTables() {}

    static Facts of(PoleShares shares) {
        List<List<Value>> rows = new ArrayList<>();
        for (int k = 0; k < shares.poles().size(); k++) {
            Ball share = shares.shares().get(k);
            rows.add(List.of(
                    Value.exact(shares.poles().get(k).u().toString()),
                    CertainDigits.of(share, DIGITS),
                    fraction(share, shares.total())));
        }
        Table table = new Table(
                "poles", "",
                List.of(Column.of("u", "u0"), Column.of("value", "share"), Column.of("fraction", "share/c_n")), rows);
        Facts facts = Facts.titled("shares", "What the listed poles contribute to c_" + shares.n())
                .with("n", "n", Value.count(shares.n()))
                .with("c_n", "c_n", CertainDigits.of(shares.total(), DIGITS))
                .with("poles", "shares", Value.rows(table))
                .with("remainder", "remainder (c_n minus all shares, exact)", CertainDigits.of(shares.remainder(), DIGITS));
        if (shares.bound().isEmpty()) {
            return facts;
        }
        RemainderBound bound = shares.bound().get();
        return facts.with("bound", "proved bound of its size", Value.numeral(bound.decimal()))
                .with(
                        "bound_radius", "from the circle |u| =",
                        Value.numeral(String.format(Locale.ROOT, "%.4f", bound.radius())));
    }

    private static Value fraction(Ball share, Ball total) {
        if (total.containsZero()) {
            return Value.absent();
        }
        Ball ratio = share.divide(total, BITS);
        return CertainDigits.of(ratio, FRACTION_DIGITS);
    }
}
