package bubblechain.analytic;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.DomainException;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.GradedSum;
import bubblechain.exact.Rational;
import bubblechain.series.LaurentSeries;
import java.io.IOException;
import java.util.List;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Exact expansions monomial by monomial against the same through series of exact constants. */
class GradedTermTest {
    private static final List<String> SHIFTS = List.of("0", "1", "-2", "1/2", "-3/2", "3", "1/3");
    private static final List<String> SLOPES = List.of("u", "-u", "2*u", "-u/2", "3*u/2", "-2*u/3");
    private static final List<String> EXPONENTIALS = List.of(
            "exp(5*u/3)", "4^u", "exp(-u/2)", "(2/3)^(2*u)", "exp(euler_gamma*u)", "exp(pi*u)", "exp(1/2-u)*3^u");
    private static final List<String> CONSTANTS =
            List.of("2", "pi", "sqrt(2)", "zeta(3)", "(euler_gamma-1)", "ln(3)", "gamma(1/4)", "1/7");

    private static String oneOf(List<String> texts, Random random) {
        return texts.get(random.nextInt(texts.size()));
    }

    private static String product(Random random) {
        StringBuilder text = new StringBuilder(oneOf(CONSTANTS, random)).append("*(1+3*u/2)/(2-u+u^2/3)");
        for (int k = random.nextInt(4); k > 0; k--) {
            String gamma = "gamma(" + oneOf(SHIFTS, random) + "+" + oneOf(SLOPES, random) + ")";
            text.append(random.nextBoolean() ? "*" : "/").append(gamma);
        }
        for (int k = random.nextInt(3); k > 0; k--) {
            text.append("*polygamma(" + random.nextInt(3) + "," + oneOf(SHIFTS, random) + "+" + oneOf(SLOPES, random) + ")");
        }
        return text.append("*").append(oneOf(EXPONENTIALS, random)).toString();
    }

    private static void assertRoutesAgree(Expansion expansion, int end, String what) {
        Optional<LaurentSeries<ExactConstant>> byMonomials = expansion.exactByMonomials(end);
        assertThat(byMonomials).as("%s", what).isPresent();
        assertThat(byMonomials.get()).as("%s", what).isEqualTo(expansion.exactBySeries(end));
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 3, 4, 5, 6, 7, 8})
    void sumsOfRandomProductsHaveTheSameExpansionOnBothRoutes(int seed) {
        Random random = new Random(seed);
        for (int i = 0; i < 12; i++) {
            String text = product(random) + (random.nextBoolean() ? "-" + product(random) : "");
            Rational point = Rational.parse(oneOf(List.of("0", "0", "1", "-1", "1/2", "-3/2"), random));
            Expansion expansion = Expansion.about(point, Forms.form(text));
            int end = expansion.lowestPower() + 5 + random.nextInt(4);
            assertRoutesAgree(expansion, end, text + " about " + point);
        }
    }

    @Test
    void everyFormulaOfTheRefereeHasTheSameExpansionOnBothRoutes() throws IOException {
        int applied = 0;
        for (RefereeRow row : RefereeRow.all()) {
            NormalForm form = NormalForm.of(row.formula(), "u");
            Expansion expansion = Expansion.about(row.point(), form);
            boolean sines = form.terms().keySet().stream().anyMatch(key -> !key.sines().isEmpty());
            boolean units = form.terms().keySet().stream().anyMatch(key -> !key.units().isEmpty());
            int end = row.valuation() + 4;
            boolean present = expansion.exactByMonomials(end).isPresent();
            // next to its pole the function of the widths may leave rational terms only
            assertThat(present || units).as("%s", row).isEqualTo(!sines || units);
            if (present) {
                assertRoutesAgree(expansion, end, row.toString());
                applied++;
            }
        }
        assertThat(applied).isGreaterThan(290);
    }

    @ParameterizedTest
    @ValueSource(strings = {
        Forms.POLE_MASS,
        Forms.ADLER,
        "polygamma(1,1-u)^3*polygamma(0,1/2+u)^2*gamma(1+u)",
        "u^2*gamma(-u)^3*polygamma(2,u)*exp(u)",
        "gamma(1/3+u)*gamma(2/3-u)*polygamma(1,1/3-u)",
        "gamma(u)-gamma(u)+u^3"
    })
    void longerExpansionsAgreeToo(String text) {
        assertRoutesAgree(Expansion.about(Rational.ZERO, Forms.form(text)), 12, text);
    }

    @ParameterizedTest
    @CsvSource({"sin(u)*gamma(1+u)", "exp(zeta(3)*u)*gamma(1+u)", "exp(pi^2*u)", "exp(euler_gamma*pi*u)"})
    void formsThatAreNotGradedGoThroughSeries(String text) {
        Expansion expansion = Expansion.about(Rational.ZERO, Forms.form(text));
        assertThat(expansion.exactByMonomials(10)).isEmpty();
        assertThat(expansion.exact(10)).isEqualTo(expansion.exactBySeries(10));
    }

    /** The check has teeth: a factor taken at a neighbouring weight, for one weight alone, is seen where that enters. */
    @Test
    void aFactorOfTheWrongWeightIsSeenFromTheOrderOfThatWeightOn() {
        Expansion expansion = Expansion.about(Rational.ZERO, Forms.form("exp(5*u/3)*gamma(1-u)*gamma(1+2*u)/(1-u)"));
        List<GradedTerm> terms = expansion.graded(12).orElseThrow();
        GradedSum sum = GradedSum.of(terms.stream().map(GradedTerm::summand).toList());
        LaurentSeries<ExactConstant> right = expansion.exactBySeries(12);
        for (int order = 0; order < 12; order++) {
            int n = order;
            ExactConstant wrong = sum.combine((h, w) -> terms.get(h).factor(w == 5 ? n - w + 1 : n - w));
            assertThat(wrong.equals(right.coefficients().get(n))).as("order %d", n).isEqualTo(n < 4);
        }
    }

    @Test
    void anExpansionTooLargeToWriteDownIsRefused() {
        Expansion expansion = Expansion.about(Rational.ZERO, Forms.form("gamma(1-u)^3*6^u"));
        assertThatThrownBy(() -> expansion.exact(300))
                .isInstanceOf(DomainException.class)
                .hasMessageMatching("the exact coefficient of order 299 has more than 1000000 terms, as every order from"
                        + " \\d+ on; ask for fewer orders");
    }
}
