package bubblechain.formula;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.time.Duration;
import java.util.stream.Stream;
import org.assertj.core.api.Assertions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

class FormulaErrorTest {
    private static final String KNOWN =
            "known are gamma, digamma, polygamma, zeta, polylog, unit_3f2, ln, sqrt, exp, sin, cos, sum (for a product write ";

    /** Formula; reason; line; column; the last two lines of the message. */
    static Stream<Arguments> badFormulas() {
        return Stream.of(
                bad("2u", "two factors without an operator; write 2*u", 1, 1, "2u", "^^"),
                bad("1 + 2 u", "two factors without an operator; write 2*u", 1, 5, "1 + 2 u", "    ^^^"),
                bad("u v", "two factors without an operator; write u*v", 1, 1, "u v", "^^^"),
                bad("(1+u)(1-u)", "two factors without an operator; write (1+u)*(", 1, 1, "(1+u)(1-u)", "^^^^^^"),
                bad("2exp(u)", "two factors without an operator; write 2*exp", 1, 1, "2exp(u)", "^^^^"),
                bad("1.2.3", "two factors without an operator; write 1.2*.3", 1, 1, "1.2.3", "^^^^^"),
                bad("u(1-u)", "no function 'u'; " + KNOWN + "u*(...))", 1, 1, "u(1-u)", "^"),
                bad("1+tan(u)", "no function 'tan'; " + KNOWN + "tan*(...))", 1, 3, "1+tan(u)", "  ^^^"),
                bad("Gamma(u)", "no function 'Gamma'; " + KNOWN + "Gamma*(...))", 1, 1, "Gamma(u)", "^^^^^"),
                bad("2*(1-u", "the formula ends where the parenthesis that closes column 3 was expected", 1, 7,
                        "2*(1-u", "      ^"),
                bad("gamma(1-u", "the formula ends where the parenthesis that closes column 1 was expected", 1, 10,
                        "gamma(1-u", "         ^"),
                bad("(1-u))", "found ')' where an operator or the end of the formula was expected", 1, 6, "(1-u))",
                        "     ^"),
                bad("gamma(1,u)", "gamma takes 1 argument, got 2", 1, 1, "gamma(1,u)", "^^^^^^^^^^"),
                bad("polygamma(u)", "polygamma takes 2 arguments, got 1", 1, 1, "polygamma(u)", "^^^^^^^^^^^^"),
                bad("gamma()", "found ')' where a number, a name or a parenthesis was expected", 1, 7, "gamma()",
                        "      ^"),
                bad("gamma", "the function gamma needs its arguments in parentheses", 1, 1, "gamma", "^^^^^"),
                bad("1+sum", "the function sum needs its arguments in parentheses", 1, 3, "1+sum", "  ^^^"),
                bad("", "the formula ends where a number, a name or a parenthesis was expected", 1, 1, "", "^"),
                bad("  ", "the formula ends where a number, a name or a parenthesis was expected", 1, 3, "  ", "  ^"),
                bad("1+", "the formula ends where a number, a name or a parenthesis was expected", 1, 3, "1+", "  ^"),
                bad("1**2", "found '*' where a number, a name or a parenthesis was expected", 1, 3, "1**2", "  ^"),
                bad("1\u22122", "the character U+2212 (MINUS SIGN) has no meaning in a formula", 1, 2, "1\u22122", " ^"),
                bad("\u0441os(u)", "the character U+0441 (CYRILLIC SMALL LETTER ES) has no meaning in a formula", 1, 1,
                        "\u0441os(u)", "^"),
                bad("1\u00a0+ u", "the character U+00A0 (NO-BREAK SPACE) has no meaning in a formula", 1, 2,
                        "1\u00a0+ u", " ^"),
                bad("u\u00b2", "the character U+00B2 (SUPERSCRIPT TWO) has no meaning in a formula", 1, 2, "u\u00b2", " ^"),
                bad("u\u0378", "the character U+0378 (unassigned) has no meaning in a formula", 1, 2, "u\u0378", " ^"),
                bad("u\u007f", "the character U+007F (DELETE) has no meaning in a formula", 1, 2, "u ", " ^"),
                bad("u = 1", "the character '=' has no meaning in a formula", 1, 3, "u = 1", "  ^"),
                bad("[1]", "the character '[' has no meaning in a formula", 1, 1, "[1]", "^"),
                bad("1e10000", "the exponent of this number is out of range", 1, 1, "1e10000", "^^^^^^^"),
                bad("sum(1, 1, 2, u)",
                        "found '1' where the name of the summation index, as in sum(k, 1, 5, 1/k) was expected", 1, 5,
                        "sum(1, 1, 2, u)", "    ^"),
                bad("sum(pi, 1, 2, u)", "'pi' cannot be a summation index", 1, 5, "sum(pi, 1, 2, u)", "    ^^"),
                bad("sum(sum, 1, 2, u)", "'sum' cannot be a summation index", 1, 5, "sum(sum, 1, 2, u)", "    ^^^"),
                bad("sum(k, 1, 2)", "found ')' where a comma was expected", 1, 12, "sum(k, 1, 2)", "           ^"),
                bad("exp(5*u/3)\n * 6\n * (1-u", "the formula ends where the parenthesis that closes column 4 was expected",
                        3, 8, " * (1-u", "       ^"),
                bad("1 +\n\t2u", "two factors without an operator; write 2*u", 2, 2, " 2u", " ^^"));
    }

    private static Arguments bad(String formula, String reason, int line, int column, String shown, String carets) {
        return Arguments.of(formula, reason, line, column, "  " + shown + "\n  " + carets);
    }

    @ParameterizedTest
    @MethodSource("badFormulas")
    void badFormulasAreRefusedWithThePlaceUnderlined(String text, String reason, int line, int column, String picture) {
        FormulaException e = catchThrowableOfType(FormulaException.class, () -> Formula.parse(text));
        assertThat(e).isNotNull();
        assertThat(e.getMessage())
                .isEqualTo("formula line " + line + ", column " + column + ": " + reason + "\n" + picture);
        assertThat(e.reason()).isEqualTo(reason);
        assertThat(e.line()).isEqualTo(line);
        assertThat(e.column()).isEqualTo(column);
    }

    @Test
    void thePlaceOfTheFormulaCanBePutInFront() {
        FormulaException e = catchThrowableOfType(FormulaException.class, () -> Formula.parse("2u"));
        assertThat(e.in("my.toml, T: "))
                .hasMessage("my.toml, T: line 1, column 1: two factors without an operator; write 2*u\n  2u\n  ^^");
    }

    /** Constants that parse but have no value. */
    static Stream<Arguments> badConstants() {
        return Stream.of(
                bad("1 + nf", "the name 'nf' has no value here", 1, 5, "1 + nf", "    ^^"),
                bad("1/(1-1)", "division by zero", 1, 1, "1/(1-1)", "^^^^^^^"),
                bad("2*gamma(-3)", "gamma(-3) is infinite", 1, 3, "2*gamma(-3)", "  ^^^^^^^^^"),
                bad("zeta(1)", "zeta(1) is infinite", 1, 1, "zeta(1)", "^^^^^^^"),
                bad("zeta(1/2)", "the argument of zeta must be an integer of at most 10000", 1, 6, "zeta(1/2)", "     ^^^"),
                bad("zeta(1001)", "the argument of zeta lies between -1000 and 1000, got 1001", 1, 1, "zeta(1001)",
                        "^^^^^^^^^^"),
                bad("polygamma(-1, 2)", "the order of a polygamma lies between 0 and 1000", 1, 11, "polygamma(-1, 2)",
                        "          ^^"),
                bad("1+ln(3-pi)", "the logarithm needs a positive number, got -pi+3", 1, 3, "1+ln(3-pi)", "  ^^^^^^^^"),
                bad("sqrt(-2)", "a fractional power needs a positive base, got -2", 1, 1, "sqrt(-2)", "^^^^^^^^"),
                bad("2^10001", "the number 10001 is larger than the limit 10000", 1, 1, "2^10001", "^^^^^^^"),
                bad("sum(k, 1, 1001, k)", "a sum of more than 1000 terms", 1, 1, "sum(k, 1, 1001, k)",
                        "^^^^^^^^^^^^^^^^^^"),
                bad("sum(k, 1, pi, k)", "the end of a sum must be an integer of at most 10000", 1, 11, "sum(k, 1, pi, k)",
                        "          ^^"));
    }

    @ParameterizedTest
    @MethodSource("badConstants")
    void constantsWithoutAValueAreRefusedWithThePlace(String text, String reason, int line, int column, String picture) {
        FormulaException e = catchThrowableOfType(FormulaException.class, () -> ConstantValue.of(Formula.parse(text)));
        assertThat(e).isNotNull();
        assertThat(e.getMessage())
                .isEqualTo("formula line " + line + ", column " + column + ": " + reason + "\n" + picture);
    }

    @Test
    void aLongLineIsShownAroundThePlace() {
        String text = "1+".repeat(200) + "2u" + "+1".repeat(200);
        FormulaException e = catchThrowableOfType(FormulaException.class, () -> Formula.parse(text));
        String[] lines = String.valueOf(e.getMessage()).split("\n");
        assertThat(lines[0]).isEqualTo("formula line 1, column 401: two factors without an operator; write 2*u");
        assertThat(lines[1].length()).isLessThanOrEqualTo(102);
        assertThat(lines[1].substring(lines[2].indexOf('^'), lines[2].length())).isEqualTo("2u");
    }

    @Test
    void nestingIsLimitedToTwoHundredLevels() {
        String open = "(".repeat(200) + "u" + ")".repeat(200);
        assertThat(Formula.parse(open).print()).isEqualTo("u");
        assertThatThrownBy(() -> Formula.parse("(" + open + ")"))
                .isInstanceOf(FormulaException.class)
                .hasMessageContaining("line 1, column 202: nested deeper than 200 levels");
        assertThatThrownBy(() -> Formula.parse("-".repeat(100_000)))
                .isInstanceOf(FormulaException.class)
                .hasMessageContaining("nested deeper than 200 levels");
        assertThatThrownBy(() -> Formula.parse("2^".repeat(300) + "2"))
                .isInstanceOf(FormulaException.class)
                .hasMessageContaining("nested deeper than 200 levels");
    }

    @Test
    void lengthIsLimitedToAHundredThousandCharacters() {
        assertThatThrownBy(() -> Formula.parse("1".repeat(100_001)))
                .isInstanceOf(FormulaException.class)
                .hasMessageStartingWith(
                        "formula line 1, column 1: the formula has 100001 characters; the limit is 100000");
        assertThatThrownBy(() -> Formula.parse("1".repeat(2_001)))
                .isInstanceOf(FormulaException.class)
                .hasMessageStartingWith("formula line 1, column 1: a number of more than 2000 digits");
    }

    @Test
    void aLongChainIsRefusedBeforeItExhaustsTheStack() {
        assertThat(Formula.parse("u" + "+u".repeat(1_000)).names()).containsExactly("u");
        assertThatThrownBy(() -> Formula.parse("u" + "+u".repeat(49_000)))
                .isInstanceOf(FormulaException.class)
                .hasMessageStartingWith("formula line 1, column 1: too long a chain of operations (49001 levels; the limit is"
                        + " 1200); group the terms with parentheses or use sum(k, 1, n, ...)");
    }

    @Test
    void hostileConstantsAreRefusedFast() {
        for (String text : new String[] {
            "((2^10000)^10000)^10000", "1e9999^10000", "exp(2000000000*ln(3))", "(1+pi+euler_gamma+zeta(3))^300",
            "polygamma(1000,9000)", "polygamma(1000,0.0001-9000)", "gamma(10001)", "(1+pi)^10000",
            "sum(i,1,1000,sum(j,1,1000,sum(k,1,1000,1)))"
        }) {
            Formula formula = Formula.parse(text);
            Assertions.assertThatExceptionOfType(FormulaException.class)
                    .as(text)
                    .isThrownBy(() -> org.junit.jupiter.api.Assertions.assertTimeoutPreemptively(
                            Duration.ofSeconds(5), () -> ConstantValue.of(formula)));
        }
    }
}
