package bubblechain.kernel;

import bubblechain.analytic.AnalyticFunction;
import bubblechain.exact.Rational;
import bubblechain.formula.Formula;
import bubblechain.formula.Span;
import java.util.Map;
import java.util.Optional;

/**
 * T(u) and the anomalous dimension of a kernel, whichever form the file has.
 *
 * @param transform          T(u) at mu = scale
 * @param anomalousDimension gamma(a)
 */
record KernelFunctions(Optional<AnalyticFunction> transform, Optional<AnalyticFunction> anomalousDimension) {
    /** e^(5u/3), the limit of D(eps)^(u/eps - 1), D the massless bubble in d = 4 - 2 eps in the MS-bar scheme. */
    private static final Formula BUBBLE_CHAIN = Formula.parse("exp(5*u/3)/u");

    /**
     * e^(gammaE eps)/D(eps) at eps = -a, with D(eps) = 6 e^(gammaE eps) Gamma(1+eps) Gamma(2-eps)^2/Gamma(4-2eps), times
     * the 2 of gamma(a) = 2 F(-a, 0).
     */
    private static final Formula TWICE_INVERSE_BUBBLE =
            Formula.parse("gamma(4+2*a)/(3*gamma(1-a)*gamma(2+a)^2)");

    /**
     * From a diagram F(eps, u) = u e^(gammaE eps) A(eps, u) D(eps)^(u/eps - 1) with G(eps, u) = u A(eps, u):
     * T(u) = e^(5u/3) G(0, u)/u and gamma(a) = 2 F(-a, 0), both at mu = scale.
     */
    static KernelFunctions ofDiagram(Formula diagram) {
        Span span = diagram.span();
        Formula zero = new Formula.Literal(Rational.ZERO, span);
        Formula minusA = new Formula.Negation(new Formula.Name("a", span), span);
        Formula atZero = diagram.substitute(Map.of("eps", zero));
        Formula onAxis = diagram.substitute(Map.of("eps", minusA, "u", zero));
        return new KernelFunctions(
                Optional.of(AnalyticFunction.of(product(atZero, BUBBLE_CHAIN), "u")),
                Optional.of(AnalyticFunction.of(product(onAxis, TWICE_INVERSE_BUBBLE), "a")));
    }

    private static Formula product(Formula left, Formula right) {
        return new Formula.Binary(Formula.Operator.MULTIPLY, left, right, left.span());
    }
}
