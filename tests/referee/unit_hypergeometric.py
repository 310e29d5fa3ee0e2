"""W(z) = sum_k [k! Gamma(z)/Gamma(z+k+1)]^2 = z^-2 3F2(1,1,1; 1+z,1+z; 1), unit_3f2 of the formula language, two ways.

Usage: python3 unit_hypergeometric.py special-functions.csv
Recomputes the rows of unit_3f2 in that table by the second way, which shares nothing with the series of the first."""
import csv
import sys
from fractions import Fraction
from mpmath import mp, mpf


def taylor(z, count):
    """W^(k)(z)/k! for k < count by W = (3/4) sum_n 4^-n (z)_n/[(z+n) (z-1/2)_(n+1)], term by term."""
    factor = over([mpf(3) / 4] + [mpf(0)] * (count - 1), z - mpf(1) / 2)
    total = [mpf(0)] * count
    for n in range(int(mp.prec / 2) + 20 + 2 * count):
        total = [a + b for a, b in zip(total, over(factor, z + n))]
        factor = [a / 4 for a in over(times(factor, z + n), z + n + mpf(1) / 2)]
    return total


def times(series, c):
    """series (c + y)."""
    return [c * a + b for a, b in zip(series, [mpf(0)] + series)]


def over(series, c):
    """series/(c + y)."""
    out, last, inverse = [], mpf(0), 1 / c
    for a in series:
        last = (a - last) * inverse
        out.append(last)
    return out


def derivative(n, z):
    """unit_3f2(n, z)."""
    return mp.factorial(int(n)) * taylor(z, int(n) + 1)[int(n)]


def by_tails(z):
    """W(z) from its terms: the first ones added up, the others expanded at large k.

    With w = k + (1+z)/2 the ratio Gamma(k+1)/Gamma(k+1+z) is w^-z times a series in w^-2, so that a square of it is
    sum_j a_j w^(-2z-2j); its sum over k is a Hurwitz zeta function, which continues it to every z."""
    first = int(mp.dps * 1.2) + 20
    terms = int(mp.dps * 0.6) + 10
    head, ratio = mpf(0), 1 / z
    for k in range(first):
        head += ratio ** 2
        ratio *= (k + 1) / (z + k + 1)
    # ln of the ratio: sum_i (-1)^(i+1) [B_(i+1)(a) - B_(i+1)(b)]/(i (i+1)) w^-i at w + a, w + b, here a, b = (1 -+ z)/2
    low, high = (1 - z) / 2, (1 + z) / 2
    logarithm = [mpf(0)] + [-2 * (mp.bernpoly(2 * j + 1, low) - mp.bernpoly(2 * j + 1, high))
                            / (2 * j * (2 * j + 1)) for j in range(1, terms)]
    series = [mpf(1)]
    for m in range(1, terms):
        series.append(mp.fsum(j * logarithm[j] * series[m - j] for j in range(1, m + 1)) / m)
    tail = mp.fsum(a * mp.zeta(2 * z + 2 * j, first + (1 + z) / 2) for j, a in enumerate(series))
    return head + mp.gamma(z) ** 2 * tail


def derivatives_by_tails(z, radius, points, count):
    """The first derivatives, order 0 included, from values on a circle without a pole inside."""
    values = [mp.mpc(by_tails(z + radius * mp.expjpi(mpf(2 * j) / points))) for j in range(points // 2 + 1)]
    values += [mp.conj(v) for v in values[-2:0:-1]]
    return [mp.factorial(n) * mp.re(mp.fsum(v * mp.expjpi(-mpf(2 * j * n) / points) for j, v in enumerate(values)))
            / (points * radius ** n) for n in range(count)]


def nearest_pole(z):
    """Distance of a real z from the nearest pole."""
    top = mpf(1) / 2 if z > mpf(1) / 4 else mp.nint(2 * z) / 2
    return abs(z - min(top, mpf(1) / 2))


def main(path):
    with open(path, newline="") as table:
        rows = [r for r in csv.DictReader(line for line in table if not line.startswith("#")) if r["function"] == "unit_3f2"]
    worst, second = [mpf(0), mpf(0)], {}
    for row in rows:
        order, place = row["arguments"].split(";")
        mp.dps = 130
        z = mpf(Fraction(place).numerator) / Fraction(place).denominator
        value = mpf(row["value"])
        worst[0] = max(worst[0], abs(derivative(int(order), z) / value - 1))
        mp.dps = 110
        if place not in second:
            second[place] = derivatives_by_tails(z, nearest_pole(z) / 128, 32, 4)
        worst[1] = max(worst[1], abs(second[place][int(order)] / value - 1))
    print(len(rows), "rows, largest relative difference:", mp.nstr(worst[0], 3), "by the series,",
          mp.nstr(worst[1], 3), "by the tails")


if __name__ == "__main__":
    main(sys.argv[1])
