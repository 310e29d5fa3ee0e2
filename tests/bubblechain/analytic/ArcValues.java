package bubblechain.analytic;

import bubblechain.formula.Formula;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.Reader;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Objects;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;

/** The rows of reference-values/generated/arc-values.csv (mpmath, 30 digits). */
final class ArcValues {
    /** A row; the reference value is (valueRe + i valueIm) 10^decimalExponent. */
    record Row(String formula, String kind, String radius, double re, double im, double valueRe, double valueIm,
            int decimalExponent) {
        double lnModulus() {
            return Math.log(Math.hypot(valueRe, valueIm)) + decimalExponent * Math.log(10);
        }

        double circle() {
            return Double.parseDouble(radius);
        }

        NormalForm form() {
            return ArcValues.form(formula);
        }
    }

    private ArcValues() {}

    static NormalForm form(String formula) {
        return NormalForm.of(Formula.parse(formula), "u");
    }

    static List<Row> rows() {
        CSVFormat format = CSVFormat.DEFAULT.builder()
                .setCommentMarker('#')
                .setHeader()
                .setSkipHeaderRecord(true)
                .get();
        try (InputStream stream = Objects.requireNonNull(
                        ArcValues.class.getResourceAsStream("/reference-values/generated/arc-values.csv"));
                Reader reader = new InputStreamReader(stream, StandardCharsets.UTF_8);
                CSVParser parser = format.parse(reader)) {
            return parser.getRecords().stream().map(ArcValues::row).toList();
        } catch (IOException e) {
            throw new IllegalStateException(e);
        }
    }

    private static Row row(CSVRecord r) {
        BigDecimal re = new BigDecimal(r.get("value_re"));
        BigDecimal im = new BigDecimal(r.get("value_im"));
        int exponent = Math.max(decimalExponent(re), decimalExponent(im));
        return new Row(
                r.get("formula"),
                r.get("kind"),
                r.get("radius"),
                Double.parseDouble(r.get("re")),
                Double.parseDouble(r.get("im")),
                re.scaleByPowerOfTen(-exponent).doubleValue(),
                im.scaleByPowerOfTen(-exponent).doubleValue(),
                exponent);
    }

    private static int decimalExponent(BigDecimal x) {
        return x.signum() == 0 ? Integer.MIN_VALUE / 2 : x.precision() - x.scale() - 1;
    }
}
