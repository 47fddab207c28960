/** Every text a user wrote, escaped so that it prints as typed; ids, keys and enumerated values hold nothing to
 *  escape. Paths stay as they are. */

import type { Study } from '../../spec/study.ts';
import { escapeMarkdown } from '../markdown/escape.ts';

/** Keys whose texts are ours or are looked up by, not printed. */
const NOT_PRINTED = new Set([
  'path',
  'key',
  'cite',
  'hash',
  'id',
  'method',
  'references',
  'aim',
  'effectKeys',
]);

export function escapedStudy(study: Study): Study {
  return escaped(study) as Study;
}

function escaped(value: unknown): unknown {
  if (typeof value === 'string') return escapeMarkdown(value);
  if (Array.isArray(value)) return value.map(escaped);
  if (value === null || typeof value !== 'object') return value;
  return Object.fromEntries(
    Object.entries(value).map(([key, item]) => [key, NOT_PRINTED.has(key) ? item : escaped(item)]),
  );
}
