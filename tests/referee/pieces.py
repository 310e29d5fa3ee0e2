"""Building blocks of random admissible formulas: each knows its text, its expansion in PARI/GP about a rational point and
its singular points (a superset, poles and zeros of the elementary functions alike)."""
from fractions import Fraction
from mpmath import mp, mpf

ATOM, POWER, PRODUCT, SUM = 4, 3, 2, 1


class Piece:
    def __init__(self, text, level, gp, singular):
        self.text = text            # in the formula language
        self.level = level          # binding strength of the outermost operation
        self.gp = gp                # function of the rational point u0: PARI/GP text, a series in x = u - u0
        self.singular = singular    # function of u0: distances to possible singular points, zero included

    def inside(self, level):
        return self.text if self.level >= level else "(" + self.text + ")"


def q(r):
    """A rational as PARI/GP text."""
    r = Fraction(r)
    return "(%d/%d)" % (r.numerator, r.denominator)


def rational_text(r):
    r = Fraction(r)
    return str(r.numerator) if r.denominator == 1 else "%d/%d" % (r.numerator, r.denominator)


def decimal_text(r):
    """Terminating decimal, or None if the denominator has another factor than 2 and 5."""
    r = Fraction(r)
    for places in range(1, 4):
        n = r * 10 ** places
        if n.denominator == 1:
            s = "%0*d" % (places + 1, abs(n.numerator))
            return ("-" if r < 0 else "") + s[:-places] + "." + s[-places:]
    return None


class Lin:
    """a + index + b u, with the sum index k as an optional further term."""

    def __init__(self, a, b, index=None, style=0):
        self.a, self.b, self.index, self.style = Fraction(a), Fraction(b), index, style

    def at(self, u0):
        shift = self.index if isinstance(self.index, int) else 0
        return self.a + shift + self.b * u0

    def slope_term(self):
        b = abs(self.b)
        if self.style == 3 and b.denominator in (2, 4, 5):
            body = decimal_text(b) + "*u"
        elif b == 1:
            body = "u"
        elif b.denominator == 1:
            body = "%d*u" % b
        elif b.numerator == 1:
            body = "u/%d" % b.denominator
        else:
            body = "%d*u/%d" % (b.numerator, b.denominator)
        return body

    def constant_terms(self):
        terms = []
        if self.index is not None:
            terms.append((1, "k"))
        if self.a != 0:
            body = rational_text(abs(self.a))
            if self.style == 3 and decimal_text(self.a) and self.a.denominator > 1:
                body = decimal_text(abs(self.a))
            terms.append((1 if self.a > 0 else -1, body))
        return terms

    def text(self):
        d = self.b.denominator
        if self.style == 2 and d > 1 and self.index is None and (self.a * d).denominator == 1:
            return "(%s)/%d" % (Lin(self.a * d, self.b * d).text(), d)
        slope = (1 if self.b > 0 else -1, self.slope_term())
        terms = self.constant_terms()
        terms = [slope] + terms if self.style == 1 else terms + [slope]
        out = ""
        for sign, body in terms:
            out += ("-" if sign < 0 else "+" if out else "") + body
        return out

    def level(self):
        t = self.text()
        if t.isalnum():
            return ATOM
        if t.startswith("(") or not ("+" in t[1:] or "-" in t):
            return PRODUCT
        return SUM


def constant(text, gp, level=ATOM):
    return Piece(text, level, lambda u0: gp, lambda u0: [])


def number(r, decimal=False):
    text = decimal_text(r) if decimal and decimal_text(r) else rational_text(r)
    return constant(text, q(r), SUM if r < 0 else PRODUCT if "/" in text else ATOM)


def pole_ladder(lin, u0, step=1):
    """Distances from u0 to the points where the argument is an integer multiple of 1/step (near ones only)."""
    c = lin.at(u0)
    base = c.numerator * step // c.denominator
    return [abs((Fraction(base + n, step) - c) / lin.b) for n in range(-3, 5)]


def gamma_poles(lin, u0):
    """Distances from u0 to the points where the argument is zero or a negative integer (near ones only)."""
    c = lin.at(u0)
    base = min(c.numerator // c.denominator, 0)
    return [abs((base + n - c) / lin.b) for n in range(-3, 3) if base + n <= 0]


def linear(lin):
    root = lambda u0: [abs(lin.at(u0) / lin.b)]
    return Piece(lin.text(), lin.level(), lambda u0: "(%s+%s*x)" % (q(lin.at(u0)), q(lin.b)), root)


def quadratic(a, c):
    """a + c u^2, irreducible or not."""
    text = rational_text(a) + ("-" if c < 0 else "+") + ("" if abs(c) == 1 else rational_text(abs(c)) + "*") + "u^2"
    root = mp.sqrt(mpf(-a) / mpf(c))
    gp = lambda u0: "(%s+%s*(%s+x)^2)" % (q(a), q(c), q(u0))
    return Piece(text, SUM, gp, lambda u0: [abs(mpf(u0.numerator) / u0.denominator - s * root) for s in (1, -1)])


def gamma(lin):
    return Piece("gamma(%s)" % lin.text(), ATOM, lambda u0: "ga(%s,%s)" % (q(lin.at(u0)), q(lin.b)),
                 lambda u0: gamma_poles(lin, u0))


def polygamma(order, lin):
    if order == 0:
        text, gp = "digamma(%s)" % lin.text(), lambda u0: "ps(%s,%s)" % (q(lin.at(u0)), q(lin.b))
    else:
        text = "polygamma(%d,%s)" % (order, lin.text())
        gp = lambda u0: "pg(%d,%s,%s)" % (order, q(lin.at(u0)), q(lin.b))
    return Piece(text, ATOM, gp, lambda u0: gamma_poles(lin, u0))


def circular(name, lin):
    """sin or cos of pi times a linear argument; cos may not stand in a denominator."""
    if lin.a == 0 and lin.b == 1:
        argument = "pi*u"
    elif lin.a == 0 and lin.b.denominator == 1:
        argument = "%d*pi*u" % lin.b
    elif lin.a == 0:
        argument = "pi*u/%d" % lin.b.denominator if lin.b.numerator == 1 else "%s*pi*u" % rational_text(lin.b)
    else:
        argument = "pi*(%s)" % lin.text()
    gp = lambda u0: "%s(%s,%s)" % ({"sin": "sp", "cos": "cp"}[name], q(lin.at(u0)), q(lin.b))
    return Piece("%s(%s)" % (name, argument), ATOM, gp, lambda u0: pole_ladder(lin, u0, 2))


def circular_rational(name, lin):
    gp = lambda u0: "%s(lin(%s,%s))" % (name, q(lin.at(u0)), q(lin.b))
    return Piece("%s(%s)" % (name, lin.text()), ATOM, gp, lambda u0: [])


def exponential(lin):
    gp = lambda u0: "ex(%s+%s*x)" % (q(lin.at(u0)), q(lin.b))
    return Piece("exp(%s)" % lin.text(), ATOM, gp, lambda u0: [])


def exponential_constant(text, gp_slope):
    """exp of a constant of the language times u."""
    return Piece("exp(%s*u)" % text, ATOM, lambda u0: "ex(%s*(%s+x))" % (gp_slope, q(u0)), lambda u0: [])


def base_power(base, lin):
    text = lin.text()
    body = text if text.isalnum() else "(" + text + ")"
    base_text = rational_text(base) if base.denominator == 1 else "(" + rational_text(base) + ")"
    gp = lambda u0: "ex(log(%s)*(%s+%s*x))" % (q(base), q(lin.at(u0)), q(lin.b))
    return Piece("%s^%s" % (base_text, body), POWER, gp, lambda u0: [])


def times(*factors):
    text = "*".join(f.inside(PRODUCT if i == 0 else POWER) for i, f in enumerate(factors))
    return Piece(text, PRODUCT if len(factors) > 1 else factors[0].level,
                 lambda u0: "(" + "*".join(f.gp(u0) for f in factors) + ")",
                 lambda u0: [d for f in factors for d in f.singular(u0)])


def over(numerator, *denominators):
    text = numerator.inside(PRODUCT)
    if len(denominators) == 1 or sum(len(d.text) for d in denominators) % 2:
        text += "".join("/" + d.inside(POWER) for d in denominators)
    else:
        text += "/(" + times(*denominators).text + ")"
    every = (numerator,) + denominators
    return Piece(text, PRODUCT, lambda u0: "(" + "/".join(f.gp(u0) for f in every) + ")",
                 lambda u0: [d for f in every for d in f.singular(u0)])


def plus(*signed):
    """Sum of (sign, piece)."""
    text = ""
    for sign, p in signed:
        text += ("-" if sign < 0 and not text else " - " if sign < 0 else " + " if text else "")
        text += p.inside(PRODUCT)
    return Piece(text, SUM, lambda u0: "(" + "+".join("(%d)*%s" % (s, p.gp(u0)) for s, p in signed) + ")",
                 lambda u0: [d for s, p in signed for d in p.singular(u0)])


def power(p, n):
    text = "%s^%s" % (p.inside(ATOM), n if n >= 0 else "(%d)" % n)
    return Piece(text, POWER, lambda u0: "(%s)^(%d)" % (p.gp(u0), n), p.singular)


def finite_sum(first, last, term):
    """sum(k, first, last, term(k)); term takes an integer or the letter k."""
    terms = [term(k) for k in range(first, last + 1)]
    return Piece("sum(k,%d,%d,%s)" % (first, last, term("k").text), ATOM,
                 lambda u0: "(" + "+".join(t.gp(u0) for t in terms) + ")",
                 lambda u0: [d for t in terms for d in t.singular(u0)])


def index_power(k, exponent):
    """k^exponent for the index of a sum."""
    if isinstance(k, int):
        return number(Fraction(k) ** exponent)
    return constant("k^%d" % exponent if exponent > 1 else "k", "", POWER if exponent > 1 else ATOM)


def alternating(k):
    return number(Fraction((-1) ** k)) if isinstance(k, int) else constant("(-1)^k", "", POWER)
