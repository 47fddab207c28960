/** Tails of a family of distributions whose shape grows by one: Beta(a + i, b) or Gamma(a + i) at a fixed point.
 *  Neighbouring tails differ by a positive step, so that going the right way nothing is ever subtracted. */

import { logBetaFront } from '../special/beta-front.ts';
import { type BetaPoint, excessOverMean } from '../special/beta-point.ts';
import type { Tail } from '../special/direct-tail.ts';
import { betaLogTail, betaTail } from '../special/incomplete-beta.ts';
import { directGammaTail, gammaLogTail, gammaTail } from '../special/incomplete-gamma.ts';

export interface TailLadder {
  tail: Tail;
  /** Largest first shape for which the tails are verified. */
  largestShape: number;
  logTailAt(shape: number): number;
  tailAt(shape: number): number;
  /** lowerTail(shape) − lowerTail(shape + 1), which is also the gain of the upper tail. */
  stepAt(shape: number): number;
  /** step(shape + 1)/step(shape). */
  growthAt(shape: number): number;
}

/** Source of the steps: Abramowitz & Stegun (1964), 26.5.16: I(a, b) − I(a + 1, b) = x^a (1 − x)^b/(a·B(a, b)). */
export function betaLadder(point: BetaPoint, b: number, tail: Tail): TailLadder {
  return {
    tail,
    largestShape: 1e7,
    logTailAt: (a) => betaLogTail(point, a, b, tail),
    tailAt: (a) => betaTail(point, a, b, tail),
    stepAt: (a) => Math.exp(logBetaFront(point, a, b, excessOverMean(point, a, b))) / a,
    growthAt: (a) => (point.x * (a + b)) / (a + 1),
  };
}

/** Source of the steps: Abramowitz & Stegun (1964), 6.5.21: P(a, x) − P(a + 1, x) = x^a e^−x/Γ(a + 1). */
export function gammaLadder(x: number, tail: Tail): TailLadder {
  return {
    tail,
    largestShape: 1e7,
    logTailAt: (a) => gammaLogTail(x, a, tail),
    tailAt: (a) => gammaTail(x, a, tail),
    stepAt: (a) => Math.exp(directGammaTail(x, a).logFront) / a,
    growthAt: (a) => x / (a + 1),
  };
}
