package bubblechain.qcd;

import java.util.List;

/**
 * Coupling and heavy-quark masses to start from when a user gives none, in GeV: rows "input" of
 * reference-values/fixed-order.csv, which tell where each was read. They change from year to year: whoever publishes a
 * number states them.
 */
public final class StandardInputs {
    /** alpha_s^(5)(M_Z), world average; Review of Particle Physics 2024, from memory. */
    public static final double ALPHA_S_MZ = 0.1180;
    /** Its standard deviation; same source. */
    public static final double ALPHA_S_MZ_ERROR = 0.0009;
    /** Flavours of the coupling at M_Z. */
    public static final int ALPHA_S_FLAVOURS = 5;
    /** M_Z (error 0.0020 GeV); Review of Particle Physics 2024, from memory. */
    public static final double MZ = 91.1880;
    /** mbar_c(mbar_c) (error 0.0046 GeV); Review of Particle Physics 2024, from memory. */
    public static final double CHARM_MASS = 1.2730;
    /** mbar_b(mbar_b) (error 0.007 GeV); Review of Particle Physics 2024 with 2025 update, seen in its listing. */
    public static final double BOTTOM_MASS = 4.183;
    /** Pole mass of the top quark from cross sections (error 0.7 GeV); Review of Particle Physics 2024, seen in its listing. */
    public static final double TOP_POLE_MASS = 172.4;

    private static final int CHARM_NL = 3;

    private StandardInputs() {}

    /** alpha_s^(5) through the world average at M_Z. @param loops 1 to 5 */
    public static RunningCoupling coupling(int loops) {
        return RunningCoupling.of(ALPHA_S_FLAVOURS, loops, MZ, ALPHA_S_MZ);
    }

    /** Charm and bottom at mu = mbar(mbar), top at its pole mass. */
    public static List<Threshold> thresholds() {
        return List.of(
                Threshold.msbar(CHARM_NL, CHARM_MASS),
                Threshold.msbar(CHARM_NL + 1, BOTTOM_MASS),
                Threshold.pole(CHARM_NL + 2, TOP_POLE_MASS));
    }
}
