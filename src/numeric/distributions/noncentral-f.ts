/** Provisional. */

import { logGamma } from '../special/log-gamma.ts';
import { betaUpperTail } from './beta.ts';

export function noncentralFUpperTail(x: number, df1: number, df2: number, noncentrality: number): number {
  const y = (df1 * x) / (df1 * x + df2);
  const half = noncentrality / 2;
  if (half === 0) return betaUpperTail(y, df1 / 2, df2 / 2);
  const start = Math.max(0, Math.floor(half - 9 * Math.sqrt(half) - 5));
  const end = Math.ceil(half + 9 * Math.sqrt(half) + 40);
  let sum = 0;
  for (let j = start; j <= end; j += 1) {
    sum += Math.exp(j * Math.log(half) - half - logGamma(j + 1)) * betaUpperTail(y, df1 / 2 + j, df2 / 2);
  }
  return sum;
}
