import { refuse, requireBetween, requireZeroOrBetween } from '../domain.ts';
import { logBetaFront } from './beta-front.ts';
import { type BetaPoint, betaPoint, excessOverMean } from './beta-point.ts';
import { type DirectTail, logProbabilityOf, probabilityOf, type Tail } from './direct-tail.ts';
import { incompleteBetaFraction } from './incomplete-beta-fraction.ts';

/** Regularised incomplete beta function I_x(a, b) = ∫₀ˣ t^(a-1) (1-t)^(b-1) dt / B(a, b) and its complement:
 *  the tails of the beta distribution.
 *
 *  Domain of all functions here: x is 0 or from 1e-300 to 1; a and b from 1/4 to 1e7. `complement` is 1 - x;
 *  give it where it is known better than the subtraction would know it: the smaller of x and complement then
 *  counts as exact.
 *  Relative error (test/fixtures/beta.json): 2e-14 where both tails are above 1e-6, 3e-13 down to 1e-200.
 *  Smaller tails lose digits below 1e-300, as doubles do; the logarithms go on.
 *  @throws {RangeError} names argument, value and domain
 *  Source: Loader (2000) for the front factor, DiDonato & Morris (1992) for the continued fraction. */
export function incompleteBetaLower(x: number, a: number, b: number, complement: number = 1 - x): number {
  return betaTail(checkedPoint('incompleteBetaLower', x, a, b, complement), a, b, 'lower');
}

/** 1 - I_x(a, b), without the subtraction; see incompleteBetaLower. */
export function incompleteBetaUpper(x: number, a: number, b: number, complement: number = 1 - x): number {
  return betaTail(checkedPoint('incompleteBetaUpper', x, a, b, complement), a, b, 'upper');
}

/** ln I_x(a, b); -Infinity at 0. See incompleteBetaLower. */
export function incompleteBetaLogLower(x: number, a: number, b: number, complement: number = 1 - x): number {
  return betaLogTail(checkedPoint('incompleteBetaLogLower', x, a, b, complement), a, b, 'lower');
}

/** ln(1 - I_x(a, b)); -Infinity at 1. See incompleteBetaLower. */
export function incompleteBetaLogUpper(x: number, a: number, b: number, complement: number = 1 - x): number {
  return betaLogTail(checkedPoint('incompleteBetaLogUpper', x, a, b, complement), a, b, 'upper');
}

/** x^a (1-x)^b / B(a, b): x(1-x) times the beta density. I_x(a, b) - I_x(a + 1, b) is this over a.
 *  Domain, error and source as for incompleteBetaLower. */
export function incompleteBetaFront(x: number, a: number, b: number, complement: number = 1 - x): number {
  const point = checkedPoint('incompleteBetaFront', x, a, b, complement);
  if (point.x === 0 || point.complement === 0) return 0;
  return Math.exp(logBetaFront(point, a, b, excessOverMean(point, a, b)));
}

/** Shapes that the fixtures cover; beyond them the functions refuse. */
export function requireShapes(functionName: string, a: number, b: number): void {
  requireBetween(functionName, 'a', a, 0.25, 1e7);
  requireBetween(functionName, 'b', b, 0.25, 1e7);
}

/** Tail of the beta distribution at a point held in extended precision (not checked). */
export function betaTail(point: BetaPoint, a: number, b: number, wanted: Tail): number {
  if (point.x === 0) return wanted === 'lower' ? 0 : 1;
  if (point.complement === 0) return wanted === 'lower' ? 1 : 0;
  return probabilityOf(directBetaTail(point, a, b), wanted);
}

/** Natural logarithm of betaTail, also where the tail itself is below the smallest double. */
export function betaLogTail(point: BetaPoint, a: number, b: number, wanted: Tail): number {
  if (point.x === 0) return wanted === 'lower' ? -Infinity : 0;
  if (point.complement === 0) return wanted === 'lower' ? 0 : -Infinity;
  return logProbabilityOf(directBetaTail(point, a, b), wanted);
}

/** The tail on whose side of (a + 1)/(a + b + 2) the point lies: beyond it the fraction converges slowly.
 *  Domain (not checked): 0 < x < 1; a, b as in requireShapes. */
export function directBetaTail(point: BetaPoint, a: number, b: number): DirectTail {
  const { x, complement: y } = point;
  const excess = excessOverMean(point, a, b);
  const logFront = logBetaFront(point, a, b, excess);
  if (excess <= y - x) {
    return { tail: 'lower', logFront, ratio: incompleteBetaFraction(a, b, x, y, excess), excess };
  }
  return { tail: 'upper', logFront, ratio: incompleteBetaFraction(b, a, y, x, -excess), excess };
}

function checkedPoint(functionName: string, x: number, a: number, b: number, complement: number): BetaPoint {
  requireZeroOrBetween(functionName, 'x', x, 1e-300, 1);
  requireZeroOrBetween(functionName, 'complement', complement, 1e-300, 1);
  if (Math.abs(x + complement - 1) > 1e-12) {
    refuse(functionName, 'complement', complement, `with x ${x} a complement of ${1 - x}`);
  }
  requireShapes(functionName, a, b);
  return betaPoint(x, complement);
}
