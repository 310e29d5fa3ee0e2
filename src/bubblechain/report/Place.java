package bubblechain.report;

/** Where a column is shown. Text means the formats for reading (text, LaTeX); data means JSON and CSV. */
public enum Place {
    EVERYWHERE,
    TEXT_ONLY,
    DATA_ONLY;

    /** True if a reader of text or LaTeX sees the column. */
    public boolean inText() {
        return this != DATA_ONLY;
    }

    /** True if the column is part of JSON and CSV. */
    public boolean inData() {
        return this != TEXT_ONLY;
    }
}
