package bubblechain.report;

/**
 * A remark for the reader of the text output; data formats leave it out.
 *
 * @param text one paragraph, or several separated by line feeds; not blank
 */
public record Note(String text) implements Block {
    public Note {
        if (text.isBlank()) {
            throw new IllegalArgumentException("a note needs a text");
        }
    }
}
