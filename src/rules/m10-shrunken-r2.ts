import type { Aim } from '../spec/study.ts';
import type { Rule } from './rule.ts';
import { isFromData, leadingOf } from './support/aim.ts';
import { type Part, together } from './support/findings.ts';
import { shownQuantity } from './support/numbers.ts';

/** Forms of an effect that a sample overstates. */
const UNADJUSTED = new Set(['r2', 'f2', 'partial_r2', 'r2_full', 'r2_increase', 't_statistic']);

export const shrunkenR2: Rule = {
  id: 'M10',
  level: 'warning',
  title: 'An R² from data is adjusted before it is planned with',
  why: 'R² rises with every useless predictor: from 50 people and 6 predictors an R² of .20 adjusts to .09. The same holds for what is computed from it. Planned with as it stands, it makes the study too small.',
  sources: [
    { key: 'albers2018', of: 'biased effect sizes from small studies as a basis for planning' },
    { key: 'olkin1958', of: 'estimation of a squared multiple correlation' },
  ],
  ground: null,
  checkStudy: (study) => study.aims.flatMap((aim) => together(aim.id, [unadjusted(aim)])),
};

function unadjusted(aim: Aim): Part | null {
  const effect = leadingOf(aim);
  if (effect === null || !isFromData(effect.basis) || !UNADJUSTED.has(effect.key)) return null;
  if (effect.note !== null && /\badjust|\bshr[iu]nk/i.test(effect.note)) return null;
  return {
    path: effect.path,
    level: 'warning',
    message: `The ${shownQuantity(effect)} comes from data and is not said to be adjusted, and such values are too large on average. State adjusted_r2 or observed_r2 with the n and the predictors of its source where the method takes them, or say in the note how it was adjusted.`,
  };
}
