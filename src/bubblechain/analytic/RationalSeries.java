package bubblechain.analytic;

import bubblechain.exact.Rational;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;

/**
 * A truncated Laurent series with rational coefficients, sum_k coefficients[k] x^(lowest + k). Immutable.
 *
 * <p>Every operation keeps the number of coefficients, or the smaller of two.
 */
record RationalSeries(int lowest, List<Rational> coefficients) {
    /** e^(slope x). */
    static RationalSeries exponential(Rational slope, int length) {
        List<Rational> result = new ArrayList<>(length);
        Rational term = Rational.ONE;
        for (int k = 0; k < length; k++) {
            result.add(term);
            term = slope.isZero() ? Rational.ZERO : term.multiply(slope).divide(k + 1L);
        }
        return new RationalSeries(0, result);
    }

    /** (value + slope x)^power for a negative power. */
    static RationalSeries inversePower(Rational value, Rational slope, int power, int length) {
        RationalSeries one = exponential(Rational.ZERO, length);
        if (value.isZero()) {
            return one.times(slope.power(power)).shifted(power);
        }
        RationalSeries result = one;
        for (int k = 0; k < -power; k++) {
            result = result.over(List.of(value, slope));
        }
        return result;
    }

    RationalSeries shifted(int power) {
        return power == 0 ? this : new RationalSeries(lowest + power, coefficients);
    }

    RationalSeries times(Rational factor) {
        return new RationalSeries(lowest, coefficients.stream().map(c -> c.multiply(factor)).toList());
    }

    /** The product with a polynomial, by its coefficients from the constant term on. */
    RationalSeries times(List<Rational> polynomial) {
        if (polynomial.size() == 1) {
            return polynomial.get(0).equals(Rational.ONE) ? this : times(polynomial.get(0));
        }
        List<Rational> result = new ArrayList<>(coefficients.size());
        for (int k = 0; k < coefficients.size(); k++) {
            result.add(convolution(polynomial, coefficients, k, 0));
        }
        return new RationalSeries(lowest, result);
    }

    /** The quotient by a polynomial whose constant term is not zero. */
    RationalSeries over(List<Rational> polynomial) {
        Rational inverse = polynomial.get(0).inverse();
        if (polynomial.size() == 1) {
            return inverse.equals(Rational.ONE) ? this : times(inverse);
        }
        List<Rational> result = new ArrayList<>(coefficients.size());
        for (int k = 0; k < coefficients.size(); k++) {
            Rational rest = coefficients.get(k).subtract(convolution(polynomial, result, k, 1));
            result.add(rest.multiply(inverse));
        }
        return new RationalSeries(lowest, result);
    }

    RationalSeries times(RationalSeries other) {
        int length = Math.min(coefficients.size(), other.coefficients.size());
        List<Rational> result = new ArrayList<>(length);
        for (int k = 0; k < length; k++) {
            result.add(convolution(coefficients, other.coefficients, k, 0));
        }
        return new RationalSeries(lowest + other.lowest, result);
    }

    /** sum_{j>=from} left_j right_(k-j). */
    private static Rational convolution(List<Rational> left, List<Rational> right, int k, int from) {
        Rational sum = Rational.ZERO;
        for (int j = from; j < left.size() && j <= k; j++) {
            Rational factor = left.get(j);
            if (!factor.isZero() && !right.get(k - j).isZero()) {
                sum = sum.add(factor.multiply(right.get(k - j)));
            }
        }
        return sum;
    }

    RationalSeries plus(RationalSeries other) {
        int first = Math.min(lowest, other.lowest);
        int end = Math.min(lowest + coefficients.size(), other.lowest + other.coefficients.size());
        List<Rational> result = new ArrayList<>(Collections.nCopies(Math.max(0, end - first), Rational.ZERO));
        for (int k = 0; k < result.size(); k++) {
            result.set(k, coefficient(first + k).add(other.coefficient(first + k)));
        }
        return new RationalSeries(first, result);
    }

    /** The coefficient of x^power, zero below the lowest. */
    Rational coefficient(int power) {
        return power < lowest ? Rational.ZERO : coefficients.get(power - lowest);
    }
}
