package bubblechain.exact;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * W(z) = sum_{k&gt;=0} [k! Gamma(z)/Gamma(z+k+1)]^2 = z^(-2) 3F2(1, 1, 1; 1+z, 1+z; 1), the function of the inclusive
 * widths of heavy quarks, and its derivatives.
 *
 * <p>W(z) = int int (x y)^(z-1)/(x + y - x y) over the unit square; the relation of neighbours
 * W(z) = W(z+1) z/(2(2z-1)) + 3/(2z(2z-1)), iterated, gives a series that converges like 4^(-n) for every z,
 *
 * <p>W(z) = (3/4) sum_{n&gt;=0} 4^(-n) (z)_n/[(z-1/2)_(n+1) (z+n)],
 *
 * <p>with simple poles at z = 1/2, -1/2, -3/2, ... and at 0, -1, -2, ... only. From n = N on the sum is the N-th factor
 * 4^(-N) (z)_N/(z-1/2)_(N+1) times R(z) with |R| &lt;= (4/3)/|z+N| where Re z + N &gt; 0, since |w| &lt;= |w+1/2| there;
 * Cauchy's estimate on |y| = 1/2 bounds the Taylor coefficients of R.
 */
public final class UnitHypergeometric {
    /** Largest order of a derivative in formulas. */
    public static final int LARGEST_ORDER = 100;
    /** Largest argument of a constant. */
    public static final int LARGEST_ARGUMENT = 200;

    private static final int GUARD_BITS = 24;
    private static final int LEAST_BITS = 64;
    private static final Rational HALF = Rational.HALF;
    private static final Rational THREE_HALVES = Rational.of(3, 2);
    /** Bound of 2^(-j) |R_j| if Re z + N &gt;= 1: (4/3)/(1/2), rounded up. */
    private static final long TAIL_FACTOR = 3;

    private UnitHypergeometric() {}

    /** True at a pole of W. */
    public static boolean isPole(Rational z) {
        return z.signum() <= 0 && z.isInteger() || z.compareTo(HALF) <= 0 && z.add(HALF).isInteger();
    }

    /** The number c in the factor c + y of a series in y. */
    private interface Shift {
        Ball times(Ball value, int bits);

        /** value/c. */
        Ball over(Ball value, int bits);

        /** c + q. */
        Shift plus(Rational q);
    }

    /** Products with a short fraction cost no more than its length. */
    private record ExactShift(Rational c) implements Shift {
        @Override
        public Ball times(Ball value, int bits) {
            return value.multiply(c, bits);
        }

        @Override
        public Ball over(Ball value, int bits) {
            return value.divide(c, bits);
        }

        @Override
        public Shift plus(Rational q) {
            return new ExactShift(c.add(q));
        }
    }

    private record BallShift(Ball c, Ball inverse, int working) implements Shift {
        static BallShift of(Ball c, int working) {
            return new BallShift(c, Ball.ONE.divide(c, working), working);
        }

        @Override
        public Ball times(Ball value, int bits) {
            return value.multiply(c, bits);
        }

        @Override
        public Ball over(Ball value, int bits) {
            return value.multiply(inverse, bits);
        }

        @Override
        public Shift plus(Rational q) {
            return of(c.add(q, working), working);
        }
    }

    /**
     * The Taylor coefficients W^(k)(z)/k! for k below {@code count}.
     *
     * @param bits working precision; the precision of the k-th coefficient is relative to 2^k
     * @throws ArithmeticException if z is a pole
     */
    public static Ball[] taylor(Rational z, int count, int bits) {
        return taylor(new ExactShift(z), firstTerm(z), count, bits);
    }

    /** The same at all numbers of a ball. @throws ArithmeticException if z cannot be told from a pole */
    public static Ball[] taylor(Ball z, int count, int bits) {
        Rational least = z.midpoint().subtract(z.radius().toRational());
        return taylor(BallShift.of(z, bits + GUARD_BITS), firstTerm(least), count, bits);
    }

    /** The first n with z + n of at least 1. */
    private static long firstTerm(Rational z) {
        return Math.max(0, 1 - z.floor().longValueExact());
    }

    private static Ball[] taylor(Shift z, long first, int count, int bits) {
        int working = bits + GUARD_BITS;
        long last = Math.max(first, 1) + working / 2 + 2L * count;
        Ball[] factor = new Ball[count];
        Arrays.fill(factor, Ball.ZERO);
        factor[0] = Ball.of(Rational.of(3, 4), working);
        overLinear(factor, z.plus(HALF.negate()), working);
        Ball[] sum = new Ball[count];
        Arrays.fill(sum, Ball.ZERO);
        for (long n = 0; n < last; n++) {
            // the terms fall like 4^(-n), and with them the digits that are needed
            int current = (int) Math.max(LEAST_BITS, working - 2 * Math.max(0, n - first));
            Shift shifted = z.plus(Rational.of(n));
            Ball[] term = factor.clone();
            overLinear(term, shifted, current);
            for (int k = 0; k < count; k++) {
                sum[k] = sum[k].add(term[k], working);
            }
            timesLinear(factor, shifted, current);
            overLinear(factor, shifted.plus(HALF), current);
            for (int k = 0; k < count; k++) {
                factor[k] = factor[k].shift(-2);
            }
        }
        return withTail(sum, factor);
    }

    /** series (c + y). */
    private static void timesLinear(Ball[] series, Shift c, int bits) {
        for (int k = series.length - 1; k >= 0; k--) {
            Ball product = c.times(series[k], bits);
            series[k] = k == 0 ? product : product.add(series[k - 1], bits);
        }
    }

    /** series/(c + y). */
    private static void overLinear(Ball[] series, Shift c, int bits) {
        for (int k = 0; k < series.length; k++) {
            series[k] = c.over(k == 0 ? series[k] : series[k].subtract(series[k - 1], bits), bits);
        }
    }

    private static Ball[] withTail(Ball[] sum, Ball[] factor) {
        Magnitude convolution = Magnitude.ZERO;
        Ball[] result = new Ball[sum.length];
        for (int k = 0; k < sum.length; k++) {
            convolution = convolution.scale(1).add(factor[k].upperBound());
            result[k] = sum[k].addError(convolution.multiply(Magnitude.of(TAIL_FACTOR)));
        }
        return result;
    }

    /**
     * W^(n)(z) exactly, in terms of its Taylor coefficients at a point of [1, 2).
     *
     * @throws DomainException at a pole
     */
    static ExactConstant value(int n, Rational z) {
        if (isPole(z)) {
            throw new DomainException("unit_3f2 has a pole at " + z);
        }
        Rational anchor = anchor(z);
        List<ExactConstant> values = new ArrayList<>();
        for (int k = 0; k <= n; k++) {
            values.add(coefficient(k, anchor).multiply(Rational.of(ExactFunctions.factorial(k))));
        }
        return new UnitRecurrence<>(
                        ExactConstant::add, ExactConstant::multiply, ExactConstant::of,
                        (c, power) -> ExactConstant.of(c.power(-power)))
                .from(values, anchor, z.subtract(anchor).intValueExact())
                .get(n);
    }

    /** The point of [1, 2) that differs from z by an integer. */
    public static Rational anchor(Rational z) {
        return z.subtract(Rational.of(z.floor())).add(1);
    }

    /**
     * W^(k)(s)/k!, for s in [1, 2). In closed form W(1) = zeta(2), W'(1) = -2 sum H_n/n^2 = -4 zeta(3),
     * W''(1) = sum (4 H_n^2 + 2 H_n^(2))/n^2 = 41 zeta(4)/2,
     * W'''(1) = -sum (8 H_n^3 + 12 H_n H_n^(2) + 4 H_n^(3))/n^2 = -114 zeta(5) - 12 zeta(2) zeta(3) by the sums of Euler
     * (the cubic ones: Flajolet and Salvy, Experimental Mathematics 7 (1998) 15, from memory), and W(3/2) = 4 pi - 12,
     * since the residue of W at 1/2 is pi/2 (the terms of the sum over k go like Gamma(z)^2 k^(-2z)).
     */
    public static ExactConstant coefficient(int k, Rational s) {
        return closedForm(k, s).orElseGet(() -> ExactConstant.opaque(
                        "unit_3f2(" + k + "," + s + ")",
                        bits -> taylor(s, k + 1, bits + 2 * k)[k].multiply(
                                Rational.of(ExactFunctions.factorial(k)), bits))
                .divide(Rational.of(ExactFunctions.factorial(k))));
    }

    private static Optional<ExactConstant> closedForm(int k, Rational s) {
        if (s.equals(THREE_HALVES) && k == 0) {
            return Optional.of(ExactConstant.PI.multiply(Rational.of(4)).subtract(ExactConstant.of(12)));
        }
        if (!s.equals(Rational.ONE) || k > 3) {
            return Optional.empty();
        }
        return Optional.of(switch (k) {
            case 0 -> ExactFunctions.zeta(2);
            case 1 -> ExactFunctions.zeta(3).multiply(Rational.of(-4));
            case 2 -> ExactFunctions.zeta(4).multiply(Rational.of(41, 4));
            default -> ExactFunctions.zeta(5).multiply(Rational.of(-19))
                    .subtract(ExactFunctions.zeta(2).multiply(ExactFunctions.zeta(3)).multiply(Rational.TWO));
        });
    }
}
