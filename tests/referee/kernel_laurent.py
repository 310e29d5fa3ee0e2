"""Makes reference-values/generated/kernel-laurent.csv: poles of Borel transforms between u = -6 and 6, 60 digits.

Usage: python3 kernel_laurent.py OUTPUT.csv
Two computations at every multiple of 1/2: PARI/GP series with exact expansion points, and mpmath values on a circle."""
import sys
from fractions import Fraction as F
import mpmath
from mpmath import mp, mpf
import composed_kernels
import kernels
import pari

DIGITS = 60
TERMS = 150
POINTS = [F(k, 2) for k in range(-12, 13)]
LOWEST, HIGHEST = -5, 3
RADIUS = mpf(1) / 8

SCRIPT = pari.PRELUDE + r"""
default(realprecision, 200);
default(seriesprecision, 200);
T = 150; t = O(y^(T+1));
chain = gamma(4+2*y+t)/(6*gamma(1+y+t)*gamma(2+y+t)^2*gamma(1-y+t));
half = 1/3*(3+2*y)*gamma(4+2*y+t)/(gamma(1-y+t)*gamma(2+y+t)^2*gamma(3+y+t));
cuspa = 4*chain; gammama = 6*chain*(1+2*y/3)/((1+y/2)*(1+y));
entire(f, c) = sum(n = 0, T, polcoef(f, n)/n!*(c+x)^n) + O(x^12);
e5(c) = ex(5/3*(c+x));
b(s, d) = (pg(1, s/2, d/2) - pg(1, (s+1)/2, d/2))/4;
polemass(c) = (6*(1-c-x)*e5(c)*ga(1+c,1)*ga(1-2*c,-2)/ga(3-c,-1) - entire(half, c))/(c+x);
potential(c) = e5(c)*ex(-2*log(2)*(c+x))*ga(1/2-c,-1)/(sqrt(Pi)*ga(1+c,1));
adler(c) = 8*e5(c)*(b(1+c,1) - b(3-c,-1))/((1-c-x)*(2-c-x));
bjorken(c) = -3*e5(c)*(1+(c+x)/3)/((1-(c+x)^2)*(1-(c+x)^2/4));
g2(c) = 2*e5(c)*ga(2+c,1)*ga(1-2*c,-2)/ga(3-c,-1);
cusp(c) = entire(cuspa, c);
gammam(c) = entire(gammama, c);
show(f) = { f = f + O(x^6); print(vector(9, i, polcoef(f, i-6)*1.)) };
"""

COMPOSED_SCRIPT = pari.PRELUDE + composed_kernels.GP + r"""
show(f) = { f = f + O(x^6); print(vector(9, i, polcoef(f, i-6)*1.)) };
"""


def entire(coefficients):
    weights = kernels.borel_weights(coefficients)
    return lambda u: mp.fsum(w * u ** n for n, w in enumerate(weights))


def transforms():
    """(kernel, PARI/GP name, mpmath function B(u))"""
    counter = entire(kernels.taylor(kernels.gamma_m_half, mpf(5) / 4, 512, TERMS))
    pole_mass = lambda u: (kernels.pole_mass_on_shell(u) - counter(u)) / u
    flat = lambda f: entire(kernels.taylor(f, mpf(5) / 4, 512, TERMS))
    return [("pole-mass", "polemass", pole_mass), ("static-potential-r", "potential", kernels.static_potential_r),
            ("adler", "adler", kernels.adler), ("bjorken-gls", "bjorken", kernels.bjorken_gls),
            ("cusp", "cusp", flat(kernels.cusp)), ("gamma-m", "gammam", flat(kernels.gamma_m)),
            ("lepton-g2", "g2", kernels.lepton_g2)]


def composed_transforms():
    """The same of the kernels made of parts; gp functions of the point and both scales."""
    return [(name, gp, lambda u, n=name: composed_kernels.transform(n, u))
            for name, (gp, _) in composed_kernels.KERNELS.items()]


def agreed(series, circle):
    """Coefficients on which both agree, an exact zero where both are below 10^-90 of the largest term on the circle."""
    scale = max(abs(c) * RADIUS ** k for k, c in zip(range(LOWEST, HIGHEST + 1), series))
    out = []
    for k, a, b in zip(range(LOWEST, HIGHEST + 1), series, circle):
        if max(abs(a), abs(b)) * RADIUS ** k < scale * mpf(10) ** -90:
            out.append(mpf(0))
        elif abs(a - b) > abs(a) * mpf(10) ** -(DIGITS + 8):
            raise ValueError("disagreement %s %s" % (mp.nstr(a, 30), mp.nstr(b, 30)))
        else:
            out.append(a)
    return out


def rows_at(kernel, u0, coefficients, source):
    """Rows for the powers -order .. -1, or one row of order 0 with the value at the point."""
    order = max([-(LOWEST + i) for i, c in enumerate(coefficients[:-LOWEST]) if c != 0] + [0])
    place = str(u0)
    powers = range(-order, 0) if order else [0]
    return ["%s,%s,%d,%d,%s,%s" % (kernel, place, order, k, decimal(coefficients[k - LOWEST]), source) for k in powers]


def decimal(c):
    return "0" if c == 0 else mp.nstr(c, DIGITS, strip_zeros=False, min_fixed=-4, max_fixed=59)


HEADER = """# Laurent coefficients of Borel transforms B(u) (normalisation of kernel-coefficients.csv, mu = scale, prefactor left
# out) at every multiple of 1/2 from -6 to 6: value multiplies (u-u0)^power, 60 significant digits.
# order: pole order, with one row per power -order .. -1 (a zero among them is a coefficient that vanishes). order 0: no pole
# at this point; then power = 0 and value = B(u0) (0 = exact zero by the same rule), the limit where the formula is 0/0.
# Elsewhere in -6 <= u <= 6 the transforms are regular. Anomalous dimensions are entire. Parameters at their defaults.
# No pole means: coefficients below 10^-90 of the largest term on a circle of radius 1/8 in both computations. Made by tests/referee/kernel_laurent.py.
"""


def laurent_rows(functions, script, call, source):
    work = [(kernel, gp, function, u0) for kernel, gp, function in functions for u0 in POINTS]
    lines = pari.run(script + "\n".join("show(%s);" % (call % (gp, u0)) for _, gp, _, u0 in work) + "\n").strip().split("\n")
    rows = []
    for (kernel, _, function, u0), line in zip(work, lines):
        series = [mpf(s.replace(" E", "e")) for s in line.strip("[]").split(", ")]
        centre = mpf(u0.numerator) / u0.denominator
        circle = kernels.laurent(function, centre, RADIUS, 192, LOWEST, HIGHEST)
        rows += rows_at(kernel, u0, agreed(series, circle), source)
    return rows


def main(path):
    mp.dps = 170
    source = "PARI/GP %s power series and mpmath %s circle agree; tests/referee/kernel_laurent.py" % (
        pari.version(), mpmath.__version__)
    rows = laurent_rows(transforms(), SCRIPT, "%s(%s)", source)
    rows += laurent_rows(composed_transforms(), COMPOSED_SCRIPT, "%s(%s,1,1)", source)
    with open(path, "w") as out:
        out.write(HEADER + "kernel,u0,order,power,value,source\n" + "\n".join(rows) + "\n")
    print(len(rows), "rows")


if __name__ == "__main__":
    main(sys.argv[1])
