package bubblechain.chain;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.formula.FormulaException;
import bubblechain.kernel.Kernel;
import bubblechain.qcd.Coupling;
import bubblechain.qcd.Normalisation;
import bubblechain.qcd.Theory;
import java.math.BigInteger;
import java.util.Optional;
import java.util.OptionalInt;

/**
 * How a chain is expanded: scales, coupling, normalisation, scheme and flavours, as the user states them.
 *
 * @param muOverScale         scale of the coupling over the kernel's scale; a constant of the formula language
 * @param operatorMuOverScale scale of the operator over the kernel's scale
 * @param coupling            expansion parameter
 * @param normalisation       what is taken out of the coefficients
 * @param scheme              scheme of the coupling
 * @param nf                  massless flavours in the bubbles
 * @param couplingFlavours    flavours of the coupling; nf, or nf + 1 for a heavy-quark quantity
 */
public record ChainOptions(
        String muOverScale,
        String operatorMuOverScale,
        Coupling coupling,
        Normalisation normalisation,
        Scheme scheme,
        OptionalInt nf,
        OptionalInt couplingFlavours) {
    /** Largest number of massless flavours. */
    public static final int LARGEST_NF = 16;

    /** Characters up to which a rational ratio of scales is written out in words. */
    private static final int LONGEST_FACTOR = 12;

    /** mu = scale, coupling a, prefactor taken out, MS-bar. */
    public static final ChainOptions DEFAULT = new ChainOptions(
            "1", "1", Coupling.A, Normalisation.PREFACTOR, Scheme.MSBAR, OptionalInt.empty(), OptionalInt.empty());

    public ChainOptions {
        requireFlavours(nf);
        requireFlavours(couplingFlavours);
    }

    /** The same with another scale of the coupling. */
    public ChainOptions withMu(String value) {
        return new ChainOptions(value, operatorMuOverScale, coupling, normalisation, scheme, nf, couplingFlavours);
    }

    /** The same for a number of massless flavours. */
    public ChainOptions withFlavours(int value) {
        return new ChainOptions(
                muOverScale, operatorMuOverScale, coupling, normalisation, scheme, OptionalInt.of(value), couplingFlavours);
    }

    private static void requireFlavours(OptionalInt nf) {
        if (nf.isPresent() && (nf.getAsInt() < 0 || nf.getAsInt() > LARGEST_NF)) {
            throw new DomainException("the number of flavours lies between 0 and " + LARGEST_NF + ", got " + nf.getAsInt());
        }
    }

    /** The logarithms of the two scales. @throws DomainException if a ratio is not positive or flavours do not fit */
    public Scales scales(Kernel kernel) {
        Scales scales = Scales.of(ratio("--mu-over-scale", muOverScale), ratio("--operator-mu-over-scale", operatorMuOverScale));
        if (!scales.operatorLog().isZero() && (!kernel.isRenormalised() || kernel.isAnomalousDimension())) {
            throw new DomainException("the kernel " + kernel.name() + " has no operator to renormalise;"
                    + " --operator-mu-over-scale must stay 1");
        }
        Scales flavoured = countsHeavyQuark(kernel) ? scales.withHeavyFlavour(kernel, nf.getAsInt()) : scales;
        return scheme == Scheme.V ? flavoured.withVCoupling() : flavoured;
    }

    /** The scales of a coupling that counts the flavours in the bubbles only. */
    Scales scalesWithoutHeavyQuark(Kernel kernel) {
        return new ChainOptions(muOverScale, operatorMuOverScale, coupling, normalisation, scheme, nf, nf).scales(kernel);
    }

    /** A positive constant of the formula language. */
    public static ExactConstant ratio(String option, String text) {
        ExactConstant value;
        try {
            value = ConstantValue.of(Formula.parse(text));
        } catch (FormulaException e) {
            throw e.in(option + ": ");
        }
        Optional<Rational> rational = value.asRational();
        boolean positive = rational.isPresent() ? rational.get().signum() > 0 : value.toBall(128).isPositive();
        if (!positive) {
            throw new DomainException(option + " must be positive, got " + text);
        }
        return value;
    }

    private boolean countsHeavyQuark(Kernel kernel) {
        if (couplingFlavours.isEmpty() || nf.isPresent() && nf.getAsInt() == couplingFlavours.getAsInt()) {
            return false;
        }
        if (nf.isEmpty()) {
            throw new DomainException("--coupling-nf needs --nf, the number of massless flavours in the bubbles");
        }
        if (!kernel.heavyQuark()) {
            throw new DomainException("the kernel " + kernel.name() + " has no heavy quark;"
                    + " --coupling-nf must be equal to --nf");
        }
        if (couplingFlavours.getAsInt() != nf.getAsInt() + 1) {
            throw new DomainException("--coupling-nf is --nf or --nf plus the heavy quark, " + nf.getAsInt() + " or "
                    + (nf.getAsInt() + 1) + ", got " + couplingFlavours.getAsInt());
        }
        requireBeta0(kernel);
        return true;
    }

    private void requireBeta0(Kernel kernel) {
        if (kernel.theory().beta0(nf.getAsInt()).isZero()) {
            throw new DomainException("beta0 is zero for nf = " + nf.getAsInt());
        }
    }

    /** How the coefficients are shown. */
    public Rendering rendering(Kernel kernel) {
        return Rendering.of(kernel, coupling, normalisation, nf);
    }

    /** The scale of the coupling in words, such as "2 m". */
    public String scaleWords(Kernel kernel) {
        return scaled(muOverScale, kernel.scale());
    }

    /** A multiple of a scale in words: "2 m", "m/2", "(3/2) m", "sqrt(8)/r", "1/(2 r)". */
    private static String scaled(String ratio, String scale) {
        Formula formula = Formula.parse(ratio);
        Optional<Rational> value = ConstantValue.of(formula).asRational();
        if (value.isPresent() && value.get().equals(Rational.ONE)) {
            return scale;
        }
        boolean inverse = scale.startsWith("1/");
        if (value.isPresent() && value.get().numerator().equals(BigInteger.ONE)) {
            return inverse ? "1/(" + value.get().inverse() + " " + scale.substring(2) + ")" : scale + "/" + value.get().inverse();
        }
        String factor = value.map(Rational::toString)
                .filter(text -> text.length() <= LONGEST_FACTOR)
                .orElse(formula.print());
        boolean plain = value.map(Rational::isInteger).orElseGet(() -> isFactor(formula));
        String front = plain ? factor : "(" + factor + ")";
        return front + (inverse ? scale.substring(1) : " " + scale);
    }

    /** True if a formula may stand in front of another factor without parentheses. */
    private static boolean isFactor(Formula formula) {
        return !(formula instanceof Formula.Negation)
                && !(formula instanceof Formula.Binary b
                        && b.operator() != Formula.Operator.MULTIPLY
                        && b.operator() != Formula.Operator.POWER);
    }

    /** The coupling in words, such as "alpha_s^(4)(2 m)/pi". */
    public String couplingWords(Kernel kernel) {
        Theory theory = kernel.theory();
        String flavours = couplingFlavours.isPresent()
                ? Integer.toString(couplingFlavours.getAsInt())
                : nf.isPresent() ? Integer.toString(nf.getAsInt()) : "nf";
        String schemeMark = scheme == Scheme.V ? ",V" : "";
        String symbol = theory.coupling() + "^(" + flavours + schemeMark + ")(" + scaleWords(kernel) + ")";
        return coupling.words().replace("alpha_s", symbol);
    }

    /** The name of the coefficients: c_n, or d_n = c_n/c_0. */
    String symbol() {
        return normalisation == Normalisation.FIRST ? "d_n" : "c_n";
    }

    /** The whole convention in one sentence: what is expanded, in what, and what the numbers multiply. */
    public String words(Kernel kernel) {
        String expansion = coupling == Coupling.A ? "a" : "x";
        String meaning = coupling == Coupling.A
                ? couplingWords(kernel)
                : "x = " + couplingWords(kernel);
        String front = normalisation == Normalisation.FULL
                ? ""
                : normalisation == Normalisation.FIRST ? "(first coefficient) " : kernel.prefactor().words() + " ";
        String operator = operatorMuOverScale.equals("1") || !kernel.isRenormalised()
                ? ""
                : "; operator renormalised at " + scaled(operatorMuOverScale, kernel.scale()) + " instead";
        String decoupling = countsHeavyQuark(kernel)
                ? "; the " + couplingFlavours.getAsInt() + "-flavour coupling is decoupled at " + kernel.scale() + ", at one loop"
                : "";
        return kernel.quantity() + " = " + front + "sum_{n>=0} " + symbol() + " " + expansion + "^(n+1), " + meaning + operator
                + decoupling + ", large-beta0 limit" + (scheme == Scheme.V ? ", V-scheme coupling" : ", MS-bar coupling");
    }
}
