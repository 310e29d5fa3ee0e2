package bubblechain.cli;

import bubblechain.output.ReportWriter;
import bubblechain.report.Report;
import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/**
 * A command that makes one report and prints it on standard output in the format asked for.
 *
 * <p>A subclass carries {@code @Command(name, description)}, options and parameters as texts and integers, its examples
 * and {@link #report}. The report is written in full before anything is printed, so that a failure leaves no half of it.
 */
abstract class ReportCommand implements Callable<Integer> {
    /** Place of the help option in the list of options; the options of a command come before. */
    static final int LAST = 1000;

    @Mixin
    private FormatOption format = new FormatOption();

    @Option(names = {"-h", "--help"}, usageHelp = true, order = LAST, description = "show this help and exit")
    private boolean help;

    @Spec
    private CommandSpec spec = CommandSpec.create();

    private Terminal terminal = Terminal.none();

    /** At least one worked example for the help. */
    abstract List<Example> examples();

    /**
     * Does the work.
     *
     * @throws bubblechain.exact.DomainException    if the request is wrong
     * @throws bubblechain.exact.PrecisionException if the digits asked for cannot be reached
     */
    abstract Report report();

    /** Where the report will be shown. */
    final Terminal terminal() {
        return terminal;
    }

    final void use(Terminal shown) {
        terminal = shown;
    }

    /** Status of the program after a report that was written; a command that found a failure to tell says 1. */
    int status(Report report) {
        return ExitStatus.DONE;
    }

    /** Seconds the work may take, roughly; only for the progress shown on a terminal. */
    double estimatedSeconds() {
        return 1;
    }

    /** True if the text may be too large to be held twice; it is then written as it is made. */
    boolean isLarge() {
        return false;
    }

    /** Prints the report. A command with output that is no report overrides this and ends with {@link #print}. */
    @Override
    public Integer call() throws IOException {
        Report report = Patience.during(terminal, spec.name(), estimatedSeconds(), this::report);
        ReportWriter writer = format.format().writer(terminal.width());
        if (isLarge()) {
            PrintWriter out = spec.commandLine().getOut();
            writer.write(report, out);
            out.flush();
        } else {
            StringWriter text = new StringWriter();
            writer.write(report, text);
            print(text.toString());
        }
        return status(report);
    }

    /** True if an option stands on the command line. */
    final boolean isGiven(String option) {
        return spec.commandLine().getParseResult().hasMatchedOption(option);
    }

    /** Prints a text on standard output as it is. */
    final void print(String text) {
        PrintWriter out = spec.commandLine().getOut();
        out.print(text);
        out.flush();
    }
}
