package bubblechain.bibliography;

import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * One paper, as far as it is known.
 *
 * @param key     INSPIRE key, or a key of this project where {@code status} says so
 * @param arxiv   number in the arXiv such as "hep-ph/9402364" or "1606.06754"; may be empty
 * @param authors "A. Author, B. Author and C. Author", perhaps "et al." and a collaboration in parentheses
 * @param title   may say in parentheses that it is not confirmed
 * @param year    of the publication
 * @param journal "Nucl. Phys. B 426 (1994) 301-343", or words if it did not appear in a journal
 * @param doi     may be empty
 * @param status  how the entry was checked: "seen: ..." names what was read and in parentheses the fields found there,
 *                "from memory" means recalled and not looked up
 */
public record Publication(
        String key, String arxiv, String authors, String title, String year, String journal, String doi, String status) {
    /** The columns of the table. */
    static final List<String> FIELDS =
            List.of("key", "arxiv", "authors", "title", "year", "journal", "doi", "source_status");

    private static final String ALL_FIELDS = "all fields";
    private static final Pattern SEEN = Pattern.compile("seen: [^(;]*\\(([^)]*)\\).*");
    private static final Pattern FEW_AUTHORS = Pattern.compile("[^,]+(, [^,]+)? and [^,]+|[^,]+");
    private static final String DOUBTFUL = "not confirmed";

    static Publication of(List<String> f) {
        if (f.size() != FIELDS.size()) {
            throw new IllegalArgumentException("an entry of the bibliography has " + f.size() + " fields: " + f);
        }
        return new Publication(f.get(0), f.get(1), f.get(2), f.get(3), f.get(4), f.get(5), f.get(6), f.get(7));
    }

    /** True if every field was read somewhere; else {@link #status} goes with the entry wherever it is quoted. */
    public boolean isVerified() {
        return seen(ALL_FIELDS);
    }

    private boolean seen(String field) {
        Matcher matcher = SEEN.matcher(status);
        return matcher.matches() && List.of(matcher.group(1).split(", ")).contains(field);
    }

    /** The title, unless it is doubtful. */
    Optional<String> confirmedTitle() {
        return title.contains(DOUBTFUL) ? Optional.empty() : Optional.of(title);
    }

    /** The journal, unless it is doubtful; a remark in parentheses that it is not confirmed makes it so. */
    Optional<String> confirmedJournal() {
        return journal.contains(DOUBTFUL) || journal.equals("arXiv only") ? Optional.empty() : Optional.of(journal);
    }

    /**
     * Authors and arXiv number in one line, without a number the journal: "M. Beneke and V.M. Braun, hep-ph/9402364".
     * More than three authors are shown as the first and "et al."; "from memory" follows if these were not looked up.
     */
    public String inWords() {
        String who = FEW_AUTHORS.matcher(authors).matches() ? authors : authors.substring(0, authors.indexOf(',')) + " et al.";
        boolean read = isVerified() || seen("authors") && (arxiv.isEmpty() ? seen("journal") : seen("arxiv"));
        return who + ", " + where() + (read ? "" : "; from memory");
    }

    private String where() {
        if (arxiv.isEmpty()) {
            return confirmedJournal().orElse(year);
        }
        return arxiv.contains("/") ? arxiv : "arXiv:" + arxiv;
    }
}
