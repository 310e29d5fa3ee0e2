package bubblechain.kernel;

import bubblechain.analytic.AnalyticFunction;
import bubblechain.exact.Rational;
import bubblechain.qcd.Theory;
import java.util.List;
import java.util.Optional;

/**
 * One quantity in the large-beta0 limit.
 *
 * @param name         lower case with hyphens
 * @param title        one line
 * @param quantity     what the series is of, such as "M/mbar(mbar) - 1"
 * @param scale        symbol of the hard scale, such as "m", "Q", "1/r"
 * @param theory       gauge theory
 * @param prefactor    f = prefactor x sum c_n a^(n+1)
 * @param massDimension dimension of the quantity in units of mass
 * @param form         how the file gives it
 * @param origin       what T(u) and the subtraction are made from, in words: the diagram, or the parts of a combination
 * @param transform    T(u) at mu = scale, with every singularity of B(u); empty if the quantity is an anomalous
 *                     dimension, whose Borel transform is entire
 * @param anomalousDimension gamma(a) in d ln O/d ln mu = prefactor x a gamma(a); the quantity itself if there is no T(u)
 * @param sudakov    instead of the anomalous dimension, what subtracts a quantity with double logarithms
 * @param definingEquation what the anomalous dimension is, such as "d ln(M/mbar(mu))/d ln mu = CF/beta0 * a * gamma(a)"
 * @param heavyQuark   true if the scale is the mass of a quark heavier than those in the bubbles, so that the coupling may
 *                     count that quark too
 * @param series       name of the QCD series it mimics
 * @param singularities what is known of single singularities
 * @param sources      bibliography keys
 * @param cautions     shown with every number
 * @param checks       numbers to be reproduced
 */
public record Kernel(
        String name,
        String title,
        String quantity,
        String scale,
        Theory theory,
        Prefactor prefactor,
        Rational massDimension,
        KernelForm form,
        Optional<String> origin,
        Optional<AnalyticFunction> transform,
        Optional<AnalyticFunction> anomalousDimension,
        Optional<SudakovSubtraction> sudakov,
        Optional<String> definingEquation,
        boolean heavyQuark,
        Optional<String> series,
        List<SingularityNote> singularities,
        List<String> sources,
        List<String> cautions,
        List<KernelCheck> checks) {
    public Kernel {
        singularities = List.copyOf(singularities);
        sources = List.copyOf(sources);
        cautions = List.copyOf(cautions);
        checks = List.copyOf(checks);
    }

    /** True if the quantity is an anomalous dimension: no singularity at all in the Borel plane. */
    public boolean isAnomalousDimension() {
        return transform.isEmpty();
    }

    /** True if a subtraction makes the quantity finite, so that it has an anomalous dimension. */
    public boolean isRenormalised() {
        return anomalousDimension.isPresent() || sudakov.isPresent();
    }

    /**
     * The anomalous dimension as a quantity of its own.
     *
     * @throws KernelException if there is none
     */
    public Kernel anomalousDimensionAsKernel() {
        if (!isRenormalised()) {
            throw new KernelException("the kernel " + name + " has no anomalous dimension");
        }
        if (isAnomalousDimension()) {
            return this;
        }
        String derivative = definingEquation
                .map(equation -> equation.substring(0, equation.indexOf('=')).strip())
                .orElse("d ln O/d ln mu (O: " + quantity + ")");
        return new Kernel(
                name, "Anomalous dimension of: " + title, derivative, "mu", theory, prefactor, Rational.ZERO, form, origin,
                Optional.empty(), anomalousDimension, sudakov, definingEquation, false, Optional.empty(), List.of(), sources,
                List.of(), List.of());
    }

    /** The note on the singularity at u, if there is one. */
    public Optional<SingularityNote> note(Rational u) {
        return singularities.stream().filter(s -> s.u().equals(u)).findFirst();
    }
}
