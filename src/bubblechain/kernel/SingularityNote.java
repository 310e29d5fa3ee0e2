package bubblechain.kernel;

import bubblechain.exact.Rational;
import java.util.Optional;

/**
 * What physics says about one singularity of a kernel.
 *
 * @param u                  its position
 * @param kind               IR or UV, declared and not read off the sign
 * @param operator           the operator whose matrix element the ambiguity cancels against
 * @param power              the power correction in words, such as "Lambda/m"
 * @param anomalousDimension delta in (Lambda/Q)^(2u) alpha^(-delta), where known
 * @param source             where this is known from
 */
public record SingularityNote(
        Rational u,
        Kind kind,
        Optional<String> operator,
        Optional<String> power,
        Optional<Rational> anomalousDimension,
        Optional<String> source) {
    /** Infrared or ultraviolet. */
    public enum Kind {
        IR,
        UV
    }
}
