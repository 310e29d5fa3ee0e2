package bubblechain.exact;

import java.util.List;
import java.util.Random;

/** Seeded sums of products of every kind of factor a constant can have. */
public final class RandomConstants {
    private static final List<ExactConstant> CLOSED = List.of(
            ExactConstant.PI,
            ExactConstant.SQRT_PI,
            ExactConstant.SQRT_PI.inverse(),
            ExactConstant.EULER_GAMMA,
            ExactFunctions.zeta(3),
            ExactFunctions.zeta(5),
            ExactFunctions.ln(Rational.of(6)),
            ExactFunctions.ln(Rational.of(10, 7)),
            ExactFunctions.power(Rational.of(12), Rational.HALF),
            ExactFunctions.power(Rational.TWO, Rational.of(-2, 3)),
            ExactConstant.of(Rational.of(5, 3)).exp(),
            ExactConstant.EULER_GAMMA.multiply(Rational.of(-2)).exp());
    private static final List<ExactConstant> OPAQUE = List.of(
            ExactFunctions.gamma(Rational.of(1, 4)),
            ExactFunctions.gamma(Rational.of(-7, 3)),
            ExactFunctions.digamma(Rational.of(2, 3)),
            ExactFunctions.hurwitz(3, Rational.of(1, 5)),
            ExactFunctions.sinPi(Rational.of(1, 5)),
            ExactConstant.ONE.add(ExactConstant.EULER_GAMMA).inverse(),
            ExactConstant.PI.exp(),
            ExactConstant.PI.ln(),
            ExactConstant.PI.add(ExactConstant.ONE).ln());

    private final Random random;

    public RandomConstants(int seed) {
        random = new Random(seed);
    }

    public Rational rational() {
        return Rational.of(random.nextInt(41) - 20, 1 + random.nextInt(12));
    }

    /** A product without opaque factors. */
    public ExactConstant closedProduct() {
        ExactConstant product = ExactConstant.of(rational());
        for (int k = random.nextInt(4); k > 0; k--) {
            product = product.multiply(CLOSED.get(random.nextInt(CLOSED.size())));
        }
        return product;
    }

    public ExactConstant closed() {
        ExactConstant sum = ExactConstant.ZERO;
        for (int k = random.nextInt(4); k > 0; k--) {
            sum = sum.add(closedProduct());
        }
        return sum;
    }

    public ExactConstant any() {
        ExactConstant opaque = OPAQUE.get(random.nextInt(OPAQUE.size())).power(random.nextInt(3));
        return random.nextInt(3) == 0 ? closed() : closed().add(closedProduct().multiply(opaque));
    }
}
