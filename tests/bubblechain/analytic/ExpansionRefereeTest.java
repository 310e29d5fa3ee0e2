package bubblechain.analytic;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.PrecisionException;
import bubblechain.exact.Rational;
import bubblechain.series.BallRing;
import bubblechain.series.CoefficientRing;
import bubblechain.series.CoefficientwiseAlgebra;
import bubblechain.series.ExactRing;
import bubblechain.series.LaurentSeries;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.UnaryOperator;
import org.junit.jupiter.api.Test;

/** Every route to an expansion against random and chosen formulas expanded by PARI/GP and mpmath. */
class ExpansionRefereeTest {
    /** A ball holds the referee's number, which is known up to its last digit; empty if it does. */
    private static Optional<String> miss(RefereeRow row, int power, Ball ball) {
        Ball referee = row.coefficient(power);
        return ball.overlaps(referee)
                ? Optional.empty()
                : Optional.of(row + ", power " + power + ": " + ball + " against " + referee);
    }

    private static Ball coefficient(LaurentSeries<Ball> series, int power) {
        return power < series.lowest() ? Ball.ZERO : series.coefficients().get(power - series.lowest());
    }

    private static List<String> misses(RefereeRow row, LaurentSeries<Ball> series) {
        List<String> misses = new ArrayList<>();
        for (int power = Math.min(series.lowest(), row.valuation()); power < Math.min(row.end(), series.end()); power++) {
            miss(row, power, coefficient(series, power)).ifPresent(misses::add);
        }
        return misses;
    }

    /** The part of the expansion route that chooses the ring, with a ring of the test's own. */
    private static LaurentSeries<Ball> expansion(RefereeRow row, UnaryOperator<CoefficientRing<Ball>> fault, int bits) {
        NormalForm form = NormalForm.of(row.formula(), "u");
        List<LocalTerm> terms = new ArrayList<>();
        form.terms().forEach((key, factor) -> terms.add(new LocalTerm(key, factor, row.point())));
        int lowest = terms.stream().mapToInt(LocalTerm::valuation).min().orElse(0);
        int length = Math.max(1, row.end() - lowest);
        CoefficientwiseAlgebra<Ball> algebra =
                CoefficientwiseAlgebra.of(fault.apply(BallRing.of(bits, length + 1)), length);
        LaurentSeries<Ball> total = new LaurentSeries<>(row.end(), List.of());
        for (LocalTerm term : terms) {
            total = algebra.add(total, term.expand(algebra));
        }
        return total;
    }

    @Test
    void ballsOfRandomFormulasContainTheRefereeValues() throws IOException {
        List<String> misses = new ArrayList<>();
        int accurate = 0;
        int total = 0;
        for (RefereeRow row : RefereeRow.all()) {
            for (int bits : new int[] {100, 300}) {
                LaurentSeries<Ball> series =
                        Expansion.about(row.point(), NormalForm.of(row.formula(), "u")).balls(row.end(), bits);
                assertThat(series.end()).as("%s", row).isEqualTo(row.end());
                misses.addAll(misses(row, series));
                for (int power = row.valuation(); power < row.end(); power++) {
                    total++;
                    accurate += coefficient(series, power).accuracyBits() > bits / 2 ? 1 : 0;
                }
            }
        }
        assertThat(misses).isEmpty();
        assertThat(total).isGreaterThan(5_000);
        // the balls are narrow as well: nearly all keep half of their bits
        assertThat(accurate).isGreaterThan(total * 95 / 100);
    }

    @Test
    void exactExpansionsOfRandomFormulasHaveTheRefereesValuationAndValues() throws IOException {
        List<String> misses = new ArrayList<>();
        for (RefereeRow row : RefereeRow.all()) {
            int end = row.valuation() + 3;
            LaurentSeries<ExactConstant> series =
                    Expansion.about(row.point(), NormalForm.of(row.formula(), "u")).exact(end);
            int lowest = series.lowest();
            // a leading coefficient that vanishes without a formal reason may come first
            while (lowest < row.valuation()) {
                ExactConstant leading = series.coefficients().get(lowest - series.lowest());
                assertThat(leading.isClosedForm()).as("%s: %s should be zero", row, leading).isFalse();
                assertThat(leading.toBall(300).containsZero()).as("%s: %s should be zero", row, leading).isTrue();
                lowest++;
            }
            assertThat(lowest).as("%s", row).isEqualTo(row.valuation());
            for (int power = row.valuation(); power < end; power++) {
                miss(row, power, series.coefficients().get(power - series.lowest()).toBall(300)).ifPresent(misses::add);
            }
        }
        assertThat(misses).isEmpty();
    }

    @Test
    void theTreeRouteAgreesWithTheRefereeWhereverItExpands() throws IOException {
        List<String> misses = new ArrayList<>();
        int expanded = 0;
        for (RefereeRow row : RefereeRow.all()) {
            int length = 13;
            CoefficientwiseAlgebra<Ball> algebra = CoefficientwiseAlgebra.of(BallRing.of(160, length + 1), length);
            try {
                LaurentSeries<Ball> series = SeriesInterpretation.about(row.point(), row.formula(), algebra, "u");
                misses.addAll(misses(row, series));
                expanded += series.end() >= row.end() ? 1 : 0;
            } catch (bubblechain.formula.FormulaException | PrecisionException e) {
                // a ball that holds zero where the tree divides: this route gives no answer there, and says so
                assertThat(e.getMessage()).as("%s", row).isNotBlank();
            }
        }
        assertThat(misses).isEmpty();
        assertThat(expanded).isGreaterThan(280);
    }

    @Test
    void exactTreesAgreeWithNormalFormsFormally() throws IOException {
        int compared = 0;
        for (RefereeRow row : RefereeRow.all()) {
            if (row.id().startsWith("fractional") || row.id().startsWith("circular") || !row.point().isInteger()) {
                continue;
            }
            CoefficientwiseAlgebra<ExactConstant> algebra = CoefficientwiseAlgebra.of(ExactRing.INSTANCE, 7);
            LaurentSeries<ExactConstant> tree = SeriesInterpretation.about(row.point(), row.formula(), algebra, "u");
            int end = Math.min(tree.end(), row.valuation() + 2);
            LaurentSeries<ExactConstant> form =
                    Expansion.about(row.point(), NormalForm.of(row.formula(), "u")).exact(end);
            for (int power = row.valuation(); power < end; power++) {
                ExactConstant difference = algebra.coefficient(tree, power).subtract(algebra.coefficient(form, power));
                assertThat(difference.isZero() || !difference.isClosedForm() && difference.toBall(300).containsZero())
                        .as("%s, power %d: %s", row, power, difference)
                        .isTrue();
                compared++;
            }
        }
        assertThat(compared).isGreaterThan(150);
    }

    @Test
    void theCheckFailsWhenRadiiAreDropped() throws IOException {
        int red = 0;
        int green = 0;
        for (RefereeRow row : RefereeRow.all().subList(0, 60)) {
            assertThat(misses(row, expansion(row, ring -> ring, 100))).isEmpty();
            boolean missed = !misses(row, expansion(row, ring -> new MidpointRing((BallRing) ring), 100)).isEmpty();
            red += missed ? 1 : 0;
            green += missed ? 0 : 1;
        }
        // a rational result may survive; the inexact ones may not
        assertThat(red).isGreaterThan(50);
        assertThat(green).isLessThan(10);
    }

    @Test
    void theRefereeIsNotLooserThanItsDigits() throws IOException {
        for (RefereeRow row : RefereeRow.all()) {
            assertThat(row.coefficients()).hasSize(8);
            assertThat(row.coefficients().get(0).contains(Rational.ZERO)).as("%s", row).isFalse();
        }
    }
}
