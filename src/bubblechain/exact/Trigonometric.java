package bubblechain.exact;

import java.math.BigInteger;

/** Sine and cosine of balls and of rational multiples of pi. */
final class Trigonometric {
    private static final int GUARD = 24;
    private static final int LARGEST_ARGUMENT_EXPONENT = 1 << 16;
    private static final Rational QUARTER = Rational.of(1, 4);
    private static final Rational SIXTH = Rational.of(1, 6);

    private Trigonometric() {}

    static Ball sin(Ball x, int bits) {
        return shiftedSine(x, 0, bits);
    }

    static Ball cos(Ball x, int bits) {
        return shiftedSine(x, 1, bits);
    }

    /** sin(x + quarters pi/2); its slope is at most 1 and its change at most 2. */
    private static Ball shiftedSine(Ball x, int quarters, int bits) {
        if (x.isZero()) {
            return Ball.of(quarters);
        }
        if (x.mid().top() > LARGEST_ARGUMENT_EXPONENT) {
            throw new PrecisionException("sine or cosine of an argument above 2^" + LARGEST_ARGUMENT_EXPONENT
                    + " is not computed");
        }
        Magnitude change = x.radius().min(Magnitude.powerOfTwo(1));
        BigInteger turns = nearestQuarterTurns(x);
        int quadrant = turns.add(BigInteger.valueOf(quarters)).and(BigInteger.valueOf(3)).intValue();
        Ball rest = remainder(x, turns, bits);
        Ball value = quadrant % 2 == 0 ? sineOfSmall(rest, bits + 4) : cosineOfSmall(rest, bits + 4);
        return (quadrant >= 2 ? value.negate() : value).addError(change).round(bits);
    }

    /** The integer nearest to 2 m/pi, or a neighbour of it where that hardly matters. */
    private static BigInteger nearestQuarterTurns(Ball x) {
        int working = (int) Math.max(0, x.mid().top()) + 64;
        Ball turns = x.center().shift(1).divide(Constants.pi(working), working);
        return turns.mid().add(new Dyadic(BigInteger.ONE, -1)).floor();
    }

    /** m - turns pi/2, to bits significant bits or as far as the radius of x gives meaning to them. */
    private static Ball remainder(Ball x, BigInteger turns, int bits) {
        if (turns.signum() == 0) {
            return x.center();
        }
        int working = bits + GUARD + turns.bitLength();
        while (true) {
            Ball multiple = Constants.pi(working).shift(-1).multiply(Rational.of(turns), working);
            // all bits of m are kept, so the error is that of the multiple of pi alone
            Ball rest = x.center().subtract(multiple, Math.max(working, x.mid().mantissa().bitLength() + 2));
            int missing = bits + 8 - rest.accuracyBits();
            if (missing <= 0 || rest.radius().scale(8).compareTo(x.radius()) <= 0) {
                return rest;
            }
            working += Math.max(missing, GUARD); // m is near a multiple of pi/2, which it cannot equal
        }
    }

    /**
     * sin t for |t| < 0.9, to bits significant bits.
     *
     * <p>Error. Fixed point with u the cut-down midpoint, |t - u| <= r + 1 unit, slope at most 1. The term
     * n is floor(term (n-1) floor(u^2))/(2n (2n+1)), off by e_n <= (0.81 e_(n-1) + 2)/6 + 1 <= 2 units. The loop ends
     * when a term is zero, so that the true one is at most 2 units; the rest alternates and is at most that.
     */
    static Ball sineOfSmall(Ball t, int bits) {
        if (t.isZero()) {
            return t;
        }
        long size = -t.mid().top();
        if (size > bits / 2 + 4) { // |sin t - t| <= |t|^3/6
            Magnitude bound = t.upperBound();
            return t.addError(bound.multiply(bound).multiply(bound).scale(-2)).round(bits);
        }
        int scale = bits + GUARD + (int) Math.max(0, size);
        BigInteger u = t.fixed(scale);
        return alternating(u, u, 1, scale).addError(t.radius().add(Magnitude.powerOfTwo(-scale)));
    }

    /** cos t for |t| < 0.9; the bound is the one of {@link #sineOfSmall} with (2n-1) 2n in place of 2n (2n+1). */
    static Ball cosineOfSmall(Ball t, int bits) {
        int scale = bits + GUARD;
        BigInteger u = t.fixed(scale);
        return alternating(BigInteger.ONE.shiftLeft(scale), u, 0, scale)
                .addError(t.radius().add(Magnitude.powerOfTwo(-scale)));
    }

    /**
     * first - first u^2/((offset+1)(offset+2)) + ...; the bound is found at {@link #sineOfSmall}. For the cosine the
     * first step divides by 2: e_1 <= (0 + 2)/2 + 1 = 2, then e_n <= (0.81 * 2 + 2)/12 + 1 <= 2.
     */
    static Ball alternating(BigInteger first, BigInteger u, int offset, int scale) {
        BigInteger square = u.multiply(u).shiftRight(scale);
        BigInteger term = first;
        BigInteger sum = first;
        long n = 0;
        while (term.signum() != 0) {
            n++;
            BigInteger divisor = BigInteger.valueOf((2 * n - 1 + offset) * (2 * n + offset));
            term = term.multiply(square).shiftRight(scale).divide(divisor).negate();
            sum = sum.add(term);
        }
        return Ball.ofFixed(sum, scale, 2 * n + 4);
    }

    /** sin(pi q); exact where it is rational: 0, +-1/2, +-1. */
    static Ball sinPi(Rational q, int bits) {
        Rational turn = q.subtract(Rational.of(q.multiply(Rational.HALF).floor()).multiply(2)); // in [0, 2)
        boolean negative = turn.compareTo(Rational.ONE) >= 0;
        Rational half = negative ? turn.subtract(1) : turn; // in [0, 1)
        Rational angle = half.compareTo(Rational.HALF) > 0 ? Rational.ONE.subtract(half) : half; // in [0, 1/2]
        Ball value = sinPiFirstQuarter(angle, bits);
        return negative ? value.negate() : value;
    }

    static Ball cosPi(Rational q, int bits) {
        return sinPi(q.add(Rational.HALF), bits);
    }

    private static Ball sinPiFirstQuarter(Rational angle, int bits) {
        if (angle.isZero()) {
            return Ball.ZERO;
        }
        if (angle.equals(SIXTH) || angle.equals(Rational.HALF)) {
            return angle.equals(SIXTH) ? Ball.ONE.shift(-1) : Ball.ONE;
        }
        int working = bits + 8;
        Ball pi = Constants.pi(working + 4);
        Ball value = angle.compareTo(QUARTER) <= 0
                ? sineOfSmall(pi.multiply(angle, working), working)
                : cosineOfSmall(pi.multiply(Rational.HALF.subtract(angle), working), working);
        return value.round(bits);
    }
}
