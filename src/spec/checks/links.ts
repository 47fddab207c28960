/** Names that must lead somewhere. */

import { sourceKeys } from '../../generated/source-keys.ts';
import { errorAt } from '../error-at.ts';
import { nearest } from '../nearest.ts';
import { listed, shown } from '../shown.ts';
import { childOf, entriesOf } from '../tree.ts';
import { aimsOf, type Check, textAt } from './check.ts';
import { writtenQuantities } from './written-quantities.ts';

/** Comparing every unresolved name with every known one is for a few slips, not for a list that went missing. */
const MOST_SUGGESTIONS = 20;

export const citationsResolve: Check = (tree, references) => {
  if (!references) return [];
  const ids = [...new Set(references.map(({ id }) => id))];
  const known = new Set([...ids, ...sourceKeys]);
  const held = ids.length > 0 && ids.length <= 12 ? `, which holds ${listed(ids.map(shown), 'and')}` : '';
  return writtenQuantities(tree)
    .flatMap(({ path, quantity }) =>
      entriesOf(quantity.cite).flatMap((id, index) =>
        typeof id !== 'string' || id === '' || known.has(id) ? [] : [{ id, path: [...path, 'cite', index] }],
      ),
    )
    .map(({ id, path }, index) => {
      const near = index < MOST_SUGGESTIONS ? nearest(id, [...known]) : null;
      const step = near ? `Did you mean ${shown(near)}?` : `Add it to references${held}.`;
      return errorAt('unknown-reference', path, `No reference has the id ${shown(id)}. ${step}`);
    });
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
    return [errorAt('unknown-aim', ['acknowledge', index, 'aim'], `No aim has the id ${shown(id)}. ${step}`)];
  });
};
