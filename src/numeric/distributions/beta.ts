import { refuse, requireBetween, requireProbability } from '../domain.ts';
import { betaPoint } from '../special/beta-point.ts';
import { betaTail, requireShapes, type Tail } from '../special/incomplete-beta.ts';
import { betaQuantilePoint } from '../special/incomplete-beta-inverse.ts';

export function betaLowerTail(x: number, a: number, b: number): number {
  requireBetween('betaLowerTail', 'x', x, 0, 1);
  requireShapes('betaLowerTail', a, b);
  return betaTail(betaPoint(x), a, b, 'lower');
}

export function betaUpperTail(x: number, a: number, b: number): number {
  requireBetween('betaUpperTail', 'x', x, 0, 1);
  requireShapes('betaUpperTail', a, b);
  return betaTail(betaPoint(x), a, b, 'upper');
}

export function betaQuantile(p: number, a: number, b: number): number {
  return quantile('betaQuantile', p, a, b, 'lower');
}

export function betaUpperQuantile(p: number, a: number, b: number): number {
  return quantile('betaUpperQuantile', p, a, b, 'upper');
}

function quantile(functionName: string, p: number, a: number, b: number, tail: Tail): number {
  requireProbability(functionName, 'p', p);
  requireShapes(functionName, a, b);
  const { x } = betaQuantilePoint(p, a, b, tail);
  if (!(x > 1e-307)) refuse(functionName, 'p', p, `with a ${a} and b ${b} a less extreme probability`);
  return x;
}
