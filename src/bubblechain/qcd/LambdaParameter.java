package bubblechain.qcd;

import bubblechain.exact.DomainException;

/**
 * The scale parameter Lambda_MSbar^(nf) of the coupling.
 *
 * <p>Definition, with y = alpha_s/(4 pi), b = beta_1/(2 beta_0^2), P(x) = sum_{k<loops} beta_k x^k:
 * <pre>
 *   ln(mu/Lambda_MSbar) = 1/(2 beta_0 y) + b ln(beta_0 y) + int_0^y dx [-1/(2 x^2 P(x)) + 1/(2 beta_0 x^2) - b/x]
 * </pre>
 * the integral of the truncated beta function, not expanded in 1/ln mu; at one loop b = 0 and the integral vanishes. It does
 * not depend on mu. {@link #lambdaT} is the one of the truncated sum rule and of ambiguities,
 * Lambda_t = mu e^(-1/z) z^(-b) (1 + O(z)), z = 2 beta_0 y: Lambda_t = 2^(-b) Lambda_MSbar exactly. Both in GeV.
 *
 * <p>Error: numerical, relative, below {@link RunningCoupling#RELATIVE_ACCURACY} for alpha_s between 0.01 and 1. It grows like
 * 1e-16/(2 beta_0 y) for smaller couplings, and it does not contain missing orders.
 *
 * <p>Source: the definition is the usual one, stated with b in the literature on renormalons (hep-ph/0105008, from memory).
 */
public final class LambdaParameter {
    /** Where {@link #coupling} puts its reference value, unless the beta function has a zero near. */
    private static final double REFERENCE_ALPHA = 0.2;

    private final int nf;
    private final int loops;
    private final double lambda;

    private LambdaParameter(int nf, int loops, double lambda) {
        this.nf = nf;
        this.loops = loops;
        this.lambda = lambda;
    }

    /** Lambda of a coupling. @throws DomainException if the coupling is so small that Lambda is below any double */
    public static LambdaParameter of(RunningCoupling coupling) {
        double y = coupling.value() / (4 * Math.PI);
        double logarithm = logarithm(BetaFunction.of(coupling.nf(), coupling.loops()), coupling.evolution(), y);
        double lambda = Math.exp(Math.log(coupling.scale()) - logarithm);
        return of(coupling.nf(), coupling.loops(), lambda);
    }

    /**
     * A given Lambda_MSbar.
     *
     * @param nf     flavours, 0 to 16
     * @param loops  coefficients of the beta function kept, 1 to 5
     * @param lambda Lambda_MSbar^(nf) in GeV, positive
     * @throws DomainException outside these ranges
     */
    public static LambdaParameter of(int nf, int loops, double lambda) {
        BetaFunction beta = BetaFunction.of(nf, loops);
        return new LambdaParameter(beta.nf(), loops, Numbers.positive(lambda, "Lambda_MSbar in GeV"));
    }

    /** ln(mu/Lambda_MSbar). */
    private static double logarithm(BetaFunction beta, Evolution evolution, double y) {
        double beta0 = Numbers.of(beta.beta(0));
        return 1 / (2 * beta0 * y) + exponent(beta) * Math.log(beta0 * y) + evolution.beyondTwoTerms(y);
    }

    private static double exponent(BetaFunction beta) {
        double beta0 = Numbers.of(beta.beta(0));
        return Numbers.of(beta.beta(1)) / (2 * beta0 * beta0);
    }

    public int nf() {
        return nf;
    }

    /** Coefficients of the beta function kept. */
    public int loops() {
        return loops;
    }

    /** Lambda_MSbar^(nf) in GeV. */
    public double lambdaMsbar() {
        return lambda;
    }

    /** Lambda_t = 2^(-b) Lambda_MSbar in GeV. */
    public double lambdaT() {
        return lambda * Math.pow(2, -exponent(BetaFunction.of(nf, loops)));
    }

    /**
     * The coupling with this Lambda; its reference value is 0.2, or half the zero of the beta function if that is less.
     *
     * @throws DomainException if the scale of that value is above any double, as for nf = 16 beyond one loop
     */
    public RunningCoupling coupling() {
        BetaFunction beta = BetaFunction.of(nf, loops);
        double[] numbers = Numbers.of(beta.coefficients());
        double alphaS = Math.min(REFERENCE_ALPHA, RunningCoupling.smallestRoot(numbers).orElse(1) / 2);
        double logarithm = logarithm(beta, new Evolution(numbers, new double[0]), alphaS / (4 * Math.PI));
        return RunningCoupling.of(nf, loops, lambda * Math.exp(logarithm), alphaS);
    }

    /** The same flavours, loops and value. */
    @Override
    public boolean equals(Object other) {
        return other instanceof LambdaParameter l && nf == l.nf && loops == l.loops && lambda == l.lambda;
    }

    @Override
    public int hashCode() {
        return 31 * (31 * nf + loops) + Double.hashCode(lambda);
    }

    /** "Lambda_MSbar^(3) = 0.332 GeV, 5-loop running". */
    @Override
    public String toString() {
        return "Lambda_MSbar^(" + nf + ") = " + lambda + " GeV, " + loops + "-loop running";
    }
}
