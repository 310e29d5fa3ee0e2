package bubblechain.series;

import bubblechain.exact.Rational;
import java.util.List;

/**
 * prod (1 + slope v), which multiplies a series or divides it.
 *
 * @param divides true if the series is divided by the product
 */
public record LinearGroup(List<Rational> slopes, boolean divides) {
    public LinearGroup {
        slopes = List.copyOf(slopes);
    }
}
