package bubblechain.borel;

import bubblechain.analytic.Pole;
import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import bubblechain.kernel.SingularityNote;
import java.math.BigInteger;
import java.util.List;
import java.util.Optional;

/**
 * A pole of B(u) at a rational point, with what is known of its physics.
 *
 * @param pole its exact principal part
 * @param note operator, power correction and anomalous dimension, where the kernel declares them
 */
public record BorelPole(Pole pole, Optional<SingularityNote> note) {
    public Rational u() {
        return pole.point();
    }

    /** IR or UV: as declared, else by the sign of u (common practice, no source). */
    public SingularityNote.Kind kind() {
        return note.map(SingularityNote::kind)
                .orElse(u().signum() > 0 ? SingularityNote.Kind.IR : SingularityNote.Kind.UV);
    }

    /** The power correction: as declared, else (Lambda/scale)^(2u) for u &gt; 0. */
    public String power(String scale) {
        if (note.isPresent() && note.get().power().isPresent()) {
            return note.get().power().get();
        }
        if (u().signum() < 0) {
            return "none (sign-alternating growth)";
        }
        Rational exponent = u().multiply(2);
        String hard = scale.startsWith("1/") ? "Lambda*" + scale.substring(2) : "Lambda/" + scale;
        if (exponent.equals(Rational.ONE)) {
            return hard;
        }
        return "(" + hard + ")^" + (exponent.isInteger() ? exponent.toString() : "(" + exponent + ")");
    }

    /** K, the strength of K (1 - u/u0)^(-1) for a simple pole: K = -R/u0. */
    public Optional<ExactConstant> strength() {
        return pole.order() == 1
                ? Optional.of(pole.residue().divide(u()).negate())
                : Optional.empty();
    }

    /**
     * The share of this pole in c_n: n! [u^n] sum_k R_k (u - u0)^(-k) = n! sum_k R_k (-1)^k C(n+k-1, n) u0^(-n-k).
     */
    public Ball share(int n, int bits) {
        List<Ball> laurent = pole.balls(bits);
        Rational factorial = Rational.of(ExactFunctions.factorial(n));
        Ball sum = Ball.ZERO;
        for (int k = 1; k <= pole.order(); k++) {
            Rational weight = Rational.of(binomial(n + k - 1, k - 1))
                    .multiply(u().power(-n - k))
                    .multiply(factorial);
            Ball term = laurent.get(pole.order() - k).multiply(k % 2 == 0 ? weight : weight.negate(), bits);
            sum = sum.add(term, bits);
        }
        return sum;
    }

    private static BigInteger binomial(int n, int k) {
        BigInteger result = BigInteger.ONE;
        for (int j = 1; j <= k; j++) {
            result = result.multiply(BigInteger.valueOf(n - k + j)).divide(BigInteger.valueOf(j));
        }
        return result;
    }
}
