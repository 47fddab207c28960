import { refuse, requireBetween, requireNonNegative, requireProbability } from '../domain.ts';
import { type BetaPoint, betaPointOfProduct } from '../special/beta-point.ts';
import { betaLogTail, betaTail, type Tail } from '../special/incomplete-beta.ts';
import { betaRatioQuantile } from '../special/incomplete-beta-inverse.ts';

/** Degrees of freedom that the fixtures cover; beyond them the functions refuse. */
const SMALLEST_DF = 0.5;
const LARGEST_DF = 2e7;

function checkedPoint(functionName: string, x: number, df1: number, df2: number): BetaPoint {
  requireNonNegative(functionName, 'x', x);
  requireBetween(functionName, 'df1', df1, SMALLEST_DF, LARGEST_DF);
  requireBetween(functionName, 'df2', df2, SMALLEST_DF, LARGEST_DF);
  return betaPointOfProduct(df1, x, df2);
}

export function fLowerTail(x: number, df1: number, df2: number): number {
  return betaTail(checkedPoint('fLowerTail', x, df1, df2), df1 / 2, df2 / 2, 'lower');
}

export function fUpperTail(x: number, df1: number, df2: number): number {
  return betaTail(checkedPoint('fUpperTail', x, df1, df2), df1 / 2, df2 / 2, 'upper');
}

export function fLogLowerTail(x: number, df1: number, df2: number): number {
  return betaLogTail(checkedPoint('fLogLowerTail', x, df1, df2), df1 / 2, df2 / 2, 'lower');
}

export function fLogUpperTail(x: number, df1: number, df2: number): number {
  return betaLogTail(checkedPoint('fLogUpperTail', x, df1, df2), df1 / 2, df2 / 2, 'upper');
}

export function fQuantile(p: number, df1: number, df2: number): number {
  return quantile('fQuantile', p, df1, df2, 'lower');
}

export function fUpperQuantile(p: number, df1: number, df2: number): number {
  return quantile('fUpperQuantile', p, df1, df2, 'upper');
}

function quantile(functionName: string, p: number, df1: number, df2: number, tail: Tail): number {
  requireProbability(functionName, 'p', p);
  requireBetween(functionName, 'df1', df1, SMALLEST_DF, LARGEST_DF);
  requireBetween(functionName, 'df2', df2, SMALLEST_DF, LARGEST_DF);
  const value = betaRatioQuantile(p, df1 / 2, df2 / 2, tail);
  if (!(value > 1e-307 && value < Infinity)) {
    refuse(functionName, 'p', p, `with df1 ${df1} and df2 ${df2} a less extreme probability`);
  }
  return value;
}
