package bubblechain.exact;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.Reader;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.function.BiFunction;
import java.util.stream.Stream;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Every function against the table reference-values/generated/special-functions.csv (PARI/GP, 80 digits). */
class SpecialFunctionReferenceTest {
    private static final int BITS = 320;
    /** The last of 80 digits is rounded: half a unit is at most 5e-80 of the value. */
    private static final Rational TABLE_ERROR = Rational.parse("6e-80");

    private static final Map<String, BiFunction<List<Rational>, Integer, Ball>> FUNCTIONS = Map.ofEntries(
            Map.entry("pi", (a, bits) -> BallFunctions.pi(bits)),
            Map.entry("eulerGamma", (a, bits) -> BallFunctions.eulerGamma(bits)),
            Map.entry("ln", SpecialFunctionReferenceTest::logarithm),
            Map.entry("exp", (a, bits) -> BallFunctions.exp(ball(a.get(0), bits), bits)),
            Map.entry("sqrt", (a, bits) -> BallFunctions.sqrt(ball(a.get(0), bits), bits)),
            Map.entry("power", (a, bits) -> BallFunctions.power(ball(a.get(0), bits), a.get(1), bits)),
            Map.entry("sin", (a, bits) -> BallFunctions.sin(ball(a.get(0), bits), bits)),
            Map.entry("cos", (a, bits) -> BallFunctions.cos(ball(a.get(0), bits), bits)),
            Map.entry("sinPi", (a, bits) -> BallFunctions.sinPi(a.get(0), bits)),
            Map.entry("cosPi", (a, bits) -> BallFunctions.cosPi(a.get(0), bits)),
            Map.entry("zeta", (a, bits) -> BallFunctions.zeta(a.get(0).intValueExact(), bits)),
            Map.entry("hurwitz", (a, bits) ->
                    BallFunctions.hurwitzZeta(a.get(0).intValueExact(), ball(a.get(1), bits), bits)),
            Map.entry("gamma", (a, bits) -> BallFunctions.gamma(ball(a.get(0), bits), bits)),
            Map.entry("lnGamma", (a, bits) -> BallFunctions.lnGamma(ball(a.get(0), bits), bits)),
            Map.entry("digamma", (a, bits) -> BallFunctions.digamma(ball(a.get(0), bits), bits)),
            Map.entry("polygamma", (a, bits) ->
                    BallFunctions.polygamma(a.get(0).intValueExact(), ball(a.get(1), bits), bits)),
            Map.entry("polylog", (a, bits) -> BallFunctions.polylog(a.get(0).intValueExact(), a.get(1), bits)),
            Map.entry("unit_3f2", SpecialFunctionReferenceTest::unitHypergeometric));

    private static Ball logarithm(List<Rational> arguments, int bits) {
        Rational x = arguments.get(0);
        return x.isInteger() ? BallFunctions.lnOf(x.numerator(), bits) : BallFunctions.ln(ball(x, bits), bits);
    }

    private static Ball unitHypergeometric(List<Rational> arguments, int bits) {
        int n = arguments.get(0).intValueExact();
        return UnitHypergeometric.taylor(ball(arguments.get(1), bits), n + 1, bits)[n].multiply(
                Rational.of(ExactFunctions.factorial(n)), bits);
    }

    /** The argument with bits to spare, so that what is seen is the loss in the function. */
    private static Ball ball(Rational x, int bits) {
        return Ball.of(x, bits + 64);
    }

    static List<CSVRecord> rows() throws IOException {
        CSVFormat format = CSVFormat.DEFAULT.builder()
                .setCommentMarker('#')
                .setHeader()
                .setSkipHeaderRecord(true)
                .get();
        try (InputStream stream = Objects.requireNonNull(SpecialFunctionReferenceTest.class.getResourceAsStream(
                        "/reference-values/generated/special-functions.csv"));
                Reader reader = new InputStreamReader(stream, StandardCharsets.UTF_8);
                CSVParser parser = format.parse(reader)) {
            return parser.getRecords();
        }
    }

    private static List<Rational> arguments(CSVRecord row) {
        return Stream.of(row.get("arguments").split(";"))
                .filter(text -> !text.isEmpty())
                .map(Rational::parse)
                .toList();
    }

    private static Ball evaluate(CSVRecord row, int bits) {
        return Objects.requireNonNull(FUNCTIONS.get(row.get("function"))).apply(arguments(row), bits);
    }

    @ParameterizedTest
    @MethodSource("rows")
    void valueAgreesWithTheTableToAllItsDigits(CSVRecord row) {
        Rational value = Rational.parse(row.get("value"));
        Ball table = Ball.of(value, value.abs().multiply(TABLE_ERROR), 400);
        Ball result = evaluate(row, BITS);
        assertThat(table.contains(result)).as("%s %s = %s", row.get(0), row.get(1), result.toDecimal(85)).isTrue();
    }

    @ParameterizedTest
    @MethodSource("rows")
    void twoPrecisionsAgree(CSVRecord row) {
        for (int bits : new int[] {24, 75, 200}) {
            Ball coarse = evaluate(row, bits);
            Ball fine = evaluate(row, 3 * bits);
            assertThat(fine.overlaps(coarse)).as("at %d and %d bits", bits, 3 * bits).isTrue();
            Ball inflated = coarse.addError(coarse.radius()).addError(fine.radius().scale(1));
            assertThat(inflated.contains(fine)).as("inside the inflated ball at %d bits", bits).isTrue();
        }
    }

    @Test
    void radiusOfResultsIsWithinAFewBitsOfTheWorkingPrecision() throws IOException {
        for (int bits : new int[] {60, 320, 1000}) {
            List<Integer> losses = new ArrayList<>();
            for (CSVRecord row : rows()) {
                losses.add(bits - Math.min(bits, evaluate(row, bits).accuracyBits()));
            }
            int[] sorted = losses.stream().mapToInt(Integer::intValue).sorted().toArray();
            assertThat(sorted[sorted.length / 2]).as("median loss of %s", Arrays.toString(sorted)).isLessThan(4);
            assertThat(sorted[sorted.length - 1]).as("largest loss of %s", Arrays.toString(sorted)).isLessThan(20);
        }
    }

    @Test
    void everyFunctionOfTheTableIsCovered() throws IOException {
        assertThat(rows()).hasSizeGreaterThan(120);
        assertThat(rows().stream().map(row -> row.get("function")).distinct())
                .containsExactlyInAnyOrderElementsOf(FUNCTIONS.keySet());
    }
}
