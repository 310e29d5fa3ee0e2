package bubblechain.chain;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The families in the moment N: exact coefficients, and the one-loop functions of N. */
class MomentFamiliesTest {
    private static List<ExactConstant> exact(String name, int moment) {
        Kernel kernel = KernelLibrary.load(name, Map.of("moment", Rational.of(moment)));
        return Chain.of(kernel).exact(8);
    }

    private static Rational harmonic(int n, int power) {
        Rational sum = Rational.ZERO;
        for (int k = 1; k <= n; k++) {
            sum = sum.add(Rational.of(1, k).power(power));
        }
        return sum;
    }

    /**
     * In units of CF alpha_s/(4 pi), MS-bar (one-loop functions as used everywhere, common practice, no source):
     * F_L 4/(N+1); F_2 2 S_1^2 - 2 S_2 + 3 S_1 - 2 S_1/(N(N+1)) + 3/N + 4/(N+1) + 2/N^2 - 9; F_3 less by (4N+2)/(N(N+1)).
     */
    @ParameterizedTest
    @ValueSource(ints = {1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12})
    void momentsAreExactAndStartWithTheOneLoopFunctions(int n) {
        Rational first = harmonic(n, 1);
        long product = (long) n * (n + 1);
        Rational f2 = first.power(2).multiply(2).subtract(harmonic(n, 2).multiply(2)).add(first.multiply(3))
                .subtract(first.multiply(Rational.of(2, product))).add(Rational.of(3, n)).add(Rational.of(4, n + 1L))
                .add(Rational.of(2, (long) n * n)).subtract(9);
        assertThat(exact("dis-fl", n)).allMatch(ExactConstant::isClosedForm).first().isEqualTo(ExactConstant.of(Rational.of(4, n + 1L)));
        assertThat(exact("dis-f2", n)).allMatch(ExactConstant::isClosedForm).first().isEqualTo(ExactConstant.of(f2));
        assertThat(exact("dis-f3", n)).allMatch(ExactConstant::isClosedForm).first()
                .isEqualTo(ExactConstant.of(f2.subtract(Rational.of(4L * n + 2, product))));
        assertThat(exact("dis-gamma", n)).allMatch(ExactConstant::isClosedForm);
    }
}
