package bubblechain.formula;

import bubblechain.exact.ExactConstant;

/**
 * Steps taken while constants are evaluated, counted together for all the constants of one formula. A step is the visit of
 * a node with a number of a few machine words; longer numbers count more.
 */
public final class EvaluationSteps {
    private static final int WORD = 64;

    private long taken;

    /** @throws FormulaException if the limit is passed */
    void visit(Formula place) {
        take(1, place);
    }

    /** What a value costs beside the visit. */
    void value(ExactConstant value, Formula place) {
        long words = value.asRational()
                .map(q -> (q.numerator().bitLength() + (long) q.denominator().bitLength()) / WORD)
                .orElse((long) value.size());
        take(words * words / WORD, place);
    }

    private void take(long steps, Formula place) {
        taken += steps;
        if (taken > FormulaLimits.STEPS) {
            throw FormulaException.at(place.span(), "the sums of this formula have too many terms in all");
        }
    }
}
