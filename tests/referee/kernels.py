"""Borel transforms and anomalous dimensions of the kernels as mpmath functions, in the program's normalisation, at
mu = scale: f = prefactor * sum c_n a^(n+1), B(u) = sum c_n u^n / n!. Written from the formulas of the kernel sheets, with
the e^{5u/3} of MS-bar inside. An anomalous dimension is a function of a, its coefficients are the c_n themselves."""
from mpmath import mp, mpf


def scheme(u):
    return mp.exp(mpf(5) * u / 3)


def gammas(above, below):
    """Product of gammas over product of gammas; a pole below gives zero."""
    return mp.gammaprod(above, below)


def chain_factor(x):
    """G(x) = Gamma(4+2x)/(6 Gamma(1+x) Gamma(2+x)^2 Gamma(1-x)), the inverse of one bubble at eps = -x, u = 0."""
    return gammas([4 + 2 * x], [1 + x, 2 + x, 2 + x, 1 - x]) / 6


def alternating_squares(z):
    """b(z) = sum_{j>=0} (-1)^j/(j+z)^2."""
    return (mp.psi(1, z / 2) - mp.psi(1, (z + 1) / 2)) / 4


# unsubtracted parts F(0,u): B = (F(0,u) - Ftilde(u))/u with the anomalous dimension below -----------------------------

def pole_mass_on_shell(u):
    return 6 * (1 - u) * scheme(u) * gammas([1 + u, 1 - 2 * u], [3 - u])


def gamma_m_half(x):
    """F(-x,0) of the pole mass; -d ln m/d ln mu = 2 (CF/beta0) a F(-a,0)."""
    return (3 + 2 * x) * gammas([4 + 2 * x], [1 - x, 2 + x, 2 + x, 3 + x]) / 3


# form 1 kernels -------------------------------------------------------------------------------------------------------

def static_potential_r(u):
    """mu = 1/r, V = -(4 pi CF/(beta0 r)) ..."""
    return scheme(u) * mp.power(4, -u) * gammas([mpf(1) / 2 - u], [1 + u]) / mp.sqrt(mp.pi)


def adler(u):
    return 8 * scheme(u) * (alternating_squares(1 + u) - alternating_squares(3 - u)) / ((1 - u) * (2 - u))


def bjorken_gls(u):
    return -3 * scheme(u) * (1 + u / 3) / ((1 - u ** 2) * (1 - u ** 2 / 4))


def lepton_g2(u):
    return scheme(u) * 2 * gammas([2 + u, 1 - 2 * u], [3 - u])


# anomalous dimensions (functions of a) --------------------------------------------------------------------------------

def cusp(a):
    return 4 * chain_factor(a)


def gamma_m(a):
    return 6 * chain_factor(a) * (1 + 2 * a / 3) / ((1 + a / 2) * (1 + a))


# expansions -----------------------------------------------------------------------------------------------------------

def taylor(function, radius, points, count):
    """First Taylor coefficients at 0 of a function real on the real axis, by the trapezoidal rule on a circle."""
    return laurent(function, mpf(0), mpf(radius), points, 0, count - 1)


def laurent(function, centre, radius, points, lowest, highest):
    values = [mp.mpc(function(centre + radius * mp.expjpi(mpf(2 * j) / points))) for j in range(points // 2 + 1)]
    phases = [mp.expjpi(-mpf(2 * j) / points) for j in range(points)]
    out = []
    for k in range(lowest, highest + 1):
        total = mp.re(values[0]) + (-1) ** k * mp.re(values[-1])
        total += 2 * mp.fsum(mp.re(values[j] * phases[j * k % points]) for j in range(1, points // 2))
        out.append(total / points / mpf(radius) ** k)
    return out


def borel_weights(coefficients):
    return [c / mp.factorial(n) for n, c in enumerate(coefficients)]
