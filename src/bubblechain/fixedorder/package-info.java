/**
 * Series known to a few orders: their numbers, their files, and exact rewriting in another scale or coupling.
 *
 * <p>{@link bubblechain.fixedorder.PerturbativeSeries} is the one type for published and user series,
 * f = prefactor x sum_{n>=1} c_n coupling^n with c_n a formula in {@code nf}. It is read from a file by
 * {@link bubblechain.fixedorder.SeriesFile}; {@link bubblechain.fixedorder.SeriesLibrary} has the built-in ones. At a
 * flavour number it becomes an {@link bubblechain.fixedorder.UncertainSeries}, a list of exact numbers with input errors.
 * {@link bubblechain.fixedorder.ScaleLogarithms} changes the coupling's scale, exactly and to any order, with the beta
 * function as given; {@link bubblechain.fixedorder.CouplingSubstitution} changes the coupling.
 *
 * <p>Orders count loops: {@code coefficient(1)} multiplies the first power of the coupling.
 */
@NullMarked
package bubblechain.fixedorder;

import org.jspecify.annotations.NullMarked;
