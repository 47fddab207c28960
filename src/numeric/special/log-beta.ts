import { requireShapes } from './incomplete-beta.ts';
import { stirlingError } from './stirling-error.ts';

/** Natural logarithm of the beta function B(a, b).
 *  Domain: a and b from 1/4 to 1e7.
 *  Relative error (test/fixtures/log-beta.json): 5e-15; near B = 1, where the logarithm is 0, absolute 5e-16.
 *  @throws {RangeError} names argument, value and domain
 *  Source: B = Γ(a)Γ(b)/Γ(a + b) with each Γ by Stirling's formula and its error, Loader (2000): the large
 *  logarithms of Γ, which would cancel, do not appear. */
export function logBeta(a: number, b: number): number {
  requireShapes('logBeta', a, b);
  const total = a + b;
  const stirling = stirlingError(a) + stirlingError(b) - stirlingError(total);
  const main = a * Math.log1p(b / a) + b * Math.log1p(a / b);
  return 0.5 * Math.log((2 * Math.PI * total) / a / b) + stirling - main;
}
