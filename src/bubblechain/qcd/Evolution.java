package bubblechain.qcd;

import bubblechain.exact.PrecisionException;
import org.apache.commons.math3.analysis.UnivariateFunction;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegrator;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;
import org.apache.commons.math3.exception.MathIllegalStateException;
import org.apache.commons.math3.exception.NumberIsTooSmallException;
import org.apache.commons.math3.ode.FirstOrderDifferentialEquations;
import org.apache.commons.math3.ode.nonstiff.DormandPrince853Integrator;

/**
 * The renormalisation group equations in doubles. With v = 1/y = 4 pi/alpha_s and s = ln mu,
 * dv/ds = 2 sum_k beta_k v^(-k) and d ln m/ds = -2 sum_k gamma_k v^(-k-1): v is linear in s up to logarithms.
 */
final class Evolution {
    /** Relative tolerance of a step; the rounding of a double is 1.1e-16. */
    private static final double STEP_TOLERANCE = 1e-14;
    /** Absolute tolerance of a step; v is above 4, ln m below some units. */
    private static final double ABSOLUTE_TOLERANCE = 1e-15;

    private static final double SMALLEST_STEP = 1e-10;
    private static final double QUADRATURE_TOLERANCE = 3e-14;
    private static final int QUADRATURE_POINTS = 20;
    private static final int MOST_BISECTIONS = 50;
    private static final int MOST_EVALUATIONS = 2_000_000;

    private static final GaussIntegrator GAUSS = new GaussIntegratorFactory().legendre(QUADRATURE_POINTS);

    private final double[] beta;
    private final double[] gamma;

    /** @param gamma empty if no mass is asked for */
    Evolution(double[] beta, double[] gamma) {
        this.beta = beta.clone();
        this.gamma = gamma.clone();
    }

    /** sum_k beta_k y^k. */
    double polynomial(double y) {
        return horner(beta, y);
    }

    private static double horner(double[] coefficients, double y) {
        double sum = 0;
        for (int k = coefficients.length - 1; k >= 0; k--) {
            sum = sum * y + coefficients[k];
        }
        return sum;
    }

    /**
     * {v, ln(m/m0)} after a change of ln mu.
     *
     * @param v    at the start
     * @param step ln(mu/mu0)
     * @throws PrecisionException if the tolerance cannot be met
     */
    double[] run(double v, double step) {
        double[] state = {v, 0};
        if (step == 0) {
            return state;
        }
        DormandPrince853Integrator integrator = new DormandPrince853Integrator(
                Math.min(SMALLEST_STEP, Math.abs(step) / 2), Math.abs(step), ABSOLUTE_TOLERANCE, STEP_TOLERANCE);
        integrator.setMaxEvaluations(MOST_EVALUATIONS);
        try {
            integrator.integrate(new Flow(), 0, state, step, state);
        } catch (NumberIsTooSmallException | MathIllegalStateException e) {
            throw new PrecisionException("the running over a factor " + Numbers.shown(Math.exp(step))
                    + " in the scale could not be integrated to " + STEP_TOLERANCE + " (" + e.getMessage() + ")");
        }
        return state;
    }

    /** -d ln m/d ln mu. */
    double decrease(double v) {
        return 2 * horner(gamma, 1 / v) / v;
    }

    /** ln(mu/mu0) over which v changes from one value to another: int dv/(2 sum_k beta_k v^(-k)), regular at v = 0. */
    double distance(double from, double to) {
        int last = beta.length - 1;
        double[] reversed = new double[beta.length];
        for (int k = 0; k <= last; k++) {
            reversed[k] = beta[last - k];
        }
        return integral(v -> Math.pow(v, last) / (2 * horner(reversed, v)), from, to);
    }

    /**
     * What the exact flow adds to ln(mu/Lambda) beyond its first two terms:
     * int_0^y dx [-1/(2 x^2 P) + 1/(2 beta0 x^2) - b/x], P = sum beta_k x^k, b = beta_1/(2 beta_0^2), as
     * int_0^y dx [beta0 R - beta1^2 - beta1 x R]/(2 beta0^2 P), P = beta0 + beta1 x + x^2 R.
     */
    double beyondTwoTerms(double y) {
        if (beta.length == 1) {
            return 0;
        }
        double first = beta[0];
        double second = beta[1];
        double[] rest = new double[beta.length - 2];
        System.arraycopy(beta, 2, rest, 0, rest.length);
        return integral(
                x -> {
                    double r = horner(rest, x);
                    return (first * r - second * second - second * x * r) / (2 * first * first * polynomial(x));
                },
                0,
                y);
    }

    private static double integral(UnivariateFunction f, double from, double to) {
        return from == to ? 0 : bisected(f, from, to, gauss(f, from, to), MOST_BISECTIONS);
    }

    private static double gauss(UnivariateFunction f, double from, double to) {
        double half = (to - from) / 2;
        double middle = from + half;
        return half * GAUSS.integrate(t -> f.value(middle + half * t));
    }

    /** Gauss-Legendre, halving the interval until the value of the halves is that of the whole up to rounding. */
    private static double bisected(UnivariateFunction f, double from, double to, double whole, int depth) {
        double middle = from + (to - from) / 2;
        double left = gauss(f, from, middle);
        double right = gauss(f, middle, to);
        double sum = left + right;
        if (Math.abs(sum - whole) <= QUADRATURE_TOLERANCE * (Math.abs(left) + Math.abs(right))) {
            return sum;
        }
        if (depth == 0) {
            throw new PrecisionException("an integral over the beta function did not reach " + QUADRATURE_TOLERANCE
                    + "; the coupling is too near to a zero of the beta function");
        }
        return bisected(f, from, middle, left, depth - 1) + bisected(f, middle, to, right, depth - 1);
    }

    /** The two equations. */
    private final class Flow implements FirstOrderDifferentialEquations {
        @Override
        public int getDimension() {
            return 2;
        }

        @Override
        public void computeDerivatives(double s, double[] state, double[] derivative) {
            derivative[0] = 2 * polynomial(1 / state[0]);
            derivative[1] = -decrease(state[0]);
        }
    }
}
