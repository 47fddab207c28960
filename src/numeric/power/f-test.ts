/** Power of the F test as a mixture of central tails at the critical value. */

import { betaUpperQuantile, betaUpperTail } from '../distributions/beta.ts';
import { requireBetween, requireNonNegative, requireProbability } from '../domain.ts';
import { incompleteBetaFront } from '../special/incomplete-beta.ts';
import { logGamma } from '../special/log-gamma.ts';

interface Weights {
  start: number;
  logWeight: number;
  ratio: (j: number) => number;
}

function mixture(
  x: number,
  alpha: number,
  a: number,
  b: number,
  { start, logWeight, ratio }: Weights,
): number {
  let weight = Math.exp(logWeight);
  let left = 1;
  let tail = start === 0 ? alpha : betaUpperTail(x, a + start, b);
  let term = incompleteBetaFront(x, a + start, b) / (a + start);
  let sum = 0;
  for (let j = start; ; j += 1) {
    sum += weight * tail;
    left -= weight;
    const next = ratio(j);
    if (next < 1 && (weight * next) / (1 - next) < 1e-17 * sum) return sum;
    weight *= next;
    tail += term;
    term *= (x * (a + b + j)) / (a + j + 1);
  }
}

export function fTestPower(alpha: number, df1: number, df2: number, noncentrality: number): number {
  requireProbability('fTestPower', 'alpha', alpha);
  requireBetween('fTestPower', 'df1', df1, 0.5, 1e4);
  requireBetween('fTestPower', 'df2', df2, 0.5, 1e7);
  requireNonNegative('fTestPower', 'noncentrality', noncentrality);
  if (noncentrality === 0) return alpha;
  const half = noncentrality / 2;
  const start = Math.max(0, Math.floor(half - 10 * Math.sqrt(half)));
  const x = betaUpperQuantile(alpha, df1 / 2, df2 / 2);
  return mixture(x, alpha, df1 / 2, df2 / 2, {
    start,
    logWeight: start * Math.log(half) - half - logGamma(start + 1),
    ratio: (j) => half / (j + 1),
  });
}

export function sampledFTestPower(alpha: number, df1: number, df2: number, partialR2: number): number {
  requireProbability('sampledFTestPower', 'alpha', alpha);
  requireBetween('sampledFTestPower', 'partialR2', partialR2, 0, 1);
  if (partialR2 === 0) return alpha;
  const size = (df1 + df2) / 2;
  const mean = (size * partialR2) / (1 - partialR2);
  const deviation = Math.sqrt(mean / (1 - partialR2));
  const start = Math.max(0, Math.floor(mean - 10 * deviation));
  const x = betaUpperQuantile(alpha, df1 / 2, df2 / 2);
  return mixture(x, alpha, df1 / 2, df2 / 2, {
    start,
    logWeight:
      logGamma(size + start) -
      logGamma(size) -
      logGamma(start + 1) +
      size * Math.log1p(-partialR2) +
      start * Math.log(partialR2),
    ratio: (j) => ((size + j) / (j + 1)) * partialR2,
  });
}
