package bubblechain.borel;

import bubblechain.analytic.AlgebraicPole;
import bubblechain.analytic.ArcBound;
import bubblechain.analytic.ComplexRoots;
import bubblechain.analytic.NormalForm;
import bubblechain.analytic.SingularityList;
import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Magnitude;
import bubblechain.exact.Rational;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.List;
import java.util.Optional;
import java.util.SortedSet;
import java.util.TreeSet;

/**
 * A proved bound of what is left of c_n when the shares of listed poles are taken away: n! M R^(-n) from the circle
 * |u| = R inside which every pole is listed, plus the sizes of the listed shares outside it and of the entire part.
 *
 * @param radius R
 * @param size   the bound
 */
public record RemainderBound(double radius, Magnitude size) {
    private static final MathContext THREE_UP = new MathContext(3, RoundingMode.UP);
    private static final Rational BEYOND = Rational.of(2);
    /** How far beyond the range a circle may lie where nothing but the range limits it. */
    private static final int FURTHEST = 12;
    private static final int ARCS = 64;
    private static final int ROOT_DIGITS = 15;
    /** Where in the gap the circle may lie: the higher the order, the nearer to the outer end the best one. */
    private static final double[] PARTS_OF_GAP = {0.5, 0.8125, 0.96875};

    /**
     * The bound for c_n.
     *
     * @param listed all poles with from &lt;= u &lt;= to
     * @param shares their shares in c_n
     * @param entire what the subtraction contributes to c_n
     * @return empty if no suitable circle exists
     */
    static Optional<RemainderBound> of(
            BorelPlane plane, List<BorelPole> listed, List<Ball> shares, Ball entire, Rational from, Rational to, int n) {
        NormalForm form = plane.form();
        if (form.isZero()) {
            return Optional.empty();
        }
        Rational limit = from.abs().compareTo(to.abs()) > 0 ? from.abs() : to.abs();
        Magnitude rest = entire.upperBound();
        Gap gap = gap(form, plane, limit.add(BEYOND), from, to);
        if (gap.isOpen() && 2 * gap.outer() < n) {
            // nothing is missing so far: the larger the circle the better, up to about n
            gap = gap(form, plane, limit.add(Rational.of(Math.min(n, FURTHEST))), from, to);
        }
        for (int k = 0; k < listed.size(); k++) {
            if (listed.get(k).u().abs().toDouble() > gap.inner()) {
                rest = rest.add(shares.get(k).upperBound());
            }
        }
        Optional<RemainderBound> best = Optional.empty();
        for (double part : PARTS_OF_GAP) {
            Optional<RemainderBound> found = onCircle(form, gap.radius(part), n, rest);
            if (best.isEmpty() || found.isPresent() && found.get().size.compareTo(best.get().size) < 0) {
                best = found;
            }
        }
        return best;
    }

    private static Optional<RemainderBound> onCircle(NormalForm form, double radius, int n, Magnitude rest) {
        try {
            Magnitude arc = ArcBound.maximum(form, radius, ARCS).coefficientBound(n);
            return Optional.of(
                    new RemainderBound(radius, arc.multiply(Magnitude.of(ExactFunctions.factorial(n))).add(rest)));
        } catch (DomainException noCircle) {
            return Optional.empty();
        }
    }

    /**
     * Radii between two neighbouring circles of singular points.
     *
     * @param isOpen true if no singular point that is not listed was found at the outer end
     */
    private record Gap(double inner, double outer, boolean isOpen) {
        double radius(double part) {
            return inner + part * (outer - inner);
        }
    }

    /** The last gap between circles of singular points below the nearest pole that is not listed. */
    private static Gap gap(NormalForm form, BorelPlane plane, Rational limit, Rational from, Rational to) {
        double missing = limit.toDouble();
        for (BorelPole pole : plane.poles(limit.negate(), limit)) {
            if (pole.u().compareTo(from) < 0 || pole.u().compareTo(to) > 0) {
                missing = Math.min(missing, pole.u().abs().toDouble());
            }
        }
        SingularityList singularities = SingularityList.of(form);
        for (AlgebraicPole pole : singularities.algebraicPoles(limit.negate(), limit)) {
            missing = Math.min(missing, RootInterval.of(pole, ROOT_DIGITS).distance());
        }
        for (ComplexRoots.Pair pair : singularities.complexRoots()) {
            missing = Math.min(missing, Math.hypot(pair.re(), pair.im()));
        }
        SortedSet<Double> circles = new TreeSet<>();
        circles.add(0.0);
        singularities.candidates(limit.negate(), limit).forEach(u -> circles.add(u.abs().toDouble()));
        return new Gap(circles.headSet(missing).last(), missing, missing == limit.toDouble());
    }

    /** The bound in three digits, rounded up. */
    public String decimal() {
        Rational value = size.toRational();
        BigDecimal decimal = new BigDecimal(value.numerator())
                .divide(new BigDecimal(value.denominator()), THREE_UP)
                .round(THREE_UP);
        int exponent = decimal.precision() - decimal.scale() - 1;
        boolean plain = Math.abs(exponent) < 5;
        return plain ? decimal.toPlainString() : decimal.movePointLeft(exponent).stripTrailingZeros().toPlainString() + "e" + exponent;
    }
}
