package bubblechain.output;

/** Text with every character that LaTeX treats specially written so that it prints as itself. */
final class LatexText {
    private LatexText() {}

    /** One line that LaTeX prints as the given text. */
    static String escape(String text) {
        StringBuilder escaped = new StringBuilder();
        PlainText.oneLine(text).codePoints().forEach(c -> append(escaped, c));
        return escaped.toString();
    }

    private static void append(StringBuilder escaped, int c) {
        switch (c) {
            case '\\' -> escaped.append("\\textbackslash{}");
            case '{', '}', '#', '$', '%', '&', '_' -> escaped.append('\\').append((char) c);
            case '^' -> escaped.append("\\textasciicircum{}");
            case '~' -> escaped.append("\\textasciitilde{}");
            case '<' -> escaped.append("\\textless{}");
            case '>' -> escaped.append("\\textgreater{}");
            case '|' -> escaped.append("\\textbar{}");
            case '"' -> escaped.append("\\char34{}");
            case '[', ']' -> escaped.append('{').append((char) c).append('}');
            default -> escaped.appendCodePoint(c);
        }
    }
}
