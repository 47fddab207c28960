import type { AimPlan } from '../plan/plan.ts';
import type { Rule } from './rule.ts';
import { leadingOf } from './support/aim.ts';
import { type Part, together } from './support/findings.ts';

export const effectFromNumber: Rule = {
  id: 'M20',
  level: 'warning',
  title: 'An effect solved from a given number says so',
  why: 'To adjust the effect until the number fits the budget is the oldest trick of the trade. Where the number was given, the page says what the study can detect and not what is expected, and the worth of that effect has to be argued.',
  sources: [{ key: 'lakens2022', of: 'justification where resources set the number' }],
  ground: null,
  checkAim: (plan) => together(plan.aim.id, [solvedBackwards(plan), suspiciouslyEqual(plan)]),
};

function solvedBackwards({ aim, own }: AimPlan): Part | null {
  if (aim.find !== 'detectable-effect') return null;
  return {
    path: `aims[${aim.index}].find`,
    level: 'note',
    message: `The number was given and the effect solved for: the documents say what ${own.n} analysed can detect. Say in the objective why an effect of that size would be worth finding.`,
  };
}

/** The stated effect is just what a given number detects. */
function suspiciouslyEqual({ aim, own, effect }: AimPlan): Part | null {
  const leading = leadingOf(aim);
  if (aim.find !== 'power' || leading === null || effect === null || own.detectable === null) return null;
  if (leading.basis === 'smallest-effect-of-interest') return null;
  if (effect.toPrecision(3) !== own.detectable.toPrecision(3)) return null;
  return {
    path: leading.path,
    level: 'warning',
    message: `The stated effect equals, to three digits, the smallest that ${own.n} analysed detect. If it was solved from the number, use find: detectable-effect; if not, say where it comes from.`,
  };
}
