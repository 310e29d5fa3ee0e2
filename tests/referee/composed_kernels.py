"""Widths, Sudakov objects and kernels put together from parts, at any scales, for both computations: PARI/GP series about a
rational point, and mpmath functions. Written from the formulas of the kernel sheets.

X = mu/scale moves the coupling, Y = operator mu/scale the operator. With F = F(eps,u) of a single subtraction
B = [Y^(2u) F(0,u) - Ftilde(u)]/u (X/Y)^(2u), Ftilde = sum_k g_k u^k/k!, F(-x,0) = sum_k g_k x^k; of a double one, where u F is
regular and the diagram carries Y^(2u), B is the sum of the lines of (S2) times (X/Y)^(2u)."""
import functools
from mpmath import mp, mpf
import kernels
import more_kernels as more

TERMS = 150

# p = F_k0, q = F_k1 as series in y = eps; t, T and entire() as in kernel_laurent.py
GP = r"""
T = 150; t = O(y^(T+1));
default(seriesprecision, T + 10);
uu(c) = lin(c, 1);
e5(c) = ex(5/3*(c+x));
scaled(c, X) = ex(2*log(X)*(c+x));
/* sum_n w[n+1] (c+x)^n by Horner's scheme */
horner(w, c) = { my(v = O(x^ORDER)); forstep(n = #w, 1, -1, v = v*(c+x) + w[n]); v };
entire(f, c) = horner(vector(T, n, polcoef(f, n-1)/(n-1)!), c);
single(F, f, c, X, Y) = (scaled(c, Y)*F - entire(f, c))/uu(c)*scaled(c, X/Y);
double(F, p, q, c, X, Y) = {
  my(l = 2*log(Y), u = uu(c), h = 0, s, w);
  s = (scaled(c, Y)*F - polcoef(p, 0) - (polcoef(q, 0) + l*polcoef(p, 0))*u)/u^2;
  w = vector(T - 1, k, h += 1/k; (-1)^(k-1)*(polcoef(q, k) + l*polcoef(p, k) + h*polcoef(p, k+1))/k!);
  (s + horner(w, c))*scaled(c, X/Y);
}
/* gamma_k, k = 1, 2, ..., as Borel weights */
gammas(p, q) = {
  my(h = 0);
  sum(k = 1, T, h += 1/k; 2*(-1)^(k-1)*(polcoef(q, k-1) + h*polcoef(p, k))*y^(k-1)) + O(y^T);
}
bubble = 6*exp(Euler*y+t)*gamma(1+y+t)*gamma(2-y+t)^2/gamma(4-2*y+t);
/* psi(1-y) */
psione = -Euler - sum(k = 1, T, zeta(k+1)*y^k) + t;
first(g) = g*exp(Euler*y+t)/bubble;
/* g and the logarithmic derivative of the diagram in u at u = 0 */
second(g, r) = first(g)*(r + log(bubble)/y);
inverses = 1/(1-y+t) + 1/(2-y+t);
/* form factor */
hard0 = (-4+6*y-2*y^2)/((1-y)*(2-y)*gamma(1-y+t));
hardp = first(hard0); hardq = second(hard0, (-4*y+2*y^2)/(-4+6*y-2*y^2+t) + inverses + 2*Euler - Euler + psione);
hardF(c) = -4*e5(c)*ga(1-c,-1)*ga(1+c,1)/((1-uu(c))*(2-uu(c)));
/* jet function: psi(1-y) of the two gammas below cancels; gammaE of gamma(1-u) and of e^(-gammaE u) as well */
jet0 = (8-12*y+4*y^2)/((1-y)*(2-y)*gamma(1-y+t));
jetp = first(jet0); jetq = second(jet0, (-6+8*y-2*y^2)/(8-12*y+4*y^2+t) + inverses);
jetF(c) = e5(c)*ex(-Euler*(c+x))*(8-6*uu(c))/((1-uu(c))*(2-uu(c))*ga(1+c,1));
deltaF(c) = e5(c)*(8-6*uu(c))/((1-uu(c))*(2-uu(c))*ga(1+c,1)*ga(1-c,-1));
/* soft functions */
soft0 = 4/gamma(1-y+t);
softp = first(soft0); softq = second(soft0, Euler - psione - 2*Euler);
softF(c) = 4*e5(c)*ex(-2*Euler*(c+x))*ga(1-c,-1)/ga(1+c,1);
thrustq = second(-soft0, 2*Euler - Euler - psione - 2*Euler);
thrustF(c) = -4*e5(c)*ex(-2*Euler*(c+x))*ga(1-2*c,-2)/(ga(1-c,-1)*ga(1+c,1));
hard(c, X, Y) = double(hardF(c), hardp, hardq, c, X, Y);
timelike(c, X, Y) = double(2*cp(c,1)*hardF(c), 2*hardp, 2*hardq, c, X, Y);
jet(c, X, Y) = double(jetF(c), jetp, jetq, c, X, Y);
delta(c, X, Y) = double(deltaF(c), jetp, jetq, c, X, Y);
soft(c, X, Y) = double(softF(c), softp, softq, c, X, Y);
thrust(c, X, Y) = double(thrustF(c), -softp, thrustq, c, X, Y);
threshold(c, X, Y) = 2*hard(c, X, Y) + delta(c, X, Y);
hardgamma(c, X, Y) = entire(gammas(hardp, hardq), c)*scaled(c, X);
jetgamma(c, X, Y) = entire(gammas(jetp, jetq), c)*scaled(c, X);
softgamma(c, X, Y) = entire(gammas(softp, softq), c)*scaled(c, X);
/* heavy quarks */
bare = gamma(4+2*y+t)/(6*gamma(1-y+t)*gamma(2+y+t)^2);
onshell(c) = e5(c)*ga(1+c,1)*ga(1-2*c,-2)/ga(3-c,-1);
pole(c, X, Y) = single(6*(1-uu(c))*onshell(c), 2*(3+2*y)/gamma(3+y+t)*bare, c, X, Y);
scalar(c, X, Y) = single(3*(uu(c)^2-uu(c)+1)*onshell(c), (3+2*y)/gamma(3+y+t)*bare, c, X, Y);
timecomponent(c, X, Y) = single(3*(uu(c)^2+uu(c)-1)*onshell(c), -(3+2*y)/gamma(3+y+t)*bare, c, X, Y);
magneticf(c, X) = 4*(1+uu(c))*onshell(c)*scaled(c, X);
magnetic0 = (2+y)*(2+5*y+2*y^2)/(2*(1+y))/gamma(3+y+t);
magnetica(c, X, Y) = single((2-uu(c))*(2+3*uu(c))/2*onshell(c), magnetic0*bare, c, X, Y);
chromomag(c, X, Y) = 4/3*magneticf(c, X) + 3*magnetica(c, X, Y);
selfF(c) = 3*e5(c)*ga(1+2*c,2)*ga(1-c,-1)/(2*(2*uu(c)-1)*ga(2+c,1));
selfenergy(c, X, Y) = single(selfF(c), -(3+2*y)/(2*gamma(2+y+t))*bare, c, X, Y);
ratio(c, X, Y) = scalar(c, X, Y) - timecomponent(c, X, Y);
potential(c, X) = e5(c)*ex(-2*log(2)*(c+x))*ga(1/2-c,-1)/(sqrt(Pi)*ga(1+c,1))*scaled(c, X);
psmass(c, X) = e5(c)/(1-2*uu(c))*scaled(c, X);
energy(c, X) = 3*sqrt(Pi)/4*e5(c)/(ga(1+c,1)*ga(5/2-c,-1))*scaled(c, X);
binding(c, X) = (1-uu(c))/(1-2*uu(c))*energy(c, X);
psmsbar(c, X, Y) = pole(c, X, Y) - 4/2*psmass(c, 2*X);
kinetic(c, X, Y) = pole(c, X, Y) - 16/3/2*binding(c, 2*X) - 2/4*energy(c, 2*X);
static(c, X, Y) = 2*pole(c, X, Y) - 4*Pi/3*potential(c, 3*X);
/* widths */
sum3f2(c) = subst(unit(1-c), x, -x);
topwidth(c, X) = {
  my(u = uu(c), V, A, W);
  V = 2*(3*u^4-2*u^3-u^2+2)/(u*(u-1))*ga(c,1)*ga(1-2*c,-2)/ga(3-c,-1);
  A = -2*(3*u^6-23*u^5+55*u^4-47*u^3+10*u^2-6*u+4)/(u^3*(u-2)^2*(u-1)^3);
  W = 2*(3*u^4-20*u^3+35*u^2-18*u+2)/(u*(u-2)*(u-1)^2);
  scaled(c, X)*e5(c)*(V + sp(c,1)/Pi*(A + W*sum3f2(c)));
}
btou(c, X) = {
  my(u = uu(c), V, A, W, W1);
  V = ga(1+c,1)*ga(1-2*c,-2)/ga(3-c,-1)*((18*u^3-206*u^2-28*u+124)/(3*u*(u-4))
      + 32*(1-2*u)*(1+u)/(u*(u-4))*(ps(-c,-1) - ps(-2*c,-2)));
  A = -2*(9*u^9-238*u^8+1772*u^7-5974*u^6+10317*u^5-9096*u^4+3658*u^3-760*u^2+504*u-288)
      /(3*u^3*(u-1)^3*(u-2)^3*(u-3)*(u-4));
  W = 2*(9*u^4-175*u^3+298*u^2-250*u+24)/(3*u*(u-1)*(u-2)*(u-4));
  W1 = 16*(1-2*u)*(1+u)/((u-1)*(u-2)*(u-4));
  scaled(c, X)*e5(c)*(V + sp(c,1)/Pi*(A + W*sum3f2(c) + W1*deriv(sum3f2(c), x)));
}
toppole(c, X, Y) = topwidth(c, X);
topmsbar(c, X, Y) = topwidth(c, X) + 3*pole(c, X, Y);
btoupole(c, X, Y) = btou(c, X);
btoumsbar(c, X, Y) = btou(c, X) + 5*pole(c, X, Y);
"""


class Plain:
    """B(u) needs no subtraction."""

    def __init__(self, function):
        self.function = functools.lru_cache(maxsize=None)(function)

    def at(self, u):
        return self.function(u)

    def weights(self, x, y, count):
        return scaled(x, kernels.taylor(self.function, mpf(1) / 4, 640, count))


class Single:
    """F(0,u) and F(-x,0)."""

    def __init__(self, on_shell, dimension, radius=mpf(5) / 4):
        self.on_shell, self.dimension, self.radius = on_shell, dimension, radius

    @functools.lru_cache(maxsize=None)
    def counter(self, count):
        return kernels.borel_weights(kernels.taylor(self.dimension, self.radius, 640, count))

    @functools.lru_cache(maxsize=None)
    def at(self, u):
        return (self.on_shell(u) - mp.polyval(self.counter(TERMS)[::-1], u)) / u

    def weights(self, x, y, count):
        whole = scaled(y, kernels.taylor(self.on_shell, mpf(1) / 4, 640, count + 1))
        return scaled(x / y, [a - b for a, b in zip(whole[1:], self.counter(count + 1)[1:])])


class Double:
    """u F(eps,u), regular, and its limit eps = 0."""

    def __init__(self, diagram, four):
        self.diagram, self.four = diagram, four

    @functools.lru_cache(maxsize=None)
    def columns(self, count):
        return more.columns(self.diagram, count)

    @functools.lru_cache(maxsize=None)
    def counterterms(self, y, count):
        """Coefficients of u^(k-1), k = 1, 2, ..., in the second sum of (S2)."""
        first, second = self.columns(count + 2)
        log = 2 * mp.log(y)
        return [mpf(-1) ** (k - 1) * (second[k] + log * first[k] + mp.harmonic(k) * first[k + 1]) / mp.factorial(k)
                for k in range(1, count + 1)]

    @functools.lru_cache(maxsize=None)
    def at(self, u):
        first, second = self.columns(TERMS + 2)
        return ((self.four(u) - first[0] - second[0] * u) / u ** 2
                + mp.polyval(self.counterterms(mpf(1), TERMS)[::-1], u))

    def weights(self, x, y, count):
        whole = scaled(y, kernels.taylor(self.four, mpf(1) / 4, 640, count + 2))
        return scaled(x / y, [a + b for a, b in zip(whole[2:], self.counterterms(y, count))])


class SingleLogarithm:
    """The anomalous dimension gamma_k = 2 (-1)^(k-1) [F_(k-1)1 + H_k F_k0] of a double subtraction, as Borel weights."""

    def __init__(self, double):
        self.double = double

    @functools.lru_cache(maxsize=None)
    def plain(self, count):
        first, second = self.double.columns(count + 2)
        return kernels.borel_weights([2 * mpf(-1) ** (k - 1) * (second[k - 1] + mp.harmonic(k) * first[k])
                                      for k in range(1, count + 1)])

    def at(self, u):
        return mp.polyval(self.plain(TERMS)[::-1], u)

    def weights(self, x, y, count):
        return scaled(x, self.plain(count))


def scaled(x, weights):
    """(x^2)^u times a Taylor series."""
    powers = [(2 * mp.log(x)) ** n / mp.factorial(n) for n in range(len(weights))]
    return [mp.fsum(powers[k] * weights[n - k] for k in range(n + 1)) for n in range(len(weights))]


def transform(name, u):
    """B(u) at mu = scale."""
    return mp.fsum(w() * mp.power(mpf(s), 2 * u) * part().at(u) for w, part, s in KERNELS[name][1])


def weights(name, x, y, count):
    """c_n/n! at mu = x scale, the operator at y scale."""
    lists = [[w() * a for a in part().weights(x * s, y, count)] for w, part, s in KERNELS[name][1]]
    return [mp.fsum(terms) for terms in zip(*lists)]


@functools.lru_cache(maxsize=None)
def part(name):
    return PARTS[name]()


PARTS = {
    "top": lambda: Plain(more.top_width), "b-to-u": lambda: Plain(more.b_to_u_width),
    "pole": lambda: Single(kernels.pole_mass_on_shell, kernels.gamma_m_half),
    "scalar": lambda: current("hl-current-scalar"), "vector": lambda: current("hl-current-gamma0"),
    "magnetic-f": lambda: Plain(more.chromomagnetic_cf),
    "magnetic-a": lambda: Single(more.chromomagnetic_ca_on_shell, more.chromomagnetic_ca_dimension, mpf(1) / 2),
    "self-energy": lambda: Single(more.self_energy_four, more.self_energy_dimension),
    "potential": lambda: Plain(kernels.static_potential_r), "ps": lambda: Plain(more.ps_mass),
    "binding": lambda: Plain(more.kinetic_binding), "energy": lambda: Plain(more.kinetic_energy),
    "hard": lambda: sudakov("hard-massless"), "jet": lambda: sudakov("jet-quark"),
    "delta": lambda: sudakov("jet-quark-delta"), "soft": lambda: sudakov("soft-dy"),
    "thrust": lambda: sudakov("soft-thrust"), "timelike": lambda: sudakov("hard-massless-timelike"),
    "hard-gamma": lambda: SingleLogarithm(part("hard")), "jet-gamma": lambda: SingleLogarithm(part("jet")),
    "soft-gamma": lambda: SingleLogarithm(part("soft")),
}


def current(name):
    above, below = more.CURRENTS[name]
    return Single(more.on_shell_current(above), more.current_dimension(below))


def sudakov(name):
    return Double(more.SUDAKOV[name], more.FOUR_DIMENSIONS[name])


def terms(*weighted):
    """(weight, part, mu of the part over mu of the whole), the weight taken at the precision of the moment."""
    return [(w if callable(w) else (lambda v=w: mpf(v)), functools.partial(part, name), mpf(s)) for w, name, s in weighted]


# name: (PARI/GP function, parts); parameters at their defaults: mu_f = m/2, mu_k = m/2, m r = 3
KERNELS = {
    "top-width-mw0-pole": ("toppole", terms((1, "top", 1))),
    "top-width-mw0-msbar": ("topmsbar", terms((1, "top", 1), (3, "pole", 1))),
    "b-to-u-width-pole": ("btoupole", terms((1, "b-to-u", 1))),
    "b-to-u-width-msbar": ("btoumsbar", terms((1, "b-to-u", 1), (5, "pole", 1))),
    "hard-massless": ("hard", terms((1, "hard", 1))),
    "hard-massless-timelike": ("timelike", terms((1, "timelike", 1))),
    "jet-quark": ("jet", terms((1, "jet", 1))),
    "jet-quark-delta": ("delta", terms((1, "delta", 1))),
    "soft-dy": ("soft", terms((1, "soft", 1))),
    "soft-thrust": ("thrust", terms((1, "thrust", 1))),
    "dis-threshold": ("threshold", terms((2, "hard", 1), (1, "delta", 1))),
    "hard-gamma": ("hardgamma", terms((1, "hard-gamma", 1))),
    "jet-gamma": ("jetgamma", terms((1, "jet-gamma", 1))),
    "soft-dy-gamma": ("softgamma", terms((1, "soft-gamma", 1))),
    "hqet-self-energy": ("selfenergy", terms((1, "self-energy", 1))),
    "chromomag": ("chromomag", terms((lambda: mpf(4) / 3, "magnetic-f", 1), (3, "magnetic-a", 1))),
    "scalar-over-gamma0": ("ratio", terms((1, "scalar", 1), (-1, "vector", 1))),
    "ps-mass-msbar": ("psmsbar", terms((1, "pole", 1), (-2, "ps", 2))),
    "kinetic-mass-msbar": ("kinetic", terms((1, "pole", 1), (lambda: -mpf(8) / 3, "binding", 2),
                                            (lambda: -mpf(1) / 2, "energy", 2))),
    "static-energy": ("static", terms((2, "pole", 1), (lambda: -4 * mp.pi / 3, "potential", 3))),
}
