import { overallLoss, proportionsOf } from '../plan/losses.ts';
import type { Study } from '../spec/study.ts';
import type { Rule } from './rule.ts';
import { type Part, together } from './support/findings.ts';
import { shownPercent } from './support/numbers.ts';

export const stagesMultiply: Rule = {
  id: 'M02',
  level: 'warning',
  title: 'Loss stages multiply; none is the sum of the others',
  why: 'What remains after several stages is the product of what each leaves. Adding the proportions overstates the loss a little and hides which stage matters. Every printed number is rounded up once, from the exact quotient; rounding up at every stage instead can give one person more.',
  sources: [],
  ground: 'arithmetic; one rounding a printed number is common practice, no source',
  checkStudy: (study) => together(null, [sumAmongStages(study), compounding(study)]),
};

function sumAmongStages({ sample: { losses } }: Study): Part | null {
  if (losses.length < 3) return null;
  const total = proportionsOf(losses).reduce((sum, loss) => sum + loss, 0);
  const whole = losses.find(({ proportion }) => Math.abs(2 * proportion.value - total) < 1e-9);
  if (whole === undefined) return null;
  return {
    path: whole.proportion.path,
    level: 'warning',
    message: `The loss at “${whole.stage}” (${shownPercent(whole.proportion.value)}) is the sum of the other stages, so the same people seem to be lost twice. Leave out the total, or the parts.`,
  };
}

function compounding({ sample: { losses } }: Study): Part | null {
  if (losses.length < 2) return null;
  const proportions = proportionsOf(losses);
  const sum = proportions.reduce((total, loss) => total + loss, 0);
  return {
    path: 'sample.losses',
    level: 'note',
    message: `The ${losses.length} stages together lose ${shownPercent(overallLoss(proportions))}, not the ${shownPercent(sum)} of their sum, because each acts on those whom the stages before it left.`,
  };
}
