/**
 * The residue of a Borel singularity from a few known coefficients: the truncated sum rule, with its error.
 *
 * <p><b>Statement.</b> Let f(R) = R^p sum_{n>=1} a_n y(R)^n, y = alpha_s/(4 pi), with Borel transform
 * B(u) = sum_{n>=0} a_{n+1} beta0^(-n-1) u^n/n!, so that f = R^p int_0^inf du e^(-u/a) B(u), a = beta0 y. A singularity
 * K (1 - 2u/p)^(-1-nu) [1 + ...] belongs to a power correction (Lambda/R)^p y^(-delta) (1 + C_1 y + ...), with
 * nu = b + delta and b = p beta1/(2 beta0^2). Then
 * <pre>
 *   K = (2/p) Gamma(1+nu) sum_{k>=0} S_k p^k / Gamma(1+nu+k)
 * </pre>
 * with S_k from a_1 .. a_{k+1} and beta_0 .. beta_{k+1}.
 *
 * <p><b>Derivation</b> (for delta = 0 the method of arXiv:0803.4214 and arXiv:0908.3189; the shift is derived here).
 * <ol>
 * <li>F = f y^delta/(1 + C_1 y + ...) = R^p y^delta sum A_n y^n has an ambiguity that does not depend on R, A_n being
 * the coefficients of (sum a_n y^n)/(1 + C_1 y + ...).
 * <li>dF/d ln R = R^p y^delta sum_k G_k y^(k+1) with
 * G_k = p A_{k+1} - 2 sum_{j=0}^{k-1} (k-j+delta) beta_j A_{k-j}, because y^(n+delta) has the derivative
 * -2 (n+delta) sum_j beta_j y^(n+delta+j+1).
 * <li>With z = 2 beta0 y one has dz/d ln R = -z^2/sum_k g_k z^k and
 * R^p = Lambda^p e^(p/z) z^b exp(-p sum_{k>=2} g_k z^(k-1)/(k-1)). Therefore, integrating along the flow to R,
 * F = -Lambda^p (2 beta0)^(-delta) int dz e^(p/z) z^(b+delta-1) sum_k S_k z^k with
 * sum S_k z^k = [sum g_k z^k] exp(-p sum_{k>=2} g_k z^(k-1)/(k-1)) [sum G_k z^k/(2 beta0)^(k+1)].
 * <li>With x = 1/z each term is Hankel's integral of x^(-1-nu-k) e^(p x), whose discontinuity is
 * 2 pi i p^(nu+k)/Gamma(1+nu+k). So |Im f|/pi = P Lambda^p z^(-delta) (1 + ...) with
 * P = p^nu sum_k S_k p^k/Gamma(1+nu+k).
 * <li>The singularity K (1 - 2u/p)^(-1-nu) gives |Im|/pi = K (p/2) (p/z)^nu e^(-p/z)/Gamma(1+nu). Equating the two
 * gives K above and P = (p/2) p^nu K/Gamma(1+nu).
 * </ol>
 * K is a rational function of p term by term, so it is continued to p &lt; 0, an ultraviolet singularity; there is then
 * no ambiguity on the positive axis and P is not given. p = 0 is refused.
 *
 * <p>Since b and delta are rational, Gamma(1+nu)/Gamma(1+nu+k) is a product of rationals: the partial sums K_0, K_1, ...
 * are exact linear combinations of the a_n. With one-loop running they telescope,
 * K_k = a_{k+1}/(beta0^(k+1) (2/p)^k (1+delta)_k).
 *
 * <p><b>Names.</b> K strength, N = beta0 K/(4 pi), P as above; R_u = -u0 K is the Laurent residue of a simple pole and
 * exists only for one-loop running and delta = 0. For a bubble chain K without its prefactor is the <em>bare</em> strength.
 *
 * <p>Read {@link bubblechain.sumrule.SumRule}, then {@link bubblechain.sumrule.SumRuleRequest},
 * {@link bubblechain.sumrule.SumRuleResult} and {@link bubblechain.sumrule.NullTest}; the recursion is
 * {@link bubblechain.sumrule.ScaleEvolution}.
 */
@NullMarked
package bubblechain.sumrule;

import org.jspecify.annotations.NullMarked;
