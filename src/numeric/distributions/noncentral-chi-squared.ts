/** Noncentral χ² distribution: Poisson mixture of gamma distributions.
 *  Domain: x ≥ 0, df .5–1e7, noncentrality 0–1e5.
 *  Relative error (test/fixtures/noncentral-chi-squared.json): 1e-12 for both tails down to 1e-200.
 *  @throws {RangeError} names argument, value and domain */

import { requireBetween, requireNonNegative } from '../domain.ts';
import { mixtureQuantile } from '../mixtures/mixture-quantile.ts';
import { mixtureTail } from '../mixtures/mixture-tail.ts';
import { gammaLadder } from '../mixtures/tail-ladder.ts';
import { poissonWeights } from '../mixtures/weights.ts';
import type { Tail } from '../special/direct-tail.ts';
import { gammaTail } from '../special/incomplete-gamma.ts';

function tailOf(name: string, x: number, df: number, noncentrality: number, tail: Tail): number {
  requireNonNegative(name, 'x', x);
  requireBetween(name, 'df', df, 0.5, 1e7);
  requireBetween(name, 'noncentrality', noncentrality, 0, 1e5);
  if (x === 0) return tail === 'lower' ? 0 : 1;
  if (noncentrality === 0) return gammaTail(x / 2, df / 2, tail);
  return mixtureTail(poissonWeights(noncentrality / 2), gammaLadder(x / 2, tail), df / 2);
}

/** P(χ² ≤ x). */
export function noncentralChiSquaredLowerTail(x: number, df: number, noncentrality: number): number {
  return tailOf('noncentralChiSquaredLowerTail', x, df, noncentrality, 'lower');
}

/** P(χ² > x). */
export function noncentralChiSquaredUpperTail(x: number, df: number, noncentrality: number): number {
  return tailOf('noncentralChiSquaredUpperTail', x, df, noncentrality, 'upper');
}

/** The x with P(χ² ≤ x) = p, 0 < p < 1. */
export function noncentralChiSquaredQuantile(p: number, df: number, noncentrality: number): number {
  return mixtureQuantile('noncentralChiSquaredQuantile', p, df + noncentrality, (x) => [
    noncentralChiSquaredLowerTail(x, df, noncentrality),
    noncentralChiSquaredUpperTail(x, df, noncentrality),
  ]);
}

/** The x with P(χ² > x) = p, 0 < p < 1. */
export function noncentralChiSquaredUpperQuantile(p: number, df: number, noncentrality: number): number {
  return mixtureQuantile('noncentralChiSquaredUpperQuantile', p, df + noncentrality, (x) => [
    noncentralChiSquaredUpperTail(x, df, noncentrality),
    noncentralChiSquaredLowerTail(x, df, noncentrality),
  ]);
}
