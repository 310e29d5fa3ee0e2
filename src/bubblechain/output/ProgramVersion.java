package bubblechain.output;

/** Version of the program, as the jar's manifest states it. */
public final class ProgramVersion {
    private ProgramVersion() {}

    /** "0.1.0"; "development" when the classes do not come from a built jar. */
    public static String text() {
        String version = ProgramVersion.class.getPackage().getImplementationVersion();
        return version == null ? "development" : version;
    }
}
