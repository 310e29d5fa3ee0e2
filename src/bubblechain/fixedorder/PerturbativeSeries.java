package bubblechain.fixedorder;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.qcd.BetaFunction;
import bubblechain.qcd.Coupling;
import bubblechain.qcd.Decoupling;
import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * A published or user series f = prefactor x sum_{n>=1} c_n coupling^n, c_n a polynomial in {@code nf}, the number of
 * massless flavours (nl for a heavy quark). MS-bar. Immutable.
 *
 * @param name         short name, used on the command line
 * @param title        heading
 * @param quantity     what f is, in words: "M/mbar(mbar) - 1"
 * @param scale        scale of the coupling, in words: "mbar"
 * @param coupling     the expansion parameter
 * @param heavyFlavours 0 if the coupling has {@code nf} flavours, 1 if it has {@code nf + 1} with the heavy quark,
 *                     converted at mu = mbar(mbar)
 * @param flavours     allowed flavour numbers
 * @param prefactor    prefactor as a formula in {@code nf}, 1 if nothing is taken out
 * @param power        p = 2 u0 of the leading singularity, not zero
 * @param prescription what was left out or chosen where the series is not unique, in words, such as the scale of an
 *                     ultrasoft logarithm; empty if there is nothing to choose
 * @param coefficients c_1, c_2, ...
 * @param singularities what is known of each singularity
 * @param sources      bibliography keys of the series as a whole
 * @param cautions     what the reader must know
 */
public record PerturbativeSeries(
        String name,
        String title,
        String quantity,
        String scale,
        Coupling coupling,
        int heavyFlavours,
        FlavourRange flavours,
        Formula prefactor,
        Rational power,
        Optional<String> prescription,
        List<SeriesCoefficient> coefficients,
        List<Singularity> singularities,
        List<String> sources,
        List<String> cautions) {

    public PerturbativeSeries {
        coefficients = List.copyOf(coefficients);
        singularities = List.copyOf(singularities);
        sources = List.copyOf(sources);
        cautions = List.copyOf(cautions);
        if (coefficients.isEmpty()) {
            throw new DomainException("series '" + name + "' has no coefficients; give at least one");
        }
        if (power.isZero()) {
            throw new DomainException("series '" + name + "' has power 0; give p = 2 u0 of its leading singularity");
        }
        if (heavyFlavours < 0 || heavyFlavours > 1) {
            throw new DomainException("the coupling may have 0 or 1 heavy flavours, got " + heavyFlavours);
        }
    }

    /** Number of known coefficients. */
    public int loops() {
        return coefficients.size();
    }

    /** c_n. @param loops n, from 1 to {@link #loops} @throws DomainException outside that range */
    public SeriesCoefficient coefficient(int loops) {
        if (loops < 1 || loops > loops()) {
            throw new DomainException("series '" + name + "' is known to " + loops()
                    + (loops() == 1 ? " loop" : " loops") + "; ask for 1 to " + loops() + ", got " + loops);
        }
        return coefficients.get(loops - 1);
    }

    /** The value of c_n. @throws DomainException if n or nf is out of range */
    public ExactConstant value(int loops, int nf) {
        flavours.check(name, nf);
        return evaluate(coefficient(loops).value(), nf);
    }

    /** The independent errors of c_n, as one standard deviation each. */
    public List<ExactConstant> errors(int loops, int nf) {
        flavours.check(name, nf);
        return coefficient(loops).errors().stream().map(e -> evaluate(e, nf)).toList();
    }

    /** The prefactor at a flavour number. */
    public ExactConstant prefactor(int nf) {
        flavours.check(name, nf);
        return evaluate(prefactor, nf);
    }

    private static ExactConstant evaluate(Formula formula, int nf) {
        return ConstantValue.of(formula, Map.of("nf", ExactConstant.of(nf)));
    }

    /** All coefficients with their errors, in {@link #coupling} with {@code nf + heavyFlavours} flavours. */
    public UncertainSeries at(int nf) {
        List<ExactConstant> values = new ArrayList<>();
        List<List<ExactConstant>> errors = new ArrayList<>();
        for (int n = 1; n <= loops(); n++) {
            values.add(value(n, nf));
            for (ExactConstant error : errors(n, nf)) {
                if (!error.isZero()) {
                    List<ExactConstant> source = new ArrayList<>(Collections.nCopies(loops(), ExactConstant.ZERO));
                    source.set(n - 1, error);
                    errors.add(source);
                }
            }
        }
        return new UncertainSeries(values, errors);
    }

    /** All coefficients in another unit of the same coupling; {@code a} uses beta0 with {@code nf} flavours. */
    public UncertainSeries at(int nf, Coupling unit) {
        return at(nf).inUnits(coupling.inUnitsOf(unit, BetaFunction.of(nf).beta0()));
    }

    /**
     * All coefficients in alpha_s^(nf + heavy)/pi and its powers, whatever the series is written in; a change of the
     * number of flavours is made at mu = mbar(mbar) with the known decoupling, so it needs a heavy quark of that mass
     * and the coupling at that scale.
     *
     * @param heavy 0 or 1
     * @throws DomainException if nf is out of range, or more terms are known than the decoupling can convert
     */
    public UncertainSeries inAlphaOverPi(int nf, int heavy) {
        UncertainSeries own = at(nf, Coupling.ALPHA_OVER_PI);
        if (heavy == heavyFlavours) {
            return own;
        }
        List<ExactConstant> relation =
                heavy == 1 ? Decoupling.atMass(nf, order(own)) : Decoupling.atMassInverse(nf, order(own));
        return own.map(list -> CouplingSubstitution.apply(list, relation));
    }

    private static int order(UncertainSeries series) {
        return series.loops() - 1;
    }

    /**
     * The coefficients of nf^0, nf^1, ... in c_n, exact. The last entry is not zero.
     *
     * @throws DomainException if c_n is not a polynomial in nf of degree n or less
     */
    public List<ExactConstant> flavourCoefficients(int loops) {
        Formula value = coefficient(loops).value();
        return FlavourPolynomial.coefficients(nf -> evaluate(value, nf), loops)
                .orElseThrow(() -> new DomainException("coefficient " + loops + " of series '" + name
                        + "' is not a polynomial in nf of degree " + loops + " or less"));
    }

    /** The coefficient of nf^(n-1) in c_n, which a bubble chain reproduces. */
    public ExactConstant leadingFlavourCoefficient(int loops) {
        List<ExactConstant> polynomial = flavourCoefficients(loops);
        return loops <= polynomial.size() ? polynomial.get(loops - 1) : ExactConstant.ZERO;
    }

    /** The declared singularity with this p = 2 u0. */
    public Optional<Singularity> singularity(Rational p) {
        return singularities.stream().filter(s -> s.power().equals(p)).findFirst();
    }

    /**
     * What is expanded in what: "M/mbar(mbar) - 1 in alpha_s^(3)(mbar)/pi", and the prescription if there is one.
     *
     * @param couplingFlavours flavours of the coupling
     */
    public String inWordsWith(int couplingFlavours) {
        return quantity + " in " + coupling.words(couplingFlavours, scale)
                + prescription.map(words -> "; " + words).orElse("");
    }

    /** The same in the coupling of the series at {@code nf} massless flavours. */
    public String inWords(int nf) {
        return inWordsWith(nf + heavyFlavours);
    }

    /**
     * Refuses two series whose numbers cannot be set side by side because they are made with different prescriptions. A
     * series without a prescription goes with every other.
     *
     * @throws DomainException if both have a prescription and the two differ
     */
    public void requireSamePrescription(PerturbativeSeries other) {
        if (prescription.isPresent() && other.prescription.isPresent() && !prescription.equals(other.prescription)) {
            throw new DomainException("the series '" + name + "' and '" + other.name + "' cannot be compared: the first has the"
                    + " prescription '" + prescription.get() + "', the second '" + other.prescription.get()
                    + "'; use series with the same one");
        }
    }

    /** True if the coefficients are given at one number of flavours only, so that their terms in nf are not known. */
    public boolean isForOneFlavourNumber() {
        return flavours.from() == flavours.to();
    }

    /** Bibliography keys of the series and its first {@code loops} coefficients, without duplicates. */
    public List<String> sources(int loops) {
        Set<String> keys = new LinkedHashSet<>(sources);
        coefficients.stream().limit(loops).forEach(c -> keys.addAll(c.sources()));
        return List.copyOf(keys);
    }
}
