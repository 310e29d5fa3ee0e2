package bubblechain.analytic;

/**
 * A product of factors over a disc |u - c| <= r, collected as f(u) e^(g(c)) e^(g(u) - g(c)): f by discs over all u, g
 * by its value at c and by its derivative over the disc. |g(u) - g(c)| <= r max |g'| with the derivatives of all
 * factors added before the modulus is taken, so that what cancels between gamma functions cancels here.
 */
final class TermProduct {
    /** The disc of u. */
    private final ComplexDisc domain;

    private final ComplexDisc center;
    private ScaledDisc value = ScaledDisc.ONE;
    private ComplexDisc exponent = ComplexDisc.ZERO;
    private ComplexDisc derivative = ComplexDisc.ZERO;

    TermProduct(ComplexDisc domain) {
        this.domain = domain;
        this.center = domain.center();
    }

    ComplexDisc domain() {
        return domain;
    }

    ComplexDisc center() {
        return center;
    }

    /** Whether u is one point, so that derivatives are not needed. */
    boolean isPoint() {
        return domain.radius() == 0;
    }

    void multiply(ScaledDisc factor) {
        value = value.multiply(factor);
    }

    /** Multiplies by e^g. */
    void multiplyExponential(ComplexDisc atCenter, ComplexDisc derivativeOverDomain) {
        exponent = exponent.add(atCenter);
        addDerivative(derivativeOverDomain);
    }

    /** The factor multiplied at the centre only has this logarithmic derivative over the disc. */
    void addDerivative(ComplexDisc logarithmicDerivative) {
        derivative = derivative.add(logarithmicDerivative);
    }

    ScaledDisc total() {
        ComplexDisc over =
                isPoint() ? exponent : exponent.widened(Upward.inflate(domain.radius() * derivative.largest()));
        return value.multiply(ScaledDisc.exp(over));
    }
}
