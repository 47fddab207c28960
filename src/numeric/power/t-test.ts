/** Power of the one-sided t test in the direction of the effect. The two-sided test is the F test with df1 = 1.
 *
 *  Domain: 0 < alpha < .5; df .5–1e7; noncentrality 0–316; 0 ≤ partialCorrelation < 1.
 *  Relative error (test/fixtures/power.json): 1e-12.
 *  @throws {RangeError} names argument, value and domain */

import { noncentralTUpperTail } from '../distributions/noncentral-t.ts';
import { tUpperQuantile } from '../distributions/student-t.ts';
import { requireBetween } from '../domain.ts';
import { mixtureTail } from '../mixtures/mixture-tail.ts';
import { betaLadder } from '../mixtures/tail-ladder.ts';
import { negativeBinomialWeights } from '../mixtures/weights.ts';
import { betaPointOfProduct } from '../special/beta-point.ts';

/** With the predictor fixed by the design: T is noncentral t. */
export function tTestPower(alpha: number, df: number, noncentrality: number): number {
  check('tTestPower', alpha, df);
  requireBetween('tTestPower', 'noncentrality', noncentrality, 0, 316);
  return noncentrality === 0 ? alpha : noncentralTUpperTail(tUpperQuantile(alpha, df), df, noncentrality);
}

/** With the predictor sampled, jointly normal with the outcome: the exact upper tail of the sample's (partial)
 *  correlation at its critical value. Half a sum over whole and half-integer weights, as for the noncentral t, the
 *  weights averaged over the gamma distribution of the noncentrality. */
export function sampledTTestPower(alpha: number, df: number, partialCorrelation: number): number {
  check('sampledTTestPower', alpha, df);
  requireBetween('sampledTTestPower', 'partialCorrelation', partialCorrelation, 0, 1 - 1e-9);
  if (partialCorrelation === 0) return alpha;
  const t = tUpperQuantile(alpha, df);
  const weights = negativeBinomialWeights((df + 1) / 2, partialCorrelation * partialCorrelation);
  const ladder = betaLadder(betaPointOfProduct(t, t, df), df / 2, 'upper');
  return (mixtureTail(weights, ladder, 0.5) + mixtureTail(weights, ladder, 0.5, 0.5)) / 2;
}

function check(name: string, alpha: number, df: number): void {
  requireBetween(name, 'alpha', alpha, Number.MIN_VALUE, 0.5);
  requireBetween(name, 'df', df, 0.5, 1e7);
}
