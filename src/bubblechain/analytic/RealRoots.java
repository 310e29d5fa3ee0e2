package bubblechain.analytic;

import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.Collections;
import java.util.Comparator;
import java.util.List;
import java.util.Set;

/**
 * The real roots of a squarefree polynomial over Q, isolated by Sturm's theorem: rational ones exactly, the others in
 * intervals with rational ends that contain one root each.
 */
final class RealRoots {
    private final Polynomial polynomial;
    private final List<Polynomial> sturm = new ArrayList<>();

    private RealRoots(Polynomial squarefree) {
        polynomial = squarefree;
        sturm.add(squarefree);
        sturm.add(squarefree.derivative());
        while (!sturm.get(sturm.size() - 1).isZero()) {
            Polynomial remainder = sturm.get(sturm.size() - 2).divideAndRemainder(sturm.get(sturm.size() - 1))[1];
            sturm.add(remainder.isZero() ? remainder : remainder.multiply(remainder.leading().abs().inverse().negate()));
        }
        sturm.remove(sturm.size() - 1);
    }

    /** lower = upper for a rational root, else lower &lt; root &lt; upper. */
    record Interval(Rational lower, Rational upper) {
        boolean isPoint() {
            return lower.equals(upper);
        }

        Rational width() {
            return upper.subtract(lower);
        }
    }

    /** All real roots in increasing order. Small rational roots are split off first, which spares Sturm's chain most of its work. */
    static List<Interval> of(Polynomial squarefree) {
        if (squarefree.degree() < 1) {
            return List.of();
        }
        RationalRoots.Split split = RationalRoots.of(squarefree);
        List<Interval> found = new ArrayList<>();
        split.roots().keySet().forEach(root -> found.add(new Interval(root, root)));
        if (split.rest().degree() > 0) {
            for (Interval interval : bySturm(split.rest())) {
                found.add(apart(split.rest(), interval, split.roots().keySet()));
            }
        }
        found.sort(Comparator.comparing(Interval::lower));
        return found;
    }

    private static List<Interval> bySturm(Polynomial squarefree) {
        RealRoots roots = new RealRoots(squarefree);
        Rational bound = roots.cauchyBound();
        List<Interval> found = new ArrayList<>();
        roots.isolate(bound.negate(), bound, found);
        List<Interval> recognised = new ArrayList<>();
        for (Interval interval : found) {
            recognised.add(roots.recogniseRational(interval));
        }
        return recognised;
    }

    /** The interval made so narrow that it holds none of the roots of another factor. */
    private static Interval apart(Polynomial polynomial, Interval interval, Set<Rational> others) {
        Interval current = interval;
        for (Rational other : others) {
            while (!current.isPoint()
                    && other.compareTo(current.lower()) >= 0
                    && other.compareTo(current.upper()) <= 0) {
                current = refine(polynomial, current, current.width());
            }
        }
        return current;
    }

    /** The interval halved until it is narrower than {@code width}. */
    static Interval refine(Polynomial squarefree, Interval interval, Rational width) {
        Interval current = interval;
        int signBelow = squarefree.valueAt(current.lower()).signum();
        while (!current.isPoint() && current.width().compareTo(width) >= 0) {
            Rational middle = current.lower().add(current.upper()).divide(2);
            int sign = squarefree.valueAt(middle).signum();
            if (sign == 0) {
                return new Interval(middle, middle);
            }
            current = sign == signBelow
                    ? new Interval(middle, current.upper())
                    : new Interval(current.lower(), middle);
        }
        return current;
    }

    private Rational cauchyBound() {
        Rational largest = Rational.ZERO;
        for (Rational c : polynomial.coefficients()) {
            Rational size = c.divide(polynomial.leading()).abs();
            largest = size.compareTo(largest) > 0 ? size : largest;
        }
        return Rational.of(largest.ceiling()).add(1);
    }

    private int signChanges(Rational u) {
        int changes = 0;
        int last = 0;
        for (Polynomial p : sturm) {
            int sign = p.valueAt(u).signum();
            if (sign != 0) {
                changes += last != 0 && sign != last ? 1 : 0;
                last = sign;
            }
        }
        return changes;
    }

    /** Roots in (lower, upper]. */
    private void isolate(Rational lower, Rational upper, List<Interval> found) {
        int count = signChanges(lower) - signChanges(upper);
        if (count == 0) {
            return;
        }
        if (count == 1 && polynomial.valueAt(upper).signum() == 0) {
            found.add(new Interval(upper, upper));
            return;
        }
        if (count == 1 && polynomial.valueAt(lower).signum() != 0) {
            found.add(new Interval(lower, upper));
            return;
        }
        Rational middle = lower.add(upper).divide(2);
        isolate(lower, middle, found);
        isolate(middle, upper, found);
    }

    /** The leading coefficient a of the integer polynomial makes a*root an integer if the root is rational. */
    private Interval recogniseRational(Interval interval) {
        if (interval.isPoint()) {
            return interval;
        }
        BigInteger common = BigInteger.ONE;
        for (Rational c : polynomial.coefficients()) {
            common = common.multiply(c.denominator()).divide(common.gcd(c.denominator()));
        }
        BigInteger leading =
                polynomial.leading().multiply(Rational.of(common)).numerator().abs();
        Interval narrow = refine(polynomial, interval, Rational.of(BigInteger.ONE, leading.shiftLeft(1)));
        Rational candidate = Rational.of(
                narrow.upper().multiply(Rational.of(leading)).floor(), leading);
        boolean root = candidate.compareTo(narrow.lower()) >= 0
                && polynomial.valueAt(candidate).signum() == 0;
        return root ? new Interval(candidate, candidate) : narrow;
    }

    /** The factors q_1, q_2, ... of a polynomial, q_k squarefree with the roots of multiplicity k (Yun's algorithm). */
    static List<Polynomial> squarefreeFactors(Polynomial polynomial) {
        if (polynomial.degree() < 1) {
            return Collections.emptyList();
        }
        List<Polynomial> factors = new ArrayList<>();
        Polynomial derivative = polynomial.derivative();
        Polynomial gcd = polynomial.gcd(derivative);
        Polynomial b = polynomial.divideExactly(gcd);
        Polynomial d = derivative.divideExactly(gcd).subtract(b.derivative());
        while (b.degree() > 0) {
            Polynomial factor = b.gcd(d);
            factors.add(factor);
            b = b.divideExactly(factor);
            d = d.divideExactly(factor).subtract(b.derivative());
        }
        return factors;
    }
}
