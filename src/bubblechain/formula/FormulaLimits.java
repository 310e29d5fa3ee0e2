package bubblechain.formula;

/** The caps that keep a hostile or mistaken formula from taking the machine. */
public final class FormulaLimits {
    /** Characters of one formula. */
    public static final int LENGTH = 100_000;
    /** Depth of nested parentheses, calls and signs. */
    public static final int NESTING = 200;
    /** Depth of the tree: nesting plus the length of chains such as a + b + c + ... */
    public static final int HEIGHT = 1_200;
    /** Largest integer exponent, in absolute value. */
    public static final int EXPONENT = 10_000;
    /** Terms of one finite sum. */
    public static final int SUM_TERMS = 1_000;
    /** Nodes visited while the sums of a constant or a series are written out. */
    public static final int STEPS = 500_000;
    /** Digits of one number. */
    public static final int DIGITS = 2_000;
    /** Definitions of one file. */
    public static final int DEFINITIONS = 1_000;
    /** Nodes of a formula after all definitions are written out. */
    public static final long NODES = 100_000;

    private FormulaLimits() {}
}
