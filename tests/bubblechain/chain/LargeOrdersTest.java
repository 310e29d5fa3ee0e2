package bubblechain.chain;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.fixedorder.ReferenceTable;
import bubblechain.formula.ConstantValue;
import bubblechain.formula.Formula;
import bubblechain.kernel.Kernel;
import bubblechain.kernel.KernelLibrary;
import bubblechain.kernel.KernelText;
import java.math.BigDecimal;
import java.math.BigInteger;
import java.math.RoundingMode;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Digits printed at orders and precisions that only the fixed-point route reaches in ordinary time. */
class LargeOrdersTest {
    private static final int LOOPS = 137;
    private static final int DIGITS = 211;
    private static final double BITS_PER_DIGIT = Math.log(10) / Math.log(2);

    /** Gammas at quarter shifts, a polygamma, a sine, an irrational pole, two rational ones. */
    private static final String OF_ONES_OWN =
            "exp(5*u/3)*(gamma(1/4+u)*gamma(1-u/2)/gamma(3/4+u)*(1+u)/(3-u^2)+polygamma(1,1-u)*sin(1+u/3)/((1-2*u)*(2+u)))";

    @TempDir
    private static Path folder;

    private static Kernel kernel(String name) {
        return name.equals("of-ones-own") ? KernelText.of(OF_ONES_OWN).kernel(folder) : KernelLibrary.load(name);
    }

    private static ExactConstant constant(String text) {
        return ConstantValue.of(Formula.parse(text));
    }

    private static Chain chain(String kernel, String mu, String operatorMu) {
        return Chain.of(kernel(kernel), Scales.of(constant(mu), constant(operatorMu)));
    }

    /** Within half a unit of the last of so many digits. */
    private static void assertRounds(String what, String text, Ball ball, int digits) {
        BigDecimal printed = new BigDecimal(text);
        Rational halfUnit = Rational.parse("5e" + (printed.precision() - printed.scale() - 1 - digits));
        Rational difference = Rational.parse(text).subtract(ball.midpoint()).abs();
        assertThat(difference.add(ball.radius().toRational())).as(what).isLessThanOrEqualTo(halfUnit);
        assertThat(printed.unscaledValue().abs().toString().length()).as("%s: digits printed", what).isEqualTo(digits);
    }

    @ParameterizedTest
    @CsvSource({
        "pole-mass, 3/2, 1", "pole-mass, 1, 3/2", "adler, 3/2, 1", "bjorken-gls, 3/2, 1", "cusp, 1, 1",
        "static-potential-r, 3/2, 1", "lepton-g2, 3/2, 1", "of-ones-own, 3/2, 1"
    })
    void everyDigitPrintedIsReadAgainAtThreeTimesThePrecision(String name, String mu, String operatorMu) {
        Chain chain = chain(name, mu, operatorMu);
        List<CertifiedNumber> numbers = chain.certified(LOOPS, DIGITS);
        List<Ball> balls = chain.balls(LOOPS, (int) (3 * DIGITS * BITS_PER_DIGIT));
        for (int n = 0; n < LOOPS; n++) {
            assertThat(numbers.get(n).isDecimal()).isTrue();
            String text = numbers.get(n).text();
            if (!balls.get(n).isExact() || text.contains("e")) {
                assertRounds(name + " c_" + n + " = " + text, text, balls.get(n), DIGITS);
            }
            assertThat(balls.get(n).toDecimal(DIGITS)).as("%s c_%d", name, n).contains(text);
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {"pole-mass", "adler", "static-potential-r", "lepton-g2"})
    void anOrderAskedForAloneHasTheSameDigits(String name) {
        Chain chain = chain(name, "3/2", "1");
        List<CertifiedNumber> longest = chain.certified(LOOPS, DIGITS);
        for (int loops : new int[] {1, 20, 21, 41, 136}) {
            assertThat(chain.certified(loops, DIGITS)).isEqualTo(longest.subList(0, loops));
        }
        // the anomalous part is cut in the longer list only
        assertThat(chain.certified(230, 50).subList(0, 90)).isEqualTo(chain.certified(90, 50));
    }

    /** reference-values/generated/large-orders.csv: each row carries its source. */
    @Test
    void valuesOfTheRefereeAreReproducedToTheLastDigit() {
        Map<List<String>, List<CSVRecord>> groups = new TreeMap<>(java.util.Comparator.comparing(List::toString));
        List<CSVRecord> rows = ReferenceTable.read("/reference-values/generated/large-orders.csv");
        for (CSVRecord row : rows) {
            groups.computeIfAbsent(
                            List.of(row.get("kernel"), row.get("mu_over_scale"), row.get("operator_mu_over_scale")),
                            key -> new java.util.ArrayList<>())
                    .add(row);
        }
        assertThat(rows).hasSizeGreaterThan(40);
        groups.forEach((key, members) -> {
            int loops = 1 + members.stream().mapToInt(row -> Integer.parseInt(row.get("n"))).max().orElseThrow();
            List<CertifiedNumber> numbers =
                    chain(key.get(0), key.get(1), key.get(2)).certified(loops, DIGITS);
            for (CSVRecord row : members) {
                String got = numbers.get(Integer.parseInt(row.get("n"))).text();
                assertThat(new BigDecimal(got)).as("%s", row).isEqualByComparingTo(new BigDecimal(row.get("value")));
                assertThat(new BigDecimal(row.get("value")).precision()).isEqualTo(DIGITS);
            }
        });
    }

    private static final BigInteger MODULUS = BigInteger.valueOf(1_000_000_007);

    /** sum_n sign(c_n) (n+1) (D_n mod q) mod q, D_n the first digits of c_n, rounded, as an integer. */
    private static long checksum(Chain chain, int loops, int digits) {
        List<CertifiedNumber> numbers = chain.certified(loops, digits);
        BigInteger sum = BigInteger.ZERO;
        for (int n = 0; n < loops; n++) {
            BigDecimal value = new BigDecimal(numbers.get(n).text());
            int places = digits - (value.precision() - value.scale());
            BigInteger leading = value.setScale(places, RoundingMode.UNNECESSARY).unscaledValue();
            sum = sum.add(leading.multiply(BigInteger.valueOf(n + 1L)));
        }
        return sum.mod(MODULUS).longValueExact();
    }

    /** The Adler function divided by c_0 = 3. */
    private static Chain adlerFromOne() {
        return Chain.of(KernelText.of("8*exp(5*u/3)/(12*(1-u)*(2-u))*(polygamma(1,(1+u)/2)-polygamma(1,(2+u)/2)"
                        + "-polygamma(1,(3-u)/2)+polygamma(1,(4-u)/2))")
                .kernel(folder));
    }

    /** FLINT/Arb 2.9 (tests/referee/flint_pole_mass.c), PARI/GP 2.15 and mpmath agree on these. */
    @ParameterizedTest
    @CsvSource({"20, 50, 70035272", "100, 100, 634600252", "300, 300, 945892110"})
    void checksumsOfThePoleMassAreThoseOfTheReferees(int loops, int digits, long expected) {
        assertThat(checksum(chain("pole-mass", "1", "1"), loops, digits)).isEqualTo(expected);
    }

    /** FLINT/Arb 2.9 (tests/referee/flint_adler.c), PARI/GP 2.15 and mpmath agree on these. */
    @ParameterizedTest
    @CsvSource({"20, 50, 770293811", "100, 100, 408706783", "300, 300, 533319797"})
    void checksumsOfTheAdlerFunctionAreThoseOfTheReferees(int loops, int digits, long expected) {
        assertThat(checksum(adlerFromOne(), loops, digits)).isEqualTo(expected);
    }

    /** FLINT/Arb 2.9; at 1000 also PARI/GP 2.15 and mpmath. */
    @Tag("thorough")
    @ParameterizedTest
    @CsvSource({"1000, 903515554, 139930271", "2000, 902905653, 404561831"})
    void checksumsAtThousandsOfOrdersAndDigitsAreThoseOfTheReferees(int size, long poleMass, long adler) {
        assertThat(checksum(chain("pole-mass", "1", "1"), size, size)).isEqualTo(poleMass);
        assertThat(checksum(adlerFromOne(), size, size)).isEqualTo(adler);
    }
}
