import type { Aim } from '../spec/study.ts';
import type { Rule } from './rule.ts';
import { type Part, together } from './support/findings.ts';
import { shownComputed, shownNumber } from './support/numbers.ts';

const LARGE_OVERLAP = 0.8;

export const overlap: Rule = {
  id: 'M11',
  level: 'warning',
  title: 'A single coefficient needs the spread and the overlap of its predictor',
  why: 'The standard error of a slope depends on how much its predictor varies that the others do not already explain; the number grows with 1/(1 − R²) of the predictor with the others. A slope without that spread is no effect size, which is why all four inputs are asked for; above .8 (common practice, no source) so little is left of the predictor that the question itself is in doubt.',
  sources: [{ key: 'hsieh1998', of: 'variance inflation for further covariates' }],
  ground: null,
  checkStudy: (study) => study.aims.flatMap((aim) => together(aim.id, [largeOverlap(aim)])),
};

function largeOverlap(aim: Aim): Part | null {
  const shared = aim.quantities.predictor_r2;
  if (shared === undefined || shared.value <= LARGE_OVERLAP) return null;
  return {
    path: shared.path,
    level: 'warning',
    message: `The other predictors explain ${shownNumber(shared.value)} of this one, which multiplies the number by ${shownComputed(1 / (1 - shared.value))}. Ask whether its own contribution can be told from theirs at all, or test them together.`,
  };
}
