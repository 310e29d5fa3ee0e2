package bubblechain.series;

/**
 * value + t derivative with t^2 = 0: a function of a second variable to first order at t = 0.
 *
 * @param <S> the series
 */
public record Dual<S>(S value, S derivative) {}
