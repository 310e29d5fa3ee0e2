package bubblechain.kernel;

import bubblechain.analytic.AnalyticFunction;
import bubblechain.exact.Rational;
import bubblechain.formula.Formula;
import bubblechain.formula.Span;
import java.util.Map;
import java.util.Optional;

/**
 * T(u) and the subtraction of a kernel, whichever form the file has.
 *
 * @param transform          T(u) at mu = scale
 * @param anomalousDimension gamma(a)
 * @param sudakov            the subtraction of a quantity with double logarithms
 */
record KernelFunctions(
        Optional<AnalyticFunction> transform,
        Optional<AnalyticFunction> anomalousDimension,
        Optional<SudakovSubtraction> sudakov) {
    /** e^(5u/3), the limit of D(eps)^(u/eps - 1), D the massless bubble in d = 4 - 2 eps in the MS-bar scheme. */
    private static final Formula BUBBLE_CHAIN = Formula.parse("exp(5*u/3)/u");

    private static final Formula BUBBLE_CHAIN_TWICE = Formula.parse("exp(5*u/3)/u^2");

    /** e^(gammaE eps)/D(eps) at eps = -a, with D(eps) = 6 e^(gammaE eps) Gamma(1+eps) Gamma(2-eps)^2/Gamma(4-2eps). */
    private static final Formula INVERSE_BUBBLE = Formula.parse("gamma(4+2*a)/(6*gamma(1-a)*gamma(2+a)^2)");

    /** The same times the 2 of gamma(a) = 2 F(-a, 0). */
    private static final Formula TWICE_INVERSE_BUBBLE =
            Formula.parse("gamma(4+2*a)/(3*gamma(1-a)*gamma(2+a)^2)");

    /**
     * From a diagram F(eps, u) = u e^(gammaE eps) A(eps, u) D(eps)^(u/eps - 1) with G(eps, u) = u A(eps, u):
     * T(u) = e^(5u/3) G(0, u)/u and gamma(a) = 2 F(-a, 0), both at mu = scale.
     */
    static KernelFunctions ofDiagram(Formula diagram) {
        return new KernelFunctions(
                Optional.of(AnalyticFunction.of(product(atZero(diagram), BUBBLE_CHAIN), "u")),
                Optional.of(AnalyticFunction.of(product(onAxis(diagram), TWICE_INVERSE_BUBBLE), "a")),
                Optional.empty());
    }

    /** The same for a diagram with double logarithms, G(eps, u) = u^2 A(eps, u): T(u) = e^(5u/3) G(0, u)/u^2. */
    static KernelFunctions ofDoubleLogarithms(Formula diagram) {
        Formula slope = onAxis(diagram.derivative("u"));
        SudakovSubtraction subtraction = new SudakovSubtraction(
                AnalyticFunction.of(product(onAxis(diagram), INVERSE_BUBBLE), "a"),
                AnalyticFunction.of(product(slope, INVERSE_BUBBLE), "a"));
        return new KernelFunctions(
                Optional.of(AnalyticFunction.of(product(atZero(diagram), BUBBLE_CHAIN_TWICE), "u")),
                Optional.empty(), Optional.of(subtraction));
    }

    /** The subtraction alone: the quantity is the anomalous dimension. */
    KernelFunctions withoutTransform() {
        return new KernelFunctions(Optional.empty(), anomalousDimension, sudakov);
    }

    /** G(0, u). */
    private static Formula atZero(Formula diagram) {
        return diagram.substitute(Map.of("eps", zero(diagram.span()))).simplified();
    }

    /** G(-a, 0). */
    private static Formula onAxis(Formula diagram) {
        Span span = diagram.span();
        Formula minusA = new Formula.Negation(new Formula.Name("a", span), span);
        return diagram.substitute(Map.of("eps", minusA, "u", zero(span))).simplified();
    }

    private static Formula zero(Span span) {
        return new Formula.Literal(Rational.ZERO, span);
    }

    private static Formula product(Formula left, Formula right) {
        return new Formula.Binary(Formula.Operator.MULTIPLY, left, right, left.span());
    }
}
