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
    private static final int ARCS = 64;

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
        double radius = radius(form, plane, limit.add(BEYOND), from, to);
        ArcBound.Bound arc;
        try {
            arc = ArcBound.maximum(form, radius, ARCS);
        } catch (DomainException noCircle) {
            return Optional.empty();
        }
        Magnitude factorial = Magnitude.of(ExactFunctions.factorial(n));
        Magnitude size = arc.coefficientBound(n).multiply(factorial).add(entire.upperBound());
        for (int k = 0; k < listed.size(); k++) {
            if (listed.get(k).u().abs().toDouble() > radius) {
                size = size.add(shares.get(k).upperBound());
            }
        }
        return Optional.of(new RemainderBound(radius, size));
    }

    /** The middle of the last gap between circles of singular points below the nearest pole that is not listed. */
    private static double radius(NormalForm form, BorelPlane plane, Rational limit, Rational from, Rational to) {
        double missing = limit.toDouble();
        for (BorelPole pole : plane.poles(limit.negate(), limit)) {
            if (pole.u().compareTo(from) < 0 || pole.u().compareTo(to) > 0) {
                missing = Math.min(missing, pole.u().abs().toDouble());
            }
        }
        SingularityList singularities = SingularityList.of(form);
        for (AlgebraicPole pole : singularities.algebraicPoles(limit.negate(), limit)) {
            missing = Math.min(missing, Math.min(pole.lower().abs().toDouble(), pole.upper().abs().toDouble()));
        }
        for (ComplexRoots.Pair pair : singularities.complexRoots()) {
            missing = Math.min(missing, Math.hypot(pair.re(), pair.im()));
        }
        SortedSet<Double> circles = new TreeSet<>();
        circles.add(0.0);
        singularities.candidates(limit.negate(), limit).forEach(u -> circles.add(u.abs().toDouble()));
        return (circles.headSet(missing).last() + missing) / 2;
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
