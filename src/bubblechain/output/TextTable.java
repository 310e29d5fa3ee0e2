package bubblechain.output;

import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.function.Predicate;
import java.util.stream.IntStream;
import java.util.stream.Stream;

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
            int column = c;
            columns.add(TextColumn.of(headings.get(c), rows.stream().map(row -> row.get(column)).toList()));
        }
        Predicate<TextColumn> words = column -> !column.holdsDigits();
        List<List<Cell>> sample = rows.subList(0, Math.min(rows.size(), SAMPLE));
        return Stream.of(words, TextColumn::holdsDigits, any -> true)
                .flatMap(first -> narrowed(columns, first, room).stream())
                .min(Comparator.comparingInt(table -> table.height(sample)));
    }

    private int height(List<List<Cell>> rows) {
        return rows.stream().mapToInt(row -> lines(row).size()).sum();
    }

    /** Breaks headings, then narrows the widest of the columns to be narrowed first, then the widest of all. */
    private static Optional<TextTable> narrowed(List<TextColumn> columns, Predicate<TextColumn> first, int room) {
        int[] widths = columns.stream().mapToInt(TextColumn::natural).toArray();
        int excess = GAP * (widths.length - 1) + IntStream.of(widths).sum() - room;
        for (int c = 0; c < widths.length && excess > 0; c++) {
            int less = Math.min(excess, widths[c] - columns.get(c).body());
            widths[c] -= less;
            excess -= less;
        }
        for (; excess > 0; excess--) {
            int widest = widestToNarrow(columns, widths, first);
            if (widest < 0) {
                widest = widestToNarrow(columns, widths, column -> true);
            }
            if (widest < 0) {
                return Optional.empty();
            }
            widths[widest]--;
        }
        return Optional.of(new TextTable(columns, widths));
    }

    private static int widestToNarrow(List<TextColumn> columns, int[] widths, Predicate<TextColumn> allowed) {
        int widest = -1;
        for (int c = 0; c < widths.length; c++) {
            boolean canShrink = widths[c] > columns.get(c).least() && allowed.test(columns.get(c));
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
        int height = blocks.stream().mapToInt(List::size).max().orElse(0);
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
        List<List<String>> blocks = new ArrayList<>();
        for (int c = 0; c < widths.length; c++) {
            blocks.add(columns.get(c).lines(row.get(c), widths[c]));
        }
        return sideBySide(blocks);
    }

    private List<String> sideBySide(List<List<String>> blocks) {
        int height = blocks.stream().mapToInt(List::size).max().orElse(0);
        List<String> lines = new ArrayList<>();
        for (int i = 0; i < height; i++) {
            StringBuilder line = new StringBuilder();
            for (int c = 0; c < widths.length; c++) {
                String piece = i < blocks.get(c).size() ? blocks.get(c).get(i) : "";
                line.append(piece).append(" ".repeat(widths[c] - Wrapping.width(piece) + GAP));
            }
            lines.add(line.toString());
        }
        return lines;
    }
}
