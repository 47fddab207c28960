import { requireBetween, requireNonNegative } from '../domain.ts';
import { devianceTerm } from './deviance.ts';
import type { DirectTail } from './incomplete-beta.ts';
import { stirlingError } from './stirling-error.ts';

/** Shapes that the fixtures cover; beyond them the functions refuse. */
const SMALLEST_SHAPE = 0.25;
const LARGEST_SHAPE = 1e7;

export function requireShape(functionName: string, shape: number): void {
  requireBetween(functionName, 'shape', shape, SMALLEST_SHAPE, LARGEST_SHAPE);
}

function check(functionName: string, x: number, shape: number): void {
  requireNonNegative(functionName, 'x', x);
  requireShape(functionName, shape);
}

export function gammaLowerTail(x: number, shape: number): number {
  check('gammaLowerTail', x, shape);
  return gammaTail(x, shape, 'lower');
}

export function gammaUpperTail(x: number, shape: number): number {
  check('gammaUpperTail', x, shape);
  return gammaTail(x, shape, 'upper');
}

export function gammaLogLowerTail(x: number, shape: number): number {
  check('gammaLogLowerTail', x, shape);
  return gammaLogTail(x, shape, 'lower');
}

export function gammaLogUpperTail(x: number, shape: number): number {
  check('gammaLogUpperTail', x, shape);
  return gammaLogTail(x, shape, 'upper');
}

export function gammaTail(x: number, shape: number, wanted: 'lower' | 'upper'): number {
  if (x === 0) return wanted === 'lower' ? 0 : 1;
  const { tail, logFront, ratio } = directGammaTail(x, shape);
  const probability = Math.exp(logFront) * ratio;
  return tail === wanted ? probability : 1 - probability;
}

export function gammaLogTail(x: number, shape: number, wanted: 'lower' | 'upper'): number {
  if (x === 0) return wanted === 'lower' ? -Infinity : 0;
  const { tail, logFront, ratio } = directGammaTail(x, shape);
  if (tail === wanted) return logFront + Math.log(ratio);
  return Math.log1p(-Math.exp(logFront) * ratio);
}

/** The tail that a continued fraction gives directly; the other is 1 less it. */
export function directGammaTail(x: number, shape: number): DirectTail {
  const logFront = logGammaFront(x, shape);
  if (x <= shape + 1) return { tail: 'lower', logFront, ratio: lowerFraction(x, shape) };
  return { tail: 'upper', logFront, ratio: upperFraction(x, shape) };
}

/** ln of x^shape e^-x / Γ(shape), the density of ln x. Source: Loader (2000), saddle-point form. */
function logGammaFront(x: number, shape: number): number {
  const ratio = x / shape;
  const deviance = shape * devianceTerm((x - shape) / shape, ratio, (x - ratio * shape) / shape);
  return 0.5 * Math.log(shape / (2 * Math.PI)) - stirlingError(shape) - deviance;
}

/** Lower tail over front. The limit of the beta distribution's fraction (DiDonato & Morris 1992) as b grows
 *  with b·x fixed. */
function lowerFraction(x: number, shape: number): number {
  const lift = shape - x + 1;
  let inverse = 1 / (shape + 1);
  let numeratorBefore = 0;
  let denominatorBefore = 1;
  let numerator = 1;
  let denominator = shape * inverse * lift;
  for (let n = 1; n < MOST_STEPS; n++) {
    const alpha = (shape + n - 1) * n * x * x * inverse * inverse;
    const inverseNext = 1 / (shape + 2 * n + 1);
    const beta = n + n * x * inverse + (shape + n) * inverseNext * (lift + 2 * n);
    inverse = inverseNext;
    const numeratorNext = beta * numerator + alpha * numeratorBefore;
    const denominatorNext = beta * denominator + alpha * denominatorBefore;
    numeratorBefore = numerator;
    denominatorBefore = denominator;
    numerator = numeratorNext;
    denominator = denominatorNext;
    const cross = numerator * denominatorBefore;
    if (Math.abs(cross - numeratorBefore * denominator) <= CONVERGED * Math.abs(cross)) {
      return numerator / denominator;
    }
    if (denominator > 1e100) {
      numeratorBefore *= 1e-100;
      denominatorBefore *= 1e-100;
      numerator *= 1e-100;
      denominator *= 1e-100;
    }
  }
  throw new Error(`gammaLowerTail: no convergence at x ${x}, shape ${shape}`);
}

/** Upper tail over front. Source: Legendre's fraction, Abramowitz & Stegun (1964) 6.5.31, even part. */
function upperFraction(x: number, shape: number): number {
  let numeratorBefore = 0;
  let denominatorBefore = 1;
  let numerator = 1;
  const lift = x - shape + 1;
  let denominator = lift;
  for (let n = 1; n < MOST_STEPS; n++) {
    const alpha = n * (shape - n);
    const beta = lift + 2 * n;
    const numeratorNext = beta * numerator + alpha * numeratorBefore;
    const denominatorNext = beta * denominator + alpha * denominatorBefore;
    numeratorBefore = numerator;
    denominatorBefore = denominator;
    numerator = numeratorNext;
    denominator = denominatorNext;
    const cross = numerator * denominatorBefore;
    if (Math.abs(cross - numeratorBefore * denominator) <= CONVERGED * Math.abs(cross)) {
      return numerator / denominator;
    }
    if (denominator > 1e100) {
      numeratorBefore *= 1e-100;
      denominatorBefore *= 1e-100;
      numerator *= 1e-100;
      denominator *= 1e-100;
    }
  }
  throw new Error(`gammaUpperTail: no convergence at x ${x}, shape ${shape}`);
}

const CONVERGED = 2e-16;
const MOST_STEPS = 100_000;
