package bubblechain.analytic;

import bubblechain.exact.Ball;
import bubblechain.exact.Rational;

/**
 * A pole at an irrational real root of a denominator.
 *
 * @param polynomial a squarefree polynomial whose root this is
 * @param lower      rational below the root
 * @param upper      rational above the root; no other root of the polynomial lies between
 * @param order      the multiplicity in the denominators
 * @param status     {@link PoleStatus#CERTIFIED} if the leading coefficient excludes zero
 * @param leading    a ball for the coefficient of (u - u0)^(-order)
 */
public record AlgebraicPole(
        Polynomial polynomial, Rational lower, Rational upper, int order, PoleStatus status, Ball leading) {}
