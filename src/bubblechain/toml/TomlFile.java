package bubblechain.toml;

import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CoderResult;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.Optional;

/** Opens a TOML file or resource of limited size. */
public final class TomlFile {
    /** Largest size of a file in bytes. */
    public static final int LARGEST_SIZE = 1_000_000;
    /** Largest size in characters of a file that only the library can read, which takes far longer. */
    private static final int LARGEST_UNUSUAL = 100_000;
    /** Deepest nesting of brackets in a file; deeper ones are refused before parsing. */
    private static final int DEEPEST_NESTING = 50;

    /** Some editors begin a file with it. */
    private static final char BYTE_ORDER_MARK = '\ufeff';

    private TomlFile() {}

    /** The top of a file. @throws TomlException if it cannot be read, is too large, or is not TOML in UTF-8 */
    public static TomlSection read(Path path) {
        if (Files.isDirectory(path)) {
            throw new TomlException(path + " is a directory; name a file in it");
        }
        if (Files.exists(path) && !Files.isRegularFile(path)) {
            throw new TomlException(path + " is a device or a pipe; name a file");
        }
        try (InputStream stream = Files.newInputStream(path)) {
            return read(stream, path.toString());
        } catch (IOException e) {
            throw new TomlException("cannot read the file " + path + "; check that it exists and is readable", e);
        }
    }

    /** The path of a file. @throws TomlException if no file can have this name */
    public static Path path(String name) {
        try {
            return Path.of(name);
        } catch (InvalidPathException e) {
            throw new TomlException("'" + name + "' cannot be the name of a file", e);
        }
    }

    /** The top of a stream; {@code file} names it in messages. The stream is left open. */
    public static TomlSection read(InputStream stream, String file) throws IOException {
        byte[] bytes = stream.readNBytes(LARGEST_SIZE + 1);
        if (bytes.length > LARGEST_SIZE) {
            throw new TomlException(file + ": larger than the limit of " + LARGEST_SIZE + " bytes");
        }
        CharBuffer text = CharBuffer.allocate(bytes.length);
        CoderResult end = StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(bytes), text, true);
        text.flip();
        if (end.isError()) {
            throw new TomlException(place(text, text.length(), file) + ": not a text in UTF-8");
        }
        boolean marked = text.length() > 0 && text.charAt(0) == BYTE_ORDER_MARK;
        return parse(text.subSequence(marked ? 1 : 0, text.length()).toString(), file);
    }

    /** File, line and column of the character at an index. */
    private static String place(CharSequence text, int index, String file) {
        int line = 1;
        int start = 0;
        for (int k = 0; k < index; k++) {
            if (text.charAt(k) == '\n') {
                line++;
                start = k + 1;
            }
        }
        return file + ", line " + line + ", column " + (index - start + 1);
    }

    /** The top of a text; {@code file} names it in messages. */
    public static TomlSection parse(String text, String file) {
        refuseDeepNesting(text, file);
        PlainReader reader = new PlainReader(text);
        Optional<Node.Table> plain = reader.read();
        Node.Table top = plain.isPresent() ? plain.get() : general(text, file, reader.position());
        return new TomlSection(file, "at the top of the file", top);
    }

    private static Node.Table general(String text, String file, int notPlain) {
        if (text.length() > LARGEST_UNUSUAL) {
            throw new TomlException(place(text, notPlain, file) + ": not plain TOML (names, strings in double quotes, lists of"
                    + " strings, tables), which a file of more than " + LARGEST_UNUSUAL + " characters must be");
        }
        return GeneralReader.read(text, file);
    }

    private static void refuseDeepNesting(String text, String file) {
        int depth = 0;
        for (int k = 0; k < text.length(); k++) {
            char c = text.charAt(k);
            if (c == '#' || c == '"' || c == '\'') {
                k = endOfWords(text, k);
            } else if (c == '[' || c == '{') {
                depth++;
            } else if (c == ']' || c == '}') {
                depth--;
            }
            if (depth > DEEPEST_NESTING) {
                throw new TomlException(place(text, k, file) + ": brackets nested deeper than " + DEEPEST_NESTING + " levels");
            }
        }
    }

    /** The last character of the comment or string that begins here; brackets in it are no structure. */
    private static int endOfWords(String text, int start) {
        char quote = text.charAt(start);
        boolean comment = quote == '#';
        String fence = String.valueOf(quote).repeat(3);
        boolean fenced = !comment && text.startsWith(fence, start);
        for (int k = start + (fenced ? 3 : 1); k < text.length(); k++) {
            char c = text.charAt(k);
            if (c == '\n' && !fenced) {
                return k; // of a comment, or of a string that the parser will complain about
            }
            if (c == '\\' && quote == '"') {
                k++;
            } else if (!comment && c == quote && (!fenced || text.startsWith(fence, k))) {
                return fenced ? k + 2 : k;
            }
        }
        return text.length();
    }
}
