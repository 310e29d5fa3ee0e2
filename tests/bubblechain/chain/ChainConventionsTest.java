package bubblechain.chain;

import static bubblechain.fixedorder.ReferenceTable.assertPrinted;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import bubblechain.qcd.Coupling;
import bubblechain.qcd.Normalisation;
import bubblechain.qcd.Theory;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Couplings, normalisations, schemes and flavours, each against numbers found another way. */
class ChainConventionsTest {
    private static final Kernel POLE_MASS = KernelLibrary.load("pole-mass");

    private static ChainOptions options(Coupling coupling, Normalisation normalisation, int nf, int couplingNf) {
        return new ChainOptions(
                "1", "1", coupling, normalisation, Scheme.MSBAR, OptionalInt.of(nf), OptionalInt.of(couplingNf));
    }

    private static List<ExactConstant> shown(Kernel kernel, ChainOptions options, int loops) {
        return options.rendering(kernel)
                .applyToExact(Chain.of(kernel, options.scales(kernel)).exact(loops));
    }

    private static ExactConstant constant(String text) {
        return KernelCoefficientsTest.constant(text);
    }

    @Test
    void theCoefficientInAlphaOverPiIsTheClassicalOne() {
        // CF = 4/3 in M = mbar(1 + 4/3 alpha_s/pi): Tarrach:1980up
        List<ExactConstant> full = shown(POLE_MASS, options(Coupling.ALPHA_OVER_PI, Normalisation.FULL, 3, 3), 2);
        assertThat(full.get(0)).isEqualTo(constant("4/3"));
        // CF/4 c_1 beta0/4 with beta0 = 9
        assertThat(full.get(1)).isEqualTo(constant("(pi^2 + 71/8)*9/12"));
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 3, 5, 16})
    void couplingsDifferByTheirPowersOnly(int nf) {
        List<ExactConstant> a = shown(POLE_MASS, options(Coupling.A, Normalisation.FULL, nf, nf), 4);
        List<ExactConstant> alpha = shown(POLE_MASS, options(Coupling.ALPHA, Normalisation.FULL, nf, nf), 4);
        List<ExactConstant> overPi = shown(POLE_MASS, options(Coupling.ALPHA_OVER_PI, Normalisation.FULL, nf, nf), 4);
        List<ExactConstant> over4Pi = shown(POLE_MASS, options(Coupling.ALPHA_OVER_4PI, Normalisation.FULL, nf, nf), 4);
        ExactConstant beta0 = constant("11 - 2/3*" + nf);
        for (int n = 0; n < 4; n++) {
            assertThat(over4Pi.get(n)).isEqualTo(a.get(n).multiply(beta0.power(n + 1)));
            assertThat(overPi.get(n)).isEqualTo(over4Pi.get(n).divide(Rational.of(4).power(n + 1)));
            assertThat(alpha.get(n)).isEqualTo(overPi.get(n).multiply(ExactConstant.PI.power(n + 1).inverse()));
        }
    }

    @Test
    void normalisedToTheFirstTheCoefficientsAreRatios() {
        List<ExactConstant> c = Chain.of(POLE_MASS).exact(4);
        List<ExactConstant> d = shown(POLE_MASS, options(Coupling.A, Normalisation.FIRST, 3, 3), 4);
        for (int n = 0; n < 4; n++) {
            assertThat(d.get(n)).isEqualTo(c.get(n).divide(Rational.of(4)));
        }
        assertPrinted(d.get(1), "4.686", "d_1"); // Ball:1995ni table, recalled
        assertPrinted(d.get(2), "17.623", "d_2"); // Ball:1995ni table, recalled
    }

    @ParameterizedTest
    @CsvSource({"3, 2, 1", "4, 1/3, 1", "0, 2, 2", "5, 3, 1/2"})
    void aCouplingThatCountsTheHeavyQuarkIsTheOneLoopSubstitution(int nl, String mu, String operator) {
        // 1/alpha^(nl)(mu) = 1/alpha^(nl+1)(mu) + (4 TF/3) L/(4 pi), L = ln(mu^2/m^2), TF = 1/2: with y = alpha/(4 pi)
        // y^(nl) = y/(1 + 2 L y/3) = sum_k (-2L/3)^k y^(k+1), put into the series in y^(nl)
        int loops = 5;
        ChainOptions light = new ChainOptions(
                mu, operator, Coupling.ALPHA_OVER_4PI, Normalisation.FULL, Scheme.MSBAR, OptionalInt.of(nl), OptionalInt.of(nl));
        ChainOptions heavy = new ChainOptions(
                mu, operator, Coupling.ALPHA_OVER_4PI, Normalisation.FULL, Scheme.MSBAR, OptionalInt.of(nl),
                OptionalInt.of(nl + 1));
        ExactConstant shift = constant("-2/3").multiply(constant(mu).ln()).multiply(Rational.TWO);
        List<ExactConstant> expected = substituted(shown(POLE_MASS, light, loops), shift);
        assertThat(shown(POLE_MASS, heavy, loops)).isEqualTo(expected);
    }

    /** sum f_n y^(n+1) with y replaced by y/(1 - s y), whose power n+1 has the coefficient binom(n+k, k) s^k at y^(n+1+k). */
    private static List<ExactConstant> substituted(List<ExactConstant> f, ExactConstant s) {
        List<ExactConstant> result = new ArrayList<>();
        for (int total = 0; total < f.size(); total++) {
            ExactConstant sum = ExactConstant.ZERO;
            Rational binomial = Rational.ONE;
            for (int k = 0; k <= total; k++) {
                sum = sum.add(f.get(total - k).multiply(s.power(k)).multiply(binomial));
                binomial = binomial.multiply(total - k).divide(k + 1);
            }
            result.add(sum);
        }
        return result;
    }

    @Test
    void atTheMassItselfTheHeavyQuarkMakesNoDifference() {
        assertThat(shown(POLE_MASS, options(Coupling.ALPHA, Normalisation.FULL, 4, 5), 6))
                .isEqualTo(shown(POLE_MASS, options(Coupling.ALPHA, Normalisation.FULL, 4, 4), 6));
    }

    @Test
    void theVSchemeRemovesTheConstantOfTheBubble() {
        // a_V(mu) = a(e^(-5/6) mu): the V scheme at mu is MS-bar at e^(-5/6) mu
        Scales v = Scales.of(constant("2"), ExactConstant.ONE).withVCoupling();
        Scales shifted = Scales.of(constant("2*exp(-5/6)"), ExactConstant.ONE);
        assertThat(Chain.of(POLE_MASS, v).exact(6)).isEqualTo(Chain.of(POLE_MASS, shifted).exact(6));
        // for the potential in position space 5/3 + 2 gammaE loses its 5/3 (Fischler:1977yf, from memory)
        Kernel potential = KernelLibrary.load("static-potential-r");
        assertThat(Chain.of(potential, Scales.NATURAL.withVCoupling()).exact(2).get(1)).isEqualTo(constant("2*euler_gamma"));
        ChainOptions options = new ChainOptions(
                "1", "1", Coupling.A, Normalisation.PREFACTOR, Scheme.V, OptionalInt.empty(), OptionalInt.empty());
        assertThat(shown(potential, options, 2).get(1)).isEqualTo(constant("2*euler_gamma"));
    }

    @Test
    void changingTheCouplingsScaleThereAndBackChangesNothing() {
        // c_n at mu from c_n at Q by e^(L u), and the inverse
        ExactConstant log = constant("2*ln(3)");
        List<ExactConstant> natural = Chain.of(POLE_MASS).exact(7);
        List<ExactConstant> there = Chain.of(POLE_MASS, Scales.of(constant("3"), ExactConstant.ONE)).exact(7);
        assertThat(translated(there, log.negate())).isEqualTo(natural);
        assertThat(translated(natural, log)).isEqualTo(there);
    }

    /** sum_k binom(n, k) L^k c_(n-k). */
    private static List<ExactConstant> translated(List<ExactConstant> c, ExactConstant log) {
        List<ExactConstant> result = new ArrayList<>();
        for (int n = 0; n < c.size(); n++) {
            ExactConstant sum = ExactConstant.ZERO;
            Rational binomial = Rational.ONE;
            for (int k = 0; k <= n; k++) {
                sum = sum.add(c.get(n - k).multiply(log.power(k)).multiply(binomial));
                binomial = binomial.multiply(n - k).divide(k + 1);
            }
            result.add(sum);
        }
        return result;
    }

    @Test
    void theOperatorsScaleShiftsTheFirstCoefficientByItsAnomalousDimension() {
        // M - mbar(mu): c_0 = 4 + 3 ln(mu^2/m^2), Tarrach:1980up
        List<ExactConstant> c = Chain.of(POLE_MASS, Scales.of(constant("1"), constant("5"))).exact(1);
        assertThat(c.get(0)).isEqualTo(constant("4 + 6*ln(5)"));
    }

    @ParameterizedTest
    @CsvSource({
        "2, 2 m", "1/2, m/2", "3/2, (3/2) m", "0.5, m/2", "sqrt(8), sqrt(8) m", "2*sqrt(2), 2*sqrt(2) m",
        "sqrt(2)/2, (sqrt(2)/2) m", "1+ln(2), (1 + ln(2)) m", "exp(-5/6), exp(-5/6) m", "1, m", "4/4, m", "exp(0), m",
        "123456789/10, (123456789/10) m"
    })
    void theScaleIsSaidInWords(String ratio, String words) {
        assertThat(ChainOptions.DEFAULT.withMu(ratio).scaleWords(POLE_MASS)).isEqualTo(words);
    }

    @ParameterizedTest
    @CsvSource({
        "2, 2/r", "1/2, 1/(2 r)", "3/2, (3/2)/r", "sqrt(8), sqrt(8)/r", "exp(-euler_gamma), exp(-euler_gamma)/r", "1, 1/r"
    })
    void anInverseScaleIsSaidInWords(String ratio, String words) {
        assertThat(ChainOptions.DEFAULT.withMu(ratio).scaleWords(KernelLibrary.load("static-potential-r")))
                .isEqualTo(words);
    }

    @Test
    void theHeaderSaysWhatIsExpandedInWhat() {
        ChainOptions options = new ChainOptions(
                "2", "sqrt(2)", Coupling.ALPHA_OVER_PI, Normalisation.FULL, Scheme.MSBAR, OptionalInt.of(3), OptionalInt.of(4));
        assertThat(options.words(POLE_MASS)).isEqualTo("M/mbar(mbar) - 1 = sum_{n>=0} c_n x^(n+1), x = alpha_s^(4)(2 m)/pi;"
                + " operator renormalised at sqrt(2) m instead; the 4-flavour coupling is decoupled at m, at one loop,"
                + " large-beta0 limit, MS-bar coupling");
        assertThat(ChainOptions.DEFAULT.words(KernelLibrary.load("lepton-g2")))
                .isEqualTo("a_l = 2/beta0 sum_{n>=0} c_n a^(n+1), a = beta0 alpha^(nf)(m)/(4 pi), large-beta0 limit,"
                        + " MS-bar coupling");
    }

    @Test
    void flavourTermsAreTheChainWithTheFermionicBeta0() {
        // CF c_n (-4 TF/3)^n/4^(n+1): the difference quotient of the full coefficient in nf gives the same at n = 1
        List<ExactConstant> at3 = shown(POLE_MASS, options(Coupling.ALPHA_OVER_PI, Normalisation.FULL, 3, 3), 2);
        List<ExactConstant> at4 = shown(POLE_MASS, options(Coupling.ALPHA_OVER_PI, Normalisation.FULL, 4, 4), 2);
        ExactConstant term = FlavourTerm.perAlphaOverPi(POLE_MASS, 1, Chain.of(POLE_MASS).exact(2).get(1));
        assertThat(at4.get(1).subtract(at3.get(1))).isEqualTo(term);
        assertThat(term).isEqualTo(constant("-(71/144 + pi^2/18)")); // Gray:1990yh (from memory)
        assertThat(POLE_MASS.theory()).isEqualTo(Theory.QCD);
    }

    @Test
    void flavoursThatDoNotFitAreRefused() {
        assertThatThrownBy(() -> options(Coupling.A, Normalisation.PREFACTOR, 3, 5).scales(POLE_MASS))
                .isInstanceOf(DomainException.class)
                .hasMessage("--coupling-nf is --nf or --nf plus the heavy quark, 3 or 4, got 5");
        assertThatThrownBy(() -> options(Coupling.A, Normalisation.PREFACTOR, 3, 4).scales(KernelLibrary.load("adler")))
                .hasMessage("the kernel adler has no heavy quark; --coupling-nf must be equal to --nf");
        assertThatThrownBy(() -> options(Coupling.A, Normalisation.PREFACTOR, 17, 17))
                .hasMessage("the number of flavours lies between 0 and 16, got 17");
    }
}
