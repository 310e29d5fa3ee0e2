package bubblechain.exact;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;

/**
 * Balls compared with finer ones, at least three times as precise: the error is always within the bound, and the bound
 * is not wasteful, half of the bounds exceeding the error met by less than 2^20. Results that are right to the last bit
 * of the finer ball have no ratio and do not count.
 */
public final class BoundSamples {
    public static final double LARGEST_MEDIAN = 20;
    /** The finer ball must be so many bits narrower for the distance to be an error. */
    private static final int FINER = 20;

    private final List<Double> ratios = new ArrayList<>();

    private static double log2(Magnitude positive) {
        return positive.exponent() + Math.log(positive.mantissa()) / Math.log(2);
    }

    /** A ball and a finer one for the same number. */
    public void add(Ball ball, Ball finer, String what, Object... arguments) {
        Dyadic distance = ball.mid().subtract(finer.mid()).abs();
        Dyadic allowed = ball.radius().toDyadic().add(finer.radius().toDyadic());
        assertThat(distance.compareTo(allowed)).as(what, arguments).isLessThanOrEqualTo(0);
        Magnitude error = distance.upperBound();
        if (finer.radius().scale(FINER).compareTo(error) < 0) {
            ratios.add(log2(ball.radius()) - log2(error));
        }
    }

    /** A bound and what it bounds, exactly or to far more digits than the ratio shows. */
    public void add(Rational bound, Rational size, String what, Object... arguments) {
        assertThat(size).as(what, arguments).isLessThanOrEqualTo(bound);
        if (!size.isZero()) {
            ratios.add(log2(Magnitude.ofRational(bound)) - log2(Magnitude.ofRational(size)));
        }
    }

    public int count() {
        return ratios.size();
    }

    /** The median of log2(bound/error). */
    public double median() {
        Collections.sort(ratios);
        return ratios.get(ratios.size() / 2);
    }

    /** At least so many errors were met, and half of them are not far below their bounds. */
    public void assertNotWasteful(int atLeast, String what, Object... arguments) {
        assertThat(ratios).as(what, arguments).hasSizeGreaterThanOrEqualTo(atLeast);
        assertThat(median()).as(what, arguments).isLessThan(LARGEST_MEDIAN);
    }
}
