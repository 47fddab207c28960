"""Widths of the confidence interval of R² by the direct way: limits by root finding, the width integrated over the density
of the observed R² piece by piece between its kinks; the assured width by its definition. The project goes another way
(Pratt's identity), so the two share no step. SciPy. Run: python3 r2-precision.py > r2-precision.json"""

import json

import numpy as np
from scipy import integrate, optimize, stats


def mixture(rho2, n, sampled):
    if rho2 == 0:
        return np.arange(1), np.ones(1)
    if sampled:
        j = np.arange(int(stats.nbinom.isf(1e-15, (n - 1) / 2, 1 - rho2) * 1.1) + 40)
        return j, stats.nbinom.pmf(j, (n - 1) / 2, 1 - rho2)
    half = n * rho2 / (1 - rho2) / 2
    j = np.arange(int(half + 12 * half**0.5) + 60)
    return j, stats.poisson.pmf(j, half)


def tail(r, rho2, n, k, sampled, upper):
    j, weights = mixture(rho2, n, sampled)
    of = stats.beta.sf if upper else stats.beta.cdf
    return float(np.sum(weights * of(r, k / 2 + j, (n - k - 1) / 2)))


def density(r, rho2, n, k, sampled):
    j, weights = mixture(rho2, n, sampled)
    return float(np.sum(weights * stats.beta.pdf(r, k / 2 + j, (n - k - 1) / 2)))


def quantile(p, rho2, n, k, sampled):
    return optimize.brentq(lambda r: tail(r, rho2, n, k, sampled, False) - p, 0, 1, xtol=1e-15, rtol=1e-14)


def width(r, n, k, alpha, sampled):
    low = up = 0.0
    if tail(r, 0, n, k, sampled, True) < alpha / 2:
        low = optimize.brentq(lambda t: tail(r, t, n, k, sampled, True) - alpha / 2, 0, r, xtol=1e-15, rtol=1e-14)
    if tail(r, 0, n, k, sampled, False) > alpha / 2:
        top = max(r, 1e-6)
        while tail(r, top, n, k, sampled, False) > alpha / 2:
            top = 1 - (1 - top) * 0.7
        up = optimize.brentq(lambda t: tail(r, t, n, k, sampled, False) - alpha / 2, 0, top, xtol=1e-15, rtol=1e-14)
    return up - low


def expected(n, rho2, k, alpha, sampled):
    ends = [quantile(p, rho2, n, k, sampled) for p in (1e-14, 1 - 1e-14)]
    kinks = [quantile(p, 0, n, k, sampled) for p in (alpha / 2, 1 - alpha / 2)]
    edges = sorted([*ends, *[x for x in [*kinks, rho2] if ends[0] < x < ends[1]]])
    weighted = lambda r: width(r, n, k, alpha, sampled) * density(r, rho2, n, k, sampled)
    return sum(integrate.quad(weighted, a, b, epsabs=1e-12, epsrel=1e-11, limit=200)[0] for a, b in zip(edges, edges[1:]))


def assured(n, rho2, k, alpha, sampled, assurance):
    of = lambda r: width(r, n, k, alpha, sampled)
    peak = optimize.minimize_scalar(lambda r: -of(r), bounds=(1e-4, 0.9), method="bounded", options={"xatol": 1e-8}).x

    def narrow(w):
        a = optimize.brentq(lambda r: of(r) - w, 1e-9, peak, xtol=1e-14)
        b = optimize.brentq(lambda r: of(r) - w, peak, 1 - 1e-3, xtol=1e-14)
        return tail(a, rho2, n, k, sampled, False) + tail(b, rho2, n, k, sampled, True)

    return optimize.brentq(lambda w: narrow(w) - assurance, of(peak) * 0.3, of(peak) * (1 - 1e-10), xtol=1e-13)


rows = []
for sampled in (True, False):
    for n, rho2, k, alpha in ((60, 0.3, 5, 0.05), (200, 0.3, 5, 0.05), (40, 0.05, 3, 0.05), (30, 0.6, 2, 0.1), (150, 0.1, 10, 0.05)):
        rows.append(
            {
                "n": n,
                "r2": rho2,
                "predictors": k,
                "confidence": round(1 - alpha, 10),
                "predictor_values": "sampled" if sampled else "fixed",
                "expected": expected(n, rho2, k, alpha, sampled),
                "assured_80": assured(n, rho2, k, alpha, sampled, 0.8),
            }
        )
print(json.dumps({"made_by": "r2-precision.py", "with": "SciPy", "rows": rows}, indent=1))
