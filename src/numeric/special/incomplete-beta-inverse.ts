import { type BetaPoint, betaPointOfProduct, reflected } from './beta-point.ts';
import type { Tail } from './direct-tail.ts';
import { directBetaTail } from './incomplete-beta.ts';
import { invertLogTail } from './invert-log-tail.ts';
import { logBeta } from './log-beta.ts';
import { roughNormalUpperQuantile } from './rough-normal-quantile.ts';

/** The ratio F = (x/a) / ((1 - x)/b) at which a tail of the beta distribution is p: with a = df1/2 and
 *  b = df2/2 the quantile of the F distribution. Outside [1e-300, 1e300] it is rough: callers refuse it.
 *  Domain (not checked): 0 < p < 1; a, b as in requireShapes. */
export function betaRatioQuantile(p: number, a: number, b: number, tail: Tail): number {
  // 1 - p is exact for p > 1/2, and 1/F has the shapes exchanged: the smaller upper tail serves all cases.
  if (p > 0.5) return betaRatioQuantile(1 - p, a, b, tail === 'lower' ? 'upper' : 'lower');
  return tail === 'lower' ? 1 / upperRatioQuantile(p, b, a) : upperRatioQuantile(p, a, b);
}

/** The point at which a tail of the beta distribution is p; callers refuse it where x is below 1e-300. */
export function betaQuantilePoint(p: number, a: number, b: number, tail: Tail): BetaPoint {
  const ratio = betaRatioQuantile(p, a, b, tail);
  return ratio > 1 ? reflected(betaPointOfProduct(b, 1 / ratio, a)) : betaPointOfProduct(a, ratio, b);
}

function upperRatioQuantile(p: number, a: number, b: number): number {
  return invertLogTail('upper', p, start(p, a, b), (ratio) =>
    directBetaTail(betaPointOfProduct(a, ratio, b), a, b),
  );
}

/** Cube roots of F are nearly normal: Paulson (1942), An approximate normalization of the analysis of variance
 *  distribution. Where the denominator has too few degrees of freedom for that, the tail is nearly
 *  (1 - x)^b / (b B(a, b)), Abramowitz & Stegun (1964) 26.5.4. */
function start(p: number, a: number, b: number): number {
  const z = roughNormalUpperQuantile(p);
  const variance1 = 1 / (9 * a);
  const variance2 = 1 / (9 * b);
  const centre1 = 1 - variance1;
  const centre2 = 1 - variance2;
  const denominator = centre2 ** 2 - z * z * variance2;
  if (b >= 1.5 && denominator > 0.2) {
    const spread = centre1 ** 2 * variance2 + centre2 ** 2 * variance1 - z * z * variance1 * variance2;
    return Math.max((centre1 * centre2 + z * Math.sqrt(Math.max(spread, 0))) / denominator, 0.1) ** 3;
  }
  const logComplement = (Math.log(p * b) + logBeta(a, b)) / b;
  return logComplement > -0.1 ? 1 : (b / a) * Math.expm1(-logComplement);
}
