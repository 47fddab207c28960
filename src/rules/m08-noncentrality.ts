import type { AimPlan } from '../plan/plan.ts';
import type { Rule } from './rule.ts';
import { type Part, together } from './support/findings.ts';
import { modelCounts } from './support/plan.ts';

export const noncentrality: Rule = {
  id: 'M08',
  level: 'note',
  title: 'One noncentrality is used throughout, and named',
  why: 'For fixed predictors the F test has the noncentrality f²·n. An older textbook convention, f²·(u + v + 1), gives the same only when nothing is adjusted for. Two honest people who do not say which they use get two numbers, and each thinks the other wrong.',
  sources: [{ key: 'cohen1988', of: 'the older convention (from memory)', at: 'chapter 9' }],
  ground: null,
  checkAim: (plan) => together(plan.aim.id, [convention(plan)]),
};

function convention(plan: AimPlan): Part | null {
  const { effect, target, calculation, aim } = plan;
  if (modelCounts(plan).adjustedFor === 0 || effect === null || target === null || aim.find !== 'sample-size')
    return null;
  const older = calculation.alternatives(effect, target).find(({ key }) => key === 'older');
  if (older === undefined) return null;
  return {
    path: `aims[${aim.index}].inputs`,
    level: 'note',
    message: `Noncentrality is taken as f²·n. Under the older convention f²·(u + v + 1), with fixed predictors, ${older.n} would have to be analysed; the number here is ${plan.own.n}.`,
  };
}
