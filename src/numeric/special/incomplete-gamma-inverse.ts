import type { Tail } from './direct-tail.ts';
import { directGammaTail } from './incomplete-gamma.ts';
import { invertLogTail } from './invert-log-tail.ts';
import { logGamma } from './log-gamma.ts';
import { roughNormalUpperQuantile } from './rough-normal-quantile.ts';

/** The x at which a tail of the gamma distribution (scale 1) is p. Below 1e-300 it is rough: callers refuse it.
 *  Domain (not checked): 0 < p < 1; shape as in gammaLowerTail. */
export function gammaTailQuantile(p: number, shape: number, tail: Tail): number {
  // 1 - p is exact for p > 1/2: the smaller tail serves.
  if (p > 0.5) return gammaTailQuantile(1 - p, shape, tail === 'lower' ? 'upper' : 'lower');
  return invertLogTail(tail, p, start(p, shape, tail), (x) => directGammaTail(x, shape));
}

/** Cube roots are nearly normal: Wilson & Hilferty (1931), The distribution of chi-square. Near 0 the lower
 *  tail is nearly x^shape / Γ(shape + 1), Abramowitz & Stegun (1964) 6.5.29. */
function start(p: number, shape: number, tail: Tail): number {
  const variance = 1 / (9 * shape);
  const z = roughNormalUpperQuantile(p) * (tail === 'lower' ? -1 : 1);
  const root = 1 - variance + z * Math.sqrt(variance);
  if (root > 0.3) return shape * root ** 3;
  return Math.exp((Math.log(p) + logGamma(shape + 1)) / shape);
}
