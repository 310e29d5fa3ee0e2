package bubblechain.analytic;

import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.Rational;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** A polynomial over Q in one variable, by its coefficients from the constant term on; the last is not zero. */
public final class Polynomial {
    public static final Polynomial ZERO = new Polynomial(List.of());
    public static final Polynomial ONE = constant(Rational.ONE);

    /** Degrees beyond this are refused. */
    public static final int LARGEST_DEGREE = 1_000;

    private final List<Rational> coefficients;

    private Polynomial(List<Rational> coefficients) {
        this.coefficients = coefficients;
    }

    public static Polynomial of(List<Rational> coefficients) {
        int size = coefficients.size();
        while (size > 0 && coefficients.get(size - 1).isZero()) {
            size--;
        }
        return size == 0 ? ZERO : new Polynomial(List.copyOf(coefficients.subList(0, size)));
    }

    public static Polynomial constant(Rational value) {
        return of(List.of(value));
    }

    /** constant + slope u. */
    public static Polynomial linear(Rational constant, Rational slope) {
        return of(List.of(constant, slope));
    }

    /** The coefficients from the constant term on; empty for zero. */
    public List<Rational> coefficients() {
        return coefficients;
    }

    /** -1 for zero. */
    public int degree() {
        return coefficients.size() - 1;
    }

    public boolean isZero() {
        return coefficients.isEmpty();
    }

    public boolean isConstant() {
        return degree() <= 0;
    }

    /** The coefficient of u^k, zero above the degree. */
    public Rational coefficient(int k) {
        return k < coefficients.size() ? coefficients.get(k) : Rational.ZERO;
    }

    public Rational leading() {
        return coefficient(Math.max(degree(), 0));
    }

    public Polynomial add(Polynomial other) {
        List<Rational> sum = new ArrayList<>();
        for (int k = 0; k <= Math.max(degree(), other.degree()); k++) {
            sum.add(coefficient(k).add(other.coefficient(k)));
        }
        return of(sum);
    }

    public Polynomial subtract(Polynomial other) {
        return add(other.multiply(Rational.of(-1)));
    }

    public Polynomial multiply(Rational factor) {
        List<Rational> product = new ArrayList<>();
        for (Rational c : coefficients) {
            product.add(c.multiply(factor));
        }
        return of(product);
    }

    /** @throws DomainException if the degree of the product is above {@link #LARGEST_DEGREE} */
    public Polynomial multiply(Polynomial other) {
        if (isZero() || other.isZero()) {
            return ZERO;
        }
        requireDegree((long) degree() + other.degree());
        Rational[] product = new Rational[degree() + other.degree() + 1];
        Arrays.fill(product, Rational.ZERO);
        for (int j = 0; j <= degree(); j++) {
            Rational c = coefficients.get(j);
            for (int k = 0; k <= other.degree() && !c.isZero(); k++) {
                Rational d = other.coefficients.get(k);
                if (!d.isZero()) {
                    product[j + k] = product[j + k].add(c.multiply(d));
                }
            }
        }
        return of(List.of(product));
    }

    private static void requireDegree(long degree) {
        if (degree > LARGEST_DEGREE) {
            throw new DomainException("a polynomial of degree " + degree + " in u; the limit is " + LARGEST_DEGREE);
        }
    }

    public Polynomial power(int exponent) {
        requireDegree((long) Math.max(degree(), 0) * exponent);
        Polynomial result = ONE;
        for (int k = 0; k < exponent; k++) {
            result = result.multiply(this);
        }
        return result;
    }

    /** Quotient and remainder. @throws ArithmeticException if the divisor is zero */
    public Polynomial[] divideAndRemainder(Polynomial divisor) {
        Rational inverse = divisor.leading().inverse();
        List<Rational> remainder = new ArrayList<>(coefficients);
        Rational[] quotient = new Rational[Math.max(0, degree() - divisor.degree() + 1)];
        for (int k = quotient.length - 1; k >= 0; k--) {
            Rational factor = remainder.get(k + divisor.degree()).multiply(inverse);
            quotient[k] = factor;
            for (int j = 0; j <= divisor.degree() && !factor.isZero(); j++) {
                remainder.set(k + j, remainder.get(k + j).subtract(factor.multiply(divisor.coefficient(j))));
            }
        }
        return new Polynomial[] {of(List.of(quotient)), of(remainder)};
    }

    public Polynomial divideExactly(Polynomial divisor) {
        return divideAndRemainder(divisor)[0];
    }

    /** The monic greatest common divisor; zero if both are zero. */
    public Polynomial gcd(Polynomial other) {
        return PolynomialGcd.of(this, other);
    }

    /** This divided by its leading coefficient. */
    public Polynomial monic() {
        return isZero() ? this : multiply(leading().inverse());
    }

    public Polynomial derivative() {
        List<Rational> result = new ArrayList<>();
        for (int k = 1; k <= degree(); k++) {
            result.add(coefficient(k).multiply(k));
        }
        return of(result);
    }

    public Rational valueAt(Rational u) {
        Rational value = Rational.ZERO;
        for (int k = degree(); k >= 0; k--) {
            value = value.multiply(u).add(coefficient(k));
        }
        return value;
    }

    public Ball valueAt(Ball u, int bits) {
        Ball value = Ball.ZERO;
        for (int k = degree(); k >= 0; k--) {
            value = value.multiply(u, bits).add(coefficient(k), bits);
        }
        return value;
    }

    /** The polynomial in x with u = u0 + x, by repeated synthetic division. */
    public Polynomial shifted(Rational u0) {
        List<Rational> result = new ArrayList<>(coefficients);
        for (int start = 0; start < result.size(); start++) {
            for (int k = result.size() - 2; k >= start; k--) {
                result.set(k, result.get(k).add(result.get(k + 1).multiply(u0)));
            }
        }
        return of(result);
    }

    /** The number of vanishing coefficients at the start: the multiplicity of the root 0. */
    public int valuation() {
        int k = 0;
        while (k < coefficients.size() && coefficients.get(k).isZero()) {
            k++;
        }
        return k;
    }

    /** This divided by u^k, k of at most the valuation. */
    public Polynomial dividedByPower(int k) {
        return of(coefficients.subList(k, coefficients.size()));
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Polynomial p && coefficients.equals(p.coefficients);
    }

    @Override
    public int hashCode() {
        return coefficients.hashCode();
    }

    /** The polynomial in u, in the formula language. */
    @Override
    public String toString() {
        if (isZero()) {
            return "0";
        }
        StringBuilder text = new StringBuilder();
        for (int k = degree(); k >= 0; k--) {
            Rational c = coefficient(k);
            if (c.isZero()) {
                continue;
            }
            String power = k == 0 ? "" : k == 1 ? "u" : "u^" + k;
            String size = c.abs().equals(Rational.ONE) && k > 0
                    ? power
                    : c.abs() + (k > 0 ? "*" + power : "");
            text.append(c.signum() < 0 ? "-" : text.length() > 0 ? "+" : "").append(size);
        }
        return text.toString();
    }
}
