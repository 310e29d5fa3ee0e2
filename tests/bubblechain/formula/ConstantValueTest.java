package bubblechain.formula;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.RandomConstants;
import bubblechain.exact.Rational;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.Reader;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;

class ConstantValueTest {
    @Test
    void printedConstantsReadBackAsTheSameConstantOnSeed31() {
        RandomConstants random = new RandomConstants(31);
        for (int k = 0; k < 1_000; k++) {
            ExactConstant c = random.any();
            assertThat(ConstantValue.of(Formula.parse(c.toString()))).as("%s", c).isEqualTo(c);
        }
    }

    @Test
    void printedInversesAndExponentialsReadBackOnSeed32() {
        RandomConstants random = new RandomConstants(32);
        for (int k = 0; k < 300; k++) {
            ExactConstant c = random.any();
            ExactConstant exponential = c.exp();
            assertThat(ConstantValue.of(Formula.parse(exponential.toString()))).isEqualTo(exponential);
            if (!c.isZero()) {
                assertThat(ConstantValue.of(Formula.parse(c.inverse().toString()))).isEqualTo(c.inverse());
            }
        }
    }

    static List<CSVRecord> referenceRows() throws IOException {
        InputStream stream = Objects.requireNonNull(
                ConstantValueTest.class.getResourceAsStream("/reference-values/generated/exact-functions.csv"));
        try (Reader reader = new InputStreamReader(stream, StandardCharsets.UTF_8);
                CSVParser parser = CSVFormat.DEFAULT.builder().setHeader().setSkipHeaderRecord(true)
                        .setCommentMarker('#').get().parse(reader)) {
            return parser.getRecords();
        }
    }

    @ParameterizedTest
    @MethodSource("referenceRows")
    void ballsOfConstantsContainTheValuesOfPariAndMpmath(CSVRecord row) {
        Rational value = Rational.parse(row.get("value"));
        Rational lastDigit = value.abs().multiply(Rational.parse("6e-60"));
        Ball reference = Ball.of(value, lastDigit, 400);
        ExactConstant constant = ConstantValue.of(Formula.parse(row.get("formula")));
        Ball ball = constant.toBall(260);
        assertThat(ball.overlaps(reference)).as("%s: %s, %s", row.get("formula"), ball, row.get("source")).isTrue();
        assertThat(ball.isExact() || ball.accuracyBits() > 220).as("accuracy of %s", row.get("formula")).isTrue();
    }

    @ParameterizedTest
    @CsvSource({
        "sqrt(pi), sqrt(pi)", "pi^(3/2), pi^(3/2)", "sqrt(2*pi)^3, 2*pi^(3/2)*sqrt(2)", "sqrt(0), 0", "0^0, 1",
        "sqrt(exp(euler_gamma)), exp(1/2*euler_gamma)", "2^(1/2)*2^(1/2), 2", "(9/4)^(-3/2), 8/27",
        "exp(ln(pi)), pi", "'sum(k, 1, 4, 1/k)', 25/12", "'gamma(3/2)*gamma(1/2)', pi/2", "cos(pi/3)^2, 1/4"
    })
    void constantsAreBroughtToCanonicalForm(String formula, String expected) {
        assertThat(ConstantValue.of(Formula.parse(formula))).hasToString(expected);
    }

    @Test
    void namesTakeTheValuesGiven() {
        ExactConstant value = ConstantValue.of(Formula.parse("11 - 2*nf/3"), Map.of("nf", ExactConstant.of(4)));
        assertThat(value).hasToString("25/3");
    }
}
