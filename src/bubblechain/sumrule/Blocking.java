package bubblechain.sumrule;

import bubblechain.exact.Rational;
import bubblechain.qcd.BetaFunction;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Which known singularities stand in the way of the one probed.
 *
 * <p>A singularity K_j at u_j adds K_j (u0/u_j)^k prod_{i=1}^{k} (i+nu_j)/(i+nu_0) to K_k, exactly so with one-loop
 * running. Rule, with the size r_j of that at the last order k:
 * <ul>
 * <li>|u_j| &lt;= |u0|, strength unknown: blocks, because K_k need not converge;
 * <li>|u_j| &lt;= |u0|, strength known: blocks if r_j &gt;= {@value #NEAR_CONTAMINATION} |K_k|, however large the error,
 * because it does not fall with k;
 * <li>|u_j| &gt; |u0|, strength known: blocks if r_j &gt;= {@value #FAR_CONTAMINATION} max(|K_k|, E_k); the fall with k
 * and the error take care of less;
 * <li>|u_j| &gt; |u0|, strength unknown: does not block.
 * </ul>
 * A singularity whose part has been removed never blocks.
 */
final class Blocking {
    /** Relative size at which a singularity that is as near or nearer blocks. */
    static final double NEAR_CONTAMINATION = 0.1;
    /** Relative size at which a singularity farther away blocks. */
    static final double FAR_CONTAMINATION = 0.5;
    private static final int BITS = 64;

    private Blocking() {}

    /**
     * @param request  what was asked
     * @param nu       exponent of the singularity probed
     * @param strength |K_k| at the last order, prefactor left out
     * @param error    E_k
     */
    static List<BlockedBy> find(SumRuleRequest request, Rational nu, double strength, double error) {
        List<BlockedBy> found = new ArrayList<>();
        for (Obstacle obstacle : request.obstacles()) {
            if (!obstacle.removed()) {
                judge(request, nu, obstacle, strength, error).ifPresent(found::add);
            }
        }
        return found;
    }

    private static Optional<BlockedBy> judge(
            SumRuleRequest request, Rational nu, Obstacle obstacle, double strength, double error) {
        Rational distance = request.position().divide(obstacle.position());
        boolean near = distance.abs().compareTo(Rational.ONE) >= 0;
        String place = near ? "at equal or smaller |u|" : "farther away";
        if (obstacle.strength().isEmpty()) {
            return near
                    ? Optional.of(new BlockedBy(obstacle, Optional.empty(), place
                            + " and its strength is unknown: the sum need not converge; remove it first"))
                    : Optional.empty();
        }
        double size = Math.abs(obstacle.strength().get().toBall(BITS).toDouble())
                * growth(request.beta(), nu, obstacle, distance, request.loops() - 1);
        double reference = near ? strength : Math.max(strength, error);
        if (size == 0 || size < (near ? NEAR_CONTAMINATION : FAR_CONTAMINATION) * reference) {
            return Optional.empty();
        }
        Optional<Double> contamination = reference == 0 ? Optional.empty() : Optional.of(size / reference);
        return Optional.of(new BlockedBy(obstacle, contamination, place + " and its part of the last order is "
                + contamination.map(Blocking::share).orElse("far above") + (near ? " the value" : " the value or its error")
                + "; remove it first"));
    }

    private static String share(double contamination) {
        return contamination < 10
                ? String.format(Locale.ROOT, "%.0f %% of", 100 * contamination)
                : String.format(Locale.ROOT, "%.3g times", contamination);
    }

    /** |u0/u_j|^k prod_{i=1}^{k} |(i+nu_j)/(i+nu_0)|. */
    private static double growth(BetaFunction beta, Rational nu, Obstacle obstacle, Rational distance, int k) {
        Rational other = obstacle.position().multiply(2).multiply(beta.b1hat()).add(obstacle.exponentShift());
        double product = 1;
        for (int i = 1; i <= k; i++) {
            product *= Math.abs(distance.multiply(other.add(i)).divide(nu.add(i)).toDouble());
        }
        return product;
    }
}
