package bubblechain.exact;

import java.math.BigInteger;

/** Li_s(x) = sum_{k>=1} x^k/k^s for rational |x| <= 1/2. */
final class Polylogarithm {
    private static final int GUARD = 24;

    private Polylogarithm() {}

    static Ball of(int s, Rational x, int bits) {
        if (s < 1) {
            throw new DomainException("the polylogarithm of order " + s + " is not provided; the order must be from 1");
        }
        if (x.abs().compareTo(Rational.HALF) > 0) {
            throw new DomainException("the polylogarithm at " + x + " is not provided; |x| must not exceed 1/2");
        }
        if (x.isZero()) {
            return Ball.ZERO;
        }
        // the value is at least |x|/2: as many bits more as x has zeros after the point
        int scale = bits + GUARD + (int) Math.max(0, Magnitude.ofRational(x.inverse()).exponent());
        return fixedPointSum(s, x, scale).round(bits);
    }

    /**
     * Fixed point with p_k = p_(k-1) x cut to an integer.
     *
     * <p>Error. p_k is off by e_k <= e_(k-1)/2 + 1 <= 2 units, the term p_k/k^s by at most 3. The sum stops at the first
     * p_k = 0; the true power is then at most 2 units and the rest, itself included, at most 2/(1 - 1/2) = 4 units.
     */
    static Ball fixedPointSum(int s, Rational x, int scale) {
        BigInteger power = BigInteger.ONE.shiftLeft(scale);
        BigInteger sum = BigInteger.ZERO;
        int k = 0;
        while (power.signum() != 0) {
            k++;
            power = power.multiply(x.numerator()).divide(x.denominator());
            // k^s beyond the length of the power leaves less than one unit: within the 3 units of the term
            boolean small = (double) s * (31 - Integer.numberOfLeadingZeros(k)) > power.bitLength();
            sum = small ? sum : sum.add(power.divide(BigInteger.valueOf(k).pow(s)));
        }
        return Ball.ofFixed(sum, scale, 3L * k + 4);
    }
}
