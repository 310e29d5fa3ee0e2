package bubblechain.analytic;

import bubblechain.exact.Ball;
import bubblechain.exact.BallFunctions;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import bubblechain.exact.UnitHypergeometric;

/** The transcendental part of a term at a real point given by a ball. */
final class TermValue {
    private TermValue() {}

    static Ball of(TermKey key, Ball u, int bits) {
        Ball[] value = {key.constant().toBall(bits)};
        if (!key.slope().isZero()) {
            Ball exponent = key.slope().toBall(bits).multiply(u, bits);
            value[0] = value[0].multiply(BallFunctions.exp(exponent, bits), bits);
        }
        key.gammas().forEach((g, power) -> {
            Ball gamma = BallFunctions.gamma(argument(g.shift(), g.slope(), u, bits), bits);
            value[0] = value[0].multiply(gamma.power(power, bits), bits);
        });
        key.polygammas().forEach((p, power) -> {
            Ball z = argument(p.shift(), p.slope(), u, bits);
            Ball psi = p.n() == 0 ? BallFunctions.digamma(z, bits) : BallFunctions.polygamma(p.n(), z, bits);
            value[0] = value[0].multiply(psi.power(power, bits), bits);
        });
        key.units().forEach((w, power) -> {
            Ball z = argument(w.shift(), w.slope(), u, bits);
            Ball derivative = UnitHypergeometric.taylor(z, w.n() + 1, bits)[w.n()];
            Ball factor = derivative.multiply(Rational.of(ExactFunctions.factorial(w.n())), bits);
            value[0] = value[0].multiply(factor.power(power, bits), bits);
        });
        key.sines().forEach((s, power) -> {
            Ball z = s.constant().toBall(bits).add(u.multiply(s.slope(), bits), bits);
            value[0] = value[0].multiply(BallFunctions.sin(z, bits).power(power, bits), bits);
        });
        return value[0];
    }

    private static Ball argument(Rational shift, Rational slope, Ball u, int bits) {
        return u.multiply(slope, bits).add(shift, bits);
    }
}
