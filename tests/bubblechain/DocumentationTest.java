package bubblechain;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.DocumentationPage.Block;
import bubblechain.DocumentationPage.Shown;
import bubblechain.assessment.Validation;
import bubblechain.cli.Main;
import bubblechain.fixedorder.SeriesFile;
import bubblechain.formula.Function;
import bubblechain.kernel.KernelLibrary;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.api.io.TempDir;

/**
 * README.md and kernels/README.md tell the truth: their commands are run and the output compared, their files are read, the
 * program is compiled. With {@code -Dbubblechain.refresh=true} the output is written anew; {@link DocumentationPage} says how
 * the blocks of a page are written.
 */
class DocumentationTest {
    private static final DocumentationPage README = new DocumentationPage(Path.of("README.md"));
    private static final DocumentationPage OWN_KERNEL = new DocumentationPage(Path.of("kernels", "README.md"));
    private static final List<DocumentationPage> PAGES = List.of(README, OWN_KERNEL);

    @TempDir
    private static Path temporary = Path.of("");

    @BeforeAll
    static void writeTheFilesOfThePages() throws IOException {
        for (DocumentationPage page : PAGES) {
            page.writeFiles(folder(page));
            if (Boolean.getBoolean("bubblechain.refresh")) {
                page.refresh(PageCommands.run(page, folder(page))::output);
            }
        }
    }

    private static Path folder(DocumentationPage page) {
        return temporary.resolve(page == README ? "readme" : "own-kernel");
    }

    @TestFactory
    Stream<DynamicTest> everyCommandOfTheReadmePrintsWhatIsShown() throws IOException {
        assertThat(README.commands()).hasSizeGreaterThan(9);
        return comparisons(README);
    }

    @TestFactory
    Stream<DynamicTest> everyCommandOfThePageOnKernelsPrintsWhatIsShown() throws IOException {
        assertThat(OWN_KERNEL.commands()).hasSizeGreaterThan(5);
        return comparisons(OWN_KERNEL);
    }

    private static Stream<DynamicTest> comparisons(DocumentationPage page) throws IOException {
        PageCommands commands = PageCommands.run(page, folder(page));
        return page.commands().stream().filter(shown -> shown.runnable().isPresent()).map(shown -> DynamicTest.dynamicTest(
                shown.command(), () -> {
                    List<String> found = commands.output(shown);
                    assertThat(shown.matches(found))
                            .as("%s shows%n%s%nthe program prints%n%s%n"
                                            + "If the program is right: mvn test -Dtest=DocumentationTest -Dbubblechain.refresh=true",
                                    page.path(), String.join("\n", shown.output()), String.join("\n", found))
                            .isTrue();
                }));
    }

    @Test
    void theComparisonSeesOneChangedLine() {
        Shown pattern = new Shown("command", List.of("a", "...", "c", "..."), Optional.empty());
        assertThat(pattern.matches(List.of("a", "b", "b", "c"))).isTrue();
        assertThat(pattern.matches(List.of("a", "b", "d"))).isFalse();
        assertThat(new Shown("command", List.of("a"), Optional.empty()).matches(List.of("a", "b"))).isFalse();
        Shown lines = new Shown("command", List.of("...", "b  no"), Optional.of(new DocumentationPage.Kept(false, List.of(" no"))));
        assertThat(lines.matches(List.of("a  yes", "b  no", "c  yes"))).isTrue();
        assertThat(lines.matches(List.of("a  yes", "b  no", "c  no"))).isFalse();
    }

    @Test
    void whatIsKeptOfAnOutputAreParagraphsOrLinesWithTheirContinuations() {
        List<String> output = List.of("head", "", "Table", "a  yes", "b  no, and", "   more", "c  yes", "", "foot");
        assertThat(new DocumentationPage.Kept(false, List.of("^b.*no")).of(output))
                .containsExactly("...", "b  no, and", "   more");
        assertThat(new DocumentationPage.Kept(true, List.of("Table")).of(output))
                .containsExactly("...", "Table", "a  yes", "b  no, and", "   more", "c  yes", "...");
    }

    @Test
    void everyFileOfThePagesIsReadAndKeepsItsPromises() throws IOException {
        assertThat(README.blocks("toml")).hasSize(2);
        assertThat(OWN_KERNEL.blocks("toml")).hasSizeGreaterThan(3);
        for (DocumentationPage page : PAGES) {
            for (Block block : page.blocks("toml")) {
                Optional<String> fileName = block.fileName();
                if (fileName.isPresent()) {
                    requireGood(folder(page).resolve(fileName.get()), block.lines());
                }
            }
        }
    }

    private static void requireGood(Path file, List<String> lines) {
        String name = lines.stream().anyMatch(line -> line.startsWith("form = "))
                ? KernelLibrary.load(file.toString()).name()
                : SeriesFile.read(file).name();
        assertThat(file.getFileName()).hasToString(name + ".toml");
        assertThat(Validation.of(file.toString())).isNotEmpty().allMatch(Validation.Finding::passed);
    }

    @Test
    void thePageInTheFolderOfTheKernelsIsNoKernelAndNotInTheProgram() throws IOException {
        assertThat(OWN_KERNEL.path()).exists();
        assertThat(KernelLibrary.names()).contains("pole-mass").noneMatch(name -> name.contains("README"));
        assertThat(Main.class.getResource("/kernels/heavy-quark/pole-mass.toml")).isNotNull();
        assertThat(Main.class.getResource("/kernels/README.md")).isNull();
        Path alone = Files.createDirectories(temporary.resolve("alone"));
        Files.copy(OWN_KERNEL.path(), alone.resolve("README.md"));
        assertThatThrownBy(() -> Validation.of(alone.toString())).hasMessageStartingWith("there is no .toml file below");
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
                assertThat(status(new ByteArrayOutputStream(), PageCommands.words(example).toArray(new String[0])))
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
        String page = Files.readString(README.path());
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
        Path file = Files.writeString(temporary.resolve(name), text);
        String complaint = Validation.of(file.toString()).get(0).detail();
        assertThat(complaint).contains("; allowed are ");
        return List.of(complaint.replaceFirst(".*; allowed are ", "").split(", "));
    }

    @Test
    void theContinuousCheckRunsTheTwoCommandsOfTheReadme() throws IOException {
        String script = Files.readString(Path.of(".ci", "run"));
        List<String> builds = README.commands().stream()
                .map(Shown::command)
                .filter(command -> command.startsWith("mvn "))
                .toList();
        assertThat(builds).hasSize(2);
        assertThat(script).contains(builds);
    }
}
