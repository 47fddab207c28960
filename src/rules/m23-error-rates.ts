import type { AimPlan } from '../plan/plan.ts';
import type { Rule } from './rule.ts';
import { type Part, together } from './support/findings.ts';
import { inWords, shownLevel, shownPower } from './support/numbers.ts';
import { inView } from './support/plan.ts';

const USUAL_ALPHAS = [0.05, 0.025, 0.01, 0.005, 0.001];

export const errorRates: Rule = {
  id: 'M23',
  level: 'warning',
  title: 'Unusual error rates are explained',
  why: '.05 and .80 are conventions, and less is defensible where the number is bounded; but a study whose chance of finding the effect is below one half (common practice, no source) is worse than a coin, and a reader should be told in words what is missed. Very high power asks more of people than the question needs.',
  sources: [
    { key: 'sully2013', of: 'a power of .90 where possible' },
    { key: 'bacchetti2010', of: 'why there is no threshold below which a study is worthless' },
  ],
  ground: null,
  checkAim: (plan) => together(plan.aim.id, [power(plan), alpha(plan)]),
};

function power(plan: AimPlan): Part | null {
  const { aim, method } = plan;
  const { achieved, n } = inView(plan);
  if (method.achieves !== 'power' || achieved === null || aim.role === 'exploratory') return null;
  const path = `aims[${aim.index}].criteria`;
  const chance = `With ${n} analysed the power is ${shownPower(achieved)}`;
  if (achieved < 0.5) {
    return {
      path,
      level: 'warning',
      message: `${chance}: the effect would more likely be missed than found. Say why the study is worth doing, or plan for more people or a larger effect.`,
    };
  }
  if (achieved < 0.8) {
    return {
      path,
      level: 'note',
      message: `${chance}: a true effect of this size would be missed about ${inWords(1 - achieved)} times.`,
    };
  }
  if (achieved > 0.95 && aim.find === 'sample-size' && (plan.target ?? 0) > 0.95) {
    return {
      path,
      level: 'note',
      message: `${chance}. So much power asks more of people than most questions need; say why it is wanted.`,
    };
  }
  return null;
}

function alpha({ aim }: AimPlan): Part | null {
  const { alpha: level, confidence } = aim.criteria;
  if (confidence !== null || USUAL_ALPHAS.includes(level)) return null;
  return {
    path: `aims[${aim.index}].criteria.alpha`,
    level: 'note',
    message: `A significance level of ${shownLevel(level)} is unusual. Say how it was chosen, for instance by division among several tests.`,
  };
}
