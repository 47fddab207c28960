/** Every quantity of a spec that is written as a group of keys, wherever it stands. */

import type { Segments } from '../path.ts';
import { childOf, entriesOf, type Group, isGroup } from '../tree.ts';
import { aimsOf } from './check.ts';

export interface WrittenQuantity {
  path: Segments;
  quantity: Group;
}

export function writtenQuantities(tree: unknown): WrittenQuantity[] {
  const losses = ['sample', 'losses'];
  return [
    ...aimsOf(tree).flatMap(({ path, aim }) => quantitiesIn(childOf(aim, 'inputs'), [...path, 'inputs'])),
    ...entriesOf(childOf(childOf(tree, 'sample'), 'losses')).flatMap((loss, index) =>
      quantitiesIn(loss, [...losses, index]),
    ),
  ];
}

function quantitiesIn(value: unknown, path: Segments): WrittenQuantity[] {
  if (!isGroup(value)) return [];
  if (Object.hasOwn(value, 'value')) return [{ path, quantity: value }];
  return Object.entries(value).flatMap(([key, inner]) => quantitiesIn(inner, [...path, key]));
}
