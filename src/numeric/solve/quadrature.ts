/** Adaptive quadrature: the 15-point Kronrod rule on each piece, its error judged by the 7-point Gauss rule inside it. */

/** Kronrod nodes above 0; every second one, from the second on, is a Gauss node too, and so is 0. */
const NODES = [
  0.9914553711208126, 0.9491079123427585, 0.8648644233597691, 0.7415311855993945, 0.5860872354676911,
  0.4058451513773972, 0.20778495500789848,
];
/** Weights of the nodes, and last that of 0. */
const KRONROD = [
  0.022935322010529224, 0.06309209262997856, 0.10479001032225019, 0.14065325971552592, 0.1690047266392679,
  0.19035057806478542, 0.20443294007529889, 0.20948214108472782,
];
/** Weights of the Gauss nodes, and last that of 0. */
const GAUSS = [0.1294849661688697, 0.27970539148927664, 0.3818300505051189, 0.4179591836734694];

/** Halving a piece so often leaves nothing that a double can tell apart. */
const DEEPEST = 50;

interface Piece {
  value: number;
  error: number;
}

export interface QuadratureOptions {
  /** Wanted error relative to the integral; by default 1e-12. */
  relativeTolerance?: number;
}

/** Integral of a function that is finite and, but for corners, smooth between two finite limits.
 *  @throws {RangeError} a limit is not finite, or the function gives no number
 *  Source: rules and error estimate of Piessens, de Doncker-Kapenga, Überhuber & Kahaner (1983), QUADPACK, QK15; the
 *  recursion is the plainest there is. */
export function integrate(
  f: (x: number) => number,
  lower: number,
  upper: number,
  { relativeTolerance = 1e-12 }: QuadratureOptions = {},
): number {
  if (!Number.isFinite(lower) || !Number.isFinite(upper)) {
    throw new RangeError(`integrate: the limits are ${lower} and ${upper}; finite numbers are needed`);
  }
  const whole = kronrod(f, lower, upper);
  const allowed = (size: number) => relativeTolerance * Math.abs(size);
  let total = whole.value;
  const refine = (a: number, b: number, piece: Piece, depth: number): number => {
    if (piece.error <= allowed(total) || depth >= DEEPEST) return piece.value;
    const middle = (a + b) / 2;
    const [left, right] = [kronrod(f, a, middle), kronrod(f, middle, b)];
    // A peak that the first pass missed raises what the pieces are measured against.
    total += left.value + right.value - piece.value;
    return refine(a, middle, left, depth + 1) + refine(middle, b, right, depth + 1);
  };
  return refine(lower, upper, whole, 0);
}

function kronrod(f: (x: number) => number, a: number, b: number): Piece {
  const centre = (a + b) / 2;
  const half = (b - a) / 2;
  const values = NODES.map((node) => f(centre - half * node) + f(centre + half * node));
  const middle = f(centre);
  let value = middle * KRONROD[7]!;
  let gauss = middle * GAUSS[3]!;
  values.forEach((pair, index) => {
    value += pair * KRONROD[index]!;
    if (index % 2 === 1) gauss += pair * GAUSS[(index - 1) / 2]!;
  });
  if (Number.isNaN(value))
    throw new RangeError(`integrate: the function gives no number between ${a} and ${b}`);
  const mean = value / 2;
  let variation = Math.abs(middle - mean) * KRONROD[7]!;
  values.forEach((pair, index) => {
    variation += 2 * Math.abs(pair / 2 - mean) * KRONROD[index]!;
  });
  const difference = Math.abs(value - gauss);
  // QUADPACK's estimate: the Kronrod value is far better than its distance from the Gauss value.
  const error = variation === 0 ? 0 : variation * Math.min(1, ((200 * difference) / variation) ** 1.5);
  return { value: value * half, error: error * Math.abs(half) };
}
