package bubblechain.series;

import bubblechain.exact.Ball;
import bubblechain.exact.Magnitude;
import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.IntFunction;

/**
 * A power series with fixed-point coefficients at one common scale and an error bound for each, in units of the last
 * place: the fast counterpart of a series of balls. Coefficients should be of order one; a number that grows out of
 * range throws {@link ArithmeticException}, and the caller takes another route. Immutable.
 *
 * <p>Error discipline: every operation carries the same recurrence for the bounds as for the numbers. Bounds are sums of
 * positive doubles; their own rounding, below n 2^-52 for n terms, is covered by the factor {@link #UP}.
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
            digits[k] = values.get(k).signum() == 0 ? new long[limbs + 1] : FixedDigits.of(values.get(k), limbs);
        }
        return new FixedSeries(limbs, digits, errors.clone());
    }

    /** A series from digits that the caller gives away. */
    static FixedSeries of(long[][] digits, double[] errors, int limbs) {
        return new FixedSeries(limbs, digits, errors);
    }

    /** Nothing but zeros. */
    public static FixedSeries zero(int length, int limbs) {
        return new FixedSeries(limbs, new long[length][limbs + 1], new double[length]);
    }

    /** The constant 1. */
    public static FixedSeries one(int length, int limbs) {
        long[][] digits = new long[length][limbs + 1];
        digits[0][0] = 1;
        return new FixedSeries(limbs, digits, new double[length]);
    }

    /** first e^(ratio v): first ratio^k/k!. */
    public static FixedSeries exponential(Rational first, Rational ratio, int length, int limbs) {
        return ratios(first, k -> ratio.divide(k), length, limbs);
    }

    /** A series whose first coefficient is given, and the quotients of each other one by that before it. */
    public static FixedSeries ratios(Rational first, IntFunction<Rational> quotient, int length, int limbs) {
        long[][] digits = new long[length][];
        double[] errors = new double[length];
        BigInteger scaled = first.numerator().shiftLeft(bits(limbs)).divide(first.denominator());
        for (int k = 0; k < length; k++) {
            if (k == 0) {
                digits[k] = FixedDigits.of(scaled, limbs);
                errors[k] = 1;
                continue;
            }
            Rational factor = quotient.apply(k);
            digits[k] = digits[k - 1].clone();
            if (FixedDigits.scales(factor)) {
                FixedDigits.scale(
                        digits[k], factor.numerator().intValueExact(), factor.denominator().intValueExact(),
                        FixedDigits.leadingZeros(digits[k]));
            } else {
                BigInteger next = FixedDigits.toInteger(digits[k]).multiply(factor.numerator());
                digits[k] = FixedDigits.of(next.divide(factor.denominator()), limbs);
            }
            errors[k] = (errors[k - 1] * Math.abs(factor.toDouble()) + 2) * UP;
        }
        return new FixedSeries(limbs, digits, errors);
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
            FixedDigits.add(sum[k], other.digits[k]);
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

    /** The same numbers with more limbs; an error is then that many more units. */
    FixedSeries extended(int moreLimbs) {
        if (moreLimbs <= limbs) {
            return this;
        }
        long[][] result = new long[length()][];
        double[] bounds = new double[length()];
        double scale = Math.scalb(1.0, bits(moreLimbs - limbs));
        for (int k = 0; k < result.length; k++) {
            result[k] = Arrays.copyOf(digits[k], moreLimbs + 1);
            bounds[k] = errors[k] * scale;
        }
        return new FixedSeries(moreLimbs, result, bounds);
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

    /** Products of numbers of so many limbs that can be added to column sums before they must be carried. */
    static int productsBetweenCarries(int limbs) {
        return Math.max(1, PRODUCTS_BETWEEN_CARRIES / (1 + (limbs + GUARD_COLUMNS) / DIGITS_AT_ONCE));
    }

    /** The product of two series, digit by digit or by one long convolution, whichever is cheaper. */
    public FixedSeries multiply(FixedSeries other) {
        return SeriesProduct.of(this, other);
    }

    /** The digits, not to be changed. */
    long[][] digits() {
        return digits;
    }

    /** The error bounds, not to be changed. */
    double[] errors() {
        return errors;
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
        List<Rational> monic = new ArrayList<>();
        for (Rational c : polynomial) {
            monic.add(c.divide(leading));
        }
        FixedSeries quotient = RationalSteps.over(scaled, monic);
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
        for (int n = 0; n < upper.length; n++) {
            upper[n] = (FixedDigits.upperBound(numbers[n]) + bounds[n] * unit) * UP;
        }
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

    /** The coefficients from one power on, as those of v^0, v^1, ...; zeros take the place of what is beyond the end. */
    public FixedSeries window(int from, int length) {
        long[][] moved = new long[length][];
        double[] bounds = new double[length];
        for (int k = 0; k < length; k++) {
            boolean inside = from + k < length();
            moved[k] = inside ? digits[from + k] : new long[limbs + 1];
            bounds[k] = inside ? errors[from + k] : 0;
        }
        return new FixedSeries(limbs, moved, bounds);
    }

    /** Several series one behind the other; at least one, all with the same limbs. */
    public static FixedSeries joined(List<FixedSeries> parts) {
        int length = 0;
        for (FixedSeries part : parts) {
            length += part.length();
        }
        long[][] digits = new long[length][];
        double[] errors = new double[length];
        int at = 0;
        for (FixedSeries part : parts) {
            System.arraycopy(part.digits, 0, digits, at, part.length());
            System.arraycopy(part.errors, 0, errors, at, part.length());
            at += part.length();
        }
        return new FixedSeries(parts.get(0).limbs, digits, errors);
    }

    /** The same numbers, each with an error larger by so much. */
    public FixedSeries withError(Magnitude error) {
        double units = error.scale(bits(limbs)).toDouble();
        double[] bounds = errors.clone();
        for (int k = 0; k < bounds.length; k++) {
            bounds[k] = (bounds[k] + units) * UP;
        }
        return new FixedSeries(limbs, digits, bounds);
    }

    /** The coefficients of this and of another series multiplied one by one, with the limbs of the other. */
    public FixedSeries timesEach(FixedSeries other) {
        int length = Math.min(length(), other.length());
        int last = other.limbs + GUARD_COLUMNS;
        int excess = bits(other.limbs - limbs);
        double unit = Math.scalb(1.0, -bits(limbs));
        long[][] product = new long[length][];
        double[] bounds = new double[length];
        long[] sums = new long[last + 3];
        for (int k = 0; k < length; k++) {
            Arrays.fill(sums, 0);
            int zeros = FixedDigits.leadingZeros(digits[k]);
            FixedDigits.accumulateProduct(
                    digits[k], zeros, other.digits[k], FixedDigits.leadingZeros(other.digits[k]), last, sums);
            product[k] = FixedDigits.fromSums(sums, other.limbs);
            double size = FixedDigits.upperBound(digits[k]) + errors[k] * unit;
            bounds[k] = (size * other.errors[k] + errors[k] * FixedDigits.upperBound(other.digits[k], excess) + 2) * UP;
        }
        return new FixedSeries(other.limbs, product, bounds);
    }

    /** The coefficient of v^k times 1 - 2^-k, for each k. */
    FixedSeries timesOneMinusPowersOfHalf() {
        long[][] result = new long[length()][];
        double[] bounds = new double[length()];
        for (int k = 0; k < result.length; k++) {
            result[k] = digits[k].clone();
            DigitWords.addShifted(result[k], k, -1);
            bounds[k] = (errors[k] + 1) * UP;
        }
        return new FixedSeries(limbs, result, bounds);
    }

    /** This times a constant. */
    public FixedSeries times(Ball constant) {
        int bits = bits(limbs);
        long[] factor = FixedDigits.of(constant.scaledMidpoint(bits), limbs);
        double error = constant.radius().scale(bits).toDouble() + 1;
        long[][] factors = new long[length()][];
        double[] factorErrors = new double[length()];
        Arrays.fill(factors, factor);
        Arrays.fill(factorErrors, error);
        return timesEach(new FixedSeries(limbs, factors, factorErrors));
    }

    Optional<String> decimal(int k, FixedDecimals decimals, int significant) {
        return decimals.decimal(digits[k], errors[k], significant);
    }

    /** The first coefficients only. */
    public FixedSeries first(int length) {
        return new FixedSeries(limbs, Arrays.copyOf(digits, length), Arrays.copyOf(errors, length));
    }
}
