/** What a tail is at a positive value v, seen on the scale of ln v. */
export interface LogTail {
  logTail: number;
  /** Tail over the density of ln v. */
  ratio: number;
  /** Minus the slope of the log density of ln v. */
  excess: number;
}

/** The v > 0 whose tail is `probability`, from a rough start: Halley's method for the logarithm of the tail as
 *  a function of ln v. Tails of log-concave densities are log-concave, so Newton's step, which replaces Halley's
 *  where that one is not to be trusted, converges from anywhere.
 *  Returns Infinity or 0 when no double holds the answer.
 *  Source: Halley's iteration, Abramowitz & Stegun (1964) 3.9.5–3.9.6, with f''/f' in closed form. */
export function invertLogTail(
  tail: 'lower' | 'upper',
  probability: number,
  start: number,
  logTailAt: (v: number) => LogTail,
): number {
  const direction = tail === 'lower' ? 1 : -1;
  const target = Math.log(probability);
  let v = start;
  for (let step = 0; step < MOST_STEPS; step++) {
    const { logTail, ratio, excess } = logTailAt(v);
    const miss = logTail - target;
    const bend = (miss * (1 + direction * excess * ratio)) / 2;
    const newton = -direction * miss * ratio;
    const change = bend > -0.5 && bend < 2 ? newton / (1 + bend) : newton;
    v *= Math.exp(Math.max(-LARGEST_CHANGE, Math.min(LARGEST_CHANGE, change)));
    if (Math.abs(miss) <= SETTLED || v === 0 || v === Infinity) return v;
  }
  throw new Error(`invertLogTail: no convergence at probability ${probability}, start ${start}`);
}

/** Halley's step leaves about the cube of the miss: 1e-17. */
const SETTLED = 2e-6;
const LARGEST_CHANGE = 100;
const MOST_STEPS = 100;
