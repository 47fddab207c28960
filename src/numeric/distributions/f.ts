import { refuse, requireBetween, requireProbability, requireZeroOrBetween } from '../domain.ts';
import { type BetaPoint, betaPointOfProduct } from '../special/beta-point.ts';
import type { Tail } from '../special/direct-tail.ts';
import { betaLogTail, betaTail } from '../special/incomplete-beta.ts';
import { betaRatioQuantile } from '../special/incomplete-beta-inverse.ts';
import { isReachable } from '../special/invert-log-tail.ts';

/** Lower tail of the F distribution, P(X ≤ x), with df1 numerator and df2 denominator degrees of freedom.
 *
 *  Domain of all tails here: x is 0 or from 1e-300 to 1e300; df1 and df2 from 0.5 to 2e7, whole or not.
 *  Relative error (test/fixtures/f.json): 2e-14 where both tails are above 1e-6, 3e-13 down to 1e-200.
 *  Smaller tails lose digits below 1e-300, as doubles do; the logarithms go on.
 *  @throws {RangeError} names argument, value and domain
 *  Source: Abramowitz & Stegun (1964) 26.6.2, the incomplete beta function at df1·x/(df1·x + df2), which is
 *  formed in extended precision. */
export function fLowerTail(x: number, df1: number, df2: number): number {
  return betaTail(checkedPoint('fLowerTail', x, df1, df2), df1 / 2, df2 / 2, 'lower');
}

/** P(X > x), without subtraction from 1; see fLowerTail. */
export function fUpperTail(x: number, df1: number, df2: number): number {
  return betaTail(checkedPoint('fUpperTail', x, df1, df2), df1 / 2, df2 / 2, 'upper');
}

/** ln P(X ≤ x); -Infinity at 0. See fLowerTail. */
export function fLogLowerTail(x: number, df1: number, df2: number): number {
  return betaLogTail(checkedPoint('fLogLowerTail', x, df1, df2), df1 / 2, df2 / 2, 'lower');
}

/** ln P(X > x). See fLowerTail. */
export function fLogUpperTail(x: number, df1: number, df2: number): number {
  return betaLogTail(checkedPoint('fLogUpperTail', x, df1, df2), df1 / 2, df2 / 2, 'upper');
}

/** The x that an F variate with df1 and df2 degrees of freedom falls below with probability p.
 *  Domain: 0 < p < 1; df1 and df2 from 0.5 to 2e7; a result from 1e-300 to 1e300.
 *  Relative error (test/fixtures/f-quantile.json): 2e-13 for p from 1e-200.
 *  @throws {RangeError} names argument, value and domain
 *  Source: Halley's method on the logarithm of the smaller tail, from Paulson (1942). */
export function fQuantile(p: number, df1: number, df2: number): number {
  return quantile('fQuantile', p, df1, df2, 'lower');
}

/** The x that an F variate exceeds with probability p: the critical value at alpha = p. See fQuantile. */
export function fUpperQuantile(p: number, df1: number, df2: number): number {
  return quantile('fUpperQuantile', p, df1, df2, 'upper');
}

function checkedPoint(functionName: string, x: number, df1: number, df2: number): BetaPoint {
  requireZeroOrBetween(functionName, 'x', x, 1e-300, 1e300);
  requireDegreesOfFreedom(functionName, df1, df2);
  return betaPointOfProduct(df1, x, df2);
}

function quantile(functionName: string, p: number, df1: number, df2: number, tail: Tail): number {
  requireProbability(functionName, 'p', p);
  requireDegreesOfFreedom(functionName, df1, df2);
  const value = betaRatioQuantile(p, df1 / 2, df2 / 2, tail);
  if (!isReachable(value)) {
    refuse(functionName, 'p', p, `with df1 ${df1} and df2 ${df2} a less extreme probability`);
  }
  return value;
}

/** What the fixtures cover. */
function requireDegreesOfFreedom(functionName: string, df1: number, df2: number): void {
  requireBetween(functionName, 'df1', df1, 0.5, 2e7);
  requireBetween(functionName, 'df2', df2, 0.5, 2e7);
}
