package bubblechain.borel;

import bubblechain.analytic.AlgebraicPole;
import bubblechain.analytic.AnalyticFunction;
import bubblechain.analytic.ComplexRoots;
import bubblechain.analytic.InadmissibleFormulaException;
import bubblechain.analytic.NormalForm;
import bubblechain.analytic.Pole;
import bubblechain.analytic.SingularityList;
import bubblechain.chain.Scales;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.formula.FormulaException;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.SingularityNote;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The singularities of B(u) of a kernel at given scales. The subtraction of a renormalised quantity is entire, so all of
 * them come from T(u); a pole of T at u = 0 is taken away by it and never listed.
 */
public final class BorelPlane {
    /** Radius up to which the nearest singularity is looked for. */
    public static final int SEARCH_LIMIT = 12;

    /** Increasing radii, so that a dense sequence of poles is not listed in full to find the first. */
    private static final List<Rational> SEARCH_LIMITS =
            List.of(Rational.of(1, 4), Rational.ONE, Rational.of(3), Rational.of(SEARCH_LIMIT));

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
     * @throws FormulaException if its singularities cannot be listed exactly, with the place in T(u)
     */
    public static BorelPlane of(Kernel kernel, Scales scales) {
        Optional<AnalyticFunction> transform =
                kernel.transform().map(t -> t.timesExponential(scales.couplingLog()));
        try {
            return new BorelPlane(
                    kernel, transform.map(AnalyticFunction::requireNormalForm).orElse(NormalForm.ZERO));
        } catch (InadmissibleFormulaException e) {
            throw e.in("the poles of the kernel " + kernel.name() + " cannot be listed, its coefficients can; T(u), ");
        }
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

    /** Points, u = 0 left out, outside which no rational pole lies in the range; IR or UV is known without looking. */
    List<Rational> candidates(Rational from, Rational to) {
        return singularities.candidates(from, to).stream().filter(u -> !u.isZero()).toList();
    }

    /** What a pole at u would be. */
    SingularityNote.Kind kindAt(Rational u) {
        return BorelPole.kindAt(u, kernel.note(u));
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

    /** The pole with u &gt; 0 nearest to the origin, if there is one up to {@link #SEARCH_LIMIT}. */
    public Optional<BorelPole> leadingInfrared() {
        return SEARCH_LIMITS.stream()
                .map(limit -> poles(Rational.ZERO, limit))
                .filter(found -> !found.isEmpty())
                .map(found -> found.get(0))
                .findFirst();
    }

    /** The pole with u &lt; 0 nearest to the origin, if there is one up to {@link #SEARCH_LIMIT}. */
    public Optional<BorelPole> leadingUltraviolet() {
        return SEARCH_LIMITS.stream()
                .map(limit -> poles(limit.negate(), Rational.ZERO))
                .filter(found -> !found.isEmpty())
                .map(found -> found.get(found.size() - 1))
                .findFirst();
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
