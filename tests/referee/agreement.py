"""Writes the coefficients on which PARI/GP and mpmath agree. Used by the generators of reference values."""
import mpmath
from mpmath import mp, mpf
import pari

COLUMNS = "kernel,mu_over_scale,operator_mu_over_scale,n,value,source\n"


def write(path, header, program, script, jobs, by_circle, orders, digits):
    """One row per job and order. A job starts with kernel, mu/scale, operator mu/scale, PARI/GP text; by_circle(job, cache)
    gives its c_n by mpmath. A disagreement within the digits printed stops the program."""
    source = "PARI/GP %s power series and mpmath %s circle agree; tests/referee/%s" % (
        pari.version(), mpmath.__version__, program)
    output = pari.run(script + "\n".join("show(%s);" % j[3] for j in jobs) + "\n")
    rows, cache, worst = [], {}, mpf(0)
    for job, line in zip(jobs, output.strip().split("\n")):
        series = [mpf(s.replace(" E", "e")) for s in line.strip("[]").split(", ")]
        circle = by_circle(job, cache)
        for n in orders:
            difference = abs(series[n] - circle[n]) / abs(series[n])
            worst = max(worst, difference)
            if difference > mpf(10) ** -(digits + 8):
                raise ValueError("%s n=%d: relative difference %s" % (job[:3], n, mp.nstr(difference, 5)))
            text = mp.nstr(series[n], digits, strip_zeros=False, min_fixed=-4, max_fixed=99)
            rows.append("%s,%s,%s,%d,%s,%s" % (job[0], job[1], job[2], n, text, source))
    with open(path, "w") as out:
        out.write(header + COLUMNS + "\n".join(rows) + "\n")
    print(len(rows), "rows, largest relative difference", mp.nstr(worst, 3))


def exponential_weights(x, terms):
    """Taylor coefficients of (x^2)^u."""
    return [(2 * mp.log(x)) ** n / mp.factorial(n) for n in range(terms)]


def multiplied(a, b):
    """Product of two Taylor series, as long as the shorter."""
    return [mp.fsum(a[k] * b[n - k] for k in range(n + 1)) for n in range(min(len(a), len(b)))]
