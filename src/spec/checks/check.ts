/** A check that a schema cannot make. It looks at the spec as written, valid or not, and passes over what is
 *  missing or malformed: that is the schema's to report. */

import { methodInputs } from '../../generated/inputs.ts';
import type { Problem } from '../../problem.ts';
import type { MethodInputs } from '../method-inputs.ts';
import type { Segments } from '../path.ts';
import type { Reference } from '../study.ts';
import { childOf, entriesOf } from '../tree.ts';

/** @param references null when they could not be read */
export type Check = (tree: unknown, references: readonly Reference[] | null) => Problem[];

export interface WrittenAim {
  path: Segments;
  aim: unknown;
  /** What the aim's method takes; null when the method is not known. */
  method: MethodInputs | null;
}

export function aimsOf(tree: unknown): WrittenAim[] {
  return entriesOf(childOf(tree, 'aims')).map((aim, index) => {
    const name = childOf(aim, 'method');
    const isKnown = typeof name === 'string' && Object.hasOwn(methodInputs, name);
    return {
      path: ['aims', index],
      aim,
      method: isKnown ? methodInputs[name as keyof typeof methodInputs] : null,
    };
  });
}

export function numberAt(value: unknown, key: string): number | null {
  const number = childOf(value, key);
  return typeof number === 'number' ? number : null;
}

export function textAt(value: unknown, key: string): string | null {
  const text = childOf(value, key);
  return typeof text === 'string' ? text : null;
}
