/**
 * From a formula to its expansion about any rational point and the exact list of its singularities.
 *
 * <p>{@link bubblechain.analytic.NormalForm} is the canonical sum of terms a formula of the admissible class turns
 * into; what cancels there cancels identically. {@link bubblechain.analytic.Expansion} gives its Laurent series about a
 * rational point, in balls or exactly, the latter monomial by monomial through {@link bubblechain.analytic.GradedTerm};
 * {@link bubblechain.analytic.SingularityList} the finite superset of points where a pole can be, and
 * {@link bubblechain.analytic.Pole} what the exact expansion finds there. {@link bubblechain.analytic.SeriesInterpretation}
 * evaluates a formula outside the class as a tree. {@link bubblechain.analytic.FixedExpansion} is the fast route to many
 * coefficients about u = 0, and {@link bubblechain.analytic.ArcBound} bounds a form on circles.
 *
 * <p>Poles are never found numerically: candidates come from the arguments of the gamma and polygamma functions and the
 * roots of the denominators.
 */
@NullMarked
package bubblechain.analytic;

import org.jspecify.annotations.NullMarked;
