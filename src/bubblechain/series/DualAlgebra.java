package bubblechain.series;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import java.util.List;

/**
 * Dual numbers over a series algebra: f(x, t) to first order in t. Every function f obeys
 * f(v + t d) = f(v) + t d f'(v), with the derivative written in terms of the algebra itself.
 *
 * @param <S> the series of the algebra below
 */
public final class DualAlgebra<S> implements SeriesAlgebra<Dual<S>> {
    private final SeriesAlgebra<S> base;

    private DualAlgebra(SeriesAlgebra<S> base) {
        this.base = base;
    }

    public static <S> DualAlgebra<S> over(SeriesAlgebra<S> base) {
        return new DualAlgebra<>(base);
    }

    /** The second variable t itself. */
    public Dual<S> secondVariable() {
        return new Dual<>(zero(), base.constant(ExactConstant.ONE));
    }

    private S zero() {
        return base.constant(ExactConstant.ZERO);
    }

    private Dual<S> withoutDerivative(S value) {
        return new Dual<>(value, zero());
    }

    @Override
    public int length() {
        return base.length();
    }

    @Override
    public Dual<S> constant(ExactConstant value) {
        return withoutDerivative(base.constant(value));
    }

    @Override
    public Dual<S> linear(ExactConstant constant, ExactConstant slope) {
        return withoutDerivative(base.linear(constant, slope));
    }

    @Override
    public Dual<S> add(Dual<S> left, Dual<S> right) {
        return new Dual<>(base.add(left.value(), right.value()), base.add(left.derivative(), right.derivative()));
    }

    @Override
    public Dual<S> negate(Dual<S> value) {
        return new Dual<>(base.negate(value.value()), base.negate(value.derivative()));
    }

    @Override
    public Dual<S> multiply(Dual<S> left, Dual<S> right) {
        return new Dual<>(
                base.multiply(left.value(), right.value()),
                base.add(
                        base.multiply(left.value(), right.derivative()),
                        base.multiply(left.derivative(), right.value())));
    }

    @Override
    public Dual<S> multiply(Dual<S> value, Rational factor) {
        return new Dual<>(base.multiply(value.value(), factor), base.multiply(value.derivative(), factor));
    }

    @Override
    public Dual<S> multiply(Dual<S> value, List<Rational> polynomial) {
        return new Dual<>(base.multiply(value.value(), polynomial), base.multiply(value.derivative(), polynomial));
    }

    @Override
    public Dual<S> divide(Dual<S> value, List<Rational> polynomial) {
        return new Dual<>(base.divide(value.value(), polynomial), base.divide(value.derivative(), polynomial));
    }

    @Override
    public Dual<S> inverse(Dual<S> value) {
        S inverse = base.inverse(value.value());
        return chain(value, inverse, base.negate(base.multiply(inverse, inverse)));
    }

    private Dual<S> chain(Dual<S> argument, S value, S slope) {
        return new Dual<>(value, base.multiply(argument.derivative(), slope));
    }

    @Override
    public Dual<S> power(Dual<S> value, int exponent) {
        if (exponent == 0) {
            return constant(ExactConstant.ONE);
        }
        S slope = base.multiply(base.power(value.value(), exponent - 1), Rational.of(exponent));
        return chain(value, base.power(value.value(), exponent), slope);
    }

    @Override
    public Dual<S> shift(Dual<S> value, int shift) {
        return new Dual<>(base.shift(value.value(), shift), base.shift(value.derivative(), shift));
    }

    @Override
    public Dual<S> exp(Dual<S> value) {
        S exp = base.exp(value.value());
        return chain(value, exp, exp);
    }

    @Override
    public Dual<S> ln(Dual<S> value) {
        return chain(value, base.ln(value.value()), base.inverse(value.value()));
    }

    @Override
    public Dual<S> sin(Dual<S> value) {
        return chain(value, base.sin(value.value()), base.cos(value.value()));
    }

    @Override
    public Dual<S> cos(Dual<S> value) {
        return chain(value, base.cos(value.value()), base.negate(base.sin(value.value())));
    }

    @Override
    public Dual<S> gamma(Dual<S> value) {
        S gamma = base.gamma(value.value());
        return chain(value, gamma, base.multiply(gamma, base.polygamma(0, value.value())));
    }

    @Override
    public Dual<S> polygamma(int n, Dual<S> value) {
        return chain(value, base.polygamma(n, value.value()), base.polygamma(n + 1, value.value()));
    }

    @Override
    public Dual<S> logGammaTail(Rational s, Rational slope) {
        return withoutDerivative(base.logGammaTail(s, slope));
    }

    @Override
    public Dual<S> polygammaTail(int n, Rational s, Rational slope) {
        return withoutDerivative(base.polygammaTail(n, s, slope));
    }

    @Override
    public Dual<S> unit3f2Tail(int n, Rational s, Rational slope) {
        return withoutDerivative(base.unit3f2Tail(n, s, slope));
    }
}
