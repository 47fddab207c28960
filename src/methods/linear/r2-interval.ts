/** The confidence interval of R² that inverts its exact distribution, two equal tails, and how wide it will be.
 *  An observed R² of x has the limits at which x is its lower or upper α/2 point; a limit that does not exist is 0. */

import { noncentralFUpperTail } from '../../numeric/distributions/noncentral-f.ts';
import { squaredMultipleCorrelationUpperTail } from '../../numeric/distributions/squared-multiple-correlation.ts';
import { integrate } from '../../numeric/solve/quadrature.ts';
import { findRoot } from '../../numeric/solve/root.ts';

export interface R2Design {
  predictors: number;
  isSampled: boolean;
  /** 1 − confidence. */
  alpha: number;
}

/** P(observed R² > x) with n analysed and a population R² of `population`. Fixed predictors: noncentral F with
 *  λ = n·R²/(1 − R²). */
export function exceedance(
  x: number,
  population: number,
  n: number,
  { predictors, isSampled }: R2Design,
): number {
  if (x <= 0) return 1;
  if (x >= 1) return 0;
  if (isSampled) return squaredMultipleCorrelationUpperTail(x, predictors, n, population);
  const df2 = n - predictors - 1;
  return noncentralFUpperTail(
    (x / (1 - x)) * (df2 / predictors),
    predictors,
    df2,
    (n * population) / (1 - population),
  );
}

/** Roots inside an integral need no more digits than the integral keeps. */
const ROOT = { relativeTolerance: 1e-12 };

/** The observed R² that is exceeded with probability p. */
export function exceededWith(p: number, population: number, n: number, design: R2Design): number {
  return findRoot((x) => exceedance(x, population, n, design) - p, 0, 1, ROOT);
}

/** Expected width. By Pratt (1961, from memory) it is the integral, over all values r that R² could have, of the
 *  probability that the interval covers r: no interval has to be inverted. Relative error: 1e-8. */
export function expectedWidth(population: number, n: number, design: R2Design): number {
  const { alpha } = design;
  const covers = (r: number) =>
    exceedance(exceededWith(1 - alpha / 2, r, n, design), population, n, design) -
    exceedance(exceededWith(alpha / 2, r, n, design), population, n, design);
  // Outside the limits of observations this extreme the interval covers r with a probability below 1e-10.
  const lowest = lowerLimit(exceededWith(1 - NEGLIGIBLE, population, n, design), n, design);
  const highest = upperLimit(exceededWith(NEGLIGIBLE, population, n, design), n, design);
  return integrate(covers, lowest, highest, { relativeTolerance: 1e-6 });
}

const NEGLIGIBLE = 1e-10;

/** The population value under which an observation above x has probability p; 0 when none is so small. */
function limit(p: number, x: number, n: number, design: R2Design): number {
  const excess = (r: number) => exceedance(x, r, n, design) - p;
  if (excess(0) >= 0) return 0;
  // Step towards 1 by quarters of what is left: the mixture has more terms the nearer to 1.
  let left = 1 - x;
  while (excess(1 - left) < 0) left /= 4;
  return findRoot(excess, 0, 1 - left, ROOT);
}

function lowerLimit(x: number, n: number, design: R2Design): number {
  return limit(design.alpha / 2, x, n, design);
}

function upperLimit(x: number, n: number, design: R2Design): number {
  return limit(1 - design.alpha / 2, x, n, design);
}

/** Width of the interval of an observed R² of x. */
export function widthAt(x: number, n: number, design: R2Design): number {
  return upperLimit(x, n, design) - lowerLimit(x, n, design);
}

/** Above this no interval is widest. */
const WIDEST_BELOW = 0.95;

/** The observed R² whose interval is widest; the width rises before it and falls after it. */
function widestAt(n: number, design: R2Design): number {
  const golden = (Math.sqrt(5) - 1) / 2;
  let [low, high] = [0, WIDEST_BELOW];
  let [inner, outer] = [high - golden * (high - low), low + golden * (high - low)];
  let [atInner, atOuter] = [widthAt(inner, n, design), widthAt(outer, n, design)];
  while (high - low > 1e-4) {
    if (atInner < atOuter) {
      low = inner;
      [inner, atInner] = [outer, atOuter];
      outer = low + golden * (high - low);
      atOuter = widthAt(outer, n, design);
    } else {
      high = outer;
      [outer, atOuter] = [inner, atInner];
      inner = high - golden * (high - low);
      atInner = widthAt(inner, n, design);
    }
  }
  return (low + high) / 2;
}

/** The width that the interval does not exceed with probability `assurance`: with W(x) the width at an observed x,
 *  rising to a peak and falling after it, the width w for which P(W(R²) ≤ w) is the assurance. The observations with
 *  wider intervals lie between a and b, W(a) = W(b) = w. Relative error: 1e-8. */
export function assuredWidth(assurance: number, population: number, n: number, design: R2Design): number {
  const peak = widestAt(n, design);
  const widest = widthAt(peak, n, design);
  const lowest = exceededWith(1 - NEGLIGIBLE, population, n, design);
  const highest = exceededWith(NEGLIGIBLE, population, n, design);
  const narrowAt = (width: number, from: number, to: number): number => {
    if (widthAt(from, n, design) >= width) return from;
    return findRoot((x) => widthAt(x, n, design) - width, from, to, { relativeTolerance: 1e-10 });
  };
  const excess = (width: number) => {
    const a = lowest >= peak ? lowest : narrowAt(width, lowest, peak);
    const b = highest <= peak ? highest : narrowAt(width, highest, peak);
    return exceedance(a, population, n, design) - exceedance(b, population, n, design) - (1 - assurance);
  };
  return findRoot(excess, widest / 100, widest * (1 - 1e-9), { relativeTolerance: 1e-10 });
}
