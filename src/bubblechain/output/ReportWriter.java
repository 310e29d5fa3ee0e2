package bubblechain.output;

import bubblechain.report.Report;
import java.io.IOException;
import java.io.Writer;

/**
 * Writes a report in one format.
 *
 * <p>Whatever texts the report holds, the output is well formed in its format, contains no control character but the
 * line feed, ends with exactly one line feed, and is the same for equal reports.
 */
public interface ReportWriter {
    /**
     * Writes the whole report; the writer is neither flushed nor closed.
     *
     * @throws IOException if {@code out} fails
     */
    void write(Report report, Writer out) throws IOException;
}
