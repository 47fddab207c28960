/** R² of a sample when outcome and predictors are jointly normal: negative-binomial mixture of beta distributions.
 *  Domain: 0 ≤ r2 ≤ 1; predictors 1–1e4, n from predictors + 2 to 1e7, 0 ≤ populationR2 < 1.
 *  Relative error (test/fixtures/squared-multiple-correlation.json): 1e-12 for both tails down to 1e-200.
 *  @throws {RangeError} names argument, value and domain
 *  Source: Gatsonis & Sampson (1989); as a mixture, Benton & Krishnamoorthy (2003). */

import { requireBetween } from '../domain.ts';
import { mixtureTail } from '../mixtures/mixture-tail.ts';
import { betaLadder } from '../mixtures/tail-ladder.ts';
import { negativeBinomialWeights } from '../mixtures/weights.ts';
import { betaPoint } from '../special/beta-point.ts';
import type { Tail } from '../special/direct-tail.ts';
import { betaTail } from '../special/incomplete-beta.ts';

function tailOf(
  name: string,
  r2: number,
  predictors: number,
  n: number,
  populationR2: number,
  tail: Tail,
): number {
  requireBetween(name, 'r2', r2, 0, 1);
  requireBetween(name, 'predictors', predictors, 1, 1e4);
  requireBetween(name, 'n', n, predictors + 1.5, 1e7);
  requireBetween(name, 'populationR2', populationR2, 0, 1 - 1e-9);
  if (r2 === 0) return tail === 'lower' ? 0 : 1;
  if (r2 === 1) return tail === 'lower' ? 1 : 0;
  const point = betaPoint(r2);
  const a = predictors / 2;
  const b = (n - predictors - 1) / 2;
  if (populationR2 === 0) return betaTail(point, a, b, tail);
  return mixtureTail(negativeBinomialWeights((n - 1) / 2, populationR2), betaLadder(point, b, tail), a);
}

/** P(R² ≤ r2). */
export function squaredMultipleCorrelationLowerTail(
  r2: number,
  predictors: number,
  n: number,
  populationR2: number,
): number {
  return tailOf('squaredMultipleCorrelationLowerTail', r2, predictors, n, populationR2, 'lower');
}

/** P(R² > r2). */
export function squaredMultipleCorrelationUpperTail(
  r2: number,
  predictors: number,
  n: number,
  populationR2: number,
): number {
  return tailOf('squaredMultipleCorrelationUpperTail', r2, predictors, n, populationR2, 'upper');
}
