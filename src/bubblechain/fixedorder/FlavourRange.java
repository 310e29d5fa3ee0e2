package bubblechain.fixedorder;

import bubblechain.exact.DomainException;
import bubblechain.qcd.BetaFunction;

/**
 * The flavour numbers for which a series is meant.
 *
 * @param from  smallest number
 * @param to    largest number
 * @param words what is counted: "nl, massless flavours below the heavy quark"
 */
public record FlavourRange(int from, int to, String words) {
    public FlavourRange {
        if (from < 0 || to < from || to > BetaFunction.LARGEST_NF) {
            throw new DomainException("a range of flavour numbers must lie between 0 and " + BetaFunction.LARGEST_NF
                    + ", got " + from + " to " + to);
        }
    }

    /** The flavour number of the range that is nearest to {@code nf}. */
    public int nearest(int nf) {
        return Math.max(from, Math.min(to, nf));
    }

    void check(String series, int nf) {
        if (nf < from || nf > to) {
            throw new DomainException("series '" + series + "' holds for " + (from == to ? "" : from + " to ") + to + " flavours (" + words
                    + "); got " + nf);
        }
    }
}
