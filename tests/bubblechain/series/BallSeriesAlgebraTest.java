package bubblechain.series;

import bubblechain.exact.Ball;

class BallSeriesAlgebraTest extends SeriesAlgebraLaws<Ball> {
    private static final int BITS = 200;

    @Override
    CoefficientRing<Ball> ring() {
        return BallRing.of(BITS, 12);
    }

    /** Both hold the true number, to at least a third of the working precision. */
    @Override
    boolean agree(Ball left, Ball right) {
        return left.overlaps(right) && left.radiusAsDouble() < 1e-20 && right.radiusAsDouble() < 1e-20;
    }
}
