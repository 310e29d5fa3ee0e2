package bubblechain.formula;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import java.util.Map;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Derivatives and simplification of trees, against difference quotients and the values themselves. */
class TreeOperationsTest {
    private static final int BITS = 600;

    private static Ball value(Formula formula, Rational u) {
        return ConstantValue.of(formula, Map.of("u", ExactConstant.of(u))).toBall(BITS);
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "u^2*gamma(1+u)", "gamma(1-2*u)/gamma(3-u)", "digamma(1+u/3)^3", "polygamma(2,3/2-u)*u", "exp(5*u/3)/(1+u)^4",
        "sin(1+u)*cos(2*u)", "ln(2+u)", "sqrt(3+u^2)", "2^u", "(1+u)^(1/2)", "sum(k,1,4,u^k/(k+u))", "-(3-u)/(u-5)", "pi*zeta(3)",
        "unit_3f2(0,1-u)*unit_3f2(1,2+u)", "u^u*3"
    })
    void derivativesAreLimitsOfDifferenceQuotients(String text) {
        Formula formula = Formula.parse(text);
        Formula derivative = formula.derivative("u");
        for (Rational u : new Rational[] {Rational.of(1, 3), Rational.of(2, 7)}) {
            // central difference: off by h^2 f'''/6
            Rational h = Rational.TWO.power(-150);
            Ball quotient = value(formula, u.add(h)).subtract(value(formula, u.subtract(h)), BITS)
                    .divide(h.multiply(2), BITS);
            Ball difference = quotient.subtract(value(derivative, u), BITS);
            assertThat(difference.upperBound().toDouble()).as("d/du %s at %s", text, u).isLessThan(1e-60);
        }
    }

    @Test
    void whatHoldsTheVariableInAnIntegerFunctionIsRefused() {
        assertThatThrownBy(() -> Formula.parse("1+zeta(u)").derivative("u"))
                .isInstanceOf(FormulaException.class)
                .hasMessageContaining("zeta needs a constant argument");
    }

    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "3 - 2*0 - u | 3 - u", "(1 - -a)*(2 + -a) | (1 + a)*(2 - a)", "-4*u*(u*2 - 0)^1 | -(4*u*(u*2))", "0*u^2 + 5 | 5",
        "gamma(1 - 0)*x/1 | x", "(-a)^2 - (-a)^3 | a^2 + a^3", "0*gamma(0) | 0*gamma(0)", "0/u | 0/u", "1*a - (-b) | a + b",
        "a*(-b)/(-c) | a*b/c", "sum(k,1,3,0*k+u) | sum(k,1,3,u)"
    })
    void zerosOnesAndDoubleSignsAreTakenOut(String text, String simple) {
        assertThat(Formula.parse(text).simplified().print()).isEqualTo(Formula.parse(simple).print());
    }

    @Test
    void simplifiedTreesHaveTheSameValuesWithSeed5() {
        Random random = new Random(5);
        String[] leaves = {"0", "1", "2", "u", "-u", "(u-3)", "gamma(1+u)", "-1", "(1-0*u)"};
        String[] operators = {"+", "-", "*", "/"};
        for (int i = 0; i < 300; i++) {
            StringBuilder text = new StringBuilder(leaves[random.nextInt(leaves.length)]);
            for (int k = 1 + random.nextInt(6); k > 0; k--) {
                String leaf = leaves[random.nextInt(leaves.length)];
                String operator = leaf.equals("0") ? operators[random.nextInt(3)] : operators[random.nextInt(4)];
                text.insert(0, random.nextBoolean() ? "(" : "-(").append(")").append(operator)
                        .append(leaf.startsWith("-") ? "(" + leaf + ")" : leaf);
            }
            Formula formula = Formula.parse(text.toString());
            Map<String, ExactConstant> at = Map.of("u", ExactConstant.of(Rational.of(2, 5)));
            assertThat(ConstantValue.of(formula.simplified(), at)).as("%s", text).isEqualTo(ConstantValue.of(formula, at));
        }
    }
}
