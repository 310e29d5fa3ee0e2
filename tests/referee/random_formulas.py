"""Seeded random formulas of the admissible class, in families, each with a point of expansion."""
from fractions import Fraction as F
from pieces import (Lin, alternating, base_power, circular, circular_rational, constant, exponential,
                    exponential_constant, finite_sum, gamma, index_power, linear, number, over, plus, polygamma,
                    power, quadratic, times)

POINTS = [F(0), F(1, 2), F(1), F(-1), F(2), F(3, 2), F(1, 3), F(-2), F(3), F(-1, 2), F(5, 2), F(1, 4), F(-3, 2), F(4),
          F(2, 3)]
CONSTANTS = [("pi", "Pi"), ("euler_gamma", "Euler"), ("zeta(3)", "zeta(3)"), ("ln(2)", "log(2)"), ("sqrt(2)", "sqrt(2)"),
             ("zeta(5)", "zeta(5)"), ("ln(3)", "log(3)"), ("exp(5/6)", "exp(5/6)"), ("sqrt(pi)", "sqrt(Pi)")]
SLOPES = [1, -1, 1, -1, 2, -2, 2, -2, F(1, 2), F(-1, 2), 3, F(3, 2), F(-3, 2)]
SHIFTS = [0, 1, 1, 2, 3, -1, F(1, 2), F(3, 2), F(5, 2), 4]
BROKEN = [F(1, 4), F(3, 4), F(5, 4), F(-1, 4), F(1, 3), F(2, 3), F(1, 6), F(7, 4)]


class Source:
    """Random pieces from one seeded generator."""

    def __init__(self, random):
        self.random = random

    def pick(self, choices):
        return self.random.choice(choices)

    def lin(self, shifts=SHIFTS, slopes=SLOPES):
        return Lin(self.pick(shifts), self.pick(slopes), style=self.random.randrange(4))

    def line(self):
        """A linear polynomial, 1-u or 2+3*u or u-1/3."""
        return linear(Lin(self.pick([1, 2, 3, -1, F(1, 2), F(-1, 3), 4]), self.pick([1, -1, 1, -1, 2, -2, 3, F(1, 2)]),
                          style=self.random.randrange(3)))

    def polynomial(self):
        if self.random.random() < 0.7:
            return self.line()
        return quadratic(self.pick([1, 2, 3, -2, 4]), self.pick([1, -1, 2]))

    def constant(self):
        return constant(*self.pick(CONSTANTS))

    def number(self):
        return number(F(self.random.randint(1, 12), self.pick([1, 1, 2, 3, 4, 5])), self.random.random() < 0.3)

    def exponential(self):
        kind = self.random.randrange(5)
        if kind == 0:
            return exponential(Lin(0, F(5, 3)))
        if kind == 1:
            return exponential(self.lin([0, F(5, 3), 1], [F(5, 3), -1, F(1, 2), F(-2, 3)]))
        if kind == 2:
            return base_power(self.pick([F(2), F(4), F(3), F(1, 2)]), self.lin([0, 1, -1], [1, -1, 2, -2, F(1, 2)]))
        return exponential_constant(*self.pick([("2*ln(2)", "(2*log(2))"), ("(5/3-euler_gamma)", "(5/3-Euler)"),
                                                ("euler_gamma", "Euler"), ("(ln(3)/2)", "(log(3)/2)"),
                                                ("(-2*euler_gamma)", "(-2*Euler)"), ("pi", "Pi")]))

    def gamma(self, shifts=SHIFTS):
        return gamma(self.lin(shifts))

    def polygamma(self, shifts=SHIFTS):
        return polygamma(self.pick([0, 0, 1, 1, 2, 3]), self.lin(shifts))

    def sine(self):
        return circular("sin", self.lin([0, 0, F(1, 2), F(1, 3), 1], [1, 1, 2, F(1, 2), -1]))

    def oscillating(self):
        kind = self.random.randrange(4)
        if kind == 0:
            return self.sine()
        if kind == 1:
            return circular("cos", self.lin([0, 0, F(1, 4), 1], [1, 1, 2, F(1, 2)]))
        return circular_rational(self.pick(["sin", "cos"]), self.lin([0, F(1, 2), 1], [1, F(2, 3), F(1, 2), -2]))

    # families -----------------------------------------------------------------------------------------------------

    def kernel_term(self, shifts=SHIFTS, polynomials=True):
        """exp * polynomial * gammas / gammas, as in a bubble-chain kernel."""
        factors = []
        if self.random.random() < 0.6:
            factors.append(self.exponential())
        if polynomials and self.random.random() < 0.6:
            factors.append(self.polynomial())
        factors += [self.gamma(shifts) for _ in range(self.random.randint(1, 2))]
        if self.random.random() < 0.3:
            factors.insert(0, self.number())
        below = [self.gamma(shifts) for _ in range(self.random.randint(0, 2))]
        if polynomials and self.random.random() < 0.5:
            below.append(self.polynomial())
        top = times(*factors)
        return over(top, *below) if below else top

    def polygamma_term(self, shifts=SHIFTS):
        top = self.polygamma(shifts)
        if self.random.random() < 0.4:
            top = times(self.pick([self.constant, self.number, self.exponential])(), top)
        return over(top, self.polynomial()) if self.random.random() < 0.6 else top

    def product(self):
        return self.kernel_term()

    def two_terms(self):
        return plus((1, self.kernel_term()), (self.pick([1, -1]), self.polygamma_term()))

    def three_terms(self):
        return plus((1, times(self.constant(), self.polygamma_term())), (self.pick([1, -1]), self.kernel_term()),
                    (self.pick([1, -1]), over(self.constant(), self.polynomial())))

    def fractional_arguments(self):
        first = self.kernel_term(BROKEN + [1, 2])
        if self.random.random() < 0.5:
            return first
        return plus((1, first), (self.pick([1, -1]), self.polygamma_term(BROKEN)))

    def circular_functions(self):
        top = times(self.oscillating(), self.pick([self.gamma, self.exponential, self.polynomial, self.polygamma])())
        kind = self.random.randrange(3)
        if kind == 0:
            return over(top, self.sine())
        if kind == 1:
            return over(times(self.number(), top), self.polynomial(), self.gamma())
        return plus((1, over(top, self.polynomial())), (-1, over(self.exponential(), self.sine())))

    def finite_sums(self):
        kind = self.random.randrange(5)
        s = self.pick([1, -1, 2])
        if kind == 0:
            body = finite_sum(1, 4, lambda k: over(alternating(k), linear(Lin(0, s, k))))
        elif kind == 1:
            body = finite_sum(1, 3, lambda k: over(gamma(Lin(0, s, k)), index_power(k, 2)))
        elif kind == 2:
            p = self.polynomial()
            body = finite_sum(2, 5, lambda k: over(times(index_power(k, 1), p), power(linear(Lin(0, s, k)), 2)))
        elif kind == 3:
            order = self.pick([0, 1])
            body = finite_sum(0, 3, lambda k: times(alternating(k), polygamma(order, Lin(F(1, 2), s, k))))
        else:
            inner = over(self.exponential(), self.polynomial())
            body = finite_sum(1, 3, lambda k: times(plus((1, linear(Lin(1, s, k))), (1, inner)), gamma(Lin(-1, -s, k))))
        return over(times(self.kernel_term(), body), self.polynomial()) if self.random.random() < 0.4 else times(
            self.pick([self.number, self.exponential, self.constant])(), body)

    def powers(self):
        kind = self.random.randrange(4)
        if kind == 0:
            return power(plus((1, self.gamma()), (self.pick([1, -1]), self.polygamma_term())), 2)
        if kind == 1:
            return times(self.gamma(), power(times(self.polynomial(), self.gamma()), -1))
        if kind == 2:
            return over(power(self.kernel_term(), 2), power(self.polynomial(), 3))
        return times(power(self.sine(), -2), power(plus((1, self.exponential()), (1, self.line())), 3))

    def removable(self, u0):
        """A factor that is 0/0 at u0 and equal to 1 or a constant elsewhere."""
        zero = linear(Lin(-u0, 1, style=1))
        if self.random.random() < 0.5:
            return over(times(self.kernel_term(), zero), zero)
        twice = linear(Lin(-2 * u0, 2, style=1))
        return plus((1, times(over(twice, zero), self.kernel_term())), (-1, self.polygamma_term()))
