package bubblechain.qcd;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import java.util.StringJoiner;

/** The expansion parameter of a series, as a multiple of alpha_s. */
public enum Coupling {
    /** a = beta0 alpha_s/(4 pi), the natural one of a bubble chain. */
    A("a", "a = beta0 alpha_s/(4 pi)"),
    ALPHA("alpha", "alpha_s"),
    ALPHA_OVER_PI("alpha/pi", "alpha_s/pi"),
    /** y = alpha_s/(4 pi), the one of the beta function. */
    ALPHA_OVER_4PI("alpha/4pi", "alpha_s/(4 pi)");

    private final String text;
    private final String words;

    Coupling(String text, String words) {
        this.text = text;
        this.words = words;
    }

    /** The word used on the command line and in files. */
    public String text() {
        return text;
    }

    /** The coupling as a reader writes it. */
    public String words() {
        return words;
    }

    /**
     * The coupling with its flavours and scale, as in "alpha_s^(4)(2 mbar)/pi".
     *
     * @param flavours flavours of the coupling
     * @param scale    its scale in words
     */
    public String words(int flavours, String scale) {
        return words.replace("alpha_s", "alpha_s^(" + flavours + ")(" + scale + ")");
    }

    /** This coupling divided by alpha_s. @param beta0 first coefficient of the beta function; used by {@link #A} only */
    public ExactConstant perAlpha(Rational beta0) {
        return switch (this) {
            case A -> ExactConstant.PI.inverse().multiply(beta0.divide(4));
            case ALPHA -> ExactConstant.ONE;
            case ALPHA_OVER_PI -> ExactConstant.PI.inverse();
            case ALPHA_OVER_4PI -> ExactConstant.PI.inverse().divide(Rational.of(4));
        };
    }

    /**
     * The factor r that turns a coefficient of this coupling into one of another: c_n this^n = c_n r^n other^n.
     *
     * @throws DomainException if {@code beta0} is zero and the other coupling is {@link #A}
     */
    public ExactConstant inUnitsOf(Coupling other, Rational beta0) {
        if (other == A && beta0.isZero()) {
            throw new DomainException("the coupling a = beta0 alpha_s/(4 pi) needs beta0 different from 0");
        }
        return perAlpha(beta0).multiply(other.perAlpha(beta0).inverse());
    }

    /** @throws DomainException if the text is none of the four names */
    public static Coupling parse(String text) {
        StringJoiner names = new StringJoiner(", ");
        for (Coupling coupling : values()) {
            if (coupling.text.equals(text)) {
                return coupling;
            }
            names.add(coupling.text);
        }
        throw new DomainException("coupling '" + text + "' is not one of " + names);
    }
}
