/**
 * Writers of the report model: text for a terminal, JSON, CSV and LaTeX.
 *
 * <p>A writer decides the layout and nothing else: no number is rounded, computed or left out here. All writers
 * implement {@link bubblechain.output.ReportWriter} and pass the same tests on hostile texts;
 * {@link bubblechain.output.OutputFormat} names them and makes one without loading the others.
 *
 * <p>Text: {@link bubblechain.output.TextWriter} places blocks on a {@code TextPage}; {@code TextTable} finds column
 * widths; {@code Cell} says how a value is aligned and where it may be broken. JSON is described by the schema
 * {@code schema/report.schema.json} in this package.
 */
@NullMarked
package bubblechain.output;

import org.jspecify.annotations.NullMarked;
