package bubblechain;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.assessment.Validation;
import bubblechain.cli.Main;
import bubblechain.fixedorder.SeriesFile;
import bubblechain.formula.Function;
import bubblechain.kernel.KernelLibrary;
import java.io.ByteArrayOutputStream;
import java.io.File;
import java.io.IOException;
import java.io.PrintStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.api.io.TempDir;

/**
 * README.md tells the truth: its commands are run and their output compared, its files are read, its program is compiled.
 *
 * <p>A fenced block {@code console} holds commands, lines that start with "$ ", each followed by what it prints; a line
 * "..." stands for any number of lines. A fenced block {@code toml} or {@code java} whose first line is a comment with a
 * file name is a file that commands may name. With {@code -Dbubblechain.refresh=true} the output is written anew: all of
 * it, or the paragraphs whose first words stand in a comment {@code <!-- show: A | B -->} before the block.
 */
class DocumentationTest {
    private static final Path README = Path.of("README.md");
    private static final String JAR = "java -jar target/bubblechain.jar";
    private static final String CLASS_PATH = "java -cp target/bubblechain.jar";
    private static final String ANYTHING = "...";
    private static final Pattern FILE_NAME = Pattern.compile("(?:#|//) (\\S+\\.(?:toml|java))");
    private static final Pattern SHOW = Pattern.compile("<!-- show: (.*) -->");

    @TempDir
    private static Path folder = Path.of("");

    /** A fenced block: its language, the lines between the fences, and what to show of each output. */
    private record Block(String language, int first, List<String> lines, List<String> show) {
        Optional<String> fileName() {
            Matcher matcher = FILE_NAME.matcher(lines.isEmpty() ? "" : lines.get(0));
            return matcher.matches() ? Optional.of(matcher.group(1)) : Optional.empty();
        }
    }

    /** A command and the lines shown below it. */
    private record Shown(String command, List<String> output) {}

    @BeforeAll
    static void writeTheFilesOfTheReadme() throws IOException {
        if (Boolean.getBoolean("bubblechain.refresh")) {
            refresh();
        }
        writeFiles();
    }

    private static void writeFiles() throws IOException {
        for (Block block : blocks(Files.readAllLines(README))) {
            Optional<String> name = block.fileName();
            if (name.isPresent()) {
                Files.write(folder.resolve(name.get()), block.lines());
            }
        }
    }

    private static List<Block> blocks(List<String> page) {
        List<Block> blocks = new ArrayList<>();
        for (int i = 0; i < page.size(); i++) {
            if (page.get(i).startsWith("```")) {
                int end = i + 1;
                while (!page.get(end).equals("```")) {
                    end++;
                }
                Matcher show = SHOW.matcher(i == 0 ? "" : page.get(i - 1));
                List<String> kept = show.matches() ? List.of(show.group(1).split(" \\| ")) : List.of();
                blocks.add(new Block(page.get(i).substring(3), i + 1, List.copyOf(page.subList(i + 1, end)), kept));
                i = end;
            }
        }
        return blocks;
    }

    private static List<Block> blocks(String language) throws IOException {
        return blocks(Files.readAllLines(README)).stream()
                .filter(block -> block.language().equals(language))
                .toList();
    }

    private static List<Shown> commands(Block block) {
        List<Shown> commands = new ArrayList<>();
        for (String line : block.lines()) {
            if (line.startsWith("$ ")) {
                commands.add(new Shown(line.substring(2), new ArrayList<>()));
            } else {
                commands.get(commands.size() - 1).output().add(line);
            }
        }
        return commands;
    }

    /** The part of a command line this test can run; empty for a build alone. */
    private static Optional<String> runnable(String command) {
        String last = command.substring(command.lastIndexOf("&& ") + 1).replaceFirst("^& ", "");
        return last.startsWith("mvn ") ? Optional.empty() : Optional.of(last);
    }

    /** What a command prints on both streams. */
    private static List<String> output(String command) {
        try {
            String text = command.startsWith(JAR) && !command.contains(".toml") ? here(command) : elsewhere(command);
            return text.lines().map(String::stripTrailing).toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static String here(String command) {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        PrintStream stream = new PrintStream(bytes, true, StandardCharsets.UTF_8);
        Main.run(stream, stream, words(command.substring(JAR.length())).toArray(new String[0]));
        return bytes.toString(StandardCharsets.UTF_8);
    }

    /** Runs a command that names a file of the page, in the folder of these files. */
    private static String elsewhere(String command) throws IOException {
        List<String> words = new ArrayList<>();
        words.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
        words.add("-cp");
        words.add(absoluteClassPath());
        if (command.startsWith(JAR)) {
            words.add(Main.class.getName());
            words.addAll(words(command.substring(JAR.length())));
        } else {
            assertThat(command).startsWith(CLASS_PATH);
            words.addAll(words(command.substring(CLASS_PATH.length())));
        }
        ProcessBuilder builder = new ProcessBuilder(words).directory(folder.toFile()).redirectErrorStream(true);
        builder.environment().keySet().removeAll(List.of("COLUMNS", "JAVA_TOOL_OPTIONS", "JDK_JAVA_OPTIONS"));
        return new String(builder.start().getInputStream().readAllBytes(), StandardCharsets.UTF_8);
    }

    private static String absoluteClassPath() {
        String path = System.getProperty("surefire.test.class.path", System.getProperty("java.class.path"));
        return String.join(
                File.pathSeparator,
                Arrays.stream(path.split(File.pathSeparator)).map(entry -> Path.of(entry).toAbsolutePath().toString()).toList());
    }

    private static List<String> words(String arguments) {
        return List.of(arguments.strip().split(" +"));
    }

    /** True if the lines are those of the pattern, in which a line "..." stands for any number of lines. */
    private static boolean matches(List<String> pattern, List<String> lines) {
        if (pattern.isEmpty()) {
            return lines.isEmpty();
        }
        List<String> rest = pattern.subList(1, pattern.size());
        if (!pattern.get(0).equals(ANYTHING)) {
            return !lines.isEmpty()
                    && lines.get(0).equals(pattern.get(0))
                    && matches(rest, lines.subList(1, lines.size()));
        }
        for (int skipped = 0; skipped <= lines.size(); skipped++) {
            if (matches(rest, lines.subList(skipped, lines.size()))) {
                return true;
            }
        }
        return false;
    }

    @TestFactory
    Stream<DynamicTest> everyCommandOfTheReadmePrintsWhatIsShown() throws IOException {
        List<Shown> all = blocks("console").stream().flatMap(block -> commands(block).stream()).toList();
        assertThat(all).hasSizeGreaterThan(9);
        return all.stream().filter(shown -> runnable(shown.command()).isPresent()).map(shown -> DynamicTest.dynamicTest(
                shown.command(), () -> {
                    List<String> found = output(runnable(shown.command()).orElseThrow());
                    assertThat(matches(shown.output(), found))
                            .as("README shows%n%s%nthe program prints%n%s%n"
                                            + "If the program is right: mvn test -Dtest=DocumentationTest -Dbubblechain.refresh=true",
                                    String.join("\n", shown.output()), String.join("\n", found))
                            .isTrue();
                }));
    }

    @Test
    void theComparisonSeesOneChangedLine() {
        List<String> pattern = List.of("a", ANYTHING, "c", ANYTHING);
        assertThat(matches(pattern, List.of("a", "b", "b", "c"))).isTrue();
        assertThat(matches(pattern, List.of("a", "b", "d"))).isFalse();
        assertThat(matches(List.of("a"), List.of("a", "b"))).isFalse();
    }

    @Test
    void everyFileOfTheReadmeIsReadAndKeepsItsPromises() throws IOException {
        List<Block> files = blocks("toml");
        assertThat(files).hasSize(2);
        for (Block block : files) {
            Path file = folder.resolve(block.fileName().orElseThrow());
            String name = block.lines().contains("form = \"borel\"")
                    ? KernelLibrary.load(file.toString()).name()
                    : SeriesFile.read(file).name();
            assertThat(file.getFileName()).hasToString(name + ".toml");
            assertThat(Validation.of(file.toString())).isNotEmpty().allMatch(Validation.Finding::passed);
        }
    }

    @Test
    void everyExampleOfEveryHelpRuns() {
        List<String> commands = lines("--help").stream()
                .dropWhile(line -> !line.equals("Commands:"))
                .filter(line -> line.matches("  [a-z]+ .*"))
                .map(line -> line.strip().replaceFirst(" .*", ""))
                .toList();
        assertThat(commands).contains("kernels", "assess", "validate");
        for (String command : commands) {
            List<String> examples = lines(command, "--help").stream()
                    .dropWhile(line -> !line.equals("Examples:"))
                    .filter(line -> line.startsWith("    bubblechain "))
                    .map(line -> line.substring("    bubblechain ".length()))
                    .toList();
            assertThat(examples).as(command).isNotEmpty();
            for (String example : examples) {
                assertThat(status(new ByteArrayOutputStream(), words(example).toArray(new String[0])))
                        .as(example)
                        .isZero();
            }
        }
    }

    private static int status(ByteArrayOutputStream bytes, String... arguments) {
        PrintStream stream = new PrintStream(bytes, true, StandardCharsets.UTF_8);
        return Main.run(stream, stream, arguments);
    }

    private static List<String> lines(String... arguments) {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        assertThat(status(bytes, arguments)).isZero();
        return bytes.toString(StandardCharsets.UTF_8).lines().toList();
    }

    @Test
    void theReadmeNamesEveryCommandKeyAndFunction() throws IOException {
        String page = Files.readString(README);
        List<String> wanted = new ArrayList<>(Arrays.stream(Function.values()).map(Function::text).toList());
        wanted.addAll(allowedKeys("kernel.toml", "form = \"borel\"\nqqqqqqqqqqqq = \"1\"\n"));
        wanted.addAll(allowedKeys("series.toml", "qqqqqqqqqqqq = \"1\"\n"));
        assertThat(wanted).hasSizeGreaterThan(30);
        for (String word : wanted) {
            assertThat(page).containsPattern("[`\\[\n]" + word + "\\b");
        }
    }

    /** The keys a file may have, from the complaint about one it may not have. */
    private static List<String> allowedKeys(String name, String text) throws IOException {
        Path file = Files.writeString(folder.resolve(name), text);
        String complaint = Validation.of(file.toString()).get(0).detail();
        assertThat(complaint).contains("; allowed are ");
        return List.of(complaint.replaceFirst(".*; allowed are ", "").split(", "));
    }

    @Test
    void theContinuousCheckRunsTheTwoCommandsOfTheReadme() throws IOException {
        String script = Files.readString(Path.of(".ci", "run"));
        List<String> builds = blocks("console").stream()
                .flatMap(block -> commands(block).stream())
                .map(Shown::command)
                .filter(command -> command.startsWith("mvn "))
                .toList();
        assertThat(builds).hasSize(2);
        assertThat(script).contains(builds);
    }

    private static void refresh() throws IOException {
        writeFiles();
        List<String> page = new ArrayList<>(Files.readAllLines(README));
        List<Block> blocks = blocks(page);
        for (int i = blocks.size() - 1; i >= 0; i--) {
            Block block = blocks.get(i);
            if (block.language().equals("console")) {
                List<String> place = page.subList(block.first(), block.first() + block.lines().size());
                place.clear();
                place.addAll(refreshed(block));
            }
        }
        Files.write(README, page);
    }

    private static List<String> refreshed(Block block) {
        List<String> lines = new ArrayList<>();
        for (Shown shown : commands(block)) {
            lines.add("$ " + shown.command());
            lines.addAll(runnable(shown.command()).map(c -> abridged(output(c), block.show())).orElse(shown.output()));
        }
        return lines;
    }

    /** The paragraphs that start with one of the words, all others as "..."; everything if there are no words. */
    private static List<String> abridged(List<String> output, List<String> show) {
        if (show.isEmpty()) {
            return output;
        }
        List<String> lines = new ArrayList<>();
        for (String paragraph : String.join("\n", output).split("\n\n")) {
            boolean kept = show.stream().anyMatch(paragraph.strip()::startsWith);
            if (kept || lines.isEmpty() || !lines.get(lines.size() - 1).equals(ANYTHING)) {
                if (!lines.isEmpty() && kept && !lines.get(lines.size() - 1).equals(ANYTHING)) {
                    lines.add("");
                }
                lines.addAll(kept ? paragraph.lines().toList() : List.of(ANYTHING));
            }
        }
        return lines;
    }
}
