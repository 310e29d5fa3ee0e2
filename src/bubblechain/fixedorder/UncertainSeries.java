package bubblechain.fixedorder;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import java.util.ArrayList;
import java.util.List;
import java.util.function.UnaryOperator;

/**
 * Coefficients of coupling^1, coupling^2, ... with their input errors. Every independent source of error is a vector of
 * one-standard-deviation shifts, one per coefficient; shifts within a source are fully correlated, sources are
 * independent. Every linear map of the series maps the sources in the same way. Immutable.
 *
 * @param values  central values, entry 0 the coefficient of the first power; at least one
 * @param sources error vectors, each as long as {@code values}; none for an exact series
 */
public record UncertainSeries(List<ExactConstant> values, List<List<ExactConstant>> sources) {
    public UncertainSeries {
        values = List.copyOf(values);
        sources = sources.stream().map(List::copyOf).toList();
        if (values.isEmpty()) {
            throw new DomainException("a series needs at least one coefficient, got none");
        }
        int length = values.size();
        if (sources.stream().anyMatch(source -> source.size() != length)) {
            throw new DomainException("an error source must have as many entries as the series, " + length);
        }
    }

    /** A series without input errors. */
    public static UncertainSeries exact(List<ExactConstant> values) {
        return new UncertainSeries(values, List.of());
    }

    /** Number of terms. */
    public int loops() {
        return values.size();
    }

    /** The first {@code loops} terms. @throws DomainException if there are fewer, or none is asked for */
    public UncertainSeries first(int loops) {
        if (loops < 1 || loops > loops()) {
            throw new DomainException("the series is known to " + loops() + (loops() == 1 ? " loop" : " loops")
                    + "; ask for 1 to " + loops() + ", got " + loops);
        }
        return map(list -> list.subList(0, loops)).withoutEmptySources();
    }

    private UncertainSeries withoutEmptySources() {
        return new UncertainSeries(
                values,
                sources.stream()
                        .filter(source -> !source.stream().allMatch(ExactConstant::isZero))
                        .toList());
    }

    /** This series with a linear map applied to the values and to every source. */
    public UncertainSeries map(UnaryOperator<List<ExactConstant>> linear) {
        return new UncertainSeries(
                linear.apply(values), sources.stream().map(linear).toList());
    }

    /** c_n r^n in place of c_n: the series in another unit of the coupling, r as in {@code Coupling.inUnitsOf}. */
    public UncertainSeries inUnits(ExactConstant ratio) {
        return map(list -> {
            List<ExactConstant> scaled = new ArrayList<>();
            ExactConstant power = ExactConstant.ONE;
            for (ExactConstant value : list) {
                power = power.multiply(ratio);
                scaled.add(value.multiply(power));
            }
            return scaled;
        });
    }
}
