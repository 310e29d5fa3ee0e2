/**
 * The Borel plane of a chain: where B(u) is singular, its exact principal parts, and what each pole contributes to the
 * coefficients.
 *
 * <p>{@link bubblechain.borel.BorelPlane} lists the poles. {@link bubblechain.borel.PoleShares} splits one coefficient
 * c_n into the shares of listed poles and an exact remainder, and bounds the remainder by the largest value of B on a
 * circle. No sum over infinitely many poles is ever assumed to converge.
 */
@NullMarked
package bubblechain.borel;

import org.jspecify.annotations.NullMarked;
