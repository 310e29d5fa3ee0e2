package bubblechain.exact;

import java.math.BigInteger;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * A product of constants in canonical form, without rational coefficient:
 * pi^(h/2) e^(r + s gammaE) prod_p p^(q_p) prod_g g^(k_g), with 0 &lt; q_p &lt; 1 and g the {@link Generator}s.
 */
final class Monomial {
    static final Monomial ONE =
            new Monomial(0, Rational.ZERO, Rational.ZERO, new TreeMap<>(), new Generator[0], new int[0]);

    private final int halfPi;
    private final Rational exponent;
    private final Rational eulerExponent;
    private final SortedMap<BigInteger, Rational> roots;
    private final Generator[] generators;
    private final int[] powers;
    private final int hash;

    private Monomial(
            int halfPi,
            Rational exponent,
            Rational eulerExponent,
            SortedMap<BigInteger, Rational> roots,
            Generator[] generators,
            int[] powers) {
        this.halfPi = halfPi;
        this.exponent = exponent;
        this.eulerExponent = eulerExponent;
        this.roots = roots;
        this.generators = generators;
        this.powers = powers;
        int h = halfPi;
        h = 31 * h + exponent.hashCode();
        h = 31 * h + eulerExponent.hashCode();
        h = 31 * h + roots.hashCode();
        h = 31 * h + Arrays.hashCode(generators);
        this.hash = 31 * h + Arrays.hashCode(powers);
    }

    static Monomial piPower(int half) {
        return new Monomial(half, Rational.ZERO, Rational.ZERO, ONE.roots, ONE.generators, ONE.powers);
    }

    static Monomial exp(Rational exponent, Rational eulerExponent) {
        return new Monomial(0, exponent, eulerExponent, ONE.roots, ONE.generators, ONE.powers);
    }

    /** p^q for a prime p and 0 &lt; q &lt; 1. */
    static Monomial root(BigInteger p, Rational q) {
        TreeMap<BigInteger, Rational> roots = new TreeMap<>();
        roots.put(p, q);
        return new Monomial(0, Rational.ZERO, Rational.ZERO, roots, ONE.generators, ONE.powers);
    }

    static Monomial of(Generator generator) {
        return new Monomial(
                0, Rational.ZERO, Rational.ZERO, ONE.roots, new Generator[] {generator}, new int[] {1});
    }

    /** pi^piPower times powers of generators, which are in their order; the powers are not zero. */
    static Monomial of(int piPower, Generator[] generators, int[] powers) {
        return new Monomial(2 * piPower, Rational.ZERO, Rational.ZERO, ONE.roots, generators, powers);
    }

    /** A product with the rational factor that carries over when fractional powers of a prime add to one or more. */
    record Product(Monomial monomial, Rational factor) {}

    Product multiply(Monomial other) {
        Rational factor = Rational.ONE;
        SortedMap<BigInteger, Rational> product = roots.isEmpty() ? other.roots : roots;
        if (!roots.isEmpty() && !other.roots.isEmpty()) {
            product = new TreeMap<>(roots);
            for (Map.Entry<BigInteger, Rational> entry : other.roots.entrySet()) {
                Rational q = product.getOrDefault(entry.getKey(), Rational.ZERO).add(entry.getValue());
                if (q.compareTo(Rational.ONE) >= 0) {
                    factor = factor.multiply(Rational.of(entry.getKey()));
                    q = q.subtract(1);
                }
                if (q.isZero()) {
                    product.remove(entry.getKey());
                } else {
                    product.put(entry.getKey(), q);
                }
            }
        }
        List<Generator> merged = new ArrayList<>(generators.length + other.generators.length);
        int[] mergedPowers = mergeGenerators(other, merged);
        return new Product(
                new Monomial(
                        halfPi + other.halfPi,
                        exponent.add(other.exponent),
                        eulerExponent.add(other.eulerExponent),
                        product,
                        merged.toArray(new Generator[0]),
                        mergedPowers),
                factor);
    }

    private int[] mergeGenerators(Monomial other, List<Generator> merged) {
        int[] result = new int[generators.length + other.generators.length];
        int i = 0;
        int j = 0;
        int length = 0;
        while (i < generators.length || j < other.generators.length) {
            int order = i == generators.length
                    ? 1
                    : j == other.generators.length ? -1 : generators[i].compareTo(other.generators[j]);
            Generator next = order <= 0 ? generators[i] : other.generators[j];
            int power = (order <= 0 ? powers[i++] : 0) + (order >= 0 ? other.powers[j++] : 0);
            if (power != 0) {
                merged.add(next);
                result[length++] = power;
            }
        }
        return Arrays.copyOf(result, length);
    }

    /** True if 1/this is again a monomial: no Euler constant, zeta value or logarithm in it. */
    boolean isUnit() {
        for (Generator generator : generators) {
            if (!generator.isOpaque()) {
                return false;
            }
        }
        return true;
    }

    Product inverse() {
        Rational factor = Rational.ONE;
        TreeMap<BigInteger, Rational> inverted = new TreeMap<>();
        for (Map.Entry<BigInteger, Rational> entry : roots.entrySet()) {
            factor = factor.divide(Rational.of(entry.getKey()));
            inverted.put(entry.getKey(), Rational.ONE.subtract(entry.getValue()));
        }
        int[] negated = powers.clone();
        for (int i = 0; i < negated.length; i++) {
            negated[i] = -negated[i];
        }
        return new Product(
                new Monomial(-halfPi, exponent.negate(), eulerExponent.negate(), inverted, generators, negated), factor);
    }

    Monomial timesPi(int power) {
        return power == 0
                ? this
                : new Monomial(halfPi + 2 * power, exponent, eulerExponent, roots, generators, powers);
    }

    /** True for pi^power alone. */
    boolean isPiPower(int power) {
        return halfPi == 2 * power
                && generators.length == 0
                && exponent.isZero()
                && eulerExponent.isZero()
                && roots.isEmpty();
    }

    boolean isOne() {
        return this.equals(ONE);
    }

    boolean isOpaque() {
        for (Generator generator : generators) {
            if (generator.isOpaque()) {
                return true;
            }
        }
        return false;
    }

    /** The single generator to the first power, if this monomial is nothing else. */
    @org.jspecify.annotations.Nullable Generator asGenerator() {
        boolean single = halfPi == 0
                && exponent.isZero()
                && eulerExponent.isZero()
                && roots.isEmpty()
                && generators.length == 1
                && powers[0] == 1;
        return single ? generators[0] : null;
    }

    int halfPi() {
        return halfPi;
    }

    Rational exponent() {
        return exponent;
    }

    Rational eulerExponent() {
        return eulerExponent;
    }

    SortedMap<BigInteger, Rational> roots() {
        return roots;
    }

    boolean hasGenerators() {
        return generators.length > 0;
    }

    /** Twice the transcendental weight: pi and ln count one, zeta(k) counts k. */
    int doubledWeight() {
        int weight = halfPi;
        for (int i = 0; i < generators.length; i++) {
            weight += 2 * powers[i] * generators[i].weight();
        }
        return weight;
    }

    Ball toBall(int bits) {
        Ball result = Ball.ONE;
        if (halfPi != 0) {
            Ball pi = BallFunctions.pi(bits);
            Ball base = halfPi % 2 == 0 ? pi : BallFunctions.sqrt(pi, bits);
            result = base.power(halfPi % 2 == 0 ? halfPi / 2 : halfPi, bits);
        }
        if (!exponent.isZero() || !eulerExponent.isZero()) {
            Ball argument = Ball.of(exponent, bits);
            if (!eulerExponent.isZero()) {
                argument = argument.add(BallFunctions.eulerGamma(bits).multiply(eulerExponent, bits), bits);
            }
            result = result.multiply(BallFunctions.exp(argument, bits), bits);
        }
        for (Map.Entry<BigInteger, Rational> entry : roots.entrySet()) {
            result = result.multiply(
                    BallFunctions.power(Ball.of(entry.getKey()), entry.getValue(), bits), bits);
        }
        for (int i = 0; i < generators.length; i++) {
            result = result.multiply(generators[i].toBall(bits).power(powers[i], bits), bits);
        }
        return result;
    }

    /** The factors in the formula language, such as ["pi^2", "zeta(3)"]; negative powers go to {@code below}. */
    void appendFactors(List<String> above, List<String> below) {
        if (!exponent.isZero() || !eulerExponent.isZero()) {
            above.add("exp(" + exponentText() + ")");
        }
        for (int i = 0; i < generators.length; i++) {
            (powers[i] > 0 ? above : below).add(power(generators[i].toString(), Math.abs(powers[i])));
        }
        if (halfPi != 0) {
            int h = Math.abs(halfPi);
            (halfPi > 0 ? above : below).add(h % 2 == 0 ? power("pi", h / 2) : h == 1 ? "sqrt(pi)" : "pi^(" + h + "/2)");
        }
        roots.forEach((p, q) -> above.add(q.equals(Rational.HALF) ? "sqrt(" + p + ")" : p + "^(" + q + ")"));
    }

    private String exponentText() {
        if (eulerExponent.isZero()) {
            return exponent.toString();
        }
        String euler = eulerExponent.equals(Rational.ONE)
                ? "euler_gamma"
                : eulerExponent.equals(Rational.of(-1)) ? "-euler_gamma" : eulerExponent + "*euler_gamma";
        if (exponent.isZero()) {
            return euler;
        }
        return exponent + (euler.startsWith("-") ? euler : "+" + euler);
    }

    private static String power(String base, int exponent) {
        return exponent == 1 ? base : base + "^" + exponent;
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Monomial m
                && hash == m.hash
                && halfPi == m.halfPi
                && exponent.equals(m.exponent)
                && eulerExponent.equals(m.eulerExponent)
                && roots.equals(m.roots)
                && Arrays.equals(generators, m.generators)
                && Arrays.equals(powers, m.powers);
    }

    @Override
    public int hashCode() {
        return hash;
    }
}
