package bubblechain.series;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.Ball;
import bubblechain.exact.Magnitude;
import java.math.BigInteger;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** A bound in units of the last place stays a bound when it exceeds what a long holds. */
class FixedSeriesErrorTest {
    private static FixedSeries withError(double error) {
        return FixedSeries.of(List.of(BigInteger.TEN), new double[] {error}, 3);
    }

    @ParameterizedTest
    @ValueSource(doubles = {0.5, 1, 7.25, 0x1p52, 0x1.8p62, 0x1p63, 0x1p102, 0x1.fffp300, 0x1p900})
    void theBallIsNoSmallerThanTheBound(double error) {
        Ball ball = withError(error).coefficient(0);
        Magnitude units = ball.radius().scale(FixedSeries.bits(3));
        assertThat(units.toDouble()).isBetween(error, 1.001 * error + 2);
    }

    @ParameterizedTest
    @ValueSource(doubles = {Double.POSITIVE_INFINITY, Double.NaN})
    void aBoundThatIsNoNumberIsRefused(double error) {
        assertThatThrownBy(() -> withError(error).coefficient(0)).isInstanceOf(ArithmeticException.class);
    }

    @Test
    void anExactCoefficientHasNoRadius() {
        assertThat(withError(0).coefficient(0).isExact()).isTrue();
    }
}
