package bubblechain.output;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;

/**
 * Columns with the widths chosen for them: natural if they fit; else columns of words or columns of digits are narrowed
 * first, or the widest whatever they hold, and the layout with the fewest lines is taken.
 */
final class TextTable {
    private static final int GAP = 2;
    /** Rows that are laid out to compare layouts. */
    private static final int SAMPLE = 100;

    private final List<TextColumn> columns;
    private final int[] widths;

    private TextTable(List<TextColumn> columns, int[] widths) {
        this.columns = columns;
        this.widths = widths;
    }

    /**
     * @param headings one per column
     * @param rows     cells, one per column in each
     * @param room     columns of the terminal
     * @return         empty if even the narrowest layout does not fit
     */
    static Optional<TextTable> fitted(List<String> headings, List<List<Cell>> rows, int room) {
        List<TextColumn> columns = new ArrayList<>();
        for (int c = 0; c < headings.size(); c++) {
            List<Cell> cells = new ArrayList<>();
            for (List<Cell> row : rows) {
                cells.add(row.get(c));
            }
            columns.add(TextColumn.of(headings.get(c), cells));
        }
        List<List<Cell>> sample = rows.subList(0, Math.min(rows.size(), SAMPLE));
        Optional<TextTable> lowest = Optional.empty();
        for (Narrowing first : Narrowing.values()) {
            Optional<TextTable> table = narrowed(columns, first, room);
            if (table.isPresent() && (lowest.isEmpty() || table.get().height(sample) < lowest.get().height(sample))) {
                lowest = table;
            }
        }
        return lowest;
    }

    /** Which columns are narrowed first. */
    private enum Narrowing {
        WORDS,
        DIGITS,
        ALL;

        boolean takes(TextColumn column) {
            return this == ALL || column.holdsDigits() == (this == DIGITS);
        }
    }

    private int height(List<List<Cell>> rows) {
        int height = 0;
        for (List<Cell> row : rows) {
            height += tallest(blocks(row));
        }
        return height;
    }

    /** Breaks headings, then narrows the widest of the columns to be narrowed first, then the widest of all. */
    private static Optional<TextTable> narrowed(List<TextColumn> columns, Narrowing first, int room) {
        int[] widths = new int[columns.size()];
        int excess = GAP * (widths.length - 1) - room;
        for (int c = 0; c < widths.length; c++) {
            widths[c] = columns.get(c).natural();
            excess += widths[c];
        }
        for (int c = 0; c < widths.length && excess > 0; c++) {
            int less = Math.min(excess, widths[c] - columns.get(c).body());
            widths[c] -= less;
            excess -= less;
        }
        for (; excess > 0; excess--) {
            int widest = widestToNarrow(columns, widths, first);
            if (widest < 0) {
                widest = widestToNarrow(columns, widths, Narrowing.ALL);
            }
            if (widest < 0) {
                return Optional.empty();
            }
            widths[widest]--;
        }
        return Optional.of(new TextTable(columns, widths));
    }

    private static int widestToNarrow(List<TextColumn> columns, int[] widths, Narrowing allowed) {
        int widest = -1;
        for (int c = 0; c < widths.length; c++) {
            boolean canShrink = widths[c] > columns.get(c).least() && allowed.takes(columns.get(c));
            if (canShrink && (widest < 0 || widths[c] > widths[widest])) {
                widest = c;
            }
        }
        return widest;
    }

    /** The headings, the last line of each just above the column. */
    List<String> heading() {
        List<List<String>> blocks = new ArrayList<>();
        for (int c = 0; c < widths.length; c++) {
            blocks.add(columns.get(c).heading(widths[c]));
        }
        int height = tallest(blocks);
        List<List<String>> lowered = new ArrayList<>();
        for (List<String> block : blocks) {
            List<String> padded = new ArrayList<>(Collections.nCopies(height - block.size(), ""));
            padded.addAll(block);
            lowered.add(padded);
        }
        return sideBySide(lowered);
    }

    /** A line of dashes as wide as each column. */
    String rule() {
        List<String> dashes = new ArrayList<>();
        for (int width : widths) {
            dashes.add("-".repeat(width));
        }
        return String.join(" ".repeat(GAP), dashes);
    }

    /** One row, in several lines if a cell is broken. */
    List<String> lines(List<Cell> row) {
        return sideBySide(blocks(row));
    }

    private List<List<String>> blocks(List<Cell> row) {
        List<List<String>> blocks = new ArrayList<>();
        for (int c = 0; c < widths.length; c++) {
            blocks.add(columns.get(c).lines(row.get(c), widths[c]));
        }
        return blocks;
    }

    private static int tallest(List<List<String>> blocks) {
        int height = 0;
        for (List<String> block : blocks) {
            height = Math.max(height, block.size());
        }
        return height;
    }

    private List<String> sideBySide(List<List<String>> blocks) {
        int height = tallest(blocks);
        List<String> lines = new ArrayList<>(height);
        StringBuilder line = new StringBuilder();
        for (int i = 0; i < height; i++) {
            line.setLength(0);
            for (int c = 0; c < widths.length; c++) {
                String piece = i < blocks.get(c).size() ? blocks.get(c).get(i) : "";
                line.append(piece);
                for (int spaces = widths[c] - Wrapping.width(piece) + GAP; spaces > 0; spaces--) {
                    line.append(' ');
                }
            }
            lines.add(line.toString());
        }
        return lines;
    }
}
