package bubblechain.sumrule;

import bubblechain.exact.DomainException;
import bubblechain.exact.Rational;
import bubblechain.qcd.BetaFunction;
import bubblechain.series.CoefficientRing;
import bubblechain.series.CoefficientwiseAlgebra;
import bubblechain.series.LaurentSeries;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;

/**
 * The recursion behind the sum rule, for one power p, exponent shift delta and beta function: from a_1 .. a_N to
 * S_0 .. S_{N-1} and back, and the shape of the large orders. Formulas and derivation in the package comment.
 *
 * @param <C> the numbers: exact constants or balls
 * @implNote O(N^2) operations of the ring per call
 */
public final class ScaleEvolution<C> {
    private final CoefficientRing<C> ring;
    private final CoefficientwiseAlgebra<C> algebra;
    private final BetaFunction beta;
    private final Rational p;
    private final Rational delta;
    private final int length;
    /** 1 + C_1 y + C_2 y^2 + ... */
    private final LaurentSeries<C> corrections;
    /** sum_k g_k z^k = 1/sum_k (beta_k/beta_0) (z/2beta0)^k. */
    private final LaurentSeries<C> flow;
    /** sum_{k>=2} g_k z^(k-1)/(k-1). */
    private final LaurentSeries<C> exponent;

    private ScaleEvolution(
            CoefficientRing<C> ring, BetaFunction beta, Rational p, Rational delta, List<C> corrections, int length) {
        this.ring = ring;
        this.algebra = CoefficientwiseAlgebra.of(ring, length + 1);
        this.beta = beta;
        this.p = p;
        this.delta = delta;
        this.length = length;
        this.corrections = correctionSeries(corrections);
        this.flow = algebra.inverse(algebra.series(0, runningSeries()));
        this.exponent = exponentSeries();
    }

    /**
     * @param ring        where to compute
     * @param beta        running; missing coefficients are zero
     * @param p           twice the position of the singularity, not 0
     * @param delta       shift of the exponent
     * @param corrections C_1, C_2, ... of the power correction; missing ones are zero
     * @param length      largest number of coefficients N, at least 1
     * @throws DomainException if p is 0, or 1 + nu is 0, -1, -2, ..., where the singularity is no power
     */
    public static <C> ScaleEvolution<C> of(
            CoefficientRing<C> ring, BetaFunction beta, Rational p, Rational delta, List<C> corrections, int length) {
        if (p.isZero()) {
            throw new DomainException("the power p = 2 u0 of a singularity cannot be 0; give p > 0 (infrared) or p < 0"
                    + " (ultraviolet)");
        }
        if (length < 1) {
            throw new DomainException("the sum rule needs at least one coefficient, got " + length);
        }
        ScaleEvolution<C> evolution = new ScaleEvolution<>(ring, beta, p, delta, corrections, length);
        Rational top = evolution.nu().add(1);
        if (top.isInteger() && top.signum() <= 0) {
            throw new DomainException("the exponent 1 + b + delta = " + top + " is not positive: (1-2u/p)^(" + top.negate()
                    + ") is no singularity; change the exponent shift " + delta);
        }
        return evolution;
    }

    /** nu = b + delta, b = p beta1/(2 beta0^2): the singularity is (1 - 2u/p)^(-1-nu). */
    public Rational nu() {
        return p.multiply(beta.b1hat()).add(delta);
    }

    private LaurentSeries<C> correctionSeries(List<C> given) {
        List<C> list = new ArrayList<>(Collections.nCopies(length + 1, ring.constant(Rational.ZERO)));
        list.set(0, ring.constant(Rational.ONE));
        for (int k = 1; k <= Math.min(length, given.size()); k++) {
            list.set(k, given.get(k - 1));
        }
        return algebra.series(0, list);
    }

    private List<C> runningSeries() {
        List<C> running = new ArrayList<>();
        for (int k = 0; k <= length; k++) {
            C ratio = ring.multiply(ring.constant(beta.beta(k)), beta.beta0().inverse());
            running.add(ring.multiply(ratio, twoBeta0().power(-k)));
        }
        return running;
    }

    private LaurentSeries<C> exponentSeries() {
        List<C> terms = new ArrayList<>();
        terms.add(ring.constant(Rational.ZERO));
        for (int k = 2; k <= length; k++) {
            terms.add(ring.multiply(algebra.coefficient(flow, k), Rational.of(1, k - 1L)));
        }
        return algebra.series(0, terms);
    }

    private Rational twoBeta0() {
        return beta.beta0().multiply(2);
    }

    /** S_0, S_1, ...: one for every coefficient given. @param coefficients a_1, a_2, ... of y, y^2, ... */
    public List<C> terms(List<C> coefficients) {
        int n = coefficients.size();
        LaurentSeries<C> reduced = algebra.multiply(algebra.series(1, coefficients), algebra.inverse(corrections));
        List<C> slopes = new ArrayList<>();
        for (int k = 0; k < n; k++) {
            C slope = ring.multiply(algebra.coefficient(reduced, k + 1), p);
            slope = ring.add(slope, ring.negate(running(reduced, k)));
            slopes.add(ring.multiply(slope, twoBeta0().power(-k - 1)));
        }
        LaurentSeries<C> result = algebra.multiply(kernel(), algebra.series(0, slopes));
        return list(result, n);
    }

    /** 2 sum_{j=0}^{k-1} (k-j+delta) beta_j A_{k-j}. */
    private C running(LaurentSeries<C> reduced, int k) {
        C sum = ring.constant(Rational.ZERO);
        for (int j = 0; j < Math.min(k, beta.loops()); j++) {
            C product = ring.multiply(ring.constant(beta.beta(j)), algebra.coefficient(reduced, k - j));
            sum = ring.add(sum, ring.multiply(product, delta.add(k - j).multiply(2)));
        }
        return sum;
    }

    /** [sum g_k z^k] exp(-p sum g_k z^(k-1)/(k-1)). */
    private LaurentSeries<C> kernel() {
        return algebra.multiply(flow, algebra.exp(algebra.multiply(exponent, p.negate())));
    }

    private List<C> list(LaurentSeries<C> series, int count) {
        List<C> result = new ArrayList<>();
        for (int k = 0; k < count; k++) {
            result.add(algebra.coefficient(series, k));
        }
        return result;
    }

    /**
     * The inverse of {@link #terms}: a_1 .. a_n with n up to the length, from S_0, S_1, ...; missing S_k are zero.
     *
     * @param terms S_0, S_1, ...
     * @param count n
     */
    public List<C> coefficients(List<C> terms, int count) {
        List<C> padded = new ArrayList<>(terms.subList(0, Math.min(count, terms.size())));
        padded.addAll(Collections.nCopies(count - padded.size(), ring.constant(Rational.ZERO)));
        LaurentSeries<C> slopes = algebra.multiply(algebra.inverse(kernel()), algebra.series(0, padded));
        List<C> reduced = new ArrayList<>();
        for (int k = 0; k < count; k++) {
            C slope = ring.multiply(algebra.coefficient(slopes, k), twoBeta0().power(k + 1));
            C sum = ring.add(slope, running(algebra.series(1, reduced), k));
            reduced.add(ring.multiply(sum, p.inverse()));
        }
        return list(algebra.multiply(algebra.series(1, reduced), corrections), count + 1).subList(1, count + 1);
    }

    /** The partial sums K_0, K_1, ... of the strength. @param terms S_0, S_1, ... */
    public List<C> strengths(List<C> terms) {
        List<C> sums = new ArrayList<>();
        C sum = ring.constant(Rational.ZERO);
        Rational weight = Rational.TWO.divide(p);
        for (int k = 0; k < terms.size(); k++) {
            if (k > 0) {
                weight = weight.multiply(p).divide(nu().add(k));
            }
            sum = ring.add(sum, ring.multiply(terms.get(k), weight));
            sums.add(sum);
        }
        return sums;
    }

    /**
     * E_0 = 1, E_1, ...: the relative weights of the non-leading parts of the singularity,
     * sum_l E_l z^l = exp(p sum_{k>=2} g_k z^(k-1)/(k-1)) (1 + C_1 y + ...), y = z/(2 beta0). E_l needs beta_{l+1}.
     *
     * @param count how many, at most the length
     */
    public List<C> shape(int count) {
        List<C> inZ = new ArrayList<>();
        for (int k = 0; k < length; k++) {
            inZ.add(ring.multiply(algebra.coefficient(corrections, k), twoBeta0().power(-k)));
        }
        LaurentSeries<C> growth = algebra.exp(algebra.multiply(exponent, p));
        return list(algebra.multiply(growth, algebra.series(0, inZ)), count);
    }

    /**
     * The coefficient a_{n+1} that a singularity of strength 1 would give,
     * beta0^(n+1) (2/p)^n sum_{l=0}^{L} E_l p^l Gamma(n+1+nu-l)/Gamma(1+nu).
     *
     * @param n     at least 0, below the length
     * @param depth L, reduced to n if larger
     */
    public C asymptotic(int n, int depth) {
        int last = Math.min(n, depth);
        List<C> weights = shape(last + 1);
        C sum = ring.constant(Rational.ZERO);
        for (int l = 0; l <= last; l++) {
            sum = ring.add(sum, ring.multiply(weights.get(l), p.power(l).multiply(rising(n - l))));
        }
        return ring.multiply(sum, beta.beta0().power(n + 1).multiply(Rational.TWO.divide(p).power(n)));
    }

    /** Gamma(1+nu+m)/Gamma(1+nu). */
    private Rational rising(int m) {
        Rational product = Rational.ONE;
        for (int k = 1; k <= m; k++) {
            product = product.multiply(nu().add(k));
        }
        return product;
    }

    /**
     * The truncated residue: partial sums, at u = p/2, of (1 - 2u/p)^(1+nu) B(u) expanded in u.
     * T. Lee, hep-th/9611010; A. Pineda, hep-ph/0105008.
     */
    public List<C> truncatedResidues(List<C> coefficients) {
        int n = coefficients.size();
        List<C> transform = new ArrayList<>();
        List<C> power = new ArrayList<>();
        Rational weight = beta.beta0().inverse();
        Rational binomial = Rational.ONE;
        for (int k = 0; k < n; k++) {
            if (k > 0) {
                weight = weight.multiply(p).divide(beta.beta0()).divide(2L * k);
                binomial = binomial.multiply(Rational.of(k - 2L).subtract(nu())).divide(k);
            }
            transform.add(ring.multiply(coefficients.get(k), weight));
            power.add(ring.constant(binomial));
        }
        LaurentSeries<C> product = algebra.multiply(algebra.series(0, power), algebra.series(0, transform));
        List<C> sums = new ArrayList<>();
        C sum = ring.constant(Rational.ZERO);
        for (int k = 0; k < n; k++) {
            sum = ring.add(sum, algebra.coefficient(product, k));
            sums.add(sum);
        }
        return sums;
    }
}
