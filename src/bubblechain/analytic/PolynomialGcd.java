package bubblechain.analytic;

import bubblechain.exact.Rational;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.List;

/**
 * The greatest common divisor of two polynomials over Q. Coprime pairs, by far the commonest, are settled modulo a prime;
 * the rest by Euclid's algorithm on integer polynomials, each remainder divided by the gcd of its coefficients.
 */
final class PolynomialGcd {
    /** The prime 2^31 - 1: products of two residues fit a long. */
    private static final long PRIME = Integer.MAX_VALUE;

    private PolynomialGcd() {}

    /** Monic; zero if both are zero. */
    static Polynomial of(Polynomial left, Polynomial right) {
        if (left.isZero() || right.isZero()) {
            return left.isZero() ? right.monic() : left.monic();
        }
        List<BigInteger> a = primitive(left.coefficients());
        List<BigInteger> b = primitive(right.coefficients());
        if (a.size() == 1 || b.size() == 1 || coprimeModulo(a, b)) {
            return Polynomial.ONE;
        }
        while (!b.isEmpty()) {
            List<BigInteger> remainder = withoutContent(pseudoRemainder(a, b));
            a = b;
            b = remainder;
        }
        List<Rational> result = new ArrayList<>();
        for (BigInteger c : a) {
            result.add(Rational.of(c));
        }
        return Polynomial.of(result).monic();
    }

    /** The multiple with coprime integer coefficients. */
    private static List<BigInteger> primitive(List<Rational> coefficients) {
        BigInteger common = BigInteger.ONE;
        for (Rational c : coefficients) {
            common = common.multiply(c.denominator().divide(common.gcd(c.denominator())));
        }
        List<BigInteger> integers = new ArrayList<>();
        for (Rational c : coefficients) {
            integers.add(c.numerator().multiply(common.divide(c.denominator())));
        }
        return withoutContent(integers);
    }

    private static List<BigInteger> withoutContent(List<BigInteger> coefficients) {
        BigInteger content = BigInteger.ZERO;
        for (BigInteger c : coefficients) {
            content = content.gcd(c);
            if (content.equals(BigInteger.ONE)) {
                return coefficients;
            }
        }
        BigInteger divisor = content;
        List<BigInteger> quotients = new ArrayList<>();
        for (BigInteger c : coefficients) {
            quotients.add(c.divide(divisor));
        }
        return quotients;
    }

    /** A multiple of the remainder of a by b, degree below that of b. */
    private static List<BigInteger> pseudoRemainder(List<BigInteger> a, List<BigInteger> b) {
        List<BigInteger> rest = new ArrayList<>(a);
        BigInteger leading = b.get(b.size() - 1);
        while (rest.size() >= b.size()) {
            BigInteger top = rest.get(rest.size() - 1);
            BigInteger gcd = top.gcd(leading);
            BigInteger scale = leading.divide(gcd);
            BigInteger factor = top.divide(gcd);
            int shift = rest.size() - b.size();
            for (int k = 0; k < rest.size(); k++) {
                BigInteger term = k < shift ? BigInteger.ZERO : factor.multiply(b.get(k - shift));
                rest.set(k, rest.get(k).multiply(scale).subtract(term));
            }
            while (!rest.isEmpty() && rest.get(rest.size() - 1).signum() == 0) {
                rest.remove(rest.size() - 1);
            }
        }
        return rest;
    }

    /**
     * True if the images modulo the prime are coprime and neither degree drops: a common factor over Q would then have an
     * image of the same degree, so there is none.
     */
    private static boolean coprimeModulo(List<BigInteger> left, List<BigInteger> right) {
        long[] a = residues(left);
        long[] b = residues(right);
        if (a[a.length - 1] == 0 || b[b.length - 1] == 0) {
            return false;
        }
        int sizeA = a.length;
        int sizeB = b.length;
        while (sizeB > 0) {
            long inverse = inverse(b[sizeB - 1]);
            while (sizeA >= sizeB) {
                long factor = a[sizeA - 1] * inverse % PRIME;
                for (int k = 0; k < sizeB; k++) {
                    int at = sizeA - sizeB + k;
                    a[at] = Math.floorMod(a[at] - factor * b[k] % PRIME, PRIME);
                }
                sizeA = trimmed(a, sizeA);
            }
            long[] swap = a;
            a = b;
            b = swap;
            int swapSize = sizeA;
            sizeA = sizeB;
            sizeB = swapSize;
        }
        return sizeA == 1;
    }

    private static int trimmed(long[] coefficients, int size) {
        int result = size;
        while (result > 0 && coefficients[result - 1] == 0) {
            result--;
        }
        return result;
    }

    private static long[] residues(List<BigInteger> coefficients) {
        BigInteger prime = BigInteger.valueOf(PRIME);
        long[] residues = new long[coefficients.size()];
        for (int k = 0; k < residues.length; k++) {
            residues[k] = coefficients.get(k).mod(prime).longValue();
        }
        return residues;
    }

    private static long inverse(long value) {
        return BigInteger.valueOf(value).modInverse(BigInteger.valueOf(PRIME)).longValue();
    }
}
