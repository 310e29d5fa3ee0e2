package bubblechain.qcd;

import bubblechain.exact.DomainException;
import bubblechain.exact.PrecisionException;

/**
 * The MS-bar mass of a quark at any scale, from its value at one scale, with a fixed number of flavours.
 *
 * <p>Definition. The solution of d ln m/d ln mu = -2 sum_{k=0}^{loops-1} gamma_k (alpha_s/(4 pi))^(k+1) together with that of
 * the coupling, both truncated equations solved exactly; gamma_k of {@link MassAnomalousDimension}. Scales and masses in GeV.
 *
 * <p>Range: that of the coupling. The flavours are those of the coupling: for mbar_b(mbar_b) of the bottom quark the theory
 * has five, the bottom quark included. {@link FlavourThresholds} carries the mass of a lighter quark over a threshold.
 *
 * <p>Error: relative, below {@link RunningCoupling#RELATIVE_ACCURACY}, inputs taken as exact.
 */
public final class RunningMass {
    private static final int MOST_STEPS = 60;
    /** A Newton step in ln mu below this is the last one. */
    private static final double LAST_STEP = 1e-14;

    private final RunningCoupling coupling;
    private final int loops;
    private final double scale;
    private final double value;
    /** 4 pi/alpha_s at {@link #scale}. */
    private final double startV;

    private final Evolution evolution;

    private RunningMass(RunningCoupling coupling, int loops, double scale, double value) {
        this.coupling = coupling;
        this.loops = loops;
        this.scale = scale;
        this.value = value;
        this.startV = 4 * Math.PI / coupling.alphaS(scale);
        this.evolution = new Evolution(
                Numbers.of(BetaFunction.of(coupling.nf(), coupling.loops()).coefficients()),
                Numbers.of(MassAnomalousDimension.of(coupling.nf(), loops).coefficients()));
    }

    /**
     * The mass with a given value at a given scale; as many loops as the coupling.
     *
     * @param coupling alpha_s with the flavours of the theory
     * @param scale    mu in GeV, in the range of the coupling
     * @param mass     m(mu) in GeV, positive; another unit comes back unchanged
     * @throws DomainException outside these ranges
     */
    public static RunningMass of(RunningCoupling coupling, double scale, double mass) {
        return of(coupling, coupling.loops(), scale, mass);
    }

    /** As {@link #of(RunningCoupling, double, double)} with 1 to 5 loops of the anomalous dimension. */
    public static RunningMass of(RunningCoupling coupling, int loops, double scale, double mass) {
        Numbers.positive(scale, "the scale of the mass in GeV");
        Numbers.positive(mass, "the mass in GeV");
        return new RunningMass(coupling, loops, scale, mass);
    }

    /** mbar(mbar) given: scale and value are the same number. @throws DomainException as {@link #of} */
    public static RunningMass ofOwnScale(RunningCoupling coupling, double mass) {
        return of(coupling, mass, mass);
    }

    /** The coupling it runs with. */
    public RunningCoupling coupling() {
        return coupling;
    }

    /** Coefficients of the anomalous dimension kept. */
    public int loops() {
        return loops;
    }

    /** The scale in GeV at which the value was given. */
    public double scale() {
        return scale;
    }

    /** The mass at {@link #scale}. */
    public double value() {
        return value;
    }

    /** m(mu) in GeV. @throws DomainException if mu is outside the range of the coupling */
    public double mass(double mu) {
        Numbers.positive(mu, "the scale mu in GeV");
        if (mu == scale) {
            return value;
        }
        coupling.refuseTooLow(mu);
        double step = coupling.logRatio(mu) - coupling.logRatio(scale);
        return value * Math.exp(evolution.run(startV, step)[1]);
    }

    /**
     * mbar(mbar), the scale at which mass and scale are equal. The difference ln m(mu) - ln mu falls everywhere, so that there is
     * one such scale at most.
     *
     * @throws DomainException    if it lies below the range of the coupling
     * @throws PrecisionException if Newton's iteration does not settle
     */
    public double ownScale() {
        double mu = scale;
        for (int i = 0; i < MOST_STEPS; i++) {
            double step = Math.log(mass(mu) / mu) / (1 + slope(mu));
            mu *= Math.exp(step);
            if (Math.abs(step) < LAST_STEP) {
                return mu;
            }
        }
        throw new PrecisionException("no scale found at which the mass equals the scale, starting from " + this);
    }

    /** -d ln m/d ln mu. */
    private double slope(double mu) {
        return evolution.decrease(4 * Math.PI / coupling.alphaS(mu));
    }

    /** The same curve with another reference scale. @throws DomainException as {@link #mass} */
    public RunningMass at(double mu) {
        return new RunningMass(coupling, loops, mu, mass(mu));
    }

    /** The same coupling, loops, scale and value. */
    @Override
    public boolean equals(Object other) {
        return other instanceof RunningMass m
                && coupling.equals(m.coupling)
                && loops == m.loops
                && scale == m.scale
                && value == m.value;
    }

    @Override
    public int hashCode() {
        return 31 * (31 * coupling.hashCode() + loops) + Double.hashCode(scale) + 7 * Double.hashCode(value);
    }

    /** "m(4.18 GeV) = 4.18 GeV, 5-loop running; alpha_s^(5)(...) = ...". */
    @Override
    public String toString() {
        return "m(" + scale + " GeV) = " + value + " GeV, " + loops + "-loop running; " + coupling;
    }
}
