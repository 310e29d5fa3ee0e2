package bubblechain.sumrule;

import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import java.util.List;

/**
 * The sum rule with f rewritten at R' = lambda R.
 *
 * @param lambda    scale factor
 * @param strengths bare K_0, K_1, ...
 */
public record ScanPoint(ExactConstant lambda, List<Ball> strengths) {
    public ScanPoint {
        strengths = List.copyOf(strengths);
    }
}
