package bubblechain.kernel;

import java.util.Locale;
import java.util.StringJoiner;

/** How a kernel file gives its quantity. */
public enum KernelForm {
    /** T(u), the Borel transform before subtraction, and the anomalous dimension where one is needed. */
    BOREL("borel"),
    /** G(eps, u), the one-loop diagram in d = 4 - 2 eps with gluon index 1 + u - eps. */
    D_DIMENSIONAL("d-dimensional"),
    /** A weighted sum of other kernels. */
    COMBINATION("combination");

    private final String text;

    KernelForm(String text) {
        this.text = text;
    }

    /** The word in a kernel file. */
    public String text() {
        return text;
    }

    static KernelForm parse(String text) {
        StringJoiner names = new StringJoiner(", ");
        for (KernelForm form : values()) {
            if (form.text.equals(text.toLowerCase(Locale.ROOT))) {
                return form;
            }
            names.add(form.text);
        }
        throw new KernelException("form '" + text + "' is not one of " + names);
    }
}
