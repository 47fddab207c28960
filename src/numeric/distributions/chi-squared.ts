import { refuse, requireBetween, requireProbability, requireZeroOrBetween } from '../domain.ts';
import type { Tail } from '../special/direct-tail.ts';
import { gammaLogTail, gammaTail } from '../special/incomplete-gamma.ts';
import { gammaTailQuantile } from '../special/incomplete-gamma-inverse.ts';
import { isReachable } from '../special/invert-log-tail.ts';

/** Lower tail of the chi-squared distribution, P(X ≤ x), with df degrees of freedom.
 *
 *  Domain of all tails here: x is 0 or from 1e-299 to 1e100; df from 0.5 to 2e7, whole or not.
 *  Relative error (test/fixtures/chi-squared.json): 2e-14 where both tails are above 1e-6, 3e-13 down to 1e-200.
 *  Smaller tails lose digits below 1e-300, as doubles do; the logarithms go on.
 *  @throws {RangeError} names argument, value and domain
 *  Source: Abramowitz & Stegun (1964) 26.4.19, the incomplete gamma function at x/2 with shape df/2. */
export function chiSquaredLowerTail(x: number, df: number): number {
  requireArguments('chiSquaredLowerTail', x, df);
  return gammaTail(x / 2, df / 2, 'lower');
}

/** P(X > x), without subtraction from 1; see chiSquaredLowerTail. */
export function chiSquaredUpperTail(x: number, df: number): number {
  requireArguments('chiSquaredUpperTail', x, df);
  return gammaTail(x / 2, df / 2, 'upper');
}

/** ln P(X ≤ x); -Infinity at 0. See chiSquaredLowerTail. */
export function chiSquaredLogLowerTail(x: number, df: number): number {
  requireArguments('chiSquaredLogLowerTail', x, df);
  return gammaLogTail(x / 2, df / 2, 'lower');
}

/** ln P(X > x). See chiSquaredLowerTail. */
export function chiSquaredLogUpperTail(x: number, df: number): number {
  requireArguments('chiSquaredLogUpperTail', x, df);
  return gammaLogTail(x / 2, df / 2, 'upper');
}

/** The x that a chi-squared variate with df degrees of freedom falls below with probability p.
 *  Domain: 0 < p < 1; df from 0.5 to 2e7; a result of at least 2e-300.
 *  Relative error (test/fixtures/chi-squared-quantile.json): 2e-13 for p from 1e-200.
 *  @throws {RangeError} names argument, value and domain
 *  Source: Halley's method on the logarithm of the smaller tail, from Wilson & Hilferty (1931). */
export function chiSquaredQuantile(p: number, df: number): number {
  return quantile('chiSquaredQuantile', p, df, 'lower');
}

/** The x that a chi-squared variate exceeds with probability p: the critical value at alpha = p.
 *  See chiSquaredQuantile. */
export function chiSquaredUpperQuantile(p: number, df: number): number {
  return quantile('chiSquaredUpperQuantile', p, df, 'upper');
}

function quantile(functionName: string, p: number, df: number, tail: Tail): number {
  requireProbability(functionName, 'p', p);
  requireDegreesOfFreedom(functionName, df);
  const half = gammaTailQuantile(p, df / 2, tail);
  if (!isReachable(half)) refuse(functionName, 'p', p, `with df ${df} a less extreme probability`);
  return 2 * half;
}

function requireArguments(functionName: string, x: number, df: number): void {
  requireZeroOrBetween(functionName, 'x', x, 1e-299, 1e100);
  requireDegreesOfFreedom(functionName, df);
}

/** What the fixtures cover. */
function requireDegreesOfFreedom(functionName: string, df: number): void {
  requireBetween(functionName, 'df', df, 0.5, 2e7);
}
