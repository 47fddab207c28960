import { requireBetween } from '../domain.ts';
import { logBetaFront } from './beta-front.ts';
import { type BetaPoint, betaPoint, excessOverMean } from './beta-point.ts';
import { incompleteBetaFraction } from './incomplete-beta-fraction.ts';

/** Shapes that the fixtures cover; beyond them the functions refuse. */
export const SMALLEST_SHAPE = 0.25;
export const LARGEST_SHAPE = 1e7;

export function requireShapes(functionName: string, a: number, b: number): void {
  requireBetween(functionName, 'a', a, SMALLEST_SHAPE, LARGEST_SHAPE);
  requireBetween(functionName, 'b', b, SMALLEST_SHAPE, LARGEST_SHAPE);
}

function checkedPoint(functionName: string, x: number, a: number, b: number, complement: number): BetaPoint {
  requireBetween(functionName, 'x', x, 0, 1);
  requireBetween(functionName, 'complement', complement, 0, 1);
  requireShapes(functionName, a, b);
  return betaPoint(x, complement);
}

export function incompleteBetaLower(x: number, a: number, b: number, complement: number = 1 - x): number {
  return betaTail(checkedPoint('incompleteBetaLower', x, a, b, complement), a, b, 'lower');
}

export function incompleteBetaUpper(x: number, a: number, b: number, complement: number = 1 - x): number {
  return betaTail(checkedPoint('incompleteBetaUpper', x, a, b, complement), a, b, 'upper');
}

export function incompleteBetaLogLower(x: number, a: number, b: number, complement: number = 1 - x): number {
  return betaLogTail(checkedPoint('incompleteBetaLogLower', x, a, b, complement), a, b, 'lower');
}

export function incompleteBetaLogUpper(x: number, a: number, b: number, complement: number = 1 - x): number {
  return betaLogTail(checkedPoint('incompleteBetaLogUpper', x, a, b, complement), a, b, 'upper');
}

/** x^a (1-x)^b / B(a, b): the density of ln(x/(1-x)), and a·b/(a + b) times neighbouring differences of tails. */
export function incompleteBetaFront(x: number, a: number, b: number, complement: number = 1 - x): number {
  const point = checkedPoint('incompleteBetaFront', x, a, b, complement);
  if (point.x === 0 || point.complement === 0) return 0;
  return Math.exp(logBetaFront(point, a, b, excessOverMean(point, a, b)));
}

export type Tail = 'lower' | 'upper';

/** The tail that the continued fraction gives directly at a point: the other one is 1 less it, and is never
 *  below about 1/30, so nothing is lost. */
export interface DirectTail {
  tail: Tail;
  logFront: number;
  /** Probability of that tail over the front factor. */
  ratio: number;
}

/** Domain (not checked): 0 < x < 1; a, b as in requireShapes. */
export function directBetaTail(point: BetaPoint, a: number, b: number): DirectTail {
  const { x, complement: y } = point;
  const excess = excessOverMean(point, a, b);
  const logFront = logBetaFront(point, a, b, excess);
  if (excess <= y - x) return { tail: 'lower', logFront, ratio: incompleteBetaFraction(a, b, x, y, excess) };
  return { tail: 'upper', logFront, ratio: incompleteBetaFraction(b, a, y, x, -excess) };
}

/** Tail of the beta distribution at a point held in extended precision (not checked). */
export function betaTail(point: BetaPoint, a: number, b: number, wanted: Tail): number {
  if (point.x === 0) return wanted === 'lower' ? 0 : 1;
  if (point.complement === 0) return wanted === 'lower' ? 1 : 0;
  const { tail, logFront, ratio } = directBetaTail(point, a, b);
  const probability = Math.exp(logFront) * ratio;
  return tail === wanted ? probability : 1 - probability;
}

/** Natural logarithm of betaTail, down to where the logarithm itself overflows. */
export function betaLogTail(point: BetaPoint, a: number, b: number, wanted: Tail): number {
  if (point.x === 0) return wanted === 'lower' ? -Infinity : 0;
  if (point.complement === 0) return wanted === 'lower' ? 0 : -Infinity;
  const { tail, logFront, ratio } = directBetaTail(point, a, b);
  if (tail === wanted) return logFront + Math.log(ratio);
  return Math.log1p(-Math.exp(logFront) * ratio);
}
