"""Makes reference-values/generated/large-orders.csv: coefficients up to c_136 of six kernels, 211 digits.

Usage: python3 large_orders.py OUTPUT.csv
Two computations: PARI/GP power series about u = 0, and mpmath from values on a circle. Only numbers on which both agree to
the digits printed are written; a disagreement stops the program."""
import sys
from mpmath import mp, mpf
import agreement
import kernels

DIGITS = 211
ORDERS = [0, 1, 19, 20, 40, 41, 100, 135, 136]
TERMS = 139
POINTS = 1280

SCRIPT = r"""
default(realprecision, 500);
TERMS = 139; o = O(x^(TERMS+1));
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
cusp = weights(4*gamma(4+2*x+o)/(6*gamma(1+x+o)*gamma(2+x+o)^2*gamma(1-x+o)));
scaled(f, X) = exp(2*log(X)*x+o)*f;
mass(X, Y) = (scaled(F, X) - scaled(Ft, X/Y))/x;
show(f) = print(vector(137, i, (i-1)!*polcoef(f, i-1)*1.));
"""

JOBS = [
    ("pole-mass", "3/2", "1", "mass(3/2,1)", None, None),
    ("pole-mass", "1", "1", "mass(1,1)", None, None),
    ("pole-mass", "1", "3/2", "mass(1,3/2)", None, None),
    ("adler", "3/2", "1", "scaled(adler,3/2)", kernels.adler, mpf(1) / 2),
    ("bjorken-gls", "3/2", "1", "scaled(bjorken,3/2)", kernels.bjorken_gls, mpf(1) / 2),
    ("static-potential-r", "3/2", "1", "scaled(potential,3/2)", kernels.static_potential_r, mpf(1) / 4),
    ("lepton-g2", "3/2", "1", "scaled(g2,3/2)", kernels.lepton_g2, mpf(1) / 4),
    ("cusp", "1", "1", "cusp", None, None),
]


def value(text):
    return mpf(int(text.split("/")[0])) / int((text + "/1").split("/")[1])


def by_circle(job, cache):
    """c_0 .. c_136 from mpmath."""
    name, x_text, y_text, _, function, radius = job
    x, y = value(x_text), value(y_text)
    if name == "pole-mass":
        if name not in cache:
            cache[name] = (kernels.taylor(kernels.pole_mass_on_shell, mpf(1) / 4, POINTS, TERMS),
                           kernels.borel_weights(kernels.taylor(kernels.gamma_m_half, mpf(5) / 4, POINTS, TERMS)))
        on_shell, anomalous = cache[name]
        whole = agreement.multiplied(agreement.exponential_weights(x, TERMS), on_shell)
        counter = agreement.multiplied(agreement.exponential_weights(x / y, TERMS), anomalous)
        borel = [a - b for a, b in zip(whole[1:], counter[1:])]
    elif name == "cusp":
        borel = kernels.borel_weights(kernels.taylor(kernels.cusp, mpf(5) / 4, POINTS, TERMS))
    else:
        borel = agreement.multiplied(agreement.exponential_weights(x, TERMS), kernels.taylor(function, radius, POINTS, TERMS))
    return [mp.factorial(n) * borel[n] for n in range(ORDERS[-1] + 1)]


HEADER = """# Bubble-chain coefficients c_n of six kernels at high orders, 211 significant digits, in the program's normalisation;
# the conventions and the meaning of the columns are those of kernel-coefficients.csv.
# A rational number is rounded to 211 digits like the others. Made by tests/referee/large_orders.py.
"""


def main(path):
    mp.dps = 500
    agreement.write(path, HEADER, agreement.rows("large_orders.py", SCRIPT, JOBS, by_circle, ORDERS, DIGITS))


if __name__ == "__main__":
    main(sys.argv[1])
