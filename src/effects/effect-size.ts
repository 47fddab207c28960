/** Conversions between the forms in which the field reports the effect of predictors in a linear model. Cohen (1988,
 *  ch. 9) for f²; the rest is algebra. Domains are those of the schema and are not checked again here. */

/** f² of a share of variance: R²/(1 − R²), R² being that of the whole model or partial. Domain: 0 ≤ R² < 1. */
export function f2FromR2(r2: number): number {
  return r2 / (1 - r2);
}

/** The share of variance, of the whole model or partial, with this f². Domain: f² ≥ 0. */
export function r2FromF2(f2: number): number {
  return f2 / (1 + f2);
}

/** f² of the predictors that raise R² from `reduced` to `full`: the increase over what the full model leaves. */
export function f2FromIncrease(full: number, reduced: number): number {
  return (full - reduced) / (1 - full);
}

/** f² of one coefficient whose t statistic with `df` residual degrees of freedom is `t`. */
export function f2FromT(t: number, df: number): number {
  return (t * t) / df;
}

/** f² of one slope: what the predictor explains beyond the others, over the residual variance.
 *  @param overlap R² of the predictor with the other predictors */
export function f2FromSlope(slope: number, residualSd: number, predictorSd: number, overlap: number): number {
  const explained = (slope * predictorSd) ** 2 * (1 - overlap);
  return explained / residualSd ** 2;
}

/** Adjusted R² of a sample of n with k predictors: 1 − (1 − R²)(n − 1)/(n − k − 1) (Ezekiel's formula, from memory).
 *  Can be negative. */
export function adjustedR2(observed: number, n: number, k: number): number {
  return 1 - ((1 - observed) * (n - 1)) / (n - k - 1);
}

/** The R² that a sample of n with k predictors showed, from its adjusted R². */
export function observedR2(adjusted: number, n: number, k: number): number {
  return 1 - ((1 - adjusted) * (n - k - 1)) / (n - 1);
}
