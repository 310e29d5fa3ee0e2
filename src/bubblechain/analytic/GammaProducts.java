package bubblechain.analytic;

import bubblechain.analytic.TermKey.GammaFactor;
import bubblechain.analytic.TermKey.PolygammaFactor;
import bubblechain.analytic.TermKey.UnitFactor;
import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import bubblechain.exact.UnitHypergeometric;
import bubblechain.series.BallRing;
import bubblechain.series.FixedSeries;
import bubblechain.series.FixedUnit3f2;
import bubblechain.series.FixedZeta;
import bubblechain.series.PowerSums;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeMap;

/**
 * e^(alpha u) prod Gamma(s + b u)^m as fixed-point series in v = u/rho, the poles and zeros with |u| &lt; r rho taken out.
 *
 * <p>With the roots of a gamma at u_j = -(s+j)/b, the logarithmic derivative of what is left has the coefficients
 * k l_k = sum m [(-b rho)^k zeta(k, s) - sum_j (rho/u_j)^k] for k of at least 2, which fall like r^(-k), and
 * l_1 = rho (alpha + sum m b psi(s)) - sum m rho/u_j.
 */
final class GammaProducts {
    private static final int GUARD_BITS = 32;
    private static final double LN2 = Math.log(2);

    private final Rational radius;
    private final int length;
    private final int limbs;
    private final int bits;
    private final int removal;
    private final BallRing ring;
    private final Map<TermKey, Known> products = new HashMap<>();
    private final Map<UnitFactor, FixedSeries> unit3f2Series = new HashMap<>();
    /** Polygammas want zeta values up to the last order, products of gammas do not. */
    private Optional<BallRing> polygammaRing = Optional.empty();

    /** @param extraBits precision of the logarithms beyond the limbs, where large parts of them cancel */
    GammaProducts(Rational radius, int length, int limbs, int extraBits) {
        this.radius = radius;
        this.length = length;
        this.limbs = limbs;
        this.bits = FixedSeries.bits(limbs) + GUARD_BITS + extraBits;
        this.removal = removalRadius(limbs);
        this.ring = BallRing.of(bits, Math.min(length + 2, (int) (bits * LN2 / Math.log(removal)) + GUARD_BITS));
    }

    /**
     * How many times rho the poles are taken out: more make the exponential cheaper and the linear factors dearer. Measured
     * optimum for products of two to four gammas.
     */
    private static int removalRadius(int limbs) {
        return Math.max(4, Math.min(48, limbs / 3));
    }

    /**
     * A product of gammas.
     *
     * @param series   what is left, 1 at v = 0
     * @param removed  powers of (1 - u/root) that were taken out
     * @param constant prod Gamma(s)^m
     */
    record Product(FixedSeries series, Map<Rational, Integer> removed, ExactConstant constant) {}

    /** What is kept of a product between the stages of a computation. */
    private record Known(FixedSeries slopes, Product product) {}

    /** The product to some order and precision; a second call may go further with fewer limbs. */
    Product of(TermKey key, Stage stage) {
        Known known = products.containsKey(key) ? products.get(key) : first(key);
        FixedSeries slopes = known.slopes().truncated(stage.length(), stage.limbs());
        FixedSeries before = known.product().series();
        FixedSeries series = slopes.expOfIntegral(before.truncated(before.length(), stage.limbs()));
        Product product = new Product(series, known.product().removed(), known.product().constant());
        products.put(key, new Known(known.slopes(), product));
        return product;
    }

    private Known first(TermKey key) {
        Map<Rational, Integer> removed = new HashMap<>();
        ExactConstant first = key.slope();
        for (Map.Entry<GammaFactor, Integer> entry : key.gammas().entrySet()) {
            GammaFactor gamma = entry.getKey();
            int power = entry.getValue();
            for (int j = 0; j < polesRemoved(gamma); j++) {
                FactoredTerm.add(removed, FactoredTerm.pole(gamma, j), -power);
            }
            first = first.add(ExactFunctions.digamma(gamma.shift()).multiply(gamma.slope().multiply(power)));
        }
        removed.values().removeAll(Set.of(0));
        FixedSeries slopes = logarithmicDerivative(key, removed, first);
        return new Known(slopes, new Product(FixedSeries.one(1, limbs), removed, constant(key)));
    }

    /** prod Gamma(s)^m. */
    static ExactConstant constant(TermKey key) {
        ExactConstant constant = ExactConstant.ONE;
        for (Map.Entry<GammaFactor, Integer> entry : key.gammas().entrySet()) {
            constant = constant.multiply(ExactFunctions.gamma(entry.getKey().shift()).power(entry.getValue()));
        }
        return constant;
    }

    private int polesRemoved(GammaFactor gamma) {
        Rational reach = gamma.slope().abs().multiply(radius).multiply(removal).subtract(gamma.shift());
        return Math.max(0, reach.ceiling().intValueExact());
    }

    private FixedSeries logarithmicDerivative(TermKey key, Map<Rational, Integer> removed, ExactConstant first) {
        FixedValues values = new FixedValues(length, limbs);
        if (length < 2) {
            return values.series();
        }
        int largest = key.gammas().isEmpty() ? 1 : largestOrder(key);
        PowerSums powers = PowerSums.of(length, limbs);
        Ball[] rest = new Ball[largest + 1];
        Arrays.fill(rest, Ball.ZERO);
        rest[1] = first.multiply(radius).toBall(bits);
        for (Map.Entry<Rational, Integer> factor : removed.entrySet()) {
            Rational ratio = radius.divide(factor.getKey());
            if (PowerSums.fits(ratio)) {
                powers.add(ratio, factor.getValue(), largest);
            } else {
                addPowers(rest, ratio, factor.getValue(), largest);
            }
        }
        boolean fixed = true;
        for (GammaFactor gamma : key.gammas().keySet()) {
            fixed &= PowerSums.fits(ratio(gamma));
        }
        if (!fixed) {
            addZetaSums(rest, key, largest);
        }
        for (int k = 1; k < length; k++) {
            if (k <= largest) {
                values.set(k, rest[k]);
            } else if (!key.gammas().isEmpty()) {
                values.setZero(k, 1);
            }
        }
        // a removed factor (1 - u/root)^power was in the product, so its -power (rho/root)^k goes
        FixedSeries sum = values.series().add(powers.series());
        return fixed && largest > 1 ? sum.add(zetaSums(key, largest)) : sum;
    }

    /** -b rho/s: the zeta sum of a gamma is the sum of m (-b rho/s)^k s^k zeta(k, s). */
    private Rational ratio(GammaFactor gamma) {
        return gamma.slope().multiply(radius).divide(gamma.shift()).negate();
    }

    /** sum m (-b rho)^k zeta(k, s) for k = 2 .. largest, with all gammas of one shift together. */
    private FixedSeries zetaSums(TermKey key, int largest) {
        Map<Rational, PowerSums> weights = new TreeMap<>();
        for (Map.Entry<GammaFactor, Integer> entry : key.gammas().entrySet()) {
            Rational shift = entry.getKey().shift();
            if (!weights.containsKey(shift)) {
                weights.put(shift, PowerSums.of(largest + 1, limbs));
            }
            weights.get(shift).add(ratio(entry.getKey()), entry.getValue(), largest);
        }
        FixedSeries total = FixedSeries.zero(largest + 1, limbs);
        for (Map.Entry<Rational, PowerSums> entry : weights.entrySet()) {
            FixedSeries zeta = FixedZeta.normalised(entry.getKey(), largest, limbs);
            total = total.add(entry.getValue().series().timesEach(zeta));
        }
        return total.window(0, length);
    }

    /** Beyond this order k l_k is below 2^-8 units of the last place, by |k l_k| <= sum |m| x^k (1 + (s+J)/(k-1)). */
    private int largestOrder(TermKey key) {
        double target = -(FixedSeries.bits(limbs) + 8.0);
        int count = key.gammas().size();
        double[] starts = new double[count];
        double[] log2Ratios = new double[count];
        double[] sizes = new double[count];
        int next = 0;
        for (Map.Entry<GammaFactor, Integer> entry : key.gammas().entrySet()) {
            GammaFactor gamma = entry.getKey();
            starts[next] = gamma.shift().toDouble() + polesRemoved(gamma);
            log2Ratios[next] = Math.log(gamma.slope().abs().multiply(radius).toDouble() / starts[next]) / LN2;
            sizes[next] = Math.abs(entry.getValue());
            next++;
        }
        for (int k = 2; k < length; k++) {
            double bound = Double.NEGATIVE_INFINITY;
            for (int i = 0; i < count; i++) {
                double log2 = k * log2Ratios[i] + Math.log(sizes[i] * (1 + starts[i] / (k - 1))) / LN2;
                bound = Math.max(bound, log2 + count);
            }
            if (bound < target) {
                return k - 1;
            }
        }
        return length - 1;
    }

    /** The same from balls: poles of single gammas within the radius cancel, and the sums are large. */
    private void addZetaSums(Ball[] sums, TermKey key, int largest) {
        for (Map.Entry<GammaFactor, Integer> entry : key.gammas().entrySet()) {
            Rational step = entry.getKey().slope().multiply(radius).negate();
            Ball power = Ball.of(step.multiply(entry.getValue()), bits);
            for (int k = 2; k <= largest; k++) {
                power = power.multiply(step, bits);
                sums[k] = sums[k].add(power.multiply(ring.hurwitz(k, entry.getKey().shift()), bits), bits);
            }
        }
    }

    /**
     * Bits that the logarithm of a product loses up to some order where poles of single gammas lie inside the radius: their
     * parts (rho/u_0)^k of the zeta values are taken away again.
     */
    static int bitsLost(TermKey key, Rational radius, int length) {
        double largest = 0;
        for (GammaFactor gamma : key.gammas().keySet()) {
            double ratio = gamma.slope().abs().multiply(radius).divide(gamma.shift()).toDouble();
            largest = Math.max(largest, Math.log(ratio) / Math.log(2));
        }
        return (int) Math.ceil(largest * length);
    }

    /** The same sums for a ratio that is not a quotient of small integers. */
    private void addPowers(Ball[] sums, Rational ratio, int weight, int largest) {
        Ball power = Ball.of(Rational.of(weight), bits);
        for (int k = 1; k <= largest; k++) {
            power = power.multiply(ratio, bits);
            sums[k] = sums[k].add(power, bits);
        }
    }

    /** How far one stage of a computation goes: orders below length, so many limbs. */
    record Stage(int length, int limbs) {}

    /**
     * psi^(n)(s + b rho v) = sum_k (-1)^(n+k+1) (n+k)!/k! zeta(n+k+1, s) (b rho)^k v^k
     * = (-1/s)^(n+1) sum_k [(n+k)!/k! (-b rho/s)^k] [s^(n+k+1) zeta(n+k+1, s)] v^k, psi(s) apart.
     */
    FixedSeries polygamma(PolygammaFactor factor, Stage stage) {
        Rational ratio = factor.slope().multiply(radius).divide(factor.shift()).negate();
        if (!PowerSums.fits(ratio)) {
            return polygammaFromBalls(factor).truncated(stage.length(), stage.limbs());
        }
        int n = factor.n();
        // one more limb for what the weights lose while they grow
        FixedSeries weights = FixedSeries.ratios(
                Rational.of(ExactFunctions.factorial(n)), k -> ratio.multiply(n + k).divide(k), stage.length(),
                stage.limbs() + 1);
        FixedSeries zeta = FixedZeta.normalised(factor.shift(), stage.length() + n, stage.limbs() + 1)
                .window(n + 1, stage.length());
        FixedSeries series = weights.timesEach(zeta)
                .truncated(stage.length(), stage.limbs())
                .times(List.of(factor.shift().negate().power(-(n + 1))));
        if (n > 0) {
            return series;
        }
        FixedValues first = new FixedValues(stage.length(), stage.limbs());
        first.set(0, ExactFunctions.digamma(factor.shift()).toBall(bits));
        return series.add(first.series());
    }

    /** The same where poles lie within the radius. */
    private FixedSeries polygammaFromBalls(PolygammaFactor factor) {
        FixedValues values = new FixedValues(length, limbs);
        int n = factor.n();
        BallRing ring = polygammaRing.orElseGet(() -> BallRing.of(bits, length + n + 2));
        polygammaRing = Optional.of(ring);
        Rational step = factor.slope().multiply(radius);
        Ball weight = Ball.of(ExactFunctions.factorial(n));
        for (int k = 0; k < length; k++) {
            if (k > 0) {
                weight = weight.multiply(step.multiply(n + k).divide(k), bits);
            }
            int m = n + k;
            Ball value = m == 0
                    ? ExactFunctions.digamma(factor.shift()).toBall(bits)
                    : ring.hurwitz(m + 1, factor.shift()).multiply(weight, bits);
            values.set(k, m == 0 || m % 2 == 1 ? value : value.negate());
        }
        return values.series();
    }

    /** W^(n)(s + b rho v) = sum_k (n+k)!/k! w_(n+k) (b rho)^k v^k, w_k (b rho)^k the coefficients of W(s + b rho v). */
    FixedSeries unit3f2(UnitFactor factor, Stage stage) {
        int n = factor.n();
        Rational step = factor.slope().multiply(radius);
        if (!FixedUnit3f2.fits(factor.shift(), step)) {
            return unit3f2FromBalls(factor).truncated(stage.length(), stage.limbs());
        }
        // one more limb for what the derivatives lose
        FixedSeries known = unit3f2Series.get(factor.withoutDerivative());
        if (known == null || known.length() < stage.length() + n || known.limbs() <= stage.limbs()) {
            known = FixedUnit3f2.of(factor.shift(), step, stage.length() + n, stage.limbs() + 1);
            unit3f2Series.put(factor.withoutDerivative(), known);
        }
        if (n == 0) {
            return known.truncated(stage.length(), stage.limbs());
        }
        Rational first = Rational.of(ExactFunctions.factorial(n)).multiply(step.power(-n));
        FixedValues weights = new FixedValues(stage.length(), known.limbs());
        Rational weight = first;
        for (int k = 0; k < stage.length(); k++) {
            weight = k == 0 ? first : weight.multiply(n + k).divide(k);
            weights.set(k, Ball.of(weight, FixedSeries.bits(known.limbs())));
        }
        return known.window(n, stage.length()).timesEach(weights.series()).truncated(stage.length(), stage.limbs());
    }

    /** The same from balls, for a step beyond the nearest pole of W. */
    private FixedSeries unit3f2FromBalls(UnitFactor factor) {
        int n = factor.n();
        Ball[] taylor = UnitHypergeometric.taylor(factor.shift(), length + n, bits);
        FixedValues values = new FixedValues(length, limbs);
        Rational step = factor.slope().multiply(radius);
        Ball weight = Ball.of(ExactFunctions.factorial(n));
        for (int k = 0; k < length; k++) {
            if (k > 0) {
                weight = weight.multiply(step.multiply(n + k).divide(k), bits);
            }
            values.set(k, taylor[n + k].multiply(weight, bits));
        }
        return values.series();
    }
}
