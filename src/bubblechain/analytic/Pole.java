package bubblechain.analytic;

import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.series.LaurentSeries;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The principal part of a function at a rational point, in powers of u - u0.
 *
 * @param point   u0
 * @param order   the pole's order; the largest order not excluded if the status is {@link PoleStatus#ORDER_NOT_PROVED}
 * @param status  how far the order is known
 * @param laurent coefficients of (u - u0)^(-order) .. (u - u0)^(-1)
 */
public record Pole(Rational point, int order, PoleStatus status, List<ExactConstant> laurent) {
    /** Largest order of a pole whose principal part is computed. */
    public static final int LARGEST_ORDER = 100;

    private static final int FIRST_BITS = 192;
    /** Precision up to which a formally non-zero coefficient is refined before its sign is given up. */
    private static final int LAST_BITS = 3_072;

    public Pole {
        laurent = List.copyOf(laurent);
    }

    /**
     * The pole at a point, if there is one; a principal part that vanishes formally is none.
     *
     * @throws DomainException if a term has a pole of an order above {@link #LARGEST_ORDER} there
     */
    public static Optional<Pole> of(NormalForm form, Rational point) {
        Expansion expansion = Expansion.about(point, form);
        if (expansion.lowestPower() >= 0) {
            return Optional.empty();
        }
        if (-expansion.lowestPower() > LARGEST_ORDER) {
            throw new DomainException("the pole at u = " + point + " may be of order " + -expansion.lowestPower()
                    + "; principal parts are computed up to order " + LARGEST_ORDER);
        }
        LaurentSeries<ExactConstant> principal = expansion.exact(0);
        if (principal.length() == 0) {
            return Optional.empty();
        }
        List<ExactConstant> laurent = principal.coefficients();
        boolean closed = laurent.stream().allMatch(ExactConstant::isClosedForm);
        PoleStatus status = !excludesZero(laurent.get(0))
                ? PoleStatus.ORDER_NOT_PROVED
                : closed ? PoleStatus.EXACT : PoleStatus.CERTIFIED;
        return Optional.of(new Pole(point, -principal.lowest(), status, laurent));
    }

    private static boolean excludesZero(ExactConstant value) {
        for (int bits = FIRST_BITS; bits <= LAST_BITS; bits *= 2) {
            if (!value.toBall(bits).containsZero()) {
                return true;
            }
        }
        return false;
    }

    /** The coefficient of (u - u0)^power for -order &lt;= power &lt;= -1. */
    public ExactConstant coefficient(int power) {
        return laurent.get(order + power);
    }

    /** The residue, the coefficient of 1/(u - u0). */
    public ExactConstant residue() {
        return coefficient(-1);
    }

    /** Balls for the Laurent coefficients, refined until each has {@code bits} bits or the precision limit is reached. */
    public List<Ball> balls(int bits) {
        List<Ball> balls = new ArrayList<>();
        for (ExactConstant c : laurent) {
            balls.add(refined(c, bits));
        }
        return balls;
    }

    private static Ball refined(ExactConstant value, int bits) {
        Ball ball = value.toBall(bits + 32);
        for (int working = 2 * bits + 64; ball.accuracyBits() < bits && working <= 4 * bits + LAST_BITS; working *= 2) {
            ball = value.toBall(working);
        }
        return ball;
    }
}
