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
 * @param radius rho
 * @param pieces the coefficients of v^0, v^1, ... of u^(shift) times the function, one piece for each stage of precision
 * @param shift  the order of the pole at u = 0
 */
public record FixedExpansion(Rational radius, List<FixedSeries> pieces, int shift) {
    /** Bits that may be lost on the way: error bounds are doubles and end at 2^1023 units. */
    private static final int LARGEST_LOSS = 900;

    private static final int ESTIMATE_BITS = 64;

    public FixedExpansion {
        pieces = List.copyOf(pieces);
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
        return of(form, List.of(new Stage(end, bits)), radius(form), true);
    }

    /**
     * The expansion in stages. Bits lost where poles of single gammas cancel within the radius are made up for in part only:
     * the worth of the coefficients must fall faster.
     *
     * @param stages  falling precision for growing orders
     * @param largest the scale of the variable if no singular point is nearer
     * @return empty if a hypergeometric function has a pole at u = 0, or a number leaves the fixed-point range
     */
    public static Optional<FixedExpansion> of(NormalForm form, List<Stage> stages, Rational largest) {
        Rational own = radius(form).orElse(largest);
        return of(form, stages, Optional.of(own.compareTo(largest) < 0 ? own : largest), false);
    }

    private static Optional<FixedExpansion> of(
            NormalForm form, List<Stage> stages, Optional<Rational> radius, boolean makeUp) {
        if (radius.isEmpty()) {
            return Optional.empty();
        }
        List<FactoredTerm> terms = factored(form);
        for (FactoredTerm term : terms) {
            if (UnitFunctions.poleAtZero(term.key())) {
                return Optional.empty();
            }
        }
        int shift = 0;
        for (FactoredTerm term : terms) {
            shift = Math.max(shift, -term.valuation());
        }
        int last = stages.get(stages.size() - 1).end() + shift;
        int lost = 0;
        for (FactoredTerm term : terms) {
            lost = Math.max(lost, GammaProducts.bitsLost(term.key(), radius.get(), last));
        }
        int extra = makeUp ? lost : Math.max(0, lost - LARGEST_LOSS);
        int small = bitsBelowOne(terms);
        GammaProducts gammas = new GammaProducts(
                radius.get(), last, FixedSeries.limbsFor(stages.get(0).bits() + small), extra);
        List<FixedSeries> pieces = new ArrayList<>();
        int from = 0;
        try {
            for (Stage stage : stages) {
                GammaProducts.Stage size =
                        new GammaProducts.Stage(stage.end() + shift, FixedSeries.limbsFor(stage.bits() + small));
                pieces.add(new Computation(radius.get(), shift, size, gammas).sum(terms).window(from, size.length() - from));
                from = size.length();
            }
        } catch (ArithmeticException outOfRange) {
            return Optional.empty();
        }
        return Optional.of(new FixedExpansion(radius.get(), pieces, shift));
    }

    /** The k with the constants of all terms below 2^-k; 0 if they are larger. */
    private static int bitsBelowOne(List<FactoredTerm> terms) {
        long largest = Long.MIN_VALUE;
        for (FactoredTerm term : terms) {
            ExactConstant constant = term.key().constant().multiply(GammaProducts.constant(term.key()));
            largest = Math.max(largest, constant.toBall(ESTIMATE_BITS).upperBound().exponent());
        }
        return (int) Math.max(0, -largest);
    }

    private static List<FactoredTerm> factored(NormalForm form) {
        List<FactoredTerm> terms = new ArrayList<>();
        for (Map.Entry<TermKey, RationalFunction> term : form.terms().entrySet()) {
            terms.add(FactoredTerm.of(term.getKey(), term.getValue()));
        }
        return terms;
    }

    /** The distance within which no term of the form has a singular point but u = 0; empty if there is none at all. */
    public static Optional<Rational> radius(NormalForm form) {
        return radius(factored(form));
    }

    private static Optional<Rational> radius(List<FactoredTerm> terms) {
        Optional<Rational> least = Optional.empty();
        for (FactoredTerm term : terms) {
            Optional<Rational> radius = term.radius();
            if (radius.isPresent() && (least.isEmpty() || radius.get().compareTo(least.get()) < 0)) {
                least = radius;
            }
        }
        return least;
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
        FixedSeries sum(List<FactoredTerm> terms) {
            Map<TermKey, Map<ExactConstant, List<FactoredTerm>>> groups = new LinkedHashMap<>();
            for (FactoredTerm term : terms) {
                groups.putIfAbsent(term.functions(), new LinkedHashMap<>());
                Map<ExactConstant, List<FactoredTerm>> group = groups.get(term.functions());
                group.putIfAbsent(term.key().constant(), new ArrayList<>());
                group.get(term.key().constant()).add(term);
            }
            List<FixedSeries> parts = new ArrayList<>();
            for (Map.Entry<TermKey, Map<ExactConstant, List<FactoredTerm>>> group : groups.entrySet()) {
                GammaProducts.Product product = gammas.of(group.getKey(), stage);
                for (Map.Entry<ExactConstant, List<FactoredTerm>> part : group.getValue().entrySet()) {
                    parts.add(times(members(part.getValue(), product), part.getKey().multiply(product.constant())));
                }
            }
            return total(parts);
        }

        private static FixedSeries total(List<FixedSeries> parts) {
            FixedSeries total = parts.get(0);
            for (FixedSeries part : parts.subList(1, parts.size())) {
                total = total.add(part);
            }
            return total;
        }

        private FixedSeries times(FixedSeries series, ExactConstant weight) {
            Optional<Rational> rational = weight.asRational();
            if (rational.isEmpty()) {
                return series.times(weight.toBall(bits));
            }
            return rational.get().equals(Rational.ONE) ? series : series.times(List.of(rational.get()));
        }

        /** The sum of terms with one product of gammas and one constant, that constant left out. */
        private FixedSeries members(List<FactoredTerm> members, GammaProducts.Product product) {
            boolean elementary = true;
            for (FactoredTerm member : members) {
                elementary &= member.key().isInvertible();
            }
            // the linear factors taken out of the gammas are common to all: they are put back last, but for those that
            // every member cancels, which would cost digits if they were multiplied in and out again
            Map<Rational, Integer> cancelled =
                    elementary ? product.removed() : cancelled(members, product.removed());
            List<FixedSeries> parts = new ArrayList<>();
            for (FactoredTerm member : members) {
                FixedSeries own = elementary ? product.series() : transcendental(member);
                parts.add(member.applyTo(own, cancelled, radius, shift));
            }
            FixedSeries sum = total(parts);
            if (elementary) {
                return sum;
            }
            Map<Rational, Integer> left = new HashMap<>(product.removed());
            for (Map.Entry<Rational, Integer> factor : cancelled.entrySet()) {
                FactoredTerm.add(left, factor.getKey(), -factor.getValue());
            }
            return LinearFactors.apply(sum.multiply(product.series()), left, radius);
        }

        /** The poles among the factors that are zeros of the rational functions of all members, with negative powers. */
        private static Map<Rational, Integer> cancelled(List<FactoredTerm> members, Map<Rational, Integer> removed) {
            Map<Rational, Integer> result = new HashMap<>();
            for (Map.Entry<Rational, Integer> factor : removed.entrySet()) {
                int common = -factor.getValue();
                for (FactoredTerm member : members) {
                    common = Math.min(common, member.roots().getOrDefault(factor.getKey(), 0));
                }
                if (common > 0) {
                    result.put(factor.getKey(), -common);
                }
            }
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
        int index = n + shift;
        int piece = 0;
        while (index >= pieces.get(piece).length()) {
            index -= pieces.get(piece).length();
            piece++;
        }
        Ball value = pieces.get(piece).coefficient(index);
        return shift == 0
                ? value
                : value.multiply(radius.power(-shift), Math.max(ESTIMATE_BITS, value.accuracyBits() + ESTIMATE_BITS));
    }

    /** The coefficients of u^0, u^1, ... times rho^n, where there is but one stage. */
    public FixedSeries series() {
        FixedSeries only = pieces.get(0);
        return unshifted(only.window(shift, only.length() - shift));
    }

    /** The coefficients of u^0, u^1, ... times rho^n, each times a weight, in the precision of the weights. */
    public FixedSeries timesEach(FixedSeries weights) {
        List<FixedSeries> products = new ArrayList<>();
        int order = -shift;
        for (FixedSeries piece : pieces) {
            int from = Math.max(0, -order);
            int count = piece.length() - from;
            if (count > 0) {
                products.add(piece.window(from, count).timesEach(weights.window(order + from, count)));
            }
            order += piece.length();
        }
        return unshifted(FixedSeries.joined(products));
    }

    private FixedSeries unshifted(FixedSeries series) {
        return shift == 0 ? series : series.times(List.of(radius.power(-shift)));
    }
}
