package bubblechain.kernel;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;

/** A number a kernel file promises; {@code validate} computes it again and compares exactly. */
public sealed interface KernelCheck {
    /** Where the number comes from. */
    String source();

    /** c_n at mu = scale. */
    record Coefficient(int n, ExactConstant value, String source) implements KernelCheck {}

    /**
     * The coefficient of nf^n in that of (alpha/pi)^(n+1) of the whole quantity at mu = scale, as a paper has it: prefactor
     * x beta0 x c_n (-4 TF/3)^n/4^(n+1), numbers for the colour factors put in.
     */
    record FlavourTerm(int n, ExactConstant value, String source) implements KernelCheck {}

    /** The coefficient of (u - u0)^power at a pole. */
    record Laurent(Rational u, int power, ExactConstant value, String source) implements KernelCheck {}

    /** No pole at u0. */
    record Absent(Rational u, String source) implements KernelCheck {}

    /** The same T(u) and anomalous dimension as another kernel, identically. */
    record SameAs(String kernel, String source) implements KernelCheck {}
}
