package bubblechain.exact;

import java.math.BigInteger;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A rational number in lowest terms with a positive denominator. Immutable; {@code equals} is equality of numbers.
 *
 * @implNote one gcd per operation; operations on integers skip it.
 */
public final class Rational implements Comparable<Rational> {
    public static final Rational ZERO = new Rational(BigInteger.ZERO, BigInteger.ONE);
    public static final Rational ONE = new Rational(BigInteger.ONE, BigInteger.ONE);
    public static final Rational TWO = of(2);
    public static final Rational HALF = of(1, 2);

    private static final Pattern TEXT =
            Pattern.compile("([+-]?\\d+)/(\\d+)|([+-]?)(\\d+)(?:\\.(\\d*))?(?:[eE]([+-]?\\d{1,5}))?");

    private final BigInteger numerator;
    private final BigInteger denominator;

    private Rational(BigInteger numerator, BigInteger denominator) {
        this.numerator = numerator;
        this.denominator = denominator;
    }

    public static Rational of(long value) {
        return new Rational(BigInteger.valueOf(value), BigInteger.ONE);
    }

    public static Rational of(BigInteger value) {
        return new Rational(value, BigInteger.ONE);
    }

    public static Rational of(long numerator, long denominator) {
        return of(BigInteger.valueOf(numerator), BigInteger.valueOf(denominator));
    }

    /** @throws ArithmeticException if the denominator is zero */
    public static Rational of(BigInteger numerator, BigInteger denominator) {
        if (denominator.signum() == 0) {
            throw new ArithmeticException("division by zero");
        }
        if (denominator.signum() < 0) {
            return reduced(numerator.negate(), denominator.negate());
        }
        return reduced(numerator, denominator);
    }

    private static Rational reduced(BigInteger numerator, BigInteger denominator) {
        if (denominator.equals(BigInteger.ONE)) {
            return new Rational(numerator, denominator);
        }
        if (numerator.bitLength() < Long.SIZE && denominator.bitLength() < Long.SIZE) {
            return reduced(numerator.longValue(), denominator.longValue());
        }
        BigInteger gcd = numerator.gcd(denominator);
        return gcd.equals(BigInteger.ONE)
                ? new Rational(numerator, denominator)
                : new Rational(numerator.divide(gcd), denominator.divide(gcd));
    }

    /** Euclid's algorithm in one word: most numbers are small, and big integers start slowly. */
    private static Rational reduced(long numerator, long denominator) {
        long gcd = denominator;
        long rest = numerator % denominator;
        while (rest != 0) {
            long next = gcd % rest;
            gcd = rest;
            rest = next;
        }
        long size = Math.abs(gcd);
        return new Rational(BigInteger.valueOf(numerator / size), BigInteger.valueOf(denominator / size));
    }

    /**
     * Reads an integer, a fraction "-3/4" or a decimal "1.25", "2e-3"; decimals are exact.
     *
     * @throws DomainException if the text is none of these
     */
    public static Rational parse(String text) {
        Matcher m = TEXT.matcher(text.strip());
        if (!m.matches()) {
            throw new DomainException("'" + text + "' is not a rational number such as 3, -3/4 or 1.25");
        }
        if (m.group(1) != null) {
            BigInteger below = new BigInteger(m.group(2));
            if (below.signum() == 0) {
                throw new DomainException("'" + text + "' divides by zero");
            }
            return of(new BigInteger(m.group(1)), below);
        }
        String fraction = m.group(5) == null ? "" : m.group(5);
        BigInteger digits = new BigInteger(m.group(4) + fraction);
        int exponent = (m.group(6) == null ? 0 : Integer.parseInt(m.group(6))) - fraction.length();
        Rational magnitude = exponent >= 0
                ? of(digits.multiply(BigInteger.TEN.pow(exponent)))
                : of(digits, BigInteger.TEN.pow(-exponent));
        return "-".equals(m.group(3)) ? magnitude.negate() : magnitude;
    }

    public BigInteger numerator() {
        return numerator;
    }

    public BigInteger denominator() {
        return denominator;
    }

    public Rational add(Rational other) {
        if (denominator.equals(other.denominator)) {
            return reduced(numerator.add(other.numerator), denominator);
        }
        return reduced(
                numerator.multiply(other.denominator).add(other.numerator.multiply(denominator)),
                denominator.multiply(other.denominator));
    }

    public Rational add(long other) {
        return new Rational(numerator.add(denominator.multiply(BigInteger.valueOf(other))), denominator);
    }

    public Rational subtract(Rational other) {
        return add(other.negate());
    }

    public Rational subtract(long other) {
        return new Rational(numerator.subtract(denominator.multiply(BigInteger.valueOf(other))), denominator);
    }

    public Rational multiply(Rational other) {
        return reduced(numerator.multiply(other.numerator), denominator.multiply(other.denominator));
    }

    public Rational multiply(long other) {
        return reduced(numerator.multiply(BigInteger.valueOf(other)), denominator);
    }

    /** @throws ArithmeticException if the divisor is zero */
    public Rational divide(Rational other) {
        return of(numerator.multiply(other.denominator), denominator.multiply(other.numerator));
    }

    /** @throws ArithmeticException if the divisor is zero */
    public Rational divide(long other) {
        return of(numerator, denominator.multiply(BigInteger.valueOf(other)));
    }

    public Rational negate() {
        return new Rational(numerator.negate(), denominator);
    }

    public Rational abs() {
        return signum() < 0 ? negate() : this;
    }

    /** @throws ArithmeticException if this is zero */
    public Rational inverse() {
        return of(denominator, numerator);
    }

    /** @throws ArithmeticException if this is zero and the exponent negative */
    public Rational power(int exponent) {
        if (exponent < 0) {
            return inverse().power(-exponent);
        }
        return new Rational(numerator.pow(exponent), denominator.pow(exponent));
    }

    public int signum() {
        return numerator.signum();
    }

    public boolean isZero() {
        return numerator.signum() == 0;
    }

    public boolean isInteger() {
        return denominator.equals(BigInteger.ONE);
    }

    /** The largest integer not above this number. */
    public BigInteger floor() {
        BigInteger[] parts = numerator.divideAndRemainder(denominator);
        return parts[1].signum() < 0 ? parts[0].subtract(BigInteger.ONE) : parts[0];
    }

    /** The smallest integer not below this number. */
    public BigInteger ceiling() {
        return negate().floor().negate();
    }

    /** @throws ArithmeticException if this is not an integer that fits an int */
    public int intValueExact() {
        if (!isInteger()) {
            throw new ArithmeticException(this + " is not an integer");
        }
        return numerator.intValueExact();
    }

    /** The nearest double, to within a few units in its last place; not a certified value. */
    public double toDouble() {
        int shift = numerator.bitLength() - denominator.bitLength() - 62;
        BigInteger quotient = shift >= 0
                ? numerator.divide(denominator.shiftLeft(shift))
                : numerator.shiftLeft(-shift).divide(denominator);
        return Math.scalb(quotient.doubleValue(), shift);
    }

    @Override
    public int compareTo(Rational other) {
        return numerator.multiply(other.denominator).compareTo(other.numerator.multiply(denominator));
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Rational r && numerator.equals(r.numerator) && denominator.equals(r.denominator);
    }

    @Override
    public int hashCode() {
        return 31 * numerator.hashCode() + denominator.hashCode();
    }

    /** "7", "-3/4": readable by {@link #parse} and by the formula language. */
    @Override
    public String toString() {
        return isInteger() ? numerator.toString() : numerator + "/" + denominator;
    }
}
