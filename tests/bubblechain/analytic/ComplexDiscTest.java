package bubblechain.analytic;

import static org.assertj.core.api.Assertions.assertThat;

import bubblechain.exact.Ball;
import bubblechain.exact.BallFunctions;
import bubblechain.exact.BoundSamples;
import bubblechain.exact.Rational;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Random;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;

/** Inclusion: points of the arguments, combined in exact decimal arithmetic, lie in the resulting disc. */
class ComplexDiscTest {
    private static final int TRIALS = 4_000;
    private static final MathContext DIGITS = new MathContext(60);

    private static double random(Random source) {
        double mantissa = 2 * source.nextDouble() - 1;
        return source.nextInt(12) == 0 ? source.nextInt(5) - 2 : Math.scalb(mantissa, source.nextInt(40) - 20);
    }

    private static ComplexDisc disc(Random source) {
        double re = random(source);
        double im = random(source);
        double radius = Math.hypot(re, im) * Math.scalb(source.nextDouble(), -source.nextInt(60));
        return new ComplexDisc(re, im, source.nextInt(3) == 0 ? 0 : radius);
    }

    /** A point of the disc, often on its rim. */
    private static ComplexDisc point(ComplexDisc disc, Random source) {
        double angle = 2 * Math.PI * source.nextDouble();
        double reach = disc.radius() * (source.nextBoolean() ? 1 - 1e-15 : source.nextDouble());
        ComplexDisc point = ComplexDisc.of(disc.re() + reach * Math.cos(angle), disc.im() + reach * Math.sin(angle));
        return squaredDistance(disc, exact(point.re()), exact(point.im())).compareTo(square(exact(disc.radius()))) <= 0
                ? point
                : disc.center();
    }

    private static BigDecimal exact(double x) {
        return new BigDecimal(x);
    }

    private static BigDecimal square(BigDecimal x) {
        return x.multiply(x);
    }

    private static BigDecimal squaredDistance(ComplexDisc disc, BigDecimal re, BigDecimal im) {
        return square(re.subtract(exact(disc.re()))).add(square(im.subtract(exact(disc.im()))));
    }

    /** log2(radius/distance) of the points that are not the centre. */
    private final List<Double> ratios = new ArrayList<>();

    private void assertInside(ComplexDisc disc, BigDecimal re, BigDecimal im) {
        BigDecimal distance = squaredDistance(disc, re, im);
        assertThat(distance).isLessThanOrEqualTo(square(exact(disc.radius())));
        if (distance.signum() > 0) {
            double ratio = square(exact(disc.radius())).divide(distance, DIGITS).doubleValue();
            ratios.add(Math.log(ratio) / (2 * Math.log(2)));
        }
    }

    @AfterEach
    void radiiAreNotWasteful() {
        if (!ratios.isEmpty()) {
            Collections.sort(ratios);
            assertThat(ratios.get(ratios.size() / 2)).isLessThan(BoundSamples.LARGEST_MEDIAN);
        }
    }

    @Test
    void sumsAndProductsOfPointsLieInTheDiscSeed11() {
        Random source = new Random(11);
        for (int trial = 0; trial < TRIALS; trial++) {
            ComplexDisc a = disc(source);
            ComplexDisc b = disc(source);
            ComplexDisc p = point(a, source);
            ComplexDisc q = point(b, source);
            BigDecimal pr = exact(p.re());
            BigDecimal pi = exact(p.im());
            BigDecimal qr = exact(q.re());
            BigDecimal qi = exact(q.im());
            assertInside(a.add(b), pr.add(qr), pi.add(qi));
            assertInside(a.subtract(b), pr.subtract(qr), pi.subtract(qi));
            assertInside(a.add(q.re()), pr.add(qr), pi);
            assertInside(a.multiply(q.re()), pr.multiply(qr), pi.multiply(qr));
            assertInside(a.timesI(), pi.negate(), pr);
            assertInside(
                    a.multiply(b),
                    pr.multiply(qr).subtract(pi.multiply(qi)),
                    pr.multiply(qi).add(pi.multiply(qr)));
        }
    }

    @Test
    void inversesOfPointsLieInTheDiscSeed12() {
        Random source = new Random(12);
        for (int trial = 0; trial < TRIALS; trial++) {
            ComplexDisc a = disc(source);
            ComplexDisc p = point(a, source);
            ComplexDisc inverse = a.inverse();
            if (!inverse.isWhole()) {
                BigDecimal norm = square(exact(p.re())).add(square(exact(p.im())));
                assertInside(
                        inverse.widened(inverse.largest() * 1e-30),
                        exact(p.re()).divide(norm, DIGITS),
                        exact(p.im()).negate().divide(norm, DIGITS));
            }
        }
    }

    @Test
    void modulusBoundsEncloseTheModulusOfEveryPointSeed13() {
        Random source = new Random(13);
        for (int trial = 0; trial < TRIALS; trial++) {
            ComplexDisc a = disc(source);
            ComplexDisc p = point(a, source);
            BigDecimal modulusSquared = square(exact(p.re())).add(square(exact(p.im())));
            assertThat(modulusSquared).isLessThanOrEqualTo(square(exact(a.largest())));
            assertThat(modulusSquared).isGreaterThanOrEqualTo(square(exact(a.smallest())));
        }
    }

    @Test
    void logarithmAndExponentialUndoEachOtherOnWholeDiscsSeed14() {
        Random source = new Random(14);
        for (int trial = 0; trial < TRIALS; trial++) {
            double x = 5 * source.nextGaussian();
            ComplexDisc a = new ComplexDisc(x, 5 * source.nextGaussian(), source.nextDouble() / 2);
            ComplexDisc p = point(a, source);
            // exp of the log of a holds every point of a, with little to spare for small discs
            ComplexDisc ln = a.ln();
            if (!ln.isWhole()) {
                ComplexDisc back = ScaledDisc.exp(ln).unscaled();
                assertInside(back, exact(p.re()), exact(p.im()));
                double relative = a.radius() / a.smallest();
                assertThat(back.radius()).isLessThan(a.largest() * (Math.expm1(relative) * 1.01 + 1e-14));
            }
        }
    }

    @Test
    void exponentialsAndLogarithmsOfPointsHoldTheCertifiedValuesSeed16() {
        Random source = new Random(16);
        int bits = 160;
        for (int trial = 0; trial < 600; trial++) {
            double x = 40 * source.nextGaussian();
            double y = 40 * source.nextGaussian();
            Ball re = Ball.of(Rational.parse(exact(x).toPlainString()), bits);
            Ball im = Ball.of(Rational.parse(exact(y).toPlainString()), bits);
            Ball size = BallFunctions.exp(re, bits);
            ComplexDisc exponential = ScaledDisc.exp(ComplexDisc.of(x, y)).unscaled();
            assertNear(exponential.re(), size.multiply(BallFunctions.cos(im, bits), bits), exponential.radius());
            assertNear(exponential.im(), size.multiply(BallFunctions.sin(im, bits), bits), exponential.radius());
            ComplexDisc logarithm = ComplexDisc.of(x, y).ln();
            Ball norm = re.multiply(re, bits).add(im.multiply(im, bits), bits);
            assertNear(logarithm.re(), BallFunctions.ln(norm, bits).shift(-1), logarithm.radius());
            assertThat(exponential.radius()).isLessThan(1e-13 * exponential.largest());
            assertThat(logarithm.radius()).isLessThan(1e-14);
        }
    }

    private static void assertNear(double value, Ball certified, double radius) {
        Rational distance = certified.midpoint().subtract(Rational.parse(exact(value).toPlainString())).abs();
        assertThat(distance).isLessThanOrEqualTo(Rational.parse(exact(radius).toPlainString()));
    }

    @Test
    void rationalsAndBallsOfAnySizeAreEnclosed() {
        Random source = new Random(15);
        for (int trial = 0; trial < 500; trial++) {
            Rational value = Rational.of(source.nextLong(), 1 + source.nextInt(1_000_000))
                    .power(1 + source.nextInt(4));
            ComplexDisc disc = ComplexDisc.of(value);
            assertThat(value.subtract(Rational.parse(exact(disc.re()).toPlainString())).abs())
                    .isLessThanOrEqualTo(Rational.parse(exact(disc.radius()).toPlainString()));
            assertThat(disc.radius()).isLessThanOrEqualTo(Math.abs(disc.re()) * 1e-15 + Double.MIN_NORMAL);
        }
        assertThat(ComplexDisc.of(Rational.of(-7, 4)).radius()).isZero();
        Ball huge = Ball.of(3).power(3_000, 64);
        assertThat(ScaledDisc.of(huge).lnLargest())
                .isGreaterThanOrEqualTo(3_000 * Math.log(3))
                .isLessThan(3_000 * Math.log(3) + 1e-9);
        assertThat(ScaledDisc.of(Rational.of(3).power(-3_000)).inverse().lnLargest())
                .isGreaterThanOrEqualTo(3_000 * Math.log(3))
                .isLessThan(3_000 * Math.log(3) + 1e-9);
    }

    @Test
    void whatIsNotDefinedOrOutOfRangeIsTheWholePlane() {
        assertThat(new ComplexDisc(1, 1, 1.5).inverse().isWhole()).isTrue();
        assertThat(new ComplexDisc(1, 1, 1.5).ln().isWhole()).isTrue();
        assertThat(ComplexDisc.of(Double.NaN, 0).isWhole()).isTrue();
        assertThat(ComplexDisc.of(1e300, 0).multiply(ComplexDisc.of(1e300, 0)).isWhole()).isTrue();
        assertThat(ComplexDisc.WHOLE.multiply(ComplexDisc.ZERO).isWhole()).isTrue();
        assertThat(ComplexDisc.WHOLE.add(ComplexDisc.ONE).largest()).isInfinite();
        assertThat(ScaledDisc.WHOLE.add(ScaledDisc.ONE).lnLargest()).isEqualTo(Double.POSITIVE_INFINITY);
        assertThat(ScaledDisc.exp(ComplexDisc.of(1e300, 0)).isWhole()).isTrue();
        assertThat(ComplexDisc.of(0x1p-1060, 0x1p-1070).inverse().isWhole()).isTrue();
        assertThat(ComplexDisc.of(0x1p-1000, 0).inverse().largest()).isBetween(0x1p1000, 0x1.001p1000);
    }

    @Test
    void sumsOfVeryDifferentScalesKeepBothSummandsInside() {
        ScaledDisc big = ScaledDisc.exp(ComplexDisc.of(2_000, 0));
        ScaledDisc small = ScaledDisc.exp(ComplexDisc.of(-2_000, 1));
        assertThat(big.add(small).lnLargest()).isBetween(2_000.0, 2_000 + 1e-9);
        assertThat(small.add(big).lnLargest()).isEqualTo(big.add(small).lnLargest());
        assertThat(small.add(ScaledDisc.ZERO)).isEqualTo(small);
    }
}
