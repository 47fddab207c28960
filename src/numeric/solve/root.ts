/** How exactly a root is wanted; by default to rounding. */
export interface RootOptions {
  /** Largest distance from the root, relative to its size. */
  relativeTolerance?: number;
}

/** Root of a continuous function between two points where its signs differ; either may be the larger.
 *  Stops when the function is exactly 0, or when the bracket is as narrow as asked for or as doubles allow.
 *  Cost: usually 6–12 evaluations, never more than a few times those of bisection.
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
  const valueAt = (x: number) => {
    const value = f(x);
    if (Number.isNaN(value)) throw new RangeError(`findRoot: f(${x}) is NaN; a number is needed`);
    return value;
  };
  let newest = { x: lower, value: valueAt(lower) };
  if (newest.value === 0) return lower;
  let opposite = { x: upper, value: valueAt(upper) };
  if (opposite.value === 0) return upper;
  if (newest.value > 0 === opposite.value > 0) {
    throw new RangeError(
      `findRoot: f(${lower}) is ${newest.value} and f(${upper}) is ${opposite.value}; opposite signs are needed`,
    );
  }
  let dropped = opposite;
  let share = 0.5;
  for (;;) {
    const x = newest.x + share * (opposite.x - newest.x);
    const point = { x, value: valueAt(x) };
    if (point.value > 0 === newest.value > 0) {
      dropped = newest;
    } else {
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
  }
}

interface Evaluated {
  x: number;
  value: number;
}

/** Inverse quadratic interpolation where it is monotone between the points, else bisection. */
function nextShare(newest: Evaluated, opposite: Evaluated, dropped: Evaluated): number {
  const xi = (newest.x - opposite.x) / (dropped.x - opposite.x);
  const phi = (newest.value - opposite.value) / (dropped.value - opposite.value);
  if (!(phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi)) return 0.5;
  const { value: a } = newest;
  const { value: b } = opposite;
  const { value: c } = dropped;
  const alpha = (dropped.x - newest.x) / (opposite.x - newest.x);
  return (a / (b - a)) * (c / (b - c)) + alpha * (a / (c - a)) * (b / (c - b));
}
