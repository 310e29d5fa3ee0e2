package bubblechain.chain;

import static bubblechain.fixedorder.ReferenceTable.assertPrinted;
import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.ReferenceTable;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.kernel.KernelLibrary;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

/** Coefficients against reference-values/generated/kernel-coefficients.csv and against the values of single sources. */
class KernelCoefficientsTest {
    private static final int REFEREE_BITS = 400;

    /** The rows of one kernel at one pair of scales. */
    record Request(String kernel, String mu, String operatorMu, List<CSVRecord> rows) {
        Chain chain() {
            return Chain.of(KernelLibrary.load(kernel), Scales.of(constant(mu), constant(operatorMu)));
        }

        @Override
        public String toString() {
            return kernel + " at " + mu + ", operator at " + operatorMu;
        }
    }

    static ExactConstant constant(String text) {
        return ConstantValue.of(Formula.parse(text));
    }

    static Stream<Request> requests() {
        Map<List<String>, List<CSVRecord>> groups = new LinkedHashMap<>();
        for (CSVRecord row : ReferenceTable.read("/reference-values/generated/kernel-coefficients.csv")) {
            groups.computeIfAbsent(
                            List.of(row.get("kernel"), row.get("mu_over_scale"), row.get("operator_mu_over_scale")),
                            key -> new java.util.ArrayList<>())
                    .add(row);
        }
        return groups.entrySet().stream()
                .map(e -> new Request(e.getKey().get(0), e.getKey().get(1), e.getKey().get(2), e.getValue()));
    }

    @Test
    void theTableHasEveryKernelAtItsScales() {
        assertThat(requests().count()).isEqualTo(80);
        assertThat(requests().mapToInt(r -> r.rows().size())).allMatch(size -> size == 33);
    }

    @ParameterizedTest
    @MethodSource("requests")
    void everyPrintedDigitIsThatOfTheReferee(Request request) {
        for (int digits : new int[] {1, 12, 60}) {
            int loops = 1 + request.rows().stream().mapToInt(row -> Integer.parseInt(row.get("n"))).max().orElseThrow();
            List<CertifiedNumber> numbers = request.chain().certified(loops, digits);
            for (CSVRecord row : request.rows()) {
                int n = Integer.parseInt(row.get("n"));
                CertifiedNumber number = numbers.get(n);
                String expected = Ball.of(Rational.parse(row.get("value")), REFEREE_BITS).toDecimal(digits).orElseThrow();
                boolean zero = row.get("value").equals("0");
                assertThat(number.text()).as("n = %d, %d digits", n, digits).isEqualTo(zero ? "0" : expected);
                assertThat(number.isZero()).as("n = %d is zero", n).isEqualTo(zero);
            }
        }
    }

    @ParameterizedTest
    @MethodSource("requests")
    void theExactFormsAreTheRefereesNumbers(Request request) {
        List<ExactConstant> exact = request.chain().exact(16);
        // unit_3f2 at 1 has known closed forms up to its third derivative
        int closed = request.kernel().contains("-width-") ? 4 : exact.size();
        for (int n = 0; n < exact.size(); n++) {
            assertThat(exact.get(n).isClosedForm()).as("closed form, n = %d", n).isEqualTo(n < closed);
            assertPrinted(exact.get(n).toBall(REFEREE_BITS), request.rows().get(n).get("value"), request + ", n = " + n);
        }
    }

    @Test
    void poleMassHasTheClosedFormsOfItsFirstFourLoops() {
        List<ExactConstant> c = Chain.of(KernelLibrary.load("pole-mass")).exact(4);
        assertThat(c.get(0)).isEqualTo(constant("4")); // Tarrach:1980up
        assertThat(c.get(1)).isEqualTo(constant("pi^2 + 71/8")); // Gray:1990yh, nl term (from memory)
        assertThat(c.get(2)).isEqualTo(constant("14*zeta(3) + 13*pi^2/3 + 2353/216")); // Melnikov:2000qh (from memory)
        // Ball:1995ni, closed form of the kernel expanded once more; also the referee's digits
        assertThat(c.get(3)).isEqualTo(constant("71*pi^4/40 + 317*zeta(3)/4 + 89*pi^2/6 + 42979/1728"));
    }

    @ParameterizedTest
    @CsvSource({
        // mpmath, coupling's scale alone: e^(u ln 4) on all of B; 6 decimals
        "1, 4, 24.289782, 130.148928, 851.325161",
        // mpmath, coupling and operator together: e^(u ln 4) on the unsubtracted part only; 6 decimals
        "2, 8.158883, 30.638236, 133.574297, 847.143587"
    })
    void poleMassAtTwiceTheMassKeepsTheTwoOperationsApart(
            String operator, String c0, String c1, String c2, String c3) {
        Chain chain = Chain.of(KernelLibrary.load("pole-mass"), Scales.of(constant("2"), constant(operator)));
        List<ExactConstant> exact = chain.exact(4);
        List<String> printed = List.of(c0, c1, c2, c3);
        for (int n = 0; n < 4; n++) {
            assertPrinted(exact.get(n), printed.get(n), "c_" + n);
        }
    }

    @ParameterizedTest
    @CsvSource({"1, 1", "2, 1", "1, sqrt(2)", "exp(-1/3), 5/7", "sqrt(8), sqrt(8)"})
    void bothFormsOfThePoleMassKernelAreIdentical(String mu, String operator) {
        Scales scales = Scales.of(constant(mu), constant(operator));
        assertThat(Chain.of(KernelLibrary.load("pole-mass-diagram"), scales).exact(10))
                .isEqualTo(Chain.of(KernelLibrary.load("pole-mass"), scales).exact(10));
    }

    @Test
    void theAnomalousDimensionOfThePoleMassIsGammaM() {
        List<ExactConstant> gamma = Chain.of(KernelLibrary.load("gamma-m")).exact(12);
        assertThat(Chain.ofAnomalousDimension(KernelLibrary.load("pole-mass")).exact(12)).isEqualTo(gamma);
        assertThat(Chain.ofAnomalousDimension(KernelLibrary.load("pole-mass-diagram")).exact(12)).isEqualTo(gamma);
        assertThat(Chain.ofAnomalousDimension(KernelLibrary.load("gamma-m")).exact(12)).isEqualTo(gamma);
    }
}
