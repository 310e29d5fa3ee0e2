package bubblechain.qcd;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.Map;

/**
 * The gauge theory of a bubble chain: its colour factors and the first coefficient of its beta function,
 * beta0 = 11 CA/3 - 4 TF nf/3 with d alpha/d ln mu = -2 alpha [beta0 alpha/(4 pi) + ...].
 */
public enum Theory {
    /** SU(3). */
    QCD(Colour.CF, Colour.CA, Colour.TF, "alpha_s"),
    /** One charge: CF = TF = 1, CA = 0, so beta0 = -4 nf/3 is negative. */
    QED(Rational.ONE, Rational.ZERO, Rational.ONE, "alpha");

    private static final Rational GLUON = Rational.of(11, 3);
    private static final Rational FERMION = Rational.of(4, 3);

    private final Rational cf;
    private final Rational ca;
    private final Rational tf;
    private final String coupling;

    Theory(Rational cf, Rational ca, Rational tf, String coupling) {
        this.cf = cf;
        this.ca = ca;
        this.tf = tf;
        this.coupling = coupling;
    }

    public Rational cf() {
        return cf;
    }

    public Rational ca() {
        return ca;
    }

    public Rational tf() {
        return tf;
    }

    /** The name of the coupling, alpha_s or alpha. */
    public String coupling() {
        return coupling;
    }

    /** beta0 for nf massless flavours. */
    public Rational beta0(int nf) {
        return GLUON.multiply(ca).subtract(beta0PerFlavour().multiply(nf));
    }

    /** What one flavour takes from beta0: 4 TF/3. */
    public Rational beta0PerFlavour() {
        return FERMION.multiply(tf);
    }

    /** Values of the names CF, CA, TF, nf and beta0 a prefactor may use. */
    public Map<String, ExactConstant> names(int nf) {
        Map<String, ExactConstant> values = new LinkedHashMap<>();
        values.put("CF", ExactConstant.of(cf));
        values.put("CA", ExactConstant.of(ca));
        values.put("TF", ExactConstant.of(tf));
        values.put("nf", ExactConstant.of(nf));
        values.put("beta0", ExactConstant.of(beta0(nf)));
        return values;
    }

    /** @throws DomainException if the text is neither QCD nor QED */
    public static Theory parse(String text) {
        return Arrays.stream(values())
                .filter(t -> t.name().equals(text))
                .findFirst()
                .orElseThrow(() -> new DomainException("theory '" + text + "' is neither QCD nor QED"));
    }
}
