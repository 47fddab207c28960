import { listed } from '../spec/shown.ts';
import type { Aim, Quantity, Study } from '../spec/study.ts';
import type { Rule } from './rule.ts';
import { leadingOf } from './support/aim.ts';
import { type Part, together } from './support/findings.ts';
import { shownQuantity } from './support/numbers.ts';
import { countWords } from './support/texts.ts';

/** A reason in fewer words names neither a judge nor a ground. */
const FEWEST_WORDS = 8;

/** Says that the effect matters, and not why. */
const EMPTY_PRAISE =
  /\b(?:clinically|practically|scientifically)?\s*(?:significant|important|relevant|meaningful|worthwhile)(?: (?:difference|effect|change|contribution))?\b/gi;

export const statedBasis: Rule = {
  id: 'M15',
  level: 'warning',
  title: 'Every assumed number has a basis, and the effect a reason',
  why: 'The effect decides the number of people more than anything else, and a reader can judge it only by knowing where it comes from, who decided on it and why. Of 446 trial protocols sent to ethics committees fewer than half justified the effect and one in eight discussed whether it mattered. “Clinically significant” without a reason says nothing (the line at eight words is common practice, without a source).',
  sources: [
    { key: 'cook2018', of: 'the need to justify the target difference', at: 'recommendations 3 and 4' },
    { key: 'clark2013', of: 'how seldom protocols do so' },
  ],
  ground: null,
  checkStudy: (study) => [
    ...study.aims.flatMap((aim) =>
      together(aim.id, [withoutBasis(Object.values(aim.quantities)), withoutReason(aim)]),
    ),
    ...together(null, [lossesWithoutBasis(study)]),
  ],
};

function withoutBasis(quantities: readonly Quantity[]): Part | null {
  const bare = quantities.filter(({ basis }) => basis === null);
  const [first] = bare;
  if (first === undefined) return null;
  return {
    path: first.path,
    level: 'warning',
    message: `There is no basis stated for ${listed(bare.map(shownQuantity), 'and')}. Say where ${bare.length === 1 ? 'the number comes' : 'each number comes'} from, as value, basis and note.`,
  };
}

function withoutReason(aim: Aim): Part | null {
  const effect = leadingOf(aim);
  if (effect === null || effect.basis === null) return null;
  const words = countWords((effect.note ?? '').replace(EMPTY_PRAISE, ' '));
  if (words >= FEWEST_WORDS) return null;
  const found =
    effect.note !== null
      ? `The note on the ${shownQuantity(effect)} gives hardly a reason`
      : effect.cite.length > 0
        ? `For the ${shownQuantity(effect)} there is a citation and no reason`
        : `For the ${shownQuantity(effect)} there is a basis and no reason`;
  return {
    path: effect.path,
    level: 'warning',
    message: `${found}. Say in a note, in a sentence of at least ${FEWEST_WORDS} words, who decided on this effect and why it is the one to plan for.`,
  };
}

function lossesWithoutBasis({ sample }: Study): Part | null {
  const bare = sample.losses.map(({ proportion }) => proportion).filter(({ basis }) => basis === null);
  const [first] = bare;
  if (first === undefined) return null;
  const which = bare.length === 1 ? 'one stage' : `${bare.length} stages`;
  return {
    path: first.path,
    level: 'warning',
    message: `There is no basis stated for the loss at ${which} (${listed(
      bare.map(({ path }) => path),
      'and',
    )}). Say where ${bare.length === 1 ? 'the proportion comes' : 'the proportions come'} from.`,
  };
}
