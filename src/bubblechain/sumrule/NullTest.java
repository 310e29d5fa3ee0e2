package bubblechain.sumrule;

import bubblechain.exact.DomainException;
import java.util.List;

/**
 * Whether there is a singularity at all: the sum rule of a series without one tends to zero.
 *
 * <p>Rule, with E_k = max(half the scale band, last step, input error) at order k:
 * <ul>
 * <li>present if |K_k| &gt; {@value #PRESENT_LAST} E_k and |K_{k-1}| &gt; {@value #PRESENT_BEFORE} E_{k-1};
 * <li>absent if |K_k| &lt; E_k, |K| fell at each of the last two steps and |K_k| &lt; {@value #ABSENT_FALL} |K_0|;
 * <li>otherwise it cannot tell.
 * </ul>
 * Calibrated on bubble chains, on series built to have or not to have a singularity with the full beta function, and on
 * anomalous dimensions. The last condition for absence is needed: a constructed series with p = 4 shows a fall of rounding
 * size at K_3/K_0 = 1.6.
 */
public final class NullTest {
    /** |K|/E above which the last order speaks for a singularity. */
    public static final double PRESENT_LAST = 3;
    /** |K|/E that the order before must exceed as well. */
    public static final double PRESENT_BEFORE = 2;
    /** |K_k/K_0| below which a falling sum speaks against a singularity. */
    public static final double ABSENT_FALL = 0.25;

    private NullTest() {}

    /**
     * The verdict of the last order.
     *
     * @param strengths |K_0|, |K_1|, ...
     * @param errors    E_0, E_1, ...
     */
    public static Verdict judge(List<Double> strengths, List<Double> errors) {
        if (strengths.isEmpty() || strengths.size() != errors.size()) {
            throw new DomainException("a verdict needs one error for each of at least one value, got " + strengths.size()
                    + " values and " + errors.size() + " errors");
        }
        int k = strengths.size() - 1;
        if (k >= 1
                && strengths.get(k) > PRESENT_LAST * errors.get(k)
                && strengths.get(k - 1) > PRESENT_BEFORE * errors.get(k - 1)) {
            return Verdict.PRESENT;
        }
        boolean fell = k >= 2
                && strengths.get(k) < strengths.get(k - 1)
                && strengths.get(k - 1) < strengths.get(k - 2)
                && strengths.get(k) < ABSENT_FALL * strengths.get(0);
        return fell && strengths.get(k) < errors.get(k) ? Verdict.ABSENT : Verdict.CANNOT_TELL;
    }
}
