/**
 * The papers behind the numbers: what a bibliography key stands for, in words and as BibTeX.
 *
 * <p>Read {@link bubblechain.bibliography.Bibliography}, then {@link bubblechain.bibliography.Publication}. The table is
 * {@code reference-values/bibliography.csv}; it also says of each entry how it was checked, and what was not checked is
 * shown as such.
 */
@NullMarked
package bubblechain.bibliography;

import org.jspecify.annotations.NullMarked;
