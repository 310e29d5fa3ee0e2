package bubblechain.output;

import java.util.ArrayList;
import java.util.List;

/**
 * Layout of one column of a text table. Decimal numbers are aligned at the point; a column of integers and fractions
 * is aligned right; everything else is aligned left.
 */
final class TextColumn {
    /** A column of digits or words is not made narrower than this to save a table from being written as a list. */
    private static final int NARROW = 18;
    /** Continued digits go below the digits after the point if at least so many fit there, else to the left edge. */
    private static final int FEWEST_DIGITS = 12;

    private enum Alignment {
        LEFT,
        RIGHT,
        POINT
    }

    private final String heading;
    private final Alignment alignment;
    private final int beforePoint;
    private final int natural;
    private final int body;
    private final int least;

    private TextColumn(String heading, Alignment alignment, int beforePoint, int natural, int body, int least) {
        this.heading = heading;
        this.alignment = alignment;
        this.beforePoint = beforePoint;
        this.natural = natural;
        this.body = body;
        this.least = least;
    }

    static TextColumn of(String heading, List<Cell> cells) {
        Alignment alignment = alignment(cells);
        int before = 0;
        int after = 0;
        int widest = 0;
        for (Cell cell : cells) {
            if (alignment == Alignment.POINT && isNumber(cell)) {
                before = Math.max(before, cell.beforePoint());
                after = Math.max(after, cell.width() - cell.beforePoint());
            } else {
                widest = Math.max(widest, cell.width());
            }
        }
        int cellsWidth = Math.max(widest, before + after);
        int longestWord = 1;
        for (String word : heading.split(" ")) {
            longestWord = Math.max(longestWord, Wrapping.width(word));
        }
        int natural = Math.max(cellsWidth, Wrapping.width(heading));
        int body = Math.max(cellsWidth, longestWord);
        int least = Math.max(longestWord, Math.min(cellsWidth, NARROW));
        return new TextColumn(heading, alignment, before, natural, body, least);
    }

    private static Alignment alignment(List<Cell> cells) {
        boolean whole = false;
        boolean words = false;
        for (Cell cell : cells) {
            switch (cell.kind()) {
                case DECIMAL -> {
                    return Alignment.POINT;
                }
                case WHOLE -> whole = true;
                case WORDS, FORMULA -> words = true;
                case NOTHING -> { }
            }
        }
        return whole && !words ? Alignment.RIGHT : Alignment.LEFT;
    }

    private static boolean isNumber(Cell cell) {
        return cell.kind() != Cell.Kind.WORDS && cell.kind() != Cell.Kind.FORMULA;
    }

    /** True if the column holds decimal numbers. */
    boolean holdsDigits() {
        return alignment == Alignment.POINT;
    }

    /** Width at which nothing is broken. */
    int natural() {
        return natural;
    }

    /** Width at which only the heading is broken. */
    int body() {
        return body;
    }

    /** Width below which the column is not pressed. */
    int least() {
        return least;
    }

    List<String> heading(int width) {
        List<String> lines = Wrapping.words(heading, width);
        return alignment == Alignment.RIGHT ? right(lines, width) : lines;
    }

    List<String> lines(Cell cell, int width) {
        return switch (alignment) {
            case LEFT -> cell.wrapped(width);
            case RIGHT -> right(cell.wrapped(width), width);
            case POINT -> isNumber(cell) ? atPoint(cell, width) : cell.wrapped(width);
        };
    }

    private List<String> atPoint(Cell cell, int width) {
        int lead = beforePoint - cell.beforePoint();
        int under = beforePoint + 1;
        if (width < natural && under + FEWEST_DIGITS > width) {
            return cell.wrapped(width);
        }
        List<String> pieces = Wrapping.digits(cell.text(), width - lead, width - under);
        List<String> lines = new ArrayList<>();
        for (String piece : pieces) {
            lines.add(" ".repeat(lines.isEmpty() ? lead : under) + piece);
        }
        return lines;
    }

    private static List<String> right(List<String> lines, int width) {
        List<String> moved = new ArrayList<>();
        for (String line : lines) {
            moved.add(" ".repeat(Math.max(0, width - Wrapping.width(line))) + line);
        }
        return moved;
    }
}
