package bubblechain.analytic;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import java.util.ArrayList;
import java.util.List;

/** One term of a normal form over discs of u, its exact numbers turned into discs once. */
final class TermDisc {
    private static final int BITS = 64;

    private final ScaledDisc constant;
    private final ComplexDisc slope;
    private final RationalDisc factor;
    private final List<GammaPower> gammas = new ArrayList<>();
    private final List<PolygammaPower> polygammas = new ArrayList<>();
    private final List<UnitPower> units = new ArrayList<>();
    private final List<SinePower> sines = new ArrayList<>();

    /** constant + slope u. */
    private record Argument(ComplexDisc constant, ComplexDisc slope) {
        static Argument of(Rational constant, Rational slope) {
            return new Argument(ComplexDisc.of(constant), ComplexDisc.of(slope));
        }

        static Argument of(ExactConstant constant, Rational slope) {
            return new Argument(ComplexDisc.of(constant.toBall(BITS)), ComplexDisc.of(slope));
        }

        ComplexDisc over(ComplexDisc u) {
            return slope.multiply(u).add(constant);
        }
    }

    private record GammaPower(Argument argument, int power) {}

    private record PolygammaPower(PolygammaDisc function, Argument argument, int power) {}

    private record UnitPower(UnitDisc function, Argument argument, int power) {}

    private record SinePower(Argument argument, int power) {}

    private TermDisc(TermKey key, RationalFunction rational) {
        constant = ScaledDisc.of(key.constant().toBall(BITS));
        slope = ComplexDisc.of(key.slope().toBall(BITS));
        factor = RationalDisc.of(rational);
        key.gammas().forEach((g, power) -> gammas.add(new GammaPower(Argument.of(g.shift(), g.slope()), power)));
        key.polygammas()
                .forEach((p, power) -> polygammas.add(
                        new PolygammaPower(PolygammaDisc.of(p.n()), Argument.of(p.shift(), p.slope()), power)));
        key.units()
                .forEach((w, power) -> units.add(
                        new UnitPower(UnitDisc.of(w.n()), Argument.of(w.shift(), w.slope()), power)));
        key.sines().forEach((s, power) -> sines.add(new SinePower(Argument.of(s.constant(), s.slope()), power)));
    }

    static TermDisc of(TermKey key, RationalFunction rational) {
        return new TermDisc(key, rational);
    }

    /** The values at all u of the disc; the whole plane if the term may be singular there. */
    ScaledDisc over(ComplexDisc u) {
        TermProduct product = new TermProduct(u);
        product.multiply(constant);
        product.multiplyExponential(slope.multiply(product.center()), slope);
        factor.multiplyInto(product);
        gammas.forEach(g -> multiplyGamma(product, g));
        for (PolygammaPower p : polygammas) {
            product.multiply(p.function().over(p.argument().over(u)).power(p.power()));
        }
        for (UnitPower w : units) {
            product.multiply(w.function().over(w.argument().over(u)).power(w.power()));
        }
        sines.forEach(s -> multiplySine(product, s));
        return product.total();
    }

    /**
     * Gamma(z)^m = (Gamma(z+N)/(z (z+1) ... (z+N-1)))^m. Factors that may vanish on the disc are taken over the disc,
     * the others at the centre with their logarithmic derivatives.
     */
    private static void multiplyGamma(TermProduct product, GammaPower gamma) {
        ComplexDisc over = gamma.argument().over(product.domain());
        ComplexDisc atCenter = gamma.argument().over(product.center());
        int steps = StirlingSeries.shift(0, over);
        if (steps < 0) {
            product.multiply(ScaledDisc.WHOLE);
            return;
        }
        ScaledDisc shifted = ScaledDisc.ONE;
        ComplexDisc inverses = ComplexDisc.ZERO;
        for (int k = 0; k < steps; k++) {
            ComplexDisc point = atCenter.add(k);
            if (point.smallest() > 2 * over.radius()) {
                shifted = shifted.multiply(point);
                inverses = product.isPoint() ? inverses : inverses.add(over.add(k).inverse());
            } else {
                product.multiply(ScaledDisc.of(over.add(k)).power(-gamma.power()));
            }
        }
        product.multiply(shifted.power(-gamma.power()));
        ComplexDisc logarithm = StirlingSeries.lnGamma(atCenter.add(steps), StirlingSeries.TERMS);
        ComplexDisc derivative = product.isPoint()
                ? ComplexDisc.ZERO
                : StirlingSeries.digamma(over.add(steps), StirlingSeries.TERMS)
                        .subtract(inverses)
                        .multiply(gamma.argument().slope());
        product.multiplyExponential(logarithm.multiply(gamma.power()), derivative.multiply(gamma.power()));
    }

    /** sin z = (i s/2) e^(-i s z) (1 - e^(2 i s z)) with s the sign of Im z; the last factor is of order one. */
    private static void multiplySine(TermProduct product, SinePower sine) {
        ComplexDisc over = sine.argument().over(product.domain());
        ComplexDisc atCenter = sine.argument().over(product.center());
        int sign = over.im() < 0 ? -1 : 1;
        ComplexDisc small = ScaledDisc.exp(over.timesI().multiply(2.0 * sign)).unscaled();
        ComplexDisc factor = ComplexDisc.ONE.subtract(small).timesI().multiply(sign / 2.0);
        product.multiply(ScaledDisc.of(factor).power(sine.power()));
        double rate = -sign * sine.power();
        product.multiplyExponential(
                atCenter.timesI().multiply(rate), sine.argument().slope().timesI().multiply(rate));
    }
}
