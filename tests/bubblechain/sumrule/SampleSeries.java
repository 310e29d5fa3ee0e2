package bubblechain.sumrule;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.ReferenceTable;
import bubblechain.fixedorder.UncertainSeries;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.qcd.BetaFunction;
import bubblechain.qcd.Coupling;
import bubblechain.series.ExactRing;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/** Series with a known answer, for calibrating the sum rule. */
final class SampleSeries {
    private SampleSeries() {}

    /** c_0, c_1, ... of a bubble chain from chain-coefficients.csv. */
    static List<ExactConstant> chain(String name, int count) {
        return ReferenceTable.read("/bubblechain/sumrule/chain-coefficients.csv").stream()
                .filter(r -> r.get("chain").equals(name))
                .limit(count)
                .map(r -> ExactConstant.of(Rational.parse(r.get("value"))))
                .toList();
    }

    static SumRuleRequest.Builder chainRequest(String name, int count, int p) {
        return SumRuleRequest.forChain(name, chain(name, count), 4, Rational.of(p));
    }

    /** a_n with S = (1, 0.7, -0.3, 0, ...), beta_0 to beta_2 of nf = 4; sum-rule.md section 2, item 3. */
    static SumRuleRequest.Builder constructed(int p, int count) {
        BetaFunction beta = BetaFunction.of(4, 3);
        ScaleEvolution<ExactConstant> evolution =
                ScaleEvolution.of(ExactRing.INSTANCE, beta, Rational.of(p), Rational.ZERO, List.of(), count);
        List<ExactConstant> a = evolution.coefficients(constructedTerms(), count);
        return inY("constructed", a, beta, p);
    }

    static List<ExactConstant> constructedTerms() {
        return List.of(
                ExactConstant.ONE, ExactConstant.of(Rational.parse("0.7")), ExactConstant.of(Rational.parse("-0.3")));
    }

    /** The convergent series a_n = (beta0/2)^n, nf = 4, five-loop running. */
    static SumRuleRequest.Builder convergent(int p, int count) {
        BetaFunction beta = BetaFunction.of(4);
        List<ExactConstant> a = new ArrayList<>();
        for (int n = 1; n <= count; n++) {
            a.add(ExactConstant.of(beta.beta0().divide(2).power(n)));
        }
        return inY("convergent", a, beta, p);
    }

    static SumRuleRequest.Builder inY(String name, List<ExactConstant> a, BetaFunction beta, int p) {
        return SumRuleRequest.forCoefficients(
                name, UncertainSeries.exact(a), Coupling.ALPHA_OVER_4PI, beta, Rational.of(p));
    }

    /** A series in alpha_s/pi, five-loop running, from polynomials in nf. */
    static SumRuleRequest.Builder inAlphaOverPi(String name, int nf, int p, String... polynomials) {
        List<ExactConstant> values = new ArrayList<>();
        for (String polynomial : polynomials) {
            values.add(ConstantValue.of(Formula.parse(polynomial), Map.of("nf", ExactConstant.of(nf))));
        }
        return SumRuleRequest.forCoefficients(
                name, UncertainSeries.exact(values), Coupling.ALPHA_OVER_PI, BetaFunction.of(nf), Rational.of(p));
    }

    /** fixed-order.csv, Adler function non-singlet d1..d4; Baikov, Chetyrkin, Kuehn, arXiv:0801.1821. */
    static SumRuleRequest.Builder adler(int nf, int p) {
        return inAlphaOverPi(
                "adler", nf, p, "1", "1.985707399 - 0.1152953979*nf",
                "18.24269218 - 4.215846509*nf + 0.08620687062*nf^2",
                "135.7916236 - 34.44022726*nf + 1.875251477*nf^2 - 0.01009278335*nf^3");
    }

    /** fixed-order.csv, minus the Bjorken polarised sum rule; Larin, Vermaseren 1991; Baikov et al, arXiv:1001.3606. */
    static SumRuleRequest.Builder bjorken(int nf, int p) {
        return inAlphaOverPi(
                "bjorken", nf, p, "1", "4.583333333 - nf/3", "41.43991307 - 7.607289626*nf + 0.1774691358*nf^2",
                "479.4475407 - 123.3914427*nf + 7.697467702*nf^2 - 0.1037379973*nf^3");
    }

    /** fixed-order.csv, light-like cusp A1..A4 times 4^-n; Henn et al, arXiv:1911.10174. */
    static SumRuleRequest.Builder cusp(int nf) {
        return inAlphaOverPi(
                "cusp", nf, 1, "16/3/4", "(66.47322097 - 5.925925926*nf)/16",
                "(1174.898272 - 183.1874304*nf - 0.7901234568*nf^2)/64",
                "(20702.35303 - 5171.916129*nf + 195.5772258*nf^2 + 3.272344451*nf^3)/256");
    }

    /** fixed-order.csv, gamma_m0..gamma_m3; Chetyrkin, hep-ph/9703278. */
    static SumRuleRequest.Builder gammaM(int nf) {
        return inAlphaOverPi(
                "gamma-m", nf, 1, "1", "4.208333333 - 0.1388888889*nf",
                "19.515625 - 2.284121493*nf - 0.02700617284*nf^2",
                "98.94341426 - 19.10746192*nf + 0.2761625514*nf^2 + 0.005793222354*nf^3");
    }
}
