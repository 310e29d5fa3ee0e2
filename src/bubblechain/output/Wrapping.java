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
        int start = 0;
        // two characters a code point: a window this long shows whether the rest fits, without a look at all of it
        int reach = 2 * width + 2;
        String window = text.substring(0, Math.min(text.length(), reach));
        while (width(window) > width) {
            int limit = window.offsetByCodePoints(0, width);
            int end = formula ? lastBreak(window, limit, limit / 2, Wrapping::startsTerm) : 0;
            if (end == 0) {
                end = lastBreak(window, limit, 0, formula ? Wrapping::splitsFormula : Wrapping::splitsWords);
            }
            if (end == 0) {
                end = limit;
            }
            lines.add(window.substring(0, end).stripTrailing());
            start += end;
            while (start < text.length() && Character.isWhitespace(text.codePointAt(start))) {
                start += Character.charCount(text.codePointAt(start));
            }
            window = text.substring(start, Math.min(text.length(), start + reach));
        }
        if (!window.isEmpty() || lines.isEmpty()) {
            lines.add(window);
        }
        return lines;
    }

    /** Where a line may end: a place in a text, just before the character at the index. */
    @FunctionalInterface
    private interface Place {
        boolean allows(String text, int index);
    }

    /** The last such place after {@code from} and not after {@code limit}; 0 if there is none. */
    private static int lastBreak(String text, int limit, int from, Place place) {
        for (int i = limit; i > from; i--) {
            if (place.allows(text, i)) {
                return i;
            }
        }
        return 0;
    }

    private static boolean splitsWords(String text, int i) {
        return text.charAt(i) == ' ' || text.charAt(i - 1) == ' ';
    }

    private static boolean splitsFormula(String text, int i) {
        if (splitsWords(text, i)) {
            return !endsWithSign(text, i);
        }
        char before = text.charAt(i - 1);
        return before == '*' || before == ',' || startsTerm(text, i);
    }

    /** True if the line would end with a plus or minus that belongs to what follows. */
    private static boolean endsWithSign(String text, int i) {
        String line = text.substring(0, i).stripTrailing();
        return line.endsWith(" +") || line.endsWith(" -");
    }

    /** True before a plus or minus between two terms, not before the sign of an exponent. */
    private static boolean startsTerm(String text, int i) {
        char before = i > 1 && text.charAt(i - 1) == ' ' ? text.charAt(i - 2) : text.charAt(i - 1);
        boolean sign = text.charAt(i) == '+' || text.charAt(i) == '-';
        return sign && (Character.isLetterOrDigit(before) || before == ')') && before != 'e' && before != 'E';
    }
}
