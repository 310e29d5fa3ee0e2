package bubblechain.sumrule;

import java.util.Locale;

/** What a sum rule says about a singularity. */
public enum Verdict {
    PRESENT,
    ABSENT,
    CANNOT_TELL;

    /** "present", "absent", "cannot tell". */
    public String text() {
        return name().toLowerCase(Locale.ROOT).replace('_', ' ');
    }
}
