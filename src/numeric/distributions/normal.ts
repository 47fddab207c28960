import { requireBetween, requireProbability } from '../domain.ts';
import { erf, expOfMinusSquare, scaledErfc } from '../special/error-function.ts';
import { roughNormalUpperQuantile } from '../special/rough-normal-quantile.ts';

const ROOT_TWO_PI = Math.sqrt(2 * Math.PI);
const ROOT_HALF_PI = Math.sqrt(Math.PI / 2);

/** Density of the standard normal distribution, exp(-z²/2) / √(2π).
 *  Domain and error as for normalLowerTail. */
export function normalDensity(z: number): number {
  requirePoint('normalDensity', z);
  return expOfMinusSquare(z, 0.5) / ROOT_TWO_PI;
}

/** Lower tail of the standard normal distribution, P(Z ≤ z).
 *
 *  Domain of all functions of z here: z from -1e150 to 1e150.
 *  Relative error (test/fixtures/normal.json): 1.5e-15. Smaller tails lose digits below 1e-300, as
 *  doubles do; the logarithm goes on.
 *  @throws {RangeError} names argument, value and domain
 *  Source: Abramowitz & Stegun (1964) 26.2.29, with the Chebyshev series of Shepherd & Laframboise (1981). */
export function normalLowerTail(z: number): number {
  requirePoint('normalLowerTail', z);
  return upperTail(-z);
}

/** P(Z > z), without subtraction from 1; see normalLowerTail. */
export function normalUpperTail(z: number): number {
  requirePoint('normalUpperTail', z);
  return upperTail(z);
}

/** ln P(Z > z); see normalLowerTail. */
export function normalLogUpperTail(z: number): number {
  requirePoint('normalLogUpperTail', z);
  if (z < 0) return Math.log1p(-upperTail(-z));
  return Math.log(scaledErfc(z * Math.SQRT1_2) / 2) - (z * z) / 2;
}

/** The z that a standard normal variate falls below with probability p.
 *  Domain: 0 < p < 1.
 *  Relative error (test/fixtures/normal-quantile.json): 1.5e-15.
 *  @throws {RangeError} names argument, value and domain
 *  Source: Halley's method on the logarithm of the smaller tail, from Abramowitz & Stegun (1964) 26.2.23. */
export function normalQuantile(p: number): number {
  requireProbability('normalQuantile', 'p', p);
  return 0 - upperQuantile(p);
}

/** The z that a standard normal variate exceeds with probability p. See normalQuantile. */
export function normalUpperQuantile(p: number): number {
  requireProbability('normalUpperQuantile', 'p', p);
  return upperQuantile(p);
}

function upperTail(z: number): number {
  if (z < 0) return 1 - upperTail(-z);
  return (expOfMinusSquare(z, 0.5) * scaledErfc(z * Math.SQRT1_2)) / 2;
}

function upperQuantile(p: number): number {
  if (p > 0.5) return -upperQuantile(1 - p);
  if (p > 0.25) return quantileFromMedian(0.5 - p);
  const target = Math.log(2 * p);
  let z = roughNormalUpperQuantile(p);
  // From an error of 5e-4 two steps of third order reach rounding.
  for (let step = 0; step < 2; step++) {
    const scaled = scaledErfc(z * Math.SQRT1_2);
    const miss = Math.log(scaled) - (z * z) / 2 - target;
    const ratio = scaled * ROOT_HALF_PI;
    z += (miss * ratio) / (1 + (miss * (1 - z * ratio)) / 2);
  }
  return z;
}

/** z with P(0 < Z < z) = p, p ≤ 1/4: near the median the tails would lose the digits of z. */
function quantileFromMedian(p: number): number {
  let z = p * ROOT_TWO_PI;
  // From an error of 0.05 three steps of third order reach rounding.
  for (let step = 0; step < 3; step++) {
    const miss = (erf(z * Math.SQRT1_2) / 2 - p) * ROOT_TWO_PI * Math.exp((z * z) / 2);
    z -= miss / (1 + (miss * z) / 2);
  }
  return z;
}

function requirePoint(functionName: string, z: number): void {
  requireBetween(functionName, 'z', z, -1e150, 1e150);
}
