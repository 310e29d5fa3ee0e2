"""Checks every row of reference-values/kernel-checks.csv against the closed forms, with mpmath at 75 digits.

Usage: python3 check_kernel_rows.py kernel-checks.csv
Prints the rows that deviate by more than their tolerance and, per kernel, how many rows were checked. With --units the
deviation of each row in units of its last printed digit is printed."""
import csv
import sys
from fractions import Fraction as F
from mpmath import mp, mpf
import kernels
import more_kernels as more
from formulas import function_of_u

COUNT = 13


def number(text):
    return function_of_u(text)(mpf(0))


class Quantity:
    """c_n and B(u) of one kernel at mu = scale; coefficients is c_0, c_1, ..."""

    def __init__(self, coefficients, transform):
        self.coefficients, self.transform = coefficients, transform


def unsubtracted(function, radius=mpf(1) / 4):
    weights = kernels.taylor(function, radius, 256, COUNT)
    return Quantity([mp.factorial(n) * w for n, w in enumerate(weights)], function)


def subtracted(on_shell, dimension, radius=mpf(5) / 4):
    """B = [F(0,u) - Ftilde(u)]/u."""
    counter = kernels.taylor(dimension, radius, 256, 120)
    tilde = lambda u: mp.fsum(g / mp.factorial(n) * u ** n for n, g in enumerate(counter))
    return unsubtracted(lambda u: (on_shell(u) - tilde(u)) / u)


def dimension(function, radius=mpf(3) / 4):
    coefficients = kernels.taylor(function, radius, 640, COUNT)
    return Quantity(coefficients, None)


def double_subtracted(name):
    """B = [Fh(0,u) - Fh_00 - Fh_01 u]/u^2 + sum_k (-1)^(k-1) [Fh_k1 + H_k Fh_(k+1)0] u^(k-1)/k!; see single_logarithm."""
    four = more.FOUR_DIMENSIONS[name]
    first, second = more.columns(more.SUDAKOV[name], COUNT + 2)
    head = kernels.taylor(four, mpf(1) / 4, 256, COUNT + 3)
    out = []
    for n in range(COUNT):
        k = n + 1
        counter = mpf(-1) ** (k - 1) * (second[k] + mp.harmonic(k) * first[k + 1]) / mp.factorial(k)
        out.append(mp.factorial(n) * (head[n + 2] + counter))
    transform = lambda u: (four(u) - head[0] - head[1] * u) / u ** 2  # poles only; the counterterms are entire
    return Quantity(out, transform)


def single_logarithm(name):
    """gamma_k = 2 (-1)^(k-1) [Fh_(k-1)1 + H_k Fh_k0], k = n + 1."""
    first, second = more.columns(more.SUDAKOV[name], COUNT + 2)
    return Quantity([2 * mpf(-1) ** (k - 1) * (second[k - 1] + mp.harmonic(k) * first[k]) for k in range(1, COUNT + 1)],
                    None)


def with_scale(quantity, x):
    """The coupling's scale at x times the natural one."""
    log = 2 * mp.log(x)
    old = quantity.coefficients
    new = [mp.fsum(mp.binomial(n, k) * log ** (n - k) * old[k] for k in range(n + 1)) for n in range(len(old))]
    return Quantity(new, lambda u: mp.exp(log * u) * quantity.transform(u))


def combined(*weighted):
    return Quantity([mp.fsum(w * q.coefficients[n] for w, q in weighted) for n in range(COUNT)],
                    lambda u: mp.fsum(w * q.transform(u) for w, q in weighted))


def pole_mass():
    return subtracted(kernels.pole_mass_on_shell, kernels.gamma_m_half)


def scalar(function):
    return subtracted(function, kernels.gamma_m)


MAKERS = {
    "pole-mass": lambda m: pole_mass(),
    "static-potential-r": lambda m: unsubtracted(kernels.static_potential_r),
    "static-potential-q": lambda m: unsubtracted(kernels.scheme),
    "static-force": lambda m: unsubtracted(more.static_force),
    "adler": lambda m: unsubtracted(kernels.adler),
    "bjorken-gls": lambda m: unsubtracted(kernels.bjorken_gls),
    "bjorken-unpol": lambda m: unsubtracted(more.bjorken_unpolarised),
    "lepton-g2": lambda m: unsubtracted(kernels.lepton_g2),
    "cusp": lambda m: dimension(kernels.cusp),
    "gamma-m": lambda m: dimension(kernels.gamma_m),
    "gamma-hl-current": lambda m: dimension(more.gamma_hl_current),
    "gamma-hqet-field-landau": lambda m: dimension(more.gamma_hqet_field),
    "gamma-tensor-current": lambda m: dimension(more.gamma_tensor_current),
    "gamma-chromomag": lambda m: dimension(more.gamma_chromomagnetic),
    "qed-beta": lambda m: dimension(more.qed_integrand),
    "ps-mass": lambda m: unsubtracted(more.ps_mass),
    "kin-lambdabar": lambda m: unsubtracted(more.kinetic_binding),
    "kin-mupi2": lambda m: unsubtracted(more.kinetic_energy),
    "fbstar-over-fb": lambda m: unsubtracted(more.f_ratio),
    "chromomag-cf": lambda m: unsubtracted(more.chromomagnetic_cf),
    "chromomag-ca": lambda m: subtracted(more.chromomagnetic_ca_on_shell, more.chromomagnetic_ca_dimension,
                                         mpf(1) / 2),
    "top-width-mw0-pole": lambda m: unsubtracted(more.top_width),
    "top-width-mw0-msbar": lambda m: combined((1, quantity("top-width-mw0-pole")), (3, quantity("pole-mass"))),
    "b-to-u-width-pole": lambda m: unsubtracted(more.b_to_u_width),
    "b-to-u-width-msbar": lambda m: combined((1, quantity("b-to-u-width-pole")), (5, quantity("pole-mass"))),
    "ree": lambda m: unsubtracted(more.spectral),
    "tau": lambda m: unsubtracted(more.tau_width),
    "dis-fl": lambda m: unsubtracted(more.dis_longitudinal(m)),
    "dis-gamma": lambda m: dimension(more.dis_dimension(m)),
    "dis-f2": lambda m: subtracted(more.dis_f2_unsubtracted(m), more.dis_dimension(m)),
    "dis-f3": lambda m: subtracted(more.dis_f3_unsubtracted(m), more.dis_dimension(m)),
    "scalar-psi2": lambda m: scalar(more.scalar_unsubtracted),
    "scalar-im-hbb": lambda m: scalar(more.scalar_spectral_unsubtracted),
    "gradient-flow": lambda m: unsubtracted(more.gradient_flow),
    "hard-massless": lambda m: double_subtracted("hard-massless"),
    "jet-quark": lambda m: double_subtracted("jet-quark"),
    "soft-dy": lambda m: double_subtracted("soft-dy"),
    "soft-thrust": lambda m: double_subtracted("soft-thrust"),
    "hard-massless-timelike": lambda m: double_subtracted("hard-massless-timelike"),
    "jet-quark-delta": lambda m: double_subtracted("jet-quark-delta"),
    "dis-threshold": lambda m: combined((2, quantity("hard-massless")), (1, quantity("jet-quark-delta"))),
    "hard-gamma": lambda m: single_logarithm("hard-massless"),
    "jet-gamma": lambda m: single_logarithm("jet-quark"),
    "soft-dy-gamma": lambda m: single_logarithm("soft-dy"),
    "hqet-self-energy": lambda m: subtracted(more.self_energy_four, more.self_energy_dimension),
    "chromomag": lambda m: combined((mpf(4) / 3, quantity("chromomag-cf")), (3, quantity("chromomag-ca"))),
    "scalar-over-gamma0": lambda m: combined((1, quantity("hl-current-scalar")), (-1, quantity("hl-current-gamma0"))),
    "ps-mass-msbar": lambda r: combined((1, quantity("pole-mass")), (-4 * r, with_scale(quantity("ps-mass"), 1 / r))),
    "kinetic-mass-msbar": lambda r: combined(
        (1, quantity("pole-mass")), (-16 * mpf(r) / 3, with_scale(quantity("kin-lambdabar"), 1 / r)),
        (-2 * r ** 2, with_scale(quantity("kin-mupi2"), 1 / r))),
    "static-energy": lambda mr: combined((2, quantity("pole-mass")),
                                         (-4 * mp.pi / mr, with_scale(quantity("static-potential-r"), mr))),
}
for current, (above, below) in more.CURRENTS.items():
    MAKERS[current] = lambda m, a=above, b=below: subtracted(
        more.on_shell_current(a), more.current_dimension(b))
CACHE = {}


def quantity(name, parameter=None):
    if (name, parameter) not in CACHE:
        CACHE[name, parameter] = MAKERS[name](parameter)
    return CACHE[name, parameter]


def parameter(text):
    """The value in name=value: an integer (a moment) or a ratio; None if there is none."""
    if not text:
        return None
    value = F(text.split("=")[1])
    return int(value) if value.denominator == 1 else mpf(value.numerator) / value.denominator


def massive_gluon(x):
    """r(x) of the b -> u width from b(u) = -(sin pi u/pi) int dx x^(-1-u) r(x): inverse Mellin transform.

    x < 1: minus the residues at u = 0, 1/2, 1, ...; x > 1: the virtual part alone, along Re u = -1/2."""
    if x > 1:
        step = mpf(1) / 25
        points = [mp.mpc(mpf(-1) / 2, step * k) for k in range(-350, 351)]
        return -mp.re(mp.fsum(more.b_to_u_virtual(u) * mp.power(x, u) / mp.sinpi(u) for u in points)) * step / 2
    integrand = lambda u: mp.pi * more.b_to_u_width(u) / kernels.scheme(u) * mp.power(x, u) / mp.sinpi(u)
    last = int(2 * 25 / -mp.log10(x)) + 12
    return mp.fsum(kernels.laurent(integrand, mpf(k) / 2, mpf(1) / 8, 48, -1, -1)[0] for k in range(last))


def special(row):
    """Program numbers of the rows of kind other."""
    if row["parameters"].startswith("x="):
        return massive_gluon(mpf(row["parameters"][2:]))
    if row["u0"]:
        u = mpf(F(row["u0"]).numerator) / F(row["u0"]).denominator
        return kernels.laurent(more.b_to_u_width, u, mpf(1) / 16, 64, 0, 0)[0]
    delta = quantity("jet-quark-delta")
    if row["arguments"].startswith("delta(p^2)"):
        return -mpf(4) / 3 * delta.coefficients[1]
    return -mpf(2) / 3 * (2 * quantity("hard-massless").coefficients[1] + delta.coefficients[1])


def program_number(row):
    if row["kind"] == "other":
        return special(row)
    q = quantity(row["kernel"], parameter(row["parameters"]))
    if row["mu_over_scale"] != "1":
        q = with_scale(q, number(row["mu_over_scale"]))
    if row["kind"] == "laurent":
        u0 = mpf(F(row["u0"]).numerator) / F(row["u0"]).denominator
        power = int(row["power"])
        return kernels.laurent(q.transform, u0, mpf(1) / 8, 96, power, power)[0]
    n = int(row["n"]) - (int(row["power"]) if row["kind"] == "log-term" else 0)
    return q.coefficients[n] / (q.coefficients[0] if row["kind"] == "ratio" else 1)


def last_unit(text):
    """Size of one unit of the last printed digit."""
    mantissa, _, exponent = text.lower().partition("e")
    places = len(mantissa.partition(".")[2])
    return mpf(10) ** (int(exponent or 0) - places)


def deviation(row):
    """|program number / multiplier - value|; the exact form, where there is one, is compared as well."""
    multiplier = number(row["multiplier"]) if row["multiplier"] else mpf(1)
    mine = program_number(row) / multiplier
    if row["factor_cn"] and abs(number(row["factor_cn"]) * multiplier - 1) > mpf(10) ** -60:
        raise ValueError("factor_cn is not 1/multiplier: %s" % row)
    if row["exact"] and abs(number(row["exact"]) - mine) > mpf(10) ** -38 * max(1, abs(mine)):
        print("exact form differs:", row["kernel"], row["arguments"], row["exact"], mp.nstr(mine, 40))
    return abs(mine - mpf(row["value"])), mine


def main(path, units):
    mp.dps = 75
    with open(path, newline="") as table:
        rows = list(csv.DictReader(line for line in table if not line.startswith("#")))
    wrong, counts = 0, {}
    for row in rows:
        distance, mine = deviation(row)
        counts[row["kernel"]] = counts.get(row["kernel"], 0) + 1
        if units:
            print(mp.nstr(distance / last_unit(row["value"]), 4), row["kernel"], row["arguments"], row["value"],
                  mp.nstr(mine, 34), sep="|")
        elif distance > mpf(row["tolerance"]):
            wrong += 1
            print("differs:", row["kernel"], row["arguments"], row["value"], mp.nstr(mine, 34))
    print(len(rows), "rows checked,", wrong, "outside their tolerance;", counts)
    return 1 if wrong else 0


if __name__ == "__main__":
    sys.exit(main(sys.argv[1], "--units" in sys.argv))
