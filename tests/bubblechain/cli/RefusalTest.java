package bubblechain.cli;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.kernel.KernelText;
import java.io.IOException;
import java.io.RandomAccessFile;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** A wrong request: status 2, nothing on standard output, one line on standard error that says what is wrong. */
class RefusalTest {
    private static final long HUNDRED_MEGABYTES = 100_000_000;

    @TempDir
    private static Path folder;

    private static void assertRefused(String message, String... arguments) {
        assertThat(Console.runProgram(arguments)).isEqualTo(new Console(2, "", "bubblechain: " + message + "\n"));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "coefficients pole-mas | no kernel is named 'pole-mas'; did you mean pole-mass, pole-mass-diagram? (a file of your own is"
                + " given by its path, ending in .toml)",
        "poles xyzzy | no kernel is named 'xyzzy'; 'bubblechain kernels' lists them (a file of your own is given by its path,"
                + " ending in .toml)",
        "coefficients pole-mass --loops 0 | the number of loops lies between 1 and 10000, got 0",
        "coefficients pole-mass --loops 10001 | the number of loops lies between 1 and 10000, got 10001",
        "coefficients pole-mass --loops -1 | the number of loops lies between 1 and 10000, got -1",
        "coefficients pole-mass --exact --loops 81 | the number of loops in exact form lies between 1 and 80, got 81",
        "coefficients pole-mass --digits 0 | the number of digits lies between 1 and 10000, got 0",
        "coefficients pole-mass --digits 10001 | the number of digits lies between 1 and 10000, got 10001",
        "poles pole-mass --digits 0 | the number of digits lies between 1 and 10000, got 0",
        "poles pole-mass --digits 100000000 | the number of digits lies between 1 and 10000, got 100000000",
        "coefficients pole-mass --mu-over-scale 0 | --mu-over-scale must be positive, got 0",
        "coefficients pole-mass --mu-over-scale -1 | --mu-over-scale must be positive, got -1",
        "coefficients pole-mass --operator-mu-over-scale ln(1/2) | --operator-mu-over-scale must be positive, got ln(1/2)",
        "coefficients adler --operator-mu-over-scale 2 | the kernel adler has no operator to renormalise;"
                + " --operator-mu-over-scale must stay 1",
        "coefficients pole-mass --nf 17 | the number of flavours lies between 0 and 16, got 17",
        "coefficients pole-mass --nf -1 | the number of flavours lies between 0 and 16, got -1",
        "coefficients pole-mass --coupling alpha | coefficients in alpha normalised to prefactor depend on the number of"
                + " flavours; give --nf",
        "coefficients pole-mass --coupling alpha/2 | coupling 'alpha/2' is not one of a, alpha, alpha/pi, alpha/4pi",
        "coefficients pole-mass --normalise half | normalisation 'half' is not one of prefactor, full, first",
        "coefficients pole-mass --scheme mom | scheme 'mom' is neither msbar nor v",
        "coefficients pole-mass --nf 3 --coupling-nf 5 | --coupling-nf is --nf or --nf plus the heavy quark, 3 or 4, got 5",
        "coefficients pole-mass --coupling-nf 5 | --coupling-nf needs --nf, the number of massless flavours in the bubbles",
        "coefficients adler --nf 3 --coupling-nf 4 | the kernel adler has no heavy quark; --coupling-nf must be equal to --nf",
        "coefficients lepton-g2 --nf 0 --normalise full | beta0 is zero for nf = 0: there is no chain to expand in",
        "coefficients adler --anomalous-dimension | the kernel adler has no anomalous dimension",
        "poles pole-mass --from 3 --to 1 | the range from 3 to 1 is empty; --from must not exceed --to",
        "poles pole-mass --from -100000 --to 100000 | the range from -100000 to 100000 may hold more than 5000 poles; ask for a"
                + " smaller one",
        "poles pole-mass --from half | --from: 'half' is not a rational number such as 3, -3/4 or 1.25",
        "poles pole-mass --share-of -1 | the coefficient whose make-up is shown has n between 0 and 400, got -1",
        "residue pole-mass --power 0 | the power p = 2 u0 of a singularity cannot be 0; give p > 0 (infrared) or p < 0"
                + " (ultraviolet)",
        "residue pole-mass --power x | --power: 'x' is not a rational number such as 3, -3/4 or 1.25",
        "residue pole-mass --nf 17 | series 'pole-mass' holds for 0 to 15 flavours (nl, massless flavours below the heavy"
                + " quark); got 17",
        "residue pole-mass --loops 5 | the series is known to 4 loops; ask for 1 to 4, got 5",
        "residue pole-mass --remove-nearer | --remove-nearer needs --chain: only there are the residues of nearer poles exact",
        "residue pole-mass --chain --power 0 | the power p = 2 u0 of a singularity cannot be 0",
        "residue pole-mass --chain --beta-loops 2 | a chain runs at one loop and its exponents are exact; leave out"
                + " --exponent-shift and --beta-loops",
        "residue cusp --chain | the kernel cusp has no pole near the origin; give --power",
        "residue lepton-g2 --chain | the sum rule runs with the beta function of QCD; the kernel lepton-g2 belongs to QED",
        "crosscheck | name a quantity, or give --kernel and --series; --kernel is missing",
        "crosscheck --kernel lepton-g2 --series pole-mass | the kernel lepton-g2 belongs to QED, the series pole-mass to QCD;"
                + " there is nothing to compare",
        "crosscheck pole-mass --power 0 | the power p = 2 u0 of a singularity cannot be 0; give p > 0 (infrared) or p < 0"
                + " (ultraviolet)",
        "assess pole-mass --range -1 | --range must be positive, got -1",
        "assess pole-mass --range 0 | --range must be positive, got 0",
        "assess pole-mass --loops 0 | the number of loops lies between 1 and 400, got 0",
        "assess pole-mass --loops 500 | the number of loops lies between 1 and 400, got 500",
        "validate nosuch | 'nosuch' is neither a file, nor a folder, nor a built-in name",
        "kernels adler tau --parameter moment=2 | --parameter needs the name of one kernel or the path of a file",
        "kernels --parameter moment=2 | --parameter needs the name of one kernel or the path of a file",
        "kernels nosuch --bibtex | No built-in kernel has the word 'nosuch'; 'bubblechain kernels' lists them all. A file of your"
                + " own is given by its path, ending in .toml.",
        "kernels --bibtex --format json | --bibtex is a format of its own; leave out --format"
    })
    void aWrongRequestIsOneLine(String command, String message) {
        assertRefused(message, command.split(" "));
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '`', value = {
        "2 m       | two factors without an operator; write 2*m | 1 | ^^^",
        "2pi       | two factors without an operator; write 2*pi | 1 | ^^^",
        "u         | the name 'u' has no value here | 1 | ^",
        "1/0       | division by zero | 1 | ^^^",
        "2*(3      | the formula ends where the parenthesis that closes column 3 was expected | 5 |     ^",
        "sqrt(-1)  | a fractional power needs a positive base, got -1 | 1 | ^^^^^^^^"
    })
    void aScaleThatIsNoConstantIsUnderlined(String text, String reason, int column, String carets) {
        String place = "line 1, column " + column + ": " + reason + "\n  " + text + "\n  "
                + " ".repeat(column - 1) + carets.strip();
        assertRefused("--mu-over-scale: " + place, "coefficients", "pole-mass", "--mu-over-scale", text);
        assertRefused("--operator-mu-over-scale: " + place, "coefficients", "pole-mass", "--operator-mu-over-scale", text);
    }

    @ParameterizedTest
    @CsvSource({
        "coefficients pole-mass --loops many, invalid value for option '--loops': 'many' is not an int",
        "coefficients pole-mass --loops 99999999999, invalid value for option '--loops': '99999999999' is not an int",
        "coefficients, missing required parameter: 'KERNEL'",
        "coefficients pole-mass --loop 3, 'unknown option ''--loop'', did you mean ''--loops''?'",
        "coefficient pole-mass, 'unknown command ''coefficient'', did you mean ''coefficients''?'",
        "poles pole-mass adler, unexpected argument 'adler'",
        "coefficients pole-mass --parameter moment, value for option '--parameter' (NAME=VALUE) should be in KEY=VALUE format"
                + " but was moment"
    })
    void aWrongCommandLineNamesTheHelp(String command, String message) {
        Console console = Console.runProgram(command.split(" "));
        assertThat(console.status()).isEqualTo(2);
        assertThat(console.out()).isEmpty();
        assertThat(console.err().lines()).hasSize(2).first().isEqualTo("bubblechain: " + message);
        assertThat(console.err().lines().skip(1)).first().asString().matches("try 'bubblechain( [a-z]+)? --help'");
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', quoteCharacter = '`', value = {
        "2u | , line 7, column 1, in 'T': line 1, column 1: two factors without an operator; write 2*u;  2u;  ^^",
        "1/(1-x) | , line 7, column 1, in 'T': line 1, column 6: the name 'x' has no meaning; the variable is u, other names are"
                + " set in [definitions] or [parameters];  1/(1-x);       ^",
        "gamma(u) | , line 7, column 1: the 1/u pole does not cancel: T(u) has residue 1 at u = 0, and no anomalous_dimension is"
                + " given that would subtract it",
        "1/u^2 | , line 7, column 1: T(u) has a pole of order 2 at u = 0, leading coefficient 1; one subtraction takes away a"
                + " simple pole only"
    })
    void aKernelFileAtFaultIsRefusedByEveryCommand(String transform, String message) {
        String path = KernelText.of(transform).in(folder);
        List<String> lines = new ArrayList<>(List.of(message.split(";(?=  )")));
        for (String command : new String[] {"coefficients", "poles", "kernels", "assess"}) {
            assertRefused(path + String.join("\n", lines), command, path);
        }
        assertRefused(path + String.join("\n", lines), "residue", path, "--chain");
        assertRefused(path + String.join("\n", lines), "crosscheck", "--kernel", path, "--series", "pole-mass");
    }

    @Test
    void polesOutsideTheClassAreRefusedCoefficientsAreNot() {
        String path = KernelText.of("u/(exp(u)-1)").in(folder);
        assertThat(Console.runProgram("coefficients", path, "--exact", "--loops", "3").out())
                .contains("1/6"); // Bernoulli number B_2
        assertRefused("the poles of the kernel mine cannot be listed, its coefficients can; T(u), line 1, column 4: a denominator"
                + " must be a product of rational functions, exponentials, gammas and sin(pi*...); the zeros of this one cannot be"
                + " listed exactly\n  u/(exp(u)-1)\n     ^^^^^^^^", "poles", path);
    }

    @Test
    void strangeFilesAreRefused() throws IOException {
        Path binary = Files.write(folder.resolve("binary.toml"), new byte[] {0, 1, (byte) 0xff, (byte) 0xfe, (byte) 0x80});
        assertRefused(binary + ", line 1, column 3: not a text in UTF-8", "coefficients", binary.toString());
        assertRefused(folder + " is a directory; name a file in it", "coefficients", folder.toString());
        Path missing = folder.resolve("missing.toml");
        assertRefused("cannot read the file " + missing + "; check that it exists and is readable", "poles", missing.toString());
        assertRefused("'a\ufffdb.toml' cannot be the name of a file", "poles", "a\0b.toml");
        Path text = Files.writeString(folder.resolve("text.toml"), "this is not toml");
        assertRefused(text + ", line 1, column 6: not TOML: Unexpected 'is', expected . or =", "poles", text.toString());
        Path nested = Files.writeString(folder.resolve("nested.toml"), "x = " + "[".repeat(100_000));
        assertRefused(nested + ", line 1, column 55: brackets nested deeper than 50 levels", "poles", nested.toString());
    }

    @Test
    void aHugeFileIsRefusedAtOnceInLittleMemory() throws IOException {
        Path huge = folder.resolve("huge.toml");
        try (RandomAccessFile file = new RandomAccessFile(huge.toFile(), "rw")) {
            file.setLength(HUNDRED_MEGABYTES);
        }
        long start = System.nanoTime();
        for (String command : new String[] {"coefficients", "poles", "assess"}) {
            assertRefused(huge + ": larger than the limit of 1000000 bytes", command, huge.toString());
        }
        assertThat(System.nanoTime() - start).isLessThan(2_000_000_000L);
        Files.delete(huge);
    }

    @Test
    void aParameterOutsideItsRangeIsRefused() {
        String path = KernelText.of("gamma(moment+u)/(gamma(moment)*gamma(1+u)*(1-u))")
                .and("[parameters.moment]\nfrom = \"1\"\nto = \"50\"\ndefault = \"2\"\ninteger = \"yes\"")
                .in(folder);
        assertRefused("the parameter moment is an integer between 1 and 50, got 51", "poles", path, "--parameter", "moment=51");
        assertRefused("the parameter moment is an integer between 1 and 50, got 5/2", "poles", path, "--parameter", "moment=5/2");
        assertRefused(path + ": the kernel has no parameter 'n'; it has moment", "poles", path, "--parameter", "n=5");
        assertRefused("--parameter moment: 'x' is not a rational number such as 3, -3/4 or 1.25",
                "poles", path, "--parameter", "moment=x");
        Console right = Console.runProgram("coefficients", path, "--parameter", "moment=3", "--loops", "2", "--exact");
        assertThat(right.out()).contains("f (moment = 3) = CF/beta0", "parameter_moment = 3", "5/2");
    }
}
