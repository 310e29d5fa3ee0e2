package bubblechain.analytic;

import bubblechain.exact.DomainException;
import java.util.ArrayList;
import java.util.List;

/**
 * A normal form prepared for evaluation in complex double precision, at points and over discs, with proved errors.
 *
 * @implNote a term costs about |slope * Re u| + 30 complex operations for each gamma or polygamma function: some
 *     microseconds
 */
public final class FormEvaluation {
    private final List<TermDisc> terms = new ArrayList<>();

    private FormEvaluation(NormalForm form) {
        form.terms().forEach((key, factor) -> terms.add(TermDisc.of(key, factor)));
    }

    public static FormEvaluation of(NormalForm form) {
        return new FormEvaluation(form);
    }

    /**
     * The value at re + i im with a bound of its error.
     *
     * @throws DomainException if the point is so close to a singular point of a term that no digit can be given, or too
     *     far out for double precision
     */
    public ComplexValue at(double re, double im) {
        if (!Double.isFinite(re) || !Double.isFinite(im)) {
            throw new DomainException("the point " + re + " + " + im + " i is not finite");
        }
        ScaledDisc value = over(ComplexDisc.of(re, im));
        if (value.isWhole()) {
            throw new DomainException("no value in double precision at u = " + re + " + " + im
                    + " i: a term is singular at or next to this point, or out of range; choose another point");
        }
        return ComplexValue.of(value);
    }

    /** A disc that holds the values at all points of a disc; the whole plane if a term may be singular there. */
    ScaledDisc over(ComplexDisc u) {
        ScaledDisc sum = ScaledDisc.ZERO;
        for (TermDisc term : terms) {
            sum = sum.add(term.over(u));
        }
        return sum;
    }
}
