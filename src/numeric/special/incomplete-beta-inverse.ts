import { type BetaPoint, betaPointOfProduct, excessOverMean, reflected } from './beta-point.ts';
import { directBetaTail, type Tail } from './incomplete-beta.ts';
import { invertLogTail } from './invert-log-tail.ts';
import { logBeta } from './log-beta.ts';
import { roughNormalUpperQuantile } from './rough-normal-quantile.ts';

/** The ratio F = (x/a) / ((1 - x)/b) at which a tail of the beta distribution is p: with a = df1/2 and
 *  b = df2/2 the quantile of the F distribution. Infinity or 0 when no double holds it.
 *  Domain (not checked): 0 < p < 1; a, b as in requireShapes. */
export function betaRatioQuantile(p: number, a: number, b: number, tail: Tail): number {
  // 1 - p is exact for p > 1/2; 1/F has the shapes exchanged.
  if (p > 0.5) return betaRatioQuantile(1 - p, a, b, tail === 'lower' ? 'upper' : 'lower');
  if (tail === 'lower') return 1 / upperRatioQuantile(p, b, a);
  return upperRatioQuantile(p, a, b);
}

/** The point at which a tail of the beta distribution is p; x or the complement is 0 when no double holds it. */
export function betaQuantilePoint(p: number, a: number, b: number, tail: Tail): BetaPoint {
  const ratio = betaRatioQuantile(p, a, b, tail);
  if (ratio > 1) return reflected(betaPointOfProduct(b, 1 / ratio, a));
  return betaPointOfProduct(a, ratio, b);
}

function upperRatioQuantile(p: number, a: number, b: number): number {
  const first = start(p, a, b);
  if (first === Infinity) return Infinity;
  return invertLogTail('upper', p, first, (ratio) => {
    const point = betaPointOfProduct(a, ratio, b);
    const direct = directBetaTail(point, a, b);
    const excess = excessOverMean(point, a, b);
    if (direct.tail === 'upper') {
      return { logTail: direct.logFront + Math.log(direct.ratio), ratio: direct.ratio, excess };
    }
    const front = Math.exp(direct.logFront);
    const other = front * direct.ratio;
    return { logTail: Math.log1p(-other), ratio: (1 - other) / front, excess };
  });
}

/** Cube roots of F are nearly normal (Paulson 1942, from Wilson & Hilferty 1931); where the denominator has
 *  too few degrees of freedom for that, the tail is nearly (1 - x)^b / (b B(a, b)). */
function start(p: number, a: number, b: number): number {
  const variance1 = 1 / (9 * a);
  const variance2 = 1 / (9 * b);
  const z = roughNormalUpperQuantile(p);
  const denominator = (1 - variance2) ** 2 - z * z * variance2;
  if (b >= 1.5 && denominator > 0.2) {
    const centre1 = 1 - variance1;
    const centre2 = 1 - variance2;
    const spread = centre1 ** 2 * variance2 + centre2 ** 2 * variance1 - z * z * variance1 * variance2;
    const root = (centre1 * centre2 + z * Math.sqrt(Math.max(spread, 0))) / denominator;
    return Math.max(root, 0.1) ** 3;
  }
  const logComplement = (Math.log(p * b) + logBeta(a, b)) / b;
  if (logComplement > -0.1) return 1;
  return Math.max((b / a) * Math.expm1(-logComplement), Number.MIN_VALUE);
}
