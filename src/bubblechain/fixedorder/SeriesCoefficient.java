package bubblechain.fixedorder;

import bubblechain.formula.Formula;
import java.util.List;

/**
 * One coefficient of a series.
 *
 * @param loops   n of coupling^n, from 1
 * @param value   the coefficient as a formula in {@code nf}
 * @param errors  independent one-standard-deviation errors, formulas in {@code nf}; none if the value is exact
 * @param status  how far the number was checked
 * @param sources bibliography keys
 */
public record SeriesCoefficient(
        int loops, Formula value, List<Formula> errors, SourceStatus status, List<String> sources) {
    public SeriesCoefficient {
        errors = List.copyOf(errors);
        sources = List.copyOf(sources);
    }

    /** True if the value carries no input error. */
    public boolean isExact() {
        return errors.isEmpty();
    }
}
