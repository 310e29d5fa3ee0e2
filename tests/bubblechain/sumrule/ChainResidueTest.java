package bubblechain.sumrule;

import static bubblechain.fixedorder.ReferenceTable.assertPrinted;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import bubblechain.borel.ChainPole;
import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.Singularity;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Bubble chains with one-loop running: sum-rule.md sections 2.1, 2.2, 2.4, 2.5. */
class ChainResidueTest {
    private static final ExactConstant STRENGTH = ConstantValue.of(Formula.parse("4*exp(5/6)"));
    private static final ChainPole HALF =
            new ChainPole(Rational.HALF, 1, ConstantValue.of(Formula.parse("-2*exp(5/6)")));

    private static void assertAll(List<Ball> values, String... printed) {
        for (int k = 0; k < printed.length; k++) {
            assertPrinted(values.get(k), printed[k], "K_" + k);
        }
    }

    private static List<Ball> scanned(SumRuleResult result, Rational lambda) {
        return result.scan().stream()
                .filter(point -> point.lambda().equals(ExactConstant.of(lambda)))
                .findFirst()
                .orElseThrow()
                .strengths();
    }

    @Test
    void poleMassChainAtItsScaleAndTwoOthersMatchesTheSheet() {
        SumRuleResult result = SumRule.evaluate(SampleSeries.chainRequest("pole-mass", 7, 1).build());
        // sum-rule.md section 2.1
        assertAll(result.bareStrengths(), "4.0", "9.3723022", "8.8113251", "9.1549038", "9.1033743", "9.2080062", "9.1852675");
        // sum-rule.md section 2.2
        assertAll(scanned(result, Rational.HALF), "8.0", "13.199427", "6.5516926", "10.153635", "8.7853271", "9.3860488");
        assertAll(scanned(result, Rational.TWO), "2.0", "6.0724455", "8.1343080", "8.8679704", "9.0622289", "9.1508886");
    }

    @Test
    void poleMassChainTendsToItsResidue() {
        SumRuleResult result = SumRule.evaluate(SampleSeries.chainRequest("pole-mass", 13, 1).build());
        assertThat(result.verdict()).isEqualTo(Verdict.PRESENT);
        // 4 e^(5/6) = 9.2039035635713, N = (CF/pi) e^(5/6) = 0.976564498589, sum-rule.md; distance falls like 2^-k
        assertThat(result.bareStrength(13).toDouble()).isCloseTo(9.2039035635713, within(1e-3));
        assertThat(result.normalisation(13).toDouble()).isCloseTo(0.976564498589, within(1e-4));
        assertThat(result.laurentResidue(13).orElseThrow().toDouble())
                .isCloseTo(-4.60195178178565, within(5e-4));
        assertThat(HALF.strength()).isEqualTo(STRENGTH);
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 3, 4, -2, -1})
    void strengthsTelescopeExactlySeed7(int p) {
        List<ExactConstant> c = randomChain(7, 8);
        SumRuleRequest request = SumRuleRequest.forChain("random", c, 3, Rational.of(p)).build();
        List<ExactConstant> exact = SumRule.exactStrengths(request);
        for (int k = 0; k < c.size(); k++) {
            Rational divisor = Rational.TWO.divide(Rational.of(p)).power(k).multiply(Rational.of(ExactFunctions.factorial(k)));
            assertThat(exact.get(k)).as("K_%d = c_k/((2/p)^k k!)", k).isEqualTo(c.get(k).divide(divisor));
        }
        SumRuleResult balls = SumRule.evaluate(request);
        for (int k = 0; k < c.size(); k++) {
            assertThat(balls.bareStrengths().get(k).overlaps(exact.get(k).toBall(300))).isTrue();
        }
    }

    @Test
    void shiftedStrengthsTelescopeExactlySeed8() {
        List<ExactConstant> c = randomChain(8, 6);
        SumRuleRequest request = SumRuleRequest.forChain("random", c, 5, Rational.of(-2)).exponentShift(Rational.ONE).build();
        List<ExactConstant> exact = SumRule.exactStrengths(request);
        for (int k = 0; k < c.size(); k++) {
            // (1 + delta)_k = (k+1)! for delta = 1; (2/p)^k = (-1)^k
            Rational divisor = Rational.of(ExactFunctions.factorial(k + 1)).multiply(k % 2 == 0 ? 1 : -1);
            assertThat(exact.get(k)).isEqualTo(c.get(k).divide(divisor));
        }
        assertThat(SumRule.evaluate(request).laurentResidue(3)).isEmpty();
    }

    private static List<ExactConstant> randomChain(long seed, int count) {
        Random random = new Random(seed);
        List<ExactConstant> c = new ArrayList<>();
        for (int n = 0; n < count; n++) {
            ExactConstant pi = ExactConstant.PI.power(2).multiply(Rational.of(random.nextInt(41) - 20, 9));
            ExactConstant exponential = ExactConstant.of(Rational.of(5, 6)).exp().multiply(Rational.of(random.nextInt(9) - 4));
            c.add(ExactFunctions.zeta(3).add(pi).add(exponential).add(ExactConstant.of(Rational.of(random.nextInt(99), 4))));
        }
        return c;
    }

    @Test
    void poleOfOrderTwoIsFoundWithItsShiftAtOnce() {
        // B = K (1 + u)^(-2): c_n = K (n+1)! (-1)^n, every partial sum is K
        List<ExactConstant> c = new ArrayList<>();
        for (int n = 0; n < 6; n++) {
            Rational factor = Rational.of(ExactFunctions.factorial(n + 1)).multiply(n % 2 == 0 ? 1 : -1);
            c.add(STRENGTH.multiply(factor));
        }
        SumRuleRequest request =
                SumRuleRequest.forChain("double pole", c, 3, Rational.of(-2)).exponentShift(Rational.ONE).build();
        assertThat(SumRule.exactStrengths(request)).containsOnly(STRENGTH);
        assertThat(SumRule.evaluate(request).ambiguity(6)).isEmpty();
    }

    @Test
    void removedPoleLeavesTheDivergenceOfTheSheet() {
        List<ExactConstant> rest = ChainPole.remove(SampleSeries.chain("pole-mass", 7), List.of(HALF));
        SumRuleRequest.Builder builder = SumRuleRequest.forChain("pole-mass", rest, 4, Rational.of(3));
        SumRuleResult result = SumRule.evaluate(builder.build());
        // sum-rule.md section 2.5
        assertAll(result.bareStrengths(), "-5.2", "0.51", "-3.5", "-1.3", "-8.1", "1.0", "-13.6");
    }

    @Test
    void nearerUltravioletPoleBlocksTheNextInfraredOne() {
        List<ExactConstant> rest = ChainPole.remove(SampleSeries.chain("pole-mass", 7), List.of(HALF));
        // residue -4 e^(-5/3) at u = -1, kernels-heavy-quark.csv
        ChainPole minusOne = new ChainPole(Rational.of(-1), 1, ConstantValue.of(Formula.parse("-4*exp(-5/3)")));
        Obstacle uv = Obstacle.unknown(Rational.of(-1), Singularity.Kind.UV, "").withStrength(minusOne.strength());
        Obstacle ir = Obstacle.unknown(Rational.HALF, Singularity.Kind.IR, "").asRemoved();
        SumRuleResult result = SumRule.evaluate(SumRuleRequest.forChain("pole-mass", rest, 4, Rational.of(3))
                .obstacle(uv)
                .obstacle(ir)
                .build());
        assertThat(result.verdict()).isEqualTo(Verdict.CANNOT_TELL);
        assertThat(result.blockedBy()).hasSize(1);
        // |K_j| (3/2)^6 = 0.7555 x 11.39 = 8.6 against |K_6| = 13.6
        assertThat(result.blockedBy().get(0).contamination().orElseThrow()).isBetween(0.62, 0.65);
    }

    @Test
    void removingEveryPoleOfARationalTransformLeavesNothingSeed9() {
        Random random = new Random(9);
        List<ChainPole> poles = new ArrayList<>();
        for (int order = 1; order <= 3; order++) {
            poles.add(new ChainPole(Rational.of(-1), order, ExactConstant.of(random.nextInt(9) + 1)));
            poles.add(new ChainPole(Rational.of(5, 2), order, ExactConstant.PI.multiply(Rational.of(random.nextInt(9) + 1))));
        }
        // coefficients from Taylor's formula, d^n/du^n (u-v)^(-m) at 0 = (-1)^n (m)_n (-v)^(-m-n)
        List<ExactConstant> c = new ArrayList<>();
        for (int n = 0; n < 8; n++) {
            ExactConstant sum = ExactConstant.ZERO;
            for (ChainPole pole : poles) {
                Rational derivative = pole.position().negate().power(-pole.order() - n);
                for (int i = 0; i < n; i++) {
                    derivative = derivative.multiply(-(pole.order() + i));
                }
                sum = sum.add(pole.coefficient().multiply(derivative));
            }
            c.add(sum);
        }
        assertThat(ChainPole.remove(c, poles)).allMatch(ExactConstant::isZero);
    }

    @Test
    void adlerChainHasNoLimitAtPowerTwoAndFour() {
        // sum-rule.md section 2.4
        assertAll(SumRule.evaluate(SampleSeries.chainRequest("adler", 6, 2).build()).bareStrengths(),
                "1", "0.69", "1.55", "0.36", "1.28", "-0.29");
        assertAll(SumRule.evaluate(SampleSeries.chainRequest("adler", 6, 4).build()).bareStrengths(),
                "1", "1.38", "6.21", "2.91", "20.5", "-9.2");
    }

    @Test
    void longChainKeepsItsDigits() {
        // c_n = n! (2^n + (-1)^n): poles at 1/2 and -1; K_k = 1 + (-1/2)^k exactly
        List<ExactConstant> c = new ArrayList<>();
        for (int n = 0; n < 60; n++) {
            Rational sum = Rational.TWO.power(n).add(n % 2 == 0 ? 1 : -1);
            c.add(ExactConstant.of(sum.multiply(Rational.of(ExactFunctions.factorial(n)))));
        }
        SumRuleResult result = SumRule.evaluate(SumRuleRequest.forChain("two poles", c, 3, Rational.ONE).build());
        Rational exact = Rational.ONE.subtract(Rational.HALF.power(59));
        assertThat(result.bareStrength(60).contains(exact)).isTrue();
        assertThat(result.bareStrength(60).accuracyBits()).isGreaterThan(79);
    }

    @Test
    void aPoleNeedsAPlaceAndAnOrder() {
        assertThatThrownBy(() -> new ChainPole(Rational.ZERO, 1, ExactConstant.ONE))
                .isInstanceOf(DomainException.class)
                .hasMessage("a pole needs a position different from 0 and an order of at least 1, got u = 0, order 1");
        assertThatThrownBy(() -> new ChainPole(Rational.ONE, 0, ExactConstant.ONE)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> Obstacle.unknown(Rational.ZERO, Singularity.Kind.IR, "")).isInstanceOf(DomainException.class);
    }
}
