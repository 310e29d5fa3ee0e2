package bubblechain.analytic;

import bubblechain.formula.FormulaException;
import bubblechain.formula.Span;

/**
 * A formula outside the class whose singularities can be listed exactly; the message underlines the sub-expression. Its
 * expansion about a point where it is analytic may still be computed.
 */
public final class InadmissibleFormulaException extends FormulaException {
    private static final long serialVersionUID = 1L;

    InadmissibleFormulaException(Span span, String reason) {
        super(span, reason);
    }
}
