"""Formulas in which poles of single terms or factors cancel: the valuation is zero or more."""
from fractions import Fraction as F
from math import factorial
from pieces import (ATOM, PRODUCT, Lin, Piece, base_power, circular, constant, exponential, gamma, linear, number, over,
                    plus, polygamma, power, times)


def pole(coefficient, u0, order):
    """coefficient/(u-u0)^order with an exact coefficient."""
    zero = linear(Lin(-u0, 1, style=1))
    return over(number(coefficient), power(zero, order) if order > 1 else zero)


def exponential_value(slope, u0):
    r = slope * u0
    text = "exp(%s)" % (r.numerator if r.denominator == 1 else "%d/%d" % (r.numerator, r.denominator))
    gp = "exp(%d/%d)" % (r.numerator, r.denominator)
    return constant(text, gp)


class Cancellations:
    """Terms whose poles at a chosen point cancel, from one source of random pieces."""

    def __init__(self, source):
        self.source = source
        self.random = source.random

    def gamma_at_pole(self):
        """(u0, n, b) with gamma(s + b u) having its pole number n at u0."""
        b = F(self.source.pick([1, -1, 2, -2, F(1, 2), F(-3, 2)]))
        n = self.random.randint(0, 3)
        u0 = self.source.pick([F(0), F(1, 2), F(1), F(-1), F(2), F(3, 2), F(1, 3), F(-2), F(3)])
        return u0, n, b, Lin(-n - b * u0, b, style=self.random.randrange(3))

    def gamma_minus_pole(self):
        u0, n, b, lin = self.gamma_at_pole()
        residue = F((-1) ** n, factorial(n)) / b
        return plus((1, gamma(lin)), (-1, pole(residue, u0, 1))), u0

    def kernel_minus_pole(self):
        """exp(5 u/3) R(u) gamma - exp(5 u0/3) R(u0) residue/(u-u0)."""
        u0, n, b, lin = self.gamma_at_pole()
        shift = self.source.pick([s for s in (1, 2, 3, F(1, 2)) if s + u0 != 0])
        value = (shift + u0) * F((-1) ** n, factorial(n)) / b
        kernel = times(exponential(Lin(0, F(5, 3))), linear(Lin(shift, 1)), gamma(lin))
        return plus((1, kernel), (-1, times(exponential_value(F(5, 3), u0), pole(value, u0, 1)))), u0

    def digamma_minus_pole(self):
        u0, n, b, lin = self.gamma_at_pole()
        order = self.source.pick([0, 1, 2])
        strength = F((-1) ** (order + 1) * factorial(order)) / b ** (order + 1)
        return plus((1, polygamma(order, lin)), (-1, pole(strength, u0, order + 1))), u0

    def two_digammas(self):
        """b1 psi(s1 + b1 u) - b2 psi(s2 + b2 u): the poles at u0 cancel."""
        u0, n, b, lin = self.gamma_at_pole()
        other = F(self.source.pick([1, 2, -1, F(1, 2)]))
        m = self.random.randint(0, 2)
        second = Lin(-m - other * u0, other)
        if (lin.a, lin.b) == (second.a, second.b):
            second = Lin(second.a - 1, other)
        return plus((1, times(number(b), polygamma(0, lin))), (-1, times(number(other), polygamma(0, second)))), u0

    def two_gammas(self):
        """Two gammas with equal residue times rational weights."""
        u0, n, b, lin = self.gamma_at_pole()
        m = self.random.randint(0, 2)
        second = Lin(-m + b * u0, -b)
        first_residue = F((-1) ** n, factorial(n)) / b
        second_residue = F((-1) ** m, factorial(m)) / -b
        return plus((1, times(number(1 / first_residue), gamma(lin))),
                    (-1, times(number(1 / second_residue), gamma(second)))), u0

    def gamma_ratio(self):
        """gamma over gamma, both with a pole at u0, with further regular factors."""
        u0, n, b, lin = self.gamma_at_pole()
        other = F(self.source.pick([1, -1, 2, F(1, 2)]))
        below = gamma(Lin(-self.random.randint(0, 2) - other * u0, other))
        return over(times(self.source.exponential(), gamma(lin)), below), u0

    def pole_times_zero(self):
        u0, n, b, lin = self.gamma_at_pole()
        factor = self.source.pick([linear(Lin(-u0, 1, style=1)), linear(Lin(u0, -1))])
        return over(times(factor, gamma(lin), self.source.exponential()), linear(Lin(7, 1))), u0

    def sine_times_gamma(self):
        u0, n, b, lin = self.gamma_at_pole()
        sine = circular("sin", Lin(-u0, 1))
        return times(sine, gamma(lin), polygamma(1, Lin(F(1, 2) - u0, 1))), u0

    def inverse_sine_minus_pole(self):
        """1/sin(pi (u-u0))^2 - 1/(pi (u-u0))^2."""
        u0 = self.source.pick([F(0), F(1, 2), F(1), F(-1), F(1, 3)])
        sine = circular("sin", Lin(-u0, 1))
        square = over(constant("pi^2", "Pi^2"), power(sine, 2))
        return plus((1, square), (-1, pole(F(1), u0, 2))), u0

    def duplication(self):
        """psi(2u) - psi(u)/2 - psi(u+1/2)/2 = ln 2, plus something regular or multiplied by a function."""
        u0 = self.source.pick([F(0), F(-1), F(-2), F(-1, 2)])
        half = number(F(1, 2))
        body = plus((1, polygamma(0, Lin(0, 2))), (-1, times(half, polygamma(0, Lin(0, 1)))),
                    (-1, times(half, polygamma(0, Lin(F(1, 2), 1, style=1)))))
        return times(base_power(F(2), Lin(0, 2)), body) if self.random.random() < 0.5 else body, u0

    def trigamma_shift(self):
        """psi1(u) - psi1(u+1) = 1/u^2 less half of it, and a double zero in front."""
        u0 = self.source.pick([F(0), F(1), F(1, 2)])
        body = plus((1, polygamma(1, Lin(-u0, 1, style=1))), (-1, polygamma(1, Lin(u0, -1))),
                    (1, self.source.exponential()))
        return times(body, self.source.line()), u0

    def any(self, i):
        makers = [self.gamma_minus_pole, self.kernel_minus_pole, self.digamma_minus_pole, self.two_digammas,
                  self.two_gammas, self.gamma_ratio, self.pole_times_zero, self.sine_times_gamma,
                  self.inverse_sine_minus_pole, self.duplication, self.trigamma_shift]
        return makers[i % len(makers)]()
