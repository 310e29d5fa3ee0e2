package bubblechain.kernel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowable;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import bubblechain.exact.DomainException;
import com.sun.management.ThreadMXBean;
import java.io.IOException;
import java.lang.management.ManagementFactory;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** Files made to exhaust time, memory or stack, or to deceive: each is refused soon, with the place and the reason. */
@Timeout(120)
class HostileFileTest {
    private static final ThreadMXBean THREADS = (ThreadMXBean) ManagementFactory.getThreadMXBean();
    private static final long MEGABYTE = 1_000_000;
    /** Of processor time; a refusal takes less than a second of a warm virtual machine, of a cold one a few. */
    private static final long SECONDS = 6_000_000_000L;

    @TempDir
    private Path folder;

    private void assertRefused(byte[] file, String message, long megabytes) throws IOException {
        String path = Files.write(folder.resolve("mine.toml"), file).toString();
        long bytes = THREADS.getThreadAllocatedBytes(Thread.currentThread().getId());
        long start = THREADS.getCurrentThreadCpuTime();
        Throwable refusal = catchThrowable(() -> KernelLibrary.load(path));
        long spent = THREADS.getCurrentThreadCpuTime() - start;
        long allocated = THREADS.getThreadAllocatedBytes(Thread.currentThread().getId()) - bytes;
        assertThat(refusal).isInstanceOf(DomainException.class);
        assertThat(refusal.getMessage().lines().findFirst().orElse("")).startsWith(path + message);
        assertThat(refusal.getMessage().length()).isLessThan(path.length() + 1_000);
        assertThat(allocated).as("bytes allocated").isLessThan(megabytes * MEGABYTE);
        assertThat(spent).as("nanoseconds").isLessThan(SECONDS);
    }

    private void assertRefused(String file, String message) throws IOException {
        assertRefused(file.getBytes(StandardCharsets.UTF_8), message, 200);
    }

    private static KernelText good() {
        return KernelText.of("1+u");
    }

    private static final String TOO_LARGE = "written out as one sum of products this formula is too large";
    private static final String TOO_MANY = "the sums of this formula have too many terms in all";

    private static Arguments formula(String name, String transform, String reason) {
        return Arguments.of(name, transform, reason);
    }

    static Stream<Arguments> enormousFormulas() {
        return Stream.of(
                formula("parentheses", "(".repeat(40_000) + "u" + ")".repeat(40_000), "line 1, column 202: nested deeper than 200"),
                formula("signs", "-".repeat(90_000) + "u", "line 1, column 202: nested deeper than 200"),
                formula("exponent", "u^99999999999999999999", "line 1, column 3: an exponent of more than 10000 in size"),
                formula("degree", "(1+u)^10000", "line 1, column 1: "),
                formula("negative degree", "(1+u)^(-10000)", "line 1, column 1: "),
                formula("tower", "((1+u)^10000)^10000", "line 1, column 2: "),
                formula("tower of numbers", "(2^10000)^10000*u", "line 1, column 1: " + TOO_LARGE),
                formula("power of a sum", "(1+u+gamma(1-u))^1000", "line 1, column 1: " + TOO_LARGE),
                formula("power of fractions", "(1+u/3)^1000", "line 1, column 1: " + TOO_LARGE),
                formula("number", "1e99999*u", "line 1, column 1: the exponent of this number is out of range"),
                formula("digits", "0." + "1".repeat(5_000) + "*u", "line 1, column 1: a number of more than 2000 digits"),
                formula("long sum", "sum(k,1,1000000000,u^k)", "line 1, column 9: the end of a sum must be an integer of at most"),
                formula("sum of fractions", "sum(k,1,1000,1/(k+u))", "line 1, column 1: " + TOO_LARGE),
                formula("sum in a sum", "sum(i,1,1000,sum(j,1,1000,u^j/i))", "line 1, column 14: " + TOO_LARGE),
                formula("fractions in two sums", "sum(i,1,30,sum(j,1,30,1/(i+j*u)))", "line 1, column 1: " + TOO_LARGE),
                formula("three sums", "sum(i,1,1000,sum(j,1,1000,sum(k,1,1000,1)))*u", "line 1, column "),
                formula("constant sums", "sum(i,1,1000,exp(u*sum(j,1,1000,sum(k,1,1000,1/k))))", "line 1, column "),
                formula("constant sums in a call", "sum(i,1,1000,u*exp(sum(j,1,1000,1/j)))", "line 1, column 35: " + TOO_MANY),
                formula("repeated product", String.join("*", java.util.Collections.nCopies(500, "(1+u+exp(u))")),
                        "line 1, column 1: " + TOO_LARGE),
                formula("product of sums", IntStream.range(1, 30).mapToObj(k -> "(gamma(1+u/" + k + ")+gamma(1-u/" + k + "))")
                        .collect(Collectors.joining("*")), "line 1, column 1: the product has more than 2000 terms"),
                formula("chain", "u" + "+u".repeat(40_000), "line 1, column 1: too long a chain of operations"),
                formula("constant of gamma", "gamma(100000000-u)", "line 1, column 7: " + TOO_LARGE),
                formula("constant of digamma", "digamma(1900-u)", "line 1, column 9: " + TOO_LARGE),
                formula("order of polygamma", "polygamma(1000,50-u)", "line 1, column 16: " + TOO_LARGE));
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("enormousFormulas")
    void aFormulaThatStandsForAnEnormousOneIsRefused(String name, String transform, String reason) throws IOException {
        assertRefused(
                KernelText.of(transform).text().getBytes(StandardCharsets.UTF_8), ", line 7, column 1, in 'T': " + reason, 4_000);
    }

    static Stream<Arguments> definitionBombs() {
        return Stream.of(
                Arguments.of("d{k} = \"d{p}*d{p}\"", 60, "in 'd15': line 1, column 1: with its definitions written out the formula"
                        + " is too large"),
                Arguments.of("d{k} = \"d{p}+gamma(1-u)*d{p}\"", 60, "in 'd14': line 1, column 1: with its definitions written out"),
                Arguments.of("d{k} = \"sum(k,1,1000,d{p})\"", 60, "in 'T': line 1, column 1: "),
                Arguments.of("d{k} = \"u\"", 40_000, "in 'd1000': line 1, column 1: more than 1000 definitions"));
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("definitionBombs")
    void definitionsThatGrowIntoEachOtherAreRefused(String line, int count, String reason) throws IOException {
        StringBuilder file = new StringBuilder(KernelText.of("d" + (count - 1)).and("[definitions]\nd0 = \"1+u\"").text());
        for (int k = 1; k < count; k++) {
            file.append(line.replace("{k}", "" + k).replace("{p}", "" + (k - 1))).append('\n');
        }
        String path = Files.writeString(folder.resolve("bomb.toml"), file).toString();
        long start = THREADS.getCurrentThreadCpuTime();
        Throwable refusal = catchThrowable(() -> KernelLibrary.load(path));
        assertThat(THREADS.getCurrentThreadCpuTime() - start).isLessThan(SECONDS);
        assertThat(refusal).isInstanceOf(DomainException.class).hasMessageContaining(reason);
    }

    static Stream<Arguments> strangeFiles() {
        String text = good().text();
        String many = "0123456789".repeat(50_000);
        return Stream.of(
                Arguments.of("nested brackets", text + "x = " + "[".repeat(900_000), ", line 8, column 55: brackets nested deeper than 50"),
                Arguments.of("dotted key", text + "a.".repeat(30_000) + "a = \"1\"", ", line 8, column "),
                Arguments.of("key twice", text + "T = \"1\"", ", line 8, column 1: not TOML: T previously defined at line 7, column 1"),
                Arguments.of("table twice", text + "[definitions]\na1 = \"1\"\n[definitions]", ", line 10, column 1: not TOML: definitions"),
                Arguments.of("zero bytes", "\0".repeat(1_000), ", line 1, column 1: not TOML: Unexpected '\\u0000'"),
                Arguments.of("zero byte in a text", text.replace("one's", "one\0s"), ", line 2, column 25: not TOML: Unexpected '\\u0000'"),
                Arguments.of("carriage returns", text.replace('\n', '\r'), ", line 1, column 14: not TOML: Unexpected '\\r'"),
                Arguments.of("no quotes", text.replace("\"mine\"", "mine"), ", line 1, column 8: not TOML: Unexpected 'm', expected a value"),
                Arguments.of("quote not closed", text.replace("\"mine\"", "\"mine"), ", line 1, column 13: not TOML: Unexpected end of line"),
                Arguments.of("three quotes not closed", text + "x = \"\"\"" + many, ", line 8, column "),
                Arguments.of("list of numbers", text + "sources = [" + "1,".repeat(200_000) + "]", ", line 8, column 12: not plain TOML"),
                Arguments.of("unknown key", text + "sourcess = []", ", line 8, column 1: unknown key 'sourcess' at the top of the file; did you"),
                Arguments.of("long key", text + "k".repeat(500_000) + " = \"1\"", ", line 8, column 1: unknown key 'kkkkk"),
                Arguments.of("float", text.replace("\"0\"", "0.5"), ", line 5, column 1: numbers are written as strings so that they stay"),
                Arguments.of("infinite float", text.replace("\"0\"", "inf"), ", line 5, column 1: numbers are written as strings"),
                Arguments.of("float out of range", text.replace("\"0\"", "1e400"), ", line 5, column 18: not TOML: Float is too large"),
                Arguments.of("date", text.replace("\"0\"", "2020-01-01"), ", line 5, column 1: 'mass_dimension' must be a string"),
                Arguments.of("long number", text.replace("\"0\"", "\"" + many + "\""), ", line 5, column 1: a number of more than 2000"),
                Arguments.of("exponent", text.replace("\"0\"", "\"1e999999999\""), ", line 5, column 1: '1e999999999' is not a rational"),
                Arguments.of("division", text.replace("\"0\"", "\"1/0\""), ", line 5, column 1: '1/0' divides by zero"),
                Arguments.of("path as name", text.replace("\"mine\"", "\"../x\""), ", line 1, column 1: a kernel name has lower-case letters"),
                Arguments.of("long name", text.replace("mine", "a-".repeat(300_000) + "a"), ", line 1, column 1: a kernel name has lower-case"
                        + " letters, digits and hyphens, at most 100, got 'a-a-"),
                Arguments.of("path as series", text + "series = \"../../etc/passwd\"", ", line 8, column 1: series is the name of a built-in"),
                Arguments.of("many parameters", text + IntStream.range(0, 10_000)
                        .mapToObj(k -> "[parameters.p" + k + "]\nfrom = \"1\"\nto = \"2\"\ndefault = \"1\"\n").collect(Collectors.joining()),
                        ", line 8, column 1: a kernel has at most 20 parameters, got 10000"),
                Arguments.of("power as prefactor", text + "prefactor = \"CF*((\"", ", line 8, column 1, in 'prefactor': line 1, column 6: the"),
                Arguments.of("power in a check", text + "[[check]]\nkind = \"coefficient\"\nn = \"1\"\nsource = \"x\"\nvalue = \"(1+pi)^10000\"",
                        ", line 12, column 1, in 'value': line 1, column 1: the power 10000 of a sum of 2 terms has more than"),
                Arguments.of("empty", "", ", line 1, column 1: the key 'form' is missing at the top of the file"));
    }

    @ParameterizedTest(name = "{0}")
    @MethodSource("strangeFiles")
    void aStrangeFileIsRefusedWithItsPlace(String name, String file, String message) throws IOException {
        assertRefused(file, message);
    }

    static Stream<Arguments> lookAlikes() {
        return Stream.of(
                Arguments.of("T = \"\u0435xp(u)\"", "in 'T': line 1, column 1: the character U+0435 (CYRILLIC SMALL LETTER IE) has no"),
                Arguments.of("T = \"\uff11+u\"", "in 'T': line 1, column 1: the character U+FF11 (FULLWIDTH DIGIT ONE) has no meaning"),
                Arguments.of("T = \"1\u2212u\"", "in 'T': line 1, column 2: the character U+2212 (MINUS SIGN) has no meaning in a formula"),
                Arguments.of("T = \"1\u2013u\"", "in 'T': line 1, column 2: the character U+2013 (EN DASH) has no meaning in a formula"),
                Arguments.of("T = \"1+\u202eu\"", ": the character U+202E (RIGHT-TO-LEFT OVERRIDE) may not stand in a text"),
                Arguments.of("T = \"1+\u200bu\"", ": the character U+200B (ZERO WIDTH SPACE) may not stand in a text"),
                Arguments.of("s\u0441ale = \"Q\"", ": not TOML: Unexpected '\\u0441', expected . or ="),
                Arguments.of("prefactor = \"C\u0424\"", "in 'prefactor': line 1, column 2: the character U+0424 (CYRILLIC CAPITAL LETTER"),
                Arguments.of("theory = \"Q\u0421D\"", ": theory 'Q\u0421D' is neither QCD nor QED"),
                Arguments.of("series = \"p\u043ele\"", ": series is the name of a built-in series, got 'p\u043ele'"),
                Arguments.of("cautions = [\"\u2066hidden\u2069\"]", ": the character U+2066 (LEFT-TO-RIGHT ISOLATE) may not stand in a"));
    }

    @ParameterizedTest
    @MethodSource("lookAlikes")
    void charactersThatLookLikeOthersAreNamed(String line, String message) throws IOException {
        String key = line.substring(0, line.indexOf(' '));
        String file = good().text().replaceAll("(?m)^" + key + " = .*\n", "") + line + "\n";
        String path = Files.writeString(folder.resolve("mine.toml"), file).toString();
        int place = (int) file.lines().count();
        assertThat(catchThrowable(() -> KernelLibrary.load(path)))
                .isInstanceOf(DomainException.class)
                .hasMessageStartingWith(path + ", line " + place + ", column ")
                .hasMessageContaining(message);
    }

    @Test
    void lineEndsOfOtherSystemsAndAMarkAtTheStartAreRead() throws IOException {
        for (String text : new String[] {good().text().replace("\n", "\r\n"), "\ufeff" + good().text(), good().text().strip()}) {
            Path file = Files.writeString(folder.resolve("mine.toml"), text);
            assertThat(KernelLibrary.load(file.toString()).name()).isEqualTo("mine");
        }
    }

    @Test
    void bytesThatAreNoTextAreRefusedWithTheirPlace() throws IOException {
        byte[] latin = "name = \"mine\"\ntitle = \"\u00e9t\u00e9\"\n".getBytes(StandardCharsets.ISO_8859_1);
        assertRefused(latin, ", line 2, column 10: not a text in UTF-8", 200);
        assertRefused(good().text().getBytes(StandardCharsets.UTF_16), ", line 1, column 1: not a text in UTF-8", 200);
        assertRefused(new byte[] {0, 1, (byte) 0xff, (byte) 0xfe}, ", line 1, column 3: not a text in UTF-8", 200);
        assertRefused(new byte[] {'a', '\n', (byte) 0xc3}, ", line 2, column 1: not a text in UTF-8", 200);
    }

    @Test
    void whatIsNoFileIsRefusedAndNotWaitedFor() throws IOException, InterruptedException {
        assertThat(catchThrowable(() -> KernelLibrary.load(folder + "/")))
                .hasMessage(folder + " is a directory; name a file in it");
        assumeTrue(Files.exists(Path.of("/dev/zero")), "a system with devices");
        assertThat(catchThrowable(() -> KernelLibrary.load("/dev/zero"))).hasMessage("/dev/zero is a device or a pipe; name a file");
        Path pipe = folder.resolve("pipe.toml");
        assumeTrue(new ProcessBuilder("mkfifo", pipe.toString()).start().waitFor() == 0, "a system with pipes");
        assertThat(catchThrowable(() -> KernelLibrary.load(pipe.toString()))).hasMessage(pipe + " is a device or a pipe; name a file");
    }

    @Test
    void aFileThatMayNotBeReadIsRefused() throws IOException {
        Path file = Files.writeString(folder.resolve("mine.toml"), good().text());
        assumeTrue(file.toFile().setReadable(false) && !Files.isReadable(file), "a user who may not read everything");
        assertThat(catchThrowable(() -> KernelLibrary.load(file.toString())))
                .isInstanceOf(DomainException.class)
                .hasMessage("cannot read the file " + file + "; check that it exists and is readable");
    }
}
