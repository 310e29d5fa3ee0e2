package bubblechain.qcd;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import java.util.ArrayList;
import java.util.List;

/**
 * A truncated power series sum_{k=0}^{K} a^k sum_j c_kj L^j in a coupling a, with polynomials in one logarithm L as
 * coefficients. Exact.
 */
final class LogarithmSeries {
    /** [k][j]; K + 1 rows. */
    private final List<List<ExactConstant>> coefficients;

    private LogarithmSeries(List<List<ExactConstant>> coefficients) {
        this.coefficients = coefficients.stream().map(List::copyOf).toList();
    }

    /** The constant 1. @param order K */
    static LogarithmSeries one(int order) {
        return constants(order, List.of(ExactConstant.ONE));
    }

    /** A series without logarithms; entry k belongs to a^k, missing ones are zero. */
    static LogarithmSeries constants(int order, List<ExactConstant> values) {
        List<List<ExactConstant>> rows = new ArrayList<>();
        for (int k = 0; k <= order; k++) {
            rows.add(k < values.size() ? List.of(values.get(k)) : List.of());
        }
        return new LogarithmSeries(rows);
    }

    int order() {
        return coefficients.size() - 1;
    }

    /** The polynomial in L at a^k, constant term first. */
    List<ExactConstant> row(int k) {
        return coefficients.get(k);
    }

    LogarithmSeries plus(LogarithmSeries other) {
        List<List<ExactConstant>> rows = new ArrayList<>();
        for (int k = 0; k <= order(); k++) {
            rows.add(sum(row(k), other.row(k)));
        }
        return new LogarithmSeries(rows);
    }

    LogarithmSeries minus(LogarithmSeries other) {
        return plus(other.times(ExactConstant.of(-1)));
    }

    LogarithmSeries times(ExactConstant factor) {
        return new LogarithmSeries(coefficients.stream()
                .map(row -> row.stream().map(c -> c.multiply(factor)).toList())
                .toList());
    }

    LogarithmSeries times(LogarithmSeries other) {
        List<List<ExactConstant>> rows = new ArrayList<>();
        for (int k = 0; k <= order(); k++) {
            List<ExactConstant> row = List.of();
            for (int i = 0; i <= k; i++) {
                row = sum(row, product(row(i), other.row(k - i)));
            }
            rows.add(row);
        }
        return new LogarithmSeries(rows);
    }

    /** This series times a^power. */
    LogarithmSeries shifted(int power) {
        List<List<ExactConstant>> rows = new ArrayList<>();
        for (int k = 0; k <= order(); k++) {
            rows.add(k < power ? List.of() : row(k - power));
        }
        return new LogarithmSeries(rows);
    }

    LogarithmSeries power(int exponent) {
        LogarithmSeries result = one(order());
        for (int i = 0; i < exponent; i++) {
            result = result.times(this);
        }
        return result;
    }

    /** a d/da of this series. */
    LogarithmSeries counted() {
        List<List<ExactConstant>> rows = new ArrayList<>();
        for (int k = 0; k <= order(); k++) {
            ExactConstant factor = ExactConstant.of(k);
            rows.add(row(k).stream().map(c -> c.multiply(factor)).toList());
        }
        return new LogarithmSeries(rows);
    }

    /** This series with the row at a^k replaced by start + int_0^L dL of a polynomial. */
    LogarithmSeries withIntegral(int k, ExactConstant start, List<ExactConstant> derivative) {
        List<ExactConstant> row = new ArrayList<>(List.of(start));
        for (int j = 0; j < derivative.size(); j++) {
            row.add(derivative.get(j).divide(Rational.of(j + 1)));
        }
        List<List<ExactConstant>> rows = new ArrayList<>(coefficients);
        rows.set(k, row);
        return new LogarithmSeries(rows);
    }

    /** The series with L replaced by another series in the same coupling. */
    LogarithmSeries at(LogarithmSeries logarithm) {
        LogarithmSeries result = constants(order(), List.of());
        for (int k = 0; k <= order(); k++) {
            LogarithmSeries value = constants(order(), List.of());
            for (int j = row(k).size() - 1; j >= 0; j--) {
                value = value.times(logarithm).plus(constants(order(), List.of(row(k).get(j))));
            }
            result = result.plus(value.shifted(k));
        }
        return result;
    }

    /** ln(1 + this) for a series that starts at a^1. */
    LogarithmSeries lnOnePlus() {
        LogarithmSeries result = constants(order(), List.of());
        LogarithmSeries power = one(order());
        for (int n = 1; n <= order(); n++) {
            power = power.times(this);
            result = result.plus(power.times(ExactConstant.of(Rational.of(n % 2 == 1 ? 1 : -1, n))));
        }
        return result;
    }

    /** outer(inner) = sum_k outer_k inner^k, outer without logarithms. @param inner starts at a^1 */
    static LogarithmSeries composed(List<ExactConstant> outer, LogarithmSeries inner) {
        LogarithmSeries result = constants(inner.order(), List.of());
        LogarithmSeries power = one(inner.order());
        for (int k = 0; k < outer.size() && k <= inner.order(); k++) {
            result = result.plus(power.times(outer.get(k)));
            power = power.times(inner);
        }
        return result;
    }

    private static List<ExactConstant> sum(List<ExactConstant> first, List<ExactConstant> second) {
        List<ExactConstant> result = new ArrayList<>();
        for (int j = 0; j < Math.max(first.size(), second.size()); j++) {
            ExactConstant left = j < first.size() ? first.get(j) : ExactConstant.ZERO;
            result.add(j < second.size() ? left.add(second.get(j)) : left);
        }
        return result;
    }

    private static List<ExactConstant> product(List<ExactConstant> first, List<ExactConstant> second) {
        List<ExactConstant> result = new ArrayList<>();
        for (int i = 0; i < first.size(); i++) {
            for (int j = 0; j < second.size(); j++) {
                ExactConstant term = first.get(i).multiply(second.get(j));
                if (i + j == result.size()) {
                    result.add(term);
                } else {
                    result.set(i + j, result.get(i + j).add(term));
                }
            }
        }
        return result;
    }
}
