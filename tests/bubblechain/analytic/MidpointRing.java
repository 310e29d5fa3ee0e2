package bubblechain.analytic;

import bubblechain.exact.Ball;
import bubblechain.exact.ExactConstant;
import bubblechain.exact.Rational;
import bubblechain.series.BallRing;
import bubblechain.series.CoefficientRing;
import java.util.Optional;

/** Balls whose radius is lost after every operation: what a fault in the error bounds would look like. */
final class MidpointRing implements CoefficientRing<Ball> {
    private final BallRing ring;

    MidpointRing(BallRing ring) {
        this.ring = ring;
    }

    @Override
    public Ball constant(ExactConstant value) {
        return ring.constant(value).center();
    }

    @Override
    public Ball constant(Rational value) {
        return ring.constant(value).center();
    }

    @Override
    public Ball add(Ball left, Ball right) {
        return ring.add(left, right).center();
    }

    @Override
    public Ball negate(Ball value) {
        return ring.negate(value).center();
    }

    @Override
    public Ball multiply(Ball left, Ball right) {
        return ring.multiply(left, right).center();
    }

    @Override
    public Ball multiply(Ball value, Rational factor) {
        return ring.multiply(value, factor).center();
    }

    @Override
    public Ball inverse(Ball value) {
        return ring.inverse(value).center();
    }

    @Override
    public boolean isZero(Ball value) {
        return ring.isZero(value);
    }

    @Override
    public Optional<Integer> asInteger(Ball value) {
        return ring.asInteger(value);
    }

    @Override
    public Ball exp(Ball value) {
        return ring.exp(value).center();
    }

    @Override
    public Ball ln(Ball value) {
        return ring.ln(value).center();
    }

    @Override
    public Ball sin(Ball value) {
        return ring.sin(value).center();
    }

    @Override
    public Ball cos(Ball value) {
        return ring.cos(value).center();
    }

    @Override
    public Ball gamma(Ball value) {
        return ring.gamma(value).center();
    }

    @Override
    public Ball polygamma(int n, Ball value) {
        return ring.polygamma(n, value).center();
    }

    @Override
    public Ball hurwitz(int k, Rational s) {
        return ring.hurwitz(k, s).center();
    }

    @Override
    public Ball unit3f2(int k, Rational s) {
        return ring.unit3f2(k, s).center();
    }
}
