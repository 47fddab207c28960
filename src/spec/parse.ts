/** From the text of a spec to its Study: read → references → validate → consistency → normalise. Pure: a file
 *  of references is asked for through the caller. */

import type { Spec } from '../generated/spec.ts';
import type { Problem } from '../problem.ts';
import { specHash } from './canonical.ts';
import { findInconsistencies } from './consistency.ts';
import { LIMITS } from './limits.ts';
import { normalise } from './normalise.ts';
import { inFileOrder, locate } from './positions.ts';
import { read } from './read.ts';
import { type ReferenceLoader, referencesOf, withReferences } from './references.ts';
import type { Reference, Study } from './study.ts';
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
  const { tree: written, positions, problems: unread } = read(text);
  const { tree, source, areKnown, problems: unloaded } = withReferences(written, options.readReferences);
  const place = (problem: Problem): Located => locate(problem, positions, options.file);
  const placeInvalid = (problem: Problem): Located =>
    source !== null && problem.path.startsWith('references[')
      ? locate({ ...problem, path: problem.path.slice('references'.length) }, source.positions, source.file)
      : place(problem);
  const invalid = tree === undefined ? [] : findProblems(tree, areKnown ? referencesOf(tree) : null);
  const problems = inFileOrder([...unread.map(place), ...invalid.map(placeInvalid), ...unloaded.map(place)]);
  return {
    study: problems.length === 0 ? studyOf(tree as Spec) : null,
    problems: atMost(LIMITS.problems, problems),
    locate: place,
  };
}

function findProblems(tree: unknown, references: readonly Reference[] | null): Problem[] {
  const invalid = validate(tree);
  // Lists beyond their limits are reported and not looked into.
  const isOversized = invalid.some(({ code }) => code === 'too-many');
  return withoutConsequences([...invalid, ...(isOversized ? [] : findInconsistencies(tree, references))]);
}

/** A key written wrong is also a key missing: the second is not said. */
function withoutConsequences(findings: readonly Finding[]): Problem[] {
  const explained = new Set(findings.map(({ explains }) => explains));
  return findings
    .filter(({ code, path }) => code !== 'missing-key' || !explained.has(path))
    .map(({ explains: _, ...problem }) => problem);
}

/** A file with a thousand faults has one reason, which the first of them show. */
function atMost(most: number, problems: Problem[]): Problem[] {
  const next = problems[most];
  if (!next) return problems;
  const message = `Not all problems are shown: there are more from here on. Mend the ${most} above first.`;
  return [...problems.slice(0, most), { ...next, code: 'more-problems', message }];
}

function studyOf(spec: Spec): Study {
  return normalise(spec, referencesOf(spec), specHash(spec));
}
