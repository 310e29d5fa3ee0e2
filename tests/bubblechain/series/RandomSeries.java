package bubblechain.series;

import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import java.util.ArrayList;
import java.util.List;
import java.util.Random;

/** Seeded series over any ring, the same for the same seed. */
final class RandomSeries<C> {
    private static final List<ExactConstant> FACTORS = List.of(
            ExactConstant.ONE,
            ExactConstant.ONE,
            ExactConstant.PI,
            ExactConstant.EULER_GAMMA,
            ExactConstant.of(Rational.of(5, 3)).exp(),
            ExactConstant.of(2).ln());

    private final CoefficientwiseAlgebra<C> algebra;
    private final Random random;

    RandomSeries(CoefficientwiseAlgebra<C> algebra, int seed) {
        this.algebra = algebra;
        random = new Random(seed);
    }

    private C coefficient() {
        Rational rational = Rational.of(random.nextInt(13) - 6, 1 + random.nextInt(5));
        return algebra.ring().constant(FACTORS.get(random.nextInt(FACTORS.size())).multiply(rational));
    }

    /** Lowest power between -3 and 3, of any length up to that of the algebra. */
    LaurentSeries<C> any() {
        return withLowest(random.nextInt(7) - 3, 1 + random.nextInt(algebra.length()));
    }

    /** A non-zero rational constant term, of any length. */
    LaurentSeries<C> unit() {
        LaurentSeries<C> tail = withLowest(1, random.nextInt(algebra.length()));
        List<C> coefficients = new ArrayList<>();
        coefficients.add(algebra.ring().constant(Rational.of(1 + random.nextInt(5), 1 + random.nextInt(3))));
        for (int k = 1; k < tail.end(); k++) {
            coefficients.add(algebra.coefficient(tail, k));
        }
        return new LaurentSeries<>(0, coefficients);
    }

    /** Without constant term. */
    LaurentSeries<C> small() {
        return withLowest(1 + random.nextInt(2), 1 + random.nextInt(algebra.length()));
    }

    private LaurentSeries<C> withLowest(int lowest, int length) {
        List<C> coefficients = new ArrayList<>();
        for (int k = 0; k < length; k++) {
            coefficients.add(random.nextInt(4) == 0 ? algebra.ring().constant(Rational.ZERO) : coefficient());
        }
        return algebra.series(lowest, coefficients);
    }
}
