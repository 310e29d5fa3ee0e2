package bubblechain.chain;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.kernel.KernelLibrary;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The same digits from one thread or many: nothing is shared but tables that only grow. */
class ConcurrentUseTest {
    private static final List<String> KERNELS = List.of("pole-mass", "adler", "static-potential-r", "gamma-m");

    private static List<String> digits(String kernel) {
        return Chain.of(KernelLibrary.load(kernel)).certified(70, 90).stream()
                .map(CertifiedNumber::text)
                .toList();
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 8})
    void digitsDoNotDependOnTheNumberOfThreads(int threads) throws InterruptedException, ExecutionException {
        List<List<String>> expected = KERNELS.stream().map(ConcurrentUseTest::digits).toList();
        ExecutorService pool = Executors.newFixedThreadPool(threads);
        try {
            List<Future<List<String>>> answers = new ArrayList<>();
            for (int round = 0; round < 2 * threads; round++) {
                String kernel = KERNELS.get(round % KERNELS.size());
                answers.add(pool.submit(() -> digits(kernel)));
            }
            for (int round = 0; round < answers.size(); round++) {
                assertThat(answers.get(round).get()).isEqualTo(expected.get(round % KERNELS.size()));
            }
        } finally {
            pool.shutdownNow();
        }
    }
}
