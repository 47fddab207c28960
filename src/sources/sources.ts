/** The built-in references: publications that methods and rules rest on. Exports: sources, source, verifiedFields.
 *
 *  `sources.json` holds them as CSL-JSON. `custom.verified` says whether volume, issue and pages were compared with
 *  the publication (`full`), `custom.doi` how the DOI was (`seen`; `pattern`: follows from the journal's rule;
 *  `standards`: listed in the guideline notes the project was built on; `memory`), and `custom.memory` which other
 *  fields were written from memory. */

import { references } from '../generated/references.ts';
import type { Reference } from '../spec/study.ts';

export const sources: readonly Reference[] = references;

const byKey = new Map(sources.map((item) => [item.id, item]));

const TRUSTED_DOI = ['seen', 'pattern', 'standards'];

/** The reference of a key that our own code or templates name. @throws {Error} unknown key: a defect of ours */
export function source(key: string): Reference {
  const found = byKey.get(key);
  if (found === undefined) throw new Error(`src/sources/sources.json holds no item '${key}'`);
  return found;
}

/** The reference without what was not verified: a page prints volume, issue and pages only where they were checked,
 *  and a DOI only where it was seen. A reference that says nothing of its verification, as a user's own, stays whole. */
export function verifiedFields(reference: Reference): Reference {
  const { verified, doi } = reference.custom ?? {};
  if (verified === undefined) return reference;
  const { volume, issue, page, DOI, ...rest } = reference;
  const place = verified === 'full' ? { volume, issue, page } : {};
  const identifier = doi !== undefined && TRUSTED_DOI.includes(doi) ? { DOI } : {};
  return { ...rest, ...given({ ...place, ...identifier }) };
}

type Fields = Pick<Reference, 'volume' | 'issue' | 'page' | 'DOI'>;

function given(fields: { [Key in keyof Fields]?: Fields[Key] | undefined }): Fields {
  return Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== undefined));
}
