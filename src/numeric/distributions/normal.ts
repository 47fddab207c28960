import { requireFinite, requireProbability } from '../domain.ts';
import { erf, expOfMinusSquare, scaledErfc } from '../special/error-function.ts';
import { roughNormalUpperQuantile } from '../special/rough-normal-quantile.ts';

/** Density of the standard normal distribution. */
export function normalDensity(z: number): number {
  requireFinite('normalDensity', 'z', z);
  return expOfMinusSquare(z, 0.5) / Math.sqrt(2 * Math.PI);
}

export function normalLowerTail(z: number): number {
  requireFinite('normalLowerTail', 'z', z);
  return upperTail(-z);
}

export function normalUpperTail(z: number): number {
  requireFinite('normalUpperTail', 'z', z);
  return upperTail(z);
}

export function normalLogUpperTail(z: number): number {
  requireFinite('normalLogUpperTail', 'z', z);
  if (z < 0) return Math.log1p(-upperTail(-z));
  return Math.log(scaledErfc(z * Math.SQRT1_2) / 2) - (z * z) / 2;
}

function upperTail(z: number): number {
  if (z < 0) return 1 - upperTail(-z);
  return (expOfMinusSquare(z, 0.5) * scaledErfc(z * Math.SQRT1_2)) / 2;
}

export function normalQuantile(p: number): number {
  requireProbability('normalQuantile', 'p', p);
  return -upperQuantile(p);
}

export function normalUpperQuantile(p: number): number {
  requireProbability('normalUpperQuantile', 'p', p);
  return upperQuantile(p);
}

function upperQuantile(p: number): number {
  if (p > 0.5) return -upperQuantile(1 - p);
  if (p > 0.25) return centralQuantile(0.5 - p);
  const target = Math.log(2 * p);
  let z = roughNormalUpperQuantile(p);
  // Halley's method on the logarithm of the tail: from an error of 5e-4 two steps reach rounding.
  for (let step = 0; step < 2; step++) {
    const scaled = scaledErfc(z * Math.SQRT1_2);
    const miss = Math.log(scaled) - (z * z) / 2 - target;
    const ratio = scaled * Math.sqrt(Math.PI / 2);
    z += (miss * ratio) / (1 + (miss * (1 - z * ratio)) / 2);
  }
  return z;
}

/** z with P(0 < Z < z) = p: near 0 the tails would lose the digits of z. */
function centralQuantile(p: number): number {
  const halfRoot = Math.sqrt(2 * Math.PI);
  let z = p * halfRoot;
  for (let step = 0; step < 4; step++) {
    const miss = (erf(z * Math.SQRT1_2) / 2 - p) * halfRoot * Math.exp((z * z) / 2);
    z -= miss / (1 + (miss * z) / 2);
  }
  return z;
}
