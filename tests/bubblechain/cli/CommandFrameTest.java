package bubblechain.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class CommandFrameTest {
    @Test
    void aResultGoesToStandardOutputInUtf8() {
        Console console = Console.run("sample", "any", "--loops", "5", "--from", "-3/2");
        assertThat(console).isEqualTo(new Console(0, """
                bubblechain sample
                  expansion  \u03b1 in words

                name   any
                loops  5
                from   -3/2
                width  100
                """, ""));
    }

    @Test
    void theFormatIsChosenInAnyCase() {
        assertThat(Console.run("sample", "any", "--format", "JSON").out()).startsWith("{\n  \"program\": \"bubblechain\"");
        assertThat(Console.run("sample", "any", "--format=csv").out()).startsWith("# bubblechain development sample\n");
        assertThat(Console.run("sample", "any", "--format=latex").out()).contains("\\toprule");
    }

    @Test
    void aCommandMayEndWithItsOwnStatusAfterItsReport() {
        Console console = Console.run("sample", "unhappy");
        assertThat(console.status()).isEqualTo(1);
        assertThat(console.out()).contains("unhappy");
        assertThat(console.err()).isEmpty();
    }

    @Test
    void anUnknownFormatIsRefusedWithTheOnesThatExist() {
        assertThat(Console.run("sample", "any", "--format", "xml")).isEqualTo(new Console(2, "", """
                bubblechain: invalid value for option '--format': 'xml' is not one of text, json, csv, latex
                try 'bubblechain sample --help'
                """));
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "domain    | 2 | loops 0 is below 1; ask for at least one",
                "precision | 1 | 40 digits were asked for, 12 could be reached",
                "bug       | 1 | internal error: IllegalStateException: first line second line",
                "silent    | 1 | internal error: IllegalStateException",
                "file      | 1 | cannot read or write: java.io.IOException: disk on fire",
                "deep      | 1 | internal error: StackOverflowError",
                "escape    | 2 | no kernel \ufffd[31m",
                "memory    | 1 | not enough memory for this request; ask for fewer terms or digits,"
                        + " or give java a larger -Xmx"
            })
    void everyFailureIsOneLineAndAStatus(String failure, int status, String message) {
        assertThat(Console.run("sample", failure)).isEqualTo(new Console(status, "", "bubblechain: " + message + "\n"));
    }

    @Test
    void aFormulaErrorKeepsItsLineWithTheCaret() {
        assertThat(Console.run("sample", "formula")).isEqualTo(new Console(2, "", """
                bubblechain: line 1, column 2: expected an operator
                  2u
                   ^
                """));
    }

    @Test
    void theStackTraceAppearsOnlyWhenAskedFor() {
        System.setProperty(ErrorLines.TRACE, "");
        try {
            assertThat(Console.run("sample", "bug").err()).contains("\tat bubblechain.cli.SampleCommand");
        } finally {
            System.clearProperty(ErrorLines.TRACE);
        }
        assertThat(Console.run("sample", "bug").err()).doesNotContain("\tat ");
    }

    @Test
    void unknownCommandsAndOptionsSuggestTheNearest() {
        assertThat(Console.run("sampel")).isEqualTo(new Console(2, "", """
                bubblechain: unknown command 'sampel', did you mean 'sample'?
                try 'bubblechain --help'
                """));
        assertThat(Console.run("banana", "--to", "2").err()).startsWith("bubblechain: unknown command 'banana'\n");
        assertThat(Console.run("sample", "any", "--loop=3")).isEqualTo(new Console(2, "", """
                bubblechain: unknown option '--loop=3', did you mean '--loops'?
                try 'bubblechain sample --help'
                """));
        assertThat(Console.run("sample", "any", "--wrong").err()).startsWith("bubblechain: unknown option '--wrong'\n");
        assertThat(Console.run("sample", "any", "other").err()).startsWith("bubblechain: unexpected argument 'other'\n");
    }

    @Test
    void missingAndMalformedArgumentsAreNamed() {
        assertThat(Console.run("sample").err()).startsWith("bubblechain: missing required parameter: 'NAME'\n");
        assertThat(Console.run("sample", "any", "--loops", "many").err())
                .startsWith("bubblechain: invalid value for option '--loops': 'many' is not an int\n");
        assertThat(Console.run("sample", "any", "--loops").status()).isEqualTo(2);
        assertThat(Console.run()).isEqualTo(new Console(2, "", """
                bubblechain: a command is missing
                try 'bubblechain --help'
                """));
    }

    @Test
    void theHelpOfTheProgramListsCommandsAndExitStatuses() {
        Console console = Console.run("--help");
        assertThat(console.status()).isZero();
        assertThat(console.err()).isEmpty();
        assertThat(console.out()).isEqualTo("""
                Usage: bubblechain [OPTIONS] COMMAND
                All-order bubble-chain coefficients, exact Borel poles, and residues from known series.

                Results go to standard output, everything else to standard error. 'bubblechain COMMAND --help'
                shows the options of a command with worked examples.

                Options:
                  -h, --help      show this help and exit
                  -V, --version   print the version and exit

                Commands:
                  sample  prints its options

                Exit status:
                  0   done
                  1   the result could not be computed or written
                  2   wrong usage: an option, a name, a value or a file is not what it should be
                """);
    }

    @Test
    void theHelpOfACommandHasItsExamplesAndExitStatuses() {
        Console console = Console.run("sample", "--help");
        assertThat(console.status()).isZero();
        assertThat(console.out()).contains("""

                Examples:
                  the options, 100% of them
                    bubblechain sample any --loops 5

                Exit status:
                  0   done
                """);
        assertThat(console.out()).startsWith("""
                Usage: bubblechain sample [OPTIONS] NAME
                prints its options

                Arguments:
                      NAME              a name, or a way to fail

                Options:
                      --loops=L         number of terms; default 3
                      --from=U          a rational
                      --format=FORMAT   text, json, csv, latex; default text
                  -h, --help            show this help and exit
                """);
    }

    @ParameterizedTest
    @ValueSource(strings = {"-V", "--version"})
    void theVersionIsPrinted(String option) {
        assertThat(Console.run(option)).isEqualTo(new Console(0, "bubblechain development\n", ""));
    }

    @Test
    void anArgumentBeginningWithAnAtSignIsNotReadAsAFile(@TempDir Path folder) throws IOException {
        Path file = Files.writeString(folder.resolve("arguments"), "other");
        assertThat(Console.run("sample", "@" + file, "--format=json").out()).contains("\"name\": \"@" + file);
    }

    @Test
    void colourIsUsedOnlyOnATerminal() {
        assertThat(Console.run("--help").out()).doesNotContain("\u001b");
        assertThat(Console.run(new Terminal(true, true, true, 80), "--help").out()).contains("\u001b");
    }

    @Test
    void theWidthOfTheTerminalReachesTheCommand() {
        assertThat(Console.run(new Terminal(true, true, false, 72), "sample", "any").out()).contains("width  72");
    }

    @Test
    void theProgramItselfHasHelpAndAVersion() {
        assertThat(Console.runProgram("--version")).isEqualTo(new Console(0, "bubblechain development\n", ""));
        assertThat(Console.runProgram("--help").out()).contains("Exit status:");
        assertThat(Console.runProgram("nonsense").status()).isEqualTo(2);
    }

    @Test
    void everyCommandHasExamplesThatNameIt() {
        for (ReportCommand command : Subcommands.all()) {
            String name = command.getClass().getAnnotation(picocli.CommandLine.Command.class).name();
            assertThat(command.examples()).as(name).isNotEmpty()
                    .allSatisfy(example -> assertThat(example.words()).first().isEqualTo(name));
        }
    }
}
