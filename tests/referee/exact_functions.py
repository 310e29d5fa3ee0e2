"""Writes reference-values/generated/exact-functions.csv: values of constants in the formula language.

Each row is computed by PARI/GP and again by mpmath; a row on which they differ in the first 58 digits stops the run.
Usage: python3 exact_functions.py > exact-functions.csv   (needs gp and mpmath)
"""
import subprocess
import sys

import mpmath
from pari import PRELUDE
import unit_hypergeometric

DIGITS = 60

# formula of the kernel language, the same in PARI/GP, the same in mpmath
ROWS = [
    ("zeta(2)", "zeta(2)", "zeta(2)"),
    ("zeta(12)", "zeta(12)", "zeta(12)"),
    ("zeta(40)", "zeta(40)", "zeta(40)"),
    ("zeta(0)", "zeta(0)", "zeta(0)"),
    ("zeta(-1)", "zeta(-1)", "zeta(-1)"),
    ("zeta(-4)", "0.", "mpf(0)"),
    ("zeta(-7)", "zeta(-7)", "zeta(-7)"),
    ("zeta(-21)", "zeta(-21)", "zeta(-21)"),
    ("zeta(3)^2/zeta(6)", "zeta(3)^2/zeta(6)", "zeta(3)**2/zeta(6)"),
    ("gamma(1)", "gamma(1)", "gamma(1)"),
    ("gamma(9)", "gamma(9)", "gamma(9)"),
    ("gamma(1/2)", "gamma(1/2)", "gamma(mpf(1)/2)"),
    ("gamma(15/2)", "gamma(15/2)", "gamma(mpf(15)/2)"),
    ("gamma(-1/2)", "gamma(-1/2)", "gamma(-mpf(1)/2)"),
    ("gamma(-13/2)", "gamma(-13/2)", "gamma(-mpf(13)/2)"),
    ("gamma(1/3)", "gamma(1/3)", "gamma(mpf(1)/3)"),
    ("gamma(-17/4)", "gamma(-17/4)", "gamma(-mpf(17)/4)"),
    ("gamma(22/7)", "gamma(22/7)", "gamma(mpf(22)/7)"),
    ("digamma(1)", "psi(1)", "digamma(1)"),
    ("digamma(1/2)", "psi(1/2)", "digamma(mpf(1)/2)"),
    ("digamma(11/2)", "psi(11/2)", "digamma(mpf(11)/2)"),
    ("digamma(-7/2)", "psi(-7/2)", "digamma(-mpf(7)/2)"),
    ("digamma(8)", "psi(8)", "digamma(8)"),
    ("digamma(-5/3)", "psi(-5/3)", "digamma(-mpf(5)/3)"),
    ("polygamma(1,1)", "zetahurwitz(2,1)", "polygamma(1,1)"),
    ("polygamma(1,1/2)", "zetahurwitz(2,1/2)", "polygamma(1,mpf(1)/2)"),
    ("polygamma(2,1/2)", "-2*zetahurwitz(3,1/2)", "polygamma(2,mpf(1)/2)"),
    ("polygamma(3,5)", "6*zetahurwitz(4,5)", "polygamma(3,5)"),
    ("polygamma(4,9/2)", "-24*zetahurwitz(5,9/2)", "polygamma(4,mpf(9)/2)"),
    ("polygamma(1,-3/2)", "zetahurwitz(2,1/2)+4+4/9", "polygamma(1,-mpf(3)/2)"),
    ("polygamma(2,-5/2)", "-2*zetahurwitz(3,1/2)+2*(8+8/27+8/125)", "polygamma(2,-mpf(5)/2)"),
    ("polygamma(5,1/3)", "120*zetahurwitz(6,1/3)", "polygamma(5,mpf(1)/3)"),
    ("sin(pi/6)", "sin(Pi/6)", "sin(pi/6)"),
    ("sin(-3*pi/4)", "sin(-3*Pi/4)", "sin(-3*pi/4)"),
    ("sin(7*pi/3)", "sin(7*Pi/3)", "sin(7*pi/3)"),
    ("cos(5*pi/6)", "cos(5*Pi/6)", "cos(5*pi/6)"),
    ("cos(-2*pi/3)", "cos(-2*Pi/3)", "cos(-2*pi/3)"),
    ("cos(pi/5)", "cos(Pi/5)", "cos(pi/5)"),
    ("sin(13*pi/7)", "sin(13*Pi/7)", "sin(13*pi/7)"),
    ("sin(1)", "sin(1)", "sin(1)"),
    ("cos(2+pi)", "cos(2+Pi)", "cos(2+pi)"),
    ("ln(360/7)", "log(360/7)", "log(mpf(360)/7)"),
    ("ln(2*pi*exp(1/3))", "log(2*Pi)+1/3", "log(2*pi)+mpf(1)/3"),
    ("sqrt(8)", "sqrt(8)", "sqrt(8)"),
    ("(12/5)^(7/3)", "(12/5)^(7/3)", "(mpf(12)/5)**(mpf(7)/3)"),
    ("sqrt(2*pi)", "sqrt(2*Pi)", "sqrt(2*pi)"),
    ("pi^(-5/2)", "Pi^(-5/2)", "pi**(-mpf(5)/2)"),
    ("pi^(1/3)", "Pi^(1/3)", "pi**(mpf(1)/3)"),
    ("2^pi", "2^Pi", "mpf(2)**pi"),
    ("exp(-2*euler_gamma+5/3)", "exp(-2*Euler+5/3)", "exp(-2*euler+mpf(5)/3)"),
    ("exp(ln(6)/2+pi)", "sqrt(6)*exp(Pi)", "sqrt(6)*exp(pi)"),
    ("polylog(1,1/3)", "polylog(1,1/3)", "polylog(1,mpf(1)/3)"),
    ("polylog(2,1/2)", "polylog(2,1/2)", "polylog(2,mpf(1)/2)"),
    ("polylog(4,-1/3)", "polylog(4,-1/3)", "polylog(4,-mpf(1)/3)"),
    ("polylog(3,0)", "0.", "mpf(0)"),
    ("1/(zeta(3)+euler_gamma)", "1/(zeta(3)+Euler)", "1/(zeta(3)+euler)"),
    ("(1/3+zeta(3))^(-2)", "(1/3+zeta(3))^(-2)", "(mpf(1)/3+zeta(3))**(-2)"),
    ("unit_3f2(0,1)", "value(0,1)", "unit_3f2(0,mpf(1))"),
    ("unit_3f2(1,1)", "value(1,1)", "unit_3f2(1,mpf(1))"),
    ("unit_3f2(2,1)", "value(2,1)", "unit_3f2(2,mpf(1))"),
    ("unit_3f2(3,1)", "value(3,1)", "unit_3f2(3,mpf(1))"),
    ("unit_3f2(12,1)", "value(12,1)", "unit_3f2(12,mpf(1))"),
    ("unit_3f2(0,4)", "value(0,4)", "unit_3f2(0,mpf(4))"),
    ("unit_3f2(2,3)", "value(2,3)", "unit_3f2(2,mpf(3))"),
    ("unit_3f2(0,3/2)", "value(0,3/2)", "unit_3f2(0,mpf(3)/2)"),
    ("unit_3f2(0,7/2)", "value(0,7/2)", "unit_3f2(0,mpf(7)/2)"),
    ("unit_3f2(1,5/2)", "value(1,5/2)", "unit_3f2(1,mpf(5)/2)"),
    ("unit_3f2(0,1/3)", "value(0,1/3)", "unit_3f2(0,mpf(1)/3)"),
    ("unit_3f2(1,-1/3)", "value(1,-1/3)", "unit_3f2(1,-mpf(1)/3)"),
    ("unit_3f2(3,-33/10)", "value(3,-33/10)", "unit_3f2(3,-mpf(33)/10)"),
    ("unit_3f2(2,5/4)", "value(2,5/4)", "unit_3f2(2,mpf(5)/4)"),
    ("unit_3f2(0,51/100)/unit_3f2(1,-9/4)", "value(0,51/100)/value(1,-9/4)",
     "unit_3f2(0,mpf(51)/100)/unit_3f2(1,-mpf(9)/4)"),
]


def pari(expressions):
    setup = PRELUDE + "value(n, z) = n!*polcoef(unit(z), n);\ndefault(realprecision,100);\n"
    script = setup + "\n".join(f"print(precision(1.*({e}),80))" for e in expressions)
    out = subprocess.run(["gp", "-q", "-f"], input=script, capture_output=True, text=True, check=True).stdout
    return [line.replace(" E", "e") for line in out.split()] if " E" not in out else out.replace(" E", "e").split()


def main():
    mpmath.mp.dps = 100
    names = {k: getattr(mpmath, k) for k in dir(mpmath) if not k.startswith("_")}
    names["unit_3f2"] = unit_hypergeometric.derivative
    values = pari([row[1] for row in ROWS])
    print("# Constants in the formula language, 60 significant digits, the last one rounded.")
    print("# Made by tests/referee/exact_functions.py: PARI/GP at 100 digits; mpmath agrees to a relative 1e-58 on every row.")
    print("formula,value,source")
    for (formula, _, text), value in zip(ROWS, values):
        second = mpmath.mpf(eval(text, names))
        first = mpmath.mpf(value)
        if abs(first - second) > mpmath.mpf(10) ** -58 * max(abs(second), mpmath.mpf(10) ** -90):
            sys.exit(f"{formula}: {first} and {second}")
        digits = mpmath.nstr(second, DIGITS, strip_zeros=False, min_fixed=-5, max_fixed=70) if second else "0"
        print(f'"{formula}",{digits},PARI/GP 2.15 and mpmath {mpmath.__version__}')


main()
