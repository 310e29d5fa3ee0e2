package bubblechain.fixedorder;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.Reader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVRecord;

/** Rows of reference-values/fixed-order.csv; each carries its source in the file. */
public final class ReferenceTable {
    private static final Pattern NUMBER = Pattern.compile("[+-]?\\s*\\d+(?:\\.\\d+)?(?:e[+-]?\\d+)?");
    private static final List<CSVRecord> ROWS = read("/reference-values/fixed-order.csv");

    private ReferenceTable() {}

    /** The records of a CSV file with a header row and comment lines. */
    public static List<CSVRecord> read(String resource) {
        CSVFormat format = CSVFormat.DEFAULT.builder().setHeader().setSkipHeaderRecord(true).setCommentMarker('#').get();
        try (Reader reader = new InputStreamReader(
                Objects.requireNonNull(ReferenceTable.class.getResourceAsStream(resource), resource),
                StandardCharsets.UTF_8)) {
            return format.parse(reader).getRecords();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** The entry {@code value} of the only row whose quantity and order begin like this. */
    public static String value(String quantity, String order) {
        List<CSVRecord> found = ROWS.stream()
                .filter(r -> r.get("quantity").startsWith(quantity) && r.get("order").startsWith(order))
                .toList();
        assertThat(found).as("rows for %s, %s", quantity, order).hasSize(1);
        return found.get(0).get("value");
    }

    /** Numbers as printed, in order of appearance. */
    public static List<String> numbers(String text) {
        List<String> found = new ArrayList<>();
        Matcher m = NUMBER.matcher(text);
        while (m.find()) {
            found.add(m.group().replace(" ", ""));
        }
        return found;
    }

    /** Asserts that a value agrees with a printed number to half a unit of the last digit printed. */
    public static void assertPrinted(Ball value, String printed, String what) {
        assertPrinted(value, printed, Rational.HALF, what);
    }

    /** Asserts agreement to a number of units of the last digit printed. */
    public static void assertPrinted(Ball value, String printed, Rational units, String what) {
        Rational distance = value.midpoint().subtract(Rational.parse(printed)).abs();
        assertThat(distance.compareTo(unit(printed).multiply(units)))
                .as("%s: computed %s, printed %s", what, value, printed)
                .isLessThanOrEqualTo(0);
    }

    public static void assertPrinted(ExactConstant value, String printed, String what) {
        assertPrinted(value.toBall(256), printed, what);
    }

    private static Rational unit(String printed) {
        String lower = printed.toLowerCase(Locale.ROOT);
        int e = lower.indexOf('e');
        int exponent = e < 0 ? 0 : Integer.parseInt(lower.substring(e + 1));
        String mantissa = e < 0 ? lower : lower.substring(0, e);
        int point = mantissa.indexOf('.');
        int decimals = point < 0 ? 0 : mantissa.length() - point - 1;
        return Rational.of(10).power(exponent - decimals);
    }
}
