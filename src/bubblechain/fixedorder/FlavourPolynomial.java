package bubblechain.fixedorder;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.IntFunction;

/** A polynomial in the number of flavours from its values at 0, 1, 2, ...; exact. */
final class FlavourPolynomial {
    private FlavourPolynomial() {}

    /**
     * The coefficients of nf^0, nf^1, ..., the last not zero (one zero for the zero polynomial); empty if the values
     * are not those of a polynomial of this degree.
     */
    static Optional<List<ExactConstant>> coefficients(IntFunction<ExactConstant> value, int degree) {
        // Newton's forward differences with two points more than needed.
        List<ExactConstant> differences = new ArrayList<>();
        for (int nf = 0; nf <= degree + 2; nf++) {
            differences.add(value.apply(nf));
        }
        for (int order = 1; order < differences.size(); order++) {
            for (int k = differences.size() - 1; k >= order; k--) {
                ExactConstant step = differences.get(k).subtract(differences.get(k - 1));
                differences.set(k, step.divide(Rational.of(order)));
            }
        }
        if (!differences.get(degree + 1).isZero() || !differences.get(degree + 2).isZero()) {
            return Optional.empty();
        }
        return Optional.of(expanded(differences.subList(0, degree + 1)));
    }

    /** sum_k d_k nf (nf-1) ... (nf-k+1) in powers of nf, by Horner's rule. */
    private static List<ExactConstant> expanded(List<ExactConstant> differences) {
        List<ExactConstant> result = new ArrayList<>(List.of(ExactConstant.ZERO));
        for (int k = differences.size() - 1; k >= 0; k--) {
            List<ExactConstant> next = new ArrayList<>();
            for (int m = 0; m <= result.size(); m++) {
                ExactConstant lower = m > 0 ? result.get(m - 1) : ExactConstant.ZERO;
                ExactConstant same = m < result.size() ? result.get(m).multiply(Rational.of(-k)) : ExactConstant.ZERO;
                next.add(lower.add(same));
            }
            next.set(0, next.get(0).add(differences.get(k)));
            result = next;
        }
        while (result.size() > 1 && result.get(result.size() - 1).isZero()) {
            result.remove(result.size() - 1);
        }
        return result;
    }
}
