package bubblechain.exact;

import java.math.BigInteger;
import java.util.function.IntFunction;

/**
 * Gamma, its logarithm and its logarithmic derivatives: Stirling's series at the midpoint after a shift to the right,
 * plus a bound of the change over the ball; recurrence or reflection for negative arguments.
 *
 * <p>For real z > 0 the remainder of either Stirling series is smaller than the first omitted term (NIST DLMF,
 * section 5.11(ii)). The bounds of the slopes, for x > 0: |psi(x)| <= |ln x| + 1/x as ln x - 1/x < psi(x) < ln x, and
 * 0 < psi'(x) = sum_k (x+k)^-2 <= 1/x^2 + 1/x.
 */
final class GammaFunctions {
    private static final int GUARD = 48;
    private static final int LONGEST_FACTORIAL = 1000;
    /** Below minus this, reflection; above, recurrence, which needs as many factors. */
    private static final int LONGEST_RECURRENCE = 64;
    /** Recurrence is the only way for the derivatives of psi. */
    private static final int LONGEST_POLYGAMMA_RECURRENCE = 100_000;
    private static final int LARGEST_GAMMA_EXPONENT = 28;

    private GammaFunctions() {}

    static Ball gamma(Ball x, int bits) {
        if (x.isPositive()) {
            return gammaOfPositive(x, bits);
        }
        refusePoles(x, "gamma");
        if (x.mid().compareTo(new Dyadic(BigInteger.valueOf(-LONGEST_RECURRENCE), 0)) > 0) {
            int steps = stepsToPositive(x);
            int working = bits + GUARD;
            Ball shifted = gammaOfPositive(x.add(Rational.of(steps), working), working);
            return shifted.divide(rising(x, steps, working), bits);
        }
        // Gamma(x) = pi/(sin(pi x) Gamma(1 - x))
        int working = bits + GUARD;
        Ball below = sinPi(x, working).multiply(gammaOfPositive(oneMinus(x, working), working), working);
        return Constants.pi(working).divide(below, bits);
    }

    private static Ball gammaOfPositive(Ball x, int bits) {
        Ball value = gammaAtCenter(x.center(), bits + 4);
        // Gamma(x) = Gamma(m) e^(psi(xi) (x - m))
        Magnitude change = Elementary.growth(psiBound(x).multiply(x.radius()));
        return value.addError(value.upperBound().multiply(change)).round(bits);
    }

    private static Ball gammaAtCenter(Ball m, int bits) {
        if (m.mid().top() > LARGEST_GAMMA_EXPONENT) {
            throw new PrecisionException("gamma of an argument above 2^" + LARGEST_GAMMA_EXPONENT
                    + " is not computed; use lnGamma");
        }
        if (m.mid().compareTo(new Dyadic(BigInteger.valueOf(LONGEST_FACTORIAL), 0)) <= 0 && isInteger(m)) {
            BigInteger product = BigInteger.ONE;
            for (int i = 2; i < m.midpoint().intValueExact(); i++) {
                product = product.multiply(BigInteger.valueOf(i));
            }
            return Ball.of(product).round(bits);
        }
        // the relative error is the absolute one of z ln z < 2^(top + 6)
        int working = bits + GUARD + (int) Math.max(0, m.mid().top());
        int steps = stirlingSteps(m, working);
        Ball numerator = Elementary.exp(stirling(m.add(Ball.of(steps), working), working), bits + 8);
        return steps == 0 ? numerator : numerator.divide(rising(m, steps, bits + GUARD), bits);
    }

    static Ball lnGamma(Ball x, int bits) {
        Elementary.requirePositive(x, "lnGamma");
        Magnitude change = psiBound(x).multiply(x.radius());
        return lnGammaAtCenter(x.center(), bits + 4).addError(change).round(bits);
    }

    private static Ball lnGammaAtCenter(Ball m, int bits) {
        if (m.equals(Ball.ONE) || m.equals(Ball.of(2))) {
            return Ball.ZERO;
        }
        int working = bits + GUARD;
        int steps = stirlingSteps(m, working);
        Ball shifted = stirling(m.add(Ball.of(steps), working), working);
        return steps == 0 ? shifted : shifted.subtract(Elementary.ln(rising(m, steps, working), working), working);
    }

    /** |psi| <= |ln x| + 1/x; with 2^-c <= x < 2^a, |ln x| <= 0.7 max(|a|, |c|), and 0.7 < 45/64. */
    private static Magnitude psiBound(Ball x) {
        Magnitude inverse = x.inverseUpperBound();
        long exponent = Math.max(Math.abs(x.upperBound().exponent()), Math.abs(inverse.exponent()));
        return Magnitude.of(45).scale(-6).multiply(Magnitude.of(exponent)).add(inverse);
    }

    /** How far to go right so that the Stirling terms fall below 2^-working; any number is correct. */
    private static int stirlingSteps(Ball m, int working) {
        return (int) Math.max(0, Math.ceil(0.2 * working + 2 - m.toDouble()));
    }

    /** x (x+1) ... (x+steps-1). */
    private static Ball rising(Ball x, int steps, int bits) {
        Ball product = Ball.ONE;
        for (int k = 0; k < steps; k++) {
            product = product.multiply(x.add(Ball.of(k), bits), bits);
        }
        return product;
    }

    /** ln Gamma(z) = (z - 1/2) ln z - z + ln(2 pi)/2 + sum_k B_2k/(2k (2k-1) z^(2k-1)). */
    static Ball stirling(Ball z, int bits) {
        Ball inverse = z.inverse(bits);
        Ball correction = decreasingSeries(
                inverse, inverse, bits, k -> Bernoulli.number(2 * k).divide(2L * k * (2L * k - 1)));
        Ball half = Elementary.ln(Constants.pi(bits).shift(1), bits).shift(-1);
        return z.subtract(Ball.ONE.shift(-1), bits)
                .multiply(Elementary.ln(z, bits), bits)
                .subtract(z, bits)
                .add(half, bits)
                .add(correction, bits);
    }

    /** sum_k coefficient(k) start inverse^(2(k-1)) up to terms of 2^-bits; error at most the first omitted term. */
    private static Ball decreasingSeries(Ball start, Ball inverse, int bits, IntFunction<Rational> coefficient) {
        Ball square = inverse.multiply(inverse, bits);
        Ball power = start;
        Ball sum = Ball.ZERO;
        long previous = Long.MAX_VALUE;
        for (int k = 1; ; k++) {
            Ball term = power.multiply(coefficient.apply(k), bits);
            Magnitude bound = term.upperBound();
            if (bound.exponent() < -bits || bound.exponent() > previous) {
                return sum.addError(bound);
            }
            sum = sum.add(term, bits);
            previous = bound.exponent();
            // later terms are smaller than this one: they need no more bits
            int needed = (int) Math.max(32, Math.min(bits, bits + previous + 32));
            power = power.multiply(square.round(needed), needed);
        }
    }

    static Ball digamma(Ball x, int bits) {
        if (x.isPositive()) {
            Magnitude inverse = x.inverseUpperBound();
            Magnitude change = inverse.multiply(inverse).add(inverse).multiply(x.radius());
            return digammaAtCenter(x.center(), bits + 4).addError(change).round(bits);
        }
        refusePoles(x, "digamma");
        int working = bits + GUARD;
        if (x.mid().compareTo(new Dyadic(BigInteger.valueOf(-LONGEST_RECURRENCE), 0)) > 0) {
            int steps = stepsToPositive(x);
            Ball shifted = digamma(x.add(Rational.of(steps), working), working);
            return shifted.subtract(reciprocals(x, steps, 1, working), bits);
        }
        // psi(x) = psi(1 - x) - pi cot(pi x), and cos(pi x) = sin(pi (x + 1/2))
        Ball cotangent = sinPi(x.add(Rational.HALF, working), working).divide(sinPi(x, working), working);
        return digamma(oneMinus(x, working), working)
                .subtract(cotangent.multiply(Constants.pi(working), working), bits);
    }

    /** psi(m) = psi(z) - sum_{k<N} 1/(m+k), psi(z) = ln z - 1/(2z) - sum_k B_2k/(2k z^2k). */
    private static Ball digammaAtCenter(Ball m, int bits) {
        int working = bits + GUARD;
        int steps = stirlingSteps(m, working);
        Ball z = m.add(Ball.of(steps), working);
        Ball inverse = z.inverse(working);
        Ball series = decreasingSeries(
                inverse.multiply(inverse, working), inverse, working, k -> Bernoulli.number(2 * k).divide(2L * k));
        return Elementary.ln(z, working)
                .subtract(inverse.shift(-1), working)
                .subtract(series, working)
                .subtract(reciprocals(m, steps, 1, working), working);
    }

    /** sum_{k<steps} (x+k)^-power. */
    private static Ball reciprocals(Ball x, int steps, int power, int bits) {
        Ball sum = Ball.ZERO;
        for (int k = 0; k < steps; k++) {
            sum = sum.add(x.add(Ball.of(k), bits).power(-power, bits), bits);
        }
        return sum;
    }

    /** psi^(n)(x) = (-1)^(n+1) n! zeta(n+1, x), for negative x after psi^(n)(x) = psi^(n)(x+1) - (-1)^n n! x^-(n+1). */
    static Ball polygamma(int n, Ball x, int bits) {
        if (n < 1) {
            throw new DomainException("polygamma of order " + n + " is not provided; the order must be from 1 on"
                    + " (order 0 is digamma)");
        }
        int working = bits + 8;
        Ball sum;
        if (x.isPositive()) {
            sum = HurwitzZeta.range(x, n + 1, n + 1, working)[0];
        } else {
            refusePoles(x, "polygamma");
            int steps = stepsToPositive(x);
            Ball shifted = x.add(Rational.of(steps), working);
            sum = HurwitzZeta.range(shifted, n + 1, n + 1, working)[0]
                    .add(reciprocals(x, steps, n + 1, working), working);
        }
        BigInteger factorial = BigInteger.ONE;
        for (int i = 2; i <= n; i++) {
            factorial = factorial.multiply(BigInteger.valueOf(i));
        }
        Ball size = sum.multiply(Rational.of(factorial), bits);
        return n % 2 == 1 ? size : size.negate();
    }

    /** Refuses a ball that touches an integer <= 0. The ball is not positive. */
    private static void refusePoles(Ball x, String name) {
        if (x.isExact() && isInteger(x)) {
            throw new DomainException(name + " has a pole at " + x + "; the argument must not be an integer <= 0");
        }
        BigInteger integer = x.low().negate().floor().negate(); // smallest integer not below the lower end
        if (integer.signum() <= 0 && new Dyadic(integer, 0).compareTo(x.high()) <= 0) {
            throw new PrecisionException(name + " has a pole at " + integer + ", inside the ball " + x
                    + "; raise the precision");
        }
    }

    private static boolean isInteger(Ball x) {
        return new Dyadic(x.mid().floor(), 0).compareTo(x.mid()) == 0;
    }

    private static int stepsToPositive(Ball x) {
        BigInteger steps = x.mid().floor().negate().add(BigInteger.ONE);
        if (steps.bitLength() > 31 || steps.intValueExact() > LONGEST_POLYGAMMA_RECURRENCE) {
            throw new DomainException("polygamma at " + x + " is not provided; the argument must be above -"
                    + LONGEST_POLYGAMMA_RECURRENCE);
        }
        return steps.intValueExact();
    }

    private static Ball oneMinus(Ball x, int bits) {
        return Ball.ONE.subtract(x, bits + (int) Math.max(0, x.mid().top()));
    }

    /** sin(pi x) through the distance f of x to the nearest integer n, exact for the midpoint: (-1)^n sin(pi f). */
    private static Ball sinPi(Ball x, int bits) {
        BigInteger nearest = x.mid().add(new Dyadic(BigInteger.ONE, -1)).floor();
        Ball distance = Ball.ofDyadic(x.mid().subtract(new Dyadic(nearest, 0))).addError(x.radius());
        Ball value = Trigonometric.sin(distance.multiply(Constants.pi(bits + 8), bits + 8), bits);
        return nearest.testBit(0) ? value.negate() : value;
    }
}
