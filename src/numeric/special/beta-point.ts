import { productError, quotientError, sumError } from './double-double.ts';

/** A point of the unit interval and its distance from 1, each as a double and what it lost in rounding.
 *  The relative error of x^a (1-x)^b grows like (a + b) times that of x: at shapes of millions a plain
 *  double would spoil five digits of a far tail. */
export interface BetaPoint {
  x: number;
  xLow: number;
  complement: number;
  complementLow: number;
}

/** The point x, 0 ≤ x ≤ 1, as given; when the complement is given too, the smaller of the two counts as exact. */
export function betaPoint(x: number, complement: number = 1 - x): BetaPoint {
  if (x <= complement) {
    const rest = 1 - x;
    return { x, xLow: 0, complement: rest, complementLow: sumError(1, -x, rest) };
  }
  const rest = 1 - complement;
  return { x: rest, xLow: sumError(1, -complement, rest), complement, complementLow: 0 };
}

/** x = s/(s + t), where s = first·second is taken exactly: df1·F against df2 for the F distribution, t·t
 *  against df for Student's. All three positive; s/t from 1e-308 to 1e308. */
export function betaPointOfProduct(first: number, second: number, t: number): BetaPoint {
  const s = first * second;
  // So far out the rounding of s no longer matters, and its exact parts might leave the range of doubles.
  if (s < 1e-200) {
    const x = s / t;
    return { x, xLow: 0, complement: 1, complementLow: -x };
  }
  if (s > 1e200) {
    const complement = t / first / second;
    return { x: 1, xLow: -complement, complement, complementLow: 0 };
  }
  const sLow = productError(first, second, s);
  const total = s + t;
  const totalLow = sumError(s, t, total) + sLow;
  const x = s / total;
  const complement = t / total;
  return {
    x,
    xLow: quotientError(s, sLow, total, totalLow, x),
    complement,
    complementLow: quotientError(t, 0, total, totalLow, complement),
  };
}

/** The same point seen from the other end. */
export function reflected(point: BetaPoint): BetaPoint {
  return { x: point.complement, xLow: point.complementLow, complement: point.x, complementLow: point.xLow };
}

/** b·x - a·(1 - x): how far the point lies above the mean a/(a + b), times a + b. */
export function excessOverMean(point: BetaPoint, a: number, b: number): number {
  const above = b * point.x;
  const below = a * point.complement;
  const aboveLow = productError(b, point.x, above) + b * point.xLow;
  const belowLow = productError(a, point.complement, below) + a * point.complementLow;
  const difference = above - below;
  return difference + (sumError(above, -below, difference) + aboveLow - belowLow);
}
