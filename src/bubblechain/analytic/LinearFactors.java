package bubblechain.analytic;

import bubblechain.exact.Rational;
import bubblechain.series.FixedSeries;
import bubblechain.series.LinearGroup;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/**
 * Products of factors (1 - u/root)^power applied to a series in v = u/rho, several at a time while the integers are
 * small. The nearest roots come first, whether above or below: later errors then pass only factors that nearly cancel.
 */
final class LinearFactors {
    private static final int LARGEST_DEGREE = 4;
    private static final int LARGEST_BITS = 25;

    private LinearFactors() {}

    static FixedSeries apply(FixedSeries series, Map<Rational, Integer> powers, Rational radius) {
        List<LinearGroup> groups = groups(powers, radius, 1);
        groups.addAll(groups(powers, radius, -1));
        groups.sort(new Comparator<>() {
            @Override
            public int compare(LinearGroup left, LinearGroup right) {
                return right.slopes().get(0).abs().compareTo(left.slopes().get(0).abs());
            }
        });
        return series.throughLinear(groups);
    }

    private static Map<Rational, Integer> sorted(Map<Rational, Integer> powers) {
        Map<Rational, Integer> sorted = new TreeMap<>(new Comparator<>() {
            @Override
            public int compare(Rational left, Rational right) {
                int bySize = left.abs().compareTo(right.abs());
                return bySize != 0 ? bySize : left.compareTo(right);
            }
        });
        sorted.putAll(powers);
        return sorted;
    }

    /** The slopes -rho/root of the factors whose power has one sign, in small groups. */
    private static List<LinearGroup> groups(Map<Rational, Integer> powers, Rational radius, int sign) {
        List<LinearGroup> groups = new ArrayList<>();
        List<Rational> group = new ArrayList<>();
        BigInteger denominator = BigInteger.ONE;
        for (Map.Entry<Rational, Integer> factor : sorted(powers).entrySet()) {
            Rational slope = radius.divide(factor.getKey()).negate();
            BigInteger size = slope.denominator().max(slope.numerator().abs());
            for (int k = 0; k < sign * factor.getValue(); k++) {
                BigInteger larger = denominator.multiply(size);
                if (group.size() == LARGEST_DEGREE || larger.bitLength() > LARGEST_BITS) {
                    if (!group.isEmpty()) {
                        groups.add(new LinearGroup(group, sign < 0));
                    }
                    group = new ArrayList<>();
                    larger = size;
                }
                group.add(slope);
                denominator = larger;
            }
        }
        if (!group.isEmpty()) {
            groups.add(new LinearGroup(group, sign < 0));
        }
        return groups;
    }
}
