package bubblechain.series;

import bubblechain.exact.ConstantFunctions;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import bubblechain.exact.UnitHypergeometric;
import java.util.Optional;

/** Exact constants; functions without a canonical form give opaque constants. */
public final class ExactRing implements CoefficientRing<ExactConstant> {
    public static final ExactRing INSTANCE = new ExactRing();

    private ExactRing() {}

    @Override
    public ExactConstant constant(ExactConstant value) {
        return value;
    }

    @Override
    public ExactConstant constant(Rational value) {
        return ExactConstant.of(value);
    }

    @Override
    public ExactConstant add(ExactConstant left, ExactConstant right) {
        return left.add(right);
    }

    @Override
    public ExactConstant negate(ExactConstant value) {
        return value.negate();
    }

    @Override
    public ExactConstant multiply(ExactConstant left, ExactConstant right) {
        return left.multiply(right);
    }

    @Override
    public ExactConstant multiply(ExactConstant value, Rational factor) {
        return value.multiply(factor);
    }

    @Override
    public ExactConstant inverse(ExactConstant value) {
        return value.inverse();
    }

    @Override
    public boolean isZero(ExactConstant value) {
        return value.isZero();
    }

    @Override
    public Optional<Integer> asInteger(ExactConstant value) {
        return value.asRational().filter(Rational::isInteger).map(Rational::intValueExact);
    }

    @Override
    public ExactConstant exp(ExactConstant value) {
        return value.exp();
    }

    @Override
    public ExactConstant ln(ExactConstant value) {
        return value.ln();
    }

    @Override
    public ExactConstant sin(ExactConstant value) {
        return ConstantFunctions.sine(value, Rational.ZERO);
    }

    @Override
    public ExactConstant cos(ExactConstant value) {
        return ConstantFunctions.sine(value, Rational.HALF);
    }

    @Override
    public ExactConstant gamma(ExactConstant value) {
        return ConstantFunctions.gamma(value);
    }

    @Override
    public ExactConstant polygamma(int n, ExactConstant value) {
        return ConstantFunctions.polygamma(n, value);
    }

    @Override
    public ExactConstant hurwitz(int k, Rational s) {
        return ExactFunctions.hurwitz(k, s);
    }

    @Override
    public ExactConstant unit3f2(int k, Rational s) {
        return UnitHypergeometric.coefficient(k, s);
    }
}
