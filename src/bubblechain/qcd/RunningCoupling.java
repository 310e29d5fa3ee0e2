package bubblechain.qcd;

import bubblechain.exact.DomainException;
import java.util.Optional;
import java.util.OptionalDouble;
import org.apache.commons.math3.analysis.solvers.LaguerreSolver;
import org.apache.commons.math3.complex.Complex;

/**
 * The MS-bar coupling of QCD with a fixed number of flavours at any scale, from its value at one scale.
 *
 * <p>Definition. The solution of d alpha_s/d ln mu = -2 alpha_s sum_{k=0}^{loops-1} beta_k (alpha_s/(4 pi))^(k+1), the
 * truncated equation solved exactly (no expansion in logarithms), with beta_k of {@link BetaFunction}. Scales in GeV.
 *
 * <p>Range: scales between {@link #lowestScale}, where alpha_s = pi and an expansion has long lost its meaning, and any finite
 * one. If the truncated beta function has a zero the coupling tends to it at low scales ({@link #fixedPoint}) and has no Landau
 * pole; a reference value beyond the zero is refused, it would not be asymptotically free.
 *
 * <p>Error: the relative error of a value, reference value and scales taken as exact, is below {@value #RELATIVE_ACCURACY}
 * for alpha_s up to 1, and below ten times that up to pi, where rounding is amplified a thousandfold.
 * It does not contain the error of the reference value nor the missing orders; see {@link #of} with fewer loops for the latter.
 *
 * @implNote an adaptive Dormand-Prince integration of order 8(5,3) in ln mu for each value, about 0.1 ms.
 */
public final class RunningCoupling {
    /** Stated bound of the relative error, for alpha_s up to 1. */
    public static final double RELATIVE_ACCURACY = 1e-12;
    /** Largest coupling. */
    public static final double LARGEST_ALPHA = Math.PI;

    /** v = 4 pi/alpha_s at the largest coupling. */
    private static final double SMALLEST_V = 4;
    /** A root of the beta function with a smaller ratio of imaginary to real part counts as real. */
    private static final double REAL_ROOT = 1e-7;

    private final int nf;
    private final int loops;
    private final double scale;
    private final double value;
    private final Evolution evolution;
    private final OptionalDouble fixedPoint;

    private RunningCoupling(int nf, int loops, double scale, double value, double[] beta) {
        this.nf = nf;
        this.loops = loops;
        this.scale = scale;
        this.value = value;
        this.evolution = new Evolution(beta, new double[0]);
        this.fixedPoint = smallestRoot(beta);
        if (fixedPoint.isPresent() && value >= fixedPoint.getAsDouble()) {
            throw new DomainException("alpha_s = " + Numbers.shown(value) + " lies beyond the zero of the " + loops
                    + "-loop beta function with nf = " + nf + " at " + Numbers.shown(fixedPoint.getAsDouble())
                    + "; give a smaller value");
        }
    }

    /**
     * The coupling that has a given value at a given scale.
     *
     * @param nf     flavours, 0 to 16
     * @param loops  coefficients of the beta function kept, 1 to 5
     * @param scale  mu in GeV, positive
     * @param alphaS alpha_s^(nf)(mu), above 0 and at most pi
     * @throws DomainException outside these ranges, or beyond a zero of the beta function
     */
    public static RunningCoupling of(int nf, int loops, double scale, double alphaS) {
        double[] beta = Numbers.of(BetaFunction.of(nf, loops).coefficients());
        Numbers.positive(scale, "the scale of alpha_s in GeV");
        Numbers.positive(alphaS, "alpha_s");
        if (alphaS > LARGEST_ALPHA) {
            throw new DomainException("alpha_s must not exceed pi, got " + Numbers.shown(alphaS));
        }
        return new RunningCoupling(nf, loops, scale, alphaS, beta);
    }

    /** Flavours. */
    public int nf() {
        return nf;
    }

    /** Coefficients of the beta function kept. */
    public int loops() {
        return loops;
    }

    /** The scale in GeV at which the value was given. */
    public double scale() {
        return scale;
    }

    /** alpha_s at {@link #scale}. */
    public double value() {
        return value;
    }

    /**
     * alpha_s^(nf)(mu).
     *
     * @param mu in GeV, at least {@link #lowestScale}
     * @throws DomainException if mu is not a positive number, or too low; the message names the Landau pole
     */
    public double alphaS(double mu) {
        Numbers.positive(mu, "the scale mu in GeV");
        if (mu == scale) {
            return value;
        }
        refuseTooLow(mu);
        return 4 * Math.PI / evolution.run(4 * Math.PI / value, logRatio(mu))[0];
    }

    /** alpha_s(mu) in units of a, alpha_s, alpha_s/pi or alpha_s/(4 pi). @throws DomainException as {@link #alphaS(double)} */
    public double value(Coupling coupling, double mu) {
        return alphaS(mu) * Numbers.of(coupling.perAlpha(BetaFunction.of(nf, loops).beta0()));
    }

    /** The same curve with another reference scale. @throws DomainException as {@link #alphaS(double)} */
    public RunningCoupling at(double mu) {
        return of(nf, loops, mu, alphaS(mu));
    }

    /** ln(mu/scale); the difference of logarithms where the quotient would overflow. */
    double logRatio(double mu) {
        double ratio = mu / scale;
        return ratio > 0 && !Double.isInfinite(ratio) ? Math.log(ratio) : Math.log(mu) - Math.log(scale);
    }

    /** @throws DomainException if mu is below {@link #lowestScale} */
    void refuseTooLow(double mu) {
        if (mu >= scale) {
            return;
        }
        Optional<Double> pole = landauPole();
        if (pole.isPresent() && mu <= pole.get()) {
            throw new DomainException("mu = " + Numbers.shown(mu) + " GeV is below the Landau pole of the " + loops
                    + "-loop coupling with nf = " + nf + " at " + Numbers.shown(pole.get()) + " GeV; give a larger scale");
        }
        if (mu < lowestScale()) {
            throw new DomainException("mu = " + Numbers.shown(mu) + " GeV is so near to the Landau pole that alpha_s with nf = "
                    + nf + " exceeds pi; give at least " + Numbers.shown(lowestScale()) + " GeV");
        }
    }

    /**
     * The scale in GeV at which the solution of the truncated equation diverges; empty if the beta function has a zero on
     * the way, so that it never does. Below it there is no answer; it is not a Lambda parameter, except at one loop.
     */
    public Optional<Double> landauPole() {
        return fixedPoint.isPresent() ? Optional.empty() : Optional.of(scaleOf(0));
    }

    /** The scale in GeV where alpha_s = pi, the lowest one answered; 0 if alpha_s stays below pi at all scales. */
    public double lowestScale() {
        return fixedPoint.orElse(Double.POSITIVE_INFINITY) <= LARGEST_ALPHA ? 0 : scaleOf(SMALLEST_V);
    }

    private double scaleOf(double v) {
        return scale * Math.exp(evolution.distance(4 * Math.PI / value, v));
    }

    /** The smallest positive zero of the truncated beta function, as a value of alpha_s; empty if there is none. */
    public OptionalDouble fixedPoint() {
        return fixedPoint;
    }

    Evolution evolution() {
        return evolution;
    }

    /** The smallest positive zero of sum_k beta_k y^k, as alpha_s = 4 pi y. */
    static OptionalDouble smallestRoot(double[] beta) {
        if (beta.length == 1) {
            return OptionalDouble.empty();
        }
        double smallest = Double.POSITIVE_INFINITY;
        for (Complex root : new LaguerreSolver().solveAllComplex(beta, 0)) {
            if (root.getReal() > 0 && Math.abs(root.getImaginary()) < REAL_ROOT * root.getReal()) {
                smallest = Math.min(smallest, 4 * Math.PI * root.getReal());
            }
        }
        return Double.isInfinite(smallest) ? OptionalDouble.empty() : OptionalDouble.of(smallest);
    }

    /** The same flavours, loops, reference scale and value; equal curves given at two scales are not found out. */
    @Override
    public boolean equals(Object other) {
        return other instanceof RunningCoupling c && nf == c.nf && loops == c.loops && scale == c.scale && value == c.value;
    }

    @Override
    public int hashCode() {
        return 31 * (31 * nf + loops) + Double.hashCode(scale) + 7 * Double.hashCode(value);
    }

    /** "alpha_s^(5)(91.188 GeV) = 0.118, 5-loop running". */
    @Override
    public String toString() {
        return "alpha_s^(" + nf + ")(" + scale + " GeV) = " + value + ", " + loops + "-loop running";
    }
}
