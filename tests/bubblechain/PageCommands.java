package bubblechain;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.DocumentationPage.Shown;
import bubblechain.cli.Main;
import java.io.ByteArrayOutputStream;
import java.io.File;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/** Runs the commands of a page in the folder of its files: those of the program in one process, a Java program in its own. */
final class PageCommands {
    private static final String JAR = "java -jar target/bubblechain.jar";
    private static final String CLASS_PATH = "java -cp target/bubblechain.jar";
    private static final String END = "\u0004";

    private final Map<String, List<String>> outputs = new HashMap<>();

    private PageCommands() {}

    /** Runs every command of the page that is not a build. */
    static PageCommands run(DocumentationPage page, Path folder) throws IOException {
        PageCommands result = new PageCommands();
        List<String> ours = new ArrayList<>();
        for (Shown shown : page.commands()) {
            String command = shown.runnable().orElse("");
            if (command.startsWith(JAR)) {
                ours.add(command);
            } else if (!command.isEmpty()) {
                assertThat(command).startsWith(CLASS_PATH);
                result.outputs.put(command, lines(process(folder, words(command.substring(CLASS_PATH.length())))));
            }
        }
        List<String> arguments = new ArrayList<>(List.of(PageCommands.class.getName()));
        ours.forEach(command -> arguments.add(command.substring(JAR.length())));
        String[] texts = process(folder, arguments).split(END);
        assertThat(texts).as("one output for each command").hasSameSizeAs(ours);
        for (int i = 0; i < texts.length; i++) {
            result.outputs.put(ours.get(i), lines(texts[i]));
        }
        return result;
    }

    /** What a command printed on both streams. */
    List<String> output(Shown shown) {
        return outputs.getOrDefault(shown.runnable().orElse(""), List.of());
    }

    /** Runs each argument as a command line of the program. */
    public static void main(String[] commandLines) {
        PrintStream out = new PrintStream(System.out, true, StandardCharsets.UTF_8);
        for (String line : commandLines) {
            ByteArrayOutputStream bytes = new ByteArrayOutputStream();
            PrintStream stream = new PrintStream(bytes, true, StandardCharsets.UTF_8);
            Main.run(stream, stream, words(line).toArray(new String[0]));
            out.print(bytes.toString(StandardCharsets.UTF_8) + END);
        }
        out.flush();
    }

    private static String process(Path folder, List<String> arguments) throws IOException {
        List<String> words = new ArrayList<>();
        words.add(Path.of(System.getProperty("java.home"), "bin", "java").toString());
        words.addAll(List.of("-cp", absoluteClassPath()));
        words.addAll(arguments);
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

    private static List<String> lines(String text) {
        return text.lines().map(String::stripTrailing).toList();
    }

    static List<String> words(String arguments) {
        return List.of(arguments.strip().split(" +"));
    }
}
