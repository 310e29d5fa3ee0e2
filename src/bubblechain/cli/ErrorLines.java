package bubblechain.cli;

import bubblechain.exact.DomainException;
import bubblechain.exact.PrecisionException;
import bubblechain.output.PlainText;
import bubblechain.report.NearestNames;
import java.io.IOException;
import java.io.PrintWriter;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import picocli.CommandLine;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.UnmatchedArgumentException;

/** Exceptions as one line on standard error and an exit status. */
final class ErrorLines {
    /** System property that asks for stack traces as well. */
    static final String TRACE = "bubblechain.trace";

    private ErrorLines() {}

    /** Says what went wrong while a command ran. */
    static int print(Throwable failure, PrintWriter err) {
        err.println("bubblechain: " + PlainText.clean(line(failure)));
        if (System.getProperty(TRACE) != null) {
            failure.printStackTrace(err);
        }
        err.flush();
        return failure instanceof DomainException ? ExitStatus.WRONG_USAGE : ExitStatus.NOT_COMPUTED;
    }

    private static String line(Throwable failure) {
        if (failure instanceof DomainException || failure instanceof PrecisionException) {
            return String.valueOf(failure.getMessage());
        }
        if (failure instanceof UncheckedIOException || failure instanceof IOException) {
            return "cannot read or write: " + Optional.ofNullable(failure.getMessage()).orElse("reason unknown");
        }
        if (failure instanceof OutOfMemoryError) {
            return "not enough memory for this request; ask for fewer terms or digits, or give java a larger -Xmx";
        }
        String message = failure.getMessage();
        String name = failure.getClass().getSimpleName();
        return ("internal error: " + name + (message == null ? "" : ": " + message)).replaceAll("\\s*\\R\\s*", " ");
    }

    /** Says what is wrong with the command line and where to look. */
    static int usage(ParameterException failure, String[] arguments) {
        CommandLine line = failure.getCommandLine();
        PrintWriter err = line.getErr();
        err.println("bubblechain: " + PlainText.clean(usageLine(failure)));
        err.println("try '" + line.getCommandSpec().qualifiedName() + " --help'");
        if (System.getProperty(TRACE) != null) {
            failure.printStackTrace(err);
        }
        err.flush();
        return ExitStatus.WRONG_USAGE;
    }

    private static String usageLine(ParameterException failure) {
        if (failure instanceof UnmatchedArgumentException unmatched) {
            String word = unmatched.getUnmatched().get(0);
            CommandLine line = failure.getCommandLine();
            if (word.startsWith("-")) {
                return "unknown option '" + word + "'" + suggestion(word.replaceFirst("=.*", ""), options(line));
            }
            if (!line.getSubcommands().isEmpty()) {
                return "unknown command '" + word + "'" + suggestion(word, commands(line));
            }
            return "unexpected argument '" + word + "'";
        }
        String message = String.valueOf(failure.getMessage()).replace("option option", "option");
        return message.substring(0, 1).toLowerCase(Locale.ROOT) + message.substring(1);
    }

    private static String suggestion(String word, List<String> names) {
        List<String> near = NearestNames.of(word, names);
        return near.isEmpty() ? "" : ", did you mean '" + String.join("' or '", near) + "'?";
    }

    private static List<String> commands(CommandLine line) {
        return List.copyOf(line.getSubcommands().keySet());
    }

    private static List<String> options(CommandLine line) {
        List<String> names = new ArrayList<>();
        for (OptionSpec option : line.getCommandSpec().options()) {
            names.add(option.longestName());
        }
        return names;
    }
}
