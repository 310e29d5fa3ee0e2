"""Runs PARI/GP on a script and returns its standard output. Used by the generators of reference values."""
import os
import subprocess
import tempfile


def run(script, memory="2G"):
    """Output of gp for the text of a script; an error of gp is an error here."""
    handle, path = tempfile.mkstemp(suffix=".gp")
    try:
        with os.fdopen(handle, "w") as out:
            out.write(script)
        done = subprocess.run(["gp", "-q", "-f", "--default", "parisizemax=" + memory, path],
                              stdin=subprocess.DEVNULL, capture_output=True, text=True)
    finally:
        os.unlink(path)
    if "***" in done.stdout + done.stderr:
        raise RuntimeError((done.stderr + done.stdout)[:2000])
    return done.stdout


def version():
    """Version of PARI/GP as it is written in the source column."""
    return ".".join(run("print(version())").strip().strip("[]").replace(" ", "").split(",")[:3])


# Expansions about an exact rational point c: each function is taken at c + b x, x small, so that an integer or
# half-integer value of c is recognised exactly and never through a rounded number.
PRELUDE = r"""
default(realprecision, 230);
ORDER = 40;
lin(c, b) = c + b*x + O(x^ORDER);
ga(c, b) = gamma(lin(c, b));
/* psi of a series without constant term is wrong in gp 2.15 (it returns psi(x) for psi(2 x)): shift to c >= 1 first */
ps(c, b) = {
  my(m = max(0, 1 - floor(c)));
  psi(lin(c + m, b)) - sum(j = 0, m - 1, 1/lin(c + j, b));
}
/* polygamma(k, z): k-th derivative of psi(c + y), then y = b x */
pg(k, c, b) = {
  my(s = ps(c, 1));
  for(i = 1, k, s = deriv(s, x));
  subst(s, x, b*x);
}
/* sin(pi (c + b x)) with exact 0, 1, -1 where c is a multiple of 1/2 */
sinpi(c) = {
  my(r = c - 2*floor(c/2));
  if(r == 0 || r == 1, return(0));
  if(r == 1/2, return(1));
  if(r == 3/2, return(-1));
  sin(Pi*r);
}
sp(c, b) = sinpi(c)*cos(Pi*b*x + O(x^ORDER)) + sinpi(c + 1/2)*sin(Pi*b*x + O(x^ORDER));
cp(c, b) = sp(c + 1/2, b);
ex(s) = exp(s + O(x^ORDER));
/* W(c + x) of unit_hypergeometric.py by (3/4) sum 4^-n (z)_n/[(z+n) (z-1/2)_(n+1)]; memorised */
UNIT_TERMS = 420;
unitmap = Map();
unit(c) = {
  my(z = c + x, t, s = 0., v);
  if(mapisdefined(unitmap, c, &v), return(v));
  t = (3/4. + O(x^ORDER))/(z - 1/2);
  for(n = 0, UNIT_TERMS, s += t/(z + n); t = t*(z + n)/(4*(z + n + 1/2)));
  mapput(unitmap, c, s);
  s;
}
/* unit_3f2(k, c + b x): k-th derivative of W(c + y), then y = b x */
un(k, c, b) = {
  my(s = unit(c));
  for(i = 1, k, s = deriv(s, x));
  subst(s, x, b*x);
}
"""
