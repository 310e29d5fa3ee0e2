package bubblechain.toml;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Reads the plain files the program ships without loading a TOML library, which would take most of the time of a short
 * command: bare keys, strings without backslashes, arrays of strings, comments, {@code [table]} and {@code [[table]]}.
 * Whatever else it meets, also any mistake, it leaves to the {@link GeneralReader}.
 */
final class PlainReader {
    private static final String THREE_QUOTES = "\"\"\"";

    private final String text;
    private final Node.Table top = Node.Table.empty(1, 1);
    private Node.Table current = top;
    private int position;
    private int line = 1;
    private int lineStart;

    PlainReader(String text) {
        this.text = text;
    }

    /** The top table, or empty if the file is not so plain. */
    static Optional<Node.Table> read(String text) {
        return new PlainReader(text).read();
    }

    /** The top table, or empty if the file is not so plain; then {@link #position} is about where. */
    Optional<Node.Table> read() {
        try {
            readAll();
            return Optional.of(top);
        } catch (NotPlain notPlain) {
            return Optional.empty();
        }
    }

    /** How far the text was read. */
    int position() {
        return Math.min(position, text.length());
    }

    /** Signals a file that needs the general reader; it never leaves this class. */
    private static final class NotPlain extends Exception {
        private static final long serialVersionUID = 1L;

        NotPlain() {
            super("not plain", null, false, false);
        }
    }

    private void readAll() throws NotPlain {
        skipBlank();
        while (position < text.length()) {
            if (text.charAt(position) == '[') {
                header();
            } else {
                entry();
            }
            endOfLine();
            skipBlank();
        }
    }

    private void header() throws NotPlain {
        int startLine = line;
        int startColumn = column();
        boolean array = text.startsWith("[[", position);
        position += array ? 2 : 1;
        List<String> path = new ArrayList<>(List.of(key()));
        while (!array && position < text.length() && text.charAt(position) == '.') {
            position++;
            path.add(key());
        }
        expect(array ? "]]" : "]");
        Node.Table table = Node.Table.empty(startLine, startColumn);
        String last = path.remove(path.size() - 1);
        Node.Table parent = top;
        for (String name : path) {
            parent.entries().putIfAbsent(name, Node.Table.empty(startLine, startColumn));
            Node known = parent.entries().get(name);
            if (!(known instanceof Node.Table inner)) {
                throw new NotPlain();
            }
            parent = inner;
        }
        if (array) {
            append(parent, last, table);
        } else if (parent.entries().putIfAbsent(last, table) != null) {
            throw new NotPlain();
        }
        current = table;
    }

    private static void append(Node.Table parent, String name, Node.Table table) throws NotPlain {
        Node known = parent.entries().get(name);
        if (known == null) {
            known = new Node.Listing(new ArrayList<>(), table.line(), table.column());
            parent.entries().put(name, known);
        }
        boolean tables = known instanceof Node.Listing list
                && list.entries().stream().allMatch(Node.Table.class::isInstance);
        if (!tables) {
            throw new NotPlain();
        }
        ((Node.Listing) known).entries().add(table);
    }

    private void entry() throws NotPlain {
        int startLine = line;
        int startColumn = column();
        String name = key();
        skipSpaces();
        expect("=");
        skipSpaces();
        Node value = at('[') ? array(startLine, startColumn) : new Node.Text(string(), startLine, startColumn);
        if (current.entries().putIfAbsent(name, value) != null) {
            throw new NotPlain();
        }
    }

    private Node array(int startLine, int startColumn) throws NotPlain {
        List<Node> entries = new ArrayList<>();
        expect("[");
        skipBlank();
        while (!at(']')) {
            int entryLine = line;
            int entryColumn = column();
            entries.add(new Node.Text(string(), entryLine, entryColumn));
            skipBlank();
            if (at(',')) {
                position++;
                skipBlank();
            } else if (!at(']')) {
                throw new NotPlain();
            }
        }
        expect("]");
        return new Node.Listing(entries, startLine, startColumn);
    }

    private String string() throws NotPlain {
        boolean several = text.startsWith(THREE_QUOTES, position);
        String quote = several ? THREE_QUOTES : "\"";
        expect(quote);
        int start = position;
        int end = text.indexOf(quote, position);
        if (end < 0) {
            throw new NotPlain();
        }
        String content = text.substring(start, end);
        if (content.indexOf('\\') >= 0 || content.indexOf('\r') >= 0 || hasControl(content, several)) {
            throw new NotPlain();
        }
        for (int k = start; k < end; k++) {
            if (text.charAt(k) == '\n') {
                line++;
                lineStart = k + 1;
            }
        }
        position = end + quote.length();
        if (several && at('"')) {
            throw new NotPlain();
        }
        return several && content.startsWith("\n") ? content.substring(1) : content;
    }

    private static boolean hasControl(String content, boolean newlines) {
        for (int k = 0; k < content.length(); k++) {
            char c = content.charAt(k);
            if (c < ' ' && !(newlines && c == '\n') || c == 127) {
                return true;
            }
        }
        return false;
    }

    private String key() throws NotPlain {
        int start = position;
        while (position < text.length() && isKeyCharacter(text.charAt(position))) {
            position++;
        }
        if (position == start) {
            throw new NotPlain();
        }
        return text.substring(start, position);
    }

    private static boolean isKeyCharacter(char c) {
        return c >= 'a' && c <= 'z' || c >= 'A' && c <= 'Z' || c >= '0' && c <= '9' || c == '_' || c == '-';
    }

    private void expect(String symbol) throws NotPlain {
        if (!text.startsWith(symbol, position)) {
            throw new NotPlain();
        }
        position += symbol.length();
    }

    private boolean at(char c) {
        return position < text.length() && text.charAt(position) == c;
    }

    private int column() {
        return position - lineStart + 1;
    }

    private void skipSpaces() {
        while (at(' ') || at('\t')) {
            position++;
        }
    }

    /** Spaces, line ends and comments. */
    private void skipBlank() throws NotPlain {
        while (position < text.length()) {
            char c = text.charAt(position);
            if (c == '#') {
                skipComment();
            } else if (c == '\n') {
                position++;
                line++;
                lineStart = position;
            } else if (c == ' ' || c == '\t') {
                position++;
            } else {
                return;
            }
        }
    }

    private void skipComment() throws NotPlain {
        while (position < text.length() && text.charAt(position) != '\n') {
            char c = text.charAt(position++);
            if (c < ' ' && c != '\t' || c == 127) {
                throw new NotPlain();
            }
        }
    }

    private void endOfLine() throws NotPlain {
        skipSpaces();
        if (at('#')) {
            skipComment();
        }
        if (position < text.length() && !at('\n')) {
            throw new NotPlain();
        }
    }
}
