package bubblechain;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.IntStream;

/**
 * A page of documentation whose blocks are files, commands and what the commands print.
 *
 * <p>A fenced block {@code console} holds commands, lines that start with "$ ", each followed by what it prints; a line
 * "..." stands for any number of lines. A fenced block {@code toml} or {@code java} whose first line is a comment with a
 * file name is a file that commands may name. A line {@code # NAME: OTHER with} in a block {@code toml} begins the file
 * NAME: the earlier file OTHER with the keys that follow it replaced.
 *
 * <p>A comment before a console block says what is kept of long outputs: {@code <!-- show: A | B -->} the paragraphs that
 * start with these words, {@code <!-- lines: A | B -->} the lines in which one of these patterns is found, with those that
 * continue them; no "..." stands for the lines between, so the page has to say what is left out.
 */
final class DocumentationPage {
    private static final String ANYTHING = "...";
    private static final Pattern FILE_NAME = Pattern.compile("(?:#|//) (\\S+\\.(?:toml|java))");
    private static final Pattern VARIANT = Pattern.compile("# (\\S+\\.toml): (\\S+\\.toml) with");
    private static final Pattern KEPT = Pattern.compile("<!-- (show|lines): (.*) -->");

    private final Path path;

    DocumentationPage(Path path) {
        this.path = path;
    }

    /** A fenced block: its language, the lines between the fences, and what to keep of each output. */
    record Block(String language, int first, List<String> lines, Optional<Kept> kept) {
        Optional<String> fileName() {
            Matcher matcher = FILE_NAME.matcher(lines.isEmpty() ? "" : lines.get(0));
            return matcher.matches() ? Optional.of(matcher.group(1)) : Optional.empty();
        }

        /** The commands with what is shown of each. */
        List<Shown> commands() {
            List<Shown> commands = new ArrayList<>();
            for (String line : lines) {
                if (line.startsWith("$ ")) {
                    commands.add(new Shown(line.substring(2), new ArrayList<>(), kept));
                } else {
                    commands.get(commands.size() - 1).output().add(line);
                }
            }
            return commands;
        }
    }

    /** What is kept of an output: paragraphs by their first words, or lines by patterns. */
    record Kept(boolean paragraphs, List<String> words) {
        List<String> of(List<String> output) {
            return paragraphs ? paragraphs(output) : lines(output);
        }

        private List<String> paragraphs(List<String> output) {
            List<String> lines = new ArrayList<>();
            for (String paragraph : String.join("\n", output).split("\n\n")) {
                boolean wanted = words.stream().anyMatch(paragraph.strip()::startsWith);
                if (wanted && !lines.isEmpty() && !lines.get(lines.size() - 1).equals(ANYTHING)) {
                    lines.add("");
                }
                if (wanted) {
                    paragraph.lines().forEach(lines::add);
                } else if (lines.isEmpty() || !lines.get(lines.size() - 1).equals(ANYTHING)) {
                    lines.add(ANYTHING);
                }
            }
            return lines;
        }

        private List<String> lines(List<String> output) {
            List<String> lines = new ArrayList<>(List.of(ANYTHING));
            boolean wanted = false;
            for (String line : output) {
                wanted = wanted && line.startsWith("  ")
                        || words.stream().anyMatch(word -> Pattern.compile(word).matcher(line).find());
                if (wanted) {
                    lines.add(line);
                }
            }
            return lines;
        }
    }

    /** A command, the lines shown below it, and what of its output they are. */
    record Shown(String command, List<String> output, Optional<Kept> kept) {
        /** The part of the command line a test can run; empty for a build alone. */
        Optional<String> runnable() {
            String last = command.substring(command.lastIndexOf("&& ") + 1).replaceFirst("^& ", "");
            return last.startsWith("mvn ") ? Optional.empty() : Optional.of(last);
        }

        /** True if this output is the one shown, in which "..." stands for any number of lines. */
        boolean matches(List<String> found) {
            return kept.isPresent() && !kept.get().paragraphs()
                    ? output.equals(kept.get().of(found))
                    : matches(output, found);
        }

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
            return IntStream.rangeClosed(0, lines.size())
                    .anyMatch(skipped -> matches(rest, lines.subList(skipped, lines.size())));
        }
    }

    Path path() {
        return path;
    }

    List<Block> blocks() throws IOException {
        return blocks(Files.readAllLines(path));
    }

    List<Block> blocks(String language) throws IOException {
        return blocks().stream().filter(block -> block.language().equals(language)).toList();
    }

    private static List<Block> blocks(List<String> page) {
        List<Block> blocks = new ArrayList<>();
        for (int i = 0; i < page.size(); i++) {
            if (page.get(i).startsWith("```")) {
                int end = page.subList(i + 1, page.size()).indexOf("```") + i + 1;
                Matcher kept = KEPT.matcher(i == 0 ? "" : page.get(i - 1));
                blocks.add(new Block(
                        page.get(i).substring(3), i + 1, List.copyOf(page.subList(i + 1, end)),
                        kept.matches()
                                ? Optional.of(new Kept(kept.group(1).equals("show"), List.of(kept.group(2).split(" \\| "))))
                                : Optional.empty()));
                i = end;
            }
        }
        return blocks;
    }

    /** Every command of the page, in its order. */
    List<Shown> commands() throws IOException {
        return blocks("console").stream().flatMap(block -> block.commands().stream()).toList();
    }

    /** Writes the files of the page below a folder. */
    void writeFiles(Path folder) throws IOException {
        for (Map.Entry<String, List<String>> file : files().entrySet()) {
            Path target = folder.resolve(file.getKey());
            Files.createDirectories(target.getParent());
            Files.write(target, file.getValue());
        }
    }

    /** Name to lines. */
    private Map<String, List<String>> files() throws IOException {
        Map<String, List<String>> files = new LinkedHashMap<>();
        for (Block block : blocks()) {
            block.fileName().ifPresent(name -> files.put(name, block.lines()));
            Optional<String> variant = Optional.empty();
            for (String line : block.lines()) {
                Matcher start = VARIANT.matcher(line);
                if (block.language().equals("toml") && start.matches()) {
                    variant = Optional.of(start.group(1));
                    files.put(start.group(1), new ArrayList<>(files.get(start.group(2))));
                } else if (variant.isPresent() && !line.isBlank()) {
                    replaceKey(files.get(variant.get()), line);
                }
            }
        }
        return files;
    }

    /** Puts the line in place of the first that sets the same key. */
    private static void replaceKey(List<String> lines, String line) {
        String key = line.substring(0, line.indexOf("=") + 1);
        int place = IntStream.range(0, lines.size()).filter(i -> lines.get(i).startsWith(key)).findFirst().orElseThrow();
        lines.set(place, line);
    }

    /** Writes anew what is shown below every command. */
    void refresh(Function<Shown, List<String>> outputs) throws IOException {
        List<String> page = new ArrayList<>(Files.readAllLines(path));
        List<Block> blocks = blocks(page);
        for (int i = blocks.size() - 1; i >= 0; i--) {
            Block block = blocks.get(i);
            if (block.language().equals("console")) {
                List<String> place = page.subList(block.first(), block.first() + block.lines().size());
                place.clear();
                for (Shown shown : block.commands()) {
                    place.add("$ " + shown.command());
                    place.addAll(refreshed(shown, outputs));
                }
            }
        }
        Files.write(path, page);
    }

    private static List<String> refreshed(Shown shown, Function<Shown, List<String>> outputs) {
        if (shown.runnable().isEmpty()) {
            return shown.output();
        }
        List<String> found = outputs.apply(shown);
        return shown.kept().map(kept -> kept.of(found)).orElse(found);
    }
}
