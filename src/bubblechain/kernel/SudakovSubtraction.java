package bubblechain.kernel;

import bubblechain.analytic.AnalyticFunction;

/**
 * What makes a quantity with double logarithms finite: the diagram F(eps, u) u = sum F_nm eps^n u^m has one power of u more
 * below it than a single subtraction takes away, and of the bare series its first two columns survive.
 *
 * <p>With g(a) = sum g_k a^k = sum F_k0 (-a)^k and h(a) = sum h_k a^k = sum F_k1 (-a)^k at the scale Q of the kernel, at
 * operator scale mu, L = ln(mu^2/Q^2), H_k = 1 + 1/2 + ... + 1/k,
 *
 * <p>B(u) = e^(L u) T(u) - g_0/u^2 - (1/u) sum_k s_k u^k/k!, s_k = h_k + L g_k - H_k g_(k+1), T = F(0, u)/u,
 *
 * <p>d ln O/d ln mu = prefactor x a [gamma(a) + 2 L g(a)], gamma_n = 2 (h_n - H_(n+1) g_(n+1)): the part without logarithm
 * and, in g, the cusp anomalous dimension.
 *
 * @param cusp  g(a) = G(-a, 0) e^(-gammaE a)/D(-a), with D the massless bubble in d = 4 - 2 eps
 * @param slope dG/du(-a, 0) e^(-gammaE a)/D(-a), so that h(a) = slope(a) + g(a) ln D(-a)/(-a)
 */
public record SudakovSubtraction(AnalyticFunction cusp, AnalyticFunction slope) {}
