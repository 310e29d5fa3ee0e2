/**
 * The kernel expression language: a tree, its grammar, printing back, and errors that show the place.
 *
 * <p>Ordinary notation without implicit multiplication: {@code + - * / ^} with {@code ^} right-associative and binding
 * tighter than a leading minus, exact decimals, {@code pi}, {@code euler_gamma}, functions in lower case, and
 * {@code sum(k, 1, 5, body)}. The tree knows nothing of series or numbers; interpretations of it live elsewhere.
 *
 * <p>Read {@link bubblechain.formula.Formula}, then {@link bubblechain.formula.FormulaParser}; the caps on hostile
 * input stand in {@link bubblechain.formula.FormulaLimits}.
 */
@NullMarked
package bubblechain.formula;

import org.jspecify.annotations.NullMarked;
