"""Makes reference-values/sum-rule.csv: truncated sum rule for the strength K of a Borel singularity, 45 digits.

Usage: python3 sum_rule.py OUTPUT.csv
f(R) = R^p sum_{n>=1} a_n y^n, y = alpha_s(R)/4pi, dy/d ln R = -2 sum_k beta_k y^(k+2). Recursion used:
  gamma_k = p a_(k+1) - 2 sum_{j<k} (k-j) beta_j a_(k-j)
  sum_k g_k z^k = 1/(1 + sum_k beta_k/beta0 (z/2beta0)^k)
  sum_k S_k z^k = [sum g_k z^k] exp(-p sum_{k>=2} g_k z^(k-1)/(k-1)) [sum gamma_k z^k/(2beta0)^(k+1)]
  K_m = (2/p) Gamma(1+b) sum_{k<=m} S_k p^k/Gamma(1+b+k),  b = (p/2) beta1/beta0^2.
The real-QCD values are also computed by a second form of the rule, in alpha_s itself; both must agree to 60 digits."""
import sys
from mpmath import mp, mpf
import kernels
from formulas import function_of_u

DIGITS = 45


def beta_function(nf):
    """beta_0 .. beta_4, SU(3), alpha_s/4pi."""
    z3, z4, z5, n = mp.zeta(3), mp.zeta(4), mp.zeta(5), mpf(nf)
    f = lambda a, b: mpf(a) / b
    return [
        11 - f(2, 3) * n,
        102 - f(38, 3) * n,
        f(2857, 2) - f(5033, 18) * n + f(325, 54) * n ** 2,
        f(149753, 6) + 3564 * z3 - (f(1078361, 162) + f(6508, 27) * z3) * n
        + (f(50065, 162) + f(6472, 81) * z3) * n ** 2 + f(1093, 729) * n ** 3,
        f(8157455, 16) + f(621885, 2) * z3 - f(88209, 2) * z4 - 288090 * z5
        + n * (-f(336460813, 1944) - f(4811164, 81) * z3 + f(33935, 6) * z4 + f(1358995, 27) * z5)
        + n ** 2 * (f(25960913, 1944) + f(698531, 81) * z3 - f(10526, 9) * z4 - f(381760, 81) * z5)
        + n ** 3 * (-f(630559, 5832) - f(48722, 243) * z3 + f(1618, 27) * z4 + f(460, 9) * z5)
        + n ** 4 * (f(1205, 2916) - f(152, 81) * z3)]


def pole_mass(nl):
    """c_1 .. c_4 of M/mbar(mbar) in alpha_s^(nl)(mbar)/pi; c_4 with its printed decimals taken as exact."""
    l2, p2, p4, z3, z5 = mp.log(2), mp.pi ** 2, mp.pi ** 4, mp.zeta(3), mp.zeta(5)
    li, n, f = mp.polylog(4, mpf(1) / 2), mpf(nl), lambda a, b: mpf(a) / b
    c2 = f(307, 32) + p2 / 3 + p2 / 9 * l2 - z3 / 6 - n * (f(71, 144) + p2 / 18)
    c3 = (f(8462917, 93312) + f(652841, 38880) * p2 - f(695, 7776) * p4 - f(575, 162) * p2 * l2
          - f(22, 81) * p2 * l2 ** 2 - f(55, 162) * l2 ** 4 - f(220, 27) * li + f(58, 27) * z3
          - f(1439, 432) * p2 * z3 + f(1975, 216) * z5
          + n * (-f(231847, 23328) - f(991, 648) * p2 + f(61, 1944) * p4 - f(11, 81) * p2 * l2
                 + f(2, 81) * p2 * l2 ** 2 + l2 ** 4 / 81 + f(8, 27) * li - f(241, 72) * z3)
          + n ** 2 * (f(2353, 23328) + f(13, 324) * p2 + f(7, 54) * z3))
    c4 = mpf("3562.20") - mpf("745.290") * n + mpf("43.3963") * n ** 2 - mpf("0.678141") * n ** 3
    return [f(4, 3), c2, c3, c4]


# truncated power series as lists, index = power -----------------------------------------------------------------------

def product(a, b, size):
    return [mp.fsum(a[i] * b[k - i] for i in range(k + 1) if i < len(a) and k - i < len(b)) for k in range(size)]


def reciprocal(a, size):
    out = [1 / mpf(a[0])]
    for k in range(1, size):
        out.append(-mp.fsum(a[i] * out[k - i] for i in range(1, k + 1) if i < len(a)) / a[0])
    return out


def exponential(a, size):
    """exp of a series without constant term."""
    out = [mpf(1)]
    for k in range(1, size):
        out.append(mp.fsum(i * a[i] * out[k - i] for i in range(1, k + 1) if i < len(a)) / k)
    return out


# the rule -------------------------------------------------------------------------------------------------------------

class Running:
    """g_k and the exponential factor for one beta function and one p."""

    def __init__(self, beta, p, size):
        self.beta = list(beta) + [mpf(0)] * (size + 2 - len(beta))
        self.p, self.size, self.twice = mpf(p), size, 2 * self.beta[0]
        ratios = [self.beta[k] / self.beta[0] / self.twice ** k for k in range(size + 2)]
        self.g = reciprocal(ratios, size + 2)
        self.exponent = [mpf(0)] + [self.g[k + 1] / k for k in range(1, size + 1)]
        self.b = self.p / 2 * self.beta[1] / self.beta[0] ** 2
        damping = exponential([-self.p * e for e in self.exponent], size)
        self.front = product(self.g, damping, size)

    def strengths(self, a):
        """S_k from a_1, a_2, ... (a[0] = a_1)."""
        gamma = [self.p * a[k] - 2 * mp.fsum((k - j) * self.beta[j] * a[k - j - 1] for j in range(k))
                 for k in range(len(a))]
        return product(self.front, [c / self.twice ** (k + 1) for k, c in enumerate(gamma)], len(a))

    def partial_sums(self, s):
        terms = [2 / self.p * mp.gamma(1 + self.b) * c * self.p ** k / mp.gamma(1 + self.b + k)
                 for k, c in enumerate(s)]
        return [mp.fsum(terms[:k + 1]) for k in range(len(terms))]

    def series_from(self, s, count):
        """a_1 .. a_count whose strengths are s, continued by zeros."""
        s = list(s) + [mpf(0)] * (count - len(s))
        gamma = product(reciprocal(self.front, count), s, count)
        a = []
        for k in range(count):
            lower = mp.fsum((k - j) * self.beta[j] * a[k - j - 1] for j in range(k))
            a.append((gamma[k] * self.twice ** (k + 1) + 2 * lower) / self.p)
        return a

    def asymptotic(self, n, terms):
        """a_(n+1) of K = 1 with the given number of corrections."""
        h = exponential([self.p * e for e in self.exponent], terms + 1)
        return (self.beta[0] ** (n + 1) * (2 / self.p) ** n * mp.fsum(
            h[l] * self.p ** l * mp.gamma(n + 1 + self.b - l) for l in range(terms + 1)) / mp.gamma(1 + self.b))


def at_scale(a, beta, p, scale):
    """a'_n of the same f written with R' = scale R, divided by scale^p: exact Lie series, all beta_k given."""
    size = len(a)
    log = mp.log(scale)
    power, total, factor = [mpf(0), mpf(1)] + [mpf(0)] * (size - 1), [mpf(0)] * (size + 1), mpf(1)
    for j in range(size + 1):
        total = [t + factor * q for t, q in zip(total, power)]
        # D = -2 sum beta_k y^(k+2) d/dy
        power = [mp.fsum(-2 * beta[k] * (i - k - 1) * power[i - k - 1] for k in range(len(beta)) if i - k - 1 >= 1)
                 for i in range(size + 1)]
        factor *= -log / (j + 1)
    out, y_power = [mpf(0)] * (size + 1), [mpf(1)] + [mpf(0)] * size
    for c in a:
        y_power = product(y_power, total, size + 1)
        out = [o + c * q for o, q in zip(out, y_power)]
    return [c / scale ** p for c in out[1:]]


def second_form(c, beta):
    """N by order for p = 1, in alpha_s: h_k and v_k, e_k of the mass relation r_n = c_(n+1)/pi^(n+1)."""
    four_pi = 4 * mp.pi
    size = len(c)
    b_i = [beta[i] / four_pi ** (i + 1) for i in range(len(beta))]
    b0, b = b_i[0], beta[1] / (2 * beta[0] ** 2)
    r = [x / mp.pi ** (n + 1) for n, x in enumerate(c)]
    v = reciprocal(b_i, size + 1)
    e = exponential([mpf(0)] + [v[k + 1] / k / 2 for k in range(1, size)], size)
    g = [r[n] - 2 * mp.fsum(b_i[j] * (n - j) * r[n - 1 - j] for j in range(n)) for n in range(size)]
    h = [x / 2 for x in product(product(g, v, size), reciprocal(e, size), size)]
    terms = [h[k] * (2 * b0) ** (1 - k) * mp.gamma(1 + b) / mp.gamma(1 + b + k) for k in range(size)]
    return [mp.fsum(terms[:k + 1]) for k in range(size)]


SCALES = ["1", "1/2", "2", "1/sqrt(2)", "sqrt(2)"]


def scale_value(text):
    return function_of_u(text)(mpf(0))


def chain_rows():
    """Pole-mass chain with one-loop running: K_k = c_k/(2^k k!), and the same through the recursion."""
    on_shell = kernels.taylor(kernels.pole_mass_on_shell, mpf(1) / 4, 512, 24)
    tilde = kernels.borel_weights(kernels.taylor(kernels.gamma_m_half, mpf(5) / 4, 512, 24))
    weights = [a - b for a, b in zip(on_shell[1:], tilde[1:])]
    series = [mp.factorial(n) * w for n, w in enumerate(weights[:21])]
    rows = []
    for text in ("1", "1/2", "2"):
        moved = at_scale(series, [mpf(1)], 1, scale_value(text))
        run = Running([mpf(1)], 1, 21)
        sums = run.partial_sums(run.strengths(moved))
        for k, value in enumerate(sums):
            direct = moved[k] / (mpf(2) ** k * mp.factorial(k))
            if abs(direct - value) > mpf(10) ** -60:
                raise ValueError("telescoping fails at %d" % k)
            rows.append(("chain-pole-mass", 1, "", text, k, value))
    rows.append(("chain-pole-mass-limit", 1, "", "1", "", 4 * mp.exp(mpf(5) / 6)))
    return rows


def other_chain_rows():
    """K_k = c_k p^k/(2^k k!) of chains whose nearest singularity is another one: no limit."""
    weights = kernels.taylor(kernels.adler, mpf(1) / 2, 512, 13)
    rows = [("chain-adler", p, "", "1", k, w / 3 * (mpf(p) / 2) ** k) for p in (2, 4) for k, w in enumerate(weights)]
    on_shell = kernels.taylor(kernels.pole_mass_on_shell, mpf(1) / 4, 512, 14)
    tilde = kernels.borel_weights(kernels.taylor(kernels.gamma_m_half, mpf(5) / 4, 512, 14))
    half = 4 * mp.exp(mpf(5) / 6)
    for k in range(13):
        rest = on_shell[k + 1] - tilde[k + 1] - half * mpf(2) ** k
        rows.append(("chain-pole-mass-beyond-half", 3, "", "1", k, rest * (mpf(3) / 2) ** k))
    return rows


def null_rows():
    beta = beta_function(4)
    a = [(beta[0] / 2) ** n for n in range(1, 16)]
    rows = []
    for p in (1, 2, 4):
        run = Running(beta, p, 15)
        rows += [("null-test", p, 4, "1", k, v) for k, v in enumerate(run.partial_sums(run.strengths(a)))]
    return rows


def constructed_rows():
    beta = beta_function(4)[:3]
    s = [mpf(1), mpf("0.7"), mpf("-0.3")]
    rows = []
    for p in (1, 2, 3, 4):
        run = Running(beta, p, 100)
        rows.append(("constructed-strength", p, 4, "1", "", run.partial_sums(s)[-1]))
        a = run.series_from(s, 91)
        if max(abs(x - y) for x, y in zip(run.strengths(a)[:3], s)) > mpf(10) ** -60:
            raise ValueError("inversion fails")
        rows += [("constructed-coefficient", p, 4, "1", n, a[n - 1]) for n in list(range(1, 13)) + [81]]
        rows.append(("constructed-ratio", p, 4, "1", 81, a[80] / run.asymptotic(80, 12)))
    return rows


def qcd_rows():
    rows = []
    for nl in (0, 3, 4, 5):
        beta, c = beta_function(nl), pole_mass(nl)
        a = [x * mpf(4) ** (n + 1) for n, x in enumerate(c)]
        run = Running(beta, 1, 4)
        for text in SCALES:
            moved = at_scale(a, beta, 1, scale_value(text))
            sums = run.partial_sums(run.strengths(moved))
            values = [beta[0] * k / (4 * mp.pi) for k in sums]
            again = second_form([x / mpf(4) ** (n + 1) for n, x in enumerate(moved)], beta)
            if max(abs(x - y) for x, y in zip(values, again)) > mpf(10) ** -60:
                raise ValueError("second form differs")
            rows += [("qcd-pole-mass-N", 1, nl, text, k, v) for k, v in enumerate(values)]
    return rows


HEADER = """# Truncated sum rule for the strength K of (1-2u/p)^(-1-b), f(R) = R^p sum_n a_n (alpha_s(R)/4pi)^n, b = (p/2) beta1/beta0^2:
# K_k = (2/p) Gamma(1+b) sum_{j<=k} S_j p^j/Gamma(1+b+j), S_j from the recursion written in tests/referee/sum_rule.py. 45 digits.
# lambda: the series is rewritten exactly with R' = lambda R and divided by lambda^p. k: index of the last term (k+1 loops).
# chain-pole-mass: c_n of the pole mass, mu = scale, one-loop running, without CF/beta0: K_k = c_k/(2^k k!) at lambda 1;
# chain-pole-mass-limit: the value for k to infinity, 4 exp(5/6). chain-pole-mass-beyond-half: the same at p = 3 after the pole
# at u = 1/2 is taken out; chain-adler: c_n/3 of the Adler function. Both have no limit: a nearer singularity wins.
# null-test: a_n = (beta0/2)^n, nl = 4, beta_0..beta_4, 0 beyond.
# constructed-*: S = (1, 7/10, -3/10, 0, ...), nl = 4, beta_0..beta_2, 0 beyond: -strength K; -coefficient a_k with k = n;
# -ratio a_81 over the asymptotic formula of K = 1 with corrections l <= 12 (tends to K).
# qcd-pole-mass-N: N = beta0 K/(4 pi) of M/mbar(mbar), R = mbar, alpha_s^(nl), beta_0..beta_4; c_1..c_3 exact,
# c_4 = 3562.20 - 745.290 nl + 43.3963 nl^2 - 0.678141 nl^3 with these decimals taken as exact (its own error: 1.64, 0.040 nl).
# Sources of the inputs: rows beta and M/mbar(mbar) of fixed-order.csv; the rule: arXiv:0803.4214, 0908.3189, 1704.01580.
# Checked: telescoping sum, inversion of the recursion, and N also from the rule written in powers of alpha_s, all to 60 digits.
"""


def main(path):
    mp.dps = 120
    rows = chain_rows() + other_chain_rows() + null_rows() + constructed_rows() + qcd_rows()
    source = "computed with mpmath; tests/referee/sum_rule.py"
    with open(path, "w") as out:
        out.write(HEADER + "case,p,nl,lambda,k,value,source\n")
        for case, p, nl, scale, k, value in rows:
            text = mp.nstr(value, DIGITS, strip_zeros=False, min_fixed=-4, max_fixed=44)
            out.write("%s,%s,%s,%s,%s,%s,%s\n" % (case, p, nl, scale, k, text, source))
    print(len(rows), "rows")


if __name__ == "__main__":
    main(sys.argv[1])
