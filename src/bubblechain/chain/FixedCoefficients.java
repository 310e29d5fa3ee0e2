package bubblechain.chain;

import bubblechain.analytic.AnalyticFunction;
import bubblechain.analytic.ArcBound;
import bubblechain.analytic.FixedExpansion;
import bubblechain.analytic.FixedValues;
import bubblechain.analytic.NormalForm;
import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Magnitude;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.SudakovSubtraction;
import bubblechain.series.FixedSeries;
import bubblechain.series.WeightedSeries;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;

/**
 * Coefficients as balls on the fixed-point route. With T(rho v) = sum x_n v^n and
 * y_n = (gamma_n/2) rho^n/n!,
 *
 * <p>c_n rho^n/n! = x_n - (1/rho) [v^(n+1)] e^(L rho v) sum_k y_k v^k, L = L_c - L_o.
 *
 * <p>The anomalous part falls like 1/n!; beyond the order where a Cauchy bound puts it below the last place it is not
 * computed.
 */
final class FixedCoefficients {
    private static final double LN2 = Math.log(2);
    /** The circle of the bound, close to the nearest pole: another radius would cost its ratio at every order. */
    private static final Rational INSIDE = Rational.of(511, 512);

    private static final int RATIO_BITS = 40;
    private static final int GUARD_BITS = 16;
    /** The anomalous part is computed in at most so many stages, one for each so many bits: measured, and flat. */
    private static final int STAGES = 8;

    private static final int BITS_PER_STAGE = 300;
    /** Lists below this length are not worth a bound where to cut. */
    private static final int CUT_TERMS = 150;
    private static final int ESTIMATE_BITS = 64;

    private final int bits;

    FixedCoefficients(int bits) {
        this.bits = bits;
    }

    /** Empty if this route cannot take the kernel. */
    Optional<List<Ball>> coefficients(Kernel kernel, int loops, Scales scales) {
        if (kernel.transform().isEmpty() && kernel.sudakov().isPresent()) {
            return scales.couplingLog().isZero() ? sudakov(kernel.sudakov().get(), loops) : Optional.empty();
        }
        return series(kernel, loops, scales).map(series -> series.balls(bits));
    }

    private Optional<List<Ball>> sudakov(SudakovSubtraction subtraction, int loops) {
        return FixedSudakov.of(subtraction, bits)
                .flatMap(s -> s.coefficients(loops + 1))
                .map(s -> s.anomalousDimension(loops));
    }

    /** The same before the powers and factorials are multiplied in; empty for the anomalous dimension of double logarithms. */
    Optional<WeightedSeries> series(Kernel kernel, int loops, Scales scales) {
        try {
            if (kernel.transform().isPresent()) {
                return transformed(kernel, kernel.transform().get(), loops, scales);
            }
            return kernel.sudakov().isPresent() ? Optional.empty() : anomalous(kernel, loops, scales);
        } catch (ArithmeticException outOfRange) {
            return Optional.empty();
        }
    }

    private Optional<WeightedSeries> anomalous(Kernel kernel, int loops, Scales scales) {
        Optional<NormalForm> form = kernel.anomalousDimension().flatMap(AnalyticFunction::normalForm);
        if (form.isEmpty() || !scales.couplingLog().isZero()) {
            return Optional.empty();
        }
        Optional<FixedExpansion> expansion = FixedExpansion.of(form.get(), loops, bits);
        return expansion.map(e -> new WeightedSeries(e.series(), e.radius(), false));
    }

    private Optional<WeightedSeries> transformed(
            Kernel kernel, AnalyticFunction transform, int loops, Scales scales) {
        Optional<NormalForm> form = transform.timesExponential(scales.couplingLog()).normalForm();
        Optional<FixedExpansion> expansion =
                form.isEmpty() ? Optional.empty() : FixedExpansion.of(form.get(), loops, bits);
        if (expansion.isEmpty()) {
            return Optional.empty();
        }
        Rational radius = expansion.get().radius();
        FixedSeries series = expansion.get().series();
        if (kernel.isRenormalised()) {
            Optional<FixedSeries> subtraction = kernel.sudakov().isPresent()
                    ? doubleSubtraction(kernel.sudakov().get(), loops, scales, radius, series.limbs())
                    : subtraction(
                            kernel.anomalousDimension().orElseThrow(), loops, scales.subtractionLog(), radius,
                            series.limbs());
            if (subtraction.isEmpty()) {
                return Optional.empty();
            }
            series = series.add(subtraction.get());
        }
        return Optional.of(new WeightedSeries(series, radius, true));
    }

    /** -(1/rho) [v^(n+1)] e^(L rho v) sum y_k v^k for n = 0 .. loops-1. */
    private Optional<FixedSeries> subtraction(
            AnalyticFunction gamma, int loops, ExactConstant log, Rational radius, int limbs) {
        Optional<NormalForm> form = gamma.normalForm();
        Optional<Tail> tail = form.isEmpty() ? Optional.empty() : tail(form.get(), loops + 1, radius, log);
        if (tail.isEmpty()) {
            return Optional.empty();
        }
        int last = tail.get().last();
        Rational own = FixedExpansion.radius(form.get()).orElse(radius);
        double excess = Math.max(1, radius.toDouble() / own.toDouble());
        Optional<FixedExpansion> expansion = FixedExpansion.of(form.get(), stages(last, excess), radius);
        if (expansion.isEmpty()) {
            return Optional.empty();
        }
        Rational ratio = radius.divide(expansion.get().radius());
        FixedSeries y = expansion.get().timesEach(FixedSeries.exponential(Rational.HALF, ratio, last, limbs));
        return Optional.of(subtracted(y, tail.get(), loops, log, radius));
    }

    /** -(1/rho) [v^(n+1)] e^(L rho v) sum y_k v^k. */
    private FixedSeries subtracted(FixedSeries y, Tail tail, int loops, ExactConstant log, Rational radius) {
        FixedSeries product = log.isZero()
                ? y
                : y.window(0, loops + 1).multiply(exponential(log.multiply(radius), loops + 1, y.limbs()));
        return product.window(1, loops).withError(tail.size()).times(List.of(radius.inverse().negate()));
    }

    /** The same with y_k = s_k rho^k/k!, and -g_0 (L rho)^(n+2)/((n+2)! rho^2). */
    private Optional<FixedSeries> doubleSubtraction(
            SudakovSubtraction subtraction, int loops, Scales scales, Rational radius, int limbs) {
        Optional<FixedSudakov> sudakov = FixedSudakov.of(subtraction, bits);
        if (sudakov.isEmpty()) {
            return Optional.empty();
        }
        ExactConstant log = scales.subtractionLog();
        Tail tail = cut(() -> sudakov.get().bound(scales.operatorLog()), sudakov.get().radius(), loops + 1, radius, log);
        int last = tail.last();
        Optional<SudakovCoefficients<Ball>> coefficients = sudakov.get().coefficients(last + 1);
        if (coefficients.isEmpty()) {
            return Optional.empty();
        }
        FixedValues y = new FixedValues(last, limbs);
        Ball weight = Ball.ONE;
        int k = 0;
        for (Ball s : coefficients.get().subtraction(scales.operatorLog().toBall(bits), last)) {
            y.set(k++, s.multiply(weight, bits));
            weight = weight.multiply(radius.divide(k), bits);
        }
        FixedSeries result = subtracted(y.series(), tail, loops, log, radius);
        return Optional.of(log.isZero()
                ? result
                : result.add(doubleLogarithm(log.multiply(radius), coefficients.get().cusp(), radius, loops, limbs)));
    }

    /** -g_0 (L rho)^(n+2)/((n+2)! rho^2). */
    private FixedSeries doubleLogarithm(ExactConstant log, Ball cusp, Rational radius, int loops, int limbs) {
        Ball step = log.toBall(bits);
        Ball power = step.multiply(cusp, bits).divide(radius.power(2).negate(), bits);
        FixedValues values = new FixedValues(loops, limbs);
        for (int n = 0; n < loops; n++) {
            power = power.multiply(step, bits).divide(Rational.of(n + 2L), bits);
            values.set(n, power);
        }
        return values.series();
    }

    /** e^(l v) as a series. */
    private FixedSeries exponential(ExactConstant log, int count, int limbs) {
        int working = FixedSeries.bits(limbs) + GUARD_BITS;
        Ball step = log.toBall(working);
        FixedValues values = new FixedValues(count, limbs);
        Ball power = Ball.ONE;
        for (int j = 0; j < count; j++) {
            values.set(j, power);
            power = power.multiply(step, working).divide(Rational.of(j + 1), working);
        }
        return values.series();
    }

    /**
     * y_k is worth bits + log2(ratio^k/k!) bits: a few stages of falling precision. Where the scale of the variable is that of
     * the anomalous part, poles of single gammas may cancel within it and cost about a bit for each order.
     */
    private List<FixedExpansion.Stage> stages(int last, double ratio) {
        List<FixedExpansion.Stage> stages = new ArrayList<>();
        double worth = bits;
        int from = 0;
        int parts = Math.max(1, Math.min(STAGES, bits / BITS_PER_STAGE));
        for (int part = parts; part >= 1; part--) {
            double start = worth;
            while (from < last && (part == 1 || worth > (double) bits * (part - 1) / parts)) {
                from++;
                worth += (Math.log(ratio) - Math.log(from)) / LN2;
            }
            if (stages.isEmpty() || from > stages.get(stages.size() - 1).end()) {
                int spare = GUARD_BITS + (ratio > 1 ? from : 0);
                stages.add(new FixedExpansion.Stage(from, (int) Math.max(start, 0) + spare));
            }
        }
        return stages;
    }

    /**
     * Where the anomalous part may be cut.
     *
     * @param last first order that is left out
     * @param size not below what any of the coefficients loses by it
     */
    record Tail(int last, Magnitude size) {}

    /**
     * |y_k| &lt;= M (rho/R)^k/k!/2 for |gamma| &lt;= M on |a| = R; the sum over k &gt;= K is at most (1 + 2x) times its
     * first term once x = rho/(R K) is below 1/2. With e^(l v) in front, l = L rho, every term takes one of the
     * coefficients l^j/j!, so that the loss is at most the largest of them times that.
     */
    Optional<Tail> tail(NormalForm form, int count, Rational radius, ExactConstant log) {
        return FixedExpansion.radius(form)
                .map(own -> cut(() -> ArcBound.remainder(form, insideOf(own)), own, count, radius, log));
    }

    /** The radius of a circle on which a function without a singular point up to {@code own} is bounded. */
    static double insideOf(Rational own) {
        return own.multiply(INSIDE).toDouble();
    }

    /** @param circle the bound of |gamma|, asked for only where cutting may pay */
    private Tail cut(Supplier<ArcBound.Bound> circle, Rational own, int count, Rational radius, ExactConstant log) {
        Tail none = new Tail(count, Magnitude.ZERO);
        double ratioOnly = radius.toDouble() / own.toDouble();
        double falls = 0;
        for (int k = 1; k < count; k++) {
            falls += Math.log(ratioOnly) - Math.log(k);
        }
        if (count < CUT_TERMS || falls > -bits * LN2) {
            return none;
        }
        ArcBound.Bound bound;
        try {
            bound = circle.get();
        } catch (DomainException noCircle) {
            return none;
        }
        double ratio = radius.toDouble() / bound.radius();
        Magnitude exponential = largestTerm(log.multiply(radius).toBall(ESTIMATE_BITS).upperBound(), count);
        double logarithm = bound.logarithm() + exponential.exponent() * LN2;
        for (int k = 1; k < count; k++) {
            logarithm += Math.log(ratio) - Math.log(k);
            if (k > 2 * ratio && logarithm < -(bits + GUARD_BITS) * LN2) {
                return new Tail(k, loss(bound, k, radius).multiply(exponential));
            }
        }
        return none;
    }

    /** The largest l^j/j! with j below {@code count}. */
    private static Magnitude largestTerm(Magnitude l, int count) {
        Magnitude term = Magnitude.ONE;
        Magnitude largest = term;
        for (long j = 1; j < count && Magnitude.of(j).compareTo(l) <= 0; j++) {
            term = term.multiply(l).multiply(Magnitude.ofRational(Rational.of(1, j)));
            largest = largest.max(term);
        }
        return largest;
    }

    private static Magnitude loss(ArcBound.Bound bound, int k, Rational radius) {
        Rational weight = radius.power(k).divide(Rational.of(ExactFunctions.factorial(k).shiftLeft(1)));
        double x = radius.toDouble() / bound.radius() / k;
        Magnitude excess = Magnitude.of((long) Math.scalb(2 * x, RATIO_BITS) + 1).scale(-RATIO_BITS);
        return bound.coefficientBound(k)
                .multiply(Magnitude.ofRational(weight))
                .multiply(Magnitude.ONE.add(excess));
    }
}
