package bubblechain.borel;

import bubblechain.analytic.AlgebraicPole;
import bubblechain.analytic.PoleStatus;
import bubblechain.chain.Scales;
import bubblechain.exact.DomainException;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.SingularityNote.Kind;
import bubblechain.report.Value;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Supplier;

/**
 * The infrared and the ultraviolet pole of B(u) nearest to the origin on the real axis. They are looked for in growing
 * ranges, and only until one of each kind is found, so that the poles of a whole library are there at once.
 */
public final class NearestPoles {
    private static final List<Rational> LIMITS = List.of(
            Rational.of(1, 4), Rational.ONE, Rational.of(3), Rational.of(BorelPlane.SEARCH_LIMIT));
    private static final int POSITION_DIGITS = 10;
    /** Points at which the function is expanded before the search is given up. */
    private static final int MOST_EXPANSIONS = 500;

    /**
     * A pole and what a list says of it.
     *
     * @param u      its position: exact if rational, else a decimal number
     * @param order  the order of the pole
     * @param status how far the order is known
     */
    public record Nearest(Value u, int order, PoleStatus status) {
        /** "3" for a simple pole, else "3 double". */
        public String inWords() {
            String place = u instanceof Value.Exact exact ? exact.formula() : ((Value.Numeral) u).decimal();
            return switch (order) {
                case 1 -> place;
                case 2 -> place + " double";
                case 3 -> place + " triple";
                default -> place + " of order " + order;
            };
        }
    }

    /** A point at which there may be a pole. */
    private record Candidate(Rational away, Kind kind, Supplier<Optional<Nearest>> pole) {}

    private final BorelPlane plane;
    private final Map<Kind, Nearest> found = new EnumMap<>(Kind.class);
    private Rational searched = Rational.ZERO;
    private int expansions;

    private NearestPoles(BorelPlane plane) {
        this.plane = plane;
    }

    /**
     * The nearest poles of a kernel at its natural scale; an anomalous dimension has none.
     *
     * @throws bubblechain.formula.FormulaException if its poles cannot be listed exactly
     */
    public static NearestPoles of(Kernel kernel) {
        NearestPoles nearest = new NearestPoles(BorelPlane.of(kernel, Scales.NATURAL));
        nearest.search();
        return nearest;
    }

    private void search() {
        for (Rational limit : LIMITS) {
            Optional<List<Candidate>> candidates = candidates(limit);
            if (candidates.isEmpty()) {
                return;
            }
            for (Candidate candidate : candidates.get()) {
                if (!found.containsKey(candidate.kind())) {
                    if (++expansions > MOST_EXPANSIONS) {
                        return;
                    }
                    candidate.pole().get().ifPresent(pole -> found.put(candidate.kind(), pole));
                }
            }
            searched = limit;
            if (found.size() == Kind.values().length) {
                return;
            }
        }
    }

    /** The candidates not yet looked at with |u| up to a limit, the nearest first; empty if there are too many. */
    private Optional<List<Candidate>> candidates(Rational limit) {
        List<Candidate> candidates = new ArrayList<>();
        try {
            for (Rational u : plane.candidates(limit.negate(), limit)) {
                candidates.add(new Candidate(u.abs(), plane.kindAt(u), () -> plane.poleAt(u).map(NearestPoles::rational)));
            }
        } catch (DomainException tooMany) {
            return Optional.empty();
        }
        for (AlgebraicPole pole : plane.algebraicPoles(limit.negate(), limit)) {
            RootInterval root = RootInterval.of(pole, POSITION_DIGITS);
            Kind kind = root.upper().signum() > 0 ? Kind.IR : Kind.UV;
            candidates.add(new Candidate(root.lower().abs(), kind, () -> Optional.of(irrational(pole, root))));
        }
        return Optional.of(candidates.stream()
                .filter(candidate -> candidate.away().compareTo(searched) > 0)
                .sorted(Comparator.comparing(Candidate::away))
                .toList());
    }

    private static Nearest rational(BorelPole pole) {
        return new Nearest(Value.exact(pole.u().toString()), pole.pole().order(), pole.pole().status());
    }

    private static Nearest irrational(AlgebraicPole pole, RootInterval root) {
        return new Nearest(root.decimal(POSITION_DIGITS), pole.order(), pole.status());
    }

    public Optional<Nearest> infrared() {
        return Optional.ofNullable(found.get(Kind.IR));
    }

    public Optional<Nearest> ultraviolet() {
        return Optional.ofNullable(found.get(Kind.UV));
    }

    /** How far was looked: a pole that was not found is not there with |u| up to this. */
    public Rational searchedTo() {
        return searched;
    }

    /** The weaker status of the two; empty if neither was found. */
    public Optional<PoleStatus> status() {
        return found.values().stream().map(Nearest::status).max(Comparator.naturalOrder());
    }
}
