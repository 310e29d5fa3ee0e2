package bubblechain.chain;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.kernel.KernelLibrary;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;
import org.junit.jupiter.api.Test;

/** The same digits from one thread or many: nothing is shared but tables that only grow. */
class ConcurrentUseTest {
    private static final List<String> KERNELS =
            List.of("pole-mass", "adler", "static-potential-r", "gamma-m", "chromomag-ca", "static-potential-q");
    private static final int REQUESTS = 24;

    /**
     * Short lists, long lists and closed forms in turn, the precision growing so that tables are made anew meanwhile.
     */
    private static List<String> digits(int request, int base) {
        Chain chain = Chain.of(KernelLibrary.load(KERNELS.get(request % KERNELS.size())));
        int digits = base + 5 * request;
        return switch (request % 4) {
            case 0 -> chain.certified(12, 40 + request).stream().map(CertifiedNumber::text).toList();
            case 1 -> chain.exact(6).stream().map(c -> CertifiedNumber.of(c, digits).text()).toList();
            default -> chain.certified(25 + request, digits).stream().map(CertifiedNumber::text).toList();
        };
    }

    private static List<List<String>> answers(int threads, int base) throws InterruptedException, ExecutionException {
        ExecutorService pool = Executors.newFixedThreadPool(threads);
        try {
            List<Future<List<String>>> futures = new ArrayList<>();
            for (int request = 0; request < REQUESTS; request++) {
                int number = request;
                futures.add(pool.submit(() -> digits(number, base)));
            }
            List<List<String>> answers = new ArrayList<>();
            for (Future<List<String>> future : futures) {
                answers.add(future.get());
            }
            return answers;
        } finally {
            pool.shutdownNow();
        }
    }

    /** The run in most threads comes first: it finds the fewest values in the tables. */
    @Test
    void oneTwoAndEightThreadsGiveTheSameDigits() throws InterruptedException, ExecutionException {
        List<List<String>> eight = answers(8, 300);
        assertThat(answers(2, 300)).isEqualTo(eight);
        assertThat(answers(1, 300)).isEqualTo(eight);
        assertThat(eight).hasSize(REQUESTS).allSatisfy(list -> assertThat(list).hasSizeGreaterThan(5));
    }

    /** Tables filled by short requests and by long ones, in one thread or by many at once. */
    @Test
    void theOrderOfRequestsDoesNotMatter() throws InterruptedException, ExecutionException {
        List<List<String>> together = answers(4, 120);
        for (int request = REQUESTS - 1; request >= 0; request -= 3) {
            assertThat(digits(request, 120)).as("request %d alone", request).isEqualTo(together.get(request));
        }
    }
}
