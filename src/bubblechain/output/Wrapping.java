package bubblechain.output;

import java.util.ArrayList;
import java.util.List;

/** Breaks one line of text into pieces of a given width, counted in characters (code points). */
final class Wrapping {
    /** Digits that stay beside an exponent when a number is broken. */
    private static final int BESIDE_EXPONENT = 3;

    private Wrapping() {}

    static int width(String text) {
        return text.codePointCount(0, text.length());
    }

    /** Breaks at spaces; a word longer than the width is cut. */
    static List<String> words(String text, int width) {
        return greedy(text, width, false);
    }

    /** Breaks at spaces, before + and - and after * and commas; a longer piece is cut. */
    static List<String> formula(String text, int width) {
        return greedy(text, width, true);
    }

    /**
     * Breaks a decimal number anywhere but in its exponent.
     *
     * @param first width of the first piece
     * @param rest  width of the others
     */
    static List<String> digits(String number, int first, int rest) {
        int exponent = Math.max(number.indexOf('e'), number.indexOf('E'));
        List<String> pieces = new ArrayList<>();
        int start = 0;
        int width = first;
        while (number.length() - start > width) {
            int end = start + width;
            int beside = exponent - BESIDE_EXPONENT;
            if (exponent >= 0 && end > beside && beside > start) {
                end = beside;
            }
            pieces.add(number.substring(start, end));
            start = end;
            width = rest;
        }
        pieces.add(number.substring(start));
        return pieces;
    }

    private static List<String> greedy(String text, int width, boolean formula) {
        List<String> lines = new ArrayList<>();
        String rest = text;
        while (width(rest) > width) {
            int limit = rest.offsetByCodePoints(0, width);
            int end = limit;
            for (int i = limit; i > 0; i--) {
                if (breaksAt(rest, i, formula)) {
                    end = i;
                    break;
                }
            }
            lines.add(rest.substring(0, end).stripTrailing());
            rest = rest.substring(end).stripLeading();
        }
        if (!rest.isEmpty() || lines.isEmpty()) {
            lines.add(rest);
        }
        return lines;
    }

    /** True if a line may end just before position i. */
    private static boolean breaksAt(String text, int i, boolean formula) {
        char before = text.charAt(i - 1);
        char after = text.charAt(i);
        if (after == ' ' || before == ' ') {
            return !formula || !endsWithSign(text, i);
        }
        return formula && (before == '*' || before == ',' || startsTerm(before, after));
    }

    /** True if the line would end with a plus or minus that belongs to what follows. */
    private static boolean endsWithSign(String text, int i) {
        String line = text.substring(0, i).stripTrailing();
        return line.endsWith(" +") || line.endsWith(" -");
    }

    private static boolean startsTerm(char before, char after) {
        boolean sign = after == '+' || after == '-';
        return sign && (Character.isLetterOrDigit(before) || before == ')') && before != 'e' && before != 'E';
    }
}
