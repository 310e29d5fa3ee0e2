package bubblechain.series;

import bubblechain.exact.Ball;
import bubblechain.exact.BallFunctions;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.exact.UnitHypergeometric;
import java.math.BigInteger;
import java.util.HashMap;
import java.util.Map;
import java.util.Optional;

/** Balls at one working precision. */
public final class BallRing implements CoefficientRing<Ball> {
    private final int bits;
    private final int largestOrder;
    private final Map<Rational, Ball[]> hurwitzTables = new HashMap<>();

    private final Map<Rational, Ball[]> unit3f2Tables = new HashMap<>();

    private BallRing(int bits, int largestOrder) {
        this.bits = bits;
        this.largestOrder = Math.max(largestOrder, 2);
    }

    /**
     * @param bits         working precision
     * @param largestOrder order up to which zeta values will be wanted
     */
    public static BallRing of(int bits, int largestOrder) {
        return new BallRing(bits, largestOrder);
    }

    public int bits() {
        return bits;
    }

    @Override
    public Ball constant(ExactConstant value) {
        return value.toBall(bits);
    }

    @Override
    public Ball constant(Rational value) {
        return Ball.of(value, bits);
    }

    @Override
    public Ball add(Ball left, Ball right) {
        return left.add(right, bits);
    }

    @Override
    public Ball negate(Ball value) {
        return value.negate();
    }

    @Override
    public Ball multiply(Ball left, Ball right) {
        return left.multiply(right, bits);
    }

    @Override
    public Ball multiply(Ball value, Rational factor) {
        return value.multiply(factor, bits);
    }

    @Override
    public Ball inverse(Ball value) {
        return Ball.ONE.divide(value, bits);
    }

    @Override
    public boolean isZero(Ball value) {
        return value.isZero();
    }

    @Override
    public Optional<Integer> asInteger(Ball value) {
        if (!value.isExact()) {
            return Optional.empty();
        }
        Rational midpoint = value.midpoint();
        boolean small = midpoint.isInteger() && midpoint.numerator().bitLength() < Integer.SIZE - 1;
        return small ? Optional.of(midpoint.intValueExact()) : Optional.empty();
    }

    @Override
    public Ball exp(Ball value) {
        return BallFunctions.exp(value, bits);
    }

    @Override
    public Ball ln(Ball value) {
        return BallFunctions.ln(value, bits);
    }

    @Override
    public Ball sin(Ball value) {
        return BallFunctions.sin(value, bits);
    }

    @Override
    public Ball cos(Ball value) {
        return BallFunctions.cos(value, bits);
    }

    @Override
    public Ball gamma(Ball value) {
        return BallFunctions.gamma(value, bits);
    }

    @Override
    public Ball polygamma(int n, Ball value) {
        return n == 0 ? BallFunctions.digamma(value, bits) : BallFunctions.polygamma(n, value, bits);
    }

    @Override
    public Ball hurwitz(int k, Rational s) {
        if (s.equals(Rational.ONE) || s.equals(Rational.HALF)) {
            Ball zeta = k <= largestOrder ? table(Rational.ONE)[k] : BallFunctions.zeta(k, bits);
            // zeta(k, 1/2) = (2^k - 1) zeta(k)
            BigInteger factor = BigInteger.ONE.shiftLeft(k).subtract(BigInteger.ONE);
            return s.equals(Rational.ONE) ? zeta : zeta.multiply(Rational.of(factor), bits);
        }
        return k <= largestOrder ? table(s)[k] : BallFunctions.hurwitzZeta(k, Ball.of(s, bits + 8), bits);
    }

    @Override
    public Ball unit3f2(int k, Rational s) {
        Ball[] known = unit3f2Tables.get(s);
        if (known == null || known.length <= k) {
            // the k-th coefficient is known relative to 2^k
            known = UnitHypergeometric.taylor(s, Math.max(k, largestOrder) + 1, bits);
            unit3f2Tables.put(s, known);
        }
        return known[k];
    }

    private Ball[] table(Rational s) {
        return hurwitzTables.computeIfAbsent(s, key -> key.equals(Rational.ONE)
                ? BallFunctions.zetaTable(largestOrder, bits)
                : BallFunctions.hurwitzZetaTable(Ball.of(key, bits + 8), largestOrder, bits));
    }
}
