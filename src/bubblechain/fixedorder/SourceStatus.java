package bubblechain.fixedorder;

import java.util.Arrays;
import java.util.Locale;
import java.util.Optional;

/** How far a number is known to agree with the source named beside it. */
public enum SourceStatus {
    /** Read in the text named. */
    SEEN_IN_THE_PAPER,
    /** Recalled; the source named is where it was published. */
    FROM_MEMORY,
    /** Computed for this project from other numbers. */
    DERIVED_HERE;

    /** The words used in files: "seen in the paper", "from memory", "derived here". */
    public String text() {
        return name().toLowerCase(Locale.ROOT).replace('_', ' ');
    }

    static Optional<SourceStatus> named(String text) {
        return Arrays.stream(values()).filter(s -> s.text().equals(text)).findFirst();
    }
}
