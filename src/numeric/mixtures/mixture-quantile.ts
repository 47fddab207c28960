/** Quantile of a distribution on the positive axis from its two tails: the root of the logarithm of the smaller tail
 *  as a function of the logarithm of x, where it is nearly straight. */

import { requireProbability } from '../domain.ts';
import { findRoot } from '../solve/root.ts';

/** @param tailsAt the tail asked for and the other one */
export function mixtureQuantile(
  name: string,
  p: number,
  start: number,
  tailsAt: (x: number) => readonly [number, number],
): number {
  requireProbability(name, 'p', p);
  const goal = Math.log(Math.min(p, 1 - p));
  const side = p <= 0.5 ? 0 : 1;
  const miss = (logX: number) => Math.log(Math.max(tailsAt(Math.exp(logX))[side], Number.MIN_VALUE)) - goal;
  let low = Math.log(start);
  const above = miss(low) > 0;
  // The tail falls one way; step that way until the sign changes, doubling.
  const rising = miss(low + 1e-6) > miss(low);
  let step = above === rising ? -0.25 : 0.25;
  let high = low + step;
  while (miss(high) > 0 === above) {
    low = high;
    step *= 2;
    high += step;
  }
  return Math.exp(findRoot(miss, low, high));
}
