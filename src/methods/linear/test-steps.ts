/** The arithmetic of the power of an F or one-sided t test, line by line, as the page prints it and as base R and
 *  SciPy run it. Both languages sum the mixture themselves: their noncentral F is good to ten digits only. */

import { fUpperQuantile } from '../../numeric/distributions/f.ts';
import { tUpperQuantile } from '../../numeric/distributions/student-t.ts';
import type { Step } from '../method.ts';

export interface TestNumbers {
  n: number;
  f2: number;
  tested: number;
  adjustedFor: number;
  alpha: number;
  power: number;
}

/** A step of which both languages have the same expression. */
function same(step: Omit<Step, 'r' | 'python'>, expression: string): Step {
  return { ...step, r: expression, python: expression };
}

function residualDf({ n, tested, adjustedFor }: TestNumbers): Step {
  const formula = { symbol: 'v', formula: 'v = n − u − p − 1', meaning: 'residual degrees of freedom' };
  return same({ variable: 'v', ...formula, value: n - tested - adjustedFor - 1 }, 'n - u - p - 1');
}

/** A helper that is run, not printed. */
function helper(variable: string, meaning: string, r: string, python: string): Step {
  return { variable, symbol: variable, meaning, formula: '', value: null, r, python };
}

export function fTestSteps(numbers: TestNumbers, isSampled: boolean): Step[] {
  const { n, f2, tested: u, alpha, power } = numbers;
  const v = n - u - numbers.adjustedFor - 1;
  const critical = fUpperQuantile(alpha, u, v);
  const steps: Step[] = [
    residualDf(numbers),
    {
      variable: 'critical',
      symbol: 'F₁₋α',
      meaning: 'critical value of F with u and v degrees of freedom',
      formula: 'P(F > F₁₋α) = α',
      value: critical,
      r: 'qf(alpha, u, v, lower.tail = FALSE)',
      python: 'stats.f.isf(alpha, u, v)',
    },
    same(
      {
        variable: 'x',
        symbol: 'x',
        meaning: 'the same on the scale of the beta distribution',
        formula: 'x = u·F₁₋α/(u·F₁₋α + v)',
        value: (u * critical) / (u * critical + v),
      },
      'u * critical / (u * critical + v)',
    ),
  ];
  return isSampled
    ? [...steps, ...sampledMixture(numbers, power)]
    : [...steps, ...fixedMixture(n, f2, power)];
}

function fixedMixture(n: number, f2: number, power: number): Step[] {
  return [
    same(
      { variable: 'ncp', symbol: 'λ', meaning: 'noncentrality', formula: 'λ = f²·n', value: f2 * n },
      'f2 * n',
    ),
    helper(
      'j',
      'terms of the mixture',
      '0:ceiling(qpois(1e-15, ncp / 2, lower.tail = FALSE))',
      'np.arange(stats.poisson.isf(1e-15, ncp / 2) + 1)',
    ),
    {
      variable: 'achieved',
      symbol: '1 − β',
      meaning: 'power',
      formula: '1 − β = Σ Poisson(j; λ/2)·P(Beta(u/2 + j, v/2) > x)',
      value: power,
      r: 'sum(dpois(j, ncp / 2) * pbeta(x, u / 2 + j, v / 2, lower.tail = FALSE))',
      python: 'float(np.sum(stats.poisson.pmf(j, ncp / 2) * stats.beta.sf(x, u / 2 + j, v / 2)))',
    },
  ];
}

function sampledSize({ n, adjustedFor, f2 }: TestNumbers): Step[] {
  return [
    same(
      {
        variable: 'm',
        symbol: 'm',
        meaning: 'size of the negative binomial weights',
        formula: 'm = (n − 1 − p)/2',
        value: (n - 1 - adjustedFor) / 2,
      },
      '(n - 1 - p) / 2',
    ),
    same(
      {
        variable: 'q',
        symbol: '1 − R²',
        meaning: 'share of variance left',
        formula: '1 − R² = 1/(1 + f²)',
        value: 1 / (1 + f2),
      },
      '1 / (1 + f2)',
    ),
    helper(
      'j',
      'terms of the mixture',
      '0:ceiling(qnbinom(1e-15, m, q, lower.tail = FALSE))',
      'np.arange(stats.nbinom.isf(1e-15, m, q) + 1)',
    ),
  ];
}

function sampledMixture(numbers: TestNumbers, power: number): Step[] {
  return [
    ...sampledSize(numbers),
    {
      variable: 'achieved',
      symbol: '1 − β',
      meaning: 'power',
      formula: '1 − β = Σ NegBin(j; m, 1 − R²)·P(Beta(u/2 + j, v/2) > x)',
      value: power,
      r: 'sum(dnbinom(j, m, q) * pbeta(x, u / 2 + j, v / 2, lower.tail = FALSE))',
      python: 'float(np.sum(stats.nbinom.pmf(j, m, q) * stats.beta.sf(x, u / 2 + j, v / 2)))',
    },
  ];
}

/** One-sided t test: half the sum over whole and half-integer weights (Benton & Krishnamoorthy 2003 for the
 *  noncentral t; the sampled weights are theirs averaged over the gamma distribution of the noncentrality). */
export function tTestSteps(numbers: TestNumbers, isSampled: boolean): Step[] {
  const { n, f2, adjustedFor, alpha, power } = numbers;
  const v = n - adjustedFor - 2;
  const critical = tUpperQuantile(alpha, v);
  const steps: Step[] = [
    residualDf(numbers),
    {
      variable: 'critical',
      symbol: 't₁₋α',
      meaning: 'critical value of t with v degrees of freedom',
      formula: 'P(t > t₁₋α) = α',
      value: critical,
      r: 'qt(alpha, v, lower.tail = FALSE)',
      python: 'stats.t.isf(alpha, v)',
    },
    same(
      {
        variable: 'x',
        symbol: 'x',
        meaning: 'the same on the scale of the beta distribution',
        formula: 'x = t²₁₋α/(t²₁₋α + v)',
        value: critical ** 2 / (critical ** 2 + v),
      },
      'critical * critical / (critical * critical + v)',
    ),
  ];
  const achieved: Step = {
    variable: 'achieved',
    symbol: '1 − β',
    meaning: 'power',
    formula: '1 − β = ½·Σ [w(j)·P(Beta(½ + j, v/2) > x) + w(j + ½)·P(Beta(1 + j, v/2) > x)]',
    value: power,
    r: 'sum(even * pbeta(x, j + 0.5, v / 2, lower.tail = FALSE) + odd * pbeta(x, j + 1, v / 2, lower.tail = FALSE)) / 2',
    python:
      'float(np.sum(even * stats.beta.sf(x, j + 0.5, v / 2) + odd * stats.beta.sf(x, j + 1, v / 2)) / 2)',
  };
  if (isSampled) {
    return [
      ...steps,
      ...sampledSize(numbers),
      helper('even', 'weights w(j)', 'dnbinom(j, m, q)', 'stats.nbinom.pmf(j, m, q)'),
      helper(
        'odd',
        'weights w(j + ½)',
        'exp(lgamma(m + j + 0.5) - lgamma(m) - lgamma(j + 1.5) + m * log(q) + (j + 0.5) * log(1 - q))',
        'np.exp(special.gammaln(m + j + 0.5) - special.gammaln(m) - special.gammaln(j + 1.5) + m * np.log(q) + (j + 0.5) * np.log(1 - q))',
      ),
      achieved,
    ];
  }
  return [
    ...steps,
    same(
      {
        variable: 'ncp',
        symbol: 'λ',
        meaning: 'square of the noncentrality δ of t',
        formula: 'λ = δ² = f²·n',
        value: f2 * n,
      },
      'f2 * n',
    ),
    helper(
      'j',
      'terms of the mixture',
      '0:ceiling(qpois(1e-15, ncp / 2, lower.tail = FALSE))',
      'np.arange(stats.poisson.isf(1e-15, ncp / 2) + 1)',
    ),
    helper('even', 'weights w(j)', 'dpois(j, ncp / 2)', 'stats.poisson.pmf(j, ncp / 2)'),
    helper(
      'odd',
      'weights w(j + ½)',
      'exp((j + 0.5) * log(ncp / 2) - ncp / 2 - lgamma(j + 1.5))',
      'np.exp((j + 0.5) * np.log(ncp / 2) - ncp / 2 - special.gammaln(j + 1.5))',
    ),
    achieved,
  ];
}
