package bubblechain.analytic;

/** How far the order of a pole is known. */
public enum PoleStatus {
    /** Closed forms throughout, and the ball of the leading coefficient excludes zero. */
    EXACT("exact"),
    /** Some coefficient is known only by its balls, and the ball of the leading one excludes zero. */
    CERTIFIED("certified"),
    /** The leading coefficient is formally not zero, but its ball still contains zero at the highest precision tried. */
    ORDER_NOT_PROVED("order-not-proved");

    private final String text;

    PoleStatus(String text) {
        this.text = text;
    }

    /** The word shown to the user. */
    public String text() {
        return text;
    }
}
