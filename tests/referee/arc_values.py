"""Makes reference-values/generated/arc-values.csv: values of functions at complex points with mpmath.

Usage: python3 arc_values.py OUTPUT.csv
For each formula and radius: the point of the half circle where |h| is largest (samples, then golden section), and
random points of the half circle; for each formula also random points off the circles."""
import csv
import random
import sys
import mpmath
from mpmath import mp, mpf, mpc
import unit_hypergeometric

mp.dps = 50
SEED = 20240612
PRINTED = 30
CIRCLES = [
    ("exp(5*u/3)*6*(1-u)*gamma(u)*gamma(1-2*u)/gamma(3-u)", ["0.75", "1.25", "3.25", "10.25", "40.25"]),
    ("gamma(1/2-u)*exp(5*u/3)/(sqrt(pi)*4^u*gamma(1+u))", ["1", "3", "10", "40"]),
    ("8*exp(5*u/3)*(polygamma(1,(1+u)/2)-polygamma(1,(2+u)/2)-polygamma(1,(3-u)/2)+polygamma(1,(4-u)/2))"
     "/4/((1-u)*(2-u))", ["1.5", "2.5", "3.5", "10.5"]),
    ("sin(1+3*u/2)*(1-2*u)/((u^2+2)*(3-u)^2)+cos(u/3)", ["1", "2.5", "20"]),
    ("digamma(1-u/3)*gamma(1/3+2*u)/gamma(5/4-u)^2*exp(-u)", ["2.6", "10.45"]),
    ("polygamma(3,1/4-u)*polygamma(10,u)*sin(pi*u/2)", ["2.6", "20.1"]),
    ("gamma(30-u)/gamma(1-2*u)", ["20.25", "50.25"]),
    ("(u^4-3*u+5)/((u^2-2)*(u^2+u+1))*exp(u*ln(2)-euler_gamma)", ["0.5", "1.25", "7"]),
]
# Right half plane near the origin, where an asymptotic series with few terms is visibly off.
PLAIN = ["gamma(u)", "digamma(u)", "polygamma(1,u)", "polygamma(3,u)"]
# with the function of the inclusive widths; their random points have a source of their own
UNIT_CIRCLES = [
    ("unit_3f2(0,1-u)", ["0.25", "0.75", "4.75", "20.25"]),
    ("unit_3f2(1,1-u)*exp(5*u/3)", ["0.25", "1.25", "3.75"]),
    ("unit_3f2(2,1/3+u/2)", ["0.2", "1.2", "9.1"]),
    ("exp(5*u/3)*sin(pi*u)/pi*(unit_3f2(0,1-u)/u+(1-2*u)*unit_3f2(1,1-u))/gamma(3-u)", ["0.25", "1.75", "6.25"]),
]
POINTS_ON, POINTS_OFF = 24, 12
NAMES = {"exp": mpmath.exp, "gamma": mpmath.gamma, "polygamma": mpmath.polygamma, "sin": mpmath.sin, "cos": mpmath.cos,
         "digamma": mpmath.digamma, "sqrt": mpmath.sqrt, "ln": mpmath.ln, "pi": mp.pi, "euler_gamma": mp.euler, "mpf": mpf,
         "unit": unit_hypergeometric.derivative}


def function(text):
    """Integers become mpf, so that 1/2 is a half in full precision."""
    tokens, number = [], ""
    for c in text.replace("unit_3f2", "unit") + " ":
        if c.isdigit():
            number += c
            continue
        if number:
            tokens.append(f"mpf({number})")
            number = ""
        tokens.append("**" if c == "^" else c)
    source = compile("".join(tokens).replace("polygamma(mpf(", "polygamma(int(").strip(), text, "eval")
    return lambda u: eval(source, dict(NAMES, u=u))


def argmax(h, radius, n):
    def size(t):
        try:
            return abs(h(radius * mpmath.expjpi(t)))
        except ValueError:  # a gamma function below the line at its pole: h vanishes there
            return mpf(0)

    best = max(range(n + 1), key=lambda k: size(mpf(k) / n))
    low, high = max(mpf(best - 1) / n, mpf(0)), min(mpf(best + 1) / n, mpf(1))
    ratio = (mpmath.sqrt(5) - 1) / 2
    for _ in range(60):
        a, b = high - ratio * (high - low), low + ratio * (high - low)
        low, high = (low, b) if size(a) > size(b) else (a, high)
    return max([low, (low + high) / 2, mpf(best) / n], key=size)


def row(text, h, kind, radius, u):
    re, im = float(u.real), float(u.imag)
    value = h(mpc(re, im))
    digits = lambda x: mpmath.nstr(x, PRINTED, min_fixed=0, max_fixed=0)
    return [text, kind, radius, repr(re), repr(im), digits(mpmath.re(value)), digits(mpmath.im(value)),
            "mpmath " + mpmath.__version__]


def on_circles(circles, source, samples):
    for text, radii in circles:
        h = function(text)
        for radius in radii:
            r = mpf(radius)
            mp.dps = 20
            t = argmax(h, r, samples)
            mp.dps = 50
            yield row(text, h, "maximum", radius, r * mpmath.expjpi(t))
            for _ in range(POINTS_ON):
                yield row(text, h, "circle", radius, r * mpmath.expjpi(mpf(source.random())))
        for k in range(POINTS_OFF):
            reach = 3 if k % 2 == 0 else 60
            yield row(text, h, "plane", "", mpc(source.uniform(-reach, reach), source.uniform(-reach, reach)))


def rows():
    source = random.Random(SEED)
    yield from on_circles(CIRCLES, source, 4000)
    for text in PLAIN:
        h = function(text)
        for k in range(POINTS_OFF):
            yield row(text, h, "plane", "", mpc(source.uniform(0.5, 5), source.uniform(-4, 4)))
    yield from on_circles(UNIT_CIRCLES, random.Random(SEED + 1), 500)


HEADER = f"""# Values of functions of u at complex points, {PRINTED} significant digits; referee for bounds on arcs and complex evaluation.
# kind: maximum = where |h| is largest on the circle |u| = radius (to the accuracy of a double), circle = random point of
# the upper half of that circle, plane = random point. re, im: the point, decimal text of doubles; value_re, value_im: h there.
# Made by tests/referee/arc_values.py with seed {SEED} (rows of unit_3f2: {SEED + 1}), computed with 50 digits."""

if __name__ == "__main__":
    with open(sys.argv[1], "w", newline="") as out:
        out.write(HEADER + "\n")
        writer = csv.writer(out, lineterminator="\n")
        writer.writerow("formula,kind,radius,re,im,value_re,value_im,source".split(","))
        for r in rows():
            writer.writerow(r)
