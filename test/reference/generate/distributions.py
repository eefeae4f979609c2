"""Tails and quantiles of the normal, chi-square, t, F and weighted chi-square laws, 50-digit arithmetic, into ../distributions.json.

Needs mpmath (Debian: python3-mpmath; made with mpmath 1.2.1). Run in this folder: python3 distributions.py
"""
import json
import random
import mpmath as mp

mp.mp.dps = 50
rng = random.Random(20240501)
out = {'mpmath': mp.__version__, 'seed': 20240501, 'normal': [], 'chiSquare': [], 'studentT': [], 'fisherF': [], 'weighted': []}
f = lambda v: float(mp.nstr(v, 25))

for x in [0, 1e-8, 0.5, 1, 1.96, 3, 6, 10, 20, 37] + [round(rng.uniform(-5, 8), 3) for _ in range(10)]:
    out['normal'].append([x, f(mp.erfc(mp.mpf(x) / mp.sqrt(2)) / 2)])
for df in [0.5, 1, 2, 3, 7, 22, 100, 999]:
    for r in [0.01, 0.3, 1, 2, 5]:
        x = round(df * r, 6)
        out['chiSquare'].append([x, df, f(mp.gammainc(mp.mpf(df) / 2, 0, mp.mpf(x) / 2, regularized=True)),
                                 f(mp.gammainc(mp.mpf(df) / 2, mp.mpf(x) / 2, mp.inf, regularized=True))])
def beta(a, b, x):
    return mp.betainc(a, b, 0, x, regularized=True)
for df in [0.7, 1, 2, 5, 30, 400]:
    for t in [0, 0.1, 1, 2.5, 8, 60]:
        m = mp.mpf(df)
        out['studentT'].append([t, df, f(beta(m / 2, mp.mpf(1) / 2, m / (m + mp.mpf(t) ** 2)) / 2)])
for d1, d2 in [(1, 1), (2, 7), (5, 30), (40, 3), (120, 240)]:
    for x in [0.05, 0.8, 1, 2.5, 12]:
        a, b, v = mp.mpf(d1), mp.mpf(d2), mp.mpf(x)
        out['fisherF'].append([x, d1, d2, f(beta(b / 2, a / 2, b / (b + a * v))), f(beta(a / 2, b / 2, a * v / (b + a * v)))])
# Equal weights are a scaled chi-square; pairs of equal weights a sum of exponentials, whose tail is closed form.
for w, x in [([1, 1, 1], 4.0), ([0.5] * 10, 9.0), ([2.0], 3.0)]:
    out['weighted'].append([w, x, f(mp.gammainc(mp.mpf(len(w)) / 2, mp.mpf(x) / (2 * mp.mpf(w[0])), mp.inf, regularized=True))])
for w, x in [([3, 2, 0.5], 8.0), ([1, 0.9, 0.1], 1.0), ([5, 1], 30.0)]:
    doubled = [v for v in w for _ in (0, 1)]
    tail = mp.mpf(0)
    for i, a in enumerate(w):
        c = mp.mpf(1)
        for j, b in enumerate(w):
            if j != i:
                c *= mp.mpf(a) / (mp.mpf(a) - mp.mpf(b))
        tail += c * mp.exp(-mp.mpf(x) / (2 * mp.mpf(a)))
    out['weighted'].append([doubled, x, f(tail)])
json.dump(out, open('../distributions.json', 'w'))
