/**
 * Kernel files: one quantity per file, its one-loop diagram with an analytically regulated gluon line, and what is known
 * about its singularities.
 *
 * <p>A kernel defines f = prefactor x sum_{n>=0} c_n a^(n+1) = prefactor x int_0^inf du e^(-u/a) B(u) with
 * a = beta0 alpha/(4 pi) and B(u) = sum c_n u^n/n!. {@link bubblechain.kernel.Kernel} holds T(u), the part of B with all
 * the singularities, and the anomalous dimension whose subtraction makes B finite at u = 0:
 * B(u) = T(u) - Gtilde(u)/u at mu equal to the scale, Gtilde(u) = sum g_n u^n/n!, g(a) = gamma(a)/2 where
 * d ln O/d ln mu = prefactor x a gamma(a).
 *
 * <p>A quantity with double logarithms has a {@link bubblechain.kernel.SudakovSubtraction} in place of gamma(a); a
 * {@linkplain bubblechain.kernel.Combination combination} is the weighted sum of other kernels, joined as one formula.
 *
 * <p>{@link bubblechain.kernel.KernelFile} reads the TOML; {@link bubblechain.kernel.KernelLibrary} finds built-in names
 * and files of the user.
 */
@NullMarked
package bubblechain.kernel;

import org.jspecify.annotations.NullMarked;
