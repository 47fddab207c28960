import { type DirectTail, logProbabilityOf, ratioOf, type Tail } from './direct-tail.ts';

/** The v > 0 whose tail is `probability`, from a rough start: Halley's method for the logarithm of the tail as
 *  a function of ln v, with both derivatives in closed form. The tails are log-concave on that scale, so
 *  Newton's step, which replaces Halley's where that one is not to be trusted, converges from anywhere.
 *  An answer that leaves [1e-300, 1e300] is returned as it stands when it does: callers refuse it.
 *  Source: Halley's iteration, as in Gil, Segura & Temme (2007), Numerical Methods for Special Functions, chapter 7. */
export function invertLogTail(
  tail: Tail,
  probability: number,
  start: number,
  directTailAt: (v: number) => DirectTail,
): number {
  const direction = tail === 'lower' ? 1 : -1;
  const target = Math.log(probability);
  let v = start;
  for (let step = 0; step < MOST_STEPS; step++) {
    if (!isReachable(v)) return v;
    const direct = directTailAt(v);
    const miss = logProbabilityOf(direct, tail) - target;
    const ratio = ratioOf(direct, tail);
    const newton = -direction * miss * ratio;
    const bend = (miss * (1 + direction * direct.excess * ratio)) / 2;
    const change = bend > -0.5 && bend < 2 ? newton / (1 + bend) : newton;
    v *= Math.exp(Math.max(-LARGEST_CHANGE, Math.min(LARGEST_CHANGE, change)));
    if (Math.abs(miss) <= SETTLED) return v;
  }
  throw new Error(`invertLogTail: no convergence at probability ${probability}, start ${start}`);
}

/** Whether doubles hold a quantile, and what is formed from it, to full precision. */
export function isReachable(quantile: number): boolean {
  return quantile >= 1e-300 && quantile <= 1e300;
}

/** Halley's step leaves about the cube of the miss: 1e-17. */
const SETTLED = 2e-6;
/** Keeps exp() finite; only starts that are wrong by many orders of magnitude meet it. */
const LARGEST_CHANGE = 100;
/** Random shapes and probabilities over the whole domain took 5 at most. */
const MOST_STEPS = 100;
