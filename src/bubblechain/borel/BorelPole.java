package bubblechain.borel;

import bubblechain.analytic.Pole;
import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.kernel.SingularityNote;
import java.util.ArrayList;
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
        return kindAt(u(), note);
    }

    static SingularityNote.Kind kindAt(Rational u, Optional<SingularityNote> note) {
        return note.map(SingularityNote::kind)
                .orElse(u.signum() > 0 ? SingularityNote.Kind.IR : SingularityNote.Kind.UV);
    }

    /** The power correction: as declared, else (Lambda/scale)^(2u) for u &gt; 0. */
    public String power(String scale) {
        if (note.isPresent() && note.get().power().isPresent()) {
            return note.get().power().get();
        }
        if (u().signum() < 0) {
            return "none";
        }
        Rational exponent = u().multiply(2);
        String hard = scale.startsWith("1/") ? "Lambda*" + scale.substring(2) : "Lambda/" + scale;
        if (exponent.equals(Rational.ONE)) {
            return hard;
        }
        return "(" + hard + ")^" + (exponent.isInteger() ? exponent.toString() : "(" + exponent + ")");
    }

    /** Its Laurent terms, those of (u - u0)^(-1), (u - u0)^(-2), ... in this order. */
    public List<ChainPole> terms() {
        List<ChainPole> terms = new ArrayList<>();
        for (int k = 1; k <= pole.order(); k++) {
            terms.add(new ChainPole(u(), k, pole.coefficient(-k)));
        }
        return terms;
    }

    /** K, the strength of K (1 - u/u0)^(-1) for a simple pole: K = -R/u0. */
    public Optional<ExactConstant> strength() {
        return pole.order() == 1 ? Optional.of(terms().get(0).strength()) : Optional.empty();
    }

    /** The share of this pole in c_n, the sum of the parts of its Laurent terms. */
    public Ball share(int n, int bits) {
        Ball sum = Ball.ZERO;
        for (ChainPole term : terms()) {
            sum = sum.add(term.part(n).toBall(bits), bits);
        }
        return sum;
    }
}
