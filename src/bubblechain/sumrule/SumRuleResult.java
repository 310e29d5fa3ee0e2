package bubblechain.sumrule;

import bubblechain.exact.Ball;
import bubblechain.exact.DomainException;
import java.util.List;
import java.util.Optional;

/**
 * The answer of the sum rule. Lists hold one entry per order, entry 0 from one loop. Balls bound rounding only; the
 * truncation is in {@link #errors}.
 *
 * @param request           what was asked
 * @param bareStrengths     K_k without the prefactor
 * @param strengths         K_k with the prefactor
 * @param normalisations    N_k = beta0 K_k/(4 pi)
 * @param ambiguities       P_k = (p/2) p^nu K_k/Gamma(1+nu), |Im f|/pi = P Lambda_t^p z^(-delta); empty for p &lt; 0
 * @param inputErrors       propagated input error of K_k
 * @param scan              bare strengths for every scale factor
 * @param errors            error budget of the last K
 * @param ratios            second estimator, with the prefactor: a_n over the large-order formula for K = 1; an entry is
 *                          empty where that formula vanishes
 * @param truncatedResidues third estimator, with the prefactor: truncated residue of (1-2u/p)^(1+nu) B(u)
 * @param unblockedVerdict  verdict of the null test alone
 * @param blockedBy         singularities that stand in the way
 */
public record SumRuleResult(
        SumRuleRequest request,
        List<Ball> bareStrengths,
        List<Ball> strengths,
        List<Ball> normalisations,
        List<Ball> ambiguities,
        List<Double> inputErrors,
        List<ScanPoint> scan,
        ErrorBudget errors,
        List<Optional<Ball>> ratios,
        List<Ball> truncatedResidues,
        Verdict unblockedVerdict,
        List<BlockedBy> blockedBy) {
    private static final int BITS = 128;

    public SumRuleResult {
        bareStrengths = List.copyOf(bareStrengths);
        strengths = List.copyOf(strengths);
        normalisations = List.copyOf(normalisations);
        ambiguities = List.copyOf(ambiguities);
        inputErrors = List.copyOf(inputErrors);
        scan = List.copyOf(scan);
        ratios = List.copyOf(ratios);
        truncatedResidues = List.copyOf(truncatedResidues);
        blockedBy = List.copyOf(blockedBy);
    }

    /** Number of orders. */
    public int loops() {
        return strengths.size();
    }

    /** K from the first {@code loops} coefficients, prefactor included. */
    public Ball strength(int loops) {
        return entry(strengths, loops);
    }

    /** K without the prefactor. */
    public Ball bareStrength(int loops) {
        return entry(bareStrengths, loops);
    }

    /** N = beta0 K/(4 pi). */
    public Ball normalisation(int loops) {
        return entry(normalisations, loops);
    }

    /** P, the coefficient of the ambiguity; empty for p &lt; 0. */
    public Optional<Ball> ambiguity(int loops) {
        return ambiguities.isEmpty() ? Optional.empty() : Optional.of(entry(ambiguities, loops));
    }

    /** R_u = -u0 K, prefactor not included; only for a simple pole of a bubble chain. */
    public Optional<Ball> laurentResidue(int loops) {
        return request.isSimplePole()
                ? Optional.of(bareStrength(loops).multiply(request.position().negate(), BITS))
                : Optional.empty();
    }

    /** Error budget of the last N. */
    public ErrorBudget normalisationErrors() {
        return errors.times(normalisationPerStrength());
    }

    /** Error budget of the last P; empty for p &lt; 0. */
    public Optional<ErrorBudget> ambiguityErrors() {
        return ambiguity(loops()).map(p -> errors.times(ambiguityPerStrength()));
    }

    /** N/K = beta0/(4 pi). */
    public double normalisationPerStrength() {
        return request.beta().beta0().toDouble() / (4 * Math.PI);
    }

    private double ambiguityPerStrength() {
        return SumRule.ambiguityPerStrength(request).toDouble();
    }

    /** The verdict: "cannot tell" if a singularity stands in the way. */
    public Verdict verdict() {
        return blockedBy.isEmpty() ? unblockedVerdict : Verdict.CANNOT_TELL;
    }

    private static <T> T entry(List<T> list, int loops) {
        if (loops < 1 || loops > list.size()) {
            throw new DomainException("orders 1 to " + list.size() + " are known, got " + loops);
        }
        return list.get(loops - 1);
    }
}
