package bubblechain.sumrule;

import static bubblechain.fixedorder.ReferenceTable.assertPrinted;
import static bubblechain.fixedorder.ReferenceTable.numbers;
import static bubblechain.fixedorder.ReferenceTable.value;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.data.Percentage.withPercentage;

import bubblechain.exact.Ball;
import bubblechain.exact.BallFunctions;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.SeriesLibrary;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.qcd.BetaFunction;
import bubblechain.series.BallRing;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** The pole mass in QCD: fixed-order.md section 9 and sum-rule.md section 3. */
class PoleMassResidueTest {
    private static final int BITS = 200;

    private static SumRuleResult result(int nl) {
        return SumRule.evaluate(SumRuleRequest.forSeries(SeriesLibrary.find("pole-mass"), nl).build());
    }

    private static Ball normalised(Ball strength, int nl) {
        return strength.multiply(BetaFunction.of(nl).beta0(), BITS).divide(BallFunctions.pi(BITS), BITS).shift(-2);
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 3})
    void partialSumsOfTheSumRuleMatchTheReferenceTable(int nl) {
        List<String> printed = numbers(value("N partial sums, R-evolution sum rule, nl=" + nl, "1..4")); // fixed-order.csv
        SumRuleResult result = result(nl);
        for (int n = 1; n <= 4; n++) {
            assertPrinted(result.normalisation(n), printed.get(n - 1), "N at " + n + " loops");
        }
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 3})
    void truncatedResiduesMatchTheReferenceTable(int nl) {
        List<String> printed = numbers(value("N partial sums, truncated residue, nl=" + nl, "1..4")); // fixed-order.csv
        SumRuleResult result = result(nl);
        for (int n = 1; n <= 4; n++) {
            // the table cuts its last digit instead of rounding it
            assertPrinted(
                    normalised(result.truncatedResidues().get(n - 1), nl), printed.get(n - 1), Rational.ONE,
                    "truncated residue at " + n + " loops");
        }
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 3, 5})
    void ratiosToTheLargeOrderFormulaMatchTheReferenceTable(int nl) {
        List<String> printed = numbers(value("N from c4/c4_as (s1..s3), nl=" + nl, "4-loop")); // fixed-order.csv
        assertPrinted(normalised(result(nl).ratios().get(3).orElseThrow(), nl), printed.get(0), "ratio");
    }

    @ParameterizedTest
    @CsvSource({
        "3, 0.424413, 0.137858, 0.012703", // N_m, A. Pineda, hep-ph/0105008 (fixed-order.csv: recalled, reproduced)
        "4, 0.424413, 0.127505, 0.000361", // the same
    })
    void stepsOfTheTruncatedResidueMatchPineda(int nl, String first, String second, String third) {
        List<Ball> sums = result(nl).truncatedResidues().stream().map(k -> normalised(k, nl)).toList();
        assertPrinted(sums.get(0), first, "first term");
        assertPrinted(sums.get(1).subtract(sums.get(0), BITS), second, "second term");
        assertPrinted(sums.get(2).subtract(sums.get(1), BITS), third, "third term");
    }

    @ParameterizedTest
    @CsvSource({ // sum-rule.md, section 3
        "0, 1/2, 0.84882636, 0.73490237, 0.62243194, 0.58329",
        "0, 1, 0.42441318, 0.57440396, 0.60909469, 0.59824",
        "0, 2, 0.21220659, 0.39067836, 0.51272662, 0.56745",
        "3, 1/2, 0.84882636, 0.66409660, 0.57339811, 0.50495",
        "3, 1, 0.42441318, 0.54292126, 0.56900615, 0.53737",
        "3, 2, 0.21220659, 0.37689711, 0.48668469, 0.52279",
    })
    void scaleScanMatchesTheSheet(int nl, String lambda, String one, String two, String three, String four) {
        ExactConstant factor = ConstantValue.of(Formula.parse(lambda));
        ScanPoint point = result(nl).scan().stream().filter(s -> s.lambda().equals(factor)).findFirst().orElseThrow();
        List<String> printed = List.of(one, two, three, four);
        for (int k = 0; k < 4; k++) {
            assertPrinted(normalised(point.strengths().get(k), nl), printed.get(k), "N, order " + (k + 1));
        }
    }

    @ParameterizedTest
    @ValueSource(ints = {0, 3, 4, 5})
    void ambiguityInUnitsOfLambdaMsbarMatchesTheReferenceTable(int nl) {
        // fixed-order.csv, |Im M|/pi = K(nl) N Lambda_MSbar, K = (2 pi/beta0) 2^(-b)/Gamma(1+b); Lambda_t = 2^(-b) Lambda_MSbar
        String row = value("|Im M|/pi = K(nl) N Lambda_MSbar", "exact");
        String printed = Arrays.stream(row.split("; "))
                .filter(entry -> entry.startsWith("nl=" + nl + ":"))
                .map(entry -> entry.substring(entry.indexOf(':') + 2))
                .findFirst()
                .orElseThrow();
        SumRuleResult result = result(nl);
        Rational b = BetaFunction.of(nl).b1hat();
        Ball two = BallFunctions.power(Ball.of(2), b.negate(), BITS);
        Ball factor = result.ambiguity(4).orElseThrow().divide(result.normalisation(4), BITS).multiply(two, BITS);
        assertPrinted(factor, printed, "K(nl)");
    }

    @Test
    void ambiguityIsTwoPiNOverBetaZeroGamma() {
        // definition at p = 1: P = 2 pi N/(beta0 Gamma(1+b))
        SumRuleResult result = result(4);
        Ball gamma = BallFunctions.gamma(Ball.of(BetaFunction.of(4).b1hat().add(1), BITS), BITS);
        Ball expected = result.normalisation(3)
                .multiply(BallFunctions.pi(BITS), BITS)
                .multiply(Rational.TWO.divide(BetaFunction.of(4).beta0()), BITS)
                .divide(gamma, BITS);
        assertThat(result.ambiguity(3).orElseThrow().overlaps(expected)).isTrue();
    }

    @ParameterizedTest
    @CsvSource({ // fixed-order.csv: b, s1, s2, s3 of the u=1/2 asymptotics
        "0, -0.090661499, -0.045071895, -0.0081446508",
        "3, -0.064719555, -0.056680867, 0.0083361987",
        "5, 0.0078263192, -0.072058772, 0.021958635",
    })
    void shapeOfTheLargeOrdersMatchesTheReferenceTable(int nl, String s1, String s2, String s3) {
        ScaleEvolution<Ball> evolution = ScaleEvolution.of(
                BallRing.of(BITS, 2), BetaFunction.of(nl), Rational.ONE, Rational.ZERO, List.of(), 5);
        List<Ball> shape = evolution.shape(4);
        assertPrinted(shape.get(1), s1, "s1");
        assertPrinted(shape.get(2), s2, "s2");
        assertPrinted(shape.get(3), s3, "s3");
    }

    @Test
    void singularityIsPresentAndErrorIsHonest() {
        SumRuleResult result = result(3);
        assertThat(result.verdict()).isEqualTo(Verdict.PRESENT);
        assertThat(result.blockedBy()).isEmpty();
        ErrorBudget budget = result.normalisationErrors();
        // sum-rule.md section 3, nl = 3: last step 0.56900615 - 0.53737; extremes of the scan 0.50495 and 0.53737
        assertThat(budget.lastStep()).isCloseTo(0.03164, within(5e-6));
        assertThat(budget.scale()).isCloseTo((0.53737 - 0.50495) / 2, within(1e-5));
        assertThat(budget.combined()).isGreaterThan(budget.lastStep());
        // R_0 = 0.535(10), Komijani, arXiv:1701.00347 (recalled): well inside
        assertThat(Math.abs(result.normalisation(4).toDouble() - 0.535)).isLessThan(budget.combined());
    }

    @Test
    void inputErrorIsTheLinearShiftOfTheFourLoopCoefficient() {
        // d K_3/d a_4 = (2/p)/(2 beta0)^4 p/(1)... p^3/((1+b)(2+b)(3+b)); c4 error 1.64 and 0.040 nl in quadrature
        double b = 32.0 / 81;
        double perCoefficient = 256 * 2 / Math.pow(18, 4) / ((1 + b) * (2 + b) * (3 + b));
        double expected = Math.hypot(1.64, 0.12) * perCoefficient;
        List<Double> errors = result(3).inputErrors();
        assertThat(errors.subList(0, 3)).containsOnly(0.0);
        assertThat(errors.get(3)).isCloseTo(expected, withPercentage(1e-9));
    }

    @Test
    void droppingTheHighestBetaCoefficientIsTheBetaError() {
        SumRuleRequest.Builder request = SumRuleRequest.forSeries(SeriesLibrary.find("pole-mass"), 3);
        double full = SumRule.evaluate(request.build()).strength(4).toDouble();
        double without = SumRule.evaluate(request.betaLoops(4).build()).strength(4).toDouble();
        assertThat(result(3).errors().beta()).isCloseTo(Math.abs(full - without), within(1e-14));
    }
}
