package bubblechain.qcd;

import bubblechain.exact.Rational;

/**
 * Colour factors of SU(3) with quarks in the fundamental representation. The quartic ones are the products of fully
 * symmetrised traces, summed over all four indices, without division by the dimension of a representation.
 */
public final class Colour {
    /** C_F = (N^2 - 1)/(2N). */
    public static final Rational CF = Rational.of(4, 3);
    /** C_A = N. */
    public static final Rational CA = Rational.of(3);
    /** T_F. */
    public static final Rational TF = Rational.HALF;
    /** Dimension of the fundamental representation. */
    public static final Rational NF = Rational.of(3);
    /** Dimension of the adjoint representation, N^2 - 1. */
    public static final Rational NA = Rational.of(8);
    /** d_F^abcd d_F^abcd = (N^2 - 1)(N^4 - 6 N^2 + 18)/(96 N^2). */
    public static final Rational DFF = Rational.of(5, 12);
    /** d_F^abcd d_A^abcd = N (N^2 - 1)(N^2 + 6)/48. */
    public static final Rational DFA = Rational.of(15, 2);
    /** d_A^abcd d_A^abcd = N^2 (N^2 - 1)(N^2 + 36)/24. */
    public static final Rational DAA = Rational.of(135);

    private Colour() {}
}
