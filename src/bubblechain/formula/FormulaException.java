package bubblechain.formula;

import bubblechain.exact.DomainException;

/**
 * A formula that cannot be read or used. The message gives the reason with line and column, then the line of the
 * formula with the place underlined.
 */
public class FormulaException extends DomainException {
    private static final long serialVersionUID = 1L;
    private static final int SHOWN = 100;

    private final String reason;
    private final int line;
    private final int column;
    private final String picture;

    protected FormulaException(Span span, String reason) {
        this("formula ", reason, span.line(), span.column(), underline(span));
    }

    private FormulaException(String where, String reason, int line, int column, String picture) {
        super(where + "line " + line + ", column " + column + ": " + reason + "\n" + picture);
        this.reason = reason;
        this.line = line;
        this.column = column;
        this.picture = picture;
    }

    public static FormulaException at(Span span, String reason) {
        return new FormulaException(span, reason);
    }

    /** The same error with the place of the formula in front, such as "my.toml, line 7, T: ". */
    public FormulaException in(String where) {
        return new FormulaException(where, reason, line, column, picture);
    }

    public String reason() {
        return reason;
    }

    public int line() {
        return line;
    }

    public int column() {
        return column;
    }

    private static String underline(Span span) {
        String source = span.source();
        int from = source.lastIndexOf('\n', span.start() - 1) + 1;
        int newline = source.indexOf('\n', span.start());
        int to = newline < 0 ? source.length() : newline;
        int end = Math.min(Math.max(span.end(), span.start() + 1), Math.max(to, span.start() + 1));
        // A long line is shown around the place only.
        int shownFrom = Math.max(from, span.start() - SHOWN / 2);
        int shownTo = Math.min(to, shownFrom + SHOWN);
        String shown = source.substring(shownFrom, Math.max(shownTo, shownFrom)).replaceAll("\\p{Cntrl}", " ");
        int width = Math.max(1, Math.min(end, Math.max(shownTo, span.start() + 1)) - span.start());
        return "  " + shown + "\n  " + " ".repeat(span.start() - shownFrom) + "^".repeat(width);
    }
}
