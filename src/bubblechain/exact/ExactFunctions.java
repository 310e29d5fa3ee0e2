package bubblechain.exact;

import java.math.BigInteger;
import java.util.Map;
import java.util.TreeMap;

/**
 * Functions of rational arguments in canonical form where one is known, opaque otherwise: gamma, digamma and polygamma
 * are closed at integers and half-integers, sin and cos at multiples of pi/4 and pi/6.
 */
public final class ExactFunctions {
    /** Trial division stops here; a remaining factor below its square is prime. */
    private static final int LARGEST_TRIAL_DIVISOR = 100_000;

    /** Bits of a power of a rational; a larger one is refused before it takes the memory. */
    private static final int LARGEST_POWER_BITS = 2_000_000;

    private ExactFunctions() {}

    /** zeta(k); closed for even k and for k of at most 0. @throws DomainException at the pole k = 1 */
    public static ExactConstant zeta(int k) {
        if (k == 1) {
            throw new DomainException("zeta(1) is infinite");
        }
        if (k <= 0) {
            // zeta(-n) = (-1)^n B_{n+1}/(n+1), DLMF 25.6.3 (with B_1 = -1/2 for n = 0).
            Rational value = Bernoulli.number(1 - k).divide(1L - k);
            return ExactConstant.of(k % 2 == 0 ? value : value.negate());
        }
        if (k % 2 == 1) {
            return ExactConstant.of(Monomial.of(Generator.zeta(k)), Rational.ONE);
        }
        // zeta(2m) = (2 pi)^{2m} |B_2m| / (2 (2m)!), DLMF 25.6.2.
        Rational factor = Bernoulli.number(k)
                .abs()
                .multiply(Rational.of(BigInteger.ONE.shiftLeft(k - 1), factorial(k)));
        return ExactConstant.of(Monomial.piPower(2 * k), factor);
    }

    /** Natural logarithm of a positive rational, split into primes. @throws DomainException if not positive */
    public static ExactConstant ln(Rational x) {
        if (x.signum() <= 0) {
            throw new DomainException("the logarithm needs a positive number, got " + x);
        }
        ExactConstant sum = ExactConstant.ZERO;
        for (Map.Entry<BigInteger, Integer> f : factors(x).entrySet()) {
            sum = sum.add(ExactConstant.of(Monomial.of(Generator.log(f.getKey())), Rational.of(f.getValue())));
        }
        return sum;
    }

    /** x^q for a positive rational x. @throws DomainException if x is negative and q not an integer, or 0^q for q < 0 */
    public static ExactConstant power(Rational x, Rational q) {
        if (q.isInteger()) {
            return ExactConstant.of(integerPower(x, q.numerator()));
        }
        if (x.isZero() && q.signum() > 0) {
            return ExactConstant.ZERO;
        }
        if (x.signum() <= 0) {
            throw new DomainException("a fractional power needs a positive base, got " + x);
        }
        ExactConstant product = ExactConstant.ONE;
        for (Map.Entry<BigInteger, Integer> f : factors(x).entrySet()) {
            product = product.multiply(primePower(f.getKey(), q.multiply(f.getValue())));
        }
        return product;
    }

    static ExactConstant primePower(BigInteger p, Rational q) {
        BigInteger whole = q.floor();
        Rational fraction = q.subtract(Rational.of(whole));
        Rational factor = integerPower(Rational.of(p), whole);
        return fraction.isZero()
                ? ExactConstant.of(factor)
                : ExactConstant.of(Monomial.root(p, fraction), factor);
    }

    private static Rational integerPower(Rational x, BigInteger n) {
        int bits = Math.max(x.numerator().bitLength(), x.denominator().bitLength());
        boolean unit = x.abs().equals(Rational.ONE) || x.isZero();
        if (!unit && n.abs().multiply(BigInteger.valueOf(bits)).compareTo(BigInteger.valueOf(LARGEST_POWER_BITS)) > 0) {
            throw new DomainException("the power " + n + " of a number of " + bits + " bits is too large; the limit is "
                    + LARGEST_POWER_BITS + " bits");
        }
        return x.power(n.intValueExact());
    }

    private static Map<BigInteger, Integer> factors(Rational x) {
        Map<BigInteger, Integer> found = new TreeMap<>();
        factor(x.numerator(), 1, found);
        factor(x.denominator(), -1, found);
        return found;
    }

    private static void factor(BigInteger n, int sign, Map<BigInteger, Integer> found) {
        BigInteger rest = n;
        for (int p = 2; p <= LARGEST_TRIAL_DIVISOR && rest.bitLength() > 1; p += p == 2 ? 1 : 2) {
            BigInteger divisor = BigInteger.valueOf(p);
            if (divisor.multiply(divisor).compareTo(rest) > 0) {
                break;
            }
            BigInteger[] qr = rest.divideAndRemainder(divisor);
            while (qr[1].signum() == 0) {
                found.merge(divisor, sign, Integer::sum);
                rest = qr[0];
                qr = rest.divideAndRemainder(divisor);
            }
        }
        if (!rest.equals(BigInteger.ONE)) {
            found.merge(rest, sign, Integer::sum);
        }
    }

    /** Gamma(z). @throws DomainException at a pole z = 0, -1, -2, ... */
    public static ExactConstant gamma(Rational z) {
        requireNoPole("gamma", z);
        Rational s = reduced(z);
        int steps = z.subtract(s).intValueExact();
        Rational factor = steps >= 0 ? rising(s, steps) : rising(z, -steps).inverse();
        ExactConstant base = s.equals(Rational.ONE)
                ? ExactConstant.ONE
                : s.equals(Rational.HALF)
                        ? ExactConstant.SQRT_PI
                        : ExactConstant.opaque(
                                "gamma(" + s + ")", bits -> BallFunctions.gamma(Ball.of(s, bits + 8), bits));
        return base.multiply(factor);
    }

    /** psi(z), the logarithmic derivative of gamma. @throws DomainException at a pole */
    public static ExactConstant digamma(Rational z) {
        return polygamma(0, z);
    }

    /** The n-th derivative of psi, n of at least 0. @throws DomainException at a pole */
    public static ExactConstant polygamma(int n, Rational z) {
        requireNoPole(n == 0 ? "digamma" : "polygamma", z);
        Rational s = reduced(z);
        // psi^(n)(t+1) = psi^(n)(t) + (-1)^n n!/t^{n+1}, DLMF 5.15.5.
        int steps = z.subtract(s).intValueExact();
        Rational shift = steps >= 0 ? powerSum(s, n + 1, 0, steps) : powerSum(z, n + 1, 0, -steps).negate();
        Rational scale = Rational.of(n % 2 == 0 ? factorial(n) : factorial(n).negate());
        return reducedPolygamma(n, s, scale.negate()).add(ExactConstant.of(shift.multiply(scale)));
    }

    /** The sum of (s + j)^(-k) for from <= j < to, halves first so that long fractions meet late. */
    private static Rational powerSum(Rational s, int k, int from, int to) {
        if (to - from <= 1) {
            return from == to ? Rational.ZERO : s.add(from).power(-k);
        }
        int middle = (from + to) >>> 1;
        return powerSum(s, k, from, middle).add(powerSum(s, k, middle, to));
    }

    private static ExactConstant reducedPolygamma(int n, Rational s, Rational signedFactorial) {
        boolean half = s.equals(Rational.HALF);
        if (!half && !s.equals(Rational.ONE)) {
            String name = n == 0 ? "digamma(" + s + ")" : "polygamma(" + n + "," + s + ")";
            return ExactConstant.opaque(name, bits -> n == 0
                    ? BallFunctions.digamma(Ball.of(s, bits + 8), bits)
                    : BallFunctions.polygamma(n, Ball.of(s, bits + 8), bits));
        }
        if (n == 0) {
            ExactConstant euler = ExactConstant.EULER_GAMMA.negate();
            return half ? euler.subtract(ln(Rational.TWO).multiply(Rational.TWO)) : euler;
        }
        // psi^(n)(1) = (-1)^{n+1} n! zeta(n+1); at 1/2 times 2^{n+1} - 1, DLMF 5.15.2-3.
        Rational factor = half
                ? signedFactorial.multiply(Rational.of(BigInteger.ONE.shiftLeft(n + 1).subtract(BigInteger.ONE)))
                : signedFactorial;
        return zeta(n + 1).multiply(factor);
    }

    /** Hurwitz zeta(k, s) for k of at least 2 and s in (0,1]. */
    public static ExactConstant hurwitz(int k, Rational s) {
        if (k < 2) {
            throw new DomainException("the Hurwitz zeta function needs an integer k of at least 2, got " + k);
        }
        // psi^(k-1)(s) = (-1)^k (k-1)! zeta(k, s)
        Rational factor = Rational.of(factorial(k - 1));
        return polygamma(k - 1, s).divide(k % 2 == 0 ? factor : factor.negate());
    }

    /** sin(pi r). */
    public static ExactConstant sinPi(Rational r) {
        Rational t = r.subtract(Rational.of(r.divide(2).floor()).multiply(2));
        if (t.compareTo(Rational.ONE) >= 0) {
            return sinPi(t.subtract(1)).negate();
        }
        Rational angle = t.compareTo(Rational.HALF) > 0 ? Rational.ONE.subtract(t) : t;
        if (angle.isZero()) {
            return ExactConstant.ZERO;
        }
        if (angle.equals(Rational.of(1, 6))) {
            return ExactConstant.of(Rational.HALF);
        }
        if (angle.equals(Rational.of(1, 4))) {
            return power(Rational.TWO, Rational.HALF).divide(Rational.TWO);
        }
        if (angle.equals(Rational.of(1, 3))) {
            return power(Rational.of(3), Rational.HALF).divide(Rational.TWO);
        }
        if (angle.equals(Rational.HALF)) {
            return ExactConstant.ONE;
        }
        return ExactConstant.opaque("sin(" + angle + "*pi)", bits -> BallFunctions.sinPi(angle, bits));
    }

    /** cos(pi r) = sin(pi (r + 1/2)). */
    public static ExactConstant cosPi(Rational r) {
        return sinPi(r.add(Rational.HALF));
    }

    /** n! for n of at least 0. */
    public static BigInteger factorial(int n) {
        if (n < 0) {
            throw new DomainException("a factorial needs a number of at least 0, got " + n);
        }
        return product(1, n);
    }

    /** s (s+1) ... (s+n-1). */
    private static Rational rising(Rational s, int n) {
        return Rational.of(
                rising(s.numerator(), s.denominator(), 0, n), s.denominator().pow(n));
    }

    /** The product of top + j step for from <= j < to. */
    private static BigInteger rising(BigInteger top, BigInteger step, int from, int to) {
        if (to - from <= 8) {
            BigInteger result = BigInteger.ONE;
            for (int j = from; j < to; j++) {
                result = result.multiply(top.add(step.multiply(BigInteger.valueOf(j))));
            }
            return result;
        }
        int middle = (from + to) >>> 1;
        return rising(top, step, from, middle).multiply(rising(top, step, middle, to));
    }

    private static BigInteger product(int from, int to) {
        if (from > to) {
            return BigInteger.ONE;
        }
        if (to - from < 8) {
            BigInteger result = BigInteger.valueOf(from);
            for (int k = from + 1; k <= to; k++) {
                result = result.multiply(BigInteger.valueOf(k));
            }
            return result;
        }
        int middle = (from + to) >>> 1;
        return product(from, middle).multiply(product(middle + 1, to));
    }

    /** z + integer in (0,1]. */
    private static Rational reduced(Rational z) {
        return z.subtract(Rational.of(z.ceiling())).add(1);
    }

    private static void requireNoPole(String function, Rational z) {
        if (z.isInteger() && z.signum() <= 0) {
            throw new DomainException(function + "(" + z + ") is infinite");
        }
    }
}
