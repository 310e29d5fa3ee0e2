package bubblechain.assessment;

import static bubblechain.fixedorder.ReferenceTable.assertPrinted;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.chain.Chain;
import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.PerturbativeSeries;
import bubblechain.fixedorder.SeriesLibrary;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import bubblechain.kernel.KernelText;
import bubblechain.sumrule.SumRule;
import bubblechain.sumrule.SumRuleResult;
import bubblechain.sumrule.Verdict;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class CrossCheckTest {
    private static final Kernel KERNEL = KernelLibrary.load("pole-mass");
    private static final PerturbativeSeries SERIES = SeriesLibrary.find("pole-mass");

    private static CrossCheck check(int nf) {
        return CrossCheck.of(KERNEL, SERIES, nf, Optional.empty());
    }

    @ParameterizedTest
    @CsvSource({
        // naive non-abelianization over the exact coefficient at orders 2, 3, 4, the last digit cut off or rounded
        "0, 1.28, 0.93, 0.85", "3, 1.36, 1.02, 0.98", "4, 1.40, 1.08, 1.07", "5, 1.45, 1.18, 1.23"
    })
    void theChainOvershootsTheCoefficientsByTheKnownFactors(int nl, String two, String three, String four) {
        List<CrossCheck.OrderComparison> orders = check(nl).orders();
        List<String> printed = List.of("1.00", two, three, four);
        for (int n = 0; n < 4; n++) {
            Ball ratio = orders.get(n).chain().toBall(256).divide(orders.get(n).published().toBall(256), 256);
            assertPrinted(ratio, printed.get(n), Rational.ONE, "order " + (n + 1));
        }
    }

    @Test
    void theFlavourTermsAgreeInClosedForm() {
        CrossCheck check = check(3);
        assertThat(check.flavourTermsAgree()).isTrue();
        assertThat(check.orders()).hasSize(4).allMatch(CrossCheck.OrderComparison::flavourTermsEqual);
        assertThat(check.verdict()).isEqualTo("sum rule on the published series: singularity at u = 1/2: present; chain: simple"
                + " pole there; the nf^n terms agree exactly through 4 loops");
    }

    @Test
    void anotherKernelIsSeenByItsFlavourTerms(@TempDir Path folder) {
        Kernel wrong = KernelText.of("4*exp(5*u/3)/(1-2*u)").kernel(folder);
        CrossCheck check = CrossCheck.of(wrong, SERIES, 3, Optional.empty());
        assertThat(check.flavourTermsAgree()).isFalse();
        assertThat(check.orders().get(0).flavourTermsEqual()).isTrue();
        assertThat(check.orders().get(1).flavourTermsEqual()).isFalse();
        assertThat(check.verdict()).endsWith("the nf^n terms DIFFER: the kernel does not describe this series");
    }

    @Test
    void theChainValueIsExactAndTheMeasuredOneAboutHalfOfIt() {
        CrossCheck check = check(3);
        // K = 4/27 * 4 e^(5/6), N = (CF/pi) e^(5/6) = 0.976564
        assertThat(check.chainStrength()).isEqualTo(ConstantValue.of(Formula.parse("16*exp(5/6)/27")));
        assertPrinted(check.normalisation(check.chainStrength()), "0.976564", "N of the chain");
        assertThat(check.measuredOverChain().orElseThrow().toDouble()).isBetween(0.5, 0.6);
        assertThat(check.measured().verdict()).isEqualTo(Verdict.PRESENT);
        assertThat(check.isNearest()).isTrue();
        assertThat(CrossCheck.of(KERNEL, SERIES, 3, Optional.of(Rational.of(3))).isNearest()).isFalse();
    }

    @ParameterizedTest
    @CsvSource({"1", "3", "-2", "2", "4"})
    void theSumRuleOfTheChainTelescopes(String power) {
        Rational p = Rational.parse(power);
        CrossCheck check = CrossCheck.of(KERNEL, SERIES, 4, Optional.of(p));
        List<ExactConstant> c = Chain.of(KERNEL).exact(CrossCheck.CHAIN_TERMS);
        ExactConstant prefactor = ExactConstant.of(Rational.of(4, 25)); // CF/beta0 at nf = 4
        for (int k = 0; k < c.size(); k++) {
            // K_k = c_k/((2/p)^k k!)
            Rational weight = Rational.TWO.divide(p).power(k).multiply(Rational.of(ExactFunctions.factorial(k)));
            assertThat(check.chainOrders().get(k)).isEqualTo(c.get(k).divide(weight).multiply(prefactor));
        }
    }

    @Test
    void whatCannotBeComparedIsRefused() {
        assertThatThrownBy(() -> CrossCheck.of(KernelLibrary.load("lepton-g2"), SERIES, 3, Optional.empty()))
                .isInstanceOf(DomainException.class)
                .hasMessage("the kernel lepton-g2 belongs to QED, the series pole-mass to QCD; there is nothing to compare");
        assertThatThrownBy(() -> CrossCheck.of(KernelLibrary.load("adler"), SERIES, 3, Optional.of(Rational.of(6))))
                .hasMessage("the chain has a pole of order 2 at u = 3; a residue is compared at simple poles only");
    }

    private static SumRuleResult chain(int loops, int power, boolean removeNearer) {
        return SumRule.evaluate(
                ChainSumRule.request(KERNEL, 3, loops, Optional.of(Rational.of(power)), removeNearer));
    }

    @Test
    void removingAllNearerPolesUncoversTheNextOne() {
        SumRuleResult result = chain(30, 3, true);
        assertThat(result.blockedBy()).isEmpty();
        // K = -R/u0 = -(3/4 e^(5/2))/(3/2)
        double expected = -0.5 * Math.exp(2.5);
        assertThat(result.bareStrengths().get(29).toDouble()).isEqualTo(expected, org.assertj.core.data.Offset.offset(1e-2));
        assertThat(result.request().inWords())
                .endsWith("; the parts of the nearer poles at u = -1, 1/2 are taken out of c_n exactly");
    }

    @Test
    void takingOutOneHalfOnlyLeavesTheUltravioletPoleInTheWay() {
        // with u = -1 put back, c_n + 4 e^(-5/3) n! (-1)^n ..., the values of the sum-rule sheet return
        List<String> printed = List.of("-5.2", "0.51", "-3.5", "-1.3", "-8.1", "1.0", "-13.6");
        SumRuleResult result = chain(7, 3, true);
        for (int k = 0; k < 7; k++) {
            // share of u = -1: -R/(u0^(n+1)) n! = 4 e^(-5/3) (-1)^(n+1) n!, over (2/3)^k k!
            ExactConstant share = ConstantValue.of(Formula.parse("4*exp(-5/3)*(-1)^(%1$d+1)*(3/2)^%1$d".formatted(k)));
            assertPrinted(result.bareStrengths().get(k).add(share.toBall(300), 300), printed.get(k), "k = " + k);
        }
        assertThat(chain(7, 3, false).blockedBy())
                .extracting(b -> b.obstacle().position().toString())
                .contains("1/2");
        assertThat(chain(7, 3, false).verdict()).isEqualTo(Verdict.CANNOT_TELL);
    }
}
