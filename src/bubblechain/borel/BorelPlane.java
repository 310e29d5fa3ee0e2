package bubblechain.borel;

import bubblechain.analytic.AlgebraicPole;
import bubblechain.analytic.AnalyticFunction;
import bubblechain.analytic.ComplexRoots;
import bubblechain.analytic.NormalForm;
import bubblechain.analytic.Pole;
import bubblechain.analytic.SingularityList;
import bubblechain.chain.Scales;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The singularities of B(u) of a kernel at given scales. The subtraction of a renormalised quantity is entire, so all of
 * them come from T(u); a pole of T at u = 0 is taken away by it and never listed.
 */
public final class BorelPlane {
    /** Radius up to which the nearest singularity is looked for. */
    private static final Rational SEARCH_LIMIT = Rational.of(12);

    private final Kernel kernel;
    private final NormalForm form;
    private final SingularityList singularities;

    private BorelPlane(Kernel kernel, NormalForm form) {
        this.kernel = kernel;
        this.form = form;
        this.singularities = SingularityList.of(form);
    }

    /**
     * The Borel plane of a kernel.
     *
     * @throws bubblechain.analytic.InadmissibleFormulaException if its singularities cannot be listed exactly
     */
    public static BorelPlane of(Kernel kernel, Scales scales) {
        Optional<AnalyticFunction> transform =
                kernel.transform().map(t -> t.timesExponential(scales.couplingLog()));
        return new BorelPlane(
                kernel, transform.map(AnalyticFunction::requireNormalForm).orElse(NormalForm.ZERO));
    }

    public Kernel kernel() {
        return kernel;
    }

    /** e^(L u) T(u) in normal form; zero for an anomalous dimension. */
    NormalForm form() {
        return form;
    }

    /**
     * The poles at rational points with from &lt;= u &lt;= to, in increasing order.
     *
     * @throws DomainException if the range is empty or holds too many candidates
     */
    public List<BorelPole> poles(Rational from, Rational to) {
        requireRange(from, to);
        List<BorelPole> found = new ArrayList<>();
        for (Pole pole : singularities.poles(from, to)) {
            if (!pole.point().isZero()) {
                found.add(new BorelPole(pole, kernel.note(pole.point())));
            }
        }
        return found;
    }

    /** The pole at u, if there is one. */
    public Optional<BorelPole> poleAt(Rational u) {
        return u.isZero() ? Optional.empty() : Pole.of(form, u).map(pole -> new BorelPole(pole, kernel.note(u)));
    }

    /** Poles at irrational real points. */
    public List<AlgebraicPole> algebraicPoles(Rational from, Rational to) {
        requireRange(from, to);
        return singularities.algebraicPoles(from, to);
    }

    /** Pairs of complex poles of the rational factors, approximately. */
    public List<ComplexRoots.Pair> complexPoles() {
        return singularities.complexRoots();
    }

    /** Rational points of the range at which single terms are singular but B(u) is regular. */
    public List<Rational> regularCandidates(Rational from, Rational to) {
        requireRange(from, to);
        List<Rational> regular = new ArrayList<>();
        for (Rational point : singularities.candidates(from, to)) {
            if (point.isZero() || Pole.of(form, point).isEmpty()) {
                regular.add(point);
            }
        }
        return regular;
    }

    /** The pole with u &gt; 0 nearest to the origin. */
    public Optional<BorelPole> leadingInfrared() {
        return poles(Rational.ZERO, SEARCH_LIMIT).stream().findFirst();
    }

    /** The pole with u &lt; 0 nearest to the origin. */
    public Optional<BorelPole> leadingUltraviolet() {
        List<BorelPole> found = poles(SEARCH_LIMIT.negate(), Rational.ZERO);
        return found.isEmpty() ? Optional.empty() : Optional.of(found.get(found.size() - 1));
    }

    private static void requireRange(Rational from, Rational to) {
        if (from.compareTo(to) > 0) {
            throw new DomainException("the range from " + from + " to " + to + " is empty; --from must not exceed --to");
        }
    }

    /** The residue in closed form at a simple pole. */
    public Optional<ExactConstant> residueAt(Rational u) {
        return poleAt(u).filter(p -> p.pole().order() == 1).map(p -> p.pole().residue());
    }
}
