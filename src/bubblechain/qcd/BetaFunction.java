package bubblechain.qcd;

import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.formula.Formula;
import java.util.List;

/**
 * The MS-bar beta function of QCD with SU(3) and {@code nf} massless flavours,
 * dy/d ln mu = -2 sum_{k>=0} beta_k y^(k+2), y = alpha_s/(4 pi), through a number of loops; the later coefficients are
 * zero. Exact.
 *
 * <p>The flavour number is limited to 0..{@value #LARGEST_NF}, where beta0 = 11 - 2 nf/3 is positive.
 *
 * <p>Sources: {@link #sources}. The formulas are recalled from the papers; they were checked against the colour forms
 * (beta0 to beta3) and the published decimals (beta4).
 */
public final class BetaFunction {
    /** Loops known: beta_0 .. beta_4. */
    public static final int LARGEST_LOOPS = 5;
    /** The largest flavour number for which beta0 is positive. */
    public static final int LARGEST_NF = 16;

    /** beta_k as a formula in nf. */
    private static final List<Formula> FORMULAS = List.of(
            Formula.parse("11 - 2/3*nf"),
            Formula.parse("102 - 38/3*nf"),
            Formula.parse("2857/2 - 5033/18*nf + 325/54*nf^2"),
            Formula.parse("149753/6 + 3564*zeta(3) - (1078361/162 + 6508/27*zeta(3))*nf"
                    + " + (50065/162 + 6472/81*zeta(3))*nf^2 + 1093/729*nf^3"),
            Formula.parse("8157455/16 + 621885/2*zeta(3) - 88209/2*zeta(4) - 288090*zeta(5)"
                    + " + nf*(-336460813/1944 - 4811164/81*zeta(3) + 33935/6*zeta(4) + 1358995/27*zeta(5))"
                    + " + nf^2*(25960913/1944 + 698531/81*zeta(3) - 10526/9*zeta(4) - 381760/81*zeta(5))"
                    + " + nf^3*(-630559/5832 - 48722/243*zeta(3) + 1618/27*zeta(4) + 460/9*zeta(5))"
                    + " + nf^4*(1205/2916 - 152/81*zeta(3))"));
    /** Bibliography keys per coefficient; status of all: from memory. */
    private static final List<List<String>> SOURCES = List.of(
            List.of("Gross:1973id", "Politzer:1973fx"),
            List.of("Caswell:1974gg", "Jones:1974mm"),
            List.of("Tarasov:1980au", "Larin:1993tp"),
            List.of("vanRitbergen:1997va"),
            List.of("Baikov:2016tgj", "Herzog:2017ohr"));

    private final LoopCoefficients coefficients;

    private BetaFunction(LoopCoefficients coefficients) {
        this.coefficients = coefficients;
    }

    /** All {@value #LARGEST_LOOPS} known loops. @throws DomainException if nf is not between 0 and 16 */
    public static BetaFunction of(int nf) {
        return of(nf, LARGEST_LOOPS);
    }

    /**
     * The first {@code loops} coefficients; one loop is the running of a bubble chain.
     *
     * @throws DomainException if nf is not between 0 and 16, or loops not between 1 and 5
     */
    public static BetaFunction of(int nf, int loops) {
        return new BetaFunction(LoopCoefficients.of("beta function", FORMULAS, nf, loops));
    }

    /** The same flavours with fewer loops. @throws DomainException if there are fewer than that */
    public BetaFunction truncated(int loops) {
        if (loops < 1 || loops > loops()) {
            throw new DomainException("this beta function has " + loops() + " loops; cannot cut it to " + loops);
        }
        return new BetaFunction(new LoopCoefficients(nf(), coefficients.values().subList(0, loops)));
    }

    public int nf() {
        return coefficients.nf();
    }

    /** Number of loops kept. */
    public int loops() {
        return coefficients.loops();
    }

    /** beta_k, zero beyond the loops kept. @param k at least 0 */
    public ExactConstant beta(int k) {
        return coefficients.get(k);
    }

    /** beta_k as a ball. */
    public Ball toBall(int k, int bits) {
        return beta(k).toBall(bits);
    }

    /** beta_0 = 11 - 2 nf/3. */
    public Rational beta0() {
        return rational(0);
    }

    /** beta_1/(2 beta_0^2), the exponent of the coupling in Lambda; zero at one loop. */
    public Rational b1hat() {
        return rational(1).divide(beta0().power(2)).divide(2);
    }

    /** beta_0 and beta_1 have no transcendental part, for every nf. */
    private Rational rational(int k) {
        return beta(k).asRational().orElseThrow();
    }

    /** The coefficients kept, beta_0 first. */
    public List<ExactConstant> coefficients() {
        return coefficients.values();
    }

    /** Bibliography keys of beta_k. @param k 0 to 4 */
    public static List<String> sources(int k) {
        return SOURCES.get(k);
    }

    /** beta_k as a formula in {@code nf}. @param k 0 to 4 */
    public static Formula formula(int k) {
        return FORMULAS.get(k);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof BetaFunction b && coefficients.equals(b.coefficients);
    }

    @Override
    public int hashCode() {
        return coefficients.hashCode();
    }

    /** "5-loop running with 3 flavours". */
    @Override
    public String toString() {
        return coefficients.inWords("running");
    }
}
