/** The three questions of planning, answered for any method: how many, how powerful, how small an effect. */

import type { Calculation, Method } from '../methods/method.ts';
import { findRoot } from '../numeric/solve/root.ts';
import { smallestInteger } from '../numeric/solve/smallest-integer.ts';

/** No plan of ours needs more: the distributions are verified to 10⁷ residual degrees of freedom. */
export const LARGEST_N = 1e7;

/** A target that no admissible number or effect reaches; `reason` is a sentence for the reader. */
export class OutOfReach extends Error {
  constructor(reason: string) {
    super(reason);
    this.name = 'OutOfReach';
  }
}

/** Does `achieved` meet the target? Power must reach it, the width of an interval must not exceed it. */
export function meets(method: Method, achieved: number, target: number): boolean {
  return method.achieves === 'power' ? achieved >= target : achieved <= target;
}

/** Smallest n that meets the target for it and every larger n. The search begins below a guess, so that it costs a few
 *  evaluations whatever the size. @throws OutOfReach when more than LARGEST_N would be needed. */
export function requiredNumber(
  method: Method,
  calculation: Calculation,
  effect: number,
  target: number,
): number {
  const { smallestN } = calculation;
  const holds = (n: number) => meets(method, calculation.achieved(n, effect), target);
  let from = Math.min(LARGEST_N, Math.max(smallestN, Math.floor(calculation.guess(effect, target))));
  try {
    while (from > smallestN && holds(from)) from = Math.max(smallestN, Math.floor(from * 0.95) - 1);
    return smallestInteger(holds, from, LARGEST_N, method.rises);
  } catch (error) {
    if (error instanceof RangeError) {
      throw new OutOfReach(`More than ${LARGEST_N} would have to be analysed; the target cannot be reached.`);
    }
    throw error;
  }
}

/** Where a real-valued n would meet the target exactly, `n` being the required number; `n` itself when even the
 *  smallest admissible number meets it. */
export function realValuedNumber(
  calculation: Calculation,
  n: number,
  effect: number,
  target: number,
): number {
  if (n === calculation.smallestN) return n;
  return findRoot((x) => calculation.achieved(x, effect) - target, n - 1, n);
}

/** The smallest effect for which n analysed reach the target power. Solved on a log scale, so that its
 *  relative error is that of the power function. @throws OutOfReach when no effect in the domain reaches it. */
export function detectableEffect(calculation: Calculation, n: number, target: number): number {
  const excess = (logEffect: number) => calculation.achieved(n, Math.exp(logEffect)) - target;
  let lower = Math.log(1 / n);
  while (excess(lower) > 0) lower -= 2;
  let upper = lower + 2;
  try {
    while (excess(upper) < 0) upper += 1;
  } catch (error) {
    if (error instanceof RangeError) {
      throw new OutOfReach(`With ${n} analysed no effect within reach has the target power.`);
    }
    throw error;
  }
  return Math.exp(findRoot(excess, lower, upper));
}
