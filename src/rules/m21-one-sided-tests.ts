import type { AimPlan, StudyPlan } from '../plan/plan.ts';
import { requiredOrNull } from '../sensitivity/required-table.ts';
import type { Rule } from './rule.ts';
import { type Part, together } from './support/findings.ts';
import { shownLevel } from './support/numbers.ts';

/** Half of the usual two-sided level. */
const ONE_SIDED_LEVEL = 0.025;

export const oneSidedTests: Rule = {
  id: 'M21',
  level: 'warning',
  title: 'A one-sided test has a reason, and in a trial half the two-sided level',
  why: 'A one-sided test is honest only where an effect in the other direction would change nothing. At the same alpha it is a laxer criterion, not a cleverer one: instead of two-sided .05 it saves about a fifth of the people at power .80, and unexplained it reads as a way to save them. In trials the usual one-sided level is .025 (ICH E9, from memory).',
  sources: [],
  ground: 'common practice, no source',
  checkAim: (plan, study) =>
    plan.aim.criteria.sides === 1 ? together(plan.aim.id, [noReason(plan), laxInTrial(plan, study)]) : [],
};

function noReason(plan: AimPlan): Part | null {
  const { aim } = plan;
  if (aim.criteria.sidesReason !== null) return null;
  const twoSided = neededTwoSided(plan);
  const saving = twoSided === null ? '' : `, which needs ${plan.own.n} analysed instead of ${twoSided}`;
  return {
    path: `aims[${aim.index}].criteria.sides`,
    level: 'warning',
    message: `The test is one-sided${saving}, and no reason is given. Say in sides_reason why an effect in the other direction would change nothing, or test two-sided.`,
  };
}

function laxInTrial({ aim }: AimPlan, { study }: StudyPlan): Part | null {
  const { alpha } = aim.criteria;
  if (alpha <= ONE_SIDED_LEVEL || !/\btrial\b/i.test(study.design)) return null;
  return {
    path: `aims[${aim.index}].criteria.alpha`,
    level: 'warning',
    message: `In a trial a one-sided test at ${shownLevel(alpha)} is laxer than the usual one-sided .025, half the two-sided level. Use .025, or give the reason for ${shownLevel(alpha)}.`,
  };
}

/** What the same test would need two-sided at the same alpha. */
function neededTwoSided(plan: AimPlan): number | null {
  const { aim, method, effect, target } = plan;
  if (aim.find !== 'sample-size' || effect === null || target === null) return null;
  const calculation = method.prepare({ ...aim, criteria: { ...aim.criteria, sides: 2 } });
  return requiredOrNull({ ...plan, calculation }, effect, target);
}
