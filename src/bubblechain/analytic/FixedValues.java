package bubblechain.analytic;

import bubblechain.exact.Ball;
import bubblechain.series.FixedSeries;
import java.math.BigInteger;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;

/** Coefficients given as balls, gathered into a fixed-point series. */
public final class FixedValues {
    private final List<BigInteger> values;
    private final double[] errors;
    private final int limbs;

    public FixedValues(int length, int limbs) {
        this.values = new ArrayList<>(Collections.nCopies(length, BigInteger.ZERO));
        this.errors = new double[length];
        this.limbs = limbs;
    }

    public void set(int k, Ball ball) {
        int bits = FixedSeries.bits(limbs);
        values.set(k, ball.scaledMidpoint(bits));
        errors[k] = ball.radius().scale(bits).toDouble() + 1;
    }

    /** A coefficient that is zero within so many units of the last place. */
    void setZero(int k, double error) {
        errors[k] = error;
    }

    /** The series. */
    public FixedSeries series() {
        return FixedSeries.of(values, errors, limbs);
    }
}
