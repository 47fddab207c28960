import { refuse, requireBetween, requireProbability } from '../domain.ts';
import { betaPointOfProduct } from '../special/beta-point.ts';
import { betaTail } from '../special/incomplete-beta.ts';
import { betaRatioQuantile } from '../special/incomplete-beta-inverse.ts';
import { isReachable } from '../special/invert-log-tail.ts';

/** Lower tail of Student's t distribution, P(T ≤ t), with df degrees of freedom.
 *
 *  Domain of both tails: t from -1e150 to 1e150; df from 0.5 to 2e7, whole or not.
 *  Relative error (test/fixtures/student-t.json): 2e-14 where both tails are above 1e-6, 3e-13 down to 1e-200.
 *  Smaller tails lose digits below 1e-300, as doubles do.
 *  @throws {RangeError} names argument, value and domain
 *  Source: Abramowitz & Stegun (1964) 26.7.1, with t² exact: half the upper tail of F with 1 and df. */
export function tLowerTail(t: number, df: number): number {
  requireArguments('tLowerTail', t, df);
  return upperTail(-t, df);
}

/** P(T > t), without subtraction from 1; see tLowerTail. */
export function tUpperTail(t: number, df: number): number {
  requireArguments('tUpperTail', t, df);
  return upperTail(t, df);
}

/** The t that Student's t with df degrees of freedom falls below with probability p.
 *  Domain: 0 < p < 1; df from 0.5 to 2e7; a result whose square is at most 1e300.
 *  Relative error (test/fixtures/student-t-quantile.json): 2e-13 for p from 1e-200.
 *  @throws {RangeError} names argument, value and domain
 *  Source: square root of the quantile of F with 1 and df degrees of freedom. */
export function tQuantile(p: number, df: number): number {
  return 0 - upperQuantile('tQuantile', p, df);
}

/** The t that Student's t exceeds with probability p: the critical value of a one-sided test at alpha = p.
 *  See tQuantile. */
export function tUpperQuantile(p: number, df: number): number {
  return upperQuantile('tUpperQuantile', p, df);
}

function upperTail(t: number, df: number): number {
  if (t < 0) return 1 - upperTail(-t, df);
  return betaTail(betaPointOfProduct(t, t, df), 0.5, df / 2, 'upper') / 2;
}

function upperQuantile(functionName: string, p: number, df: number): number {
  requireProbability(functionName, 'p', p);
  requireDegreesOfFreedom(functionName, df);
  if (p === 0.5) return 0;
  // Near the median the probability of |T| < t, 2p - 1, is exact and keeps the digits of t.
  const square =
    p > 0.25 && p < 0.75
      ? betaRatioQuantile(Math.abs(1 - 2 * p), 0.5, df / 2, 'lower')
      : betaRatioQuantile(2 * Math.min(p, 1 - p), 0.5, df / 2, 'upper');
  if (!isReachable(square)) refuse(functionName, 'p', p, `with df ${df} a less extreme probability`);
  return p < 0.5 ? Math.sqrt(square) : -Math.sqrt(square);
}

function requireArguments(functionName: string, t: number, df: number): void {
  requireBetween(functionName, 't', t, -1e150, 1e150);
  requireDegreesOfFreedom(functionName, df);
}

/** What the fixtures cover. */
function requireDegreesOfFreedom(functionName: string, df: number): void {
  requireBetween(functionName, 'df', df, 0.5, 2e7);
}
