package bubblechain.sumrule;

import bubblechain.exact.Ball;
import bubblechain.exact.BallFunctions;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.PrecisionException;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.ScaleLogarithms;
import bubblechain.qcd.BetaFunction;
import bubblechain.series.BallRing;
import bubblechain.series.ExactRing;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The truncated sum rule for the strength K of a Borel singularity at u0 = p/2,
 * K = (2/p) Gamma(1+nu) sum_{k=0}^{N-1} S_k p^k/Gamma(1+nu+k), from N coefficients, with an error budget, two other
 * estimators and a verdict. Definitions and derivation in the package comment.
 *
 * <p>Sources: Hoang, Jain, Scimemi, Stewart, arXiv:0803.4214 (p = 1) and arXiv:0908.3189; Hoang et al,
 * arXiv:1704.01580.
 */
public final class SumRule {
    /** Bibliography keys of the method. */
    public static final List<String> SOURCES = List.of("Hoang:2008yj", "Hoang:2009yr", "Hoang:2017suc");

    private static final int FIRST_BITS = 200;
    private static final int LARGEST_BITS = 100_000;
    /** Relative accuracy wanted of every value, or absolute accuracy relative to the largest one. */
    private static final int WANTED_BITS = 80;
    /** Non-leading terms of the large-order formula in the ratio estimator. */
    private static final int RATIO_DEPTH = 3;

    private final SumRuleRequest request;
    private final int bits;
    private final BallRing ring;
    private final ScaleEvolution<Ball> evolution;
    private final List<Ball> coefficients;

    private SumRule(SumRuleRequest request, int bits) {
        this.request = request;
        this.bits = bits;
        this.ring = BallRing.of(bits, 2);
        this.evolution = evolution(request.beta());
        this.coefficients = balls(request.coefficients().values());
    }

    private ScaleEvolution<Ball> evolution(BetaFunction beta) {
        List<Ball> corrections = balls(request.corrections());
        return ScaleEvolution.of(ring, beta, request.power(), request.shiftUsed(), corrections, request.loops());
    }

    private List<Ball> balls(List<ExactConstant> constants) {
        return constants.stream().map(c -> c.toBall(bits)).toList();
    }

    /**
     * Evaluates the sum rule.
     *
     * @throws bubblechain.exact.DomainException if the singularity is none (see {@link ScaleEvolution#of})
     * @throws PrecisionException if cancellations leave no digits at {@value #LARGEST_BITS} bits
     */
    public static SumRuleResult evaluate(SumRuleRequest request) {
        for (int bits = FIRST_BITS; bits <= LARGEST_BITS; bits *= 2) {
            SumRule rule = new SumRule(request, bits);
            List<ScanPoint> scan = rule.scan();
            List<Ball> central = rule.strengths(rule.evolution, rule.coefficients);
            boolean accurate = isAccurate(central) && scan.stream().allMatch(point -> isAccurate(point.strengths()));
            if (accurate) {
                return rule.result(central, scan);
            }
        }
        throw new PrecisionException("the sum rule for '" + request.name() + "' loses all digits to cancellation at "
                + LARGEST_BITS + " bits; use fewer loops");
    }

    /**
     * The bare partial sums K_0, K_1, ... as exact constants.
     *
     * @implNote grows quickly with the number of terms when the coefficients hold many different constants
     */
    public static List<ExactConstant> exactStrengths(SumRuleRequest request) {
        ScaleEvolution<ExactConstant> exact = ScaleEvolution.of(
                ExactRing.INSTANCE,
                request.beta(),
                request.power(),
                request.shiftUsed(),
                request.corrections(),
                request.loops());
        return exact.strengths(exact.terms(request.coefficients().values()));
    }

    /** P/K = (p/2) p^nu/Gamma(1+nu) for p &gt; 0. */
    static Ball ambiguityPerStrength(SumRuleRequest request) {
        Rational p = request.power();
        Rational nu = p.multiply(request.beta().b1hat()).add(request.shiftUsed());
        Ball power = BallFunctions.power(Ball.of(p, FIRST_BITS), nu, FIRST_BITS);
        Ball gamma = BallFunctions.gamma(Ball.of(nu.add(1), FIRST_BITS), FIRST_BITS);
        return power.multiply(p.divide(2), FIRST_BITS).divide(gamma, FIRST_BITS);
    }

    private static boolean isAccurate(List<Ball> values) {
        double largest = values.stream().mapToDouble(v -> Math.abs(v.toDouble())).max().orElse(0);
        return values.stream()
                .allMatch(v -> v.accuracyBits() >= WANTED_BITS
                        || v.radiusAsDouble() <= Math.scalb(largest, -2 * WANTED_BITS));
    }

    private List<Ball> strengths(ScaleEvolution<Ball> along, List<Ball> series) {
        return along.strengths(along.terms(series));
    }

    private List<ScanPoint> scan() {
        ScaleLogarithms<Ball> logarithms =
                ScaleLogarithms.of(ring, coefficients, request.beta(), Rational.ZERO);
        ScaleLogarithms<Ball> correctionLogarithms = correctionLogarithms();
        return request.lambdas().stream()
                .map(lambda -> scanPoint(lambda, logarithms, correctionLogarithms))
                .toList();
    }

    /** y^(-delta) (1 + C_1 y + ...) at every scale, as y^(-delta-1) sum_{n>=1}. */
    private ScaleLogarithms<Ball> correctionLogarithms() {
        List<Ball> list = new ArrayList<>();
        list.add(Ball.ONE);
        for (int k = 1; k <= request.loops(); k++) {
            list.add(k <= request.corrections().size() ? request.corrections().get(k - 1).toBall(bits) : Ball.ZERO);
        }
        return ScaleLogarithms.of(ring, list, request.beta(), request.shiftUsed().negate().subtract(1));
    }

    /** f = R'^p lambda^(-p) sum a'_n y(R')^n with R' = lambda R; the power correction is rewritten in y(R') as well. */
    private ScanPoint scanPoint(
            ExactConstant lambda, ScaleLogarithms<Ball> logarithms, ScaleLogarithms<Ball> correctionLogarithms) {
        Ball factor = lambda.toBall(bits);
        Ball logarithm = lambda.ln().toBall(bits);
        Ball rescaled = BallFunctions.power(factor, request.power().negate(), bits);
        List<Ball> moved = logarithms.at(logarithm).stream()
                .map(a -> a.multiply(rescaled, bits))
                .toList();
        List<Ball> corrections = correctionLogarithms.at(logarithm);
        ScaleEvolution<Ball> here = ScaleEvolution.of(
                ring,
                request.beta(),
                request.power(),
                request.shiftUsed(),
                corrections.subList(1, corrections.size()),
                request.loops());
        return new ScanPoint(lambda, strengths(here, moved));
    }

    private SumRuleResult result(List<Ball> central, List<ScanPoint> scan) {
        List<Double> inputs = inputErrors();
        List<ErrorBudget> budgets = budgets(central, scan, inputs);
        List<Double> sizes = central.stream().map(v -> Math.abs(v.toDouble())).toList();
        List<Double> nullErrors = budgets.stream().map(ErrorBudget::forNullTest).toList();
        int last = central.size() - 1;
        Ball prefactor = request.prefactor().toBall(bits);
        double scale = Math.abs(prefactor.toDouble());
        List<Ball> full = times(central, prefactor);
        Ball perStrength = Ball.of(request.beta().beta0(), bits)
                .divide(BallFunctions.pi(bits), bits)
                .shift(-2);
        return new SumRuleResult(
                request,
                central,
                full,
                times(full, perStrength),
                request.power().signum() > 0 ? times(full, ambiguityPerStrength(request)) : List.of(),
                inputs.stream().map(e -> e * scale).toList(),
                scan,
                budgets.get(last).times(scale),
                ratios(prefactor),
                times(evolution.truncatedResidues(coefficients), prefactor),
                NullTest.judge(sizes, nullErrors),
                Blocking.find(request, evolution.nu(), sizes.get(last), nullErrors.get(last)));
    }

    /** One budget per order; the shift of the beta function at the last one only. */
    private List<ErrorBudget> budgets(List<Ball> central, List<ScanPoint> scan, List<Double> inputs) {
        List<ErrorBudget> budgets = new ArrayList<>();
        for (int k = 0; k < central.size(); k++) {
            double beta = k == central.size() - 1 ? betaShift(central.get(k)) : 0;
            budgets.add(new ErrorBudget(halfBand(scan, k), lastStep(central, k), inputs.get(k), beta));
        }
        return budgets;
    }

    private List<Ball> times(List<Ball> values, Ball factor) {
        return values.stream().map(v -> v.multiply(factor, bits)).toList();
    }

    private List<Optional<Ball>> ratios(Ball prefactor) {
        List<Optional<Ball>> ratios = new ArrayList<>();
        for (int n = 0; n < coefficients.size(); n++) {
            Ball unit = evolution.asymptotic(n, RATIO_DEPTH);
            Ball value = coefficients.get(n).multiply(prefactor, bits);
            ratios.add(unit.containsZero() ? Optional.empty() : Optional.of(value.divide(unit, bits)));
        }
        return ratios;
    }

    /** Input errors of K_0, K_1, ...: the sum rule is linear, so every source goes through it by itself. */
    private List<Double> inputErrors() {
        double[] squares = new double[request.loops()];
        for (List<ExactConstant> source : request.coefficients().sources()) {
            List<Ball> shifts = strengths(evolution, balls(source));
            for (int k = 0; k < squares.length; k++) {
                double shift = shifts.get(k).toDouble();
                squares[k] += shift * shift;
            }
        }
        List<Double> errors = new ArrayList<>();
        for (double square : squares) {
            errors.add(Math.sqrt(square));
        }
        return errors;
    }

    private static double halfBand(List<ScanPoint> scan, int k) {
        Ball low = scan.get(0).strengths().get(k);
        Ball high = low;
        for (ScanPoint point : scan) {
            Ball value = point.strengths().get(k);
            low = value.midpoint().compareTo(low.midpoint()) < 0 ? value : low;
            high = value.midpoint().compareTo(high.midpoint()) > 0 ? value : high;
        }
        return high.midpoint().subtract(low.midpoint()).toDouble() / 2;
    }

    private static double lastStep(List<Ball> central, int k) {
        Rational before = k == 0 ? Rational.ZERO : central.get(k - 1).midpoint();
        return central.get(k).midpoint().subtract(before).abs().toDouble();
    }

    /** |K - K with the highest beta coefficient used set to zero|. */
    private double betaShift(Ball last) {
        int highest = Math.min(request.loops(), request.beta().loops() - 1);
        if (highest == 0) {
            return 0;
        }
        List<Ball> without = strengths(evolution(request.beta().truncated(highest)), coefficients);
        return without.get(without.size() - 1).midpoint().subtract(last.midpoint()).abs().toDouble();
    }
}
