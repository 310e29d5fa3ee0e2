package bubblechain.chain;

import bubblechain.analytic.GradedTerm;
import bubblechain.exact.GradedSum;
import bubblechain.exact.Rational;

/**
 * Coefficients of a function order by order: a monomial of weight w in the summand enters order n with a rational factor that
 * depends on n and w only.
 */
record GradedCoefficients(GradedSum.Summand summand, Factor factors) {
    /** The factor of a monomial of some weight in order n. */
    interface Factor {
        Rational at(int n, int weight);
    }

    /** The Taylor coefficients of a term. */
    static GradedCoefficients of(GradedTerm term) {
        return new GradedCoefficients(term.summand(), (n, weight) -> term.factor(n - weight));
    }
}
