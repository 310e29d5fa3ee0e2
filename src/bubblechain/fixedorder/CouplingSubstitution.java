package bubblechain.fixedorder;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.series.CoefficientwiseAlgebra;
import bubblechain.series.ExactRing;
import bubblechain.series.LaurentSeries;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;

/** Rewriting a series in another coupling, old = new (1 + e_1 new + e_2 new^2 + ...). Exact. */
public final class CouplingSubstitution {
    private CouplingSubstitution() {}

    /**
     * The coefficients in the new coupling, as many as given.
     *
     * @param coefficients c_1, c_2, ... of old, old^2, ...
     * @param relation     e_1, e_2, ...; at least as many as there are coefficients, less one
     * @throws DomainException if the relation is too short
     */
    public static List<ExactConstant> apply(List<ExactConstant> coefficients, List<ExactConstant> relation) {
        int length = coefficients.size();
        if (relation.size() < length - 1) {
            throw new DomainException("rewriting " + length + " terms in another coupling needs the relation to order "
                    + (length - 1) + ", known to order " + relation.size());
        }
        CoefficientwiseAlgebra<ExactConstant> algebra = CoefficientwiseAlgebra.of(ExactRing.INSTANCE, length);
        List<ExactConstant> factor = new ArrayList<>(relation.subList(0, length - 1));
        factor.add(0, ExactConstant.ONE);
        LaurentSeries<ExactConstant> old = algebra.series(1, factor);
        LaurentSeries<ExactConstant> power = old;
        List<ExactConstant> result = new ArrayList<>(Collections.nCopies(length, ExactConstant.ZERO));
        for (int m = 1; m <= length; m++) {
            for (int n = m; n <= length; n++) {
                ExactConstant term = coefficients.get(m - 1).multiply(algebra.coefficient(power, n));
                result.set(n - 1, result.get(n - 1).add(term));
            }
            power = algebra.multiply(power, old);
        }
        return result;
    }
}
