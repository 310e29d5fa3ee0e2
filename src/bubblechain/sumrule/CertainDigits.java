package bubblechain.sumrule;

import bubblechain.exact.Ball;
import bubblechain.exact.Rational;
import bubblechain.report.Value;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/** Numbers printed with no more digits than their error allows: the error with two digits, the value to the same place. */
final class CertainDigits {
    /** Most digits of a value. */
    static final int MOST = 8;
    private static final MathContext TWO = new MathContext(2, RoundingMode.HALF_UP);

    private CertainDigits() {}

    /** An error with two significant digits. */
    static Value error(double error) {
        return Value.numeral(error == 0 ? "0" : text(new BigDecimal(error).round(TWO)));
    }

    /**
     * A value with an error of known size, 0 if there is none but rounding: at most {@value #MOST} digits.
     *
     * @param value its ball; the radius is taken to be far below the error
     */
    static Value value(Ball value, double error) {
        int certain = value.certainDigits(MOST);
        if (error > 0) {
            int place = place(error);
            int digits = digitsAbove(value, place);
            if (digits < certain) {
                return Value.numeral(rounded(value, place));
            }
        }
        return value.toDecimal(Math.max(1, certain))
                .<Value>map(Value::numeral)
                .orElseGet(() -> Value.text(value.toString()));
    }

    /** Number of decimals that show two digits of an error. */
    private static int place(double error) {
        return new BigDecimal(error).round(TWO).scale();
    }

    /** Significant digits of a value written to this many decimals. */
    private static int digitsAbove(Ball value, int place) {
        return new BigDecimal(rounded(value, place)).precision();
    }

    private static String rounded(Ball value, int place) {
        Rational middle = value.midpoint();
        BigDecimal decimal = new BigDecimal(middle.numerator())
                .divide(new BigDecimal(middle.denominator()), place, RoundingMode.HALF_EVEN);
        return decimal.signum() == 0 ? "0" : text(decimal);
    }

    private static String text(BigDecimal decimal) {
        return decimal.toString().replace("E", "e");
    }
}
