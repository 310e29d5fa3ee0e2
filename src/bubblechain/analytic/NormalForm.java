package bubblechain.analytic;

import bubblechain.analytic.TermKey.GammaFactor;
import bubblechain.analytic.TermKey.PolygammaFactor;
import bubblechain.analytic.TermKey.SineFactor;
import bubblechain.analytic.TermKey.UnitFactor;
import bubblechain.exact.ConstantFunctions;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import bubblechain.exact.UnitRecurrence;
import bubblechain.formula.Formula;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * A function of u as a sum of terms R(u) c e^(alpha u) prod Gamma(s + b u)^m prod psi^(n)(s + b u)^k prod W^(n)(s + b u)^k, with R over Q(u),
 * c a product of exact constants and s in (0,1]; terms with the same transcendental part are one term. Immutable.
 *
 * <p>sin(pi z) is pi/(Gamma(z) Gamma(1-z)); a sine of rational slope stays as a factor. A form that vanishes formally
 * vanishes identically; the converse is not claimed (products of gammas that the duplication formula relates are not
 * recognised as equal).
 */
public final class NormalForm {
    /** Terms a form may have: beyond this the formula is not distributed but evaluated as a tree. */
    public static final int TERM_LIMIT = 2_000;

    public static final NormalForm ZERO = new NormalForm(Map.of());
    public static final NormalForm ONE = of(TermKey.ONE, RationalFunction.ONE);
    /** The function u. */
    public static final NormalForm VARIABLE = of(Polynomial.linear(Rational.ZERO, Rational.ONE));

    private static final int SHIFT_LIMIT = 2_000;
    private static final int UNIT_SHIFT_LIMIT = 100;

    private final Map<TermKey, RationalFunction> terms;

    private NormalForm(Map<TermKey, RationalFunction> terms) {
        this.terms = terms;
    }

    private static NormalForm of(TermKey key, RationalFunction factor) {
        return factor.isZero() ? ZERO : new NormalForm(Map.of(key, factor));
    }

    /**
     * The normal form of a formula.
     *
     * @param variable the name of the variable
     * @throws InadmissibleFormulaException if the formula is outside the class, with the place
     * @throws bubblechain.formula.FormulaException if a name has no meaning or a constant is undefined
     */
    public static NormalForm of(Formula formula, String variable) {
        return new NormalFormCompiler(variable).compile(formula);
    }

    public static NormalForm of(Polynomial polynomial) {
        return of(TermKey.ONE, RationalFunction.of(polynomial));
    }

    public static NormalForm constant(ExactConstant value) {
        Map<TermKey, RationalFunction> sum = new HashMap<>();
        for (Map.Entry<ExactConstant, Rational> term : value.products().entrySet()) {
            accumulate(sum, TermKey.ONE.withConstant(term.getKey()), RationalFunction.constant(term.getValue()));
        }
        return new NormalForm(sum);
    }

    /** e^(constant + slope u). */
    public static NormalForm exponential(ExactConstant constant, ExactConstant slope) {
        TermKey key = TermKey.exponential(slope);
        return of(key, RationalFunction.ONE).multiply(constant(constant.exp()));
    }

    /** Gamma(constant + slope u); the shift by integers becomes a rational factor. */
    public static NormalForm gamma(Rational constant, Rational slope) {
        if (slope.isZero()) {
            return constant(ConstantFunctions.gamma(ExactConstant.of(constant)));
        }
        Rational shift = reduced(constant);
        int steps = steps(constant, shift);
        Polynomial product = Polynomial.ONE;
        for (int j = 0; j < Math.abs(steps); j++) {
            Rational first = steps > 0 ? shift : shift.add(steps);
            product = product.multiply(Polynomial.linear(first.add(j), slope));
        }
        RationalFunction factor =
                steps >= 0 ? RationalFunction.of(product) : RationalFunction.of(Polynomial.ONE, product);
        Map<GammaFactor, Integer> gammas = Map.of(new GammaFactor(slope, shift), 1);
        return of(TermKey.gammas(ExactConstant.ZERO, gammas), factor);
    }

    /** psi^(n)(constant + slope u); the shift by integers becomes a rational term, DLMF 5.15.5. */
    public static NormalForm polygamma(int n, Rational constant, Rational slope) {
        if (slope.isZero()) {
            return constant(ConstantFunctions.polygamma(n, ExactConstant.of(constant)));
        }
        Rational shift = reduced(constant);
        int steps = steps(constant, shift);
        BigInteger factorial = ExactFunctions.factorial(n);
        Rational sign = Rational.of(n % 2 == 0 ? factorial : factorial.negate());
        if ((long) Math.abs(steps) * (n + 1) > Polynomial.LARGEST_DEGREE) {
            throw new DomainException("the constant " + constant + " in the argument of a polygamma function of order " + n
                    + " is too large");
        }
        RationalFunction rest = RationalFunction.ZERO;
        for (int j = 0; j < steps; j++) {
            rest = rest.add(RationalFunction.of(Polynomial.linear(shift.add(j), slope)).power(-n - 1).multiply(sign));
        }
        for (int j = 1; j <= -steps; j++) {
            Polynomial argument = Polynomial.linear(shift.subtract(j), slope);
            rest = rest.add(RationalFunction.of(argument).power(-n - 1).multiply(sign.negate()));
        }
        TermKey key = TermKey.of(new PolygammaFactor(n, slope, shift));
        return of(key, RationalFunction.ONE).add(of(TermKey.ONE, rest));
    }

    /**
     * The n-th derivative of {@link bubblechain.exact.UnitHypergeometric} at constant + slope u; the shift by integers becomes
     * lower derivatives with rational factors and a rational term.
     */
    public static NormalForm unit3f2(int n, Rational constant, Rational slope) {
        if (slope.isZero()) {
            return constant(ConstantFunctions.unit3f2(n, ExactConstant.of(constant)));
        }
        Rational shift = reduced(constant);
        int steps = steps(constant, shift);
        if (Math.abs(steps) > UNIT_SHIFT_LIMIT) {
            throw new DomainException("the constant " + constant + " in the argument of unit_3f2 is larger than "
                    + UNIT_SHIFT_LIMIT);
        }
        List<NormalForm> atShift = new ArrayList<>();
        for (int k = 0; k <= n; k++) {
            atShift.add(of(TermKey.of(new UnitFactor(k, slope, shift)), RationalFunction.ONE));
        }
        return new UnitRecurrence<>(
                        NormalForm::add, NormalForm::multiply, q -> constant(ExactConstant.of(q)),
                        (c, power) -> of(
                                TermKey.ONE, RationalFunction.of(Polynomial.linear(c, slope)).power(-power)))
                .from(atShift, shift, steps)
                .get(n);
    }

    /** sin(constant + slope u) for a slope that is rational or a rational multiple of pi. */
    public static Optional<NormalForm> sine(ExactConstant constant, ExactConstant slope) {
        if (slope.isZero()) {
            return Optional.of(constant(ConstantFunctions.sine(constant, Rational.ZERO)));
        }
        ExactConstant perPi = ExactConstant.PI.inverse();
        Optional<Rational> turnSlope = slope.multiply(perPi).asRational();
        if (turnSlope.isEmpty()) {
            return slope.asRational().map(b -> sineOfRationalSlope(constant, b));
        }
        Optional<Rational> turnConstant = constant.multiply(perPi).asRational();
        if (turnConstant.isPresent()) {
            return Optional.of(sinePi(turnConstant.get(), turnSlope.get()));
        }
        // sin(c + pi b u) = sin(c) cos(pi b u) + cos(c) sin(pi b u)
        NormalForm first = constant(ConstantFunctions.sine(constant, Rational.ZERO))
                .multiply(sinePi(Rational.HALF, turnSlope.get()));
        NormalForm second = constant(ConstantFunctions.sine(constant, Rational.HALF))
                .multiply(sinePi(Rational.ZERO, turnSlope.get()));
        return Optional.of(first.add(second));
    }

    private static NormalForm sineOfRationalSlope(ExactConstant constant, Rational slope) {
        return of(TermKey.of(new SineFactor(constant, slope)), RationalFunction.ONE);
    }

    /** sin(pi z) = pi/(Gamma(z) Gamma(1-z)), z = constant + slope u, DLMF 5.5.3. */
    private static NormalForm sinePi(Rational constant, Rational slope) {
        NormalForm gammas = gamma(constant, slope).multiply(gamma(Rational.ONE.subtract(constant), slope.negate()));
        return gammas.inverse()
                .map(inverse -> inverse.multiply(constant(ExactConstant.PI)))
                .orElseThrow(() -> new IllegalStateException("a product of gammas has an inverse"));
    }

    private static Rational reduced(Rational z) {
        return z.subtract(Rational.of(z.ceiling())).add(1);
    }

    private static int steps(Rational constant, Rational shift) {
        Rational difference = constant.subtract(shift);
        if (difference.abs().compareTo(Rational.of(SHIFT_LIMIT)) > 0) {
            throw new DomainException("the constant " + constant + " in the argument of a gamma function is larger than "
                    + SHIFT_LIMIT);
        }
        return difference.intValueExact();
    }

    public boolean isZero() {
        return terms.isEmpty();
    }

    /** Number of terms. */
    public int size() {
        return terms.size();
    }

    Map<TermKey, RationalFunction> terms() {
        return terms;
    }

    public NormalForm add(NormalForm other) {
        Map<TermKey, RationalFunction> sum = new HashMap<>(terms);
        for (Map.Entry<TermKey, RationalFunction> term : other.terms.entrySet()) {
            accumulate(sum, term.getKey(), term.getValue());
        }
        return new NormalForm(sum);
    }

    private static void accumulate(Map<TermKey, RationalFunction> sum, TermKey key, RationalFunction factor) {
        RationalFunction total = sum.containsKey(key) ? sum.get(key).add(factor) : factor;
        if (total.isZero()) {
            sum.remove(key);
        } else {
            sum.put(key, total);
        }
    }

    public NormalForm negate() {
        return multiply(Rational.of(-1));
    }

    public NormalForm subtract(NormalForm other) {
        return add(other.negate());
    }

    public NormalForm multiply(Rational factor) {
        if (factor.isZero()) {
            return ZERO;
        }
        Map<TermKey, RationalFunction> product = new HashMap<>();
        for (Map.Entry<TermKey, RationalFunction> term : terms.entrySet()) {
            product.put(term.getKey(), term.getValue().multiply(factor));
        }
        return new NormalForm(product);
    }

    public NormalForm multiply(NormalForm other) {
        if ((long) size() * other.size() > (long) TERM_LIMIT * TERM_LIMIT) {
            throw new DomainException("the product has too many terms");
        }
        Map<TermKey, RationalFunction> product = new HashMap<>();
        for (Map.Entry<TermKey, RationalFunction> left : terms.entrySet()) {
            for (Map.Entry<TermKey, RationalFunction> right : other.terms.entrySet()) {
                RationalFunction factor = left.getValue().multiply(right.getValue());
                ExactConstant constants =
                        left.getKey().constant().multiply(right.getKey().constant());
                for (Map.Entry<ExactConstant, Rational> part : constants.products().entrySet()) {
                    accumulate(
                            product,
                            left.getKey().timesFunctions(right.getKey(), part.getKey()),
                            factor.multiply(part.getValue()));
                }
            }
            if (product.size() > TERM_LIMIT) {
                throw new DomainException("the product has more than " + TERM_LIMIT + " terms");
            }
        }
        return new NormalForm(product);
    }

    /** u^k times this, any integer k. */
    public NormalForm timesPower(int k) {
        RationalFunction power = RationalFunction.of(Polynomial.linear(Rational.ZERO, Rational.ONE)).power(k);
        return multiply(of(TermKey.ONE, power));
    }

    /**
     * 1/this, if it is again a normal form: when this is constant, or all terms have the same exponentials and gammas
     * and nothing else, with one constant. Empty otherwise.
     *
     * @throws ArithmeticException if this is formally zero
     */
    public Optional<NormalForm> inverse() {
        if (isZero()) {
            throw new ArithmeticException("division by zero");
        }
        Optional<ExactConstant> value = asConstant();
        if (value.isPresent()) {
            return Optional.of(constant(value.get().inverse()));
        }
        if (size() != 1) {
            return inverseWithCommonFunctions();
        }
        Map.Entry<TermKey, RationalFunction> only = terms.entrySet().iterator().next();
        if (!only.getKey().isInvertible()) {
            return Optional.empty();
        }
        NormalForm functions = of(only.getKey().inverseFunctions(), only.getValue().inverse());
        return Optional.of(functions.multiply(constant(only.getKey().constant().inverse())));
    }

    /** (c_1 r + c_2 r) f = (c_1 + c_2) r f with the same rational function r up to rational factors. */
    private Optional<NormalForm> inverseWithCommonFunctions() {
        Map.Entry<TermKey, RationalFunction> first = terms.entrySet().iterator().next();
        TermKey functions = first.getKey().withConstant(ExactConstant.ONE);
        RationalFunction shape = first.getValue();
        ExactConstant sum = ExactConstant.ZERO;
        for (Map.Entry<TermKey, RationalFunction> term : terms.entrySet()) {
            RationalFunction ratio = term.getValue().multiply(shape.inverse());
            boolean same = term.getKey().withConstant(ExactConstant.ONE).equals(functions)
                    && ratio.isPolynomial()
                    && ratio.numerator().isConstant();
            if (!same) {
                return Optional.empty();
            }
            sum = sum.add(term.getKey().constant().multiply(ratio.numerator().leading()));
        }
        NormalForm inverseSum = constant(sum.inverse());
        return of(functions, shape).inverse().map(inverse -> inverse.multiply(inverseSum));
    }

    /** The value if this does not depend on u. */
    public Optional<ExactConstant> asConstant() {
        ExactConstant sum = ExactConstant.ZERO;
        for (Map.Entry<TermKey, RationalFunction> term : terms.entrySet()) {
            RationalFunction factor = term.getValue();
            if (!term.getKey().isConstant() || !factor.isPolynomial() || !factor.numerator().isConstant()) {
                return Optional.empty();
            }
            sum = sum.add(term.getKey().constant().multiply(factor.numerator().leading()));
        }
        return Optional.of(sum);
    }

    /** A linear function constant + slope u of the variable. */
    public record Linear(ExactConstant constant, ExactConstant slope) {}

    /** This as a linear function of u, if it is one. */
    public Optional<Linear> asLinear() {
        ExactConstant constant = ExactConstant.ZERO;
        ExactConstant slope = ExactConstant.ZERO;
        for (Map.Entry<TermKey, RationalFunction> term : terms.entrySet()) {
            RationalFunction factor = term.getValue();
            if (!term.getKey().isConstant() || !factor.isPolynomial() || factor.numerator().degree() > 1) {
                return Optional.empty();
            }
            constant = constant.add(term.getKey().constant().multiply(factor.numerator().coefficient(0)));
            slope = slope.add(term.getKey().constant().multiply(factor.numerator().coefficient(1)));
        }
        return Optional.of(new Linear(constant, slope));
    }

    /** The rational function this is, if nothing transcendental occurs. */
    public Optional<RationalFunction> asRationalFunction() {
        if (isZero()) {
            return Optional.of(RationalFunction.ZERO);
        }
        return size() == 1 ? Optional.ofNullable(terms.get(TermKey.ONE)) : Optional.empty();
    }

    /** True if the two forms are equal term by term; then the functions are equal. */
    @Override
    public boolean equals(Object other) {
        return other instanceof NormalForm n && terms.equals(n.terms);
    }

    @Override
    public int hashCode() {
        return terms.hashCode();
    }

    @Override
    public String toString() {
        return terms.toString();
    }
}
