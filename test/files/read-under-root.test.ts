import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { MOST_BYTES } from '../../src/files/read-text.ts';
import { type RootOptions, readUnderRoot } from '../../src/files/read-under-root.ts';
import { ProblemError } from '../../src/problem.ts';

let folder = '';
let root = '';

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'samplecase-read-'));
  root = join(folder, 'study');
  mkdirSync(join(root, 'inner'), { recursive: true });
  mkdirSync(join(folder, 'study-beside'));
  writeFileSync(join(root, 'refs.json'), '[] é');
  writeFileSync(join(root, 'inner', 'deep.json'), 'deep');
  writeFileSync(join(root, '..refs.json'), 'dots in a name');
  writeFileSync(join(folder, 'secret.json'), 'secret');
  writeFileSync(join(folder, 'study-beside', 'refs.json'), 'beside');
  symlinkSync(join(folder, 'secret.json'), join(root, 'link-out.json'));
  symlinkSync(join(root, 'refs.json'), join(root, 'link-in.json'));
  symlinkSync('loop.json', join(root, 'loop.json'));
  symlinkSync(root, join(folder, 'study-link'));
});

afterAll(() => {
  rmSync(folder, { recursive: true, force: true });
});

function said(path: string, options: Partial<RootOptions> = {}): string {
  try {
    readUnderRoot(path, { root, ...options });
  } catch (error) {
    if (error instanceof ProblemError)
      return error.problems.map(({ code, message }) => `${code}: ${message}`).join('\n');
    throw error;
  }
  return 'read';
}

describe('a file named in a spec', () => {
  it.each([
    ['refs.json', '[] é'],
    ['./inner/../refs.json', '[] é'],
    ['inner/deep.json', 'deep'],
    ['..refs.json', 'dots in a name'],
    ['link-in.json', '[] é'],
  ])('%s is read below the folder of the spec', (path, content) => {
    expect(readUnderRoot(path, { root })).toBe(content);
  });

  it('is read when the folder itself is reached through a link', () => {
    expect(readUnderRoot('refs.json', { root: join(folder, 'study-link') })).toBe('[] é');
  });

  it.each([
    '../secret.json',
    '../study-beside/refs.json',
    'inner/../../secret.json',
    '..',
    '/etc/hostname',
    'link-out.json',
    '../not-there.json',
  ])('%s outside is refused, whether it exists or not', (path) => {
    expect(said(path)).toBe(
      `outside-root: ${path} lies outside the folder of the spec, and is not read. Move it there, or allow it with --allow-outside.`,
    );
  });

  it('is read outside when the user allows it', () => {
    expect(readUnderRoot('../secret.json', { root, allowOutside: true })).toBe('secret');
    expect(readUnderRoot(join(folder, 'secret.json'), { root, allowOutside: true })).toBe('secret');
    expect(readUnderRoot('link-out.json', { root, allowOutside: true })).toBe('secret');
  });

  it('that cannot be read is answered with the reason', () => {
    expect(said('missing.json')).toBe(`unreadable-file: There is no file ${join(root, 'missing.json')}.`);
    expect(said('inner')).toBe(`unreadable-file: ${join(root, 'inner')} is a folder, not a file.`);
    expect(said('refs.json/deeper.json')).toBe(
      `unreadable-file: There is no file ${join(root, 'refs.json/deeper.json')}: a part of its path is a file, not a folder.`,
    );
    expect(said('loop.json')).toBe(
      `unreadable-file: ${join(root, 'loop.json')} is a link that leads back to itself.`,
    );
    expect(said('nul\0.json', { allowOutside: true })).toMatch(
      /^unreadable-file: .* cannot be read \(ERR_INVALID_ARG_VALUE\)\.$/,
    );
  });
});

describe('the text of a file', () => {
  const write = (content: string | Uint8Array): void => writeFileSync(join(root, 'text'), content);

  it('may have 1 MiB and no more', () => {
    write('x'.repeat(MOST_BYTES));
    expect(readUnderRoot('text', { root })).toHaveLength(MOST_BYTES);
    write('x'.repeat(MOST_BYTES + 1));
    expect(said('text')).toBe(
      `too-large: ${join(root, 'text')} is larger than 1 MiB (1,048,576 bytes), the most that is read. Shorten it.`,
    );
  });

  it('may be empty', () => {
    write('');
    expect(readUnderRoot('text', { root })).toBe('');
  });

  it('keeps its byte order mark, which the reader of the spec takes off', () => {
    write('\ufeffa');
    expect(readUnderRoot('text', { root })).toBe('\ufeffa');
  });

  it('must be UTF-8, and the line that is not is named', () => {
    write(Buffer.from('title: x\nauthor: M\xfcller\n', 'latin1'));
    expect(said('text')).toBe(
      `not-utf8: ${join(root, 'text')} is not UTF-8 text (line 2). Save it as UTF-8.`,
    );
    write(Buffer.from('\ufefftitle: x', 'utf16le'));
    expect(said('text')).toBe(`not-utf8: ${join(root, 'text')} is saved as UTF-16. Save it as UTF-8.`);
  });
});
