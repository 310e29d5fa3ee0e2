/**
 * Truncated Laurent series and the algebras that compute with them.
 *
 * <p>{@link bubblechain.series.SeriesAlgebra} is the interface every interpretation of a formula is written against; it
 * is generic over whole series, so that an implementation may choose its own representation.
 * {@link bubblechain.series.CoefficientwiseAlgebra} works coefficient by coefficient over a
 * {@link bubblechain.series.CoefficientRing}: exact constants or balls. {@link bubblechain.series.DualAlgebra} adds to
 * any algebra a second variable t with t^2 = 0.
 *
 * <p>{@link bubblechain.series.FixedSeries} is the fast representation for long lists: fixed-point numbers at one common
 * scale with an error bound beside each.
 */
@NullMarked
package bubblechain.series;

import org.jspecify.annotations.NullMarked;
