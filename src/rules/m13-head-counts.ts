import type { Aim } from '../spec/study.ts';
import type { Rule } from './rule.ts';
import { type Part, together } from './support/findings.ts';
import { mention, notesOf, purposeOf } from './support/texts.ts';

const HEAD_COUNT =
  /\b(?:\d+|ten|fifteen|twenty|thirty) (?:people|participants|patients|persons|subjects|cases|observations|events)? ?(?:per|for each|for every) (?:candidate )?(?:variable|predictor|parameter|covariate|group)\b|\b50 ?\+ ?8|\b104 ?\+|\brules? of thumb\b/i;

export const headCounts: Rule = {
  id: 'M13',
  level: 'warning',
  title: 'A head-count rule is not a justification',
  why: 'So many people per predictor, 50 + 8m, 104 + m, thirty per group: each hides an effect size. Green found no support for constant or ratio rules; the two that did better assume a medium effect, and 50 + 8m asks for too many from seven predictors on. With eight predictors it gives 114 people, whose power for an R² of .05 is .33.',
  sources: [{ key: 'green1991', of: 'rules of thumb compared with power' }],
  ground: null,
  checkStudy: (study) => study.aims.flatMap((aim) => together(aim.id, [invoked(aim)])),
};

function invoked(aim: Aim): Part | null {
  const found = mention([...notesOf(aim), ...purposeOf(aim)], HEAD_COUNT);
  if (found === null) return null;
  return {
    path: found.path,
    level: 'warning',
    message: `“${found.words}” is a head-count rule, which hides an effect size. Leave it out, or say which effect the study has to find and why.`,
  };
}
