package bubblechain.analytic;

import bubblechain.exact.Rational;
import bubblechain.series.FixedSeries;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/** Products of factors (1 - u/root)^power applied to a series in v = u/rho, several at a time while the integers are small. */
final class LinearFactors {
    private static final int LARGEST_DEGREE = 4;
    private static final int LARGEST_BITS = 25;

    private LinearFactors() {}

    static FixedSeries apply(FixedSeries series, Map<Rational, Integer> powers, Rational radius) {
        FixedSeries result = series;
        for (Polynomial p : groups(powers, radius, 1)) {
            result = result.times(p.coefficients());
        }
        for (Polynomial p : groups(powers, radius, -1)) {
            result = result.over(p.coefficients());
        }
        return result;
    }

    /** The factors whose power has one sign, multiplied together in small groups, each group 1 at v = 0. */
    private static List<Polynomial> groups(Map<Rational, Integer> powers, Rational radius, int sign) {
        List<Polynomial> groups = new ArrayList<>();
        Polynomial group = Polynomial.ONE;
        BigInteger denominator = BigInteger.ONE;
        for (Map.Entry<Rational, Integer> factor : new TreeMap<>(powers).entrySet()) {
            Rational slope = radius.divide(factor.getKey()).negate();
            for (int k = 0; k < sign * factor.getValue(); k++) {
                BigInteger larger = denominator.multiply(
                        slope.denominator().max(slope.numerator().abs()));
                if (group.degree() == LARGEST_DEGREE || larger.bitLength() > LARGEST_BITS) {
                    groups.add(group);
                    group = Polynomial.ONE;
                    larger = slope.denominator().max(slope.numerator().abs());
                }
                group = group.multiply(Polynomial.linear(Rational.ONE, slope));
                denominator = larger;
            }
        }
        if (group.degree() > 0) {
            groups.add(group);
        }
        return groups;
    }
}
