package bubblechain.chain;

import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.kernel.Kernel;
import bubblechain.series.WeightedSeries;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * The bubble chain of a kernel: its coefficients c_n in f = prefactor x sum_{n>=0} c_n a^(n+1),
 * a = beta0 alpha(mu)/(4 pi), exactly or to any number of certified digits.
 *
 * <p>Entry 0 of every list is c_0, the one-loop coefficient. The error of a {@link CertifiedNumber} covers truncation
 * and rounding; that the chain is a model of the full series it does not cover.
 */
public final class Chain {
    /** Largest number of coefficients as decimals. */
    public static final int LARGEST_LOOPS = 10_000;
    /** Largest number of coefficients in exact form. */
    public static final int LARGEST_EXACT_LOOPS = 80;
    /** Largest number of terms that exact coefficients may have together. */
    public static final int LARGEST_EXACT_TERMS = 2_000_000;
    /** Largest number of exact coefficients that need series of constants, and that settle a doubtful decimal. */
    static final int LARGEST_SERIES_LOOPS = 40;
    /** Terms of an exact coefficient up to which longer exact lists stay cheap. */
    private static final int FEW_TERMS = 20;
    /** Largest number of digits. */
    public static final int LARGEST_DIGITS = 10_000;

    private static final double BITS_PER_DIGIT = 3.3219280948873626;
    /** Guard bits of the first attempt: the bounds of the fixed-point route lose some 10 to 50 bits on the way. */
    private static final int FIRST_GUARD_BITS = 64;

    /** Jobs up to this size take the ball route, which starts sooner. */
    private static final int SMALL_LOOPS = 20;

    private static final int SMALL_BITS = 320;
    private static final int LARGEST_GUARD_BITS = 2_048;
    /** Bits beyond those that are missing at one precision, for the next. */
    private static final int SPARE_BITS = 32;
    /** A combination whose nearest pole cancels loses log2(u_1/u_0) bits with every order. */
    private static final int BITS_LOST_PER_ORDER = 4;

    private final Kernel kernel;
    private final Scales scales;

    private Chain(Kernel kernel, Scales scales) {
        this.kernel = kernel;
        this.scales = scales;
    }

    /** The chain at the kernel's own scale. */
    public static Chain of(Kernel kernel) {
        return new Chain(kernel, Scales.NATURAL);
    }

    public static Chain of(Kernel kernel, Scales scales) {
        return new Chain(kernel, scales);
    }

    /**
     * The chain of the kernel's anomalous dimension, gamma(a) = sum gamma_n a^n with d ln O/d ln mu = prefactor x a
     * gamma(a).
     *
     * @throws DomainException if the kernel has none
     */
    public static Chain ofAnomalousDimension(Kernel kernel) {
        return new Chain(kernel.anomalousDimensionAsKernel(), Scales.NATURAL);
    }

    public Kernel kernel() {
        return kernel;
    }

    public Scales scales() {
        return scales;
    }

    /**
     * c_0 .. c_(loops-1) in closed form.
     *
     * @param loops between 1 and {@link #LARGEST_EXACT_LOOPS}; of a kernel with a sine of rational slope, or outside the
     *     admissible class, 40
     * @throws DomainException if the coefficients have more than {@link #LARGEST_EXACT_TERMS} terms together, which
     *     for the pole mass happens above 72 loops
     * @implNote about two microseconds for each term of the result
     */
    public List<ExactConstant> exact(int loops) {
        requireRange("the number of loops in exact form", loops, LARGEST_EXACT_LOOPS);
        return new ExactCoefficients(LARGEST_SERIES_LOOPS).coefficients(kernel, loops, scales);
    }

    /** Balls for c_0 .. c_(loops-1) at a working precision in bits. */
    public List<Ball> balls(int loops, int bits) {
        requireRange("the number of loops", loops, LARGEST_LOOPS);
        return isSmall(loops, bits)
                ? new BallCoefficients(bits).coefficients(kernel, loops, scales)
                : new FixedCoefficients(bits)
                        .coefficients(kernel, loops, scales)
                        .orElseGet(() -> new BallCoefficients(bits).coefficients(kernel, loops, scales));
    }

    private static boolean isSmall(int loops, int bits) {
        return loops <= SMALL_LOOPS && bits <= SMALL_BITS;
    }

    /**
     * c_0 .. c_(loops-1) to a number of certified significant digits.
     *
     * <p>The working precision is raised until both ends of every ball round to the same decimal. A ball that still
     * contains zero, or sits on a tie, is settled by the exact route where that reaches.
     *
     * @param loops  between 1 and {@link #LARGEST_LOOPS}
     * @param digits between 1 and {@link #LARGEST_DIGITS}
     * @throws bubblechain.exact.PrecisionException if the memory of the virtual machine will not do
     */
    public List<CertifiedNumber> certified(int loops, int digits) {
        return certified(loops, digits, Rendering.PLAIN);
    }

    /** The same in another coupling and normalisation. */
    public List<CertifiedNumber> certified(int loops, int digits, Rendering rendering) {
        requireRange("the number of digits", digits, LARGEST_DIGITS);
        requireRange("the number of loops", loops, LARGEST_LOOPS);
        ChainCost.of(loops, digits).requireMemory(Runtime.getRuntime().maxMemory());
        int needed = firstBits(loops, digits) - FIRST_GUARD_BITS;
        int guard = FIRST_GUARD_BITS;
        while (true) {
            int bits = needed + guard;
            Attempt attempt = attempt(loops, digits, bits, rendering);
            List<Optional<CertifiedNumber>> numbers = attempt.numbers();
            int open = undecided(numbers);
            if (open == 0) {
                List<CertifiedNumber> all = new ArrayList<>();
                for (Optional<CertifiedNumber> number : numbers) {
                    all.add(number.orElseThrow());
                }
                return all;
            }
            // what more bits do not settle is a zero or a tie, which exact arithmetic decides where it is affordable
            List<Ball> balls = attempt.all();
            int next = Math.max(2 * guard, guard + missing(balls, numbers, needed));
            boolean beyond = next > Math.max(LARGEST_GUARD_BITS, BITS_LOST_PER_ORDER * loops);
            if (beyond || open <= LARGEST_SERIES_LOOPS && guard >= 2 * FIRST_GUARD_BITS) {
                return settled(balls, numbers, rendering.applyToExact(affordable(open)), digits, bits);
            }
            guard = next;
        }
    }

    /** The bits that the worst ball in doubt lacks, as far as that shows: of a ball that contains zero it does not. */
    private static int missing(List<Ball> balls, List<Optional<CertifiedNumber>> numbers, int needed) {
        int most = 0;
        for (int n = 0; n < balls.size(); n++) {
            if (numbers.get(n).isEmpty() && !balls.get(n).containsZero()) {
                most = Math.max(most, needed + SPARE_BITS - balls.get(n).accuracyBits());
            }
        }
        return most;
    }

    /** The working precision of the first attempt, which normally decides every digit. */
    static int firstBits(int loops, int digits) {
        int forLength = 2 * (32 - Integer.numberOfLeadingZeros(loops));
        return (int) Math.ceil(digits * BITS_PER_DIGIT) + forLength + FIRST_GUARD_BITS;
    }

    /**
     * What one working precision gives.
     *
     * @param numbers those whose digits are certain
     * @param series  all of them, if the fixed-point route was taken
     * @param balls   all of them, if it was not
     */
    private record Attempt(
            List<Optional<CertifiedNumber>> numbers, Optional<WeightedSeries> series, List<Ball> balls, int bits) {
        List<Ball> all() {
            return series.isPresent() ? series.get().balls(bits) : balls;
        }
    }

    private Attempt attempt(int loops, int digits, int bits, Rendering rendering) {
        List<Optional<CertifiedNumber>> numbers = new ArrayList<>();
        if (!isSmall(loops, bits) && rendering.isPlain()) {
            Optional<WeightedSeries> series = new FixedCoefficients(bits).series(kernel, loops, scales);
            if (series.isPresent()) {
                for (Optional<String> text : series.get().decimals(digits, bits)) {
                    numbers.add(text.isPresent() ? Optional.of(CertifiedNumber.ofDigits(text.get())) : Optional.empty());
                }
                return new Attempt(numbers, series, List.of(), bits);
            }
        }
        List<Ball> balls = rendering.applyToBalls(balls(loops, bits), bits);
        for (Ball ball : balls) {
            numbers.add(CertifiedNumber.ifDecided(ball, digits));
        }
        return new Attempt(numbers, Optional.empty(), balls, bits);
    }

    /** One more than the index of the last number in doubt; 0 if there is none. */
    private static int undecided(List<Optional<CertifiedNumber>> numbers) {
        for (int n = numbers.size() - 1; n >= 0; n--) {
            if (numbers.get(n).isEmpty()) {
                return n + 1;
            }
        }
        return 0;
    }

    /** At most {@code loops} exact coefficients: long lists only while they have few terms. */
    private List<ExactConstant> affordable(int loops) {
        int reached = Math.min(loops, LARGEST_SERIES_LOOPS);
        List<ExactConstant> exact;
        try {
            exact = exact(reached);
        } catch (DomainException tooManyTerms) {
            return List.of();
        }
        while (reached < loops && exact.stream().allMatch(c -> c.size() <= FEW_TERMS)) {
            reached = Math.min(loops, 2 * reached);
            exact = new ExactCoefficients(LARGEST_LOOPS).coefficients(kernel, reached, scales);
        }
        return exact;
    }

    /** The numbers that balls could not decide, by the exact ones as far as these reach. */
    private static List<CertifiedNumber> settled(
            List<Ball> balls, List<Optional<CertifiedNumber>> numbers, List<ExactConstant> exact, int digits, int bits) {
        List<CertifiedNumber> result = new ArrayList<>();
        for (int n = 0; n < balls.size(); n++) {
            Ball ball = balls.get(n);
            Optional<ExactConstant> form = n < exact.size() ? Optional.of(exact.get(n)) : Optional.empty();
            result.add(numbers.get(n).orElseGet(() -> form
                    .map(c -> CertifiedNumber.of(c, ball, digits, bits))
                    .orElseGet(() -> CertifiedNumber.of(ball, digits))));
        }
        return result;
    }

    static void requireRange(String what, int value, int largest) {
        if (value < 1 || value > largest) {
            throw new DomainException(what + " lies between 1 and " + largest + ", got " + value);
        }
    }
}
