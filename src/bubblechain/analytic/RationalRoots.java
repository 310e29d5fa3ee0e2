package bubblechain.analytic;

import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/**
 * Rational roots k/q of polynomials over Q with small k and q, by trial modulo a prime and an exact check. Roots beyond
 * the limits are not found: use it where missing one costs accuracy, not correctness.
 */
final class RationalRoots {
    private static final int LARGEST_DENOMINATOR = 64;
    private static final int LARGEST_NUMERATOR = 10_000;
    /** Below 2^31, so that products fit a long. */
    private static final long PRIME = Integer.MAX_VALUE;

    private RationalRoots() {}

    /** Roots with their multiplicities, and the monic rest. */
    record Split(Map<Rational, Integer> roots, Polynomial rest) {}

    /** @param polynomial not zero */
    static Split of(Polynomial polynomial) {
        Map<Rational, Integer> roots = new TreeMap<>();
        Polynomial rest = polynomial.monic();
        BigInteger common = BigInteger.ONE;
        for (Rational c : rest.coefficients()) {
            common = common.multiply(c.denominator()).divide(common.gcd(c.denominator()));
        }
        double bound = rootBound(rest);
        for (int q = 1; q <= LARGEST_DENOMINATOR; q++) {
            // q divides the leading coefficient of the polynomial with integer coefficients
            if (common.mod(BigInteger.valueOf(q)).signum() == 0) {
                rest = split(rest, q, (int) Math.min(LARGEST_NUMERATOR, Math.ceil(bound * q)), roots);
            }
        }
        return new Split(roots, rest);
    }

    /** Takes the roots k/q with |k| up to the limit out. */
    private static Polynomial split(Polynomial polynomial, int q, int limit, Map<Rational, Integer> roots) {
        Polynomial rest = polynomial;
        long[] residues = residues(rest);
        long inverse = BigInteger.valueOf(q).modInverse(BigInteger.valueOf(PRIME)).longValueExact();
        for (int k = -limit; k <= limit && rest.degree() > 0; k++) {
            while (vanishes(residues, Math.floorMod(k * inverse, PRIME))) {
                Rational root = Rational.of(k, q);
                Polynomial[] parts = rest.divideAndRemainder(Polynomial.linear(root.negate(), Rational.ONE));
                if (!parts[1].isZero()) {
                    break;
                }
                roots.merge(root, 1, Integer::sum);
                rest = parts[0];
                residues = residues(rest);
            }
        }
        return rest;
    }

    /** The coefficients modulo the prime; empty if the prime divides a denominator. */
    private static long[] residues(Polynomial polynomial) {
        BigInteger prime = BigInteger.valueOf(PRIME);
        List<Rational> coefficients = polynomial.coefficients();
        long[] residues = new long[coefficients.size()];
        for (int k = 0; k < residues.length; k++) {
            Rational c = coefficients.get(k);
            if (c.denominator().mod(prime).signum() == 0) {
                return new long[0];
            }
            residues[k] = c.numerator()
                    .multiply(c.denominator().modInverse(prime))
                    .mod(prime)
                    .longValueExact();
        }
        return residues;
    }

    private static boolean vanishes(long[] residues, long point) {
        long value = 0;
        for (int k = residues.length - 1; k >= 0; k--) {
            value = (value * point + residues[k]) % PRIME;
        }
        return value == 0 && residues.length > 1;
    }

    /** Fujiwara's bound 2 max |c_(n-k)|^(1/k) of the roots of a monic polynomial; lengths stand for coefficients. */
    private static double rootBound(Polynomial monic) {
        double exponent = Double.NEGATIVE_INFINITY;
        for (int k = 1; k <= monic.degree(); k++) {
            Rational c = monic.coefficient(monic.degree() - k);
            if (!c.isZero()) {
                double length = c.numerator().bitLength() - c.denominator().bitLength() + 1;
                exponent = Math.max(exponent, length / k);
            }
        }
        return 2 * Math.pow(2, exponent);
    }
}
