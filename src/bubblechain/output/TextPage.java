package bubblechain.output;

import java.io.IOException;
import java.io.Writer;
import java.util.ArrayList;
import java.util.List;

/** Lines of text under construction, with a current indentation; no trailing spaces, no two blank lines in a row. */
final class TextPage {
    private static final int PIECE = 8_192;

    private final StringBuilder text = new StringBuilder();
    private final int width;
    private int indent;
    private boolean blankPending;

    TextPage(int width) {
        this.width = width;
    }

    /** Columns left beside the indentation. */
    int room() {
        return width - indent;
    }

    /** Runs the body with everything moved right. */
    void indented(int by, Runnable body) {
        indent += by;
        body.run();
        indent -= by;
    }

    void line(String line) {
        if (line.isBlank()) {
            gap();
            return;
        }
        if (blankPending && text.length() > 0) {
            text.append('\n');
        }
        blankPending = false;
        int end = line.length();
        while (Character.isWhitespace(line.charAt(end - 1))) {
            end--;
        }
        for (int i = 0; i < indent; i++) {
            text.append(' ');
        }
        text.append(line, 0, end).append('\n');
    }

    void lines(List<String> lines) {
        for (String line : lines) {
            line(line);
        }
    }

    /** A blank line before the next line, if there is one. */
    void gap() {
        blankPending = true;
    }

    /** The first piece after the lead, the others below it. */
    void hanging(String lead, List<String> pieces) {
        String under = " ".repeat(Wrapping.width(lead));
        for (int i = 0; i < pieces.size(); i++) {
            line((i == 0 ? lead : under) + pieces.get(i));
        }
    }

    /** Words after a lead, broken at the width and continued below themselves. */
    void paragraph(String lead, String words) {
        hanging(lead, Wrapping.words(words, room() - Wrapping.width(lead)));
    }

    /** Items after a lead, separated by commas, broken only between items where possible. */
    void items(String lead, List<String> items) {
        int room = room() - Wrapping.width(lead);
        List<String> pieces = new ArrayList<>();
        String current = "";
        for (int i = 0; i < items.size(); i++) {
            String item = items.get(i) + (i < items.size() - 1 ? "," : "");
            String longer = current.isEmpty() ? item : current + " " + item;
            if (Wrapping.width(longer) > room && !current.isEmpty()) {
                pieces.addAll(Wrapping.words(current, room));
                longer = item;
            }
            current = longer;
        }
        pieces.addAll(Wrapping.words(current, room));
        hanging(lead, pieces);
    }

    /** Writes the page piece by piece: a long one is not copied as a whole. */
    void writeTo(Writer out) throws IOException {
        char[] piece = new char[PIECE];
        for (int start = 0; start < text.length(); start += PIECE) {
            int end = Math.min(text.length(), start + PIECE);
            text.getChars(start, end, piece, 0);
            out.write(piece, 0, end - start);
        }
    }

    @Override
    public String toString() {
        return text.toString();
    }
}
