package bubblechain.formula;

import java.util.Locale;
import java.util.Optional;

/** The functions of the formula language; an integer order comes first, as in {@code polygamma(1, u)}. */
public enum Function {
    GAMMA(1),
    DIGAMMA(1),
    POLYGAMMA(2),
    ZETA(1),
    POLYLOG(2),
    UNIT_3F2(2),
    LN(1),
    SQRT(1),
    EXP(1),
    SIN(1),
    COS(1);

    private final int arity;

    Function(int arity) {
        this.arity = arity;
    }

    public int arity() {
        return arity;
    }

    /** The name in a formula. */
    public String text() {
        return name().toLowerCase(Locale.ROOT);
    }

    static Optional<Function> named(String name) {
        for (Function function : values()) {
            if (function.text().equals(name)) {
                return Optional.of(function);
            }
        }
        return Optional.empty();
    }
}
