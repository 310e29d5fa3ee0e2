package bubblechain.series;

import bubblechain.exact.Ball;
import bubblechain.exact.Rational;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Numbers c_n = s_n radius^(-n), or n! times that, with s_n in fixed point.
 *
 * @param series     the s_n
 * @param radius     positive
 * @param factorials true if every number has the factor n!
 */
public record WeightedSeries(FixedSeries series, Rational radius, boolean factorials) {
    private Rational step(int n) {
        return Rational.of(factorials ? n : 1).divide(radius);
    }

    /** The c_n as balls. */
    public List<Ball> balls(int bits) {
        List<Ball> result = new ArrayList<>();
        Ball weight = Ball.ONE;
        for (int n = 0; n < series.length(); n++) {
            if (n > 0) {
                weight = weight.multiply(step(n), bits);
            }
            result.add(series.coefficient(n).multiply(weight, bits));
        }
        return result;
    }

    /**
     * The c_n as decimals in the notation of {@link Ball#toDecimal}; empty where the digits are not certain.
     *
     * @param digits significant digits, at least 1
     * @param bits   working precision, should numbers not fit the fast way
     * @throws ArithmeticException if a product leaves the fixed-point range
     */
    public List<Optional<String>> decimals(int digits, int bits) {
        List<Optional<String>> result = new ArrayList<>();
        // n and 1 make the largest and the smallest step
        if (!FixedDecimals.fits(step(1)) || !FixedDecimals.fits(step(series.length()))) {
            for (Ball ball : balls(bits)) {
                result.add(ball.toDecimal(digits));
            }
            return result;
        }
        FixedDecimals decimals = new FixedDecimals(series.limbs());
        for (int n = 0; n < series.length(); n++) {
            if (n > 0) {
                decimals.step(step(n));
            }
            result.add(series.decimal(n, decimals, digits));
        }
        return result;
    }
}
