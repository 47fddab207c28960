import type { AimPlan, StudyPlan } from '../plan/plan.ts';
import type { Rule } from './rule.ts';
import { isTest } from './support/aim.ts';
import { type Part, together } from './support/findings.ts';
import { shownPower } from './support/numbers.ts';
import { inView } from './support/plan.ts';

const USUAL_ALPHA = 0.05;
/** A third of .05 is written .0167 or .017: each level may be rounded to its third decimal. */
const ROUNDING = 0.0005;

export const severalPrimaryAims: Rule = {
  id: 'M24',
  level: 'error',
  title: 'Several primary aims: any or all is stated, and alpha follows',
  why: 'If any one success counts, alpha has to be divided or ordered, or false positives add up. If all must succeed alpha stays whole, but the power is that of all together: two independent aims of .80 have .64.',
  sources: [{ key: 'fda2022', of: 'multiple endpoints (details from memory)' }],
  ground: null,
  checkPlan: (plan) =>
    together(null, [unstated(plan), undivided(plan), needlesslyDivided(plan), jointPower(plan)]),
};

function primaryTests({ aims }: StudyPlan) {
  return aims.filter(({ aim }) => aim.role === 'primary' && isTest(aim));
}

function totalAlpha(tests: readonly AimPlan[]): number {
  return tests.reduce((sum, { aim }) => sum + aim.criteria.alpha, 0);
}

/** Whether an excess may come from rounding each of the levels. */
function isWithin(excess: number, tests: number): boolean {
  return excess <= tests * ROUNDING + 1e-12;
}

function unstated(plan: StudyPlan): Part | null {
  const tests = primaryTests(plan);
  if (tests.length < 2 || plan.study.primaryAims !== null) return null;
  return {
    path: 'primary_aims',
    level: 'error',
    message: `There are ${tests.length} primary tests, and it is not stated whether the study succeeds only if all do or if any does. State primary_aims: all or any.`,
  };
}

function undivided(plan: StudyPlan): Part | null {
  const tests = primaryTests(plan);
  const total = totalAlpha(tests);
  if (tests.length < 2 || plan.study.primaryAims !== 'any' || isWithin(total - USUAL_ALPHA, tests.length))
    return null;
  return {
    path: 'primary_aims',
    level: 'error',
    message: `Any of ${tests.length} primary tests may count as success, and their significance levels add up to ${shownPower(total)}. Divide ${shownPower(USUAL_ALPHA)} among them and state the divided level as alpha of each.`,
  };
}

function needlesslyDivided(plan: StudyPlan): Part | null {
  const tests = primaryTests(plan);
  const isDivided = isWithin(Math.abs(totalAlpha(tests) - USUAL_ALPHA), tests.length);
  if (tests.length < 2 || plan.study.primaryAims !== 'all' || !isDivided) return null;
  return {
    path: 'primary_aims',
    level: 'warning',
    message:
      'All primary aims have to succeed, so their significance levels need no division; divided levels make the study larger than it has to be.',
  };
}

function jointPower(plan: StudyPlan): Part | null {
  const powers = primaryTests(plan).flatMap((aim) => inView(aim).achieved ?? []);
  if (powers.length < 2 || plan.study.primaryAims !== 'all') return null;
  const independent = powers.reduce((product, power) => product * power, 1);
  const bound = Math.max(0, powers.reduce((sum, power) => sum + power, 0) - (powers.length - 1));
  return {
    path: 'primary_aims',
    level: 'note',
    message: `All ${powers.length} primary tests have to succeed. The chance that they do is ${shownPower(independent)} if they are independent, and never below ${shownPower(bound)}.`,
  };
}
