"""Writes the coefficients on which PARI/GP and mpmath agree. Used by the generators of reference values."""
import mpmath
from mpmath import mp, mpf
import pari

COLUMNS = "kernel,mu_over_scale,operator_mu_over_scale,n,value,source\n"


def rows(program, script, jobs, by_circle, orders, digits):
    """One row per job and order. A job starts with kernel, mu/scale, operator mu/scale, PARI/GP text; by_circle(job, cache)
    gives its c_n by mpmath. A disagreement within the digits printed stops the program."""
    source = "PARI/GP %s power series and mpmath %s circle agree; tests/referee/%s" % (
        pari.version(), mpmath.__version__, program)
    output = pari.run(script + "\n".join("show(%s);" % j[3] for j in jobs) + "\n")
    out, cache, worst = [], {}, mpf(0)
    for job, line in zip(jobs, output.strip().split("\n")):
        series = [mpf(s.replace(" E", "e")) for s in line.strip("[]").split(", ")]
        circle = by_circle(job, cache)
        for n in orders:
            if max(abs(series[n]), abs(circle[n])) < mpf(10) ** -(digits + 8):
                out.append("%s,%s,%s,%d,0,%s" % (job[0], job[1], job[2], n, source))
                continue
            difference = abs(series[n] - circle[n]) / abs(series[n])
            worst = max(worst, difference)
            if difference > mpf(10) ** -(digits + 8):
                raise ValueError("%s n=%d: relative difference %s" % (job[:3], n, mp.nstr(difference, 5)))
            text = mp.nstr(series[n], digits, strip_zeros=False, min_fixed=-4, max_fixed=99)
            out.append("%s,%s,%s,%d,%s,%s" % (job[0], job[1], job[2], n, text, source))
    print(len(out), "rows, largest relative difference", mp.nstr(worst, 3))
    return out


def write(path, header, lines):
    with open(path, "w") as out:
        out.write(header + COLUMNS + "\n".join(lines) + "\n")


def exponential_weights(x, terms):
    """Taylor coefficients of (x^2)^u."""
    return [(2 * mp.log(x)) ** n / mp.factorial(n) for n in range(terms)]


def multiplied(a, b):
    """Product of two Taylor series, as long as the shorter."""
    return [mp.fsum(a[k] * b[n - k] for k in range(n + 1)) for n in range(min(len(a), len(b)))]
