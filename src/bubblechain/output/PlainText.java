package bubblechain.output;

/** Makes text harmless for a terminal and a line-oriented format: no control or direction-changing characters. */
public final class PlainText {
    private static final int REPLACEMENT = 0xFFFD;

    private PlainText() {}

    /** One line: white space and line ends become single spaces, other control characters the replacement sign. */
    public static String oneLine(String text) {
        return clean(text).replaceAll("\\s+", " ").strip();
    }

    /** Line ends become line feeds, tabs spaces, other control characters the replacement sign. */
    public static String clean(String text) {
        StringBuilder clean = new StringBuilder(text.length());
        String lines = text.replace("\r\n", "\n").replace('\r', '\n');
        for (int at = 0; at < lines.length(); at += Character.charCount(lines.codePointAt(at))) {
            clean.appendCodePoint(harmless(lines.codePointAt(at)));
        }
        return clean.toString();
    }

    private static int harmless(int c) {
        if (c == '\n') {
            return c;
        }
        if (c == '\t' || c == 0x2028 || c == 0x2029) {
            return ' ';
        }
        int type = Character.getType(c);
        boolean harmful = type == Character.CONTROL || type == Character.SURROGATE || type == Character.FORMAT;
        return harmful ? REPLACEMENT : c;
    }
}
