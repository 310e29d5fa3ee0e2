package bubblechain.analytic;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import java.util.HashMap;
import java.util.Map;
import java.util.Set;

/**
 * The transcendental part of one term of a {@link NormalForm}:
 * constant e^(slope u) prod Gamma(shift + b u)^m prod psi^(n)(shift + b u)^k prod W^(n)(shift + b u)^k prod sin(c + b u)^k.
 *
 * <p>Equality is that of the components. It is written out because the one that comes with a record is put together when
 * it is first used, which takes longer than an ordinary list of coefficients.
 *
 * @param constant   a single product of constants, with coefficient one
 * @param slope      coefficient of u in the exponent
 * @param gammas     powers of gamma functions, never zero
 * @param polygammas positive powers of polygamma functions
 * @param units     positive powers of derivatives of {@link bubblechain.exact.UnitHypergeometric}
 * @param sines      positive powers of sines whose slope is rational (not a multiple of pi)
 */
record TermKey(
        ExactConstant constant,
        ExactConstant slope,
        Map<GammaFactor, Integer> gammas,
        Map<PolygammaFactor, Integer> polygammas,
        Map<UnitFactor, Integer> units,
        Map<SineFactor, Integer> sines) {
    static final TermKey ONE = exponential(ExactConstant.ZERO);

    /** Gamma(shift + slope u) with shift in (0,1] and slope not zero. */
    record GammaFactor(Rational slope, Rational shift) {
        @Override
        public boolean equals(Object other) {
            return other instanceof GammaFactor g && slope.equals(g.slope) && shift.equals(g.shift);
        }

        @Override
        public int hashCode() {
            return 31 * slope.hashCode() + shift.hashCode();
        }
    }

    /** psi^(n)(shift + slope u) with shift in (0,1] and slope not zero. */
    record PolygammaFactor(int n, Rational slope, Rational shift) {
        @Override
        public boolean equals(Object other) {
            return other instanceof PolygammaFactor p && n == p.n && slope.equals(p.slope) && shift.equals(p.shift);
        }

        @Override
        public int hashCode() {
            return 31 * (31 * n + slope.hashCode()) + shift.hashCode();
        }
    }

    /** W^(n)(shift + slope u) with shift in (0,1] and slope not zero. */
    record UnitFactor(int n, Rational slope, Rational shift) {
        /** W(shift + slope u) itself. */
        UnitFactor withoutDerivative() {
            return n == 0 ? this : new UnitFactor(0, slope, shift);
        }
    }

    /** sin(constant + slope u) with slope not zero. */
    record SineFactor(ExactConstant constant, Rational slope) {}

    TermKey {
        gammas = Map.copyOf(gammas);
        polygammas = Map.copyOf(polygammas);
        units = Map.copyOf(units);
        sines = Map.copyOf(sines);
    }

    /** e^(slope u). */
    static TermKey exponential(ExactConstant slope) {
        return gammas(slope, Map.of());
    }

    /** e^(slope u) times a product of gamma functions. */
    static TermKey gammas(ExactConstant slope, Map<GammaFactor, Integer> gammas) {
        return new TermKey(ExactConstant.ONE, slope, gammas, Map.of(), Map.of(), Map.of());
    }

    static TermKey of(PolygammaFactor factor) {
        return new TermKey(ExactConstant.ONE, ExactConstant.ZERO, Map.of(), Map.of(factor, 1), Map.of(), Map.of());
    }

    static TermKey of(UnitFactor factor) {
        return new TermKey(ExactConstant.ONE, ExactConstant.ZERO, Map.of(), Map.of(), Map.of(factor, 1), Map.of());
    }

    static TermKey of(SineFactor factor) {
        return new TermKey(ExactConstant.ONE, ExactConstant.ZERO, Map.of(), Map.of(), Map.of(), Map.of(factor, 1));
    }

    /** The product of the parts that depend on u; the constants are multiplied by the caller. */
    TermKey timesFunctions(TermKey other, ExactConstant newConstant) {
        return new TermKey(
                newConstant,
                slope.add(other.slope),
                merged(gammas, other.gammas),
                merged(polygammas, other.polygammas),
                merged(units, other.units),
                merged(sines, other.sines));
    }

    private static <F> Map<F, Integer> merged(Map<F, Integer> left, Map<F, Integer> right) {
        if (left.isEmpty() || right.isEmpty()) {
            return left.isEmpty() ? right : left;
        }
        Map<F, Integer> result = new HashMap<>(left);
        for (Map.Entry<F, Integer> factor : right.entrySet()) {
            result.put(factor.getKey(), result.getOrDefault(factor.getKey(), 0) + factor.getValue());
        }
        result.values().removeAll(Set.of(0));
        return result;
    }

    boolean isConstant() {
        return slope.isZero() && gammas.isEmpty() && isInvertible();
    }

    /** True if only exponentials and gamma functions depend on u, so that the inverse is of the same kind. */
    boolean isInvertible() {
        return polygammas.isEmpty() && units.isEmpty() && sines.isEmpty();
    }

    /** The inverse of the parts that depend on u, with constant one. */
    TermKey inverseFunctions() {
        Map<GammaFactor, Integer> inverted = new HashMap<>();
        for (Map.Entry<GammaFactor, Integer> factor : gammas.entrySet()) {
            inverted.put(factor.getKey(), -factor.getValue());
        }
        return gammas(slope.negate(), inverted);
    }

    TermKey withConstant(ExactConstant value) {
        return new TermKey(value, slope, gammas, polygammas, units, sines);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof TermKey k
                && constant.equals(k.constant)
                && slope.equals(k.slope)
                && gammas.equals(k.gammas)
                && polygammas.equals(k.polygammas)
                && units.equals(k.units)
                && sines.equals(k.sines);
    }

    @Override
    public int hashCode() {
        int others = 31 * (31 * polygammas.hashCode() + units.hashCode()) + sines.hashCode();
        int functions = 31 * gammas.hashCode() + others;
        return 31 * (31 * constant.hashCode() + slope.hashCode()) + functions;
    }
}
