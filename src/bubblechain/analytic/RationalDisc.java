package bubblechain.analytic;

import java.util.ArrayList;
import java.util.List;

/** A rational function over discs: its rational roots and poles as linear factors, the rest by Horner's scheme. */
final class RationalDisc {
    private final ScaledDisc leading;
    private final List<Root> roots = new ArrayList<>();
    private final List<ComplexDisc> above;
    private final List<ComplexDisc> below;

    /** (u - point)^power, the power negative for a pole. */
    private record Root(ComplexDisc point, int power) {}

    private RationalDisc(RationalFunction function) {
        leading = ScaledDisc.of(function.numerator().leading().divide(function.denominator().leading()));
        above = split(function.numerator(), 1);
        below = split(function.denominator(), -1);
    }

    static RationalDisc of(RationalFunction function) {
        return new RationalDisc(function);
    }

    /** Takes rational roots out; the coefficients of the monic rest. */
    private List<ComplexDisc> split(Polynomial polynomial, int sign) {
        RationalRoots.Split split = RationalRoots.of(polynomial);
        split.roots().forEach((point, multiplicity) -> roots.add(new Root(ComplexDisc.of(point), sign * multiplicity)));
        return split.rest().coefficients().stream().map(ComplexDisc::of).toList();
    }

    void multiplyInto(TermProduct product) {
        product.multiply(leading);
        ComplexDisc u = product.domain();
        for (Root root : roots) {
            ComplexDisc over = u.subtract(root.point());
            ComplexDisc atCenter = product.center().subtract(root.point());
            if (atCenter.smallest() > 2 * over.radius()) {
                product.multiply(ScaledDisc.of(atCenter).power(root.power()));
                if (!product.isPoint()) {
                    product.addDerivative(over.inverse().multiply(root.power()));
                }
            } else {
                product.multiply(ScaledDisc.of(over).power(root.power()));
            }
        }
        if (above.size() > 1) {
            product.multiply(horner(above, u));
        }
        if (below.size() > 1) {
            product.multiply(horner(below, u).inverse());
        }
    }

    private static ScaledDisc horner(List<ComplexDisc> coefficients, ComplexDisc u) {
        ComplexDisc value = ComplexDisc.ZERO;
        for (int k = coefficients.size() - 1; k >= 0; k--) {
            value = value.multiply(u).add(coefficients.get(k));
        }
        return ScaledDisc.of(value);
    }
}
