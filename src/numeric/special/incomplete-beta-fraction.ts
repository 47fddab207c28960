/** Lower tail of the beta distribution over its front factor x^a y^b / B(a, b), where y = 1 - x and
 *  `excess` = b·x - a·y is at most 1. There the fraction converges fast, in about 7 (ab/(a + b))^(1/3) steps at
 *  the mean and fewer in the tail, and its terms are positive up to the b-th.
 *  Domain (not checked): 0 < x < 1; a, b ≥ 1/4, one of them up to 1e100.
 *  Source: DiDonato & Morris (1992), Algorithm 708, the continued fraction of BFRAC with λ = -excess (written
 *  from memory, confirmed by the fixtures); convergents by Abramowitz & Stegun (1964) 3.10.1. */
export function incompleteBetaFraction(a: number, b: number, x: number, y: number, excess: number): number {
  const lift = 1 - excess;
  const liftStep = 1 + y;
  let inverse = 1 / (a + 1);
  let numeratorBefore = 0;
  let denominatorBefore = 1;
  let numerator = 1;
  let denominator = a * inverse * lift;
  for (let n = 1; n < MOST_STEPS; n++) {
    const weight = n * (b - n) * x;
    const alpha = (a + n - 1) * (a + b + n - 1) * weight * x * inverse * inverse;
    const inverseNext = 1 / (a + 2 * n + 1);
    const beta = n + weight * inverse + (a + n) * inverseNext * (lift + n * liftStep);
    inverse = inverseNext;
    const numeratorNext = beta * numerator + alpha * numeratorBefore;
    const denominatorNext = beta * denominator + alpha * denominatorBefore;
    numeratorBefore = numerator;
    denominatorBefore = denominator;
    numerator = numeratorNext;
    denominator = denominatorNext;
    // Equal ratios, compared without dividing.
    const cross = numerator * denominatorBefore;
    if (Math.abs(cross - numeratorBefore * denominator) <= CONVERGED * Math.abs(cross)) {
      return numerator / denominator;
    }
    if (denominator > RESCALE_ABOVE) {
      numeratorBefore /= RESCALE_ABOVE;
      denominatorBefore /= RESCALE_ABOVE;
      numerator /= RESCALE_ABOVE;
      denominator /= RESCALE_ABOVE;
    }
  }
  throw new Error(`incompleteBetaFraction: no convergence at a ${a}, b ${b}, x ${x}, excess ${excess}`);
}

/** Two steps that agree to this are within rounding of the limit. */
const CONVERGED = 2e-16;
/** Products of two convergents stay within the range of doubles. */
const RESCALE_ABOVE = 1e100;
/** At the mean of shapes of 1e7 about 1300 steps are taken. */
const MOST_STEPS = 100_000;
