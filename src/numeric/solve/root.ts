/** How exactly a root is wanted; by default to rounding. */
export interface RootOptions {
  /** Largest distance from the root, relative to its size. */
  relativeTolerance?: number;
}

interface Evaluated {
  x: number;
  value: number;
}

/** Root of a continuous function between two points where its signs differ; either may be the larger.
 *  Stops where the function is exactly 0, or when the bracket is as narrow as asked for or as doubles allow.
 *  Cost: 6–15 evaluations for smooth functions; never more than four times those of bisection.
 *  @throws {RangeError} a limit is not finite, the function returns NaN, or the signs do not differ
 *  Source: Chandrupatla (1997), A new hybrid quadratic/bisection algorithm for finding the zero of a
 *  nonlinear function without using derivatives, Advances in Engineering Software 28, 145–149. */
export function findRoot(
  f: (x: number) => number,
  lower: number,
  upper: number,
  { relativeTolerance = 2 ** -52 }: RootOptions = {},
): number {
  if (!Number.isFinite(lower) || !Number.isFinite(upper)) {
    throw new RangeError(`findRoot: lower is ${lower} and upper is ${upper}; finite numbers are needed`);
  }
  let newest = evaluate(f, lower);
  if (newest.value === 0) return lower;
  let opposite = evaluate(f, upper);
  if (opposite.value === 0) return upper;
  if (newest.value > 0 === opposite.value > 0) {
    throw new RangeError(
      `findRoot: f(${lower}) is ${newest.value} and f(${upper}) is ${opposite.value}; opposite signs are needed`,
    );
  }
  let share = 0.5;
  let widthBefore = Infinity;
  for (let step = 1; ; step++) {
    const point = evaluate(f, newest.x + share * (opposite.x - newest.x));
    let dropped = newest;
    if (point.value > 0 !== newest.value > 0) {
      dropped = opposite;
      opposite = newest;
    }
    newest = point;
    const best = Math.abs(newest.value) < Math.abs(opposite.value) ? newest : opposite;
    const width = Math.abs(opposite.x - newest.x);
    const allowed = Math.max(relativeTolerance * Math.abs(best.x), Number.MIN_VALUE);
    if (best.value === 0 || width <= 2 * allowed) return best.x;
    const least = allowed / width;
    share = Math.min(1 - least, Math.max(least, nextShare(newest, opposite, dropped)));
    // Not in the paper: a bracket that three steps did not halve is bisected, which bounds the cost.
    if (step % 4 === 0) {
      if (width > widthBefore / 2) share = 0.5;
      widthBefore = width;
    }
  }
}

function evaluate(f: (x: number) => number, x: number): Evaluated {
  const value = f(x);
  if (Number.isNaN(value)) throw new RangeError(`findRoot: f(${x}) is NaN; a number is needed`);
  return { x, value };
}

/** How far to go from the newest point to the opposite one: inverse quadratic interpolation where it is
 *  monotone between them, else half way. */
function nextShare(newest: Evaluated, opposite: Evaluated, dropped: Evaluated): number {
  const xi = (newest.x - opposite.x) / (dropped.x - opposite.x);
  const phi = (newest.value - opposite.value) / (dropped.value - opposite.value);
  if (!(phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi)) return 0.5;
  const a = newest.value;
  const b = opposite.value;
  const c = dropped.value;
  const alpha = (dropped.x - newest.x) / (opposite.x - newest.x);
  return (a / (b - a)) * (c / (b - c)) + alpha * (a / (c - a)) * (b / (c - b));
}
