/**
 * Numbers of QCD that belong to no single quantity: colour factors, the beta function, the change of the number of
 * flavours at a threshold, and the names of couplings and normalisations.
 *
 * <p>Conventions, once for all: MS-bar; y = alpha_s/(4 pi) with dy/d ln mu = -2 sum_k beta_k y^(k+2); a = beta0 y;
 * {@code nf} is the number of massless flavours in the loops.
 *
 * <p>Read {@link bubblechain.qcd.BetaFunction}, then {@link bubblechain.qcd.Coupling}.
 */
@NullMarked
package bubblechain.qcd;

import org.jspecify.annotations.NullMarked;
