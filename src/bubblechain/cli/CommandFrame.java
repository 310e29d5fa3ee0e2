package bubblechain.cli;

import java.io.PrintStream;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import picocli.CommandLine;
import picocli.CommandLine.Help.Ansi;
import picocli.CommandLine.Model.UsageMessageSpec;

/** The root command with its subcommands, and what they share: help, streams, errors and exit statuses. */
final class CommandFrame {
    private static final String EXAMPLES = "examples";
    private static final int WIDEST_HELP = 100;
    private static final int NARROWEST_HELP = 60;

    private final List<ReportCommand> commands;
    private final Terminal terminal;

    CommandFrame(List<ReportCommand> commands, Terminal terminal) {
        this.commands = List.copyOf(commands);
        this.terminal = terminal;
    }

    /** Runs the program; everything is written as UTF-8 and flushed before the status is returned. */
    int run(PrintStream out, PrintStream err, String... arguments) {
        PrintWriter output = new PrintWriter(out, false, StandardCharsets.UTF_8);
        PrintWriter errors = new PrintWriter(err, true, StandardCharsets.UTF_8);
        try {
            return commandLine().setOut(output).setErr(errors).execute(arguments);
        } catch (RuntimeException | Error failure) {
            return ErrorLines.print(failure, errors);
        } finally {
            output.flush();
            errors.flush();
        }
    }

    /** The parser with all commands; also the source of completion scripts and man pages. */
    CommandLine commandLine() {
        CommandLine root = new CommandLine(new RootCommand());
        for (ReportCommand command : commands) {
            command.use(terminal);
            CommandLine line = new CommandLine(command);
            addExamples(line.getCommandSpec().usageMessage(), command.examples());
            root.addSubcommand(line);
        }
        root.setExpandAtFiles(false);
        root.setColorScheme(CommandLine.Help.defaultColorScheme(terminal.colour() ? Ansi.ON : Ansi.OFF));
        root.setUsageHelpWidth(Math.max(NARROWEST_HELP, Math.min(terminal.width(), WIDEST_HELP)));
        root.setParameterExceptionHandler(ErrorLines::usage);
        root.setExecutionExceptionHandler((exception, line, parsed) -> ErrorLines.print(exception, line.getErr()));
        share(root.getCommandSpec().usageMessage());
        root.getSubcommands().values().forEach(line -> share(line.getCommandSpec().usageMessage()));
        return root;
    }

    private static void share(UsageMessageSpec usage) {
        usage.parameterListHeading("%nArguments:%n")
                .optionListHeading("%nOptions:%n")
                .commandListHeading("%nCommands:%n")
                .exitCodeListHeading("%nExit status:%n")
                .exitCodeList(ExitStatus.list())
                .sortOptions(false)
                .abbreviateSynopsis(true);
    }

    private static void addExamples(UsageMessageSpec usage, List<Example> examples) {
        StringBuilder text = new StringBuilder("\nExamples:\n");
        for (Example example : examples) {
            text.append("  ").append(example.says()).append('\n');
            text.append("    bubblechain ").append(example.arguments()).append('\n');
        }
        usage.sectionMap().put(EXAMPLES, help -> text.toString());
        List<String> keys = new ArrayList<>(usage.sectionKeys());
        keys.add(keys.indexOf(UsageMessageSpec.SECTION_KEY_EXIT_CODE_LIST_HEADING), EXAMPLES);
        usage.sectionKeys(keys);
    }
}
