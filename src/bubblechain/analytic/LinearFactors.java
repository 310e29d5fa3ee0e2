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
        for (List<Rational> slopes : groups(powers, radius, 1)) {
            result = result.timesLinear(slopes);
        }
        for (List<Rational> slopes : groups(powers, radius, -1)) {
            result = result.overLinear(slopes);
        }
        return result;
    }

    /** The slopes -rho/root of the factors whose power has one sign, in small groups. */
    private static List<List<Rational>> groups(Map<Rational, Integer> powers, Rational radius, int sign) {
        List<List<Rational>> groups = new ArrayList<>();
        List<Rational> group = new ArrayList<>();
        BigInteger denominator = BigInteger.ONE;
        for (Map.Entry<Rational, Integer> factor : new TreeMap<>(powers).entrySet()) {
            Rational slope = radius.divide(factor.getKey()).negate();
            BigInteger size = slope.denominator().max(slope.numerator().abs());
            for (int k = 0; k < sign * factor.getValue(); k++) {
                BigInteger larger = denominator.multiply(size);
                if (group.size() == LARGEST_DEGREE || larger.bitLength() > LARGEST_BITS) {
                    groups.add(group);
                    group = new ArrayList<>();
                    larger = size;
                }
                group.add(slope);
                denominator = larger;
            }
        }
        groups.add(group);
        groups.removeIf(List::isEmpty);
        return groups;
    }
}
