package bubblechain.exact;

import java.math.BigInteger;

/**
 * Square root, exponential, logarithm and powers of balls: the value at the midpoint plus a bound of the change over
 * the ball.
 */
final class Elementary {
    private static final int GUARD = 24;
    /** From here on one starts from the logarithm of a double: four times its 50 bits. */
    private static final int DOUBLE_START_BITS = 190;
    private static final long LARGEST_EXPONENT_ARGUMENT = 1L << 28;

    private Elementary() {}

    /** |sqrt x - sqrt m| = |x - m|/(sqrt x + sqrt m) <= r/sqrt m, and the root of a cut mantissa is below one unit low. */
    static Ball sqrt(Ball x, int bits) {
        if (x.isZero()) {
            return x;
        }
        if (x.isNegative()) {
            throw new DomainException("the square root of " + x + " is not real; the argument must not be negative");
        }
        if (x.low().signum() < 0) {
            throw new PrecisionException("the square root of a ball with negative points, " + x
                    + ", is not defined; raise the precision");
        }
        Dyadic middle = x.mid();
        long scale = middle.top() - 2L * (bits + 2);
        scale -= Math.floorMod(scale, 2L);
        long shift = middle.exponent() - scale;
        BigInteger shifted = shift >= 0
                ? middle.mantissa().shiftLeft((int) shift)
                : middle.mantissa().shiftRight((int) -shift);
        BigInteger[] root = shifted.sqrtAndRemainder();
        boolean exact = root[1].signum() == 0
                && (shift >= 0 || middle.mantissa().getLowestSetBit() >= -shift);
        Ball result = Ball.ofDyadic(new Dyadic(root[0], scale / 2));
        if (!exact) {
            result = result.addError(Magnitude.powerOfTwo(scale / 2));
        }
        Magnitude change = x.radius().multiply(Magnitude.ofInverse(root[0], scale / 2)); // root[0] is cut down
        return result.addError(change).round(bits);
    }

    /** e^x: e^m times a factor within e^r - 1 of one. */
    static Ball exp(Ball x, int bits) {
        if (x.isZero()) {
            return Ball.ONE;
        }
        if (x.upperBound().compareTo(Magnitude.of(LARGEST_EXPONENT_ARGUMENT)) > 0) {
            throw new PrecisionException("exp of a ball that reaches sizes above " + LARGEST_EXPONENT_ARGUMENT
                    + " is not computed");
        }
        Ball center = expCenter(x.center(), bits + 4);
        return center.addError(center.upperBound().multiply(growth(x.radius()))).round(bits);
    }

    /** A bound of e^r - 1: r + r^2 for r <= 1, as the series gives r^2/2 (1 + r/3 + ...) <= r^2 (e - 2); else 2^ceil(3r/2). */
    static Magnitude growth(Magnitude r) {
        if (r.compareTo(Magnitude.ONE) <= 0) {
            return r.add(r.multiply(r));
        }
        return Magnitude.powerOfTwo((long) Math.ceil(1.5 * r.toDouble()) + 1);
    }

    /** e^m = 2^k (e^t)^(2^j) with t = (m - k ln 2)/2^j. */
    private static Ball expCenter(Ball m, int bits) {
        long k = Math.round(m.toDouble() / Math.log(2));
        int halvings = (int) Math.sqrt(bits) + 1;
        int scale = bits + halvings + GUARD;
        Ball reduced = m;
        if (k != 0) {
            int working = scale + 64 - Long.numberOfLeadingZeros(Math.abs(k));
            reduced = m.subtract(Constants.ln2(working).multiply(Rational.of(k), working), working);
        }
        Ball power = expSeries(reduced.shift(-halvings), scale);
        for (int i = 0; i < halvings; i++) {
            power = power.multiply(power, scale);
        }
        return power.shift((int) k).round(bits);
    }

    /**
     * e^t for a ball with |t| <= 1/2, by its Taylor series in fixed point.
     *
     * <p>Error. Let u be the cut-down midpoint, |t - u| <= d = r + 1 unit: |e^t - e^u| <= e^u (e^d - 1) <= 4 d for
     * d <= 1/2. The computed term n is floor(term (n-1) u) / n, off by e_n <= (e_(n-1)/2 + 1)/n + 1 <= 2 units. The
     * loop ends when a term is zero; the true one is then at most 2 units and the rest at most 2 units.
     */
    static Ball expSeries(Ball t, int scale) {
        BigInteger u = t.fixed(scale);
        BigInteger term = BigInteger.ONE.shiftLeft(scale);
        BigInteger sum = term;
        int n = 0;
        do {
            n++;
            term = term.multiply(u).shiftRight(scale).divide(BigInteger.valueOf(n));
            sum = sum.add(term);
        } while (term.signum() != 0);
        Magnitude argument = t.radius().add(Magnitude.powerOfTwo(-scale));
        if (argument.compareTo(Magnitude.powerOfTwo(-1)) > 0) {
            throw new PrecisionException("the argument of exp is known to less than one bit");
        }
        return Ball.ofFixed(sum, scale, 2L * n + 4).addError(argument.scale(2));
    }

    /** ln x: |ln x - ln m| <= -ln(1 - r/m) <= r/(m - r). */
    static Ball ln(Ball x, int bits) {
        requirePositive(x, "the logarithm");
        Magnitude change = x.radius().multiply(x.inverseUpperBound());
        return lnCenter(x.center(), bits).addError(change).round(bits);
    }

    static void requirePositive(Ball x, String name) {
        if (x.isPositive()) {
            return;
        }
        if (x.high().signum() <= 0) {
            throw new DomainException(name + " needs a positive argument, got " + x);
        }
        throw new PrecisionException(name + " needs a positive argument; the ball " + x
                + " reaches zero; raise the precision");
    }

    /** ln m = k ln 2 + ln y with y in [2/3, 4/3). */
    private static Ball lnCenter(Ball m, int bits) {
        int k = Math.toIntExact(m.mid().top());
        Ball y = m.shift(-k);
        if (y.mid().compareTo(new Dyadic(BigInteger.valueOf(2863311531L), -32)) < 0) { // 2/3, roughly
            y = y.shift(1);
            k--;
        }
        if (k == 0) {
            return lnNearOne(y, bits);
        }
        int working = bits + 8;
        Ball twos = Constants.ln2(working + 32).multiply(Rational.of(k), working + 32);
        return twos.add(lnAbsolute(y, working), bits + 8);
    }

    /** To {@code bits} significant bits, however close to one y is. */
    private static Ball lnNearOne(Ball y, int bits) {
        Ball difference = y.subtract(Ball.ONE, Integer.MAX_VALUE);
        if (difference.isZero()) {
            return difference;
        }
        long closeness = Math.max(0, -difference.mid().top());
        return closeness > (bits + GUARD) / 3 + 2
                ? lnOnePlus(difference, bits)
                : lnAbsolute(y, bits + (int) closeness + 4);
    }

    /** To an absolute error near 2^-bits: ln y = y_0 + ln(y e^-y_0), y_0 good to a quarter of the bits. */
    private static Ball lnAbsolute(Ball y, int bits) {
        Ball start;
        if (bits <= DOUBLE_START_BITS) {
            double guess = Math.log(y.toDouble());
            start = Ball.ofDyadic(BigInteger.valueOf((long) Math.scalb(guess, 60)), -60);
        } else {
            start = lnAbsolute(y, bits / 4 + 8).center();
        }
        int working = bits + GUARD;
        Ball ratio = y.multiply(exp(start.negate(), working), working);
        return start.add(lnOnePlus(ratio.subtract(Ball.ONE, working), working), working);
    }

    /** ln(1 + d) = d - d^2/2 + d^3/3 with an error of at most d^4/(4 (1 - |d|)) <= d^4/2 for |d| <= 1/2. */
    static Ball lnOnePlus(Ball d, int bits) {
        Magnitude size = d.upperBound();
        if (size.compareTo(Magnitude.powerOfTwo(-1)) > 0) {
            throw new PrecisionException("the start of a logarithm is not close enough; raise the precision");
        }
        int working = bits + 8;
        Ball cubic = d.multiply(Rational.of(1, 3), working).subtract(Ball.ONE.shift(-1), working);
        Ball factor = cubic.multiply(d, working).add(Ball.ONE, working);
        Magnitude square = size.multiply(size);
        return d.multiply(factor, working).addError(square.multiply(square).scale(-1)).round(bits);
    }

    /** base^exponent for rational exponents; the base must be positive unless the exponent is an integer. */
    static Ball power(Ball base, Rational exponent, int bits) {
        if (exponent.isInteger() && exponent.numerator().bitLength() < 31) {
            return base.power(exponent.intValueExact(), bits);
        }
        if (base.isZero() && exponent.signum() > 0) {
            return base;
        }
        if (exponent.denominator().equals(BigInteger.TWO) && exponent.numerator().bitLength() < 31) {
            return sqrt(base, bits + 36).power(exponent.numerator().intValueExact(), bits);
        }
        requirePositive(base, "a power with the exponent " + exponent);
        Ball logarithm = ln(base, bits + 8);
        // relative error of the power = absolute error of the exponent: as many bits more as it has before the point
        long size = Math.max(0, logarithm.multiply(exponent, bits).upperBound().exponent());
        if (size > 30) {
            throw new PrecisionException("the power " + base + "^" + exponent + " is out of range");
        }
        int working = bits + (int) size + 8;
        return exp(ln(base, working).multiply(exponent, working), bits);
    }
}
