package bubblechain.fixedorder;

import bubblechain.exact.DomainException;
import bubblechain.exact.Rational;
import bubblechain.qcd.BetaFunction;
import bubblechain.series.CoefficientRing;
import java.util.ArrayList;
import java.util.List;

/**
 * A series at every scale of the coupling: with L = ln(mu/R),
 * y(R)^s sum_{n>=1} a_n y(R)^n = y(mu)^s sum_{n>=1} a_n(L) y(mu)^n and a_n(L) = sum_m a_{n,m} L^m, y = alpha_s/(4 pi).
 *
 * <p>The coefficients follow from the independence of mu, order by order in y with the beta function as given (derived
 * here): a_{n,0} = a_n and (m+1) a_{n,m+1} = 2 sum_{j>=0} beta_j (n-1-j+s) a_{n-1-j,m}. The map is linear and
 * triangular: a_n(L) needs a_1 .. a_n and beta_0 .. beta_{n-2}.
 *
 * @param <C> the numbers: exact constants or balls
 * @implNote O(N^2 x loops) operations for N terms
 */
public final class ScaleLogarithms<C> {
    private final CoefficientRing<C> ring;
    /** Entry n - 1 holds a_{n,0} .. a_{n,n-1}. */
    private final List<List<C>> table;

    private ScaleLogarithms(CoefficientRing<C> ring, List<List<C>> table) {
        this.ring = ring;
        this.table = table;
    }

    /**
     * @param ring         where to compute
     * @param coefficients a_1, a_2, ... of y, y^2, ...
     * @param beta         running of y
     * @param shift        s, an extra power of the coupling in front; 0 for an ordinary series
     */
    public static <C> ScaleLogarithms<C> of(
            CoefficientRing<C> ring, List<C> coefficients, BetaFunction beta, Rational shift) {
        List<C> running = beta.coefficients().stream().map(ring::constant).toList();
        List<List<C>> table = new ArrayList<>();
        for (int n = 1; n <= coefficients.size(); n++) {
            List<C> row = new ArrayList<>();
            row.add(coefficients.get(n - 1));
            for (int m = 0; m < n - 1; m++) {
                row.add(next(ring, table, running, shift, n, m));
            }
            table.add(row);
        }
        return new ScaleLogarithms<>(ring, table);
    }

    private static <C> C next(
            CoefficientRing<C> ring, List<List<C>> table, List<C> beta, Rational shift, int n, int m) {
        C sum = ring.constant(Rational.ZERO);
        for (int j = 0; j < beta.size() && n - 1 - j >= 1; j++) {
            List<C> earlier = table.get(n - 2 - j);
            if (m < earlier.size()) { // a_{n,m} = 0 for m >= n
                C product = ring.multiply(beta.get(j), earlier.get(m));
                sum = ring.add(sum, ring.multiply(product, shift.add(n - 1 - j)));
            }
        }
        return ring.multiply(sum, Rational.of(2, m + 1L));
    }

    /** Number of terms N. */
    public int loops() {
        return table.size();
    }

    /** a_{n,0}, a_{n,1}, ...: the coefficients of L^0, L^1, ... at y^n. @param n from 1 to {@link #loops} */
    public List<C> powers(int n) {
        if (n < 1 || n > table.size()) {
            throw new DomainException("the series has orders 1 to " + table.size() + ", got " + n);
        }
        return List.copyOf(table.get(n - 1));
    }

    /** a_1(L), a_2(L), ... @param logarithm L = ln(mu/R) */
    public List<C> at(C logarithm) {
        List<C> values = new ArrayList<>();
        for (List<C> row : table) {
            C value = row.get(row.size() - 1);
            for (int m = row.size() - 2; m >= 0; m--) {
                value = ring.add(ring.multiply(value, logarithm), row.get(m));
            }
            values.add(value);
        }
        return values;
    }
}
