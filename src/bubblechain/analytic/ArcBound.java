package bubblechain.analytic;

import bubblechain.exact.DomainException;
import bubblechain.exact.Magnitude;
import bubblechain.exact.Rational;
import java.util.Comparator;
import java.util.Locale;
import java.util.PriorityQueue;
import java.util.SortedSet;
import java.util.TreeSet;

/**
 * Proved upper bounds of a normal form on circles about the origin, and of the Taylor coefficients they imply.
 *
 * <p>With M = max |h(u)| on |u| = R and p the poles of h with 0 &lt; |p| &lt; R, Cauchy's integral over the circle
 * gives |[u^n] h + sum_p Res(h(u) u^(-n-1), p)| <= M R^(-n): what is left of a coefficient when the parts of the poles
 * inside are taken away. [u^n] is the coefficient of the Laurent series about 0.
 *
 * <p>The half circle Im u >= 0 is covered by discs (h(conj u) = conj h(u), the coefficients being real), h is enclosed
 * over each disc, and the arcs with the largest bounds are halved until the largest bound is close to a value the
 * function attains at the middle of an arc.
 */
public final class ArcBound {
    /** Arcs of the half circle a bound may take. */
    public static final int ARC_LIMIT = 4_096;

    private static final int FIRST_ARCS = 64;
    /** The refinement ends when the bound is this close to the largest value seen, in ln |h|. */
    private static final double CLOSE = 0.05;

    private static final Rational ROOT_WIDTH = Rational.TWO.power(-60);

    private ArcBound() {}

    /**
     * A bound on one circle.
     *
     * @param radius    R
     * @param logarithm not below ln max |h(u)| on |u| = R; minus infinity for the zero form
     * @param attained  ln |h| at some point of the circle, good to about ten digits where terms do not cancel;
     *                  not a bound itself. The bound exceeds the true maximum by at most the difference
     * @param arcs      number of arcs of the half circle used
     */
    public record Bound(double radius, double logarithm, double attained, int arcs) {
        private static final double LN2 = Math.log(2);
        private static final int MANTISSA_BITS = 52;

        /** Not below ln(M R^(-n)), the logarithm of the bound of the n-th coefficient's remainder. */
        public double coefficientLogarithm(int n) {
            double logarithmOfRadius = n >= 0 ? Upward.lnBelow(radius) : Upward.ln(radius);
            double product = n * logarithmOfRadius;
            return Math.nextUp(
                    logarithm - product + 4 * Upward.UNIT * (Math.abs(logarithm) + Math.abs(product)));
        }

        /** M R^(-n), not below the modulus of the n-th coefficient's remainder. */
        public Magnitude coefficientBound(int n) {
            double exponent = coefficientLogarithm(n);
            if (exponent == Double.NEGATIVE_INFINITY) {
                return Magnitude.ZERO;
            }
            double k = Math.floor(exponent / LN2);
            double rest = exponent - k * LN2 + 8 * Upward.UNIT * (Math.abs(exponent) + 1);
            double mantissa = Math.scalb(Upward.exp(rest), MANTISSA_BITS);
            return Magnitude.of((long) Math.ceil(mantissa)).scale((long) k - MANTISSA_BITS);
        }
    }

    /** The bound with the default number of first arcs. @throws DomainException as {@link #maximum} */
    public static Bound remainder(NormalForm form, double radius) {
        return maximum(form, radius, FIRST_ARCS);
    }

    /**
     * A bound of ln |h| on |u| = radius.
     *
     * @param radius positive; keep it between the circles on which singular points of single terms lie
     * @param arcs   number of equal arcs of the half circle to begin with, from 1 to {@link #ARC_LIMIT}
     * @throws DomainException if the circle meets a singular point of a term, or comes so close that {@link #ARC_LIMIT}
     *     arcs do not separate them, or if the values are out of range
     * @implNote a few milliseconds for one term with three gamma functions; proportional to the radius beyond 20
     */
    public static Bound maximum(NormalForm form, double radius, int arcs) {
        if (!(radius > 0) || radius == Double.POSITIVE_INFINITY) {
            throw new DomainException("the radius of a circle must be positive and finite, got " + radius);
        }
        if (arcs < 1 || arcs > ARC_LIMIT) {
            throw new DomainException("the number of arcs lies between 1 and " + ARC_LIMIT + ", got " + arcs);
        }
        FormEvaluation evaluation = FormEvaluation.of(form);
        PriorityQueue<Arc> queue = new PriorityQueue<>(
                Comparator.comparingDouble(Arc::bound).thenComparingDouble(Arc::width).reversed());
        double attained = Double.NEGATIVE_INFINITY;
        for (int k = 0; k < arcs; k++) {
            Arc arc = Arc.of(evaluation, radius, (double) k / arcs, (k + 1.0) / arcs);
            queue.add(arc);
            attained = Math.max(attained, arc.attained());
        }
        while (queue.size() < ARC_LIMIT && top(queue).bound() - attained > CLOSE) {
            Arc arc = queue.remove();
            double middle = (arc.from() + arc.to()) / 2;
            for (Arc half : new Arc[] {
                Arc.of(evaluation, radius, arc.from(), middle), Arc.of(evaluation, radius, middle, arc.to())
            }) {
                queue.add(half);
                attained = Math.max(attained, half.attained());
            }
        }
        Arc largest = top(queue);
        if (largest.bound() == Double.POSITIVE_INFINITY) {
            throw new DomainException(String.format(
                    Locale.ROOT,
                    "the circle |u| = %s passes through a singular point of a term, or very close to one, where the"
                            + " argument of u is about %.3f pi; choose a radius between the circles of poles",
                    radius,
                    largest.from()));
        }
        return new Bound(radius, largest.bound(), attained, queue.size());
    }

    private static Arc top(PriorityQueue<Arc> queue) {
        return queue.element();
    }

    /**
     * The radius in the middle of the widest gap between neighbouring circles on which a term can be singular, for
     * circles from {@code inner} to {@code outer}, these two counted as such.
     *
     * @throws DomainException unless 0 &lt;= inner &lt; outer
     */
    public static double radiusBetween(NormalForm form, Rational inner, Rational outer) {
        if (inner.signum() < 0 || inner.compareTo(outer) >= 0) {
            throw new DomainException("the radii must satisfy 0 <= inner < outer, got " + inner + " and " + outer);
        }
        SingularityList singularities = SingularityList.of(form);
        SortedSet<Double> circles = new TreeSet<>();
        singularities.candidates(outer.negate(), outer).forEach(p -> circles.add(Math.abs(p.toDouble())));
        singularities
                .algebraicPoles(outer.negate(), outer)
                .forEach(p -> circles.add(Math.abs(approximate(p).toDouble())));
        singularities.complexRoots().forEach(p -> circles.add(Upward.abs(p.re(), p.im())));
        double last = outer.toDouble();
        double below = inner.toDouble();
        double best = below;
        double widest = 0;
        circles.add(last);
        for (double circle : circles.tailSet(below)) {
            double end = Math.min(circle, last);
            if (end - below > widest) {
                widest = end - below;
                best = below + widest / 2;
            }
            below = Math.max(below, end);
        }
        return best;
    }

    private static Rational approximate(AlgebraicPole pole) {
        RealRoots.Interval isolating = new RealRoots.Interval(pole.lower(), pole.upper());
        return RealRoots.refine(pole.polynomial(), isolating, ROOT_WIDTH).lower();
    }

    /** The points R e^(i pi t), from <= t <= to, with a bound of ln |h| there and its value at the middle. */
    private record Arc(double from, double to, double bound, double attained) {
        static Arc of(FormEvaluation evaluation, double radius, double from, double to) {
            double angle = Math.PI * ((from + to) / 2);
            double x = radius * StrictMath.cos(angle);
            double y = radius * StrictMath.sin(angle);
            // |e^(ia) - e^(ib)| <= |a - b|; the angle is off by 4 units of at most pi, the components by 3 units each
            double reach = Upward.inflate(radius * (Math.nextUp(Math.PI) * ((to - from) / 2) + 32 * Upward.UNIT));
            ScaledDisc values = evaluation.over(new ComplexDisc(x, y, reach));
            return new Arc(from, to, values.lnLargest(), values.lnCenter());
        }

        double width() {
            return to - from;
        }
    }
}
