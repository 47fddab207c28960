/** Numbers that must stand in an order. */

import { formOf } from '../effect-form.ts';
import { errorAt } from '../error-at.ts';
import { formatPath } from '../path.ts';
import type { Range } from '../study.ts';
import { childOf, entriesOf, isGroup } from '../tree.ts';
import { aimsOf, type Check, numberAt, textAt } from './check.ts';
import { writtenQuantities } from './written-quantities.ts';

export const valueLiesInItsRange: Check = (tree) =>
  writtenQuantities(tree).flatMap(({ path, quantity }) => {
    const value = numberAt(quantity, 'value');
    const low = numberAt(quantity, 'low');
    const high = numberAt(quantity, 'high');
    if (value === null) return [];
    const found = [];
    if (low !== null && low > value) {
      const message = `Found low ${low} above the value ${value}. low is the lower end of what is plausible: give at most the value.`;
      found.push(errorAt('range', [...path, 'low'], message));
    }
    if (high !== null && high < value) {
      const message = `Found high ${high} below the value ${value}. high is the upper end of what is plausible: give at least the value.`;
      found.push(errorAt('range', [...path, 'high'], message));
    }
    return found;
  });

export const powerExceedsAlpha: Check = (tree) =>
  aimsOf(tree).flatMap(({ aim, path }) => {
    const criteria = childOf(aim, 'criteria');
    const alpha = numberAt(criteria, 'alpha');
    const power = numberAt(criteria, 'power');
    if (alpha === null || power === null || power > alpha) return [];
    const message = `Found a target power of ${power} at alpha ${alpha}, but power must be larger than alpha, which the test reaches with no effect at all. Check both.`;
    return [errorAt('power-below-alpha', [...path, 'criteria', 'power'], message)];
  });

/** `sensitivity.effects` are values of each aim's effect, in the form in which that aim states it. */
export const askedEffectsArePossible: Check = (tree) =>
  entriesOf(childOf(childOf(tree, 'sensitivity'), 'effects')).flatMap((effect, index) => {
    if (typeof effect !== 'number') return [];
    return aimsOf(tree).flatMap(({ aim, path, method }) => {
      const stated = childOf(childOf(aim, 'inputs'), 'effect');
      if (!method || !isGroup(stated)) return [];
      const form = formOf(Object.keys(stated), method.forms, textAt(aim, 'find') === 'detectable-effect');
      const leading = method.quantities.find(({ key }) => key === form?.keys[0]);
      if (!leading || isIn(effect, leading.range)) return [];
      const message = `Found ${effect}, which the effect of ${formatPath(path)}, stated as ${leading.title}, cannot be. Give values in that form.`;
      return [errorAt('not-allowed', ['sensitivity', 'effects', index], message)];
    });
  });

function isIn(value: number, range: Range): boolean {
  const isAbove = range.minimumIncluded ? value >= range.minimum : value > range.minimum;
  return isAbove && (range.maximumIncluded ? value <= range.maximum : value < range.maximum);
}

/** Targets are powers where every aim is a test; widths of intervals may be any size. */
export const askedPowersArePossible: Check = (tree) => {
  const aims = aimsOf(tree);
  if (!aims.every(({ method }) => method?.criteria.some(({ key }) => key === 'power'))) return [];
  return entriesOf(childOf(childOf(tree, 'sensitivity'), 'targets')).flatMap((target, index) => {
    if (typeof target !== 'number' || target < 1) return [];
    const hint =
      target > 1 && target <= 100
        ? ` Is ${target} % meant? Then write ${Number((target / 100).toPrecision(12))}.`
        : '';
    const message = `Found ${target}, but a target power must be less than 1.${hint}`;
    return [errorAt('not-allowed', ['sensitivity', 'targets', index], message)];
  });
};
