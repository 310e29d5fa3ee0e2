"""Prints the nl^n terms of the decoupling of light MS-bar masses at mu = mbar(mbar), from one chain of bubbles.

Usage: python3 decoupling_chain.py
The part of m^(nl)/m^(nl+1) with n light bubbles and one heavy one in the gluon line of the quark's self-energy at zero
momentum is the leading power of nl at order a^(n+2), a = alpha_s/pi. Bare, in d = 4 - 2 eps (Landau gauge, derived here):
  zeta_0 - 1 = g0^2 CF (d-1) (4/d) int d^dk/(2 pi)^d D(k)/k^2,  k^2 D = 1/(1 + Pi_light + Pi_heavy),
  Pi = 8 g0^2 TF Gamma(eps)/(4 pi)^(d/2) int_0^1 dx x(1-x) (m^2 + x(1-x) k^2)^(-eps) for each flavour.
Renormalised with Z_m of the all-order one-chain anomalous dimension and with alpha_s' = alpha_s/(1 + Pi_heavy(0)); the sum
has no poles in eps, and its value at eps = 0 is its mean over a circle. Published: 89/432; 1327/11664 - 2 zeta(3)/27;
0.05616 (arXiv:1502.04719, from memory). Exact form of the last one from its digits: 17671/124416 - 5/864 zeta(3) - 7/96 zeta(4)."""
from mpmath import mp, mpf, mpc

mp.dps = 40
CF = mpf(4) / 3


def anomalous(b):
    return (1 + 2 * b / 3) * mp.gamma(4 + 2 * b) / (mp.gamma(1 - b) * mp.gamma(2 + b) ** 2 * mp.gamma(3 + b)) / 3


G = mp.taylor(anomalous, 0, 12)


def bare(n, eps):
    """Coefficient of a0^(n+2) for B_light = B_heavy = 1, B = 4 TF nf/3."""
    d, s = 4 - 2 * eps, -(n + 1) * eps
    return (CF * (d - 1) * 4 / d * (-1) ** (n + 1) * (n + 1) * (6 * mp.beta(2 - eps, 2 - eps) * mp.gamma(eps)) ** n
            * 6 * mp.beta(2 - s, 2 - s) * mp.gamma(s) * mp.gamma(eps - s) / mp.gamma(2 - eps)
            * mp.exp(mp.euler * eps * (n + 2)))


def coefficient(n, eps):
    total = sum(bare(k, eps) * mp.binomial(n + 1, n - k) / eps ** (n - k) for k in range(n + 1))
    total += -3 * CF / eps * sum(G[j] * (-1) ** j / eps ** (n + 1 - j) for j in range(n + 2)) * mpf(n + 1) / (n + 2)
    shift = mp.gamma(eps) * mp.exp(mp.euler * eps) - 1 / eps
    total += shift * (-3 * CF / eps) * sum(G[j] * (-1) ** j / eps ** (n - j) for j in range(n + 1))
    return total


def main():
    points = 96
    circle = [mpf(1) / 8 * mp.expjpi(mpf(2) * i / points) for i in range(points)]
    for n in range(3):
        values = [coefficient(n, eps) for eps in circle]
        poles = max(abs(sum(v * eps ** k for v, eps in zip(values, circle))) / points for k in range(1, n + 3))
        value = sum(values) / points * (mpf(2) / 3) ** (n + 1) / mpf(4) ** (n + 2)
        print('nl^%d a^%d: %s   (largest pole left: %s)' % (n, n + 2, mp.nstr(value.real, 12), mp.nstr(poles, 3)))
    print('89/432 = %s, 1327/11664 - 2 zeta(3)/27 = %s' % (mp.nstr(mpf(89) / 432, 12),
                                                          mp.nstr(mpf(1327) / 11664 - 2 * mp.zeta(3) / 27, 12)))
    exact = mpf(17671) / 124416 - 5 * mp.zeta(3) / 864 - 7 * mp.zeta(4) / 96
    print('17671/124416 - 5/864 zeta(3) - 7/96 zeta(4) = %s' % mp.nstr(exact, 12))


if __name__ == '__main__':
    main()
