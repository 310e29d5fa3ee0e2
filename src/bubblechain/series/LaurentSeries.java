package bubblechain.series;

import java.util.List;

/**
 * A truncated Laurent series sum_k coefficients[k] x^(lowest + k) + O(x^end), end = lowest + number of coefficients.
 * Immutable. The coefficient of x^lowest is not known to be zero, unless the list is empty: then every coefficient
 * below x^lowest is known to be zero and nothing else is known.
 *
 * @param <C> the coefficients
 * @param lowest power of the first coefficient
 * @param coefficients coefficients of x^lowest, x^(lowest+1), ...
 */
public record LaurentSeries<C>(int lowest, List<C> coefficients) {
    public LaurentSeries {
        coefficients = List.copyOf(coefficients);
    }

    /** The first power that is not known. */
    public int end() {
        return lowest + coefficients.size();
    }

    public int length() {
        return coefficients.size();
    }
}
