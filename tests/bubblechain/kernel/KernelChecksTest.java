package bubblechain.kernel;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import bubblechain.analytic.ComplexValue;
import bubblechain.analytic.Expansion;
import bubblechain.analytic.FormEvaluation;
import bubblechain.analytic.NormalForm;
import bubblechain.analytic.Pole;
import bubblechain.chain.Chain;
import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.ExactFunctions;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.ReferenceTable;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;

/**
 * Every kernel that exists against its rows in reference-values/kernel-checks.csv, each with its source: published nf^n and
 * logarithmic terms, coefficients, ratios and Laurent coefficients. The number itself is taken from T(u) and gamma(a) by the
 * definition of c_n, not by the package that computes chains.
 */
class KernelChecksTest {
    private static final int BITS = 300;
    /** Residues at larger u have more digits than are worth computing. */
    private static final int MOST_POLES = 400;

    private static final List<CSVRecord> ROWS = ReferenceTable.read("/reference-values/kernel-checks.csv");

    private static Rational rational(CSVRecord row, String column) {
        return Rational.parse(row.get(column));
    }

    private static ExactConstant constant(String text) {
        return ConstantValue.of(Formula.parse(text));
    }

    private static Kernel kernel(CSVRecord row) {
        Map<String, Rational> parameters = new HashMap<>();
        for (String setting : row.get("parameters").split("[; ]+")) {
            // x is the argument of the massive-gluon function, not a parameter of the kernel
            if (!setting.isBlank() && !setting.startsWith("x=")) {
                parameters.put(setting.substring(0, setting.indexOf('=')), Rational.parse(setting.substring(setting.indexOf('=') + 1)));
            }
        }
        return KernelLibrary.load(row.get("kernel"), parameters);
    }

    /** c_n by n! [u^n] (e^(L u) T(u) - Gtilde(u)/u), or the coefficient of gamma(a) itself. */
    private static ExactConstant coefficient(Kernel kernel, int n, String mu) {
        ExactConstant log = constant(mu).ln().multiply(Rational.TWO);
        if (kernel.sudakov().isPresent()) {
            assertThat(log.isZero()).isTrue();
            return Chain.of(kernel).exact(n + 1).get(n);
        }
        if (kernel.isAnomalousDimension()) {
            assertThat(log.isZero()).isTrue();
            return power(kernel.anomalousDimension().orElseThrow().exact(Rational.ZERO, n + 1), n);
        }
        ExactConstant full = power(kernel.transform().orElseThrow().timesExponential(log).exact(Rational.ZERO, n + 1), n)
                .multiply(Rational.of(ExactFunctions.factorial(n)));
        if (kernel.anomalousDimension().isEmpty()) {
            return full;
        }
        assertThat(log.isZero()).as("a scale of the operator is not in the table").isTrue();
        ExactConstant g = power(kernel.anomalousDimension().orElseThrow().exact(Rational.ZERO, n + 2), n + 1);
        return full.subtract(g.divide(Rational.of(2L * (n + 1))));
    }

    private static ExactConstant power(bubblechain.series.LaurentSeries<ExactConstant> series, int n) {
        int index = n - series.lowest();
        return index < 0 || index >= series.length() ? ExactConstant.ZERO : series.coefficients().get(index);
    }

    private static Optional<ExactConstant> computed(CSVRecord row) {
        Kernel kernel = kernel(row);
        return switch (row.get("kind")) {
            case "coefficient", "nf-term" -> Optional.of(coefficient(kernel, n(row), row.get("mu_over_scale")));
            case "ratio" -> Optional.of(coefficient(kernel, n(row), row.get("mu_over_scale"))
                    .multiply(coefficient(kernel, 0, row.get("mu_over_scale")).inverse()));
            case "log-term" -> Optional.of(coefficient(kernel, n(row) - Integer.parseInt(row.get("power")), "1"));
            case "laurent" -> Optional.of(laurent(kernel, row));
            default -> Optional.empty();
        };
    }

    private static int n(CSVRecord row) {
        return Integer.parseInt(row.get("n"));
    }

    private static ExactConstant laurent(Kernel kernel, CSVRecord row) {
        ExactConstant log = constant(row.get("mu_over_scale")).ln().multiply(Rational.TWO);
        var form = kernel.transform().orElseThrow().timesExponential(log).requireNormalForm();
        int power = Integer.parseInt(row.get("power"));
        return Pole.of(form, rational(row, "u0"))
                .filter(pole -> -power <= pole.order())
                .map(pole -> pole.coefficient(power))
                .orElse(ExactConstant.ZERO);
    }

    private static void check(CSVRecord row) {
        ExactConstant computed = computed(row).orElseThrow();
        ExactConstant multiplier = constant(row.get("multiplier"));
        // program number = multiplier x value, so value = number / multiplier to its tolerance
        Ball own = computed.multiply(multiplier.inverse()).toBall(BITS);
        Rational distance = own.midpoint().subtract(Rational.parse(row.get("value"))).abs();
        assertThat(distance)
                .as("computed %s, given %s: %s; %s", own, row.get("value"), row.get("arguments"), row.get("source"))
                .isLessThanOrEqualTo(Rational.parse(row.get("tolerance")));
        if (!row.get("exact").isBlank() && computed.isClosedForm()) {
            assertThat(computed.subtract(constant(row.get("exact")).multiply(multiplier)).isZero())
                    .as("%s is exactly %s times %s; %s", computed, multiplier, row.get("exact"), row.get("source"))
                    .isTrue();
        }
    }

    @TestFactory
    Stream<DynamicTest> everyRowOfEveryKernelIsReproduced() {
        Map<String, List<CSVRecord>> rows = new LinkedHashMap<>();
        for (CSVRecord row : ROWS) {
            boolean known = KernelLibrary.contains(row.get("kernel"));
            if (known && !row.get("kind").equals("other") && !row.get("multiplier").isBlank()) {
                rows.computeIfAbsent(row.get("kernel"), k -> new java.util.ArrayList<>()).add(row);
            }
        }
        return rows.entrySet().stream()
                .map(e -> DynamicTest.dynamicTest(e.getKey(), () -> e.getValue().forEach(KernelChecksTest::check)));
    }

    /** B(u) of the b -> u width at regular points, also where its terms are singular. */
    @TestFactory
    Stream<DynamicTest> valuesOfTheBorelTransformAreReproduced() {
        return others("b-to-u-width-pole").filter(row -> !row.get("u0").isBlank()).map(row -> DynamicTest.dynamicTest(
                row.get("arguments"), () -> {
                    ExactConstant value = power(kernel(row).transform().orElseThrow().exact(rational(row, "u0"), 1), 0);
                    assertClose(value.toBall(BITS), row);
                }));
    }

    /**
     * r(x) = sum over u0 = 0, 1/2, 1, ... of the residues of pi e^(-5u/3) B(u) x^u/sin(pi u), x < 1.
     */
    @TestFactory
    Stream<DynamicTest> theMassiveGluonFunctionIsTheSumOverThePolesOfTheWidth() {
        return others("b-to-u-width-pole").filter(row -> row.get("parameters").matches("x=0[.].*")).map(row -> {
            String x = row.get("parameters").substring(2);
            return DynamicTest.dynamicTest("x = " + x, () -> {
                NormalForm transform = kernel(row).transform().orElseThrow().requireNormalForm();
                NormalForm form = transform.multiply(NormalForm.of(
                        Formula.parse("-pi*exp(ln(" + x + ")*u-5*u/3)/sin(pi*u)"), "u"));
                // the terms fall like x^u
                int last = (int) (2 * 21 / -Math.log10(Double.parseDouble(x))) + 12;
                Ball sum = Ball.ZERO;
                for (int k = 0; k <= Math.min(last, MOST_POLES); k++) {
                    var series = Expansion.about(Rational.of(k, 2), form).balls(0, BITS);
                    int index = -1 - series.lowest();
                    boolean pole = index >= 0 && index < series.length();
                    sum = pole ? sum.subtract(series.coefficients().get(index), BITS) : sum;
                }
                assertClose(sum, row);
            });
        });
    }

    /**
     * Beyond threshold, x > 1, the sum over poles diverges; r(x) = -(1/(2 pi i)) int du pi e^(-5u/3) B(u) x^u/sin(pi u) upwards
     * from u = -1/2, along a path that bends to the left so that x^u falls off. Trapezoidal rule in double precision.
     */
    @Test
    void theMassiveGluonFunctionBeyondThresholdIsTheInverseMellinTransformOfTheWidth() {
        CSVRecord row = others("b-to-u-width-pole").filter(r -> r.get("parameters").equals("x=2")).findFirst().orElseThrow();
        NormalForm form = kernel(row).transform().orElseThrow().requireNormalForm()
                .multiply(NormalForm.of(Formula.parse("pi*exp(ln(2)*u-5*u/3)/sin(pi*u)"), "u"));
        FormEvaluation evaluation = FormEvaluation.of(form);
        double step = 0.1;
        double bend = 0.1;
        double sum = 0;
        for (int k = 0; k < 4_500; k++) {
            double t = k * step;
            double root = Math.hypot(1, t);
            ComplexValue value = evaluation.at(-0.5 - bend * (root - 1), t);
            // Re [f du/(i dt)], du/dt = i - bend t/root
            double integrand = value.realPart() - bend * t / root * value.imaginaryPart();
            sum -= (k == 0 ? 0.5 : 1) * step * integrand / Math.PI;
        }
        assertThat(sum).isCloseTo(Double.parseDouble(row.get("value")), within(1e-10));
    }

    private static Stream<CSVRecord> others(String kernel) {
        return ROWS.stream().filter(row -> row.get("kernel").equals(kernel) && row.get("kind").equals("other"));
    }

    private static void assertClose(Ball value, CSVRecord row) {
        assertThat(value.midpoint().subtract(Rational.parse(row.get("value"))).abs())
                .as("computed %s, given %s: %s; %s", value, row.get("value"), row.get("arguments"), row.get("source"))
                .isLessThanOrEqualTo(Rational.parse(row.get("tolerance")).add(value.radius().toRational()));
    }

    /** The two sums of jet and hard functions, as kernels of their own. */
    @Test
    void theDeltaCoefficientsOfTheJetFunctionAndOfF2AreReproduced() {
        for (CSVRecord row : others("jet-quark").toList()) {
            boolean jet = row.get("arguments").startsWith("delta(p^2)");
            Kernel kernel = KernelLibrary.load(jet ? "jet-quark-delta" : "dis-threshold");
            // nf terms of c_1: -4/3 with TF taken out, -2/3 with TF = 1/2
            ExactConstant value = Chain.of(kernel).exact(2).get(1).multiply(jet ? Rational.of(-4, 3) : Rational.of(-2, 3));
            assertThat(value).as(row.get("source")).isEqualTo(constant(row.get("exact")));
            assertClose(value.toBall(BITS), row);
        }
    }

    @Test
    void everyRowOfOtherKindIsReproducedSomewhere() {
        assertThat(ROWS.stream().filter(row -> row.get("kind").equals("other")))
                .allMatch(row -> row.get("kernel").equals("jet-quark") && row.get("arguments").startsWith("delta")
                        || row.get("kernel").equals("b-to-u-width-pole")
                                && (!row.get("u0").isBlank() || row.get("parameters").startsWith("x=")));
        assertThat(ROWS.stream().map(row -> row.get("kernel")).distinct()).allMatch(KernelLibrary::contains);
    }

    @Test
    void theTableKnowsEveryBuiltInKernel() {
        List<String> known = ROWS.stream().map(row -> row.get("kernel")).distinct().toList();
        assertThat(KernelLibrary.names().stream().filter(name -> !name.endsWith("-diagram")))
                .isNotEmpty()
                .allMatch(known::contains);
    }

    @Test
    void leptonMomentHasThePublishedFourLoopTermOfThreeBubbles() {
        // Laporta, Phys. Lett. B312 (1993) 495: coefficient of (alpha/pi)^4 with three electron loops at L = 0, from memory:
        // -8609/5832 - 25 pi^2/162 - 2 zeta(3)/9; and 4/27 L^3 from c_0. Factor (1/2)(-1/3)^n as in the table.
        Kernel kernel = KernelLibrary.load("lepton-g2");
        ExactConstant factor = constant("(1/2)*(-1/3)^3");
        assertThat(coefficient(kernel, 3, "1").multiply(factor))
                .isEqualTo(constant("-8609/5832 - 25*pi^2/162 - 2*zeta(3)/9"));
        assertThat(coefficient(kernel, 0, "1").multiply(factor).multiply(Rational.of(-8))).isEqualTo(constant("4/27"));
    }
}
