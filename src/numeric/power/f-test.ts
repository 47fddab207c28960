/** Power of the F test. At the critical value the central upper tail is alpha itself, so that the mixture starts from
 *  alpha and adds positive terms only: Q(j + 1) = Q(j) + t(j), t(j + 1) = t(j)·x·(a + b + j)/(a + j + 1).
 *
 *  Domain: 0 < alpha < 1; df1 .5–1e4, df2 1–1e7 (real numbers, so that n can be solved for as one); noncentrality 0–1e5,
 *  partialR2 from 0 to where no term beyond shape 1e7 matters.
 *  Relative error (test/fixtures/power.json): 1e-12.
 *  @throws {RangeError} names argument, value and domain */

import { betaUpperQuantile } from '../distributions/beta.ts';
import { requireBetween, requireProbability } from '../domain.ts';
import { mixtureTail } from '../mixtures/mixture-tail.ts';
import { betaLadder } from '../mixtures/tail-ladder.ts';
import { negativeBinomialWeights, poissonWeights, type Weights } from '../mixtures/weights.ts';
import { betaPoint } from '../special/beta-point.ts';

/** Power of the F test whose statistic is noncentral F with the given noncentrality: predictors fixed by the design.
 *  Source: Cohen (1988), ch. 9; Tang (1938). */
export function fTestPower(alpha: number, df1: number, df2: number, noncentrality: number): number {
  check('fTestPower', alpha, df1, df2);
  requireBetween('fTestPower', 'noncentrality', noncentrality, 0, 1e5);
  if (noncentrality === 0) return alpha;
  const critical = criticalShare(alpha, df1, df2);
  const half = noncentrality / 2;
  // From weight 0 upwards as long as that weight is a number of ordinary size.
  if (half < FROM_ZERO) {
    return fromAlpha(critical, alpha, df1 / 2, df2 / 2, Math.exp(-half), () => half);
  }
  return beyond(critical, df1, df2, poissonWeights(half));
}

/** Power averaged over the distribution of predictors that are sampled, jointly normal, together with the outcome. The
 *  weights are negative binomial of size (df1 + df2)/2, which is (n − 1 − p)/2 with p predictors adjusted for.
 *  @param partialR2 share of the variance left by the adjusted predictors that the tested ones explain
 *  Source: Gatsonis & Sampson (1989); as a mixture, Benton & Krishnamoorthy (2003). */
export function sampledFTestPower(alpha: number, df1: number, df2: number, partialR2: number): number {
  check('sampledFTestPower', alpha, df1, df2);
  requireBetween('sampledFTestPower', 'partialR2', partialR2, 0, 1 - 1e-9);
  if (partialR2 === 0) return alpha;
  const critical = criticalShare(alpha, df1, df2);
  const size = (df1 + df2) / 2;
  const logFirst = size * Math.log1p(-partialR2);
  if (-logFirst < FROM_ZERO) {
    return fromAlpha(critical, alpha, df1 / 2, df2 / 2, Math.exp(logFirst), (j) => (size + j) * partialR2);
  }
  return beyond(critical, df1, df2, negativeBinomialWeights(size, partialR2));
}

/** Natural logarithm up to which the first weight is taken: beyond it hundreds of terms would add nothing. */
const FROM_ZERO = 200;

/** The critical value on the scale of the beta distribution, u·F/(u·F + v). Tables ask for one many times. */
interface Critical {
  alpha: number;
  df1: number;
  df2: number;
  share: number;
  /** Front of the beta distribution there, over its first shape: the first gain of the tail. */
  gain: number;
}

let latest: Critical = { alpha: Number.NaN, df1: 0, df2: 0, share: 0, gain: 0 };

function criticalShare(alpha: number, df1: number, df2: number): Critical {
  if (latest.alpha !== alpha || latest.df1 !== df1 || latest.df2 !== df2) {
    const [a, b] = [df1 / 2, df2 / 2];
    const share = betaUpperQuantile(alpha, a, b);
    const gain = betaLadder(betaPoint(share), b, 'upper').stepAt(a);
    latest = { alpha, df1, df2, share, gain };
  }
  return latest;
}

/** @param growth times 1/(j + 1): the ratio of weight j + 1 to weight j */
function fromAlpha(
  { share: x, gain }: Critical,
  alpha: number,
  a: number,
  b: number,
  firstWeight: number,
  growth: (j: number) => number,
): number {
  let weight = firstWeight;
  let tail = alpha;
  let step = gain;
  let sum = 0;
  for (let j = 0; ; j += 1) {
    sum += weight * tail;
    const shape = a + j + 1;
    // One division a term serves both recurrences.
    const inverse = 1 / ((j + 1) * shape);
    const next = growth(j) * shape * inverse;
    // The weights left fall faster than a geometric series, and no tail exceeds 1.
    if (next < 1 && weight * next < (1 - next) * 1e-16 * sum) return sum;
    weight *= next;
    tail += step;
    step *= x * (a + b + j) * (j + 1) * inverse;
  }
}

function beyond({ share }: Critical, df1: number, df2: number, weights: Weights): number {
  return mixtureTail(weights, betaLadder(betaPoint(share), df2 / 2, 'upper'), df1 / 2);
}

function check(name: string, alpha: number, df1: number, df2: number): void {
  requireProbability(name, 'alpha', alpha);
  requireBetween(name, 'df1', df1, 0.5, 1e4);
  requireBetween(name, 'df2', df2, 1, 1e7);
}
