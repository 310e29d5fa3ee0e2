"""Makes reference-values/generated/formula-expansions.csv: random admissible formulas and their Laurent coefficients.

Usage: python3 formula_expansions.py OUTPUT.csv
Two independent computations: PARI/GP power series built from the formula tree, and contour integrals with mpmath on the
formula's text, read by a parser of its own. A formula on which they differ is dropped and the number of drops printed."""
import random
import sys
from fractions import Fraction as F
import mpmath
from mpmath import mp, mpf
import pari
import unit_formulas
from cancelling_formulas import Cancellations
from formulas import function_of_u, laurent
from pieces import Lin, gamma, linear, number, plus, power, quadratic, times, over, base_power, exponential, polygamma
from random_formulas import POINTS, Source

SEED = 20240611
LOWEST, HIGHEST = -9, 15
PRINTED, ENTRIES = 90, 8
FAMILIES = [("product", 60), ("two-terms", 46), ("three-terms", 26), ("fractional-arguments", 34), ("circular", 34),
            ("finite-sum", 30), ("power", 22), ("removable-factor", 14), ("cancelling-poles", 43)]


def syntax_formulas():
    """Formulas that test the reading of the text: signs, powers of powers, decimals, brackets. With their points."""
    u = linear(Lin(0, 1))
    minus_square = plus((-1, power(u, 2)), (1, gamma(Lin(1, -1))))
    tower = times(base_power(F(2), Lin(0, 3)), power(power(quadratic(1, 1), 2), 3), gamma(Lin(F(1, 2), 1, style=3)))
    decimal = over(exponential(Lin(F(1, 4), F(1, 2), style=3)), linear(Lin(F(5, 4), -1, style=3)))
    nested = power(plus((1, power(plus((1, u), (-1, number(F(1, 3)))), 2)), (-1, over(number(F(1, 9)), linear(Lin(1, 1))))), 2)
    negative = over(polygamma(2, Lin(0, F(1, 2))), power(linear(Lin(-3, 1, style=1)), 2), linear(Lin(0, -1)))
    division = over(over(number(F(7)), linear(Lin(2, 1))), linear(Lin(2, -1)), gamma(Lin(-1, 1, style=1)))
    return [(p, F(c)) for p, points in [(minus_square, (0, 1)), (tower, (F(-1, 2), 2)), (decimal, (F(5, 4), 0)),
                                        (nested, (0,)), (negative, (0, 3)), (division, (2, 0))] for c in points]


def candidate(family, source, cancellations, i):
    u0 = source.pick(POINTS)
    make = {"product": source.product, "two-terms": source.two_terms, "three-terms": source.three_terms,
            "fractional-arguments": source.fractional_arguments, "circular": source.circular_functions,
            "finite-sum": source.finite_sums, "power": source.powers}
    if family == "removable-factor":
        u0 = source.pick([F(1, 3), F(1, 2), F(1), F(-2), F(3, 2), F(1, 4)])
        return source.removable(u0), u0
    if family == "cancelling-poles":
        return cancellations.any(i)
    piece = make[family]()
    singular = [p for p in POINTS if any(d == 0 for d in piece.singular(p))]
    if singular and source.random.random() < 0.65:
        u0 = source.pick(singular)
    return piece, u0


def candidates():
    source = Source(random.Random(SEED))
    cancellations = Cancellations(source)
    out = []
    for family, count in FAMILIES:
        for i in range(count + count // 2 + 4):
            piece, u0 = candidate(family, source, cancellations, i)
            if len(piece.text) <= 300:
                out.append((family, piece, u0))
    return [("syntax", p, c) for p, c in syntax_formulas()] + out + unit_formulas.candidates()


def expansions_by_pari(rows):
    """Coefficients LOWEST..HIGHEST of each row as decimal strings; the empty list where gp cannot expand the formula."""
    script = [pari.PRELUDE, "show(f) = { f = f + O(x^30); print(vector(%d, i, polcoef(f, i+%d, x)*1.)) }"
              % (HIGHEST - LOWEST + 1, LOWEST - 1)]
    for family, piece, u0 in rows:
        script.append("iferr(show(%s), E, print(\"[]\"));" % piece.gp(u0))
    lines = pari.run("\n".join(script) + "\n").strip().split("\n")
    return [[s.replace(" E", "e") for s in line.strip("[]").split(", ") if s] for line in lines]


def radius(piece, u0):
    near = [abs(mpf(d.numerator) / d.denominator if isinstance(d, F) else d) for d in piece.singular(u0)]
    return min([d for d in near if d > mpf(10) ** -20] + [mpf(1)]) / 8


def judge(piece, u0, by_pari):
    """(valuation, coefficients) if both computations agree, else None."""
    if len(by_pari) != HIGHEST - LOWEST + 1:
        return None
    r = radius(piece, u0)
    centre = mpf(u0.numerator) / u0.denominator
    contour = laurent(function_of_u(piece.text), centre, r, 192, LOWEST, HIGHEST)
    series = [mpf(s) for s in by_pari]
    scale = max(abs(c) * r ** k for k, c in zip(range(LOWEST, HIGHEST + 1), series))
    if scale == 0:
        return None
    for k, a, b in zip(range(LOWEST, HIGHEST + 1), series, contour):
        if abs(a - b) * r ** k > scale * mpf(10) ** -125:
            print("differ", k, mp.nstr(abs(a - b) * r ** k / scale, 5), file=sys.stderr)
            return None
    sizes = [abs(c) * r ** k / scale for k, c in zip(range(LOWEST, HIGHEST + 1), series)]
    if any(mpf(10) ** -120 < s < mpf(10) ** -60 for s in sizes):
        return None
    kept = [c if s > mpf(10) ** -60 else mpf(0) for c, s in zip(series, sizes)]
    valuation = next(i for i, c in enumerate(kept) if c != 0)
    if valuation + ENTRIES > len(kept) or valuation == 0:
        return None
    listed = slice(valuation, valuation + ENTRIES)
    if any(a != 0 and abs(a - b) > abs(a) * mpf(10) ** -95 for a, b in zip(kept[listed], contour[listed])):
        return None
    return valuation + LOWEST, kept[listed]


def decimal(c):
    return "0" if c == 0 else mp.nstr(c, PRINTED, strip_zeros=False, min_fixed=-3, max_fixed=20)


HEADER = """# Laurent expansions of %d formulas of the kernel language, most of them random, about rational points: referee for interval arithmetic.
# coefficients: those of (u-u0)^k for k = lowest .. lowest+7, separated by ;, rounded to 90 significant digits; "0" = zero.
# valuation: lowest power with a non-zero coefficient (negative: pole order). lowest: power of the first coefficient listed,
# always equal to valuation. The number after the family name in id is a running number; seed %d.
# Families: product, two-terms, three-terms (kernels, polygammas), fractional-arguments (gamma at quarters and thirds),
# circular, finite-sum, power, removable-factor (0/0 factors), cancelling-poles (single terms have poles, the sum has none),
# syntax, unit-3f2 (the function of the inclusive widths; chosen by hand). Made by tests/referee/formula_expansions.py.
# Two computations agree to 10^-125 of the largest term on a circle of radius 1/8 of the distance to the nearest other
# possible singular point: PARI/GP series arithmetic on the formula tree (230 digits) and a contour integral with mpmath on
# the text (180 digits, 192 points). A zero means: below 10^-120 of that largest term in both, where no non-zero coefficient
# lay between 10^-120 and 10^-60. Each coefficient listed agrees to a relative 10^-95.
"""


def main(path):
    mp.dps = 180
    source = "PARI/GP %s series and mpmath %s contour integral agree; tests/referee/formula_expansions.py" % (
        pari.version(), mpmath.__version__)
    rows = candidates()
    wanted = dict(FAMILIES, syntax=100, **{"unit-3f2": 100})
    lines, seen, dropped = [], set(), 0
    for (family, piece, u0), by_pari in zip(rows, expansions_by_pari(rows)):
        if wanted[family] == 0 or (piece.text, u0) in seen:
            continue
        verdict = judge(piece, u0, by_pari)
        if verdict is None or (family == "cancelling-poles" and verdict[0] < 0):
            dropped += 1
            print("dropped", family, piece.text, u0, file=sys.stderr)
            continue
        seen.add((piece.text, u0))
        wanted[family] -= 1
        valuation, coefficients = verdict
        u0_text = str(u0.numerator) if u0.denominator == 1 else "%d/%d" % (u0.numerator, u0.denominator)
        lines.append('%s-%03d,"%s",%s,%d,%d,%s,%s' % (family, len(lines) + 1, piece.text, u0_text, valuation, valuation,
                                                     ";".join(decimal(c) for c in coefficients), source))
    with open(path, "w") as out:
        out.write(HEADER % (len(lines), SEED))
        out.write("id,formula,u0,valuation,lowest,coefficients,source\n" + "\n".join(lines) + "\n")
    print(len(lines), "rows,", dropped, "dropped")


if __name__ == "__main__":
    main(sys.argv[1])
