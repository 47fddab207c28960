/** Noncentral F distribution: Poisson mixture of beta distributions.
 *  Domain: x ≥ 0, df1 .5–1e4, df2 1–1e7, noncentrality 0–1e5.
 *  Relative error (test/fixtures/noncentral-f.json): 1e-12 for both tails down to 1e-200.
 *  @throws {RangeError} names argument, value and domain */

import { requireBetween, requireNonNegative } from '../domain.ts';
import { mixtureQuantile } from '../mixtures/mixture-quantile.ts';
import { mixtureTail } from '../mixtures/mixture-tail.ts';
import { betaLadder } from '../mixtures/tail-ladder.ts';
import { poissonWeights } from '../mixtures/weights.ts';
import { betaPointOfProduct } from '../special/beta-point.ts';
import type { Tail } from '../special/direct-tail.ts';
import { betaTail } from '../special/incomplete-beta.ts';

function tailOf(
  name: string,
  x: number,
  df1: number,
  df2: number,
  noncentrality: number,
  tail: Tail,
): number {
  requireNonNegative(name, 'x', x);
  requireBetween(name, 'df1', df1, 0.5, 1e4);
  requireBetween(name, 'df2', df2, 1, 1e7);
  requireBetween(name, 'noncentrality', noncentrality, 0, 1e5);
  if (x === 0) return tail === 'lower' ? 0 : 1;
  const point = betaPointOfProduct(df1, x, df2);
  if (noncentrality === 0) return betaTail(point, df1 / 2, df2 / 2, tail);
  return mixtureTail(poissonWeights(noncentrality / 2), betaLadder(point, df2 / 2, tail), df1 / 2);
}

/** P(F ≤ x). */
export function noncentralFLowerTail(x: number, df1: number, df2: number, noncentrality: number): number {
  return tailOf('noncentralFLowerTail', x, df1, df2, noncentrality, 'lower');
}

/** P(F > x). */
export function noncentralFUpperTail(x: number, df1: number, df2: number, noncentrality: number): number {
  return tailOf('noncentralFUpperTail', x, df1, df2, noncentrality, 'upper');
}

/** The x with P(F ≤ x) = p, 0 < p < 1. */
export function noncentralFQuantile(p: number, df1: number, df2: number, noncentrality: number): number {
  const start = (df1 + noncentrality) / df1;
  return mixtureQuantile('noncentralFQuantile', p, start, (x) => [
    noncentralFLowerTail(x, df1, df2, noncentrality),
    noncentralFUpperTail(x, df1, df2, noncentrality),
  ]);
}

/** The x with P(F > x) = p, 0 < p < 1. */
export function noncentralFUpperQuantile(p: number, df1: number, df2: number, noncentrality: number): number {
  const start = (df1 + noncentrality) / df1;
  return mixtureQuantile('noncentralFUpperQuantile', p, start, (x) => [
    noncentralFUpperTail(x, df1, df2, noncentrality),
    noncentralFLowerTail(x, df1, df2, noncentrality),
  ]);
}
