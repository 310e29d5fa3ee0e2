/**
 * The command line: parse, call the library, print a report. No physics here.
 *
 * <p>{@link bubblechain.cli.Main} is the entry point. {@link bubblechain.cli.CommandFrame} builds the root command from
 * {@link bubblechain.cli.Subcommands}, turns exceptions into one line and an exit status, and adds examples and the
 * list of exit statuses to every help text. A command extends {@link bubblechain.cli.ReportCommand}: its options, its
 * examples, and a method that makes the report.
 *
 * <p>Command classes are loaded for every run, because the list of commands is part of the help. They hold options as
 * texts and small integers and call one method of a class that is loaded only when its command runs; a test counts the
 * classes that {@code --help} loads.
 */
@NullMarked
package bubblechain.cli;

import org.jspecify.annotations.NullMarked;
