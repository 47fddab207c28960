import type { Aim } from '../spec/study.ts';
import type { Rule } from './rule.ts';
import { type Part, together } from './support/findings.ts';
import { shownComputed, shownQuantity } from './support/numbers.ts';

/** Below this better measurement is worth more than more people; common practice, no source. */
const POOR = 0.7;

export const reliability: Rule = {
  id: 'M41',
  level: 'warning',
  title: 'Poor measurement costs people',
  why: 'Error of measurement dilutes what can be seen, and the number grows about as one over the reliability. It is often cheaper to measure better than to recruit more. An effect that was already seen through such measurement must not be corrected again.',
  sources: [{ key: 'busemeyer1983', of: 'how reliabilities combine in a product' }],
  ground: null,
  checkStudy: (study) => study.aims.flatMap((aim) => together(aim.id, [poor(aim)])),
};

function poor(aim: Aim): Part | null {
  const found = Object.values(aim.quantities).find(
    ({ key, value }) => key.endsWith('_reliability') && value < POOR,
  );
  if (found === undefined) return null;
  return {
    path: found.path,
    level: 'warning',
    message: `The ${shownQuantity(found)} is low: it alone multiplies the number by about ${shownComputed(1 / found.value)}. Say why no better measurement can be had, and that the effect is stated as it would be without error.`,
  };
}
