package bubblechain.analytic;

import bubblechain.analytic.TermKey.GammaFactor;
import bubblechain.analytic.TermKey.PolygammaFactor;
import bubblechain.analytic.TermKey.SineFactor;
import bubblechain.analytic.TermKey.UnitFactor;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import bubblechain.series.SeriesAlgebra;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;

/**
 * One term of a normal form written about u0, x = u - u0: an exact power of x, an exact constant, polynomials in x with
 * non-zero constant term above and below, gamma functions at arguments in (0,1] at x = 0, and the rest. The power of x
 * is settled here, in exact arithmetic, before any approximate number enters.
 */
final class LocalTerm {
    /** Recurrence steps, times the power or order, from an argument down to (0,1]. */
    private static final int LARGEST_DISTANCE = 10_000;
    /**
     * Expansions from this length on divide by linear factors one by one; below, the factoring would be seen in the
     * time.
     */
    private static final int LONG = 24;
    /** Denominators of a degree above this are factored for short expansions too. */
    private static final int LOW = 6;

    private final Rational point;
    private final TermKey key;
    private final List<Polynomial> above = new ArrayList<>();
    private final List<Polynomial> below = new ArrayList<>();
    private final List<GammaPower> gammas = new ArrayList<>();
    private ExactConstant constant;
    private int valuation;

    /** Gamma(shift + slope x)^power with shift in (0,1]. */
    record GammaPower(Rational shift, Rational slope, int power) {}

    LocalTerm(TermKey key, RationalFunction factor, Rational point) {
        this.key = key;
        this.point = point;
        this.constant = key.constant().multiply(key.slope().multiply(point).exp());
        RationalFunction local = factor.shifted(point);
        valuation = local.numerator().valuation() - local.denominator().valuation();
        above.add(local.numerator().dividedByPower(local.numerator().valuation()));
        below.add(local.denominator().dividedByPower(local.denominator().valuation()));
        for (Map.Entry<GammaFactor, Integer> gamma : key.gammas().entrySet()) {
            addGamma(gamma.getKey(), gamma.getValue());
        }
        for (Map.Entry<PolygammaFactor, Integer> polygamma : key.polygammas().entrySet()) {
            if (isPole(polygamma.getKey())) {
                valuation -= (polygamma.getKey().n() + 1) * polygamma.getValue();
            }
        }
        for (Map.Entry<TermKey.UnitFactor, Integer> unit : key.units().entrySet()) {
            valuation -= UnitFunctions.poleOrder(unit.getKey(), point) * unit.getValue();
        }
    }

    /** Lowest power of x this term can have; a sine that vanishes at the point is not counted. */
    int valuation() {
        return valuation;
    }

    TermKey key() {
        return key;
    }

    /** What is left of the constants; the polynomials and series are not normalised to 1 at x = 0. */
    ExactConstant constant() {
        return constant;
    }

    List<Polynomial> above() {
        return above;
    }

    List<Polynomial> below() {
        return below;
    }

    List<GammaPower> gammas() {
        return gammas;
    }

    private Rational argument(Rational shift, Rational slope) {
        return shift.add(slope.multiply(point));
    }

    boolean isPole(PolygammaFactor factor) {
        return isPole(argument(factor.shift(), factor.slope()));
    }

    private static boolean isPole(Rational argument) {
        return argument.isInteger() && argument.signum() <= 0;
    }

    /** Gamma(z + b x) = Gamma(s + b x) times or over the factors (s + j + b x), s in (0,1]. */
    private void addGamma(GammaFactor gamma, int power) {
        Rational z = argument(gamma.shift(), gamma.slope());
        Rational s = z.subtract(Rational.of(z.ceiling())).add(1);
        int steps = steps(z, s, Math.abs(power));
        for (int j = 0; j < steps; j++) {
            addFactor(s.add(j), gamma.slope(), power);
        }
        for (int j = 1; j <= -steps; j++) {
            addFactor(s.subtract(j), gamma.slope(), -power);
        }
        constant = constant.multiply(ExactFunctions.gamma(s).power(power));
        gammas.add(new GammaPower(s, gamma.slope(), power));
    }

    /** z - s, refused if so many factors or terms would arise that the expansion never ends. */
    private int steps(Rational z, Rational s, int each) {
        Rational difference = z.subtract(s);
        if (difference.abs().multiply(each).compareTo(Rational.of(LARGEST_DISTANCE)) > 0) {
            throw new DomainException("the point u = " + point + " is too far out: an argument of " + z
                    + " needs more than " + LARGEST_DISTANCE + " steps down to (0,1]");
        }
        return difference.intValueExact();
    }

    /** The factor (value + slope x)^power. */
    private void addFactor(Rational value, Rational slope, int power) {
        if (value.isZero()) {
            constant = constant.multiply(slope.power(power));
            valuation += power;
            return;
        }
        List<Polynomial> side = power > 0 ? above : below;
        for (int k = 0; k < Math.abs(power); k++) {
            side.add(Polynomial.linear(value, slope));
        }
    }

    /** The expansion in x with the length of the algebra. */
    <S> S expand(SeriesAlgebra<S> algebra) {
        S result = functions(algebra);
        for (Polynomial p : above) {
            result = algebra.multiply(result, p.coefficients());
        }
        for (Polynomial p : below) {
            for (Polynomial factor : algebra.length() < LONG && p.degree() <= LOW ? List.of(p) : factors(p)) {
                result = algebra.divide(result, factor.coefficients());
            }
        }
        int poles = 0;
        for (Map.Entry<PolygammaFactor, Integer> entry : key.polygammas().entrySet()) {
            S power = algebra.power(polygamma(algebra, entry.getKey()), entry.getValue());
            if (isPole(entry.getKey())) {
                poles += (entry.getKey().n() + 1) * entry.getValue();
            }
            result = algebra.multiply(result, power);
        }
        for (Map.Entry<UnitFactor, Integer> entry : key.units().entrySet()) {
            poles += UnitFunctions.poleOrder(entry.getKey(), point) * entry.getValue();
            S power = algebra.power(UnitFunctions.about(point, entry.getKey(), algebra), entry.getValue());
            result = algebra.multiply(result, power);
        }
        for (Map.Entry<SineFactor, Integer> entry : key.sines().entrySet()) {
            result = algebra.multiply(result, algebra.power(sine(algebra, entry.getKey()), entry.getValue()));
        }
        // The poles of the polygammas and hypergeometric functions are already in the series, the other powers of x are not.
        return algebra.shift(result, valuation + poles);
    }

    /**
     * The linear factors of a denominator with rational roots, and the rest: the radii of balls grow more slowly in
     * quotients by one factor after the other than by their product, whose coefficients cancel.
     */
    private static List<Polynomial> factors(Polynomial polynomial) {
        if (polynomial.degree() < 2) {
            return List.of(polynomial);
        }
        RationalRoots.Split split = RationalRoots.of(polynomial);
        Rational leading = polynomial.coefficients().get(polynomial.degree());
        List<Polynomial> factors = new ArrayList<>(List.of(split.rest().multiply(leading)));
        split.roots().forEach((root, power) -> factors.addAll(
                Collections.nCopies(power, Polynomial.linear(root.negate(), Rational.ONE))));
        return factors;
    }

    /** constant exp(sum of log-gamma tails + slope x). */
    private <S> S functions(SeriesAlgebra<S> algebra) {
        if (gammas.isEmpty() && key.slope().isZero()) {
            return algebra.constant(constant);
        }
        S exponent = algebra.linear(ExactConstant.ZERO, key.slope());
        for (GammaPower g : gammas) {
            S tail = algebra.logGammaTail(g.shift(), g.slope());
            exponent = algebra.add(exponent, algebra.multiply(tail, Rational.of(g.power())));
        }
        S exponential = algebra.exp(exponent);
        return constant.equals(ExactConstant.ONE)
                ? exponential
                : algebra.multiply(exponential, algebra.constant(constant));
    }

    /**
     * psi^(n)(z + b x) = psi^(n)(s + b x) + factor sum_v (v + b x)^(-n-1), s in (0,1].
     *
     * @param values the v = s, s+1, ..., z-1 with factor (-1)^n n!, or v = s-1, ..., z with the opposite sign
     */
    record Recurrence(Rational s, List<Rational> values, Rational factor) {}

    Recurrence recurrence(PolygammaFactor factor) {
        Rational z = argument(factor.shift(), factor.slope());
        Rational s = z.subtract(Rational.of(z.ceiling())).add(1);
        int n = factor.n();
        int steps = steps(z, s, n + 1);
        List<Rational> values = new ArrayList<>();
        for (int j = 0; j < steps; j++) {
            values.add(s.add(j));
        }
        for (int j = 1; j <= -steps; j++) {
            values.add(s.subtract(j));
        }
        BigInteger factorial = ExactFunctions.factorial(n);
        return new Recurrence(s, values, Rational.of((n % 2 == 0) == (steps >= 0) ? factorial : factorial.negate()));
    }

    private <S> S polygamma(SeriesAlgebra<S> algebra, PolygammaFactor factor) {
        Recurrence recurrence = recurrence(factor);
        S sum = algebra.polygammaTail(factor.n(), recurrence.s(), factor.slope());
        ExactConstant slope = ExactConstant.of(factor.slope());
        for (Rational value : recurrence.values()) {
            S argument = algebra.linear(ExactConstant.of(value), slope);
            sum = algebra.add(
                    sum, algebra.multiply(algebra.power(argument, -factor.n() - 1), recurrence.factor()));
        }
        return sum;
    }

    private <S> S sine(SeriesAlgebra<S> algebra, SineFactor factor) {
        ExactConstant value = factor.constant().add(ExactConstant.of(factor.slope().multiply(point)));
        return algebra.sin(algebra.linear(value, ExactConstant.of(factor.slope())));
    }
}
