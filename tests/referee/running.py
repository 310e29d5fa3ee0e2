"""Makes reference-values/generated/running.csv: running coupling, masses, Lambda and thresholds of QCD, 30 digits.

Usage: python3 running.py OUTPUT.csv
Equations: dy/d ln mu = -2 sum beta_k y^(k+2), d ln m/d ln mu = -2 sum gamma_k y^(k+1), y = alpha_s/(4 pi), truncated after
a number of loops. They are integrated twice: by Taylor series in ln mu (mpmath odefun), and by quadrature in y with the
end point found by the secant method; only numbers on which both agree are written. Lambda by quadrature of the difference
from its first two terms, in two forms; the Landau pole likewise.
Thresholds: the logarithms come from expanding the running on both sides in powers of alpha_s (Lie series in ln mu) and
composing with the constants at mu = mbar(mbar); pole masses by inserting M/mbar into the logarithm at any mu."""
import functools
import sys
from mpmath import mp, mpf
from sum_rule import beta_function

DIGITS = 30
mp.dps = 45
MAX_POWER = 5  # of a in alpha^(nl)


def f(a, b):
    return mpf(a) / b


def gamma_function(nf):
    """gamma_0 .. gamma_4, alpha_s/4pi."""
    z3, z4, z5, z6, z7, n = mp.zeta(3), mp.zeta(4), mp.zeta(5), mp.zeta(6), mp.zeta(7), mpf(nf)
    return [
        mpf(4),
        f(202, 3) - f(20, 9) * n,
        1249 - (f(2216, 27) + f(160, 3) * z3) * n - f(140, 81) * n ** 2,
        f(4603055, 162) + f(135680, 27) * z3 - 8800 * z5
        + (-f(91723, 27) - f(34192, 9) * z3 + 880 * z4 + f(18400, 9) * z5) * n
        + (f(5242, 243) + f(800, 9) * z3 - f(160, 3) * z4) * n ** 2 + (-f(332, 243) + f(64, 27) * z3) * n ** 3,
        f(99512327, 162) + f(46402466, 243) * z3 + 96800 * z3 ** 2 - f(698126, 9) * z4 - f(231757160, 243) * z5
        + 242000 * z6 + 412720 * z7
        + n * (-f(150736283, 1458) - f(12538016, 81) * z3 - f(75680, 9) * z3 ** 2 + f(2038742, 27) * z4
               + f(49876180, 243) * z5 - f(638000, 9) * z6 - f(1820000, 27) * z7)
        + n ** 2 * (f(1320742, 729) + f(2010824, 243) * z3 + f(46400, 27) * z3 ** 2 - f(166300, 27) * z4
                    - f(264040, 81) * z5 + f(92000, 27) * z6)
        + n ** 3 * (f(91865, 1458) + f(12848, 81) * z3 + f(448, 9) * z4 - f(5120, 27) * z5)
        + n ** 4 * (-f(260, 243) - f(320, 243) * z3 + f(64, 27) * z4)]


def decoupling_constants(nl):
    """d_1 .. d_4 of the coupling at mu = mbar(mbar)."""
    z2, z3, z4, z5, l2, n = mp.zeta(2), mp.zeta(3), mp.zeta(4), mp.zeta(5), mp.log(2), mpf(nl)
    a4 = mp.polylog(4, f(1, 2))
    return [mpf(0), f(11, 72), f(564731, 124416) - f(82043, 27648) * z3 - f(2633, 31104) * n,
            mpf('5.170347') + n * (-f(4770941, 2239488) + f(685, 124416) * l2 ** 4 - f(685, 20736) * z2 * l2 ** 2
                                   + f(3645913, 995328) * z3 - f(541549, 165888) * z4 + f(115, 576) * z5
                                   + f(685, 5184) * a4) + n ** 2 * (-f(271883, 4478976) + f(167, 5184) * z3)]


def mass_constants(nl):
    """m_1 .. m_4 of a light mass at mu = mbar(mbar)."""
    z2, z3, z4, l2, n = mp.zeta(2), mp.zeta(3), mp.zeta(4), mp.log(2), mpf(nl)
    b4 = 16 * mp.polylog(4, f(1, 2)) - f(13, 2) * z4 - 4 * z2 * l2 ** 2 + f(2, 3) * l2 ** 4
    return [mpf(0), f(89, 432),
            f(2951, 2916) - f(407, 864) * z3 + f(5, 4) * z4 - b4 / 36 + n * (f(1327, 11664) - f(2, 27) * z3),
            mpf('6.850') - mpf('1.466') * n + (f(17671, 124416) - f(5, 864) * z3 - f(7, 96) * z4) * n ** 2]


def pole_mass(nl):
    """c_1 .. c_3 of M/mbar(mbar) in alpha_s^(nl+1)(mbar)/pi."""
    l2, p2, p4, z3, z5 = mp.log(2), mp.pi ** 2, mp.pi ** 4, mp.zeta(3), mp.zeta(5)
    li, n = mp.polylog(4, f(1, 2)), mpf(nl)
    return [f(4, 3), f(307, 32) + p2 / 3 + p2 / 9 * l2 - z3 / 6 - n * (f(71, 144) + p2 / 18),
            f(8481925, 93312) + f(652841, 38880) * p2 - f(695, 7776) * p4 - f(575, 162) * p2 * l2
            - f(22, 81) * p2 * l2 ** 2 - f(55, 162) * l2 ** 4 - f(220, 27) * li + f(58, 27) * z3
            - f(1439, 432) * p2 * z3 + f(1975, 216) * z5
            + n * (-f(231847, 23328) - f(991, 648) * p2 + f(61, 1944) * p4 - f(11, 81) * p2 * l2
                   + f(2, 81) * p2 * l2 ** 2 + l2 ** 4 / 81 + f(8, 27) * li - f(241, 72) * z3)
            + n ** 2 * (f(2353, 23328) + f(13, 324) * p2 + f(7, 54) * z3)]


# --- running ---------------------------------------------------------------------------------------------------------

def polynomial(coefficients, y):
    return mp.polyval(coefficients[::-1], y)


def by_taylor(beta, gamma, y0, steps):
    """[(y, ln m/m0)] at several ln(mu/mu0) of one sign."""
    right = lambda s, state: [-2 * state[0] ** 2 * polynomial(beta, state[0]),
                              -2 * state[0] * polynomial(gamma, state[0])]
    sign = 1 if steps[0] > 0 else -1
    flow = mp.odefun(lambda s, state: [sign * r for r in right(s, state)], 0, [y0, mpf(0)], tol=mpf(10) ** -38)
    return [tuple(flow(abs(s))) for s in steps]


def quadrature(g, a, b, pieces=16):
    return mp.quad(g, [a + (b - a) * k / pieces for k in range(pieces + 1)])


def by_quadrature(beta, gamma, y0, step, guess):
    """y from int_{1/y0}^{v} dv/(2 sum beta_k v^-k) = step, then the integral of the mass."""
    distance = lambda v: quadrature(lambda x: 1 / (2 * polynomial(beta, 1 / x)), 1 / y0, v) - step
    v = 1 / guess
    for _ in range(3):  # Newton
        v -= distance(v) * 2 * polynomial(beta, 1 / v)
    mass = quadrature(lambda x: -polynomial(gamma, 1 / x) / (x * polynomial(beta, 1 / x)), 1 / y0, v)
    return 1 / v, mass


def run(nf, loops, mu0, alpha0, scales):
    """{mu: (alpha, m/m0)}, both ways compared."""
    beta, gamma = beta_function(nf)[:loops], gamma_function(nf)[:loops]
    y0, result = alpha0 / (4 * mp.pi), {}
    for part in ([mu for mu in scales if mu > mu0], sorted([mu for mu in scales if mu < mu0], reverse=True)):
        if not part:
            continue
        steps = [mp.log(mu / mu0) for mu in part]
        for mu, step, (y, mass) in zip(part, steps, by_taylor(beta, gamma, y0, steps)):
            y2, mass2 = by_quadrature(beta, gamma, y0, step, y)
            assert abs(y / y2 - 1) < mpf(10) ** (-DIGITS - 2) and abs(mass - mass2) < mpf(10) ** (-DIGITS - 2), (nf, loops, mu)
            result[mu] = (4 * mp.pi * y, mp.exp(mass))
    return result


def lambda_msbar(nf, loops, mu, alpha):
    """ln(mu/Lambda) = 1/(2 beta0 y) + b ln(beta0 y) + int_0^y [-1/(2 x^2 P) + 1/(2 beta0 x^2) - b/x] dx."""
    beta = beta_function(nf)[:loops] + [mpf(0)]
    y, b = alpha / (4 * mp.pi), beta[1] / (2 * beta[0] ** 2)
    # over the denominator 2 beta0^2 x^2 P the numerator is beta0 P - beta0^2 - beta1 x P, which starts at x^2
    numerator = [beta[0] * c for c in beta] + [mpf(0)]
    for k, c in enumerate(beta):
        numerator[k + 1] -= beta[1] * c
    smooth = lambda x: polynomial(numerator[2:], x) / (2 * beta[0] ** 2 * polynomial(beta, x))
    rest = quadrature(smooth, mpf(0), y)
    # the definition itself, from a small cut on, in ln x
    cut = y * mpf(10) ** -10
    mp.dps += 25
    plain = lambda x: -1 / (2 * x ** 2 * polynomial(beta, x)) + 1 / (2 * beta[0] * x ** 2) - b / x
    direct = quadrature(lambda l: mp.exp(l) * plain(mp.exp(l)), mp.log(cut), mp.log(y))
    mp.dps -= 25
    assert abs(direct + smooth(cut / 2) * cut - rest) < mpf(10) ** -24, (nf, loops)
    return mu * mp.exp(-1 / (2 * beta[0] * y) - b * mp.log(beta[0] * y) - rest)


def landau(nf, loops, mu, alpha):
    beta = beta_function(nf)[:loops]
    v = 4 * mp.pi / alpha
    return mu * mp.exp(-quadrature(lambda x: 1 / (2 * polynomial(beta, 1 / x)) if x else mpf(0), mpf(0), v))


# --- thresholds: polynomials {(power of a, power of L): coefficient}, a^MAX_POWER and beyond dropped ------------------

def add(p, q, factor=1):
    r = dict(p)
    for key, c in q.items():
        r[key] = r.get(key, mpf(0)) + factor * c
    return {key: c for key, c in r.items() if c}


def multiply(p, q):
    r = {}
    for (k, j), c in p.items():  # no zeros, else powers of L without a pile up
        for (n, i), d in q.items():
            if k + n <= MAX_POWER:
                r[k + n, j + i] = r.get((k + n, j + i), mpf(0)) + c * d
    return r


def powers(p, count):
    result = [{(0, 0): mpf(1)}]
    for _ in range(count):
        result.append(multiply(result[-1], p))
    return result


def substitute(coefficients, p):
    """sum_k coefficients[k] p^k."""
    r = {}
    for c, q in zip(coefficients, powers(p, len(coefficients) - 1)):
        r = add(r, q, c)
    return r


def lie_series(beta, gamma, with_mass):
    """List over n of the coefficients (in a) of t^n in a(t), or in m(t)/m, with t = ln(mu^2/mu0^2)."""
    b = [mpf(0), mpf(0)] + [-x / mpf(4) ** (k + 1) for k, x in enumerate(beta)]
    g = [mpf(0)] + [-x / mpf(4) ** (k + 1) for k, x in enumerate(gamma)]
    current = [mpf(1)] if with_mass else [mpf(0), mpf(1)]
    result, factorial = [], mpf(1)
    for n in range(MAX_POWER + 1):
        result.append([c / factorial for c in current])
        following = [mpf(0)] * (MAX_POWER + 1)
        for k, c in enumerate(current):
            for i in range(MAX_POWER + 1):
                if k >= 1 and i < len(b) and k - 1 + i <= MAX_POWER:
                    following[k - 1 + i] += k * c * b[i]
                if with_mass and i < len(g) and k + i <= MAX_POWER:
                    following[k + i] += c * g[i]
        current, factorial = following, factorial * (n + 1)
    return result


def flow(series, coupling, logarithm):
    """The Lie series at a coupling and a logarithm that are polynomials."""
    r = {}
    for coefficients, q in zip(series, powers(logarithm, MAX_POWER)):
        r = add(r, multiply(substitute(coefficients, coupling), q))
    return r


@functools.lru_cache(maxsize=None)
def threshold_series(nl, pole):
    """(zeta, zeta_m): {(k, j): coefficient}, a = alpha^(nl+1)(mu)/pi, L = ln(mu^2/mass^2)."""
    bh, bl, gh, gl = beta_function(nl + 1), beta_function(nl), gamma_function(nl + 1), gamma_function(nl)
    a, full = {(1, 0): mpf(1)}, {(0, 1): mpf(1)}
    logarithm = full
    if pole:
        for _ in range(4):
            at_mass = flow(lie_series(bh, gh, False), a, {k: -c for k, c in logarithm.items()})
            relation = substitute([mpf(0)] + pole_mass(nl), at_mass)
            logs = substitute([mpf(0)] + [mpf((-1) ** (n + 1)) / n for n in range(1, MAX_POWER + 1)], relation)
            logarithm = add(full, logs, 2)
    down = {k: -c for k, c in logarithm.items()}
    at_mass = flow(lie_series(bh, gh, False), a, down)
    mass_at_mass = flow(lie_series(bh, gh, True), a, down)
    light = substitute([mpf(0), mpf(1)] + decoupling_constants(nl), at_mass)
    light_mass = multiply(mass_at_mass, substitute([mpf(1)] + mass_constants(nl), at_mass))
    alpha = flow(lie_series(bl, gl, False), light, logarithm)
    mass = multiply(light_mass, flow(lie_series(bl, gl, True), light, logarithm))
    return ({(k - 1, j): c for (k, j), c in alpha.items()}, {(k, j): c for (k, j), c in mass.items() if k < MAX_POWER})


def ratio(series, a, logarithm, order):
    return sum(c * a ** k * logarithm ** j for (k, j), c in series.items() if k <= order)


# --- the table -------------------------------------------------------------------------------------------------------

HEADER = ['# Running of the coupling and of MS-bar masses, Lambda_MSbar, Landau poles, thresholds; 30 significant digits.',
          '# y = alpha_s/(4 pi), dy/d ln mu = -2 sum beta_k y^(k+2), d ln m/d ln mu = -2 sum gamma_k y^(k+1), cut after `loops`.',
          '# kind: alpha, mass (m(mu)/m(mu0)), lambda (Lambda_MSbar), landau (scale where alpha_s diverges); in GeV.',
          '# z, m: coefficient of a^k L^j in alpha^(nl)/alpha^(nl+1) and m^(nl)/m^(nl+1), a = alpha^(nl+1)(mu)/pi, nf = nl,',
          '# L = ln(mu^2/mass^2), from = msbar (mass is mbar(mbar)) or pole; columns k and j.',
          '# chain-alpha, chain-mass: from alpha^(5)(91.188) = 0.118 (m(91.188) = 1) to nf flavours at mu over charm, bottom (mbar) and',
          '# top (pole) thresholds at `from` times 1.273, 4.183, 172.4 GeV, order loops - 1 in a.',
          '# Made by tests/referee/running.py (mpmath, 45 digits; two methods for every integration).',
          'kind,nf,loops,mu0,alpha0,from,mu,k,j,value,source']
SOURCE = 'tests/referee/running.py'


def number(x):
    return mp.nstr(x, DIGITS, strip_zeros=False)


def chain(loops, factor, targets):
    """{(nf, mu): (alpha, m)} starting at M_Z with five flavours."""
    masses = {3: ('1.273', False), 4: ('4.183', False), 5: ('172.4', True)}
    state = {5: (mpf('91.188'), mpf('0.118'), mpf(1))}
    order = loops - 1
    for nl in (4, 3):
        mass, pole = masses[nl]
        mu = mpf(mass) * factor
        mu0, alpha0, m0 = state[nl + 1]
        alpha, m = run(nl + 1, loops, mu0, alpha0, [mu])[mu]
        zeta, zeta_m = threshold_series(nl, pole)
        logarithm = 2 * mp.log(factor)
        state[nl] = (mu, alpha * ratio(zeta, alpha / mp.pi, logarithm, order),
                     m0 * m * ratio(zeta_m, alpha / mp.pi, logarithm, order))
    mass, pole = masses[5]
    mu = mpf(mass) * factor
    alpha, m = run(5, loops, *state[5][:2], [mu])[mu]
    zeta, zeta_m = threshold_series(5, pole)
    logarithm = 2 * mp.log(factor)
    heavy = mp.findroot(lambda x: x * ratio(zeta, x / mp.pi, logarithm, order) - alpha, alpha)
    state[6] = (mu, heavy, m / ratio(zeta_m, heavy / mp.pi, logarithm, order))
    result = {}
    for nf, mu in targets:
        mu0, alpha0, m0 = state[nf]
        alpha, m = run(nf, loops, mu0, alpha0, [mpf(mu)])[mpf(mu)]
        result[nf, mu] = (alpha, m0 * m)
    return result


def main(path):
    rows = list(HEADER)
    line = lambda *cells: rows.append(','.join(str(c) for c in cells) + ',' + SOURCE)
    starts = {3: ('2', '0.3', ['0.95', '1.2', '3.5', '20', '1000']), 4: ('4.2', '0.225', ['1.3', '2.5', '10', '91.188', '5000']),
              5: ('91.188', '0.118', ['1.8', '4.183', '30', '172.4', '1e16']), 6: ('172.4', '0.1077', ['5', '91.188', '1000', '1e19'])}
    for nf, (mu0, alpha0, scales) in starts.items():
        for loops in range(1, 6):
            found = run(nf, loops, mpf(mu0), mpf(alpha0), [mpf(mu) for mu in scales])
            for mu in scales:
                line('alpha', nf, loops, mu0, alpha0, '', mu, '', '', number(found[mpf(mu)][0]))
                line('mass', nf, loops, mu0, alpha0, '', mu, '', '', number(found[mpf(mu)][1]))
            line('lambda', nf, loops, mu0, alpha0, '', '', '', '', number(lambda_msbar(nf, loops, mpf(mu0), mpf(alpha0))))
            if nf < 6:
                line('landau', nf, loops, mu0, alpha0, '', '', '', '', number(landau(nf, loops, mpf(mu0), mpf(alpha0))))
        print('running', nf, flush=True)
    for nl in (3, 4, 5):
        for pole in (False, True):
            for kind, series in zip('zm', threshold_series(nl, pole)):
                for k in range(1, 5):
                    for j in range(k + 1):
                        c = series.get((k, j), mpf(0))
                        line(kind, nl, '', '', '', 'pole' if pole else 'msbar', '', k, j,
                             number(c) if abs(c) > mpf(10) ** -35 else '0')
    print('threshold series', flush=True)
    for loops in range(1, 6):
        for factor in ('0.7', '1', '2'):
            targets = [(3, '1.5'), (3, '4'), (4, '3'), (6, '500')]
            for (nf, mu), (alpha, m) in chain(loops, mpf(factor), targets).items():
                line('chain-alpha', nf, loops, '91.188', '0.118', factor, mu, '', '', number(alpha))
                line('chain-mass', nf, loops, '91.188', '0.118', factor, mu, '', '', number(m))
    with open(path, 'w') as out:
        out.write('\n'.join(rows) + '\n')


if __name__ == '__main__':
    main(sys.argv[1])
