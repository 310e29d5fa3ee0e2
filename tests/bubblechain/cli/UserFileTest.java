package bubblechain.cli;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.output.OutputFormat;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** Files of the user work in every command and every format, wherever they are. */
class UserFileTest {
    private static final String KERNEL = """
            name = "invented-moment"
            title = "Invented moment of a current correlator"
            quantity = "I(Q) - 1"
            scale = "Q"
            mass_dimension = "0"
            form = "borel"
            T = "exp(5*u/3)*moment/((1 - u)*(moment + u))"
            sources = ["Beneke:1998ui"]
            cautions = ["Invented: not a physical quantity."]

            [parameters.moment]
            from = "1"
            to = "8"
            default = "2"
            integer = "yes"
            meaning = "which moment"

            [[singularity]]
            u = "1"
            kind = "IR"
            operator = "invented operator of dimension 2"
            power = "(Lambda/Q)^2"
            source = "invented"

            [[check]]
            kind = "coefficient"
            n = "1"
            value = "13/6"
            source = "invented: 5/3 + 1 - 1/2"
            """;
    private static final String SERIES = """
            name = "invented-series"
            title = "Invented moment of a current correlator, two loops"
            quantity = "I(Q) - 1"
            scale = "Q"
            coupling = "alpha/pi"
            coupling_flavours = "nf"
            flavours = "massless flavours"
            flavours_from = "0"
            flavours_to = "6"
            power = "2"

            [[coefficient]]
            loops = "1"
            value = "1/3"
            status = "derived here"

            [[coefficient]]
            loops = "2"
            value = "2 - 13/108*nf"
            status = "derived here"

            [[singularity]]
            u = "1"
            kind = "IR"
            operator = "invented operator of dimension 2"
            exponent_shift = "0"
            """;

    @TempDir
    private static Path folder;

    private static String kernel = "";
    private static String series = "";

    @BeforeAll
    static void writeTheFiles() throws IOException {
        Path home = Files.createDirectories(folder.resolve("Größe und Maß"));
        kernel = Files.writeString(home.resolve("mein kernel é.toml"), KERNEL).toString();
        series = Files.writeString(home.resolve("meine reihe é.toml"), SERIES).toString();
    }

    /** K stands for the kernel file, S for the series file; and something the output must have. */
    private static final List<List<String>> COMMANDS = List.of(
            List.of("kernels K", "invented"),
            List.of("kernels K --parameter moment=3", "3"),
            List.of("coefficients K --loops 3", ".1666666666666666667"),
            List.of("coefficients K --parameter moment=3 --exact --loops 3 --nf 4 --coupling alpha/pi --normalise full", "invented-moment"),
            List.of("coefficients K --parameter moment=3 --exact --loops 3", "59"),
            List.of("coefficients K --nf-terms --loops 2 --mu-over-scale 2", "invented-moment"),
            List.of("poles K --parameter moment=3", "-3"),
            List.of("poles K --parameter moment=4 --from -5 --to 5 --share-of 3", "-4"),
            List.of("residue K --chain --parameter moment=3 --loops 6", "K"),
            List.of("residue S --nf 4", "K"),
            List.of("crosscheck --kernel K --series S --nf 4", "K"),
            List.of("crosscheck --kernel K --series S --parameter moment=3", "K"),
            List.of("assess K --series S --loops 4", "K"),
            List.of("assess K --parameter moment=3 --loops 4", "-3"),
            List.of("validate K", "13/6"),
            List.of("validate S", "2 coefficients"));

    static Stream<Arguments> commandsAndFormats() {
        return COMMANDS.stream().flatMap(command -> OutputFormat.names().stream()
                .map(format -> Arguments.of(command.get(0), format, command.get(1))));
    }

    private static Console run(String command, String... more) {
        List<String> words = new ArrayList<>();
        for (String word : command.split(" ")) {
            words.add(word.equals("K") ? kernel : word.equals("S") ? series : word);
        }
        words.addAll(List.of(more));
        return Console.runProgram(words.toArray(new String[0]));
    }

    @ParameterizedTest
    @MethodSource("commandsAndFormats")
    void everyCommandTakesAFileOfTheUser(String command, String format, String shown) {
        Console console = run(command, "--format", format);
        assertThat(console.err()).isEmpty();
        assertThat(console.status()).isZero();
        assertThat(console.out()).contains(shown).doesNotContain("NaN", "Infinity", "\ufffd");
    }

    @Test
    void everyCommandIsAmongThem() {
        List<String> names = Subcommands.all().stream()
                .map(c -> c.getClass().getAnnotation(picocli.CommandLine.Command.class).name())
                .toList();
        names.forEach(name -> assertThat(COMMANDS).as(name).anyMatch(c -> c.get(0).startsWith(name + " ")));
    }

    @Test
    void aParameterChangesTheAnswer() {
        for (String command : new String[] {"kernels K", "coefficients K --loops 3", "poles K", "assess K --loops 3"}) {
            assertThat(run(command, "--parameter", "moment=3").out()).isNotEqualTo(run(command).out()).contains("moment = 3");
        }
    }

    @Test
    void itsPapersAreGivenToo() {
        assertThat(run("kernels K --bibtex").out()).startsWith("@article{Beneke:1998ui,\n");
    }

    @Test
    void aFolderOfFilesIsValidated() {
        Console console = Console.runProgram("validate", Path.of(kernel).getParent() + "/");
        assertThat(console.status()).isZero();
        assertThat(console.out()).contains("Größe und Maß", "passed  4\n", "failed  0\n");
    }

    @Test
    void aMistakeIsToldWithTheNameOfTheFile() throws IOException {
        Path wrong = Files.writeString(folder.resolve("fàlsch 1.toml"), KERNEL.replace("(1 - u)", "(1 - v)"));
        Console console = Console.runProgram("poles", wrong.toString());
        assertThat(console.status()).isEqualTo(2);
        assertThat(console.err()).startsWith("bubblechain: " + wrong + ", line 7, column 1, in 'T': line 1, column 25: the name 'v'");
        Files.delete(wrong);
    }
}
