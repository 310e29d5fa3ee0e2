package bubblechain.bench;

import bubblechain.chain.Chain;
import bubblechain.kernel.KernelLibrary;
import com.sun.management.OperatingSystemMXBean;
import com.sun.management.ThreadMXBean;
import java.lang.management.ManagementFactory;
import java.lang.reflect.Field;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Map;

/**
 * Prints what lists of certified coefficients cost in a warm virtual machine. Run it with {@code mvn -q -B -P bench test};
 * options in {@code -Dbench.args="..."}:
 *
 * <pre>
 *   --kernels pole-mass,adler   which kernels
 *   --sizes 20x50,100x100       pairs of coefficients and digits
 *   --exact 20,30,40            lengths of exact lists, of the first kernel; "none" for none
 *   --repeat 5                  measurements of each, after a warm-up
 * </pre>
 *
 * <p>Medians of processor milliseconds of the computing thread and of all threads (the collector and the compiler too), time
 * on the clock, megabytes allocated; growth is the ratio of thread times to the row above. The program keeps zeta values
 * between lists of coefficients; they are forgotten before every run, so that each pays for its own.
 */
public final class Benchmark {
    private static final OperatingSystemMXBean SYSTEM =
            (OperatingSystemMXBean) ManagementFactory.getOperatingSystemMXBean();
    private static final ThreadMXBean THREADS = (ThreadMXBean) ManagementFactory.getThreadMXBean();
    /** A job is warmed up for so many seconds of processor time, and twice at least. */
    private static final double WARM_UP_SECONDS = 5;
    /** Short jobs are run so many seconds per measurement: the clock of the processor ticks slowly. */
    private static final double SECONDS_AT_ONCE = 0.3;

    private static final List<Map<?, ?>> ZETA_TABLES =
            List.of(zetaTables("bubblechain.exact.ZetaFunctions"), zetaTables("bubblechain.series.FixedZeta"));

    private List<String> kernels = List.of("pole-mass", "adler", "static-potential-r", "bjorken-gls", "cusp");
    private List<String> sizes = List.of("20x50", "100x100", "300x300", "1000x1000", "2000x2000");
    private List<String> exactLengths = List.of("20", "30", "40", "60");
    private int repeat = 5;

    private Benchmark() {}

    /** What one run cost: milliseconds, and megabytes. */
    private record Cost(double thread, double process, double wall, double megabytes) {
        static Cost median(List<Cost> costs) {
            return new Cost(
                    middle(costs.stream().mapToDouble(Cost::thread).toArray()),
                    middle(costs.stream().mapToDouble(Cost::process).toArray()),
                    middle(costs.stream().mapToDouble(Cost::wall).toArray()),
                    middle(costs.stream().mapToDouble(Cost::megabytes).toArray()));
        }

        private static double middle(double[] values) {
            Arrays.sort(values);
            return values[values.length / 2];
        }
    }

    public static void main(String[] arguments) {
        Benchmark benchmark = new Benchmark();
        for (int i = 0; i + 1 < arguments.length; i += 2) {
            benchmark.option(arguments[i], arguments[i + 1]);
        }
        if (arguments.length % 2 != 0) {
            throw new IllegalArgumentException("an option without a value: " + arguments[arguments.length - 1]);
        }
        benchmark.run();
    }

    private void option(String name, String value) {
        List<String> list = List.of(value.split(","));
        switch (name) {
            case "--kernels" -> kernels = list;
            case "--sizes" -> sizes = list;
            case "--exact" -> exactLengths = value.equals("none") ? List.of() : list;
            case "--repeat" -> repeat = Integer.parseInt(value);
            default -> throw new IllegalArgumentException("no option " + name + "; there are --kernels, --sizes, --exact, --repeat");
        }
    }

    private void run() {
        System.out.println("kernel               coefficients  digits  thread ms process ms   wall ms  allocated MB   growth");
        for (String kernel : kernels) {
            Chain chain = Chain.of(KernelLibrary.load(kernel));
            double before = 0;
            for (String size : sizes) {
                int loops = Integer.parseInt(size.split("x")[0]);
                int digits = Integer.parseInt(size.split("x")[1]);
                Cost cost = measure(() -> chain.certified(loops, digits).size());
                print(kernel, loops, String.valueOf(digits), cost, before);
                before = cost.thread();
            }
        }
        Chain chain = Chain.of(KernelLibrary.load(kernels.get(0)));
        double before = 0;
        for (String length : exactLengths) {
            int loops = Integer.parseInt(length);
            Cost cost = measure(() -> chain.exact(loops).size());
            print(kernels.get(0), loops, "exact", cost, before);
            before = cost.thread();
        }
    }

    private static void print(String kernel, int loops, String digits, Cost cost, double before) {
        String growth = before == 0 ? "" : String.format(Locale.ROOT, "%9.1f", cost.thread() / before);
        System.out.println(String.format(
                Locale.ROOT,
                "%-20s %12d  %6s  %9.1f  %9.1f %9.1f  %12.1f %s",
                kernel,
                loops,
                digits,
                cost.thread(),
                cost.process(),
                cost.wall(),
                cost.megabytes(),
                growth));
    }

    /** A job that gives the number of its results, which must not be zero. */
    private interface Job {
        int run();
    }

    private static void once(Job job) {
        ZETA_TABLES.forEach(Map::clear);
        if (job.run() == 0) {
            throw new IllegalStateException("no coefficients");
        }
    }

    private Cost measure(Job job) {
        long start = SYSTEM.getProcessCpuTime();
        int runs = 0;
        while (runs < 2 || processorSeconds(start) < WARM_UP_SECONDS) {
            once(job);
            runs++;
        }
        int atOnce = (int) Math.max(1, Math.ceil(SECONDS_AT_ONCE * runs / processorSeconds(start)));
        List<Cost> costs = new ArrayList<>();
        for (int i = 0; i < repeat; i++) {
            costs.add(average(job, atOnce));
        }
        return Cost.median(costs);
    }

    private static Cost average(Job job, int runs) {
        long allocated = THREADS.getThreadAllocatedBytes(Thread.currentThread().getId());
        long clock = System.nanoTime();
        long process = SYSTEM.getProcessCpuTime();
        long thread = THREADS.getCurrentThreadCpuTime();
        for (int i = 0; i < runs; i++) {
            once(job);
        }
        return new Cost(
                (THREADS.getCurrentThreadCpuTime() - thread) / 1e6 / runs,
                processorSeconds(process) * 1e3 / runs,
                (System.nanoTime() - clock) / 1e6 / runs,
                (THREADS.getThreadAllocatedBytes(Thread.currentThread().getId()) - allocated) / 1e6 / runs);
    }

    private static double processorSeconds(long since) {
        return (SYSTEM.getProcessCpuTime() - since) / 1e9;
    }

    private static Map<?, ?> zetaTables(String owner) {
        try {
            Field tables = Class.forName(owner).getDeclaredField("TABLES");
            tables.setAccessible(true);
            return (Map<?, ?>) tables.get(null);
        } catch (ReflectiveOperationException e) {
            throw new IllegalStateException("the zeta tables have moved", e);
        }
    }
}
