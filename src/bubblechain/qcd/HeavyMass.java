package bubblechain.qcd;

/** The definition of the mass of a heavy quark that is taken out at a threshold. Neither mass depends on a scale. */
public enum HeavyMass {
    /** mbar(mbar), the MS-bar mass at its own scale, with one flavour more than there are lighter quarks. */
    MSBAR("mbar(mbar)"),
    /** The pole mass M. Its relation to mbar is used as a truncated series, lighter quarks massless. */
    POLE("pole mass");

    private final String words;

    HeavyMass(String words) {
        this.words = words;
    }

    /** The mass as a reader writes it. */
    public String words() {
        return words;
    }
}
