package bubblechain.qcd;

import bubblechain.exact.DomainException;

/**
 * Where and how a heavy quark is taken out.
 *
 * @param nl         flavours below, 0 to 15; nl + 1 above
 * @param definition which mass is meant
 * @param mass       that mass in GeV, positive
 * @param scale      mu in GeV at which couplings of nl and nl + 1 flavours are related, positive; best within a factor of
 *                   about 3 of the mass, since logarithms ln(mu^2/mass^2) are in the truncated series
 */
public record Threshold(int nl, HeavyMass definition, double mass, double scale) {
    /** @throws DomainException outside the ranges above */
    public Threshold {
        if (nl < 0 || nl >= BetaFunction.LARGEST_NF) {
            throw new DomainException("a threshold needs between 0 and " + (BetaFunction.LARGEST_NF - 1)
                    + " flavours below it, got " + nl);
        }
        Numbers.positive(mass, "the mass of the heavy quark in GeV");
        Numbers.positive(scale, "the scale of the threshold in GeV");
    }

    /** At mu = mbar(mbar). @throws DomainException outside the ranges above */
    public static Threshold msbar(int nl, double mass) {
        return new Threshold(nl, HeavyMass.MSBAR, mass, mass);
    }

    /** At mu = M, the pole mass. @throws DomainException outside the ranges above */
    public static Threshold pole(int nl, double mass) {
        return new Threshold(nl, HeavyMass.POLE, mass, mass);
    }

    /** The same quark taken out at another scale, as in variations by a factor of two. */
    public Threshold atScale(double mu) {
        return new Threshold(nl, definition, mass, mu);
    }

    /** ln(mu^2/mass^2). */
    double logarithm() {
        return 2 * Math.log(scale / mass);
    }
}
