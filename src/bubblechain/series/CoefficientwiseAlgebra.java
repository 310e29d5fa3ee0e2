package bubblechain.series;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.PrecisionException;
import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;

/**
 * Series as lists of coefficients from a ring, with the schoolbook recurrences: O(n^2) ring operations for a product, a
 * quotient or an exponential.
 *
 * @param <C> the coefficients
 */
public final class CoefficientwiseAlgebra<C> implements SeriesAlgebra<LaurentSeries<C>> {
    private final CoefficientRing<C> ring;
    private final int length;
    private final C zero;
    private final C one;

    private CoefficientwiseAlgebra(CoefficientRing<C> ring, int length) {
        this.ring = ring;
        this.length = length;
        this.zero = ring.constant(Rational.ZERO);
        this.one = ring.constant(Rational.ONE);
    }

    /** The algebra of series with {@code length} terms, at least one. */
    public static <C> CoefficientwiseAlgebra<C> of(CoefficientRing<C> ring, int length) {
        if (length < 1) {
            throw new DomainException("a series needs at least one term, got " + length);
        }
        return new CoefficientwiseAlgebra<>(ring, length);
    }

    public CoefficientRing<C> ring() {
        return ring;
    }

    @Override
    public int length() {
        return length;
    }

    /** A series from its coefficients; leading known zeros are dropped. */
    public LaurentSeries<C> series(int lowest, List<C> coefficients) {
        int zeros = 0;
        while (zeros < coefficients.size() && ring.isZero(coefficients.get(zeros))) {
            zeros++;
        }
        return new LaurentSeries<>(lowest + zeros, coefficients.subList(zeros, coefficients.size()));
    }

    /** The coefficient of x^k. @throws PrecisionException if the series does not reach so far */
    public C coefficient(LaurentSeries<C> series, int k) {
        if (k >= series.end()) {
            throw new PrecisionException("the series ends before x^" + k);
        }
        return k < series.lowest() ? zero : series.coefficients().get(k - series.lowest());
    }

    @Override
    public LaurentSeries<C> constant(ExactConstant value) {
        return linear(value, ExactConstant.ZERO);
    }

    @Override
    public LaurentSeries<C> linear(ExactConstant constant, ExactConstant slope) {
        List<C> coefficients = zeros(length + (constant.isZero() ? 1 : 0));
        coefficients.set(0, ring.constant(constant));
        if (coefficients.size() > 1) {
            coefficients.set(1, ring.constant(slope));
        }
        return series(0, coefficients);
    }

    private List<C> zeros(int count) {
        return new ArrayList<>(Collections.nCopies(count, zero));
    }

    @Override
    public LaurentSeries<C> add(LaurentSeries<C> left, LaurentSeries<C> right) {
        int end = Math.min(left.end(), right.end());
        int lowest = Math.min(Math.min(left.lowest(), right.lowest()), end);
        List<C> sum = new ArrayList<>(end - lowest);
        for (int k = lowest; k < end; k++) {
            C a = coefficient(left, k);
            C b = coefficient(right, k);
            sum.add(ring.isZero(a) ? b : ring.isZero(b) ? a : ring.add(a, b));
        }
        return series(lowest, sum);
    }

    @Override
    public LaurentSeries<C> negate(LaurentSeries<C> value) {
        return new LaurentSeries<>(
                value.lowest(), value.coefficients().stream().map(ring::negate).toList());
    }

    @Override
    public LaurentSeries<C> multiply(LaurentSeries<C> left, LaurentSeries<C> right) {
        int n = Math.min(left.length(), right.length());
        List<C> product = new ArrayList<>(n);
        for (int k = 0; k < n; k++) {
            C sum = zero;
            for (int j = 0; j <= k; j++) {
                sum = addProduct(sum, left.coefficients().get(j), right.coefficients().get(k - j));
            }
            product.add(sum);
        }
        return series(left.lowest() + right.lowest(), product);
    }

    private C addProduct(C sum, C left, C right) {
        if (ring.isZero(left) || ring.isZero(right)) {
            return sum;
        }
        C product = ring.multiply(left, right);
        return ring.isZero(sum) ? product : ring.add(sum, product);
    }

    @Override
    public LaurentSeries<C> multiply(LaurentSeries<C> value, Rational factor) {
        if (factor.isZero()) {
            return new LaurentSeries<>(value.end(), List.of());
        }
        return new LaurentSeries<>(
                value.lowest(),
                value.coefficients().stream().map(c -> ring.multiply(c, factor)).toList());
    }

    @Override
    public LaurentSeries<C> multiply(LaurentSeries<C> value, List<Rational> polynomial) {
        List<C> result = new ArrayList<>(value.length());
        for (int k = 0; k < value.length(); k++) {
            result.add(convolution(polynomial, value.coefficients(), k, 0));
        }
        return series(value.lowest(), result);
    }

    /** g = f/p by p_0 g_k = f_k - sum_{j>=1} p_j g_{k-j}: degree(p) operations for each term. */
    @Override
    public LaurentSeries<C> divide(LaurentSeries<C> value, List<Rational> polynomial) {
        Rational leading = polynomial.get(0).inverse();
        List<C> result = new ArrayList<>(value.length());
        for (int k = 0; k < value.length(); k++) {
            C sum = convolution(polynomial, result, k, 1);
            C f = value.coefficients().get(k);
            C difference = ring.isZero(sum) ? f : ring.isZero(f) ? ring.negate(sum) : ring.add(f, ring.negate(sum));
            result.add(ring.isZero(difference) ? zero : ring.multiply(difference, leading));
        }
        return new LaurentSeries<>(value.lowest(), result);
    }

    /** sum_{j>=from} polynomial_j coefficients_{k-j}. */
    private C convolution(List<Rational> polynomial, List<C> coefficients, int k, int from) {
        C sum = zero;
        for (int j = from; j < polynomial.size() && j <= k; j++) {
            C c = coefficients.get(k - j);
            if (!polynomial.get(j).isZero() && !ring.isZero(c)) {
                C product = ring.multiply(c, polynomial.get(j));
                sum = ring.isZero(sum) ? product : ring.add(sum, product);
            }
        }
        return sum;
    }

    /** 1/f by the recurrence g_k = -(1/f_0) sum_{j=1}^{k} f_j g_{k-j}. */
    @Override
    public LaurentSeries<C> inverse(LaurentSeries<C> value) {
        if (value.length() == 0) {
            throw new PrecisionException(
                    "division by a series that vanishes through all " + length + " terms computed");
        }
        C leading = ring.inverse(value.coefficients().get(0));
        List<C> result = new ArrayList<>(value.length());
        result.add(leading);
        for (int k = 1; k < value.length(); k++) {
            C sum = zero;
            for (int j = 1; j <= k; j++) {
                sum = addProduct(sum, value.coefficients().get(j), result.get(k - j));
            }
            result.add(ring.isZero(sum) ? zero : ring.negate(ring.multiply(sum, leading)));
        }
        return new LaurentSeries<>(-value.lowest(), result);
    }

    @Override
    public LaurentSeries<C> power(LaurentSeries<C> value, int exponent) {
        if (exponent == 0) {
            return constant(ExactConstant.ONE);
        }
        if (exponent < 0) {
            return power(inverse(value), -exponent);
        }
        LaurentSeries<C> half = exponent == 1 ? value : power(value, exponent / 2);
        if (exponent == 1) {
            return value;
        }
        LaurentSeries<C> square = multiply(half, half);
        return exponent % 2 == 0 ? square : multiply(square, value);
    }

    @Override
    public LaurentSeries<C> shift(LaurentSeries<C> value, int shift) {
        return new LaurentSeries<>(value.lowest() + shift, value.coefficients());
    }

    /** e^(f_0 + y) by the recurrence k h_k = sum_{j=1}^{k} j f_j h_{k-j}. */
    @Override
    public LaurentSeries<C> exp(LaurentSeries<C> value) {
        requireRegular("exp", value);
        int n = value.end();
        List<C> result = new ArrayList<>(n);
        C constant = coefficient(value, 0);
        result.add(ring.isZero(constant) ? one : ring.exp(constant));
        for (int k = 1; k < n; k++) {
            C sum = zero;
            for (int j = Math.max(1, value.lowest()); j <= k; j++) {
                C f = coefficient(value, j);
                if (!ring.isZero(f)) {
                    sum = addProduct(sum, ring.multiply(f, Rational.of(j)), result.get(k - j));
                }
            }
            result.add(ring.isZero(sum) ? zero : ring.multiply(sum, Rational.of(1, k)));
        }
        return new LaurentSeries<>(0, result);
    }

    /** ln f = ln f_0 + integral of f'/f. */
    @Override
    public LaurentSeries<C> ln(LaurentSeries<C> value) {
        if (value.lowest() != 0 || value.length() == 0) {
            throw new DomainException("the logarithm of a series needs a constant term that is not zero");
        }
        LaurentSeries<C> quotient = multiply(derivative(value), inverse(value));
        return integral(quotient, ring.ln(value.coefficients().get(0)));
    }

    private LaurentSeries<C> derivative(LaurentSeries<C> value) {
        List<C> result = new ArrayList<>();
        for (int k = 1; k < value.end(); k++) {
            result.add(ring.multiply(coefficient(value, k), Rational.of(k)));
        }
        return series(0, result);
    }

    private LaurentSeries<C> integral(LaurentSeries<C> value, C constant) {
        List<C> result = new ArrayList<>();
        result.add(constant);
        for (int k = 0; k < value.end(); k++) {
            result.add(ring.multiply(coefficient(value, k), Rational.of(1, k + 1)));
        }
        return series(0, result);
    }

    @Override
    public LaurentSeries<C> sin(LaurentSeries<C> value) {
        return sine(value, false);
    }

    @Override
    public LaurentSeries<C> cos(LaurentSeries<C> value) {
        return sine(value, true);
    }

    /** Sine and cosine together: s' = f' c, c' = -f' s. */
    private LaurentSeries<C> sine(LaurentSeries<C> value, boolean cosine) {
        requireRegular("sin and cos", value);
        int n = value.end();
        List<C> sines = new ArrayList<>(n);
        List<C> cosines = new ArrayList<>(n);
        C constant = coefficient(value, 0);
        sines.add(ring.isZero(constant) ? zero : ring.sin(constant));
        cosines.add(ring.isZero(constant) ? one : ring.cos(constant));
        for (int k = 1; k < n; k++) {
            C s = zero;
            C c = zero;
            for (int j = 1; j <= k; j++) {
                C f = coefficient(value, j);
                if (!ring.isZero(f)) {
                    C slope = ring.multiply(f, Rational.of(j));
                    s = addProduct(s, slope, cosines.get(k - j));
                    c = addProduct(c, slope, sines.get(k - j));
                }
            }
            sines.add(ring.multiply(s, Rational.of(1, k)));
            cosines.add(ring.multiply(c, Rational.of(-1, k)));
        }
        return series(0, cosine ? cosines : sines);
    }

    /**
     * Gamma(f_0 + y) = Gamma(f_0) exp(sum_k psi^(k-1)(f_0) y^k/k!). At f_0 = -m the pole is taken out first,
     * Gamma(-m + y) = Gamma(1 + y)/(y (y-1) ... (y-m)), so that no approximate number decides its order.
     */
    @Override
    public LaurentSeries<C> gamma(LaurentSeries<C> value) {
        requireRegular("gamma", value);
        C constant = coefficient(value, 0);
        Optional<Integer> integer = ring.asInteger(constant);
        if (integer.isPresent() && integer.get() <= 0) {
            LaurentSeries<C> y = add(value, constant(ExactConstant.of(-integer.get())));
            LaurentSeries<C> denominator = y;
            for (int j = 1; j <= -integer.get(); j++) {
                denominator = multiply(denominator, add(y, constant(ExactConstant.of(-j))));
            }
            return multiply(gamma(add(y, constant(ExactConstant.ONE))), inverse(denominator));
        }
        List<C> taylor = new ArrayList<>();
        taylor.add(zero);
        for (int k = 1; k < value.end(); k++) {
            taylor.add(ring.multiply(
                    ring.polygamma(k - 1, constant), Rational.of(BigInteger.ONE, ExactFunctions.factorial(k))));
        }
        return multiply(constantSeries(ring.gamma(constant)), exp(compose(taylor, withoutConstant(value))));
    }

    /** psi^(n)(f_0 + y); at f_0 = -m by psi^(n)(z) = psi^(n)(z + m + 1) - (-1)^n n! sum_j (z + j)^(-n-1). */
    @Override
    public LaurentSeries<C> polygamma(int n, LaurentSeries<C> value) {
        requireRegular("polygamma", value);
        C constant = coefficient(value, 0);
        Optional<Integer> integer = ring.asInteger(constant);
        if (integer.isPresent() && integer.get() <= 0) {
            LaurentSeries<C> sum = polygamma(n, add(value, constant(ExactConstant.of(1L - integer.get()))));
            BigInteger factorial = ExactFunctions.factorial(n);
            Rational factor = Rational.of(n % 2 == 0 ? factorial.negate() : factorial);
            for (int j = 0; j <= -integer.get(); j++) {
                LaurentSeries<C> shifted = add(value, constant(ExactConstant.of(j)));
                sum = add(sum, multiply(power(shifted, -n - 1), factor));
            }
            return sum;
        }
        List<C> taylor = new ArrayList<>();
        for (int k = 0; k < value.end(); k++) {
            taylor.add(ring.multiply(
                    ring.polygamma(n + k, constant), Rational.of(BigInteger.ONE, ExactFunctions.factorial(k))));
        }
        return compose(taylor, withoutConstant(value));
    }

    private LaurentSeries<C> constantSeries(C value) {
        List<C> coefficients = zeros(length);
        coefficients.set(0, value);
        return series(0, coefficients);
    }

    private LaurentSeries<C> withoutConstant(LaurentSeries<C> value) {
        List<C> coefficients = new ArrayList<>();
        for (int k = 1; k < value.end(); k++) {
            coefficients.add(coefficient(value, k));
        }
        return series(1, coefficients);
    }

    /** sum_k taylor_k y^k by Horner's rule, for y without constant term. */
    private LaurentSeries<C> compose(List<C> taylor, LaurentSeries<C> y) {
        // y is unknown from x^end on, which matters when no term of it is known
        LaurentSeries<C> unknown = new LaurentSeries<>(y.end(), List.of());
        LaurentSeries<C> result = add(constantSeries(taylor.get(taylor.size() - 1)), unknown);
        for (int k = taylor.size() - 2; k >= 0; k--) {
            result = add(multiply(result, y), constantSeries(taylor.get(k)));
        }
        return result;
    }

    private void requireRegular(String function, LaurentSeries<C> value) {
        if (value.lowest() < 0) {
            throw new DomainException(function + " of an argument that is infinite at this point");
        }
    }

    /** psi(s) z + sum_{k>=2} zeta(k,s) (-z)^k/k with z = slope x, DLMF 5.7.3 for s = 1. */
    @Override
    public LaurentSeries<C> logGammaTail(Rational s, Rational slope) {
        List<C> coefficients = zeros(length);
        Rational power = Rational.ONE;
        for (int k = 1; k < length; k++) {
            power = power.multiply(slope);
            coefficients.set(
                    k,
                    k == 1
                            ? ring.multiply(ring.polygamma(0, ring.constant(s)), power)
                            : ring.multiply(
                                    ring.hurwitz(k, s), (k % 2 == 0 ? power : power.negate()).divide(k)));
        }
        return series(0, coefficients);
    }

    /** psi^(n)(s + z) = sum_k psi^(n+k)(s) z^k/k!, psi^(m)(s) = (-1)^(m+1) m! zeta(m+1, s). */
    @Override
    public LaurentSeries<C> polygammaTail(int n, Rational s, Rational slope) {
        List<C> coefficients = zeros(length);
        // (n+k)!/k! slope^k
        Rational factor = Rational.of(ExactFunctions.factorial(n));
        for (int k = 0; k < length; k++) {
            if (k > 0) {
                factor = factor.multiply(slope).multiply(n + k).divide(k);
            }
            int m = n + k;
            coefficients.set(
                    k,
                    m == 0
                            ? ring.polygamma(0, ring.constant(s))
                            : ring.multiply(ring.hurwitz(m + 1, s), m % 2 == 1 ? factor : factor.negate()));
        }
        return series(0, coefficients);
    }

    @Override
    public LaurentSeries<C> unit3f2Tail(int n, Rational s, Rational slope) {
        List<C> coefficients = zeros(length);
        // (n+k)!/k! slope^k
        Rational factor = Rational.of(ExactFunctions.factorial(n));
        for (int k = 0; k < length; k++) {
            if (k > 0) {
                factor = factor.multiply(slope).multiply(n + k).divide(k);
            }
            coefficients.set(k, ring.multiply(ring.unit3f2(n + k, s), factor));
        }
        return series(0, coefficients);
    }
}
