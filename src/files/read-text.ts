/** A text file, read with a limit and as UTF-8 or not at all. */

import { closeSync, fstatSync, openSync, readSync } from 'node:fs';
import { fail, ProblemError } from '../problem.ts';

/** Largest file read, in bytes. A spec or a template of that size would be a mistake. */
export const MOST_BYTES = 1_048_576;

/** @throws {ProblemError} when there is no such file, it is a folder, too large, or no UTF-8 text */
export function readText(path: string): string {
  return decodeText(readBytes(path), path);
}

/** @param name of the source, for messages
 *  @throws {ProblemError} when the bytes are no UTF-8 text */
export function decodeText(bytes: Uint8Array, name: string): string {
  if ((bytes[0] === 0xff && bytes[1] === 0xfe) || (bytes[0] === 0xfe && bytes[1] === 0xff)) {
    fail('not-utf8', '', `${name} is saved as UTF-16. Save it as UTF-8.`);
  }
  try {
    return new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(bytes);
  } catch {
    fail('not-utf8', '', `${name} is not UTF-8 text${firstBadLine(bytes)}. Save it as UTF-8.`);
  }
}

/** Reads a descriptor to its end, or to the limit. @throws {ProblemError} when there is more */
export function readDescriptor(descriptor: number, name: string): Uint8Array {
  const bytes = new Uint8Array(MOST_BYTES + 1);
  let length = 0;
  while (length < bytes.length) {
    const count = readSync(descriptor, bytes, length, bytes.length - length, null);
    if (count === 0) return bytes.subarray(0, length);
    length += count;
  }
  fail('too-large', '', `${name} is larger than 1 MiB (1,048,576 bytes), the most that is read. Shorten it.`);
}

function readBytes(path: string): Uint8Array {
  let descriptor: number | null = null;
  try {
    descriptor = openSync(path, 'r');
    if (fstatSync(descriptor).isDirectory()) fail('unreadable-file', '', `${path} is a folder, not a file.`);
    return readDescriptor(descriptor, path);
  } catch (error) {
    if (error instanceof ProblemError) throw error;
    return fail('unreadable-file', '', unreadable(path, error));
  } finally {
    if (descriptor !== null) closeSync(descriptor);
  }
}

/** Why a path cannot be read, as a sentence. */
export function unreadable(path: string, error: unknown): string {
  switch ((error as NodeJS.ErrnoException).code) {
    case 'ENOENT':
      return `There is no file ${path}.`;
    case 'ENOTDIR':
      return `There is no file ${path}: a part of its path is a file, not a folder.`;
    case 'EACCES':
    case 'EPERM':
      return `${path} may not be read with your permissions.`;
    case 'ELOOP':
      return `${path} is a link that leads back to itself.`;
    default:
      return `${path} cannot be read (${(error as NodeJS.ErrnoException).code ?? 'unknown reason'}).`;
  }
}

/** ` (line 7)`: the line of the first byte that is no UTF-8; each line is decoded alone to find it. */
function firstBadLine(bytes: Uint8Array): string {
  const decoder = new TextDecoder('utf-8', { fatal: true });
  let start = 0;
  for (let line = 1; start < bytes.length; line++) {
    const feed = bytes.indexOf(0x0a, start);
    const end = feed < 0 ? bytes.length : feed + 1;
    try {
      decoder.decode(bytes.subarray(start, end));
    } catch {
      return ` (line ${line})`;
    }
    start = end;
  }
  return '';
}
