package bubblechain.analytic;

import bubblechain.analytic.TermKey.PolygammaFactor;
import bubblechain.exact.Ball;
import bubblechain.exact.ConstantFunctions;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.series.FixedSeries;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The Taylor coefficients of a normal form about u = 0 on the fixed-point route, with one exponential for every distinct
 * product of gamma functions and exponentials.
 *
 * <p>The variable is v = u/rho, rho the distance of the nearest singular point, so that the coefficients stay of order
 * one. Of every gamma function the poles nearest to the origin are taken out as linear factors; what is left is
 * exponentiated, and its coefficients fall so fast that most of the products are short. The linear factors cost one short
 * pass over the digits for four of them.
 *
 * @param radius       rho
 * @param coefficients balls for the coefficients of v^0, v^1, ... of u^(shift) times the function
 * @param shift        the order of the pole at u = 0
 */
public record FixedExpansion(Rational radius, List<Ball> coefficients, int shift) {
    /** Bits that may be lost on the way: error bounds are doubles and end at 2^1023 units. */
    private static final int LARGEST_LOSS = 900;

    public FixedExpansion {
        coefficients = List.copyOf(coefficients);
    }

    /**
     * Orders up to which a precision is needed.
     *
     * @param end  the first power of u that is not needed
     * @param bits absolute precision of the coefficients in v, before the constants of the terms
     */
    public record Stage(int end, int bits) {}

    /** The expansion at one precision. */
    public static Optional<FixedExpansion> of(NormalForm form, int end, int bits) {
        return of(form, List.of(new Stage(end, bits)), true);
    }

    /**
     * The expansion in stages. Bits lost where poles of single gammas cancel within the radius are made up for in part only:
     * the worth of the coefficients must fall faster.
     *
     * @param stages falling precision for growing orders
     * @return empty if the form has no singular point to set the scale or a hypergeometric function a pole at u = 0, or a number leaves the fixed-point range
     */
    public static Optional<FixedExpansion> of(NormalForm form, List<Stage> stages) {
        return of(form, stages, false);
    }

    private static Optional<FixedExpansion> of(NormalForm form, List<Stage> stages, boolean makeUp) {
        List<FactoredTerm> terms = factored(form);
        Optional<Rational> radius = radius(terms);
        if (radius.isEmpty() || terms.stream().anyMatch(t -> UnitFunctions.poleAtZero(t.key()))) {
            return Optional.empty();
        }
        int shift = Math.max(0, terms.stream().mapToInt(t -> -t.valuation()).max().orElse(0));
        int last = stages.get(stages.size() - 1).end() + shift;
        int lost = terms.stream()
                .mapToInt(t -> GammaProducts.bitsLost(t.key(), radius.get(), last))
                .max()
                .orElse(0);
        int extra = makeUp ? lost : Math.max(0, lost - LARGEST_LOSS);
        GammaProducts gammas = new GammaProducts(
                radius.get(), last, FixedSeries.limbsFor(stages.get(0).bits()), extra);
        List<Ball> coefficients = new ArrayList<>();
        try {
            for (Stage stage : stages) {
                GammaProducts.Stage size =
                        new GammaProducts.Stage(stage.end() + shift, FixedSeries.limbsFor(stage.bits()));
                List<Ball> all = new Computation(radius.get(), shift, size, gammas).sum(terms, coefficients.size());
                coefficients.addAll(all);
            }
        } catch (ArithmeticException outOfRange) {
            return Optional.empty();
        }
        return Optional.of(new FixedExpansion(radius.get(), coefficients, shift));
    }

    private static List<FactoredTerm> factored(NormalForm form) {
        List<FactoredTerm> terms = new ArrayList<>();
        form.terms().forEach((key, factor) -> terms.add(FactoredTerm.of(key, factor)));
        return terms;
    }

    /** The distance within which no term of the form has a singular point but u = 0; empty if there is none at all. */
    public static Optional<Rational> radius(NormalForm form) {
        return radius(factored(form));
    }

    private static Optional<Rational> radius(List<FactoredTerm> terms) {
        return terms.stream().flatMap(t -> t.radius().stream()).min(Rational::compareTo);
    }

    /** The work state of one stage. */
    private static final class Computation {
        private final Rational radius;
        private final int shift;
        private final GammaProducts.Stage stage;
        private final int bits;
        private final GammaProducts gammas;

        Computation(Rational radius, int shift, GammaProducts.Stage stage, GammaProducts gammas) {
            this.radius = radius;
            this.shift = shift;
            this.stage = stage;
            this.bits = FixedSeries.bits(stage.limbs());
            this.gammas = gammas;
        }

        /** Terms with the same gammas and exponential share them; within a group, those with the same constant are added. */
        List<Ball> sum(List<FactoredTerm> terms, int from) {
            Map<TermKey, Map<ExactConstant, List<FactoredTerm>>> groups = new LinkedHashMap<>();
            for (FactoredTerm term : terms) {
                groups.computeIfAbsent(term.functions(), k -> new LinkedHashMap<>())
                        .computeIfAbsent(term.key().constant(), k -> new ArrayList<>())
                        .add(term);
            }
            List<Ball> total = new ArrayList<>();
            for (Map.Entry<TermKey, Map<ExactConstant, List<FactoredTerm>>> group : groups.entrySet()) {
                GammaProducts.Product product = gammas.of(group.getKey(), stage);
                group.getValue().forEach((constant, members) -> {
                    Ball weight = constant.multiply(product.constant()).toBall(bits);
                    addScaled(total, members(members, product), weight, from);
                });
            }
            return total;
        }

        private void addScaled(List<Ball> total, FixedSeries series, Ball weight, int from) {
            boolean first = total.isEmpty();
            for (int k = from; k < stage.length(); k++) {
                Ball value = series.coefficient(k).multiply(weight, bits);
                if (first) {
                    total.add(value);
                } else {
                    total.set(k - from, total.get(k - from).add(value, bits));
                }
            }
        }

        /** The sum of terms with one product of gammas and one constant, that constant left out. */
        private FixedSeries members(List<FactoredTerm> members, GammaProducts.Product product) {
            boolean elementary = members.stream()
                    .allMatch(t -> t.key().isInvertible());
            if (elementary) {
                return members.stream()
                        .map(t -> t.applyTo(product.series(), product.removed(), radius, shift))
                        .reduce(FixedSeries::add)
                        .orElseThrow();
            }
            // the linear factors taken out of the gammas are common to all: they are put back last, but for those that
            // every member cancels, which would cost digits if they were multiplied in and out again
            Map<Rational, Integer> cancelled = cancelled(members, product.removed());
            Map<Rational, Integer> left = new HashMap<>(product.removed());
            cancelled.forEach((root, power) -> left.merge(root, -power, Integer::sum));
            FixedSeries sum = members.stream()
                    .map(t -> t.applyTo(transcendental(t), cancelled, radius, shift))
                    .reduce(FixedSeries::add)
                    .orElseThrow();
            return LinearFactors.apply(sum.multiply(product.series()), left, radius);
        }

        /** The poles among the factors that are zeros of the rational functions of all members, with negative powers. */
        private static Map<Rational, Integer> cancelled(List<FactoredTerm> members, Map<Rational, Integer> removed) {
            Map<Rational, Integer> result = new HashMap<>();
            removed.forEach((root, power) -> {
                int zeros = members.stream().mapToInt(t -> t.roots().getOrDefault(root, 0)).min().orElse(0);
                int common = Math.min(zeros, -power);
                if (common > 0) {
                    result.put(root, -common);
                }
            });
            return result;
        }

        private FixedSeries transcendental(FactoredTerm term) {
            FixedSeries result = FixedSeries.one(stage.length(), stage.limbs());
            boolean first = true;
            for (Map.Entry<PolygammaFactor, Integer> factor : term.key().polygammas().entrySet()) {
                FixedSeries series = gammas.polygamma(factor.getKey(), stage);
                for (int k = 0; k < factor.getValue(); k++) {
                    result = first ? series : result.multiply(series);
                    first = false;
                }
            }
            for (Map.Entry<TermKey.UnitFactor, Integer> factor : term.key().units().entrySet()) {
                FixedSeries series = gammas.unit3f2(factor.getKey(), stage);
                for (int k = 0; k < factor.getValue(); k++) {
                    result = first ? series : result.multiply(series);
                    first = false;
                }
            }
            for (Map.Entry<TermKey.SineFactor, Integer> factor : term.key().sines().entrySet()) {
                for (int k = 0; k < factor.getValue(); k++) {
                    result = result.multiply(sine(factor.getKey()));
                }
            }
            return result;
        }

        /** sin(c + b rho v) = sum_k sin(c + k pi/2) (b rho)^k v^k/k!. */
        private FixedSeries sine(TermKey.SineFactor factor) {
            Ball[] values = new Ball[4];
            ExactConstant quarter = ExactConstant.PI.multiply(Rational.HALF);
            ExactConstant angle = factor.constant();
            for (int k = 0; k < values.length; k++) {
                values[k] = ConstantFunctions.sine(angle, Rational.ZERO).toBall(bits + 32);
                angle = angle.add(quarter);
            }
            FixedValues list = new FixedValues(stage.length(), stage.limbs());
            Ball power = Ball.ONE;
            Rational step = factor.slope().multiply(radius);
            for (int k = 0; k < stage.length(); k++) {
                list.set(k, values[k % values.length].multiply(power, bits + 32));
                power = power.multiply(step.divide(k + 1L), bits + 32);
            }
            return list.series();
        }
    }

    /** The ball of the coefficient of u^n times rho^n. */
    public Ball scaled(int n) {
        Ball value = coefficients.get(n + shift);
        return shift == 0 ? value : value.multiply(radius.power(-shift), Math.max(64, value.accuracyBits() + 64));
    }
}
