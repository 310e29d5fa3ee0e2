package bubblechain.exact;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.math.BigInteger;
import java.util.List;
import java.util.Random;
import java.util.function.BiFunction;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * The radius of every operation and every function over balls: never below the error met at three times the precision,
 * and the median of radius/error below 2^20. Exact arguments show rounding and truncation, wide ones the bounds of the
 * slopes.
 */
class ErrorBoundsTest {
    private static final int[] PRECISIONS = {40, 200};

    /**
     * A function over balls.
     *
     * @param lowest  end of the range of arguments
     * @param highest the other end
     */
    record Named(String name, double lowest, double highest, BiFunction<Ball, Integer, Ball> function) {
        @Override
        public String toString() {
            return name;
        }
    }

    static List<Named> functions() {
        return List.of(
                new Named("sqrt", 0.01, 1e6, BallFunctions::sqrt),
                new Named("ln", 0.01, 1e6, BallFunctions::ln),
                new Named("exp", -40, 40, BallFunctions::exp),
                new Named("sin", -40, 40, BallFunctions::sin),
                new Named("cos", -40, 40, BallFunctions::cos),
                new Named("power 2/3", 0.01, 1e6, (x, bits) -> BallFunctions.power(x, Rational.of(2, 3), bits)),
                new Named("power -5/2", 0.01, 1e3, (x, bits) -> BallFunctions.power(x, Rational.of(-5, 2), bits)),
                new Named("power 17", -9, 9, (x, bits) -> BallFunctions.power(x, Rational.of(17), bits)),
                new Named("gamma", 0.1, 60, BallFunctions::gamma),
                new Named("gamma, left", -90, -0.1, BallFunctions::gamma),
                new Named("lnGamma", 0.1, 60, BallFunctions::lnGamma),
                new Named("digamma", 0.1, 60, BallFunctions::digamma),
                new Named("digamma, left", -90, -0.1, BallFunctions::digamma),
                new Named("polygamma 1", 0.1, 60, (x, bits) -> BallFunctions.polygamma(1, x, bits)),
                new Named("polygamma 4, left", -20, -0.1, (x, bits) -> BallFunctions.polygamma(4, x, bits)),
                new Named("zeta(2, x)", 0.1, 60, (x, bits) -> BallFunctions.hurwitzZeta(2, x, bits)),
                new Named("zeta(3, x)", 0.1, 60, (x, bits) -> BallFunctions.hurwitzZeta(3, x, bits)),
                new Named("zeta(17, x)", 0.1, 9, (x, bits) -> BallFunctions.hurwitzZeta(17, x, bits)),
                new Named("zeta table at x", 0.1, 9, (x, bits) -> BallFunctions.hurwitzZetaTable(x, 25, bits)[25]));
    }

    /** A dyadic number of 24 bits in the range, no closer than a tenth to an integer. */
    private static Ball point(Named named, Random random) {
        while (true) {
            double x = named.lowest + (named.highest - named.lowest) * random.nextDouble();
            if (Math.abs(x - Math.rint(x)) > 0.1) {
                return Ball.ofDyadic(BigInteger.valueOf((long) (x * (1 << 24))), -24);
            }
        }
    }

    @ParameterizedTest
    @MethodSource("functions")
    void functionsOfExactNumbersAreWithinTheirRadiiSeed61(Named named) {
        Random random = new Random(61);
        BoundSamples samples = new BoundSamples();
        for (int bits : PRECISIONS) {
            for (int i = 0; i < 15; i++) {
                Ball x = point(named, random);
                Ball finer = named.function.apply(x, 3 * bits);
                samples.add(named.function.apply(x, bits), finer, "%s(%s), %d bits", named, x, bits);
            }
        }
        samples.assertNotWasteful(20, "%s", named);
    }

    @ParameterizedTest
    @MethodSource("functions")
    void functionsOverWideBallsAreWithinTheirRadiiSeed62(Named named) {
        Random random = new Random(62);
        BoundSamples samples = new BoundSamples();
        for (int bits : PRECISIONS) {
            for (int i = 0; i < 15; i++) {
                Ball x = point(named, random);
                Ball wide = x.addError(Magnitude.powerOfTwo(-6 - random.nextInt(bits)));
                Ball end = Ball.of(random.nextBoolean() ? wide.lower() : wide.upper(), 6 * bits);
                samples.add(named.function.apply(wide, bits), named.function.apply(end, 3 * bits),
                        "%s over %s, %d bits", named, wide, bits);
            }
        }
        samples.assertNotWasteful(20, "%s", named);
    }

    static Stream<Named> ofIntegers() {
        return Stream.of(
                new Named("pi", 1, 1, (x, bits) -> BallFunctions.pi(bits)),
                new Named("Euler's constant", 1, 1, (x, bits) -> BallFunctions.eulerGamma(bits)),
                new Named("ln n", 2, 40, (x, bits) -> BallFunctions.lnOf(x.midpoint().numerator(), bits)),
                new Named("zeta(n)", 2, 60, (x, bits) -> BallFunctions.zeta(x.midpoint().intValueExact(), bits)),
                new Named("zeta table", 2, 60, (x, bits) -> BallFunctions.zetaTable(60, bits)[x.midpoint().intValueExact()]),
                new Named("alternating sums", 2, 31, (x, bits) ->
                        ZetaFunctions.alternatingSums(x.midpoint().intValueExact(), 31, bits / 2, bits + 9)[0]),
                new Named("sin(pi/n)", 7, 40, (x, bits) -> BallFunctions.sinPi(x.midpoint().inverse(), bits)),
                new Named("cos(pi/n)", 7, 40, (x, bits) -> BallFunctions.cosPi(x.midpoint().inverse(), bits)),
                new Named("Li_2(1/n)", 2, 40, (x, bits) -> BallFunctions.dilog(x.midpoint().inverse(), bits)),
                new Named("Li_n(-1/2)", 1, 9, (x, bits) ->
                        BallFunctions.polylog(x.midpoint().intValueExact(), Rational.of(-1, 2), bits)));
    }

    @ParameterizedTest
    @MethodSource("ofIntegers")
    void constantsAndFunctionsOfIntegersAreWithinTheirRadii(Named named) {
        BoundSamples samples = new BoundSamples();
        for (int n = (int) named.lowest; n <= named.highest; n++) {
            for (int bits = 24; bits < 250; bits += named.highest > 1 ? 107 : 7) {
                Ball x = Ball.of(n);
                Ball finer = named.function.apply(x, 3 * bits);
                samples.add(named.function.apply(x, bits), finer, "%s, %d, %d bits", named, n, bits);
            }
        }
        samples.assertNotWasteful(20, "%s", named);
    }

    /** Euler's and Maclaurin's formula is the referee of Bernoulli numbers and Borwein's sum. */
    @Test
    void everyZetaValueOfANewTableIsWithinItsRadius() {
        for (int bits : new int[] {40, 150, 400}) {
            BoundSamples samples = new BoundSamples();
            Ball[] table = ZetaFunctions.freshTable(70, bits);
            Ball[] finer = BallFunctions.hurwitzZetaTable(Ball.ONE, 70, 3 * bits);
            for (int k = 2; k <= 70; k++) {
                samples.add(table[k], finer[k], "zeta(%d), %d bits", k, bits);
                assertThat(table[k].radius()).as("zeta(%d), %d bits", k, bits).isLessThan(Magnitude.powerOfTwo(-bits - 2));
            }
            samples.assertNotWasteful(60, "zeta table, %d bits", bits);
        }
    }

    @Test
    void arithmeticIsWithinItsRadiiSeed63() {
        RandomBalls source = new RandomBalls(63);
        BoundSamples sums = new BoundSamples();
        BoundSamples products = new BoundSamples();
        BoundSamples quotients = new BoundSamples();
        BoundSamples powers = new BoundSamples();
        for (int i = 0; i < 600; i++) {
            Ball a = source.withoutZero();
            Ball b = source.withoutZero();
            int bits = 10 + source.random().nextInt(60);
            int n = source.random().nextInt(25) - 12;
            // exact results at the ends of the balls: 3000 bits hold all but the quotients
            Ball x = Ball.of(source.random().nextBoolean() ? a.lower() : a.upper(), 3_000);
            Ball y = Ball.of(source.random().nextBoolean() ? b.lower() : b.upper(), 3_000);
            sums.add(a.add(b, bits), x.add(y, 3_000), "%s + %s", a, b);
            products.add(a.multiply(b, bits), x.multiply(y, 3_000), "%s * %s", a, b);
            quotients.add(a.divide(b, bits), x.divide(y, 3_000), "%s / %s", a, b);
            powers.add(a.power(n, bits), x.power(n, 3_000), "(%s)^%d", a, n);
        }
        sums.assertNotWasteful(300, "sums");
        products.assertNotWasteful(300, "products");
        quotients.assertNotWasteful(300, "quotients");
        powers.assertNotWasteful(300, "powers");
    }

    @Test
    void ballsOfExactConstantsAreWithinTheirRadiiSeed64() {
        RandomConstants source = new RandomConstants(64);
        BoundSamples samples = new BoundSamples();
        for (int i = 0; i < 150; i++) {
            ExactConstant constant = source.any();
            int bits = 30 + 3 * i;
            samples.add(constant.toBall(bits), constant.toBall(3 * bits), "%s, %d bits", constant, bits);
        }
        samples.assertNotWasteful(90, "exact constants");
    }

    @Test
    void medianAndBoundOfSamplesSeeWhatIsWrong() {
        BoundSamples samples = new BoundSamples();
        Ball one = Ball.ONE.addError(Magnitude.powerOfTwo(-10));
        for (int k = 10; k < 60; k++) {
            samples.add(one, Ball.ONE.add(Rational.TWO.power(-k), 100), "k = %d", k);
        }
        Ball outside = Ball.ONE.add(Rational.TWO.power(-9), 100);
        assertThatThrownBy(() -> samples.add(one, outside, "outside")).isInstanceOf(AssertionError.class);
        assertThat(samples.count()).isEqualTo(50);
        assertThat(samples.median()).isBetween(24.9, 25.1);
        assertThatThrownBy(() -> samples.assertNotWasteful(50, "wasteful"))
                .isInstanceOf(AssertionError.class);
    }
}
