package bubblechain.qcd;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import java.util.List;
import java.util.Locale;

/** Exact coefficients as doubles, and checks of scales and couplings given as doubles. */
final class Numbers {
    /** Bits a coefficient is computed with before it is rounded to a double. */
    private static final int BITS = 96;

    private Numbers() {}

    /** The nearest double, or one of the two nearest. */
    static double of(ExactConstant constant) {
        return constant.toBall(BITS).toDouble();
    }

    static double[] of(List<ExactConstant> constants) {
        return constants.stream().mapToDouble(Numbers::of).toArray();
    }

    /** The value, if it is positive and finite. @throws DomainException otherwise */
    static double positive(double value, String what) {
        if (!(value > 0) || Double.isInfinite(value)) {
            throw new DomainException(what + " must be a positive number, got " + value);
        }
        return value;
    }

    /** A number in a message, four significant digits. */
    static String shown(double value) {
        return String.format(Locale.ROOT, "%.4g", value);
    }
}
