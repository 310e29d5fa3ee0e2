package bubblechain.chain;

import bubblechain.analytic.ArcBound;
import bubblechain.analytic.FixedExpansion;
import bubblechain.analytic.NormalForm;
import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.kernel.SudakovSubtraction;
import bubblechain.series.BallRing;
import bubblechain.series.WeightedSeries;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * The subtraction of double logarithms on the fixed-point route.
 *
 * @param cusp   g(a)
 * @param slope  h(a) - g(a) ln D(-a)/(-a)
 * @param radius of convergence of both, at most that of ln D(-a), which is 1
 * @param bits   precision
 */
record FixedSudakov(NormalForm cusp, NormalForm slope, Rational radius, int bits) {
    private static final int ESTIMATE_BITS = 64;
    /** |d_k| of ln D(eps) = sum d_k eps^k: d_1 = 5/3, and k |d_k| <= 3 zeta(2) + 2 + 5 2^(-k) beyond. */
    private static final double LOGARITHM_COEFFICIENT = 4.2;
    /** H_k for k up to {@link Chain#LARGEST_LOOPS}. */
    private static final double HARMONIC = 10;

    /** Empty if a function has no normal form. */
    static Optional<FixedSudakov> of(SudakovSubtraction subtraction, int bits) {
        Optional<NormalForm> cusp = subtraction.cusp().normalForm();
        Optional<NormalForm> slope = subtraction.slope().normalForm();
        if (cusp.isEmpty() || slope.isEmpty()) {
            return Optional.empty();
        }
        Rational radius = Stream.of(cusp.get(), slope.get())
                .flatMap(form -> FixedExpansion.radius(form).stream())
                .min(Rational::compareTo)
                .filter(r -> r.compareTo(Rational.ONE) < 0)
                .orElse(Rational.ONE);
        return Optional.of(new FixedSudakov(cusp.get(), slope.get(), radius, bits));
    }

    /** The coefficients below order {@code count}; empty if a number leaves the fixed-point range. */
    Optional<SudakovCoefficients<Ball>> coefficients(int count) {
        Optional<List<Ball>> first = expanded(cusp, count);
        Optional<List<Ball>> second = expanded(slope, count);
        if (first.isEmpty() || second.isEmpty()) {
            return Optional.empty();
        }
        return Optional.of(SudakovCoefficients.of(BallRing.of(bits, 2), first.get(), second.get(), logarithm(count)));
    }

    /** The cusp part of a combination may vanish identically. */
    private Optional<List<Ball>> expanded(NormalForm form, int count) {
        return form.isZero()
                ? Optional.of(Collections.nCopies(count, Ball.ZERO))
                : FixedExpansion.of(form, count, bits)
                        .map(e -> new WeightedSeries(e.series(), e.radius(), false).balls(bits));
    }

    /** {@link SudakovCoefficients#bubbleLogarithm} as balls; 2^k (1 - zeta(k)) is small, so it takes k bits more. */
    private List<Ball> logarithm(int count) {
        int working = bits + count;
        BallRing ring = BallRing.of(working, count);
        List<Ball> result = new ArrayList<>();
        for (int k = 1; k <= count; k++) {
            Rational power = Rational.TWO.power(k);
            Ball value = Ball.of(power.add(Rational.of(2, 3).power(k)).subtract(1), working);
            if (k > 1) {
                Rational weight = Rational.of(k % 2 == 0 ? 3 : 1).subtract(power);
                value = value.add(ring.hurwitz(k, Rational.ONE).multiply(weight, working), working);
            }
            result.add(value.multiply(Rational.of(k % 2 == 0 ? -1 : 1, k), bits));
        }
        return result;
    }

    /**
     * A bound M of 2 |s_k| R^k on a circle |a| = R inside the radius, as if s were half an anomalous dimension:
     * |s_k| R^k &lt;= |slope| + |g| (sum |d_j| R^(j-1) + |L_o| + H_k/R).
     */
    ArcBound.Bound bound(ExactConstant operatorLog) {
        double circle = FixedCoefficients.insideOf(radius);
        ArcBound.Bound ofCusp = ArcBound.remainder(cusp, circle);
        ArcBound.Bound ofSlope = ArcBound.remainder(slope, circle);
        double largest = Math.max(ofCusp.logarithm(), ofSlope.logarithm());
        double factor = 1 + LOGARITHM_COEFFICIENT / (1 - circle)
                + operatorLog.toBall(ESTIMATE_BITS).upperBound().toDouble() + HARMONIC / circle;
        // one more for rounding
        return new ArcBound.Bound(circle, largest + Math.log(2 * factor) + 1, largest, ofCusp.arcs());
    }
}
