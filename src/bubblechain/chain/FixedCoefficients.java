package bubblechain.chain;

import bubblechain.analytic.AnalyticFunction;
import bubblechain.analytic.ArcBound;
import bubblechain.analytic.FixedExpansion;
import bubblechain.analytic.NormalForm;
import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Magnitude;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.SudakovSubtraction;
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
        if (kernel.transform().isEmpty()) {
            return scales.couplingLog().isZero() ? anomalousDimension(kernel, loops) : Optional.empty();
        }
        Optional<NormalForm> form = kernel.transform().get()
                .timesExponential(scales.couplingLog())
                .normalForm();
        Optional<FixedExpansion> transform = form.flatMap(f -> FixedExpansion.of(f, loops, bits));
        if (transform.isEmpty()) {
            return Optional.empty();
        }
        List<Ball> scaled = new ArrayList<>();
        for (int n = 0; n < loops; n++) {
            scaled.add(transform.get().scaled(n));
        }
        if (kernel.isRenormalised()) {
            Optional<List<Ball>> subtraction = kernel.sudakov().isPresent()
                    ? doubleSubtraction(kernel.sudakov().get(), loops, scales, transform.get().radius())
                    : subtraction(
                            kernel.anomalousDimension().orElseThrow(), loops, scales.subtractionLog(),
                            transform.get().radius());
            if (subtraction.isEmpty()) {
                return Optional.empty();
            }
            for (int n = 0; n < loops; n++) {
                scaled.set(n, scaled.get(n).add(subtraction.get().get(n), bits));
            }
        }
        return Optional.of(weighted(scaled, transform.get().radius()));
    }

    private Optional<List<Ball>> anomalousDimension(Kernel kernel, int loops) {
        if (kernel.sudakov().isPresent()) {
            return FixedSudakov.of(kernel.sudakov().get(), bits)
                    .flatMap(s -> s.coefficients(loops + 1))
                    .map(s -> s.anomalousDimension(loops));
        }
        return kernel.anomalousDimension()
                .flatMap(AnalyticFunction::normalForm)
                .flatMap(form -> FixedExpansion.of(form, loops, bits))
                .map(expansion -> unscaled(expansion, loops, bits));
    }

    /** c_n = n! rho^(-n) times the scaled coefficients. */
    private List<Ball> weighted(List<Ball> scaled, Rational radius) {
        List<Ball> result = new ArrayList<>();
        Ball weight = Ball.ONE;
        for (int n = 0; n < scaled.size(); n++) {
            if (n > 0) {
                weight = weight.multiply(Rational.of(n).divide(radius), bits);
            }
            result.add(scaled.get(n).multiply(weight, bits));
        }
        return result;
    }

    /** The coefficients themselves. */
    static List<Ball> unscaled(FixedExpansion expansion, int loops, int bits) {
        List<Ball> result = new ArrayList<>();
        Rational step = expansion.radius().inverse();
        Ball weight = Ball.ONE;
        for (int n = 0; n < loops; n++) {
            result.add(expansion.scaled(n).multiply(weight, bits));
            weight = weight.multiply(step, bits);
        }
        return result;
    }

    /** -(1/rho) [v^(n+1)] e^(L rho v) sum y_k v^k for n = 0 .. loops-1. */
    private Optional<List<Ball>> subtraction(
            AnalyticFunction gamma, int loops, ExactConstant log, Rational radius) {
        Optional<NormalForm> form = gamma.normalForm();
        if (form.isEmpty()) {
            return Optional.empty();
        }
        Optional<Tail> tail = tail(form.get(), loops + 1, radius, log);
        if (tail.isEmpty()) {
            return Optional.empty();
        }
        int last = tail.get().last();
        Rational own = FixedExpansion.radius(form.get()).orElse(radius);
        Optional<FixedExpansion> expansion =
                FixedExpansion.of(form.get(), stages(last, radius.toDouble() / own.toDouble()));
        if (expansion.isEmpty()) {
            return Optional.empty();
        }
        List<Ball> y = new ArrayList<>();
        Ball weight = Ball.ONE.shift(-1);
        Rational ratio = radius.divide(expansion.get().radius());
        for (int k = 0; k < last; k++) {
            if (k > 0) {
                weight = weight.multiply(ratio.divide(k), bits);
            }
            y.add(expansion.get().scaled(k).multiply(weight, bits));
        }
        return Optional.of(subtracted(y, tail.get(), loops, log, radius));
    }

    /** -(1/rho) [v^(n+1)] e^(L rho v) sum y_k v^k. */
    private List<Ball> subtracted(List<Ball> y, Tail tail, int loops, ExactConstant log, Rational radius) {
        Rational factor = radius.inverse().negate();
        List<Ball> product = log.isZero() ? y : timesExponential(y, log.multiply(radius), loops + 1);
        List<Ball> result = new ArrayList<>();
        for (int n = 0; n < loops; n++) {
            Ball value = n + 1 < product.size() ? product.get(n + 1) : Ball.ZERO;
            result.add(value.addError(tail.size()).multiply(factor, bits));
        }
        return result;
    }

    /** The same with y_k = s_k rho^k/k!, and -g_0 (L rho)^(n+2)/((n+2)! rho^2). */
    private Optional<List<Ball>> doubleSubtraction(
            SudakovSubtraction subtraction, int loops, Scales scales, Rational radius) {
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
        List<Ball> y = new ArrayList<>();
        Ball weight = Ball.ONE;
        for (Ball s : coefficients.get().subtraction(scales.operatorLog().toBall(bits), last)) {
            y.add(s.multiply(weight, bits));
            weight = weight.multiply(radius.divide(y.size()), bits);
        }
        List<Ball> result = subtracted(y, tail, loops, log, radius);
        if (!log.isZero()) {
            Ball step = log.multiply(radius).toBall(bits);
            Ball power = step.multiply(coefficients.get().cusp(), bits).divide(radius.power(2).negate(), bits);
            for (int n = 0; n < loops; n++) {
                power = power.multiply(step, bits).divide(Rational.of(n + 2L), bits);
                result.set(n, result.get(n).add(power, bits));
            }
        }
        return Optional.of(result);
    }

    /** y_k is worth bits + log2(ratio^k/k!) bits: a few stages of falling precision. */
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
                stages.add(new FixedExpansion.Stage(from, (int) Math.max(start, 0) + GUARD_BITS + from));
            }
        }
        return stages;
    }

    /** [v^n] e^(l v) sum y_k v^k. */
    private List<Ball> timesExponential(List<Ball> y, ExactConstant log, int count) {
        Ball step = log.toBall(bits + GUARD_BITS);
        List<Ball> powers = new ArrayList<>();
        powers.add(Ball.ONE);
        for (int j = 1; j < count; j++) {
            powers.add(powers.get(j - 1).multiply(step, bits).divide(Rational.of(j), bits));
        }
        List<Ball> result = new ArrayList<>();
        for (int n = 0; n < count; n++) {
            Ball sum = Ball.ZERO;
            for (int k = 0; k < Math.min(y.size(), n + 1); k++) {
                sum = sum.add(y.get(k).multiply(powers.get(n - k), bits), bits);
            }
            result.add(sum);
        }
        return result;
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
