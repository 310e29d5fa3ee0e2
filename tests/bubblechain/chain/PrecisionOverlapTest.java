package bubblechain.chain;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.kernel.KernelLibrary;
import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Balls at a low precision contain those at a high one, on whichever route each was found. */
class PrecisionOverlapTest {
    private static final int LOOPS = 61;
    private static final int HIGH_BITS = 3 * 700;

    @ParameterizedTest
    @CsvSource({
        "adler, 1", "adler, 2", "bjorken-gls, 1", "bjorken-gls, 1/3", "cusp, 1", "cusp, 2", "gamma-m, 1", "gamma-m, 1/3",
        "lepton-g2, 1", "lepton-g2, 2", "pole-mass, 1", "pole-mass, 2", "pole-mass, 1/3", "static-potential-r, 1"
    })
    void lowPrecisionContainsHighPrecision(String kernel, String mu) {
        ExactConstant ratio = ConstantValue.of(Formula.parse(mu));
        Chain chain = Chain.of(KernelLibrary.load(kernel), Scales.of(ratio, ExactConstant.ONE));
        List<Ball> high = chain.balls(LOOPS, HIGH_BITS);
        for (int bits : new int[] {60, 90, 150, 321, 500, 700}) {
            List<Ball> low = chain.balls(LOOPS, bits);
            for (int n = 0; n < LOOPS; n++) {
                assertThat(low.get(n).subtract(high.get(n), HIGH_BITS).containsZero())
                        .as("%s at %s, %d bits, n = %d: %s and %s", kernel, mu, bits, n, low.get(n), high.get(n))
                        .isTrue();
            }
        }
    }
}
