/** From the text of a spec to its Study: read → references → validate → consistency → normalise. Pure: a file
 *  of references is asked for through the caller. */

import type { Spec } from '../generated/spec.ts';
import type { Problem } from '../problem.ts';
import { specHash } from './canonical.ts';
import { findInconsistencies } from './consistency.ts';
import { normalise } from './normalise.ts';
import { inFileOrder, locate } from './positions.ts';
import { read } from './read.ts';
import { loadReferences, type ReferenceLoader } from './references.ts';
import type { Reference, Study } from './study.ts';
import { type Group, isGroup } from './tree.ts';
import { type Finding, validate } from './validate.ts';

export interface ParseOptions {
  /** Name of the file, for messages. */
  file?: string;
  /** Gives the text of the file of references that the spec names; without it such a spec is refused. */
  readReferences?: ReferenceLoader;
}

export interface ParsedSpec {
  /** null when there is any problem of level error. */
  study: Study | null;
  /** Everything that is wrong, in the order of the file. */
  problems: Problem[];
  /** Adds file, line and column to a problem that a later stage finds. */
  locate: (problem: Problem) => Located;
}

/** A problem with its place in the file, as far as it has one. */
export type Located = Problem;

/** Never throws for the sake of the text: what is wrong with it is in `problems`. */
export function parseSpec(text: string, options: ParseOptions = {}): ParsedSpec {
  const { tree, positions, problems: unread } = read(text);
  const place = (problem: Problem): Located => locate(problem, positions, options.file);
  const { items, problems: unloaded } =
    tree === undefined ? { items: [], problems: [] } : loadReferences(tree, options.readReferences);
  const found =
    tree === undefined ? [] : [...unloaded, ...validate(tree), ...findInconsistencies(tree, items)];
  const problems = inFileOrder([...unread, ...withoutConsequences(found)].map(place));
  const isValid = problems.length === 0 && items !== null && isGroup(tree);
  return { study: isValid ? studyOf(tree, items) : null, problems, locate: place };
}

/** A key written wrong is also a key missing: the second is not said. */
function withoutConsequences(findings: readonly Finding[]): Problem[] {
  const explained = new Set(findings.map(({ explains }) => explains));
  return findings
    .filter(({ code, path }) => code !== 'missing-key' || !explained.has(path))
    .map(({ explains: _, ...problem }) => problem);
}

function studyOf(tree: Group, references: readonly Reference[]): Study {
  const resolved = typeof tree.references === 'string' ? { ...tree, references } : tree;
  // The validator has just said that the tree is a spec.
  return normalise(resolved as unknown as Spec, references, specHash(resolved));
}
