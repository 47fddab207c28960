/** Where each part of a spec stands in its file. */

import type { Position, Problem } from '../problem.ts';
import { parsePath, type Segments } from './path.ts';

/** Codes of problems that are about a key and not about its value. */
const ABOUT_THE_KEY = new Set(['unknown-key', 'effect-form', 'missing-key']);

/** One node of the file. Places form a tree of their own, as paths written out would repeat every key above. */
export class Place {
  readonly parent: Place | null;
  readonly segment: string | number;
  readonly depth: number;
  /** Offset of the key it stands under; null for an entry of a list and for the whole. */
  readonly key: number | null;
  readonly value: number;
  readonly isCollection: boolean;
  readonly #children = new Map<string | number, Place>();

  constructor(at: {
    parent: Place | null;
    segment: string | number;
    key: number | null;
    value: number;
    isCollection: boolean;
  }) {
    this.parent = at.parent;
    this.segment = at.segment;
    this.depth = at.parent ? at.parent.depth + 1 : 0;
    this.key = at.key;
    this.value = at.value;
    this.isCollection = at.isCollection;
    // Where a key is given twice, the first stays: later stages see the first value.
    if (at.parent && !at.parent.#children.has(at.segment)) at.parent.#children.set(at.segment, this);
  }

  child(segment: string | number): Place | undefined {
    return this.#children.get(segment);
  }

  get path(): Segments {
    return this.parent ? [...this.parent.path, this.segment] : [];
  }
}

export class Positions {
  /** The whole file, once it is read. */
  root: Place | null = null;
  readonly #lineStarts: number[];

  constructor(text: string) {
    this.#lineStarts = [0];
    for (const lineBreak of text.matchAll(/\r\n|\r|\n/g)) {
      this.#lineStarts.push(lineBreak.index + lineBreak[0].length);
    }
  }

  /** Line and column of an offset, both counted from 1. */
  at(offset: number): Position {
    let low = 0;
    let high = this.#lineStarts.length - 1;
    while (low < high) {
      const middle = Math.ceil((low + high) / 2);
      if ((this.#lineStarts[middle] ?? 0) <= offset) low = middle;
      else high = middle - 1;
    }
    return { line: low + 1, column: offset - (this.#lineStarts[low] ?? 0) + 1 };
  }

  /** Position of the node at a path, or of the nearest one around it; the first line when nothing was read.
   *  A collection is shown at its key: its first entry is already the next line. */
  find(path: string, code: string): Position {
    const segments = parsePath(path);
    if (!this.root) return this.at(0);
    let place: Place = this.root;
    for (const segment of segments) {
      const child = place.child(segment);
      if (!child) break;
      place = child;
    }
    const showKey = place.isCollection || place.depth < segments.length || ABOUT_THE_KEY.has(code);
    return this.at(showKey && place.key !== null ? place.key : place.value);
  }
}

/** The problem with file, line and column; one that knows them already keeps them. */
export function locate(problem: Problem, positions: Positions, file?: string): Problem {
  return {
    ...(file === undefined ? {} : { file }),
    position: positions.find(problem.path, problem.code),
    ...problem,
  };
}

/** In the order of the file, other files after it; the same sentence about the same place once. */
export function inFileOrder(problems: readonly Problem[]): Problem[] {
  const seen = new Set<string>();
  const files = [...new Set(problems.map(({ file }) => file))];
  return problems
    .filter(({ file, path, message }) => {
      const key = JSON.stringify([file, path, message]);
      return !seen.has(key) && seen.add(key);
    })
    .sort(
      (a, b) =>
        files.indexOf(a.file) - files.indexOf(b.file) ||
        (a.position?.line ?? 0) - (b.position?.line ?? 0) ||
        (a.position?.column ?? 0) - (b.position?.column ?? 0),
    );
}
