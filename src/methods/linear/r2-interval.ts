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
 *  probability that the interval covers r: no interval has to be inverted. Relative error: 1e-9. */
export function expectedWidth(population: number, n: number, design: R2Design): number {
  const { alpha } = design;
  const covers = (r: number) =>
    exceedance(exceededWith(1 - alpha / 2, r, n, design), population, n, design) -
    exceedance(exceededWith(alpha / 2, r, n, design), population, n, design);
  // Outside the limits of observations this extreme the interval covers r with a probability below 1e-10. With five
  // residual degrees of freedom they come too near to 1 to be computed; from `cap` on hardly an r is covered.
  const cap = 1 - (1 - population) / 1000;
  const lowest = lowerLimit(exceededWith(1 - NEGLIGIBLE, population, n, design), n, design);
  const highest = limit(1 - alpha / 2, exceededWith(NEGLIGIBLE, population, n, design), n, design, cap);
  return integrate(covers, lowest, highest, { relativeTolerance: 1e-9 });
}

const NEGLIGIBLE = 1e-10;

/** The population value under which an observation above x has probability p; 0 when none is so small, and `cap` when
 *  it is larger than that. */
function limit(p: number, x: number, n: number, design: R2Design, cap = 1): number {
  const excess = (r: number) => exceedance(x, r, n, design) - p;
  if (excess(0) >= 0) return 0;
  // In small steps towards 1: the mixture has more terms the nearer to 1.
  let left = 1 - Math.min(x, cap);
  while (excess(1 - left) < 0) {
    if (1 - left >= cap) return cap;
    left = Math.max(left * 0.7, 1 - cap);
  }
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

/** Mean of the observed R²: the integral of P(observed R² > x). Relative error: 1e-9. */
function meanR2(population: number, n: number, design: R2Design): number {
  const lowest = exceededWith(1 - NEGLIGIBLE, population, n, design);
  const highest = exceededWith(NEGLIGIBLE, population, n, design);
  return lowest + integrate((x) => exceedance(x, population, n, design), lowest, highest);
}

/** Width of the interval of a study that observes exactly the mean of R². */
export function widthAtMean(population: number, n: number, design: R2Design): number {
  return widthAt(meanR2(population, n, design), n, design);
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
 *  rising from 0 to a peak and falling to 0 after it, the width w for which P(W(R²) ≤ w) is the assurance. The
 *  observations with wider intervals lie between a and b, W(a) = W(b) = w. Relative error: 1e-8. */
export function assuredWidth(assurance: number, population: number, n: number, design: R2Design): number {
  const peak = widestAt(n, design);
  const widest = widthAt(peak, n, design);
  const wider = (width: number) => {
    const excess = (x: number) => widthAt(x, n, design) - width;
    let left = (1 - peak) / 2;
    while (excess(1 - left) > 0) left /= 2;
    const a = findRoot(excess, 0, peak, { relativeTolerance: 1e-10 });
    const b = findRoot(excess, peak, 1 - left, { relativeTolerance: 1e-10 });
    return exceedance(a, population, n, design) - exceedance(b, population, n, design) - (1 - assurance);
  };
  let narrow = widest / 2;
  while (wider(narrow) < 0) narrow /= 2;
  return findRoot(wider, narrow, widest * (1 - 1e-9), { relativeTolerance: 1e-10 });
}
