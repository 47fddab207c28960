/** Names that must lead somewhere. */

import { sourceKeys } from '../../generated/source-keys.ts';
import { nearest } from '../nearest.ts';
import { listed, shown } from '../shown.ts';
import { childOf, entriesOf } from '../tree.ts';
import { aimsOf, type Check, problem, textAt } from './check.ts';
import { writtenQuantities } from './written-quantities.ts';

export const citationsResolve: Check = (tree, references) => {
  if (!references) return [];
  const ids = [...new Set(references.map(({ id }) => id))];
  const known = new Set([...ids, ...sourceKeys]);
  return writtenQuantities(tree).flatMap(({ path, quantity }) =>
    entriesOf(quantity.cite).flatMap((id, index) => {
      if (typeof id !== 'string' || id === '' || known.has(id)) return [];
      const near = nearest(id, [...known]);
      const step = near
        ? `Did you mean ${shown(near)}?`
        : `Add it to references${ids.length > 0 && ids.length <= 12 ? `, which holds ${listed(ids.map(shown), 'and')}` : ''}.`;
      return [
        problem(
          'unknown-reference',
          [...path, 'cite', index],
          `No reference has the id ${shown(id)}. ${step}`,
        ),
      ];
    }),
  );
};

export const acknowledgedAimsExist: Check = (tree) => {
  const ids = [...new Set(aimsOf(tree).flatMap(({ aim }) => textAt(aim, 'id') ?? []))];
  return entriesOf(childOf(tree, 'acknowledge')).flatMap((entry, index) => {
    const id = textAt(entry, 'aim');
    if (id === null || ids.includes(id)) return [];
    const near = nearest(id, ids);
    const step = near
      ? `Did you mean ${shown(near)}?`
      : ids.length === 1
        ? `The one aim is ${ids.map(shown).join()}.`
        : `Aims are ${listed(ids.map(shown), 'and')}.`;
    return [problem('unknown-aim', ['acknowledge', index, 'aim'], `No aim has the id ${shown(id)}. ${step}`)];
  });
};
