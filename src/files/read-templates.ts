/** A user's own templates: every .hbs file below a folder. */

import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { fail } from '../problem.ts';
import { unreadable } from './read-text.ts';
import { readUnderRoot } from './read-under-root.ts';

const ENDING = '.hbs';

/** Texts by path below the folder, without the ending: `parts/losses`.
 *  @throws {ProblemError} when the folder or a file cannot be read, or there is no template in it */
export function readTemplates(folder: string): Record<string, string> {
  const files = listed(folder)
    .filter((file) => file.endsWith(ENDING))
    .sort();
  if (files.length === 0) fail('no-templates', '', `There is no ${ENDING} file in ${folder}.`);
  return Object.fromEntries(
    files.map((file) => [
      file.slice(0, -ENDING.length).replaceAll('\\', '/'),
      readUnderRoot(file, { root: folder, allowOutside: true }),
    ]),
  );
}

function listed(folder: string): string[] {
  try {
    return readdirSync(folder, { recursive: true, encoding: 'utf8' });
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOTDIR') {
      fail('unreadable-file', '', `${join(folder)} is a file; a folder of templates is needed.`);
    }
    fail('unreadable-file', '', unreadable(folder, error));
  }
}
