/** The spec's references: items as they stand, or the file that holds them. */

import { type Problem, ProblemError } from '../problem.ts';
import { errorAt } from './error-at.ts';
import { locate, type Positions } from './positions.ts';
import { read } from './read.ts';
import { shown, shownValue } from './shown.ts';
import type { Reference } from './study.ts';
import { childOf, entriesOf, type Group, isGroup } from './tree.ts';

/** Gives the text of the file a spec names. @throws {ProblemError} when it cannot be read, or may not. */
export type ReferenceLoader = (path: string) => string;

export interface WithReferences {
  /** The spec with the items in the place of their path. */
  tree: unknown;
  /** Where the items come from; null when they stand in the spec. */
  source: { file: string; positions: Positions } | null;
  /** Whether all items are known, so that a `cite` can be called unresolved. */
  areKnown: boolean;
  problems: Problem[];
}

/** Puts the items of a references file into the spec, so that they are checked and hashed as if they stood there. */
export function withReferences(tree: unknown, load: ReferenceLoader | undefined): WithReferences {
  const path = childOf(tree, 'references');
  if (typeof path !== 'string') return { tree, source: null, areKnown: true, problems: [] };
  const failed = (problems: Problem[]): WithReferences => ({ tree, source: null, areKnown: false, problems });
  const refused = (message: string): WithReferences =>
    failed([errorAt('references-file', ['references'], message)]);
  if (!path.toLowerCase().endsWith('.json')) {
    return refused(`Found ${shown(path)}, but the path of a .json file is needed.`);
  }
  if (!load) return refused('References in a file cannot be read here. Write the items into the spec.');
  const text = loadedText(path, load);
  if (typeof text !== 'string') return failed(text);
  const { tree: items, positions, problems } = read(text);
  if (items !== undefined && !Array.isArray(items)) {
    const message = `Found ${shownValue(items)}, but a list of CSL-JSON items is needed.`;
    problems.push(errorAt('references-file', [], message));
  }
  if (problems.length > 0) return failed(problems.map((problem) => locate(problem, positions, path)));
  const whole = { ...(tree as Group), references: items };
  return { tree: whole, source: { file: path, positions }, areKnown: true, problems: [] };
}

function loadedText(path: string, load: ReferenceLoader): string | Problem[] {
  try {
    return load(path);
  } catch (error) {
    if (!(error instanceof ProblemError)) throw error;
    return error.problems.map((problem): Problem => ({ ...problem, path: 'references' }));
  }
}

/** The items of a spec that need not be valid. */
export function referencesOf(tree: unknown): Reference[] {
  return entriesOf(childOf(tree, 'references'))
    .filter((entry): entry is Group & { id: string } => isGroup(entry) && typeof entry.id === 'string')
    .map(({ page, ...entry }) => ({
      type: 'document',
      ...entry,
      ...(page === undefined ? {} : { page: String(page) }),
    }));
}
