import { chiSquaredQuantile } from '../numeric/distributions/chi-squared.ts';
import type { AimPlan } from '../plan/plan.ts';
import type { Quantity } from '../spec/study.ts';
import type { Rule } from './rule.ts';
import { type Part, together } from './support/findings.ts';
import { shownComputed } from './support/numbers.ts';
import { consequence } from './support/plan.ts';

/** Degrees of freedom from which a pilot may be trusted with a spread (Teare 2014). */
const ENOUGH_DF = 70;
/** Probability with which the upper limit covers the true spread (Browne 1995). */
const COVERAGE = 0.8;

export const pilotSpread: Rule = {
  id: 'M18',
  level: 'warning',
  title: 'A standard deviation from few people is shown with its upper limit',
  why: 'The sampling distribution of a standard deviation is skewed: it is more often too small than too large, and most published trials found more spread than they had planned for. The upper one-sided 80 % limit says what the plan would need then. It is not put in silently, because from very few people it becomes absurd.',
  sources: [
    { key: 'browne1995', of: 'the upper limit of a standard deviation' },
    { key: 'teare2014', of: 'the number measured from which a pilot gives a standard deviation' },
    { key: 'vickers2003b', of: 'how often planned standard deviations were too small' },
  ],
  ground: null,
  checkAim: (plan) =>
    together(
      plan.aim.id,
      Object.values(plan.aim.quantities)
        .filter(({ key }) => key === 'residual_sd')
        .map((quantity) => uncertain(plan, quantity)),
    ),
};

function uncertain(plan: AimPlan, quantity: Quantity): Part | null {
  const { basis, source, value, path, title, key } = quantity;
  if (basis !== 'pilot-data' && basis !== 'published-estimate') return null;
  if (source.n === null) {
    return {
      path,
      level: 'warning',
      message: `The ${title} comes from a sample whose n is not stated, so its uncertainty cannot be shown. State source: {n: …}.`,
    };
  }
  const df = source.n - 1;
  if (df >= ENOUGH_DF) return null;
  const upper = value * upperFactor(df);
  const then = consequence(plan, { [key]: upper });
  return {
    path,
    level: 'warning',
    message: `The ${title} comes from ${source.n} people. At its upper one-sided ${COVERAGE * 100} % limit, ${shownComputed(upper)}, ${then}. Plan with a larger value, or answer why this one is trusted.`,
  };
}

/** Upper one-sided limit of a standard deviation over its estimate: √(df/χ²), χ² the lower quantile at 1 − coverage. */
export function upperFactor(df: number, coverage: number = COVERAGE): number {
  return Math.sqrt(df / chiSquaredQuantile(1 - coverage, df));
}
