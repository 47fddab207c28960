/** Whether each aim says what its `find` needs: the target, and the number of people. */

import { errorAt } from '../error-at.ts';
import { listed } from '../shown.ts';
import type { Find } from '../study.ts';
import { childOf, isGroup } from '../tree.ts';
import { aimsOf, type Check, numberAt, textAt } from './check.ts';

/** What each find is called in a sentence. */
const SOUGHT: Readonly<Record<Find, string>> = {
  'sample-size': 'the sample size',
  power: 'power',
  'detectable-effect': 'the detectable effect',
  width: 'the width of the interval',
};

export const powerIsStatedWhereNeeded: Check = (tree) =>
  aimsOf(tree).flatMap(({ aim, path, method }) => {
    const find = textAt(aim, 'find');
    const criteria = childOf(aim, 'criteria');
    const isTest = method?.criteria.some(({ key }) => key === 'power');
    if (!isTest || !isGroup(criteria) || Object.hasOwn(criteria, 'power')) return [];
    if (find !== 'sample-size' && find !== 'detectable-effect') return [];
    const message = `The key "power" is missing. ${capital(SOUGHT[find])} follows from a target power: state it, such as 0.9.`;
    return [errorAt('missing-key', [...path, 'criteria', 'power'], message)];
  });

export const evaluableIsNotSoughtAndGiven: Check = (tree) =>
  aimsOf(tree).flatMap(({ aim, path, method }) => {
    if (textAt(aim, 'find') !== 'sample-size' || numberAt(aim, 'evaluable') === null) return [];
    const others = (method?.finds ?? []).filter((find) => find !== 'sample-size').map((find) => SOUGHT[find]);
    const message = `The number analysed is given, and find asks for it. Remove evaluable${others.length > 0 ? `, or find ${listed(others, 'or')} at that number` : ''}.`;
    return [errorAt('evaluable-given', [...path, 'evaluable'], message)];
  });

export const numberAnalysedIsKnown: Check = (tree) => {
  const aims = aimsOf(tree);
  const isKnownForAll =
    childOf(childOf(tree, 'sample'), 'maximum') !== undefined ||
    aims.some(({ aim }) => textAt(aim, 'find') === 'sample-size');
  if (isKnownForAll) return [];
  return aims.flatMap(({ aim, path, method }) => {
    const find = textAt(aim, 'find');
    if (find === null || !method?.finds.includes(find as Find) || childOf(aim, 'evaluable') !== undefined)
      return [];
    const message = `The number of people is missing: ${SOUGHT[find as Find]} depends on it. Give evaluable here or sample.maximum, or let an aim find the sample size.`;
    return [errorAt('missing-key', [...path, 'evaluable'], message)];
  });
};

export const evaluableFitsTheSample: Check = (tree) => {
  const maximum = numberAt(childOf(tree, 'sample'), 'maximum');
  return aimsOf(tree).flatMap(({ aim, path }) => {
    const evaluable = numberAt(aim, 'evaluable');
    if (maximum === null || evaluable === null || evaluable <= maximum) return [];
    const message = `Found ${evaluable} analysed, but sample.maximum is ${maximum}: no more can be analysed than take part. Correct one of the two.`;
    return [errorAt('evaluable-above-maximum', [...path, 'evaluable'], message)];
  });
};

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
