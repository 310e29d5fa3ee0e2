package bubblechain.analytic;

import bubblechain.analytic.RealRoots.Interval;
import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedSet;
import java.util.TreeSet;

/**
 * Where a normal form can be singular: a finite superset of the poles in a range, from the arguments of its gamma and
 * polygamma functions and the roots of its denominators, and the poles that exact expansion finds there.
 */
public final class SingularityList {
    /** Candidates a range may contain. */
    public static final int CANDIDATE_LIMIT = 5_000;

    /** Candidates times terms that are expanded for one list: some seconds. */
    private static final int WORK_LIMIT = 200_000;

    private static final int BITS = 256;
    private static final int ROOT_BITS = 300;

    private final NormalForm form;
    private final Polynomial radical;

    private SingularityList(NormalForm form) {
        this.form = form;
        Polynomial product = Polynomial.ONE;
        for (RationalFunction factor : form.terms().values()) {
            Polynomial denominator = factor.denominator();
            product = product.multiply(denominator.divideExactly(denominator.gcd(product)));
        }
        this.radical = product.isConstant()
                ? Polynomial.ONE
                : product.divideExactly(product.gcd(product.derivative()));
    }

    public static SingularityList of(NormalForm form) {
        return new SingularityList(form);
    }

    /**
     * Every rational point in [from, to] at which some term is singular, in increasing order.
     *
     * @throws DomainException if there are more than {@link #CANDIDATE_LIMIT}
     */
    public SortedSet<Rational> candidates(Rational from, Rational to) {
        SortedSet<Rational> points = new TreeSet<>();
        for (TermKey key : form.terms().keySet()) {
            key.gammas().forEach((gamma, power) -> {
                if (power > 0) {
                    addPoles(gamma.shift(), gamma.slope(), from, to, points);
                }
            });
            key.polygammas().keySet().forEach(p -> addPoles(p.shift(), p.slope(), from, to, points));
            key.units().keySet().forEach(w -> {
                addPoles(w.shift(), w.slope(), from, to, points);
                addPoles(w.shift().subtract(Rational.HALF), w.slope(), from, to, points);
            });
        }
        for (Interval root : RealRoots.of(radical)) {
            if (root.isPoint() && root.lower().compareTo(from) >= 0 && root.lower().compareTo(to) <= 0) {
                points.add(root.lower());
            }
        }
        return points;
    }

    private static DomainException tooMany(Rational from, Rational to) {
        return new DomainException("the range from " + from + " to " + to + " may hold more than " + CANDIDATE_LIMIT
                + " poles; ask for a smaller one");
    }

    /** The points u with shift + slope u = 0, -1, -2, ... */
    private static void addPoles(
            Rational shift, Rational slope, Rational from, Rational to, SortedSet<Rational> points) {
        Rational first = slope.signum() > 0 ? to : from;
        Rational last = slope.signum() > 0 ? from : to;
        // argument at `first` is the largest, at `last` the smallest in the range
        BigInteger highest = shift.add(slope.multiply(first)).floor().min(BigInteger.ZERO);
        BigInteger lowest = shift.add(slope.multiply(last)).ceiling();
        if (highest.subtract(lowest).compareTo(BigInteger.valueOf(CANDIDATE_LIMIT)) > 0) {
            throw tooMany(from, to);
        }
        for (BigInteger m = highest; m.compareTo(lowest) >= 0; m = m.subtract(BigInteger.ONE)) {
            points.add(Rational.of(m).subtract(shift).divide(slope));
            if (points.size() > CANDIDATE_LIMIT) {
                throw tooMany(from, to);
            }
        }
    }

    /**
     * The poles at rational points of [from, to], in increasing order.
     *
     * @throws DomainException if there are too many candidates and terms to expand them all
     */
    public List<Pole> poles(Rational from, Rational to) {
        List<Pole> found = new ArrayList<>();
        SortedSet<Rational> candidates = candidates(from, to);
        if ((long) candidates.size() * form.size() > WORK_LIMIT) {
            throw new DomainException("the range from " + from + " to " + to + " holds " + candidates.size()
                    + " possible poles of a sum of " + form.size() + " terms; ask for a smaller range");
        }
        for (Rational point : candidates) {
            Pole.of(form, point).ifPresent(found::add);
        }
        return found;
    }

    /** The poles at irrational real roots of denominators between {@code from} and {@code to}. */
    public List<AlgebraicPole> algebraicPoles(Rational from, Rational to) {
        List<AlgebraicPole> found = new ArrayList<>();
        Rational width = Rational.of(BigInteger.ONE, BigInteger.ONE.shiftLeft(ROOT_BITS));
        for (Interval root : RealRoots.of(radical)) {
            if (!root.isPoint()) {
                Interval narrow = RealRoots.refine(radical, root, width);
                if (narrow.lower().compareTo(from) >= 0 && narrow.upper().compareTo(to) <= 0) {
                    algebraicPole(root, narrow).ifPresent(found::add);
                }
            }
        }
        return found;
    }

    private Optional<AlgebraicPole> algebraicPole(Interval isolating, Interval narrow) {
        int order = 0;
        Polynomial polynomial = radical;
        for (RationalFunction factor : form.terms().values()) {
            List<Polynomial> factors = RealRoots.squarefreeFactors(factor.denominator());
            for (int k = factors.size(); k > order; k--) {
                if (changesSign(factors.get(k - 1), narrow)) {
                    order = k;
                    polynomial = factors.get(k - 1);
                }
            }
        }
        if (order == 0) {
            return Optional.empty();
        }
        Ball leading = leadingCoefficient(narrow, order);
        PoleStatus status = leading.containsZero() ? PoleStatus.ORDER_NOT_PROVED : PoleStatus.CERTIFIED;
        return Optional.of(
                new AlgebraicPole(polynomial, isolating.lower(), isolating.upper(), order, status, leading));
    }

    private static boolean changesSign(Polynomial polynomial, Interval interval) {
        return polynomial.valueAt(interval.lower()).signum() * polynomial.valueAt(interval.upper()).signum() < 0;
    }

    /** Terms with denominator (u - u0)^m e(u), e(u0) = d^(m)(u0)/m!, contribute numerator times functions over e(u0). */
    private Ball leadingCoefficient(Interval narrow, int order) {
        Rational middle = narrow.lower().add(narrow.upper()).divide(2);
        Ball root = Ball.of(middle, narrow.width(), BITS);
        Ball sum = Ball.ZERO;
        for (Map.Entry<TermKey, RationalFunction> term : form.terms().entrySet()) {
            List<Polynomial> factors = RealRoots.squarefreeFactors(term.getValue().denominator());
            if (factors.size() < order || !changesSign(factors.get(order - 1), narrow)) {
                continue;
            }
            Polynomial derivative = term.getValue().denominator();
            for (int k = 0; k < order; k++) {
                derivative = derivative.derivative();
            }
            Ball rest = derivative
                    .valueAt(root, BITS)
                    .divide(Rational.of(ExactFunctions.factorial(order)), BITS);
            Ball numerator = term.getValue().numerator().valueAt(root, BITS);
            Ball functions = TermValue.of(term.getKey(), root, BITS);
            sum = sum.add(numerator.divide(rest, BITS).multiply(functions, BITS), BITS);
        }
        return sum;
    }

    /** Pairs of complex roots of the denominators; empty for almost every kernel. */
    public List<ComplexRoots.Pair> complexRoots() {
        return ComplexRoots.of(radical);
    }
}
