package bubblechain.qcd;

import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.formula.Formula;
import java.util.List;

/**
 * The anomalous dimension of the MS-bar quark mass in QCD with SU(3) and {@code nf} flavours,
 * d ln m/d ln mu = -2 sum_{k>=0} gamma_k y^(k+1), y = alpha_s/(4 pi), through a number of loops; the later coefficients
 * are zero. Exact. gamma_0 = 4.
 *
 * <p>The form d ln m/d ln mu^2 = -sum_k gamma'_k (alpha_s/pi)^(k+1) has gamma'_k = gamma_k/4^(k+1).
 *
 * <p>Sources: {@link #sources}. The formulas are recalled from the papers. Their nf^k terms agree with the all-order
 * result of one chain of bubbles; gamma_1 and gamma_2 with their colour forms; gamma_4 with the published decimals, one
 * rational of its nf^0 part having been settled by these (see reference-values/fixed-order.csv).
 */
public final class MassAnomalousDimension {
    /** Loops known: gamma_0 .. gamma_4. */
    public static final int LARGEST_LOOPS = 5;

    /** gamma_k as a formula in nf. */
    private static final List<Formula> FORMULAS = List.of(
            Formula.parse("4"),
            Formula.parse("202/3 - 20/9*nf"),
            Formula.parse("1249 + (-2216/27 - 160/3*zeta(3))*nf - 140/81*nf^2"),
            Formula.parse("4603055/162 + 135680/27*zeta(3) - 8800*zeta(5)"
                    + " + nf*(-91723/27 - 34192/9*zeta(3) + 880*zeta(4) + 18400/9*zeta(5))"
                    + " + nf^2*(5242/243 + 800/9*zeta(3) - 160/3*zeta(4)) + nf^3*(-332/243 + 64/27*zeta(3))"),
            Formula.parse("99512327/162 + 46402466/243*zeta(3) + 96800*zeta(3)^2 - 698126/9*zeta(4)"
                    + " - 231757160/243*zeta(5) + 242000*zeta(6) + 412720*zeta(7)"
                    + " + nf*(-150736283/1458 - 12538016/81*zeta(3) - 75680/9*zeta(3)^2 + 2038742/27*zeta(4)"
                    + " + 49876180/243*zeta(5) - 638000/9*zeta(6) - 1820000/27*zeta(7))"
                    + " + nf^2*(1320742/729 + 2010824/243*zeta(3) + 46400/27*zeta(3)^2 - 166300/27*zeta(4)"
                    + " - 264040/81*zeta(5) + 92000/27*zeta(6))"
                    + " + nf^3*(91865/1458 + 12848/81*zeta(3) + 448/9*zeta(4) - 5120/27*zeta(5))"
                    + " + nf^4*(-260/243 - 320/243*zeta(3) + 64/27*zeta(4))"));
    /** Bibliography keys per coefficient; status of all: from memory. */
    private static final List<List<String>> SOURCES = List.of(
            List.of("Tarrach:1980up"),
            List.of("Tarrach:1980up"),
            List.of("Tarasov:1982plg", "Larin:1993tq"),
            List.of("Chetyrkin:1997dh", "Vermaseren:1997fq"),
            List.of("Baikov:2014qja"));

    private final LoopCoefficients coefficients;

    private MassAnomalousDimension(LoopCoefficients coefficients) {
        this.coefficients = coefficients;
    }

    /** All {@value #LARGEST_LOOPS} known loops. @throws bubblechain.exact.DomainException if nf is not between 0 and 16 */
    public static MassAnomalousDimension of(int nf) {
        return of(nf, LARGEST_LOOPS);
    }

    /**
     * The first {@code loops} coefficients.
     *
     * @throws bubblechain.exact.DomainException if nf is not between 0 and 16, or loops not between 1 and 5
     */
    public static MassAnomalousDimension of(int nf, int loops) {
        return new MassAnomalousDimension(LoopCoefficients.of("mass anomalous dimension", FORMULAS, nf, loops));
    }

    public int nf() {
        return coefficients.nf();
    }

    /** Number of loops kept. */
    public int loops() {
        return coefficients.loops();
    }

    /** gamma_k, zero beyond the loops kept. @param k at least 0 */
    public ExactConstant gamma(int k) {
        return coefficients.get(k);
    }

    /** gamma_k as a ball. */
    public Ball toBall(int k, int bits) {
        return gamma(k).toBall(bits);
    }

    /** The coefficients kept, gamma_0 first. */
    public List<ExactConstant> coefficients() {
        return coefficients.values();
    }

    /** Bibliography keys of gamma_k. @param k 0 to 4 */
    public static List<String> sources(int k) {
        return SOURCES.get(k);
    }

    /** gamma_k as a formula in {@code nf}. @param k 0 to 4 */
    public static Formula formula(int k) {
        return FORMULAS.get(k);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof MassAnomalousDimension g && coefficients.equals(g.coefficients);
    }

    @Override
    public int hashCode() {
        return coefficients.hashCode();
    }

    /** "5-loop mass anomalous dimension with 3 flavours". */
    @Override
    public String toString() {
        return coefficients.inWords("mass anomalous dimension");
    }
}
