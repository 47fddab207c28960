import { directGammaTail } from './incomplete-gamma.ts';
import { invertLogTail } from './invert-log-tail.ts';
import { logGamma } from './log-gamma.ts';
import { roughNormalUpperQuantile } from './rough-normal-quantile.ts';

/** The x at which a tail of the gamma distribution (scale 1) is p; 0 when no double holds it.
 *  Domain (not checked): 0 < p < 1; shape as in requireShape. */
export function gammaTailQuantile(p: number, shape: number, tail: 'lower' | 'upper'): number {
  // 1 - p is exact for p > 1/2.
  if (p > 0.5) return gammaTailQuantile(1 - p, shape, tail === 'lower' ? 'upper' : 'lower');
  return invertLogTail(tail, p, start(p, shape, tail), (x) => {
    const direct = directGammaTail(x, shape);
    const excess = x - shape;
    if (direct.tail === tail) {
      return { logTail: direct.logFront + Math.log(direct.ratio), ratio: direct.ratio, excess };
    }
    const front = Math.exp(direct.logFront);
    const other = front * direct.ratio;
    return { logTail: Math.log1p(-other), ratio: (1 - other) / front, excess };
  });
}

/** The cube root is nearly normal (Wilson & Hilferty 1931); near 0 the lower tail is x^shape / Γ(shape + 1). */
function start(p: number, shape: number, tail: 'lower' | 'upper'): number {
  const variance = 1 / (9 * shape);
  const z = roughNormalUpperQuantile(p) * (tail === 'lower' ? -1 : 1);
  const root = 1 - variance + z * Math.sqrt(variance);
  if (root > 0.3) return shape * root ** 3;
  return Math.max(Math.exp((Math.log(p) + logGamma(shape + 1)) / shape), Number.MIN_VALUE);
}
