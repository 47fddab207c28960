/** The arithmetic of the width of the interval of R², as base R and SciPy run it. */

import type { Step } from '../method.ts';
import type { R2Design } from './r2-interval.ts';

interface R2Numbers {
  n: number;
  r2: number;
  design: R2Design;
  assurance: number | null;
  width: number;
}

/** P(x > q) if R² is r, in each language. */
const EXCEEDANCE = {
  sampled: {
    r: `beyond <- function(q, r) {
  j <- 0:ceiling(qnbinom(1e-15, (n - 1) / 2, 1 - r, lower.tail = FALSE))
  sum(dnbinom(j, (n - 1) / 2, 1 - r) * pbeta(q, k / 2 + j, v / 2, lower.tail = FALSE))
}`,
    python: `def beyond(q, r):
    m = (n - 1) / 2
    j = np.arange(int(m * r / (1 - r) + 9 * sqrt(m * r) / (1 - r) + 60 / (1 - r)))
    weight = np.exp(special.gammaln(m + j) - special.gammaln(m) - special.gammaln(j + 1) + m * np.log1p(-r) + special.xlogy(j, r))
    return float(np.sum(weight * special.betainc(v / 2, k / 2 + j, 1 - q)))`,
  },
  fixed: {
    r: `beyond <- function(q, r) {
  half <- n * r / (1 - r) / 2
  j <- 0:ceiling(qpois(1e-15, half, lower.tail = FALSE))
  sum(dpois(j, half) * pbeta(q, k / 2 + j, v / 2, lower.tail = FALSE))
}`,
    python: `def beyond(q, r):
    half = n * r / (1 - r) / 2
    j = np.arange(int(half + 9 * sqrt(half) + 60))
    weight = np.exp(special.xlogy(j, half) - half - special.gammaln(j + 1))
    return float(np.sum(weight * special.betainc(v / 2, k / 2 + j, 1 - q)))`,
  },
} as const;

const LIMITS = {
  r: `cut <- function(p, r) uniroot(function(q) beyond(q, r) - p, c(0, 1), tol = 1e-13)$root
limit <- function(p, q) {
  if (beyond(q, 0) >= p) return(0)
  left <- 1 - q
  while (beyond(q, 1 - left) < p) left <- left / 4
  uniroot(function(r) beyond(q, r) - p, c(0, 1 - left), tol = 1e-13)$root
}`,
  python: `def cut(p, r):
    return optimize.brentq(lambda q: beyond(q, r) - p, 0, 1, xtol=1e-13)
def limit(p, q):
    if beyond(q, 0) >= p:
        return 0
    left = 1 - q
    while beyond(q, 1 - left) < p:
        left = left / 4
    return optimize.brentq(lambda r: beyond(q, r) - p, 0, 1 - left, xtol=1e-13)`,
} as const;

const EXPECTED = {
  r: `integrate(Vectorize(function(r) beyond(cut(1 - alpha / 2, r), r2) - beyond(cut(alpha / 2, r), r2)),
          limit(alpha / 2, cut(1 - 1e-10, r2)), limit(1 - alpha / 2, cut(1e-10, r2)), rel.tol = 1e-7)$value`,
  python: `integrate.quad(lambda r: beyond(cut(1 - alpha / 2, r), r2) - beyond(cut(alpha / 2, r), r2), limit(alpha / 2, cut(1 - 1e-10, r2)), limit(1 - alpha / 2, cut(1e-10, r2)), epsrel=1e-7)[0]`,
} as const;

const ASSURED = {
  r: `wide <- function(q) limit(1 - alpha / 2, q) - limit(alpha / 2, q)
peak <- optimize(wide, c(0, 0.95), maximum = TRUE, tol = 1e-5)$maximum
first <- cut(1 - 1e-10, r2)
last <- cut(1e-10, r2)
side <- function(w, end) {
  if (wide(end) >= w) return(end)
  uniroot(function(q) wide(q) - w, sort(c(end, peak)), tol = 1e-11)$root
}
wider <- function(w) {
  a <- if (first >= peak) first else side(w, first)
  b <- if (last <= peak) last else side(w, last)
  beyond(a, r2) - beyond(b, r2)
}`,
  python: `def wide(q):
    return limit(1 - alpha / 2, q) - limit(alpha / 2, q)
peak = optimize.minimize_scalar(lambda q: -wide(q), bounds=(0, 0.95), method='bounded', options={'xatol': 1e-5}).x
first = cut(1 - 1e-10, r2)
last = cut(1e-10, r2)
def wider(w):
    a = first if first >= peak or wide(first) >= w else optimize.brentq(lambda q: wide(q) - w, first, peak, xtol=1e-12)
    b = last if last <= peak or wide(last) >= w else optimize.brentq(lambda q: wide(q) - w, peak, last, xtol=1e-12)
    return beyond(a, r2) - beyond(b, r2)`,
} as const;

/** Mean of x if R² is r2: that of the mixture of beta distributions. */
const MEAN = {
  sampled: {
    r: `j <- 0:ceiling(qnbinom(1e-15, (n - 1) / 2, 1 - r2, lower.tail = FALSE))
middle <- sum(dnbinom(j, (n - 1) / 2, 1 - r2) * (k / 2 + j) / ((n - 1) / 2 + j))`,
    python: `j = np.arange(stats.nbinom.isf(1e-15, (n - 1) / 2, 1 - r2) + 1)
middle = float(np.sum(stats.nbinom.pmf(j, (n - 1) / 2, 1 - r2) * (k / 2 + j) / ((n - 1) / 2 + j)))`,
  },
  fixed: {
    r: `half <- n * r2 / (1 - r2) / 2
j <- 0:ceiling(qpois(1e-15, half, lower.tail = FALSE))
middle <- sum(dpois(j, half) * (k / 2 + j) / ((n - 1) / 2 + j))`,
    python: `half = n * r2 / (1 - r2) / 2
j = np.arange(stats.poisson.isf(1e-15, half) + 1)
middle = float(np.sum(stats.poisson.pmf(j, half) * (k / 2 + j) / ((n - 1) / 2 + j)))`,
  },
} as const;

function lines(variable: string, meaning: string, code: { r: string; python: string }): Step {
  return { variable, symbol: variable, meaning, formula: '', value: null, ...code };
}

/** What every width rests on: the distribution of the observed R², its quantiles, the limits of an interval. */
function distributionSteps(n: number, design: R2Design): Step[] {
  const df = 'n - k - 1';
  return [
    {
      variable: 'v',
      symbol: 'v',
      meaning: 'residual degrees of freedom',
      formula: 'v = n − k − 1',
      value: n - design.predictors - 1,
      r: df,
      python: df,
    },
    lines('', 'probability that x exceeds q if R² is r', EXCEEDANCE[design.isSampled ? 'sampled' : 'fixed']),
    lines('', 'the x exceeded with probability p, and the limit of an interval', LIMITS),
  ];
}

/** The width of the interval at the mean of x. */
export function widthAtMeanSteps(n: number, design: R2Design, width: number): Step[] {
  const expression = 'limit(1 - alpha / 2, middle) - limit(alpha / 2, middle)';
  return [
    ...distributionSteps(n, design),
    lines('', 'the mean of x', MEAN[design.isSampled ? 'sampled' : 'fixed']),
    {
      ...lines('achieved', 'width at the mean of x', { r: expression, python: expression }),
      symbol: 'w',
      formula: 'upper limit − lower limit, at the mean of x',
      value: width,
    },
  ];
}

export function r2IntervalSteps({ n, design, assurance, width }: R2Numbers): Step[] {
  const common = distributionSteps(n, design);
  if (assurance === null) {
    const meaning = 'expected width';
    return [
      ...common,
      { ...lines('achieved', meaning, EXPECTED), symbol: 'w', formula: 'as above', value: width },
    ];
  }
  return [
    ...common,
    lines('', 'probability that the interval is wider than w', ASSURED),
    {
      variable: 'achieved',
      symbol: 'w',
      meaning: 'width not exceeded with the assurance',
      formula: 'P(width > w) = 1 − assurance',
      value: width,
      r: 'uniroot(function(w) wider(w) - (1 - assurance), wide(peak) * c(0.05, 1 - 1e-9), tol = 1e-11)$root',
      python:
        'optimize.brentq(lambda w: wider(w) - (1 - assurance), wide(peak) * 0.05, wide(peak) * (1 - 1e-9), xtol=1e-12)',
    },
  ];
}
