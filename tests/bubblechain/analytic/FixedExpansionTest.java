package bubblechain.analytic;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.Ball;
import bubblechain.exact.BoundSamples;
import bubblechain.exact.Magnitude;
import bubblechain.exact.Rational;
import bubblechain.series.FixedSeries;
import bubblechain.series.LaurentSeries;
import java.io.IOException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * The fixed-point route against the route of balls, which shares neither its series nor its gamma functions with it, at
 * three times the precision.
 */
class FixedExpansionTest {
    private static void compare(BoundSamples samples, String formula, FixedExpansion fixed, int end, int bits) {
        NormalForm form = Forms.form(formula);
        LaurentSeries<Ball> reference = Expansion.about(Rational.ZERO, form).balls(end, 3 * bits);
        for (int n = -fixed.shift(); n < end; n++) {
            int index = n - reference.lowest();
            Ball value = index < 0 || index >= reference.length() ? Ball.ZERO : reference.coefficients().get(index);
            Ball expected = value.multiply(fixed.radius().power(n), 3 * bits);
            samples.add(fixed.scaled(n), expected, "%s, [u^%d], %d bits", formula, n, bits);
        }
    }

    @ParameterizedTest
    @ValueSource(strings = {
        "gamma(1+u)*gamma(1-2*u)/gamma(1-u)",
        "exp(5*u/3)*6*(1-u)*gamma(u)*gamma(1-2*u)/gamma(3-u)",
        "gamma(4+2*u)/(6*gamma(1+u)*gamma(2+u)^2*gamma(1-u))",
        "exp(ln(9/4)*u)*gamma(1/2-u)/(4^u*sqrt(pi)*gamma(1+u))",
        "gamma(1/4+u)*gamma(3/4-3*u/2)^2/gamma(1/4-u/3)",
        "gamma(1/3+u/5)/gamma(2/7-u)^3",
        "gamma(1-u)^5*gamma(1+u/2)^3",
        "gamma(1+u)^9/gamma(1-u/3)^7",
        "polygamma(1,(1+u)/2)-polygamma(1,(2+u)/2)",
        "polygamma(0,1/4+u/3)^2*polygamma(3,1-2*u)",
        "polygamma(2,1/3-u)*gamma(1+u)*exp(sqrt(2)*u)",
        "sin(1+u/3)/(1-u)*gamma(1-u)", "cos(2*u)^2/(1-2*u)^3",
        "sin(pi*u/3)^2/u^4*gamma(1/2+u)",
        "(1+u)/((1+u+u^2)*(3-u^2)^2)*gamma(1-u)", "gamma(1+u)/(7-5*u+11*u^2+u^3)",
        "(1-u^3/7)/(1-u)^2+u^5*gamma(1-u)+3*polygamma(1,1+u)*exp(u)",
        "1/((1-1000003*u/1000033)*(1+u/1000003))*gamma(1-u)",
        "gamma(1-u/1000003)*gamma(1+u)", "zeta(3)*exp(u)/(1-u)+pi^2*exp(u)*u/(2-u)^2"
    })
    void expansionsAreWithinTheirBounds(String formula) {
        BoundSamples samples = new BoundSamples();
        for (int[] size : new int[][] {{1, 60}, {25, 200}, {45, 130}, {10, 700}}) {
            Optional<FixedExpansion> fixed = FixedExpansion.of(Forms.form(formula), size[0], size[1]);
            assertThat(fixed).as("%s, %d orders, %d bits", formula, size[0], size[1]).isPresent();
            compare(samples, formula, fixed.orElseThrow(), size[0], size[1]);
        }
        samples.assertNotWasteful(60, "%s", formula);
    }

    /** Short numbers: every coefficient fits, and the longer reference is the same to its last bit. */
    @ParameterizedTest
    @ValueSource(strings = {"1/(1-2*u^2)", "(1+30*u)^6/(1-u)"})
    void expansionsInShortNumbersAreExact(String formula) {
        FixedExpansion fixed = FixedExpansion.of(Forms.form(formula), 25, 200).orElseThrow();
        LaurentSeries<Ball> reference = Expansion.about(Rational.ZERO, Forms.form(formula)).balls(25, 600);
        for (int n = 0; n < 25; n++) {
            Ball expected = reference.coefficients().get(n).multiply(fixed.radius().power(n), 600);
            assertThat(fixed.scaled(n).midpoint()).isEqualTo(expected.midpoint());
        }
    }

    /** Numbers of more than 64 and more than 128 digits; the other route would take too long here. */
    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "30 | 3700 | gamma(1+u)*gamma(1-2*u)/gamma(1-u)*exp(5*u/3)/(2-u)",
        "25 | 3700 | polygamma(1,1/2+u)*gamma(1-u)/(1-u/7)",
        "10 | 7300 | gamma(1+u)*gamma(1-2*u)/gamma(1-u)*exp(5*u/3)/(2-u)"
    })
    void longNumbersAreWithinTheirBounds(int end, int bits, String formula) {
        FixedExpansion low = FixedExpansion.of(Forms.form(formula), end, bits).orElseThrow();
        FixedExpansion high = FixedExpansion.of(Forms.form(formula), end, 3 * bits).orElseThrow();
        BoundSamples samples = new BoundSamples();
        for (int n = 0; n < end; n++) {
            samples.add(low.scaled(n), high.scaled(n), "%s, [u^%d], %d bits", formula, n, bits);
        }
        samples.assertNotWasteful(end - 2, "%s, %d bits", formula, bits);
    }

    /** A scale far inside the circle of convergence would lose bits with every order. */
    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "1/(1-2*u^2) | 0.70710678", "1/(3-u^2)^2 | 1.7320508", "1/(1+u+u^2) | 1", "1/(u^4+4)^3 | 1.4142136",
        "1/(7-5*u+11*u^2+u^3)*gamma(1-u) | 0.7805878", "gamma(1-u/9)/(50-u^2) | 7.0710678", "u^3/(1-100*u^2+u^3) | 0.0999501"
    })
    void theScaleOfTheVariableIsCloseToTheNearestIrrationalPole(String formula, double distance) {
        double radius = FixedExpansion.radius(Forms.form(formula)).orElseThrow().toDouble();
        assertThat(radius).isBetween(0.93 * distance, distance);
    }

    @Test
    void stagesOfFallingPrecisionAreWithinTheirBounds() {
        for (String formula : new String[] {
            Forms.POLE_MASS, Forms.ADLER, "gamma(4+2*u)/(6*gamma(1+u)*gamma(2+u)^2*gamma(1-u))",
            "(1+u/3)/((1-u^2)*(1-u^2/4))*exp(5*u/3)", "sin(pi*u)/u^3*gamma(1-u)/(1-u)"
        }) {
            List<FixedExpansion.Stage> stages = List.of(
                    new FixedExpansion.Stage(5, 600), new FixedExpansion.Stage(6, 500),
                    new FixedExpansion.Stage(20, 260), new FixedExpansion.Stage(40, 70));
            FixedExpansion fixed = FixedExpansion.of(Forms.form(formula), stages, Rational.of(5, 2)).orElseThrow();
            BoundSamples samples = new BoundSamples();
            compare(samples, formula, fixed, 40, 600);
            samples.assertNotWasteful(35, "%s in stages", formula);
            int from = 0;
            for (FixedExpansion.Stage stage : stages) {
                for (int n = from; n < stage.end(); n++) {
                    double lost = stage.bits() + Math.log(fixed.scaled(n).radiusAsDouble()) / Math.log(2);
                    assertThat(lost).as("%s, [u^%d]: bits lost of %d", formula, n, stage.bits()).isLessThan(64);
                }
                from = stage.end();
            }
        }
    }

    /** A random product of what a normal form may hold, as text. */
    private static String term(Random random) {
        StringBuilder text = new StringBuilder("(" + (1 + random.nextInt(9)) + "-" + random.nextInt(9) + "*u)");
        String[] arguments = {
            "1+u", "1-u", "2-u", "1-2*u", "3+2*u", "1/2+u", "1/2-u/2", "1/4+u", "3/4-u", "1+u/3", "1/3-u/4", "5/4+3*u/2"
        };
        String[] others = {
            "exp(5*u/3)", "4^u", "exp(-sqrt(3)*u)", "(1-u/7)^3", "sin(1+u/2)", "cos(u)", "pi", "zeta(3)", "u", "u^2",
            "polygamma(0,1+u)", "polygamma(1,1/2+u/2)", "polygamma(2,3/4-u/3)", "polygamma(1,2-u)^2"
        };
        String[] denominators = {"(1-u)", "(2+u)^2", "(1-2*u^2)", "(1+u+u^2)", "(5-u)", "u", "u^2", "(3-u+2*u^3)", "(4*u^4+1)"};
        for (int k = random.nextInt(4); k > 0; k--) {
            text.append(random.nextBoolean() ? "*" : "/").append("gamma(")
                    .append(arguments[random.nextInt(arguments.length)]).append(")^").append(1 + random.nextInt(2));
        }
        for (int k = random.nextInt(3); k > 0; k--) {
            text.append("*").append(others[random.nextInt(others.length)]);
        }
        for (int k = random.nextInt(3); k > 0; k--) {
            text.append("/").append(denominators[random.nextInt(denominators.length)]);
        }
        return text.toString();
    }

    @Test
    void randomFormsAreWithinTheirBoundsWithSeed31() {
        Random random = new Random(31);
        BoundSamples samples = new BoundSamples();
        int taken = 0;
        for (int i = 0; i < 100; i++) {
            String formula = term(random);
            for (int k = random.nextInt(3); k > 0; k--) {
                formula += (random.nextBoolean() ? "+" : "-") + term(random);
            }
            int end = 1 + random.nextInt(24);
            int bits = 60 + random.nextInt(200);
            Optional<FixedExpansion> fixed = FixedExpansion.of(Forms.form(formula), end, bits);
            if (fixed.isPresent()) {
                compare(samples, formula, fixed.get(), end, bits);
                taken++;
            }
        }
        assertThat(taken).isGreaterThan(80);
        samples.assertNotWasteful(700, "random forms");
    }

    @Test
    void ballsContainTheRefereeValues() throws IOException {
        int compared = 0;
        for (RefereeRow row : RefereeRow.all()) {
            if (!row.point().isZero()) {
                continue;
            }
            Optional<FixedExpansion> fixed =
                    FixedExpansion.of(NormalForm.of(row.formula(), "u"), Math.max(1, row.end()), 260);
            if (fixed.isEmpty()) {
                continue;
            }
            for (int n = -fixed.get().shift(); n < row.end(); n++) {
                Ball expected = row.coefficient(n).multiply(fixed.get().radius().power(n), 400);
                assertThat(fixed.get().scaled(n).overlaps(expected)).as("%s, [u^%d]", row, n).isTrue();
                compared++;
            }
        }
        assertThat(compared).isGreaterThan(200);
    }

    /** What is left of a product when poles are taken out, against three times the precision with the same poles out. */
    @ParameterizedTest
    @CsvSource(delimiter = '|', value = {
        "gamma(1+u)*gamma(1-2*u)/gamma(1-u) | 1/2 | 120 | 6", "gamma(1+u)*gamma(1-2*u)/gamma(1-u) | 1/2 | 60 | 30",
        "gamma(1+u)*gamma(1-2*u)/gamma(1-u) | 1/2 | 90  | 1", "gamma(1+u)*gamma(1-2*u)/gamma(1-u) | 1/2 | 180 | 3",
        "gamma(1/4+u)^3*gamma(2/3-u/5)      | 1/4 | 120 | 2", "gamma(1-u)^9/gamma(1+u/3)^5        | 1   | 80  | 13"
    })
    void exponentialsWithoutTheirNearestPolesAreWithinTheirBounds(String formula, String rho, int length, int limbs) {
        Map.Entry<TermKey, RationalFunction> term =
                Forms.form(formula).terms().entrySet().iterator().next();
        TermKey key = FactoredTerm.of(term.getKey(), term.getValue()).functions();
        Rational radius = Rational.parse(rho);
        GammaProducts.Product low =
                new GammaProducts(radius, length, limbs, 0).of(key, new GammaProducts.Stage(length, limbs));
        GammaProducts.Product high =
                new GammaProducts(radius, length, 3 * limbs, 0).of(key, new GammaProducts.Stage(length, 3 * limbs));
        Map<Rational, Integer> back = new HashMap<>(high.removed());
        low.removed().forEach((root, power) -> back.merge(root, -power, Integer::sum));
        FixedSeries reference = LinearFactors.apply(high.series(), back, radius);
        BoundSamples samples = new BoundSamples();
        for (int n = 1; n < length; n++) {
            samples.add(low.series().coefficient(n), reference.coefficient(n), "%s, [v^%d]", formula, n);
        }
        samples.assertNotWasteful(length / 3, "%s, %d limbs", formula, limbs);
    }

    @Test
    void gatheredBallsAreWithinTheErrorsOfTheSeriesWithSeed33() {
        Random random = new Random(33);
        List<Ball> balls = new ArrayList<>();
        FixedValues values = new FixedValues(200, 2);
        for (int k = 0; k < 200; k++) {
            Ball middle = Ball.of(Rational.of(random.nextInt(2_001) - 1_000, 1 + random.nextInt(1_000)), 400);
            Magnitude radius = Magnitude.of(random.nextInt(1 << 20)).scale(-30 - random.nextInt(110));
            balls.add(random.nextInt(5) == 0 ? middle : middle.addError(radius));
            values.set(k, balls.get(k));
        }
        FixedSeries series = values.series();
        for (int k = 0; k < 200; k++) {
            assertThat(series.coefficient(k).contains(balls.get(k))).as("%s in %s", balls.get(k), series.coefficient(k)).isTrue();
        }
    }

    @Test
    void functionsWithoutSingularPointAndNumbersOutOfRangeAreLeftToTheOtherRoute() {
        assertThat(FixedExpansion.of(Forms.form("1+u"), 4, 100)).isEmpty();
        assertThat(FixedExpansion.of(Forms.form("exp(u)*sin(u)"), 4, 100)).isEmpty();
        assertThat(FixedExpansion.of(Forms.form("exp(300*u)/(1-u)"), 300, 100)).isEmpty();
        assertThat(FixedExpansion.of(Forms.form("10^20*u/(1-u)^2+gamma(1-u)*10^20*u"), 4, 100)).isEmpty();
        assertThat(FixedExpansion.of(Forms.form("1/(1-u)^40"), 60, 100)).isEmpty();
        assertThat(FixedExpansion.of(Forms.form("pi^99*exp(u)/(1-u)"), 3, 200)).isEmpty();
        // a small constant is no matter of precision: there are more limbs for it
        for (String constant : new String[] {"pi^30", "pi^(-99)"}) {
            FixedExpansion large = FixedExpansion.of(Forms.form(constant + "*exp(u)/(1-u)"), 3, 200).orElseThrow();
            Ball first = Forms.constant(constant).toBall(400);
            assertThat(large.scaled(0).overlaps(first)).isTrue();
            assertThat(large.scaled(0).accuracyBits()).isGreaterThan(195);
        }
    }
}
