import { requireBetween, requireZeroOrBetween } from '../domain.ts';
import { devianceTerm } from './deviance.ts';
import { type DirectTail, logProbabilityOf, probabilityOf, type Tail } from './direct-tail.ts';
import { incompleteBetaFraction } from './incomplete-beta-fraction.ts';
import { stirlingError } from './stirling-error.ts';

/** Regularised incomplete gamma functions P = ∫₀ˣ t^(shape-1) e^-t dt / Γ(shape) and Q = 1 - P: the tails of
 *  the gamma distribution with scale 1.
 *
 *  Domain of all functions here: x is 0 or from 1e-300 to 1e100; shape from 1/4 to 1e7.
 *  Relative error (test/fixtures/chi-squared.json): 2e-14 where both tails are above 1e-6, 3e-13 down to 1e-200.
 *  Smaller tails lose digits below 1e-300, as doubles do; the logarithms go on.
 *  @throws {RangeError} names argument, value and domain
 *  Source: Loader (2000) for the front factor; limits of the continued fraction of DiDonato & Morris (1992). */
export function gammaLowerTail(x: number, shape: number): number {
  return gammaTail(checked('gammaLowerTail', x, shape), shape, 'lower');
}

/** Q(shape, x), without subtracting P from 1; see gammaLowerTail. */
export function gammaUpperTail(x: number, shape: number): number {
  return gammaTail(checked('gammaUpperTail', x, shape), shape, 'upper');
}

/** ln P(shape, x); -Infinity at 0. See gammaLowerTail. */
export function gammaLogLowerTail(x: number, shape: number): number {
  return gammaLogTail(checked('gammaLogLowerTail', x, shape), shape, 'lower');
}

/** ln Q(shape, x). See gammaLowerTail. */
export function gammaLogUpperTail(x: number, shape: number): number {
  return gammaLogTail(checked('gammaLogUpperTail', x, shape), shape, 'upper');
}

/** Tail of the gamma distribution (not checked). */
export function gammaTail(x: number, shape: number, wanted: Tail): number {
  if (x === 0) return wanted === 'lower' ? 0 : 1;
  return probabilityOf(directGammaTail(x, shape), wanted);
}

/** Natural logarithm of gammaTail, also where the tail itself is below the smallest double. */
export function gammaLogTail(x: number, shape: number, wanted: Tail): number {
  if (x === 0) return wanted === 'lower' ? -Infinity : 0;
  return logProbabilityOf(directGammaTail(x, shape), wanted);
}

/** A beta variate times a large shape is nearly gamma; at 1e100 the difference is far below rounding. */
const OTHER_SHAPE = 1e100;

/** Domain (not checked): x > 0; shape as in gammaLowerTail. */
export function directGammaTail(x: number, shape: number): DirectTail {
  const excess = x - shape;
  const logFront = logGammaFront(x, shape, excess);
  if (excess <= 1) {
    const ratio = incompleteBetaFraction(shape, OTHER_SHAPE, x / OTHER_SHAPE, 1, excess);
    return { tail: 'lower', logFront, ratio, excess };
  }
  const ratio = incompleteBetaFraction(OTHER_SHAPE, shape, 1, x / OTHER_SHAPE, -excess);
  return { tail: 'upper', logFront, ratio, excess };
}

/** ln of x^shape e^-x / Γ(shape), the density of ln x. Source: Loader (2000), the saddle-point form. */
function logGammaFront(x: number, shape: number, excess: number): number {
  const ratio = x / shape;
  const deviance = shape * devianceTerm(excess / shape, ratio, (x - ratio * shape) / shape);
  return 0.5 * Math.log(shape / (2 * Math.PI)) - stirlingError(shape) - deviance;
}

function checked(functionName: string, x: number, shape: number): number {
  requireZeroOrBetween(functionName, 'x', x, 1e-300, 1e100);
  requireBetween(functionName, 'shape', shape, 0.25, 1e7);
  return x;
}
