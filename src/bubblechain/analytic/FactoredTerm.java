package bubblechain.analytic;

import bubblechain.analytic.RealRoots.Interval;
import bubblechain.analytic.TermKey.GammaFactor;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.series.FixedSeries;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;

/**
 * A term of a normal form with its rational function split into u^valuation, a constant, factors (1 - u/root)^power with
 * rational roots, and what is left.
 *
 * @param key       the transcendental part
 * @param valuation power of u
 * @param constant  value of the rest of the rational function at u = 0
 * @param roots     powers of (1 - u/root)
 * @param above     the numerator without rational roots, 1 at u = 0
 * @param below     the denominator without rational roots, 1 at u = 0
 */
record FactoredTerm(
        TermKey key,
        int valuation,
        Rational constant,
        Map<Rational, Integer> roots,
        Polynomial above,
        Polynomial below) {
    /** Poles of each gamma function looked at for the nearest one that does not cancel. */
    private static final int POLES_SEARCHED = 24;

    private static final Rational ROOT_WIDTH = Rational.TWO.power(-40);
    private static final double SMALLEST_SCALE = 1e-6;

    static FactoredTerm of(TermKey key, RationalFunction factor) {
        Map<Rational, Integer> roots = new HashMap<>();
        int valuation = factor.numerator().valuation() - factor.denominator().valuation();
        Polynomial above = split(factor.numerator().dividedByPower(factor.numerator().valuation()), 1, roots);
        Polynomial below = split(factor.denominator().dividedByPower(factor.denominator().valuation()), -1, roots);
        Rational constant = above.coefficient(0).divide(below.coefficient(0));
        return new FactoredTerm(
                key, valuation, constant, Map.copyOf(roots), above.multiply(above.coefficient(0).inverse()),
                below.multiply(below.coefficient(0).inverse()));
    }

    /** Takes the small rational roots out; the rest keeps the value at u = 0. */
    private static Polynomial split(Polynomial polynomial, int sign, Map<Rational, Integer> roots) {
        RationalRoots.Split split = RationalRoots.of(polynomial);
        for (Map.Entry<Rational, Integer> root : split.roots().entrySet()) {
            add(roots, root.getKey(), sign * root.getValue());
        }
        Polynomial rest = split.rest();
        // the factors (1 - u/root) are one at u = 0
        return rest.multiply(polynomial.coefficient(0).divide(rest.coefficient(0)));
    }

    /** More of a power. */
    static void add(Map<Rational, Integer> powers, Rational root, int power) {
        powers.put(root, powers.getOrDefault(root, 0) + power);
    }

    /** The exponential and the gammas alone, which terms can share. */
    TermKey functions() {
        return TermKey.gammas(key.slope(), key.gammas());
    }

    /** A radius within which the term has no singular point but u = 0; empty if it has none at all. */
    Optional<Rational> radius() {
        Map<Rational, Integer> powers = new TreeMap<>(roots);
        for (Map.Entry<GammaFactor, Integer> gamma : key.gammas().entrySet()) {
            for (int j = 0; j < POLES_SEARCHED; j++) {
                add(powers, pole(gamma.getKey(), j), -gamma.getValue());
            }
        }
        Optional<Rational> nearest = Optional.empty();
        for (Map.Entry<Rational, Integer> factor : powers.entrySet()) {
            if (factor.getValue() < 0) {
                nearest = smaller(nearest, factor.getKey().abs());
            }
        }
        for (TermKey.PolygammaFactor p : key.polygammas().keySet()) {
            nearest = smaller(nearest, p.shift().divide(p.slope()).abs());
        }
        for (TermKey.UnitFactor w : key.units().keySet()) {
            nearest = smaller(nearest, UnitFunctions.distance(w));
        }
        Polynomial squarefree = below.divideExactly(below.gcd(below.derivative()));
        for (Interval interval : RealRoots.of(squarefree)) {
            double root = RealRoots.refine(squarefree, interval, ROOT_WIDTH).lower().toDouble();
            nearest = smaller(nearest, shortNumberBelow(Math.abs(root)));
        }
        for (ComplexRoots.Pair pair : ComplexRoots.of(squarefree)) {
            nearest = smaller(nearest, shortNumberBelow(Math.hypot(pair.re(), pair.im())));
        }
        return nearest;
    }

    private static Optional<Rational> smaller(Optional<Rational> first, Rational second) {
        return first.isPresent() && first.get().compareTo(second) < 0 ? first : Optional.of(second);
    }

    /** A number of five bits, at most 1/16 below; only the scale of the variable hangs on it. */
    private static Rational shortNumberBelow(double size) {
        double reduced = Math.max(size * 0.999, SMALLEST_SCALE);
        int exponent = Math.getExponent(reduced) - 4;
        return Rational.TWO.power(exponent).multiply((long) Math.scalb(reduced, -exponent));
    }

    static Rational pole(GammaFactor gamma, int j) {
        return gamma.shift().add(j).divide(gamma.slope()).negate();
    }

    /**
     * A series in v times the rational function of this term and the given further factors, u^valuation taken as
     * u^(shift + valuation)/u^shift.
     */
    FixedSeries applyTo(FixedSeries series, Map<Rational, Integer> further, Rational radius, int shift) {
        Map<Rational, Integer> powers = new HashMap<>(roots);
        for (Map.Entry<Rational, Integer> factor : further.entrySet()) {
            add(powers, factor.getKey(), factor.getValue());
        }
        FixedSeries result = series;
        if (above.degree() > 0) {
            result = result.times(scaled(above, radius));
        }
        result = LinearFactors.apply(result, powers, radius);
        if (below.degree() > 0) {
            result = result.over(scaled(below, radius));
        }
        Rational weight = constant.multiply(radius.power(valuation + shift));
        if (!weight.equals(Rational.ONE)) {
            result = result.times(List.of(weight));
        }
        return valuation + shift == 0 ? result : result.shifted(valuation + shift);
    }

    private static List<Rational> scaled(Polynomial polynomial, Rational radius) {
        List<Rational> result = new java.util.ArrayList<>();
        Rational power = Rational.ONE;
        for (Rational c : polynomial.coefficients()) {
            result.add(c.multiply(power));
            power = power.multiply(radius);
        }
        return result;
    }
}
