"""Borel transforms and anomalous dimensions of the further kernels, for the check of reference-values/kernel-checks.csv.
Conventions of kernels.py. Every function is real on the real axis."""
from mpmath import mp, mpf
import unit_hypergeometric
from kernels import (adler, alternating_squares, chain_factor, gamma_m_half, gammas, pole_mass_on_shell, scheme,
                     static_potential_r, taylor)


# heavy quarks ---------------------------------------------------------------------------------------------------------

def on_shell_current(numerator):
    """F(0,u) of a heavy-light current with numerator N(0,u)."""
    return lambda u: scheme(u) * numerator(u) * gammas([1 + u, 1 - 2 * u], [3 - u])


def current_dimension(numerator):
    """F(-x,0) with numerator N(-x,0)."""
    return lambda x: numerator(x) * gammas([4 + 2 * x], [1 - x, 2 + x, 2 + x, 3 + x]) / 6


CURRENTS = {  # N(0,u) and N(-x,0) = 2 h(-x)^2 - 5 - 6x - 2x^2
    "hl-current-scalar": (lambda u: 3 * (u * u - u + 1), lambda x: 3 + 2 * x),
    "hl-current-gamma0": (lambda u: 3 * (u * u + u - 1), lambda x: -3 - 2 * x),
    "hl-current-gammaperp": (lambda u: 3 * u * u - u - 3, lambda x: -3 - 2 * x),
    "hl-current-tensor": (lambda u: 3 * u * u + u - 5, lambda x: 2 * x * x - 5 - 6 * x - 2 * x * x),
}


def f_ratio(u):
    return -4 * scheme(u) * gammas([1 + u, 1 - 2 * u], [3 - u])


def chromomagnetic_cf(u):
    return 4 * scheme(u) * gammas([2 + u, 1 - 2 * u], [3 - u])


def chromomagnetic_ca_on_shell(u):
    return scheme(u) * (2 - u) * (2 + 3 * u) * gammas([1 + u, 1 - 2 * u], [3 - u]) / 2


def chromomagnetic_ca_dimension(x):
    """F(-x,0) from G(eps,0) = (2-eps)(2-5 eps+2 eps^2)/(2 (1-eps)) / Gamma(3-eps)."""
    return ((2 + x) * (2 + 5 * x + 2 * x * x) / (2 * (1 + x)) * gammas([1], [3 + x])
            * gammas([4 + 2 * x], [1 - x, 2 + x, 2 + x]) / 6)


def gamma_hl_current(a):
    return (3 + 2 * a) * gammas([4 + 2 * a], [1 - a, 2 + a, 2 + a, 3 + a]) / 9


def gamma_tensor_current(a):
    """-2 x 2 [h(-a)^2 - (1+a)^2] over 6 Gamma(1-a) Gamma(2+a)^2 Gamma(3+a)/Gamma(4+2a), h(-a) = a."""
    return -4 * (a * a - (1 + a) ** 2) * gammas([4 + 2 * a], [1 - a, 2 + a, 2 + a, 3 + a]) / 6


def gamma_hqet_field(a):
    return (3 + 2 * a) * gammas([4 + 2 * a], [1 - a, 2 + a, 2 + a, 2 + a]) / 18


def gamma_chromomagnetic(a):
    return (1 + 2 * a) * gammas([5 + 2 * a], [2 + a, 2 + a, 2 + a, 1 - a]) / (24 * (1 + a))


def self_energy_four(u):
    """F(0,u) of Sigma(w)/(-2w): u times the diagram (3-2 eps) Gamma(-1+2u) Gamma(1-u)/Gamma(2+u-eps)."""
    return scheme(u) * 3 * u * gammas([2 * u - 1, 1 - u], [2 + u])


def self_energy_dimension(x):
    """F(-x,0), where u Gamma(-1+2u) -> -1/2."""
    return -(3 + 2 * x) / 2 * gammas([4 + 2 * x], [1 - x, 2 + x, 2 + x, 2 + x]) / 6


def static_force(u):
    return (1 - 2 * u) * static_potential_r(u)


def ps_mass(u):
    return scheme(u) / (1 - 2 * u)


def kinetic_binding(u):
    return scheme(u) * 3 * mp.sqrt(mp.pi) / 4 * (1 - u) / (1 - 2 * u) * gammas([], [1 + u, mpf(5) / 2 - u])


def kinetic_energy(u):
    return scheme(u) * 3 * mp.sqrt(mp.pi) / 4 * gammas([], [1 + u, mpf(5) / 2 - u])


def real_emission(u, count=1):
    """S(u) = Gamma(1-u)^2 sum_k [k!/Gamma(k+2-u)]^2 and, for count 2, its slope."""
    return [(-1) ** k * w for k, w in enumerate(unit_hypergeometric.taylor(1 - u, count))]


def top_width(u):
    virtual = 2 * (3 * u ** 4 - 2 * u ** 3 - u ** 2 + 2) / (u * (u - 1)) * gammas([u, 1 - 2 * u], [3 - u])
    a = -2 * (3 * u ** 6 - 23 * u ** 5 + 55 * u ** 4 - 47 * u ** 3 + 10 * u ** 2 - 6 * u + 4) / (
        u ** 3 * (u - 2) ** 2 * (u - 1) ** 3)
    w = 2 * (3 * u ** 4 - 20 * u ** 3 + 35 * u ** 2 - 18 * u + 2) / (u * (u - 2) * (u - 1) ** 2)
    return scheme(u) * (virtual + mp.sinpi(u) / mp.pi * (a + w * real_emission(u)[0]))


def b_to_u_virtual(u):
    psi_part = mp.digamma(-u) - mp.digamma(-2 * u)
    return gammas([1 + u, 1 - 2 * u], [3 - u]) * (
        (18 * u ** 3 - 206 * u ** 2 - 28 * u + 124) / (3 * u * (u - 4))
        + 32 * (1 - 2 * u) * (1 + u) / (u * (u - 4)) * psi_part)


def b_to_u_width(u):
    a = -2 * (9 * u ** 9 - 238 * u ** 8 + 1772 * u ** 7 - 5974 * u ** 6 + 10317 * u ** 5 - 9096 * u ** 4 + 3658 * u ** 3
              - 760 * u ** 2 + 504 * u - 288) / (3 * u ** 3 * (u - 1) ** 3 * (u - 2) ** 3 * (u - 3) * (u - 4))
    w = 2 * (9 * u ** 4 - 175 * u ** 3 + 298 * u ** 2 - 250 * u + 24) / (3 * u * (u - 1) * (u - 2) * (u - 4))
    slope = 16 * (1 - 2 * u) * (1 + u) / ((u - 1) * (u - 2) * (u - 4))
    total, derivative = real_emission(u, 2)
    return scheme(u) * (b_to_u_virtual(u) + mp.sinpi(u) / mp.pi * (a + w * total + slope * derivative))


def qed_integrand(x):
    return (1 + 2 * x) * (1 + 2 * x / 3) * (1 - x) * gammas([4 + 2 * x], [2 + x, 2 + x, 3 + x, 1 - x])


# massless quarks ------------------------------------------------------------------------------------------------------

def spectral(u):
    """R ratio."""
    return adler(u) * mp.sinpi(u) / (mp.pi * u)


def tau_width(u):
    return adler(u) * mp.sinpi(u) / mp.pi * (1 / u + 2 / (1 - u) - 2 / (3 - u) + 1 / (4 - u))


def bjorken_unpolarised(u):
    return -8 * scheme(u) / ((1 - u) * (2 - u) * (2 + u))


def rising(k, u):
    """A_k(u) = (1+u)(2+u)...(k-1+u)/(k-1)!"""
    return mp.fprod((j + u) / j for j in range(1, k))


def dis_longitudinal(moment):
    return lambda u: 8 * scheme(u) * rising(moment, u) / ((1 - u) * (2 - u) * (moment + 1 + u))


def dis_dimension(moment):
    return lambda x: chain_factor(x) * mp.fsum(
        2 * (1 + x) ** 2 / (k + x) - 4 * x * (2 + x) / (k + 1 + x) + 2 * (1 + x) ** 2 / (k + 2 + x)
        for k in range(1, moment))


def dis_f2_unsubtracted(moment):
    return lambda u: scheme(u) / ((1 - u) * (2 - u)) * mp.fsum(
        rising(k, u) * (2 * (2 - u + u * u) / (k + u) - 2 * u * (4 + u) / (k + 1 + u) + 4 * (1 + u) / (k + 2 + u))
        for k in range(1, moment))


def dis_f3_unsubtracted(moment):
    f2 = dis_f2_unsubtracted(moment)
    return lambda u: f2(u) - scheme(u) * rising(moment, u) * (
        4 * u / ((2 - u) * (moment + u)) + 4 * u * (1 + u) / ((1 - u) * (2 - u) * (moment + 1 + u)))


def scalar_unsubtracted(u):
    return scheme(u) * (12 / (2 - u) + 4 * u * (1 - u) * (alternating_squares(1 + u) - alternating_squares(3 - u)))


def scalar_spectral_unsubtracted(u):
    return scalar_unsubtracted(u) * mp.sinpi(u) / (mp.pi * u * (1 - u))


def gradient_flow(u):
    return scheme(u) * mp.power(4, -u) * mp.gamma(2 - u)


# Sudakov objects: Fh(eps,u) regular at 0, double-pole subtraction -----------------------------------------------------

def bubble(eps):
    """D(eps), one massless bubble."""
    return 6 * mp.exp(mp.euler * eps) * gammas([1 + eps, 2 - eps, 2 - eps], [4 - 2 * eps])


def chain_power(eps, u):
    """D(eps)^(u/eps-1)."""
    return mp.exp((u / eps - 1) * mp.log(bubble(eps)))


def hard_massless(eps, u):
    p = -4 + (6 - 4 * u + 2 * u * u) * eps - 2 * (1 - u) * eps ** 2
    return (p * gammas([1 - u, 1 - u, 1 + u], [1 - eps - u]) / ((1 - u - eps) * (2 - u - eps))
            * mp.exp(mp.euler * eps) * chain_power(eps, u))


def jet_quark(eps, u):
    p = 8 - 6 * u - (12 - 8 * u) * eps + (4 - 2 * u) * eps ** 2
    return (p * gammas([1 - u, 1 - eps], [1 + u - eps, 1 - u - eps]) / ((1 - u - eps) * (2 - u - eps))
            * mp.exp(mp.euler * (eps - u)) * chain_power(eps, u))


def soft_drell_yan(eps, u):
    return 4 * gammas([1 - u], [1 + u - eps]) * mp.exp(mp.euler * (eps - 2 * u)) * chain_power(eps, u)


def soft_thrust(eps, u):
    return (-4 * gammas([1 - 2 * u], [1 - u, 1 + u - eps]) * mp.exp(mp.euler * (eps - 2 * u)) * chain_power(eps, u))


def hard_time_like(eps, u):
    """The squared modulus: both amplitudes, and the phase of (-s)^(-u)."""
    return 2 * mp.cospi(u) * hard_massless(eps, u)


def jet_quark_delta(eps, u):
    """Coefficient of delta(p^2) in momentum space."""
    return jet_quark(eps, u) * mp.exp(mp.euler * u) * mp.rgamma(1 - u)


def columns(diagram, count):
    """Fh_k0 and Fh_k1, k < count; the slope in u by differences of fourth order."""
    h = mpf(10) ** -(mp.dps // 5)
    slope = lambda e: (8 * (diagram(e, h) - diagram(e, -h)) - (diagram(e, 2 * h) - diagram(e, -2 * h))) / (12 * h)
    return taylor(lambda e: diagram(e, mpf(0)), mpf(1) / 2, 640, count), taylor(slope, mpf(1) / 2, 640, count)


FOUR_DIMENSIONS = {
    "hard-massless": lambda u: -4 * scheme(u) * gammas([1 - u, 1 + u], []) / ((1 - u) * (2 - u)),
    "jet-quark": lambda u: scheme(u) * mp.exp(-mp.euler * u) * (8 - 6 * u) / ((1 - u) * (2 - u) * mp.gamma(1 + u)),
    "hard-massless-timelike": lambda u: -8 * mp.cospi(u) * scheme(u) * gammas([1 - u, 1 + u], []) / ((1 - u) * (2 - u)),
    "jet-quark-delta": lambda u: scheme(u) * (8 - 6 * u) / ((1 - u) * (2 - u)) * gammas([], [1 + u, 1 - u]),
    "soft-dy": lambda u: 4 * scheme(u) * mp.exp(-2 * mp.euler * u) * gammas([1 - u], [1 + u]),
    "soft-thrust": lambda u: -4 * scheme(u) * mp.exp(-2 * mp.euler * u) * gammas([1 - 2 * u], [1 - u, 1 + u]),
}
SUDAKOV = {"hard-massless": hard_massless, "jet-quark": jet_quark, "soft-dy": soft_drell_yan,
           "soft-thrust": soft_thrust, "hard-massless-timelike": hard_time_like, "jet-quark-delta": jet_quark_delta}
