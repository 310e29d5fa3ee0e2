package bubblechain.qcd;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.series.CoefficientwiseAlgebra;
import bubblechain.series.ExactRing;
import bubblechain.series.LaurentSeries;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/**
 * The change of the number of flavours of the MS-bar coupling at a heavy quark's mass, mu = mbar(mbar):
 * alpha^(nl)/alpha^(nl+1) = 1 + sum_{k>=1} d_k (alpha^(nl+1)/pi)^k, with d_1 = 0.
 *
 * <p>d_2, d_3 and the flavour dependence of d_4 are exact; the nl^0 part of d_4 is the decimal 5.170347, good to about
 * 0.001. Sources: {@link #SOURCES}, recalled from the papers; d_2 and d_3 reproduce the form at mu = M to 12 digits.
 */
public final class Decoupling {
    /** Highest k with a known d_k. */
    public static final int LARGEST_ORDER = 4;
    /** Bibliography keys; status: from memory. */
    public static final List<String> SOURCES = List.of(
            "Bernreuther:1981sg", "Larin:1994va", "Chetyrkin:1997sg", "Chetyrkin:1997un", "Schroder:2005hy");

    private static final List<Formula> FORMULAS = List.of(
            Formula.parse("0"),
            Formula.parse("11/72"),
            Formula.parse("564731/124416 - 82043/27648*zeta(3) - 2633/31104*nl"),
            Formula.parse("5.170347 + nl*(-4770941/2239488 + 685/124416*ln(2)^4 - 685/20736*zeta(2)*ln(2)^2"
                    + " + 3645913/995328*zeta(3) - 541549/165888*zeta(4) + 115/576*zeta(5)"
                    + " + 685/5184*polylog(4,1/2)) + nl^2*(-271883/4478976 + 167/5184*zeta(3))"));

    private Decoupling() {}

    /**
     * d_1 .. d_k.
     *
     * @param nl    massless flavours below the heavy quark, 0 to 15
     * @param order k, 0 to 4
     * @throws DomainException outside these ranges
     */
    public static List<ExactConstant> atMass(int nl, int order) {
        if (nl < 0 || nl >= BetaFunction.LARGEST_NF) {
            throw new DomainException("decoupling needs between 0 and " + (BetaFunction.LARGEST_NF - 1)
                    + " light flavours, got " + nl);
        }
        if (order < 0 || order > LARGEST_ORDER) {
            throw new DomainException("decoupling is known to order " + LARGEST_ORDER + " in alpha_s/pi, got " + order);
        }
        List<ExactConstant> values = new ArrayList<>();
        for (int k = 1; k <= order; k++) {
            values.add(ConstantValue.of(FORMULAS.get(k - 1), Map.of("nl", ExactConstant.of(nl))));
        }
        return values;
    }

    /**
     * e_1 .. e_k of the way back, alpha^(nl+1)/alpha^(nl) = 1 + sum e_k (alpha^(nl)/pi)^k.
     *
     * @throws DomainException as {@link #atMass}
     */
    public static List<ExactConstant> atMassInverse(int nl, int order) {
        List<ExactConstant> d = atMass(nl, order);
        // With A = B(1 + e(B)) and B = A(1 + d(A)): (1 + e)(1 + sum_k d_k B^k (1 + e)^k) = 1, solved order by order.
        CoefficientwiseAlgebra<ExactConstant> algebra = CoefficientwiseAlgebra.of(ExactRing.INSTANCE, order + 1);
        List<ExactConstant> factor = new ArrayList<>(List.of(ExactConstant.ONE));
        for (int n = 1; n <= order; n++) {
            LaurentSeries<ExactConstant> ratio = algebra.series(0, factor);
            LaurentSeries<ExactConstant> power = ratio;
            ExactConstant known = ExactConstant.ZERO;
            for (int k = 1; k <= n; k++) {
                power = algebra.multiply(power, ratio);
                known = known.add(d.get(k - 1).multiply(algebra.coefficient(power, n - k)));
            }
            factor.add(known.negate());
        }
        return factor.subList(1, factor.size());
    }
}
