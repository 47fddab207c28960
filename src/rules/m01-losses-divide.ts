import type { Study } from '../spec/study.ts';
import type { Rule } from './rule.ts';
import { together } from './support/findings.ts';
import { shownPercent } from './support/numbers.ts';

/** Above this the people left may no longer be those described; common practice, no source. */
const LARGE_LOSS = 0.4;

export const lossesDivide: Rule = {
  id: 'M01',
  level: 'warning',
  title: 'Losses divide, and a large loss is questioned',
  why: 'A fifth of those enrolled is lost, not a fifth of those analysed: the number to enrol is the number analysed divided by what remains, never multiplied by one plus the loss. Samplecase divides; what it cannot know is whether those left are still the people described when more than two in five are lost (that line is common practice, without a source), or why a study that follows people expects to lose none.',
  sources: [],
  ground: 'arithmetic',
  checkStudy: (study) => [
    ...study.sample.losses.flatMap(({ stage, proportion }) =>
      together(null, [
        proportion.value > LARGE_LOSS
          ? {
              path: proportion.path,
              level: 'warning',
              message: `${shownPercent(proportion.value)} are expected to be lost at “${stage}”. The people left may no longer be those described: say in the analysis plan how they differ, or find a way to lose fewer.`,
            }
          : null,
      ]),
    ),
    ...together(null, [noLoss(study)]),
  ],
};

function noLoss({ sample }: Study) {
  if (sample.losses.length > 0) return null;
  return {
    path: 'sample.losses',
    level: 'note' as const,
    message:
      'No loss between the first contact and the analysis is expected. If people can decline, drop out or give no usable outcome, say how many.',
  };
}
