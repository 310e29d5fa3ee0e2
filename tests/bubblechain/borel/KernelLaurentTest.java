package bubblechain.borel;

import static bubblechain.fixedorder.ReferenceTable.assertPrinted;
import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.analytic.PoleStatus;
import bubblechain.chain.Scales;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.ReferenceTable;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.kernel.KernelLibrary;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/** Poles and Laurent coefficients against the referee's table and against the sources of single kernels. */
class KernelLaurentTest {
    private static final Rational SIX = Rational.of(6);

    private static final List<CSVRecord> TABLE = ReferenceTable.read("/reference-values/generated/kernel-laurent.csv");

    private static BorelPlane plane(String kernel) {
        return BorelPlane.of(KernelLibrary.load(kernel), Scales.NATURAL);
    }

    private static ExactConstant constant(String text) {
        return ConstantValue.of(Formula.parse(text));
    }

    private static List<CSVRecord> rows(String kernel) {
        return TABLE.stream().filter(row -> row.get("kernel").equals(kernel)).toList();
    }

    static List<String> kernelsOfTheTable() {
        return TABLE.stream().map(row -> row.get("kernel")).distinct().toList();
    }

    @Test
    void theTableHoldsTheKernelsWithDifficultPoles() {
        assertThat(kernelsOfTheTable()).hasSize(27).contains("pole-mass", "b-to-u-width-msbar", "dis-threshold", "chromomag");
    }

    @ParameterizedTest
    @MethodSource("kernelsOfTheTable")
    void everyLaurentCoefficientOfTheRefereeIsFoundAndNoOtherPole(String kernel) {
        BorelPlane plane = plane(kernel);
        List<BorelPole> poles = plane.poles(SIX.negate(), SIX);
        int coefficients = 0;
        for (CSVRecord row : rows(kernel)) {
            int order = Integer.parseInt(row.get("order"));
            int power = Integer.parseInt(row.get("power"));
            Rational u = Rational.parse(row.get("u0"));
            Optional<BorelPole> pole = plane.poleAt(u);
            assertThat(pole.map(p -> p.pole().order()).orElse(0)).as("order at u = %s", u).isEqualTo(order);
            if (order > 0) {
                assertThat(poles).contains(pole.orElseThrow());
                assertPrinted(pole.get().pole().coefficient(power), row.get("value"), kernel + " at u = " + u);
                coefficients++;
            }
        }
        assertThat(poles.stream().mapToInt(p -> p.pole().order()).sum()).isEqualTo(coefficients);
    }

    private static List<String> points(String kernel, String from, String to) {
        return plane(kernel).poles(Rational.parse(from), Rational.parse(to)).stream()
                .map(p -> p.u().toString())
                .toList();
    }

    @Test
    void poleMassHasPolesAtHalfIntegersAtTwoAndAtNegativeIntegersOnly() {
        assertThat(points("pole-mass", "-4", "6"))
                .containsExactly("-4", "-3", "-2", "-1", "1/2", "3/2", "2", "5/2", "7/2", "9/2", "11/2");
        assertThat(points("pole-mass-diagram", "-4", "6")).isEqualTo(points("pole-mass", "-4", "6"));
    }

    @ParameterizedTest
    @CsvSource({
        // Beneke:1994sw and Ball:1995ni, residue of B(u) in u - u0, from memory and expanded again
        "pole-mass, 1/2, -2*exp(5/6)", "pole-mass, 3/2, 3/4*exp(5/2)", "pole-mass, 2, -exp(10/3)/2",
        "pole-mass, 5/2, 9/64*exp(25/6)", "pole-mass, -1, -4*exp(-5/3)", "pole-mass, -2, 9*exp(-10/3)",
        // Beneke:1992ch, from memory
        "adler, 2, -6*exp(10/3)",
        // Broadhurst:1993ru, from memory
        "bjorken-gls, 1, 8/3*exp(5/3)", "bjorken-gls, -1, -4/3*exp(-5/3)", "bjorken-gls, -2, 1/3*exp(-10/3)",
        // expansion of the closed form
        "static-potential-r, 1/2, -exp(5/6)/pi", "static-potential-r, 3/2, exp(5/2)/(6*pi)",
        "static-potential-r, 5/2, -exp(25/6)/(120*pi)", "lepton-g2, 1/2, -exp(5/6)", "lepton-g2, 1, 2*exp(5/3)",
        "lepton-g2, 3/2, -15/8*exp(5/2)", "lepton-g2, 2, exp(10/3)", "lepton-g2, -2, 2*exp(-10/3)"
    })
    void simplePolesHaveTheirClosedFormResidue(String kernel, String u, String residue) {
        BorelPole pole = plane(kernel).poleAt(Rational.parse(u)).orElseThrow();
        assertThat(pole.pole().order()).isEqualTo(1);
        assertThat(pole.pole().status()).isEqualTo(PoleStatus.EXACT);
        assertThat(pole.pole().residue()).isEqualTo(constant(residue));
        assertThat(plane(kernel).residueAt(Rational.parse(u))).contains(constant(residue));
        assertThat(pole.strength()).contains(constant("-(" + residue + ")/(" + u + ")"));
    }

    @ParameterizedTest
    @CsvSource({
        "pole-mass, 0 1 3 4 5 6 -1/2 -3/2", "adler, 0 1 1/2 3/2 -1/2", "bjorken-gls, 0 1/2 3 -3 3/2",
        "static-potential-r, 0 1 2 -1 -1/2", "lepton-g2, 0 -1 3 4 5", "cusp, 1/2 1 -1 -5/2", "gamma-m, 1/2 1 -1 -5/2"
    })
    void nullPointsHaveNoPole(String kernel, String points) {
        BorelPlane plane = plane(kernel);
        assertThat(Arrays.stream(points.split(" ")).map(Rational::parse)).noneMatch(u -> plane.poleAt(u).isPresent());
    }

    @Test
    void anomalousDimensionsHaveNoPoleAnywhere() {
        assertThat(points("cusp", "-100", "100")).isEmpty();
        assertThat(points("gamma-m", "-100", "100")).isEmpty();
        assertThat(plane("cusp").leadingInfrared()).isEmpty();
        assertThat(plane("cusp").leadingUltraviolet()).isEmpty();
    }

    @Test
    void adlerIsSimpleAtTwoAndDoubleFromThreeOnAndAtNegativeIntegers() {
        assertThat(points("adler", "-5", "6")).containsExactly("-5", "-4", "-3", "-2", "-1", "2", "3", "4", "5", "6");
        BorelPlane plane = plane("adler");
        for (int n = -5; n <= 6; n++) {
            Rational u = Rational.of(n);
            int expected = n == 0 || n == 1 ? 0 : n == 2 ? 1 : 2;
            assertThat(plane.poleAt(u).map(p -> p.pole().order()).orElse(0)).as("u = %d", n).isEqualTo(expected);
        }
        for (int n = 3; n <= 6; n++) {
            // Beneke:1992ch, Broadhurst:1992si (from memory): g_n (-1)^n [1/(n-u)^2 - (5/3 - 1/(n-1) - 1/(n-2))/(n-u)]
            String g = "(-1)^%1$d*8*exp(5*%1$d/3)/((%1$d-1)*(%1$d-2))".formatted(n);
            BorelPole pole = plane.poleAt(Rational.of(n)).orElseThrow();
            assertThat(pole.pole().coefficient(-2)).isEqualTo(constant(g));
            assertThat(pole.pole().coefficient(-1))
                    .isEqualTo(constant(g + "*(5/3 - 1/(%1$d-1) - 1/(%1$d-2))".formatted(n)));
        }
        for (int n = 1; n <= 4; n++) {
            // h_n (-1)^(n-1) [1/(n+u)^2 + (5/3 + 1/(n+1) + 1/(n+2))/(n+u)]
            String h = "(-1)^(%1$d-1)*8*exp(-5*%1$d/3)/((%1$d+1)*(%1$d+2))".formatted(n);
            BorelPole pole = plane.poleAt(Rational.of(-n)).orElseThrow();
            assertThat(pole.pole().coefficient(-2)).isEqualTo(constant(h));
            assertThat(pole.pole().coefficient(-1))
                    .isEqualTo(constant(h + "*(5/3 + 1/(%1$d+1) + 1/(%1$d+2))".formatted(n)));
            assertThat(pole.strength()).as("K belongs to simple poles").isEmpty();
        }
    }

    @Test
    void theNearestPolesAreFound() {
        assertThat(plane("pole-mass").leadingInfrared().orElseThrow().u()).isEqualTo(Rational.HALF);
        assertThat(plane("pole-mass").leadingUltraviolet().orElseThrow().u()).isEqualTo(Rational.of(-1));
        assertThat(plane("lepton-g2").leadingUltraviolet().orElseThrow().u()).isEqualTo(Rational.of(-2));
        assertThat(plane("static-potential-r").leadingUltraviolet()).isEmpty();
    }

    @Test
    void theScaleOfTheCouplingEntersAResidueAsAPower() {
        Scales twice = Scales.of(constant("2"), ExactConstant.ONE);
        BorelPole pole = BorelPlane.of(KernelLibrary.load("pole-mass"), twice).poleAt(Rational.of(3, 2)).orElseThrow();
        assertThat(pole.pole().residue()).isEqualTo(constant("8*3/4*exp(5/2)"));
        Scales operator = Scales.of(ExactConstant.ONE, constant("7"));
        assertThat(BorelPlane.of(KernelLibrary.load("pole-mass"), operator).poleAt(Rational.of(3, 2)).orElseThrow()
                        .pole().residue())
                .as("the subtraction is entire")
                .isEqualTo(constant("3/4*exp(5/2)"));
    }
}
