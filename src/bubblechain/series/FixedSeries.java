package bubblechain.series;

import bubblechain.exact.Ball;
import bubblechain.exact.Magnitude;
import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.Arrays;
import java.util.List;

/**
 * A power series with fixed-point coefficients at one common scale and an error bound for each, in units of the last
 * place: the fast counterpart of a series of balls. Coefficients should be of order one; a number that grows out of
 * range throws {@link ArithmeticException}, and the caller takes another route. Immutable.
 *
 * <p>Error discipline: every operation carries the same recurrence for the bounds as for the numbers. Bounds are sums
 * of positive doubles; their own rounding, below n 2^-52 for n terms, is covered by the factor {@link #UP}.
 */
public final class FixedSeries {
    /** Covers the rounding of a sum of up to 2^20 positive doubles. */
    static final double UP = 1 + 0x1p-30;
    /** Guard columns of a product: what is dropped is below 2^-50 of the last place for each pair. */
    static final int GUARD_COLUMNS = 2;
    /** Column sums of so many products of up to 64 digits fit a long; longer numbers take more from it. */
    private static final int PRODUCTS_BETWEEN_CARRIES = 40;
    private static final int DIGITS_AT_ONCE = 64;
    /** Nanoseconds for one product of digits, to be weighed against a transform. */
    static final double COLUMN_COST = 1.2;

    private static final int SMALL = 1 << 26;
    private static final int MANTISSA_BITS = 52;

    private final int limbs;
    private final long[][] digits;
    private final double[] errors;
    /** The errors once more as a factor of the series, see {@link ExponentialBounds}; empty if not known. */
    private final double[] factor;

    private FixedSeries(int limbs, long[][] digits, double[] errors) {
        this(limbs, digits, errors, new double[0]);
    }

    private FixedSeries(int limbs, long[][] digits, double[] errors, double[] factor) {
        this.limbs = limbs;
        this.digits = digits;
        this.errors = errors;
        this.factor = factor;
    }

    /** Number of limbs after the point that hold at least so many bits. */
    public static int limbsFor(int bits) {
        return bits / FixedDigits.BITS + 1;
    }

    /** Bits after the point for a number of limbs. */
    public static int bits(int limbs) {
        return limbs * FixedDigits.BITS;
    }

    /**
     * A series from integers: coefficient k is values[k] 2^(-56 limbs) with an error of at most errors[k] units.
     */
    public static FixedSeries of(List<BigInteger> values, double[] errors, int limbs) {
        long[][] digits = new long[values.size()][];
        for (int k = 0; k < digits.length; k++) {
            digits[k] = FixedDigits.of(values.get(k), limbs);
        }
        return new FixedSeries(limbs, digits, errors.clone());
    }

    /** A series from digits that the caller gives away. */
    static FixedSeries of(long[][] digits, double[] errors, int limbs) {
        return new FixedSeries(limbs, digits, errors);
    }

    /** The constant 1. */
    public static FixedSeries one(int length, int limbs) {
        long[][] digits = new long[length][limbs + 1];
        digits[0][0] = 1;
        return new FixedSeries(limbs, digits, new double[length]);
    }

    public int length() {
        return digits.length;
    }

    public int limbs() {
        return limbs;
    }

    /** A ball for the coefficient of v^k. */
    public Ball coefficient(int k) {
        Ball middle = Ball.ofDyadic(FixedDigits.toInteger(digits[k]), -bits(limbs));
        return errors[k] == 0 ? middle : middle.addError(magnitude(errors[k] * UP).scale(-bits(limbs)));
    }

    /** Not below a bound, which may exceed the range of a long. */
    private static Magnitude magnitude(double bound) {
        if (!(bound < Double.MAX_VALUE)) {
            throw new ArithmeticException("an error bound left the range of a double");
        }
        int shift = Math.max(0, Math.getExponent(bound) - MANTISSA_BITS);
        return Magnitude.of((long) Math.ceil(Math.scalb(bound, -shift))).scale(shift);
    }

    /** The error bound of the coefficient of v^k in units of the last place. */
    public double error(int k) {
        return errors[k];
    }

    public FixedSeries add(FixedSeries other) {
        long[][] sum = new long[length()][];
        double[] bounds = new double[length()];
        for (int k = 0; k < sum.length; k++) {
            sum[k] = digits[k].clone();
            for (int i = 0; i <= limbs; i++) {
                sum[k][i] += other.digits[k][i];
            }
            FixedDigits.normalise(sum[k]);
            bounds[k] = (errors[k] + other.errors[k]) * UP;
        }
        return new FixedSeries(limbs, sum, bounds);
    }

    public FixedSeries subtract(FixedSeries other) {
        return add(other.negate());
    }

    public FixedSeries negate() {
        long[][] result = new long[length()][limbs + 1];
        for (int k = 0; k < result.length; k++) {
            for (int i = 0; i <= limbs; i++) {
                result[k][i] = -digits[k][i];
            }
        }
        return new FixedSeries(limbs, result, errors);
    }

    /** The first {@code length} coefficients with fewer limbs, the digits beyond dropped. */
    public FixedSeries truncated(int length, int fewerLimbs) {
        if (fewerLimbs == limbs) {
            return first(length);
        }
        long[][] result = new long[length][];
        double[] bounds = new double[length];
        double scale = Math.scalb(1.0, -bits(limbs - fewerLimbs));
        for (int k = 0; k < length; k++) {
            result[k] = Arrays.copyOf(digits[k], fewerLimbs + 1);
            bounds[k] = (errors[k] * scale + 1) * UP;
        }
        return new FixedSeries(fewerLimbs, result, bounds);
    }

    /**
     * e^L for a series given by its derivative: this series holds k L_k at v^k, the constant term is not used.
     *
     * <p>n h_n = sum_{k=1}^{n} (k L_k) h_{n-k}, and the errors obey
     * e_n &lt;= (1/n) sum_k (|k L_k| e_{n-k} + d_k |h_{n-k}| + d_k e_{n-k}) + 3 + (transforms used)/n.
     */
    public FixedSeries expOfIntegral() {
        return expOfIntegral(one(1, limbs));
    }

    /** The same, continuing from coefficients that are already known. */
    public FixedSeries expOfIntegral(FixedSeries known) {
        ExponentialRecurrence recurrence = new ExponentialRecurrence(digits, errors, limbs);
        recurrence.run(known.digits, known.errors);
        return new FixedSeries(limbs, recurrence.digits(), recurrence.bounds(), recurrence.factor());
    }

    private int productsBetweenCarries() {
        return productsBetweenCarries(limbs);
    }

    /** Products of numbers of so many limbs that can be added to column sums before they must be carried. */
    static int productsBetweenCarries(int limbs) {
        return Math.max(1, PRODUCTS_BETWEEN_CARRIES / (1 + (limbs + GUARD_COLUMNS) / DIGITS_AT_ONCE));
    }

    private double[] sizes() {
        return Arrays.stream(digits).mapToDouble(FixedDigits::upperBound).toArray();
    }

    private int[] leadingZeros() {
        return Arrays.stream(digits).mapToInt(FixedDigits::leadingZeros).toArray();
    }

    /** The product of two series, digit by digit or by one long convolution, whichever is cheaper. */
    public FixedSeries multiply(FixedSeries other) {
        int length = Math.min(length(), other.length());
        double[] bounds = new double[length];
        double work = productBounds(other, bounds);
        List<long[]> left = Arrays.asList(digits).subList(0, length);
        List<long[]> right = Arrays.asList(other.digits).subList(0, length);
        TransformProduct.Shape shape = TransformProduct.Shape.of(
                length, 2 * length, FixedDigits.largestBits(left), FixedDigits.largestBits(right));
        boolean transform = shape.isPossible() && shape.cost() < work * COLUMN_COST;
        long[][] product = transform
                ? TransformProduct.multiply(left, right, 0, length, limbs, shape)
                : columnProduct(other, length);
        return new FixedSeries(limbs, product, bounds);
    }

    /** Fills in the bounds of a product; returns the number of digit products it would take. */
    private double productBounds(FixedSeries other, double[] bounds) {
        double[] left = sizes();
        double[] right = other.sizes();
        int[] leftZeros = leadingZeros();
        int[] rightZeros = other.leadingZeros();
        double unit = Math.scalb(1.0, -bits(limbs));
        int last = limbs + GUARD_COLUMNS;
        double work = 0;
        for (int n = 0; n < bounds.length; n++) {
            double bound = 0;
            for (int k = 0; k <= n; k++) {
                bound += left[k] * other.errors[n - k] + errors[k] * (right[n - k] + other.errors[n - k] * unit);
                double columns = Math.max(0, last + 1 - leftZeros[k] - rightZeros[n - k]);
                work += columns * columns / 2;
            }
            bounds[n] = (bound + 2) * UP;
        }
        return work;
    }

    private long[][] columnProduct(FixedSeries other, int length) {
        long[][] product = new long[length][];
        int[] leftZeros = leadingZeros();
        int[] rightZeros = other.leadingZeros();
        int last = limbs + GUARD_COLUMNS;
        int between = productsBetweenCarries();
        long[] sums = new long[last + 3];
        for (int n = 0; n < length; n++) {
            Arrays.fill(sums, 0);
            int products = 0;
            for (int k = 0; k <= n; k++) {
                if (leftZeros[k] + rightZeros[n - k] <= last) {
                    FixedDigits.accumulateProduct(
                            digits[k], leftZeros[k], other.digits[n - k], rightZeros[n - k], last, sums);
                    if (++products % between == 0) {
                        FixedDigits.carry(sums);
                    }
                }
            }
            product[n] = FixedDigits.fromSums(sums, limbs);
        }
        return product;
    }

    /** True if {@link #timesPolynomial} and {@link #overPolynomial} can take these integers. */
    static boolean fits(long[] polynomial, long divisor) {
        if (polynomial.length > FixedDigits.TERMS || divisor <= 0 || divisor >= SMALL) {
            return false;
        }
        double sum = 0;
        for (long c : polynomial) {
            if (Math.abs(c) >= SMALL) {
                return false;
            }
            sum += Math.abs((double) c);
        }
        return sum / divisor <= 64;
    }

    /** This times (p_0 + p_1 v + ... )/divisor. */
    FixedSeries timesSmallPolynomial(long[] polynomial, int divisor) {
        return combine(polynomial, divisor, digits, errors);
    }

    /**
     * This over (p_0 + p_1 v + ...) with p_0 &gt; 0: p_0 g_n = f_n - sum_{i>=1} p_i g_{n-i}, with f = p_0 times this.
     */
    FixedSeries overSmallPolynomial(long[] polynomial) {
        long[] recurrence = polynomial.clone();
        for (int i = 1; i < recurrence.length; i++) {
            recurrence[i] = -recurrence[i];
        }
        long[][] result = new long[length()][];
        double[] bounds = new double[length()];
        return combine(recurrence, (int) polynomial[0], result, bounds);
    }

    /**
     * g_n = (w_0 f_n + sum_{i>=1} w_i x_{n-i})/divisor with x either the input or the output itself.
     */
    private FixedSeries combine(long[] weights, int divisor, long[][] shifted, double[] shiftedErrors) {
        boolean recurrence = shifted != digits;
        long[][] result = recurrence ? shifted : new long[length()][];
        double[] bounds = recurrence ? shiftedErrors : new double[length()];
        long[][] terms = new long[FixedDigits.TERMS][];
        int[] w = new int[FixedDigits.TERMS];
        for (int i = 0; i < weights.length; i++) {
            w[i] = (int) weights[i];
        }
        for (int n = 0; n < result.length; n++) {
            terms[0] = digits[n];
            double bound = Math.abs((double) weights[0]) * errors[n];
            int count = 1;
            for (int i = 1; i < weights.length && i <= n; i++) {
                terms[i] = shifted[n - i];
                bound += Math.abs((double) weights[i]) * shiftedErrors[n - i];
                count++;
            }
            result[n] = new long[limbs + 1];
            FixedDigits.combination(result[n], terms, w, count, divisor);
            bounds[n] = (bound / divisor + 2) * UP;
        }
        return new FixedSeries(limbs, result, bounds);
    }

    /** This times a polynomial over Q in v. */
    public FixedSeries times(List<Rational> polynomial) {
        return RationalSteps.times(this, polynomial);
    }

    /**
     * This over a polynomial over Q in v whose constant term is not zero.
     *
     * <p>Each step of p_0 g_n = f_n - sum p_i g_(n-i) is off by at most two units, so the errors of g are those of
     * f/p_0 and two units more, times p_0/p, whose coefficients may be far smaller than the steps let expect.
     */
    public FixedSeries over(List<Rational> polynomial) {
        Rational leading = polynomial.get(0);
        FixedSeries scaled = leading.equals(Rational.ONE) ? this : times(List.of(leading.inverse()));
        FixedSeries quotient =
                RationalSteps.over(scaled, polynomial.stream().map(c -> c.divide(leading)).toList());
        double[] sizes = RationalSteps.quotientSizes(polynomial, length());
        double[] bounds = new double[length()];
        for (int n = 0; n < bounds.length; n++) {
            double bound = 0;
            for (int k = 0; k <= n; k++) {
                bound += sizes[k] * (scaled.errors[n - k] + 2);
            }
            bounds[n] = bound * UP;
        }
        return new FixedSeries(limbs, quotient.digits, bounds);
    }

    /** This times or over groups of linear factors, one after the other; {@link LinearBounds} has the error. */
    public FixedSeries throughLinear(List<LinearGroup> groups) {
        FixedSeries result = this;
        for (LinearGroup group : groups) {
            List<Rational> polynomial = RationalSteps.product(group.slopes());
            result = group.divides() ? RationalSteps.over(result, polynomial) : RationalSteps.times(result, polynomial);
        }
        if (groups.isEmpty()) {
            return this;
        }
        LinearBounds linear = LinearBounds.of(groups, length());
        double[] bounds = linear.after(errors);
        if (factor.length > 0) {
            bounds = linear.after(factor, upper(result.digits, bounds), bounds);
        }
        return new FixedSeries(limbs, result.digits, bounds);
    }

    private double[] upper(long[][] numbers, double[] bounds) {
        double unit = Math.scalb(1.0, -bits(limbs));
        double[] upper = new double[numbers.length];
        Arrays.setAll(upper, n -> (FixedDigits.upperBound(numbers[n]) + bounds[n] * unit) * UP);
        return upper;
    }

    /** The integer of coefficient k, the number times 2^(56 limbs). */
    BigInteger integer(int k) {
        return FixedDigits.toInteger(digits[k]);
    }

    /** v^shift times this, shift not negative; the coefficients beyond the length are dropped. */
    public FixedSeries shifted(int shift) {
        if (shift < 0) {
            throw new IllegalArgumentException("a series has no coefficients to give for v^" + shift);
        }
        long[][] moved = new long[length()][];
        double[] bounds = new double[length()];
        for (int k = 0; k < moved.length; k++) {
            int from = k - shift;
            boolean inside = from >= 0;
            moved[k] = inside ? digits[from] : new long[limbs + 1];
            bounds[k] = inside ? errors[from] : 0;
        }
        return new FixedSeries(limbs, moved, bounds);
    }

    /** The first coefficients only. */
    public FixedSeries first(int length) {
        return new FixedSeries(limbs, Arrays.copyOf(digits, length), Arrays.copyOf(errors, length));
    }
}
