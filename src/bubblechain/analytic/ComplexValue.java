package bubblechain.analytic;

import bubblechain.exact.DomainException;

/**
 * A complex number (re + i im) 2^exponent in double precision, off by at most error * 2^exponent.
 *
 * <p>The error is proved: every rounding and truncation of the evaluation is in it. A sum of terms that cancel shows a
 * large relative error, not a wrong value.
 *
 * @param re       real part of the mantissa
 * @param im       imaginary part of the mantissa
 * @param error    bound of |mantissa - exact mantissa|
 * @param exponent binary exponent, so that large and small values do not leave the range of doubles
 */
public record ComplexValue(double re, double im, double error, long exponent) {
    private static final int LARGEST_SHIFT = 2_400;
    private static final double LN2 = Math.log(2);

    /**
     * The value of a form at re + i im; for many points of one form use {@link FormEvaluation}.
     *
     * @throws DomainException if the point is so close to a singular point of a term that no digit can be given, or too
     *     far out for double precision
     */
    public static ComplexValue at(NormalForm form, double re, double im) {
        return FormEvaluation.of(form).at(re, im);
    }

    static ComplexValue of(ScaledDisc disc) {
        return new ComplexValue(
                disc.mantissa().re(), disc.mantissa().im(), disc.mantissa().radius(), disc.exponent());
    }

    /** The real part as a double; infinite or zero where that is out of range. */
    public double realPart() {
        return Math.scalb(re, shift());
    }

    /** The imaginary part as a double; infinite or zero where that is out of range. */
    public double imaginaryPart() {
        return Math.scalb(im, shift());
    }

    /** The bound of the error as a double; infinite where that is out of range. */
    public double absoluteError() {
        return Upward.inflate(Math.scalb(error, shift()));
    }

    private int shift() {
        return (int) Math.max(-LARGEST_SHIFT, Math.min(LARGEST_SHIFT, exponent));
    }

    /** ln of the modulus; minus infinity for zero. */
    public double lnModulus() {
        return Math.log(Upward.abs(re, im)) + exponent * LN2;
    }

    /** A bound of |value - exact value|/|value|; infinite if the value is zero. */
    public double relativeError() {
        double modulus = Math.nextDown(Upward.abs(re, im) * (1 - 8 * Upward.UNIT));
        return modulus > 0 ? Upward.inflate(error / modulus) : Double.POSITIVE_INFINITY;
    }
}
