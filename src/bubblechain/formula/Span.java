package bubblechain.formula;

/**
 * Where a sub-expression stands in its source text.
 *
 * @param source the whole text
 * @param start  offset of its first character
 * @param end    offset after its last character
 */
public record Span(String source, int start, int end) {
    /** From the start of this span to the end of another in the same text; this span if the texts differ. */
    public Span to(Span last) {
        return source.equals(last.source) ? new Span(source, Math.min(start, last.start), Math.max(end, last.end)) : this;
    }

    /** Line of the first character, from 1. */
    public int line() {
        return 1 + (int) source.substring(0, start).chars().filter(c -> c == '\n').count();
    }

    /** Column of the first character, from 1. */
    public int column() {
        return start - source.lastIndexOf('\n', start - 1);
    }

    /** The words this span covers. */
    public String text() {
        return source.substring(start, end);
    }
}
