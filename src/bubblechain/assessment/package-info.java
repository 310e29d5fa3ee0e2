/**
 * Where the chain and the published series meet: the cross-check of a residue, the one-page assessment of a quantity,
 * the validation of files, and the library as a user meets it.
 *
 * <p>{@link bubblechain.assessment.CrossCheck} compares three determinations of one residue: exact from the chain, by
 * the truncated sum rule from the first coefficients of the chain, and by the truncated sum rule from the published
 * series. {@link bubblechain.assessment.AssessmentReport} tells the whole story of a quantity;
 * {@link bubblechain.assessment.Validation} recomputes the numbers files promise;
 * {@link bubblechain.assessment.KernelList} and {@link bubblechain.assessment.KernelReport} show the library with the
 * nearest poles of each kernel.
 */
@NullMarked
package bubblechain.assessment;

import org.jspecify.annotations.NullMarked;
