/** Where each part of a spec stands in its file. */

import type { Position, Problem } from '../problem.ts';
import { parentPath } from './path.ts';

/** Codes of problems that are about a key and not about its value. */
const ABOUT_THE_KEY = new Set(['unknown-key', 'effect-form', 'missing-key']);

interface Place {
  key: number | null;
  value: number;
  isCollection: boolean;
}

export class Positions {
  readonly #lineStarts: number[];
  readonly #places = new Map<string, Place>();

  constructor(text: string) {
    this.#lineStarts = [0];
    for (const lineBreak of text.matchAll(/\r\n|\r|\n/g)) {
      this.#lineStarts.push(lineBreak.index + lineBreak[0].length);
    }
  }

  /** Where a key is given twice, the first stays: later stages see the first value. */
  add(path: string, key: number | null, value: number, isCollection: boolean): void {
    if (!this.#places.has(path)) this.#places.set(path, { key, value, isCollection });
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

  /** Position of the node at a path, or of the nearest one around it; the first line when there is none.
   *  A collection is shown at its key: its first entry is already the next line. */
  find(path: string, code: string): Position {
    for (let here: string | null = path; here !== null; here = parentPath(here)) {
      const place = this.#places.get(here);
      if (!place) continue;
      const showKey = place.isCollection || here !== path || ABOUT_THE_KEY.has(code);
      return this.at(showKey && place.key !== null ? place.key : place.value);
    }
    return this.at(0);
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
