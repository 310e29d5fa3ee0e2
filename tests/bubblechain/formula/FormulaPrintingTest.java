package bubblechain.formula;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class FormulaPrintingTest {
    private static final Span NOWHERE = new Span("", 0, 0);

    /** The tree with every place left out, so that two trees can be compared. */
    private static String structure(Formula formula) {
        if (formula instanceof Formula.Literal l) {
            return l.value().toString();
        } else if (formula instanceof Formula.Name n) {
            return n.name();
        } else if (formula instanceof Formula.Negation n) {
            return "neg[" + structure(n.operand()) + "]";
        } else if (formula instanceof Formula.Call c) {
            return c.function() + c.arguments().stream().map(FormulaPrintingTest::structure).toList().toString();
        } else if (formula instanceof Formula.FiniteSum s) {
            return "sum[" + s.index() + "; " + structure(s.from()) + "; " + structure(s.to()) + "; " + structure(s.body())
                    + "]";
        }
        Formula.Binary b = (Formula.Binary) formula;
        return "[" + structure(b.left()) + " " + b.operator().text() + " " + structure(b.right()) + "]";
    }

    @Test
    void printedTreesParseToTheSameTreeOnSeed21() {
        RandomFormulas random = new RandomFormulas(21);
        for (int k = 0; k < 2_000; k++) {
            Formula tree = random.next(1 + k % 6);
            String text = tree.print();
            Formula again = Formula.parse(text);
            assertThat(structure(again)).as(text).isEqualTo(structure(tree));
            assertThat(again.print()).isEqualTo(text);
        }
    }

    @ParameterizedTest
    @CsvSource({
        "-u^2, neg[[u ^ 2]]",
        "2^-u, [2 ^ neg[u]]",
        "2^-u^2, [2 ^ neg[[u ^ 2]]]",
        "2^3^2, [2 ^ [3 ^ 2]]",
        "a/b/c, [[a / b] / c]",
        "a-b-c, [[a - b] - c]",
        "a-b+c, [[a - b] + c]",
        "a/b*c, [[a / b] * c]",
        "-a*b, [neg[a] * b]",
        "a*-b, [a * neg[b]]",
        "--u, neg[neg[u]]",
        "+u, u",
        "a+b*c^d, [a + [b * [c ^ d]]]",
        "(a+b)*c, [[a + b] * c]",
        "2e3*.5, [2000 * 1/2]",
        "1e-2, 1/100",
        "' 1\t+\r\n u ', [1 + u]"
    })
    void operatorsBindAsInOrdinaryNotation(String text, String expected) {
        assertThat(structure(Formula.parse(text))).isEqualTo(expected);
    }

    @ParameterizedTest
    @CsvSource({"0.1, 1/10", "0.30, 3/10", "1.0000000000000000000001, 10000000000000000000001/10000000000000000000000"})
    void decimalsAreExact(String text, String value) {
        assertThat(ConstantValue.of(Formula.parse(text)).asRational()).contains(Rational.parse(value));
    }

    @Test
    void tenthsAddUpExactly() {
        assertThat(ConstantValue.of(Formula.parse("0.1 + 0.2 - 0.3")).isZero()).isTrue();
    }

    @ParameterizedTest
    @CsvSource({
        "-1/3, 2, (-1/3)^2", "1/3, 2, (1/3)^2", "-7, 2, (-7)^2", "5/2, 2, 2.5^2", "-5/2, 1/3, (-2.5)^(1/3)", "3, -1, 3^-1"
    })
    void numbersThatCannotBeWrittenAsLiteralsKeepTheirValue(String base, String exponent, String text) {
        Formula power = new Formula.Binary(
                Formula.Operator.POWER,
                new Formula.Literal(Rational.parse(base), NOWHERE),
                new Formula.Literal(Rational.parse(exponent), NOWHERE),
                NOWHERE);
        assertThat(power.print()).isEqualTo(text);
        assertThat(Formula.parse(text).print()).isEqualTo(text);
    }

    @Test
    void everyOperandPositionKeepsTheValueOfANegativeFraction() {
        Formula value = new Formula.Literal(Rational.of(-2, 3), NOWHERE);
        Formula seven = new Formula.Literal(Rational.of(7), NOWHERE);
        for (Formula.Operator operator : List.of(
                Formula.Operator.ADD, Formula.Operator.SUBTRACT, Formula.Operator.MULTIPLY, Formula.Operator.DIVIDE)) {
            for (Formula tree : List.of(
                    new Formula.Binary(operator, value, seven, NOWHERE), new Formula.Binary(operator, seven, value, NOWHERE))) {
                ExactConstant expected = ConstantValue.of(tree);
                assertThat(ConstantValue.of(Formula.parse(tree.print()))).as(tree.print()).isEqualTo(expected);
            }
        }
    }

    @Test
    void veryLargeAndVerySmallNumbersReadBack() {
        for (String text : List.of("1e2500", "1e-2500", "123456789e-9000", "1.5e100")) {
            Formula number = Formula.parse(text);
            assertThat(structure(Formula.parse(number.print()))).isEqualTo(structure(number));
        }
    }

    @Test
    void namesLeaveOutTheIndexInsideItsSumOnly() {
        assertThat(Formula.parse("k + sum(k, 1, n, k*u^j) + gamma(v)").names()).containsExactly("j", "k", "n", "u", "v");
        assertThat(Formula.parse("sum(k, 1, 5, k*pi)").names()).containsExactly("pi");
        assertThat(Formula.parse("sum(k, 1, k, 1)").names()).containsExactly("k");
    }

    @Test
    void substitutionDoesNotCaptureTheIndexOfASum() {
        // x stands for the outer k: sum_{j=1}^{2} (k j) = 3 k
        Formula sum = Formula.parse("sum(k, 1, 2, x*k)").substitute(Map.of("x", Formula.parse("k")));
        assertThat(sum.print()).isEqualTo("sum(k_, 1, 2, k*k_)");
        ExactConstant value = ConstantValue.of(sum, Map.of("k", ExactConstant.of(10)));
        assertThat(value).isEqualTo(ExactConstant.of(30));
    }

    @Test
    void theIndexOfASumHidesAnOuterName() {
        Formula sum = Formula.parse("k + sum(k, 1, k, k)").substitute(Map.of("k", Formula.parse("3")));
        assertThat(sum.print()).isEqualTo("3 + sum(k, 1, 3, k)");
        assertThat(ConstantValue.of(sum)).isEqualTo(ExactConstant.of(9));
        assertThat(ConstantValue.of(Formula.parse("sum(k, 1, 3, sum(k, 1, 2, k) + k)"))).isEqualTo(ExactConstant.of(15));
        assertThat(ConstantValue.of(Formula.parse("sum(k, 3, 1, 1/0)")).isZero()).isTrue();
    }
}
