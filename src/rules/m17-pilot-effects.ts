import type { Aim } from '../spec/study.ts';
import type { Rule } from './rule.ts';
import { isTest, leadingOf } from './support/aim.ts';
import { type Part, together } from './support/findings.ts';
import { shownQuantity } from './support/numbers.ts';

export const pilotEffects: Rule = {
  id: 'M17',
  level: 'warning',
  title: 'The effect of a pilot is not a target',
  why: 'A pilot tells about feasibility, spread and losses. Its effect has a wide interval, and going on only after lucky pilots selects overestimates. The target has to come from what would matter.',
  sources: [{ key: 'albers2018', of: 'what happens when pilot effects are planned with' }],
  ground: null,
  checkStudy: (study) => study.aims.flatMap((aim) => together(aim.id, [pilotTarget(aim)])),
};

function pilotTarget(aim: Aim): Part | null {
  const effect = leadingOf(aim);
  if (effect === null || effect.basis !== 'pilot-data' || !isTest(aim)) return null;
  return {
    path: effect.path,
    level: 'warning',
    message: `The ${shownQuantity(effect)} is taken from pilot data. Plan for the smallest effect that would matter, and use the pilot for spread and losses.`,
  };
}
