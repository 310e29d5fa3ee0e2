"""Writes chain-coefficients.csv: c_n = n! [u^n] B(u) of two bubble chains, to 40 digits.

mpmath 1.3.0, 90 digits; Taylor coefficients from a sum over a circle. Run in this directory:
python3 chain_coefficients.py > chain-coefficients.csv
"""
from mpmath import mp, mpf, exp, gamma, factorial, nstr, expjpi, psi

mp.dps = 90
COUNT = 13


def pole_mass():
    """[F(u) + sum g_n u^n/n!]/u, mu = mbar, c_0 = 4; F and G of Beneke and Braun, hep-ph/9402364."""
    def f(u):
        return 6 * (1 - u) * exp(5 * u / 3) * gamma(1 + u) * gamma(1 - 2 * u) / gamma(3 - u)

    def g(u):
        return -(3 + 2 * u) * gamma(4 + 2 * u) / (3 * gamma(1 - u) * gamma(2 + u) ** 2 * gamma(3 + u))

    fs, gs = contour(f, mpf(1) / 4), contour(g, mpf(3) / 4)
    assert abs(fs[0] + gs[0]) < mpf(10) ** -60
    return [factorial(n) * (fs[n + 1] + gs[n + 1] / factorial(n + 1)) for n in range(COUNT)]


def adler():
    """(32/3) e^{5u/3}/(2-u) sum_{k>=2} (-1)^k k/(k^2-(1-u)^2)^2, normalised to c_0 = 1."""
    def b(u):
        # k/(k^2-c^2)^2 = [1/(k-c)^2 - 1/(k+c)^2]/(4c), c = 1 - u; alternating sums as trigamma differences
        def alternating(x):
            return (psi(1, (2 + x) / 2) - psi(1, (3 + x) / 2)) / 4

        c = 1 - u
        return exp(5 * u / 3) / (2 - u) * (alternating(-c) - alternating(c)) / (4 * c)

    bs = contour(b, mpf(1) / 2)
    return [factorial(n) * (bs[n] / bs[0]).real for n in range(COUNT)]


def contour(h, radius, points=256):
    values = [h(radius * expjpi(mpf(2) * j / points)) for j in range(points)]
    return [sum(v * expjpi(-mpf(2) * j * n / points) for j, v in enumerate(values)).real / points / radius ** n
            for n in range(COUNT + 2)]


print("# c_n = n! [u^n] B(u) at mu = natural scale, prefactor taken out. Made by chain_coefficients.py, mpmath 1.3.0.")
print("chain,n,value")
for name, values in (("pole-mass", pole_mass()), ("adler", adler())):
    for n, value in enumerate(values):
        print(f"{name},{n},{nstr(value, 40)}")
