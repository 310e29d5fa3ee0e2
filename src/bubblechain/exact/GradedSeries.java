package bubblechain.exact;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * A power series sum_w H_w x^w in which H_w is a homogeneous polynomial of weight w: pi has weight one and every other
 * constant the weight of the power of x it came with, so that zeta(k) normally has weight k.
 *
 * <p>The exponential of such a series without products of constants is written down monomial by monomial,
 * exp(sum_g r_g g x^(w_g)) = sum prod_g (r_g^(e_g)/e_g!) g^(e_g) x^(sum w_g e_g); only the powers of pi, whose
 * exponent has a term at every order, need a recurrence, and that one is rational.
 *
 * @implNote the cost of an exponential is the number of its monomials
 */
public final class GradedSeries {
    /** Monomials one series may have. */
    public static final int LARGEST_SIZE = 1_000_000;

    /** The sum over j of coefficients[j] pi^j x^(weight + j), to be multiplied by one monomial without pi. */
    private record Part(int weight, Rational[] coefficients) {}

    /** coefficient generator x^weight. */
    private record Slope(Generator generator, int weight, Rational coefficient) {}

    private final int length;
    private final Map<Monomial, Part> parts;

    private GradedSeries(int length, Map<Monomial, Part> parts) {
        this.length = length;
        this.parts = parts;
    }

    /** The terms of a series without products of constants, by kind. */
    private record Linear(Rational[] pi, List<Slope> slopes) {}

    /** The parts of sum_k coefficients[k] x^k, if the k-th is a rational combination of pi^k and single constants. */
    private static Optional<Linear> linear(List<ExactConstant> coefficients) {
        Rational[] pi = new Rational[coefficients.size()];
        Arrays.fill(pi, Rational.ZERO);
        List<Slope> slopes = new ArrayList<>();
        Set<Generator> seen = new HashSet<>();
        for (int k = 0; k < coefficients.size(); k++) {
            for (Map.Entry<Monomial, Rational> term : coefficients.get(k).terms().entrySet()) {
                Generator generator = term.getKey().asGenerator();
                if (generator != null && k > 0 && seen.add(generator)) {
                    slopes.add(new Slope(generator, k, term.getValue()));
                } else if (term.getKey().isPiPower(k)) {
                    pi[k] = term.getValue();
                } else {
                    return Optional.empty();
                }
            }
        }
        slopes.sort(Comparator.comparing(Slope::generator));
        return Optional.of(new Linear(pi, slopes));
    }

    /** The series 1 with all orders below {@code length}. */
    public static GradedSeries one(int length) {
        return new GradedSeries(length, Map.of(Monomial.ONE, new Part(0, new Rational[] {Rational.ONE})));
    }

    /**
     * sum_k coefficients[k] x^k.
     *
     * @return empty if a coefficient has a term that is neither a multiple of pi^k nor of a single constant, or a
     *     constant comes with two powers of x
     */
    public static Optional<GradedSeries> of(List<ExactConstant> coefficients) {
        return linear(coefficients).map(linear -> {
            Map<Monomial, Part> parts = new LinkedHashMap<>();
            if (Arrays.stream(linear.pi()).anyMatch(c -> !c.isZero())) {
                parts.put(Monomial.ONE, new Part(0, linear.pi()));
            }
            for (Slope slope : linear.slopes()) {
                parts.put(Monomial.of(slope.generator()), new Part(slope.weight(), new Rational[] {slope.coefficient()}));
            }
            return new GradedSeries(coefficients.size(), parts);
        });
    }

    /**
     * exp(sum_{k>=1} exponent[k] x^k), with as many orders as the exponent has.
     *
     * @param exponent entry 0 is zero
     * @return empty in the cases of {@link #of}
     * @throws DomainException if the series has more than {@link #LARGEST_SIZE} monomials
     */
    public static Optional<GradedSeries> exp(List<ExactConstant> exponent) {
        return linear(exponent).filter(linear -> exponent.isEmpty() || linear.pi()[0].isZero()).map(linear -> {
            requireSize(linear, exponent.size());
            return enumerated(linear, exponent.size());
        });
    }

    private static void requireSize(Linear linear, int length) {
        double[] counts = new double[length];
        int step = 1;
        while (step < length && linear.pi()[step].isZero()) {
            step++;
        }
        for (int w = 0; w < length; w += step) {
            counts[w] = 1;
        }
        for (Slope slope : linear.slopes()) {
            for (int w = slope.weight(); w < length; w++) {
                counts[w] += counts[w - slope.weight()];
            }
        }
        double total = 0;
        for (int w = 0; w < length; w++) {
            total += counts[w];
            if (total > LARGEST_SIZE) {
                throw new DomainException("the exact coefficient of order " + (length - 1) + " has more than "
                        + LARGEST_SIZE + " terms, as every order from " + w + " on; ask for fewer orders");
            }
        }
    }

    private static GradedSeries enumerated(Linear linear, int length) {
        List<Product> products = new ArrayList<>();
        products.add(new Product(new Generator[0], new int[0], 0, Rational.ONE));
        for (Slope slope : linear.slopes()) {
            Rational[] powers = exponential(slope, length);
            int before = products.size();
            for (int i = 0; i < before; i++) {
                Product product = products.get(i);
                for (int e = 1; e < powers.length && product.weight() + e * slope.weight() < length; e++) {
                    products.add(product.times(slope, e, powers[e]));
                }
            }
        }
        Rational[] pi = exponential(linear.pi());
        Map<Monomial, Part> parts = new LinkedHashMap<>(2 * products.size());
        for (Product product : products) {
            Rational[] coefficients = new Rational[Math.min(pi.length, length - product.weight())];
            for (int j = 0; j < coefficients.length; j++) {
                coefficients[j] = pi[j].isZero() ? Rational.ZERO : pi[j].multiply(product.coefficient());
            }
            parts.put(
                    Monomial.of(0, product.generators(), product.powers()),
                    new Part(product.weight(), coefficients));
        }
        return new GradedSeries(length, parts);
    }

    private record Product(Generator[] generators, int[] powers, int weight, Rational coefficient) {
        Product times(Slope slope, int power, Rational factor) {
            int n = generators.length;
            Generator[] longer = Arrays.copyOf(generators, n + 1);
            int[] longerPowers = Arrays.copyOf(powers, n + 1);
            longer[n] = slope.generator();
            longerPowers[n] = power;
            return new Product(longer, longerPowers, weight + power * slope.weight(), coefficient.multiply(factor));
        }
    }

    /** r^e/e! for e = 0, 1, ... */
    private static Rational[] exponential(Slope slope, int length) {
        Rational[] powers = new Rational[(length - 1) / slope.weight() + 1];
        powers[0] = Rational.ONE;
        for (int e = 1; e < powers.length; e++) {
            powers[e] = powers[e - 1].multiply(slope.coefficient()).divide(e);
        }
        return powers;
    }

    /** k h_k = sum_j j f_j h_(k-j); the zeros at the end are left out. */
    private static Rational[] exponential(Rational[] f) {
        Rational[] h = new Rational[f.length];
        int end = 0;
        for (int k = 0; k < f.length; k++) {
            Rational sum = k == 0 ? Rational.ONE : Rational.ZERO;
            for (int j = 1; j <= k; j++) {
                if (!f[j].isZero() && !h[k - j].isZero()) {
                    sum = sum.add(f[j].multiply(j).multiply(h[k - j]));
                }
            }
            h[k] = k == 0 ? sum : sum.divide(k);
            end = h[k].isZero() ? end : k + 1;
        }
        return Arrays.copyOf(h, end);
    }

    /** The orders are those below this. */
    public int length() {
        return length;
    }

    /** H_weight x^weight alone. */
    public GradedSeries part(int weight) {
        Map<Monomial, Part> selected = new LinkedHashMap<>();
        parts.forEach((monomial, part) -> {
            int j = weight - part.weight();
            if (j >= 0 && j < part.coefficients().length && !part.coefficients()[j].isZero()) {
                Rational[] coefficients = new Rational[j + 1];
                Arrays.fill(coefficients, Rational.ZERO);
                coefficients[j] = part.coefficients()[j];
                selected.put(monomial, new Part(part.weight(), coefficients));
            }
        });
        return new GradedSeries(length, selected);
    }

    /**
     * The product, through the orders both factors have.
     *
     * @return empty if a monomial would come with two powers of x
     * @throws DomainException if the product has more than {@link #LARGEST_SIZE} monomials
     */
    public Optional<GradedSeries> multiply(GradedSeries other) {
        int end = Math.min(length, other.length);
        Map<Monomial, Part> product = new LinkedHashMap<>();
        for (Map.Entry<Monomial, Part> left : parts.entrySet()) {
            for (Map.Entry<Monomial, Part> right : other.parts.entrySet()) {
                int weight = left.getValue().weight() + right.getValue().weight();
                if (weight >= end) {
                    continue;
                }
                Rational[] coefficients =
                        convolution(left.getValue().coefficients(), right.getValue().coefficients(), end - weight);
                Monomial monomial = left.getKey().multiply(right.getKey()).monomial();
                Part known = product.get(monomial);
                if (known != null && known.weight() != weight) {
                    return Optional.empty();
                }
                product.put(
                        monomial,
                        new Part(weight, known == null ? coefficients : sum(known.coefficients(), coefficients)));
            }
            if (product.size() > LARGEST_SIZE) {
                throw new DomainException("a product of exact series has more than " + LARGEST_SIZE
                        + " terms; ask for fewer orders");
            }
        }
        return Optional.of(new GradedSeries(end, product));
    }

    private static Rational[] convolution(Rational[] left, Rational[] right, int limit) {
        int n = Math.max(0, Math.min(limit, left.length + right.length - 1));
        Rational[] result = new Rational[n];
        Arrays.fill(result, Rational.ZERO);
        for (int i = 0; i < Math.min(n, left.length); i++) {
            for (int j = 0; j < right.length && i + j < n && !left[i].isZero(); j++) {
                if (!right[j].isZero()) {
                    result[i + j] = result[i + j].add(left[i].multiply(right[j]));
                }
            }
        }
        return result;
    }

    private static Rational[] sum(Rational[] left, Rational[] right) {
        Rational[] result = Arrays.copyOf(left.length > right.length ? left : right, Math.max(left.length, right.length));
        for (int i = 0; i < Math.min(left.length, right.length); i++) {
            result[i] = left[i].add(right[i]);
        }
        return result;
    }

    /** What is done with one term coefficient monomial x^weight, the coefficient not zero. */
    interface TermUse {
        void use(Monomial monomial, int weight, Rational coefficient);
    }

    void forEachTerm(TermUse use) {
        parts.forEach((monomial, part) -> {
            for (int j = 0; j < part.coefficients().length; j++) {
                if (!part.coefficients()[j].isZero()) {
                    use.use(monomial.timesPi(j), part.weight() + j, part.coefficients()[j]);
                }
            }
        });
    }
}
