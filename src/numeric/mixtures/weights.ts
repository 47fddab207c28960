/** Weights of the mixtures: Poisson for a fixed noncentrality, negative binomial where the noncentrality is itself
 *  gamma distributed. Both at whole and at half-integer arguments, which the t distribution needs. */

import { logBetaFront } from '../special/beta-front.ts';
import { betaPoint, excessOverMean } from '../special/beta-point.ts';
import { devianceTerm } from '../special/deviance.ts';
import { quotientError } from '../special/double-double.ts';
import { logGamma } from '../special/log-gamma.ts';
import { stirlingError } from '../special/stirling-error.ts';

export interface Weights {
  /** Mean of the distribution whose weights they are. */
  centre: number;
  /** Its standard deviation. */
  deviation: number;
  logWeightAt(x: number): number;
  /** weight(x + 1)/weight(x). */
  growthAt(x: number): number;
}

/** e^−mean mean^x/Γ(x + 1). Source: Loader (2000), the saddle-point form. */
export function poissonWeights(mean: number): Weights {
  return {
    centre: mean,
    deviation: Math.sqrt(mean),
    logWeightAt(x) {
      if (x === 0) return -mean;
      if (x < 1) return x * Math.log(mean) - mean - logGamma(x + 1);
      const ratio = mean / x;
      const deviance = x * devianceTerm((mean - x) / x, ratio, quotientError(mean, 0, x, 0, ratio));
      return -0.5 * Math.log(2 * Math.PI * x) - stirlingError(x) - deviance;
    },
    growthAt: (x) => mean / (x + 1),
  };
}

/** Γ(size + x)/(Γ(size) Γ(x + 1)) share^x (1 − share)^size: Poisson weights averaged over a gamma distribution of their
 *  mean. It is the front factor of a beta distribution over x. */
export function negativeBinomialWeights(size: number, share: number): Weights {
  const point = betaPoint(share);
  return {
    centre: (size * share) / (1 - share),
    deviation: Math.sqrt(size * share) / (1 - share),
    logWeightAt(x) {
      if (x === 0) return size * Math.log1p(-share);
      return logBetaFront(point, x, size, excessOverMean(point, x, size)) - Math.log(x);
    },
    growthAt: (x) => ((size + x) / (x + 1)) * share,
  };
}
