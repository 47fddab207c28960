import { refuse, requireBetween, requireFinite, requireProbability } from '../domain.ts';
import { betaPointOfProduct } from '../special/beta-point.ts';
import { betaTail } from '../special/incomplete-beta.ts';
import { betaRatioQuantile } from '../special/incomplete-beta-inverse.ts';

const SMALLEST_DF = 0.5;
const LARGEST_DF = 2e7;

export function tLowerTail(t: number, df: number): number {
  requireFinite('tLowerTail', 't', t);
  requireBetween('tLowerTail', 'df', df, SMALLEST_DF, LARGEST_DF);
  return upperTail(-t, df);
}

export function tUpperTail(t: number, df: number): number {
  requireFinite('tUpperTail', 't', t);
  requireBetween('tUpperTail', 'df', df, SMALLEST_DF, LARGEST_DF);
  return upperTail(t, df);
}

/** t² is F with 1 and df degrees of freedom. */
function upperTail(t: number, df: number): number {
  if (t < 0) return 1 - upperTail(-t, df);
  return betaTail(betaPointOfProduct(t, t, df), 0.5, df / 2, 'upper') / 2;
}

export function tQuantile(p: number, df: number): number {
  return -upperQuantile('tQuantile', p, df);
}

export function tUpperQuantile(p: number, df: number): number {
  return upperQuantile('tUpperQuantile', p, df);
}

function upperQuantile(functionName: string, p: number, df: number): number {
  requireProbability(functionName, 'p', p);
  requireBetween(functionName, 'df', df, SMALLEST_DF, LARGEST_DF);
  if (p === 0.5) return 0;
  const sign = p < 0.5 ? 1 : -1;
  const square =
    p > 0.25 && p < 0.75
      ? betaRatioQuantile(Math.abs(1 - 2 * p), 0.5, df / 2, 'lower')
      : betaRatioQuantile(2 * Math.min(p, 1 - p), 0.5, df / 2, 'upper');
  if (!(square < Infinity)) refuse(functionName, 'p', p, `with df ${df} a less extreme probability`);
  return sign * Math.sqrt(square);
}
