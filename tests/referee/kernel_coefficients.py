"""Makes reference-values/generated/kernel-coefficients.csv: c_n of the kernels at several scales, 100 digits.

Usage: python3 kernel_coefficients.py OUTPUT.csv
Two computations: PARI/GP power series about u = 0, and mpmath from values on a circle. Only numbers on which both agree to
the digits printed are written; a disagreement stops the program."""
import sys
from mpmath import mp, mpf
import agreement
import composed_kernels
import kernels
import pari

DIGITS = 100
ORDERS = list(range(31)) + [40, 60]
TERMS = 63
SCALES = [("1", "1"), ("2", "2"), ("1/2", "1/2"), ("3/2", "3/2")]
POTENTIAL_SCALES = SCALES + [("exp(-euler_gamma)", "exp(-Euler)")]
# operator scale apart from the coupling's
BOTH = [("1", "1"), ("2", "3/2")]
COMPOSED_SCALES = {
    "top-width-mw0-pole": SCALES[::3], "top-width-mw0-msbar": BOTH, "b-to-u-width-pole": SCALES[::3],
    "b-to-u-width-msbar": BOTH + [("3/2", "1")],
    "hard-massless": BOTH + [("3/2", "1"), ("1", "2")], "hard-massless-timelike": BOTH,
    "jet-quark": BOTH + [("3/2", "1"), ("1", "2")], "jet-quark-delta": BOTH,
    "soft-dy": BOTH + [("3/2", "1"), ("1", "2")], "soft-thrust": BOTH, "dis-threshold": BOTH,
    "hard-gamma": SCALES[::3], "jet-gamma": SCALES[::3], "soft-dy-gamma": SCALES[::3],
    "hqet-self-energy": BOTH + [("3/2", "1")], "chromomag": BOTH + [("3/2", "1")],
    "scalar-over-gamma0": BOTH, "ps-mass-msbar": BOTH, "kinetic-mass-msbar": BOTH, "static-energy": BOTH,
}
NO_OPERATOR = ["top-width-mw0-pole", "b-to-u-width-pole", "hard-gamma", "jet-gamma", "soft-dy-gamma"]
MASS_SCALES = [("2", "1"), ("2", "2"), ("1/2", "1"), ("1", "2")]

SCRIPT = r"""
default(realprecision, 200);
TERMS = 63; o = O(x^(TERMS+1));
chain(s) = gamma(4+2*s+o)/(6*gamma(1+s+o)*gamma(2+s+o)^2*gamma(1-s+o));
/* Borel weights c_n/n! of an anomalous dimension given as a series in a */
weights(f) = sum(n = 0, TERMS, polcoef(f, n)/n!*x^n) + o;
zetabar(s) = (1-2^(1-s))*zeta(s);
/* b(1+u) = sum (-1)^j/(j+1+u)^2 by its Taylor series; b(3-u) by the shift b(z+2) = b(z) - 1/z^2 + 1/(z+1)^2 */
b1 = sum(m = 0, TERMS, (-1)^m*(m+1)*zetabar(m+2)*x^m) + o;
b3 = subst(b1, x, -x) - 1/(1-x)^2 + 1/(2-x)^2;
e5 = exp(5*x/3+o);
F = 6*(1-x)*e5*gamma(1+x+o)*gamma(1-2*x+o)/gamma(3-x+o);
Ft = weights(1/3*(3+2*x)*gamma(4+2*x+o)/(gamma(1-x+o)*gamma(2+x+o)^2*gamma(3+x+o)));
potential = e5*sin(Pi*x+o)/(Pi*x)*gamma(1-2*x+o);
adler = 8*e5*(b1-b3)/((1-x)*(2-x));
bjorken = -3*e5*(1+x/3)/((1-x^2)*(1-x^2/4));
g2 = 2*e5*gamma(2+x+o)*gamma(1-2*x+o)/gamma(3-x+o);
cusp = weights(4*chain(x));
gammam = weights(6*chain(x)*(1+2*x/3)/((1+x/2)*(1+x)));
scaled(f, X) = exp(2*log(X)*x+o)*f;
mass(X, Y) = (scaled(F, X) - scaled(Ft, X/Y))/x;
show(f) = print(vector(61, i, (i-1)!*polcoef(f, i-1)*1.));
"""


def jobs():
    """(kernel, mu/scale, operator mu/scale, PARI/GP text, mpmath function of u, radius of the circle)"""
    out = []
    scales = {"static-potential-r": POTENTIAL_SCALES}
    for name, gp, function, radius in [
            ("static-potential-r", "potential", kernels.static_potential_r, mpf(1) / 4),
            ("adler", "adler", kernels.adler, mpf(1) / 2), ("bjorken-gls", "bjorken", kernels.bjorken_gls, mpf(1) / 2),
            ("lepton-g2", "g2", kernels.lepton_g2, mpf(1) / 4), ("cusp", "cusp", kernels.cusp, None),
            ("gamma-m", "gammam", kernels.gamma_m, None)]:
        for x_text, x_gp in scales.get(name, SCALES):
            out.append((name, x_text, "1", "scaled(%s,%s)" % (gp, x_gp), function, radius))
    for x, y in [(s, "1") for s, _ in SCALES] + MASS_SCALES:
        if ("pole-mass", x, y) not in [j[:3] for j in out]:
            out.append(("pole-mass", x, y, "mass(%s,%s)" % (x, y), None, mpf(1) / 4))
    return sorted(out, key=lambda j: ["pole-mass", "static-potential-r", "adler", "bjorken-gls", "cusp", "gamma-m",
                                      "lepton-g2"].index(j[0]))


COMPOSED_SCRIPT = pari.PRELUDE + composed_kernels.GP + r"""
default(realprecision, 220);
ORDER = 75;
show(f) = print(vector(61, i, (i-1)!*polcoef(f, i-1)*1.));
"""


def composed_jobs():
    """(kernel, mu/scale, operator mu/scale, PARI/GP text)"""
    pairs = [(name, x, "1" if name in NO_OPERATOR else y) for name, scales in COMPOSED_SCALES.items() for x, y in scales]
    return [(name, x, y, "%s(0,%s,%s)" % (composed_kernels.KERNELS[name][0], x, y)) for name, x, y in pairs]


def composed_by_circle(job, cache):
    weights = composed_kernels.weights(job[0], value(job[1]), value(job[2]), 61)
    return [mp.factorial(n) * w for n, w in enumerate(weights)]


def value(text):
    return mp.exp(-mp.euler) if "euler" in text else mpf(int(text.split("/")[0])) / int((text + "/1").split("/")[1])


def by_circle(job, cache):
    """c_0 .. c_60 from mpmath."""
    name, x_text, y_text, _, function, radius = job
    x, y = value(x_text), value(y_text)
    if name == "pole-mass":
        if name not in cache:
            on_shell = kernels.taylor(kernels.pole_mass_on_shell, radius, 640, TERMS)
            anomalous = kernels.borel_weights(kernels.taylor(kernels.gamma_m_half, mpf(5) / 4, 640, TERMS))
            cache[name] = (on_shell, anomalous)
        on_shell, anomalous = cache[name]
        whole = agreement.multiplied(agreement.exponential_weights(x, TERMS), on_shell)
        counter = agreement.multiplied(agreement.exponential_weights(x / y, TERMS), anomalous)
        borel = [a - b for a, b in zip(whole[1:], counter[1:])]
    else:
        if name not in cache:
            plain = kernels.taylor(function, radius or mpf(5) / 4, 640, TERMS)
            cache[name] = plain if radius else kernels.borel_weights(plain)
        borel = agreement.multiplied(agreement.exponential_weights(x, TERMS), cache[name])
    return [mp.factorial(n) * borel[n] for n in range(61)]


HEADER = """# Bubble-chain coefficients c_n, 100 significant digits, in the program's normalisation:
# f = prefactor * sum_n c_n a^(n+1), a = beta0 alpha_s(mu)/(4 pi) in MS-bar, B(u) = sum_n c_n u^n/n!. Prefactor CF/beta0, except
# static-potential-r: -4 pi CF/(beta0 r) and lepton-g2: CF -> 1 and a factor 2 (a_l = (2/beta0) sum c_n a^(n+1)).
# cusp (c_0 = 4) and gamma-m (c_0 = 6) are anomalous dimensions: their c_n are the coefficients in a themselves.
# mu_over_scale X: B -> (X^2)^u B, only the coupling's scale moves, the quantity stays (for an anomalous dimension: its value at
# the scale Q as a series in a(X Q)). Scale: m (pole-mass, lepton-g2), 1/r, Q, and the quantity's own mu for cusp and gamma-m.
# operator_mu_over_scale Y (pole-mass): the MS-bar mass is taken at Y m,
# B = [ (X^2)^u F(0,u) - ((X/Y)^2)^u Ftilde(u) ]/u, Ftilde(u) = sum_n g_n u^n/n!, sum_n g_n x^n = F(-x,0); Y = 1 elsewhere.
# Kernels with double logarithms: Y moves the diagram, u F(eps,u) -> Y^(2u) u F(eps,u), then all of B is multiplied by (X/Y)^(2u).
# Kernels of several parts: every MS-bar quantity among them at Y times the scale of the whole; SU(3); parameters at their
# defaults, mu_f = m/2, mu_k = m/2, m r = 3. chromomag: prefactor 1/beta0. hard-gamma, jet-gamma, soft-dy-gamma are anomalous
# dimensions.
# A rational number is rounded to 100 digits like the others. Made by tests/referee/kernel_coefficients.py.
"""


def main(path):
    mp.dps = 220
    name = "kernel_coefficients.py"
    rows = agreement.rows(name, SCRIPT, jobs(), by_circle, ORDERS, DIGITS)
    rows += agreement.rows(name, COMPOSED_SCRIPT, composed_jobs(), composed_by_circle, ORDERS, DIGITS)
    agreement.write(path, HEADER, rows)


if __name__ == "__main__":
    main(sys.argv[1])
