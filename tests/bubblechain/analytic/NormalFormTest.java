package bubblechain.analytic;

import static bubblechain.analytic.Forms.form;
import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import bubblechain.formula.Formula;
import bubblechain.formula.FormulaException;
import java.time.Duration;
import org.junit.jupiter.api.Assertions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class NormalFormTest {
    /** Each vanishes identically by the recurrence or reflection of gamma, or as a rational function. */
    @ParameterizedTest
    @ValueSource(strings = {
        "gamma(u+3)/gamma(u) - u*(u+1)*(u+2)",
        "gamma(u-2)/gamma(u) - 1/((u-1)*(u-2))",
        "gamma(2*u+1/3)*3 - (6*u-2)*gamma(2*u-2/3)",
        "sin(pi*u)*gamma(u)*gamma(1-u) - pi",
        "cos(pi*u)*gamma(1/2+u)*gamma(1/2-u) - pi",
        "sin(pi*u+pi) + sin(pi*u)",
        "cos(pi*u) - sin(pi*u+pi/2)",
        "cos(-pi*u) - cos(pi*u)",
        "1/sin(pi*u) - gamma(u)*gamma(1-u)/pi",
        "digamma(u+2) - digamma(u) - 1/u - 1/(u+1)",
        "polygamma(2,u-1) - polygamma(2,u) + 2/(u-1)^3",
        "exp(2*u)*exp(-2*u) - 1",
        "2^u*2^(1-u) - 2",
        "4^u - 2^(2*u)",
        "(9/4)^(u/2) - 3^u/2^u",
        "exp(u*ln(2)) - 2^u",
        "exp(1/3+u) - exp(1/3)*exp(u)",
        "pi^u*pi^(1/2-u) - sqrt(pi)",
        "(u^2-1)/(u-1) - u - 1",
        "sum(k, 1, 3, 1/(u+k)) - (3*u^2+12*u+11)/((u+1)*(u+2)*(u+3))",
        "(gamma(u)+u)^2 - gamma(u)^2 - 2*gamma(u+1) - u^2",
        "1/(2*gamma(u)+3*gamma(u+1)) - 1/(gamma(u)*(2+3*u))",
        "1/((pi+1)*gamma(u)) - 1/(gamma(u)*(1+pi))",
        "zeta(2)*u - pi^2*u/6",
        "sum(u, 1, 3, u) - 6",
        // the pole of a sum of kernels cancels against its own expansion
        "u*digamma(u)*gamma(1-u) + gamma(1-u) - u*gamma(1-u)*digamma(1+u)"
    })
    void identitiesHoldIdentically(String difference) {
        assertThat(form(difference).isZero()).as("%s", form(difference)).isTrue();
    }

    @Test
    void scalarMinusGamma0CurrentIsUTimesThePoleMassKernel() {
        // N(0,u) of the heavy-light currents; Broadhurst, Grozin hep-ph/9410240: equation of motion, C_1/C_gamma0 = M/mbar
        String rest = "exp(5*u/3)*gamma(1+u)*gamma(1-2*u)/gamma(3-u)";
        NormalForm scalar = form("3*(u^2-u+1)*" + rest);
        NormalForm gamma0 = form("3*(u^2+u-1)*" + rest);
        assertThat(scalar.subtract(gamma0).subtract(form("u*" + Forms.POLE_MASS)).isZero()).isTrue();
        assertThat(scalar.subtract(gamma0)).isEqualTo(form("u*" + Forms.POLE_MASS));
    }

    @Test
    void factorsThatCancelLeaveTheKernelUnchanged() {
        assertThat(form(Forms.POLE_MASS + "*(u-1/3)/(u-1/3)")).isEqualTo(form(Forms.POLE_MASS));
        assertThat(form("(" + Forms.POLE_MASS + ")*gamma(u/3)/gamma(u/3)")).isEqualTo(form(Forms.POLE_MASS));
        assertThat(form("(" + Forms.POLE_MASS + ")^2/(" + Forms.POLE_MASS + ")")).isEqualTo(form(Forms.POLE_MASS));
    }

    @Test
    void formsAreARing() {
        NormalForm a = form("gamma(1-u)*exp(u)+digamma(u)/(u-1)");
        NormalForm b = form("sin(u)+pi*u-zeta(3)");
        NormalForm c = form("1/(u^2+1)+2^u");
        assertThat(a.multiply(b.add(c))).isEqualTo(a.multiply(b).add(a.multiply(c)));
        assertThat(a.multiply(b).multiply(c)).isEqualTo(a.multiply(b.multiply(c)));
        assertThat(a.add(b).subtract(b)).isEqualTo(a);
        assertThat(a.subtract(a)).isEqualTo(NormalForm.ZERO);
        assertThat(a.timesPower(-2).timesPower(2)).isEqualTo(a);
    }

    @ParameterizedTest
    @ValueSource(strings = {
        "gamma(1-u)/gamma(2+u/2)", "exp(5*u/3)", "exp(pi*u)", "2^(u/3)", "sin(pi*u)/cos(pi*u)", "sin(2*u)", "sin(1+pi*u)",
        "digamma(1-u)^2", "polygamma(3, u/2+1)", "1/(u^2+u+1)", "exp(-u*ln(3))/(1+u)", "gamma(1/4)*u", "gamma(pi)*u",
        "1/((u+1)*gamma(u)+u*gamma(u))", "gamma(u-u+1/3)*u", "(1/(1-u))^(-3)", "ln(2)^2*u", "1/(pi-3)*u"
    })
    void formulasOfTheClassAreAdmitted(String text) {
        assertThat(form(text).size()).isPositive();
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "1+gamma(u^2) | u^2 | the argument of gamma must be linear in u",
        "gamma(gamma(u)) | gamma(u) | the argument of gamma must be linear in u",
        "exp(1/u) | 1/u | the argument of exp must be linear in u",
        "gamma(pi*u) | pi*u | a gamma or hypergeometric function needs an argument s + b*u with rational s and b",
        "digamma(u+pi) | u+pi | a gamma or hypergeometric function needs an argument s + b*u with rational s and b",
        "2*ln(1+u) | ln(1+u) | ln of an expression with u has no exact list of singularities",
        "sqrt(1-u) | sqrt(1-u) | sqrt of an expression with u has no exact list of singularities",
        "u^(1/2) | u^(1/2) | a power needs an integer exponent, or a positive constant to a power linear in u",
        "u^u | u^u | a power needs an integer exponent, or a positive constant to a power linear in u",
        "2^(u^2) | 2^(u^2) | a power needs an integer exponent, or a positive constant to a power linear in u",
        "sin(sqrt(2)*u) | sqrt(2)*u | the slope of u in a sine or cosine must be rational or a multiple of pi"
    })
    void formulasOutsideTheClassAreRefusedWithThePartUnderlined(String text, String part, String reason) {
        InadmissibleFormulaException e = catchThrowableOfType(InadmissibleFormulaException.class, () -> form(text));
        assertThat(e).isNotNull();
        int column = text.indexOf(part) + 1;
        assertThat(e.getMessage())
                .isEqualTo("formula line 1, column " + column + ": " + reason + "\n  " + text + "\n  "
                        + " ".repeat(column - 1) + "^".repeat(part.length()));
    }

    @ParameterizedTest
    @CsvSource({"1/(1+gamma(u)), 1+gamma(u)", "1/digamma(u), digamma(u)", "1/sin(u), sin(u)", "2/(exp(u)-1), exp(u)-1",
        "(1-exp(u))^(-2), 1-exp(u)"})
    void denominatorsWithUnlistedZerosAreRefused(String text, String denominator) {
        InadmissibleFormulaException e = catchThrowableOfType(InadmissibleFormulaException.class, () -> form(text));
        assertThat(e.reason())
                .isEqualTo("a denominator must be a product of rational functions, exponentials, gammas and sin(pi*...);"
                        + " the zeros of this one cannot be listed exactly");
        String[] lines = String.valueOf(e.getMessage()).split("\n");
        String underlined = lines[1].substring(lines[2].indexOf('^'), lines[2].length());
        assertThat(underlined).contains(denominator.substring(0, 3));
    }

    @ParameterizedTest
    @CsvSource({
        "1/(u-u), division by zero", "(u-u)^(-1), division by zero", "(-2)^u, 'the logarithm needs a positive number, got -2'",
        "gamma(u)+x, the name 'x' has no value here", "u^20000, an exponent of more than 10000 in size",
        "polygamma(-1;u), the order of a polygamma lies between 0 and 1000"
    })
    void undefinedFormulasAreRefused(String text, String reason) {
        assertThatThrownBy(() -> form(text.replace(';', ',')))
                .isInstanceOf(FormulaException.class)
                .isNotInstanceOf(InadmissibleFormulaException.class)
                .hasMessageContaining(reason);
    }

    @Test
    void hostileFormulasAreRefusedFast() {
        for (String text : new String[] {
            "(1+u)^10000", "((1+u)^10000)^10000", "(gamma(u)+gamma(2*u)+gamma(3*u)+gamma(u/2)+digamma(u))^30",
            "polygamma(1000,u+2000)", "gamma(u+100000)", "gamma(u+600)^3", "sum(i,1,1000,sum(j,1,1000,u))"
        }) {
            Formula formula = Formula.parse(text);
            org.assertj.core.api.Assertions.assertThatExceptionOfType(FormulaException.class)
                    .as(text)
                    .isThrownBy(() -> Assertions.assertTimeoutPreemptively(
                            Duration.ofSeconds(10), () -> NormalForm.of(formula, "u")));
        }
    }
}
