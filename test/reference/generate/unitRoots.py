"""Augmented Dickey-Fuller and KPSS statistics of series in ../series, with chosen lags and with gaps, and tails of the two KPSS laws.

Dickey-Fuller: the regression written out row by row and solved by orthogonal-triangular factors in double precision (numpy.linalg.qr,
inverse of the triangle for the standard error). KPSS: residuals by numpy.linalg.lstsq, sums as in the definition (Kwiatkowski et al. 1992).
Tails: Smirnov's integrals between consecutive zeros of the Fredholm determinant, sin u / u for the level and
[sin v / v][3 (sin v - v cos v) / v^3], v = u / 2, for the trend, by tanh-sinh quadrature with 30 digits; those for the level also by
Anderson and Darling's series of Bessel functions (1952, Ann. Math. Stat. 23, 193-212, equation 4.35), and the two must agree.
Needs Python 3, numpy and mpmath (made with numpy 2.4.6, mpmath 1.3.0). Run in this folder: python3 unitRoots.py
"""
import json
import numpy as np
import mpmath as mp

mp.mp.dps = 30


def series(name, gaps):
    y = np.array([np.nan if v is None else v for v in json.load(open(f'../series/{name}.json'))['values']], float)
    for t in gaps:
        y[t] = np.nan
    return y


def dickey_fuller(y, trend, k):
    rows, right = [], []
    for t in range(k + 1, len(y)):
        part = y[t - k - 1:t + 1]
        if np.isnan(part).any():
            continue
        d = np.diff(part)
        rows.append([1.0] + ([float(t)] if trend == 'trend' else []) + [y[t - 1]] + [d[-1 - i] for i in range(1, k + 1)])
        right.append(d[-1])
    X, z = np.array(rows), np.array(right)
    # Centring leaves the ratio as it is and keeps the digits.
    Xc = X[:, 1:] - X[:, 1:].mean(axis=0)
    zc = z - z.mean()
    Q, R = np.linalg.qr(Xc)
    b = np.linalg.solve(R, Q.T @ zc)
    e = zc - Xc @ b
    s2 = e @ e / (len(z) - X.shape[1])
    inverse = np.linalg.inv(R)
    at = 1 if trend == 'trend' else 0
    return b[at] / np.sqrt(s2 * (inverse[at] @ inverse[at])), len(z)


def kpss(y, trend, l):
    n = len(y)
    t = np.arange(n, dtype=float)
    seen = ~np.isnan(y)
    X = np.column_stack([np.ones(n)] + ([t - t.mean()] if trend == 'trend' else []))
    b = np.linalg.lstsq(X[seen], y[seen] - y[seen].mean(), rcond=None)[0]
    e = np.where(seen, y - y[seen].mean() - X @ b, 0.0)
    lrv = e @ e / n + 2 * sum((1 - j / (l + 1)) * (e[j:] @ e[:-j]) / n for j in range(1, l + 1))
    return (np.cumsum(e) ** 2).sum() / n ** 2 / lrv


def smirnov(x, zeros, D):
    f = lambda u: mp.exp(-x * u * u / 2) / (u * mp.sqrt(abs(D(u))))
    total = mp.mpf(0)
    for k in range(0, len(zeros) - 1, 2):
        a, b = zeros[k], zeros[k + 1]
        total += (-1) ** (k // 2) * mp.quad(f, [a, (a + b) / 2, b])
        if x * b * b / 2 > 75:
            break
    return 2 / mp.pi * total


def bessel_level(x):
    total = mp.mpf(0)
    for j in range(40):
        c = (4 * j + 1) ** 2 / (16 * x)
        total += (-1) ** j * mp.binomial(mp.mpf(-1) / 2, j) * mp.sqrt(4 * j + 1) * mp.exp(-c) * mp.besselk(mp.mpf(1) / 4, c)
    return 1 - total / (mp.pi * mp.sqrt(x))


tangent = [mp.findroot(lambda x: mp.sin(x) - x * mp.cos(x), (j + mp.mpf(1) / 2) * mp.pi - 1 / ((j + mp.mpf(1) / 2) * mp.pi)) for j in range(1, 25)]
level_zeros = [j * mp.pi for j in range(1, 49)]
trend_zeros = sorted([2 * j * mp.pi for j in range(1, 25)] + [2 * r for r in tangent])
level_D = lambda u: mp.sin(u) / u
def trend_D(u):
    v = u / 2
    return mp.sin(v) / v * 3 * (mp.sin(v) - v * mp.cos(v)) / v ** 3

scattered = [7, 8, 21, 40, 41, 42, 60]
out = {'dickeyFuller': [], 'kpss': [], 'tails': []}
for name in ('lakeHuron', 'nile', 'seriesA', 'airline', 'seriesF', 'sales'):
    for gaps in ([], scattered):
        y = series(name, gaps)
        for trend in ('constant', 'trend'):
            for k in (0, 1, 4) + ((13,) if name == 'airline' and not gaps else ()):
                value, rows = dickey_fuller(y, trend, k)
                out['dickeyFuller'].append({'series': name, 'gaps': gaps, 'trend': trend, 'lags': k, 'statistic': value, 'rows': rows})
            for l in (0, 4, 12):
                out['kpss'].append({'series': name, 'gaps': gaps, 'trend': trend, 'lags': l, 'statistic': kpss(y, trend, l)})
for x in ('0.03', '0.08', '0.15', '0.347305', '0.461361', '0.743459', '1.5', '3'):
    a, b = smirnov(mp.mpf(x), level_zeros, level_D), bessel_level(mp.mpf(x))
    assert abs(a - b) < mp.mpf(10) ** -9, (x, a, b)
    out['tails'].append({'trend': 'constant', 'x': float(x), 'p': float(b)})
for x in ('0.02', '0.05', '0.119', '0.146', '0.216', '0.4', '0.8'):
    out['tails'].append({'trend': 'trend', 'x': float(x), 'p': float(smirnov(mp.mpf(x), trend_zeros, trend_D))})
for trend, zeros, D, near in (('constant', level_zeros, level_D, (.7434, .4613, .3473)), ('trend', trend_zeros, trend_D, (.2171, .1472, .1186))):
    points = [mp.findroot(lambda x: smirnov(x, zeros, D) - p, (mp.mpf(g), mp.mpf(g) * 1.01), solver='secant', tol=1e-12) for p, g in zip((0.01, 0.05, 0.10), near)]
    out[trend] = [float(x) for x in points]
json.dump(out, open('../unitRoots.json', 'w'), indent=1)
open('../unitRoots.json', 'a').write('\n')
