package bubblechain.chain;

import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.PrecisionException;
import bubblechain.exact.Rational;
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
    private static final int LAST_BITS_FACTOR = 8;

    /** From a ball, if its digits are certain or it is exactly zero. */
    static Optional<CertifiedNumber> ifDecided(Ball ball, int digits) {
        return ball.isZero()
                ? Optional.of(new CertifiedNumber("0", true, true))
                : ball.toDecimal(digits).map(text -> new CertifiedNumber(text, false, true));
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
            int power = (int) Math.floor(-Math.log10(ball.upperBound().toDouble()));
            return new CertifiedNumber("0 within 10^" + -power + " (not proved zero)", false, false);
        }
        throw new PrecisionException("the digits of " + ball + " could not be decided to " + digits + " places");
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
        for (int working = bits; working <= LAST_BITS_FACTOR * bits; working *= 2) {
            Ball refined = exact.toBall(working);
            if (refined.toDecimal(digits).isPresent()) {
                return of(refined, digits);
            }
        }
        return of(exact.toBall(LAST_BITS_FACTOR * bits), digits);
    }

    /** A rational, rounded half-even. */
    private static CertifiedNumber of(Rational value, int digits) {
        int bits = (int) (digits / DIGITS_PER_BIT) + 64;
        for (int working = bits; working <= LAST_BITS_FACTOR * bits; working *= 2) {
            Optional<String> decimal = Ball.of(value, working).toDecimal(digits);
            if (decimal.isPresent()) {
                return new CertifiedNumber(decimal.get(), false, true);
            }
        }
        // A tie: the decimal expansion ends exactly half-way, so the number is a multiple of a power of ten.
        java.math.BigDecimal exact = new java.math.BigDecimal(value.numerator())
                .divide(
                        new java.math.BigDecimal(value.denominator()),
                        new java.math.MathContext(digits, java.math.RoundingMode.HALF_EVEN));
        return new CertifiedNumber(exact.toPlainString(), false, true);
    }
}
