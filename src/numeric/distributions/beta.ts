import { refuse, requireProbability, requireZeroOrBetween } from '../domain.ts';
import { type BetaPoint, betaPoint } from '../special/beta-point.ts';
import type { Tail } from '../special/direct-tail.ts';
import { betaTail, requireShapes } from '../special/incomplete-beta.ts';
import { betaQuantilePoint } from '../special/incomplete-beta-inverse.ts';
import { isReachable } from '../special/invert-log-tail.ts';

/** Lower tail of the beta distribution, P(X ≤ x), with shapes a and b.
 *
 *  Domain of both tails: x is 0 or from 1e-300 to 1; a and b from 1/4 to 1e7. A point closer to 1 than doubles
 *  tell apart is a matter for incompleteBetaLower, which takes 1 - x as well.
 *  Relative error (test/fixtures/beta.json): 2e-14 where both tails are above 1e-6, 3e-13 down to 1e-200.
 *  Smaller tails lose digits below 1e-300, as doubles do.
 *  @throws {RangeError} names argument, value and domain
 *  Source: the regularised incomplete beta function, Abramowitz & Stegun (1964) 26.5.1. */
export function betaLowerTail(x: number, a: number, b: number): number {
  return betaTail(checkedPoint('betaLowerTail', x, a, b), a, b, 'lower');
}

/** P(X > x), without subtraction from 1; see betaLowerTail. */
export function betaUpperTail(x: number, a: number, b: number): number {
  return betaTail(checkedPoint('betaUpperTail', x, a, b), a, b, 'upper');
}

/** The x that a beta variate with shapes a and b falls below with probability p.
 *  Domain: 0 < p < 1; a and b from 1/4 to 1e7; a result of at least 1e-300. It is 1 where that is the nearest
 *  double.
 *  Relative error (test/fixtures/beta-quantile.json): 2e-13 for p from 1e-200.
 *  @throws {RangeError} names argument, value and domain
 *  Source: Halley's method on the logarithm of the smaller tail, from Paulson (1942). */
export function betaQuantile(p: number, a: number, b: number): number {
  return quantile('betaQuantile', p, a, b, 'lower');
}

/** The x that a beta variate exceeds with probability p. See betaQuantile. */
export function betaUpperQuantile(p: number, a: number, b: number): number {
  return quantile('betaUpperQuantile', p, a, b, 'upper');
}

function checkedPoint(functionName: string, x: number, a: number, b: number): BetaPoint {
  requireZeroOrBetween(functionName, 'x', x, 1e-300, 1);
  requireShapes(functionName, a, b);
  return betaPoint(x);
}

function quantile(functionName: string, p: number, a: number, b: number, tail: Tail): number {
  requireProbability(functionName, 'p', p);
  requireShapes(functionName, a, b);
  const { x } = betaQuantilePoint(p, a, b, tail);
  if (!isReachable(x)) refuse(functionName, 'p', p, `with a ${a} and b ${b} a less extreme probability`);
  return x;
}
