package bubblechain.chain;

import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.PrecisionException;
import bubblechain.exact.Rational;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Optional;

/**
 * A number with as many decimal digits as were asked for, each of them certain.
 *
 * @param text  the decimal; "0" only for a number that is proved to be zero; otherwise, if zero could not be excluded,
 *              the bound in words
 * @param isZero true if the number is proved to be zero
 * @param isDecimal true if {@code text} is a decimal
 */
public record CertifiedNumber(String text, boolean isZero, boolean isDecimal) {
    private static final double DIGITS_PER_BIT = 0.30102999566398120;
    /** Precision beyond the digits asked for, up to which a number that may be zero is refined. */
    private static final int FIRST_EXTRA_BITS = 128;

    private static final int LAST_EXTRA_BITS = 2_048;

    /** The decimal of an exact constant, rounded half-even to a number of significant digits. */
    public static CertifiedNumber of(ExactConstant value, int digits) {
        int bits = (int) (digits / DIGITS_PER_BIT) + 64;
        return of(value, value.toBall(bits), digits, bits);
    }

    /** From a ball, if its digits are certain or it is exactly zero. */
    static Optional<CertifiedNumber> ifDecided(Ball ball, int digits) {
        Optional<String> text = ball.toDecimal(digits);
        return text.isPresent() ? Optional.of(ofDigits(text.get())) : Optional.empty();
    }

    /** From certain digits. */
    static CertifiedNumber ofDigits(String text) {
        return new CertifiedNumber(text, text.equals("0"), true);
    }

    /** From a ball alone. @throws PrecisionException if its digits are not certain and zero is excluded */
    static CertifiedNumber of(Ball ball, int digits) {
        if (ball.isZero()) {
            return new CertifiedNumber("0", true, true);
        }
        Optional<String> decimal = ball.toDecimal(digits);
        if (decimal.isPresent()) {
            return new CertifiedNumber(decimal.get(), false, true);
        }
        if (ball.containsZero()) {
            return new CertifiedNumber("0 within 10^" + decadeAbove(ball) + " (not proved zero)", false, false);
        }
        throw new PrecisionException("the digits of " + ball + " could not be decided to " + digits + " places");
    }

    /** A k with |x| &lt;= 10^k for all x of the ball, also where a double would underflow. */
    private static int decadeAbove(Ball ball) {
        Rational bound = ball.upperBound().toRational();
        int bits = bound.numerator().bitLength() - bound.denominator().bitLength() + 1;
        return (int) Math.ceil(bits * DIGITS_PER_BIT);
    }

    /** From the exact value where the ball leaves a doubt. */
    static CertifiedNumber of(ExactConstant exact, Ball ball, int digits, int bits) {
        if (exact.isZero()) {
            return new CertifiedNumber("0", true, true);
        }
        if (ball.toDecimal(digits).isPresent()) {
            return of(ball, digits);
        }
        Optional<Rational> rational = exact.asRational();
        if (rational.isPresent()) {
            return of(rational.get(), digits);
        }
        Ball refined = ball;
        for (int extra = FIRST_EXTRA_BITS; extra <= LAST_EXTRA_BITS; extra *= 2) {
            refined = exact.toBall(bits + extra);
            if (refined.toDecimal(digits).isPresent()) {
                break;
            }
        }
        return of(refined, digits);
    }

    /** A rational, rounded half-even. */
    private static CertifiedNumber of(Rational value, int digits) {
        int bits = (int) (digits / DIGITS_PER_BIT) + 64;
        for (int working = bits; working <= bits + LAST_EXTRA_BITS; working *= 2) {
            Optional<String> decimal = Ball.of(value, working).toDecimal(digits);
            if (decimal.isPresent()) {
                return new CertifiedNumber(decimal.get(), false, true);
            }
        }
        // A tie: the decimal expansion ends exactly half-way, so the number is a multiple of a power of ten.
        BigDecimal rounded = new BigDecimal(value.numerator())
                .divide(new BigDecimal(value.denominator()), new MathContext(digits, RoundingMode.HALF_EVEN));
        String text = Ball.of(Rational.parse(rounded.toPlainString()), bits).toDecimal(digits).orElseThrow();
        return new CertifiedNumber(text, false, true);
    }
}
