/** Reads what a spec names: only below the spec's own folder, unless the user allows more. Specs come from
 *  anywhere, and a path in one must not reach into the rest of the disk. */

import { realpathSync } from 'node:fs';
import { isAbsolute, relative, resolve } from 'node:path';
import { fail } from '../problem.ts';
import { readText, unreadable } from './read-text.ts';

export interface RootOptions {
  /** Folder below which the file must lie; a relative path begins here. */
  root: string;
  /** Read it wherever it lies. */
  allowOutside?: boolean;
}

/** Links are followed before the folder is compared, so that a link cannot lead out of it.
 *  @throws {ProblemError} when the file lies outside, or cannot be read as `readText` reads */
export function readUnderRoot(path: string, { root, allowOutside = false }: RootOptions): string {
  const target = resolve(root, path);
  if (!allowOutside) {
    // By its name first: whether a file outside exists is none of the spec's business.
    if (!isBelow(resolve(root), target) || !isBelow(real(root), real(target))) {
      fail(
        'outside-root',
        '',
        `${path} lies outside the folder of the spec, and is not read. Move it there, or allow it with --allow-outside.`,
      );
    }
  }
  return readText(target);
}

function real(path: string): string {
  try {
    return realpathSync(path);
  } catch (error) {
    fail('unreadable-file', '', unreadable(path, error));
  }
}

function isBelow(folder: string, path: string): boolean {
  const way = relative(folder, path);
  return way !== '' && way !== '..' && !way.startsWith('../') && !way.startsWith('..\\') && !isAbsolute(way);
}
