/** Names that must stand for one thing. */

import type { Problem } from '../../problem.ts';
import { errorAt } from '../error-at.ts';
import type { Segments } from '../path.ts';
import { shown } from '../shown.ts';
import { childOf, entriesOf } from '../tree.ts';
import { aimsOf, type Check, textAt } from './check.ts';

interface Named {
  name: string | null;
  path: Segments;
}

function repeated(named: readonly Named[], message: (name: string) => string): Problem[] {
  const seen = new Set<string>();
  return named.flatMap(({ name, path }) => {
    if (name === null) return [];
    const isRepeated = seen.has(name);
    seen.add(name);
    return isRepeated ? [errorAt('duplicate', path, message(name))] : [];
  });
}

export const aimIdsDiffer: Check = (tree) =>
  repeated(
    aimsOf(tree).map(({ aim, path }) => ({ name: textAt(aim, 'id'), path: [...path, 'id'] })),
    (id) => `Another aim is called ${shown(id)} already. Give each aim an id of its own.`,
  );

export const documentKindsDiffer: Check = (tree) =>
  repeated(
    entriesOf(childOf(tree, 'documents')).map((document, index) => ({
      name: textAt(document, 'kind'),
      path: ['documents', index, 'kind'],
    })),
    (kind) =>
      `A document of kind ${shown(kind)} is asked for already, and the two would be written to one file. Keep one; formats lists its formats.`,
  );

export const referenceIdsDiffer: Check = (_tree, references) =>
  repeated(
    (references ?? []).map(({ id }, index) => ({ name: id, path: ['references', index, 'id'] })),
    (id) =>
      `Two references have the id ${shown(id)}. Give each an id of its own, so that a citation names one.`,
  );
