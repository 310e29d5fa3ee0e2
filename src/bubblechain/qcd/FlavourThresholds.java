package bubblechain.qcd;

import bubblechain.exact.DomainException;
import bubblechain.exact.PrecisionException;
import java.util.ArrayList;
import java.util.List;

/**
 * The MS-bar coupling and the MS-bar masses of light quarks in theories with different numbers of flavours, related at the
 * thresholds of heavy quarks.
 *
 * <p>Definition. Down: alpha_s^(nl) = alpha_s^(nl+1) zeta with the truncated series zeta of {@link DecouplingSeries} in
 * alpha_s^(nl+1)(mu), mu the scale of the threshold. Up: the same equation solved numerically for alpha_s^(nl+1), not
 * the reversed series, so that going there and back is the identity up to rounding. Masses are multiplied or divided by
 * zeta_m of the same alpha_s^(nl+1). Between thresholds the equations are integrated ({@link RunningCoupling}).
 * Running with n loops goes with n - 1 orders here; n = 1 leaves coupling and mass continuous.
 *
 * <p>Error: relative, below {@link RunningCoupling#RELATIVE_ACCURACY}, constants taken as printed. The truncation of zeta is
 * another matter: vary the scales of the thresholds ({@link Threshold#atScale}) and the order.
 */
public final class FlavourThresholds {
    private static final int MOST_STEPS = 50;
    /** Relative change of the last step of the solution for alpha_s^(nl+1). */
    private static final double LAST_STEP = 4e-16;

    private final int order;
    private final List<Threshold> thresholds;
    private final List<DecouplingSeries> series;

    private FlavourThresholds(int order, List<Threshold> thresholds) {
        this.order = order;
        this.thresholds = List.copyOf(thresholds);
        this.series = thresholds.stream()
                .map(t -> DecouplingSeries.of(t.nl(), t.definition(), order))
                .toList();
    }

    /**
     * Thresholds in order, each with one flavour more below it than the one before.
     *
     * @param order      highest power of alpha_s/pi kept at a threshold, 0 to 4
     * @param thresholds lightest quark first, at least one, scales rising
     * @throws DomainException if they are not like that
     */
    public static FlavourThresholds of(int order, List<Threshold> thresholds) {
        if (thresholds.isEmpty()) {
            throw new DomainException("give at least one threshold; with a fixed number of flavours none is needed");
        }
        for (int i = 1; i < thresholds.size(); i++) {
            Threshold below = thresholds.get(i - 1);
            Threshold above = thresholds.get(i);
            if (above.nl() != below.nl() + 1 || above.scale() <= below.scale()) {
                throw new DomainException("thresholds must follow each other with one more flavour and a larger scale; got nl = "
                        + below.nl() + " at " + below.scale() + " GeV, then nl = " + above.nl() + " at " + above.scale() + " GeV");
            }
        }
        return new FlavourThresholds(order, thresholds);
    }

    /** The charm, bottom and top quarks of {@link StandardInputs} at their own masses, orders fit for n-loop running. */
    public static FlavourThresholds standard(int loops) {
        BetaFunction beta = BetaFunction.of(StandardInputs.ALPHA_S_FLAVOURS, loops);
        return of(beta.loops() - 1, StandardInputs.thresholds());
    }

    /** Highest power of alpha_s/pi kept. */
    public int order() {
        return order;
    }

    /** The thresholds, lightest quark first. */
    public List<Threshold> thresholds() {
        return thresholds;
    }

    /** Flavours active at a scale: one more above the scale of each threshold, and at it. */
    public int flavoursAt(double mu) {
        Numbers.positive(mu, "the scale mu in GeV");
        int above = (int) thresholds.stream().filter(t -> mu >= t.scale()).count();
        return lowest() + above;
    }

    private int lowest() {
        return thresholds.get(0).nl();
    }

    private int highest() {
        return lowest() + thresholds.size();
    }

    /** alpha_s at a scale with the flavours active there. @throws DomainException as {@link #withFlavours(RunningCoupling, int)} */
    public double alphaS(RunningCoupling from, double mu) {
        return alphaS(from, mu, flavoursAt(mu));
    }

    /**
     * alpha_s^(nf)(mu) from a coupling of any number of flavours.
     *
     * @param mu in GeV; also beyond the thresholds around nf, in the range of the coupling of nf flavours
     * @throws DomainException outside the ranges of thresholds and couplings
     */
    public double alphaS(RunningCoupling from, double mu, int nf) {
        return withFlavours(from, nf).alphaS(mu);
    }

    /**
     * The coupling of nf flavours; its reference scale is that of the last threshold passed.
     *
     * @throws DomainException if there are no thresholds between the two numbers of flavours, or if a scale is below the range
     */
    public RunningCoupling withFlavours(RunningCoupling from, int nf) {
        RunningCoupling current = from;
        for (int step : steps(from.nf(), nf)) {
            current = across(current, step, nf < from.nf());
        }
        return current;
    }

    /** Indices of the thresholds passed, in that order. */
    private List<Integer> steps(int from, int to) {
        List<Integer> steps = new ArrayList<>();
        if (from == to) {
            return steps;
        }
        for (int nf : List.of(from, to)) {
            if (nf < lowest() || nf > highest()) {
                throw new DomainException("these thresholds lead from " + lowest() + " to " + highest() + " flavours, not to or from "
                        + nf);
            }
        }
        int direction = to > from ? 1 : -1;
        for (int nf = from; nf != to; nf += direction) {
            steps.add(Math.min(nf, nf + direction) - lowest());
        }
        return steps;
    }

    private RunningCoupling across(RunningCoupling from, int index, boolean down) {
        Threshold threshold = thresholds.get(index);
        double start = from.alphaS(threshold.scale());
        double end = down
                ? start * series.get(index).couplingRatio(start, threshold.logarithm())
                : heavier(start, threshold, series.get(index));
        return RunningCoupling.of(down ? threshold.nl() : threshold.nl() + 1, from.loops(), threshold.scale(), end);
    }

    /** The solution alpha of alpha zeta(alpha) = alpha_s^(nl), by the secant method from alpha_s^(nl). */
    private static double heavier(double lighter, Threshold threshold, DecouplingSeries series) {
        double logarithm = threshold.logarithm();
        double last = lighter;
        double lastResidue = lighter * series.couplingRatio(lighter, logarithm) - lighter;
        double alpha = lighter - lastResidue;
        for (int i = 0; i < MOST_STEPS; i++) {
            double residue = alpha * series.couplingRatio(alpha, logarithm) - lighter;
            if (residue == lastResidue || Math.abs(alpha - last) <= LAST_STEP * alpha) {
                return alpha;
            }
            double next = alpha - residue * (alpha - last) / (residue - lastResidue);
            last = alpha;
            lastResidue = residue;
            alpha = next;
        }
        throw new PrecisionException("alpha_s with " + (threshold.nl() + 1) + " flavours was not found from alpha_s = "
                + Numbers.shown(lighter) + " at the threshold " + threshold.scale() + " GeV; move that scale nearer to the mass");
    }

    /**
     * The mass of a quark in the theory with nf flavours, with its coupling; reference scale as that of the coupling.
     *
     * @param from the mass of a quark lighter than those of the thresholds passed, in any theory with this quark
     * @throws DomainException as for couplings, or if the quark is not lighter than that of a threshold: a heavy quark has no
     *                         running mass below its own threshold
     */
    public RunningMass withFlavours(RunningMass from, int nf) {
        int start = from.coupling().nf();
        RunningMass current = from;
        for (int step : steps(start, nf)) {
            current = across(current, step, nf < start);
        }
        return current;
    }

    /** m^(nf)(mu) in GeV. @throws DomainException as {@link #withFlavours(RunningMass, int)} */
    public double mass(RunningMass from, double mu, int nf) {
        return withFlavours(from, nf).mass(mu);
    }

    private RunningMass across(RunningMass from, int index, boolean down) {
        Threshold threshold = thresholds.get(index);
        double mass = from.mass(threshold.scale());
        if (mass >= threshold.mass()) {
            throw new DomainException("a quark of mass " + Numbers.shown(mass) + " GeV cannot be carried over the threshold of one of "
                    + Numbers.shown(threshold.mass()) + " GeV; its running mass exists only above its own threshold");
        }
        RunningCoupling end = across(from.coupling(), index, down);
        double heavier = (down ? from.coupling() : end).alphaS(threshold.scale());
        double ratio = series.get(index).massRatio(heavier, threshold.logarithm());
        return RunningMass.of(end, from.loops(), threshold.scale(), down ? mass * ratio : mass / ratio);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof FlavourThresholds f && order == f.order && thresholds.equals(f.thresholds);
    }

    @Override
    public int hashCode() {
        return 31 * order + thresholds.hashCode();
    }

    @Override
    public String toString() {
        return "thresholds to order " + order + " in alpha_s/pi: " + thresholds;
    }
}
