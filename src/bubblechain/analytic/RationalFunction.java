package bubblechain.analytic;

import bubblechain.exact.Ball;
import bubblechain.exact.Rational;

/** A quotient of polynomials over Q in lowest terms with a monic denominator; equal functions are equal objects. */
public final class RationalFunction {
    public static final RationalFunction ZERO = new RationalFunction(Polynomial.ZERO, Polynomial.ONE);
    public static final RationalFunction ONE = new RationalFunction(Polynomial.ONE, Polynomial.ONE);

    private final Polynomial numerator;
    private final Polynomial denominator;

    private RationalFunction(Polynomial numerator, Polynomial denominator) {
        this.numerator = numerator;
        this.denominator = denominator;
    }

    public static RationalFunction of(Polynomial polynomial) {
        return new RationalFunction(polynomial, Polynomial.ONE);
    }

    public static RationalFunction constant(Rational value) {
        return of(Polynomial.constant(value));
    }

    /** @throws ArithmeticException if the denominator is zero */
    public static RationalFunction of(Polynomial numerator, Polynomial denominator) {
        Polynomial gcd = denominator.isConstant() ? Polynomial.ONE : numerator.gcd(denominator);
        Polynomial above = gcd.isConstant() ? numerator : numerator.divideExactly(gcd);
        Polynomial below = gcd.isConstant() ? denominator : denominator.divideExactly(gcd);
        Rational scale = below.leading().inverse();
        return new RationalFunction(above.multiply(scale), below.multiply(scale));
    }

    public Polynomial numerator() {
        return numerator;
    }

    public Polynomial denominator() {
        return denominator;
    }

    public boolean isZero() {
        return numerator.isZero();
    }

    public boolean isPolynomial() {
        return denominator.isConstant();
    }

    /** What the denominators have in common is taken out first, so that only it can cancel in the sum (Henrici). */
    public RationalFunction add(RationalFunction other) {
        if (denominator.equals(other.denominator)) {
            return of(numerator.add(other.numerator), denominator);
        }
        Polynomial common = denominator.gcd(other.denominator);
        Polynomial own = quotient(denominator, common);
        Polynomial theirs = quotient(other.denominator, common);
        Polynomial sum = numerator.multiply(theirs).add(other.numerator.multiply(own));
        if (sum.isZero()) {
            return ZERO;
        }
        Polynomial cancels = common.isConstant() ? Polynomial.ONE : sum.gcd(common);
        return new RationalFunction(
                quotient(sum, cancels), own.multiply(theirs).multiply(quotient(common, cancels)));
    }

    /** Each numerator can have a factor in common with the other denominator only. */
    public RationalFunction multiply(RationalFunction other) {
        if (isZero() || other.isZero()) {
            return ZERO;
        }
        Polynomial first = common(numerator, other.denominator);
        Polynomial second = common(other.numerator, denominator);
        return new RationalFunction(
                quotient(numerator, first).multiply(quotient(other.numerator, second)),
                quotient(denominator, second).multiply(quotient(other.denominator, first)));
    }

    private static Polynomial common(Polynomial numerator, Polynomial denominator) {
        return denominator.isConstant() ? Polynomial.ONE : numerator.gcd(denominator);
    }

    private static Polynomial quotient(Polynomial polynomial, Polynomial monicDivisor) {
        return monicDivisor.isConstant() ? polynomial : polynomial.divideExactly(monicDivisor);
    }

    public RationalFunction multiply(Rational factor) {
        return new RationalFunction(
                numerator.multiply(factor), factor.isZero() ? Polynomial.ONE : denominator);
    }

    /** @throws ArithmeticException if this is zero */
    public RationalFunction inverse() {
        return of(denominator, numerator);
    }

    /** Any integer exponent. @throws ArithmeticException for a negative power of zero */
    public RationalFunction power(int exponent) {
        return exponent < 0
                ? inverse().power(-exponent)
                : new RationalFunction(numerator.power(exponent), denominator.power(exponent));
    }

    /** The function of x with u = u0 + x. */
    public RationalFunction shifted(Rational u0) {
        return new RationalFunction(numerator.shifted(u0), denominator.shifted(u0));
    }

    public Ball valueAt(Ball u, int bits) {
        return numerator.valueAt(u, bits).divide(denominator.valueAt(u, bits), bits);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof RationalFunction r
                && numerator.equals(r.numerator)
                && denominator.equals(r.denominator);
    }

    @Override
    public int hashCode() {
        return 31 * numerator.hashCode() + denominator.hashCode();
    }

    @Override
    public String toString() {
        return isPolynomial() ? numerator.toString() : "(" + numerator + ")/(" + denominator + ")";
    }
}
