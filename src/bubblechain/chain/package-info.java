/**
 * From a kernel to the coefficients of its series.
 *
 * <p>{@link bubblechain.chain.Chain} is the entry. {@link bubblechain.chain.Scales} says where the coupling and the
 * operator are renormalised: changing the coupling's scale multiplies all of B(u) by e^(L u), changing the operator's
 * scale with it multiplies only the unsubtracted part. {@link bubblechain.chain.ExactCoefficients},
 * {@link bubblechain.chain.BallCoefficients} and {@link bubblechain.chain.FixedCoefficients} are three routes to the same
 * numbers, for closed forms, short lists and long ones; {@link bubblechain.chain.Rendering} turns them into the coupling and normalisation asked for.
 */
@NullMarked
package bubblechain.chain;

import org.jspecify.annotations.NullMarked;
