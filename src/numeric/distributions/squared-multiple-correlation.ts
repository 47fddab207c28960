/** R² of a sample when the predictors are jointly normal: negative-binomial mixture of beta distributions. Provisional. */

import { incompleteBetaFront } from '../special/incomplete-beta.ts';
import { logGamma } from '../special/log-gamma.ts';
import { betaLowerTail, betaUpperTail } from './beta.ts';

function mixture(
  r2: number,
  predictors: number,
  n: number,
  populationR2: number,
  tail: 'lower' | 'upper',
): number {
  const a = predictors / 2;
  const b = (n - predictors - 1) / 2;
  if (r2 <= 0) return tail === 'lower' ? 0 : 1;
  if (r2 >= 1) return tail === 'lower' ? 1 : 0;
  if (populationR2 === 0) return tail === 'lower' ? betaLowerTail(r2, a, b) : betaUpperTail(r2, a, b);
  const size = (n - 1) / 2;
  const mean = (size * populationR2) / (1 - populationR2);
  const deviation = Math.sqrt(mean / (1 - populationR2));
  const start = Math.max(0, Math.floor(mean - 9 * deviation));
  const end = Math.ceil(mean + 9 * deviation + 40);
  const logWeight = (j: number) =>
    logGamma(size + j) -
    logGamma(size) -
    logGamma(j + 1) +
    size * Math.log1p(-populationR2) +
    j * Math.log(populationR2);
  let sum = 0;
  if (tail === 'upper') {
    let weight = Math.exp(logWeight(start));
    let q = betaUpperTail(r2, a + start, b);
    let term = incompleteBetaFront(r2, a + start, b) / (a + start);
    for (let j = start; j <= end; j += 1) {
      sum += weight * q;
      q += term;
      term *= (r2 * (a + b + j)) / (a + j + 1);
      weight *= ((size + j) / (j + 1)) * populationR2;
    }
    return sum;
  }
  let weight = Math.exp(logWeight(end));
  let p = betaLowerTail(r2, a + end, b);
  let term = incompleteBetaFront(r2, a + end, b) / (a + end);
  for (let j = end; j >= start; j -= 1) {
    sum += weight * p;
    term *= (a + j) / (r2 * (a + b + j - 1));
    p += term;
    weight *= j / ((size + j - 1) * populationR2);
  }
  return sum;
}

export function squaredMultipleCorrelationLowerTail(
  r2: number,
  predictors: number,
  n: number,
  populationR2: number,
): number {
  return mixture(r2, predictors, n, populationR2, 'lower');
}

export function squaredMultipleCorrelationUpperTail(
  r2: number,
  predictors: number,
  n: number,
  populationR2: number,
): number {
  return mixture(r2, predictors, n, populationR2, 'upper');
}
