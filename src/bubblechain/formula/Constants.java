package bubblechain.formula;

/** The named constants of the language. */
public final class Constants {
    public static final String PI = "pi";
    public static final String EULER_GAMMA = "euler_gamma";

    private Constants() {}

    public static boolean isConstant(String name) {
        return name.equals(PI) || name.equals(EULER_GAMMA);
    }

    /** True if the name may be given to a parameter or definition: a plain word that means nothing else. */
    public static boolean isFreeName(String name) {
        return name.matches("[A-Za-z_][A-Za-z0-9_]*")
                && !isConstant(name)
                && Function.named(name).isEmpty()
                && !name.equals("sum");
    }
}
