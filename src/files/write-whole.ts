/** Writes files whole or not at all. */

import { randomBytes } from 'node:crypto';
import {
  closeSync,
  fsyncSync,
  lstatSync,
  mkdirSync,
  openSync,
  renameSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import { basename, dirname, join } from 'node:path';
import { fail, ProblemError } from '../problem.ts';

export interface FileToWrite {
  path: string;
  content: string;
}

/** Every file is first written in full under a temporary name in its own folder, then all are renamed. When
 *  anything fails before the first rename nothing has changed; a failing rename leaves the file it was to
 *  replace as it was. Missing folders are made; no temporary file stays behind.
 *  @throws {ProblemError} names the file and the reason, and says what was written before it */
export function writeWhole(files: readonly FileToWrite[]): void {
  const waiting: { temporary: string; path: string }[] = [];
  const written: string[] = [];
  let current = '';
  try {
    for (const { path, content } of files) {
      current = path;
      refuseFolder(path);
      mkdirSync(dirname(path), { recursive: true });
      const temporary = join(dirname(path), `.${basename(path)}.${randomBytes(6).toString('hex')}.tmp`);
      waiting.push({ temporary, path });
      writeToDisk(temporary, content);
    }
    for (let next = waiting[0]; next; next = waiting[0]) {
      current = next.path;
      renameSync(next.temporary, next.path);
      written.push(next.path);
      waiting.shift();
    }
  } catch (error) {
    if (error instanceof ProblemError) throw error;
    const before =
      written.length > 0 ? ` Written before it: ${written.join(', ')}.` : ' Nothing was written.';
    fail('unwritable-file', '', `${unwritable(current, error)}${before}`);
  } finally {
    for (const { temporary } of waiting) rmSync(temporary, { force: true });
  }
}

/** A rename onto a folder would fail too, but only after other files had been replaced. */
function refuseFolder(path: string): void {
  if (lstatSync(path, { throwIfNoEntry: false })?.isDirectory()) {
    fail('unwritable-file', '', `${path} is a folder, so no file can be written there. Nothing was written.`);
  }
}

/** On the disk, and not only on its way there, before the rename: after a power cut the name must not point at
 *  an empty file. */
function writeToDisk(path: string, content: string): void {
  const descriptor = openSync(path, 'wx');
  try {
    writeFileSync(descriptor, content);
    fsyncSync(descriptor);
  } finally {
    closeSync(descriptor);
  }
}

function unwritable(path: string, error: unknown): string {
  switch ((error as NodeJS.ErrnoException).code) {
    case 'ENOENT':
      return `${path} cannot be written: its folder is missing.`;
    case 'ENOTDIR':
    case 'EEXIST':
      return `${path} cannot be written: a part of its path is a file, not a folder.`;
    case 'EACCES':
    case 'EPERM':
      return `${path} may not be written with your permissions.`;
    case 'EROFS':
      return `${path} cannot be written: the disk is read-only.`;
    case 'ENOSPC':
    case 'EDQUOT':
      return `${path} cannot be written: the disk is full.`;
    case 'ENAMETOOLONG':
      return `${path} cannot be written: its name is too long.`;
    default:
      return `${path} cannot be written (${(error as NodeJS.ErrnoException).code ?? 'unknown reason'}).`;
  }
}
