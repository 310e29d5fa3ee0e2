package bubblechain.sumrule;

/**
 * The parts of the error of a sum-rule value, each at least 0; good to about two digits.
 *
 * @param scale    half the spread over the scale factors
 * @param lastStep size of the last term, |K_k - K_{k-1}|; |K_0| at one loop
 * @param input    input errors of the coefficients, in quadrature
 * @param beta     shift from dropping the highest beta coefficient used; 0 with one-loop running
 */
public record ErrorBudget(double scale, double lastStep, double input, double beta) {
    /** sqrt(max(scale, lastStep)^2 + input^2 + beta^2). */
    public double combined() {
        double truncation = Math.max(scale, lastStep);
        return Math.sqrt(truncation * truncation + input * input + beta * beta);
    }

    /** The error E of the null test: max(scale, lastStep, input). */
    public double forNullTest() {
        return Math.max(Math.max(scale, lastStep), input);
    }

    /** Every part times |factor|. */
    public ErrorBudget times(double factor) {
        double f = Math.abs(factor);
        return new ErrorBudget(scale * f, lastStep * f, input * f, beta * f);
    }
}
