package bubblechain.chain;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatCode;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.PrecisionException;
import org.junit.jupiter.api.Test;

class ChainCostTest {
    private static final long MEGABYTE = 1_000_000;

    @Test
    void costGrowsWithLoopsAndDigits() {
        int[] sizes = {1, 20, 300, 1_000, 4_000, 10_000};
        for (int k = 1; k < sizes.length; k++) {
            assertThat(ChainCost.of(sizes[k], 500).bytes()).isGreaterThan(ChainCost.of(sizes[k - 1], 500).bytes());
            assertThat(ChainCost.of(500, sizes[k]).bytes())
                    .isGreaterThanOrEqualTo(ChainCost.of(500, sizes[k - 1]).bytes());
            assertThat(ChainCost.of(sizes[k], 500).seconds()).isGreaterThan(ChainCost.of(sizes[k - 1], 500).seconds());
        }
    }

    @Test
    void twoThousandLoopsToTwoThousandDigitsFitThreeHundredMegabytes() {
        assertThatCode(() -> ChainCost.of(2_000, 2_000).requireMemory(300 * MEGABYTE)).doesNotThrowAnyException();
    }

    @Test
    void whatDoesNotFitIsRefusedWithTheHeapThatWouldDo() {
        ChainCost cost = ChainCost.of(10_000, 10_000);
        long gigabytes = cost.bytes() / MEGABYTE / 900 + 1;
        assertThatThrownBy(() -> cost.requireMemory(256 * MEGABYTE))
                .isInstanceOf(PrecisionException.class)
                .hasMessage("this needs about " + cost.bytes() / MEGABYTE + " MB of memory, java may take 256 MB; ask for"
                        + " fewer loops or digits, or start with java -Xmx" + gigabytes + "g -jar ...");
        assertThatCode(() -> cost.requireMemory(gigabytes << 30)).doesNotThrowAnyException();
    }
}
