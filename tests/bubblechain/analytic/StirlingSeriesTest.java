package bubblechain.analytic;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.junit.jupiter.api.Test;

/** Remainders with few terms, where they are visible, and discs against points. */
class StirlingSeriesTest {
    private static List<ArcValues.Row> rows(String formula) {
        List<ArcValues.Row> rows = ArcValues.rows().stream()
                .filter(r -> r.formula().equals(formula))
                .toList();
        assertThat(rows).hasSizeGreaterThan(10);
        return rows;
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 3, 4, 6})
    void logarithmsOfGammaWithFewTermsEncloseTheReferenceValues(int terms) {
        for (ArcValues.Row row : rows("gamma(u)")) {
            ComplexDisc value = StirlingSeries.lnGamma(ComplexDisc.of(row.re(), row.im()), terms);
            assertThat(Math.abs(value.re() - row.lnModulus())).isLessThanOrEqualTo(value.radius());
            double turns = (value.im() - Math.atan2(row.valueIm(), row.valueRe())) / (2 * Math.PI);
            assertThat(Math.abs(turns - Math.rint(turns)) * 2 * Math.PI).isLessThanOrEqualTo(value.radius());
        }
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 2, 3, 4, 6})
    void digammaAndPolygammasWithFewTermsEncloseTheReferenceValues(int terms) {
        for (ArcValues.Row row : rows("digamma(u)")) {
            assertEncloses(StirlingSeries.digamma(ComplexDisc.of(row.re(), row.im()), terms), row, 1);
        }
        for (ArcValues.Row row : rows("polygamma(1,u)")) {
            ScaledDisc value = PolygammaDisc.of(1).hurwitz(ComplexDisc.of(row.re(), row.im()), terms);
            assertEncloses(value.unscaled(), row, 1);
        }
        for (ArcValues.Row row : rows("polygamma(3,u)")) {
            ScaledDisc value = PolygammaDisc.of(3).hurwitz(ComplexDisc.of(row.re(), row.im()), terms);
            assertEncloses(value.unscaled(), row, 6);
        }
    }

    /** factor * disc holds the value of the row. */
    private static void assertEncloses(ComplexDisc disc, ArcValues.Row row, int factor) {
        double scale = Math.pow(10, row.decimalExponent()) / factor;
        assertThat(Math.hypot(disc.re() - row.valueRe() * scale, disc.im() - row.valueIm() * scale))
                .isLessThanOrEqualTo(disc.radius());
    }

    @Test
    void discsThatReachTheImaginaryAxisAreNotTreated() {
        assertThat(StirlingSeries.lnGamma(new ComplexDisc(1, 20, 1.1), 14).isWhole()).isTrue();
        assertThat(StirlingSeries.digamma(new ComplexDisc(1, 20, 1.1), 14).isWhole()).isTrue();
        assertThat(PolygammaDisc.of(2).hurwitz(new ComplexDisc(1, 20, 1.1), 14).isWhole()).isTrue();
        assertThat(PolygammaDisc.of(2).over(new ComplexDisc(1, 20, 7)).isWhole()).isTrue();
    }

    @ParameterizedTest
    @ValueSource(strings = {
        "gamma(1-2*u)", "1/gamma(u)", "gamma(u/3+1/2)^2/gamma(2/3-u)^3", "digamma(u)", "polygamma(1,1-u)",
        "polygamma(4,u)^2", "sin(1-2*u)^3", "(u-1)^3*(u+2)/(u^2-u+3)/(u-1/2)^2", "exp(-2*u)*gamma(u)-u*digamma(u)"
    })
    void discsHoldTheValuesAtTheirPointsSeed21(String formula) {
        FormEvaluation evaluation = FormEvaluation.of(ArcValues.form(formula));
        Random source = new Random(21);
        int finite = 0;
        for (int trial = 0; trial < 400; trial++) {
            double re = 12 * source.nextDouble() - 6;
            double im = trial % 4 == 0 ? 0 : 12 * source.nextDouble() - 6;
            double radius = Math.scalb(source.nextDouble(), -source.nextInt(12));
            ScaledDisc over = evaluation.over(new ComplexDisc(re, im, radius));
            for (int k = 0; k < 4 && !over.isWhole(); k++, finite++) {
                double angle = 2 * Math.PI * source.nextDouble();
                double reach = radius * (1 - 1e-9);
                ComplexValue value = evaluation.at(re + reach * Math.cos(angle), im + reach * Math.sin(angle));
                double scale = Math.scalb(1.0, (int) (value.exponent() - over.exponent()));
                double distance = Math.hypot(
                        value.re() * scale - over.mantissa().re(), value.im() * scale - over.mantissa().im());
                assertThat(distance)
                        .as("%s about %s + %s i, radius %s", formula, re, im, radius)
                        .isLessThanOrEqualTo(over.mantissa().radius() + value.error() * scale);
            }
        }
        assertThat(finite).isGreaterThan(800);
    }
}
