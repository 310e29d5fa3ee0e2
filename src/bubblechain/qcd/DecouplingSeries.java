package bubblechain.qcd;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/**
 * Decoupling of a heavy quark at any scale mu, for the MS-bar coupling and for the MS-bar masses of lighter quarks:
 * <pre>
 *   alpha_s^(nl)(mu)/alpha_s^(nl+1)(mu) = 1 + sum_{k>=1} a^k sum_{j<=k} z_kj L^j
 *   m^(nl)(mu)/m^(nl+1)(mu)             = 1 + sum_{k>=2} a^k sum_{j<=k} m_kj L^j
 * </pre>
 * with a = alpha_s^(nl+1)(mu)/pi and L = ln(mu^2/mass^2), mass being mbar(mbar) or the pole mass ({@link HeavyMass}).
 * Known through k = 4 (four loops).
 *
 * <p>The constants at mu = mbar(mbar) are published ({@link Decoupling#atMass} and {@link #massAtMass}); the logarithms
 * follow from the renormalisation group on both sides, since these masses do not depend on mu; those of the pole mass from
 * M = mbar (1 + c_1 a + c_2 a^2 + c_3 a^3). All this is exact algebra on the constants; derived here.
 *
 * <p>Errors: z_40 at nl^0 is the decimal 5.170347, good to about 0.001. m_40 is
 * quoted as 6.850 - 1.466 nl + 0.05616 nl^2; the nl^2 part is replaced by its exact value from one chain of bubbles, derived
 * here, which agrees, the others are untested. The series is the truncated one: nothing is said about higher orders.
 *
 * <p>Sources: {@link Decoupling#SOURCES}, {@link #MASS_SOURCES} and {@link #POLE_MASS_SOURCES}, all from memory.
 */
public final class DecouplingSeries {
    /** Bibliography keys of the decoupling of masses; status: from memory. */
    public static final List<String> MASS_SOURCES = List.of("Chetyrkin:1997un", "Liu:2015fxa");
    /** Bibliography keys of the pole mass; status: from memory. */
    public static final List<String> POLE_MASS_SOURCES =
            List.of("Tarrach:1980up", "Gray:1990yh", "Melnikov:2000qh", "Chetyrkin:1999qi");

    /** m_k0 at mu = mbar(mbar); the bracket of m_30 with ln(2) and polylog is -B4/36. */
    private static final List<Formula> MASS_CONSTANTS = List.of(
            Formula.parse("0"),
            Formula.parse("89/432"),
            Formula.parse("2951/2916 - 407/864*zeta(3) + 5/4*zeta(4)"
                    + " - (16*polylog(4,1/2) - 13/2*zeta(4) - 4*zeta(2)*ln(2)^2 + 2/3*ln(2)^4)/36"
                    + " + nl*(1327/11664 - 2/27*zeta(3))"),
            Formula.parse("6.850 - 1.466*nl + nl^2*(17671/124416 - 5/864*zeta(3) - 7/96*zeta(4))"));
    /** c_k of M/mbar(mbar) in alpha_s^(nl+1)(mbar)/pi. */
    private static final List<Formula> POLE_MASS = List.of(
            Formula.parse("4/3"),
            Formula.parse("307/32 + pi^2/3 + pi^2/9*ln(2) - zeta(3)/6 + nl*(-71/144 - pi^2/18)"),
            Formula.parse("8481925/93312 + 652841/38880*pi^2 - 695/7776*pi^4 - 575/162*pi^2*ln(2) - 22/81*pi^2*ln(2)^2"
                    + " - 55/162*ln(2)^4 - 220/27*polylog(4,1/2) + 58/27*zeta(3) - 1439/432*pi^2*zeta(3)"
                    + " + 1975/216*zeta(5) + nl*(-231847/23328 - 991/648*pi^2 + 61/1944*pi^4 - 11/81*pi^2*ln(2)"
                    + " + 2/81*pi^2*ln(2)^2 + 1/81*ln(2)^4 + 8/27*polylog(4,1/2) - 241/72*zeta(3))"
                    + " + nl^2*(2353/23328 + 13/324*pi^2 + 7/54*zeta(3))"));

    private final int nl;
    private final HeavyMass definition;
    private final LogarithmSeries coupling;
    private final LogarithmSeries mass;
    private final double[][] couplingNumbers;
    private final double[][] massNumbers;

    private DecouplingSeries(int nl, HeavyMass definition, LogarithmSeries coupling, LogarithmSeries mass) {
        this.nl = nl;
        this.definition = definition;
        this.coupling = coupling;
        this.mass = mass;
        this.couplingNumbers = numbers(coupling);
        this.massNumbers = numbers(mass);
    }

    /**
     * The series for one threshold.
     *
     * @param nl         massless flavours below the heavy quark, 0 to 15
     * @param definition which mass of the heavy quark L contains
     * @param order      highest power of a kept, 0 to 4; running with n loops goes with n - 1
     * @throws DomainException outside these ranges
     */
    public static DecouplingSeries of(int nl, HeavyMass definition, int order) {
        ThresholdLogarithms flow = new ThresholdLogarithms(nl, order);
        LogarithmSeries coupling = flow.coupling(Decoupling.atMass(nl, order));
        LogarithmSeries mass = flow.mass(massAtMass(nl, order), coupling);
        if (definition == HeavyMass.POLE) {
            // at mu = M the logarithm of mbar is ln(M^2/mbar^2); from there on L counts from M
            LogarithmSeries shift = flow.poleMassLogarithm(values(POLE_MASS, nl));
            LogarithmSeries massAtPole = mass.at(shift);
            coupling = flow.coupling(constantTerms(coupling.at(shift)));
            mass = flow.mass(constantTerms(massAtPole), coupling);
        }
        return new DecouplingSeries(nl, definition, coupling, mass);
    }

    /**
     * m_1 .. m_k at mu = mbar(mbar) without logarithm.
     *
     * @param nl    massless flavours below the heavy quark, 0 to 15
     * @param order k, 0 to 4
     * @throws DomainException outside these ranges
     */
    public static List<ExactConstant> massAtMass(int nl, int order) {
        Decoupling.atMass(nl, order); // the same ranges
        return values(MASS_CONSTANTS.subList(0, order), nl);
    }

    /** Flavours below the heavy quark. */
    public int nl() {
        return nl;
    }

    /** The mass in the logarithm L. */
    public HeavyMass definition() {
        return definition;
    }

    /** Highest power of a kept. */
    public int order() {
        return coupling.order();
    }

    /** z_k0, z_k1, ... of the coupling; shorter than k + 1 if the last are zero. @param k 0 to {@link #order} */
    public List<ExactConstant> coupling(int k) {
        return coupling.row(checked(k));
    }

    /** m_k0, m_k1, ... of the mass of a lighter quark. @param k 0 to {@link #order} */
    public List<ExactConstant> mass(int k) {
        return mass.row(checked(k));
    }

    private int checked(int k) {
        if (k < 0 || k > order()) {
            throw new DomainException("this decoupling series has the powers 0 to " + order() + " of alpha_s/pi, got " + k);
        }
        return k;
    }

    /**
     * alpha_s^(nl)/alpha_s^(nl+1), the truncated sum in double precision.
     *
     * @param alphaS    alpha_s^(nl+1)(mu)
     * @param logarithm L = ln(mu^2/mass^2)
     */
    public double couplingRatio(double alphaS, double logarithm) {
        return sum(couplingNumbers, alphaS, logarithm);
    }

    /** m^(nl)/m^(nl+1) of a lighter quark, as {@link #couplingRatio}. */
    public double massRatio(double alphaS, double logarithm) {
        return sum(massNumbers, alphaS, logarithm);
    }

    /** Horner's scheme in a, and in L for each coefficient. */
    private static double sum(double[][] numbers, double alphaS, double logarithm) {
        double a = alphaS / Math.PI;
        double result = 0;
        for (int k = numbers.length - 1; k >= 0; k--) {
            double coefficient = 0;
            for (int j = numbers[k].length - 1; j >= 0; j--) {
                coefficient = coefficient * logarithm + numbers[k][j];
            }
            result = result * a + coefficient;
        }
        return result;
    }

    private static double[][] numbers(LogarithmSeries series) {
        double[][] numbers = new double[series.order() + 1][];
        for (int k = 0; k < numbers.length; k++) {
            numbers[k] = series.row(k).stream().mapToDouble(Numbers::of).toArray();
        }
        return numbers;
    }

    /** The terms without L of a^1, a^2, ... */
    private static List<ExactConstant> constantTerms(LogarithmSeries series) {
        List<ExactConstant> terms = new ArrayList<>();
        for (int k = 1; k <= series.order(); k++) {
            List<ExactConstant> row = series.row(k);
            terms.add(row.isEmpty() ? ExactConstant.ZERO : row.get(0));
        }
        return terms;
    }

    private static List<ExactConstant> values(List<Formula> formulas, int nl) {
        return formulas.stream()
                .map(f -> ConstantValue.of(f, Map.of("nl", ExactConstant.of(nl))))
                .toList();
    }

    /** "decoupling at mbar(mbar), 4 and 5 flavours, to order 3 in alpha_s/pi". */
    @Override
    public String toString() {
        return "decoupling at " + definition.words() + ", " + nl + " and " + (nl + 1) + " flavours, to order " + order()
                + " in alpha_s/pi";
    }
}
