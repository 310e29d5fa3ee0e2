"""Formulas with unit_3f2 and the points to expand them about: poles at 1/2, 0, -1/2, -1 of the argument, products with gammas,
derivatives, cancellations. They follow the random formulas in reference-values/generated/formula-expansions.csv."""
from fractions import Fraction as F
from pieces import (ATOM, Lin, Piece, circular, constant, exponential, finite_sum, gamma, gamma_poles, index_power, linear,
                    number, over, plus, polygamma, power, q, times)


def unit(order, lin):
    """unit_3f2(order, a + b u)."""
    half = Lin(lin.a - F(1, 2), lin.b, lin.index)
    return Piece("unit_3f2(%d,%s)" % (order, lin.text()), ATOM,
                 lambda u0: "un(%d,%s,%s)" % (order, q(lin.at(u0)), q(lin.b)),
                 lambda u0: gamma_poles(lin, u0) + gamma_poles(half, u0))


def formulas():
    """(piece, points)"""
    u, reflected, third = Lin(0, 1), Lin(1, -1), Lin(F(1, 3), F(1, 2))
    scheme, line = exponential(Lin(0, F(5, 3))), linear(Lin(3, 1))
    at_zero = plus((1, unit(0, reflected)), (-1, over(constant("pi^2", "Pi^2"), number(F(6)))))
    without_half = plus((1, unit(0, u)), (-1, over(constant("pi", "Pi"), linear(Lin(-1, 2, style=1)))))
    without_zero = plus((1, unit(0, u)), (1, over(number(F(3)), linear(Lin(0, 2)))))
    neighbours = plus((1, unit(0, u)), (-1, over(times(linear(u), unit(0, Lin(1, 1))), number(F(2)), linear(Lin(-1, 2)))))
    sums = finite_sum(1, 3, lambda k: over(unit(0, Lin(0, -1, k)), index_power(k, 2)))
    return [
        (unit(0, u), (1, F(5, 4), F(1, 3), F(1, 2), 0, F(-1, 2), -1)),
        (unit(0, reflected), (0, F(1, 2), 1, F(3, 2), 2, -2)),
        (unit(1, reflected), (0, F(1, 2), 1, F(3, 2))),
        (unit(2, third), (0, F(1, 3), F(-2, 3), F(-5, 3), F(-8, 3))),
        (unit(3, u), (1, F(1, 2), 0, F(-1, 2), -1)),
        (over(times(scheme, circular("sin", u), unit(0, reflected)), constant("pi", "Pi")), (0, F(1, 2), 1, 2)),
        (times(gamma(Lin(1, -2)), unit(0, Lin(1, 2))), (0, F(1, 2), F(-1, 4), F(-1, 2))),
        (times(gamma(u), power(unit(0, u), 2)), (0, F(1, 2))),
        (over(times(unit(1, Lin(F(1, 2), 1)), unit(0, reflected)), line), (0, F(1, 2), F(-1, 2))),
        (over(times(scheme, unit(0, Lin(F(7, 2), -1))), gamma(Lin(F(1, 2), -1))), (0, F(1, 2), 3)),
        (times(polygamma(1, reflected), unit(1, Lin(2, -1))), (0, 2, F(3, 2))),
        (times(polygamma(0, Lin(0, -1)), circular("sin", u), unit(1, reflected)), (0, 1)),
        (at_zero, (0, F(1, 2))), (power(at_zero, 2), (0,)),
        (without_half, (F(1, 2), 0)), (without_zero, (0, F(1, 2))), (neighbours, (F(1, 2), 0, F(1, 4))),
        (sums, (0, F(1, 2), 1)),
    ]


def candidates():
    return [("unit-3f2", piece, F(u0)) for piece, points in formulas() for u0 in points]
