import type { Aim } from '../spec/study.ts';
import type { Rule } from './rule.ts';
import { isInteraction, isTest } from './support/aim.ts';
import { type Part, together } from './support/findings.ts';
import { mention, purposeOf } from './support/texts.ts';

/** "A moderate effect" and "an interactive course" speak of no difference. */
const DIFFERENCE =
  /\b(?:moderat(?:ors?|es|ed|ing|ion)|moderate (?:the|this|that|these|its|their|how)|sub-?groups?|interact(?:s|ed|ing|ions?)?|effect modif\w+|differs? between)\b/i;

export const interactions: Rule = {
  id: 'M27',
  level: 'warning',
  title: 'A claim that an effect differs needs a test of the difference',
  why: 'Significant here and not there is no difference. In balanced halves an interaction as large as the main effect needs four times its number and one half as large sixteen times: the difference of two differences has twice the standard error of one.',
  sources: [
    { key: 'brookes2004', of: 'power of interaction tests and of subgroup claims' },
    { key: 'leon2009', of: 'the fourfold number (from memory)' },
  ],
  ground: null,
  checkStudy: (study) => study.aims.flatMap((aim) => together(aim.id, [withoutTest(aim), multiplied(aim)])),
};

function withoutTest(aim: Aim): Part | null {
  if (isInteraction(aim) || !isTest(aim)) return null;
  const found = mention(purposeOf(aim), DIFFERENCE);
  if (found === null) return null;
  return {
    path: found.path,
    level: 'warning',
    message: `“${found.words}” speaks of an effect that differs, and the aim is sized for another test. Size the product term with method linear-interaction, or reword.`,
  };
}

function multiplied(aim: Aim): Part | null {
  if (!isInteraction(aim)) return null;
  return {
    path: `aims[${aim.index}].method`,
    level: 'note',
    message:
      'In balanced halves an interaction as large as the main effect needs four times the number of that effect, and one half as large sixteen times.',
  };
}
