/** The spec's references: items as they stand, or the file that holds them. */

import { type Problem, ProblemError } from '../problem.ts';
import { formatPath } from './path.ts';
import { locate } from './positions.ts';
import { read } from './read.ts';
import { shown, shownValue } from './shown.ts';
import type { Reference } from './study.ts';
import { childOf, entriesOf, isGroup } from './tree.ts';

/** Gives the text of the file a spec names. @throws {ProblemError} when it cannot be read, or may not. */
export type ReferenceLoader = (path: string) => string;

export interface LoadedReferences {
  /** The items; null when they could not be read, so that no `cite` is called unresolved for it. */
  items: Reference[] | null;
  problems: Problem[];
}

export function loadReferences(tree: unknown, load: ReferenceLoader | undefined): LoadedReferences {
  const written = childOf(tree, 'references');
  if (typeof written !== 'string') return { items: itemsOf(entriesOf(written)), problems: [] };
  const failed = (code: string, message: string): LoadedReferences => ({
    items: null,
    problems: [{ level: 'error', code, path: 'references', message }],
  });
  if (!written.toLowerCase().endsWith('.json')) {
    return failed('references-file', `Found ${shown(written)}, but the path of a .json file is needed.`);
  }
  if (!load) {
    return failed(
      'references-file',
      'References in a file cannot be read here. Write the items into the spec.',
    );
  }
  let text: string;
  try {
    text = load(written);
  } catch (error) {
    if (!(error instanceof ProblemError)) throw error;
    return {
      items: null,
      problems: error.problems.map((problem): Problem => ({ ...problem, path: 'references' })),
    };
  }
  return readReferences(text, written);
}

/** A CSL-JSON file: a list of items, each with an id. */
function readReferences(text: string, file: string): LoadedReferences {
  const { tree, positions, problems } = read(text);
  const found = [...problems];
  const report = (path: string, message: string): void => {
    found.push({ level: 'error', code: 'references-file', path, message });
  };
  if (tree !== undefined && !Array.isArray(tree)) {
    report('', `Found ${shownValue(tree)}, but a list of CSL-JSON items is needed.`);
  }
  for (const [index, item] of entriesOf(tree).entries()) {
    const id = childOf(item, 'id');
    if (typeof id === 'string' && id !== '') continue;
    const path = formatPath(isGroup(item) ? [index, 'id'] : [index]);
    report(
      path,
      `Found ${shownValue(isGroup(item) ? id : item)}, but an item with an id (a text) is needed.`,
    );
  }
  if (found.length > 0)
    return { items: null, problems: found.map((problem) => locate(problem, positions, file)) };
  return { items: itemsOf(entriesOf(tree)), problems: [] };
}

function itemsOf(entries: readonly unknown[]): Reference[] {
  return entries
    .filter((entry) => isGroup(entry) && typeof entry.id === 'string')
    .map((entry) => ({ type: 'document', ...(entry as Omit<Reference, 'type'>) }));
}
