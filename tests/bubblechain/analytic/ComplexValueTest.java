package bubblechain.analytic;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import bubblechain.exact.DomainException;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.assertj.core.data.Offset;
import org.assertj.core.data.Percentage;
import org.junit.jupiter.api.Test;

/** Complex evaluation against reference-values/generated/arc-values.csv (mpmath). */
class ComplexValueTest {
    private static final double ACCURACY = 1e-11;
    private static final double LN2 = Math.log(2);
    private static final double LN10 = Math.log(10);

    @Test
    void everyReferenceValueIsMetToElevenDigits() {
        List<ArcValues.Row> rows = ArcValues.rows();
        Map<String, FormEvaluation> evaluations = new HashMap<>();
        double worst = 0;
        for (ArcValues.Row row : rows) {
            FormEvaluation evaluation =
                    evaluations.computeIfAbsent(row.formula(), f -> FormEvaluation.of(ArcValues.form(f)));
            worst = Math.max(worst, relativeDistance(evaluation.at(row.re(), row.im()), row));
        }
        assertThat(rows).hasSizeGreaterThan(700);
        assertThat(worst).isLessThan(ACCURACY);
    }

    @Test
    void theStatedErrorCoversTheDistanceToEveryReferenceValue() {
        Map<String, FormEvaluation> evaluations = new HashMap<>();
        for (ArcValues.Row row : ArcValues.rows()) {
            FormEvaluation evaluation =
                    evaluations.computeIfAbsent(row.formula(), f -> FormEvaluation.of(ArcValues.form(f)));
            ComplexValue value = evaluation.at(row.re(), row.im());
            // the comparison itself loses some 1e-13 with exponents of a few hundred
            assertThat(relativeDistance(value, row))
                    .as("%s at %s + %s i", row.formula(), row.re(), row.im())
                    .isLessThanOrEqualTo(value.relativeError() + 2e-13);
            assertThat(value.relativeError()).isLessThan(1e-9);
        }
    }

    /** |value - reference|/|reference|. */
    private static double relativeDistance(ComplexValue value, ArcValues.Row row) {
        double scale = Math.exp(value.exponent() * LN2 - row.decimalExponent() * LN10);
        double difference = Math.hypot(value.re() * scale - row.valueRe(), value.im() * scale - row.valueIm());
        return difference / Math.hypot(row.valueRe(), row.valueIm());
    }

    @Test
    void aFormulaOfOneLineGivesTheSameAsThePreparedOne() {
        NormalForm form = ArcValues.form("gamma(1/2-u)*exp(5*u/3)");
        ComplexValue value = ComplexValue.at(form, 0.25, 1.5);
        assertThat(value).isEqualTo(FormEvaluation.of(form).at(0.25, 1.5));
        assertThat(Math.hypot(value.realPart(), value.imaginaryPart()))
                .isCloseTo(Math.exp(value.lnModulus()), Percentage.withPercentage(1e-11));
        assertThat(value.absoluteError() / Math.exp(value.lnModulus()))
                .isCloseTo(value.relativeError(), Percentage.withPercentage(1e-6));
    }

    @Test
    void valuesConjugateWithThePoint() {
        NormalForm form = ArcValues.form("polygamma(2,1/3-2*u)*sin(1+u)/gamma(u/2)^3");
        ComplexValue above = ComplexValue.at(form, -3.3, 2.2);
        ComplexValue below = ComplexValue.at(form, -3.3, -2.2);
        assertThat(below.re()).isCloseTo(above.re(), Offset.offset(2 * above.error()));
        assertThat(below.im()).isCloseTo(-above.im(), Offset.offset(2 * above.error()));
    }

    @Test
    void hugeAndTinyValuesKeepTheirExponent() {
        NormalForm form = ArcValues.form("exp(3000*u)");
        assertThat(ComplexValue.at(form, 1, 0).lnModulus()).isEqualTo(3000, Offset.offset(1e-9));
        assertThat(ComplexValue.at(form, -1, 0).lnModulus())
                .isEqualTo(-3000, Offset.offset(1e-9));
        assertThat(ComplexValue.at(form, 1, 0).realPart()).isInfinite();
        assertThat(ComplexValue.at(form, -1, 0).realPart()).isZero();
    }

    @Test
    void termsThatCancelShowALargeRelativeErrorNotAWrongValue() {
        // the duplication formula DLMF 5.5.5, which the normal form does not recognise
        NormalForm form = ArcValues.form("gamma(2*u)*sqrt(pi)/2^(2*u-1)-gamma(u)*gamma(u+1/2)");
        assertThat(form.isZero()).isFalse();
        ComplexValue value = ComplexValue.at(form, 1.3, 0.4);
        assertThat(Math.hypot(value.re(), value.im())).isLessThanOrEqualTo(value.error());
    }

    @Test
    void aPointOnAPoleIsRefused() {
        assertThatThrownBy(() -> ComplexValue.at(ArcValues.form("gamma(1/2-u)"), 1.5, 0))
                .isInstanceOf(DomainException.class)
                .hasMessage("no value in double precision at u = 1.5 + 0.0 i: a term is singular at or next to this"
                        + " point, or out of range; choose another point");
        assertThatThrownBy(() -> ComplexValue.at(ArcValues.form("1/(u^2+2)/(u-3)"), 3, 0))
                .isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> ComplexValue.at(ArcValues.form("polygamma(1,u)"), -2, 0))
                .isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> ComplexValue.at(NormalForm.ONE, Double.NaN, 0)).isInstanceOf(DomainException.class);
        assertThatThrownBy(() -> ComplexValue.at(ArcValues.form("gamma(u)"), -1e6 - 0.5, 0))
                .isInstanceOf(DomainException.class)
                .hasMessageContaining("too far to the left");
    }

    @Test
    void aZeroOfAnInverseGammaIsNoTrouble() {
        ComplexValue value = ComplexValue.at(ArcValues.form("exp(u)/gamma(1+u)"), -4, 0);
        assertThat(Math.hypot(value.re(), value.im())).isLessThanOrEqualTo(value.error());
        assertThat(value.absoluteError()).isLessThan(1e-13);
    }
}
