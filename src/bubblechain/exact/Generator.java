package bubblechain.exact;

import java.math.BigInteger;
import java.util.Objects;
import java.util.function.IntFunction;

/**
 * A constant that enters an {@link ExactConstant} polynomially: Euler's constant, zeta(3), zeta(5), ..., ln p, or a
 * number without canonical form (such as gamma(1/4)) that is only known by its balls.
 *
 * <p>Two generators are equal when they have the same kind, index and text. Different generators are independent
 * <em>formally</em>; nothing is claimed about the numbers.
 */
final class Generator implements Comparable<Generator> {
    enum Kind {
        EULER,
        LOG,
        ZETA,
        OPAQUE
    }

    static final Generator EULER =
            new Generator(Kind.EULER, BigInteger.ZERO, "euler_gamma", BallFunctions::eulerGamma);

    private final Kind kind;
    private final BigInteger index;
    private final String text;
    private final IntFunction<Ball> value;
    private final int hash;

    private Generator(Kind kind, BigInteger index, String text, IntFunction<Ball> value) {
        this.kind = kind;
        this.index = index;
        this.text = text;
        this.value = value;
        this.hash = Objects.hash(kind.ordinal(), index, text);
    }

    /** zeta(k) for odd k of at least 3. */
    static Generator zeta(int k) {
        return new Generator(Kind.ZETA, BigInteger.valueOf(k), "zeta(" + k + ")", bits -> BallFunctions.zeta(k, bits));
    }

    /** ln p for a prime p (or a number too large to be factored, which then stands for itself). */
    static Generator log(BigInteger p) {
        return new Generator(Kind.LOG, p, "ln(" + p + ")", bits -> BallFunctions.lnOf(p, bits));
    }

    /** A number known only by its balls, with its text in the formula language. */
    static Generator opaque(String text, IntFunction<Ball> value) {
        return new Generator(Kind.OPAQUE, BigInteger.ZERO, text, value);
    }

    boolean isOpaque() {
        return kind == Kind.OPAQUE;
    }

    boolean isLog() {
        return kind == Kind.LOG;
    }

    boolean isEuler() {
        return kind == Kind.EULER;
    }

    BigInteger index() {
        return index;
    }

    /** Transcendental weight, used only to order the terms of a printed constant. */
    int weight() {
        return switch (kind) {
            case ZETA -> index.intValueExact();
            case EULER, LOG, OPAQUE -> 1;
        };
    }

    Ball toBall(int bits) {
        return value.apply(bits);
    }

    @Override
    public int compareTo(Generator other) {
        int byKind = kind.compareTo(other.kind);
        if (byKind != 0) {
            return byKind;
        }
        int byIndex = index.compareTo(other.index);
        return byIndex != 0 ? byIndex : text.compareTo(other.text);
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Generator g && kind == g.kind && index.equals(g.index) && text.equals(g.text);
    }

    @Override
    public int hashCode() {
        return hash;
    }

    @Override
    public String toString() {
        return text;
    }
}
