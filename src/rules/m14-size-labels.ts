import type { Aim } from '../spec/study.ts';
import type { Rule } from './rule.ts';
import { leadingOf } from './support/aim.ts';
import { type Part, together } from './support/findings.ts';
import { shownQuantity } from './support/numbers.ts';

/** Labels small, medium and large by form, with half a unit of their last digit. */
const LABELS: Record<string, { values: readonly number[]; half: number }> = {
  f2: { values: [0.02, 0.15, 0.35], half: 0.005 },
  r2: { values: [0.02, 0.13, 0.26], half: 0.005 },
  partial_r2: { values: [0.02, 0.13, 0.26], half: 0.005 },
  partial_correlation: { values: [0.1, 0.3, 0.5], half: 0.005 },
};

export const sizeLabels: Rule = {
  id: 'M14',
  level: 'warning',
  title: 'A size label is not a reason for an effect',
  why: 'Small, medium and large are labels that were offered for want of anything better. A standardised effect mixes importance with noise of measurement: a worse instrument needs no more people for the same label. The effect has to be one that somebody would want to find, in units that a reader can judge.',
  sources: [
    { key: 'lenth2001', of: 'why standardised benchmarks are no basis by themselves' },
    { key: 'cook2018', of: 'how to choose a target difference' },
  ],
  ground: null,
  checkStudy: (study) => study.aims.flatMap((aim) => together(aim.id, [labelled(aim)])),
};

function labelled(aim: Aim): Part | null {
  const effect = leadingOf(aim);
  if (effect === null || (effect.basis !== null && effect.basis !== 'convention')) return null;
  const label = LABELS[effect.key];
  const isLabel = label?.values.some((value) => Math.abs(Math.abs(effect.value) - value) <= label.half);
  if (isLabel !== true && effect.basis !== 'convention') return null;
  return {
    path: effect.path,
    level: 'warning',
    message: `The ${shownQuantity(effect)} ${isLabel === true ? 'is one of the conventional size labels' : 'rests on convention'} and has no other basis. Say what it means in units of the outcome, and who needs to find an effect of that size and why.`,
  };
}
