package bubblechain.exact;

import java.math.BigInteger;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Sums sum_h C_h sum_w f_h(w) H_(h,w) of the homogeneous parts of several series, with constants C_h, for any rational
 * factors f_h(w): the exact coefficients of a function are such sums, one for each order.
 *
 * @implNote one rational number is made for each term of the result: monomials are found once, and the coefficients of
 *     one monomial are brought to a common denominator beforehand
 */
public final class GradedSum {
    /**
     * One of the series.
     *
     * @param constant what multiplies the whole series
     */
    public record Summand(ExactConstant constant, GradedSeries series) {}

    /** The rational factors of one sum. */
    public interface Factors {
        /** f_h(w), h the index of the summand. */
        Rational at(int summand, int weight);
    }

    /** A monomial whose coefficient in one sum is sum_i f_(h_i)(w) numerators[i]/denominator. */
    private record Entry(Monomial monomial, BigInteger[] numerators, BigInteger denominator) {}

    /** The entries of one weight that the same summands contribute to. */
    private record Group(int weight, int[] summands, List<Entry> entries) {}

    private final List<Group> groups;

    private GradedSum(List<Group> groups) {
        this.groups = groups;
    }

    public static GradedSum of(List<Summand> summands) {
        List<Map<Monomial, Map<Integer, Rational>>> byWeight = new ArrayList<>();
        for (int h = 0; h < summands.size(); h++) {
            int index = h;
            for (Map.Entry<Monomial, Rational> factor : summands.get(h).constant().terms().entrySet()) {
                boolean one = factor.getKey().isOne();
                summands.get(h).series().forEachTerm((monomial, weight, coefficient) -> {
                    while (byWeight.size() <= weight) {
                        byWeight.add(new LinkedHashMap<>());
                    }
                    // no roots of primes in a graded monomial, so the product carries no rational factor
                    Monomial product = one
                            ? monomial
                            : monomial.multiply(factor.getKey()).monomial();
                    Rational value = coefficient.multiply(factor.getValue());
                    byWeight.get(weight)
                            .computeIfAbsent(product, m -> new LinkedHashMap<>(4))
                            .merge(index, value, Rational::add);
                });
            }
        }
        List<Group> groups = new ArrayList<>();
        for (int w = 0; w < byWeight.size(); w++) {
            addGroups(w, byWeight.get(w), groups);
        }
        return new GradedSum(groups);
    }

    private static void addGroups(int weight, Map<Monomial, Map<Integer, Rational>> monomials, List<Group> groups) {
        Map<List<Integer>, Group> found = new LinkedHashMap<>();
        monomials.forEach((monomial, coefficients) -> {
            List<Integer> summands = List.copyOf(coefficients.keySet());
            Group group = found.computeIfAbsent(summands, s -> new Group(
                    weight, s.stream().mapToInt(Integer::intValue).toArray(), new ArrayList<>()));
            Rational[] values = coefficients.values().toArray(Rational[]::new);
            BigInteger denominator = commonDenominator(values);
            group.entries().add(new Entry(monomial, numerators(values, denominator), denominator));
        });
        groups.addAll(found.values());
    }

    private static BigInteger commonDenominator(Rational[] values) {
        BigInteger common = values[0].denominator();
        for (int i = 1; i < values.length; i++) {
            BigInteger next = values[i].denominator();
            common = common.multiply(next.divide(common.gcd(next)));
        }
        return common;
    }

    private static BigInteger[] numerators(Rational[] values, BigInteger denominator) {
        BigInteger[] result = new BigInteger[values.length];
        for (int i = 0; i < values.length; i++) {
            result[i] = values[i].numerator().multiply(denominator.divide(values[i].denominator()));
        }
        return result;
    }

    /** Number of monomials of each weight, from weight 0 on. */
    public int[] sizes() {
        int[] sizes = new int[groups.isEmpty() ? 0 : groups.get(groups.size() - 1).weight() + 1];
        for (Group group : groups) {
            sizes[group.weight()] += group.entries().size();
        }
        return sizes;
    }

    /** The sum with these factors. */
    public ExactConstant combine(Factors factors) {
        List<Group> present = new ArrayList<>();
        List<Rational[]> values = new ArrayList<>();
        int size = 0;
        for (Group group : groups) {
            Rational[] f = new Rational[group.summands().length];
            boolean zero = true;
            for (int i = 0; i < f.length; i++) {
                f[i] = factors.at(group.summands()[i], group.weight());
                zero &= f[i].isZero();
            }
            if (!zero) {
                present.add(group);
                values.add(f);
                size += group.entries().size();
            }
        }
        Map<Monomial, Rational> terms = new HashMap<>(size + size / 2);
        for (int i = 0; i < present.size(); i++) {
            addTerms(present.get(i), values.get(i), terms);
        }
        return ExactConstant.ofTerms(terms);
    }

    private static void addTerms(Group group, Rational[] factors, Map<Monomial, Rational> terms) {
        BigInteger common = commonDenominator(factors);
        BigInteger[] multipliers = numerators(factors, common);
        for (Entry entry : group.entries()) {
            BigInteger numerator = multipliers[0].multiply(entry.numerators()[0]);
            for (int i = 1; i < multipliers.length; i++) {
                numerator = numerator.add(multipliers[i].multiply(entry.numerators()[i]));
            }
            if (numerator.signum() != 0) {
                Rational value = Rational.of(numerator, common.multiply(entry.denominator()));
                if (terms.putIfAbsent(entry.monomial(), value) != null) {
                    // it has come with another weight before
                    ExactConstant.accumulate(terms, entry.monomial(), value);
                }
            }
        }
    }
}
