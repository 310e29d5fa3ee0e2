/**
 * What is shown, before anyone decides how: the data model that every writer prints.
 *
 * <p>A {@link bubblechain.report.Report} names the command and the request, says in words what is expanded in what,
 * and carries {@linkplain bubblechain.report.Block blocks}: named values ({@link bubblechain.report.Facts}), tables
 * ({@link bubblechain.report.Table}) and remarks ({@link bubblechain.report.Note}), followed by sources and cautions.
 * A {@link bubblechain.report.Value} is a text, a decimal number, an exact number, a count, a flag, a list, or a nested
 * table or group. Numbers are texts here: whoever made them decided which digits are certain, and nothing below this
 * package may round or reformat them.
 *
 * <p>Read {@link bubblechain.report.Report}, then {@link bubblechain.report.Value}. All values are immutable and
 * checked when made; a report that exists can be written in every format.
 */
@NullMarked
package bubblechain.report;

import org.jspecify.annotations.NullMarked;
