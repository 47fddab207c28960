/** What the pages say of every linear model: assumptions and what follows, symbols, sources. */

import type { Assumption, Source } from '../method.ts';

export const MODEL_ASSUMPTIONS: readonly Assumption[] = [
  {
    statement: 'observations are independent',
    ifNot: 'clustered or repeated observations carry less information, and the power is lower than stated',
  },
  {
    statement: 'the relation is linear as modelled',
    ifNot: 'part of the effect goes into the residuals, and the power is lower than stated',
  },
  {
    statement: 'residuals have one variance',
    ifNot: 'the significance level is not the nominal one unless robust standard errors are used',
  },
  {
    statement: 'residuals are normal',
    ifNot: 'significance level and power are approximate, closely so with many residual degrees of freedom',
  },
  {
    statement: 'the model is fixed before the data are seen',
    ifNot: 'a selected model no longer has the stated significance level',
  },
  {
    statement: 'predictors are measured without error',
    ifNot: 'the effect seen is smaller than the true one unless it was stated as it would be seen',
  },
];

/** The same for an interval, of which no power is spoken. */
export const INTERVAL_ASSUMPTIONS: readonly Assumption[] = [
  {
    statement: 'observations are independent',
    ifNot:
      'clustered or repeated observations carry less information, and the interval is too narrow for its level',
  },
  {
    statement: 'the relation is linear as modelled',
    ifNot: 'the interval is about the best straight-line description, not about the relation itself',
  },
  {
    statement: 'residuals have one variance',
    ifNot: 'the interval does not have its nominal confidence unless robust standard errors are used',
  },
  {
    statement: 'residuals are normal',
    ifNot:
      'confidence and width are approximate, closely so for a slope with many residual degrees of freedom',
  },
  {
    statement: 'the model is fixed before the data are seen',
    ifNot: 'an interval from a selected model covers less often than stated',
  },
  {
    statement: 'predictors are measured without error',
    ifNot: 'the interval is about the attenuated relation with the predictors as measured',
  },
  {
    statement: 'sampled predictors are jointly normal',
    ifNot:
      'the width to be expected is approximate, and with outlying predictor values so is the interval of R²',
  },
];

export const SAMPLED_ASSUMPTION: Assumption = {
  statement: 'sampled predictors are jointly normal',
  ifNot:
    'the average over their distribution is approximate; the number with fixed predictors shows how little is at stake',
};

export const TEST_SYMBOLS = [
  { symbol: 'n', meaning: 'number analysed' },
  { symbol: 'u', meaning: 'predictors tested, in parameters' },
  { symbol: 'p', meaning: 'predictors adjusted for, in parameters' },
  { symbol: 'v', meaning: 'residual degrees of freedom' },
  { symbol: 'α', meaning: 'significance level' },
  { symbol: '1 − β', meaning: 'power' },
  { symbol: 'f²', meaning: 'explained variance over the variance that the full model leaves' },
  { symbol: 'R²', meaning: 'share of variance explained; partial R² where others are adjusted for' },
  { symbol: 'λ', meaning: 'noncentrality of F with fixed predictors' },
  { symbol: 'm', meaning: 'size of the negative binomial weights with sampled predictors' },
  { symbol: 'Beta(a, b)', meaning: 'beta-distributed random variable' },
];

export const F_TEST_FORMULA = [
  'v = n − u − p − 1; reject if F > F₁₋α(u, v); x = u·F₁₋α/(u·F₁₋α + v)',
  'predictors fixed:    1 − β = Σ Poisson(j; λ/2)·P(Beta(u/2 + j, v/2) > x),  λ = f²·n',
  'predictors sampled:  1 − β = Σ NegBin(j; m, 1 − R²)·P(Beta(u/2 + j, v/2) > x),  m = (n − 1 − p)/2',
];

export const ONE_SIDED_FORMULA = [
  'one-sided: reject if t > t₁₋α(v) in the stated direction; 1 − β = P(t > t₁₋α), t noncentral with δ = √λ,',
  '           averaged over the predictors where they are sampled',
];

export const TEST_SOURCES: readonly Source[] = [
  { key: 'cohen1988', of: 'f² and its noncentrality', at: 'chapter 9' },
  { key: 'gatsonis1989', of: 'exact power with sampled predictors' },
  { key: 'sampson1974', of: 'why fixed and sampled predictors share the test and not the power' },
  { key: 'benton2003', of: 'summing the mixtures' },
];
