import { refuse, requireBetween, requireNonNegative, requireProbability } from '../domain.ts';
import { gammaLogTail, gammaTail } from '../special/incomplete-gamma.ts';
import { gammaTailQuantile } from '../special/incomplete-gamma-inverse.ts';

const SMALLEST_DF = 0.5;
const LARGEST_DF = 2e7;

function check(functionName: string, x: number, df: number): void {
  requireNonNegative(functionName, 'x', x);
  requireBetween(functionName, 'df', df, SMALLEST_DF, LARGEST_DF);
}

export function chiSquaredLowerTail(x: number, df: number): number {
  check('chiSquaredLowerTail', x, df);
  return gammaTail(x / 2, df / 2, 'lower');
}

export function chiSquaredUpperTail(x: number, df: number): number {
  check('chiSquaredUpperTail', x, df);
  return gammaTail(x / 2, df / 2, 'upper');
}

export function chiSquaredLogLowerTail(x: number, df: number): number {
  check('chiSquaredLogLowerTail', x, df);
  return gammaLogTail(x / 2, df / 2, 'lower');
}

export function chiSquaredLogUpperTail(x: number, df: number): number {
  check('chiSquaredLogUpperTail', x, df);
  return gammaLogTail(x / 2, df / 2, 'upper');
}

export function chiSquaredQuantile(p: number, df: number): number {
  return quantile('chiSquaredQuantile', p, df, 'lower');
}

export function chiSquaredUpperQuantile(p: number, df: number): number {
  return quantile('chiSquaredUpperQuantile', p, df, 'upper');
}

function quantile(functionName: string, p: number, df: number, tail: 'lower' | 'upper'): number {
  requireProbability(functionName, 'p', p);
  requireBetween(functionName, 'df', df, SMALLEST_DF, LARGEST_DF);
  const value = 2 * gammaTailQuantile(p, df / 2, tail);
  if (!(value > 1e-307)) refuse(functionName, 'p', p, `with df ${df} a less extreme probability`);
  return value;
}
