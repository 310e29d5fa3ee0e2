/**
 * Numbers of QCD that belong to no single quantity: colour factors, the beta function and the mass anomalous dimension, the
 * running coupling and running masses, Lambda, the change of the number of flavours at a threshold, and the names of
 * couplings and normalisations.
 *
 * <p>Conventions, once for all: MS-bar; y = alpha_s/(4 pi) with dy/d ln mu = -2 sum_k beta_k y^(k+2); a = beta0 y;
 * {@code nf} is the number of massless flavours in the loops.
 *
 * <p>Coefficients are exact. What runs is a double: the truncated equations solved with a stated relative error, scales and
 * masses in GeV. From alpha_s(M_Z) to any scale and number of flavours:
 * <pre>
 *   RunningCoupling five = RunningCoupling.of(5, 5, 91.188, 0.118);            // flavours, loops, GeV, alpha_s
 *   FlavourThresholds thresholds = FlavourThresholds.standard(5);
 *   double alpha = thresholds.alphaS(five, 1.5, 3);                            // alpha_s^(3)(1.5 GeV)
 *   double lambda = LambdaParameter.of(thresholds.withFlavours(five, 3)).lambdaMsbar();
 * </pre>
 *
 * <p>Read {@link bubblechain.qcd.BetaFunction}, then {@link bubblechain.qcd.Coupling}; for running
 * {@link bubblechain.qcd.RunningCoupling}, {@link bubblechain.qcd.FlavourThresholds}.
 */
@NullMarked
package bubblechain.qcd;

import org.jspecify.annotations.NullMarked;
