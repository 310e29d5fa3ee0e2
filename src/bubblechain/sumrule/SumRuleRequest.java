package bubblechain.sumrule;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.PerturbativeSeries;
import bubblechain.fixedorder.Singularity;
import bubblechain.fixedorder.UncertainSeries;
import bubblechain.qcd.BetaFunction;
import bubblechain.qcd.Colour;
import bubblechain.qcd.Coupling;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.IntFunction;

/**
 * What the sum rule is asked: a series, the singularity to probe, the running, and how to judge.
 *
 * <p>{@link #forSeries}, {@link #forCoefficients} and {@link #forChain} start a request; the methods of {@link Builder}
 * change its defaults.
 *
 * @param name          name of the series
 * @param inWords       what is expanded in what
 * @param coefficients  coefficients of y, y^2, ..., y = alpha_s/(4 pi), with input errors, prefactor taken out
 * @param prefactor     f = prefactor x series; the strength K includes it, the bare strength does not
 * @param beta          running
 * @param power         p = 2 u0, not 0
 * @param exponentShift delta; empty if unknown, then 0 is used and said so
 * @param corrections   C_1, C_2, ... of the power correction
 * @param lambdas       positive scale factors of the scan
 * @param obstacles     other singularities
 * @param sources       bibliography keys of the series
 * @param cautions      cautions of the series
 */
public record SumRuleRequest(
        String name,
        String inWords,
        UncertainSeries coefficients,
        ExactConstant prefactor,
        BetaFunction beta,
        Rational power,
        Optional<Rational> exponentShift,
        List<ExactConstant> corrections,
        List<ExactConstant> lambdas,
        List<Obstacle> obstacles,
        List<String> sources,
        List<String> cautions) {
    /** The scan of the scale error: 1/2, 1/sqrt(2), 1, sqrt(2), 2. */
    public static final List<ExactConstant> LAMBDAS = List.of(
            ExactConstant.of(Rational.HALF),
            ExactFunctions.power(Rational.TWO, Rational.of(-1, 2)),
            ExactConstant.ONE,
            ExactFunctions.power(Rational.TWO, Rational.HALF),
            ExactConstant.of(2));
    private static final int SIGN_BITS = 64;

    public SumRuleRequest {
        corrections = List.copyOf(corrections);
        lambdas = List.copyOf(lambdas);
        obstacles = List.copyOf(obstacles);
        sources = List.copyOf(sources);
        cautions = List.copyOf(cautions);
        if (power.isZero()) {
            throw new DomainException("the power p = 2 u0 of a singularity cannot be 0; give p > 0 (infrared) or p < 0"
                    + " (ultraviolet)");
        }
        if (lambdas.isEmpty()) {
            throw new DomainException("the scale scan needs at least one factor lambda, got none");
        }
        for (ExactConstant lambda : lambdas) {
            if (!lambda.toBall(SIGN_BITS).isPositive()) {
                throw new DomainException("a scale factor lambda must be positive, got " + lambda);
            }
        }
    }

    /** Number of coefficients used. */
    public int loops() {
        return coefficients.loops();
    }

    /** The shift of the exponent that is used: 0 if it is unknown. */
    public Rational shiftUsed() {
        return exponentShift.orElse(Rational.ZERO);
    }

    /** u0 = p/2. */
    public Rational position() {
        return power.divide(2);
    }

    /** True for a simple pole of a bubble chain, where a Laurent residue exists. */
    public boolean isSimplePole() {
        return beta.loops() == 1 && shiftUsed().isZero() && exponentShift.isPresent();
    }

    /**
     * A published or user series in alpha_s^(nf), all known orders, five-loop running, its leading singularity with the
     * exponent declared there, its other singularities as obstacles.
     *
     * @throws DomainException if nf is outside the range of the series
     */
    public static Builder forSeries(PerturbativeSeries series, int nf) {
        UncertainSeries inY = series.inAlphaOverPi(nf, 0).inUnits(ExactConstant.of(4));
        Builder builder = new Builder(series.name(), inY, BetaFunction.of(nf), series.power());
        builder.inWords = series.inWordsWith(nf);
        builder.prefactor = series.prefactor(nf);
        builder.declared = series.singularities();
        builder.cautions = series.cautions();
        builder.sources = loops -> series.sources(loops);
        return builder;
    }

    /**
     * Coefficients of coupling, coupling^2, ... with any running.
     *
     * @throws DomainException if power is 0
     */
    public static Builder forCoefficients(
            String name, UncertainSeries coefficients, Coupling coupling, BetaFunction beta, Rational power) {
        ExactConstant ratio = coupling.inUnitsOf(Coupling.ALPHA_OVER_4PI, beta.beta0());
        Builder builder = new Builder(name, coefficients.inUnits(ratio), beta, power);
        builder.inWords = name + " in " + coupling.words();
        builder.exponentShift = Optional.of(Rational.ZERO);
        return builder;
    }

    /**
     * A bubble chain f = (CF/beta0) sum_{n>=0} c_n a^(n+1) with one-loop running; a pole of order m has delta = m - 1.
     *
     * @param c c_0, c_1, ...
     */
    public static Builder forChain(String name, List<ExactConstant> c, int nf, Rational power) {
        BetaFunction beta = BetaFunction.of(nf, 1);
        return forCoefficients(name, UncertainSeries.exact(c), Coupling.A, beta, power)
                .prefactor(ExactConstant.of(Colour.CF.divide(beta.beta0())));
    }

    /** A request under construction. */
    public static final class Builder {
        private final String name;
        private final UncertainSeries coefficients;
        private BetaFunction beta;
        private Rational power;
        private int loops;
        private String inWords = "";
        private ExactConstant prefactor = ExactConstant.ONE;
        private Optional<Rational> exponentShift = Optional.empty();
        private Optional<List<ExactConstant>> corrections = Optional.empty();
        private List<ExactConstant> lambdas = LAMBDAS;
        private List<Singularity> declared = List.of();
        private final List<Obstacle> obstacles = new ArrayList<>();
        private IntFunction<List<String>> sources = loops -> List.of();
        private List<String> cautions = List.of();

        private Builder(String name, UncertainSeries coefficients, BetaFunction beta, Rational power) {
            this.name = name;
            this.coefficients = coefficients;
            this.beta = beta;
            this.power = power;
            this.loops = coefficients.loops();
        }

        /** Uses the first coefficients only. */
        public Builder loops(int number) {
            loops = number;
            return this;
        }

        /** Probes another singularity, p = 2 u0. */
        public Builder power(Rational p) {
            power = p;
            return this;
        }

        /** Fixes delta, whatever the series declares. */
        public Builder exponentShift(Rational delta) {
            exponentShift = Optional.of(delta);
            return this;
        }

        /** Fixes C_1, C_2, ... of the power correction, whatever the series declares. */
        public Builder corrections(List<ExactConstant> values) {
            corrections = Optional.of(values);
            return this;
        }

        /** f = prefactor x series. */
        public Builder prefactor(ExactConstant value) {
            prefactor = value;
            return this;
        }

        /** Runs with fewer loops. */
        public Builder betaLoops(int number) {
            beta = BetaFunction.of(beta.nf(), number);
            return this;
        }

        /** Scale factors of the scan, positive. */
        public Builder lambdas(List<ExactConstant> factors) {
            lambdas = factors;
            return this;
        }

        /** Adds a singularity that may stand in the way; it replaces one declared by the series at the same u. */
        public Builder obstacle(Obstacle other) {
            obstacles.add(other);
            return this;
        }

        /** What is expanded in what, for the header of a report. */
        public Builder inWords(String words) {
            inWords = words;
            return this;
        }

        /** @throws DomainException if p is 0, a lambda is not positive, or more loops are asked for than known */
        public SumRuleRequest build() {
            Optional<Singularity> probed =
                    declared.stream().filter(s -> s.power().equals(power)).findFirst();
            Optional<Rational> shift = exponentShift.isPresent()
                    ? exponentShift
                    : probed.flatMap(s -> s.exponentShift(beta.nf()));
            List<ExactConstant> correction = corrections.orElseGet(
                    () -> probed.map(s -> s.corrections(beta.nf())).orElse(List.of()));
            return new SumRuleRequest(
                    name, inWords, coefficients.first(loops), prefactor, beta, power, shift, correction, lambdas,
                    allObstacles(), sources.apply(loops), cautions);
        }

        private List<Obstacle> allObstacles() {
            List<Obstacle> all = new ArrayList<>(obstacles);
            declared.stream()
                    .filter(s -> obstacles.stream().noneMatch(o -> o.position().equals(s.position())))
                    .forEach(s -> all.add(Obstacle.of(s, beta.nf())));
            all.removeIf(o -> o.position().equals(power.divide(2)));
            return all;
        }
    }
}
