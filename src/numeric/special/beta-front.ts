import type { BetaPoint } from './beta-point.ts';
import { devianceTerm, isNearMean } from './deviance.ts';
import { productError, quotientError, sumError } from './double-double.ts';
import { stirlingError } from './stirling-error.ts';

/** ln of x^a (1-x)^b / B(a, b), the front factor of the incomplete beta function and the density of
 *  ln(x/(1-x)). `excess` is excessOverMean(point, a, b).
 *  Nothing cancels: the deviance is a sum of two positive terms, and ln Γ enters by its Stirling errors only.
 *  Domain (not checked): 0 < x < 1; a, b ≥ 1/4.
 *  Source: Loader (2000), Fast and accurate computation of binomial probabilities: the saddle-point form. */
export function logBetaFront(point: BetaPoint, a: number, b: number, excess: number): number {
  const total = a + b;
  const deviance =
    a * devianceOf(point.x, point.xLow, a, b, excess / a) +
    b * devianceOf(point.complement, point.complementLow, b, a, -excess / b);
  const stirling = stirlingError(total) - stirlingError(a) - stirlingError(b);
  return 0.5 * Math.log((a / total) * (b / (2 * Math.PI))) + stirling - deviance;
}

/** Deviance of a share x from its mean a/(a + b); u is (a + b)x/a - 1, formed without cancellation. */
function devianceOf(x: number, xLow: number, a: number, b: number, u: number): number {
  if (isNearMean(u)) return devianceTerm(u, 1 + u, 0);
  const total = a + b;
  const scaled = total * x;
  const scaledLow = productError(total, x, scaled) + sumError(a, b, total) * x + total * xLow;
  const ratio = scaled / a;
  return devianceTerm(u, ratio, quotientError(scaled, scaledLow, a, 0, ratio));
}
