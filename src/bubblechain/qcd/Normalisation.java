package bubblechain.qcd;

import bubblechain.exact.DomainException;
import java.util.Locale;
import java.util.StringJoiner;

/** What is taken out of the coefficients of f = prefactor x sum_{n>=0} c_n a^(n+1). */
public enum Normalisation {
    /** c_n: the prefactor is taken out. */
    PREFACTOR("c_n, the prefactor taken out"),
    /** prefactor x c_n: the coefficient in the full quantity. */
    FULL("coefficient in the full quantity, prefactor included"),
    /** c_n/c_0. */
    FIRST("c_n/c_0, the first coefficient taken out");

    private final String meaning;

    Normalisation(String meaning) {
        this.meaning = meaning;
    }

    /** The word used on the command line: prefactor, full or first. */
    public String text() {
        return name().toLowerCase(Locale.ROOT);
    }

    /** The meaning in words. */
    public String meaning() {
        return meaning;
    }

    /** @throws DomainException if the text is not one of the three words */
    public static Normalisation parse(String text) {
        StringJoiner names = new StringJoiner(", ");
        for (Normalisation normalisation : values()) {
            if (normalisation.text().equals(text)) {
                return normalisation;
            }
            names.add(normalisation.text());
        }
        throw new DomainException("normalisation '" + text + "' is not one of " + names);
    }
}
