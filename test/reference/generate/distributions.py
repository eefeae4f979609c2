"""Tails, densities and quantiles of the laws in workers/distributions, 50-digit arithmetic, into ../distributions.json.

Needs mpmath (Debian: python3-mpmath). Run in this folder: /usr/bin/python3 distributions.py (about half a minute).
Every argument is the double written beside it; quantiles solve for the double p itself. Values below 1e-290 are left out, as doubles
lose digits there.
"""
import json
import random
import mpmath as mp

mp.mp.dps = 50
SEED = 20240501
rng = random.Random(SEED)
one = mp.mpf(1)
number = lambda value: float(mp.nstr(value, 25))
tables = {}


def keep(name, row):
    if all(v == 0 or abs(v) > 1e-290 for v in row if not isinstance(v, list)):
        tables.setdefault(name, []).append(row)


def carefully(compute):
    """A share in digits enough that its complement keeps 30 of them."""
    for digits in [60, 120, 400]:
        with mp.workdps(digits):
            share = compute(mp.mpf(10) ** (5 - digits))
            if 1 - share > mp.mpf(10) ** (30 - digits):
                return share, 1 - share
    return share, mp.mpf(0)


def gamma_tails(a, x):
    """P and Q from the series of positive terms NIST DLMF 8.11.4."""
    a, x = mp.mpf(a), mp.mpf(x)

    def share(small):
        term = total = mp.exp(a * mp.log(x) - x - mp.loggamma(a + 1))
        n = 0
        while term > total * small:
            n += 1
            term *= x / (a + n)
            total += term
        return total

    return carefully(share)


def beta_tails(a, b, x, y):
    """I_x(a, b) and its complement from the series of positive terms NIST DLMF 8.17.8 in the smaller of x, y; x + y = 1."""
    if x == 0 or y == 0:
        return (mp.mpf(0), one) if x == 0 else (one, mp.mpf(0))
    if x > y:
        return tuple(reversed(beta_tails(b, a, y, x)))

    def share(small):
        term = total = mp.exp(a * mp.log(x) + b * mp.log(y) - mp.loggamma(a + 1) - mp.loggamma(b) + mp.loggamma(a + b))
        n = 0
        while term > total * small:
            term *= x * (a + b + n) / (a + 1 + n)
            total += term
            n += 1
        return total

    return carefully(share)


def t_upper(t, df):
    m, square = mp.mpf(df), mp.mpf(t) ** 2
    return beta_tails(m / 2, one / 2, m / (m + square), square / (m + square))[0] / 2


def f_tails(x, d1, d2):
    a, b, v = mp.mpf(d1), mp.mpf(d2), mp.mpf(x)
    return beta_tails(a / 2, b / 2, a * v / (b + a * v), b / (b + a * v))


def solve(height, low, high):
    """Zero of a monotone function between two positive points: bisection in the logarithm, then secant steps to 28 digits."""
    a, b = mp.log(low), mp.log(high)
    rising = height(mp.exp(b)) > 0
    for _ in range(24):
        middle = (a + b) / 2
        if (height(mp.exp(middle)) > 0) == rising:
            b = middle
        else:
            a = middle
    for _ in range(60):
        fa, fb = height(mp.exp(a)), height(mp.exp(b))
        if fb == fa or abs(b - a) < mp.mpf(10) ** -28:
            break
        a, b = b, b - fb * (b - a) / (fb - fa)
    return mp.exp(b)


for x in [1e-12, 0.01, 0.3, 0.5, 0.9, 1.0001, 1.3, 1.4999, 1.9999, 2.0001, 2.4999, 2.5001, 7, 15.9, 16, 123.456, 1e5, 1e12]:
    keep('logGamma', [x, number(mp.loggamma(mp.mpf(x)))])
for x in [1e-200, 1e-9, 0.1, 0.5, 1, 1.2247, 1.2248, 2, 3.7, 5, 9, 15, 25.5]:
    keep('errorFunction', [x, number(mp.erf(mp.mpf(x))), number(mp.erfc(mp.mpf(x))), number(mp.erfc(-mp.mpf(x)))])
for x in [0, 1e-8, 0.5, 1, 1.96, 3, 6, 10, 20, 36] + [round(rng.uniform(-5, 8), 3) for _ in range(10)]:
    keep('normal', [x, number(mp.erfc(mp.mpf(x) / mp.sqrt(2)) / 2), number(mp.npdf(mp.mpf(x)))])
for p in [1e-280, 1e-100, 1e-16, 1e-7, 0.001, 0.025, 0.3, 0.49, 0.499999, 0.51, 0.75, 0.975, 0.999, 1 - 2.0 ** -40]:
    keep('normalQuantile', [p, number(mp.sqrt(2) * mp.erfinv(2 * mp.mpf(p) - 1)) if p > 1e-30 else
                            -number(solve(lambda x: mp.log(mp.erfc(x / mp.sqrt(2)) / 2) - mp.log(mp.mpf(p)), 5, 40))])

for df in [0.1, 0.5, 1, 2, 3, 7, 22, 100, 999, 100_000, 10_000_000]:
    ratios = [1e-6, 0.01, 0.3, 0.99, 1.01, 1.5, 2, 5, 30] if df < 1000 else [1 + k / df ** 0.5 for k in (-12, -2, 0.5, 3, 20)]
    for ratio in ratios:
        x = round(df * ratio, 7)
        lower, upper = gamma_tails(df / 2, mp.mpf(x) / 2)
        keep('chiSquare', [x, df, number(lower), number(upper)])
for df in [0.1, 0.5, 1, 2, 9, 120, 5000]:
    for p in [1e-20, 1e-4, 0.025, 0.5, 0.95, 0.9999]:
        if df * 20 < -mp.log10(p):
            continue
        low, high = mp.mpf(10) ** -250 if df < 100 else df / 3, df + 9 * df ** 0.5 + 60
        value = solve(lambda x: mp.log(gamma_tails(df / 2, x / 2)[0 if p < 0.5 else 1]) - mp.log(mp.mpf(p) if p < 0.5 else 1 - mp.mpf(p)), low, high)
        keep('chiSquareQuantile', [p, df, number(value)])

for df in [0.3, 1, 2, 5, 30, 400, 10_000, 1_000_000]:
    for t in [0, 1e-10, 0.1, 1, 2.5, 8, 25, 1e6]:
        m, v = mp.mpf(df), mp.mpf(t)
        density = mp.gamma((m + 1) / 2) / mp.gamma(m / 2) / mp.sqrt(m * mp.pi) * (1 + v * v / m) ** (-(m + 1) / 2)
        upper = t_upper(t, df) if t > 0 else one / 2
        keep('studentT', [t, df, number(upper), number(density)])
for df in [0.3, 1, 2, 7, 60, 5000]:
    for p in [1e-12, 0.005, 0.05, 0.3]:
        keep('studentTQuantile', [p, df, -number(solve(lambda t: mp.log(t_upper(t, df)) - mp.log(mp.mpf(p)), 1e-3, mp.mpf(10) ** 60))])

for d1, d2 in [(0.5, 3), (1, 1), (2, 7), (5, 30), (40, 3), (120, 240), (3, 100_000)]:
    for x in [1e-8, 0.05, 0.8, 1, 2.5, 12, 400]:
        lower, upper = f_tails(x, d1, d2)
        keep('fisherF', [x, d1, d2, number(lower), number(upper)])
for d1, d2 in [(1, 1), (2, 7), (5, 30), (40, 3), (120, 240)]:
    for p in [1e-9, 0.05, 0.5, 0.95, 0.999]:
        side = 0 if p < 0.5 else 1
        share = mp.mpf(p) if p < 0.5 else 1 - mp.mpf(p)
        value = solve(lambda x: mp.log(f_tails(x, d1, d2)[side]) - mp.log(share), mp.mpf(10) ** -20, mp.mpf(10) ** 7)
        keep('fisherFQuantile', [p, d1, d2, number(value)])

for x in [0.15, 0.3, 0.5, 0.7, 0.9, 0.999, 1, 1.2, 1.36, 1.63, 2.5, 8]:
    keep('kolmogorov', [x, number(2 * mp.nsum(lambda k: (-1) ** (k - 1) * mp.exp(-2 * k ** 2 * mp.mpf(x) ** 2), [1, mp.inf]))
                        if x >= 0.5 else number(1 - mp.sqrt(2 * mp.pi) / mp.mpf(x) * mp.nsum(
                            lambda k: mp.exp(-((2 * k - 1) * mp.pi) ** 2 / (8 * mp.mpf(x) ** 2)), [1, mp.inf]))])


def weighted_pairs(w, x):
    """Every weight twice: a sum of exponentials with distinct means 2w, whose tail is in closed form."""
    tail = mp.mpf(0)
    for i, a in enumerate(w):
        c = one
        for j, b in enumerate(w):
            if j != i:
                c *= mp.mpf(a) / (mp.mpf(a) - mp.mpf(b))
        tail += c * mp.exp(-mp.mpf(x) / (2 * mp.mpf(a)))
    return tail


def weighted_ruben(w, x):
    """Ruben 1962, Ann. Math. Stat. 33, 542-570: a mixture of chi-squares with the smallest weight as scale."""
    w = [mp.mpf(v) for v in w]
    scale, m = min(w), len(w)
    shares = [1 - scale / v for v in w]
    powers = [one] * m
    g, mix = [], [mp.sqrt(mp.fprod(scale / v for v in w))]
    y = mp.mpf(x) / scale / 2
    survival = gamma_tails(mp.mpf(m) / 2, y)[1]
    term = y ** (mp.mpf(m) / 2) * mp.exp(-y) / mp.gamma(mp.mpf(m) / 2 + 1)
    tail, left, k = mix[0] * survival, 1 - mix[0], 0
    while left > tail * mp.mpf(10) ** -20:
        k += 1
        powers = [p * s for p, s in zip(powers, shares)]
        g.append(mp.fsum(powers))
        mix.append(mp.fsum(g[k - 1 - r] * mix[r] for r in range(k)) / (2 * k))
        survival += term
        term *= y / (mp.mpf(m) / 2 + k)
        tail += mix[k] * survival
        left -= mix[k]
    return tail


for w, x in [([1, 1, 1], 4), ([0.5] * 10, 9), ([2], 3), ([2], 0.001), ([2], 900), ([1] * 40, 3.5), ([1e-9] * 3, 2e-8)]:
    keep('weighted', [w, x, number(gamma_tails(mp.mpf(len(w)) / 2, mp.mpf(x) / (2 * mp.mpf(w[0])))[1])])
for w, x in [([3, 2, 0.5], 8), ([1, 0.9, 0.1], 1), ([5, 1], 30), ([1, 0.001], 0.01), ([1, 0.001], 60), ([1, 0.5, 0.25, 0.125], 300)]:
    keep('weighted', [[v for v in w for _ in (0, 1)], x, number(weighted_pairs(w, x))])
for w in [[1, 0.2], [1, 0.8, 0.5, 0.3, 0.1], [1] * 12 + [0.4, 0.05]]:
    for ratio in [0.02, 0.5, 1, 1.05, 3, 12]:
        x = round(sum(w) * ratio, 6)
        keep('weighted', [w, x, number(weighted_ruben(w, x))])

with open('../distributions.json', 'w') as file:
    rows = lambda table: ',\n'.join('    ' + json.dumps(row) for row in table)
    about = {'madeBy': 'generate/distributions.py', 'mpmath': mp.__version__, 'digits': 50, 'seed': SEED}
    head = ''.join(f'  {json.dumps(key)}: {json.dumps(value)},\n' for key, value in about.items())
    body = ',\n'.join(f'  {json.dumps(name)}: [\n{rows(table)}\n  ]' for name, table in tables.items())
    file.write('{\n' + head + body + '\n}\n')
