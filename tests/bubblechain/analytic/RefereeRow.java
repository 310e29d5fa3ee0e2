package bubblechain.analytic;

import bubblechain.exact.Ball;
import bubblechain.exact.Rational;
import bubblechain.formula.Formula;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.Reader;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;

/** One row of reference-values/generated/formula-expansions.csv: an expansion made by PARI/GP and mpmath. */
record RefereeRow(String id, Formula formula, Rational point, int valuation, List<Ball> coefficients) {
    /** Coefficients are rounded to 90 significant digits. */
    private static final Rational LAST_DIGIT = Rational.parse("1e-89");

    static List<RefereeRow> all() throws IOException {
        InputStream stream = Objects.requireNonNull(
                RefereeRow.class.getResourceAsStream("/reference-values/generated/formula-expansions.csv"));
        List<RefereeRow> rows = new ArrayList<>();
        try (Reader reader = new InputStreamReader(stream, StandardCharsets.UTF_8);
                CSVParser parser = CSVFormat.DEFAULT.builder().setHeader().setSkipHeaderRecord(true)
                        .setCommentMarker('#').get().parse(reader)) {
            parser.forEach(record -> rows.add(of(record)));
        }
        return rows;
    }

    private static RefereeRow of(CSVRecord record) {
        List<Ball> coefficients = new ArrayList<>();
        for (String text : record.get("coefficients").split(";")) {
            Rational value = Rational.parse(text);
            coefficients.add(Ball.of(value, value.abs().multiply(LAST_DIGIT), 400));
        }
        return new RefereeRow(
                record.get("id"),
                Formula.parse(record.get("formula")),
                Rational.parse(record.get("u0")),
                Integer.parseInt(record.get("valuation")),
                coefficients);
    }

    /** The first power that is not listed. */
    int end() {
        return valuation + coefficients.size();
    }

    /** The coefficient of (u - u0)^power, with the error of its last digit; zero below the valuation. */
    Ball coefficient(int power) {
        return power < valuation ? Ball.ZERO : coefficients.get(power - valuation);
    }

    @Override
    public String toString() {
        return id + ": " + formula.print() + " about " + point;
    }
}
