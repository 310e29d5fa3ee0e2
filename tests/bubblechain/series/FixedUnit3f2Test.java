package bubblechain.series;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.Ball;
import bubblechain.exact.Rational;
import bubblechain.exact.UnitHypergeometric;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** The nested series of the width function against its Taylor coefficients in balls at three times the precision. */
class FixedUnit3f2Test {
    private static final double LARGEST_MEDIAN = 20;

    @ParameterizedTest
    @CsvSource({
        "1, -1/2, 40, 2", "1, 1/2, 25, 9", "1, -1/4, 30, 30", "1/3, 1/6, 20, 5", "3/4, -1/4, 20, 5", "2/3, 1/7, 12, 1", "1, 1/3, 5, 70"
    })
    void coefficientsAreWithinTheirBounds(String shift, String step, int length, int limbs) {
        Rational s = Rational.parse(shift);
        Rational r = Rational.parse(step);
        assertThat(FixedUnit3f2.fits(s, r)).isTrue();
        FixedSeries series = FixedUnit3f2.of(s, r, length, limbs);
        int bits = 3 * FixedSeries.bits(limbs) + 100;
        Ball[] reference = UnitHypergeometric.taylor(s, length, bits);
        List<Double> slack = new ArrayList<>();
        for (int k = 0; k < length; k++) {
            Ball expected = reference[k].multiply(r.power(k), bits);
            Ball found = series.coefficient(k);
            Rational difference = found.midpoint().subtract(expected.midpoint()).abs();
            assertThat(difference).as("[v^%d] W(%s + %s v)", k, shift, step)
                    .isLessThanOrEqualTo(found.radius().add(expected.radius()).toRational());
            assertThat(series.error(k)).as("units of the last place").isLessThan(1e5);
            if (!difference.isZero()) {
                slack.add(Math.log(found.radius().toRational().divide(difference).toDouble()) / Math.log(2));
            }
        }
        Collections.sort(slack);
        assertThat(slack.get(slack.size() / 2)).as("median of log2(bound/error)").isLessThan(LARGEST_MEDIAN);
    }

    @Test
    void argumentsItDoesNotTakeAreKnown() {
        assertThat(FixedUnit3f2.fits(Rational.HALF, Rational.of(1, 4))).isFalse();
        assertThat(FixedUnit3f2.fits(Rational.ONE, Rational.of(3, 4))).isFalse();
        assertThat(FixedUnit3f2.fits(Rational.of(5, 4), Rational.of(1, 4))).isFalse();
    }
}
