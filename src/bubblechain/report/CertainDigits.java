package bubblechain.report;

import bubblechain.exact.Ball;
import bubblechain.exact.PrecisionException;
import bubblechain.exact.Rational;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/**
 * Numbers as cells with no more digits than can be defended: as many as a ball makes certain, and where a number has an
 * error of another origin, the error with two digits and the value to the same place.
 */
public final class CertainDigits {
    /** Most digits of a value that carries an error. */
    public static final int MOST = 8;

    private static final MathContext TWO = new MathContext(2, RoundingMode.HALF_UP);

    private CertainDigits() {}

    /** A ball with at most {@code digits} significant digits, all certain; a bound if zero is not excluded. */
    public static Value of(Ball ball, int digits) {
        if (ball.isZero()) {
            return Value.numeral("0");
        }
        if (ball.containsZero()) {
            int power = (int) Math.ceil(Math.log10(ball.upperBound().toDouble()));
            return Value.text("0 within 10^" + power + " (not proved zero)");
        }
        int certain = ball.certainDigits(digits);
        return ball.toDecimal(Math.max(1, certain))
                .map(Value::numeral)
                .orElseThrow(() -> new PrecisionException("not one digit of " + ball + " is certain"));
    }

    /** An error with two significant digits. */
    public static Value error(double error) {
        return Value.numeral(error == 0 ? "0" : text(new BigDecimal(error).round(TWO)));
    }

    /**
     * A value with an error of known size, 0 if there is none but rounding: at most {@value #MOST} digits.
     *
     * @param value its ball; the radius is taken to be far below the error
     */
    public static Value withError(Ball value, double error) {
        int certain = value.certainDigits(MOST);
        if (error > 0) {
            int place = new BigDecimal(error).round(TWO).scale();
            if (digitsAbove(value, place) < certain) {
                return Value.numeral(rounded(value, place));
            }
        }
        return value.toDecimal(Math.max(1, certain))
                .map(Value::numeral)
                .orElseGet(() -> Value.text(value.toString()));
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
