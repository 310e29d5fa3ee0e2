package bubblechain.exact;

import java.math.BigInteger;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;
import java.util.function.IntFunction;

/** Constants as balls; each is kept at the largest precision asked for so far. Thread safe. */
final class Constants {
    private static final int GUARD = 24;
    private static final Map<String, Known> KNOWN = new ConcurrentHashMap<>();

    private Constants() {}

    private record Known(int bits, Ball value) {}

    static Ball pi(int bits) {
        return kept("pi", bits, Constants::machinPi);
    }

    static Ball ln2(int bits) {
        return kept("ln 2", bits, Constants::machinLn2);
    }

    static Ball eulerGamma(int bits) {
        return kept("Euler's constant", bits, working -> brentMcMillan(working / 5 + 6, working + GUARD));
    }

    /** The value to {@code bits}, computed afresh (with a margin for later requests) if not known well enough. */
    static Ball kept(String name, int bits, IntFunction<Ball> algorithm) {
        Known known = KNOWN.get(name);
        if (known == null || known.bits < bits) {
            int working = bits + bits / 8 + GUARD;
            known = new Known(working, algorithm.apply(working));
            KNOWN.merge(name, known, (a, b) -> a.bits >= b.bits ? a : b);
        }
        return known.value.round(bits);
    }

    /** pi = 16 arctan(1/5) - 4 arctan(1/239) (Machin). */
    private static Ball machinPi(int bits) {
        int scale = bits + GUARD;
        Ball first = inverseTangent(5, scale, -1).multiply(Rational.of(16), scale);
        return first.subtract(inverseTangent(239, scale, -1).multiply(Rational.of(4), scale), scale);
    }

    /** ln 2 = 18 artanh(1/26) - 2 artanh(1/4801) + 8 artanh(1/8749), from 2^1 = (27/25)^9 (4802/4800)^-1 (8750/8748)^4. */
    private static Ball machinLn2(int bits) {
        int scale = bits + GUARD;
        Ball sum = inverseTangent(26, scale, 1).multiply(Rational.of(18), scale);
        sum = sum.subtract(inverseTangent(4801, scale, 1).multiply(Rational.of(2), scale), scale);
        return sum.add(inverseTangent(8749, scale, 1).multiply(Rational.of(8), scale), scale);
    }

    /**
     * sum_k sign^k x^-(2k+1)/(2k+1) for integer x >= 2: arctan(1/x) or artanh(1/x).
     *
     * <p>Error. floor(floor(a/b)/c) = floor(a/(bc)), so each term is less than one unit low. The sum stops when
     * x^-(2k+1) is below one unit; what is left out is below 1/(1 - x^-2) <= 4/3 units.
     */
    static Ball inverseTangent(int x, int scale, int sign) {
        BigInteger square = BigInteger.valueOf((long) x * x);
        BigInteger power = BigInteger.ONE.shiftLeft(scale).divide(BigInteger.valueOf(x));
        BigInteger sum = BigInteger.ZERO;
        int k = 0;
        while (power.signum() > 0) {
            BigInteger term = power.divide(BigInteger.valueOf(2L * k + 1));
            sum = sign < 0 && k % 2 == 1 ? sum.subtract(term) : sum.add(term);
            power = power.divide(square);
            k++;
        }
        return Ball.ofFixed(sum, scale, k + 2L);
    }

    /**
     * Euler's constant by the Bessel functions of argument x = 2n (Brent and McMillan, Math. Comp. 34 (1980) 305):
     * gamma = S/I - ln n - K_0(2n)/I_0(2n), I = I_0(2n) = sum_k (n^k/k!)^2, S = sum_k H_k (n^k/k!)^2.
     *
     * <p>Bound of the last part, derived here: K_0(x) = int_0^inf e^(-x cosh t) dt <= e^-x sqrt(pi/(2x)) from
     * cosh t >= 1 + t^2/2; I_0(x) >= (1/pi) int_0^pi e^(x(1 - t^2/2)) dt = e^x erf(pi sqrt(x/2))/sqrt(2 pi x) from
     * cos t >= 1 - t^2/2. Hence 0 < K_0/I_0 <= pi e^(-4n)/erf(pi sqrt n) < 4 e^(-4n), and e^-4 < 2^-5.
     */
    static Ball brentMcMillan(int n, int working) {
        BesselSums sums = BesselSums.of(n, working);
        Ball ratio = sums.weighted.divide(sums.plain, working);
        Ball logarithm = Elementary.ln(Ball.of(n), working);
        return ratio.subtract(logarithm, working).addError(Magnitude.powerOfTwo(2 - 5L * n));
    }

    /** The sums I and S of {@link #brentMcMillan}. */
    record BesselSums(Ball plain, Ball weighted) {
        /**
         * Fixed point: a_k = floor(a_(k-1) n^2/k^2), b_k = floor((b_(k-1) n^2/k + a_k)/k) with b_k for H_k a_k.
         *
         * <p>Error. With e_k, f_k the errors of a_k, b_k: e_k <= e_(k-1) n^2/k^2 + 1 and
         * f_k <= f_(k-1) n^2/k^2 + e_k/k + 2, accumulated upwards. The loop ends at a k >= 2n where a_k = b_k = 0, so
         * the true terms there are at most e_k, f_k; later ones shrink by at least (1/2)^2 (a) and, as
         * H_(k+1)/H_k <= 3/2, by 3/8 (b): the rest is at most e_k, f_k again.
         */
        static BesselSums of(int n, int scale) {
            BigInteger square = BigInteger.valueOf((long) n * n);
            BigInteger a = BigInteger.ONE.shiftLeft(scale);
            BigInteger b = BigInteger.ZERO;
            BigInteger sumA = a;
            BigInteger sumB = b;
            Magnitude errorA = Magnitude.ZERO;
            Magnitude errorB = Magnitude.ZERO;
            Magnitude totalA = Magnitude.ZERO;
            Magnitude totalB = Magnitude.ZERO;
            for (int k = 1; k < 2 * n || a.signum() > 0 || b.signum() > 0; k++) {
                BigInteger index = BigInteger.valueOf(k);
                BigInteger indexSquare = BigInteger.valueOf((long) k * k);
                a = a.multiply(square).divide(indexSquare);
                b = b.multiply(square).divide(index).add(a).divide(index);
                sumA = sumA.add(a);
                sumB = sumB.add(b);
                Magnitude ratio = Magnitude.of(square).multiply(Magnitude.ofInverse(indexSquare, 0));
                errorA = errorA.multiply(ratio).add(Magnitude.ONE);
                errorB = errorB.multiply(ratio)
                        .add(errorA.multiply(Magnitude.ofInverse(index, 0)))
                        .add(Magnitude.powerOfTwo(1));
                totalA = totalA.add(errorA);
                totalB = totalB.add(errorB);
            }
            return new BesselSums(
                    Ball.ofFixed(sumA, scale, 0).addError(totalA.add(errorA).scale(-scale)),
                    Ball.ofFixed(sumB, scale, 0).addError(totalB.add(errorB).scale(-scale)));
        }
    }
}
