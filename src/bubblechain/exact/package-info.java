/**
 * Numbers that can be defended: rationals, exact constants and balls.
 *
 * <p>{@link bubblechain.exact.Rational} is a fraction of big integers. {@link bubblechain.exact.ExactConstant} is a
 * polynomial with rational coefficients in pi, odd zeta values, logarithms of primes and their like, kept in a
 * canonical form in which a formal zero is zero; {@link bubblechain.exact.GradedSum} writes down long ones term by term.
 * {@link bubblechain.exact.Ball} is a midpoint with a radius that encloses the true value;
 * {@link bubblechain.exact.BallFunctions} has the constants and special functions over balls.
 *
 * <p>A formal zero proves that a number vanishes. A formal non-zero proves nothing, because the independence of pi,
 * Euler's constant and the zeta values is open; only a ball that excludes zero does.
 */
@NullMarked
package bubblechain.exact;

import org.jspecify.annotations.NullMarked;
