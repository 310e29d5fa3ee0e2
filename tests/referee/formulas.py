"""The kernel formula language, evaluated at complex points with mpmath; written from the language's description only.

Grammar: sums and differences of products and quotients; ^ binds tighter than a leading minus and is right-associative;
no implicit multiplication; names pi, euler_gamma, u and the index of a sum; functions zeta, ln, sqrt, exp, sin, cos,
gamma, digamma, polygamma(k, z), unit_3f2(k, z), sum(index, first, last, term)."""
import re
from mpmath import mp, mpf
import unit_hypergeometric

TOKEN = re.compile(r"\s*(?:(\d+\.\d+|\d+)|([A-Za-z_][A-Za-z_0-9]*)|(.))")


def tokens(text):
    out = []
    for number, name, sign in TOKEN.findall(text):
        if number:
            out.append(("number", number))
        elif name:
            out.append(("name", name))
        elif sign.strip():
            out.append(("sign", sign))
    return out + [("end", "")]


class Reader:
    """Recursive descent over the tokens; every method returns a function of an environment {name: value}."""

    def __init__(self, text):
        self.rest = tokens(text)

    def take(self, sign):
        if self.rest[0] == ("sign", sign):
            return self.rest.pop(0)
        return None

    def need(self, sign):
        if not self.take(sign):
            raise ValueError("expected %s before %s" % (sign, self.rest[0]))

    def formula(self):
        value = self.total()
        if self.rest[0][0] != "end":
            raise ValueError("left over: %s" % (self.rest[0],))
        return value

    def total(self):
        value = self.product()
        while True:
            if self.take("+"):
                value = (lambda a, b: lambda e: a(e) + b(e))(value, self.product())
            elif self.take("-"):
                value = (lambda a, b: lambda e: a(e) - b(e))(value, self.product())
            else:
                return value

    def product(self):
        value = self.signed()
        while True:
            if self.take("*"):
                value = (lambda a, b: lambda e: a(e) * b(e))(value, self.signed())
            elif self.take("/"):
                value = (lambda a, b: lambda e: a(e) / b(e))(value, self.signed())
            else:
                return value

    def signed(self):
        if self.take("-"):
            return (lambda a: lambda e: -a(e))(self.signed())
        return self.power()

    def power(self):
        base = self.atom()
        if self.take("^"):
            return (lambda a, b: lambda e: raised(a(e), b(e)))(base, self.signed())
        return base

    def atom(self):
        kind, text = self.rest.pop(0)
        if kind == "number":
            return lambda e: mpf(text)
        if kind == "name":
            return self.named(text)
        if text == "(":
            value = self.total()
            self.need(")")
            return value
        raise ValueError("unexpected %s" % text)

    def named(self, name):
        if name == "pi":
            return lambda e: +mp.pi
        if name == "euler_gamma":
            return lambda e: +mp.euler
        if not self.take("("):
            return lambda e: e[name]
        if name == "sum":
            return self.finite_sum()
        arguments = [self.total()]
        while self.take(","):
            arguments.append(self.total())
        self.need(")")
        function = FUNCTIONS[name]
        return lambda e: function(*[a(e) for a in arguments])

    def finite_sum(self):
        index = self.rest.pop(0)[1]
        self.need(",")
        first = self.total()
        self.need(",")
        last = self.total()
        self.need(",")
        term = self.total()
        self.need(")")
        return lambda e: mp.fsum(term({**e, index: mpf(k)}) for k in range(int(first(e)), int(last(e)) + 1))


def raised(base, exponent):
    if exponent == int(mp.re(exponent)) and mp.im(exponent) == 0:
        return base ** int(mp.re(exponent))
    return mp.power(base, exponent)


FUNCTIONS = {
    "zeta": mp.zeta, "ln": mp.log, "sqrt": mp.sqrt, "exp": mp.exp, "sin": mp.sin, "cos": mp.cos,
    "gamma": mp.gamma, "digamma": mp.digamma, "polygamma": lambda k, z: mp.psi(int(k), z),
    "unit_3f2": unit_hypergeometric.derivative,
}


def function_of_u(text):
    """The formula as a function of the complex number u."""
    value = Reader(text).formula()
    return lambda u: value({"u": u})


def laurent(function, centre, radius, points, lowest, highest):
    """Laurent coefficients of a function that is real on the real axis, from a circle, by the trapezoidal rule."""
    half = []
    for j in range(points // 2 + 1):
        half.append(mp.mpc(function(centre + radius * mp.expjpi(mpf(2 * j) / points))))
    out = []
    for k in range(lowest, highest + 1):
        total = mp.re(half[0]) + mp.re(half[-1]) * (-1) ** k
        for j in range(1, points // 2):
            total += 2 * mp.re(half[j] * mp.expjpi(-mpf(2 * j * k) / points))
        out.append(total / points / mpf(radius) ** k)
    return out
